using System.Collections.Immutable;
using StackTiming.Lines.Fields.Geometry;
using StackTiming.Lines.Fields.Systems;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Fields;

/// <summary>
/// A solved section: the line's constants, and the charges from which fields, currents and losses are computed. It holds the factored equations
/// (some hundred kilobytes to some megabytes); keep only <see cref="Line"/> where many sections are kept.
/// </summary>
public sealed class FieldSolution
{
    private readonly SectionFrame frame;
    private readonly SectionSurfaces surfaces;
    private readonly ConductorPairs pairs;

    internal FieldSolution(
        CrossSection section, LineSolution line, SectionFrame frame, SectionSurfaces surfaces, ConductorPairs pairs, SolvedMesh mesh)
    {
        (Section, Line) = (section, line);
        (this.frame, this.surfaces, this.pairs, Mesh) = (frame, surfaces, pairs, mesh);
    }

    /// <summary>The section that was solved.</summary>
    public CrossSection Section { get; }

    /// <summary>Capacitance and inductance per metre, energy shares and the estimated error.</summary>
    public LineSolution Line { get; }

    /// <summary>Number of unknowns of the last mesh (of each parity in a symmetric section).</summary>
    public int Unknowns => Mesh.Unknowns;

    internal SolvedMesh Mesh { get; }

    internal SectionFrame Frame => frame;

    internal ConductorPairs Pairs => pairs;

    /// <summary>Share of the electric energy in each dielectric when the signals have these voltages.</summary>
    public ImmutableArray<DielectricShare> EnergyShares(ReadOnlySpan<double> signalVolts)
    {
        CheckSignals(signalVolts.Length);
        return EnergyPicture.Shares(Mesh, pairs, surfaces.Regions.Media, signalVolts);
    }

    /// <summary>The electric field when the signals have these voltages.</summary>
    public DrivenField Drive(ReadOnlySpan<double> signalVolts)
    {
        CheckSignals(signalVolts.Length);
        return new DrivenField(this, Mesh.Filled, pairs.Volts(signalVolts));
    }

    /// <summary>
    /// The electric field in air when the signals have these voltages. Turned by a right angle and divided by the wave impedance of vacuum it is the magnetic
    /// field of currents c·C₀·V with every dielectric present, because dielectrics do not carry magnetic flux differently from air.
    /// </summary>
    public DrivenField DriveInAir(ReadOnlySpan<double> signalVolts)
    {
        CheckSignals(signalVolts.Length);
        return new DrivenField(this, Mesh.Empty, pairs.Volts(signalVolts));
    }

    private void CheckSignals(int count)
    {
        if (count != pairs.Signals)
            throw new ArgumentException($"The section has {pairs.Signals} signals but {count} voltages were given.");
    }
}
