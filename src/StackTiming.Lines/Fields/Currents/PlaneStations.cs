using StackTiming.Lines.Fields.Panels;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Currents;

/// <summary>
/// Stations along a plane that are close where the current in it changes fast: below the corners of conductors on the scale of their
/// distance, and out to infinity (or, between two planes, to where nothing is left) as the inverse of the distance.
/// </summary>
internal sealed class PlaneStations
{
    private const int Nodes = 10;

    private readonly List<double> x = [];
    private readonly List<double> weights = [];

    private PlaneStations()
    {
    }

    /// <summary>x of the stations in rising order, in the section's coordinates.</summary>
    public double[] X => [.. x];

    /// <summary>Weights with which a density at the stations integrates to its total.</summary>
    public double[] Weights => [.. weights];

    /// <summary>Stations along the plane at this height.</summary>
    public static PlaneStations Along(CrossSection section, double planeMetres)
    {
        List<(double X, double Distance)> corners = [];
        foreach (var c in section.Conductors)
        {
            AddCorners(corners, c.CentreMetres, c.LowerWidthMetres, Math.Abs(c.BottomMetres - planeMetres));
            AddCorners(corners, c.CentreMetres, c.UpperWidthMetres, Math.Abs(c.TopMetres - planeMetres));
        }

        var (left, right) = (corners.Min(c => c.X), corners.Max(c => c.X));
        var highest = corners.Max(c => c.Distance);
        var margin = section.BottomPlaneMetres is { } bottom && section.TopPlaneMetres is { } top
            ? 5 * (top - bottom)
            : (right - left) / 2 + 3 * highest;
        var stations = new PlaneStations();
        var open = section.BottomPlaneMetres is null || section.TopPlaneMetres is null;
        var middle = (left + right) / 2;
        var reach = (right - left) / 2 + margin;
        if (open)
            stations.AddTail(middle, -reach);
        stations.AddBetween(middle - reach, middle + reach, corners);
        if (open)
            stations.AddTail(middle, reach);
        return stations;
    }

    private static void AddCorners(List<(double X, double Distance)> corners, double centre, double width, double distance)
    {
        corners.Add((centre - width / 2, distance));
        corners.Add((centre + width / 2, distance));
    }

    private void AddBetween(double from, double to, List<(double X, double Distance)> corners)
    {
        var length = to - from;
        foreach (var corner in corners)
        {
            var aside = Math.Max(0, Math.Max(from - corner.X, corner.X - to));
            if (length > 1e-6 * (Math.Abs(from) + Math.Abs(to)) && length > Math.Max(aside, corner.Distance))
            {
                AddBetween(from, from + length / 2, corners);
                AddBetween(from + length / 2, to, corners);
                return;
            }
        }

        var rule = LegendreRule.Of(Nodes);
        for (var k = 0; k < Nodes; k++)
        {
            x.Add(from + length * rule.Nodes[k]);
            weights.Add(length * rule.Weights[k]);
        }
    }

    private void AddTail(double middle, double reach)
    {
        var rule = LegendreRule.Of(2 * Nodes);
        for (var i = 0; i < 2 * Nodes; i++)
        {
            // In rising order of x: on the left from far to near, which is u rising; on the right the other way round.
            var k = reach < 0 ? i : 2 * Nodes - 1 - i;
            var u = rule.Nodes[k];
            x.Add(middle + reach / u);
            weights.Add(Math.Abs(reach) / (u * u) * rule.Weights[k]);
        }
    }
}
