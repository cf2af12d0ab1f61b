using System.Globalization;
using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;

namespace StackTiming.Reports.Pdf;

/// <summary>
/// Writes a report as a PDF: vectors and embedded fonts throughout, an outline, links, attached files. The same document gives the same
/// bytes: the only date in the file is the document's own.
/// </summary>
public static class PdfReportWriter
{
    /// <summary>Writes the report.</summary>
    /// <param name="document">The report.</param>
    /// <param name="output">Where to.</param>
    /// <param name="format">The paper.</param>
    public static void Write(ReportDocument document, Stream output, PageFormat format)
    {
        var headings = NumberedHeading.Of(document);
        var flow = Paginator.Flow(Chunks(document, headings, format.ContentWidth), format);
        var date = document.Date.ToDateTime(TimeOnly.MinValue, DateTimeKind.Utc);

        using var pages = new MemoryStream();
        var metadata = new SKDocumentPdfMetadata
        {
            Title = document.Title,
            Subject = document.Subject,
            Creator = document.Producer,
            Creation = date,
            Modified = date,
            EncodingQuality = 100,
            RasterDpi = 300,
        };
        using (var pdf = SKDocument.CreatePdf(pages, metadata))
        using (var ink = new Ink(flow.PageOfAnchor))
        {
            for (var p = 0; p < flow.Pages.Count; p++)
            {
                ink.Canvas = pdf.BeginPage(format.Width, format.Height);
                DrawFrame(ink, document, format, p + 1, flow.Pages.Count);
                foreach (var placed in flow.Pages[p])
                {
                    if (placed.Chunk.Anchor is { } anchor && flow.PageOfAnchor[anchor] == p + 1)
                        ink.Canvas.DrawNamedDestinationAnnotation(new SKPoint(format.Left, MathF.Max(0, placed.Y - 10)), anchor);
                    placed.Chunk.Draw(ink, format.Left, placed.Y);
                }
                pdf.EndPage();
            }
            pdf.Close();
        }
        pages.Position = 0;
        PdfFinisher.Finish(pages, output, document, flow.Outline, format);
    }

    private static IEnumerable<Chunk> Chunks(ReportDocument document, List<NumberedHeading> headings, float width)
    {
        var layout = new BlockLayout(headings);
        foreach (var block in document.FirstPage)
        {
            foreach (var chunk in layout.Lay(block, width))
                yield return chunk;
        }
        foreach (var heading in headings)
        {
            yield return HeadingChunk(heading, width);
            foreach (var block in heading.Section.Blocks)
            {
                foreach (var chunk in layout.Lay(block, width))
                    yield return chunk;
            }
        }
    }

    private static Chunk HeadingChunk(NumberedHeading heading, float width)
    {
        var style = TextStyle.Heading(heading.Level);
        var number = heading.Number.Length == 0 ? "" : heading.Number + "  ";
        var text = RichText.Of(new Run(number, Emphasis.Quiet), new Run(heading.Section.Heading));
        var lines = LineBreaker.Break(text, style, width, 300, 3);
        var ruled = heading.Level == 1;
        var height = lines.Count * style.LineHeight + (ruled ? 7 : 2);
        return new Chunk(height, (ink, x, y) =>
        {
            ink.Lines(lines, x, y, style);
            if (ruled)
                ink.Rule(x, x + width, y + height - 4, Palette.Accent, 0.9f);
        })
        {
            SpaceBefore = heading.Level switch { 1 => 26, 2 => 16, _ => 12 },
            KeepWithNext = true,
            BeginsPage = heading.Section.BeginsPage,
            Anchor = heading.Section.Anchor,
            Outline = (heading.Level, (heading.Number + "  " + heading.Section.Heading).TrimStart()),
        };
    }

    private static void DrawFrame(Ink ink, ReportDocument document, PageFormat format, int page, int count)
    {
        var style = TextStyle.Small;
        var right = format.Width - format.Right;
        if (page > 1)
        {
            var half = format.ContentWidth * 0.62f;
            foreach (var line in LineBreaker.Break(document.RunningHead.Left, style, half, 200, 1))
                ink.Line(line, format.Left, format.Top - 24);
            foreach (var line in LineBreaker.Break(document.RunningHead.Right, style, format.ContentWidth - half, 200, 1))
                ink.Line(line, right - line.Width, format.Top - 24);
            ink.Rule(format.Left, right, format.Top - 18, Palette.Hairline, 0.5f);
        }
        var foot = format.Height - format.Bottom + 28;
        ink.Rule(format.Left, right, foot - 11, Palette.Hairline, 0.5f);
        ink.Text(document.Producer, style, format.Left, foot);
        ink.TextEndingAt(string.Create(CultureInfo.InvariantCulture, $"Page {page} of {count}"), style, right, foot);
    }
}
