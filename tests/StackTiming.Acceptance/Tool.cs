using System.Diagnostics;

namespace StackTiming.Acceptance;

/// <summary>What a run of the built program left behind.</summary>
public sealed record ToolResult(int ExitCode, string Output, string Error);

/// <summary>Runs the built command line as a process of its own, as a user does.</summary>
public static class Tool
{
    /// <summary>The repository's root.</summary>
    public static string Root { get; } = FindRoot();

    /// <summary>Runs <c>stacktiming</c> with these arguments.</summary>
    public static ToolResult Run(params string[] arguments) => RunIn(Root, null, arguments);

    /// <summary>Runs it in a folder, with further environment variables.</summary>
    public static ToolResult RunIn(string folder, IReadOnlyDictionary<string, string>? environment, params string[] arguments)
    {
        using var process = Start(folder, environment, arguments);
        var error = process.StandardError.ReadToEndAsync();
        var output = process.StandardOutput.ReadToEnd();
        if (!process.WaitForExit(TimeSpan.FromMinutes(2)))
        {
            process.Kill(entireProcessTree: true);
            throw new TimeoutException(string.Join(' ', arguments));
        }
        return new ToolResult(process.ExitCode, output, error.GetAwaiter().GetResult());
    }

    /// <summary>Starts it without waiting.</summary>
    public static Process Start(string folder, IReadOnlyDictionary<string, string>? environment, params string[] arguments)
    {
        var start = new ProcessStartInfo("dotnet")
        {
            WorkingDirectory = folder,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            RedirectStandardInput = true,
        };
        // The program lies beside the tests, where the project reference put it.
        start.ArgumentList.Add(Path.Combine(AppContext.BaseDirectory, "stacktiming.dll"));
        foreach (var argument in arguments)
            start.ArgumentList.Add(argument);
        foreach (var (name, value) in environment ?? new Dictionary<string, string>())
            start.Environment[name] = value;
        var process = Process.Start(start)!;
        process.StandardInput.Close();
        return process;
    }

    private static string FindRoot()
    {
        var folder = AppContext.BaseDirectory;
        while (!File.Exists(Path.Combine(folder, "StackTiming.sln")))
            folder = Path.GetDirectoryName(folder) ?? throw new InvalidOperationException("The tests must run inside the repository.");
        return folder;
    }
}
