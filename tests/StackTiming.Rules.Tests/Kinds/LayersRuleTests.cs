using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.Tests.Judging;
using Xunit;
using static StackTiming.Rules.Tests.Judging.TinyBoard;

namespace StackTiming.Rules.Tests.Kinds;

/// <summary>The tiny board has signals on L1, L3 and L5, planes on L2 and L4.</summary>
public class LayersRuleTests
{
    private static LayersRule Rule(PlaneNeed planes, double outsideMillimetres, params string[] allowed) =>
        new(Judge.Header("layers"), Judge.Nets("A"), [.. allowed], planes, outsideMillimetres * 1e-3);

    private static TinyBoard Board { get; } = new TinyBoard().Net("A", Trace("L1", 3), Via(), Trace("L3", 20));

    [Theory]
    [InlineData(PlaneNeed.None, 0, "L3", FindingStatus.Fail)]
    [InlineData(PlaneNeed.None, 3, "L3", FindingStatus.Pass)]
    [InlineData(PlaneNeed.None, 2.9, "L3", FindingStatus.Fail)]
    [InlineData(PlaneNeed.None, 0, "L1 L3", FindingStatus.Pass)]
    [InlineData(PlaneNeed.Both, 0, "", FindingStatus.Fail)]
    [InlineData(PlaneNeed.Both, 3, "", FindingStatus.Pass)]
    [InlineData(PlaneNeed.Either, 0, "", FindingStatus.Pass)]
    public void Layers_and_planes_decide(PlaneNeed planes, double outside, string allowed, FindingStatus status)
    {
        var rule = Rule(planes, outside, allowed.Split(' ', StringSplitOptions.RemoveEmptyEntries));
        Assert.Equal(status, Judge.Run(rule, Board)[0].Status);
    }

    [Fact]
    public void What_is_wrong_is_measured_and_named()
    {
        var finding = Judge.Run(Rule(PlaneNeed.Both, 1), Board)[0];
        Assert.Equal(3, finding.Value!.Value, 9);
        Assert.Contains("3.000 mm on L1, which has no plane above", finding.Explanation, StringComparison.Ordinal);
        Assert.Contains("move 2.000 mm of A to L3", finding.Fix!.Text, StringComparison.Ordinal);
    }

    [Fact]
    public void A_net_that_keeps_to_its_layers_is_not_ranked_as_being_at_the_limit() =>
        Assert.Equal(1, Judge.Run(Rule(PlaneNeed.None, 0, "L1", "L3"), Board)[0].RelativeMargin);
}
