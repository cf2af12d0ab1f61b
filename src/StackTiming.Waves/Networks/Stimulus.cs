using System.Collections.Immutable;

namespace StackTiming.Waves.Networks;

/// <summary>What a driver sends.</summary>
public enum Edge
{
    /// <summary>One rising edge.</summary>
    Rise,
    /// <summary>One falling edge.</summary>
    Fall,
    /// <summary>A row of bits.</summary>
    Pattern,
}

/// <summary>The edge or the bits that a driver sends; ramps are linear from 0 to 100 % of the open-circuit step and begin at t = 0.</summary>
/// <param name="Edge">Which.</param>
/// <param name="RiseSeconds">Length of a rising ramp, in seconds; above 0.</param>
/// <param name="FallSeconds">Length of a falling ramp, in seconds; above 0.</param>
/// <param name="Bits">The bits of a pattern, true for high; empty for a single edge.</param>
/// <param name="BitSeconds">Length of a bit in seconds; 0 for a single edge.</param>
public sealed record Stimulus(Edge Edge, double RiseSeconds, double FallSeconds, ImmutableArray<bool> Bits, double BitSeconds)
{
    /// <summary>One rising edge.</summary>
    /// <param name="riseSeconds">Length of the ramp in seconds.</param>
    public static Stimulus Rising(double riseSeconds) => new(Edge.Rise, riseSeconds, riseSeconds, [], 0);

    /// <summary>One falling edge.</summary>
    /// <param name="fallSeconds">Length of the ramp in seconds.</param>
    public static Stimulus Falling(double fallSeconds) => new(Edge.Fall, fallSeconds, fallSeconds, [], 0);

    /// <summary>True where the source ends on its high level.</summary>
    public bool EndsHigh => Edge switch { Edge.Rise => true, Edge.Fall => false, _ => Bits[^1] };

    /// <summary>The shortest ramp that the stimulus contains, in seconds.</summary>
    public double ShortestRampSeconds => Edge switch
    {
        Edge.Rise => RiseSeconds,
        Edge.Fall => FallSeconds,
        _ => Math.Min(RiseSeconds, FallSeconds),
    };

    /// <summary>The open-circuit voltage over time of a source with these levels.</summary>
    /// <param name="lowVolts">Low level in volts.</param>
    /// <param name="highVolts">High level in volts.</param>
    public SourceWaveform Source(double lowVolts, double highVolts)
    {
        switch (Edge)
        {
            case Edge.Rise:
                return new SourceWaveform([0, RiseSeconds], [lowVolts, highVolts]);
            case Edge.Fall:
                return new SourceWaveform([0, FallSeconds], [highVolts, lowVolts]);
            default:
                var times = new List<double> { 0 };
                var volts = new List<double> { Bits[0] ? highVolts : lowVolts };
                for (var i = 1; i < Bits.Length; i++)
                {
                    if (Bits[i] == Bits[i - 1])
                        continue;
                    times.Add(i * BitSeconds);
                    volts.Add(volts[^1]);
                    times.Add((i * BitSeconds) + (Bits[i] ? RiseSeconds : FallSeconds));
                    volts.Add(Bits[i] ? highVolts : lowVolts);
                }
                return new SourceWaveform([.. times], [.. volts]);
        }
    }
}
