using System.Collections.Immutable;
using StackTiming.Stackups.Reading;

namespace StackTiming.Stackups.Quantities;

/// <summary>Reads <c>units: { length: um, time: ps }</c>.</summary>
public static class DefaultUnitsReader
{
    private static readonly (string Key, Dimension Dimension)[] Keys =
    [
        ("length", Dimension.Length), ("time", Dimension.Time), ("frequency", Dimension.Frequency), ("voltage", Dimension.Voltage),
        ("current", Dimension.Current), ("resistance", Dimension.Resistance), ("capacitance", Dimension.Capacitance), ("inductance", Dimension.Inductance),
    ];

    /// <summary>The default units of a file, or none where it declares none.</summary>
    /// <param name="file">The file's outermost mapping.</param>
    public static DefaultUnits Read(MapReader file)
    {
        if (file.Map("units") is not { } map)
            return DefaultUnits.None;
        var factors = ImmutableDictionary.CreateBuilder<Dimension, double>();
        foreach (var (key, dimension) in Keys)
        {
            if (map.Text(key) is not { } name)
                continue;
            if (Unit.TryParse(name, out var unit) && unit.Dimension == dimension)
            {
                factors[dimension] = unit.Factor;
                continue;
            }
            file.Problems.Error(map.PositionOf(key), $"'{Suggestion.Shorten(name)}' is not a unit of {key}",
                UnitSpelling.WithOtherCapitals(name, dimension) is { } meant ? $"did you mean '{meant}'?" : "it can be " + string.Join(", ", DimensionWords.Units(dimension)));
            // Nothing comes of this file; the usual unit keeps its bare numbers from being reported one by one.
            if (Unit.TryParse(DimensionWords.Units(dimension)[0], out var usual))
                factors[dimension] = usual.Factor;
        }
        map.Finish();
        return new DefaultUnits(factors.ToImmutable());
    }
}
