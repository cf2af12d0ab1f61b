using BenchmarkDotNet.Attributes;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Sections;

namespace StackTiming.Benchmarks;

/// <summary>
/// Time of the field solver for each family of geometries: one warm thread, whole solutions with energy shares. The errors that belong to the
/// times are in the table of <see cref="FieldSolverTable"/>.
/// </summary>
public class FieldSolverBenchmarks
{
    private CrossSection section = null!;
    private FieldSolver solver = FieldSolver.Default;

    /// <summary>What can be solved.</summary>
    public static IEnumerable<string> Sections => FieldSolverCases.Names;

    /// <summary>What is solved.</summary>
    [ParamsSource(nameof(Sections))]
    public string Section { get; set; } = "";

    /// <summary>The relative error that is asked for.</summary>
    [Params(1e-3, 3e-4, 1e-5)]
    public double Tolerance { get; set; }

    /// <summary>Builds the section.</summary>
    [GlobalSetup]
    public void Build() => (section, solver) = (FieldSolverCases.Named(Section), new FieldSolver(new FieldSolverOptions(Tolerance)));

    /// <summary>Solves it.</summary>
    [Benchmark]
    public FieldSolution Solve() => solver.Solve(section);
}
