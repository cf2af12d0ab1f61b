using SkiaSharp;

namespace StackTiming.Reports.Appearance;

/// <summary>A relative margin as a bar about a line at zero: to the right what is left, to the left by how much it fails.</summary>
public static class MarginBar
{
    /// <summary>Width of the bar's field, points.</summary>
    public const float Width = 64f;

    /// <summary>Draws the bar.</summary>
    /// <param name="canvas">What to draw on.</param>
    /// <param name="relativeMargin">The margin as a share of what the rule allows; beyond ±1 the bar ends in an arrow.</param>
    /// <param name="x">Left edge, points.</param>
    /// <param name="baseline">Baseline of the text beside it, points.</param>
    public static void Draw(SKCanvas canvas, double relativeMargin, float x, float baseline)
    {
        if (!double.IsFinite(relativeMargin))
            return;
        const float half = Width / 2 - 4;
        float centre = x + Width / 2, middle = baseline - 2.8f, thickness = 4.4f;
        using var paint = new SKPaint { IsAntialias = true, Color = Palette.Hairline, StrokeWidth = 0.6f };
        canvas.DrawLine(centre - half, middle, centre + half, middle, paint);

        var fails = relativeMargin < 0;
        var end = centre + half * (float)Math.Clamp(relativeMargin, -1, 1);
        paint.Color = fails ? Palette.Alarm : Palette.Accent;
        canvas.DrawRect(new SKRect(MathF.Min(centre, end), middle - thickness / 2, MathF.Max(centre, end), middle + thickness / 2), paint);
        if (Math.Abs(relativeMargin) > 1)
        {
            var direction = fails ? -1 : 1;
            using var arrow = new SKPath();
            arrow.MoveTo(end, middle - thickness / 2);
            arrow.LineTo(end + direction * 3.6f, middle);
            arrow.LineTo(end, middle + thickness / 2);
            arrow.Close();
            canvas.DrawPath(arrow, paint);
        }
        paint.Color = Palette.Ink;
        paint.StrokeWidth = 0.8f;
        canvas.DrawLine(centre, middle - 4.2f, centre, middle + 4.2f, paint);
    }
}
