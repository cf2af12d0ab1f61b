using StackTiming.Nets.Parts;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.Tests.Judging;
using StackTiming.Stackups.Quantities;
using Xunit;
using static StackTiming.Rules.Tests.Judging.TinyBoard;

namespace StackTiming.Rules.Tests.Kinds;

/// <summary>Ringback, overshoot, settling and first wave, of a 0 to 1 V edge with vil 0.3 V and vih 0.7 V.</summary>
public class WaveRuleTests
{
    private static readonly EdgeQuery Both = Judge.Edges(Edge.Rise, Edge.Fall);

    private static TinyBoard Board(ReceiverResponse rise, ReceiverResponse fall) =>
        new TinyBoard { Driver = Driver(20) }.Net("A", Trace("L1", 50)).Response("A", Edge.Rise, rise).Response("A", Edge.Fall, fall);

    private static DriverModel Driver(double ohms) => new(
        Quantity.Exact(0), Quantity.Exact(1), Quantity.Exact(ohms), Quantity.Exact(1e-10), Quantity.Exact(1e-10), Quantity.Exact(0), null);

    private static RingbackRule Ringback { get; } = new(Judge.Header("ringback"), Judge.Nets("A"), 0.05, Both);

    [Fact]
    public void Ringback_is_the_distance_to_the_threshold_of_the_worse_edge()
    {
        // Rising: back to 0.8 V is 100 mV above vih. Falling: back to 0.28 V is 20 mV below vil.
        var board = Board(Responses.Clean with { RingbackVolts = 0.8 }, Responses.CleanFall with { RingbackVolts = 0.28 });
        var finding = Assert.Single(Judge.Run(Ringback, board));
        Assert.Equal(20, finding.Value!.Value, 6);
        Assert.Equal(-30, finding.Margin!.Value, 6);
        Assert.Contains("vil on the falling edge", finding.Explanation, StringComparison.Ordinal);
    }

    [Fact]
    public void A_receiver_that_never_switches_fails_ringback()
    {
        var board = Board(Responses.Clean with { FirstLevelSeconds = null, FinalVolts = 0.6, RingbackVolts = null }, Responses.CleanFall);
        var finding = Judge.Run(Ringback, board)[0];
        Assert.Equal(FindingStatus.Fail, finding.Status);
        Assert.Contains("never reaches vih", finding.Explanation, StringComparison.Ordinal);
    }

    [Fact]
    public void The_fix_of_ringing_is_what_the_source_lacks_to_the_line()
    {
        var board = Board(Responses.Clean with { RingbackVolts = 0.6 }, Responses.CleanFall);
        var fix = Judge.Run(Ringback, board)[0].Fix!;
        Assert.Equal((FixKind.SeriesResistor, 30.0), (fix.Kind, Math.Round(fix.Value, 6)));
        board.SeriesOhms = 15;
        fix = Judge.Run(Ringback, board)[0].Fix!;
        Assert.Equal((FixKind.SeriesResistor, 30.0), (fix.Kind, Math.Round(fix.Value, 6)));
        Assert.Contains("raise the series resistor from 15.0 ohm to 30.0 ohm", fix.Text, StringComparison.Ordinal);
        board.SeriesOhms = 30;
        Assert.Equal(FixKind.EndResistor, Judge.Run(Ringback, board)[0].Fix!.Kind);
    }

    [Fact]
    public void A_receiver_without_thresholds_is_unchecked()
    {
        var finding = Judge.Run(Ringback, Board(Responses.Clean with { VihVolts = null }, Responses.CleanFall))[0];
        Assert.Equal("the receiver at U2.1 states no vih", finding.UncheckedReason);
    }

    [Fact]
    public void A_net_without_a_response_is_unchecked() =>
        Assert.Equal("the driver has no model", Judge.Run(Ringback, new TinyBoard().Net("A", Trace("L1", 50)))[0].UncheckedReason);

    [Fact]
    public void Overshoot_and_undershoot_have_their_own_limits()
    {
        var board = Board(Responses.Clean with { OvershootVolts = 0.25 }, Responses.CleanFall with { OvershootVolts = 0.22 });
        var rule = new OvershootRule(Judge.Header("overshoot"), Judge.Nets("A"), 0.3, null, 0.2, null, Both);
        var finding = Judge.Run(rule, board)[0];
        Assert.Equal(220, finding.Value!.Value, 6);
        Assert.Equal(200, finding.UpperLimit!.Value, 6);
        Assert.Contains("below its final level", finding.Explanation, StringComparison.Ordinal);
    }

    [Fact]
    public void An_overshoot_limit_may_be_a_share_of_the_swing()
    {
        var board = Board(Responses.Clean with { OvershootVolts = 0.25, FinalVolts = 2 }, Responses.CleanFall with { InitialVolts = 2 });
        var rule = new OvershootRule(Judge.Header("overshoot"), Judge.Nets("A"), null, 0.1, null, 0.1, Both);
        Assert.Equal((250.0, 200.0), (Math.Round(Judge.Run(rule, board)[0].Value!.Value, 6), Math.Round(Judge.Run(rule, board)[0].UpperLimit!.Value, 6)));
    }

    [Fact]
    public void Settling_counts_the_slower_edge()
    {
        var board = Board(Responses.Clean with { SettledSeconds = 1.2e-9 }, Responses.CleanFall with { SettledSeconds = 1.4e-9 });
        var finding = Judge.Run(new SettlingRule(Judge.Header("settling"), Judge.Nets("A"), 1.3e-9, Both), board)[0];
        Assert.Equal((1400.0, -100.0), (Math.Round(finding.Value!.Value, 6), Math.Round(finding.Margin!.Value, 6)));
    }

    [Fact]
    public void The_first_wave_must_carry_across_the_threshold()
    {
        // 0.6 V of the first wave are 100 mV short of 0.7 V. The wave's share is Z0/(Z0 + Rs): 50/(50 + 40) must grow by 0.7/0.6, which
        // 50/(50 + 27.14) does.
        var board = Board(Responses.Clean with { FirstWaveVolts = 0.6 }, Responses.CleanFall);
        board.Driver = Driver(40);
        var finding = Judge.Run(new FirstWaveRule(Judge.Header("first-wave"), Judge.Nets("A"), 0, Both), board)[0];
        Assert.Equal(-100, finding.Value!.Value, 6);
        Assert.Equal(0.6 / 0.7 * 90 - 50, finding.Fix!.Value, 6);
    }

    [Fact]
    public void The_waveform_of_a_finding_is_noted_for_its_figure()
    {
        var judgement = Judge.Full(Ringback, Board(Responses.Clean with { RingbackVolts = 0.6 }, Responses.CleanFall));
        var wave = Assert.Single(judgement.Waves);
        Assert.Equal(("A", "U2.1", Edge.Rise), (wave.Net, wave.Receiver, wave.Edge));
    }
}
