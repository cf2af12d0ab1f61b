using System.Globalization;
using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;

namespace StackTiming.Reports.Figures;

/// <summary>
/// A cross-section to scale under its drive: equipotentials, density of energy and of power along the line, charge on the conductors, and the return current in the planes.
/// </summary>
/// <param name="picture">What is drawn.</param>
public sealed class SectionFigure(SectionPicture picture) : IDrawing
{
    private const float Gap = 16;
    private const float TitleHeight = 26;
    private const float PanelTitle = 13;
    private const float ScaleHeight = 20;
    private const float GraphHeight = 128;

    private double Proportion => (picture.Outline.Top - picture.Outline.Bottom) / (picture.Outline.Right - picture.Outline.Left);

    /// <inheritdoc/>
    public float HeightFor(float width) =>
        TitleHeight + 2 * (PanelTitle + MapHeight(width) + ScaleHeight + 6) + (picture.Returns.IsEmpty ? 12 : PanelTitle + GraphHeight);

    /// <inheritdoc/>
    public void Draw(SKCanvas canvas, float width, float height)
    {
        using var pen = new Pen(canvas);
        pen.Text(Pen.Fit(picture.Title, TextStyle.Heading(3), width), TextStyle.Heading(3), 0, 9);
        pen.Text(Pen.Fit(picture.Drive, TextStyle.Small, width), TextStyle.Small, 0, 20);
        var (mapWidth, mapHeight) = ((width - Gap) / 2, MapHeight(width));
        var y = TitleHeight;
        var rowHeight = PanelTitle + mapHeight + ScaleHeight + 6;
        DrawPotential(pen, Panel(pen, "Equipotentials", 0, y, mapWidth, mapHeight));
        DrawCharge(pen, Panel(pen, "Charge on the conductors", mapWidth + Gap, y, mapWidth, mapHeight));
        y += rowHeight;
        DrawMap(pen, Panel(pen, "Energy of the electric field (logarithmic scale)", 0, y, mapWidth, mapHeight), picture.EnergyJoulePerCubicMetre, 1e-3, "mJ/m³");
        DrawMap(pen, Panel(pen, "Power along the line (logarithmic scale)", mapWidth + Gap, y, mapWidth, mapHeight), picture.PowerWattPerSquareMetre, 1e6, "W/mm²");
        y += rowHeight;
        if (picture.Returns.IsEmpty)
        {
            pen.Text("No infinite plane: the current returns in the conductors at zero volts.", TextStyle.Small, 0, y + 9);
            return;
        }
        PanelName(pen, $"Return current in the planes, skin effect, {picture.CurrentDrive}", 0, y, width);
        ReturnCurrentGraph.Draw(pen, new SKRect(0, y + PanelTitle, width, y + PanelTitle + GraphHeight), picture.Outline, picture.Returns);
    }

    private float MapHeight(float width) => (float)Proportion * (width - Gap) / 2;

    private SectionView Panel(Pen pen, string name, float x, float y, float width, float height)
    {
        PanelName(pen, name, x, y, width);
        return new SectionView(picture.Outline, new SKRect(x, y + PanelTitle, x + width, y + PanelTitle + height));
    }

    private static void PanelName(Pen pen, string name, float x, float y, float width) =>
        pen.Text(Pen.Fit(name, TextStyle.Label, width), TextStyle.Label, x, y + 8);

    private void DrawPotential(Pen pen, SectionView view)
    {
        double[] finite = [.. picture.PotentialVolts.Values.Where(double.IsFinite)];
        var (levels, decimals) = NiceTicks.Between(finite.Min(), finite.Max(), 20);
        view.Clipped(pen.Canvas, () =>
        {
            view.DrawDielectrics(pen);
            foreach (var level in levels)
                DrawLevel(pen, view, level);
            view.DrawMetal(pen, Palette.Copper, labels: true);
            view.DrawNames(pen);
            view.DrawScaleBar(pen);
        });
        pen.Outline(view.Area, Palette.Rule, 0.5f);
        var step = levels.Length > 1 ? levels[1] - levels[0] : 0;
        var text = string.Create(CultureInfo.InvariantCulture, $"a line every {step.ToString("F" + decimals, CultureInfo.InvariantCulture)} V; negative dashed, zero heavy");
        pen.Text(text, TextStyle.Small with { Size = 6.6f }, view.Area.Left, view.Area.Bottom + 10);
    }

    private void DrawLevel(Pen pen, SectionView view, double level)
    {
        var grid = picture.PotentialVolts;
        var (across, down) = (view.Area.Width / grid.Columns, view.Area.Height / grid.Rows);
        SKPoint Place(SKPoint p) => new(view.Area.Left + p.X * across, view.Area.Top + p.Y * down);
        var zero = Math.Abs(level) < 1e-9;
        foreach (var line in ContourLines.Of(grid, level))
            pen.Line([.. line.Select(Place)], Palette.Accent, zero ? 1.2f : 0.55f, level < -1e-9 ? [4, 2] : []);
    }

    private void DrawCharge(Pen pen, SectionView view)
    {
        var high = ChargeHairs.High([.. picture.Charges.Where(Shown)]);
        view.Clipped(pen.Canvas, () =>
        {
            view.DrawBoundaries(pen);
            ChargeHairs.Draw(pen, view, picture.Charges, high);
            view.DrawMetal(pen, new SKColor(0xC9, 0xCE, 0xD2), labels: false);
        });
        pen.Outline(view.Area, Palette.Rule, 0.5f);
        var negative = picture.Charges.Any(f => Array.Exists(f.CoulombPerSquareMetre, c => c < -0.02 * high));
        ChargeHairs.DrawKey(pen, view, high, negative, new SKPoint(view.Area.Left, view.Area.Bottom + 4 + ChargeHairs.Tall(view)));
    }

    // A pour reaches far beyond the window, where it has almost no charge.
    private bool Shown(ChargedFace face)
    {
        var middle = face.X.Length / 2;
        return face.X[middle] > picture.Outline.Left && face.X[middle] < picture.Outline.Right;
    }

    private static void DrawMap(Pen pen, SectionView view, FieldGrid grid, double unit, string unitName)
    {
        var high = SectionMap.High(grid);
        view.Clipped(pen.Canvas, () =>
        {
            SectionMap.Draw(pen, view, grid, high);
            view.DrawBoundaries(pen);
            view.DrawMetal(pen, Palette.Paper, labels: false);
        });
        pen.Outline(view.Area, Palette.Rule, 0.5f);
        SectionMap.DrawScale(pen, new SKRect(view.Area.Left, view.Area.Bottom + 4, view.Area.Right, view.Area.Bottom + ScaleHeight), high, unit, unitName);
    }
}
