using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.RuleFiles;
using StackTiming.Rules.Tests.Judging;
using Xunit;
using static StackTiming.Rules.Tests.Judging.TinyBoard;

namespace StackTiming.Rules.Tests.Kinds;

public class OffsetRuleTests
{
    private static OffsetRule Rule(Window window, params string[] strobe) => new(
        Judge.Header("offset"), Judge.Nets("D0", "D1"), new ReferenceNets("DQS", [.. strobe]), window, Judge.TimeOfFlight);

    private static TinyBoard Board(double second) => new TinyBoard()
        .Net("D0", Trace("L1", 10)).Net("D1", Trace("L1", second)).Net("DQS_P", Trace("L1", 10)).Net("DQS_N", Trace("L1", 11));

    [Fact]
    public void The_offset_is_the_net_minus_the_strobe()
    {
        // 12 mm on L1 are 72 ps against 60 ps.
        var findings = Judge.Run(Rule(new Window(-10e-12, 10e-12), "DQS_P"), Board(12));
        Assert.Equal([0.0, 12.0], findings.Select(f => Math.Round(f.Value!.Value, 9)));
        Assert.Equal([FindingStatus.Pass, FindingStatus.Fail], findings.Select(f => f.Status));
        Assert.Equal(-2, findings[1].Margin!.Value, 9);
        Assert.Contains("after DQS", findings[1].Explanation, StringComparison.Ordinal);
    }

    [Fact]
    public void Of_a_strobe_pair_the_mean_counts()
    {
        // The strobe pair takes 60 and 66 ps: 63 ps.
        var findings = Judge.Run(Rule(new Window(-10e-12, 10e-12), "DQS_P", "DQS_N"), Board(10));
        Assert.All(findings, f => Assert.Equal(-3, f.Value!.Value, 9));
    }

    [Theory]
    [InlineData(2)]
    [InlineData(25)]
    public void The_fix_brings_the_net_to_the_middle_of_the_window(double length)
    {
        var rule = Rule(new Window(-4e-12, 16e-12), "DQS_P");
        var fix = Judge.Run(rule, Board(length))[1].Fix!;
        var mended = length + (fix.Kind == FixKind.AddLength ? 1 : -1) * fix.Value * 1e3;
        Assert.Equal(6, Judge.Run(rule, Board(mended))[1].Value!.Value, 6);
    }

    [Fact]
    public void A_one_sided_window_is_met_exactly_by_its_fix()
    {
        var rule = Rule(Window.AtMost(0), "DQS_P");
        var fix = Judge.Run(rule, Board(12))[1].Fix!;
        Assert.Equal(FixKind.RemoveLength, fix.Kind);
        Assert.Equal(FindingStatus.Pass, Judge.Run(rule, Board(12 - fix.Value * 1e3))[1].Status);
    }

    [Fact]
    public void Without_the_strobe_nothing_is_judged()
    {
        var findings = Judge.Run(Rule(new Window(-10e-12, 10e-12), "MISSING"), Board(10));
        Assert.All(findings, f => Assert.Equal(FindingStatus.Unchecked, f.Status));
        Assert.All(findings, f => Assert.Contains("MISSING: it has no driver", f.UncheckedReason, StringComparison.Ordinal));
    }
}
