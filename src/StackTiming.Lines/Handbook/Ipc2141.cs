using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Handbook;

/// <summary>
/// The handbook formulas that fabricators quote, always a second opinion. IPC-2141, "Controlled impedance circuit boards and high-speed logic design",
/// 1996 (formulas from memory). Single microstrip 87/√(ε+1.41)·ln(5.98h/(0.8w+t)) with ε_eff = 0.475ε+0.67; covered microstrip with ε·(1−exp(−1.55·h₁/h)) in the embedded form; stripline
/// 60/√ε·ln(1.9b/(0.8w+t)); pairs 2·Z₀·(1−0.48·exp(−0.96·s/h)) and 2·Z₀·(1−0.347·exp(−2.9·s/b)). Validity as the trade states it: 0.1 ≤ w/h ≤ 2 and ε ≤ 15 for microstrip, w/(b−t) &lt; 0.35 and
/// t/b &lt; 0.25 for stripline. Lengths in any one unit.
/// </summary>
public sealed class Ipc2141 : IClosedForm
{
    /// <inheritdoc/>
    public LineMethod Method => MethodCatalogue.Ipc2141;

    /// <inheritdoc/>
    public string? Objection(CrossSection section)
    {
        var kind = SectionGeometry.Of(section).Kind;
        return kind is SectionKind.SurfaceMicrostrip or SectionKind.LayeredMicrostrip or SectionKind.Stripline
            or SectionKind.EdgeCoupledMicrostrip or SectionKind.EdgeCoupledStripline && !section.Slabs.IsEmpty
            ? null
            : "it describes single and edge-coupled traces over a plane or between two";
    }

    /// <inheritdoc/>
    public bool Suits(CrossSection section) => false;

    /// <inheritdoc/>
    public LineSolution Calculate(CrossSection section)
    {
        var trace = section.Conductors[0];
        double w = trace.WideMetres, t = trace.ThicknessMetres;
        var bottom = section.BottomPlaneMetres!.Value;
        var verdict = new Validity(Method);
        double z0, epsEff, pairFactor = 1;
        if (section.TopPlaneMetres is { } top)
        {
            var b = top - bottom;
            epsEff = MeanDk(section);
            z0 = StriplineOhms(w, b, t, epsEff);
            verdict.AtMost("width / (spacing − thickness)", w / (b - t), 0.35).AtMost("thickness / spacing", t / b, 0.25)
                .AtMost("distance off the middle / spacing", Math.Abs(trace.BottomMetres + 0.5 * t - bottom - 0.5 * b) / b, 0.05);
            if (section.Conductors.Length == 2)
                pairFactor = 1 - 0.347 * Math.Exp(-2.9 * Gap(section) / b);
        }
        else
        {
            var h = trace.BottomMetres - bottom;
            var dk = SectionGeometry.LowestDielectric(section).Dk;
            var cover = section.Slabs[^1].TopMetres - trace.BottomMetres;
            (z0, epsEff) = cover > 0 && section.Slabs.Length > 1 ? EmbeddedMicrostrip(w, h, t, cover + h, dk) : Microstrip(w, h, t, dk);
            verdict.Within("width / height", w / h, 0.1, 2).AtMost("Dk", dk, 15);
            if (section.Conductors.Length == 2)
                pairFactor = 1 - 0.48 * Math.Exp(-0.96 * Gap(section) / h);
        }
        if (section.Conductors.Length == 1)
            return Solved.Single(trace.Name, Method, z0, epsEff, [], verdict.Warnings);
        // The handbook has no even mode; the product of the modes' impedances is that of the lone trace where coupling is weak.
        var odd = z0 * pairFactor;
        return Solved.Pair(trace.Name, section.Conductors[1].Name, Method, (odd, epsEff), (z0 * z0 / odd, epsEff), [], verdict.Warnings);
    }

    /// <summary>Impedance in ohm and effective permittivity of surface microstrip.</summary>
    /// <param name="width">Width w.</param>
    /// <param name="height">Height h.</param>
    /// <param name="thickness">Thickness t.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static (double Z0Ohms, double EpsEff) Microstrip(double width, double height, double thickness, double dk) =>
        (87 / Math.Sqrt(dk + 1.41) * Math.Log(5.98 * height / (0.8 * width + thickness)), 0.475 * dk + 0.67);

    /// <summary>Impedance in ohm and effective permittivity of embedded microstrip.</summary>
    /// <param name="width">Width w.</param>
    /// <param name="height">Height h of the trace over the plane.</param>
    /// <param name="thickness">Thickness t.</param>
    /// <param name="coverTop">Height of the dielectric's upper face over the plane.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static (double Z0Ohms, double EpsEff) EmbeddedMicrostrip(double width, double height, double thickness, double coverTop, double dk)
    {
        var epsEff = dk * (1 - Math.Exp(-1.55 * coverTop / height));
        return (60 / Math.Sqrt(epsEff) * Math.Log(5.98 * height / (0.8 * width + thickness)), epsEff);
    }

    /// <summary>Impedance of a centred stripline in ohm.</summary>
    /// <param name="width">Width w.</param>
    /// <param name="spacing">Distance b between the planes.</param>
    /// <param name="thickness">Thickness t.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static double StriplineOhms(double width, double spacing, double thickness, double dk) =>
        60 / Math.Sqrt(dk) * Math.Log(1.9 * spacing / (0.8 * width + thickness));

    private static double MeanDk(CrossSection section) =>
        section.Slabs.Sum(s => s.Dielectric.Dk * s.ThicknessMetres) / section.Slabs.Sum(s => s.ThicknessMetres);

    private static double Gap(CrossSection section) =>
        Math.Abs(section.Conductors[0].CentreMetres - section.Conductors[1].CentreMetres) - section.Conductors[0].WideMetres;
}
