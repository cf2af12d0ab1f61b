using System.Runtime.Intrinsics;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields.Kernels;

/// <summary>
/// The integrals of <see cref="PanelIntegral"/> at points farther than one and a half lengths from the panel's middle, as the power series in the ratio of the
/// half length to the distance; fourteen terms leave less than 1e-8.
/// </summary>
internal static class FarPanelIntegral
{
    private const int Powers = 14;

    private static readonly double[][] Moments = [MomentsOf(PanelMap.Straight), MomentsOf(PanelMap.Square), MomentsOf(PanelMap.Cube)];

    /// <summary>See <see cref="PanelIntegral.Evaluate"/>; x and y from the panel's middle, <paramref name="square"/> their squares' sum.</summary>
    public static void Evaluate(
        Panel panel,
        Vector512<double> x,
        Vector512<double> y,
        Vector512<double> square,
        Span<Vector512<double>> potential,
        Span<Vector512<double>> fieldRe,
        Span<Vector512<double>> fieldIm)
    {
        var half = 0.5 * panel.Length;
        var moments = Moments[(int)panel.Map - 1];
        Span<Vector512<double>> powerRe = stackalloc Vector512<double>[Powers + 1];
        Span<Vector512<double>> powerIm = stackalloc Vector512<double>[Powers + 1];
        var (ratioRe, ratioIm) = (half * x / square, -half * y / square);
        (powerRe[0], powerIm[0]) = potential.IsEmpty ? (ratioRe / half, ratioIm / half) : (Vector512.Create(1.0), Vector512<double>.Zero);
        for (var k = 1; k <= Powers; k++)
        {
            powerRe[k] = powerRe[k - 1] * ratioRe - powerIm[k - 1] * ratioIm;
            powerIm[k] = powerRe[k - 1] * ratioIm + powerIm[k - 1] * ratioRe;
        }

        if (potential.IsEmpty)
            AddField(moments, panel.Terms, powerRe, powerIm, fieldRe, fieldIm);
        else
            AddPotential(moments, panel.Terms, 0.5 * Vector512.Log(square), powerRe, potential);
    }

    private static void AddPotential(
        double[] moments, int terms, Vector512<double> log, Span<Vector512<double>> powerRe, Span<Vector512<double>> potential)
    {
        for (var n = 0; n < terms; n++)
        {
            var row = n * (Powers + 1);
            var sum = n == 0 ? log : Vector512<double>.Zero;
            for (var k = 1; k <= Powers; k++)
                sum -= powerRe[k] * (moments[row + k] / k);
            potential[n] = sum;
        }
    }

    private static void AddField(
        double[] moments,
        int terms,
        Span<Vector512<double>> powerRe,
        Span<Vector512<double>> powerIm,
        Span<Vector512<double>> fieldRe,
        Span<Vector512<double>> fieldIm)
    {
        for (var n = 0; n < terms; n++)
        {
            var row = n * (Powers + 1);
            var (re, im) = (Vector512<double>.Zero, Vector512<double>.Zero);
            for (var k = 0; k <= Powers; k++)
            {
                re += powerRe[k] * moments[row + k];
                im += powerIm[k] * moments[row + k];
            }

            fieldRe[n] = re;
            fieldIm[n] = im;
        }
    }

    /// <summary>∫ P_n(2u-1) (2u^m - 1)^k du for all n and k; the rule is exact for these degrees.</summary>
    private static double[] MomentsOf(PanelMap map)
    {
        var rule = LegendreRule.Of(LegendreRule.MaxNodes);
        var moments = new double[PanelIntegral.MaxTerms * (Powers + 1)];
        for (var n = 0; n < PanelIntegral.MaxTerms; n++)
        {
            for (var k = 0; k <= Powers; k++)
            {
                var sum = 0.0;
                for (var q = 0; q < rule.Nodes.Length; q++)
                    sum += rule.Weights[q] * rule.Polynomials[q, n] * Math.Pow(2 * Math.Pow(rule.Nodes[q], (int)map) - 1, k);
                moments[n * (Powers + 1) + k] = sum;
            }
        }

        return moments;
    }
}
