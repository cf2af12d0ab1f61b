using System.Runtime.Intrinsics;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields.Kernels;

/// <summary>
/// The exact integrals of ln|z - s(u)| and 1/(z - s(u)) against the Legendre polynomials P_n(2u-1) of a panel, for eight points z at
/// once in the panel's own coordinates (origin at zero, line along the real axis). With s = d·u^m the logarithm splits over the m roots
/// of z/d, ln(z - d u^m) = ln d + Σ ln(w_j - u), each of which integrates to Legendre functions of the second kind; farther than one and
/// a half lengths from the panel's middle a power series in the distance takes over.
/// </summary>
internal static class PanelIntegral
{
    /// <summary>Largest number of polynomials of a panel.</summary>
    public const int MaxTerms = 24;

    /// <summary>Vectors of workspace that <see cref="Evaluate"/> needs.</summary>
    public const int Workspace = 2 * (MaxTerms + 1);

    private const double HalfRootThree = 0.86602540378443864676;

    /// <summary>
    /// Writes the potential integrals (without the integral of ln u that an infinite panel also has, a constant) to <paramref
    /// name="potential"/> or, where it is empty, those of the complex field 1/(z - s) to <paramref name="fieldRe"/> and <paramref
    /// name="fieldIm"/>.
    /// </summary>
    public static void Evaluate(
        Panel panel,
        Vector512<double> x,
        Vector512<double> y,
        Span<Vector512<double>> potential,
        Span<Vector512<double>> fieldRe,
        Span<Vector512<double>> fieldIm,
        Span<Vector512<double>> workspace)
    {
        if (panel.Map != PanelMap.Infinite)
        {
            var half = 0.5 * panel.Length;
            var away = (x - Vector512.Create(half)) * (x - Vector512.Create(half)) + y * y;
            if (Vector512.GreaterThanAll(away, Vector512.Create(9 * half * half)))
            {
                FarPanelIntegral.Evaluate(panel, x - Vector512.Create(half), y, away, potential, fieldRe, fieldIm, workspace);
                return;
            }
        }

        var (re, im) = (x / panel.Length, y / panel.Length);
        var terms = panel.Terms;
        potential.Clear();
        fieldRe.Clear();
        fieldIm.Clear();
        if (panel.Map == PanelMap.Straight)
        {
            AddRoot(re, im, Vector512.Create(2 / panel.Length), Vector512<double>.Zero, terms, potential, fieldRe, fieldIm, workspace);
        }
        else if (panel.Map == PanelMap.Infinite)
        {
            AddInfinite(re, im, panel.Length, terms, potential, fieldRe, fieldIm, workspace);
            return;
        }
        else
        {
            AddRoots((int)panel.Map, re, im, panel.Length, terms, potential, fieldRe, fieldIm, workspace);
        }

        if (!potential.IsEmpty)
            potential[0] += Vector512.Create(Math.Log(panel.Length));
    }

    private static void AddRoots(
        int power,
        Vector512<double> re,
        Vector512<double> im,
        double length,
        int terms,
        Span<Vector512<double>> potential,
        Span<Vector512<double>> fieldRe,
        Span<Vector512<double>> fieldIm,
        Span<Vector512<double>> workspace)
    {
        var square = Vector512.Max(re * re + im * im, Vector512.Create(1e-200));
        var radius = Vector512.Exp(Vector512.Log(square) * (0.5 / power));
        var (cos, sin) = RootDirection(power, re, im);
        var (rootRe, rootIm) = (radius * cos, radius * sin);
        // dξ/dz = 2 w / (m z)
        var scale = Vector512.Create(2 / (power * length)) / square;
        for (var j = 0; j < power; j++)
        {
            var slopeRe = (rootRe * re + rootIm * im) * scale;
            var slopeIm = (rootIm * re - rootRe * im) * scale;
            AddRoot(rootRe, rootIm, slopeRe, slopeIm, terms, potential, fieldRe, fieldIm, workspace);
            (rootRe, rootIm) = power == 2
                ? (-rootRe, -rootIm)
                : (-0.5 * rootRe - HalfRootThree * rootIm, HalfRootThree * rootRe - 0.5 * rootIm);
        }
    }

    private static (Vector512<double> Cos, Vector512<double> Sin) RootDirection(int power, Vector512<double> re, Vector512<double> im)
    {
        var angle = Lanes.Atan2(im, re);
        if (power == 3)
            return Lanes.CosSin(angle / 3.0);
        // The half angle reaches a right angle: take the quarter angle and double it.
        var (cos, sin) = Lanes.CosSin(angle / 4.0);
        return (cos * cos - sin * sin, 2.0 * cos * sin);
    }

    /// <summary>Adds ∫ P_n ln|w - u| du and (dξ/dz) Q_n(ξ), ξ = 2w - 1.</summary>
    private static void AddRoot(
        Vector512<double> rootRe,
        Vector512<double> rootIm,
        Vector512<double> slopeRe,
        Vector512<double> slopeIm,
        int terms,
        Span<Vector512<double>> potential,
        Span<Vector512<double>> fieldRe,
        Span<Vector512<double>> fieldIm,
        Span<Vector512<double>> workspace)
    {
        var qRe = workspace[..(terms + 1)];
        var qIm = workspace.Slice(terms + 1, terms + 1);
        var (re, im) = (2.0 * rootRe - Vector512.Create(1.0), 2.0 * rootIm);
        var logs = LegendreSecondKind.Fill(re, im, potential.IsEmpty ? terms - 1 : terms, ref qRe[0], ref qIm[0]);
        if (!potential.IsEmpty)
        {
            // ∫ ln(ξ - x) dx = 2 ξ Q_0 + ln(ξ+1) + ln(ξ-1) - 2; ∫ P_n ln(ξ - x) dx = 2 (Q_(n+1) - Q_(n-1)) / (2n+1)
            potential[0] += re * qRe[0] - im * qIm[0] + 0.5 * logs - Vector512.Create(1 + Math.Log(2));
            for (var n = 1; n < terms; n++)
                potential[n] += (qRe[n + 1] - qRe[n - 1]) * (1.0 / (2 * n + 1));
            return;
        }

        for (var n = 0; n < terms; n++)
        {
            fieldRe[n] += slopeRe * qRe[n] - slopeIm * qIm[n];
            fieldIm[n] += slopeRe * qIm[n] + slopeIm * qRe[n];
        }
    }

    /// <summary>∫ P_n ln|z - X/u| du = δ_n0 ln|z| + ∫ P_n ln|w - u| du - ∫ P_n ln u du with w = X/z.</summary>
    private static void AddInfinite(
        Vector512<double> re,
        Vector512<double> im,
        double start,
        int terms,
        Span<Vector512<double>> potential,
        Span<Vector512<double>> fieldRe,
        Span<Vector512<double>> fieldIm,
        Span<Vector512<double>> workspace)
    {
        var square = Vector512.Max(re * re + im * im, Vector512.Create(1e-24));
        var (rootRe, rootIm) = (re / square, -im / square);
        // dw/dz = -w²/X
        var scale = -2 / start;
        var slopeRe = (rootRe * rootRe - rootIm * rootIm) * scale;
        var slopeIm = 2.0 * rootRe * rootIm * scale;
        AddRoot(rootRe, rootIm, slopeRe, slopeIm, terms, potential, fieldRe, fieldIm, workspace);
        if (!potential.IsEmpty)
        {
            potential[0] += 0.5 * Vector512.Log(square) + Vector512.Create(Math.Log(start));
            return;
        }

        fieldRe[0] += rootRe / start;
        fieldIm[0] += rootIm / start;
    }
}
