using System.Numerics;
using StackTiming.Lines.Fields.Panels;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Currents;

/// <summary>
/// Weights at a panel's Gauss nodes for the integral of the square of its density. Towards a corner of inner angle θ the density in air
/// grows as the distance to the power of α - 1, α = π/(2π - θ) (J. Meixner, IEEE Trans. AP-20, 1972), so that per u its square is a power
/// of u times a smooth function; the weights integrate that power exactly.
/// </summary>
internal static class CornerWeights
{
    /// <summary>Weights w_k with ∫ K² ds = Σ w_k τ(u_k)², τ being the charge per u.</summary>
    /// <param name="panel">A panel of a conductor.</param>
    /// <param name="innerAngle">
    /// Inner angle of the metal where the panel's parameter is zero, radians; π where the surface is straight.
    /// </param>
    public static double[] Of(Panel panel, double innerAngle)
    {
        var rule = LegendreRule.Of(panel.Terms);
        var weights = new double[panel.Terms];
        if (panel.Map != PanelMap.Cube)
        {
            for (var k = 0; k < weights.Length; k++)
                weights[k] = rule.Weights[k] / panel.Stretch(rule.Nodes[k]);
            return weights;
        }

        // τ² ds/du⁻¹ = u^power · h(u) with h = τ² u^(-2 growth) / 3 length.
        var growth = 3 * Math.PI / (2 * Math.PI - innerAngle) - 1;
        var power = 2 * growth - 2;
        for (var k = 0; k < weights.Length; k++)
        {
            var sum = 0.0;
            var moment = 1 / (power + 1);
            for (var n = 0; n < panel.Terms; n++)
            {
                sum += (2 * n + 1) * rule.Polynomials[k, n] * moment;
                // ∫ u^a P_n(2u-1) du falls by (a - n)/(a + n + 2) with each degree.
                moment *= (power - n) / (power + n + 2);
            }

            weights[k] = rule.Weights[k] * sum * Math.Pow(rule.Nodes[k], -2 * growth) / (3 * panel.Length);
        }

        return weights;
    }

    /// <summary>Inner angle of a conductor's metal at a point of its surface, both in the section's coordinates.</summary>
    public static double InnerAngle(SectionConductor conductor, Complex point)
    {
        var near = 1e-4 * Math.Min(conductor.NarrowMetres, conductor.ThicknessMetres);
        var atBottom = Math.Abs(point.Imaginary - conductor.BottomMetres) < near;
        if (!atBottom && Math.Abs(point.Imaginary - conductor.TopMetres) >= near)
            return Math.PI;
        var width = atBottom ? conductor.LowerWidthMetres : conductor.UpperWidthMetres;
        if (Math.Abs(Math.Abs(point.Real - conductor.CentreMetres) - width / 2) >= near)
            return Math.PI;
        var acute = Math.Atan2(conductor.ThicknessMetres, (conductor.WideMetres - conductor.NarrowMetres) / 2);
        return atBottom == conductor.WideFaceDown ? acute : Math.PI - acute;
    }
}
