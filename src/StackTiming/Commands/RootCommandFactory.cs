using System.CommandLine;
using StackTiming.Terminal;

namespace StackTiming.Commands;

/// <summary>The commands of the program; a new command is a new file and one line here.</summary>
internal static class RootCommandFactory
{
    /// <summary>The root command.</summary>
    /// <param name="cancellation">Cancelled when the user wants to stop.</param>
    public static RootCommand Create(CancellationToken cancellation)
    {
        var root = new RootCommand("StackTiming checks a board's impedance, timing, matching and reflections from its stack-up and routed lengths.")
        {
            CheckCommand.Create(cancellation),
            NetCommand.Create(cancellation),
            SectionCommand.Create(),
            LinesCommand.Create(cancellation),
            MethodsCommand.Create(),
            CompletionCommand.Create(),
        };
        HelpWithExamples.AddTo(root, () => """
            Examples:
              stacktiming check board.yaml --report board.pdf
              stacktiming lines board.stackup.yaml --width 0.1mm --width 0.12mm
              stacktiming net clock.net.yaml

            Exit codes:
              0 all rules hold    1 a rule fails    2 the input is wrong    3 the program failed    130 interrupted

            Results are predictions: the fabricator's controlled-impedance process and measured coupons decide.
            """);
        return root;
    }

    /// <summary>The help command that fits what was typed.</summary>
    /// <param name="result">What was typed.</param>
    public static string HelpHint(ParseResult result) =>
        result.CommandResult.Command is RootCommand ? "stacktiming --help" : $"stacktiming {result.CommandResult.Command.Name} --help";
}
