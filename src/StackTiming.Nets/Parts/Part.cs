using System.Collections.Frozen;
using System.Collections.Immutable;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Parts;

/// <summary>A part on the board.</summary>
/// <param name="Name">Reference designator, such as <c>U1</c>.</param>
/// <param name="At">Where the file states it.</param>
/// <param name="Pins">The pins that the file states, by name.</param>
/// <param name="Joins">Pairs of pins that pass the signal on; empty for a part that is not in series.</param>
public sealed record Part(
    string Name, FilePosition At, FrozenDictionary<string, PartPin> Pins, ImmutableArray<SeriesJoin> Joins);
