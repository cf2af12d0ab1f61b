using StackTiming.Lines.Constants;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Stripline;

/// <summary>
/// Thin strip midway between two planes in one dielectric, exact. S. B. Cohn, "Characteristic impedance of the shielded-strip transmission
/// line", IRE Trans. MTT-2, 1954, pp. 52–57: Z₀√ε_r = (η₀/4)·K(k)/K(k′) with k = sech(πw/2b). Any w/b; zero thickness only. Lengths in any one unit.
/// </summary>
public sealed class Cohn1954 : IClosedForm
{
    /// <inheritdoc/>
    public LineMethod Method => MethodCatalogue.Cohn1954;

    /// <inheritdoc/>
    public string? Objection(CrossSection section)
    {
        var geometry = SectionGeometry.Of(section);
        return geometry.Kind == SectionKind.Stripline && geometry.IsHomogeneous && geometry.IsCentred && section.Conductors[0].ThicknessMetres == 0
            ? null
            : "it describes one thin strip midway between two planes in one dielectric";
    }

    /// <inheritdoc/>
    public bool Suits(CrossSection section) => true;

    /// <inheritdoc/>
    public LineSolution Calculate(CrossSection section)
    {
        var trace = section.Conductors[0];
        var dielectric = SectionGeometry.LowestDielectric(section);
        var spacing = section.TopPlaneMetres!.Value - section.BottomPlaneMetres!.Value;
        var z0 = Z0Ohms(trace.WideMetres, spacing, dielectric.Dk);
        return Solved.Single(trace.Name, Method, z0, dielectric.Dk, [new DielectricShare(dielectric.Name, 1)], []);
    }

    /// <summary>Characteristic impedance in ohm.</summary>
    /// <param name="width">Width w of the strip.</param>
    /// <param name="spacing">Distance b between the planes.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static double Z0Ohms(double width, double spacing, double dk)
    {
        var x = 0.5 * Math.PI * width / spacing;
        // Beyond this both moduli leave the range of double; there the two faces are plates with a constant fringe (same paper).
        if (x > 300)
            return Vacuum.Impedance / (4 * (width / spacing + 2 * Math.Log(2) / Math.PI)) / Math.Sqrt(dk);
        var ratio = CompleteEllipticIntegral.ComplementRatio(Math.Tanh(x), 1 / Math.Cosh(x));
        return 0.25 * Vacuum.Impedance * ratio / Math.Sqrt(dk);
    }
}
