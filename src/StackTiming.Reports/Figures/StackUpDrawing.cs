using System.Collections.Immutable;
using System.Globalization;
using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;
using StackTiming.Stackups.Layers;

namespace StackTiming.Reports.Figures;

/// <summary>What a line on a layer does, for the drawing of a stack-up.</summary>
/// <param name="Layer">Copper layer.</param>
/// <param name="Text">Its geometry and impedance, such as <c>0.110 mm → 50.2 Ω</c>.</param>
public readonly record struct LineLabel(string Layer, string Text);

/// <summary>
/// A stack-up from the side: heights to scale wherever the layer is thick enough to be seen, names at the left, materials in the
/// middle, the lines with their impedances at the right.
/// </summary>
/// <param name="stackUp">The stack-up.</param>
/// <param name="lines">What is written beside the copper layers.</param>
public sealed class StackUpDrawing(StackUp stackUp, ImmutableArray<LineLabel> lines) : IDrawing
{
    private const float PreferredHeight = 240;
    private const float LeastCopper = 7.5f;
    private const float LeastDielectric = 12.5f;
    private const float HeadHeight = 14;
    private const float FootHeight = 16;
    private const float LabelHeight = 9.6f;

    private readonly float[] heights = Heights(stackUp);

    /// <summary>Whether every layer is drawn to scale; where not, thin ones are drawn thicker.</summary>
    public bool IsToScale { get; } = stackUp.Layers.All(l => Micrometres(l) / Total(stackUp) * PreferredHeight >= Least(l));

    /// <inheritdoc/>
    public float HeightFor(float width) => HeadHeight + MathF.Max(heights.Sum(), lines.Length * LabelHeight) + FootHeight;

    /// <inheritdoc/>
    public void Draw(SKCanvas canvas, float width, float height)
    {
        using var pen = new Pen(canvas);
        var label = TextStyle.Label with { Size = 7f };
        float nameRight = 62, left = 70, right = width * 0.60f, lineLeft = right + 56;
        pen.TextEndingAt("layer", label, nameRight, 8);
        pen.Text("material, thickness, Dk, Df", label, left, 8);
        pen.Text("lines on the layer", label, lineLeft, 8);

        var y = HeadHeight;
        var anchors = new List<(LineLabel Label, float Y)>();
        for (var i = 0; i < stackUp.Layers.Length; i++)
        {
            var area = new SKRect(left, y, right, y + heights[i]);
            switch (stackUp.Layers[i])
            {
                case CopperLayer copper:
                    DrawCopper(pen, copper, area, nameRight);
                    foreach (var line in lines.Where(l => l.Layer == copper.Name))
                        anchors.Add((line, area.MidY));
                    break;
                case DielectricLayer dielectric:
                    DrawDielectric(pen, dielectric, area);
                    break;
                case MaskLayer mask:
                    DrawMask(pen, mask, area);
                    break;
                default:
                    break;
            }
            y += heights[i];
        }
        pen.Outline(new SKRect(left, HeadHeight, right, y), Palette.Ink, 0.5f);
        DrawTotal(pen, HeadHeight, y);
        DrawLabels(pen, anchors, right, lineLeft, width, HeadHeight, height - FootHeight);
    }

    private static void DrawCopper(Pen pen, CopperLayer copper, SKRect area, float nameRight)
    {
        var style = TextStyle.Cell with { Size = 7.4f, Face = TextStyle.Heading(1).Face };
        var quiet = TextStyle.Cell with { Size = 6.8f, Color = Palette.Quiet };
        if (copper.Use == CopperUse.Plane)
        {
            pen.Fill(area, Palette.Copper);
        }
        else
        {
            // Traces, cut across: on a mixed layer a pour lies beside them.
            pen.Fill(area, Palette.Wash);
            var step = area.Width / 22;
            var pourFrom = copper.Use == CopperUse.Mixed ? 13 : 22;
            for (var i = 1; i < pourFrom; i += 3)
                pen.Fill(SKRect.Create(area.Left + i * step, area.Top, step * 0.9f, area.Height), Palette.Copper);
            if (pourFrom < 22)
                pen.Fill(new SKRect(area.Left + pourFrom * step, area.Top, area.Right, area.Bottom), Palette.Copper);
        }
        var baseline = area.MidY + 2.6f;
        pen.TextEndingAt(Pen.Fit(copper.Name, style, 32), style, nameRight, baseline);
        pen.TextEndingAt(copper.Use switch { CopperUse.Plane => "plane", CopperUse.Mixed => "mixed", _ => "signal" }, quiet, nameRight - 34, baseline);
        pen.Text(Micro(copper.Thickness.Value), quiet, area.Right + 4, baseline);
    }

    private static void DrawDielectric(Pen pen, DielectricLayer dielectric, SKRect area)
    {
        var style = TextStyle.Cell with { Size = 7.2f };
        var core = dielectric.Kind == DielectricKind.Core;
        pen.Fill(area, core ? new SKColor(0xDF, 0xE4, 0xE4) : Palette.Paper);
        if (!core)
        {
            for (var y = area.Top + 3; y < area.Bottom - 1; y += 5)
                pen.Segment(new SKPoint(area.Left, y), new SKPoint(area.Right, y), Palette.Hairline, 0.4f, 5, 4);
        }
        pen.Rule(area.Left, area.Right, area.Top, Palette.Rule, 0.3f);
        pen.Rule(area.Left, area.Right, area.Bottom, Palette.Rule, 0.3f);
        var text = string.Create(CultureInfo.InvariantCulture,
            $"{dielectric.Material.Name} ({(core ? "core" : "prepreg")}), {Micro(dielectric.Thickness.Value)}, Dk {dielectric.Material.Dk.Value:0.00#}, Df {dielectric.Material.Df.Value:0.000#}");
        WriteOn(pen, text, style, area);
    }

    private static void DrawMask(Pen pen, MaskLayer mask, SKRect area)
    {
        pen.Fill(area, new SKColor(0xC4, 0xCE, 0xC9));
        var text = string.Create(CultureInfo.InvariantCulture,
            $"{mask.Material.Name} (mask), {Micro(mask.OverLaminate.Value)}, on copper {Micro(mask.OverCopper.Value)}, Dk {mask.Material.Dk.Value:0.00#}");
        WriteOn(pen, text, TextStyle.Cell with { Size = 7.2f }, area);
    }

    private static void WriteOn(Pen pen, string text, TextStyle style, SKRect area)
    {
        var shown = Pen.Fit(text, style, area.Width - 12);
        pen.TextCentredAt(shown, style, area.MidX, area.MidY + 2.6f);
    }

    private void DrawTotal(Pen pen, float top, float bottom)
    {
        var label = TextStyle.Label with { Size = 7f, Color = Palette.Ink };
        const float x = 5;
        pen.Segment(new SKPoint(x, top), new SKPoint(x, bottom), Palette.Rule, 0.6f);
        pen.Rule(x - 3, x + 3, top, Palette.Rule, 0.6f);
        pen.Rule(x - 3, x + 3, bottom, Palette.Rule, 0.6f);
        var laminate = stackUp.Layers.Where(l => l is not MaskLayer).Sum(Micrometres);
        pen.Text(string.Create(CultureInfo.InvariantCulture, $"{laminate / 1000:0.000} mm without mask{(IsToScale ? ", to scale" : "; thin layers are drawn thicker")}"), label, 0, bottom + 11);
    }

    // Labels stand beside their layers; where they would overlap they are pushed apart, and a thin line leads back.
    private static void DrawLabels(Pen pen, List<(LineLabel Label, float Y)> anchors, float from, float x, float width, float top, float bottom)
    {
        if (anchors.Count == 0)
            return;
        var style = TextStyle.Cell with { Size = 7.6f };
        var places = new float[anchors.Count];
        var next = top + LabelHeight / 2;
        for (var i = 0; i < places.Length; i++)
        {
            var run = anchors.Count(a => a.Y == anchors[i].Y);
            var inRun = i - anchors.FindIndex(a => a.Y == anchors[i].Y);
            places[i] = MathF.Max(next, anchors[i].Y + (inRun - (run - 1) / 2f) * LabelHeight);
            next = places[i] + LabelHeight;
        }
        var limit = bottom - LabelHeight / 2;
        for (var i = places.Length - 1; i >= 0; i--)
        {
            places[i] = MathF.Min(places[i], limit);
            limit = places[i] - LabelHeight;
        }
        for (var i = 0; i < places.Length; i++)
        {
            pen.Segment(new SKPoint(from + 36, anchors[i].Y), new SKPoint(x - 4, places[i]), Palette.Rule, 0.4f);
            pen.Text(Pen.Fit(anchors[i].Label.Text, style, width - x), style, x, places[i] + 2.7f);
        }
    }

    private static float[] Heights(StackUp stackUp)
    {
        var total = Total(stackUp);
        return [.. stackUp.Layers.Select(l => MathF.Max(Least(l), (float)(Micrometres(l) / total) * PreferredHeight))];
    }

    private static float Least(Layer layer) => layer is CopperLayer ? LeastCopper : LeastDielectric;

    private static double Total(StackUp stackUp) => Math.Max(1e-3, stackUp.Layers.Sum(Micrometres));

    private static double Micrometres(Layer layer) => 1e6 * layer switch
    {
        CopperLayer copper => copper.Thickness.Value,
        DielectricLayer dielectric => dielectric.Thickness.Value,
        MaskLayer mask => mask.OverLaminate.Value,
        _ => 0,
    };

    private static string Micro(double metres) => (metres * 1e6).ToString("0.#", CultureInfo.InvariantCulture) + " µm";
}
