using SkiaSharp;
using StackTiming.Reports.Appearance;

namespace StackTiming.Reports.Figures;

/// <summary>Draws the shapes of a cross-section to scale into a rectangle.</summary>
/// <param name="outline">The shapes.</param>
/// <param name="area">Where to; of the window's proportions.</param>
internal sealed class SectionView(SectionOutline outline, SKRect area)
{
    /// <summary>Where it is drawn.</summary>
    public SKRect Area => area;

    /// <summary>Points per metre.</summary>
    public double Scale => area.Width / (outline.Right - outline.Left);

    /// <summary>A place on the drawing.</summary>
    public SKPoint At(double x, double y) => new(
        area.Left + (float)((x - outline.Left) * Scale), area.Bottom - (float)((y - outline.Bottom) * Scale));

    /// <summary>The dielectrics, the paler the lower their permittivity.</summary>
    public void DrawDielectrics(Pen pen)
    {
        foreach (var dielectric in outline.Dielectrics)
        {
            using var path = Closed(dielectric.Corners);
            pen.Path(path, Tint(dielectric.Dk), Palette.Rule, 0.4f);
        }
    }

    /// <summary>Lines between dielectrics, for maps that colour the areas themselves.</summary>
    public void DrawBoundaries(Pen pen)
    {
        foreach (var dielectric in outline.Dielectrics)
        {
            using var path = Closed(dielectric.Corners);
            pen.Path(path, null, Palette.Ink.WithAlpha(0x60), 0.4f);
        }
    }

    /// <summary>Conductors and planes.</summary>
    /// <param name="pen">The pen.</param>
    /// <param name="fill">Colour of the metal.</param>
    /// <param name="labels">Whether names and voltages are written on the conductors.</param>
    public void DrawMetal(Pen pen, SKColor fill, bool labels)
    {
        foreach (var (height, above) in outline.PlaneHeights)
        {
            var y = At(0, height).Y;
            pen.Fill(above ? new SKRect(area.Left, area.Top, area.Right, y) : new SKRect(area.Left, y, area.Right, area.Bottom), fill);
            pen.Rule(area.Left, area.Right, y, Palette.Ink, 0.5f);
        }
        foreach (var conductor in outline.Conductors)
        {
            using var path = Closed(conductor.Corners);
            pen.Path(path, fill, Palette.Ink, 0.5f);
            if (labels)
                DrawLabel(pen, conductor, path.Bounds);
        }
    }

    /// <summary>Names of the dielectrics at the left edge, where they fit.</summary>
    public void DrawNames(Pen pen)
    {
        var style = TextStyle.Small with { Size = 6.2f, Color = Palette.Ink };
        foreach (var dielectric in outline.Dielectrics)
        {
            using var path = Closed(dielectric.Corners);
            var bounds = path.Bounds;
            bounds.Intersect(area);
            if (dielectric.Name.Length == 0)
                continue;
            // In the area where it has room, else over it.
            var text = Pen.Fit(dielectric.Name, style, area.Width / 3);
            var baseline = bounds.Height >= style.Size + 1 ? bounds.Bottom - 2.5f : bounds.Top - 2f;
            pen.Fill(new SKRect(area.Left + 2, baseline - style.Size + 0.5f, area.Left + 4 + style.Face.Width(text, style.Size), baseline + 1.7f), Palette.Paper.WithAlpha(0xB0));
            pen.Text(text, style, area.Left + 3, baseline);
        }
    }

    /// <summary>A bar of a round length.</summary>
    public void DrawScaleBar(Pen pen)
    {
        var micrometres = RoundDown(area.Width / Scale / 5 * 1e6);
        var length = (float)(micrometres * 1e-6 * Scale);
        var (right, y) = (area.Right - 6, area.Top + 15);
        var text = micrometres >= 1000 ? $"{Number(micrometres / 1000)} mm" : $"{Number(micrometres)} µm";
        var style = TextStyle.Label with { Size = 6.8f, Color = Palette.Ink };
        var width = Math.Max(length, style.Face.Width(text, style.Size));
        pen.Fill(new SKRect(right - width - 4, y - 12, right + 4, y + 4), Palette.Paper.WithAlpha(0xD8));
        pen.Rule(right - length, right, y, Palette.Ink, 1.4f);
        pen.TextCentredAt(text, style, right - length / 2, y - 3.5f);
    }

    /// <summary>Draws inside the window only.</summary>
    public void Clipped(SKCanvas canvas, Action draw)
    {
        canvas.Save();
        canvas.ClipRect(area);
        draw();
        canvas.Restore();
    }

    private void DrawLabel(Pen pen, ConductorShape conductor, SKRect bounds)
    {
        bounds.Intersect(area);
        var style = TextStyle.Label with { Size = 6.4f, Color = Palette.Paper };
        var text = conductor.Name + (conductor.Label.Length > 0 ? " " + conductor.Label : "");
        if (style.Face.Width(text, style.Size) > bounds.Width - 3)
            text = conductor.Name;
        if (bounds.Height >= style.Size && style.Face.Width(text, style.Size) <= bounds.Width - 3)
            pen.TextCentredAt(Pen.Fit(text, style, bounds.Width), style, bounds.MidX, bounds.MidY + style.Size * 0.36f);
    }

    private SKPath Closed(IReadOnlyList<(double X, double Y)> corners)
    {
        var path = new SKPath();
        path.AddPoly([.. corners.Select(c => At(c.X, c.Y))], true);
        return path;
    }

    private static SKColor Tint(double dk)
    {
        var share = Math.Clamp((dk - 1) / 5, 0, 1);
        return new SKColor((byte)(0xFC - 0x22 * share), (byte)(0xFB - 0x20 * share), (byte)(0xF7 - 0x2C * share));
    }

    private static double RoundDown(double value)
    {
        var power = Math.Pow(10, Math.Floor(Math.Log10(value)));
        return power * ((value / power) switch { >= 5 => 5, >= 2 => 2, _ => 1 });
    }

    private static string Number(double value) => value.ToString("0.######", System.Globalization.CultureInfo.InvariantCulture);
}
