using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Sketches;

/// <summary>Reads the lines of a sketch in their three forms.</summary>
internal static class SketchLineReader
{
    private const string Forms =
        "write z0 and delay; or layer, width and length; or length, l and c (with r-dc, r-skin, df and at where it is lossy)";

    private static readonly string[] IdealKeys = ["z0", "delay"];
    private static readonly string[] TraceKeys = ["layer", "width", "length"];
    private static readonly string[] LossyKeys = ["length", "l", "c"];

    public static SketchLine? Read(MapReader map)
    {
        var from = map.NeedText("from", "from: U1");
        var to = map.NeedText("to", "to: U2");
        var z0 = map.Quantity("z0", Dimension.Resistance, QuantityRange.Positive)?.Value;
        var delay = map.Quantity("delay", Dimension.Time, QuantityRange.Positive)?.Value;
        var layer = map.Text("layer");
        var width = map.Quantity("width", Dimension.Length, QuantityRange.Positive)?.Value;
        var length = map.Quantity("length", Dimension.Length, QuantityRange.Positive)?.Value;
        var l = map.Quantity("l", Dimension.InductancePerLength, QuantityRange.Positive)?.Value;
        var c = map.Quantity("c", Dimension.CapacitancePerLength, QuantityRange.Positive)?.Value;
        var dc = map.Quantity("r-dc", Dimension.ResistancePerLength, QuantityRange.NotNegative)?.Value ?? 0;
        var skin = map.Quantity("r-skin", Dimension.SkinResistancePerLength, QuantityRange.NotNegative)?.Value ?? 0;
        var df = map.Quantity("df", Dimension.None, new QuantityRange(0, true, 1, "must be between 0 and 1"))?.Value ?? 0;
        var at = map.Quantity("at", Dimension.Frequency, QuantityRange.Positive)?.Value;
        var keys = FormOf(map);
        if (keys is null)
        {
            map.Problems.Error(map.At, "the line mixes descriptions or has none", Forms);
            return null;
        }
        var missing = Array.FindAll(keys, k => !map.Has(k));
        if (missing.Length > 0)
        {
            map.Problems.Error(map.At, $"the line lacks {string.Join(" and ", missing)}", Forms);
            return null;
        }
        if (from is not null && from == to)
            map.Problems.Error(map.At, $"the line leads from '{Suggestion.Shorten(from)}' to itself", "give it two different ends");
        if (df > 0 && at is null)
            map.Problems.Error(map.PositionOf("df"), "'df' needs its frequency", "write at: 1 GHz");
        if (from is null || to is null)
            return null;
        if (ReferenceEquals(keys, IdealKeys))
            return z0 is null || delay is null ? null : new IdealSketchLine(map.At, from, to, z0.Value, delay.Value);
        if (ReferenceEquals(keys, TraceKeys))
            return layer is null || width is null || length is null ? null : new TraceSketchLine(map.At, from, to, layer, width.Value, length.Value);
        return length is null || l is null || c is null
            ? null : new LossySketchLine(map.At, from, to, length.Value, l.Value, c.Value, dc, skin, df, at ?? 1e9);
    }

    public static SketchPair? ReadPair(MapReader map)
    {
        var from = Ends(map, "from");
        var to = Ends(map, "to");
        var even = map.NeedQuantity("z-even", Dimension.Resistance, QuantityRange.Positive, "z-even: 55 ohm");
        var odd = map.NeedQuantity("z-odd", Dimension.Resistance, QuantityRange.Positive, "z-odd: 45 ohm");
        var delayEven = map.NeedQuantity("delay-even", Dimension.Time, QuantityRange.Positive, "delay-even: 1 ns");
        var delayOdd = map.NeedQuantity("delay-odd", Dimension.Time, QuantityRange.Positive, "delay-odd: 0.95 ns");
        if (even is { } e && odd is { } o && e.Value < o.Value)
            map.Problems.Error(map.PositionOf("z-even"), "the even-mode impedance is below the odd-mode impedance", "exchange the two");
        if (from is not { } f || to is not { } t || even is null || odd is null || delayEven is null || delayOdd is null)
            return null;
        return new SketchPair(map.At, f.A, f.B, t.A, t.B, even.Value.Value, odd.Value.Value, delayEven.Value.Value, delayOdd.Value.Value);
    }

    private static (string A, string B)? Ends(MapReader map, string key)
    {
        if (map.Need(key, $"{key}: [p, q]") is not { } node)
            return null;
        if (node is DataList { Items.Length: 2 } list && map.TextOf(list.Items[0], key) is { } a && map.TextOf(list.Items[1], key) is { } b && a != b)
            return (a, b);
        map.Problems.Error(node.At, $"'{key}' of coupled lines must be two different nodes", $"write {key}: [p, q]");
        return null;
    }

    // The keys that a line has decide which form it means; keys of two forms are a mistake.
    private static string[]? FormOf(MapReader map)
    {
        var ideal = map.Has("z0") || map.Has("delay");
        var trace = map.Has("layer") || map.Has("width");
        var lossy = map.Has("l") || map.Has("c") || map.Has("r-dc") || map.Has("r-skin") || map.Has("df");
        if ((ideal ? 1 : 0) + (trace ? 1 : 0) + (lossy ? 1 : 0) != 1 || (ideal && map.Has("length")))
            return null;
        return ideal ? IdealKeys : trace ? TraceKeys : LossyKeys;
    }
}
