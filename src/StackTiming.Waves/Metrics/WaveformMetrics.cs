using StackTiming.Waves.Networks;
using StackTiming.Waves.Responses;

namespace StackTiming.Waves.Metrics;

/// <summary>Takes the metrics from a waveform.</summary>
public static class WaveformMetrics
{
    private const double RingbackShare = 0.001;
    private const double SettlingShare = 0.05;
    private const double PauseShare = 0.01;

    /// <summary>The metrics of one receiver.</summary>
    /// <param name="voltage">Its voltage.</param>
    /// <param name="stepSeconds">Time between samples.</param>
    /// <param name="durationSeconds">Length of the window.</param>
    /// <param name="thresholds">Its levels, or null.</param>
    /// <param name="stimulus">What the driver sent.</param>
    /// <param name="referenceMidSeconds">When the driver into the reference load alone crosses the threshold, or null.</param>
    public static ReceiverMetrics Of(
        NodeVoltage voltage, double stepSeconds, double durationSeconds, Thresholds? thresholds, Stimulus stimulus, double? referenceMidSeconds)
    {
        double max = voltage.InitialVolts, min = voltage.InitialVolts;
        foreach (var v in voltage.Volts)
        {
            max = Math.Max(max, v);
            min = Math.Min(min, v);
        }
        var levels = new ReceiverMetrics { MaxVolts = max, MinVolts = min, FinalVolts = voltage.FinalVolts, InitialVolts = voltage.InitialVolts };
        if (thresholds is not { } t || stimulus.Edge == Edge.Pattern)
            return levels;
        // A falling edge is judged as a rising one of the negative voltage.
        var sign = stimulus.EndsHigh ? 1 : -1;
        var trace = new Trace(voltage.Volts, sign, stepSeconds, durationSeconds, sign * voltage.FinalVolts);
        var judged = sign > 0 ? t.VihVolts : -t.VilVolts;
        var swing = Math.Abs(voltage.FinalVolts - voltage.InitialVolts);
        var firstMid = FirstCrossing(voltage, stepSeconds, t.MidVolts, stimulus.EndsHigh);
        var firstVih = trace.FirstRise(judged);
        var pause = trace.FirstPause(0.5 * stimulus.ShortestRampSeconds, PauseShare * swing);
        return levels with
        {
            FirstMidSeconds = firstMid,
            FirstVihSeconds = firstVih,
            FinalVihSeconds = trace.LastRise(judged),
            OvershootVolts = Math.Max(0, sign > 0 ? max - voltage.FinalVolts : voltage.FinalVolts - min),
            RingbackVolts = sign * trace.Ringback(firstVih, RingbackShare * swing),
            SettleSeconds = trace.LastOutside(SettlingShare * swing),
            FlightTimeSeconds = firstMid - referenceMidSeconds,
            FirstIncident = firstVih is { } crossing && crossing <= trace.SecondsOf(pause),
            FirstWaveVolts = trace.VoltsInPause(pause, 0.5 * stimulus.ShortestRampSeconds),
        };
    }

    /// <summary>First crossing of a level in the direction of the edge, seconds, or null.</summary>
    /// <param name="voltage">The voltage.</param>
    /// <param name="stepSeconds">Time between samples.</param>
    /// <param name="levelVolts">The level.</param>
    /// <param name="rising">True for upward.</param>
    public static double? FirstCrossing(NodeVoltage voltage, double stepSeconds, double levelVolts, bool rising)
    {
        var sign = rising ? 1 : -1;
        return new Trace(voltage.Volts, sign, stepSeconds, double.PositiveInfinity, sign * voltage.FinalVolts).FirstRise(sign * levelVolts);
    }

    /// <summary>A waveform with its sign such that the edge rises.</summary>
    private readonly ref struct Trace(double[] volts, int sign, double step, double duration, double final)
    {
        private double At(int i) => sign * volts[i];

        public double? FirstRise(double level)
        {
            for (var i = 1; i < volts.Length; i++)
            {
                if (At(i - 1) < level && At(i) >= level)
                    return Crossing(i, level);
            }
            return null;
        }

        public double? LastRise(double level)
        {
            for (var i = volts.Length - 1; i > 0; i--)
            {
                if (At(i - 1) < level && At(i) >= level)
                    return Crossing(i, level);
            }
            return null;
        }

        public double Ringback(double? afterSeconds, double depth)
        {
            if (afterSeconds is not { } after)
                return final;
            var highest = double.NegativeInfinity;
            var lowest = double.PositiveInfinity;
            for (var i = (int)Math.Ceiling(after / step); i < volts.Length; i++)
            {
                var v = At(i);
                highest = Math.Max(highest, v);
                if (highest - v > depth)
                    lowest = Math.Min(lowest, v);
            }
            return double.IsPositiveInfinity(lowest) ? final : lowest;
        }

        public double LastOutside(double band)
        {
            for (var i = volts.Length - 1; i >= 0; i--)
            {
                var off = Math.Abs(At(i) - final);
                if (off <= band)
                    continue;
                if (i == volts.Length - 1)
                    return Math.Min(duration, i * step);
                // The next sample may lie on the other side of the final value.
                var next = Math.Sign(At(i) - final) * (At(i + 1) - final);
                return step * (i + ((off - band) / (off - next)));
            }
            return 0;
        }

        /// <summary>The first sample from which the voltage rises by less than a share in a span, once it has begun to rise; the last where there is none.</summary>
        public int FirstPause(double spanSeconds, double rise)
        {
            var span = Math.Max(1, (int)(spanSeconds / step));
            var start = 0;
            while (start < volts.Length - 1 && At(start) - At(0) < rise)
                start++;
            for (var i = start; i + span < volts.Length; i++)
            {
                if (At(i + span) - At(i) < rise)
                    return i;
            }
            return volts.Length - 1;
        }

        public double SecondsOf(int i) => i * step;

        /// <summary>The voltage at the end of a pause: at its beginning the wave may still be a little short of what it brings.</summary>
        public double VoltsInPause(int i, double spanSeconds) => sign * At(Math.Min(volts.Length - 1, i + Math.Max(1, (int)(spanSeconds / step))));

        private double Crossing(int i, double level) => step * (i - 1 + ((level - At(i - 1)) / (At(i) - At(i - 1))));
    }
}
