using SkiaSharp;

namespace StackTiming.Reports.Documents;

/// <summary>Something drawn: it fills whatever rectangle it is given.</summary>
public interface IDrawing
{
    /// <summary>Draws into the rectangle from (0, 0) to (<paramref name="width"/>, <paramref name="height"/>).</summary>
    /// <param name="canvas">What to draw on: a page, an image or a vector file.</param>
    /// <param name="width">Width, points.</param>
    /// <param name="height">Height, points.</param>
    void Draw(SKCanvas canvas, float width, float height);

    /// <summary>The height that suits the drawing at a width.</summary>
    /// <param name="width">Width, points.</param>
    float HeightFor(float width);
}

/// <summary>A drawing with its caption.</summary>
/// <param name="Drawing">The drawing.</param>
/// <param name="Caption">What it shows.</param>
/// <param name="AlternativeText">What it shows, for those who cannot see it; writers that can will store it.</param>
/// <param name="Anchor">Where links lead to, or null.</param>
public sealed record Figure(IDrawing Drawing, RichText Caption, string AlternativeText, string? Anchor = null) : Block;
