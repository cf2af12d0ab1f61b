namespace StackTiming.Waves.Networks;

/// <summary>Resistance, inductance and capacitance in series with each other, between two nodes.</summary>
/// <param name="From">One node.</param>
/// <param name="To">The other node.</param>
/// <param name="ResistanceOhms">Resistance in ohms; 0 for none.</param>
/// <param name="InductanceHenries">Inductance in henries; 0 for none.</param>
/// <param name="CapacitanceFarads">Capacitance in farads, or null where the branch conducts direct current.</param>
public readonly record struct SeriesBranch(int From, int To, double ResistanceOhms, double InductanceHenries, double? CapacitanceFarads);
