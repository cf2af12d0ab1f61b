using CsCheck;
using StackTiming.Stackups.Copper;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Stackups.Tests.Layers;

public sealed class StackUpReaderTests
{
    private const string Valid = """
        format: 1
        name: Test board
        revision: C
        units: { length: um }
        dielectrics:
          core-a: { dk: 3.95 ±3 %, df: 0.016, at: 1 GHz }
          prepreg-a: { dk: 3.70 ±5 %, df: 0.018, at: 1 GHz, resin: 54 % }
          mask-a: { dk: 3.5, df: 0.025, at: 1 GHz }
        copper: { resistivity: 1.72e-8 ohm m, roughness: 1.2 um, etch-factor: 2.5 }
        layers:
          - { mask: mask-a, over-laminate: 25, over-copper: 15 }
          - { copper: L1, thickness: 45 ±8, use: signal, width-tolerance: 20 }
          - { prepreg: prepreg-a, thickness: 75 ±10 % }
          - { copper: L2, thickness: 15.2, use: plane }
          - { core: core-a, thickness: 100 ±8 % }
          - { copper: L3, thickness: 15.2, use: signal }
          - { prepreg: prepreg-a, thickness: 200 }
          - { copper: L4, thickness: 45, use: mixed, undercut: 10, base: down }
        """;

    private static (StackUp? StackUp, ProblemList Problems) Read(string text)
    {
        var problems = new ProblemList();
        return (StackUpReader.Read(new InputFile("board.stackup.yaml", text, ""), problems), problems);
    }

    [Fact]
    public void Reads_the_layers_from_the_top()
    {
        var (stackUp, problems) = Read(Valid);
        Assert.Empty(problems.Items);
        Assert.NotNull(stackUp);
        Assert.Equal("Test board", stackUp.Name);
        Assert.Equal(["L1", "L2", "L3", "L4"], stackUp.CopperLayers.Select(l => l.Name));
        var l1 = stackUp.FindCopper("L1")!;
        Assert.Equal(45e-6, l1.Thickness.Value, 1e-12);
        Assert.Equal(18e-6, l1.Copper.UndercutMetres.Value, 1e-12); // 45 / 2.5
        Assert.Equal(20e-6, l1.WidthToleranceMetres.Plus, 1e-12);
        Assert.Equal(10e-6, stackUp.FindCopper("L4")!.Copper.UndercutMetres.Value, 1e-12);
        var prepreg = stackUp.Layers.OfType<DielectricLayer>().First();
        Assert.Equal(0.54, prepreg.Material.ResinContent!.Value.Value, 1e-12);
        Assert.Equal(0.185, prepreg.Material.Dk.Tolerance.Plus, 1e-12);
    }

    [Fact]
    public void The_wide_face_lies_on_the_core_or_on_the_dielectric_below_an_outer_foil()
    {
        var (stackUp, _) = Read(Valid.Replace(", base: down", "", StringComparison.Ordinal));
        Assert.Equal(WideFace.Down, stackUp!.FindCopper("L1")!.WideFace);
        Assert.Equal(WideFace.Up, stackUp.FindCopper("L3")!.WideFace); // the core is above it
        Assert.Equal(WideFace.Up, stackUp.FindCopper("L4")!.WideFace);
        Assert.Equal(WideFace.Down, Read(Valid).StackUp!.FindCopper("L4")!.WideFace);
    }

    [Theory]
    [InlineData("use: plane", "use: plain", "did you mean 'plane'?", 14)]
    [InlineData("prepreg-a, thickness: 75", "prepreg-b, thickness: 75", "did you mean 'prepreg-a'?", 13)]
    [InlineData("thickness: 100 ±8 %", "thickness: 0", "above zero", 15)]
    [InlineData("thickness: 100 ±8 %", "thickness: -4", "above zero", 15)]
    [InlineData("thickness: 100 ±8 %", "thickness: NaN", "finite number", 15)]
    [InlineData("thickness: 100 ±8 %", "thickness: inf", "finite number", 15)]
    [InlineData("thickness: 100 ±8 %", "thickness: 100 mm", "20 mm", 15)]
    [InlineData("thickness: 45 ±8", "thickness: 0", "above zero", 12)]
    [InlineData("copper: L3", "copper: L2", "stands twice", 16)]
    [InlineData("dk: 3.5,", "dk: 0.5,", "between 1 and 1000", 8)]
    [InlineData("df: 0.025", "df: 1.5", "between 0 and 1", 8)]
    [InlineData("dk: 3.5,", "dk: 3.5, dk: 3.6,", "stands twice", 8)]
    [InlineData("dk: 3.5,", "Dk: 3.5,", "did you mean 'dk'?", 8)]
    [InlineData("roughness", "rougness", "did you mean 'roughness'?", 9)]
    [InlineData("etch-factor: 2.5", "etch-factor: 2.5, undercut: 3", "same thing twice", 9)]
    [InlineData("revision: C", "revisoin: C", "did you mean 'revision'?", 3)]
    [InlineData("format: 1", "format: 2", "write format: 1", 1)]
    [InlineData("{ length: um }", "{ length: volts }", "not a unit of length", 4)]
    [InlineData("- { core: core-a, thickness: 100 ±8 % }", "- { mask: mask-a, over-laminate: 5, over-copper: 5 }", "first or the last", 15)]
    [InlineData("- { core: core-a, thickness: 100 ±8 % }", "- { core: core-a, prepreg: prepreg-a, thickness: 1 }", "core and prepreg", 15)]
    [InlineData("- { core: core-a, thickness: 100 ±8 % }", "- { thickness: 1 }", "does not say what it is", 15)]
    [InlineData("- { core: core-a, thickness: 100 ±8 % }", "- core-a", "must be a mapping", 15)]
    [InlineData("name: Test board", "name: &a Test board", "anchor", 2)]
    [InlineData("name: Test board", "name: *a", "alias", 2)]
    [InlineData("name: Test board", "name: !!str x", "tags", 2)]
    [InlineData("name: Test board", "name:", "has no value", 2)]
    [InlineData("name: Test board", "name: [a, b", "the [ that opens here is not closed", 2)]
    [InlineData("name: Test board", "name: a: b", "valid YAML", 2)]
    [InlineData("thickness: 100 ±8 %", "thickness: 100 ±100 %", "everywhere inside its tolerance", 15)]
    [InlineData("thickness: 100 ±8 %", "thickness: 100 ±8 ps", "is a time, not a length", 15)]
    [InlineData("thickness: 100 ±8 %", "thickness: 0.1 ±8 mil", "to the tolerance only", 15)]
    [InlineData("thickness: 100 ±8 %", "thickness: [100]", "must be a single value", 15)]
    [InlineData("thickness: 100 ±8 %", "thicknes: 100", "did you mean 'thickness'?", 15)]
    [InlineData("thickness: 100 ±8 %", "thickness: ~", "has no value", 15)]
    [InlineData("dk: 3.5,", "dk: 1.01 ±5 %,", "everywhere inside its tolerance", 8)]
    [InlineData("dk: 3.5,", "DK: 3.5,", "did you mean 'dk'?", 8)]
    [InlineData("dk: 3.5,", "dk: 3.5 F,", "is a capacitance, not a plain number", 8)]
    [InlineData("df: 0.025", "df: -0.01", "between 0 and 1", 8)]
    [InlineData("df: 0.025, at: 1 GHz", "df: 0.025, at: 0 Hz", "above zero", 8)]
    [InlineData("df: 0.025, at: 1 GHz", "df: 0.025, at: 1 ghz", "did you mean 'GHz'?", 8)]
    [InlineData("resin: 54 %", "resin: 54", "has no unit", 7)]
    [InlineData("resin: 54 %", "resin: 154 %", "between 0 % and 100 %", 7)]
    [InlineData("mask-a: {", "air: {", "kept for the space around the board", 8)]
    [InlineData("mask-a: { dk: 3.5, df: 0.025, at: 1 GHz }", "mask-a: 3.5", "must be a mapping", 8)]
    [InlineData("resistivity: 1.72e-8 ohm m", "resistivity: 1.72 ohm m", "between 1e-9 and 1e-3", 9)]
    [InlineData("resistivity: 1.72e-8 ohm m", "resistivity: 1.72e-8 ohm", "is a resistance, not a resistivity", 9)]
    [InlineData("roughness: 1.2 um", "roughness: 1.2 mm", "between zero and 20 um", 9)]
    [InlineData("etch-factor: 2.5", "etch-factor: 0", "between 0.1 and 1000", 9)]
    [InlineData("width-tolerance: 20", "width-tolerance: 20 %", "is a share in percent, not a length", 12)]
    [InlineData("width-tolerance: 20", "width-tolerance: -20", "is negative", 12)]
    [InlineData("copper: L1", "copper: \"\"", "has no name", 12)]
    [InlineData("copper: L1", "copper: \"L\\e1\"", "control character", 12)]
    [InlineData(", use: plane", "", "'use' is missing", 14)]
    [InlineData("over-copper: 15", "over-coper: 15", "'over-copper' is missing", 11)]
    [InlineData("base: down", "base: left", "it can be down, up", 18)]
    [InlineData("name: Test board", "\tname: Test board", "a tab stands in the indent", 2)]
    [InlineData("name: Test board", "name:Test board", "no blank follows the colon", 2)]
    [InlineData("name: Test board", "name: %board", "begins with % in quotes", 2)]
    [InlineData("name: Test board", "name: \"Test board", "a quotation mark opens here", 2)]
    [InlineData("thickness: 100 ±8 % }", "thickness: 100 ±8 %", "the { that opens here is not closed", 15)]
    [InlineData("thickness: 100 ±8 % }", "thickness: 100 ±8 % }}", "the } here closes nothing", 15)]
    [InlineData("  - { core: core-a, thickness: 100 ±8 % }", "  -", "has an item without a value", 15)]
    public void Wrong_input_is_located_and_explained(string right, string wrong, string expected, int line)
    {
        Assert.Contains(right, Valid);
        var (stackUp, problems) = Read(Valid.Replace(right, wrong, StringComparison.Ordinal));
        Assert.Null(stackUp);
        Assert.Contains(problems.Items, p => p.IsError && p.ToString().Contains(expected, StringComparison.Ordinal));
        Assert.Contains(problems.Items, p => p.IsError && p.At.Line == line);
    }

    [Fact]
    public void All_problems_of_a_file_are_reported_in_one_run()
    {
        var (_, problems) = Read(Valid.Replace("use: plane", "use: plain", StringComparison.Ordinal).Replace("dk: 3.5,", "dk: 0.5,", StringComparison.Ordinal)
            .Replace("copper: L3, thickness: 15.2", "copper: L3, thickness: x", StringComparison.Ordinal));
        Assert.Equal(3, problems.ErrorCount);
    }

    [Fact]
    public void A_refused_layer_is_reported_alone_and_not_missed_by_its_neighbours()
    {
        var (_, problems) = Read(Valid.Replace("{ core: core-a, thickness: 100 ±8 % }", "{ core: core-x, thickness: 100 }", StringComparison.Ordinal));
        var problem = Assert.Single(problems.Items);
        Assert.Equal("board.stackup.yaml:15:13: error: the material 'core-x' is not among the dielectrics; did you mean 'core-a'?", problem.ToString());
    }

    [Theory]
    [InlineData("width-tolerance: ±20", 20e-6, 20e-6)]
    [InlineData("width-tolerance: +5/-20", 20e-6, 5e-6)]
    [InlineData("width-tolerance: 1 mil", 25.4e-6, 25.4e-6)]
    public void Width_tolerances_may_carry_signs(string written, double minus, double plus)
    {
        var tolerance = Read(Valid.Replace("width-tolerance: 20", written, StringComparison.Ordinal)).StackUp!.FindCopper("L1")!.WidthToleranceMetres;
        Assert.Equal(minus, tolerance.Minus, 1e-12);
        Assert.Equal(plus, tolerance.Plus, 1e-12);
    }

    [Fact]
    public void Copper_that_the_file_is_silent_about_is_noted_once_for_all_layers()
    {
        var (stackUp, problems) = Read(Valid.Replace("copper: { resistivity: 1.72e-8 ohm m, roughness: 1.2 um, etch-factor: 2.5 }\n", "", StringComparison.Ordinal));
        Assert.Equal(
            ["board.stackup.yaml:1:1: note: no etch-factor or undercut is stated for L1, L3: traces count as rectangles; write copper: { etch-factor: 2.5 }, with your fabricator's figure",
             "board.stackup.yaml:1:1: note: no roughness is stated for L1, L3, L4: copper counts as smooth, and losses come out low; write copper: { roughness: 0.5 um }, with your fabricator's figure"],
            problems.Items.Select(p => p.ToString()));
        Assert.Equal(0, stackUp!.FindCopper("L1")!.Copper.UndercutMetres.Value);
        Assert.Equal(10e-6, stackUp.FindCopper("L4")!.Copper.UndercutMetres.Value, 1e-12);
    }

    [Fact]
    public void Copper_without_thickness_is_for_sections_only()
    {
        var text = Valid.Replace("copper: L3, thickness: 15.2", "copper: L3, thickness: 0", StringComparison.Ordinal);
        Assert.Null(Read(text).StackUp);
        var problems = new ProblemList();
        var map = YamlDocument.ReadMap(new InputFile("s.yaml", text, ""), problems)!;
        Assert.Equal(0, StackUpReader.Read(map, problems, allowThinCopper: true)!.FindCopper("L3")!.Thickness.Value);
    }

    [Fact]
    public void Inner_copper_between_two_sheets_of_a_kind_is_noted_and_can_be_stated()
    {
        var twoCores = Valid.Replace("prepreg: prepreg-a, thickness: 200", "core: core-a, thickness: 200", StringComparison.Ordinal);
        var (stackUp, problems) = Read(twoCores);
        Assert.NotNull(stackUp);
        Assert.Contains("write base: up or base: down", Assert.Single(problems.Items).ToString(), StringComparison.Ordinal);
        var (stated, none) = Read(twoCores.Replace("copper: L3,", "copper: L3, base: down,", StringComparison.Ordinal));
        Assert.Equal(WideFace.Down, stated!.FindCopper("L3")!.WideFace);
        Assert.Empty(none.Items);
    }

    [Fact]
    public void Missing_loss_and_frequency_are_noted_not_invented()
    {
        var (stackUp, problems) = Read(Valid.Replace("dk: 3.5, df: 0.025, at: 1 GHz", "dk: 3.5", StringComparison.Ordinal));
        Assert.NotNull(stackUp);
        Assert.Contains(problems.Items, p => !p.IsError && p.Message.Contains("no df", StringComparison.Ordinal));
    }

    [Fact]
    public void Never_throws_on_any_bytes()
    {
        Gen.Byte.Array[0, 200].Sample(bytes =>
        {
            var problems = new ProblemList();
            if (InputFileLoader.Decode("x.yaml", bytes, problems) is { } file)
                StackUpReader.Read(file, problems);
        }, iter: 3000);
    }

    [Fact]
    public void Never_throws_on_a_changed_file()
    {
        Gen.Select(Gen.Int[0, Valid.Length - 1], Gen.Char["{}[]:,-#&*!|>'\"%@` \n\t0x"], Gen.Int[0, 12]).Array[1, 6].Sample(changes =>
        {
            var text = Valid;
            foreach (var (at, letter, cut) in changes)
            {
                var start = Math.Min(at, text.Length);
                text = text[..start] + letter + text[Math.Min(text.Length, start + cut)..];
            }
            var (stackUp, problems) = Read(text);
            Assert.True(stackUp is not null || problems.HasErrors);
        }, iter: 3000);
    }
}
