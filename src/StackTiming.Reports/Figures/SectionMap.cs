using System.Globalization;
using SkiaSharp;
using StackTiming.Reports.Appearance;

namespace StackTiming.Reports.Figures;

/// <summary>A density over a cross-section in colours, on a logarithmic scale of four decades below its highest values.</summary>
internal static class SectionMap
{
    private const int Decades = 4;

    // Towards corners a field grows without bound; the highest thousandth does not set the scale.
    private const double Counted = 0.999;

    /// <summary>Draws the map.</summary>
    public static void Draw(Pen pen, SectionView view, FieldGrid grid, double high)
    {
        using var bitmap = new SKBitmap(new SKImageInfo(grid.Columns, grid.Rows, SKColorType.Rgba8888, SKAlphaType.Opaque));
        for (var row = 0; row < grid.Rows; row++)
        {
            for (var column = 0; column < grid.Columns; column++)
            {
                var value = grid.Values[row * grid.Columns + column];
                bitmap.SetPixel(column, row, value > 0 ? ColourScale.At(1 + Math.Log10(value / high) / Decades) : ColourScale.At(0));
            }
        }
        using var image = SKImage.FromBitmap(bitmap);
        pen.Canvas.DrawImage(image, view.Area, new SKSamplingOptions(SKFilterMode.Linear));
    }

    /// <summary>The high end of the scale: the round value (1, 2 or 5) above all but the highest thousandth.</summary>
    public static double High(FieldGrid grid)
    {
        double[] values = [.. grid.Values.Where(v => double.IsFinite(v) && v > 0)];
        if (values.Length == 0)
            return 1;
        Array.Sort(values);
        var value = values[(int)(Counted * (values.Length - 1))];
        var power = Math.Pow(10, Math.Floor(Math.Log10(value)));
        return power * ((value / power) switch { <= 1 => 1, <= 2 => 2, <= 5 => 5, _ => 10 });
    }

    /// <summary>The colour bar with its values under the map.</summary>
    public static void DrawScale(Pen pen, SKRect area, double high, double unit, string unitName)
    {
        const int steps = 100;
        for (var i = 0; i < steps; i++)
        {
            var left = area.Left + area.Width * i / steps;
            // A little wider than a step, so that no seam shows between them.
            pen.Fill(new SKRect(left, area.Top, Math.Min(area.Right, left + area.Width / steps + 0.6f), area.Top + 6), ColourScale.At((i + 0.5) / steps));
        }
        pen.Outline(new SKRect(area.Left, area.Top, area.Right, area.Top + 6), Palette.Quiet, 0.4f);
        var style = TextStyle.Small with { Size = 6.6f };
        for (var decade = 0; decade <= Decades; decade++)
        {
            var x = area.Left + area.Width * decade / Decades;
            var text = (high / unit * Math.Pow(10, decade - Decades)).ToString("0.######", CultureInfo.InvariantCulture);
            text = decade == 0 ? "≤ " + text : decade == Decades ? $"≥ {text} {unitName}" : text;
            if (decade == 0)
                pen.Text(text, style, x, area.Top + 14);
            else if (decade == Decades)
                pen.TextEndingAt(text, style, x, area.Top + 14);
            else
                pen.TextCentredAt(text, style, x, area.Top + 14);
            pen.Segment(new SKPoint(x, area.Top), new SKPoint(x, area.Top + 7.5f), Palette.Quiet, 0.4f);
        }
    }
}
