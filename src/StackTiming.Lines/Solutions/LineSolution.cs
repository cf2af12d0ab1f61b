using System.Collections.Immutable;
using StackTiming.Lines.Constants;

namespace StackTiming.Lines.Solutions;

/// <summary>
/// The quasi-static constants per metre of the signals of a cross-section, whoever computed them: a closed form or the field solver.
/// </summary>
/// <param name="Signals">Names of the signals, in the order of the matrix rows.</param>
/// <param name="MethodId">Id of the method that produced the result, as <c>stacktiming methods</c> lists it.</param>
/// <param name="CapacitanceFaradPerMetre">Maxwell capacitance matrix, F/m, planes and grounded conductors at zero volts.</param>
/// <param name="InductanceHenryPerMetre">External inductance matrix, H/m.</param>
/// <param name="EnergyShares">Share of the field energy in each dielectric: unit drive of a single signal; ±1/2 V on a pair.</param>
/// <param name="RelativeError">The documented error of a closed form, or the estimated error of the solver; relative, e.g. 0.01.</param>
/// <param name="Warnings">What the reader of the result must know, such as a use outside the validity range.</param>
public sealed record LineSolution(
    ImmutableArray<string> Signals,
    string MethodId,
    double[,] CapacitanceFaradPerMetre,
    double[,] InductanceHenryPerMetre,
    ImmutableArray<DielectricShare> EnergyShares,
    double RelativeError,
    ImmutableArray<string> Warnings)
{
    private double C11 => CapacitanceFaradPerMetre[0, 0];
    private double L11 => InductanceHenryPerMetre[0, 0];

    /// <summary>Characteristic impedance of a single signal, ohm.</summary>
    public double Z0Ohms => Math.Sqrt(L11 / C11);

    /// <summary>Effective permittivity of a single signal.</summary>
    public double EpsEff => L11 * C11 * Vacuum.SpeedOfLight * Vacuum.SpeedOfLight;

    /// <summary>Delay of a single signal, seconds per metre.</summary>
    public double DelaySecondsPerMetre => Math.Sqrt(L11 * C11);
}
