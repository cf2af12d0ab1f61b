using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields.Currents;

/// <summary>
/// How current crowds on the surfaces of a section under skin effect. For unit currents i and j the integral of K_i K_j over a surface,
/// in 1/m, times the surface resistance is the resistance matrix per metre (H. A. Wheeler, Formulas for the skin effect, Proc. IRE 30,
/// 1942: the same as the incremental inductance of receding walls). At the corners of a trapezoid the square of the density is
/// integrable.
/// </summary>
internal sealed class CurrentSpread
{
    private CurrentSpread(double[][,] conductors, double[,] planes, double[] internalInductance) =>
        (Conductors, Planes, InternalInductance) = (conductors, planes, internalInductance);

    /// <summary>The integral over each conductor's surface, 1/m.</summary>
    public double[][,] Conductors { get; }

    /// <summary>The integral over the planes, 1/m.</summary>
    public double[,] Planes { get; }

    /// <summary>What the inductance of each signal gains with even current in its own conductor, henry per metre.</summary>
    public double[] InternalInductance { get; }

    /// <summary>The spread in a solved section.</summary>
    /// <exception cref="SectionNotSolvableException">
    /// A conductor has no thickness, so that the current at its edges has no finite loss.
    /// </exception>
    public static CurrentSpread Of(FieldSolution solution)
    {
        foreach (var c in solution.Section.Conductors)
        {
            if (c.ThicknessMetres <= 0)
                throw new SectionNotSolvableException($"Conductor {c.Name} has no thickness; its resistance is not defined.");
        }

        var signals = solution.Pairs.Signals;
        var drives = new SolvedDrive[signals];
        for (var i = 0; i < signals; i++)
        {
            var amperes = new double[signals];
            amperes[i] = 1;
            drives[i] = solution.Carry(amperes);
        }

        var conductors = new double[solution.Section.Conductors.Length][,];
        for (var i = 0; i < conductors.Length; i++)
            conductors[i] = new double[signals, signals];
        AddConductors(solution, drives, conductors);
        double[] inductance =
        [
            .. Enumerable.Range(0, conductors.Length)
                .Where(c => solution.Pairs.SignalRow(c) >= 0)
                .Select(c => EvenCurrent.InternalInductance(solution, c, drives[solution.Pairs.SignalRow(c)]))
        ];
        return new CurrentSpread(conductors, OnPlanes(solution, drives), inductance);
    }

    private static void AddConductors(FieldSolution solution, SolvedDrive[] drives, double[][,] conductors)
    {
        var scale = 2 * Math.PI * Vacuum.Epsilon0 * Vacuum.SpeedOfLight;
        var density = new double[drives.Length];
        var first = 0;
        foreach (var panel in drives[0].Panels)
        {
            for (var side = 0; side < (drives[0].Mirrored ? 2 : 1); side++)
            {
                var conductor = side == 1 ? solution.Pairs.Twin(panel.Piece.Conductor) : panel.Piece.Conductor;
                // The mirror image has the same angles.
                var corner = solution.Frame.Back(panel.Origin);
                var weights = CornerWeights.Of(panel, CornerWeights.InnerAngle(solution.Section.Conductors[panel.Piece.Conductor], corner));
                for (var k = 0; k < panel.Terms; k++)
                {
                    for (var i = 0; i < density.Length; i++)
                        density[i] = scale * drives[i].ChargeAt(panel, first, side == 1, LegendreRule.Of(panel.Terms).Nodes[k]);
                    AddProducts(conductors[conductor], density, weights[k]);
                }
            }

            first += panel.Terms;
        }
    }

    private static double[,] OnPlanes(FieldSolution solution, SolvedDrive[] drives)
    {
        var sum = new double[drives.Length, drives.Length];
        var section = solution.Section;
        foreach (var plane in new[] { section.BottomPlaneMetres, section.TopPlaneMetres })
        {
            if (plane is not { } height)
                continue;
            var stations = PlaneStations.Along(section, height);
            var (x, weights) = (stations.X, stations.Weights);
            double[][] densities = [.. drives.Select(d =>
                ReturnCurrent.PlaneDensity(solution.Field(d), height, height == section.BottomPlaneMetres ? 1 : -1, x))];
            var density = new double[drives.Length];
            for (var k = 0; k < x.Length; k++)
            {
                for (var i = 0; i < density.Length; i++)
                    density[i] = densities[i][k];
                AddProducts(sum, density, weights[k]);
            }
        }

        return sum;
    }

    private static void AddProducts(double[,] sum, double[] density, double weight)
    {
        for (var i = 0; i < density.Length; i++)
        {
            for (var j = 0; j < density.Length; j++)
                sum[i, j] += weight * density[i] * density[j];
        }
    }
}
