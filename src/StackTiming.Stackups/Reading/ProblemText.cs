namespace StackTiming.Stackups.Reading;

/// <summary>Makes text from files fit for messages: short, on one line, and without characters that a terminal would obey.</summary>
internal static class ProblemText
{
    /// <summary>Text of at most a number of characters, with an ellipsis where it is cut; control characters become �.</summary>
    /// <param name="text">The text.</param>
    /// <param name="longest">Most characters kept.</param>
    public static string Cut(string text, int longest)
    {
        if (text.Length > longest)
        {
            var end = longest - 3;
            // Half of a surrogate pair is no character.
            if (char.IsHighSurrogate(text[end - 1]))
                end--;
            text = string.Concat(text.AsSpan(0, end), "…");
        }
        return text.AsSpan().ContainsAnyInRange('\0', '\u001f') || text.AsSpan().ContainsAnyInRange('\u007f', '\u009f')
            ? string.Create(text.Length, text, static (shown, source) =>
            {
                for (var i = 0; i < source.Length; i++)
                    shown[i] = char.IsControl(source[i]) ? '\uFFFD' : source[i];
            })
            : text;
    }
}
