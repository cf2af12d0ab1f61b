using StackTiming.Lines.Constants;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Stripline;

/// <summary>
/// Thick strip midway between two planes. H. A. Wheeler, "Transmission-line properties of a stripline between parallel planes", IEEE Trans. MTT-26,
/// 1978, pp. 866–876. Stated accuracy 0.5 % for w′/(b−t) &lt; 10. Lengths in any one unit.
/// A strip off the middle, or between two dielectrics, has the mean of the capacitances of the two centred lines that have its distance to either plane
/// (capacitance partition, common practice); a trapezoid counts as the rectangle of the mean width.
/// </summary>
public sealed class Wheeler1978 : IClosedForm
{
    private const double MostFlatWidth = 10;

    /// <summary>Largest error of 25 random centred rectangles against the field solver.</summary>
    private const double CentredError = 0.007;

    /// <inheritdoc/>
    public LineMethod Method => MethodCatalogue.Wheeler1978;

    /// <inheritdoc/>
    public string? Objection(CrossSection section) =>
        SectionGeometry.Of(section).Kind == SectionKind.Stripline ? null : "it describes one trace between two planes";

    /// <inheritdoc/>
    public bool Suits(CrossSection section)
    {
        var geometry = SectionGeometry.Of(section);
        var trace = section.Conductors[0];
        return geometry.IsCentred && geometry.IsHomogeneous && trace.WideMetres - trace.NarrowMetres <= 1e-3 * trace.WideMetres
            && FlatWidth(section) < MostFlatWidth;
    }

    /// <inheritdoc/>
    public LineSolution Calculate(CrossSection section)
    {
        var trace = section.Conductors[0];
        double bottom = section.BottomPlaneMetres!.Value, top = section.TopPlaneMetres!.Value;
        var width = 0.5 * (trace.WideMetres + trace.NarrowMetres);
        double Capacitance(double below, double above, double[] dks) =>
            0.5 * (dks[0] * CapacitanceInAir(width, below, trace.ThicknessMetres) + dks[1] * CapacitanceInAir(width, above, trace.ThicknessMetres));
        double under = trace.BottomMetres - bottom, over = top - trace.TopMetres;
        double[] dks = [SeriesDk(section, bottom, trace.BottomMetres), SeriesDk(section, trace.TopMetres, top)];
        var filled = Capacitance(under, over, dks);
        var air = Capacitance(under, over, [1, 1]);
        var z0 = 1 / (Vacuum.SpeedOfLight * Math.Sqrt(filled * air));
        var dielectrics = section.Slabs.Select(s => s.Dielectric).Distinct().ToArray();
        var shares = EnergyShares.FromPermittivity(dielectrics, values =>
        {
            var varied = section with { Slabs = [.. section.Slabs.Select(s => s with { Dielectric = s.Dielectric with { Dk = values[Array.IndexOf(dielectrics, s.Dielectric)] } })] };
            return Capacitance(under, over, [SeriesDk(varied, bottom, trace.BottomMetres), SeriesDk(varied, trace.TopMetres, top)]);
        });
        var verdict = new Validity(Method)
            .AtMost("width / (spacing − thickness)", FlatWidth(section), MostFlatWidth)
            .AtMost("thickness / spacing", trace.ThicknessMetres / (top - bottom), 0.5)
            .AtMost("distance to the farther plane / distance to the nearer", Math.Max(under, over) / Math.Min(under, over), 3);
        var solution = Solved.Single(trace.Name, Method, z0, filled / air, shares, verdict.Warnings);
        return Suits(section) ? solution with { RelativeError = CentredError } : solution;
    }

    /// <summary>Characteristic impedance of a centred strip in ohm.</summary>
    /// <param name="width">Width w.</param>
    /// <param name="spacing">Distance b between the planes.</param>
    /// <param name="thickness">Thickness t, below b; 0 for a thin strip.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static double Z0Ohms(double width, double spacing, double thickness, double dk)
    {
        var free = spacing - thickness;
        var flat = width / free;
        if (thickness > 0)
        {
            var x = thickness / spacing;
            var m = 2 / (1 + 2.0 / 3 * x / (1 - x));
            var a = x / (2 - x);
            var c = 0.0796 * x / (width / spacing + 1.1 * x);
            flat += x / (Math.PI * (1 - x)) * (1 - 0.5 * Math.Log(a * a + Math.Pow(c, m)));
        }
        var inverse = 8 / (Math.PI * flat);
        return 30 / Math.Sqrt(dk) * Math.Log(1 + 0.5 * inverse * (inverse + Math.Sqrt(inverse * inverse + 6.27)));
    }

    private static double CapacitanceInAir(double width, double distance, double thickness) =>
        1 / (Vacuum.SpeedOfLight * Z0Ohms(width, 2 * distance + thickness, thickness, 1));

    private static double FlatWidth(CrossSection section)
    {
        var trace = section.Conductors[0];
        return 0.5 * (trace.WideMetres + trace.NarrowMetres) / (section.TopPlaneMetres!.Value - section.BottomPlaneMetres!.Value - trace.ThicknessMetres);
    }

    /// <summary>Permittivity of the slabs between two heights, one on the other like capacitors in series.</summary>
    private static double SeriesDk(CrossSection section, double from, double to)
    {
        double filled = 0, electrical = 0;
        foreach (var slab in section.Slabs)
        {
            var part = Math.Min(slab.TopMetres, to) - Math.Max(slab.BottomMetres, from);
            if (part <= 0)
                continue;
            filled += part;
            electrical += part / slab.Dielectric.Dk;
        }
        return (to - from) / (electrical + (to - from - filled));
    }
}
