using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using nietras.SeparatedValues;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Lengths;

/// <summary>Reads single cells: their text without quotes and spaces, their numbers in metres, and their places for messages.</summary>
/// <param name="header">Where the columns stand.</param>
/// <param name="file">Path of the file.</param>
/// <param name="format">How numbers are written.</param>
/// <param name="problems">Where problems go.</param>
internal sealed class CellReader(HeaderRow header, string file, LengthListFormat format, ProblemList problems)
{
    private readonly double[] most = [.. Enumerable.Range(0, LengthColumns.Names.Length).Select(i => LengthColumns.MostMetres((LengthColumn)i))];
    private readonly bool[] unitReported = new bool[LengthColumns.Names.Length];

    /// <summary>Line at which the row that is being read starts, from 1.</summary>
    public int Line { get; set; }

    /// <summary>Where the row starts.</summary>
    private FilePosition RowPosition => new(file, Line, 0);

    /// <summary>Where the cell of a column stands; the row where it has no such cell.</summary>
    public FilePosition PositionOf(SepReader.Row row, LengthColumn column) =>
        header.PlaceOf(column) is >= 0 and var place && place < row.ColCount ? PositionOf(row, row[place].Span) : RowPosition;

    /// <summary>Where a cell stands.</summary>
    public FilePosition PositionOf(SepReader.Row row, ReadOnlySpan<char> cell) => PositionIn(row.Span, cell, file, Line);

    /// <summary>Where a cell stands in a row that may run over several lines.</summary>
    /// <param name="row">Text of the row.</param>
    /// <param name="cell">A part of it.</param>
    /// <param name="file">Path of the file.</param>
    /// <param name="line">Line at which the row starts.</param>
    public static FilePosition PositionIn(ReadOnlySpan<char> row, ReadOnlySpan<char> cell, string file, int line)
    {
        // Not Overlaps: an empty cell overlaps nothing, but it has a place all the same.
        var bytes = Unsafe.ByteOffset(ref MemoryMarshal.GetReference(row), ref MemoryMarshal.GetReference(cell));
        var offset = (int)Math.Clamp(bytes / sizeof(char), 0, row.Length);
        var before = row[..offset];
        var lastBreak = before.LastIndexOf('\n');
        return new FilePosition(file, line + before.Count('\n'), offset - lastBreak);
    }

    /// <summary>The text of a cell without quotes and the spaces around it; empty where the row has no such cell.</summary>
    public ReadOnlySpan<char> TextOf(SepReader.Row row, LengthColumn column)
    {
        var place = header.PlaceOf(column);
        if ((uint)place >= (uint)row.ColCount)
            return default;
        var text = row[place].Span;
        return text.Length > 0 && (text[0] is <= ' ' or '"' || text[^1] <= ' ') ? Unquote(text.Trim()) : text;
    }

    /// <summary>The number of a cell in metres; 0 where the cell is empty, NaN where it is wrong, which is reported.</summary>
    public double MetresOf(SepReader.Row row, LengthColumn column)
    {
        var text = TextOf(row, column);
        if (text.Length == 0)
            return 0;
        var unit = header.UnitMetres(column);
        // False for a unit that is not known, too: NaN compares with nothing.
        if (NumberText.TryParse(text, out var value) && value * unit is > 0 and var metres && metres <= most[(int)column])
            return metres;
        return OddMetresOf(row, column, text);
    }

    /// <summary>Removes the quotes around a cell and halves those inside.</summary>
    /// <param name="text">A cell without spaces around it.</param>
    public static ReadOnlySpan<char> Unquote(ReadOnlySpan<char> text)
    {
        if (text.Length < 2 || text[0] != '"' || text[^1] != '"')
            return text;
        var inner = text[1..^1].Trim();
        return inner.Contains('"') ? inner.ToString().Replace("\"\"", "\"", StringComparison.Ordinal) : inner;
    }

    // Decimal commas, units in the cell, and everything that is wrong.
    private double OddMetresOf(SepReader.Row row, LengthColumn column, ReadOnlySpan<char> text)
    {
        var name = LengthColumns.NameOf(column);
        var at = PositionOf(row, column);
        var shown = Suggestion.Shorten(text.Length > 100 ? text[..100].ToString() : text.ToString());
        var digits = text.LastIndexOfAnyInRange('0', '9') + 1;
        if (text[^1] == '.' && digits == text.Length - 1)
            digits = text.Length;
        var unitText = text[digits..].Trim();
        var unit = header.UnitMetres(column);
        if (digits > 0 && unitText.Length > 0)
        {
            if (LengthUnit.FactorOf(unitText) is not { } own)
            {
                problems.Error(at, $"'{name}' says '{shown}', which is not a length", $"units are {LengthUnit.Accepted}");
                return double.NaN;
            }
            if (!double.IsNaN(unit) && own != unit)
            {
                problems.Error(at, $"'{name}' says '{shown}', another unit than its header", "use the header's unit in every cell, without writing it");
                return double.NaN;
            }
            unit = own;
        }
        if (!TryOddNumber(digits > 0 ? text[..digits] : text, out var value) || !double.IsFinite(value))
        {
            problems.Error(at, $"'{name}' says '{shown}', which is not a number", NumberAdvice(text));
            return double.NaN;
        }
        if (double.IsNaN(unit))
        {
            if (!unitReported[(int)column])
                problems.Error(header.PositionOf(column), $"'{name}' has no unit", $"write {name}[mm] in the header; units are {LengthUnit.Accepted}");
            unitReported[(int)column] = true;
            return double.NaN;
        }
        var metres = value * unit;
        if (metres > 0 && metres <= most[(int)column])
            return metres;
        problems.Error(
            at,
            metres > 0
                ? $"'{name}' says '{shown}': more than {most[(int)column]} m, which no board has"
                : $"'{name}' must be above zero, but it says '{shown}'",
            metres > 0 ? "check the unit in the header" : column == LengthColumn.Length ? "leave the row out if nothing is routed" : "leave the cell empty");
        return double.NaN;
    }

    private bool TryOddNumber(ReadOnlySpan<char> text, out double value)
    {
        text = text.TrimEnd();
        if (!format.DecimalComma || text.Contains('.') || text.Count(',') > 1 || text.Length > 64)
            return NumberText.TryParse(text, out value);
        Span<char> copy = stackalloc char[64];
        text.Replace(copy, ',', '.');
        return NumberText.TryParse(copy[..text.Length], out value);
    }

    private static string NumberAdvice(ReadOnlySpan<char> text) => text.Contains(',')
        ? "write a decimal point and no thousands separator, or 'decimal: comma' in the board file"
        : "write a number such as 12.5";
}
