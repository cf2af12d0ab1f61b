using StackTiming.Rules.Boards;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.RuleFiles;

/// <summary>
/// Collects the rules of a board from its rule files and the reusable sets that they use, in the order in which they are written.
/// </summary>
/// <param name="files">The board's files.</param>
/// <param name="problems">Where problems go.</param>
public sealed class RuleFileReader(BoardFiles files, ProblemList problems)
{
    /// <summary>Most rules that a board may have, so that sets which use each other cannot grow without end.</summary>
    public const int MostRules = 20_000;

    private readonly List<RuleEntry> entries = [];
    private readonly List<RuleScope> scopes = [];
    private readonly List<string> open = [];
    private int uses;

    /// <summary>The rules found so far, in file order.</summary>
    public IReadOnlyList<RuleEntry> Entries => entries;

    /// <summary>The scopes of all files read so far.</summary>
    public IReadOnlyList<RuleScope> Scopes => scopes;

    /// <summary>A new scope.</summary>
    public RuleScope NewScope()
    {
        var scope = new RuleScope();
        scopes.Add(scope);
        return scope;
    }

    /// <summary>Reads <c>groups</c> and <c>pairs</c> of a mapping into a scope.</summary>
    /// <param name="reader">The mapping.</param>
    /// <param name="scope">The scope.</param>
    public void ReadNames(MapReader reader, RuleScope scope)
    {
        foreach (var entry in reader.Named("groups"))
            scope.Add(NetGroup.Read(entry, reader.Units, problems), problems);
        foreach (var entry in reader.Named("pairs"))
            scope.Add(NetPair.Read(entry, problems), problems);
    }

    /// <summary>
    /// Reads one item of a list of rules: a rule, <c>{ use: … }</c>, or (in a board file) the path of a rule file, which shares the
    /// scope.
    /// </summary>
    /// <param name="item">The item.</param>
    /// <param name="scope">The names that it can use.</param>
    /// <param name="prefix">What is put before ids.</param>
    /// <param name="units">Units of the file that it stands in.</param>
    /// <param name="allowPath">Whether the item may be a path.</param>
    public void ReadItem(DataNode item, RuleScope scope, string prefix, DefaultUnits units, bool allowPath)
    {
        switch (item)
        {
            case DataMap map when map.Entries.Any(e => e.Key == "use"):
                ReadUse(new MapReader(map, units, problems), scope, prefix);
                break;
            case DataMap map:
                if (entries.Count == MostRules)
                    problems.Error(map.At, $"a board can have at most {MostRules} rules", "use patterns over nets instead of a rule for each");
                if (entries.Count <= MostRules)
                    entries.Add(new RuleEntry(map, scope, prefix, units));
                break;
            case DataScalar { Text.Length: > 0 } path when allowPath:
                ReadFile(path.Text, path.At, scope, prefix);
                break;
            default:
                problems.Error(
                    item.At,
                    "an item of 'rules' is a mapping",
                    allowPath ? "write the path of a rule file, { use: FILE, bind: { … } }, or { id: …, kind: …, … }" : "write { id: …, kind: …, … } or { use: FILE, bind: { … } }");
                break;
        }
    }

    private void ReadUse(MapReader reader, RuleScope outer, string prefix)
    {
        var path = reader.NeedText("use", "use: ../../rules/byte-lane.rules.yaml");
        var own = reader.Text("prefix") ?? "";
        var bind = reader.Named("bind");
        reader.Finish();
        if (path is null)
            return;
        var scope = NewScope();
        var errors = problems.ErrorCount;
        var bindings = new List<(DataEntry Entry, NetSelector Selector)>();
        foreach (var entry in bind)
        {
            if (NetSelector.Read(entry.Value, entry.Key, problems) is { } selector)
                bindings.Add((entry, selector));
        }
        if (problems.ErrorCount > errors)
            return;
        ReadFile(path, reader.PositionOf("use"), scope, prefix + own, () => Bind(scope, outer, bindings, reader, path));
    }

    private void Bind(RuleScope scope, RuleScope outer, List<(DataEntry Entry, NetSelector Selector)> bindings, MapReader use, string path)
    {
        foreach (var (entry, selector) in bindings)
        {
            var known = scope.Groups.TryGetValue(entry.Key, out var group) ? group.Nets is null
                : scope.Pairs.TryGetValue(entry.Key, out var pair) ? pair.Members is null
                : (bool?)null;
            if (known is true)
                scope.Bind(entry.Key, new Binding(outer, selector));
            else if (known is false)
                problems.Error(entry.KeyAt, $"'{entry.Key}' has nets of its own in {path}, so it cannot be bound");
            else
                problems.Error(entry.KeyAt, $"{path} has no group or pair '{Suggestion.Shorten(entry.Key)}'", Suggestion.For(entry.Key, scope.Names));
        }
        var left = scope.Groups.Values.Where(g => g.Nets is null).Select(g => g.Name)
            .Concat(scope.Pairs.Values.Where(p => p.Members is null).Select(p => p.Name))
            .Where(name => !scope.Bindings.ContainsKey(name) && bindings.All(b => b.Entry.Key != name))
            .ToArray();
        if (left.Length > 0)
            problems.Error(use.At, $"{path} leaves open: {string.Join(", ", left)}", $"write bind: {{ {left[0]}: a group or net of yours }}");
    }

    private void ReadFile(string path, FilePosition from, RuleScope scope, string prefix, Action? afterNames = null)
    {
        if (++uses > MostRules)
        {
            problems.Error(from, $"rule sets are used more than {MostRules} times", "use patterns over nets instead");
            return;
        }
        if (files.Resolve(path, from) is not { } shown)
            return;
        var full = Path.GetFullPath(shown);
        if (open.Contains(full))
        {
            var circle = open.Skip(open.IndexOf(full)).Append(full).Select(Path.GetFileName);
            problems.Error(from, $"the rule files use each other in a circle: {string.Join(" → ", circle)}", "remove one of these 'use'");
            return;
        }
        if (files.Yaml(shown, from, "rules") is not { } map)
            return;
        open.Add(full);
        var reader = FileHeader.Open(map, problems);
        reader.Text("name");
        ReadNames(reader, scope);
        afterNames?.Invoke();
        var items = reader.List("rules");
        if (items.IsEmpty && scope.Groups.Count + scope.Pairs.Count == 0)
            problems.Error(map.At, "the file has neither rules nor groups", "write rules: [ { id: …, kind: …, nets: … } ]");
        foreach (var item in items)
            ReadItem(item, scope, prefix, reader.Units, allowPath: false);
        reader.Finish();
        open.RemoveAt(open.Count - 1);
    }
}
