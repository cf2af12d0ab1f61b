using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.Tests.Judging;
using Xunit;
using static StackTiming.Rules.Tests.Judging.TinyBoard;

namespace StackTiming.Rules.Tests.Kinds;

public class LossRuleTests
{
    private static LossRule Rule(double gigahertz, double max) =>
        new(Judge.Header("loss"), Judge.Nets("A"), gigahertz * 1e9, max, Drivers.OnlyDriver);

    [Fact]
    public void The_traces_of_the_way_add_up()
    {
        // 30 mm at 0.02 dB/mm (2 GHz) are 0.6 dB; 0.1 dB too much are 5 mm.
        var board = new TinyBoard().Net("A", Trace("L1", 10), Via(), Trace("L3", 20));
        var finding = Judge.Run(Rule(2, 0.5), board)[0];
        Assert.Equal(0.6, finding.Value!.Value, 9);
        Assert.Equal(("L3", 5.0), (finding.Fix!.Layer, Math.Round(finding.Fix.Value * 1e3, 9)));
        board.Net("A", Trace("L1", 10), Via(), Trace("L3", 20 - finding.Fix.Value * 1e3));
        Assert.Equal(FindingStatus.Pass, Judge.Run(Rule(2, 0.5), board)[0].Status);
    }

    [Fact]
    public void Where_no_length_is_left_to_save_another_way_is_named() =>
        Assert.Equal(FixKind.Other, Judge.Run(Rule(2, 0.01), new TinyBoard().Net("A", Trace("L1", 1), Trace("L3", 1.2)))[0].Fix!.Kind);
}
