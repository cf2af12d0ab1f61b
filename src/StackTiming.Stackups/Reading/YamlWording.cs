using YamlDotNet.Core;

namespace StackTiming.Stackups.Reading;

/// <summary>Says in plain words what the YAML library objects to, and what to write.</summary>
internal static class YamlWording
{
    /// <summary>Said of a file that nests too deeply.</summary>
    public const string TooDeep = "the file nests too deeply";

    /// <summary>Said of a file with too many values.</summary>
    public const string TooLarge = "the file has too many values";

    /// <summary>Place, message and advice for a failure of the library.</summary>
    /// <param name="file">The file.</param>
    /// <param name="failure">The failure.</param>
    public static (FilePosition At, string Message, string? Advice) Explain(InputFile file, Exception failure)
    {
        if (failure is not YamlException yaml)
            return (FilePosition.WholeFile(file.Path), "the text is not valid YAML", "check brackets and quotes");
        var line = (int)Math.Max(1, yaml.Start.Line);
        var at = new FilePosition(file.Path, line, (int)Math.Max(1, yaml.Start.Column));
        if (yaml.Message is TooDeep or TooLarge)
            return (at, yaml.Message, null);
        return (at, "the text is not valid YAML here", Advice(LineOf(file.Text, line), yaml.Message));
    }

    private static string Advice(ReadOnlySpan<char> text, string message)
    {
        if (text.Contains('\t'))
            return "use blanks instead of tabs to indent";
        if (message.Contains("mapping values", StringComparison.OrdinalIgnoreCase) || message.Contains("simple key", StringComparison.OrdinalIgnoreCase))
            return "put a blank after each colon, keep the keys of one mapping at the same indent, and put a text that contains ': ' in quotes";
        var value = text.IndexOf(": ") is var colon and >= 0 ? text[(colon + 2)..].TrimStart() : text.TrimStart();
        if (!value.IsEmpty && value[0] is '%' or '@' or '`' or '*' or '&' or '!' or '|' or '>')
            return $"put a text that begins with {value[0]} in quotes";
        if (text.Contains('{') || text.Contains('[') || message.Contains("flow", StringComparison.OrdinalIgnoreCase))
            return "close each bracket, separate entries by commas, and put a text with brackets, such as \"D[0..7]\", in quotes";
        return "check the indent, the brackets and the quotes of this line and the one before it";
    }

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
