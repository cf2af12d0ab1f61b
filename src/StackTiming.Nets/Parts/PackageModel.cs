namespace StackTiming.Nets.Parts;

/// <summary>
/// The package of a driver or receiver: a shunt capacitance at the die, then a series inductance to the pin.
/// </summary>
/// <param name="InductanceHenry">Series inductance, H; 0 for none.</param>
/// <param name="CapacitanceFarad">Shunt capacitance at the die, F; 0 for none.</param>
public sealed record PackageModel(double InductanceHenry, double CapacitanceFarad);
