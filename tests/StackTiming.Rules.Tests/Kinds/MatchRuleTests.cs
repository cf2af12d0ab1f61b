using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.Tests.Judging;
using Xunit;
using static StackTiming.Rules.Tests.Judging.TinyBoard;

namespace StackTiming.Rules.Tests.Kinds;

public class MatchRuleTests
{
    private static MatchRule Rule(double withinPs, params string[] nets) =>
        new(Judge.Header("match"), Judge.Nets(nets), withinPs * 1e-12, Judge.TimeOfFlight);

    [Fact]
    public void A_group_inside_the_window_passes_with_the_rest_of_the_window_as_margin()
    {
        // 60, 63 and 66 ps: the ends differ by 6 ps, the middle one by 3 ps.
        var board = new TinyBoard().Net("D0", Trace("L1", 10)).Net("D1", Trace("L1", 10.5)).Net("D2", Trace("L1", 11));
        var findings = Judge.Run(Rule(10, "D0", "D1", "D2"), board);
        Assert.All(findings, f => Assert.Equal(FindingStatus.Pass, f.Status));
        Assert.Equal([4.0, 7.0, 4.0], findings.Select(f => Math.Round(f.Margin!.Value, 9)));
    }

    [Fact]
    public void Equal_lengths_on_different_layers_are_not_matched()
    {
        // The same 50 mm take 300 ps on L1 and 350 ps on L3.
        var board = new TinyBoard().Net("D0", Trace("L1", 50)).Net("D1", Trace("L1", 50)).Net("D2", Trace("L3", 50));
        var findings = Judge.Run(Rule(10, "D0", "D1", "D2"), board);
        var failed = Assert.Single(findings, f => f.Status == FindingStatus.Fail);
        Assert.Equal("D2", failed.Subject);
        Assert.Equal(50, failed.Value!.Value, 9);
        Assert.Equal(-40, failed.Margin!.Value, 9);
        Assert.Contains("too late", failed.Explanation, StringComparison.Ordinal);
    }

    [Fact]
    public void One_net_that_is_off_does_not_fail_the_others()
    {
        var board = new TinyBoard();
        for (var i = 0; i < 7; i++)
            board.Net($"D{i}", Trace("L1", 40 + 0.1 * i));
        board.Net("D7", Trace("L1", 20));
        var findings = Judge.Run(Rule(10, [.. Enumerable.Range(0, 8).Select(i => $"D{i}")]), board);
        Assert.Equal("D7", Assert.Single(findings, f => f.Status == FindingStatus.Fail).Subject);
    }

    [Theory]
    [InlineData(20)]
    [InlineData(60)]
    public void The_fix_mends_the_net(double wrongLength)
    {
        var board = new TinyBoard().Net("D0", Trace("L1", 40)).Net("D1", Trace("L1", 41)).Net("D2", Trace("L1", 2), Trace("L3", wrongLength));
        var rule = Rule(10, "D0", "D1", "D2");
        var fix = Assert.Single(Judge.Run(rule, board), f => f.Status == FindingStatus.Fail).Fix!;
        Assert.Equal("L3", fix.Layer);
        var mended = wrongLength + (fix.Kind == FixKind.AddLength ? 1 : -1) * fix.Value * 1e3;
        board.Net("D2", Trace("L1", 2), Trace("L3", mended));
        Assert.All(Judge.Run(rule, board), f => Assert.Equal(FindingStatus.Pass, f.Status));
        // 40 and 41 mm on L1 are 240 and 246 ps; their middle is 243 ps, of which 2 mm on L1 take 12.
        Assert.Equal((243 - 12) / 7.0, mended, 6);
    }

    [Fact]
    public void A_value_at_the_limit_passes()
    {
        var board = new TinyBoard().Net("D0", Trace("L1", 10)).Net("D1", Trace("L1", 10 + 10 / 6.0));
        Assert.All(Judge.Run(Rule(10, "D0", "D1"), board), f => Assert.Equal(FindingStatus.Pass, f.Status));
    }

    [Fact]
    public void A_net_without_a_driver_is_unchecked_and_the_others_are_judged()
    {
        var board = new TinyBoard().Net("D0", Trace("L1", 10)).Net("D1", Trace("L1", 10));
        var findings = Judge.Run(Rule(10, "D0", "D1", "D9"), board);
        Assert.Equal(2, findings.Count(f => f.Status == FindingStatus.Pass));
        var open = Assert.Single(findings, f => f.Status == FindingStatus.Unchecked);
        Assert.Equal(("D9", "it has no driver"), (open.Subject, open.UncheckedReason));
    }

    [Fact]
    public void Flight_times_count_where_every_receiver_has_one()
    {
        var board = new TinyBoard().Net("D0", Trace("L1", 10)).Net("D1", Trace("L1", 10))
            .Response("D0", Edge.Rise, Responses.Flight(100e-12)).Response("D1", Edge.Rise, Responses.Flight(130e-12));
        var rule = new MatchRule(Judge.Header("match"), Judge.Nets("D0", "D1"), 50e-12, Judge.Automatic);
        var findings = Judge.Run(rule, board);
        Assert.All(findings, f => Assert.Equal(30, f.Value!.Value, 9));
        Assert.All(findings, f => Assert.StartsWith("flight time", f.Method, StringComparison.Ordinal));
    }

    [Fact]
    public void One_receiver_without_a_flight_time_turns_the_comparison_to_time_of_flight()
    {
        var board = new TinyBoard().Net("D0", Trace("L1", 10)).Net("D1", Trace("L1", 10)).Response("D0", Edge.Rise, Responses.Flight(100e-12));
        var rule = new MatchRule(Judge.Header("match"), Judge.Nets("D0", "D1"), 50e-12, Judge.Automatic);
        var findings = Judge.Run(rule, board);
        Assert.All(findings, f => Assert.Equal(0, f.Value!.Value, 9));
        Assert.All(findings, f => Assert.StartsWith("time of flight", f.Method, StringComparison.Ordinal));
    }

    [Fact]
    public void The_chart_of_the_group_holds_every_delay_and_the_window()
    {
        var board = new TinyBoard().Net("D0", Trace("L1", 10)).Net("D1", Trace("L1", 11));
        var table = Assert.Single(Judge.Full(Rule(10, "D0", "D1"), board).Groups);
        Assert.Equal([60.0, 66.0], table.Delays.Select(d => Math.Round(d.DelaySeconds * 1e12, 9)));
        Assert.Equal(58, table.LowestSeconds!.Value * 1e12, 9);
        Assert.Equal(68, table.HighestSeconds!.Value * 1e12, 9);
    }

    [Fact]
    public void Findings_do_not_depend_on_the_order_in_which_nets_are_named()
    {
        var board = new TinyBoard().Net("D0", Trace("L1", 10)).Net("D1", Trace("L1", 12)).Net("D2", Trace("L1", 14)).Net("D3", Trace("L1", 16));
        var forward = Judge.Run(Rule(15, "D0", "D1", "D2", "D3"), board);
        var backward = Judge.Run(Rule(15, "D3", "D2", "D1", "D0"), board);
        Assert.Equal(forward.Select(f => (f.Subject, f.Status, f.Value)), backward.Select(f => (f.Subject, f.Status, f.Value)));
    }
}
