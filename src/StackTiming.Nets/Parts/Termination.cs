using StackTiming.Stackups.Quantities;

namespace StackTiming.Nets.Parts;

/// <summary>A resistor from a pin to a fixed voltage.</summary>
/// <param name="Resistance">Resistance, ohm; above zero.</param>
/// <param name="ToVolts">The voltage that it goes to, V; 0 is ground.</param>
/// <param name="CapacitanceFarad">Capacitance in series with the resistor, F, or null where it is connected directly.</param>
public sealed record Termination(Quantity Resistance, double ToVolts, double? CapacitanceFarad);
