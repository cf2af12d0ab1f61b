using System.Collections.Immutable;

namespace StackTiming.Waves.Networks;

/// <summary>A voltage made of straight pieces: constant before the first corner and after the last.</summary>
/// <param name="TimesSeconds">Times of the corners, rising, in seconds.</param>
/// <param name="Volts">Voltages at the corners.</param>
public sealed record SourceWaveform(ImmutableArray<double> TimesSeconds, ImmutableArray<double> Volts)
{
    /// <summary>The level before the first ramp, in volts.</summary>
    public double InitialVolts => Volts[0];

    /// <summary>The level after the last ramp, in volts.</summary>
    public double FinalVolts => Volts[^1];

    /// <summary>Time of the last corner, in seconds.</summary>
    public double LastCornerSeconds => TimesSeconds[^1];

    /// <summary>Samples of the voltage at equal steps.</summary>
    /// <param name="startSeconds">Time of the first sample.</param>
    /// <param name="stepSeconds">Step, above 0.</param>
    /// <param name="samples">Where they go.</param>
    public void Sample(double startSeconds, double stepSeconds, Span<double> samples)
    {
        var piece = 0;
        for (var i = 0; i < samples.Length; i++)
        {
            var t = startSeconds + (i * stepSeconds);
            while (piece < TimesSeconds.Length && TimesSeconds[piece] <= t)
                piece++;
            samples[i] = piece == 0 ? Volts[0]
                : piece == TimesSeconds.Length ? Volts[^1]
                : Volts[piece - 1] + ((Volts[piece] - Volts[piece - 1]) * (t - TimesSeconds[piece - 1]) / (TimesSeconds[piece] - TimesSeconds[piece - 1]));
        }
    }
}
