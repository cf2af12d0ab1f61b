using System.Numerics;
using System.Runtime.Intrinsics;
using MathNet.Numerics.Integration;
using StackTiming.Lines.Fields.Geometry;
using StackTiming.Lines.Fields.Kernels;
using StackTiming.Lines.Fields.Panels;
using Xunit;

namespace StackTiming.Lines.Tests.Fields.Kernels;

/// <summary>The closed integrals against plain quadrature.</summary>
public sealed class PanelIntegralTests
{
    private const int Terms = 9;

    private static readonly SurfacePiece Piece = new(0, 1, 0, 1, -1, PieceEnd.Corner, PieceEnd.Smooth, false);

    // Beside both ends, above the middle, in the transition to the power series, far away.
    private static readonly Complex[] Points =
        [new(-0.02, 0.05), new(0.4, 0.03), new(1.03, -0.04), new(0.5, 0.9), new(1.9, 0.6), new(2.4, -0.3), new(7, 5), new(-60, 20)];

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(-1)]
    public void Potential_and_field_are_those_of_quadrature(int map)
    {
        var panel = new Panel(Piece, (PanelMap)map, 0, 1, 1.3, Terms);
        foreach (var point in Points)
        {
            var (potential, field) = Evaluate(panel, 1.3 * point);
            for (var n = 0; n < Terms; n++)
            {
                // The tail's ln u is left to the images.
                var (potentialSum, fieldSum) = Quadrature(panel, 1.3 * point, n, map < 0 ? 1 : 0);
                Assert.Equal(potentialSum, potential[n], 2e-8);
                Assert.True((fieldSum - field[n]).Magnitude < 1e-7 * Math.Max(1, 1 / point.Magnitude));
            }
        }
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    public void Potential_on_the_panel_itself_is_that_of_quadrature(int map)
    {
        var panel = new Panel(Piece, (PanelMap)map, 0, 1, 1.3, Terms);
        foreach (var u in new[] { 0.05, 0.31, 0.5, 0.98 })
        {
            var point = new Complex(panel.Distance(u), 0);
            var (potential, _) = Evaluate(panel, point);
            for (var n = 0; n < Terms; n++)
            {
                var order = n;
                double Density(double v) => LegendreRule.Polynomial(order, v) * Math.Log(Math.Abs(point.Real - panel.Distance(v)));
                var sum = DoubleExponentialTransformation.Integrate(Density, 0, u, 1e-13)
                    + DoubleExponentialTransformation.Integrate(Density, u, 1, 1e-13);
                Assert.Equal(sum, potential[n], 1e-7);
            }
        }
    }

    private static (double[] Potential, Complex[] Field) Evaluate(Panel panel, Complex point)
    {
        var workspace = new Vector512<double>[PanelIntegral.Workspace];
        var (potential, re, im) = (new Vector512<double>[Terms], new Vector512<double>[Terms], new Vector512<double>[Terms]);
        PanelIntegral.Evaluate(panel, Vector512.Create(point.Real), Vector512.Create(point.Imaginary), potential, default, default,
            workspace);
        PanelIntegral.Evaluate(panel, Vector512.Create(point.Real), Vector512.Create(point.Imaginary), default, re, im, workspace);
        return ([.. potential.Select(p => p[3])], [.. re.Zip(im, (r, i) => new Complex(r[5], i[5]))]);
    }

    private static (double Potential, Complex Field) Quadrature(Panel panel, Complex point, int order, int removeLogarithm)
    {
        var (potential, field) = (0.0, Complex.Zero);
        const int parts = 200;
        var rule = new GaussLegendreRule(0, 1, 16);
        for (var part = 0; part < parts; part++)
        {
            for (var k = 0; k < 16; k++)
            {
                var u = (part + rule.Abscissas[k]) / parts;
                var weight = rule.Weights[k] / parts * LegendreRule.Polynomial(order, u);
                var away = point - panel.Distance(u);
                potential += weight * (Math.Log(away.Magnitude) + removeLogarithm * Math.Log(u));
                field += weight / away;
            }
        }

        return (potential, field);
    }
}
