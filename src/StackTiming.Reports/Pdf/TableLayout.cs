using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;

namespace StackTiming.Reports.Pdf;

/// <summary>Lays out a table: widths from the cells, wrapped text, a head that is repeated on every page.</summary>
internal static class TableLayout
{
    private const float Gutter = 9;
    private const float PaddingAbove = 2.0f;
    private const float PaddingBelow = 2.2f;
    private const int CellCharacters = 320;
    private const int CellLines = 6;

    // Rows that are measured for the widths; the others are wrapped into what results.
    private const int MeasuredRows = 400;

    /// <summary>The pieces of the table.</summary>
    /// <param name="table">The table.</param>
    /// <param name="width">Width, points.</param>
    public static IEnumerable<Chunk> Lay(Table table, float width)
    {
        var widths = Widths(table, width);
        var total = widths.Sum() + Gutter * (widths.Length - 1);
        var head = Head(table, widths, total);
        yield return head with { SpaceBefore = 6, KeepWithNext = true };
        for (var r = 0; r < table.Rows.Length; r++)
        {
            // The first two rows stay with the head, and the last one with the row before it.
            yield return LayRow(table, table.Rows[r], widths, total) with
            {
                HeadOnNewPage = head,
                KeepWithNext = (r == 0 && table.Rows.Length > 1) || r == table.Rows.Length - 2 || (r == table.Rows.Length - 1 && table.Foot is { Runs.IsEmpty: false }),
                Anchor = table.Rows[r].Anchor,
            };
        }
        if (table.Foot is { Runs.IsEmpty: false } foot)
        {
            var lines = LineBreaker.Break(foot, TextStyle.Small, width);
            yield return new Chunk(lines.Count * TextStyle.Small.LineHeight + 2, (ink, x, y) => ink.Lines(lines, x, y + 2, TextStyle.Small));
        }
        yield return new Chunk(5, (_, _, _) => { });
    }

    private static Chunk Head(Table table, float[] widths, float total)
    {
        var style = TextStyle.Label;
        var cells = table.Columns.Select((c, i) => LineBreaker.Break(c.Heading, style, widths[i])).ToArray();
        var height = cells.Max(c => c.Count) * style.LineHeight + PaddingAbove + PaddingBelow;
        return new Chunk(height, (ink, x, y) =>
        {
            var left = x;
            for (var i = 0; i < cells.Length; i++)
            {
                var top = y + height - PaddingBelow - cells[i].Count * style.LineHeight;
                DrawLines(ink, cells[i], table.Columns[i].Alignment, left, widths[i], top, style);
                left += widths[i] + Gutter;
            }
            ink.Rule(x, x + total, y + height - 0.4f, Palette.Rule, 0.8f);
        });
    }

    private static Chunk LayRow(Table table, Row row, float[] widths, float total)
    {
        var style = TextStyle.Cell;
        var cells = new List<TextLine>?[row.Cells.Length];
        var lineCount = 1;
        for (var i = 0; i < cells.Length; i++)
        {
            if (row.Cells[i] is not TextCell text)
                continue;
            cells[i] = LineBreaker.Break(text.Text, style, widths[i], CellCharacters, CellLines);
            lineCount = Math.Max(lineCount, cells[i]!.Count);
        }
        var height = lineCount * style.LineHeight + PaddingAbove + PaddingBelow;
        return new Chunk(height, (ink, x, y) =>
        {
            var left = x;
            var top = y + PaddingAbove;
            for (var i = 0; i < cells.Length; i++)
            {
                switch (row.Cells[i])
                {
                    case StatusCell status:
                        StatusWord.Draw(ink.Canvas, status.Status, left, Ink.Baseline(top, style));
                        break;
                    case MarginCell { RelativeMargin: { } margin }:
                        MarginBar.Draw(ink.Canvas, margin, left, Ink.Baseline(top, style));
                        break;
                    default:
                        if (cells[i] is { } lines)
                            DrawLines(ink, lines, table.Columns[i].Alignment, left, widths[i], top, style);
                        break;
                }
                left += widths[i] + Gutter;
            }
            ink.Rule(x, x + total, y + height - 0.2f, Palette.Hairline, 0.4f);
        });
    }

    private static void DrawLines(Ink ink, List<TextLine> lines, Alignment alignment, float left, float width, float top, TextStyle style)
    {
        for (var i = 0; i < lines.Count; i++)
        {
            var x = alignment == Alignment.Right ? left + width - lines[i].Width : left;
            ink.Line(lines[i], x, Ink.Baseline(top + i * style.LineHeight, style));
        }
    }

    private static float[] Widths(Table table, float width)
    {
        var count = table.Columns.Length;
        var available = width - Gutter * (count - 1);
        var natural = new float[count];
        var least = new float[count];
        for (var i = 0; i < count; i++)
        {
            natural[i] = LineBreaker.NaturalWidth(table.Columns[i].Heading, TextStyle.Label, CellCharacters);
            least[i] = LineBreaker.WidestWord(table.Columns[i].Heading, TextStyle.Label, CellCharacters);
            var whole = 0f;
            foreach (var row in table.Rows.AsSpan(0, Math.Min(table.Rows.Length, MeasuredRows)))
            {
                var (cellNatural, cellLeast) = Measure(row.Cells[i], available / count);
                whole = MathF.Max(whole, cellNatural);
                least[i] = MathF.Max(least[i], cellLeast);
            }
            natural[i] = MathF.Max(natural[i], whole);
            if (!table.Columns[i].Wraps && whole <= available * 0.6f)
                least[i] = MathF.Max(least[i], whole);
        }

        var naturalSum = natural.Sum();
        if (naturalSum <= available)
            return Grown(table, natural, available - naturalSum);
        var leastSum = least.Sum();
        if (leastSum > available)
            return [.. least.Select(w => w * available / leastSum)];
        var wish = naturalSum - leastSum;
        return [.. least.Select((w, i) => w + (available - leastSum) * (natural[i] - w) / wish)];
    }

    private static float[] Grown(Table table, float[] natural, float spare)
    {
        var growing = table.Columns.Count(c => c.Grows);
        return growing == 0 ? natural : [.. natural.Select((w, i) => table.Columns[i].Grows ? w + spare / growing : w)];
    }

    // A single endless word must not push the other columns off the page: no more than the even share is asked for it.
    private static (float Natural, float Least) Measure(Cell cell, float evenShare) => cell switch
    {
        StatusCell => (StatusWord.Width, StatusWord.Width),
        MarginCell => (MarginBar.Width, MarginBar.Width),
        // Half a point keeps rounding from breaking what just fits.
        TextCell text => (LineBreaker.NaturalWidth(text.Text, TextStyle.Cell, CellCharacters) + 0.5f,
            MathF.Min(LineBreaker.WidestWord(text.Text, TextStyle.Cell, CellCharacters) + 0.5f, evenShare)),
        _ => (0, 0),
    };
}
