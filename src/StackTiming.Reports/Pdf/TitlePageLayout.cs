using System.Globalization;
using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Fonts;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Pdf;

/// <summary>Lays out what stands only on the first page: the title, the verdict, the lines to sign on.</summary>
internal static class TitlePageLayout
{
    /// <summary>The title block.</summary>
    /// <param name="title">What it says.</param>
    /// <param name="width">Width, points.</param>
    public static Chunk Lay(TitleBlock title, float width)
    {
        var kind = TextStyle.Label with { Size = 9, Color = Palette.Accent };
        var name = TextStyle.Heading(1) with { Size = 23 };
        var lines = LineBreaker.Break(title.Title, name, width, 200, 2);
        var facts = TextStyle.Body;
        var height = 14 + 6 + lines.Count * 29 + 22;
        return new Chunk(height, (ink, x, y) =>
        {
            ink.Fill(SKRect.Create(x, y, 34, 2.4f), Palette.Accent);
            ink.Text(title.Kind, kind, x, y + 16);
            var baseline = y + 16;
            foreach (var line in lines)
                ink.Line(line, x, baseline += 28);
            var left = x;
            foreach (var (label, fact) in title.Facts)
            {
                ink.Text(label, facts with { Color = Palette.Quiet }, left, baseline + 18);
                left += facts.Face.Width(label, facts.Size) + 4;
                var shown = PrintableText.For(fact, TextStyle.Heading(1).Face, 60);
                ink.Text(shown, facts with { Face = TextStyle.Heading(1).Face }, left, baseline + 18);
                left += TextStyle.Heading(1).Face.Width(shown, facts.Size) + 18;
            }
        });
    }

    /// <summary>The verdict with the counts.</summary>
    /// <param name="panel">What it says.</param>
    /// <param name="width">Width, points.</param>
    public static Chunk Lay(VerdictPanel panel, float width)
    {
        const float wordWidth = 128, padding = 12;
        var passes = panel.Verdict != Verdict.Fail;
        var statement = LineBreaker.Break(panel.Statement, TextStyle.Body, width - wordWidth - 2 * padding, 600, 5);
        var topHeight = MathF.Max(52, statement.Count * TextStyle.Body.LineHeight + 22);
        const float countsHeight = 38;
        var height = topHeight + countsHeight;
        var color = panel.Verdict switch { Verdict.Pass => Palette.Accent, Verdict.Fail => Palette.Alarm, _ => Palette.Quiet };
        return new Chunk(height, (ink, x, y) =>
        {
            // A failure is a filled field, a pass an outlined one: they differ in a grey print too.
            var word = panel.Verdict switch { Verdict.Pass => "PASS", Verdict.Fail => "FAIL", _ => "NO VERDICT" };
            var style = TextStyle.Heading(1) with { Size = panel.Verdict is null ? 17 : 37, Color = passes ? color : Palette.Paper };
            var field = SKRect.Create(x, y, wordWidth, topHeight);
            if (passes)
                ink.Outline(SKRect.Create(x + 0.8f, y + 0.8f, wordWidth - 1.6f, topHeight - 1.6f), color, 1.6f);
            else
                ink.Fill(field, color);
            ink.Text(word, style, x + (wordWidth - style.Face.Width(word, style.Size)) / 2, y + topHeight / 2 + style.Size * 0.35f);
            ink.Outline(SKRect.Create(x + 0.4f, y + 0.4f, width - 0.8f, height - 0.8f), Palette.Rule, 0.6f);
            ink.Lines(statement, x + wordWidth + padding, y + (topHeight - statement.Count * TextStyle.Body.LineHeight) / 2, TextStyle.Body);
            ink.Rule(x, x + width, y + topHeight, Palette.Rule, 0.6f);

            var cell = width / Math.Max(1, panel.Counts.Length);
            for (var i = 0; i < panel.Counts.Length; i++)
            {
                var (name, count, link) = panel.Counts[i];
                var left = x + i * cell;
                if (i > 0)
                    ink.Fill(SKRect.Create(left, y + topHeight + 7, 0.4f, countsHeight - 14), Palette.Rule);
                ink.Text(count.ToString("N0", CultureInfo.InvariantCulture).Replace(',', ' '), TextStyle.Heading(1) with { Size = 14 }, left + padding, y + topHeight + 19);
                ink.Text(name, TextStyle.Small, left + padding, y + topHeight + 30);
                if (link is not null)
                    ink.Link(link, SKRect.Create(left, y + topHeight, cell, countsHeight));
            }
        })
        { SpaceBefore = 8 };
    }

    /// <summary>The lines to sign on.</summary>
    /// <param name="signOff">The roles.</param>
    /// <param name="width">Width, points.</param>
    public static Chunk Lay(SignOff signOff, float width)
    {
        const float rowHeight = 25;
        var head = TextStyle.Label;
        var height = 14 + signOff.Roles.Length * rowHeight;
        float[] columns = [0, 0.16f, 0.44f, 0.80f];
        string[] headings = ["", "Name", "Signature", "Date"];
        return new Chunk(height, (ink, x, y) =>
        {
            for (var c = 1; c < columns.Length; c++)
                ink.Text(headings[c], head, x + columns[c] * width, y + 9);
            for (var r = 0; r < signOff.Roles.Length; r++)
            {
                var line = y + 14 + (r + 1) * rowHeight - 4;
                ink.Text(signOff.Roles[r], TextStyle.Body with { Face = TextStyle.Heading(1).Face }, x, line - 2);
                for (var c = 1; c < columns.Length; c++)
                {
                    var right = c + 1 < columns.Length ? columns[c + 1] * width - 12 : width;
                    ink.Rule(x + columns[c] * width, x + right, line, Palette.Rule, 0.6f);
                }
            }
        })
        { SpaceBefore = 8 };
    }
}
