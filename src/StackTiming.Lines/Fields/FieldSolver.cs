using System.Globalization;
using StackTiming.Lines.Fields.Kernels;
using StackTiming.Lines.Fields.Panels;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Fields;

/// <summary>
/// The 2-D quasi-static field solver: boundary elements for the total charge on conductors and dielectric boundaries
/// (C. Wei, R. F. Harrington, J. R. Mautz and T. K. Sarkar, Multiconductor transmission lines in multilayered dielectric media, IEEE
/// Trans. MTT-32, 1984; S. M. Rao, T. K. Sarkar and R. F. Harrington, The electrostatic field of conducting bodies in multiple dielectric
/// media, IEEE Trans. MTT-32, 1984).
/// <para>
/// Discretisation: Legendre polynomials on straight panels with a power map towards corners and edges, where the charge grows as a power
/// of the distance (J. Meixner, The behavior of electromagnetic fields at edges, IEEE Trans. AP-20, 1972), integrated exactly through
/// Legendre functions of the second kind and held at the Gauss nodes. Chosen over graded low-order panels because it reaches 1e-4 with a
/// tenth of the unknowns: the error falls geometrically with the degree (I. Babuška and M. Suri, The p and h-p versions of the finite
/// element method, SIAM Review 36, 1994). Planes are images, so they carry no unknowns.
/// </para>
/// <para>
/// Refinement: the degrees rise until two successive solutions agree within the tolerance. Their difference is the reported error; it
/// belongs to the coarser of the two, so the result is better than it says.
/// </para>
/// </summary>
public sealed class FieldSolver(FieldSolverOptions options) : ILineCalculator
{
    /// <summary>Id of the method.</summary>
    public const string MethodId = "field-solver";

    // Two solutions may agree better than either is right; the second figure of a level is the least error that it is trusted with.
    private static readonly (PanelDegrees Degrees, double Floor)[] Levels =
    [
        (new(1.5, 2.0, 1.5, 3, 5), 1e-3), (new(1.5, 2.0, 2, 4, 7), 3e-5), (new(1.7, 2.1, 2.5, 5, 8), 1e-5), (new(1.7, 2.1, 3, 6, 10), 3e-6),
        (new(1.7, 2.1, 4, 8, 14), 3e-7), (new(2, 2.2, 5, 10, 18), 1e-8), (new(2.2, 2.2, 7, 14, PanelIntegral.MaxTerms), 1e-8),
    ];

    // The coarsest mesh alone, where there is no room for a second one; ten times what it is usually off by.
    private const double UncheckedError = 1e-2;

    /// <summary>The solver with <see cref="FieldSolverOptions.Default"/>.</summary>
    public static FieldSolver Default { get; } = new(FieldSolverOptions.Default);

    /// <inheritdoc/>
    public string Name => "field solver";

    /// <inheritdoc/>
    public LineSolution? Calculate(CrossSection section)
    {
        try
        {
            return Solve(section).Line;
        }
        catch (SectionNotSolvableException)
        {
            return null;
        }
    }

    /// <inheritdoc/>
    public string? Objection(CrossSection section)
    {
        try
        {
            Solve(section);
            return null;
        }
        catch (SectionNotSolvableException e)
        {
            return e.Message.TrimEnd('.');
        }
    }

    /// <summary>Solves a section to the tolerance.</summary>
    /// <exception cref="SectionNotSolvableException">
    /// The section has no solution or is too fine to be followed; the message says where.
    /// </exception>
    public FieldSolution Solve(CrossSection section)
    {
        var solvable = new SolvableSection(section);
        SolvedMesh? coarse = null;
        var (error, reached) = (UncheckedError, 0);
        for (var level = 0; level < Levels.Length; level++)
        {
            var mesh = solvable.Mesh(Levels[level].Degrees);
            if (mesh.Unknowns > options.MostUnknowns)
            {
                if (coarse is null)
                    throw new SectionNotSolvableException(TooMany(mesh.Unknowns));
                break;
            }

            var fine = solvable.Solve(mesh);
            var isCompared = coarse is not null;
            if (coarse is not null)
                error = Math.Max(Difference(fine, coarse), Levels[level].Floor);
            (coarse, reached) = (fine, level);
            if (isCompared && error <= options.RelativeTolerance)
                break;
        }

        return solvable.Result(coarse!, reached, error, error <= options.RelativeTolerance ? [] : [Unrefined(error)]);
    }

    /// <summary>
    /// Solves a section on the mesh of one level alone, for differences between sections that are nearly alike; the error is only known
    /// to be that of the level.
    /// </summary>
    internal static FieldSolution SolveAt(CrossSection section, int level)
    {
        var solvable = new SolvableSection(section);
        return solvable.Result(solvable.Solve(solvable.Mesh(Levels[level].Degrees)), level, UncheckedError, []);
    }

    private string Unrefined(double error) => string.Create(
        CultureInfo.InvariantCulture,
        $"The field solver stopped at an estimated error of {error:P2}; {options.RelativeTolerance:P2} was asked for.");

    private string TooMany(int unknowns) => string.Create(
        CultureInfo.InvariantCulture,
        $"The cross-section needs {unknowns} unknowns on the coarsest mesh, more than the {options.MostUnknowns} allowed; ")
        + "divide it into sections with fewer conductors.";

    private static double Difference(SolvedMesh fine, SolvedMesh coarse) => Math.Max(
        Difference(fine.FilledCapacitance, coarse.FilledCapacitance),
        Difference(SolvableSection.Inductance(fine), SolvableSection.Inductance(coarse)));

    /// <summary>
    /// Largest difference of two matrices relative to the entry, or to a hundredth of the largest entry where it is smaller than that.
    /// </summary>
    private static double Difference(double[,] fine, double[,] coarse)
    {
        var largest = fine.Cast<double>().Max(Math.Abs);
        var difference = 0.0;
        for (var i = 0; i < fine.GetLength(0); i++)
        {
            for (var j = 0; j < fine.GetLength(1); j++)
            {
                var error = Math.Abs(fine[i, j] - coarse[i, j]) / Math.Max(Math.Abs(fine[i, j]), 0.01 * largest);
                difference = double.IsNaN(error) ? double.NaN : Math.Max(difference, error);
            }
        }

        return difference;
    }
}
