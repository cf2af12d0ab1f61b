using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields.Geometry;
using StackTiming.Lines.Fields.Kernels;
using StackTiming.Lines.Fields.Panels;
using StackTiming.Lines.Fields.Systems;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields;

/// <summary>One section solved on one mesh, with its dielectrics and in air.</summary>
internal sealed class SolvedMesh
{
    private readonly ConductorPairs pairs;

    /// <summary>Solves the surfaces of a section that is in the solver's frame.</summary>
    public SolvedMesh(CrossSection section, SectionSurfaces surfaces, ConductorPairs pairs, bool symmetric, PanelDegrees degrees)
    {
        this.pairs = pairs;
        var openSpace = section.BottomPlaneMetres is null;
        Images = new PlaneImages(!openSpace, section.TopPlaneMetres);
        var mesh = PanelMesh.Of(surfaces, section.BottomPlaneMetres, section.TopPlaneMetres, symmetric, degrees);
        var influence = new InfluenceMatrix(mesh.Panels, Images, symmetric);
        Panels = mesh.Panels;
        Unknowns = influence.Unknowns;
        double[] permittivities = [.. surfaces.Regions.Media.Select(m => m.Dk)];
        Filled = [.. pairs.Parities.Select(p => new ParityCharges(influence, pairs, permittivities, p, openSpace))];
        Empty = [.. pairs.Parities.Select(p => new ParityCharges(influence, pairs, [], p, openSpace))];
        FilledCapacitance = Capacitance(Filled);
        EmptyCapacitance = Capacitance(Empty);
    }

    /// <summary>Charges with the dielectrics, by parity.</summary>
    public ParityCharges[] Filled { get; }

    /// <summary>Charges in air, by parity.</summary>
    public ParityCharges[] Empty { get; }

    /// <summary>The planes' images.</summary>
    public PlaneImages Images { get; }

    /// <summary>The panels, those of conductors first.</summary>
    public Panel[] Panels { get; }

    /// <summary>Number of unknowns of each parity.</summary>
    public int Unknowns { get; }

    /// <summary>Maxwell capacitance matrix of the signals with the dielectrics, F/m.</summary>
    public double[,] FilledCapacitance { get; }

    /// <summary>Maxwell capacitance matrix of the signals in air, F/m.</summary>
    public double[,] EmptyCapacitance { get; }

    private double[,] Capacitance(ParityCharges[] charges)
    {
        var matrix = new double[pairs.Signals, pairs.Signals];
        foreach (var part in charges)
            part.AddCapacitance(matrix);
        // Reciprocity holds up to the error of the mesh; the mean of both sides is nearer the truth than either.
        for (var i = 0; i < pairs.Signals; i++)
        {
            for (var j = 0; j <= i; j++)
                matrix[i, j] = matrix[j, i] = Math.PI * Vacuum.Epsilon0 * (matrix[i, j] + matrix[j, i]);
        }

        return matrix;
    }
}
