namespace StackTiming.Nets.Names;

/// <summary>Several names or patterns in one text: <c>A1, B1..B8, D[0,2]</c>.</summary>
public static class NameList
{
    /// <summary>Splits at the commas that stand outside brackets.</summary>
    /// <param name="text">The text.</param>
    /// <returns>The items without spaces around them; empty ones are left out.</returns>
    public static IEnumerable<string> Split(string text)
    {
        var depth = 0;
        var start = 0;
        for (var i = 0; i <= text.Length; i++)
        {
            if (i < text.Length && (text[i] != ',' || depth > 0))
            {
                depth += text[i] == '[' ? 1 : text[i] == ']' && depth > 0 ? -1 : 0;
                continue;
            }
            var item = text[start..i].Trim();
            start = i + 1;
            if (item.Length > 0)
                yield return item;
        }
    }
}
