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
    public SolvedMesh(CrossSection section, SectionSurfaces surfaces, ConductorPairs pairs, bool symmetric, PanelMesh mesh)
    {
        this.pairs = pairs;
        var openSpace = section.BottomPlaneMetres is null;
        Images = new PlaneImages(!openSpace, section.TopPlaneMetres);
        Panels = mesh.Panels;
        using var influence = new InfluenceMatrix(Panels, Images, symmetric);
        Unknowns = influence.Unknowns;
        double[] permittivities = [.. surfaces.Regions.Media.Select(m => m.Dk)];
        Filled = [.. pairs.Parities.Select(p => new ParityCharges(influence, pairs, permittivities, p, openSpace))];
        Empty = [.. pairs.Parities.Select(p => new ParityCharges(influence, pairs, [], p, openSpace))];
        FilledCapacitance = Matrix(Filled, (part, matrix) => part.AddCapacitance(matrix));
        EmptyCapacitance = Matrix(Empty, (part, matrix) => part.AddCapacitance(matrix));
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

    /// <summary>The derivative of <see cref="FilledCapacitance"/> with respect to the permittivity of a medium, F/m.</summary>
    public double[,] CapacitanceSlope(int medium) => Matrix(Filled, (part, matrix) => part.AddCapacitanceSlope(matrix, medium));

    private double[,] Matrix(ParityCharges[] charges, Action<ParityCharges, double[,]> add)
    {
        var matrix = new double[pairs.Signals, pairs.Signals];
        foreach (var part in charges)
            add(part, matrix);
        // Reciprocity holds up to the error of the mesh; the mean of both sides is nearer the truth than either.
        for (var i = 0; i < pairs.Signals; i++)
        {
            for (var j = 0; j <= i; j++)
                matrix[i, j] = matrix[j, i] = Math.PI * Vacuum.Epsilon0 * (matrix[i, j] + matrix[j, i]);
        }

        return matrix;
    }
}
