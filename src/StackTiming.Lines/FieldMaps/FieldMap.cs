using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.FieldMaps;

/// <summary>A rectangle of a cross-section, metres.</summary>
/// <param name="Left">Left edge.</param>
/// <param name="Bottom">Lower edge.</param>
/// <param name="Right">Right edge.</param>
/// <param name="Top">Upper edge.</param>
public readonly record struct MapWindow(double Left, double Bottom, double Right, double Top);

/// <summary>The fields of a forward wave on a solved section, at the middle of every cell of an even grid, row by row from the top.</summary>
/// <param name="Columns">Cells across.</param>
/// <param name="Rows">Cells down.</param>
/// <param name="Window">What the grid fills.</param>
/// <param name="PotentialVolts">Potential; beyond a plane 0.</param>
/// <param name="EnergyJoulePerCubicMetre">Density of the electric energy, ε·E²/2; NaN in metal and beyond planes.</param>
/// <param name="PowerWattPerSquareMetre">
/// Power density along the line, E×H, with H from the currents that go with the voltages in a forward wave; NaN in metal and beyond planes.
/// </param>
public sealed record FieldMap(
    int Columns, int Rows, MapWindow Window, double[] PotentialVolts, double[] EnergyJoulePerCubicMetre, double[] PowerWattPerSquareMetre)
{
    private const double WaveImpedanceOhms = Vacuum.Mu0 * Vacuum.SpeedOfLight;

    /// <summary>Area of a cell, m².</summary>
    public double CellSquareMetres => (Window.Right - Window.Left) * (Window.Top - Window.Bottom) / (Columns * Rows);

    /// <summary>Computes the map.</summary>
    /// <param name="solution">The solved section.</param>
    /// <param name="volts">Voltages of the signals.</param>
    /// <param name="window">What the grid fills.</param>
    /// <param name="columns">Cells across.</param>
    /// <param name="rows">Cells down.</param>
    public static FieldMap Of(FieldSolution solution, double[] volts, MapWindow window, int columns, int rows)
    {
        var count = columns * rows;
        List<int> cells = new(count);
        List<double> xs = new(count), ys = new(count), permittivities = new(count);
        var potential = new double[count];
        double[] energy = new double[count], power = new double[count];
        Array.Fill(energy, double.NaN);
        Array.Fill(power, double.NaN);
        for (var i = 0; i < count; i++)
        {
            var x = window.Left + (window.Right - window.Left) * (i % columns + 0.5) / columns;
            var y = window.Top - (window.Top - window.Bottom) * (i / columns + 0.5) / rows;
            potential[i] = MetalVolts(solution.Section, volts, x, y);
            if (solution.PermittivityAt(x, y) is not { } permittivity)
                continue;
            cells.Add(i);
            xs.Add(x);
            ys.Add(y);
            permittivities.Add(permittivity);
        }
        double[] px = [.. xs], py = [.. ys];
        var field = solution.Drive(volts);
        var v = field.PotentialVolts(px, py);
        var (ex, ey) = field.FieldVoltsPerMetre(px, py);
        var (ax, ay) = solution.DriveInAir(VoltsOfCurrents(solution, volts)).FieldVoltsPerMetre(px, py);
        for (var k = 0; k < cells.Count; k++)
        {
            potential[cells[k]] = v[k];
            energy[cells[k]] = 0.5 * Vacuum.Epsilon0 * permittivities[k] * (ex[k] * ex[k] + ey[k] * ey[k]);
            // H is the field in air turned by a right angle over the wave impedance, so that E×H is their scalar product.
            power[cells[k]] = (ex[k] * ax[k] + ey[k] * ay[k]) / WaveImpedanceOhms;
        }
        return new FieldMap(columns, rows, window, potential, energy, power);
    }

    /// <summary>Voltages in air whose charges, at the speed of light, are the currents of the wave: c·L·I.</summary>
    private static double[] VoltsOfCurrents(FieldSolution solution, double[] volts)
    {
        var amperes = CharacteristicAdmittance.Amperes(solution.Line, volts);
        var inAir = new double[volts.Length];
        for (var i = 0; i < volts.Length; i++)
        {
            for (var j = 0; j < volts.Length; j++)
                inAir[i] += Vacuum.SpeedOfLight * solution.Line.InductanceHenryPerMetre[i, j] * amperes[j];
        }
        return inAir;
    }

    private static double MetalVolts(CrossSection section, double[] volts, double x, double y)
    {
        var signal = 0;
        foreach (var conductor in section.Conductors)
        {
            var height = conductor.ThicknessMetres > 0 ? (y - conductor.BottomMetres) / conductor.ThicknessMetres : -1;
            var width = conductor.LowerWidthMetres + height * (conductor.UpperWidthMetres - conductor.LowerWidthMetres);
            if (height is >= 0 and <= 1 && Math.Abs(x - conductor.CentreMetres) <= width / 2)
                return conductor.Grounded ? 0 : volts[signal];
            signal += conductor.Grounded ? 0 : 1;
        }
        return 0;
    }
}
