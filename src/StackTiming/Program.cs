using System.CommandLine;
using StackTiming;
using StackTiming.Commands;
using StackTiming.Terminal;

using var interruption = new Interruption();
try
{
    var root = RootCommandFactory.Create(interruption.Token);
    var result = root.Parse(args);
    // Actions run here and stop by the token; the library's own handling of signals would end the process half-way.
    var configuration = new InvocationConfiguration { EnableDefaultExceptionHandler = false, ProcessTerminationTimeout = null };
    if (result.Errors.Count > 0 && result.Action is not { ClearsParseErrors: true })
    {
        // What was not understood says more than that a command is missing.
        var unknown = result.UnmatchedTokens.Count > 0 ? result.Errors.Where(e => !e.Message.StartsWith("Required command", StringComparison.Ordinal)).Take(1) : result.Errors;
        foreach (var error in unknown)
            Console.Error.WriteLine($"stacktiming: {ProblemPrinter.Printable(error.Message)}");
        Console.Error.WriteLine($"Type '{RootCommandFactory.HelpHint(result)}' to see what can be written.");
        return ExitCode.WrongInput;
    }
    return result.Invoke(configuration);
}
catch (OperationCanceledException) when (interruption.Token.IsCancellationRequested)
{
    Console.Error.WriteLine("stacktiming: interrupted; nothing was written");
    return ExitCode.Interrupted;
}
catch (Exception failure) when (failure is not OutOfMemoryException)
{
    Console.Error.WriteLine($"stacktiming: the program failed; this is a defect of the program, not of your files: {failure}");
    return ExitCode.ProgramFailed;
}
