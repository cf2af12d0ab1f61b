using System.Text;
using System.Xml.Linq;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Figures;
using Xunit;

namespace StackTiming.Reports.Tests.Figures;

public class SectionFigureTests
{
    [Fact]
    public void Every_scale_of_a_section_has_its_unit()
    {
        var text = TextOf(new SectionFigure(Picture(1)));
        foreach (var expected in new[] { "a line every 0.05 V", "mJ/m³", "W/mm²", "nC/m²", "A/m", "x, mm", "µm", "95 % within 0.300 mm", "total 1.000 A", "core, Dk 4.00", "a +1 V" })
            Assert.Contains(expected, text, StringComparison.Ordinal);
    }

    [Fact]
    public void Section_without_planes_says_where_its_current_returns()
    {
        var figure = new SectionFigure(Picture(1) with { Returns = [] });
        Assert.Contains("returns in the conductors", TextOf(figure), StringComparison.Ordinal);
        Assert.True(figure.HeightFor(720) < new SectionFigure(Picture(1)).HeightFor(720));
    }

    [Fact]
    public void Section_whose_fields_have_gaps_or_nothing_is_drawn_all_the_same()
    {
        var picture = Picture(1);
        picture.EnergyJoulePerCubicMetre.Values[7] = double.NaN;
        Array.Fill(picture.PowerWattPerSquareMetre.Values, double.NaN);
        Assert.NotEmpty(TextOf(new SectionFigure(picture with { Charges = [] })));
    }

    /// <summary>The lines x = const of a linear field lie where the value says, in one run from the top to the bottom.</summary>
    [Fact]
    public void Contour_of_a_linear_field_is_a_straight_line()
    {
        var grid = new FieldGrid(20, 10, [.. Enumerable.Range(0, 200).Select(i => i % 20 + 0.5)]);

        var line = Assert.Single(ContourLines.Of(grid, 7.3));

        Assert.Equal(10, line.Length);
        Assert.All(line, p => Assert.Equal(7.3f, p.X, 1e-4f));
        Assert.Equal(9, Math.Abs(line[^1].Y - line[0].Y), 1e-4);
    }

    [Fact]
    public void Contour_of_a_cone_is_one_closed_circle()
    {
        var grid = new FieldGrid(60, 60, [.. Enumerable.Range(0, 3600).Select(i => Math.Sqrt(Math.Pow(i % 60 + 0.5 - 30, 2) + Math.Pow(i / 60 + 0.5 - 30, 2)))]);

        var line = Assert.Single(ContourLines.Of(grid, 20));

        Assert.All(line, p => Assert.Equal(20, Math.Sqrt(Math.Pow(p.X - 30, 2) + Math.Pow(p.Y - 30, 2)), 0.05));
        Assert.Equal(line[0].X, line[^1].X, 1e-3);
    }

    [Fact]
    public void Colours_fall_evenly_in_lightness_so_that_a_grey_print_keeps_their_order()
    {
        // Luma after ITU-R BT.601, the grey of a printer.
        double[] luma = [.. Enumerable.Range(0, 101).Select(i => ColourScale.At(i / 100.0)).Select(c => 0.299 * c.Red + 0.587 * c.Green + 0.114 * c.Blue)];
        for (var i = 1; i < luma.Length; i++)
            Assert.True(luma[i] < luma[i - 1], $"{i}");
        Assert.True(luma[0] - luma[100] > 180);
        Assert.Equal(ColourScale.At(0), ColourScale.At(-3));
        Assert.Equal(ColourScale.At(1), ColourScale.At(9));
    }

    [Fact]
    public void Sweep_shows_causes_units_and_decades_of_each_wave()
    {
        double[] hertz = [1e6, 1e7, 1e8, 1e9];
        SweepWave Wave(string name) => new(name, [0.1, 0.3, 1, 3], [0, 0, 0.1, 1], [0.002, 0.02, 0.2, 2], [7e-9, 6.5e-9, 6.2e-9, 6e-9]);
        var text = TextOf(new SweepFigure(new SweepCurves("pair", hertz, [Wave("differential"), Wave("common")])));
        foreach (var expected in new[] { "differential wave: attenuation, dB/m", "common wave: delay, ps/mm", "smooth copper", "roughness", "dielectrics", "whole", "10 MHz", "1 GHz" })
            Assert.Contains(expected, text, StringComparison.Ordinal);
    }

    [Fact]
    public void Figure_of_its_own_is_a_pdf_of_one_page()
    {
        using var stream = new MemoryStream();
        FigureFile.WritePdf(new SectionFigure(Picture(1)), "section", 720, stream);
        using var pdf = UglyToad.PdfPig.PdfDocument.Open(stream.ToArray());
        Assert.Equal(1, pdf.NumberOfPages);
        Assert.Contains("Equipotentials", pdf.GetPage(1).Text, StringComparison.Ordinal);
    }

    private static SectionPicture Picture(double volts)
    {
        const double h = 100e-6;
        var outline = new SectionOutline(
            -4 * h, -0.1 * h, 4 * h, 3 * h,
            [new DielectricArea("core, Dk 4.00", 4, [(-5 * h, 0), (5 * h, 0), (5 * h, h), (-5 * h, h)])],
            [new ConductorShape("a", "+1 V", [(-h, h), (h, h), (0.9 * h, 1.4 * h), (-0.9 * h, 1.4 * h)])],
            [(0, false)]);
        FieldGrid Grid(double scale) => new(40, 20, [.. Enumerable.Range(0, 800).Select(i => scale * (i % 40 + 1) / 40)]);
        double[] x = [-3 * h, -h, 0, h, 3 * h];
        return new SectionPicture(
            "a.section.yaml: Z0 50.0 Ω", "Drive a +1 V", outline, Grid(volts), Grid(1e-3), Grid(1e6),
            [new ChargedFace([-0.5 * h, 0, 0.5 * h], [h, h, h], 0, -1, [2e-7, 1e-7, 2e-7])],
            [new PlaneCurrent("plane below", x, [100, 1000, 2000, 1000, 100], -1.5 * h, 1.5 * h, 1)], "a +1 A");
    }

    private static string TextOf(IDrawing drawing)
    {
        using var stream = new MemoryStream();
        FigureFile.WriteSvg(drawing, 720, stream);
        return string.Join('\n', XDocument.Parse(Encoding.UTF8.GetString(stream.ToArray())).Descendants().Where(e => e.Name.LocalName == "text").Select(e => e.Value.Trim()));
    }
}
