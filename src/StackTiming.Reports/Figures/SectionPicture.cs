using System.Collections.Immutable;

namespace StackTiming.Reports.Figures;

/// <summary>The fields of a driven cross-section, ready to be drawn. Lengths are metres, x to the right, y upwards.</summary>
/// <param name="Title">What is shown: file, drive, impedance.</param>
/// <param name="Drive">The voltages of the signals and the currents that go with them, in words.</param>
/// <param name="Outline">The shapes.</param>
/// <param name="PotentialVolts">Potential.</param>
/// <param name="EnergyJoulePerCubicMetre">Density of the electric energy; NaN in metal.</param>
/// <param name="PowerWattPerSquareMetre">Density of the power along the line; NaN in metal.</param>
/// <param name="Charges">Charge on the faces of the conductors.</param>
/// <param name="Returns">Return current in the infinite planes.</param>
/// <param name="CurrentDrive">The signal currents behind <paramref name="Returns"/>, in words.</param>
public sealed record SectionPicture(
    string Title,
    string Drive,
    SectionOutline Outline,
    FieldGrid PotentialVolts,
    FieldGrid EnergyJoulePerCubicMetre,
    FieldGrid PowerWattPerSquareMetre,
    ImmutableArray<ChargedFace> Charges,
    ImmutableArray<PlaneCurrent> Returns,
    string CurrentDrive);

/// <summary>The shapes of a cross-section inside a window.</summary>
/// <param name="Left">Left edge of the window.</param>
/// <param name="Bottom">Lower edge.</param>
/// <param name="Right">Right edge.</param>
/// <param name="Top">Upper edge.</param>
/// <param name="Dielectrics">Slabs and mask, in drawing order, with a name where it is to be written.</param>
/// <param name="Conductors">Outlines of the conductors.</param>
/// <param name="PlaneHeights">Heights of the faces of infinite planes; true where the metal lies above.</param>
public sealed record SectionOutline(
    double Left, double Bottom, double Right, double Top,
    ImmutableArray<DielectricArea> Dielectrics, ImmutableArray<ConductorShape> Conductors, ImmutableArray<(double Height, bool MetalAbove)> PlaneHeights);

/// <summary>An area of one dielectric.</summary>
/// <param name="Name">Name and constants, written into the area.</param>
/// <param name="Dk">Relative permittivity: the darker the higher.</param>
/// <param name="Corners">Corners.</param>
public sealed record DielectricArea(string Name, double Dk, ImmutableArray<(double X, double Y)> Corners);

/// <summary>The outline of a conductor.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Label">What is written on it, such as its voltage.</param>
/// <param name="Corners">Corners.</param>
public sealed record ConductorShape(string Name, string Label, ImmutableArray<(double X, double Y)> Corners);

/// <summary>Values on an even grid that fills the window: the middle of every cell, rows from the top.</summary>
/// <param name="Columns">Cells across.</param>
/// <param name="Rows">Cells down.</param>
/// <param name="Values">Row by row.</param>
public sealed record FieldGrid(int Columns, int Rows, double[] Values);

/// <summary>Charge along one straight stretch of a conductor's surface.</summary>
/// <param name="X">Stations.</param>
/// <param name="Y">Their heights.</param>
/// <param name="NormalX">Direction out of the metal.</param>
/// <param name="NormalY">Direction out of the metal.</param>
/// <param name="CoulombPerSquareMetre">Charge density at the stations.</param>
public sealed record ChargedFace(double[] X, double[] Y, double NormalX, double NormalY, double[] CoulombPerSquareMetre);

/// <summary>Return current in an infinite plane.</summary>
/// <param name="Name">Which plane.</param>
/// <param name="X">Stations in rising order.</param>
/// <param name="AmperePerMetre">Density at the stations.</param>
/// <param name="Low">Left end of the width that holds 95 % of the magnitude.</param>
/// <param name="High">Its right end.</param>
/// <param name="TotalAmperes">Current of the whole plane.</param>
public sealed record PlaneCurrent(string Name, double[] X, double[] AmperePerMetre, double Low, double High, double TotalAmperes);
