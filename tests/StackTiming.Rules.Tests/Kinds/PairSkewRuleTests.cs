using StackTiming.Rules.Findings;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.RuleFiles;
using StackTiming.Rules.Tests.Judging;
using Xunit;
using static StackTiming.Rules.Tests.Judging.TinyBoard;

namespace StackTiming.Rules.Tests.Kinds;

public class PairSkewRuleTests
{
    private static PairSkewRule Rule(double? max, double? along, double? uncoupled) => new(
        Judge.Header("pair-skew"), [new PairRef("usb", "P", "N")], max * 1e-12, along * 1e-12, uncoupled * 1e-3, Judge.TimeOfFlight);

    [Fact]
    public void The_skew_at_the_receiver_is_the_difference_of_the_delays()
    {
        var board = new TinyBoard().Net("P", Trace("L1", 20, gapMillimetres: 0.1)).Net("N", Trace("L1", 1), Trace("L1", 20, gapMillimetres: 0.1));
        var finding = Assert.Single(Judge.Run(Rule(5, null, null), board));
        Assert.Equal(6, finding.Value!.Value, 9);
        Assert.Equal("P", finding.Fix!.Net);
        Assert.Equal(1, finding.Fix.Value * 1e3, 9);
        Assert.Equal(["P", "N"], finding.Nets);
    }

    [Fact]
    public void Skew_that_is_taken_up_at_the_far_end_only_shows_along_the_pair()
    {
        // N starts 2 mm (12 ps) late, P makes the same detour after the common run: nothing at the end, 12 ps all along.
        var board = new TinyBoard()
            .Net("P", Trace("L1", 20, gapMillimetres: 0.1), Trace("L1", 2))
            .Net("N", Trace("L1", 2), Trace("L1", 20, gapMillimetres: 0.1));
        var findings = Judge.Run(Rule(5, 5, null), board);
        Assert.Equal([0.0, 12.0], findings.Select(f => Math.Round(f.Value!.Value, 9)));
        Assert.Equal([FindingStatus.Pass, FindingStatus.Fail], findings.Select(f => f.Status));
    }

    [Fact]
    public void A_detour_in_the_middle_shows_from_there_on()
    {
        // Both run 10 mm together, N makes a detour of 3 mm (18 ps), both run another 10 mm, P catches up.
        var board = new TinyBoard()
            .Net("P", Trace("L1", 20, gapMillimetres: 0.1), Trace("L1", 3))
            .Net("N", Trace("L1", 10, gapMillimetres: 0.1), Trace("L1", 3), Trace("L1", 10, gapMillimetres: 0.1));
        var finding = Judge.Run(Rule(null, 5, null), board)[0];
        Assert.Equal(18, finding.Value!.Value, 9);
        Assert.Contains("after 10.000 mm of their common run of 20.000 mm", finding.Explanation, StringComparison.Ordinal);
    }

    [Fact]
    public void The_length_apart_is_that_of_the_member_that_runs_alone_longer()
    {
        var board = new TinyBoard()
            .Net("P", Trace("L1", 20, gapMillimetres: 0.1), Trace("L1", 3))
            .Net("N", Trace("L1", 1), Trace("L1", 20, gapMillimetres: 0.1), Trace("L1", 4));
        var finding = Judge.Run(Rule(null, null, 4), board)[0];
        Assert.Equal(5, finding.Value!.Value, 9);
        Assert.Equal(FindingStatus.Fail, finding.Status);
    }

    [Fact]
    public void A_pair_without_gaps_cannot_be_followed()
    {
        var board = new TinyBoard().Net("P", Trace("L1", 20)).Net("N", Trace("L1", 20));
        Assert.Contains("no row of the length list gives it a gap", Judge.Run(Rule(null, 5, null), board)[0].UncheckedReason, StringComparison.Ordinal);
    }

    [Fact]
    public void Members_may_be_swapped_without_changing_the_figures()
    {
        var board = new TinyBoard()
            .Net("P", Trace("L1", 20, gapMillimetres: 0.1), Trace("L1", 3))
            .Net("N", Trace("L1", 1), Trace("L1", 20, gapMillimetres: 0.1), Trace("L1", 4));
        var rule = Rule(5, 5, 4);
        var swapped = rule with { Pairs = [new PairRef("usb", "N", "P")] };
        Assert.Equal(Judge.Run(rule, board).Select(f => f.Value), Judge.Run(swapped, board).Select(f => f.Value));
    }
}
