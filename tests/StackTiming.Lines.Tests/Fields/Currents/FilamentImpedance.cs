using System.Numerics;
using MathNet.Numerics.LinearAlgebra;
using StackTiming.Lines.Constants;

namespace StackTiming.Lines.Tests.Fields.Currents;

/// <summary>
/// Series impedance of a rectangular trace over a perfect plane by filaments (W. T. Weeks, L. L. Wu, M. F. McAllister, A. Singh, IBM J.
/// Res. Dev. 23, 1979): an independent solution in the volume of the copper.
/// </summary>
internal static class FilamentImpedance
{
    /// <summary>Impedance in ohm per metre.</summary>
    public static Complex Of(double width, double thickness, double height, double resistivity, double frequency, int across, int through)
    {
        var (xs, ys) = (Crowded(-width / 2, width / 2, across), Crowded(height, height + thickness, through));
        var filaments = xs.Zip(xs.Skip(1)).SelectMany(x => ys.Zip(ys.Skip(1)), (x, y) =>
            (X: (x.First + x.Second) / 2, Y: (y.First + y.Second) / 2, W: x.Second - x.First, H: y.Second - y.First)).ToArray();
        var omega = 2 * Math.PI * frequency;
        var impedance = Matrix<Complex>.Build.Dense(filaments.Length, filaments.Length, (i, j) =>
        {
            var (p, q) = (filaments[i], filaments[j]);
            var image = 0.5 * Math.Log((p.X - q.X) * (p.X - q.X) + (p.Y + q.Y) * (p.Y + q.Y));
            return (i == j ? resistivity / (p.W * p.H) : 0)
                + new Complex(0, omega * Vacuum.Mu0 / (2 * Math.PI) * (image - (i == j ? Math.Log(0.2235 * (p.W + p.H))
                : MeanLogarithm(p, q))));
        });
        return 1 / impedance.Solve(MathNet.Numerics.LinearAlgebra.Vector<Complex>.Build.Dense(filaments.Length, Complex.One)).Sum();
    }

    /// <summary>Mean of ln r over the second filament, by three Gauss points each way.</summary>
    private static double MeanLogarithm((double X, double Y, double W, double H) p, (double X, double Y, double W, double H) q)
    {
        double[] nodes = [-0.5 * 0.7745966692414834, 0, 0.5 * 0.7745966692414834];
        double[] weights = [5 / 18.0, 8 / 18.0, 5 / 18.0];
        var sum = 0.0;
        for (var k = 0; k < 3; k++)
        {
            for (var l = 0; l < 3; l++)
            {
                var (dx, dy) = (p.X - q.X - nodes[k] * q.W, p.Y - q.Y - nodes[l] * q.H);
                sum += weights[k] * weights[l] * 0.5 * Math.Log(dx * dx + dy * dy);
            }
        }

        return sum;
    }

    private static double[] Crowded(double from, double to, int count) =>
        [.. Enumerable.Range(0, count + 1).Select(i => from + (to - from) * 0.5 * (1 - Math.Cos(Math.PI * i / count)))];
}
