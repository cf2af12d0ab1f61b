using System.Buffers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Lengths;

/// <summary>
/// Makes strings of pins, branch labels and neighbour nets. Pins are written <c>U1.A3</c>, labels <c>*1</c>. Equal names that stand near each
/// other in the file share one string; a table of fixed size remembers them, because most pins occur only once.
/// </summary>
/// <param name="pinSeparator">The character between part and pin in the file.</param>
internal sealed class EndNames(char pinSeparator)
{
    /// <summary>The longest name that is accepted, in characters.</summary>
    public const int LongestName = 256;

    private static readonly SearchValues<char> Controls = SearchValues.Create([.. Enumerable.Range(0, 32).Select(i => (char)i), '\u007f']);

    private readonly string?[] recent = new string?[4096];

    /// <summary>The string of a pin or branch label.</summary>
    /// <param name="text">The cell without spaces around it; not empty.</param>
    /// <param name="objection">What is wrong with it, or null.</param>
    public string EndOf(ReadOnlySpan<char> text, out string? objection)
    {
        objection = null;
        ref var slot = ref SlotOf(text);
        if (slot is not null && text.SequenceEqual(slot))
            return slot;
        objection = ObjectionTo(text);
        if (objection is not null)
            return "";
        if (text[0] == '*')
            return slot = text.ToString();
        var separator = text.LastIndexOf(pinSeparator);
        if (separator <= 0 || separator == text.Length - 1)
        {
            objection = $"says '{Suggestion.Shorten(text.ToString())}', which is neither a pin nor a branch label";
            return "";
        }
        if (pinSeparator == NetEnd.PinSeparator)
            return slot = text.ToString();
        return string.Concat(text[..separator], [NetEnd.PinSeparator], text[(separator + 1)..]);
    }

    /// <summary>The string of another net's name.</summary>
    /// <param name="text">The cell without spaces around it; not empty.</param>
    /// <param name="objection">What is wrong with it, or null.</param>
    public static string NetOf(ReadOnlySpan<char> text, out string? objection)
    {
        objection = ObjectionTo(text);
        return objection is null ? text.ToString() : "";
    }

    /// <summary>What is wrong with a name as such, or null.</summary>
    /// <param name="text">The name; not empty.</param>
    public static string? ObjectionTo(ReadOnlySpan<char> text) => text switch
    {
        { Length: > LongestName } => $"is {text.Length} characters long; a name has at most {LongestName}",
        _ when text.ContainsAny(Controls) => "holds a control character",
        _ => null,
    };

    private ref string? SlotOf(ReadOnlySpan<char> text)
    {
        var hash = (uint)text.Length;
        for (var i = Math.Max(0, text.Length - 6); i < text.Length; i++)
            hash = hash * 31 + text[i];
        return ref recent[(hash * 2654435769u) >> 20];
    }
}
