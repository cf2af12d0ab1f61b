using CsCheck;
using StackTiming.Nets.Sketches;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Nets.Tests.Sketches;

public sealed class NetSketchReaderTests
{
    private const string Valid = """
        format: 1
        driver: { at: U1, low: 0 V, high: 1.8 V, resistance: 25 ohm, rise: 400 ps, package: { inductance: 1 nH, capacitance: 0.8 pF } }
        lines:
          - { from: U1, to: a, z0: 50 ohm, delay: 300 ps }
          - { from: a, to: U3, length: 0.2 m, l: 350 nH/m, c: 140 pF/m, r-dc: 5 ohm/m, r-skin: 1.2e-4 ohm/m/sqrtHz, df: 0.02, at: 1 GHz }
        coupled-lines:
          - { from: [p, q], to: [r, s], z-even: 55 ohm, z-odd: 45 ohm, delay-even: 1.00 ns, delay-odd: 0.95 ns }
        series: [ { from: a, to: p, resistance: 22 ohm } ]
        shunts: [ { at: q, resistance: 50 ohm, to: 0.6 V }, { at: a, capacitance: 0.4 pF } ]
        receivers:
          - { at: U3, capacitance: 2 pF, vil: 0.63 V, vih: 1.17 V, threshold: 0.9 V }
          - { at: r, resistance: 50 ohm }
          - { at: s }
        edge: rise
        reference-load: { resistance: 50 ohm }
        duration: 20 ns
        """;

    private static (NetSketch? Sketch, ProblemList Problems) Read(string text)
    {
        var problems = new ProblemList();
        return (NetSketchReader.Read(new InputFile("clock.net.yaml", text, ""), problems), problems);
    }

    [Fact]
    public void Reads_every_element_in_SI_units()
    {
        var (sketch, problems) = Read(Valid);
        Assert.Empty(problems.Items);
        Assert.NotNull(sketch);
        Assert.Equal((25.0, 400e-12, 400e-12), (sketch.Driver.ResistanceOhms, sketch.Driver.RiseSeconds, sketch.Driver.FallSeconds));
        Assert.Equal((1e-9, 0.8e-12), (sketch.Driver.PackageHenries, sketch.Driver.PackageFarads));
        Assert.Equal(300e-12, Assert.IsType<IdealSketchLine>(sketch.Lines[0]).DelaySeconds, 1e-20);
        var lossy = Assert.IsType<LossySketchLine>(sketch.Lines[1]);
        Assert.Equal(350e-9, lossy.HenryPerMetre, 1e-16);
        Assert.Equal(1.2e-4, lossy.SkinOhmPerMetreRootHertz, 1e-12);
        Assert.Equal(("p", "s", 55.0), (sketch.CoupledLines[0].FromA, sketch.CoupledLines[0].ToB, sketch.CoupledLines[0].ZEvenOhms));
        Assert.Equal(0.6, sketch.Shunts[0].ToVolts);
        Assert.Equal(20e-9, sketch.DurationSeconds!.Value, 1e-18);
    }

    [Fact]
    public void A_pattern_needs_no_edge()
    {
        var (sketch, _) = Read(Valid.Replace("edge: rise", "pattern: \"010\"\nbit: 5 ns", StringComparison.Ordinal));
        Assert.Equal([false, true, false], sketch!.Edge.Bits.ToArray());
        Assert.Equal(5e-9, sketch.Edge.BitSeconds, 1e-18);
    }

    [Theory]
    [InlineData("z0: 50 ohm, ", "", "lacks z0", 4)]
    [InlineData("z0: 50 ohm, ", "z0: 50 ohm, length: 3 mm, ", "mixes descriptions", 4)]
    [InlineData("z0: 50 ohm, ", "z0: -50 ohm, ", "above zero", 4)]
    [InlineData("z0: 50 ohm", "z-0: 50 ohm", "did you mean 'z0'", 4)]
    [InlineData("to: a, z0", "to: U1, z0", "to itself", 4)]
    [InlineData("z0: 50 ohm, delay: 300 ps", "layer: L1, width: 0.1 mm, length: 20 mm", "names no stack-up", 4)]
    [InlineData(", at: 1 GHz", "", "needs its frequency", 5)]
    [InlineData("high: 1.8 V", "high: -1 V", "not below the high level", 2)]
    [InlineData("rise: 400 ps", "rise: 0 ps", "above zero", 2)]
    [InlineData(", rise: 400 ps", "", "'rise' is missing", 2)]
    [InlineData("from: [p, q]", "from: [p, p]", "two different nodes", 7)]
    [InlineData("z-even: 55 ohm", "z-even: 40 ohm", "exchange the two", 7)]
    [InlineData(", resistance: 22 ohm", "", "says nothing of itself", 8)]
    [InlineData("vih: 1.17 V, ", "", "some of its levels", 11)]
    [InlineData("vih: 1.17 V", "vih: 0.7 V", "out of order", 11)]
    [InlineData("at: r, resistance", "at: U3, resistance", "two receivers", 12)]
    [InlineData("edge: rise", "edge: raise", "did you mean 'rise'", 14)]
    [InlineData("edge: rise", "edge: pattern", "no bits", 14)]
    [InlineData("edge: rise", "pattern: \"012\"\nbit: 1 ns", "digits 0 and 1", 14)]
    [InlineData("edge: rise", "pattern: \"010\"", "length of a bit", 14)]
    [InlineData("edge: rise", "edge: rise\nbit: 1 ns", "has no pattern", 15)]
    [InlineData("duration: 20 ns", "duration: 20 nH", "is an inductance", 16)]
    [InlineData("duration: 20 ns", "durration: 20 ns", "did you mean 'duration'", 16)]
    public void Wrong_input_is_located_and_explained(string right, string wrong, string expected, int line)
    {
        Assert.Contains(right, Valid);
        var (sketch, problems) = Read(Valid.Replace(right, wrong, StringComparison.Ordinal));
        Assert.Null(sketch);
        Assert.Contains(problems.Items, p => p.IsError && p.At.Line == line && p.ToString().Contains(expected, StringComparison.Ordinal));
    }

    [Fact]
    public void A_net_without_driver_or_receiver_is_refused()
    {
        var (_, problems) = Read("lines: [ { from: a, to: b, z0: 50 ohm, delay: 1 ns } ]");
        Assert.Contains(problems.Items, p => p.Message.Contains("'driver' is missing", StringComparison.Ordinal));
        Assert.Contains(problems.Items, p => p.Message.Contains("no receiver", StringComparison.Ordinal));
    }

    [Fact]
    public void Never_throws_on_a_changed_file()
    {
        Gen.Select(Gen.Int[0, Valid.Length - 1], Gen.Char["{}[]:,-#'\" \n0xV"], Gen.Int[0, 12]).Array[1, 5].Sample(changes =>
        {
            var text = Valid;
            foreach (var (at, letter, cut) in changes)
            {
                var start = Math.Min(at, text.Length);
                text = text[..start] + letter + text[Math.Min(text.Length, start + cut)..];
            }
            var (sketch, problems) = Read(text);
            Assert.True(sketch is not null || problems.HasErrors);
        }, iter: 2000);
    }
}
