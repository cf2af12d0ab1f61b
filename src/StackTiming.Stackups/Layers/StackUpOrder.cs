using System.Collections.Immutable;
using StackTiming.Stackups.Copper;
using StackTiming.Stackups.Reading;

namespace StackTiming.Stackups.Layers;

/// <summary>What the order of the layers must be, and what follows from it.</summary>
internal static class StackUpOrder
{
    /// <summary>Reports an order that no board can have.</summary>
    /// <param name="at">Where the stack-up begins.</param>
    /// <param name="layers">The layers from the top.</param>
    /// <param name="problems">Where problems go.</param>
    public static void Check(FilePosition at, ImmutableArray<Layer> layers, ProblemList problems)
    {
        if (layers.IsEmpty)
            return;
        var names = new Dictionary<string, FilePosition>(StringComparer.Ordinal);
        for (var i = 0; i < layers.Length; i++)
        {
            switch (layers[i])
            {
                case MaskLayer mask when i != 0 && i != layers.Length - 1:
                    problems.Error(mask.At, "solder mask can only be the first or the last layer", "move it, or write a core or prepreg");
                    break;
                case CopperLayer copper:
                    if (!names.TryAdd(copper.Name, copper.At))
                        problems.Error(copper.At, $"the copper layer '{Suggestion.Shorten(copper.Name)}' stands twice", $"the first is in line {names[copper.Name].Line}; give each a name of its own");
                    if (i > 0 && layers[i - 1] is CopperLayer above)
                        problems.Error(copper.At, $"no dielectric lies between '{Suggestion.Shorten(above.Name)}' and '{Suggestion.Shorten(copper.Name)}'", "write the core or prepreg between them");
                    break;
                default:
                    break;
            }
        }
        if (names.Count == 0)
            problems.Error(at, "the stack-up has no copper layer", "write at least one - { copper: L1, … }");
        if (!layers.Any(l => l is DielectricLayer))
            problems.Error(at, "the stack-up has no dielectric", "write at least one - { core: …, thickness: … }");
    }

    /// <summary>The layers with the wide face of each copper layer decided where the file does not state it.</summary>
    /// <param name="layers">Layers in a valid order.</param>
    /// <param name="problems">Where notes go.</param>
    public static ImmutableArray<Layer> WithWideFaces(ImmutableArray<Layer> layers, ProblemList problems)
    {
        var result = layers.ToBuilder();
        for (var i = 0; i < layers.Length; i++)
        {
            if (layers[i] is not CopperLayer { WideFaceStated: false } copper)
                continue;
            var above = i > 0 ? layers[i - 1] as DielectricLayer : null;
            var below = i + 1 < layers.Length ? layers[i + 1] as DielectricLayer : null;
            result[i] = copper with { WideFace = Decide(copper, above, below, i < layers.Length / 2, problems) };
        }
        return result.ToImmutable();
    }

    private static WideFace Decide(CopperLayer copper, DielectricLayer? above, DielectricLayer? below, bool upperHalf, ProblemList problems)
    {
        // An outer foil lies on the one dielectric that it has.
        if (above is null)
            return WideFace.Down;
        if (below is null)
            return WideFace.Up;
        if (above.Kind != below.Kind)
            return below.Kind == DielectricKind.Core ? WideFace.Down : WideFace.Up;
        // A foil between two sheets of a kind was pressed onto the inner part of the board.
        var face = upperHalf ? WideFace.Down : WideFace.Up;
        if (copper.Use != CopperUse.Plane && copper.Copper.UndercutMetres.Value > 0)
            problems.Note(copper.At, $"'{Suggestion.Shorten(copper.Name)}' lies between two layers of one kind; its wide face is taken to be the {(face == WideFace.Up ? "upper" : "lower")} one", "write base: up or base: down");
        return face;
    }
}
