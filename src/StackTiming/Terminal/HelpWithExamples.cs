using System.CommandLine;
using System.CommandLine.Help;
using System.CommandLine.Invocation;

namespace StackTiming.Terminal;

/// <summary>A help page that ends with examples and further notes of the command.</summary>
/// <param name="standard">The page of options and arguments.</param>
/// <param name="closingText">What follows it.</param>
internal sealed class HelpWithExamples(HelpAction standard, Func<string> closingText) : SynchronousCommandLineAction
{
    /// <inheritdoc/>
    public override bool ClearsParseErrors => true;

    /// <inheritdoc/>
    public override int Invoke(ParseResult parseResult)
    {
        var result = standard.Invoke(parseResult);
        parseResult.InvocationConfiguration.Output.WriteLine(closingText());
        return result;
    }

    /// <summary>Gives a command a help page of its own.</summary>
    /// <param name="command">The command.</param>
    /// <param name="closingText">What follows the options; made only when help is asked for.</param>
    public static void AddTo(Command command, Func<string> closingText)
    {
        var option = command.Options.OfType<HelpOption>().FirstOrDefault();
        if (option is null)
        {
            option = new HelpOption();
            command.Options.Add(option);
        }
        if (option.Action is HelpAction standard)
            option.Action = new HelpWithExamples(standard, closingText);
    }
}
