using System.Collections.Immutable;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Sketches;

/// <summary>Reads net sketches (<c>*.net.yaml</c>).</summary>
public static class NetSketchReader
{
    private enum EdgeWord
    {
        Rise,
        Fall,
        Pattern,
    }

    private static readonly Dictionary<string, EdgeWord> Edges = new(StringComparer.Ordinal)
    {
        ["rise"] = EdgeWord.Rise,
        ["fall"] = EdgeWord.Fall,
        ["pattern"] = EdgeWord.Pattern,
    };

    /// <summary>Reads a sketch, or reports all of its problems.</summary>
    /// <param name="file">The file.</param>
    /// <param name="problems">Where problems go.</param>
    public static NetSketch? Read(InputFile file, ProblemList problems)
    {
        var errorsBefore = problems.ErrorCount;
        if (YamlDocument.ReadMap(file, problems) is not { } map)
            return null;
        var units = DefaultUnitsReader.Read(new MapReader(map, DefaultUnits.None, problems));
        var reader = new MapReader(map, units, problems);
        FormatVersion.Check(reader);
        reader.Has("units");
        reader.Text("name");
        var stackUp = ReadStackUp(reader, file.Path);
        var driver = reader.Need("driver", "driver: { at: U1, low: 0 V, high: 1.8 V, resistance: 25 ohm, rise: 400 ps }") is { } node && reader.MapOf(node, "driver") is { } d
            ? ReadDriver(d) : null;
        var lines = Each(reader, "lines", SketchLineReader.Read);
        var pairs = Each(reader, "coupled-lines", SketchLineReader.ReadPair);
        var series = Each(reader, "series", ReadSeries);
        var shunts = Each(reader, "shunts", ReadShunt);
        var receivers = Each(reader, "receivers", ReadReceiver);
        var edge = ReadEdge(reader);
        var load = reader.Map("reference-load") is { } l ? ReadLoad(l) : null;
        var duration = reader.Quantity("duration", Dimension.Time, QuantityRange.Positive)?.Value;
        reader.Finish();
        Check(reader, stackUp, lines, receivers);
        if (problems.ErrorCount > errorsBefore || driver is null || edge is null)
            return null;
        return new NetSketch(stackUp, driver, lines, pairs, series, shunts, receivers, edge, load, duration);
    }

    private static StackUp? ReadStackUp(MapReader reader, string sketchPath)
    {
        switch (reader.Find("stackup"))
        {
            case null:
                return null;
            case DataMap inline:
                return StackUpReader.Read(inline, reader.Problems);
            case var node:
                if (reader.TextOf(node, "stackup") is not { } relative || InputPath.Resolve(sketchPath, relative, reader.Problems, node.At) is not { } path)
                    return null;
                InputPath.NoteIfOutside(Path.GetDirectoryName(sketchPath) ?? "", path, reader.Problems, node.At);
                return InputFileLoader.Load(path, node.At, reader.Problems) is { } file ? StackUpReader.Read(file, reader.Problems) : null;
        }
    }

    private static ImmutableArray<T> Each<T>(MapReader reader, string key, Func<MapReader, T?> read) where T : class
    {
        var items = ImmutableArray.CreateBuilder<T>();
        foreach (var node in reader.List(key))
        {
            if (reader.MapOf(node, key) is not { } map)
                continue;
            if (read(map) is { } item)
                items.Add(item);
            map.Finish();
        }
        return items.ToImmutable();
    }

    private static SketchDriver? ReadDriver(MapReader map)
    {
        var at = map.NeedText("at", "at: U1");
        var low = map.NeedQuantity("low", Dimension.Voltage, QuantityRange.Any, "low: 0 V");
        var high = map.NeedQuantity("high", Dimension.Voltage, QuantityRange.Any, "high: 1.8 V");
        var resistance = map.NeedQuantity("resistance", Dimension.Resistance, QuantityRange.Positive, "resistance: 25 ohm");
        var rise = map.NeedQuantity("rise", Dimension.Time, QuantityRange.Positive, "rise: 400 ps");
        var fall = map.Quantity("fall", Dimension.Time, QuantityRange.Positive);
        var die = map.Quantity("capacitance", Dimension.Capacitance, QuantityRange.NotNegative)?.Value ?? 0;
        double henries = 0, farads = 0;
        if (map.Map("package") is { } package)
        {
            henries = package.Quantity("inductance", Dimension.Inductance, QuantityRange.NotNegative)?.Value ?? 0;
            farads = package.Quantity("capacitance", Dimension.Capacitance, QuantityRange.NotNegative)?.Value ?? 0;
            package.Finish();
        }
        map.Finish();
        if (low is { } l && high is { } h && l.Value >= h.Value)
            map.Problems.Error(map.PositionOf("low"), "the low level is not below the high level", "write low: 0 V, high: 1.8 V");
        return at is null || low is null || high is null || resistance is null || rise is null
            ? null
            : new SketchDriver(map.At, at, low.Value.Value, high.Value.Value, resistance.Value.Value, rise.Value.Value, (fall ?? rise).Value.Value, henries, farads + die);
    }

    private static SketchSeries? ReadSeries(MapReader map)
    {
        var from = map.NeedText("from", "from: a");
        var to = map.NeedText("to", "to: b");
        var resistance = map.Quantity("resistance", Dimension.Resistance, QuantityRange.NotNegative);
        var inductance = map.Quantity("inductance", Dimension.Inductance, QuantityRange.NotNegative);
        var capacitance = map.Quantity("capacitance", Dimension.Capacitance, QuantityRange.Positive);
        if (!map.Has("resistance") && !map.Has("inductance") && !map.Has("capacitance"))
            map.Problems.Error(map.At, "the series element says nothing of itself", "write resistance: 22 ohm, inductance: 2 nH or capacitance: 100 nF");
        return from is null || to is null
            ? null : new SketchSeries(map.At, from, to, resistance?.Value ?? 0, inductance?.Value ?? 0, capacitance?.Value);
    }

    private static SketchShunt? ReadShunt(MapReader map)
    {
        var at = map.NeedText("at", "at: a");
        var capacitance = map.Quantity("capacitance", Dimension.Capacitance, QuantityRange.NotNegative);
        var inductance = map.Quantity("inductance", Dimension.Inductance, QuantityRange.Positive);
        var (resistance, to) = ReadResistor(map);
        if (!map.Has("capacitance") && !map.Has("inductance") && !map.Has("resistance"))
            map.Problems.Error(map.At, "the shunt says nothing of itself", "write capacitance: 0.4 pF, or resistance: 50 ohm with to: 0.6 V");
        return at is null ? null : new SketchShunt(map.At, at, capacitance?.Value ?? 0, inductance?.Value, resistance, to);
    }

    private static SketchReceiver? ReadReceiver(MapReader map)
    {
        var at = map.NeedText("at", "at: U2");
        var capacitance = map.Quantity("capacitance", Dimension.Capacitance, QuantityRange.NotNegative);
        var (resistance, to) = ReadResistor(map);
        var vil = map.Quantity("vil", Dimension.Voltage, QuantityRange.Any)?.Value;
        var vih = map.Quantity("vih", Dimension.Voltage, QuantityRange.Any)?.Value;
        var threshold = map.Quantity("threshold", Dimension.Voltage, QuantityRange.Any)?.Value;
        if (vil is null != vih is null || (threshold is not null && vil is null))
            map.Problems.Error(map.At, "the receiver states some of its levels only", "write vil, vih and threshold, or none of them");
        if (vil is { } low && vih is { } high)
        {
            threshold ??= 0.5 * (low + high);
            if (!(low <= threshold && threshold <= high && low < high))
                map.Problems.Error(map.At, "the levels of the receiver are out of order", "they must rise: vil, threshold, vih");
        }
        return at is null ? null : new SketchReceiver(map.At, at, capacitance?.Value ?? 0, resistance, to, vil, vih, threshold);
    }

    private static (double? Ohms, double ToVolts) ReadResistor(MapReader map)
    {
        var resistance = map.Quantity("resistance", Dimension.Resistance, QuantityRange.Positive);
        var to = map.Quantity("to", Dimension.Voltage, QuantityRange.Any);
        if (to is not null && !map.Has("resistance"))
            map.Problems.Error(map.PositionOf("to"), "'to' needs a 'resistance'", "write resistance: 50 ohm, to: 0.6 V");
        return (resistance?.Value, to?.Value ?? 0);
    }

    private static SketchLoad ReadLoad(MapReader map)
    {
        var (resistance, to) = ReadResistor(map);
        var capacitance = map.Quantity("capacitance", Dimension.Capacitance, QuantityRange.NotNegative)?.Value ?? 0;
        if (!map.Has("resistance") && !map.Has("capacitance"))
            map.Problems.Error(map.At, "the reference load says nothing of itself", "write reference-load: { resistance: 50 ohm }");
        map.Finish();
        return new SketchLoad(resistance, to, capacitance);
    }

    private static SketchEdge? ReadEdge(MapReader map)
    {
        var word = map.Choice("edge", Edges);
        var pattern = map.Text("pattern");
        var bit = map.Quantity("bit", Dimension.Time, QuantityRange.Positive);
        var at = map.PositionOf(pattern is null ? "edge" : "pattern");
        if (map.Has("edge") && word is null)
            return null;
        if (pattern is null)
        {
            if (word == EdgeWord.Pattern)
                map.Problems.Error(at, "the pattern has no bits", "write pattern: \"010\" with bit: 5 ns");
            if (bit is not null)
                map.Problems.Error(map.PositionOf("bit"), "'bit' has no pattern", "write pattern: \"010\", or remove it");
            return new SketchEdge(at, word != EdgeWord.Fall, [], 0);
        }
        if (word is EdgeWord.Rise or EdgeWord.Fall)
            map.Problems.Error(at, $"there is a pattern although 'edge' says {map.Text("edge")}", "write edge: pattern, or leave edge away");
        if (pattern.Length is 0 or > 4096 || pattern.AsSpan().ContainsAnyExcept('0', '1'))
            map.Problems.Error(at, "a pattern is one to 4096 digits 0 and 1", "write it in quotes, such as \"010\"");
        if (!map.Has("bit"))
            map.Problems.Error(at, "the pattern needs the length of a bit", "write bit: 5 ns");
        return bit is null ? null : new SketchEdge(at, true, [.. pattern.Select(c => c == '1')], bit.Value.Value);
    }

    private static void Check(MapReader reader, StackUp? stackUp, ImmutableArray<SketchLine> lines, ImmutableArray<SketchReceiver> receivers)
    {
        if (reader.List("receivers").IsEmpty)
            reader.Problems.Error(reader.At, "the net has no receiver", "write receivers: [ { at: U2, capacitance: 2 pF } ]");
        foreach (var twice in receivers.GroupBy(r => r.Node).Where(g => g.Count() > 1))
            reader.Problems.Error(twice.Last().At, $"'{twice.Key}' has two receivers", "keep one a node; put further capacitance into shunts");
        foreach (var trace in lines.OfType<TraceSketchLine>())
        {
            if (!reader.Has("stackup"))
                reader.Problems.Error(trace.At, "the line names a layer, but the sketch names no stack-up", "write stackup: board.stackup.yaml at the top, or give z0 and delay");
            else if (stackUp is not null && stackUp.FindCopper(trace.Layer) is null)
                reader.Problems.Error(trace.At, $"the stack-up has no copper layer '{Suggestion.Shorten(trace.Layer)}'", Suggestion.For(trace.Layer, stackUp.CopperLayers.Select(l => l.Name)));
        }
    }
}
