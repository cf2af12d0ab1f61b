using System.Globalization;
using System.Text.Json;
using Xunit;

namespace StackTiming.Acceptance;

public sealed class SectionSweepTests
{
    private const string Pair = """
        format: 1
        stackup:
          name: two layers
          dielectrics: { core: { dk: 4.2, df: 0.016, at: 1 GHz } }
          copper: { resistivity: 1.72e-8 ohm m, roughness: 1 um }
          layers:
            - { copper: L1, thickness: 35 um, use: signal }
            - { core: core, thickness: 110 um }
            - { copper: L2, thickness: 17 um, use: plane }
        conductors:
          - { name: p, layer: L1, x: -0.16 mm, width: 0.15 mm }
          - { name: n, layer: L1, x: 0.16 mm, width: 0.15 mm }
        """;

    [Fact]
    public void Sweep_of_a_pair_gives_both_waves_and_a_four_port_file()
    {
        using var folder = new TemporaryFolder();
        var file = folder.Write("pair.section.yaml", Pair);
        var touchstone = folder.PathOf("pair.s4p");
        var csv = folder.PathOf("pair.csv");

        var run = Tool.Run("section", file, "--sweep", "10MHz..10GHz", "--per-decade", "2", "--json", "--csv", csv, "--touchstone", touchstone, "--length", "50mm");

        Assert.True(run.ExitCode == 0, run.Error);
        using var json = JsonDocument.Parse(run.Output);
        var points = json.RootElement.GetProperty("sweep");
        Assert.Equal(7, points.GetArrayLength());
        var waves = points[0].GetProperty("waves");
        Assert.Equal("differential", waves[0].GetProperty("wave").GetString());
        Assert.Equal("common", waves[1].GetProperty("wave").GetString());
        // Loss and resistance grow, permittivity and with it capacitance fall with frequency.
        Assert.True(Value(points[6], "attenuation_db_per_m") > Value(points[0], "attenuation_db_per_m"));
        Assert.True(Value(points[6], "r_ohm_per_m") > Value(points[0], "r_ohm_per_m"));
        Assert.True(Value(points[6], "c_f_per_m") < Value(points[0], "c_f_per_m"));
        Assert.Equal(15, File.ReadAllLines(csv).Length);
        var data = File.ReadAllLines(touchstone).Where(l => l[0] is not ('!' or '#')).ToArray();
        Assert.Equal(28, data.Length);
        // The differential wave between 100 ohm crosses the file as S31 − S32 of its ports: with |S| below 1 and the phase of its delay.
        var first = data[24].Split(' ').Select(v => double.Parse(v, CultureInfo.InvariantCulture)).ToArray();
        Assert.Equal(1e10, first[0]);
        var passed = new System.Numerics.Complex(first[5] - first[7], first[6] - first[8]);
        var expected = Math.Pow(10, -0.05 * Value(points[6], "attenuation_db_per_m") / 20);
        Assert.Equal(expected, passed.Magnitude, 0.02);
        var turns = Value(points[6], "delay_s_per_m") * 0.05 * 1e10;
        Assert.Equal(0, Math.IEEERemainder(passed.Phase / (2 * Math.PI) + turns, 1), 0.01);
    }

    [Theory]
    [InlineData("fields.svg", "<svg")]
    [InlineData("fields.pdf", "%PDF-")]
    [InlineData("fields.png", "PNG")]
    [InlineData("loss.svg", "attenuation", "--sweep", "1GHz..10GHz", "--per-decade", "3")]
    public void Figures_are_of_the_kind_that_their_name_says(string name, string expected, params string[] options)
    {
        using var folder = new TemporaryFolder();
        var file = folder.Write("pair.section.yaml", Pair);

        var run = Tool.Run(["section", file, "--figure", folder.PathOf(name), .. options]);

        Assert.True(run.ExitCode == 0, run.Error);
        Assert.Contains(expected, File.ReadAllText(folder.PathOf(name)));
    }

    [Theory]
    [InlineData("ends in none of .svg", "--figure", "fields.gif")]
    [InlineData("needs a lowest and a highest", "--sweep", "1GHz")]
    [InlineData("must lie below", "--sweep", "2GHz..1GHz")]
    [InlineData("no length", "--sweep", "1GHz..2GHz", "--touchstone", "a.s4p")]
    [InlineData("which the name of the file must say", "--sweep", "1GHz..2GHz", "--touchstone", "a.s2p", "--length", "1mm")]
    [InlineData("add --sweep", "--touchstone", "a.s4p", "--length", "1mm")]
    [InlineData("leave --frequency and --lossless away", "--sweep", "1GHz..2GHz", "--lossless")]
    [InlineData("1 to 1000", "--sweep", "1GHz..2GHz", "--per-decade", "0")]
    public void Wrong_sweeps_are_refused_with_advice(string message, params string[] options)
    {
        using var folder = new TemporaryFolder();
        var file = folder.Write("pair.section.yaml", Pair);

        var run = Tool.Run(["section", file, .. options]);

        Assert.Equal(2, run.ExitCode);
        Assert.Contains(message, run.Error);
    }

    private static double Value(JsonElement point, string name) => point.GetProperty("waves")[0].GetProperty(name).GetDouble();
}
