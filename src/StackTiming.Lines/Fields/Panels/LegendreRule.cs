using MathNet.Numerics.Integration;

namespace StackTiming.Lines.Fields.Panels;

/// <summary>Gauss-Legendre nodes and weights on 0…1 with the Legendre polynomials P_n(2u-1) at the nodes.</summary>
internal sealed class LegendreRule
{
    /// <summary>Largest number of nodes.</summary>
    public const int MaxNodes = 40;

    private static readonly LegendreRule[] Rules = [.. Enumerable.Range(1, MaxNodes).Select(n => new LegendreRule(n))];

    private LegendreRule(int nodes)
    {
        var rule = new GaussLegendreRule(0, 1, nodes);
        Nodes = rule.Abscissas;
        Weights = rule.Weights;
        Polynomials = new double[nodes, nodes];
        for (var k = 0; k < nodes; k++)
        {
            for (var n = 0; n < nodes; n++)
                Polynomials[k, n] = Polynomial(n, Nodes[k]);
        }
    }

    /// <summary>Nodes in rising order.</summary>
    public double[] Nodes { get; }

    /// <summary>Weights; they sum to one.</summary>
    public double[] Weights { get; }

    /// <summary>P_n(2u-1) by node and degree.</summary>
    public double[,] Polynomials { get; }

    /// <summary>The rule with this many nodes.</summary>
    public static LegendreRule Of(int nodes) => Rules[nodes - 1];

    /// <summary>The Legendre polynomial P_n(2u-1).</summary>
    public static double Polynomial(int n, double u)
    {
        var x = 2 * u - 1;
        var (before, value) = (0.0, 1.0);
        for (var k = 0; k < n; k++)
            (before, value) = (value, ((2 * k + 1) * x * value - k * before) / (k + 1));
        return value;
    }
}
