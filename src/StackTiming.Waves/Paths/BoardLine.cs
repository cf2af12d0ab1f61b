using StackTiming.Lines.Loss;
using StackTiming.Lines.Solutions;

namespace StackTiming.Waves.Paths;

/// <summary>What the traces of one layer, width and gap do per metre. A trace with a gap carries half of a differential signal.</summary>
/// <param name="Key">Layer, width and gap.</param>
/// <param name="Solution">Solution of the cross-section.</param>
/// <param name="Pair">Its modes where the section is a pair; otherwise null.</param>
/// <param name="AtFrequency">The line with its losses at the frequency of the table; null where the table has none.</param>
public sealed record BoardLine(LineKey Key, LineSolution Solution, PairModes? Pair, LineAtFrequency? AtFrequency)
{
    /// <summary>Impedance that an edge meets, ohm: that of the trace, or half the differential impedance in a pair.</summary>
    public double WaveOhms { get; } = Pair is { } pair ? 0.5 * pair.ZDiffOhms : Solution.Z0Ohms;

    /// <summary>
    /// Delay, s/m: that of the trace, or of the differential signal in a pair. At a frequency it is the phase delay, to which the field inside
    /// the copper adds up to about a percent; otherwise that of the lossless line.
    /// </summary>
    public double DelaySecondsPerMetre { get; } = AtFrequency?.Modes[0].DelaySecondsPerMetre ?? Pair?.DiffDelaySecondsPerMetre ?? Solution.DelaySecondsPerMetre;

    /// <summary>The length of this line that makes a delay, metres.</summary>
    /// <param name="seconds">The delay, s.</param>
    public double MetresFor(double seconds) => seconds / DelaySecondsPerMetre;
}
