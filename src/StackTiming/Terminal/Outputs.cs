using StackTiming.Reports.Writing;

namespace StackTiming.Terminal;

/// <summary>The output files of a command, which appear together or not at all.</summary>
internal static class Outputs
{
    /// <summary>Writes the files that the user named.</summary>
    /// <param name="error">Where an obstacle is reported.</param>
    /// <param name="cancellation">Stops before anything gets its name.</param>
    /// <param name="files">Paths with what to write; a path that is null is not wanted.</param>
    /// <returns>True where all were written.</returns>
    public static bool Write(TextWriter error, CancellationToken cancellation, params ReadOnlySpan<(string? Path, Action<Stream> Write)> files)
    {
        using var run = new OutputRun();
        foreach (var (path, write) in files)
        {
            cancellation.ThrowIfCancellationRequested();
            if (path is null)
                continue;
            if (run.Stage(path, write) is { } problem)
                return Refuse(error, problem);
        }
        cancellation.ThrowIfCancellationRequested();
        return run.Commit() is not { } obstacle || Refuse(error, obstacle);
    }

    private static bool Refuse(TextWriter error, OutputProblem problem)
    {
        error.WriteLine($"error: {ProblemPrinter.Printable(problem.ToString())}");
        return false;
    }
}
