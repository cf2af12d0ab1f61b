using System.Collections.Immutable;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Nets.Parts;

/// <summary>A linear receiver: a capacitance, terminations inside the part, and the levels that it judges by.</summary>
/// <param name="Capacitance">Input capacitance, F; 0 where not stated.</param>
/// <param name="Vil">Highest voltage that counts as low, V, or null where not stated.</param>
/// <param name="Vih">Lowest voltage that counts as high, V, or null where not stated.</param>
/// <param name="Threshold">The voltage at which timing is measured, V, or null where not stated.</param>
/// <param name="Terminations">Resistors inside the part; usually none or one.</param>
/// <param name="Package">The package, or null.</param>
public sealed record ReceiverModel(
    Quantity Capacitance,
    Quantity? Vil,
    Quantity? Vih,
    Quantity? Threshold,
    ImmutableArray<Termination> Terminations,
    PackageModel? Package)
{
    /// <summary>The voltage at which timing is measured: as stated, or half-way between the levels, V; null where neither is known.</summary>
    public double? TimingThresholdVolts => Threshold?.Value ?? (Vil is { } low && Vih is { } high ? 0.5 * (low.Value + high.Value) : null);
}
