using StackTiming.Lines.Sections;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Lines.Tests.Sections;

public sealed class SectionBuilderTests
{
    private const double Micrometre = 1e-6;
    private static readonly StackUp SixLayers = ExampleStackUps.Read(ExampleStackUps.SixLayers);
    private static readonly FilePosition Here = new("board.lengths.csv", 7, 1);

    [Fact]
    public void Outer_trace_stands_on_the_prepreg_under_conformal_mask()
    {
        var section = Build(new SectionRequest(Here, "L1", 130 * Micrometre));

        var slab = Assert.Single(section.Slabs);
        Assert.Equal(("prepreg", 3.7), (slab.Dielectric.Name, slab.Dielectric.Dk));
        AssertMicrometres((0, 75), (slab.BottomMetres, slab.TopMetres));
        var trace = Assert.Single(section.Conductors);
        AssertMicrometres((75, 120), (trace.BottomMetres, trace.TopMetres));
        AssertMicrometres((130, 100), (trace.WideMetres, trace.NarrowMetres));
        Assert.True(trace.WideFaceDown);
        Assert.Equal((0.0, null), (section.BottomPlaneMetres, section.TopPlaneMetres));
        AssertMicrometres((25, 15), (section.TopMask!.OverLaminateMetres, section.TopMask.OverCopperMetres));
        Assert.Null(section.BottomMask);
        Assert.Equal(new SectionMetal(1.72e-8, 1e-6), section.Metal);
    }

    [Fact]
    public void Trace_on_the_lower_face_is_turned_upside_down()
    {
        var top = Build(new SectionRequest(Here, "L1", 130 * Micrometre));
        var bottom = Build(new SectionRequest(Here, "L6", 130 * Micrometre));

        Assert.Equal(0.0, bottom.BottomPlaneMetres);
        Assert.Null(bottom.TopPlaneMetres);
        Assert.NotNull(bottom.TopMask);
        Assert.Null(bottom.BottomMask);
        Assert.True(bottom.Conductors[0].WideFaceDown);
        Assert.Equal(top.Conductors[0].BottomMetres, bottom.Conductors[0].BottomMetres, 15);
        Assert.Equal(top.Slabs[0].ThicknessMetres, bottom.Slabs[0].ThicknessMetres, 15);
    }

    [Fact]
    public void Inner_trace_is_embedded_in_the_dielectric_on_its_narrow_face()
    {
        var section = Build(new SectionRequest(Here, "L3", 100 * Micrometre));

        // From L5 up: core 100, the empty L4 filled by the prepreg above it, prepreg 400, L3 filled by the prepreg below it, core 100.
        Assert.Equal(["core", "prepreg", "core"], section.Slabs.Select(s => s.Dielectric.Name));
        AssertMicrometres((100, 530), (section.Slabs[1].BottomMetres, section.Slabs[1].TopMetres));
        Assert.Equal(630, section.TopPlaneMetres!.Value / Micrometre, 6);
        AssertMicrometres((515, 530), (section.Conductors[0].BottomMetres, section.Conductors[0].TopMetres));
        Assert.False(section.Conductors[0].WideFaceDown);
        Assert.Null(section.TopMask);
    }

    [Fact]
    public void Pair_with_pours_lies_symmetrically()
    {
        var section = Build(new SectionRequest(Here, "L1", 120 * Micrometre) { PairGapMetres = 150 * Micrometre, PourGapMetres = 200 * Micrometre });

        Assert.Equal([false, false, true, true], section.Conductors.Select(c => c.Grounded));
        AssertMicrometres((-135, 135), (section.Conductors[0].CentreMetres, section.Conductors[1].CentreMetres));
        var right = section.Conductors[3];
        Assert.Equal(395, (right.CentreMetres - 0.5 * right.WideMetres) / Micrometre, 6);
        Assert.Equal(-section.Conductors[2].CentreMetres, right.CentreMetres, 15);
    }

    [Fact]
    public void Broadside_pair_lies_on_two_layers()
    {
        var section = Build(new SectionRequest(Here, "L3", 120 * Micrometre) { BroadsideLayer = "L4" });

        AssertMicrometres((515, 100), (section.Conductors[0].BottomMetres, section.Conductors[1].BottomMetres));
    }

    [Fact]
    public void Permittivity_and_loss_are_those_of_the_frequency()
    {
        var section = Build(new SectionRequest(Here, "L1", 130 * Micrometre) { FrequencyHertz = 10e9 });
        var stated = Build(new SectionRequest(Here, "L1", 130 * Micrometre) { FrequencyHertz = 1e9 });

        Assert.Equal(3.7, stated.Slabs[0].Dielectric.Dk);
        Assert.InRange(section.Slabs[0].Dielectric.Dk, 3.55, 3.65);
        Assert.InRange(section.Slabs[0].Dielectric.Df, 0.017, 0.020);
    }

    [Fact]
    public void Stack_up_without_planes_leaves_the_section_open_with_both_masks()
    {
        var open = ExampleStackUps.Read(ExampleStackUps.SixLayers.Replace("use: plane", "use: signal", StringComparison.Ordinal));
        var section = Build(open, new SectionRequest(Here, "L3", 100 * Micrometre));

        Assert.Null(section.BottomPlaneMetres);
        Assert.Null(section.TopPlaneMetres);
        Assert.NotNull(section.TopMask);
        Assert.NotNull(section.BottomMask);
        Assert.Equal(0, section.Slabs[0].BottomMetres);
    }

    [Theory]
    [InlineData("L9", 100, null, null, "no copper layer 'L9'")]
    [InlineData("L2", 100, null, null, "L2 is a plane")]
    [InlineData("L1", 0, null, null, "above zero")]
    [InlineData("L1", 25, null, null, "etching eats the narrow face of 'a': it is 25 µm wide and L1 is undercut by 15 µm")]
    [InlineData("L1", 100, 0.0, null, "gap of a pair")]
    [InlineData("L1", 100, 80.0, "L3", "not both")]
    [InlineData("L1", 100, null, "L3", "plane L2 lies between")]
    public void Impossible_lines_are_located_problems(string layer, double width, double? gap, string? broadside, string message)
    {
        var problems = new ProblemList();
        var request = new SectionRequest(Here, layer, width * Micrometre) { PairGapMetres = gap * Micrometre, BroadsideLayer = broadside };

        Assert.Null(SectionBuilder.Build(SixLayers, request, problems));
        Assert.Contains(problems.Items, p => p.At == Here && p.Message.Contains(message, StringComparison.Ordinal));
    }

    private static CrossSection Build(SectionRequest request) => Build(SixLayers, request);

    private static CrossSection Build(StackUp stackUp, SectionRequest request)
    {
        var problems = new ProblemList();
        var section = SectionBuilder.Build(stackUp, request, problems);
        Assert.Empty(problems.Items);
        return section!;
    }

    private static void AssertMicrometres((double First, double Second) expected, (double First, double Second) metres)
    {
        Assert.Equal(expected.First, metres.First / Micrometre, 6);
        Assert.Equal(expected.Second, metres.Second / Micrometre, 6);
    }
}
