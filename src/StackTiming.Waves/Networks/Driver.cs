namespace StackTiming.Waves.Networks;

/// <summary>A linear driver: a source that ramps between two levels, behind a resistance and, where given, a package.</summary>
/// <param name="Node">The node of its pin.</param>
/// <param name="LowVolts">Open-circuit low level, in volts.</param>
/// <param name="HighVolts">Open-circuit high level, in volts.</param>
/// <param name="ResistanceOhms">Source resistance in ohms; above 0.</param>
/// <param name="Package">The package, or null where the pin is the die.</param>
public sealed record Driver(int Node, double LowVolts, double HighVolts, double ResistanceOhms, DriverPackage? Package);

/// <summary>A driver's package: a capacitance from the die to ground, then an inductance in series to the pin.</summary>
/// <param name="InductanceHenries">Inductance in henries; 0 for none.</param>
/// <param name="CapacitanceFarads">Capacitance at the die in farads; 0 for none.</param>
public sealed record DriverPackage(double InductanceHenries, double CapacitanceFarads);
