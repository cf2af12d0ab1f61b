using Quickenshtein;

namespace StackTiming.Stackups.Reading;

/// <summary>Proposes what the author may have meant.</summary>
public static class Suggestion
{
    /// <summary>Advice for a word that is not one of the known ones: the nearest, or all where none is near.</summary>
    /// <param name="word">What the file says.</param>
    /// <param name="known">What it may say.</param>
    public static string? For(string word, IEnumerable<string> known)
    {
        var sorted = known.Order(StringComparer.Ordinal).ToArray();
        if (sorted.Length == 0)
            return null;
        if (sorted.FirstOrDefault(k => string.Equals(k, word, StringComparison.OrdinalIgnoreCase)) is { } same)
            return $"did you mean '{Shorten(same)}'?";
        if (word.Length is > 0 and <= 64)
        {
            var (distance, nearest) = sorted.Select(k => (Levenshtein.GetDistance(word, k), k)).Min();
            if (distance <= Math.Max(1, (word.Length + 1) / 3))
                return $"did you mean '{Shorten(nearest)}'?";
        }
        const int most = 12;
        return "it can be " + string.Join(", ", sorted.Take(most).Select(Shorten)) + (sorted.Length > most ? ", …" : "");
    }

    /// <summary>Text from a file, cut to a length that fits into a message.</summary>
    /// <param name="text">The text.</param>
    public static string Shorten(string text) => ProblemText.Cut(text, 60);
}
