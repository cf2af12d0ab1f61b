using StackTiming.Lines.Solutions;

namespace StackTiming.Rules.Judging;

/// <summary>What a trace of the board does per metre: its solution, and its differential mode where it runs in a pair.</summary>
/// <param name="Solution">The solution of its cross-section.</param>
/// <param name="Pair">Its modes where the section is a pair; otherwise null.</param>
public sealed record LineFacts(LineSolution Solution, PairModes? Pair)
{
    /// <summary>Impedance of the trace alone, or of one trace of a pair with the other held quiet, ohm.</summary>
    public double Z0Ohms => Solution.Z0Ohms;

    /// <summary>Impedance that an edge meets: that of the trace, or of the odd mode in a pair, ohm.</summary>
    public double WaveOhms => Pair is { } pair ? 0.5 * pair.ZDiffOhms : Solution.Z0Ohms;

    /// <summary>Delay of an edge: that of the trace, or of the differential mode in a pair, s/m.</summary>
    public double DelaySecondsPerMetre => Pair?.DiffDelaySecondsPerMetre ?? Solution.DelaySecondsPerMetre;

    /// <summary>Effective permittivity of an edge.</summary>
    public double EpsEff => Pair?.EpsEffDiff ?? Solution.EpsEff;
}
