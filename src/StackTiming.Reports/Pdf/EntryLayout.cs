using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;

namespace StackTiming.Reports.Pdf;

/// <summary>Lays out a finding: its status and subject, its figures at the right, then explanation and fix.</summary>
internal static class EntryLayout
{
    private const float Indent = StatusWord.Width + 10;

    /// <summary>The pieces of the entry: one, kept together.</summary>
    /// <param name="entry">The entry.</param>
    /// <param name="width">Width, points.</param>
    public static IEnumerable<Chunk> Lay(Entry entry, float width)
    {
        var titleStyle = TextStyle.Body with { Face = TextStyle.Heading(1).Face };
        var detailStyle = TextStyle.Cell;
        var inner = width - Indent;
        var title = LineBreaker.Break(entry.Title, titleStyle, inner, 400, 3);
        var explanation = LineBreaker.Break(entry.Explanation, TextStyle.Body, inner, 2000, 14);
        var nameWidth = entry.Details.Select(d => TextStyle.Label.Face.Width(d.Name, TextStyle.Label.Size)).DefaultIfEmpty(0).Max() + 8;
        var details = entry.Details.Select(d => (d.Name, Lines: LineBreaker.Break(d.Text, detailStyle, inner - nameWidth, 1200, 8))).ToList();
        var figures = entry.Figures.Length > 0 ? LineBreaker.Break(FiguresLine(entry), detailStyle, inner - MarginBar.Width - 8, 200, 2) : [];

        var height = 5 + title.Count * titleStyle.LineHeight
            + figures.Count * detailStyle.LineHeight + (figures.Count > 0 ? 2 : 0)
            + explanation.Count * TextStyle.Body.LineHeight
            + details.Sum(d => d.Lines.Count * detailStyle.LineHeight + 1) + 5;
        yield return new Chunk(height, (ink, x, y) =>
        {
            ink.Rule(x, x + width, y, Palette.Hairline, 0.5f);
            var top = y + 5;
            StatusWord.Draw(ink.Canvas, entry.Status, x, Ink.Baseline(top, titleStyle));
            ink.Lines(title, x + Indent, top, titleStyle);
            top += title.Count * titleStyle.LineHeight;
            if (figures.Count > 0)
            {
                ink.Lines(figures, x + Indent, top, detailStyle);
                if (entry.RelativeMargin is { } margin)
                    MarginBar.Draw(ink.Canvas, margin, x + width - MarginBar.Width, Ink.Baseline(top, detailStyle));
                top += figures.Count * detailStyle.LineHeight + 2;
            }
            ink.Lines(explanation, x + Indent, top, TextStyle.Body);
            top += explanation.Count * TextStyle.Body.LineHeight;
            foreach (var (name, lines) in details)
            {
                ink.Text(name, TextStyle.Label, x + Indent, Ink.Baseline(top + 1, detailStyle));
                ink.Lines(lines, x + Indent + nameWidth, top + 1, detailStyle);
                top += lines.Count * detailStyle.LineHeight + 1;
            }
        })
        { Anchor = entry.Anchor };
    }

    private static RichText FiguresLine(Entry entry)
    {
        var runs = new List<Run>();
        foreach (var (name, figure) in entry.Figures)
        {
            if (runs.Count > 0)
                runs.Add(new Run("    "));
            runs.Add(new Run(name + " ", Emphasis.Quiet));
            runs.Add(new Run(figure, Emphasis.Strong));
        }
        return new RichText([.. runs]);
    }
}
