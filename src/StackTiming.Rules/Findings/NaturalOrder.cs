namespace StackTiming.Rules.Findings;

/// <summary>Orders names as an engineer does: runs of digits by their number, so that <c>D2</c> comes before <c>D10</c>.</summary>
public sealed class NaturalOrder : IComparer<string>
{
    /// <summary>The only instance.</summary>
    public static NaturalOrder Instance { get; } = new();

    private NaturalOrder()
    {
    }

    /// <inheritdoc/>
    public int Compare(string? x, string? y)
    {
        if (x is null || y is null)
            return x is null ? (y is null ? 0 : -1) : 1;
        int i = 0, j = 0;
        while (i < x.Length && j < y.Length)
        {
            if (char.IsAsciiDigit(x[i]) && char.IsAsciiDigit(y[j]))
            {
                var a = DigitsAt(x, ref i);
                var b = DigitsAt(y, ref j);
                var difference = a.Length != b.Length ? a.Length - b.Length : a.SequenceCompareTo(b);
                if (difference != 0)
                    return difference;
            }
            else
            {
                if (x[i] != y[j])
                    return x[i] - y[j];
                i++;
                j++;
            }
        }
        var rest = (x.Length - i) - (y.Length - j);
        return rest != 0 ? rest : string.CompareOrdinal(x, y);
    }

    private static ReadOnlySpan<char> DigitsAt(string text, ref int index)
    {
        var start = index;
        while (index < text.Length && char.IsAsciiDigit(text[index]))
            index++;
        return text.AsSpan(start, index - start).TrimStart('0');
    }
}
