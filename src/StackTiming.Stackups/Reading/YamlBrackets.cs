namespace StackTiming.Stackups.Reading;

/// <summary>Finds the bracket that is to blame when a YAML file cannot be read.</summary>
internal static class YamlBrackets
{
    // Deeper files are refused anyway.
    private const int Deepest = 1000;

    /// <summary>The first bracket without its partner, or null where all have theirs.</summary>
    /// <param name="text">The file.</param>
    public static (int Line, int Column, char Bracket)? FindUnmatched(ReadOnlySpan<char> text)
    {
        var open = new List<(int Line, int Column, char Bracket)>();
        var (line, lineStart, previous) = (1, 0, '\n');
        for (var i = 0; i < text.Length; i++)
        {
            var c = text[i];
            switch (c)
            {
                case '\n':
                    (line, lineStart, previous) = (line + 1, i + 1, '\n');
                    continue;
                case '#' when i == 0 || char.IsWhiteSpace(text[i - 1]):
                    while (i + 1 < text.Length && text[i + 1] != '\n')
                        i++;
                    continue;
                case '"' or '\'' when Begins(previous, open.Count):
                    var end = EndOfQuote(text, i);
                    for (; i < end; i++)
                    {
                        if (text[i] == '\n')
                            (line, lineStart) = (line + 1, i + 1);
                    }
                    break;
                case '{' or '[' when Begins(previous, open.Count):
                    if (open.Count == Deepest)
                        return null;
                    open.Add((line, i - lineStart + 1, c));
                    break;
                case '}' or ']' when open.Count > 0:
                    if (open[^1].Bracket != (c == '}' ? '{' : '['))
                        return open[^1];
                    open.RemoveAt(open.Count - 1);
                    break;
                case '}' or ']' when Begins(previous, 0) || previous is '}' or ']':
                    return (line, i - lineStart + 1, c);
                default:
                    break;
            }
            if (!char.IsWhiteSpace(c))
                previous = c;
        }
        return open.Count > 0 ? open[0] : null;
    }

    // Outside brackets, a bracket or quotation mark in the middle of a text is an ordinary letter.
    private static bool Begins(char previous, int depth) => previous is '\n' or ':' or '-' or ',' or '{' or '[' || (depth > 0 && previous is not ('"' or '\''));

    private static int EndOfQuote(ReadOnlySpan<char> text, int start)
    {
        for (var i = start + 1; i < text.Length; i++)
        {
            if (text[i] == '\\' && text[start] == '"')
                i++;
            else if (text[i] == text[start])
                return i;
        }
        return text.Length;
    }
}
