using StackTiming.Lines.Constants;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Microstrip;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Coupled;

/// <summary>
/// Two like traces side by side on one dielectric over a plane, static part. M. Kirschning, R. H. Jansen, "Accurate wide-range design equations for the frequency-dependent
/// characteristic of parallel coupled microstrip lines", IEEE Trans. MTT-32, 1984, pp. 83–90 (corrections MTT-33, 1985, p. 288). Thin traces;
/// 0.1 ≤ w/h ≤ 10, 0.1 ≤ s/h ≤ 10, 1 ≤ ε_r ≤ 18; stated accuracy 0.6 % of impedances, 0.7 % of permittivities. Lengths in any one unit.
/// </summary>
public sealed class KirschningJansen1984 : IClosedForm
{
    /// <inheritdoc/>
    public LineMethod Method => MethodCatalogue.KirschningJansen1984;

    /// <inheritdoc/>
    public string? Objection(CrossSection section) =>
        SectionGeometry.Of(section).Kind == SectionKind.EdgeCoupledMicrostrip && SectionGeometry.IsBare(section)
            ? null
            : "it describes two like bare traces side by side on one dielectric over a plane";

    /// <inheritdoc/>
    public bool Suits(CrossSection section) => false;

    /// <inheritdoc/>
    public LineSolution Calculate(CrossSection section)
    {
        var (a, b) = (section.Conductors[0], section.Conductors[1]);
        var dielectric = SectionGeometry.LowestDielectric(section);
        var height = a.BottomMetres - section.BottomPlaneMetres!.Value;
        var width = HammerstadJensen1980.EquivalentWidth(a);
        var gap = Math.Abs(a.CentreMetres - b.CentreMetres) - width;
        var line = Thin(width, height, gap, dielectric.Dk);
        var shares = EnergyShares.FromPermittivity([dielectric, SectionDielectric.Air], dks => Thin(width, height, gap, dks[0] / dks[1]).Odd.EpsEff * dks[1]);
        var verdict = new Validity(Method)
            .Within("width / height", width / height, 0.1, 10)
            .Within("gap / height", gap / height, 0.1, 10)
            .Within("Dk", dielectric.Dk, 1, 18)
            .AtMost("thickness / gap", a.ThicknessMetres / gap, 0.02);
        return Solved.Pair(a.Name, b.Name, Method, line.Odd, line.Even, shares, verdict.Warnings);
    }

    /// <summary>Impedances in ohm and effective permittivities of both modes.</summary>
    /// <param name="width">Width w of each trace.</param>
    /// <param name="height">Height h of the dielectric.</param>
    /// <param name="gap">Gap s.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static ((double Z0Ohms, double EpsEff) Odd, (double Z0Ohms, double EpsEff) Even) Thin(double width, double height, double gap, double dk)
    {
        double u = width / height, g = gap / height;
        var eps = HammerstadJensen1980.EpsEff(u, dk);
        var v = u * (20 + g * g) / (10 + g * g) + g * Math.Exp(-g);
        var evenEps = HammerstadJensen1980.EpsEff(v, dk);
        var oddEps = OddEps(u, g, eps, dk);
        // The impedance of the single line in air times √ε of the mode's own carries the coupling terms.
        var z = HammerstadJensen1980.AirImpedance(u);
        var (q4, q10) = CouplingTerms(u, g);
        var even = z / Math.Sqrt(evenEps) / (1 - z / Vacuum.Impedance * q4);
        var odd = z / Math.Sqrt(oddEps) / (1 - z / Vacuum.Impedance * q10);
        return ((odd, oddEps), (even, evenEps));
    }

    private static double OddEps(double u, double g, double eps, double dk)
    {
        var mean = 0.5 * (dk + 1);
        var a = 0.7287 * (eps - mean) * (1 - Math.Exp(-0.179 * u));
        var b = 0.747 * dk / (0.15 + dk);
        var c = b - (b - 0.207) * Math.Exp(-0.414 * u);
        var d = 0.593 + 0.694 * Math.Exp(-0.562 * u);
        return (mean + a - eps) * Math.Exp(-c * Math.Pow(g, d)) + eps;
    }

    /// <summary>The paper's Q₄ and Q₁₀.</summary>
    private static (double Even, double Odd) CouplingTerms(double u, double g)
    {
        var logG = Math.Log(g);
        var q1 = 0.8695 * Math.Pow(u, 0.194);
        var q2 = 1 + 0.7519 * g + 0.189 * Math.Pow(g, 2.31);
        var q3 = 0.1975 + Math.Pow(16.6 + Math.Pow(8.4 / g, 6), -0.387) + Math.Log(Math.Pow(g, 10) / (1 + Math.Pow(g / 3.4, 10))) / 241;
        var decay = Math.Exp(-g);
        var q4 = 2 * q1 / q2 / (decay * Math.Pow(u, q3) + (2 - decay) * Math.Pow(u, -q3));
        var q5 = 1.794 + 1.14 * Math.Log(1 + 0.638 / (g + 0.517 * Math.Pow(g, 2.43)));
        var q6 = 0.2305 + Math.Log(Math.Pow(g, 10) / (1 + Math.Pow(g / 5.8, 10))) / 281.3 + Math.Log(1 + 0.598 * Math.Pow(g, 1.154)) / 5.1;
        var q7 = (10 + 190 * g * g) / (1 + 82.3 * g * g * g);
        var q8 = Math.Exp(-6.5 - 0.95 * logG - Math.Pow(g / 0.15, 5));
        var q9 = Math.Log(q7) * (q8 + 1 / 16.5);
        var q10 = (q2 * q4 - q5 * Math.Exp(Math.Log(u) * q6 * Math.Pow(u, -q9))) / q2;
        return (q4, q10);
    }
}
