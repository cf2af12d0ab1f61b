using System.Collections.Frozen;
using System.Collections.Immutable;
using StackTiming.Nets.Names;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Parts;

/// <summary>Reads one part: its pins, and the pairs of pins that it joins.</summary>
/// <param name="models">The buffer models that pins may name; a null value is a model that was stated but is wrong.</param>
internal sealed class PartReader(IReadOnlyDictionary<string, BufferModel?> models)
{
    /// <summary>Reads a part.</summary>
    /// <param name="name">Reference designator.</param>
    /// <param name="map">Its mapping.</param>
    public Part Read(string name, MapReader map)
    {
        var pins = new Dictionary<string, PartPin>(StringComparer.Ordinal);
        foreach (var entry in map.Named("pins"))
            ReadPins(entry, map, pins);
        var joins = ReadJoins(name, map, pins);
        if (!map.Has("pins") && !map.Has("joins"))
            map.Problems.Error(map.At, $"the part '{Suggestion.Shorten(name)}' has neither pins nor joins", "write pins: { 1: { model: … } } or joins: [1, 2]");
        map.Finish();
        return new Part(name, map.At, pins.ToFrozenDictionary(StringComparer.Ordinal), joins);
    }

    private void ReadPins(DataEntry entry, MapReader part, Dictionary<string, PartPin> pins)
    {
        if (part.MapOf(entry.Value, entry.Key) is not { } map)
            return;
        BufferModel? model = null;
        if (map.Text("model") is { } modelName && !models.TryGetValue(modelName, out model))
        {
            map.Problems.Error(
                map.PositionOf("model"), $"there is no model '{Suggestion.Shorten(modelName)}'",
                models.Count > 0 ? Suggestion.For(modelName, models.Keys) : "write it under models:");
        }
        var delay = map.Quantity("package-delay", Dimension.Time, QuantityRange.NotNegative);
        var terminations = BufferModelReader.ReadTerminations(map);
        var net = map.Text("net");
        map.Finish();
        foreach (var name in Expand(entry.Key, entry.KeyAt, map.Problems))
        {
            if (!pins.TryAdd(name, new PartPin(name, entry.KeyAt, model, delay?.Value ?? 0, terminations, net)))
                map.Problems.Error(entry.KeyAt, $"the pin '{Suggestion.Shorten(name)}' is stated twice", "remove it from one of the two");
        }
    }

    private static ImmutableArray<SeriesJoin> ReadJoins(string name, MapReader map, Dictionary<string, PartPin> pins)
    {
        var resistance = map.Quantity("resistance", Dimension.Resistance, QuantityRange.NotNegative) ?? Quantity.Exact(0);
        var inductance = map.Quantity("inductance", Dimension.Inductance, QuantityRange.NotNegative) ?? Quantity.Exact(0);
        var capacitance = map.Quantity("capacitance", Dimension.Capacitance, QuantityRange.Positive);
        var nets = map.List("nets");
        if (map.Find("joins") is not { } node)
        {
            foreach (var key in (ReadOnlySpan<string>)["resistance", "inductance", "capacitance", "nets"])
            {
                if (map.Has(key))
                    map.Problems.Error(map.PositionOf(key), $"'{key}' needs the two pins that the part joins", $"write {name}: {{ joins: [1, 2], {key}: … }}");
            }
            return [];
        }
        // [1, 2] is one pair; [[1, 8], [2, 7]] are several, as in a resistor network.
        var pairs = node is DataList { Items: [DataList, ..] several } ? several : [node];
        var joins = ImmutableArray.CreateBuilder<SeriesJoin>();
        var seen = new HashSet<string>(StringComparer.Ordinal);
        foreach (var pair in pairs)
        {
            if (pair is not DataList { Items: [DataScalar first, DataScalar second] })
            {
                map.Problems.Error(pair.At, "'joins' must be two pins, or a list of pairs of pins", "write joins: [1, 2] or joins: [[1, 8], [2, 7]]");
                continue;
            }
            foreach (var pin in (ReadOnlySpan<DataScalar>)[first, second])
            {
                if (!seen.Add(pin.Text))
                    map.Problems.Error(pin.At, $"the pin '{Suggestion.Shorten(pin.Text)}' is joined twice", "name every pin in one pair only");
            }
            joins.Add(new SeriesJoin(first.Text, second.Text, resistance, inductance, capacitance));
        }
        if (map.Has("nets"))
            PlaceJoin(map, nets, joins, pins);
        return joins.DrainToImmutable();
    }

    // Two nets of a list whose rows name no pins.
    private static void PlaceJoin(
        MapReader map, ImmutableArray<DataNode> nets, ImmutableArray<SeriesJoin>.Builder joins, Dictionary<string, PartPin> pins)
    {
        if (joins.Count != 1 || nets is not [DataScalar first, DataScalar second])
        {
            map.Problems.Error(map.PositionOf("nets"), "'nets' must name the nets of the part's two pins", "write joins: [1, 2], nets: [CLK_SRC, CLK]");
            return;
        }
        foreach (var (pin, net) in (ReadOnlySpan<(string, DataScalar)>)[(joins[0].FirstPin, first), (joins[0].SecondPin, second)])
        {
            pins[pin] = pins.TryGetValue(pin, out var stated)
                ? stated with { Net = net.Text }
                : new PartPin(pin, net.At, null, 0, [], net.Text);
        }
    }

    private static IEnumerable<string> Expand(string key, FilePosition at, ProblemList problems)
    {
        foreach (var item in NameList.Split(key))
        {
            if (NamePattern.TryParse(item, out var problem) is not { } pattern)
                problems.Error(at, problem);
            else if (NamePattern.HasWildcard(item))
                problems.Error(at, $"'{Suggestion.Shorten(item)}' stands for any pin, but a part's pins must be known by name", "write a range such as B1..B8");
            else
            {
                foreach (var name in pattern.Alternatives)
                    yield return name;
            }
        }
    }
}
