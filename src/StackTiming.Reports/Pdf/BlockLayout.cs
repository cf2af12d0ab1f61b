using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;

namespace StackTiming.Reports.Pdf;

/// <summary>Turns the blocks of a document into pieces that can be placed on pages.</summary>
/// <param name="contents">The headings for a table of contents.</param>
internal sealed class BlockLayout(IReadOnlyList<NumberedHeading> contents)
{
    /// <summary>The pieces of a block.</summary>
    /// <param name="block">The block.</param>
    /// <param name="width">Width, points.</param>
    public IEnumerable<Chunk> Lay(Block block, float width) => block switch
    {
        Paragraph paragraph => LayParagraph(paragraph.Text, width),
        Bullets bullets => bullets.Items.SelectMany(item => LayBullet(item, width)),
        Note note => [LayNote(note, width)],
        PageBreak => [new Chunk(0, (_, _, _) => { }) { BeginsPage = true }],
        Contents list => LayContents(list, width),
        SideBySide pair => [LaySideBySide(pair, width)],
        Caption caption => [LayCaption(caption, width)],
        KeyValues facts => LayKeyValues(facts, width),
        Table table => TableLayout.Lay(table, width),
        Figure figure => LayFigure(figure, width),
        Entry entry => EntryLayout.Lay(entry, width),
        TitleBlock title => [TitlePageLayout.Lay(title, width)],
        VerdictPanel verdict => [TitlePageLayout.Lay(verdict, width)],
        SignOff signOff => [TitlePageLayout.Lay(signOff, width)],
        _ => throw new ArgumentException($"no layout for {block.GetType().Name}", nameof(block)),
    };

    /// <summary>The pieces of a paragraph: its lines, of which neither the first nor the last stands alone.</summary>
    /// <param name="text">The text.</param>
    /// <param name="width">Width, points.</param>
    private static IEnumerable<Chunk> LayParagraph(RichText text, float width)
    {
        var style = TextStyle.Body;
        var lines = LineBreaker.Break(text, style, width);
        for (var i = 0; i < lines.Count; i++)
        {
            var line = lines[i];
            yield return new Chunk(style.LineHeight, (ink, x, y) => ink.Line(line, x, Ink.Baseline(y, style)))
            {
                SpaceBefore = i == 0 ? 4 : 0,
                KeepWithNext = (i == 0 && lines.Count > 1) || i == lines.Count - 2,
            };
        }
    }

    private static IEnumerable<Chunk> LayBullet(RichText text, float width)
    {
        const float indent = 12;
        var style = TextStyle.Body;
        var lines = LineBreaker.Break(text, style, width - indent);
        for (var i = 0; i < lines.Count; i++)
        {
            var line = lines[i];
            var first = i == 0;
            yield return new Chunk(style.LineHeight, (ink, x, y) =>
            {
                if (first)
                    ink.Text("–", style with { Color = Palette.Accent }, x, Ink.Baseline(y, style));
                ink.Line(line, x + indent, Ink.Baseline(y, style));
            })
            {
                SpaceBefore = first ? 3 : 0,
                KeepWithNext = first && lines.Count > 1,
            };
        }
    }

    private static Chunk LayNote(Note note, float width)
    {
        const float padding = 8;
        var style = TextStyle.Small with { Color = Palette.Ink };
        var inner = width - 2 * padding;
        var paragraphs = note.Items.Select(i => LineBreaker.Break(i, style, inner)).ToList();
        var headHeight = note.Heading.Length > 0 ? 12.5f : 0;
        var height = 2 * padding - 2 + headHeight + paragraphs.Sum(p => p.Count * style.LineHeight + 2);
        return new Chunk(height, (ink, x, y) =>
        {
            ink.Fill(SKRect.Create(x, y, width, height), Palette.Wash);
            ink.Fill(SKRect.Create(x, y, 1.6f, height), Palette.Accent);
            var top = y + padding - 1;
            if (note.Heading.Length > 0)
                ink.Text(note.Heading, TextStyle.Label with { Color = Palette.Ink, Size = 8 }, x + padding, Ink.Baseline(top - 1, TextStyle.Label));
            top += headHeight;
            foreach (var lines in paragraphs)
            {
                ink.Lines(lines, x + padding, top, style);
                top += lines.Count * style.LineHeight + 2;
            }
        })
        { SpaceBefore = 8 };
    }

    private IEnumerable<Chunk> LayContents(Contents list, float width)
    {
        foreach (var heading in contents)
        {
            if (heading.Level > list.Depth || heading.Section.Numbering == Numbering.None || !heading.Section.InContents)
                continue;
            var style = heading.Level == 1 ? TextStyle.Body with { Face = TextStyle.Heading(1).Face } : TextStyle.Body;
            var indent = (heading.Level - 1) * 22f;
            var text = LineBreaker.Break(heading.Section.Heading, style, width - indent - 70, 200, 1);
            yield return new Chunk(style.LineHeight + 1, (ink, x, y) =>
            {
                var baseline = Ink.Baseline(y, style);
                ink.Text(heading.Number, style with { Color = Palette.Quiet }, x + indent, baseline);
                var left = x + indent + (heading.Number.Length > 3 ? 62 : 22);
                foreach (var line in text)
                    ink.Line(line, left, baseline);
                if (ink.PageOf(heading.Section.Anchor) is { } page)
                    ink.TextEndingAt(page.ToString(System.Globalization.CultureInfo.InvariantCulture), style, x + width, baseline);
                ink.Rule(x + indent, x + width, y + style.LineHeight + 0.6f, Palette.Hairline, 0.4f);
                ink.Link(heading.Section.Anchor, new SKRect(x, y, x + width, y + style.LineHeight));
            })
            { SpaceBefore = heading.Level == 1 ? 2 : 0 };
        }
    }

    private Chunk LaySideBySide(SideBySide pair, float width)
    {
        const float gutter = 22;
        var leftWidth = (width - gutter) * (float)pair.LeftShare;
        var left = pair.Left.SelectMany(b => Lay(b, leftWidth)).ToList();
        var right = pair.Right.SelectMany(b => Lay(b, width - gutter - leftWidth)).ToList();
        return new Chunk(MathF.Max(HeightOf(left), HeightOf(right)), (ink, x, y) =>
        {
            DrawColumn(ink, left, x, y);
            DrawColumn(ink, right, x + leftWidth + gutter, y);
        })
        { SpaceBefore = 6 };
    }

    private static float HeightOf(List<Chunk> chunks) => chunks.Select((c, i) => c.Height + (i == 0 ? 0 : c.SpaceBefore)).Sum();

    private static void DrawColumn(Ink ink, List<Chunk> chunks, float x, float y)
    {
        for (var i = 0; i < chunks.Count; i++)
        {
            y += i == 0 ? 0 : chunks[i].SpaceBefore;
            chunks[i].Draw(ink, x, y);
            y += chunks[i].Height;
        }
    }

    private static Chunk LayCaption(Caption caption, float width)
    {
        var style = TextStyle.Heading(3);
        var lines = LineBreaker.Break(caption.Text, style, width, 300, 2);
        return new Chunk(lines.Count * style.LineHeight, (ink, x, y) => ink.Lines(lines, x, y, style))
        {
            SpaceBefore = 10,
            KeepWithNext = true,
            Anchor = caption.Anchor,
        };
    }

    private static IEnumerable<Chunk> LayKeyValues(KeyValues facts, float width)
    {
        var style = TextStyle.Cell;
        var keyWidth = MathF.Min(width * 0.4f, facts.Items.Select(i => TextStyle.Label.Face.Width(i.Key, TextStyle.Label.Size)).DefaultIfEmpty(0).Max() + 10);
        foreach (var (key, value) in facts.Items)
        {
            var keyLines = LineBreaker.Break(key, TextStyle.Label, keyWidth);
            var lines = LineBreaker.Break(value, style, width - keyWidth, 400, 8);
            var height = Math.Max(keyLines.Count, lines.Count) * style.LineHeight + 2.6f;
            yield return new Chunk(height, (ink, x, y) =>
            {
                ink.Lines(keyLines, x, y + 1.2f, style with { Size = style.Size });
                ink.Lines(lines, x + keyWidth, y + 1.2f, style);
                ink.Rule(x, x + width, y + height - 0.2f, Palette.Hairline, 0.4f);
            })
            { KeepWithNext = true };
        }
    }

    private static IEnumerable<Chunk> LayFigure(Figure figure, float width)
    {
        var height = figure.Drawing.HeightFor(width);
        var style = TextStyle.Small;
        var lines = LineBreaker.Break(figure.Caption, style, width, 600, 4);
        yield return new Chunk(height, (ink, x, y) =>
        {
            var canvas = ink.Canvas;
            canvas.Save();
            canvas.Translate(x, y);
            figure.Drawing.Draw(canvas, width, height);
            canvas.Restore();
        })
        { SpaceBefore = 8, KeepWithNext = true, Anchor = figure.Anchor };
        yield return new Chunk(lines.Count * style.LineHeight + 7, (ink, x, y) => ink.Lines(lines, x, y + 3, style));
    }
}
