using System.Text;
using System.Xml.Linq;
using SkiaSharp;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Figures;
using StackTiming.Reports.Tests.Compliance;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;
using Xunit;

namespace StackTiming.Reports.Tests.Figures;

public class FigureTests
{
    private static string Svg(IDrawing drawing)
    {
        using var stream = new MemoryStream();
        FigureFile.WriteSvg(drawing, 480, stream);
        return Encoding.UTF8.GetString(stream.ToArray());
    }

    private static string TextOf(IDrawing drawing) => string.Join('\n', XDocument.Parse(Svg(drawing)).Descendants().Where(e => e.Name.LocalName == "text").Select(e => e.Value.Trim()));

    [Fact]
    public void Match_chart_names_every_net_with_its_delay_and_deviation()
    {
        var text = TextOf(new MatchChart(SampleCheck.Create().Groups[0]));
        foreach (var expected in new[] { "MEM_D0", "MEM_D7", "MEM_DM0", "432.1", "+18.4", "−5.0", "delay, ps" })
            Assert.Contains(expected, text, StringComparison.Ordinal);
    }

    [Fact]
    public void Match_chart_of_a_large_group_keeps_the_worst_nets()
    {
        var group = SampleCheck.Create().Groups[2];
        var many = group with { Delays = [.. group.Delays.Select((d, i) => d with { Holds = i != 50, DelaySeconds = i == 50 ? 950e-12 : d.DelaySeconds })] };
        var chart = new MatchChart(many);
        Assert.Equal(many.Delays.Length - MatchChart.MostNets, chart.Omitted);
        Assert.Contains("MEM_A50", TextOf(chart), StringComparison.Ordinal);
        Assert.True(chart.HeightFor(480) < 620);
    }

    [Fact]
    public void Match_chart_tells_receivers_of_one_net_apart()
    {
        var group = new GroupDelays("R", "flight-time", "g", "", null, null, null,
            [new NetDelay("A0", "U1.1", "U2.1", 1e-10, 0.01, true), new NetDelay("A0", "U1.1", "U3.1", 2e-10, 0.02, true)]);
        var text = TextOf(new MatchChart(group));
        Assert.Contains("A0 → U2.1", text, StringComparison.Ordinal);
        Assert.Contains("A0 → U3.1", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Waveform_shows_thresholds_and_numbers_the_judged_instants()
    {
        var figure = new WaveformFigure(SampleCheck.Wave("CLK", 1));
        var text = TextOf(figure);
        foreach (var expected in new[] { "vih 1.17 V", "mid 0.90 V", "vil 0.63 V", "at U9.K2", "at U1.C4, driver", "time from the start of the edge, ns", "3" })
            Assert.Contains(expected, text, StringComparison.Ordinal);
        Assert.Equal("1 first crossing of vih, 1.140 ns, 1.170 V; 2 ringback, 2.600 ns, 1.310 V; 3 settled to 5 %, 4.020 ns, 1.710 V; 4 overshoot, 2.420 V", figure.Legend());
    }

    [Fact]
    public void Waveform_places_a_level_at_the_turning_point_that_reaches_it()
    {
        var wave = SampleCheck.Wave("CLK", 1);
        // Marks alone are written in the alarm colour.
        string[] Numbers(params WaveMark[] marks) => [.. XDocument.Parse(Svg(new WaveformFigure(wave with { Marks = [.. marks] }))).Descendants()
            .Where(e => e.Name.LocalName == "text" && string.Equals((string?)e.Attribute("fill"), "#A62B1F", StringComparison.OrdinalIgnoreCase)).Select(e => e.Value.Trim())];
        var highest = new WaveMark("overshoot", double.NaN, wave.Volts.Max());
        var passed = new WaveMark("first wave", double.NaN, wave.Volts.Max() / 2);
        var settled = new WaveMark("settled", 4.1e-9, double.NaN);
        Assert.Equal(["1", "3"], Numbers(highest, passed, settled));
    }

    [Fact]
    public void Waveform_without_points_or_with_gaps_is_drawn_all_the_same()
    {
        var wave = SampleCheck.Wave("CLK", 1) with { Marks = [], VihVolts = null, VilVolts = null, ThresholdVolts = null };
        Assert.NotEmpty(Svg(new WaveformFigure(wave with { TimeSeconds = [], Volts = [], DriverVolts = [] })));
        wave.Volts[100] = double.NaN;
        Assert.NotEmpty(Svg(new WaveformFigure(wave)));
    }

    [Fact]
    public void Stack_up_names_every_layer_and_its_lines()
    {
        var drawing = new StackUpDrawing(SampleCheck.StackUp(), [new LineLabel("L3", "0.100 mm → 48.2 Ω"), new LineLabel("L3", "0.142 mm → 40.1 Ω")]);
        var text = TextOf(drawing);
        foreach (var expected in new[] { "L1", "L8", "plane", "mixed", "15.2 µm", "core-b (core), 870 µm, Dk 4.35, Df 0.016", "0.142 mm → 40.1 Ω", "1.601 mm without mask; thin layers are drawn thicker" })
            Assert.Contains(expected, text, StringComparison.Ordinal);
        Assert.False(drawing.IsToScale);
    }

    [Fact]
    public void Stack_up_grows_with_the_number_of_its_labels()
    {
        var few = new StackUpDrawing(SampleCheck.StackUp(), []);
        var many = new StackUpDrawing(SampleCheck.StackUp(), [.. Enumerable.Range(0, 60).Select(i => new LineLabel("L3", $"line {i}"))]);
        Assert.True(many.HeightFor(480) > few.HeightFor(480));
        Assert.Contains("line 59", TextOf(many), StringComparison.Ordinal);
    }

    [Fact]
    public void Margin_bars_show_names_and_margins()
    {
        var text = TextOf(new MarginBars([new MarginEntry("LANE0-Z", -1.8, "−9.21 Ω", FindingStatus.Fail), new MarginEntry("ADDR-TIME", 0.3, "88.00 ps", FindingStatus.Pass)]));
        Assert.Contains("−9.21 Ω", text, StringComparison.Ordinal);
        Assert.Contains("limit", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Picture_has_the_size_that_was_asked_for()
    {
        using var stream = new MemoryStream();
        FigureFile.WritePng(new StackUpDrawing(SampleCheck.StackUp(), []), 484, 2, stream);
        using var bitmap = SKBitmap.Decode(stream.ToArray());
        Assert.Equal(1000, bitmap.Width);
        Assert.NotEqual(bitmap.GetPixel(500, 300), SKColors.Transparent);
    }

    [Theory]
    [InlineData(0, 10, 5, new[] { 0.0, 2, 4, 6, 8, 10 }, 0)]
    [InlineData(408.1, 432.9, 5, new[] { 410.0, 415, 420, 425, 430 }, 0)]
    [InlineData(-0.013, 0.021, 3, new[] { -0.01, 0, 0.01, 0.02 }, 2)]
    public void Ticks_are_round(double low, double high, int wanted, double[] expected, int decimals)
    {
        var (values, digits) = NiceTicks.Between(low, high, wanted);
        Assert.Equal(expected.Length, values.Length);
        for (var i = 0; i < values.Length; i++)
            Assert.Equal(expected[i], values[i], 12);
        Assert.Equal(decimals, digits);
    }
}
