using CsCheck;
using StackTiming.Nets.Parts;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Nets.Tests.Parts;

public class PartListReaderTests
{
    private const string Models =
        """
        models:
          io:
            driver: { low: 0.1 V, high: 1.2 V, resistance: 34 ohm ±15 %, rise: 150 ps, fall: 170 ps, capacitance: 1.5 pF, package: { inductance: 1 nH, capacitance: 0.8 pF } }
            receiver: { capacitance: 1.4 pF, vil: 0.45 V, vih: 0.75 V, threshold: 0.6 V, termination: { resistance: 60 ohm, to: 0.6 V } }
          in:
            receiver: { capacitance: 2 pF, vil: 0.6 V, vih: 1.2 V }

        """;

    private static (PartList? Parts, string[] Problems) Read(string text)
    {
        var problems = new ProblemList();
        PartList? parts = null;
        if (YamlDocument.ReadMap(new InputFile("p.yaml", text, ""), problems) is { } map)
            parts = PartListReader.Read(new MapReader(map, DefaultUnits.None, problems));
        Assert.Equal(problems.HasErrors, parts is null);
        return (parts, [.. problems.Items.Select(p => p.ToString())]);
    }

    private static PartList ReadWhole(string text)
    {
        var (parts, problems) = Read(text);
        Assert.Empty(problems);
        return parts!;
    }

    [Fact]
    public void A_buffer_that_drives_and_receives_is_read_in_SI_units()
    {
        var model = ReadWhole(Models + "parts: { U1: { pins: { A3: { model: io, package-delay: 41 ps } } } }").Models["io"];
        var driver = model.Driver!;
        Assert.Equal((0.1, 1.2, 34.0), (driver.Low.Value, driver.High.Value, driver.Resistance.Value));
        Assert.Equal(5.1, driver.Resistance.Tolerance.Plus, 1e-12);
        Assert.Equal(150e-12, driver.Rise.Value, 1e-20);
        Assert.Equal(170e-12, driver.Fall.Value, 1e-20);
        Assert.Equal(1.5e-12, driver.Capacitance.Value, 1e-20);
        Assert.Equal(1e-9, driver.Package!.InductanceHenry, 1e-18);
        Assert.Equal(0.8e-12, driver.Package.CapacitanceFarad, 1e-20);
        var receiver = model.Receiver!;
        Assert.Equal((0.45, 0.75, 0.6), (receiver.Vil!.Value.Value, receiver.Vih!.Value.Value, receiver.TimingThresholdVolts));
        var termination = Assert.Single(receiver.Terminations);
        Assert.Equal((60.0, 0.6), (termination.Resistance.Value, termination.ToVolts));
    }

    [Fact]
    public void Without_a_threshold_timing_is_measured_half_way_between_the_levels()
    {
        Assert.Equal(0.9, ReadWhole(Models + "parts: { U1: { pins: { 1: { model: in } } } }").Models["in"].Receiver!.TimingThresholdVolts!.Value, 1e-12);
    }

    [Fact]
    public void Ranges_and_lists_of_pins_share_one_description()
    {
        var part = ReadWhole(Models + "parts: { U1: { pins: { A3: { model: io, package-delay: 41 ps }, \"B1..B3, C[7,9]\": { model: in } } } }").Find("U1")!;
        Assert.Equal(["A3", "B1", "B2", "B3", "C7", "C9"], part.Pins.Keys.Order(StringComparer.Ordinal));
        Assert.Equal(41e-12, part.Pins["A3"].PackageDelaySeconds, 1e-20);
        Assert.Equal(0, part.Pins["B2"].PackageDelaySeconds);
        Assert.Equal("in", part.Pins["C9"].Model!.Name);
    }

    [Fact]
    public void Series_parts_name_the_pins_that_they_join()
    {
        var parts = ReadWhole("parts: { R12: { joins: [1, 2], resistance: 33 ohm }, RN1: { joins: [[1, 8], [2, 7]], resistance: 22 ohm }, C3: { joins: [a, k], capacitance: 100 nF } }");
        Assert.Equal([("1", "2", 33.0)], parts.Find("R12")!.Joins.Select(j => (j.FirstPin, j.SecondPin, j.Resistance.Value)));
        Assert.Equal([("1", "8", 22.0), ("2", "7", 22.0)], parts.Find("RN1")!.Joins.Select(j => (j.FirstPin, j.SecondPin, j.Resistance.Value)));
        Assert.Equal(100e-9, parts.Find("C3")!.Joins[0].Capacitance!.Value.Value, 1e-18);
        Assert.Null(parts.Find("R99"));
    }

    [Fact]
    public void A_pin_may_have_several_terminations_and_one_with_a_capacitor()
    {
        var part = ReadWhole("parts: { R30: { pins: { 1: { termination: [ { resistance: 100 ohm, to: 1.2 V }, { resistance: 100 ohm, to: 0 V, capacitance: 47 pF } ] } } } }").Find("R30")!;
        Assert.Equal([(100.0, 1.2, null), (100.0, 0.0, 47e-12)], part.Pins["1"].Terminations.Select(t => (t.Resistance.Value, t.ToVolts, t.CapacitanceFarad)));
    }

    [Fact]
    public void Pins_and_series_parts_may_say_on_which_nets_they_lie()
    {
        var parts = ReadWhole(Models + "parts: { U1: { pins: { 4: { model: in, net: CLK } } }, R1: { joins: [1, 2], nets: [CLK_S, CLK], resistance: 33 ohm } }");
        Assert.Equal("CLK", parts.Find("U1")!.Pins["4"].Net);
        Assert.Equal(("CLK_S", "CLK"), (parts.Find("R1")!.Pins["1"].Net, parts.Find("R1")!.Pins["2"].Net));
    }

    [Theory]
    [InlineData("parts: { U1: { pins: { 1: { model: ¦iox } } } }", "error: there is no model 'iox'; did you mean 'io'?")]
    [InlineData("parts: { U1: { pins: { 1: { ¦modle: io } } } }", "error: unknown key 'modle'; did you mean 'model'?")]
    [InlineData("parts: { U1: { pins: { \"1..4\": { model: io }, ¦3: { model: in } } } }", "error: the pin '3' is stated twice; remove it from one of the two")]
    [InlineData("parts: { U1: { pins: { ¦\"A*\": { model: io } } } }", "error: 'A*' stands for any pin, but a part's pins must be known by name; write a range such as B1..B8")]
    [InlineData("parts: { U1: { pins: { 1: { model: io, package-delay: ¦-3 ps } } } }", "error: 'package-delay' must not be negative, but it says '-3 ps'")]
    [InlineData("parts: { U1: ¦{} }", "error: the part 'U1' has neither pins nor joins; write pins: { 1: { model: … } } or joins: [1, 2]")]
    [InlineData("parts: { R1: { resistance: ¦33 ohm, pins: { 1: {} } } }", "error: 'resistance' needs the two pins that the part joins; write R1: { joins: [1, 2], resistance: … }")]
    [InlineData("parts: { R1: { joins: ¦[1], resistance: 33 ohm } }", "error: 'joins' must be two pins, or a list of pairs of pins; write joins: [1, 2] or joins: [[1, 8], [2, 7]]")]
    [InlineData("parts: { R1: { joins: [1, ¦1], resistance: 33 ohm } }", "error: the pin '1' is joined twice; name every pin in one pair only")]
    [InlineData("parts: { R1: { joins: [[1, 2], [3, ¦2]] } }", "error: the pin '2' is joined twice; name every pin in one pair only")]
    [InlineData("parts: { R1: { joins: [1, 2], nets: ¦[A] } }", "error: 'nets' must name the nets of the part's two pins; write joins: [1, 2], nets: [CLK_SRC, CLK]")]
    [InlineData("parts: { R1: { pins: { 1: { termination: ¦{ to: 0 V } } } } }", "error: 'resistance' is missing; write termination: { resistance: 50 ohm, to: 0.6 V }")]
    public void Wrong_parts_are_refused_with_their_place_and_what_to_write(string parts, string expected)
    {
        const string models = "models:\n  io: { driver: { high: 1 V, resistance: 30 ohm, rise: 1 ns } }\n  in:\n    receiver:\n      capacitance: 1 pF\n";
        // The mark stands where the problem is.
        var column = parts.IndexOf('¦', StringComparison.Ordinal) + 1;
        Assert.Equal([$"p.yaml:6:{column}: {expected}"], Read(models + parts.Replace("¦", "", StringComparison.Ordinal)).Problems);
    }

    [Fact]
    public void A_file_without_parts_is_refused()
    {
        Assert.Equal(
            ["p.yaml:1:1: error: 'parts' is missing; write parts: { U1: { pins: { A3: { model: … } } } }", "p.yaml:1:1: error: unknown key 'part'; did you mean 'parts'?"],
            Read("part: {}").Problems);
    }

    [Theory]
    [InlineData("driver: { high: 1 V, resistance: 30 ohm }", "'rise' is missing; write rise: 150 ps, the 0–100 % ramp of the open-circuit source")]
    [InlineData("driver: { low: 1 V, high: 1 V, resistance: 30 ohm, rise: 1 ns }", "'high' must be above 'low'; swap the two, or check the units")]
    [InlineData("driver: { high: 1 V, resistance: 0 ohm, rise: 1 ns }", "'resistance' must be above zero, but it says '0 ohm'")]
    [InlineData("receiver: { vil: 0.8 V, vih: 0.6 V }", "'vil' must be below 'vih'; swap the two, or check the units")]
    [InlineData("receiver: { vil: 0.8 V }", "'vih' is missing beside 'vil'; write both levels, such as vil: 0.45 V, vih: 0.75 V")]
    [InlineData("receiver: { vil: 0.4 V, vih: 0.8 V, threshold: 0.9 V }", "'threshold' must lie between 'vil' and 'vih'; check the three levels")]
    [InlineData("", "the model 'm' neither drives nor receives; write driver: { … }, receiver: { … } or both")]
    [InlineData("file: vendor.ibs, model: DQ_34, corner: typ", "buffer-model files are not read yet; write the model's figures: driver: { low: 0 V, high: 1.2 V, resistance: 34 ohm, rise: 150 ps }, receiver: { capacitance: 1.4 pF, vil: 0.45 V, vih: 0.75 V }")]
    public void Wrong_models_are_refused_with_what_to_write(string model, string expected)
    {
        var (_, problems) = Read($"models: {{ m: {{ {model} }} }}\nparts: {{ U1: {{ pins: {{ 1: {{ model: m }} }} }} }}");
        Assert.Equal(expected, Assert.Single(problems)[(problems[0].IndexOf("error: ", StringComparison.Ordinal) + 7)..]);
    }

    [Fact]
    public void No_text_makes_the_reader_throw()
    {
        var pieces = Gen.OneOf<string>("parts:", "models:", "{", "}", "[", "]", ", ", ": ", "\n", "  ", "U1", "pins", "joins", "driver", "receiver", "high", "1 V", "33 ohm", "\"B1..B8\"", "1", "termination", "nets", "&a ", "*a", "- ", "file");
        Gen.OneOf(Gen.String, pieces.Array[0, 40].Select(string.Concat)).Sample(text => Read(text), iter: 3000);
    }
}
