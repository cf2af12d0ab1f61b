using System.Collections.Immutable;
using System.Globalization;
using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Figures;

/// <summary>
/// The delays of a group, a line each: a filled dot where the delay lies in the window, an open diamond where it does not, with the figures
/// beside it, so that what can be measured off the drawing can also be read.
/// </summary>
/// <param name="data">The delays and their window.</param>
public sealed class MatchChart(GroupDelays data) : IDrawing
{
    /// <summary>Most nets drawn; of more the ones nearest to the limits or beyond are drawn.</summary>
    public const int MostNets = 28;

    private const float RowHeight = 11.5f;
    private const float HeadHeight = 15;
    private const float AxisHeight = 26;
    private const double Pico = 1e12;

    private readonly ImmutableArray<NetDelay> rows = Choose(data);
    private readonly HashSet<string> netsWithSeveralReceivers = [.. data.Delays.GroupBy(d => d.Net).Where(g => g.Skip(1).Any()).Select(g => g.Key)];

    /// <summary>Number of nets that are not drawn.</summary>
    public int Omitted => data.Delays.Length - rows.Length;

    /// <inheritdoc/>
    public float HeightFor(float width) => HeadHeight + rows.Length * RowHeight + AxisHeight;

    /// <inheritdoc/>
    public void Draw(SKCanvas canvas, float width, float height)
    {
        using var pen = new Pen(canvas);
        var style = TextStyle.Cell with { Size = 7.6f };
        var label = TextStyle.Label with { Size = 7f };
        const float delayWidth = 44, differenceWidth = 44, lengthWidth = 46;
        var nameWidth = MathF.Min(width * 0.30f, rows.Select(r => style.Face.Width(Pen.Fit(Name(r), style, width), style.Size)).DefaultIfEmpty(20).Max() + 4);
        var centre = Centre();
        var figuresWidth = delayWidth + lengthWidth + (centre is null ? 0 : differenceWidth);
        float left = nameWidth + 10, right = width - figuresWidth - 12;
        float top = HeadHeight, bottom = top + rows.Length * RowHeight;
        var (lowest, highest) = Range();
        float X(double picoseconds) => left + (float)((picoseconds - lowest) / (highest - lowest)) * (right - left);

        DrawWindow(pen, label, X, left, right, top, bottom);
        var (ticks, decimals) = NiceTicks.Between(lowest, highest, Math.Max(2, (int)((right - left) / 55)));
        foreach (var tick in ticks)
        {
            pen.Segment(new SKPoint(X(tick), bottom), new SKPoint(X(tick), bottom + 3), Palette.Rule, 0.6f);
            pen.TextCentredAt(tick.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture), label, X(tick), bottom + 11);
        }
        pen.Rule(left, right, bottom, Palette.Rule, 0.6f);
        pen.TextCentredAt("delay, ps", label, (left + right) / 2, bottom + 21);

        var column = right + 12 + delayWidth;
        pen.TextEndingAt("ps", label, column, top - 5);
        if (centre is not null)
            pen.TextEndingAt(data.ReferenceSeconds is null ? "to middle" : "to ref.", label, column += differenceWidth, top - 5);
        pen.TextEndingAt("mm", label, column + lengthWidth, top - 5);

        for (var i = 0; i < rows.Length; i++)
        {
            var row = rows[i];
            var y = top + (i + 0.5f) * RowHeight;
            var delay = row.DelaySeconds * Pico;
            pen.Rule(0, width, y + RowHeight / 2, Palette.Hairline, 0.3f);
            var rowStyle = row.Holds ? style : style with { Face = TextStyle.Heading(1).Face, Color = Palette.Alarm };
            pen.Text(Pen.Fit(Name(row), rowStyle, nameWidth), rowStyle, 0, y + 2.7f);
            DrawMark(pen, X(delay), y, row.Holds);
            column = right + 12 + delayWidth;
            pen.TextEndingAt(delay.ToString("F1", CultureInfo.InvariantCulture), rowStyle, column, y + 2.7f);
            if (centre is { } middle)
                pen.TextEndingAt(Signed(delay - middle), rowStyle, column += differenceWidth, y + 2.7f);
            pen.TextEndingAt((row.LengthMetres * 1e3).ToString("F2", CultureInfo.InvariantCulture), rowStyle, column + lengthWidth, y + 2.7f);
        }
    }

    private void DrawWindow(Pen pen, TextStyle label, Func<double, float> x, float left, float right, float top, float bottom)
    {
        var low = data.LowestSeconds is { } l ? x(l * Pico) : left;
        var high = data.HighestSeconds is { } h ? x(h * Pico) : right;
        if (data.LowestSeconds is not null || data.HighestSeconds is not null)
            pen.Fill(new SKRect(low, top, high, bottom), Palette.AccentLight);
        if (data.LowestSeconds is not null)
            pen.Segment(new SKPoint(low, top), new SKPoint(low, bottom), Palette.Accent, 0.8f);
        if (data.HighestSeconds is not null)
            pen.Segment(new SKPoint(high, top), new SKPoint(high, bottom), Palette.Accent, 0.8f);
        if (data.ReferenceSeconds is { } reference)
        {
            var at = x(reference * Pico);
            pen.Segment(new SKPoint(at, top), new SKPoint(at, bottom), Palette.Ink, 0.8f, 3, 2);
            var name = Pen.Fit(data.ReferenceName, label, 120);
            var half = label.Face.Width(name, label.Size) / 2;
            pen.TextCentredAt(name, label, Math.Clamp(at, left + half, right - half), top - 5);
        }
    }

    private static void DrawMark(Pen pen, float x, float y, bool holds)
    {
        using var path = new SKPath();
        if (holds)
        {
            path.AddCircle(x, y, 2.4f);
            pen.Path(path, Palette.Accent, null, 0);
            return;
        }
        const float r = 3.4f;
        path.AddPoly([new SKPoint(x, y - r), new SKPoint(x + r, y), new SKPoint(x, y + r), new SKPoint(x - r, y)], close: true);
        pen.Path(path, Palette.Paper, Palette.Alarm, 1.2f);
    }

    // What the deviations are counted from: the reference net, or the middle of a two-sided window.
    private double? Centre() =>
        data.ReferenceSeconds is { } reference ? reference * Pico
        : data.LowestSeconds is { } low && data.HighestSeconds is { } high ? (low + high) / 2 * Pico : null;

    private (double Lowest, double Highest) Range()
    {
        double lowest = double.PositiveInfinity, highest = double.NegativeInfinity;
        void Include(double? seconds)
        {
            if (seconds is { } s && double.IsFinite(s))
            {
                lowest = Math.Min(lowest, s * Pico);
                highest = Math.Max(highest, s * Pico);
            }
        }
        foreach (var row in rows)
            Include(row.DelaySeconds);
        Include(data.LowestSeconds);
        Include(data.HighestSeconds);
        Include(data.ReferenceSeconds);
        if (!(highest >= lowest))
            return (0, 1);
        var margin = Math.Max((highest - lowest) * 0.07, 0.5);
        return (lowest - margin, highest + margin);
    }

    private string Name(NetDelay delay) =>
        netsWithSeveralReceivers.Contains(delay.Net) ? $"{delay.Net} → {delay.To}" : delay.Net;

    private static string Signed(double value) => value.ToString("+0.0;−0.0;0.0", CultureInfo.InvariantCulture);

    private static ImmutableArray<NetDelay> Choose(GroupDelays data)
    {
        if (data.Delays.Length <= MostNets)
            return data.Delays;
        var low = data.LowestSeconds ?? double.NegativeInfinity;
        var high = data.HighestSeconds ?? double.PositiveInfinity;
        var order = data.Delays.Select((d, i) => (d, i))
            .OrderBy(p => p.d.Holds).ThenBy(p => Math.Min(p.d.DelaySeconds - low, high - p.d.DelaySeconds)).ThenBy(p => p.i)
            .Take(MostNets).OrderBy(p => p.i);
        return [.. order.Select(p => p.d)];
    }
}
