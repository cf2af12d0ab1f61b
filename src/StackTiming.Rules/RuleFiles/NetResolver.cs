using StackTiming.Nets.Names;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.RuleFiles;

/// <summary>
/// Finds the nets that selectors mean. Names are looked up in an index, so that the cost of a rule follows the nets that it selects; a
/// selector that occurs again costs nothing.
/// </summary>
/// <param name="nets">Names of the board's nets, or null where the length lists could not be read: then nothing is found and nothing is
/// said about it.</param>
/// <param name="problems">Where problems go.</param>
public sealed class NetResolver(NetIndex? nets, ProblemList problems)
{
    private const int MostSuggestions = 20;

    private readonly Dictionary<(RuleScope Scope, string Text), string[]?> found = [];
    private readonly HashSet<(RuleScope Scope, string Text)> searching = [];
    private readonly Dictionary<string, DriveChoice> drives = new(StringComparer.Ordinal);
    private int suggestions;

    /// <summary>Whether the board's nets are known.</summary>
    public bool KnowsNets => nets is not null;

    /// <summary>What groups say of who drives their nets and strobes; of several groups the first.</summary>
    public IReadOnlyDictionary<string, DriveChoice> Drives => drives;

    /// <summary>Notes who drives the nets and the strobe of a group.</summary>
    /// <param name="scope">Scope of the group.</param>
    /// <param name="group">The group.</param>
    public void Learn(RuleScope scope, NetGroup group)
    {
        if (Resolve(scope, new NetSelector(group.At, [new SelectorItem(group.At, group.Name)])) is not { } set || group.Drive is not { } drive)
            return;
        foreach (var net in set.Names.Concat(set.Strobe?.Nets ?? []))
            drives.TryAdd(net, DriveChoice.Parse(drive.Text));
    }

    /// <summary>The nets of a selector.</summary>
    /// <param name="scope">The names that it can use.</param>
    /// <param name="selector">The selector.</param>
    /// <returns>The nets, or null where one of the items means nothing, which is reported.</returns>
    public NetSet? Resolve(RuleScope scope, NetSelector selector)
    {
        var names = new HashSet<string>(StringComparer.Ordinal);
        var whole = true;
        foreach (var item in selector.Items)
        {
            if (NetsOf(scope, item) is { } some)
                names.UnionWith(some);
            else
                whole = false;
        }
        if (!whole)
            return null;
        var group = selector.Items.Length == 1 ? GroupOf(scope, selector.Items[0].Text, out scope) : null;
        ReferenceNets? strobe = null;
        if (group?.Strobe is { } sampled && (strobe = Reference(scope, sampled, "strobe")) is null)
            return null;
        return new NetSet(selector.Text, [.. names.Order(NaturalOrder.Instance)], strobe, group?.Drive);
    }

    /// <summary>A net, or a pair or group whose mean counts, that others are compared with.</summary>
    /// <param name="scope">The names that it can use.</param>
    /// <param name="item">The name of a net, pair or group.</param>
    /// <param name="what">What messages call it.</param>
    /// <returns>The nets, or null with a problem where the name is neither.</returns>
    public ReferenceNets? Reference(RuleScope scope, SelectorItem item, string what)
    {
        if (NetsOf(scope, item) is not { } names)
            return null;
        if (names.Length == 1 || IsName(scope, item.Text))
            return new ReferenceNets(item.Text, [.. names.Order(NaturalOrder.Instance)]);
        problems.Error(
            item.At, $"'{what}' must be one net, a pair or a group, but '{Suggestion.Shorten(item.Text)}' is {names.Length} nets", "state them as a group");
        return null;
    }

    /// <summary>The one net of a name.</summary>
    /// <param name="scope">The names that it can use.</param>
    /// <param name="item">The name.</param>
    /// <param name="what">What messages call it.</param>
    /// <returns>The net, or null with a problem where there is none or are several.</returns>
    public string? SingleNet(RuleScope scope, SelectorItem item, string what)
    {
        if (NetsOf(scope, item) is not { } names)
            return null;
        if (names.Length == 1)
            return names[0];
        problems.Error(item.At, $"'{what}' must be one net, but '{Suggestion.Shorten(item.Text)}' is {names.Length} of them");
        return null;
    }

    /// <summary>The pairs of a selector: names of pairs, wildcards over these names, or exactly two nets.</summary>
    /// <param name="scope">The names that it can use.</param>
    /// <param name="selector">The selector.</param>
    /// <returns>The pairs, or null with a problem.</returns>
    public IReadOnlyList<PairRef>? ResolvePairs(RuleScope scope, NetSelector selector)
    {
        if (selector.Items is [var first, var second] && !IsPairName(scope, first.Text) && !IsPairName(scope, second.Text)
            && nets is not null && nets.Contains(first.Text) && nets.Contains(second.Text))
        {
            return first.Text == second.Text ? SameTwice(first) : [new PairRef($"{first.Text}/{second.Text}", first.Text, second.Text)];
        }
        var pairs = new List<PairRef>();
        var whole = true;
        foreach (var item in selector.Items)
            whole &= AddPairs(scope, item, pairs);
        return whole && nets is not null ? [.. pairs.DistinctBy(p => (p.Positive, p.Negative))] : null;
    }

    private List<PairRef>? SameTwice(SelectorItem item)
    {
        problems.Error(item.At, $"both members of the pair are '{item.Text}'");
        return null;
    }

    /// <summary>Whether a name is that of a group or pair that a rule can use.</summary>
    /// <param name="scope">The scope.</param>
    /// <param name="text">The name.</param>
    public static bool IsName(RuleScope scope, string text) => scope.Groups.ContainsKey(text) || scope.Pairs.ContainsKey(text);

    private static bool IsPairName(RuleScope scope, string text) => scope.Pairs.ContainsKey(text) || scope.Bindings.ContainsKey(text);

    private bool AddPairs(RuleScope scope, SelectorItem item, List<PairRef> into)
    {
        if (scope.Bindings.TryGetValue(item.Text, out var binding))
        {
            if (ResolvePairs(binding.Outer, binding.Selector) is not { } bound)
                return false;
            into.AddRange(bound);
            return true;
        }
        if (scope.Pairs.TryGetValue(item.Text, out var pair))
            return AddPair(scope, pair, into);
        var any = false;
        var whole = true;
        foreach (var named in scope.Pairs.Values)
        {
            if (NamePattern.Fits(named.Name, item.Text))
            {
                any = true;
                whole &= AddPair(scope, named, into);
            }
        }
        if (!any)
        {
            problems.Error(
                item.At,
                $"no pair is called '{Suggestion.Shorten(item.Text)}'",
                Suggestion.For(item.Text, scope.Pairs.Keys) ?? "state it under pairs: { usb: [ USB_P, USB_N ] }");
        }
        return any && whole;
    }

    private bool AddPair(RuleScope scope, NetPair pair, List<PairRef> into)
    {
        if (pair.Members is not { } members)
            return OpenName(pair.Name, pair.At);
        var positive = SingleNet(scope, members.Positive, pair.Name);
        var negative = SingleNet(scope, members.Negative, pair.Name);
        if (positive is null || negative is null)
            return false;
        into.Add(new PairRef(pair.Name, positive, negative));
        return true;
    }

    private bool OpenName(string name, FilePosition at)
    {
        problems.Error(at, $"'{name}' is left open", "take the file in with use: …, bind: { " + name + ": … }, or state its nets");
        return false;
    }

    private string[]? NetsOf(RuleScope scope, SelectorItem item)
    {
        var key = (scope, item.Text);
        if (found.TryGetValue(key, out var before))
            return before;
        if (!searching.Add(key))
        {
            problems.Error(item.At, $"group '{Suggestion.Shorten(item.Text)}' contains itself", "a group may name other groups, but not itself");
            return null;
        }
        var names = Search(scope, item);
        searching.Remove(key);
        found[key] = names;
        return names;
    }

    private string[]? Search(RuleScope scope, SelectorItem item)
    {
        if (scope.Pairs.ContainsKey(item.Text))
        {
            var members = new List<PairRef>();
            return AddPairs(scope, item, members) ? [.. members.SelectMany(m => new[] { m.Positive, m.Negative })] : null;
        }
        if (scope.Bindings.TryGetValue(item.Text, out var binding))
            return Union(binding.Outer, binding.Selector);
        if (scope.Groups.TryGetValue(item.Text, out var group))
        {
            if (group.Nets is not null)
                return Union(scope, group.Nets);
            OpenName(group.Name, group.At);
            return null;
        }
        return nets is null ? null : OnBoard(scope, item, nets);
    }

    private string[]? Union(RuleScope scope, NetSelector selector)
    {
        var names = new HashSet<string>(StringComparer.Ordinal);
        var whole = true;
        foreach (var item in selector.Items)
        {
            if (NetsOf(scope, item) is { } some)
                names.UnionWith(some);
            else
                whole = false;
        }
        return whole ? [.. names] : null;
    }

    private string[]? OnBoard(RuleScope scope, SelectorItem item, NetIndex index)
    {
        if (NamePattern.TryParse(item.Text, out var problem) is not { } pattern)
        {
            problems.Error(item.At, $"'{Suggestion.Shorten(item.Text)}': {problem}");
            return null;
        }
        var names = index.Matching(pattern, out var missing);
        if (missing is null)
            return names;
        var advice = suggestions++ < MostSuggestions ? Suggestion.For(missing, scope.Names.Concat(index.Names)) : null;
        if (missing == item.Text)
            problems.Error(item.At, $"no group, pair or net is called '{Suggestion.Shorten(item.Text)}'", advice);
        else
            problems.Error(item.At, $"the board has no net '{Suggestion.Shorten(missing)}', which '{Suggestion.Shorten(item.Text)}' stands for", advice);
        return null;
    }

    private static NetGroup? GroupOf(RuleScope scope, string text, out RuleScope owner)
    {
        owner = scope;
        for (var depth = 0; depth < 32; depth++)
        {
            if (owner.Bindings.TryGetValue(text, out var binding))
            {
                if (binding.Selector.Items.Length != 1)
                    return null;
                owner = binding.Outer;
                text = binding.Selector.Items[0].Text;
                continue;
            }
            return owner.Groups.GetValueOrDefault(text);
        }
        return null;
    }
}
