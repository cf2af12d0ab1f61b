namespace StackTiming.Rules.Judging;

/// <summary>What a receiver sees of one edge; instants from the start of the driver's ramp. Null where it has no thresholds or never happens.</summary>
/// <param name="VilVolts">Its lower threshold, V.</param>
/// <param name="VihVolts">Its upper threshold, V.</param>
/// <param name="FirstMidSeconds">First crossing of its timing threshold.</param>
/// <param name="FirstLevelSeconds">First crossing of vih on a rising edge, of vil on a falling one.</param>
/// <param name="FinalLevelSeconds">Last crossing of it.</param>
/// <param name="RingbackVolts">The turning voltage after the first crossing that comes nearest to the threshold again.</param>
/// <param name="OvershootVolts">How far it goes beyond its final voltage, V.</param>
/// <param name="InitialVolts">Voltage before the edge, V.</param>
/// <param name="FinalVolts">Voltage in the end, V.</param>
/// <param name="SettledSeconds">Last instant outside 5 % of the swing around the final voltage.</param>
/// <param name="FlightSeconds">Flight time against the reference load.</param>
/// <param name="FirstWaveVolts">Voltage that the first wave brings, before any reflection comes back, V.</param>
/// <param name="WindowSeconds">Length of the observed window.</param>
public sealed record ReceiverResponse(
    double? VilVolts,
    double? VihVolts,
    double? FirstMidSeconds,
    double? FirstLevelSeconds,
    double? FinalLevelSeconds,
    double? RingbackVolts,
    double OvershootVolts,
    double InitialVolts,
    double FinalVolts,
    double SettledSeconds,
    double? FlightSeconds,
    double? FirstWaveVolts,
    double WindowSeconds)
{
    /// <summary>Size of the edge at the receiver, V.</summary>
    public double SwingVolts => Math.Abs(FinalVolts - InitialVolts);
}
