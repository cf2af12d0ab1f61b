using System.Collections.Immutable;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Lengths;

/// <summary>The header that a foreign length report gives to a column.</summary>
/// <param name="At">Where the board file says so.</param>
/// <param name="Header">The header's text, with or without its unit.</param>
/// <param name="UnitMetres">The unit of the column in metres, where the header does not say it itself; otherwise null.</param>
public sealed record ForeignHeader(FilePosition At, string Header, double? UnitMetres);

/// <summary>How a length list is written, where it differs from this project's own form.</summary>
/// <param name="Columns">Foreign headers by column. With any of them, headers that are not asked for are passed over.</param>
/// <param name="Defaults">Metres for number columns whose cells are empty or that the file lacks.</param>
/// <param name="DefaultLayer">Layer for rows that state none, or null.</param>
/// <param name="LayerNames">Layer names of the report to those of the stack-up.</param>
/// <param name="SkipLines">Lines before the header.</param>
/// <param name="Separator">The character between cells, or null to find it from the header.</param>
/// <param name="DecimalComma">True where numbers are written <c>12,5</c>.</param>
/// <param name="PinSeparator">The character between part and pin, <c>.</c> in this project's own form.</param>
/// <param name="Units">Units for columns whose header states none.</param>
public sealed record LengthListFormat(
    ImmutableDictionary<LengthColumn, ForeignHeader> Columns,
    ImmutableDictionary<LengthColumn, double> Defaults,
    string? DefaultLayer,
    ImmutableDictionary<string, string> LayerNames,
    int SkipLines,
    char? Separator,
    bool DecimalComma,
    char PinSeparator,
    DefaultUnits Units)
{
    /// <summary>This project's own form.</summary>
    public static LengthListFormat Own { get; } = new(
        ImmutableDictionary<LengthColumn, ForeignHeader>.Empty,
        ImmutableDictionary<LengthColumn, double>.Empty,
        null,
        ImmutableDictionary<string, string>.Empty,
        0,
        null,
        false,
        '.',
        DefaultUnits.None);
}
