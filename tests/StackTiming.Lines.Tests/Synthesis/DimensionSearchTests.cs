using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Lines.Synthesis;
using StackTiming.Lines.Tests.Sections;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Lines.Tests.Synthesis;

public sealed class DimensionSearchTests
{
    private static readonly FilePosition Here = FilePosition.WholeFile("test");
    private static readonly DimensionSearch Search = new(ExampleStackUps.Read(ExampleStackUps.SixLayers), ClosedForms.Calculator);
    private static readonly MakeableRange Range = new(75e-6, 1e-3);

    [Theory]
    [InlineData("L1", 50)]
    [InlineData("L3", 60)]
    public void Width_found_has_the_target_impedance(string layer, double target)
    {
        var found = Search.Width(new SectionRequest(Here, layer, 1), target, Range);

        Assert.Null(found.Obstacle);
        Assert.Equal(target, Z(new SectionRequest(Here, layer, found.Metres!.Value)).Z0Ohms, 4);
        Assert.Equal(target, found.ReachedOhms, 4);
    }

    [Fact]
    public void Width_and_gap_of_a_pair_find_each_other()
    {
        var pair = new SectionRequest(Here, "L3", 1) { PairGapMetres = 150e-6 };
        var width = Search.Width(pair, 100, Range).Metres!.Value;
        var gap = Search.Gap(pair with { WidthMetres = width }, 100, Range).Metres!.Value;

        Assert.Equal(150e-6, gap, 1e-8);
        Assert.Equal(100, PairModes.Of(Z(pair with { WidthMetres = width })).ZDiffOhms, 3);
    }

    [Theory]
    [InlineData(200, "even the smallest width, 0.075 mm, gives")]
    [InlineData(3, "even the largest width, 1 mm, gives")]
    public void Impedance_out_of_reach_names_the_limit_that_binds(double target, string obstacle)
    {
        var found = Search.Width(new SectionRequest(Here, "L1", 1), target, Range);

        Assert.Null(found.Metres);
        Assert.StartsWith(obstacle, found.Obstacle, StringComparison.Ordinal);
        Assert.True(found.ReachedOhms > 0);
    }

    [Fact]
    public void Range_that_reaches_below_the_undercut_is_cut_where_a_trace_can_be_made()
    {
        var found = Search.Width(new SectionRequest(Here, "L1", 1), 50, new MakeableRange(1e-6, 1e-3));

        Assert.Null(found.Obstacle);
        Assert.Equal(50, found.ReachedOhms, 4);
    }

    [Fact]
    public void Wrong_questions_get_their_reason()
    {
        Assert.Contains("above zero", Search.Width(new SectionRequest(Here, "L1", 1), -5, Range).Obstacle, StringComparison.Ordinal);
        Assert.Contains("rise", Search.Width(new SectionRequest(Here, "L1", 1), 50, new MakeableRange(1e-3, 1e-4)).Obstacle, StringComparison.Ordinal);
        Assert.Contains("no copper layer", Search.Width(new SectionRequest(Here, "L8", 1), 50, Range).Obstacle, StringComparison.Ordinal);
    }

    private static LineSolution Z(SectionRequest request) =>
        ClosedForms.Calculate(SectionBuilder.Build(ExampleStackUps.Read(ExampleStackUps.SixLayers), request, new ProblemList())!)!;
}
