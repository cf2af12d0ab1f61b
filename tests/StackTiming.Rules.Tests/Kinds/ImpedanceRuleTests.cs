using StackTiming.Rules.Findings;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.RuleFiles;
using StackTiming.Rules.Tests.Judging;
using StackTiming.Stackups.Quantities;
using Xunit;
using static StackTiming.Rules.Tests.Judging.TinyBoard;

namespace StackTiming.Rules.Tests.Kinds;

public class ImpedanceRuleTests
{
    private static ImpedanceRule Single(double ohms, double percent, double ignoreMillimetres = 0) => new(
        Judge.Header("impedance"), Judge.Nets("A"), null, new Quantity(ohms, Tolerance.Symmetric(ohms * percent / 100)), ignoreMillimetres * 1e-3);

    private static ImpedanceRule Differential(double ohms, double percent) => new(
        Judge.Header("impedance"), null, [new PairRef("usb", "P", "N")], new Quantity(ohms, Tolerance.Symmetric(ohms * percent / 100)), 0);

    [Fact]
    public void The_worst_section_of_a_net_decides()
    {
        // 0.1 mm is 50 ohm, 0.08 mm is 62.5 ohm.
        var board = new TinyBoard().Net("A", Trace("L1", 10), Trace("L3", 5, 0.08));
        var finding = Assert.Single(Judge.Run(Single(50, 10), board));
        Assert.Equal(62.5, finding.Value!.Value, 9);
        Assert.Equal(-7.5, finding.Margin!.Value, 9);
        Assert.Equal(-1.5, finding.RelativeMargin!.Value, 9);
        Assert.Equal((45.0, 55.0), (finding.LowerLimit!.Value, finding.UpperLimit!.Value));
        Assert.Contains("on L3, 0.080 mm wide for 5.000 mm", finding.Explanation, StringComparison.Ordinal);
    }

    [Fact]
    public void The_fix_is_the_width_that_has_the_target()
    {
        var board = new TinyBoard().Net("A", Trace("L1", 10, 0.2));
        var rule = Single(40, 10);
        var fix = Judge.Run(rule, board)[0].Fix!;
        Assert.Equal(FixKind.SetWidth, fix.Kind);
        Assert.Equal(0.125, fix.Value * 1e3, 9);
        board.Net("A", Trace("L1", 10, fix.Value * 1e3));
        Assert.Equal(40, Judge.Run(rule, board)[0].Value!.Value, 9);
    }

    [Fact]
    public void A_pair_is_judged_by_its_differential_impedance_where_it_runs_as_a_pair()
    {
        // 0.1 mm: 1.8 · 50 = 90 ohm. The single breakout of 0.2 mm width is not part of the pair.
        var board = new TinyBoard().Net("P", Trace("L1", 2, 0.2), Trace("L1", 20, 0.1, 0.15)).Net("N", Trace("L1", 22, 0.1, 0.15));
        var finding = Assert.Single(Judge.Run(Differential(90, 10), board));
        Assert.Equal(90, finding.Value!.Value, 9);
        Assert.Equal(FindingStatus.Pass, finding.Status);
        Assert.Equal("usb", finding.Subject);
    }

    [Fact]
    public void The_fix_of_a_pair_keeps_its_gap()
    {
        var board = new TinyBoard().Net("P", Trace("L1", 20, 0.15, 0.15)).Net("N", Trace("L1", 20, 0.15, 0.15));
        var fix = Judge.Run(Differential(90, 10), board)[0].Fix!;
        Assert.Equal(0.1, fix.Value * 1e3, 9);
        Assert.Contains("at the same gap of 0.150 mm", fix.Text, StringComparison.Ordinal);
    }

    [Fact]
    public void A_target_that_no_width_has_says_so()
    {
        var board = new TinyBoard().Net("A", Trace("L1", 10));
        Assert.Contains("no width on L1", Judge.Run(Single(250, 10), board)[0].Fix!.Text, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(1, "L1", FindingStatus.Pass)]
    [InlineData(3, "L1", FindingStatus.Fail)]
    [InlineData(1, "L4", FindingStatus.Pass)]
    [InlineData(3, "L4", FindingStatus.Unchecked)]
    public void Short_traces_are_passed_over_and_what_has_no_answer_is_unchecked(double length, string layer, FindingStatus status)
    {
        var board = new TinyBoard().Net("A", Trace("L1", 10), Trace(layer, length, 0.2));
        Assert.Equal(status, Judge.Run(Single(50, 10, 2), board)[0].Status);
    }

    [Fact]
    public void A_failure_counts_even_where_another_section_has_no_answer()
    {
        var board = new TinyBoard().Net("A", Trace("L1", 10, 0.2), Trace("L4", 10));
        Assert.Equal(FindingStatus.Fail, Judge.Run(Single(50, 10), board)[0].Status);
    }

    [Fact]
    public void A_net_without_traces_is_unchecked() =>
        Assert.Equal("it has no trace", Judge.Run(Single(50, 10), new TinyBoard().Net("A", Via()))[0].UncheckedReason);
}
