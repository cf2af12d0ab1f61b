using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace StackTiming.Lines.Fields.Kernels;

/// <summary>
/// Legendre functions of the second kind Q_0 … Q_N of complex arguments, eight at once: the integrals of a Legendre polynomial
/// against 1/(z - x) over -1…1 are 2 Q_n(z) (F. E. Neumann 1848; NIST Digital Library of Mathematical Functions, 14.12 and 14.10.3). On the
/// segment itself the real part is the mean of both sides, the principal value.
/// Near the segment the recurrence runs upwards, which loses about ρ^n of precision on the ellipse ρ; farther away it runs downwards as a
/// continued fraction (W. Gautschi, Computational aspects of three-term recurrence relations, SIAM Review 9, 1967).
/// </summary>
internal static class LegendreSecondKind
{
    // The sum of the distances to both ends is rho + 1/rho: 2.5 at rho = 2, from where on the continued fraction is short.
    private const double DownwardsFrom = 2.5;

    // Upwards while rho^n stays below a million, which costs six of sixteen digits.
    private static readonly double[] UpwardsBelow =
        [.. Enumerable.Range(0, MaxLast + 1).Select(n => n == 0 ? 1e9 : Math.Pow(1e6, 1.0 / n) + Math.Pow(1e6, -1.0 / n))];

    private static readonly double[] Rise = [.. Enumerable.Range(0, MaxLast + 1).Select(n => (2 * n + 1.0) / (n + 1))];

    private static readonly double[] Fall = [.. Enumerable.Range(0, MaxLast + 1).Select(n => (double)n / (n + 1))];

    /// <summary>Highest degree that can be asked for.</summary>
    public const int MaxLast = 40;

    /// <summary>Fills the real and imaginary parts of Q_0 … Q_last and returns ln|z+1| + ln|z-1|.</summary>
    public static Vector512<double> Fill(
        Vector512<double> re, Vector512<double> im, int last, ref Vector512<double> qRe, ref Vector512<double> qIm)
    {
        var one = Vector512.Create(1.0);
        var tiny = Vector512.Create(1e-280);
        var plus = Vector512.Max((re + one) * (re + one) + im * im, tiny);
        var minus = Vector512.Max((re - one) * (re - one) + im * im, tiny);
        var (logPlus, logMinus) = (Vector512.Log(plus), Vector512.Log(minus));
        qRe = 0.25 * (logPlus - logMinus);
        qIm = 0.5 * Lanes.Atan2(-2.0 * im, re * re + im * im - one);
        var focal = Vector512.Sqrt(plus) + Vector512.Sqrt(minus);
        var limit = Vector512.Create(DownwardsFrom);
        if (last > 0)
        {
            if (Vector512.LessThanAll(focal, Vector512.Create(UpwardsBelow[last])))
                Upwards(re, im, last, ref qRe, ref qIm);
            else if (!Vector512.LessThanAny(focal, limit))
                Downwards(re, im, last, Extra(focal), ref qRe, ref qIm);
            else
                Both(re, im, last, Vector512.LessThan(focal, limit), ref qRe, ref qIm);
        }

        return 0.5 * (logPlus + logMinus);
    }

    private static int Extra(Vector512<double> focal) =>
        Vector512.GreaterThanAll(focal, Vector512.Create(10.1)) ? 4
        : Vector512.GreaterThanAll(focal, Vector512.Create(4.25)) ? 7
        : 13;

    private static void Upwards(Vector512<double> re, Vector512<double> im, int last, ref Vector512<double> qRe, ref Vector512<double> qIm)
    {
        var (beforeRe, beforeIm) = (qRe, qIm);
        var (valueRe, valueIm) = (re * qRe - im * qIm - Vector512.Create(1.0), re * qIm + im * qRe);
        Unsafe.Add(ref qRe, 1) = valueRe;
        Unsafe.Add(ref qIm, 1) = valueIm;
        for (var n = 1; n < last; n++)
        {
            var (a, b) = (Rise[n], Fall[n]);
            var nextRe = a * (re * valueRe - im * valueIm) - b * beforeRe;
            var nextIm = a * (re * valueIm + im * valueRe) - b * beforeIm;
            (beforeRe, beforeIm, valueRe, valueIm) = (valueRe, valueIm, nextRe, nextIm);
            Unsafe.Add(ref qRe, n + 1) = valueRe;
            Unsafe.Add(ref qIm, n + 1) = valueIm;
        }
    }

    private static void Downwards(
        Vector512<double> re, Vector512<double> im, int last, int extra, ref Vector512<double> qRe, ref Vector512<double> qIm)
    {
        var (ratioRe, ratioIm) = (Vector512<double>.Zero, Vector512<double>.Zero);
        for (var n = last + extra; n >= 1; n--)
        {
            // r_n = Q_n/Q_(n-1) = n / ((2n+1) z - (n+1) r_(n+1))
            var denominatorRe = (2 * n + 1.0) * re - (n + 1.0) * ratioRe;
            var denominatorIm = (2 * n + 1.0) * im - (n + 1.0) * ratioIm;
            var scale = Vector512.Create((double)n) / (denominatorRe * denominatorRe + denominatorIm * denominatorIm);
            ratioRe = denominatorRe * scale;
            ratioIm = -denominatorIm * scale;
            if (n <= last)
            {
                Unsafe.Add(ref qRe, n) = ratioRe;
                Unsafe.Add(ref qIm, n) = ratioIm;
            }
        }

        for (var n = 1; n <= last; n++)
        {
            var (r, i) = (Unsafe.Add(ref qRe, n), Unsafe.Add(ref qIm, n));
            var (beforeRe, beforeIm) = (Unsafe.Add(ref qRe, n - 1), Unsafe.Add(ref qIm, n - 1));
            Unsafe.Add(ref qRe, n) = r * beforeRe - i * beforeIm;
            Unsafe.Add(ref qIm, n) = r * beforeIm + i * beforeRe;
        }
    }

    private static void Both(
        Vector512<double> re, Vector512<double> im, int last, Vector512<double> near, ref Vector512<double> qRe, ref Vector512<double> qIm)
    {
        Span<Vector512<double>> upRe = stackalloc Vector512<double>[last + 1];
        Span<Vector512<double>> upIm = stackalloc Vector512<double>[last + 1];
        (upRe[0], upIm[0]) = (qRe, qIm);
        Upwards(re, im, last, ref upRe[0], ref upIm[0]);
        Downwards(re, im, last, 13, ref qRe, ref qIm);
        for (var n = 1; n <= last; n++)
        {
            Unsafe.Add(ref qRe, n) = Vector512.ConditionalSelect(near, upRe[n], Unsafe.Add(ref qRe, n));
            Unsafe.Add(ref qIm, n) = Vector512.ConditionalSelect(near, upIm[n], Unsafe.Add(ref qIm, n));
        }
    }
}
