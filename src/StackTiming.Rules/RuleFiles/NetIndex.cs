using System.Collections.Immutable;
using StackTiming.Nets.Names;

namespace StackTiming.Rules.RuleFiles;

/// <summary>The names of a board's nets, sorted, so that a pattern looks only at the names that begin as it does.</summary>
public sealed class NetIndex
{
    private readonly string[] sorted;
    private readonly HashSet<string> names;

    /// <summary>Makes an index.</summary>
    /// <param name="names">The names, each once.</param>
    public NetIndex(IEnumerable<string> names)
    {
        sorted = [.. names];
        Array.Sort(sorted, StringComparer.Ordinal);
        this.names = new HashSet<string>(sorted, StringComparer.Ordinal);
    }

    /// <summary>The names in ordinal order.</summary>
    public ImmutableArray<string> Names => [.. sorted];

    /// <summary>Whether there is a net of that name.</summary>
    /// <param name="name">The name.</param>
    public bool Contains(string name) => names.Contains(name);

    /// <summary>The nets that a pattern stands for.</summary>
    /// <param name="pattern">The pattern. A name that is written exactly so comes first, even where it looks like a pattern.</param>
    /// <param name="missing">A name or wildcard of the pattern that no net has; null where each has one. A range means each of its names.</param>
    public string[] Matching(NamePattern pattern, out string? missing)
    {
        missing = null;
        if (names.TryGetValue(pattern.Text, out var exact))
            return [exact];
        var matching = new List<string>();
        foreach (var alternative in pattern.Alternatives)
        {
            var before = matching.Count;
            Add(alternative, matching);
            if (matching.Count == before)
                missing ??= pattern.Alternatives.Length == 1 ? pattern.Text : alternative;
        }
        return [.. matching];
    }

    private void Add(string alternative, List<string> into)
    {
        var wildcard = alternative.AsSpan().IndexOfAny('*', '?');
        if (wildcard < 0)
        {
            if (names.TryGetValue(alternative, out var name))
                into.Add(name);
            return;
        }
        var prefix = alternative.AsSpan(0, wildcard);
        for (var i = FirstFrom(prefix); i < sorted.Length && sorted[i].AsSpan().StartsWith(prefix, StringComparison.Ordinal); i++)
        {
            if (NamePattern.Fits(sorted[i], alternative))
                into.Add(sorted[i]);
        }
    }

    private int FirstFrom(ReadOnlySpan<char> prefix)
    {
        int low = 0, high = sorted.Length;
        while (low < high)
        {
            var middle = (low + high) / 2;
            if (sorted[middle].AsSpan().SequenceCompareTo(prefix) < 0)
                low = middle + 1;
            else
                high = middle;
        }
        return low;
    }
}
