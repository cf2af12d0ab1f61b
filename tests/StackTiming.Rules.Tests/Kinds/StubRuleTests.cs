using StackTiming.Nets.Parts;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.Tests.Judging;
using StackTiming.Stackups.Quantities;
using Xunit;
using static StackTiming.Rules.Tests.Judging.TinyBoard;

namespace StackTiming.Rules.Tests.Kinds;

public class StubRuleTests
{
    private static StubRule Rule(double? picoseconds, double? share, double? rise = null) => new(
        Judge.Header("stub"), Judge.Nets("A"), picoseconds * 1e-12, share, rise * 1e-12, Drivers.OnlyDriver);

    [Fact]
    public void A_branch_is_judged_by_its_delay()
    {
        // 5 mm at 6 ps/mm are 30 ps; 5 ps too much are 0.833 mm.
        var board = new TinyBoard().Net("A", Trace("L1", 10)).Stub("A", 5);
        var finding = Judge.Run(Rule(25, null), board)[0];
        Assert.Equal(30, finding.Value!.Value, 9);
        Assert.Equal(5 / 6.0, finding.Fix!.Value * 1e3, 9);
        board.Stub("A", 5 - finding.Fix.Value * 1e3);
        Assert.Equal(FindingStatus.Pass, Judge.Run(Rule(25, null), board)[0].Status);
    }

    [Fact]
    public void A_share_counts_against_the_rise_time_of_the_rule()
    {
        var board = new TinyBoard().Net("A", Trace("L1", 10)).Stub("A", 5);
        Assert.Equal(20, Judge.Run(Rule(null, 0.1, 150), board)[0].Value!.Value, 9);
    }

    [Fact]
    public void Without_one_the_shorter_edge_of_the_driver_counts_then_the_boards()
    {
        var board = new TinyBoard { Assumed = new SignalAssumptions(600e-12, null, null) }.Net("A", Trace("L1", 10)).Stub("A", 5);
        Assert.Equal(5, Judge.Run(Rule(null, 0.1), board)[0].Value!.Value, 9);
        board.Driver = new DriverModel(
            Quantity.Exact(0), Quantity.Exact(1), Quantity.Exact(30), Quantity.Exact(300e-12), Quantity.Exact(200e-12), Quantity.Exact(0), null);
        Assert.Equal(15, Judge.Run(Rule(null, 0.1), board)[0].Value!.Value, 9);
    }

    [Fact]
    public void Without_any_rise_time_a_share_cannot_be_judged()
    {
        var board = new TinyBoard().Net("A", Trace("L1", 10)).Stub("A", 5);
        Assert.Contains("rise time is not known", Judge.Run(Rule(null, 0.1), board)[0].UncheckedReason, StringComparison.Ordinal);
    }

    [Fact]
    public void A_net_without_branches_passes() =>
        Assert.Equal(FindingStatus.Pass, Judge.Run(Rule(10, null), new TinyBoard().Net("A", Trace("L1", 10)))[0].Status);
}
