using System.Runtime.Intrinsics;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields.Kernels;

/// <summary>
/// The integrals of <see cref="PanelIntegral"/> at points farther than one and a half lengths from the panel's middle, as the power
/// series in the ratio of the half length to the distance; fourteen terms leave less than 1e-8.
/// </summary>
internal static class FarPanelIntegral
{
    /// <summary>Highest power; at the nearest distance the next one is below 1e-8.</summary>
    public const int Powers = 14;

    private static readonly double[][] FieldMoments = [MomentsOf(PanelMap.Straight), MomentsOf(PanelMap.Square), MomentsOf(PanelMap.Cube)];

    private static readonly double[][] PotentialMoments = [.. FieldMoments.Select(OverPower)];

    /// <summary>
    /// See <see cref="PanelIntegral.Evaluate"/>; x and y from the panel's middle, <paramref name="square"/> their squares' sum.
    /// </summary>
    public static void Evaluate(
        Panel panel,
        Vector512<double> x,
        Vector512<double> y,
        Vector512<double> square,
        Span<Vector512<double>> potential,
        Span<Vector512<double>> fieldRe,
        Span<Vector512<double>> fieldIm,
        Span<Vector512<double>> workspace)
    {
        var half = 0.5 * panel.Length;
        var powers = PowersFor(half * half, square);
        var powerRe = workspace[..(powers + 1)];
        var powerIm = workspace.Slice(powers + 1, powers + 1);
        var scale = Vector512.Create(half) / square;
        var (ratioRe, ratioIm) = (x * scale, -y * scale);
        var (re, im) = potential.IsEmpty ? (ratioRe / half, ratioIm / half) : (Vector512.Create(1.0), Vector512<double>.Zero);
        for (var k = 0; k < powerRe.Length; k++)
        {
            (powerRe[k], powerIm[k]) = (re, im);
            (re, im) = (re * ratioRe - im * ratioIm, re * ratioIm + im * ratioRe);
        }

        if (potential.IsEmpty)
        {
            var moments = FieldMoments[(int)panel.Map - 1];
            for (var n = 0; n < panel.Terms; n++)
            {
                var row = moments.AsSpan(n * (Powers + 1), powerRe.Length);
                fieldRe[n] = Sum(row, powerRe);
                fieldIm[n] = Sum(row, powerIm);
            }

            return;
        }

        var overPower = PotentialMoments[(int)panel.Map - 1];
        for (var n = 0; n < panel.Terms; n++)
            potential[n] = Sum(overPower.AsSpan(n * (Powers + 1), powerRe.Length), powerRe);
        potential[0] += 0.5 * Vector512.Log(square);
    }

    /// <summary>Fewer powers suffice farther away: half length over distance to their number stays below 1e-8.</summary>
    private static int PowersFor(double halfSquare, Vector512<double> square) =>
        Vector512.GreaterThanAll(square, Vector512.Create(2500 * halfSquare)) ? 4
        : Vector512.GreaterThanAll(square, Vector512.Create(100 * halfSquare)) ? 7
        : Vector512.GreaterThanAll(square, Vector512.Create(25 * halfSquare)) ? 10
        : Powers;

    private static Vector512<double> Sum(ReadOnlySpan<double> weights, ReadOnlySpan<Vector512<double>> values)
    {
        var (even, odd) = (Vector512<double>.Zero, Vector512<double>.Zero);
        var k = 0;
        for (; k + 1 < values.Length && k + 1 < weights.Length; k += 2)
        {
            even = Vector512.FusedMultiplyAdd(values[k], Vector512.Create(weights[k]), even);
            odd = Vector512.FusedMultiplyAdd(values[k + 1], Vector512.Create(weights[k + 1]), odd);
        }

        return k < values.Length ? Vector512.FusedMultiplyAdd(values[k], Vector512.Create(weights[k]), even + odd) : even + odd;
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

    /// <summary>
    /// The moments over minus their power, as the logarithm's series has them; its constant is the logarithm of the distance.
    /// </summary>
    private static double[] OverPower(double[] moments) =>
        [.. moments.Select((m, i) => i % (Powers + 1) == 0 ? 0 : -m / (i % (Powers + 1)))];
}
