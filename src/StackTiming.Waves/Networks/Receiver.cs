namespace StackTiming.Waves.Networks;

/// <summary>A receiver: what it loads its node with, and the levels that it judges by.</summary>
/// <param name="Node">The node of its pin.</param>
/// <param name="CapacitanceFarads">Input capacitance to ground, in farads; 0 for none.</param>
/// <param name="ResistanceOhms">Termination inside the receiver in ohms, or null for none.</param>
/// <param name="ToVolts">Voltage behind that termination, in volts.</param>
/// <param name="Thresholds">Its input levels, or null where only the extremes of the voltage count.</param>
public sealed record Receiver(int Node, double CapacitanceFarads, double? ResistanceOhms, double ToVolts, Thresholds? Thresholds);

/// <summary>Input levels of a receiver, in volts.</summary>
/// <param name="VilVolts">Below it the input is surely low.</param>
/// <param name="VihVolts">Above it the input is surely high.</param>
/// <param name="MidVolts">The level at which delays are measured (<c>threshold</c>).</param>
public readonly record struct Thresholds(double VilVolts, double VihVolts, double MidVolts);

/// <summary>The load of the driver alone against which flight time counts.</summary>
/// <param name="ResistanceOhms">Resistance in ohms, or null for none.</param>
/// <param name="ToVolts">Voltage behind the resistance.</param>
/// <param name="CapacitanceFarads">Capacitance to ground in farads; 0 for none.</param>
public sealed record ReferenceLoad(double? ResistanceOhms, double ToVolts, double CapacitanceFarads);
