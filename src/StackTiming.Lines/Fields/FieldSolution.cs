using System.Collections.Immutable;
using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields.Geometry;
using StackTiming.Lines.Fields.Systems;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Fields;

/// <summary>
/// A solved section: the line's constants, and the charges from which fields, currents, losses and material sensitivities are computed.
/// </summary>
public sealed class FieldSolution
{
    private readonly SectionFrame frame;
    private readonly SectionSurfaces surfaces;
    private readonly ConductorPairs pairs;

    internal FieldSolution(
        CrossSection section, LineSolution line, SectionFrame frame, SectionSurfaces surfaces, ConductorPairs pairs, SolvedMesh mesh, int level)
    {
        (Section, Line) = (section, line);
        (this.frame, this.surfaces, this.pairs, Mesh, Level) = (frame, surfaces, pairs, mesh, level);
    }

    /// <summary>The section that was solved.</summary>
    public CrossSection Section { get; }

    /// <summary>Capacitance and inductance per metre, energy shares and the estimated error.</summary>
    public LineSolution Line { get; }

    /// <summary>Number of unknowns of the last mesh (of each parity in a symmetric section).</summary>
    public int Unknowns => Mesh.Unknowns;

    internal SolvedMesh Mesh { get; }

    internal int Level { get; }

    internal SectionFrame Frame => frame;

    internal ConductorPairs Pairs => pairs;

    /// <summary>Share of the electric energy in each dielectric when the signals have these voltages.</summary>
    public ImmutableArray<DielectricShare> EnergyShares(ReadOnlySpan<double> signalVolts)
    {
        CheckSignals(signalVolts.Length);
        return EnergyPicture.Shares(Mesh, surfaces.Regions.Media, signalVolts);
    }

    /// <summary>
    /// The derivative of the capacitance matrix with respect to the relative permittivity of a material, F/m; exact on this mesh. Times the
    /// permittivity, the loss tangent and the angular frequency it is the material's part of the conductance matrix.
    /// </summary>
    /// <param name="dielectric">Name of the material.</param>
    public double[,] CapacitanceSlope(string dielectric)
    {
        var sum = new double[pairs.Signals, pairs.Signals];
        for (var m = 0; m < surfaces.Regions.Media.Count; m++)
        {
            if (surfaces.Regions.Media[m].Name == dielectric)
                AddScaled(sum, Mesh.CapacitanceSlope(m), 1);
        }

        return sum;
    }

    /// <summary>
    /// The conductance matrix over the angular frequency, F/m, with the loss tangents of the section: the sum over the materials of
    /// permittivity times loss tangent times <see cref="CapacitanceSlope"/>.
    /// </summary>
    public double[,] LossCapacitance()
    {
        var sum = new double[pairs.Signals, pairs.Signals];
        for (var m = 0; m < surfaces.Regions.Media.Count; m++)
            AddScaled(sum, Mesh.CapacitanceSlope(m), surfaces.Regions.Media[m].Dk * surfaces.Regions.Media[m].Df);
        return sum;
    }

    /// <summary>The electric field when the signals have these voltages.</summary>
    public DrivenField Drive(ReadOnlySpan<double> signalVolts)
    {
        CheckSignals(signalVolts.Length);
        return Field(Mesh.Filled, signalVolts);
    }

    /// <summary>
    /// The electric field in air when the signals have these voltages. Turned by a right angle and divided by the wave impedance of
    /// vacuum it is the magnetic field of currents c·C₀·V with every dielectric present, because dielectrics do not carry magnetic flux
    /// differently from air.
    /// </summary>
    public DrivenField DriveInAir(ReadOnlySpan<double> signalVolts)
    {
        CheckSignals(signalVolts.Length);
        return Field(Mesh.Empty, signalVolts);
    }

    /// <summary>The charge on every conductor and dielectric boundary when the signals have these voltages.</summary>
    public IReadOnlyList<SurfaceCharge> SurfaceCharges(ReadOnlySpan<double> signalVolts)
    {
        CheckSignals(signalVolts.Length);
        return SurfaceCharge.Of(this, new SolvedDrive(Mesh.Panels, Mesh.Filled, pairs.Volts(signalVolts)));
    }

    /// <summary>Relative permittivity at a point in metres, or null in a conductor and beyond a plane.</summary>
    public double? PermittivityAt(double xMetres, double yMetres)
    {
        var medium = surfaces.Regions.At(frame.Apply(xMetres, yMetres));
        return medium >= 0 ? surfaces.Regions.Media[medium].Dk : null;
    }

    /// <summary>The charges in air that carry these signal currents, in amperes, at the speed of light.</summary>
    internal SolvedDrive Carry(ReadOnlySpan<double> signalAmperes)
    {
        CheckSignals(signalAmperes.Length);
        // L I = V/c, so that the charges C0 V are I/c.
        var volts = new double[pairs.Signals];
        for (var i = 0; i < volts.Length; i++)
        {
            for (var j = 0; j < volts.Length; j++)
                volts[i] += Vacuum.SpeedOfLight * Line.InductanceHenryPerMetre[i, j] * signalAmperes[j];
        }

        return new SolvedDrive(Mesh.Panels, Mesh.Empty, pairs.Volts(volts));
    }

    internal DrivenField Field(SolvedDrive drive) => new(frame, Mesh.Images, drive);

    private DrivenField Field(ParityCharges[] charges, ReadOnlySpan<double> signalVolts) =>
        Field(new SolvedDrive(Mesh.Panels, charges, pairs.Volts(signalVolts)));

    private static void AddScaled(double[,] sum, double[,] part, double scale)
    {
        for (var i = 0; i < sum.GetLength(0); i++)
        {
            for (var j = 0; j < sum.GetLength(1); j++)
                sum[i, j] += scale * part[i, j];
        }
    }

    private void CheckSignals(int count)
    {
        if (count != pairs.Signals)
            throw new ArgumentException($"The section has {pairs.Signals} signals but {count} voltages were given.");
    }
}
