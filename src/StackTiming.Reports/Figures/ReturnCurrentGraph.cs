using System.Globalization;
using SkiaSharp;
using StackTiming.Reports.Appearance;

namespace StackTiming.Reports.Figures;

/// <summary>Density of the return current along the planes, with the width that holds 95 % of it.</summary>
internal static class ReturnCurrentGraph
{
    private const float LeftMargin = 34;
    private const float BottomMargin = 24;

    /// <summary>Draws the graph.</summary>
    public static void Draw(Pen pen, SKRect area, SectionOutline outline, IReadOnlyList<PlaneCurrent> planes)
    {
        var plot = new SKRect(area.Left + LeftMargin, area.Top + 6, area.Right - 8, area.Bottom - BottomMargin);
        var reach = planes.Max(p => p.High - p.Low);
        double left = planes.Min(p => p.Low) - 0.08 * reach, right = planes.Max(p => p.High) + 0.08 * reach;
        double Within(PlaneCurrent plane, Func<double, double, double> choose) =>
            plane.AmperePerMetre.Where((_, i) => plane.X[i] >= left && plane.X[i] <= right).Aggregate(0.0, choose);
        double low = planes.Min(p => Within(p, Math.Min)), high = planes.Max(p => Within(p, Math.Max));
        // Room for the conductors under the curves and for a dimension line of each plane over them.
        (low, high) = (low - 0.08 * (high - low), high + (0.06 + 0.14 * planes.Count) * (high - low));
        SKPoint At(double x, double v) => new(
            plot.Left + plot.Width * (float)((x - left) / (right - left)), plot.Bottom - plot.Height * (float)((v - low) / (high - low)));

        DrawAxes(pen, plot, (left, right), (low, high), At);
        foreach (var conductor in outline.Conductors)
            pen.Fill(new SKRect(At(conductor.Corners.Min(c => c.X), 0).X, plot.Bottom - 3, At(conductor.Corners.Max(c => c.X), 0).X, plot.Bottom), Palette.Copper);
        for (var k = 0; k < planes.Count; k++)
            DrawPlane(pen, plot, planes[k], k, (left, right), At);
    }

    private static void DrawAxes(Pen pen, SKRect plot, (double Left, double Right) x, (double Low, double High) y, Func<double, double, SKPoint> at)
    {
        var style = TextStyle.Small with { Size = 6.6f };
        var (values, decimals) = NiceTicks.Between(y.Low, y.High, 5);
        foreach (var value in values)
        {
            var height = at(x.Left, value).Y;
            pen.Rule(plot.Left, plot.Right, height, Palette.Hairline, 0.5f);
            pen.TextEndingAt(value.ToString("F" + decimals, CultureInfo.InvariantCulture), style, plot.Left - 3, height + 2.3f);
        }
        (values, decimals) = NiceTicks.Between(x.Left * 1e3, x.Right * 1e3, 9);
        foreach (var value in values)
        {
            var place = at(value / 1e3, 0).X;
            pen.Segment(new SKPoint(place, plot.Bottom), new SKPoint(place, plot.Bottom + 3), Palette.Rule, 0.5f);
            pen.TextCentredAt(value.ToString("F" + decimals, CultureInfo.InvariantCulture), style, place, plot.Bottom + 10);
        }
        pen.Rule(plot.Left, plot.Right, plot.Bottom, Palette.Rule, 0.6f);
        pen.TextCentredAt("x, mm (conductors in copper colour)", style, plot.MidX, plot.Bottom + 20);
        pen.Canvas.Save();
        pen.Canvas.RotateDegrees(-90, plot.Left - 27, plot.MidY);
        pen.TextCentredAt("A/m", style, plot.Left - 27, plot.MidY);
        pen.Canvas.Restore();
    }

    private static void DrawPlane(
        Pen pen, SKRect plot, PlaneCurrent plane, int index, (double Left, double Right) x, Func<double, double, SKPoint> at)
    {
        var color = index == 0 ? Palette.Accent : Palette.Alarm;
        float[] dashes = index == 0 ? [] : [4, 2.5f];
        pen.Line([.. plane.X.Select((place, i) => (place, i)).Where(p => p.place >= x.Left && p.place <= x.Right).Select(p => at(p.place, plane.AmperePerMetre[p.i]))], color, 1.3f, dashes);
        // The width is dimensioned above the curves, one plane below the other.
        var y = plot.Top + 5 + 12 * index;
        var (low, high) = (at(plane.Low, 0).X, at(plane.High, 0).X);
        foreach (var end in new[] { low, high })
            pen.Segment(new SKPoint(end, y - 4), new SKPoint(end, plot.Bottom), color, 0.5f, 1.5f, 1.5f);
        pen.Segment(new SKPoint(low, y), new SKPoint(high, y), color, 0.8f, dashes);
        var style = TextStyle.Label with { Size = 6.8f, Color = color };
        var text = string.Create(
            CultureInfo.InvariantCulture, $"{plane.Name}: 95 % within {(plane.High - plane.Low) * 1e3:0.000} mm; total {plane.TotalAmperes:0.000;−0.000;0} A");
        var width = style.Face.Width(text, style.Size);
        var middle = (low + high) / 2;
        pen.Fill(new SKRect(middle - width / 2 - 3, y - 5, middle + width / 2 + 3, y + 5), Palette.Paper);
        pen.TextCentredAt(text, style, middle, y + 2.4f);
    }
}
