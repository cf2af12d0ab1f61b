using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.Tests.Judging;
using Xunit;
using static StackTiming.Rules.Tests.Judging.TinyBoard;

namespace StackTiming.Rules.Tests.Kinds;

public class StepRuleTests
{
    private static StepRule Rule(double max, double ignoreMillimetres = 0) =>
        new(Judge.Header("step"), Judge.Nets("A"), max, ignoreMillimetres * 1e-3, Drivers.OnlyDriver);

    [Fact]
    public void A_step_reflects_the_difference_over_the_sum()
    {
        // 50 ohm to 25 ohm: −25/75.
        var board = new TinyBoard().Net("A", Trace("L1", 20), Via(), Trace("L3", 5, 0.2));
        var finding = Judge.Run(Rule(0.1), board)[0];
        Assert.Equal(1 / 3.0, finding.Value!.Value, 9);
        Assert.Equal((FixKind.SetWidth, "L3"), (finding.Fix!.Kind, finding.Fix.Layer));
        board.Net("A", Trace("L1", 20), Via(), Trace("L3", 5, finding.Fix.Value * 1e3));
        Assert.Equal(0, Judge.Run(Rule(0.1), board)[0].Value!.Value, 9);
    }

    [Fact]
    public void Short_necks_are_passed_over()
    {
        var board = new TinyBoard().Net("A", Trace("L1", 20), Trace("L1", 0.5, 0.2), Trace("L1", 20));
        Assert.Equal(0, Judge.Run(Rule(0.1, 1), board)[0].Value!.Value, 9);
    }

    [Fact]
    public void Of_several_steps_the_largest_counts()
    {
        var board = new TinyBoard().Net("A", Trace("L1", 20), Trace("L1", 5, 0.125), Trace("L1", 20, 0.25));
        Assert.Equal(20 / 60.0, Judge.Run(Rule(0.1), board)[0].Value!.Value, 9);
    }
}
