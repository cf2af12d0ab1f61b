using System.Collections.Immutable;
using System.Globalization;
using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;

namespace StackTiming.Reports.Figures;

/// <summary>A line against frequency.</summary>
/// <param name="Title">Source and method.</param>
/// <param name="Hertz">Frequencies in rising order, Hz.</param>
/// <param name="Waves">The wave of a single signal, or both of a pair.</param>
public sealed record SweepCurves(string Title, double[] Hertz, ImmutableArray<SweepWave> Waves);

/// <summary>Attenuation by cause, and delay, of one wave.</summary>
/// <param name="Name">Name.</param>
/// <param name="Conductor">By smooth copper, dB/m.</param>
/// <param name="Roughness">By roughness, dB/m.</param>
/// <param name="Dielectric">By the dielectrics, dB/m.</param>
/// <param name="Delay">Phase delay, s/m.</param>
public sealed record SweepWave(string Name, double[] Conductor, double[] Roughness, double[] Dielectric, double[] Delay);

/// <summary>Attenuation by cause and delay against frequency; a row for each wave.</summary>
/// <param name="curves">What is drawn.</param>
public sealed class SweepFigure(SweepCurves curves) : IDrawing
{
    private const float TitleHeight = 18;
    private const float RowHeight = 220;

    // Attenuation below a ten-thousandth of its largest value is of no account.
    private const double Decades = 4;

    /// <inheritdoc/>
    public float HeightFor(float width) => TitleHeight + RowHeight * curves.Waves.Length;

    /// <inheritdoc/>
    public void Draw(SKCanvas canvas, float width, float height)
    {
        using var pen = new Pen(canvas);
        pen.Text(Pen.Fit(curves.Title, TextStyle.Heading(3), width), TextStyle.Heading(3), 0, 9);
        for (var i = 0; i < curves.Waves.Length; i++)
        {
            var (wave, top) = (curves.Waves[i], TitleHeight + i * RowHeight);
            var middle = width * 0.56f;
            DrawAttenuation(pen, wave, new SKRect(36, top + 18, middle - 70, top + RowHeight - 30), Heading(wave, "attenuation, dB/m"), top);
            DrawDelay(pen, wave, new SKRect(middle + 40, top + 18, width - 8, top + RowHeight - 30), Heading(wave, "delay, ps/mm"), top);
        }
    }

    private static string Heading(SweepWave wave, string what) => wave.Name == "single" ? what : $"{wave.Name} wave: {what}";

    private void DrawAttenuation(Pen pen, SweepWave wave, SKRect plot, string heading, float top)
    {
        var total = wave.Conductor.Select((c, k) => c + wave.Roughness[k] + wave.Dielectric[k]).ToArray();
        pen.Text(heading, TextStyle.Label, plot.Left - 28, top + 10);
        if (total.Max() <= 0)
        {
            pen.Text("none: the section states neither copper nor dielectrics with loss", TextStyle.Small, plot.Left - 28, top + 24);
            return;
        }
        var high = Math.Ceiling(Math.Log10(total.Max()));
        var least = Math.Max(1e-12, total.Min());
        var low = Math.Max(high - Decades, Math.Floor(Math.Log10(least)) - 1);
        DrawFrequencyAxis(pen, plot);
        var style = TextStyle.Small with { Size = 6.6f };
        for (var decade = low; decade <= high; decade++)
        {
            var y = plot.Bottom - plot.Height * (float)((decade - low) / (high - low));
            pen.Rule(plot.Left, plot.Right, y, Palette.Hairline, 0.5f);
            pen.TextEndingAt(Math.Pow(10, decade).ToString("0.########", CultureInfo.InvariantCulture), style, plot.Left - 4, y + 2.3f);
        }
        float Height(double v) => plot.Bottom - plot.Height * (float)((Math.Log10(v) - low) / (high - low));
        List<(string Name, double[] Values, SKColor Color, float Width, float[] Dashes)> parts =
        [
            ("whole", total, Palette.Ink, 1.6f, []), ("smooth copper", wave.Conductor, Palette.Copper, 1.2f, []),
            ("roughness", wave.Roughness, Palette.Alarm, 1.1f, [1.5f, 2]), ("dielectrics", wave.Dielectric, Palette.Accent, 1.2f, [5, 2.5f]),
        ];
        pen.Canvas.Save();
        pen.Canvas.ClipRect(plot);
        foreach (var (_, values, color, width, dashes) in parts)
            DrawCurve(pen, plot, values, Height, color, width, dashes);
        pen.Canvas.Restore();
        DrawNames(pen, plot, [.. parts.Where(p => p.Values[^1] > Math.Pow(10, low)).Select(p => (p.Name, p.Color, Height(p.Values[^1])))]);
    }

    private void DrawDelay(Pen pen, SweepWave wave, SKRect plot, string heading, float top)
    {
        var values = Array.ConvertAll(wave.Delay, d => d * 1e9);
        double low = values.Min(), high = values.Max();
        var margin = Math.Max(0.08 * (high - low), 0.005 * high);
        (low, high) = (low - margin, high + margin);
        pen.Text(heading, TextStyle.Label, plot.Left - 28, top + 10);
        DrawFrequencyAxis(pen, plot);
        var style = TextStyle.Small with { Size = 6.6f };
        var (ticks, decimals) = NiceTicks.Between(low, high, 5);
        float Height(double v) => plot.Bottom - plot.Height * (float)((v - low) / (high - low));
        foreach (var tick in ticks)
        {
            pen.Rule(plot.Left, plot.Right, Height(tick), Palette.Hairline, 0.5f);
            pen.TextEndingAt(tick.ToString("F" + decimals, CultureInfo.InvariantCulture), style, plot.Left - 4, Height(tick) + 2.3f);
        }
        DrawCurve(pen, plot, values, Height, Palette.Ink, 1.6f, []);
    }

    private void DrawFrequencyAxis(Pen pen, SKRect plot)
    {
        var style = TextStyle.Small with { Size = 6.6f };
        for (var decade = (int)Math.Ceiling(Math.Log10(curves.Hertz[0]) - 1e-9); Math.Pow(10, decade) <= curves.Hertz[^1] * (1 + 1e-9); decade++)
        {
            var x = Across(plot, Math.Pow(10, decade));
            pen.Segment(new SKPoint(x, plot.Top), new SKPoint(x, plot.Bottom), Palette.Hairline, 0.5f);
            var (scale, unit) = decade switch { >= 9 => (9, "GHz"), >= 6 => (6, "MHz"), >= 3 => (3, "kHz"), _ => (0, "Hz") };
            pen.TextCentredAt($"{Math.Pow(10, decade - scale).ToString("0", CultureInfo.InvariantCulture)} {unit}", style, x, plot.Bottom + 10);
        }
        pen.Outline(plot, Palette.Rule, 0.5f);
        pen.TextCentredAt("frequency", style, plot.MidX, plot.Bottom + 20);
    }

    private void DrawCurve(Pen pen, SKRect plot, double[] values, Func<double, float> height, SKColor color, float width, float[] dashes)
    {
        // What is nothing has no place on a logarithmic scale.
        SKPoint[] points = [.. values.Select((v, k) => (v, k)).Where(p => p.v > 0).Select(p => new SKPoint(Across(plot, curves.Hertz[p.k]), height(p.v)))];
        if (points.Length > 1)
            pen.Line(points, color, width, dashes);
    }

    // Names stand at the ends of their curves and are pushed apart where these end close together.
    private static void DrawNames(Pen pen, SKRect plot, (string Name, SKColor Color, float Y)[] names)
    {
        Array.Sort(names, (a, b) => a.Y.CompareTo(b.Y));
        var last = float.NegativeInfinity;
        foreach (var (name, color, y) in names)
        {
            last = Math.Max(last + 8.5f, y + 2.4f);
            pen.Text(name, TextStyle.Label with { Size = 6.8f, Color = color }, plot.Right + 4, last);
        }
    }

    private float Across(SKRect plot, double hertz) =>
        plot.Left + plot.Width * (float)(Math.Log(hertz / curves.Hertz[0]) / Math.Log(curves.Hertz[^1] / curves.Hertz[0]));
}
