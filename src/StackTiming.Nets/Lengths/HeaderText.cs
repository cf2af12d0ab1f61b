namespace StackTiming.Nets.Lengths;

/// <summary>A header cell, split into its name and the unit in brackets or parentheses: <c>length[mm]</c>, <c>Routed (mil)</c>.</summary>
/// <param name="Full">The whole text without spaces around it.</param>
/// <param name="Name">The text before the unit.</param>
/// <param name="Unit">The text inside the brackets, or null where there are none.</param>
public readonly record struct HeaderText(string Full, string Name, string? Unit)
{
    /// <summary>Splits a header.</summary>
    /// <param name="text">The cell's text.</param>
    public static HeaderText Parse(string text)
    {
        var full = text.Trim();
        var open = full.AsSpan().LastIndexOfAny('[', '(');
        if (open < 0 || full.Length == 0 || full[^1] != (full[open] == '[' ? ']' : ')'))
            return new HeaderText(full, full, null);
        return new HeaderText(full, full[..open].TrimEnd(), full[(open + 1)..^1].Trim());
    }

    /// <summary>True where a board file that says <paramref name="wanted"/> means this header.</summary>
    /// <param name="wanted">Header text with or without its unit, in any case.</param>
    public bool Matches(string wanted) =>
        string.Equals(Full, wanted.Trim(), StringComparison.OrdinalIgnoreCase)
        || string.Equals(Name, wanted.Trim(), StringComparison.OrdinalIgnoreCase);
}
