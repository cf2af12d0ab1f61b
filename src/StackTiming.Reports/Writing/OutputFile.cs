namespace StackTiming.Reports.Writing;

/// <summary>A single output file that appears whole or not at all.</summary>
public static class OutputFile
{
    /// <summary>Writes a file.</summary>
    /// <param name="path">Its destination, as the user named it.</param>
    /// <param name="write">Writes its content.</param>
    /// <returns>What prevents it, or null where the file was written.</returns>
    public static OutputProblem? Write(string path, Action<Stream> write)
    {
        using var run = new OutputRun();
        return run.Stage(path, write) ?? run.Commit();
    }
}
