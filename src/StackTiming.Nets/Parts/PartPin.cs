using System.Collections.Immutable;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Parts;

/// <summary>A pin of a part.</summary>
/// <param name="Name">Its name on the part, such as <c>A3</c>.</param>
/// <param name="At">Where the file states it.</param>
/// <param name="Model">What it does electrically, or null for a pin that only passes or terminates.</param>
/// <param name="PackageDelaySeconds">Delay between die and pin, s; 0 where not stated.</param>
/// <param name="Terminations">Resistors on the board from the pin to a fixed voltage.</param>
/// <param name="Net">The net that the pin lies on, where the length list does not say so itself; otherwise null.</param>
public sealed record PartPin(
    string Name,
    FilePosition At,
    BufferModel? Model,
    double PackageDelaySeconds,
    ImmutableArray<Termination> Terminations,
    string? Net);
