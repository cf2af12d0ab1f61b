using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields;

/// <summary>The charge on one straight stretch of a surface, for pictures and tables.</summary>
/// <param name="Conductor">Name of the conductor, or null on a boundary between dielectrics (bound charge).</param>
/// <param name="XMetres">Stations along the stretch, in the section's coordinates.</param>
/// <param name="YMetres">Their heights.</param>
/// <param name="TotalCoulombPerSquareMetre">
/// Free and bound charge per area at the stations; on a face of metal this is ε0 times the field beside it. It grows without bound
/// towards corners, where no station lies.
/// </param>
/// <param name="CoulombPerMetre">Free and bound charge of the whole stretch per metre of line.</param>
public sealed record SurfaceCharge(
    string? Conductor, double[] XMetres, double[] YMetres, double[] TotalCoulombPerSquareMetre, double CoulombPerMetre)
{
    /// <summary>The charge on every surface of a section but its infinite planes.</summary>
    internal static IReadOnlyList<SurfaceCharge> Of(FieldSolution solution, SolvedDrive drive)
    {
        const double scale = 2 * Math.PI * Vacuum.Epsilon0;
        var surfaces = new List<SurfaceCharge>();
        var first = 0;
        foreach (var panel in drive.Panels)
        {
            var nodes = LegendreRule.Of(panel.Terms + 2).Nodes;
            for (var side = 0; side < (drive.Mirrored ? 2 : 1); side++)
            {
                var (x, y, density) = (new double[nodes.Length], new double[nodes.Length], new double[nodes.Length]);
                for (var k = 0; k < nodes.Length; k++)
                {
                    var point = panel.At(nodes[k]);
                    var place = solution.Frame.Back(side == 1 ? new(-point.Real, point.Imaginary) : point);
                    (x[k], y[k]) = (place.Real, place.Imaginary);
                    density[k] = scale * drive.ChargeAt(panel, first, side == 1, nodes[k]) / panel.Stretch(nodes[k]);
                }

                var conductor = panel.Piece.Conductor;
                var name = conductor < 0 ? null : solution.Section.Conductors[side == 1 ? solution.Pairs.Twin(conductor) : conductor].Name;
                surfaces.Add(new SurfaceCharge(name, x, y, density, scale * drive.Coefficient(first, side == 1)));
            }

            first += panel.Terms;
        }

        return surfaces;
    }
}
