using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Fonts;

namespace StackTiming.Reports.Pdf;

/// <summary>What draws on the pages: text in the report's faces, rules, boxes, links.</summary>
internal sealed class Ink : IDisposable
{
    private readonly Dictionary<(FontFace Face, float Size), SKFont> fonts = [];
    private readonly SKPaint paint = new() { IsAntialias = true };
    private readonly IReadOnlyDictionary<string, int> pageOfAnchor;

    /// <summary>Begins to draw.</summary>
    /// <param name="pageOfAnchor">Page number of each anchor, from 1.</param>
    public Ink(IReadOnlyDictionary<string, int> pageOfAnchor) => this.pageOfAnchor = pageOfAnchor;

    /// <summary>The page being drawn.</summary>
    public SKCanvas Canvas { get; set; } = null!;

    /// <summary>Page number of an anchor, from 1; null where the document has no such anchor.</summary>
    /// <param name="anchor">The anchor.</param>
    public int? PageOf(string anchor) => pageOfAnchor.TryGetValue(anchor, out var page) ? page : null;

    /// <summary>Draws text.</summary>
    /// <param name="text">The text, printable.</param>
    /// <param name="style">Its style.</param>
    /// <param name="x">Left edge.</param>
    /// <param name="baseline">Baseline.</param>
    public void Text(string text, TextStyle style, float x, float baseline)
    {
        if (!fonts.TryGetValue((style.Face, style.Size), out var font))
            fonts[(style.Face, style.Size)] = font = style.Face.At(style.Size);
        paint.Color = style.Color;
        paint.Style = SKPaintStyle.Fill;
        Canvas.DrawText(text, x, baseline, font, paint);
    }

    /// <summary>Draws text whose right edge is given.</summary>
    /// <param name="text">The text, printable.</param>
    /// <param name="style">Its style.</param>
    /// <param name="right">Right edge.</param>
    /// <param name="baseline">Baseline.</param>
    public void TextEndingAt(string text, TextStyle style, float right, float baseline) =>
        Text(text, style, right - style.Face.Width(text, style.Size), baseline);

    /// <summary>Draws a line of broken text with its links.</summary>
    /// <param name="line">The line.</param>
    /// <param name="x">Left edge.</param>
    /// <param name="baseline">Baseline.</param>
    public void Line(TextLine line, float x, float baseline)
    {
        foreach (var span in line.Spans)
        {
            Text(span.Text, span.Style, x + span.X, baseline);
            if (span.Link is not null)
                Link(span.Link, new SKRect(x + span.X, baseline - span.Style.Size, x + span.X + span.Width, baseline + span.Style.Size * 0.3f));
        }
    }

    /// <summary>Draws lines one beneath the other.</summary>
    /// <param name="lines">The lines.</param>
    /// <param name="x">Left edge.</param>
    /// <param name="top">Top edge of the first line.</param>
    /// <param name="style">The style that gives the distance of the lines.</param>
    public void Lines(IReadOnlyList<TextLine> lines, float x, float top, TextStyle style)
    {
        for (var i = 0; i < lines.Count; i++)
            Line(lines[i], x, Baseline(top + i * style.LineHeight, style));
    }

    /// <summary>Makes a rectangle lead to an anchor.</summary>
    /// <param name="anchor">The anchor; nothing happens where the document has none of that name.</param>
    /// <param name="area">The rectangle.</param>
    public void Link(string anchor, SKRect area)
    {
        if (pageOfAnchor.ContainsKey(anchor))
            Canvas.DrawLinkDestinationAnnotation(area, anchor);
    }

    /// <summary>Draws a level rule.</summary>
    /// <param name="x">Left end.</param>
    /// <param name="right">Right end.</param>
    /// <param name="y">Height.</param>
    /// <param name="color">Colour.</param>
    /// <param name="thickness">Thickness.</param>
    public void Rule(float x, float right, float y, SKColor color, float thickness) =>
        Fill(new SKRect(x, y - thickness / 2, right, y + thickness / 2), color);

    /// <summary>Fills a rectangle.</summary>
    /// <param name="area">The rectangle.</param>
    /// <param name="color">Colour.</param>
    public void Fill(SKRect area, SKColor color)
    {
        paint.Color = color;
        paint.Style = SKPaintStyle.Fill;
        Canvas.DrawRect(area, paint);
    }

    /// <summary>Outlines a rectangle.</summary>
    /// <param name="area">The rectangle.</param>
    /// <param name="color">Colour.</param>
    /// <param name="thickness">Thickness.</param>
    public void Outline(SKRect area, SKColor color, float thickness)
    {
        paint.Color = color;
        paint.Style = SKPaintStyle.Stroke;
        paint.StrokeWidth = thickness;
        Canvas.DrawRect(area, paint);
    }

    /// <summary>Baseline of a line of text whose top edge is given.</summary>
    /// <param name="top">Top edge.</param>
    /// <param name="style">Its style.</param>
    public static float Baseline(float top, TextStyle style) =>
        top + (style.LineHeight - (style.Face.Ascent + style.Face.Descent) * style.Size) / 2 + style.Face.Ascent * style.Size;

    /// <inheritdoc/>
    public void Dispose()
    {
        foreach (var font in fonts.Values)
            font.Dispose();
        paint.Dispose();
    }
}
