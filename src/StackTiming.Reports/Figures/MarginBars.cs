using System.Collections.Immutable;
using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;
using StackTiming.Rules.Findings;

namespace StackTiming.Reports.Figures;

/// <summary>One bar of a chart of margins.</summary>
/// <param name="Name">What it stands for, such as a rule.</param>
/// <param name="RelativeMargin">The margin as a share of what the rule allows.</param>
/// <param name="Margin">The margin as text, with its unit.</param>
/// <param name="Status">The status of the finding behind it.</param>
public readonly record struct MarginEntry(string Name, double RelativeMargin, string Margin, FindingStatus Status);

/// <summary>Margins as bars about zero, so that a glance shows where the board is tight.</summary>
/// <param name="entries">The bars, from top to bottom.</param>
public sealed class MarginBars(ImmutableArray<MarginEntry> entries) : IDrawing
{
    private const float RowHeight = 12.5f;
    private const float FootHeight = 22;

    /// <inheritdoc/>
    public float HeightFor(float width) => entries.Length * RowHeight + FootHeight;

    /// <inheritdoc/>
    public void Draw(SKCanvas canvas, float width, float height)
    {
        using var pen = new Pen(canvas);
        var style = TextStyle.Cell with { Size = 7.6f };
        var label = TextStyle.Label with { Size = 7f };
        var nameWidth = MathF.Min(width * 0.34f, entries.Select(e => style.Face.Width(Pen.Fit(e.Name, style, width), style.Size)).DefaultIfEmpty(20).Max() + 4);
        const float figureWidth = 64;
        float left = nameWidth + 8, right = width - figureWidth;
        float X(double margin) => left + (float)((margin + 1) / 2) * (right - left);
        var bottom = entries.Length * RowHeight;

        foreach (var percent in new[] { -100, -50, 0, 50, 100 })
        {
            var x = X(percent / 100.0);
            pen.Segment(new SKPoint(x, 0), new SKPoint(x, bottom + 3), percent == 0 ? Palette.Ink : Palette.Hairline, percent == 0 ? 0.9f : 0.6f);
            pen.TextCentredAt(percent == 0 ? "limit" : $"{(percent < 0 ? "−" : "+")}{Math.Abs(percent)} %", label, x, bottom + 12);
        }
        for (var i = 0; i < entries.Length; i++)
        {
            var entry = entries[i];
            var y = (i + 0.5f) * RowHeight;
            var fails = entry.RelativeMargin < 0;
            var rowStyle = fails ? style with { Face = TextStyle.Heading(1).Face } : style;
            pen.Text(Pen.Fit(entry.Name, rowStyle, nameWidth), rowStyle, 0, y + 2.7f);
            var end = X(Math.Clamp(entry.RelativeMargin, -1, 1));
            var zero = X(0);
            var bar = new SKRect(MathF.Min(zero, end), y - 3, MathF.Max(zero, end), y + 3);
            if (entry.Status == FindingStatus.Waived)
                pen.Outline(new SKRect(bar.Left + 0.4f, bar.Top, bar.Right - 0.4f, bar.Bottom), Palette.Alarm, 0.8f);
            else
                pen.Fill(bar, fails ? Palette.Alarm : Palette.Accent);
            if (Math.Abs(entry.RelativeMargin) > 1)
            {
                var direction = fails ? -1 : 1;
                using var arrow = new SKPath();
                arrow.AddPoly([new SKPoint(end, y - 3), new SKPoint(end + direction * 4.5f, y), new SKPoint(end, y + 3)], close: true);
                pen.Path(arrow, fails ? Palette.Alarm : Palette.Accent, null, 0);
            }
            pen.TextEndingAt(entry.Margin, rowStyle, width, y + 2.7f);
        }
    }
}
