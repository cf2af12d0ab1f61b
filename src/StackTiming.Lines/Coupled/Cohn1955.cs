using StackTiming.Lines.Constants;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Lines.Stripline;

namespace StackTiming.Lines.Coupled;

/// <summary>
/// Two like strips side by side midway between two planes in one dielectric: exact for thin strips. S. B. Cohn, "Shielded coupled-strip transmission line",
/// IRE Trans. MTT-3, 1955, pp. 29–38. Thickness by the paper's own correction: the coupling's part of each admittance grows with the fringing
/// capacitance of a thick edge, and the walls facing each other add a parallel plate. Lengths in any one unit.
/// </summary>
public sealed class Cohn1955 : IClosedForm
{
    /// <inheritdoc/>
    public LineMethod Method => MethodCatalogue.Cohn1955;

    /// <inheritdoc/>
    public string? Objection(CrossSection section)
    {
        var geometry = SectionGeometry.Of(section);
        if (geometry.Kind != SectionKind.EdgeCoupledStripline || !geometry.IsHomogeneous)
            return "it describes two like strips side by side between two planes in one dielectric";
        var trace = section.Conductors[0];
        double under = trace.BottomMetres - section.BottomPlaneMetres!.Value, over = section.TopPlaneMetres!.Value - trace.TopMetres;
        return Math.Abs(under - over) <= 1e-9 * (under + over) ? null : "it needs strips midway between the planes";
    }

    /// <inheritdoc/>
    public bool Suits(CrossSection section) => section.Conductors[0].ThicknessMetres == 0;

    /// <inheritdoc/>
    public LineSolution Calculate(CrossSection section)
    {
        var (a, b) = (section.Conductors[0], section.Conductors[1]);
        var dielectric = SectionGeometry.LowestDielectric(section);
        var spacing = section.TopPlaneMetres!.Value - section.BottomPlaneMetres!.Value;
        var width = 0.5 * (a.WideMetres + a.NarrowMetres);
        var gap = Math.Abs(a.CentreMetres - b.CentreMetres) - width;
        var t = a.ThicknessMetres;
        var (odd, even) = t == 0
            ? Thin(width, gap, spacing, dielectric.Dk)
            : Thick(width, gap, spacing, t, dielectric.Dk);
        var verdict = new Validity(Method).AtMost("thickness / spacing", t / spacing, 0.25).AtMost("thickness / gap", t / gap, 0.5);
        return Solved.Pair(a.Name, b.Name, Method, (odd, dielectric.Dk), (even, dielectric.Dk), [new DielectricShare(dielectric.Name, 1)], verdict.Warnings);
    }

    /// <summary>Odd and even impedance of thin strips, ohm; exact.</summary>
    /// <param name="width">Width w of each strip.</param>
    /// <param name="gap">Gap s between them.</param>
    /// <param name="spacing">Distance b between the planes.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static (double OddOhms, double EvenOhms) Thin(double width, double gap, double spacing, double dk)
    {
        var x = 0.5 * Math.PI / spacing;
        var own = Math.Tanh(x * width);
        var pitch = Math.Tanh(x * (width + gap));
        double kEven = own * pitch, kOdd = own / pitch;
        var scale = 0.25 * Vacuum.Impedance / Math.Sqrt(dk);
        return (scale * Ratio(kOdd), scale * Ratio(kEven));
    }

    /// <summary>Odd and even impedance of thick strips, ohm.</summary>
    /// <param name="width">Width w of each strip.</param>
    /// <param name="gap">Gap s between them.</param>
    /// <param name="spacing">Distance b between the planes.</param>
    /// <param name="thickness">Thickness t, above 0 and below b.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static (double OddOhms, double EvenOhms) Thick(double width, double gap, double spacing, double thickness, double dk)
    {
        var (thinOdd, thinEven) = Thin(width, gap, spacing, dk);
        var thin = 1 / Cohn1954.Z0Ohms(width, spacing, dk);
        var thick = 1 / Wheeler1978.Z0Ohms(width, spacing, thickness, dk);
        var growth = Fringe(thickness / spacing) / Fringe(0);
        var even = thick - growth * (thin - 1 / thinEven);
        var odd = thick + growth * (1 / thinOdd - thin);
        if (gap < 5 * thickness)
        {
            // Walls nearer than five thicknesses face each other like plates (the paper's second form for the odd mode).
            var plates = 2 * thickness / (gap * Vacuum.Impedance / Math.Sqrt(dk));
            odd = 1 / thinOdd + (thick - thin) - 2 / Vacuum.Impedance * Math.Sqrt(dk) * (Fringe(thickness / spacing) - Fringe(0)) + plates;
        }
        return (1 / odd, 1 / even);
    }

    /// <summary>Fringing capacitance of one thick edge to one plane over ε.</summary>
    private static double Fringe(double x) =>
        x == 0 ? 2 * Math.Log(2) / Math.PI : (2 / (1 - x) * Math.Log(1 / (1 - x) + 1) - (1 / (1 - x) - 1) * Math.Log(1 / ((1 - x) * (1 - x)) - 1)) / Math.PI;

    private static double Ratio(double k) => CompleteEllipticIntegral.ComplementRatio(k, Math.Sqrt((1 - k) * (1 + k)));
}
