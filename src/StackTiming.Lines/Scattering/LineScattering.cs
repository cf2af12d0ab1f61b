using System.Numerics;
using StackTiming.Lines.Loss;

namespace StackTiming.Lines.Scattering;

/// <summary>
/// Scattering parameters of a uniform line of one or two signals (the solution of the telegraph equations in matrices: C. R. Paul, Analysis of Multiconductor
/// Transmission Lines, 2nd ed. 2008, ch. 7). With the propagation matrix Γ = √(ZY) and E = exp(−Γ·length) the line, which looks the same from both ends, is
/// driven once evenly, V = (1 + E)·w and I = Y_c·(1 − E)·w, and once oddly, with the signs exchanged; half the sum and half the difference of the two reflections
/// are reflection and transmission. Nothing in it grows with length or has a pole, as the chain matrix does.
/// <para>Ports: 1 to n are the near ends of the signals in their order, n + 1 to 2n their far ends.</para>
/// </summary>
public static class LineScattering
{
    /// <summary>The scattering matrix.</summary>
    /// <param name="line">The line at a frequency; one or two signals.</param>
    /// <param name="lengthMetres">Length, m, at least 0.</param>
    /// <param name="referenceOhms">Reference resistance of every port, ohm, above 0.</param>
    /// <exception cref="ArgumentException">The line has more than two signals.</exception>
    public static Complex[,] Of(LineAtFrequency line, double lengthMetres, double referenceOhms)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(lengthMetres);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(referenceOhms);
        var n = line.Signals.Length;
        if (n > 2)
            throw new ArgumentException("scattering parameters are computed for one or two signals", nameof(line));
        var omega = 2 * Math.PI * line.FrequencyHertz;
        var series = SmallMatrix.Of(n, line.ResistanceOhmPerMetre, line.InductanceHenryPerMetre, omega);
        var shunt = SmallMatrix.Of(n, line.ConductanceSiemensPerMetre, line.CapacitanceFaradPerMetre, omega);
        var (gamma, decay) = (series * shunt).RootAndDecay(lengthMetres);
        var admittance = referenceOhms * (series.Inverse() * gamma);
        var one = SmallMatrix.Identity;
        var (sum, difference) = (one + decay, one - decay);
        var even = Reflection(sum, admittance * difference);
        var odd = Reflection(difference, admittance * sum);
        var (near, far) = (0.5 * (even + odd), 0.5 * (even - odd));
        var s = new Complex[2 * n, 2 * n];
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
            {
                s[i, j] = s[n + i, n + j] = near[i, j];
                s[i, n + j] = s[n + i, j] = far[i, j];
            }
        }
        return s;
    }

    private static SmallMatrix Reflection(SmallMatrix voltage, SmallMatrix current) => (voltage - current) * (voltage + current).Inverse();
}
