using System.Collections.Immutable;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Stackups.Reading;

/// <summary>
/// Reads the keys of one mapping. Each question names its key, so that <see cref="Finish"/> knows every key that the format has, and can
/// report the unknown ones with the nearest known one. Problems go to the list; the answers to wrong values are null.
/// </summary>
/// <param name="map">The mapping.</param>
/// <param name="units">Units for bare numbers.</param>
/// <param name="problems">Where problems go.</param>
public sealed class MapReader(DataMap map, DefaultUnits units, ProblemList problems)
{
    private readonly HashSet<string> known = new(StringComparer.Ordinal);

    /// <summary>Where the mapping begins.</summary>
    public FilePosition At => map.At;

    /// <summary>The list that problems go to.</summary>
    public ProblemList Problems => problems;

    /// <summary>Units for bare numbers.</summary>
    public DefaultUnits Units => units;

    /// <summary>Declares a key that the format has without reading it.</summary>
    /// <param name="key">The key.</param>
    public bool Has(string key) => Find(key) is not null;

    /// <summary>The value of a key, or null where the mapping has none.</summary>
    /// <param name="key">The key.</param>
    public DataNode? Find(string key)
    {
        known.Add(key);
        foreach (var entry in map.Entries)
        {
            if (entry.Key == key)
                return entry.Value;
        }
        return null;
    }

    /// <summary>The value of a key that must be there.</summary>
    /// <param name="key">The key.</param>
    /// <param name="example">What to write, for the advice, such as <c>rise: 150 ps</c>.</param>
    public DataNode? Need(string key, string example)
    {
        var node = Find(key);
        if (node is null)
            problems.Error(map.At, $"'{key}' is missing", $"write {example}");
        return node;
    }

    /// <summary>Where the value of a key stands, or the mapping where it has none.</summary>
    /// <param name="key">The key.</param>
    public FilePosition PositionOf(string key) => Find(key)?.At ?? map.At;

    /// <summary>The text of an optional key.</summary>
    /// <param name="key">The key.</param>
    public string? Text(string key) => Find(key) is { } node ? TextOf(node, key) : null;

    /// <summary>The text of a key that must be there.</summary>
    /// <param name="key">The key.</param>
    /// <param name="example">What to write.</param>
    public string? NeedText(string key, string example) => Need(key, example) is { } node ? TextOf(node, key) : null;

    /// <summary>An optional quantity.</summary>
    /// <param name="key">The key.</param>
    /// <param name="dimension">What it must measure.</param>
    /// <param name="range">Which values are allowed.</param>
    public Quantity? Quantity(string key, Dimension dimension, QuantityRange range) =>
        Find(key) is { } node ? QuantityOf(node, key, dimension, range) : null;

    /// <summary>A quantity that must be there.</summary>
    /// <param name="key">The key.</param>
    /// <param name="dimension">What it must measure.</param>
    /// <param name="range">Which values are allowed.</param>
    /// <param name="example">What to write.</param>
    public Quantity? NeedQuantity(string key, Dimension dimension, QuantityRange range, string example) =>
        Need(key, example) is { } node ? QuantityOf(node, key, dimension, range) : null;

    /// <summary>A quantity from any node, such as an item of a list.</summary>
    /// <param name="node">The node.</param>
    /// <param name="what">What the message calls it.</param>
    /// <param name="dimension">What it must measure.</param>
    /// <param name="range">Which values are allowed.</param>
    public Quantity? QuantityOf(DataNode node, string what, Dimension dimension, QuantityRange range)
    {
        if (TextOf(node, what) is not { } text)
            return null;
        if (!QuantityParser.TryParse(text, dimension, units, out var quantity, out var problem, out var advice))
        {
            problems.Error(node.At, $"'{Suggestion.Shorten(what)}': {problem}", advice.Length == 0 ? null : advice);
            return null;
        }
        if (range.Objection(quantity) is { } objection)
        {
            problems.Error(node.At, $"'{Suggestion.Shorten(what)}' {objection}, but it says '{text}'");
            return null;
        }
        return quantity;
    }

    /// <summary>An optional tolerance that stands alone, such as <c>width-tolerance: 20 um</c>; no tolerance where the key is missing.</summary>
    /// <param name="key">The key.</param>
    /// <param name="dimension">What it must measure.</param>
    public Tolerance Tolerance(string key, Dimension dimension)
    {
        if (Find(key) is not { } node || TextOf(node, key) is not { } text)
            return Quantities.Tolerance.None;
        if (!QuantityParser.TryParseTolerance(text, dimension, units, out var tolerance, out var problem, out var advice))
            problems.Error(node.At, $"'{key}': {problem}", advice.Length == 0 ? null : advice);
        return tolerance;
    }

    /// <summary>An optional choice between words.</summary>
    /// <typeparam name="T">What the words stand for.</typeparam>
    /// <param name="key">The key.</param>
    /// <param name="choices">The words and their meanings.</param>
    public T? Choice<T>(string key, IReadOnlyDictionary<string, T> choices) where T : struct
    {
        if (Text(key) is not { } text)
            return null;
        if (choices.TryGetValue(text, out var value))
            return value;
        problems.Error(PositionOf(key), $"'{key}' cannot be '{Suggestion.Shorten(text)}'", Suggestion.For(text, choices.Keys));
        return null;
    }

    /// <summary>An optional yes or no: <c>true</c> or <c>false</c>.</summary>
    /// <param name="key">The key.</param>
    public bool? Flag(string key) => Choice(key, Flags);

    /// <summary>An optional mapping inside this one, with the same units.</summary>
    /// <param name="key">The key.</param>
    public MapReader? Map(string key) => Find(key) is { } node ? MapOf(node, key) : null;

    /// <summary>A mapping from any node, such as an item of a list.</summary>
    /// <param name="node">The node.</param>
    /// <param name="what">What the message calls it.</param>
    public MapReader? MapOf(DataNode node, string what)
    {
        if (node is DataMap inner)
            return new MapReader(inner, units, problems);
        problems.Error(node.At, $"'{Suggestion.Shorten(what)}' must be a mapping", $"write {Suggestion.Shorten(what)}: {{ key: value, … }}");
        return null;
    }

    /// <summary>The items of an optional list; a single value counts as a list of one; empty where the key is missing.</summary>
    /// <param name="key">The key.</param>
    public ImmutableArray<DataNode> List(string key) => Find(key) switch
    {
        null => [],
        DataList list => list.Items,
        var single => [single],
    };

    /// <summary>The entries of an optional mapping whose keys are names of the author's own; empty where the key is missing.</summary>
    /// <param name="key">The key.</param>
    public ImmutableArray<DataEntry> Named(string key)
    {
        switch (Find(key))
        {
            case null:
                return [];
            case DataMap inner:
                return inner.Entries;
            case var other:
                problems.Error(other.At, $"'{key}' must be a mapping of names", $"write {key}: {{ name: …, … }}");
                return [];
        }
    }

    /// <summary>The text of a node, or null with a problem where it is a list or a mapping.</summary>
    /// <param name="node">The node.</param>
    /// <param name="what">What the message calls it.</param>
    public string? TextOf(DataNode node, string what)
    {
        if (node is DataScalar scalar)
            return scalar.Text;
        problems.Error(node.At, $"'{Suggestion.Shorten(what)}' must be a single value");
        return null;
    }

    /// <summary>Reports every key that nobody asked for, with the nearest known one. Call it last.</summary>
    public void Finish()
    {
        foreach (var entry in map.Entries)
        {
            if (!known.Contains(entry.Key))
                problems.Error(entry.KeyAt, $"unknown key '{Suggestion.Shorten(entry.Key)}'", problems.IsFull ? null : Suggestion.For(entry.Key, known));
        }
    }

    private static readonly Dictionary<string, bool> Flags = new(StringComparer.Ordinal) { ["true"] = true, ["false"] = false };
}
