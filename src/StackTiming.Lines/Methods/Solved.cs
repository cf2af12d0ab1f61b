using System.Collections.Immutable;
using StackTiming.Lines.Constants;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Methods;

/// <summary>Solutions from the impedances that closed forms give.</summary>
internal static class Solved
{
    /// <summary>A single signal.</summary>
    /// <param name="signal">Its name.</param>
    /// <param name="method">The method.</param>
    /// <param name="z0Ohms">Characteristic impedance, ohm.</param>
    /// <param name="epsEff">Effective permittivity.</param>
    /// <param name="shares">Energy shares.</param>
    /// <param name="warnings">Warnings.</param>
    public static LineSolution Single(
        string signal, LineMethod method, double z0Ohms, double epsEff, ImmutableArray<DielectricShare> shares, ImmutableArray<string> warnings)
    {
        var delay = Math.Sqrt(epsEff) / Vacuum.SpeedOfLight;
        return new LineSolution(
            [signal], method.Id, new[,] { { delay / z0Ohms } }, new[,] { { delay * z0Ohms } }, shares, ErrorOf(method), warnings);
    }

    /// <summary>A symmetric pair.</summary>
    /// <param name="first">Name of the first signal.</param>
    /// <param name="second">Name of the second.</param>
    /// <param name="method">The method.</param>
    /// <param name="odd">Impedance in ohm and effective permittivity of the odd mode.</param>
    /// <param name="even">Impedance in ohm and effective permittivity of the even mode.</param>
    /// <param name="shares">Energy shares under differential drive.</param>
    /// <param name="warnings">Warnings.</param>
    public static LineSolution Pair(
        string first, string second, LineMethod method, (double Z0Ohms, double EpsEff) odd, (double Z0Ohms, double EpsEff) even,
        ImmutableArray<DielectricShare> shares, ImmutableArray<string> warnings)
    {
        double oddDelay = Math.Sqrt(odd.EpsEff) / Vacuum.SpeedOfLight, evenDelay = Math.Sqrt(even.EpsEff) / Vacuum.SpeedOfLight;
        return new LineSolution(
            [first, second], method.Id,
            Symmetric(evenDelay / even.Z0Ohms, oddDelay / odd.Z0Ohms),
            Symmetric(evenDelay * even.Z0Ohms, oddDelay * odd.Z0Ohms),
            shares, ErrorOf(method), warnings);
    }

    private static double[,] Symmetric(double even, double odd)
    {
        double own = 0.5 * (even + odd), mutual = 0.5 * (even - odd);
        return new[,] { { own, mutual }, { mutual, own } };
    }

    /// <summary>The documented error of a method: the largest that was measured, of impedance or permittivity.</summary>
    /// <param name="method">The method.</param>
    public static double ErrorOf(LineMethod method)
    {
        var largest = 0.0;
        foreach (var measured in method.Measured)
            largest = Math.Max(largest, Math.Max(measured.ImpedanceError, measured.EpsEffError));
        return largest;
    }
}
