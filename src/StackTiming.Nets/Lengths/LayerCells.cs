using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Lengths;

/// <summary>What a layer cell says: one layer, or the two of a via.</summary>
/// <param name="First">The layer, or the first of two.</param>
/// <param name="Second">The second layer of a via, or empty.</param>
internal readonly record struct LayerCell(string First, string Second);

/// <summary>
/// Reads layer cells, each distinct text once: translates names, and compares them with the stack-up. A wrong layer is reported once,
/// at its first row, however many rows say it.
/// </summary>
/// <param name="stackUp">The stack-up, or null where it is not known and every name is accepted.</param>
/// <param name="format">Foreign layer names.</param>
/// <param name="problems">Where problems go.</param>
internal sealed class LayerCells(StackUp? stackUp, LengthListFormat format, ProblemList problems)
{
    private readonly Dictionary<string, LayerCell> known = new(StringComparer.Ordinal);
    private readonly HashSet<string> planesReported = new(StringComparer.Ordinal);
    private readonly string[]? names = stackUp?.CopperLayers.Select(l => l.Name).ToArray();
    private readonly Dictionary<string, CopperUse>? uses =
        stackUp?.CopperLayers.DistinctBy(l => l.Name).ToDictionary(l => l.Name, l => l.Use, StringComparer.Ordinal);

    /// <summary>What a cell says, where its text has been seen before.</summary>
    /// <param name="text">The cell without spaces around it.</param>
    /// <param name="cell">What it says.</param>
    public bool TryGet(ReadOnlySpan<char> text, out LayerCell cell) =>
        known.GetAlternateLookup<ReadOnlySpan<char>>().TryGetValue(text, out cell);

    /// <summary>Reads a text that has not been seen before.</summary>
    /// <param name="text">The cell without spaces around it.</param>
    /// <param name="at">Where it stands.</param>
    public LayerCell Add(string text, FilePosition at)
    {
        var split = text.IndexOf('>', StringComparison.Ordinal);
        var cell = split < 0
            ? new LayerCell(Resolve(text, at), "")
            : new LayerCell(Resolve(text[..split].Trim(), at), Resolve(text[(split + 1)..].Trim(), at));
        if (split >= 0 && cell.First == cell.Second)
            problems.Error(at, $"a via from '{Suggestion.Shorten(cell.First)}' to the same layer joins nothing", "write two different layers, such as L1>L3");
        known.Add(text, cell);
        return cell;
    }

    /// <summary>Reports a trace on a layer that holds planes only; once per layer.</summary>
    /// <param name="layer">Layer of a trace.</param>
    /// <param name="at">Where its row says so.</param>
    public void CheckTrace(string layer, FilePosition at)
    {
        if (planesReported.Add(layer))
            problems.Error(at, $"a trace cannot run on '{layer}', which the stack-up uses as a plane", "say 'use: mixed' in the stack-up if it carries both");
    }

    /// <summary>True where a layer holds planes only.</summary>
    /// <param name="layer">Layer name.</param>
    public bool IsPlane(string layer) => uses is not null && uses.TryGetValue(layer, out var use) && use == CopperUse.Plane;

    private string Resolve(string name, FilePosition at)
    {
        var resolved = format.LayerNames.GetValueOrDefault(name, name);
        if (resolved.Length == 0)
            problems.Error(at, "a layer's name is empty", "write a layer such as L1, or two such as L1>L3 for a via");
        else if (uses is not null && !uses.ContainsKey(resolved))
        {
            problems.Error(
                at, $"the stack-up '{stackUp!.Name}' has no copper layer '{Suggestion.Shorten(resolved)}'", Suggestion.For(resolved, names!));
        }
        return resolved;
    }
}
