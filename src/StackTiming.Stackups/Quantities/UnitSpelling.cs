using System.Numerics;

namespace StackTiming.Stackups.Quantities;

/// <summary>Finds the unit that somebody meant who wrote its capitals wrong.</summary>
internal static class UnitSpelling
{
    // All combinations of capitals are tried: 2 to this power.
    private const int MostLetters = 8;

    /// <summary>A unit that differs from a word in its capitals only, the usual ones first, then the one with the fewest changes; or null.</summary>
    /// <param name="word">What the file says.</param>
    /// <param name="dimension">What the unit must measure.</param>
    public static string? WithOtherCapitals(string word, Dimension dimension)
    {
        foreach (var unit in DimensionWords.Units(dimension))
        {
            if (string.Equals(unit, word, StringComparison.OrdinalIgnoreCase))
                return unit;
        }
        var letters = Enumerable.Range(0, Math.Min(word.Length, 64)).Where(i => char.IsAsciiLetter(word[i])).ToArray();
        if (word.Length > 64 || letters.Length > MostLetters)
            return null;
        return Enumerable.Range(1, (1 << letters.Length) - 1)
            .OrderBy(mask => BitOperations.PopCount((uint)mask))
            .Select(mask => Changed(word, letters, mask))
            .FirstOrDefault(candidate => Unit.TryParse(candidate, out var unit) && unit.Dimension == dimension);
    }

    private static string Changed(string word, int[] letters, int mask)
    {
        var text = word.ToCharArray();
        for (var i = 0; i < letters.Length; i++)
        {
            if ((mask & (1 << i)) != 0)
                text[letters[i]] = (char)(text[letters[i]] ^ 0x20);
        }
        return new string(text);
    }
}
