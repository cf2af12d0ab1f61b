using System.Collections.Immutable;
using MathNet.Numerics.LinearAlgebra;
using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields.Geometry;
using StackTiming.Lines.Fields.Panels;
using StackTiming.Lines.Fields.Systems;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Fields;

/// <summary>A section that has been checked and cut into its surfaces, ready to be solved on meshes of any fineness.</summary>
internal sealed class SolvableSection
{
    private readonly CrossSection section;
    private readonly CrossSection framed;
    private readonly SectionFrame frame;
    private readonly SectionSurfaces surfaces;
    private readonly ConductorPairs pairs;

    /// <summary>Checks the section and cuts it.</summary>
    /// <exception cref="SectionNotSolvableException">The section makes no sense; the message says where.</exception>
    public SolvableSection(CrossSection section)
    {
        this.section = section;
        SectionChecks.Check(section);
        var tolerance = SectionChecks.Tolerance(section);
        frame = SectionFrame.Of(section, tolerance);
        framed = frame.Apply(section);
        surfaces = SectionSurfaces.Of(framed, frame.Symmetric, tolerance);
        pairs = new ConductorPairs(framed.Conductors, frame.Symmetric, tolerance);
    }

    /// <summary>The surfaces divided into panels.</summary>
    public PanelMesh Mesh(PanelDegrees degrees) =>
        PanelMesh.Of(surfaces, framed.BottomPlaneMetres, framed.TopPlaneMetres, frame.Symmetric, degrees);

    /// <summary>The charges on a mesh.</summary>
    public SolvedMesh Solve(PanelMesh mesh) => new(framed, surfaces, pairs, frame.Symmetric, mesh);

    /// <summary>The inductance matrix of a solved mesh, H/m.</summary>
    public static double[,] Inductance(SolvedMesh mesh)
    {
        var inverse = Matrix<double>.Build.DenseOfArray(mesh.EmptyCapacitance).Inverse();
        const double scale = Vacuum.Mu0 * Vacuum.Epsilon0;
        return (inverse * scale).ToArray();
    }

    /// <summary>The solution that a solved mesh gives.</summary>
    /// <param name="mesh">The solved mesh.</param>
    /// <param name="level">Which of the solver's levels of fineness it is.</param>
    /// <param name="error">Its estimated relative error.</param>
    /// <param name="warnings">What the reader must know.</param>
    public FieldSolution Result(SolvedMesh mesh, int level, double error, ImmutableArray<string> warnings)
    {
        var inductance = Inductance(mesh);
        foreach (var value in mesh.FilledCapacitance.Cast<double>().Concat(inductance.Cast<double>()).Append(error))
        {
            if (!double.IsFinite(value))
            {
                throw new SectionNotSolvableException(
                    "The equations of the cross-section have no finite solution; its dimensions may be too far apart.");
            }
        }

        var shares = EnergyPicture.Shares(mesh, surfaces.Regions.Media, EnergyPicture.StandardDrive(pairs.Signals));
        var line = new LineSolution(
            [.. section.Signals.Select(c => c.Name)], FieldSolver.MethodId, mesh.FilledCapacitance, inductance, shares, error, warnings);
        return new FieldSolution(section, line, frame, surfaces, pairs, mesh, level);
    }
}
