using StackTiming.Lines.Constants;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Lines.Stripline;

namespace StackTiming.Lines.Coupled;

/// <summary>
/// Two like thin strips above each other, placed symmetrically between two planes in one dielectric. S. B. Cohn, "Characteristic impedances of
/// broadside-coupled strip transmission lines", IRE Trans. MTT-8, 1960, pp. 633–637. Valid for w ≥ 0.35·s and w ≥ 0.35·(b − s); thickness is left out, the distance between facing
/// faces counts as s. Lengths in any one unit.
/// </summary>
public sealed class Cohn1960 : IClosedForm
{
    /// <inheritdoc/>
    public LineMethod Method => MethodCatalogue.Cohn1960;

    /// <inheritdoc/>
    public string? Objection(CrossSection section)
    {
        if (SectionGeometry.Of(section).Kind != SectionKind.Broadside)
            return "it describes two like strips above each other between two planes";
        var (lower, upper) = Ordered(section);
        double under = lower.BottomMetres - section.BottomPlaneMetres!.Value, over = section.TopPlaneMetres!.Value - upper.TopMetres;
        return Math.Abs(under - over) <= 1e-6 * (under + over) ? null : "it needs strips at equal distances from their planes";
    }

    /// <inheritdoc/>
    public bool Suits(CrossSection section) =>
        SectionGeometry.Of(section).IsHomogeneous && section.Conductors[0].ThicknessMetres == 0 && Calculate(section).Warnings.IsEmpty;

    /// <inheritdoc/>
    public LineSolution Calculate(CrossSection section)
    {
        var (lower, upper) = Ordered(section);
        var width = 0.5 * (lower.WideMetres + lower.NarrowMetres);
        var gap = upper.BottomMetres - lower.TopMetres;
        // Without its thickness the pair has the same gap and the same distances to the planes.
        var spacing = section.TopPlaneMetres!.Value - section.BottomPlaneMetres!.Value - lower.ThicknessMetres - upper.ThicknessMetres;
        var inside = DkAt(section, 0.5 * (upper.BottomMetres + lower.TopMetres));
        var outside = DkAt(section, 0.5 * (section.BottomPlaneMetres.Value + lower.BottomMetres));
        // The odd field lies between the strips and outside about as their distances to each other's middle and to the planes; the even field outside.
        var (odd, even) = Thin(width, gap, spacing, 1);
        double outer = 0.5 * (spacing - gap), inner = 0.5 * gap;
        var oddEps = (inside.Dk / inner + outside.Dk / outer) / (1 / inner + 1 / outer);
        var shares = EnergyShares.FromPermittivity(
            inside == outside ? [inside] : [inside, outside],
            dks => (dks[0] / inner + dks[^1] / outer) / (1 / inner + 1 / outer));
        var verdict = new Validity(Method)
            .Within("width / distance of the strips", width / gap, 0.35, double.PositiveInfinity)
            .Within("width / distance to the planes", width / (spacing - gap), 0.35, double.PositiveInfinity)
            .AtMost("thickness / distance of the strips", lower.ThicknessMetres / gap, 0.02);
        return Solved.Pair(
            section.Conductors[0].Name, section.Conductors[1].Name, Method,
            (odd / Math.Sqrt(oddEps), oddEps), (even / Math.Sqrt(outside.Dk), outside.Dk), shares, verdict.Warnings);
    }

    /// <summary>Odd and even impedance of thin strips, ohm.</summary>
    /// <param name="width">Width w of each strip.</param>
    /// <param name="gap">Distance s between the strips.</param>
    /// <param name="spacing">Distance b between the planes.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static (double OddOhms, double EvenOhms) Thin(double width, double gap, double spacing, double dk)
    {
        var ratio = gap / spacing;
        // The modulus runs from s/b (no width) to 1; found by bisection on its complement's logarithm, since it crowds at 1 for wide strips.
        double least = Math.Log(1e-300), most = Math.Log(1 - ratio);
        for (var i = 0; i < 200 && most - least > 1e-13 * Math.Abs(least); i++)
        {
            var middle = 0.5 * (least + most);
            if (WidthOverSpacing(Math.Exp(middle), ratio) > width / spacing)
                least = middle;
            else
                most = middle;
        }
        var rest = Math.Exp(0.5 * (least + most));
        var k = 1 - rest;
        var complement = Math.Sqrt(rest * (2 - rest));
        var root = Math.Sqrt(dk);
        // The paper's 188.3 and 296.1 are half of the wave impedance and a quarter of it times π.
        var even = 0.5 * Vacuum.Impedance / root * CompleteEllipticIntegral.ComplementRatio(k, complement);
        var odd = 0.25 * Math.PI * Vacuum.Impedance / root * ratio / ArTanh(k, rest);
        return (odd, even);
    }

    /// <summary>w/b as a function of 1 − k, the paper's equation (2).</summary>
    private static double WidthOverSpacing(double rest, double ratio)
    {
        var k = 1 - rest;
        var r = Math.Sqrt((k / ratio - 1) / (1 / (k * ratio) - 1));
        var rOverK = r / k;
        // 1 − R² and 1 − (R/k)² in forms that keep their digits as k nears 1.
        var denominator = 1 / (k * ratio) - 1;
        var restR = rest * (2 - rest) / (k * ratio * denominator);
        var restRk = rest * (2 - rest) / (k * k * denominator);
        return 2 / Math.PI * (HalfLog(r, restR) - ratio * HalfLog(rOverK, restRk));
    }

    /// <summary>artanh(x) from x and 1 − x².</summary>
    private static double HalfLog(double x, double rest) => 0.5 * Math.Log((1 + x) * (1 + x) / rest);

    private static double ArTanh(double k, double rest) => 0.5 * Math.Log((1 + k) / rest);

    private static (SectionConductor Lower, SectionConductor Upper) Ordered(CrossSection section)
    {
        var (a, b) = (section.Conductors[0], section.Conductors[1]);
        return a.BottomMetres <= b.BottomMetres ? (a, b) : (b, a);
    }

    private static SectionDielectric DkAt(CrossSection section, double y) =>
        section.Slabs.FirstOrDefault(s => y >= s.BottomMetres && y <= s.TopMetres)?.Dielectric ?? SectionDielectric.Air;
}
