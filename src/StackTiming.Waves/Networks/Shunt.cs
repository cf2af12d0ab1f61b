namespace StackTiming.Waves.Networks;

/// <summary>Elements at one node, in parallel with each other.</summary>
/// <param name="Node">The node.</param>
/// <param name="CapacitanceFarads">Capacitance to ground, in farads; 0 for none.</param>
/// <param name="ResistanceOhms">Resistance to the voltage <paramref name="ToVolts"/>, in ohms, or null for none.</param>
/// <param name="ToVolts">Voltage behind the resistance, in volts.</param>
/// <param name="InductanceHenries">Inductance to ground, in henries, or null for none.</param>
public readonly record struct Shunt(int Node, double CapacitanceFarads, double? ResistanceOhms, double ToVolts, double? InductanceHenries);
