using YamlDotNet.Core;

namespace StackTiming.Stackups.Reading;

/// <summary>Says in plain words what the YAML library objects to, and what to write.</summary>
internal static class YamlWording
{
    /// <summary>Said of a file that nests too deeply.</summary>
    public const string TooDeep = "the file nests too deeply";

    /// <summary>Said of a file with too many values.</summary>
    public const string TooLarge = "the file has too many values";

    private const string Invalid = "the text is not valid YAML here";

    // The library accepts keys of up to this length (YAML 1.2.2, section 7.4.2, sets it).
    private const int LongestKey = 1024;

    /// <summary>Place, message and advice for a failure of the library.</summary>
    /// <param name="file">The file.</param>
    /// <param name="failure">The failure.</param>
    public static (FilePosition At, string Message, string? Advice) Explain(InputFile file, Exception failure)
    {
        var said = failure is YamlException ? failure.Message : "";
        var mark = failure is YamlException { Start: var start } ? start : Mark.Empty;
        var at = Place(file, mark);
        if (said is TooDeep or TooLarge)
            return (at, said, null);
        // The library often notices a mistake only lines later, so the text is searched for the usual ones first.
        if (Tab(file.Text) is { } tab && Says(said, "tab"))
            return (At(file, tab.Line, tab.Column), "a tab stands in the indent of this line", "indent with blanks");
        if (Says(said, "quoted scalar"))
            return (at, Says(said, "escape", "surrogates") ? Invalid : "a quotation mark opens here and is not closed where it should be", QuoteAdvice(said));
        if (mark.Column > LongestKey && Says(said, "document start", "simple key", "mapping"))
            return (at, $"a key is longer than {LongestKey} characters", "put a long text after the colon of a short key");
        if (YamlBrackets.FindUnmatched(file.Text) is { } bracket)
        {
            return bracket.Bracket is '{' or '['
                ? (At(file, bracket.Line, bracket.Column), $"the {bracket.Bracket} that opens here is not closed", $"write the {(bracket.Bracket == '{' ? '}' : ']')} where it ends")
                : (At(file, bracket.Line, bracket.Column), $"the {bracket.Bracket} here closes nothing", "remove it, or put the text in quotes");
        }
        var line = (int)Math.Max(1, mark.Line);
        foreach (var candidate in new[] { line, line - 1 })
        {
            if (Glued(LineOf(file.Text, candidate)) is { } colon)
                return (At(file, candidate, colon + 1), "no blank follows the colon here", "write key: value, with a blank after the colon");
        }
        return (at, Invalid, Advice(LineOf(file.Text, line), (int)mark.Column, said));
    }

    private static string QuoteAdvice(string said) => Says(said, "escape", "surrogates")
        ? "write the character itself, \\\\ for a backslash, or use single quotes"
        : "write the same mark at the end of the text";

    private static string Advice(ReadOnlySpan<char> text, int column, string said)
    {
        var before = column >= 2 && column - 2 < text.Length && text[..(column - 1)].TrimEnd() is [.., var last] ? last : ' ';
        if (before is '\'' or '"')
            return "nothing may follow the closing quotation mark; write an apostrophe inside single quotes twice, or use double quotes";
        if (before is '}' or ']')
            return "nothing may follow the closing bracket but a comma or a comment";
        var value = text.IndexOf(": ") is var colon and >= 0 ? text[(colon + 2)..].TrimStart() : text.TrimStart();
        if (!value.IsEmpty && value[0] is '%' or '@' or '`' or '*' or '&' or '!' or '|' or '>' or ',' or '?')
            return $"put a text that begins with {value[0]} in quotes";
        if (Says(said, "flow"))
            return "separate entries by commas, and put a text with brackets, such as \"D[0..7]\", in quotes";
        if (Says(said, "invalid mapping"))
            return "keep the keys of one mapping at the same indent, and put a text that contains ': ' in quotes";
        if (Says(said, "sequence entries"))
            return "begin a list on the next line, or write it as [a, b]";
        if (Says(said, "expected key", "indicator", "document end"))
            return "indent this line like the entries that it belongs to, and begin each with - in a list, with key: in a mapping";
        return "check the indent, the brackets and the quotes of this line and the one before it";
    }

    // A key whose value is glued to its colon: name:x, units:{ … }. A time of day or a path of the web is none.
    private static int? Glued(ReadOnlySpan<char> line)
    {
        var begin = line.IndexOfAnyExcept(" -");
        if (begin < 0)
            return null;
        var colon = line.IndexOf(':');
        if (colon <= begin || colon + 1 >= line.Length || line[colon + 1] is ' ' or '/' or '\t')
            return null;
        foreach (var c in line[begin..colon])
        {
            if (!char.IsLetterOrDigit(c) && c is not ('-' or '_'))
                return null;
        }
        return colon;
    }

    private static (int Line, int Column)? Tab(ReadOnlySpan<char> text)
    {
        var number = 0;
        foreach (var line in text.EnumerateLines())
        {
            number++;
            var content = line.IndexOfAnyExcept(' ', '\t');
            if (content > 0 && line[..content].IndexOf('\t') is var tab and >= 0)
                return (number, tab + 1);
        }
        return null;
    }

    private static bool Says(string said, params ReadOnlySpan<string> words)
    {
        foreach (var word in words)
        {
            if (said.Contains(word, StringComparison.OrdinalIgnoreCase))
                return true;
        }
        return false;
    }

    private static FilePosition Place(InputFile file, Mark mark) =>
        mark.Line <= 0 ? FilePosition.WholeFile(file.Path) : At(file, (int)mark.Line, (int)Math.Max(1, mark.Column));

    private static FilePosition At(InputFile file, int line, int column) => new(file.Path, line, column);

    private static ReadOnlySpan<char> LineOf(string text, int line)
    {
        foreach (var candidate in text.AsSpan().EnumerateLines())
        {
            if (--line == 0)
                return candidate.Length > 400 ? candidate[..400] : candidate;
        }
        return [];
    }
}
