using MathNet.Numerics.Integration;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Tests.Fields;

/// <summary>
/// Area integrals over a section with one rectangular conductor, by Gauss rules whose nodes crowd at the lines through the conductor's
/// corners: x from the corner grows as the cube of the parameter, which takes the growth of fields at corners out of the integrand.
/// Independent of the solver's own integrals.
/// </summary>
internal static class SectionIntegral
{
    private const int Nodes = 14;

    /// <summary>
    /// The integral of a density over the part of the section between two heights, to infinity on both sides (and above, without a top
    /// plane).
    /// </summary>
    public static double Over(CrossSection section, double from, double to, Func<double[], double[], double[]> density)
    {
        var c = section.Conductors[0];
        var half = c.WideMetres / 2;
        double[] heights = [0, c.BottomMetres, c.TopMetres, section.Slabs[^1].TopMetres];
        var sum = 0.0;
        foreach (var (low, high) in heights.Zip(heights.Skip(1)))
        {
            if (low >= to - 1e-12 || high <= from + 1e-12)
                continue;
            var isConductor = low == c.BottomMetres;
            if (!isConductor)
                sum += 2 * Cell(Crowded(0, half, false, true), Crowded(low, high, true, true), density);
            sum += 2 * Cell(Crowded(half, half + 400e-6, true, false), Crowded(low, high, true, true), density);
            sum += 2 * Cell(Tail(half + 400e-6), Crowded(low, high, true, true), density);
        }

        if (section.TopPlaneMetres is null && to > heights[^1])
        {
            var above = heights[^1];
            sum += 2 * Cell(Crowded(0, half, false, true), Tail(above, above), density);
            sum += 2 * Cell(Crowded(half, half + 400e-6, true, false), Tail(above, above), density);
            sum += 2 * Cell(Tail(half + 400e-6), Tail(above, above), density);
        }

        return sum;
    }

    private static double Cell((double X, double W)[] xs, (double X, double W)[] ys, Func<double[], double[], double[]> density)
    {
        double[] x = [.. ys.SelectMany(_ => xs.Select(p => p.X))];
        double[] y = [.. ys.SelectMany(q => xs.Select(_ => q.X))];
        double[] w = [.. ys.SelectMany(q => xs.Select(p => p.W * q.W))];
        return density(x, y).Zip(w, (d, v) => d * v).Sum();
    }

    private static (double, double)[] Crowded(double from, double to, bool atStart, bool atEnd)
    {
        var rule = new GaussLegendreRule(0, 1, Nodes);
        if (atStart && atEnd)
        {
            var middle = (from + to) / 2;
            return [.. Crowded(from, middle, true, false), .. Crowded(middle, to, false, true)];
        }

        return
        [
            .. rule.Abscissas.Zip(rule.Weights, (u, w) => atStart
                ? (from + (to - from) * u * u * u, 3 * u * u * w * (to - from))
                : (to - (to - from) * u * u * u, 3 * u * u * w * (to - from)))
        ];
    }

    /// <summary>From a point to infinity, as the inverse of the distance from zero (or from below the start by a length).</summary>
    private static (double, double)[] Tail(double from, double length = 0)
    {
        var rule = new GaussLegendreRule(0, 1, Nodes);
        var scale = length > 0 ? length : from;
        return [.. rule.Abscissas.Zip(rule.Weights, (u, w) => (from - scale + scale / u, scale / (u * u) * w))];
    }
}
