using StackTiming.Rules.Judging;

namespace StackTiming.Rules.Tests.Judging;

/// <summary>Responses of a 0 to 1 V edge with vil 0.3 V and vih 0.7 V.</summary>
internal static class Responses
{
    public static ReceiverResponse Clean { get; } = new(
        VilVolts: 0.3, VihVolts: 0.7, FirstMidSeconds: 100e-12, FirstLevelSeconds: 120e-12, FinalLevelSeconds: 120e-12, RingbackVolts: 1,
        OvershootVolts: 0, InitialVolts: 0, FinalVolts: 1, SettledSeconds: 200e-12, FlightSeconds: 90e-12, FirstWaveVolts: 1, WindowSeconds: 5e-9);

    public static ReceiverResponse CleanFall { get; } = Clean with { InitialVolts = 1, FinalVolts = 0, RingbackVolts = 0, FirstWaveVolts = 0 };

    public static ReceiverResponse Flight(double seconds) => Clean with { FlightSeconds = seconds };
}
