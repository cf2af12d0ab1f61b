using StackTiming.Lines.Constants;

namespace StackTiming.Lines.Fields.Currents;

/// <summary>
/// The return current in an infinite plane at frequencies where the skin depth is small against the section: its density is that of the
/// charge in air times the speed of light (the magnetic field at a conductor is tangential as the electric one is normal).
/// </summary>
/// <param name="PlaneMetres">Height of the plane, in metres.</param>
/// <param name="TotalAmperes">Current in the plane, positive against a positive signal current.</param>
/// <param name="XMetres">Stations along the plane in rising order.</param>
/// <param name="DensityAmperePerMetre">Density at the stations, positive against a positive signal current.</param>
/// <param name="LowMetres">x below which 2.5 % of the magnitude of the current flows.</param>
/// <param name="HighMetres">x above which 2.5 % of the magnitude of the current flows.</param>
public sealed record ReturnCurrent(
    double PlaneMetres, double TotalAmperes, double[] XMetres, double[] DensityAmperePerMetre, double LowMetres, double HighMetres)
{
    /// <summary>Width that holds 95 % of the magnitude of the current, in metres.</summary>
    public double WidthMetres => HighMetres - LowMetres;

    /// <summary>The return current in the plane at this height for these signal currents.</summary>
    /// <param name="solution">The solved section.</param>
    /// <param name="planeMetres">Height of one of the section's planes.</param>
    /// <param name="signalAmperes">Current of each signal, in amperes.</param>
    /// <exception cref="ArgumentException">The section has no plane at that height.</exception>
    public static ReturnCurrent InPlane(FieldSolution solution, double planeMetres, ReadOnlySpan<double> signalAmperes)
    {
        var section = solution.Section;
        if (planeMetres != section.BottomPlaneMetres && planeMetres != section.TopPlaneMetres)
            throw new ArgumentException("the section has no plane at this height", nameof(planeMetres));
        var stations = PlaneStations.Along(section, planeMetres);
        var (x, weights) = (stations.X, stations.Weights);
        var normal = planeMetres == section.BottomPlaneMetres ? 1 : -1;
        var density = PlaneDensity(solution.Field(solution.Carry(signalAmperes)), planeMetres, normal, x);
        var magnitude = Cumulative(density, weights);
        var total = 0.0;
        for (var i = 0; i < x.Length; i++)
            total += weights[i] * density[i];
        return new ReturnCurrent(planeMetres, total, x, density, At(0.025, x, magnitude), At(0.975, x, magnitude));
    }

    /// <summary>
    /// The return current in every conductor at zero volts, in amperes by name, positive against a positive signal current.
    /// </summary>
    /// <param name="solution">The solved section.</param>
    /// <param name="signalAmperes">Current of each signal, in amperes.</param>
    public static IReadOnlyDictionary<string, double> InConductors(FieldSolution solution, ReadOnlySpan<double> signalAmperes)
    {
        var conductors = solution.Section.Conductors;
        var sums = conductors.Where(c => c.Grounded).ToDictionary(c => c.Name, _ => 0.0);
        var drive = solution.Carry(signalAmperes);
        var first = 0;
        foreach (var panel in drive.Panels)
        {
            for (var side = 0; side < (drive.Mirrored ? 2 : 1); side++)
            {
                var conductor = conductors[side == 1 ? solution.Pairs.Twin(panel.Piece.Conductor) : panel.Piece.Conductor];
                if (conductor.Grounded)
                    sums[conductor.Name] -= 2 * Math.PI * Vacuum.Epsilon0 * Vacuum.SpeedOfLight * drive.Coefficient(first, side == 1);
            }

            first += panel.Terms;
        }

        return sums;
    }

    /// <summary>Density against the signal current; the upward normal of the bottom plane counts as +1.</summary>
    internal static double[] PlaneDensity(DrivenField field, double planeMetres, int normal, double[] x)
    {
        var y = new double[x.Length];
        Array.Fill(y, planeMetres);
        var density = field.FieldVoltsPerMetre(x, y).Y;
        for (var i = 0; i < density.Length; i++)
            density[i] *= -normal * Vacuum.Epsilon0 * Vacuum.SpeedOfLight;
        return density;
    }

    /// <summary>Magnitude of the current up to the middle of each station's stretch.</summary>
    private static double[] Cumulative(double[] density, double[] weights)
    {
        var sums = new double[density.Length];
        var sum = 0.0;
        for (var i = 0; i < sums.Length; i++)
        {
            var part = weights[i] * Math.Abs(density[i]);
            sums[i] = sum + part / 2;
            sum += part;
        }

        for (var i = 0; i < sums.Length; i++)
            sums[i] /= sum;
        return sums;
    }

    private static double At(double share, double[] x, double[] cumulative)
    {
        var i = Array.BinarySearch(cumulative, share);
        if (i >= 0)
            return x[i];
        i = Math.Clamp(~i, 1, x.Length - 1);
        var part = (share - cumulative[i - 1]) / (cumulative[i] - cumulative[i - 1]);
        return x[i - 1] + part * (x[i] - x[i - 1]);
    }
}
