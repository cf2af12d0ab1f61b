using System.Collections.Immutable;
using StackTiming.Rules.Judging;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.RuleFiles;

/// <summary>
/// Reads the keys of one rule for its kind. Net names are found on the board at once, so that a rule never exists with nets that do not.
/// The answers to wrong or missing values are null, with the problem reported.
/// </summary>
/// <param name="map">The rule's mapping.</param>
/// <param name="scope">The names that it can use.</param>
/// <param name="resolver">Finds nets.</param>
/// <param name="layers">Names of the copper layers, or null where the stack-up could not be read.</param>
public sealed class RuleReader(MapReader map, RuleScope scope, NetResolver resolver, IReadOnlyCollection<string>? layers)
{
    /// <summary>Names of the copper layers, or null where the stack-up could not be read.</summary>
    public IReadOnlyCollection<string>? Layers => layers;

    /// <summary>The mapping, for keys that need nothing of the board.</summary>
    public MapReader Map => map;

    /// <summary>The nets of the rule: the key <c>nets</c>, which must be there.</summary>
    public NetSet? NeedNets() => NeedNets("nets");

    /// <summary>The nets of a key that must be there.</summary>
    /// <param name="key">The key.</param>
    public NetSet? NeedNets(string key) =>
        map.Need(key, $"{key}: MEM_D*") is { } node && NetSelector.Read(node, key, map.Problems) is { } selector
            ? resolver.Resolve(scope, selector)
            : null;

    /// <summary>The pairs of the rule: the key <c>pair</c>, which must be there.</summary>
    public IReadOnlyList<PairRef>? NeedPairs() =>
        map.Need("pair", "pair: usb, with pairs: { usb: [ USB_P, USB_N ] }") is { } node && NetSelector.Read(node, "pair", map.Problems) is { } selector
            ? resolver.ResolvePairs(scope, selector)
            : null;

    /// <summary>One net of an optional key; null where the key is missing or, with a problem, names no net.</summary>
    /// <param name="key">The key.</param>
    public string? Net(string key) =>
        map.Text(key) is { } text ? resolver.SingleNet(scope, new SelectorItem(map.PositionOf(key), text), key) : null;

    /// <summary>What to compare with, of an optional key; without it, the strobe or clock of the rule's group, which <c>strobe</c> and <c>clock</c> mean too.</summary>
    /// <param name="key">The key.</param>
    /// <param name="nets">The rule's nets, or null.</param>
    /// <returns>The reference; null with a problem where there is none.</returns>
    public ReferenceNets? NeedReference(string key, NetSet? nets)
    {
        if (map.Text(key) is { } text && (text is not ("strobe" or "clock") || NetResolver.IsName(scope, text)))
            return resolver.Reference(scope, new SelectorItem(map.PositionOf(key), text), key);
        if (nets is { Strobe: null })
            map.Problems.Error(map.PositionOf(key), $"'{key}' is missing, and '{Suggestion.Shorten(nets.Text)}' is no group with a "
                + "strobe or clock", $"write {key}: MEM_DQS0");
        return nets?.Strobe;
    }

    /// <summary>A quantity that must be there, above zero.</summary>
    /// <param name="key">The key.</param>
    /// <param name="dimension">What it measures.</param>
    /// <param name="example">What to write.</param>
    public double? NeedPositive(string key, Dimension dimension, string example) =>
        map.NeedQuantity(key, dimension, QuantityRange.Positive, example)?.Value;

    /// <summary>An optional quantity, above zero.</summary>
    /// <param name="key">The key.</param>
    /// <param name="dimension">What it measures.</param>
    public double? Positive(string key, Dimension dimension) => map.Quantity(key, dimension, QuantityRange.Positive)?.Value;

    /// <summary>An optional quantity, zero or above.</summary>
    /// <param name="key">The key.</param>
    /// <param name="dimension">What it measures.</param>
    public double? NotNegative(string key, Dimension dimension) => map.Quantity(key, dimension, QuantityRange.NotNegative)?.Value;

    /// <summary>An optional quantity of any sign.</summary>
    /// <param name="key">The key.</param>
    /// <param name="dimension">What it measures.</param>
    public double? Any(string key, Dimension dimension) => map.Quantity(key, dimension, QuantityRange.Any)?.Value;

    /// <summary>A window from two optional keys, of which at least one must be there, the lower first.</summary>
    /// <param name="lowerKey">Key of the lower limit.</param>
    /// <param name="upperKey">Key of the upper limit.</param>
    /// <param name="dimension">What they measure.</param>
    /// <param name="example">What to write.</param>
    public Window? NeedWindow(string lowerKey, string upperKey, Dimension dimension, string example)
    {
        var errors = map.Problems.ErrorCount;
        var lower = Any(lowerKey, dimension);
        var upper = Any(upperKey, dimension);
        if (map.Problems.ErrorCount > errors)
            return null;
        if (lower is null && upper is null)
        {
            map.Problems.Error(map.At, $"neither '{lowerKey}' nor '{upperKey}' is given", $"write {example}");
            return null;
        }
        if (lower > upper)
        {
            map.Problems.Error(map.PositionOf(lowerKey), $"'{lowerKey}' is above '{upperKey}', so that nothing can pass", "swap them");
            return null;
        }
        return new Window(lower, upper);
    }

    /// <summary>Who drives: the rule's own <c>drive</c>, or that of its group, or of other groups of a net, or the only driver of each net.</summary>
    /// <param name="nets">The rule's nets, or null.</param>
    public Drivers Drive(NetSet? nets)
    {
        var text = map.Text("drive") ?? nets?.Drive?.Text;
        return new Drivers(string.IsNullOrEmpty(text) ? null : DriveChoice.Parse(text), resolver.Drives, DriveChoice.OnlyDriver);
    }

    /// <summary>Which edges are judged: <c>rise</c>, <c>fall</c> or <c>both</c>.</summary>
    /// <param name="otherwise">Where the rule does not say.</param>
    public ImmutableArray<Edge> Edges(ImmutableArray<Edge> otherwise) => map.Text("edge") switch
    {
        null => otherwise,
        "rise" => [Edge.Rise],
        "fall" => [Edge.Fall],
        "both" => [Edge.Rise, Edge.Fall],
        var other => WrongEdge(other, otherwise),
    };

    /// <summary>Where the rule judges: the key <c>at</c>, a part or a pin; everywhere where it is missing.</summary>
    public ReceiverChoice At() => new(map.Text("at") ?? "");

    /// <summary>What delays count: the key <c>delay</c>.</summary>
    public DelayBasis Basis() => map.Choice("delay", Bases) ?? DelayBasis.Automatic;

    /// <summary>The usual keys of a rule that compares delays.</summary>
    /// <param name="nets">The rule's nets, or null.</param>
    public DelayQuery Delays(NetSet? nets) => new(Drive(nets), At(), Basis());

    /// <summary>The usual keys of a rule that judges waveforms.</summary>
    /// <param name="nets">The rule's nets, or null.</param>
    public EdgeQuery Responses(NetSet? nets) => new(Drive(nets), At(), Edges([Edge.Rise, Edge.Fall]));

    private static readonly Dictionary<string, DelayBasis> Bases = new(StringComparer.Ordinal)
    {
        ["flight-time"] = DelayBasis.FlightTime,
        ["time-of-flight"] = DelayBasis.TimeOfFlight,
    };

    private ImmutableArray<Edge> WrongEdge(string text, ImmutableArray<Edge> otherwise)
    {
        map.Problems.Error(
            map.PositionOf("edge"), $"'edge' cannot be '{Suggestion.Shorten(text)}'", Suggestion.For(text, ["rise", "fall", "both"]));
        return otherwise;
    }
}
