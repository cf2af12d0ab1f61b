using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.RuleFiles;

/// <summary>A named group of nets as its file states it.</summary>
/// <param name="At">Where it is stated.</param>
/// <param name="Name">Its name.</param>
/// <param name="Nets">Its nets, or null where a reusable rule set leaves it open.</param>
/// <param name="Strobe">The net that its receivers sample with, or null.</param>
/// <param name="Drive">Which part or pin drives it, or <c>both</c>; null where each net has one driver.</param>
public sealed record NetGroup(FilePosition At, string Name, NetSelector? Nets, SelectorItem? Strobe, SelectorItem? Drive)
{
    /// <summary>Reads the value of one key of <c>groups</c>.</summary>
    /// <param name="entry">The key and its value.</param>
    /// <param name="units">Units of the file.</param>
    /// <param name="problems">Where problems go.</param>
    public static NetGroup Read(DataEntry entry, Stackups.Quantities.DefaultUnits units, ProblemList problems)
    {
        if (IsNothing(entry.Value))
            return new NetGroup(entry.KeyAt, entry.Key, null, null, null);
        if (entry.Value is not DataMap map)
            return new NetGroup(entry.KeyAt, entry.Key, NetSelector.Read(entry.Value, entry.Key, problems), null, null);
        var reader = new MapReader(map, units, problems);
        var nets = reader.Find("nets") is { } node && !IsNothing(node) ? NetSelector.Read(node, "nets", problems) : null;
        var strobe = Item(reader, "strobe");
        var clock = Item(reader, "clock");
        if (strobe is not null && clock is not null)
            problems.Error(clock.Value.At, $"group '{entry.Key}' names both a strobe and a clock", "keep the one that samples it");
        var group = new NetGroup(entry.KeyAt, entry.Key, nets, strobe ?? clock, Item(reader, "drive"));
        reader.Finish();
        return group;
    }

    /// <summary>Whether a value says nothing, which leaves a group or pair open.</summary>
    /// <param name="node">The value.</param>
    internal static bool IsNothing(DataNode node) => node switch
    {
        DataScalar { Quoted: false, Text: "" or "~" or "null" } => true,
        DataMap { Entries.Length: 0 } => true,
        _ => false,
    };

    private static SelectorItem? Item(MapReader reader, string key) =>
        reader.Text(key) is { Length: > 0 } text ? new SelectorItem(reader.PositionOf(key), text) : null;
}
