using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Microstrip;

/// <summary>
/// Surface microstrip by one formula for all widths. H. A. Wheeler, "Transmission-line properties of a strip on a dielectric sheet on a plane",
/// IEEE Trans. MTT-25, 1977, pp. 631–647. Stated accuracy 2 %, and exact for very wide and very narrow strips. Lengths in any one unit.
/// </summary>
public sealed class Wheeler1977 : IClosedForm
{
    /// <inheritdoc/>
    public LineMethod Method => MethodCatalogue.Wheeler1977;

    /// <inheritdoc/>
    public string? Objection(CrossSection section) => new HammerstadJensen1980().Objection(section);

    /// <inheritdoc/>
    public bool Suits(CrossSection section) => false;

    /// <inheritdoc/>
    public LineSolution Calculate(CrossSection section)
    {
        var trace = section.Conductors[0];
        var dielectric = SectionGeometry.LowestDielectric(section);
        var width = HammerstadJensen1980.EquivalentWidth(trace);
        var height = trace.BottomMetres - section.BottomPlaneMetres!.Value;
        double EpsEff(double dk)
        {
            var ratio = Z0Ohms(width, height, trace.ThicknessMetres, 1) / Z0Ohms(width, height, trace.ThicknessMetres, dk);
            return ratio * ratio;
        }
        var shares = EnergyShares.FromPermittivity([dielectric, SectionDielectric.Air], dks => EpsEff(dks[0] / dks[1]) * dks[1]);
        var verdict = new Validity(Method).AtMost("thickness / height", trace.ThicknessMetres / height, 1).AtMost("thickness / width", trace.ThicknessMetres / width, 1);
        return Solved.Single(
            trace.Name, Method, Z0Ohms(width, height, trace.ThicknessMetres, dielectric.Dk), EpsEff(dielectric.Dk), shares, verdict.Warnings);
    }

    /// <summary>Characteristic impedance in ohm.</summary>
    /// <param name="width">Width w.</param>
    /// <param name="height">Height h of the dielectric.</param>
    /// <param name="thickness">Thickness t; 0 for a thin strip.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static double Z0Ohms(double width, double height, double thickness, double dk)
    {
        var wide = width;
        if (thickness > 0)
        {
            var flat = thickness / height;
            var edge = 1 / (Math.PI * (width / thickness + 1.1));
            var widening = thickness / Math.PI * Math.Log(4 * Math.E / Math.Sqrt(flat * flat + edge * edge));
            wide += 0.5 * (1 + 1 / dk) * widening;
        }
        var x = 4 * height / wide;
        var a = (14 + 8 / dk) / 11 * x;
        return 42.4 / Math.Sqrt(dk + 1) * Math.Log(1 + x * (a + Math.Sqrt(a * a + 0.5 * (1 + 1 / dk) * Math.PI * Math.PI)));
    }
}
