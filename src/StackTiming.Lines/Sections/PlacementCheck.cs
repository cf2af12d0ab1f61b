using System.Collections.Immutable;
using System.Globalization;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Lines.Sections;

/// <summary>Whether conductors can stand where they are placed.</summary>
internal static class PlacementCheck
{
    /// <summary>Reports every conductor that cannot be made.</summary>
    /// <param name="stackUp">The stack-up.</param>
    /// <param name="placed">The conductors.</param>
    /// <param name="problems">Where problems go.</param>
    public static void Run(StackUp stackUp, ImmutableArray<PlacedConductor> placed, ProblemList problems)
    {
        var names = new HashSet<string>(StringComparer.Ordinal);
        foreach (var conductor in placed)
        {
            if (!names.Add(conductor.Name))
                problems.Error(conductor.At, $"two conductors are called '{conductor.Name}'", "give each its own name");
            if (stackUp.FindCopper(conductor.Layer) is { } layer)
                CheckShape(conductor, layer, problems);
            else
                problems.Error(
                    conductor.At, $"stack-up '{stackUp.Name}' has no copper layer '{Suggestion.Shorten(conductor.Layer)}'",
                    Suggestion.For(conductor.Layer, stackUp.CopperLayers.Select(l => l.Name)));
        }
        if (placed.All(c => c.Grounded))
            problems.Error(placed[0].At, "every conductor of this section is grounded", "leave 'grounded' away from the traces that carry signals");
        foreach (var layer in placed.GroupBy(c => c.Layer))
            CheckNeighbours([.. layer.OrderBy(c => c.LeftMetres)], problems);
    }

    /// <summary>Width of the narrow face of a conductor, in metres; a layer without thickness has no undercut.</summary>
    /// <param name="wideMetres">Width of the wide face.</param>
    /// <param name="layer">Its layer.</param>
    public static double NarrowWidth(double wideMetres, CopperLayer layer) =>
        layer.Thickness.Value > 0 ? wideMetres - 2 * layer.Copper.UndercutMetres.Value : wideMetres;

    private static void CheckShape(PlacedConductor conductor, CopperLayer layer, ProblemList problems)
    {
        var width = conductor.RightMetres - conductor.LeftMetres;
        if (!double.IsFinite(width) || !(width > 0))
        {
            problems.Error(conductor.At, $"conductor '{conductor.Name}' has no width", "write a width above zero, or 'from' to the left of 'to'");
            return;
        }
        if (NarrowWidth(width, layer) <= 0)
        {
            problems.Error(
                conductor.At,
                $"etching eats the narrow face of '{conductor.Name}': it is {Micrometres(width)} wide and {layer.Name} is undercut by "
                + $"{Micrometres(layer.Copper.UndercutMetres.Value)} on each side",
                "widen the trace or state a smaller undercut (a larger etch-factor) for the layer");
        }
    }

    private static void CheckNeighbours(ImmutableArray<PlacedConductor> fromLeft, ProblemList problems)
    {
        for (var i = 1; i < fromLeft.Length; i++)
        {
            var (left, right) = (fromLeft[i - 1], fromLeft[i]);
            var gap = right.LeftMetres - left.RightMetres;
            if (gap > 0 || double.IsNaN(gap))
                continue;
            var what = gap < 0 ? $"overlap by {Micrometres(-gap)}" : "touch";
            problems.Error(right.At, $"conductors '{left.Name}' and '{right.Name}' on {right.Layer} {what}", "leave a gap between them, or make them one conductor");
        }
    }

    private static string Micrometres(double metres) => string.Create(CultureInfo.InvariantCulture, $"{metres * 1e6:0.###} µm");
}
