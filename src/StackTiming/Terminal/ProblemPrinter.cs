using StackTiming.Stackups.Reading;

namespace StackTiming.Terminal;

/// <summary>Prints problems of input files, one a line: <c>file:line:column: error: what; what to write</c>.</summary>
public static class ProblemPrinter
{
    /// <summary>Prints them all, errors and notes in the order in which they were found, and a count of what was left out.</summary>
    /// <param name="problems">The problems.</param>
    /// <param name="writer">Where to.</param>
    public static void Print(ProblemList problems, TextWriter writer)
    {
        foreach (var problem in problems.Items)
            writer.WriteLine(Printable(problem.ToString()));
        if (problems.Omitted > 0)
            writer.WriteLine($"and {problems.Omitted} more problems");
        if (problems.ErrorCount > 0)
            writer.WriteLine(problems.ErrorCount == 1 ? "1 error" : $"{problems.ErrorCount} errors");
    }

    /// <summary>Text from a file as a terminal may show it: control characters, which could move the cursor, become question marks.</summary>
    /// <param name="text">The text.</param>
    public static string Printable(string text) =>
        text.Any(char.IsControl) ? string.Create(text.Length, text, (span, s) =>
        {
            for (var i = 0; i < span.Length; i++)
                span[i] = char.IsControl(s[i]) ? '?' : s[i];
        }) : text;
}
