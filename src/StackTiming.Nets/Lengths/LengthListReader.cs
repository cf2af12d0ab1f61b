using nietras.SeparatedValues;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Lengths;

/// <summary>Reads length lists (<c>*.lengths.csv</c> and foreign reports).</summary>
public static class LengthListReader
{
    /// <summary>Reads the length lists of a board into one; nets may have rows in several files.</summary>
    /// <param name="sources">The files, and how each is written.</param>
    /// <param name="stackUp">The stack-up that the layers belong to, or null to accept every layer name.</param>
    /// <param name="problems">Where problems go.</param>
    /// <returns>The list, or null where a file has errors.</returns>
    public static LengthList? Read(IReadOnlyList<(InputFile File, LengthListFormat Format)> sources, StackUp? stackUp, ProblemList problems)
    {
        var before = problems.ErrorCount;
        var builder = new LengthListBuilder(sources.Sum(s => ExpectedRows(s.File.Text)));
        foreach (var (file, format) in sources)
            ReadFile(file, format, stackUp, builder, problems);
        return problems.ErrorCount == before ? builder.Build() : null;
    }

    /// <summary>Reads one length list.</summary>
    /// <param name="file">The file.</param>
    /// <param name="format">How it is written.</param>
    /// <param name="stackUp">The stack-up that the layers belong to, or null to accept every layer name.</param>
    /// <param name="problems">Where problems go.</param>
    /// <returns>The list, or null where the file has errors.</returns>
    public static LengthList? Read(InputFile file, LengthListFormat format, StackUp? stackUp, ProblemList problems) =>
        Read([(file, format)], stackUp, problems);

    private static void ReadFile(InputFile file, LengthListFormat format, StackUp? stackUp, LengthListBuilder builder, ProblemList problems)
    {
        const string example = "write a header such as net,from,to,kind,layer,length[mm],width[mm], then one row per segment";
        var start = StartOf(file.Text, format.SkipLines);
        if (file.Text.AsSpan(start).IsWhiteSpace())
        {
            problems.Error(FilePosition.WholeFile(file.Path), format.SkipLines > 0 ? "nothing follows the skipped lines" : "the file is empty", example);
            return;
        }
        var separator = format.Separator ?? SeparatorOf(file.Text.AsSpan(start));
        var fileIndex = builder.AddFile(file.Path);
        if (ParallelLengthReader.TryRead(file, start, separator, format, stackUp, builder, fileIndex))
            return;
        try
        {
            using var reader = RowsOf(file.Text.AsMemory(start), separator);
            ReadRows(reader, file, format, new LayerCells(stackUp, format, problems), builder, fileIndex, problems);
        }
        catch (NotSupportedException)
        {
            // The library holds a row of at most 16 million characters.
            problems.Error(FilePosition.WholeFile(file.Path), "a row is longer than any length list's", "look for a quote that is never closed");
        }
    }

    /// <summary>The rows of a text. The library numbers the first of them wrongly, as if a header stood before it.</summary>
    internal static SepReader RowsOf(ReadOnlyMemory<char> text, char separator) => Sep.New(separator)
        .Reader(o => o with { HasHeader = false, DisableColCountCheck = true, DisableFastFloat = true })
        .From(new MemoryTextReader(text));

    private static void ReadRows(
        SepReader reader, InputFile file, LengthListFormat format, LayerCells layers, LengthListBuilder builder, short fileIndex, ProblemList problems)
    {
        LengthRows? rows = null;
        var count = 0;
        var firstLine = 1;
        foreach (var row in reader)
        {
            var line = (firstLine > 0 ? firstLine : row.LineNumberFrom) + format.SkipLines;
            firstLine = 0;
            if (row.ColCount <= 1 && row.Span.IsWhiteSpace())
                continue;
            if (rows is null)
            {
                var at = new FilePosition(file.Path, line, 0);
                var cells = HeaderCells(row, at);
                rows = new LengthRows(HeaderRow.Read(cells, format, at, problems), at, format, builder, fileIndex, layers, problems);
                continue;
            }
            rows.Add(row, line);
            count++;
        }
        if (count == 0)
            problems.Error(FilePosition.WholeFile(file.Path), "the file has a header but no rows", "write one row per segment");
    }

    internal static List<(HeaderText Text, FilePosition At)> HeaderCells(SepReader.Row row, FilePosition rowAt)
    {
        var cells = new List<(HeaderText, FilePosition)>(row.ColCount);
        for (var i = 0; i < row.ColCount; i++)
        {
            var span = row[i].Span;
            cells.Add((HeaderText.Parse(CellReader.Unquote(span.Trim()).ToString()), CellReader.PositionIn(row.Span, span, rowAt.File, rowAt.Line)));
        }
        return cells;
    }

    // Lines, but no more than rows of the shortest useful kind would fill: a file of line breaks takes no memory.
    internal static int ExpectedRows(ReadOnlySpan<char> text) => Math.Min(text.Count('\n') + 1, text.Length / 24 + 1);

    private static int StartOf(string text, int skipLines)
    {
        var start = 0;
        for (var i = 0; i < skipLines && start < text.Length; i++)
        {
            var end = text.AsSpan(start).IndexOfAny('\r', '\n');
            if (end < 0)
                return text.Length;
            start += end + 1;
            if (text[start - 1] == '\r' && start < text.Length && text[start] == '\n')
                start++;
        }
        return start;
    }

    // The most frequent of the usual separators outside quotes in the first line that says anything.
    private static char SeparatorOf(ReadOnlySpan<char> text)
    {
        Span<int> counts = stackalloc int[4];
        const string candidates = ",;\t|";
        text = text.TrimStart();
        var quoted = false;
        foreach (var c in text)
        {
            if (c == '"')
                quoted = !quoted;
            else if (c is '\r' or '\n' && !quoted)
                break;
            else if (!quoted && candidates.IndexOf(c, StringComparison.Ordinal) is >= 0 and var i)
                counts[i]++;
        }
        var best = 0;
        for (var i = 1; i < counts.Length; i++)
        {
            if (counts[i] > counts[best])
                best = i;
        }
        return candidates[best];
    }
}
