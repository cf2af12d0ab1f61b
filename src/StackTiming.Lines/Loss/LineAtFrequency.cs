using System.Collections.Immutable;

namespace StackTiming.Lines.Loss;

/// <summary>What the signals of a cross-section are per metre at one frequency, losses included.</summary>
/// <param name="Signals">Names of the signals, in the order of the matrix rows.</param>
/// <param name="FrequencyHertz">The frequency, Hz.</param>
/// <param name="ResistanceOhmPerMetre">R: series resistance matrix with roughness, ohm/m.</param>
/// <param name="InductanceHenryPerMetre">L: external and internal inductance matrix, H/m.</param>
/// <param name="ConductanceSiemensPerMetre">G: shunt conductance matrix, S/m.</param>
/// <param name="CapacitanceFaradPerMetre">C: Maxwell capacitance matrix, F/m.</param>
/// <param name="Modes">The wave of a single signal; the differential and the common wave of a pair; empty for more signals.</param>
/// <param name="Warnings">What the reader of the result must know.</param>
public sealed record LineAtFrequency(
    ImmutableArray<string> Signals,
    double FrequencyHertz,
    double[,] ResistanceOhmPerMetre,
    double[,] InductanceHenryPerMetre,
    double[,] ConductanceSiemensPerMetre,
    double[,] CapacitanceFaradPerMetre,
    ImmutableArray<WaveAtFrequency> Modes,
    ImmutableArray<string> Warnings);

/// <summary>A wave on a line at one frequency. Attenuations add up to the whole.</summary>
/// <param name="Name"><c>single</c>, <c>differential</c> or <c>common</c>.</param>
/// <param name="Z0Ohms">Real part of the characteristic impedance, ohm: differential impedance for the differential wave.</param>
/// <param name="Z0ReactanceOhms">Its imaginary part, ohm.</param>
/// <param name="DelaySecondsPerMetre">Phase delay, s/m.</param>
/// <param name="ConductorDecibelPerMetre">Attenuation by the resistance of smooth metal, dB/m.</param>
/// <param name="RoughnessDecibelPerMetre">Attenuation that roughness adds, dB/m.</param>
/// <param name="DielectricDecibelPerMetre">Attenuation by the dielectrics, dB/m.</param>
public sealed record WaveAtFrequency(
    string Name, double Z0Ohms, double Z0ReactanceOhms, double DelaySecondsPerMetre,
    double ConductorDecibelPerMetre, double RoughnessDecibelPerMetre, double DielectricDecibelPerMetre)
{
    /// <summary>Whole attenuation, dB/m.</summary>
    public double AttenuationDecibelPerMetre => ConductorDecibelPerMetre + RoughnessDecibelPerMetre + DielectricDecibelPerMetre;
}
