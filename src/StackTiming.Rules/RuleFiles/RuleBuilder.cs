using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Kinds;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.RuleFiles;

/// <summary>Turns the entries of rule files into rules: common keys, kind, and the kind's own keys.</summary>
public static class RuleBuilder
{
    private static readonly Dictionary<string, Severity> Severities = new(StringComparer.Ordinal)
    {
        ["must"] = Severity.Must,
        ["should"] = Severity.Should,
    };

    /// <summary>Builds the rules of a board.</summary>
    /// <param name="entries">What the files say.</param>
    /// <param name="scopes">The scopes of all files, whose groups must all have nets.</param>
    /// <param name="resolver">Finds nets.</param>
    /// <param name="layers">Names of the copper layers, or null where the stack-up could not be read.</param>
    /// <param name="problems">Where problems go.</param>
    public static ImmutableArray<Rule> Build(
        IReadOnlyList<RuleEntry> entries, IReadOnlyList<RuleScope> scopes, NetResolver resolver, IReadOnlyCollection<string>? layers, ProblemList problems)
    {
        CheckNames(scopes, resolver);
        var rules = ImmutableArray.CreateBuilder<Rule>(entries.Count);
        var ids = new Dictionary<string, FilePosition>(StringComparer.Ordinal);
        foreach (var entry in entries)
        {
            if (Build(entry, ids, resolver, layers, problems) is { } rule)
                rules.Add(rule);
        }
        return rules.ToImmutable();
    }

    private static void CheckNames(IReadOnlyList<RuleScope> scopes, NetResolver resolver)
    {
        foreach (var scope in scopes)
        {
            foreach (var group in scope.Groups.Values)
            {
                if (group.Nets is not null)
                    resolver.Learn(scope, group);
            }
            foreach (var pair in scope.Pairs.Values)
            {
                if (pair.Members is not null)
                    resolver.ResolvePairs(scope, new NetSelector(pair.At, [new SelectorItem(pair.At, pair.Name)]));
            }
        }
    }

    private static Rule? Build(
        RuleEntry entry, Dictionary<string, FilePosition> ids, NetResolver resolver, IReadOnlyCollection<string>? layers, ProblemList problems)
    {
        var map = new MapReader(entry.Map, entry.Units, problems);
        var id = map.NeedText("id", "id: LANE0-MATCH, a name of its own for the rule");
        var kindName = map.NeedText("kind", "kind: match");
        var severity = map.Choice("severity", Severities) ?? Severity.Must;
        var reason = map.Text("reason") ?? "";
        var source = map.Text("source") ?? "";
        if (id is { Length: 0 })
            problems.Error(map.PositionOf("id"), "the id is empty", "write id: LANE0-MATCH");
        if (id is { Length: > 0 })
            CheckUnique(entry.Prefix + id, map.PositionOf("id"), ids, problems);
        if (kindName is null)
            return null;
        if (RuleKinds.Find(kindName) is not { } kind)
        {
            problems.Error(
                map.PositionOf("kind"),
                $"there is no kind of rule called '{Suggestion.Shorten(kindName)}'",
                Suggestion.For(kindName, RuleKinds.All.Select(k => k.Name)));
            return null;
        }
        var header = new RuleHeader(entry.Prefix + id, kind.Name, severity, reason, source, map.At);
        var rule = kind.Read(new RuleReader(map, entry.Scope, resolver, layers), header);
        map.Finish();
        return id is { Length: > 0 } ? rule : null;
    }

    private static void CheckUnique(string id, FilePosition at, Dictionary<string, FilePosition> ids, ProblemList problems)
    {
        if (!ids.TryAdd(id, at))
        {
            problems.Error(
                at,
                $"a rule with the id '{Suggestion.Shorten(id)}' is stated already, at {ids[id]}",
                "give it another id; where a rule set is used twice, write { use: …, prefix: LANE1-, bind: … }");
        }
    }
}
