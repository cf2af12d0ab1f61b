using System.Globalization;
using System.Text;

namespace StackTiming.Reports.Fonts;

/// <summary>Makes text from files fit for print: names may hold anything.</summary>
public static class PrintableText
{
    /// <summary>
    /// The text with every character that the face cannot show, or that would steer the layout (controls, direction marks), written as its
    /// code point, such as <c>&lt;U+0007&gt;</c>. Tabs and line ends become spaces. Text beyond the limit is cut, and says so.
    /// </summary>
    /// <param name="text">The text.</param>
    /// <param name="face">The face it will be set in.</param>
    /// <param name="limit">Most characters kept.</param>
    public static string For(string text, FontFace face, int limit)
    {
        if (text.Length <= limit && IsPlain(text, face))
            return text;
        var cut = text.Length > limit;
        var kept = cut ? text.AsSpan(0, limit) : text;
        var result = new StringBuilder(kept.Length + 32);
        foreach (var rune in kept.EnumerateRunes())
        {
            if (rune.Value is '\t' or '\n' or '\r')
                result.Append(' ');
            else if (rune.IsBmp && IsPlain((char)rune.Value, face))
                result.Append((char)rune.Value);
            else
                result.Append(CultureInfo.InvariantCulture, $"<U+{rune.Value:X4}>");
        }
        if (cut)
            result.Append(CultureInfo.InvariantCulture, $"… ({text.Length - limit} more characters)");
        return result.ToString();
    }

    private static bool IsPlain(string text, FontFace face)
    {
        foreach (var character in text)
        {
            if (!IsPlain(character, face))
                return false;
        }
        return true;
    }

    private static bool IsPlain(char character, FontFace face) =>
        character is >= ' ' and <= '~' || (face.Has(character) && !char.IsControl(character)
            && char.GetUnicodeCategory(character) is not (UnicodeCategory.Format or UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator));
}
