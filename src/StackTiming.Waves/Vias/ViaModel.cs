using System.Collections.Immutable;

namespace StackTiming.Waves.Vias;

/// <summary>
/// What a via does to a signal: a short coaxial line between its two traces, open stubs of the same line beyond them, and the extra
/// capacitance of the two pads.
/// </summary>
/// <param name="Geometry">The geometry, as stated or assumed.</param>
/// <param name="Assumptions">What was assumed because the length list does not state it, in sentences without a final full stop.</param>
public sealed record ViaModel(ViaGeometry Geometry, ImmutableArray<string> Assumptions)
{
    /// <summary>Characteristic impedance of the barrel, ohm.</summary>
    public double Z0Ohms => CoaxialBarrel.Z0Ohms(Geometry.DrillMetres, Geometry.AntipadMetres, Geometry.DkThrough);

    /// <summary>Inductance of the part that the signal runs along, H.</summary>
    public double InductanceHenry =>
        CoaxialBarrel.InductancePerMetre(Geometry.DrillMetres, Geometry.AntipadMetres) * Geometry.ThroughMetres;

    /// <summary>Capacitance of the part that the signal runs along, without pads, F.</summary>
    public double ThroughCapacitanceFarad =>
        CoaxialBarrel.CapacitancePerMetre(Geometry.DrillMetres, Geometry.AntipadMetres, Geometry.DkThrough) * Geometry.ThroughMetres;

    /// <summary>Capacitance of both stubs, F.</summary>
    public double StubCapacitanceFarad =>
        CoaxialBarrel.CapacitancePerMetre(Geometry.DrillMetres, Geometry.AntipadMetres, Geometry.DkStubs)
        * (Geometry.StubAboveMetres + Geometry.StubBelowMetres);

    /// <summary>What the two pads of the signal's traces add to the barrel inside their copper's thickness, F.</summary>
    public double PadCapacitanceFarad => Geometry.PadThicknessMetres
        * (CoaxialBarrel.CapacitancePerMetre(Geometry.PadMetres, Geometry.AntipadMetres, Geometry.DkThrough)
            - CoaxialBarrel.CapacitancePerMetre(Geometry.DrillMetres, Geometry.AntipadMetres, Geometry.DkThrough));

    /// <summary>Whole capacitance, F.</summary>
    public double CapacitanceFarad => ThroughCapacitanceFarad + StubCapacitanceFarad + PadCapacitanceFarad;

    /// <summary>Time of flight along the barrel alone, s.</summary>
    public double BarrelDelaySeconds => Math.Sqrt(InductanceHenry * ThroughCapacitanceFarad);

    /// <summary>Delay along the longer stub, s: a quarter of the period of its first notch.</summary>
    public double LongerStubDelaySeconds =>
        Math.Max(Geometry.StubAboveMetres, Geometry.StubBelowMetres) * Math.Sqrt(Geometry.DkStubs) / Lines.Constants.Vacuum.SpeedOfLight;

    /// <summary>
    /// Delay that the via adds between traces of a given impedance, s: (L/Z0 + C·Z0)/2, the exact low-frequency delay of a short
    /// symmetric two-port with series inductance L and shunt capacitance C between matched ends. It is the barrel's time of flight where the
    /// trace has the barrel's impedance and there are no stubs and pads, and more otherwise.
    /// </summary>
    /// <param name="traceOhms">Impedance of the traces, ohm; above zero.</param>
    public double DelaySeconds(double traceOhms) => 0.5 * (InductanceHenry / traceOhms + CapacitanceFarad * traceOhms);

    /// <summary>The handbook's capacitance of the whole barrel, F: a second opinion that lies high.</summary>
    public double HandbookCapacitanceFarad => JohnsonGraham1993.CapacitanceFarad(
        Geometry.BarrelMetres, Geometry.PadMetres, Geometry.AntipadMetres, Geometry.DkThrough);

    /// <summary>The handbook's inductance of the part that the signal runs along, H: a second opinion that lies high.</summary>
    public double HandbookInductanceHenry => JohnsonGraham1993.InductanceHenry(Geometry.ThroughMetres, Geometry.DrillMetres);
}
