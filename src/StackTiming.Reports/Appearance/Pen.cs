using SkiaSharp;
using StackTiming.Reports.Fonts;

namespace StackTiming.Reports.Appearance;

/// <summary>Draws text in the report's faces, rules and boxes on a canvas. Lengths are points.</summary>
public class Pen : IDisposable
{
    private readonly Dictionary<(FontFace Face, float Size), SKFont> fonts = [];
    private readonly SKPaint paint = new() { IsAntialias = true };

    /// <summary>Begins to draw.</summary>
    /// <param name="canvas">What to draw on.</param>
    public Pen(SKCanvas canvas) => Canvas = canvas;

    /// <summary>What is drawn on.</summary>
    public SKCanvas Canvas { get; set; }

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

    /// <summary>Draws text about a middle.</summary>
    /// <param name="text">The text, printable.</param>
    /// <param name="style">Its style.</param>
    /// <param name="middle">Middle of the text.</param>
    /// <param name="baseline">Baseline.</param>
    public void TextCentredAt(string text, TextStyle style, float middle, float baseline) =>
        Text(text, style, middle - style.Face.Width(text, style.Size) / 2, baseline);

    /// <summary>Draws a level rule.</summary>
    /// <param name="x">Left end.</param>
    /// <param name="right">Right end.</param>
    /// <param name="y">Height.</param>
    /// <param name="color">Colour.</param>
    /// <param name="thickness">Thickness.</param>
    public void Rule(float x, float right, float y, SKColor color, float thickness) =>
        Fill(new SKRect(x, y - thickness / 2, right, y + thickness / 2), color);

    /// <summary>Draws a straight line.</summary>
    /// <param name="from">One end.</param>
    /// <param name="to">The other end.</param>
    /// <param name="color">Colour.</param>
    /// <param name="thickness">Thickness.</param>
    /// <param name="dashes">Lengths of dashes and gaps; empty for a solid line.</param>
    public void Segment(SKPoint from, SKPoint to, SKColor color, float thickness, params float[] dashes)
    {
        paint.Color = color;
        paint.Style = SKPaintStyle.Stroke;
        paint.StrokeWidth = thickness;
        using var effect = dashes.Length > 0 ? SKPathEffect.CreateDash(dashes, 0) : null;
        paint.PathEffect = effect;
        Canvas.DrawLine(from, to, paint);
        paint.PathEffect = null;
    }

    /// <summary>Draws a line through points.</summary>
    /// <param name="points">The points.</param>
    /// <param name="color">Colour.</param>
    /// <param name="thickness">Thickness.</param>
    /// <param name="dashes">Lengths of dashes and gaps; empty for a solid line.</param>
    public void Line(SKPoint[] points, SKColor color, float thickness, params float[] dashes)
    {
        paint.Color = color;
        paint.Style = SKPaintStyle.Stroke;
        paint.StrokeWidth = thickness;
        using var effect = dashes.Length > 0 ? SKPathEffect.CreateDash(dashes, 0) : null;
        paint.PathEffect = effect;
        using var path = new SKPath();
        path.AddPoly(points, false);
        Canvas.DrawPath(path, paint);
        paint.PathEffect = null;
    }

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

    /// <summary>Draws a closed path.</summary>
    /// <param name="path">The path.</param>
    /// <param name="fill">Colour of its area, or null.</param>
    /// <param name="outline">Colour of its outline, or null.</param>
    /// <param name="thickness">Thickness of the outline.</param>
    public void Path(SKPath path, SKColor? fill, SKColor? outline, float thickness)
    {
        if (fill is { } area)
        {
            paint.Color = area;
            paint.Style = SKPaintStyle.Fill;
            Canvas.DrawPath(path, paint);
        }
        if (outline is { } edge)
        {
            paint.Color = edge;
            paint.Style = SKPaintStyle.Stroke;
            paint.StrokeWidth = thickness;
            Canvas.DrawPath(path, paint);
        }
    }

    /// <summary>A text cut to a width, with an ellipsis where something was cut.</summary>
    /// <param name="text">The text, as it comes from a file.</param>
    /// <param name="style">Its style.</param>
    /// <param name="width">Width.</param>
    public static string Fit(string text, TextStyle style, float width)
    {
        var shown = PrintableText.For(text, style.Face, 400);
        if (style.Face.Width(shown, style.Size) <= width)
            return shown;
        var room = width - style.Face.Advance('…') * style.Size;
        var used = 0f;
        var kept = 0;
        while (kept < shown.Length && used + style.Face.Advance(shown[kept]) * style.Size <= room)
            used += style.Face.Advance(shown[kept++]) * style.Size;
        return shown[..kept] + "…";
    }

    /// <summary>Baseline of a line of text whose top edge is given.</summary>
    /// <param name="top">Top edge.</param>
    /// <param name="style">Its style.</param>
    public static float Baseline(float top, TextStyle style) =>
        top + (style.LineHeight - (style.Face.Ascent + style.Face.Descent) * style.Size) / 2 + style.Face.Ascent * style.Size;

    /// <inheritdoc/>
    public void Dispose()
    {
        Dispose(true);
        GC.SuppressFinalize(this);
    }

    /// <summary>Frees the fonts and the paint.</summary>
    /// <param name="disposing">True where called from <see cref="Dispose()"/>.</param>
    protected virtual void Dispose(bool disposing)
    {
        if (!disposing)
            return;
        foreach (var font in fonts.Values)
            font.Dispose();
        paint.Dispose();
    }
}
