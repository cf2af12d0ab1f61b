using System.Collections.Immutable;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Lengths;

/// <summary>
/// Reads how a foreign length report is written from the keys <c>columns</c>, <c>defaults</c>, <c>layers</c>, <c>skip-lines</c>,
/// <c>separator</c>, <c>decimal</c> and <c>pin-separator</c> of a mapping; the caller reads the mapping's other keys and finishes it.
/// </summary>
public static class LengthListFormatReader
{
    private static readonly Dictionary<string, char> Separators = new(StringComparer.Ordinal)
    {
        [","] = ',',
        [";"] = ';',
        ["tab"] = '\t',
        ["\t"] = '\t',
        ["|"] = '|',
        ["comma"] = ',',
        ["semicolon"] = ';',
    };

    private static readonly Dictionary<string, bool> Decimals = new(StringComparer.Ordinal) { ["point"] = false, ["comma"] = true };

    private static readonly Dictionary<string, char> PinSeparators = new(StringComparer.Ordinal)
    {
        ["."] = '.',
        ["-"] = '-',
        [":"] = ':',
        ["_"] = '_',
        ["/"] = '/',
    };

    /// <summary>Reads the keys.</summary>
    /// <param name="map">The mapping of the board file, or of one entry of its <c>lengths</c>.</param>
    public static LengthListFormat Read(MapReader map)
    {
        var columns = ImmutableDictionary.CreateBuilder<LengthColumn, ForeignHeader>();
        foreach (var entry in map.Named("columns"))
        {
            if (ColumnOf(entry, map.Problems) is { } column && ReadHeader(entry, column, map) is { } header)
                columns[column] = header;
        }
        var defaults = ImmutableDictionary.CreateBuilder<LengthColumn, double>();
        string? layer = null;
        foreach (var entry in map.Named("defaults"))
        {
            if (ColumnOf(entry, map.Problems) is not { } column)
                continue;
            if (column == LengthColumn.Layer)
                layer = map.TextOf(entry.Value, entry.Key);
            else if (!LengthColumns.IsLength(column) || column == LengthColumn.Length)
                map.Problems.Error(entry.KeyAt, $"'{entry.Key}' cannot have a default", "every row states it");
            else if (map.QuantityOf(entry.Value, entry.Key, Dimension.Length, QuantityRange.Positive) is { } value)
                defaults[column] = value.Value;
        }
        var layers = ImmutableDictionary.CreateBuilder<string, string>(StringComparer.Ordinal);
        foreach (var entry in map.Named("layers"))
        {
            if (map.TextOf(entry.Value, entry.Key) is { } name)
                layers[entry.Key] = name;
        }
        return new LengthListFormat(
            columns.ToImmutable(),
            defaults.ToImmutable(),
            layer,
            layers.ToImmutable(),
            ReadSkipLines(map),
            map.Choice("separator", Separators),
            map.Choice("decimal", Decimals) ?? false,
            map.Choice("pin-separator", PinSeparators) ?? NetEnd.PinSeparator,
            map.Units);
    }

    private static LengthColumn? ColumnOf(DataEntry entry, ProblemList problems)
    {
        var column = LengthColumns.Find(entry.Key);
        if (column is null)
            problems.Error(entry.KeyAt, $"unknown column '{Suggestion.Shorten(entry.Key)}'", Suggestion.For(entry.Key, LengthColumns.Names));
        return column;
    }

    private static ForeignHeader? ReadHeader(DataEntry entry, LengthColumn column, MapReader map)
    {
        if (entry.Value is DataScalar scalar)
            return new ForeignHeader(scalar.At, scalar.Text, null);
        if (map.MapOf(entry.Value, entry.Key) is not { } inner)
            return null;
        var header = inner.NeedText("header", "header: Routed");
        var unitText = inner.Text("unit");
        var unit = unitText is null ? null : LengthUnit.FactorOf(unitText);
        if (unitText is not null && unit is null)
            map.Problems.Error(inner.PositionOf("unit"), $"'{Suggestion.Shorten(unitText)}' is not a unit of length", $"units are {LengthUnit.Accepted}");
        else if (unit is not null && !LengthColumns.IsLength(column))
            map.Problems.Error(inner.PositionOf("unit"), $"'{entry.Key}' has no unit", "remove 'unit'");
        inner.Finish();
        return header is null ? null : new ForeignHeader(inner.PositionOf("header"), header, unit);
    }

    private static int ReadSkipLines(MapReader map)
    {
        if (map.Text("skip-lines") is not { } text)
            return 0;
        if (int.TryParse(text, System.Globalization.NumberStyles.None, System.Globalization.CultureInfo.InvariantCulture, out var lines) && lines <= 1000)
            return lines;
        map.Problems.Error(map.PositionOf("skip-lines"), $"'skip-lines' cannot be '{Suggestion.Shorten(text)}'", "write the number of lines before the header, 0 to 1000");
        return 0;
    }
}
