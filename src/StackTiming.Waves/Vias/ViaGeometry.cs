namespace StackTiming.Waves.Vias;

/// <summary>A plated hole as its capacitance and inductance see it. All lengths in metres.</summary>
/// <param name="ThroughMetres">Length of the barrel that the signal runs along.</param>
/// <param name="StubAboveMetres">Length of the barrel above that.</param>
/// <param name="StubBelowMetres">Length of the barrel below that.</param>
/// <param name="DrillMetres">Diameter of the barrel.</param>
/// <param name="PadMetres">Diameter of the pads; above <paramref name="DrillMetres"/>.</param>
/// <param name="AntipadMetres">Diameter of the clearance in the planes; above <paramref name="PadMetres"/>.</param>
/// <param name="PadThicknessMetres">Thickness of the copper of both pads that the signal's traces end on, together.</param>
/// <param name="DkThrough">Mean relative permittivity along the part that the signal runs along.</param>
/// <param name="DkStubs">Mean relative permittivity along the stubs; that of the through part where there are none.</param>
public readonly record struct ViaGeometry(
    double ThroughMetres,
    double StubAboveMetres,
    double StubBelowMetres,
    double DrillMetres,
    double PadMetres,
    double AntipadMetres,
    double PadThicknessMetres,
    double DkThrough,
    double DkStubs)
{
    /// <summary>Length of the whole barrel.</summary>
    public double BarrelMetres => ThroughMetres + StubAboveMetres + StubBelowMetres;
}
