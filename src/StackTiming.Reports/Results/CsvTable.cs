using System.Globalization;
using System.Text;

namespace StackTiming.Reports.Results;

/// <summary>
/// Writes a table as CSV after RFC 4180: UTF-8 without a byte order mark, CR LF line ends, quotes where a cell needs them. A cell that a
/// spreadsheet would run as a formula (it begins with <c>=</c>, <c>+</c>, <c>-</c>, <c>@</c>, a tab or a carriage return, and is no number) is preceded by an apostrophe.
/// </summary>
public static class CsvTable
{
    /// <summary>Writes the table.</summary>
    /// <param name="header">Names of the columns, with units in brackets.</param>
    /// <param name="rows">The rows.</param>
    /// <param name="output">Where to.</param>
    public static void Write(IReadOnlyList<string> header, IEnumerable<IReadOnlyList<string>> rows, Stream output)
    {
        using var writer = new StreamWriter(output, new UTF8Encoding(false), 1 << 14, leaveOpen: true) { NewLine = "\r\n" };
        WriteRow(writer, header);
        foreach (var row in rows)
            WriteRow(writer, row);
    }

    private static void WriteRow(StreamWriter writer, IReadOnlyList<string> cells)
    {
        for (var i = 0; i < cells.Count; i++)
        {
            if (i > 0)
                writer.Write(',');
            WriteCell(writer, cells[i]);
        }
        writer.WriteLine();
    }

    private static void WriteCell(StreamWriter writer, string cell)
    {
        var text = IsFormula(cell) ? "'" + cell : cell;
        if (text.AsSpan().IndexOfAny(",\"\r\n") < 0 && !text.StartsWith(' ') && !text.EndsWith(' '))
        {
            writer.Write(text);
            return;
        }
        writer.Write('"');
        writer.Write(text.Replace("\"", "\"\"", StringComparison.Ordinal));
        writer.Write('"');
    }

    private static bool IsFormula(string cell) =>
        cell.Length > 0 && cell[0] is '=' or '+' or '-' or '@' or '\t' or '\r'
        && !double.TryParse(cell, NumberStyles.Float, CultureInfo.InvariantCulture, out _);
}
