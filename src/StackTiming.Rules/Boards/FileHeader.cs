using System.Collections.Immutable;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Boards;

/// <summary>What every structured file may begin with: <c>format: 1</c> and <c>units: { length: um, time: ps }</c>.</summary>
public static class FileHeader
{
    private static readonly Dictionary<string, Dimension> Dimensions = new(StringComparer.Ordinal)
    {
        ["length"] = Dimension.Length,
        ["time"] = Dimension.Time,
        ["frequency"] = Dimension.Frequency,
        ["voltage"] = Dimension.Voltage,
        ["resistance"] = Dimension.Resistance,
        ["capacitance"] = Dimension.Capacitance,
        ["inductance"] = Dimension.Inductance,
    };

    /// <summary>Reads the header of a file.</summary>
    /// <param name="map">The file's mapping.</param>
    /// <param name="problems">Where problems go.</param>
    /// <returns>A reader of the mapping with the file's units, that knows the keys of the header.</returns>
    public static MapReader Open(DataMap map, ProblemList problems)
    {
        var bare = new MapReader(map, DefaultUnits.None, problems);
        if (bare.Text("format") is { } format && format != "1")
            problems.Error(bare.PositionOf("format"), $"format '{Suggestion.Shorten(format)}' is not known", "write format: 1");
        var factors = ImmutableDictionary.CreateBuilder<Dimension, double>();
        foreach (var entry in bare.Named("units"))
        {
            if (!Dimensions.TryGetValue(entry.Key, out var dimension))
                problems.Error(entry.KeyAt, $"'{Suggestion.Shorten(entry.Key)}' has no default unit", Suggestion.For(entry.Key, Dimensions.Keys));
            else if (bare.TextOf(entry.Value, entry.Key) is { } unit)
                Add(dimension, unit, entry, factors, problems);
        }
        var reader = new MapReader(map, new DefaultUnits(factors.ToImmutable()), problems);
        reader.Has("format");
        reader.Has("units");
        return reader;
    }

    private static void Add(
        Dimension dimension, string unit, DataEntry entry, ImmutableDictionary<Dimension, double>.Builder factors, ProblemList problems)
    {
        // One of the unit is its factor.
        if (QuantityParser.TryParse("1 " + unit, dimension, DefaultUnits.None, out var one, out var problem, out var advice))
            factors[dimension] = one.Value;
        else
            problems.Error(entry.Value.At, $"'{entry.Key}': {problem}", advice.Length == 0 ? null : advice);
    }
}
