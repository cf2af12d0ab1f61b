using System.Globalization;
using ScottPlot;
using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;
using StackTiming.Rules.Results;
using Palette = StackTiming.Reports.Appearance.Palette;

namespace StackTiming.Reports.Figures;

/// <summary>
/// The voltage at a receiver and at its driver over time, with the thresholds and the judged instants, numbered as the caption lists them.
/// </summary>
/// <param name="wave">The waveform.</param>
public sealed class WaveformFigure(ReceiverWave wave) : IDrawing
{
    // Beyond this number of points a line on paper gains nothing.
    private const int MostPoints = 1200;

    /// <inheritdoc/>
    public float HeightFor(float width) => MathF.Round(width * 0.40f);

    /// <summary>The judged instants and levels in words, as numbered in the drawing.</summary>
    public string Legend() => string.Join("; ", wave.Marks.Select((m, i) =>
        string.Create(CultureInfo.InvariantCulture, $"{i + 1} {m.Name}")
        + (double.IsFinite(m.TimeSeconds) ? ", " + Time(m.TimeSeconds) : "")
        + (double.IsFinite(m.Volts) ? string.Create(CultureInfo.InvariantCulture, $", {m.Volts:0.000} V") : "")));

    /// <inheritdoc/>
    public void Draw(SKCanvas canvas, float width, float height)
    {
        using var plot = new Plot();
        var font = PlotTypeface.Register();
        var (scale, unit) = TimeUnit();
        var last = EndSeconds() * scale;
        var (low, high) = VoltageRange();

        AddThreshold(plot, wave.VihVolts, LinePattern.Dashed);
        AddThreshold(plot, wave.VilVolts, LinePattern.Dashed);
        AddThreshold(plot, wave.ThresholdVolts, LinePattern.Dotted);
        AddLine(plot, wave.DriverVolts, scale, Palette.Rule, 0.9f, LinePattern.DenselyDashed);
        AddLine(plot, wave.Volts, scale, Palette.Accent, 1.5f, LinePattern.Solid);
        AddMarks(plot, scale, font);

        plot.Axes.SetLimits(0, last > 0 ? last : 1, low, high);
        Style(plot, font, unit);
        plot.Layout.Fixed(new PixelPadding(34, 52, 28, 15));
        PlotPage.Render(plot, canvas, (int)width, (int)height);

        using var pen = new Pen(canvas);
        DrawKey(pen, width - 52);
        DrawThresholdNames(pen, plot, width - 49);
    }

    // The library draws whole pixels of one point each: on a page these are fractions of a millimetre.
    private static void Style(Plot plot, string font, string unit)
    {
        plot.FigureBackground.Color = Colors.Transparent;
        plot.DataBackground.Color = Colors.Transparent;
        plot.Axes.Top.FrameLineStyle.IsVisible = false;
        plot.Axes.Right.FrameLineStyle.IsVisible = false;
        plot.Grid.MajorLineColor = ToPlot(Palette.Hairline);
        plot.Grid.MajorLineWidth = 0.5f;
        foreach (var axis in new IAxis[] { plot.Axes.Bottom, plot.Axes.Left })
        {
            axis.FrameLineStyle.Color = ToPlot(Palette.Rule);
            axis.FrameLineStyle.Width = 0.6f;
            axis.MajorTickStyle.Color = ToPlot(Palette.Rule);
            axis.MajorTickStyle.Width = 0.6f;
            axis.MajorTickStyle.Length = 3;
            axis.MinorTickStyle.Length = 0;
            axis.TickLabelStyle.FontName = font;
            axis.TickLabelStyle.FontSize = 7.2f;
            axis.TickLabelStyle.ForeColor = ToPlot(Palette.Quiet);
            axis.Label.FontName = font;
            axis.Label.FontSize = 7.4f;
            axis.Label.Bold = false;
            axis.Label.ForeColor = ToPlot(Palette.Quiet);
        }
        plot.Axes.Bottom.Label.Text = $"time from the start of the edge, {unit}";
        plot.Axes.Left.Label.Text = "V";
    }

    private void DrawKey(Pen pen, float right)
    {
        var style = TextStyle.Label with { Size = 7f };
        var receiver = Pen.Fit("at " + wave.Receiver, style, 150);
        var driver = Pen.Fit("at " + wave.Driver + ", driver", style, 150);
        var x = right;
        pen.TextEndingAt(driver, style, x, 8);
        x -= style.Face.Width(driver, style.Size) + 4;
        pen.Segment(new SKPoint(x - 16, 5.6f), new SKPoint(x, 5.6f), Palette.Rule, 0.9f, 2.4f, 1.6f);
        x -= 28;
        pen.TextEndingAt(receiver, style, x, 8);
        x -= style.Face.Width(receiver, style.Size) + 4;
        pen.Segment(new SKPoint(x - 16, 5.6f), new SKPoint(x, 5.6f), Palette.Accent, 1.5f);
    }

    private void AddLine(Plot plot, double[] volts, double scale, SKColor color, float lineWidth, LinePattern pattern)
    {
        if (volts.Length == 0)
            return;
        var (times, levels) = Thin(wave.TimeSeconds, volts, scale);
        var line = plot.Add.ScatterLine(times, levels, ToPlot(color));
        line.LineWidth = lineWidth;
        line.LinePattern = pattern;
    }

    private static void AddThreshold(Plot plot, double? volts, LinePattern pattern)
    {
        if (volts is { } level)
            plot.Add.HorizontalLine(level, 0.6f, ToPlot(Palette.Quiet), pattern);
    }

    // Names of thresholds that lie close together are pushed apart.
    private void DrawThresholdNames(Pen pen, Plot plot, float x)
    {
        const float least = 8;
        var style = TextStyle.Label with { Size = 6.8f };
        var names = new List<(string Name, double Volts)>();
        if (wave.VihVolts is { } vih)
            names.Add(("vih", vih));
        if (wave.ThresholdVolts is { } threshold)
            names.Add(("mid", threshold));
        if (wave.VilVolts is { } vil)
            names.Add(("vil", vil));
        var places = names.OrderByDescending(n => n.Volts).Select(n => (n.Name, n.Volts, Y: plot.GetPixel(new Coordinates(0, n.Volts)).Y)).ToArray();
        if (places.Length == 0)
            return;
        var middle = places.Average(p => p.Y);
        for (var i = 1; i < places.Length; i++)
            places[i].Y = MathF.Max(places[i].Y, places[i - 1].Y + least);
        var shift = middle - places.Average(p => p.Y);
        foreach (var (name, volts, y) in places)
            pen.Text(string.Create(CultureInfo.InvariantCulture, $"{name} {volts:0.00#} V"), style, x, y + shift + 2.4f);
    }

    private void AddMarks(Plot plot, double scale, string font)
    {
        for (var i = 0; i < wave.Marks.Length; i++)
        {
            if (Place(wave.Marks[i]) is not { } mark)
                continue;
            var marker = plot.Add.Marker(mark.TimeSeconds * scale, mark.Volts, MarkerShape.OpenCircle, 5, ToPlot(Palette.Alarm));
            marker.MarkerLineWidth = 1.1f;
            var text = plot.Add.Text((i + 1).ToString(CultureInfo.InvariantCulture), mark.TimeSeconds * scale, mark.Volts);
            text.LabelFontName = font;
            text.LabelFontSize = 7.6f;
            text.LabelBold = true;
            text.LabelFontColor = ToPlot(Palette.Alarm);
            text.LabelAlignment = ScottPlot.Alignment.LowerRight;
            text.OffsetX = -2;
            text.OffsetY = -1;
        }
    }

    // An instant without a level lies on the curve at its time, a level without an instant at the turning point that reaches it; a level
    // that the curve only passes is named in the caption alone.
    private WaveMark? Place(WaveMark mark)
    {
        var count = Math.Min(wave.TimeSeconds.Length, wave.Volts.Length);
        if (count < 3)
            return null;
        if (double.IsFinite(mark.TimeSeconds))
            return double.IsFinite(mark.Volts) ? mark : mark with { Volts = VoltsAt(mark.TimeSeconds, count) };
        if (!double.IsFinite(mark.Volts))
            return null;
        var nearest = 0.01 * (wave.Volts.Max() - wave.Volts.Min());
        WaveMark? placed = null;
        for (var i = 1; i < count - 1; i++)
        {
            var turns = (wave.Volts[i] - wave.Volts[i - 1]) * (wave.Volts[i + 1] - wave.Volts[i]) <= 0 && wave.Volts[i] != wave.Volts[i - 1];
            if (turns && Math.Abs(wave.Volts[i] - mark.Volts) < nearest)
            {
                nearest = Math.Abs(wave.Volts[i] - mark.Volts);
                placed = mark with { TimeSeconds = wave.TimeSeconds[i] };
            }
        }
        return placed;
    }

    private double VoltsAt(double seconds, int count)
    {
        var after = Array.BinarySearch(wave.TimeSeconds, 0, count, seconds);
        after = Math.Clamp(after < 0 ? ~after : after, 1, count - 1);
        var (from, to) = (wave.TimeSeconds[after - 1], wave.TimeSeconds[after]);
        var share = to > from ? Math.Clamp((seconds - from) / (to - from), 0, 1) : 0;
        return wave.Volts[after - 1] + share * (wave.Volts[after] - wave.Volts[after - 1]);
    }

    private (double Scale, string Unit) TimeUnit() => EndSeconds() < 2e-9 ? (1e12, "ps") : (1e9, "ns");

    // Where nothing happens any more the drawing ends: a quarter after the last judged instant, or after the voltage has come to rest.
    private double EndSeconds()
    {
        var count = Math.Min(wave.TimeSeconds.Length, wave.Volts.Length);
        if (count == 0)
            return 1e-9;
        var final = wave.Volts[count - 1];
        var rest = 0.01 * (wave.Volts.Max() - wave.Volts.Min());
        var moving = count - 1;
        while (moving > 0 && !(Math.Abs(wave.Volts[moving] - final) > rest))
            moving--;
        var busy = wave.TimeSeconds[moving];
        foreach (var mark in wave.Marks)
            busy = double.IsFinite(mark.TimeSeconds) ? Math.Max(busy, mark.TimeSeconds) : busy;
        return busy > 0 ? Math.Min(wave.TimeSeconds[count - 1], busy * 1.25) : wave.TimeSeconds[count - 1];
    }

    private string Time(double seconds)
    {
        var (scale, unit) = TimeUnit();
        return (seconds * scale).ToString(unit == "ps" ? "0.0" : "0.000", CultureInfo.InvariantCulture) + " " + unit;
    }

    private (double Low, double High) VoltageRange()
    {
        double low = double.PositiveInfinity, high = double.NegativeInfinity;
        void Include(double volts)
        {
            if (double.IsFinite(volts))
            {
                low = Math.Min(low, volts);
                high = Math.Max(high, volts);
            }
        }
        foreach (var volts in wave.Volts)
            Include(volts);
        foreach (var volts in wave.DriverVolts)
            Include(volts);
        Include(wave.VihVolts ?? double.NaN);
        Include(wave.VilVolts ?? double.NaN);
        if (!(high >= low))
            return (0, 1);
        var margin = Math.Max((high - low) * 0.09, 1e-3);
        return (low - margin, high + margin);
    }

    // Keeps the lowest and the highest point of each stretch, so that no spike is lost.
    private static (double[] Times, double[] Levels) Thin(double[] seconds, double[] volts, double scale)
    {
        var count = Math.Min(seconds.Length, volts.Length);
        var times = new List<double>(Math.Min(count, MostPoints));
        var levels = new List<double>(Math.Min(count, MostPoints));
        var stretch = Math.Max(1, (count + MostPoints / 2 - 1) / (MostPoints / 2));
        for (var start = 0; start < count; start += stretch)
        {
            int lowest = start, highest = start;
            for (var i = start; i < Math.Min(count, start + stretch); i++)
            {
                lowest = volts[i] < volts[lowest] ? i : lowest;
                highest = volts[i] > volts[highest] ? i : highest;
            }
            foreach (var i in lowest == highest ? [lowest] : lowest < highest ? [lowest, highest] : new[] { highest, lowest })
            {
                if (!double.IsFinite(volts[i]) || !double.IsFinite(seconds[i]))
                    continue;
                times.Add(seconds[i] * scale);
                levels.Add(volts[i]);
            }
        }
        return ([.. times], [.. levels]);
    }

    private static Color ToPlot(SKColor color) => new(color.Red, color.Green, color.Blue, color.Alpha);
}
