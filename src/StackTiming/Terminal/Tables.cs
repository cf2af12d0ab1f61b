using Spectre.Console;

namespace StackTiming.Terminal;

/// <summary>Tables on the terminal; on a pipe they are plain text of a fixed width.</summary>
internal static class Tables
{
    private const int PipeWidth = 160;

    /// <summary>A console that writes to a writer.</summary>
    /// <param name="writer">Where to.</param>
    public static IAnsiConsole On(TextWriter writer)
    {
        var redirected = ReferenceEquals(writer, Console.Out) ? Console.IsOutputRedirected : !ReferenceEquals(writer, Console.Error) || Console.IsErrorRedirected;
        var console = AnsiConsole.Create(new AnsiConsoleSettings
        {
            Out = new AnsiConsoleOutput(writer),
            Ansi = redirected ? AnsiSupport.No : AnsiSupport.Detect,
            Interactive = InteractionSupport.No,
        });
        if (redirected)
            console.Profile.Width = PipeWidth;
        return console;
    }

    /// <summary>An empty table with columns; a name that begins with &gt; is set to the right.</summary>
    /// <param name="columns">Names of the columns.</param>
    public static Table Of(params ReadOnlySpan<string> columns)
    {
        var table = new Table { Border = TableBorder.Simple };
        foreach (var column in columns)
        {
            var right = column.StartsWith('>');
            var added = new TableColumn(new Text(right ? column[1..] : column, new Style(decoration: Decoration.Bold)));
            table.AddColumn(right ? added.RightAligned() : added);
        }
        return table;
    }

    /// <summary>Adds a row of texts, which may contain anything.</summary>
    /// <param name="table">The table.</param>
    /// <param name="cells">The cells.</param>
    public static void Add(this Table table, params ReadOnlySpan<string> cells)
    {
        var row = new List<Text>(cells.Length);
        foreach (var cell in cells)
            row.Add(new Text(ProblemPrinter.Printable(cell)));
        table.AddRow(row);
    }
}
