using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.Tests.Judging;
using Xunit;
using static StackTiming.Rules.Tests.Judging.TinyBoard;

namespace StackTiming.Rules.Tests.Kinds;

public class FlightTimeRuleTests
{
    private static FlightTimeRule Rule(Window window, DelayQuery query) => new(Judge.Header("flight-time"), Judge.Nets("A"), window, query);

    [Fact]
    public void Lines_and_vias_add_up()
    {
        // 10 mm · 6 + 10 (via) + 20 mm · 7 = 210 ps.
        var board = new TinyBoard().Net("A", Trace("L1", 10), Via(), Trace("L3", 20));
        var finding = Assert.Single(Judge.Run(Rule(Window.AtMost(200e-12), Judge.TimeOfFlight), board));
        Assert.Equal(210, finding.Value!.Value, 9);
        Assert.Equal(-10, finding.Margin!.Value, 9);
        Assert.Equal("A", finding.Fix!.Net);
        Assert.Equal(10 / 7.0, finding.Fix.Value * 1e3, 9);
    }

    [Theory]
    [InlineData(10, 250, 400, FixKind.AddLength)]
    [InlineData(60, 250, 400, FixKind.RemoveLength)]
    public void The_fix_mends_the_net(double length, double min, double max, FixKind kind)
    {
        var rule = Rule(new Window(min * 1e-12, max * 1e-12), Judge.TimeOfFlight);
        var board = new TinyBoard().Net("A", Trace("L3", length));
        var fix = Judge.Run(rule, board)[0].Fix!;
        Assert.Equal(kind, fix.Kind);
        board.Net("A", Trace("L3", length + (kind == FixKind.AddLength ? 1 : -1) * fix.Value * 1e3));
        Assert.Equal(FindingStatus.Pass, Judge.Run(rule, board)[0].Status);
    }

    [Fact]
    public void What_a_shorter_trace_cannot_save_is_said_so()
    {
        var board = new TinyBoard().Net("A", Via(), Trace("L1", 1));
        var fix = Judge.Run(Rule(Window.AtMost(5e-12), Judge.TimeOfFlight), board)[0].Fix!;
        Assert.Equal(FixKind.Other, fix.Kind);
        Assert.Contains("more than it has", fix.Text, StringComparison.Ordinal);
    }

    [Fact]
    public void Flight_time_that_was_asked_for_but_cannot_be_had_is_unchecked()
    {
        var board = new TinyBoard().Net("A", Trace("L1", 10));
        var finding = Judge.Run(Rule(Window.AtMost(1e-9), Judge.TimeOfFlight with { Basis = DelayBasis.FlightTime }), board)[0];
        Assert.Equal(FindingStatus.Unchecked, finding.Status);
        Assert.Equal("the driver has no model", finding.UncheckedReason);
    }
}
