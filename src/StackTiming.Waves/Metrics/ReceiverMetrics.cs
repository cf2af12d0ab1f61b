namespace StackTiming.Waves.Metrics;

/// <summary>
/// What is judged of a receiver's voltage. Times count from the start of the first ramp; the window ends at the net's duration. For a falling edge the
/// values are mirror images: vil takes the place of vih, overshoot lies below the final level. Values that do not exist are null: a threshold that is never
/// crossed, or anything but the levels for patterns and for receivers without thresholds.
/// </summary>
public sealed record ReceiverMetrics
{
    /// <summary>Highest voltage in the window.</summary>
    public required double MaxVolts { get; init; }

    /// <summary>Lowest voltage in the window.</summary>
    public required double MinVolts { get; init; }

    /// <summary>Direct-current level of the last source level.</summary>
    public required double FinalVolts { get; init; }

    /// <summary>Direct-current level before the first ramp.</summary>
    public required double InitialVolts { get; init; }

    /// <summary>First upward crossing of the threshold, seconds.</summary>
    public double? FirstMidSeconds { get; init; }

    /// <summary>First upward crossing of vih, seconds.</summary>
    public double? FirstVihSeconds { get; init; }

    /// <summary>Last upward crossing of vih, seconds.</summary>
    public double? FinalVihSeconds { get; init; }

    /// <summary>How far the voltage exceeds its final level, volts, not below 0.</summary>
    public double? OvershootVolts { get; init; }

    /// <summary>Lowest voltage, after the first crossing of vih, that lies more than 0.1 % of the swing below an earlier maximum; else the final level.</summary>
    public double? RingbackVolts { get; init; }

    /// <summary>Last instant at which the voltage is more than 5 % of the receiver's swing away from its final level, seconds.</summary>
    public double? SettleSeconds { get; init; }

    /// <summary>First crossing of the threshold, less that of the driver into the reference load alone, seconds.</summary>
    public double? FlightTimeSeconds { get; init; }

    /// <summary>
    /// True where the first wave alone carries the voltage to vih: on the way there from its first movement it never pauses (rises by less than 1 % of the
    /// swing in half a ramp), as it would while waiting for a reflection.
    /// </summary>
    public bool? FirstIncident { get; init; }

    /// <summary>The voltage that the first wave brings: where the first rise from its first movement comes to its first pause, V.</summary>
    public double? FirstWaveVolts { get; init; }
}
