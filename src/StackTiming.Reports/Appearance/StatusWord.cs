using SkiaSharp;
using StackTiming.Reports.Fonts;
using StackTiming.Rules.Findings;

namespace StackTiming.Reports.Appearance;

/// <summary>The mark of a status: always its word, in a box whose form differs too, so that neither colour nor its lack misleads.</summary>
public static class StatusWord
{
    private const float LetterSize = 6.6f;
    private const float BoxHeight = 10.5f;

    /// <summary>Width of the box, the same for every status, points.</summary>
    public const float Width = 49f;

    /// <summary>The word.</summary>
    /// <param name="status">The status.</param>
    public static string Of(FindingStatus status) => status switch
    {
        FindingStatus.Pass => "PASS",
        FindingStatus.Fail => "FAIL",
        FindingStatus.Waived => "WAIVED",
        _ => "UNCHECKED",
    };

    /// <summary>Draws the mark.</summary>
    /// <param name="canvas">What to draw on.</param>
    /// <param name="status">The status.</param>
    /// <param name="x">Left edge, points.</param>
    /// <param name="baseline">Baseline of the text beside it, points.</param>
    public static void Draw(SKCanvas canvas, FindingStatus status, float x, float baseline)
    {
        var box = SKRect.Create(x + 0.4f, baseline - 8.1f, Width - 0.8f, BoxHeight);
        using var paint = new SKPaint { IsAntialias = true, Color = status == FindingStatus.Fail ? Palette.Alarm : Palette.Rule, StrokeWidth = 0.7f };
        paint.Style = status == FindingStatus.Fail ? SKPaintStyle.Fill : SKPaintStyle.Stroke;
        if (status == FindingStatus.Unchecked)
        {
            paint.Color = Palette.Ink;
            using var dashes = SKPathEffect.CreateDash([2.2f, 1.6f], 0);
            paint.PathEffect = dashes;
            canvas.DrawRect(box, paint);
            paint.PathEffect = null;
        }
        else if (status == FindingStatus.Waived)
        {
            canvas.DrawRect(box, paint);
            canvas.DrawLine(box.Left, box.Bottom - 1.6f, box.Right, box.Bottom - 1.6f, paint);
        }
        else
        {
            canvas.DrawRect(box, paint);
        }

        var face = ReportFonts.Instance.SemiBold;
        using var font = face.At(LetterSize);
        paint.Style = SKPaintStyle.Fill;
        paint.Color = status switch
        {
            FindingStatus.Fail => Palette.Paper,
            FindingStatus.Pass => Palette.Accent,
            _ => Palette.Ink,
        };
        var word = Of(status);
        canvas.DrawText(word, box.MidX - face.Width(word, LetterSize) / 2, baseline - 0.5f, font, paint);
    }
}
