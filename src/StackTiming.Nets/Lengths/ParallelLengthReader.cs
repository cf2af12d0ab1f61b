using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Lengths;

/// <summary>
/// Reads the pieces of a large length list at the same time. Only lists that are in order are read so: whatever there is to report, the
/// usual reader finds it in file order, and reports once what is to be reported once.
/// </summary>
internal static class ParallelLengthReader
{
    private const int SmallestPiece = 256 * 1024;

    /// <summary>Reads a list if it is large, has no quotes, and nothing is wrong with it.</summary>
    /// <param name="file">The file.</param>
    /// <param name="start">Where its header or the blank lines before it begin.</param>
    /// <param name="separator">The character between cells.</param>
    /// <param name="format">How it is written.</param>
    /// <param name="stackUp">The stack-up that the layers belong to, or null.</param>
    /// <param name="builder">Where the rows go.</param>
    /// <param name="fileIndex">The file's index in the list.</param>
    /// <returns>False where nothing was added, and the usual reader has to read the file.</returns>
    public static bool TryRead(
        InputFile file, int start, char separator, LengthListFormat format, StackUp? stackUp, LengthListBuilder builder, short fileIndex)
    {
        var text = file.Text;
        var pieces = Math.Min(Environment.ProcessorCount, (text.Length - start) / SmallestPiece);
        if (pieces < 2 || text.AsSpan(start).Contains('"'))
            return false;
        var headerStart = text.Length - text.AsSpan(start).TrimStart().Length;
        // A separator at the start of the header may be white space itself.
        headerStart = text.AsSpan(0, headerStart).LastIndexOfAny('\r', '\n') + 1;
        var headerEnd = text.IndexOf('\n', headerStart) + 1;
        if (headerEnd == 0 || ReadHeader(file, headerStart, headerEnd, separator, format) is not { } header)
            return false;
        var bounds = new int[pieces + 1];
        (bounds[0], bounds[pieces]) = (headerEnd, text.Length);
        for (var i = 1; i < pieces; i++)
        {
            var middle = headerEnd + (int)((long)(text.Length - headerEnd) * i / pieces);
            bounds[i] = text.IndexOf('\n', middle) is >= 0 and var end ? end + 1 : text.Length;
        }
        var parts = new LengthListBuilder?[pieces];
        Parallel.For(0, pieces, i => parts[i] = ReadPiece(file, bounds[i], bounds[i + 1], separator, header.Row, header.At, format, stackUp, fileIndex));
        if (Array.Exists(parts, p => p is null) || parts.Sum(p => p!.RowCount) == 0)
            return false;
        foreach (var part in parts)
            builder.Append(part!);
        return true;
    }

    private static (HeaderRow Row, FilePosition At)? ReadHeader(InputFile file, int start, int end, char separator, LengthListFormat format)
    {
        var problems = new ProblemList();
        using var reader = LengthListReader.RowsOf(file.Text.AsMemory(start, end - start), separator);
        foreach (var row in reader)
        {
            var at = new FilePosition(file.Path, 1 + file.Text.AsSpan(0, start).Count('\n'), 0);
            var header = HeaderRow.Read(LengthListReader.HeaderCells(row, at), format, at, problems);
            return problems.Items.Count == 0 ? (header, at) : null;
        }
        return null;
    }

    private static LengthListBuilder? ReadPiece(
        InputFile file, int start, int end, char separator, HeaderRow header, FilePosition headerAt, LengthListFormat format, StackUp? stackUp, short fileIndex)
    {
        var text = file.Text.AsMemory(start, end - start);
        var problems = new ProblemList();
        var builder = new LengthListBuilder(LengthListReader.ExpectedRows(text.Span));
        var rows = new LengthRows(header, headerAt, format, builder, fileIndex, new LayerCells(stackUp, format, problems), problems);
        var linesBefore = file.Text.AsSpan(0, start).Count('\n');
        var first = true;
        try
        {
            using var reader = LengthListReader.RowsOf(text, separator);
            foreach (var row in reader)
            {
                var line = linesBefore + (first ? 1 : row.LineNumberFrom);
                first = false;
                if (row.ColCount > 1 || !row.Span.IsWhiteSpace())
                    rows.Add(row, line);
                if (problems.Items.Count > 0)
                    return null;
            }
        }
        catch (NotSupportedException)
        {
            return null;
        }
        return builder;
    }
}
