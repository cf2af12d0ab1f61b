using System.Collections.Immutable;

namespace StackTiming.Rules.Results;

/// <summary>A waveform kept for a figure: one receiver of one net for one edge of one driver.</summary>
/// <param name="Net">The net.</param>
/// <param name="Driver">Driver pin.</param>
/// <param name="Receiver">Receiver pin.</param>
/// <param name="Edge"><c>rise</c> or <c>fall</c>.</param>
/// <param name="TimeSeconds">Instants, seconds from the start of the ramp.</param>
/// <param name="Volts">Voltage at the receiver at these instants.</param>
/// <param name="DriverVolts">Voltage at the driver pin at these instants.</param>
/// <param name="VilVolts">Lower threshold, or null.</param>
/// <param name="VihVolts">Upper threshold, or null.</param>
/// <param name="ThresholdVolts">Threshold at which delays are taken, or null.</param>
/// <param name="Marks">Judged instants and levels.</param>
/// <param name="Rules">Ids of the rules that judged it, worst first.</param>
/// <param name="WorstRelativeMargin">The smallest relative margin of those findings, or null.</param>
public sealed record ReceiverWave(
    string Net,
    string Driver,
    string Receiver,
    string Edge,
    double[] TimeSeconds,
    double[] Volts,
    double[] DriverVolts,
    double? VilVolts,
    double? VihVolts,
    double? ThresholdVolts,
    ImmutableArray<WaveMark> Marks,
    ImmutableArray<string> Rules,
    double? WorstRelativeMargin);

/// <summary>A judged point of a waveform.</summary>
/// <param name="Name">What it is, such as <c>first crossing of vih</c>.</param>
/// <param name="TimeSeconds">Instant, or NaN for a level that has none.</param>
/// <param name="Volts">Level, volts.</param>
public readonly record struct WaveMark(string Name, double TimeSeconds, double Volts);
