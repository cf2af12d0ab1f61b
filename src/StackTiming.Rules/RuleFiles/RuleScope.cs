using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.RuleFiles;

/// <summary>
/// The names that the rules of a file can use: groups, pairs, and what the user of a reusable rule set bound its open names to. The rule
/// files that a board names directly share one scope; a rule set taken in by <c>use</c> has its own.
/// </summary>
public sealed class RuleScope
{
    private readonly Dictionary<string, NetGroup> groups = new(StringComparer.Ordinal);
    private readonly Dictionary<string, NetPair> pairs = new(StringComparer.Ordinal);
    private readonly Dictionary<string, Binding> bindings = new(StringComparer.Ordinal);

    /// <summary>The groups, by name.</summary>
    public IReadOnlyDictionary<string, NetGroup> Groups => groups;

    /// <summary>The pairs, by name.</summary>
    public IReadOnlyDictionary<string, NetPair> Pairs => pairs;

    /// <summary>What open names are bound to, by name.</summary>
    public IReadOnlyDictionary<string, Binding> Bindings => bindings;

    /// <summary>All names, for advice.</summary>
    public IEnumerable<string> Names => groups.Keys.Concat(pairs.Keys);

    /// <summary>Adds a group; a name that is taken is a problem.</summary>
    /// <param name="group">The group.</param>
    /// <param name="problems">Where problems go.</param>
    public void Add(NetGroup group, ProblemList problems)
    {
        if (pairs.TryGetValue(group.Name, out var pair))
            problems.Error(group.At, $"'{group.Name}' is a pair already, at {pair.At}", "give the group another name");
        else if (!groups.TryAdd(group.Name, group))
            problems.Error(group.At, $"group '{group.Name}' is stated already, at {groups[group.Name].At}", "give one of them another name");
    }

    /// <summary>Adds a pair; a name that is taken is a problem.</summary>
    /// <param name="pair">The pair.</param>
    /// <param name="problems">Where problems go.</param>
    public void Add(NetPair pair, ProblemList problems)
    {
        if (groups.TryGetValue(pair.Name, out var group))
            problems.Error(pair.At, $"'{pair.Name}' is a group already, at {group.At}", "give the pair another name");
        else if (!pairs.TryAdd(pair.Name, pair))
            problems.Error(pair.At, $"pair '{pair.Name}' is stated already, at {pairs[pair.Name].At}", "give one of them another name");
    }

    /// <summary>Binds an open name.</summary>
    /// <param name="name">Name of an open group or pair of this scope.</param>
    /// <param name="binding">What it stands for.</param>
    public void Bind(string name, Binding binding) => bindings[name] = binding;
}

/// <summary>What an open name of a reusable rule set stands for.</summary>
/// <param name="Outer">The scope of whoever uses the set.</param>
/// <param name="Selector">Nets, groups or pairs of that scope.</param>
public sealed record Binding(RuleScope Outer, NetSelector Selector);
