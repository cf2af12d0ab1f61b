using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.RuleFiles;
using StackTiming.Rules.Tests.Judging;
using Xunit;
using static StackTiming.Rules.Tests.Judging.TinyBoard;

namespace StackTiming.Rules.Tests.Kinds;

public class SetupHoldRuleTests
{
    private static SourceSynchronousBudget Source { get; } = new(new ReferenceNets("DQS", ["DQS"]), 180e-12, 170e-12, 60e-12, 50e-12, 20e-12);

    private static CommonClockBudget Common { get; } = new(10e-9, 1e-9, 4e-9, "CK_A", "CK_B", 2e-9, 0.5e-9, 0.1e-9, 0.2e-9);

    private static SetupHoldRule Rule(TransferBudget budget, double marginPs = 0) =>
        new(Judge.Header("setup-hold"), Judge.Nets("D"), budget, marginPs * 1e-12, Judge.TimeOfFlight);

    [Fact]
    public void Source_synchronous_margins_follow_from_the_difference_to_the_strobe()
    {
        // Data 72 ps, strobe 60 ps: setup 180 − 12 − 60 − 20 = 88 ps, hold 170 + 12 − 50 − 20 = 112 ps.
        var board = new TinyBoard().Net("D", Trace("L1", 12)).Net("DQS", Trace("L1", 10));
        var findings = Judge.Run(Rule(Source), board);
        Assert.Equal(["D, setup", "D, hold"], findings.Select(f => f.Subject));
        Assert.Equal([88.0, 112.0], findings.Select(f => Math.Round(f.Value!.Value, 6)));
    }

    [Fact]
    public void Common_clock_margins_count_period_clocks_and_uncertainties()
    {
        // Clocks of 100 and 160 ps: capture − launch = 60 ps. Data 300 ps.
        // Setup 10000 + 60 − 4000 − 300 − 2000 − 100 − 200 = 3460 ps; hold 1000 + 300 − 60 − 500 − 100 = 640 ps.
        var board = new TinyBoard().Net("D", Trace("L1", 50))
            .Net("CK_A", Trace("L1", 100 / 6.0)).To("CK_A", "U1").Net("CK_B", Trace("L1", 160 / 6.0)).To("CK_B", "U2");
        var findings = Judge.Run(Rule(Common), board);
        Assert.Equal([3460.0, 640.0], findings.Select(f => Math.Round(f.Value!.Value, 6)));
    }

    [Fact]
    public void Both_edges_count_with_their_flight_times()
    {
        // Rising 100 ps, falling 130 ps; strobe 110 ps on both. Setup against the later, hold against the earlier.
        var board = new TinyBoard().Net("D", Trace("L1", 12)).Net("DQS", Trace("L1", 10))
            .Response("D", Edge.Rise, Responses.Flight(100e-12)).Response("D", Edge.Fall, Responses.Flight(130e-12))
            .Response("DQS", Edge.Rise, Responses.Flight(110e-12)).Response("DQS", Edge.Fall, Responses.Flight(110e-12));
        var findings = Judge.Run(Rule(Source) with { Query = Judge.Automatic }, board);
        Assert.Equal([80.0, 90.0], findings.Select(f => Math.Round(f.Value!.Value, 6)));
    }

    [Theory]
    [InlineData(40, 0)]
    [InlineData(1, 1)]
    public void The_fix_mends_the_side_that_fails(double length, int side)
    {
        var rule = Rule(Source, 60);
        var board = new TinyBoard().Net("D", Trace("L1", length)).Net("DQS", Trace("L1", 16));
        var failed = Judge.Run(rule, board)[side];
        Assert.Equal(FindingStatus.Fail, failed.Status);
        var change = failed.Fix!.Value * 1e3 * (failed.Fix.Kind == FixKind.AddLength ? 1 : -1);
        board.Net("D", Trace("L1", length + change));
        Assert.Equal(60, Judge.Run(rule, board)[side].Value!.Value, 6);
    }

    [Fact]
    public void A_clock_that_does_not_reach_the_part_leaves_the_transfer_unchecked()
    {
        var board = new TinyBoard().Net("D", Trace("L1", 50)).Net("CK_A", Trace("L1", 10)).To("CK_A", "U1").Net("CK_B", Trace("L1", 10)).To("CK_B", "U7");
        Assert.Equal("CK_B: it does not reach U2", Judge.Run(Rule(Common), board)[0].UncheckedReason);
    }
}
