using StackTiming.Nets.Parts;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Electrical;

/// <summary>Collects the pins of the length list that the parts file does not state, and notes them, once per part.</summary>
/// <param name="parts">The parts file.</param>
/// <param name="problems">Where notes go.</param>
internal sealed class UnstatedPins(PartList parts, ProblemList problems)
{
    private readonly Dictionary<string, (string Pin, FilePosition At, int Count, bool PartKnown)> byPart = new(StringComparer.Ordinal);

    /// <summary>Adds a pin.</summary>
    /// <param name="name">Its name, such as <c>U1.A3</c>.</param>
    /// <param name="part">Its part, or null where the parts file does not state the part either.</param>
    /// <param name="at">Where it occurs first.</param>
    public void Add(string name, Part? part, FilePosition at)
    {
        // The pins of a series part are known by being joined.
        if (parts.Parts.Count == 0 || (part is not null && part.Joins.Any(j => name.AsSpan(part.Name.Length + 1) is var pin && (pin.SequenceEqual(j.FirstPin) || pin.SequenceEqual(j.SecondPin)))))
            return;
        var partName = part?.Name ?? name[..Math.Max(0, name.LastIndexOf('.'))];
        byPart[partName] = byPart.TryGetValue(partName, out var seen) ? seen with { Count = seen.Count + 1 } : (name, at, 1, part is not null);
    }

    /// <summary>Notes them.</summary>
    public void Report()
    {
        foreach (var (part, (pin, at, count, partKnown)) in byPart)
        {
            var others = count > 1 ? $" and {count - 1} more of its pins" : "";
            var effect = count > 1 ? "they neither drive nor load" : "it neither drives nor loads";
            problems.Note(
                at,
                partKnown
                    ? $"the parts file does not state the pin '{pin}'{others}; {effect}"
                    : $"the part '{part}' is not in the parts file, nor '{pin}'{others}; {effect}");
        }
    }
}
