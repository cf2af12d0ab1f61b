using CsCheck;
using StackTiming.Lines.Sections;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Lines.Tests.Sections;

public sealed class SectionFileReaderTests
{
    [Fact]
    public void Conductors_are_placed_by_centre_or_by_edges()
    {
        var (file, problems) = Read("""
              - { name: a, layer: L1, x: 0 mm, width: 0.10 mm }
              - { name: b, layer: L1, x: 0.25 mm, width: 0.10 mm }
              - { name: pour, layer: L1, from: 0.5 mm, to: 3.5 mm, grounded: true }
            """);

        Assert.Empty(problems.Items);
        var section = file!.At(null, problems)!;
        Assert.Equal(["a", "b"], section.Signals.Select(s => s.Name));
        Assert.Equal(2e-3, section.Conductors[2].CentreMetres, 12);
        Assert.Equal(3e-3, section.Conductors[2].WideMetres, 12);
    }

    [Fact]
    public void Plane_with_edges_is_a_conductor_and_the_next_plane_bounds_the_section()
    {
        var (file, problems) = Read("""
              - { name: a, layer: L1, x: 0 mm, width: 0.1 mm }
              - { name: slotted, layer: L2, from: -5 mm, to: -0.2 mm }
            """);

        var section = file!.At(null, problems)!;
        Assert.True(section.Conductors[1].Grounded);
        // L5 is now the plane below: 100 + 15 + 400 + 15 + 100 up to L2.
        Assert.Equal(630e-6, section.Conductors[1].BottomMetres, 12);
        Assert.Equal(0.0, section.BottomPlaneMetres);
    }

    [Fact]
    public void Copper_without_thickness_is_a_thin_strip()
    {
        var (file, problems) = Read("  - { name: a, layer: L1, x: 0 mm, width: 0.1 mm }\n", ExampleStackUps.SixLayers.Replace("thickness: 45", "thickness: 0", StringComparison.Ordinal));

        var trace = file!.At(null, problems)!.Conductors[0];
        Assert.Equal((0, trace.WideMetres), (trace.ThicknessMetres, trace.NarrowMetres));
    }

    [Theory]
    [InlineData("  - { name: a, layer: L1, x: 0 mm, width: 0 mm }", "must be above zero")]
    [InlineData("  - { name: a, layer: L1, x: 0 mm }", "'width' is missing")]
    [InlineData("  - { name: a, layer: L1 }", "does not say where it lies")]
    [InlineData("  - { name: a, layer: L1, x: 0 mm, from: 1 mm, to: 2 mm }", "both a centre with a width and its edges")]
    [InlineData("  - { name: a, layer: L1, from: 2 mm, to: 1 mm }", "'from' must lie to the left")]
    [InlineData("  - { name: a, layer: L7, x: 0 mm, width: 0.1 mm }", "no copper layer 'L7'")]
    [InlineData("  - { name: a, layer: L1, x: 0 mm, width: 0.1 mm, grounded: yes }", "'grounded' cannot be 'yes'")]
    [InlineData("  - { name: a, layer: L1, x: 0 mm, width: 0.1 mm, grounded: true }", "every conductor of this section is grounded")]
    [InlineData("  - { name: a, layer: L1, x: 0 mm, width: 0.1 mm, widht: 1 }", "unknown key 'widht'")]
    [InlineData("  - { name: a, layer: L1, x: 0 mm, width: 0.1 mm }\n  - { name: b, layer: L1, x: 0.05 mm, width: 0.1 mm }", "overlap by 50 µm")]
    [InlineData("  - { name: a, layer: L1, from: 0 mm, to: 1 mm }\n  - { name: b, layer: L1, from: 1 mm, to: 2 mm }", "touch")]
    [InlineData("  - { name: a, layer: L1, x: 0 mm, width: 0.1 mm }\n  - { name: a, layer: L1, x: 1 mm, width: 0.1 mm }", "two conductors are called 'a'")]
    [InlineData("  - { name: a, layer: L1, x: 0 mm, width: 0.1 mm }\n  - { name: b, layer: L3, x: 1 mm, width: 0.1 mm }", "plane L2 lies between")]
    [InlineData("  []", "the section has no conductors")]
    public void Mistakes_are_located(string conductors, string message)
    {
        var (file, problems) = Read(conductors);

        Assert.Null(file);
        var problem = Assert.Single(problems.Items, p => p.Message.Contains(message, StringComparison.Ordinal));
        Assert.True(problem.At.Line > 1);
    }

    [Fact]
    public void Missing_stack_up_file_is_reported_where_it_is_named()
    {
        var problems = new ProblemList();
        var text = "stackup: nowhere/none.stackup.yaml\nconductors: [ { name: a, layer: L1, x: 0 mm, width: 0.1 mm } ]\n";

        Assert.Null(SectionFileReader.Read(new InputFile("case.section.yaml", text, ""), problems));
        Assert.Contains(problems.Items, p => p.At.Line == 1 && p.Message.Contains("does not exist", StringComparison.Ordinal));
    }

    [Fact]
    public void Arbitrary_text_gives_problems_and_never_an_exception() =>
        Gen.String.Sample(
            text =>
            {
                var problems = new ProblemList();
                var file = SectionFileReader.Read(new InputFile("case.section.yaml", "conductors: " + text, ""), problems);
                return file is null && problems.HasErrors;
            },
            iter: 300, threads: 1);

    private static (SectionFile?, ProblemList) Read(string conductors, string stackUp = ExampleStackUps.SixLayers)
    {
        var indented = string.Concat(stackUp.Split('\n').Where(l => l != "format: 1").Select(l => "  " + l + "\n"));
        var problems = new ProblemList();
        var text = "format: 1\nstackup:\n" + indented + "conductors:\n" + conductors + "\n";
        return (SectionFileReader.Read(new InputFile("case.section.yaml", text, ""), problems), problems);
    }
}
