using StackTiming.Stackups.Quantities;

namespace StackTiming.Nets.Parts;

/// <summary>Two pins of a series part, joined by resistance, inductance and capacitance in series.</summary>
/// <param name="FirstPin">Name of one pin.</param>
/// <param name="SecondPin">Name of the other.</param>
/// <param name="Resistance">Resistance, ohm; 0 where not stated.</param>
/// <param name="Inductance">Inductance, H; 0 where not stated.</param>
/// <param name="Capacitance">Series capacitance, F, or null where d.c. passes.</param>
public sealed record SeriesJoin(string FirstPin, string SecondPin, Quantity Resistance, Quantity Inductance, Quantity? Capacitance);
