using System.Diagnostics;
using System.Globalization;
using StackTiming.Lines.Fields;

namespace StackTiming.Benchmarks;

/// <summary>
/// Error of the field solver against its time, as a table for the README. Times are processor time of this process over many solutions on one
/// thread, so that they hold on a machine that does other work too.
/// </summary>
public static class FieldSolverTable
{
    private static readonly double[] Tolerances = [1e-3, 3e-4, 1e-5];

    /// <summary>Writes the table: for each tolerance the unknowns, the time in ms, the estimated error and the error against a solution to 1e-6.</summary>
    public static void Write(TextWriter output)
    {
        output.WriteLine("| section | " + string.Join(" | ", Tolerances.Select(t => $"asked {Figure(t)}: unknowns, ms, estimate, error")) + " |");
        output.WriteLine("|---" + string.Concat(Tolerances.Select(_ => "|---")) + "|");
        foreach (var name in FieldSolverCases.Names)
        {
            var section = FieldSolverCases.Named(name);
            var fine = new FieldSolver(new FieldSolverOptions(1e-6)).Solve(section);
            var cells = Tolerances.Select(tolerance =>
            {
                var solver = new FieldSolver(new FieldSolverOptions(tolerance));
                var solution = solver.Solve(section);
                return string.Create(
                    CultureInfo.InvariantCulture,
                    $"{solution.Unknowns}, {Milliseconds(() => solver.Solve(section)):0.00}, {Figure(solution.Line.RelativeError)}, {Figure(Error(solution, fine))}");
            });
            output.WriteLine($"| {name} | {string.Join(" | ", cells)} |");
        }
    }

    /// <summary>Processor time of one run, after a second of warming up, over a second and five runs at least.</summary>
    private static double Milliseconds(Action run)
    {
        for (var watch = Stopwatch.StartNew(); watch.ElapsedMilliseconds < 1000;)
            run();
        using var process = Process.GetCurrentProcess();
        var start = process.TotalProcessorTime;
        var runs = 0;
        for (var watch = Stopwatch.StartNew(); watch.ElapsedMilliseconds < 1000 || runs < 5; runs++)
            run();
        process.Refresh();
        return (process.TotalProcessorTime - start).TotalMilliseconds / runs;
    }

    /// <summary>Largest relative error over the entries of C and L above a hundredth of the largest.</summary>
    private static double Error(FieldSolution coarse, FieldSolution fine) => Math.Max(
        Error(coarse.Line.CapacitanceFaradPerMetre, fine.Line.CapacitanceFaradPerMetre),
        Error(coarse.Line.InductanceHenryPerMetre, fine.Line.InductanceHenryPerMetre));

    private static double Error(double[,] coarse, double[,] fine)
    {
        var largest = fine.Cast<double>().Max(Math.Abs);
        return fine.Cast<double>().Zip(coarse.Cast<double>())
            .Where(p => Math.Abs(p.First) > 0.01 * largest)
            .Max(p => Math.Abs(p.Second / p.First - 1));
    }

    private static string Figure(double value) => value.ToString("0.0e-0", CultureInfo.InvariantCulture);
}
