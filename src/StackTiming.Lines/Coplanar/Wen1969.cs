using StackTiming.Lines.Constants;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Lines.Stripline;

namespace StackTiming.Lines.Coplanar;

/// <summary>
/// Thin strip between two wide grounds on a thick dielectric without a plane, exact. C. P. Wen, "Coplanar waveguide: a surface strip transmission line suitable for
/// nonreciprocal gyromagnetic device applications", IEEE Trans. MTT-17, 1969, pp. 1087–1090. Needs grounds and dielectric far larger than the slots. Lengths in any one unit.
/// </summary>
public sealed class Wen1969 : IClosedForm
{
    private const double Large = 10;

    /// <inheritdoc/>
    public LineMethod Method => MethodCatalogue.Wen1969;

    /// <inheritdoc/>
    public string? Objection(CrossSection section) =>
        section.BottomPlaneMetres is null && section.TopPlaneMetres is null && section.TopMask is null && section.BottomMask is null
        && section.Slabs.Length <= 1 && CoplanarShape.Of(section) is { IsSymmetric: true } && StandsOnSlab(section)
            ? null
            : "it describes a trace between two like pours on one dielectric without a plane";

    /// <inheritdoc/>
    public bool Suits(CrossSection section) => Verdict(section).Warnings.IsEmpty;

    /// <inheritdoc/>
    public LineSolution Calculate(CrossSection section)
    {
        var shape = CoplanarShape.Of(section)!.Value;
        var dielectric = SectionGeometry.LowestDielectric(section);
        var epsEff = 0.5 * (dielectric.Dk + 1);
        var shares = EnergyShares.ByName([dielectric, SectionDielectric.Air], [0.5 * dielectric.Dk / epsEff, 0.5 / epsEff]);
        return Solved.Single(shape.Name, Method, Z0Ohms(shape.Width, shape.Gap, dielectric.Dk), epsEff, shares, Verdict(section).Warnings);
    }

    /// <summary>Characteristic impedance in ohm.</summary>
    /// <param name="width">Width of the strip.</param>
    /// <param name="gap">Gap to either ground.</param>
    /// <param name="dk">Relative permittivity of the dielectric.</param>
    public static double Z0Ohms(double width, double gap, double dk)
    {
        var whole = width + 2 * gap;
        var k = width / whole;
        var complement = 2 * Math.Sqrt(gap * (width + gap)) / whole;
        return 0.25 * Vacuum.Impedance / Math.Sqrt(0.5 * (dk + 1)) * CompleteEllipticIntegral.ComplementRatio(k, complement);
    }

    private Validity Verdict(CrossSection section)
    {
        var shape = CoplanarShape.Of(section)!.Value;
        var whole = shape.Width + 2 * shape.Gap;
        var validity = new Validity(Method)
            .AtMost("thickness / gap", shape.Thickness / shape.Gap, 0.001)
            .Within("pour width / slot region", shape.PourWidth / whole, Large, double.PositiveInfinity);
        return section.Slabs.IsEmpty ? validity : validity.Within("dielectric thickness / slot region", section.Slabs[0].ThicknessMetres / whole, Large, double.PositiveInfinity);
    }

    private static bool StandsOnSlab(CrossSection section) =>
        section.Slabs.IsEmpty || Math.Abs(section.Conductors[0].BottomMetres - section.Slabs[0].TopMetres) <= 1e-9 * section.Slabs[0].ThicknessMetres;
}
