using StackTiming.Stackups.Quantities;

namespace StackTiming.Nets.Parts;

/// <summary>A linear driver: an open-circuit source that ramps between two levels behind a resistance.</summary>
/// <param name="Low">Low level of the source, V.</param>
/// <param name="High">High level of the source, V; above <paramref name="Low"/>.</param>
/// <param name="Resistance">Source resistance, ohm.</param>
/// <param name="Rise">0–100 % ramp from low to high, s.</param>
/// <param name="Fall">0–100 % ramp from high to low, s; the rise where the file states none.</param>
/// <param name="Capacitance">Capacitance of the die to ground, F; 0 where not stated.</param>
/// <param name="Package">The package, or null.</param>
public sealed record DriverModel(
    Quantity Low, Quantity High, Quantity Resistance, Quantity Rise, Quantity Fall, Quantity Capacitance, PackageModel? Package);
