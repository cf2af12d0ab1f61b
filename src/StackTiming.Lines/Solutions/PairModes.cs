using StackTiming.Lines.Constants;

namespace StackTiming.Lines.Solutions;

/// <summary>
/// What a pair shows to differential and common signals. The differential drive is +1/2 V and −1/2 V, the common drive 1 V on both; each
/// impedance is 1/(c·√(C·C₀)) of the capacitance that the drive sees with and without the dielectrics, which is 2·Z_odd and Z_even/2 where the
/// pair is symmetric.
/// </summary>
/// <param name="ZDiffOhms">Differential impedance, ohm.</param>
/// <param name="ZCommonOhms">Common-mode impedance, ohm.</param>
/// <param name="EpsEffDiff">Effective permittivity of the differential drive.</param>
/// <param name="EpsEffCommon">Effective permittivity of the common drive.</param>
/// <param name="IsSymmetric">True where the two signals are alike within 0.02 %, so that the drives are the odd and even modes.</param>
public sealed record PairModes(double ZDiffOhms, double ZCommonOhms, double EpsEffDiff, double EpsEffCommon, bool IsSymmetric)
{
    private const double SymmetryTolerance = 2e-4;

    /// <summary>Impedance of one signal in the odd mode, ohm; null where the pair is not symmetric.</summary>
    public double? ZOddOhms => IsSymmetric ? 0.5 * ZDiffOhms : null;

    /// <summary>Impedance of one signal in the even mode, ohm; null where the pair is not symmetric.</summary>
    public double? ZEvenOhms => IsSymmetric ? 2 * ZCommonOhms : null;

    /// <summary>Effective permittivity of the odd mode; null where the pair is not symmetric.</summary>
    public double? EpsEffOdd => IsSymmetric ? EpsEffDiff : null;

    /// <summary>Effective permittivity of the even mode; null where the pair is not symmetric.</summary>
    public double? EpsEffEven => IsSymmetric ? EpsEffCommon : null;

    /// <summary>Delay of a differential signal, seconds per metre.</summary>
    public double DiffDelaySecondsPerMetre => Math.Sqrt(EpsEffDiff) / Vacuum.SpeedOfLight;

    /// <summary>Delay of a common-mode signal, seconds per metre.</summary>
    public double CommonDelaySecondsPerMetre => Math.Sqrt(EpsEffCommon) / Vacuum.SpeedOfLight;

    /// <summary>The modes of the first two signals of a solution; other signals are held at zero volts.</summary>
    /// <param name="solution">A solution with at least two signals.</param>
    /// <exception cref="ArgumentException">The solution has fewer than two signals.</exception>
    public static PairModes Of(LineSolution solution)
    {
        if (solution.Signals.Length < 2)
            throw new ArgumentException("a pair needs two signals", nameof(solution));
        return Of(solution.CapacitanceFaradPerMetre, solution.InductanceHenryPerMetre);
    }

    private static PairModes Of(double[,] c, double[,] l)
    {
        // Capacitance of the same conductors in air, from C₀ = μ₀ε₀·L⁻¹ restricted to the two signals.
        var inverse = new double[2, 2];
        var det = l[0, 0] * l[1, 1] - l[0, 1] * l[1, 0];
        const double mu0Epsilon0 = 1 / (Vacuum.SpeedOfLight * Vacuum.SpeedOfLight);
        inverse[0, 0] = mu0Epsilon0 * l[1, 1] / det;
        inverse[1, 1] = mu0Epsilon0 * l[0, 0] / det;
        inverse[0, 1] = inverse[1, 0] = -mu0Epsilon0 * 0.5 * (l[0, 1] + l[1, 0]) / det;
        var diff = Drive(c, 0.5, -0.5);
        var diffAir = Drive(inverse, 0.5, -0.5);
        var common = Drive(c, 1, 1);
        var commonAir = Drive(inverse, 1, 1);
        var symmetric = IsClose(c[0, 0], c[1, 1]) && IsClose(l[0, 0], l[1, 1]);
        return new PairModes(
            Impedance(diff, diffAir), Impedance(common, commonAir), diff / diffAir, common / commonAir, symmetric);
    }

    private static double Drive(double[,] c, double v1, double v2) =>
        v1 * v1 * c[0, 0] + v2 * v2 * c[1, 1] + v1 * v2 * (c[0, 1] + c[1, 0]);

    private static double Impedance(double c, double cAir) => 1 / (Vacuum.SpeedOfLight * Math.Sqrt(c * cAir));

    private static bool IsClose(double a, double b) => Math.Abs(a - b) <= SymmetryTolerance * Math.Max(Math.Abs(a), Math.Abs(b));
}
