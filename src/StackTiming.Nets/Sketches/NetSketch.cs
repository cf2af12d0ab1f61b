using System.Collections.Immutable;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Sketches;

/// <summary>A net drawn by hand (<c>*.net.yaml</c>): lines between named nodes, elements at them, one driver and what it sends. All values in SI units.</summary>
/// <param name="StackUp">The stack-up that lines with a layer refer to, or null.</param>
/// <param name="Driver">The driver.</param>
/// <param name="Lines">Single lines.</param>
/// <param name="CoupledLines">Symmetric pairs.</param>
/// <param name="Series">Elements between two nodes.</param>
/// <param name="Shunts">Elements at a node.</param>
/// <param name="Receivers">The receivers.</param>
/// <param name="Edge">What is sent.</param>
/// <param name="ReferenceLoad">The load against which flight time counts, or null.</param>
/// <param name="DurationSeconds">Length of the window, or null where the file leaves it open.</param>
public sealed record NetSketch(
    StackUp? StackUp,
    SketchDriver Driver,
    ImmutableArray<SketchLine> Lines,
    ImmutableArray<SketchPair> CoupledLines,
    ImmutableArray<SketchSeries> Series,
    ImmutableArray<SketchShunt> Shunts,
    ImmutableArray<SketchReceiver> Receivers,
    SketchEdge Edge,
    SketchLoad? ReferenceLoad,
    double? DurationSeconds);

/// <summary>The driver of a sketch.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="Node">Node of its pin.</param>
/// <param name="LowVolts">Low level of the source.</param>
/// <param name="HighVolts">High level of the source.</param>
/// <param name="ResistanceOhms">Source resistance.</param>
/// <param name="RiseSeconds">0–100 % ramp up.</param>
/// <param name="FallSeconds">0–100 % ramp down.</param>
/// <param name="PackageHenries">Inductance of the package; 0 for none.</param>
/// <param name="PackageFarads">Capacitance at the die; 0 for none.</param>
public sealed record SketchDriver(
    FilePosition At, string Node, double LowVolts, double HighVolts, double ResistanceOhms, double RiseSeconds, double FallSeconds,
    double PackageHenries, double PackageFarads);

/// <summary>A line of a sketch. What describes it is one of three forms.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="From">Node of its near end.</param>
/// <param name="To">Node of its far end.</param>
public abstract record SketchLine(FilePosition At, string From, string To);

/// <summary>A line given by impedance and delay.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="From">Node of its near end.</param>
/// <param name="To">Node of its far end.</param>
/// <param name="Z0Ohms">Impedance.</param>
/// <param name="DelaySeconds">Delay from end to end.</param>
public sealed record IdealSketchLine(FilePosition At, string From, string To, double Z0Ohms, double DelaySeconds) : SketchLine(At, From, To);

/// <summary>A trace of the stack-up.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="From">Node of its near end.</param>
/// <param name="To">Node of its far end.</param>
/// <param name="Layer">Copper layer.</param>
/// <param name="WidthMetres">Width on the drawing.</param>
/// <param name="LengthMetres">Length.</param>
public sealed record TraceSketchLine(FilePosition At, string From, string To, string Layer, double WidthMetres, double LengthMetres) : SketchLine(At, From, To);

/// <summary>A line with loss, given by its constants per metre: Z' = r_dc + r_skin·√(s/π) + s·l, wideband Debye dielectric.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="From">Node of its near end.</param>
/// <param name="To">Node of its far end.</param>
/// <param name="LengthMetres">Length.</param>
/// <param name="HenryPerMetre">Inductance.</param>
/// <param name="FaradPerMetre">Capacitance at <paramref name="AtHertz"/>.</param>
/// <param name="DcOhmPerMetre">Resistance at direct current.</param>
/// <param name="SkinOhmPerMetreRootHertz">Skin-effect coefficient.</param>
/// <param name="Df">Loss tangent at <paramref name="AtHertz"/>.</param>
/// <param name="AtHertz">Frequency of capacitance and loss tangent.</param>
public sealed record LossySketchLine(
    FilePosition At, string From, string To, double LengthMetres, double HenryPerMetre, double FaradPerMetre, double DcOhmPerMetre,
    double SkinOhmPerMetreRootHertz, double Df, double AtHertz) : SketchLine(At, From, To);

/// <summary>A symmetric coupled pair; conductor a leads from <paramref name="FromA"/> to <paramref name="ToA"/>, b likewise.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="FromA">Near end of a.</param>
/// <param name="FromB">Near end of b.</param>
/// <param name="ToA">Far end of a.</param>
/// <param name="ToB">Far end of b.</param>
/// <param name="ZEvenOhms">Even-mode impedance of one conductor.</param>
/// <param name="ZOddOhms">Odd-mode impedance of one conductor.</param>
/// <param name="DelayEvenSeconds">Even-mode delay.</param>
/// <param name="DelayOddSeconds">Odd-mode delay.</param>
public sealed record SketchPair(
    FilePosition At, string FromA, string FromB, string ToA, string ToB, double ZEvenOhms, double ZOddOhms, double DelayEvenSeconds, double DelayOddSeconds);

/// <summary>Resistance, inductance and capacitance in series between two nodes.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="From">One node.</param>
/// <param name="To">The other.</param>
/// <param name="ResistanceOhms">Resistance; 0 for none.</param>
/// <param name="InductanceHenries">Inductance; 0 for none.</param>
/// <param name="CapacitanceFarads">Capacitance, or null where direct current passes.</param>
public sealed record SketchSeries(FilePosition At, string From, string To, double ResistanceOhms, double InductanceHenries, double? CapacitanceFarads);

/// <summary>Elements at a node, in parallel.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="Node">The node.</param>
/// <param name="CapacitanceFarads">Capacitance to ground; 0 for none.</param>
/// <param name="InductanceHenries">Inductance to ground, or null.</param>
/// <param name="ResistanceOhms">Resistance to <paramref name="ToVolts"/>, or null.</param>
/// <param name="ToVolts">Voltage behind the resistance.</param>
public sealed record SketchShunt(
    FilePosition At, string Node, double CapacitanceFarads, double? InductanceHenries, double? ResistanceOhms, double ToVolts);

/// <summary>A receiver.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="Node">Its node.</param>
/// <param name="CapacitanceFarads">Input capacitance; 0 for none.</param>
/// <param name="ResistanceOhms">Termination inside it, or null.</param>
/// <param name="ToVolts">Voltage behind the termination.</param>
/// <param name="VilVolts">Lower level, or null where it states none.</param>
/// <param name="VihVolts">Upper level, or null.</param>
/// <param name="ThresholdVolts">Level of delays, or null.</param>
public sealed record SketchReceiver(
    FilePosition At, string Node, double CapacitanceFarads, double? ResistanceOhms, double ToVolts, double? VilVolts, double? VihVolts, double? ThresholdVolts);

/// <summary>What the driver sends.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="Rising">True for a single rising edge, false for a falling one; of no meaning for a pattern.</param>
/// <param name="Bits">The bits of a pattern, true for high; empty for a single edge.</param>
/// <param name="BitSeconds">Length of a bit; 0 for a single edge.</param>
public sealed record SketchEdge(FilePosition At, bool Rising, ImmutableArray<bool> Bits, double BitSeconds);

/// <summary>A load of the driver alone.</summary>
/// <param name="ResistanceOhms">Resistance, or null.</param>
/// <param name="ToVolts">Voltage behind it.</param>
/// <param name="CapacitanceFarads">Capacitance to ground; 0 for none.</param>
public sealed record SketchLoad(double? ResistanceOhms, double ToVolts, double CapacitanceFarads);
