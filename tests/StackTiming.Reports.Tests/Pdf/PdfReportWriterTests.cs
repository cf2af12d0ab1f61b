using StackTiming.Reports.Documents;
using StackTiming.Reports.Pdf;
using UglyToad.PdfPig;
using UglyToad.PdfPig.Actions;
using UglyToad.PdfPig.Annotations;
using UglyToad.PdfPig.Outline;
using Xunit;

namespace StackTiming.Reports.Tests.Pdf;

public class PdfReportWriterTests
{
    private static readonly byte[] Sample = Write(SampleDocument.Create(), PageFormat.A4);

    private static byte[] Write(ReportDocument document, PageFormat format)
    {
        using var stream = new MemoryStream();
        PdfReportWriter.Write(document, stream, format);
        return stream.ToArray();
    }

    private static string TextOf(PdfDocument pdf) => string.Join('\n', pdf.GetPages().Select(p => p.Text));

    [Fact]
    public void Signs_of_the_trade_can_be_read_back_from_the_text()
    {
        using var pdf = PdfDocument.Open(Sample);
        var text = TextOf(pdf);
        foreach (var sign in "Ω±µεΓΔ≤≥–“”√·×³→")
            Assert.Contains(sign, text);
    }

    [Fact]
    public void Same_document_gives_same_bytes() => Assert.Equal(Sample, Write(SampleDocument.Create(), PageFormat.A4));

    [Fact]
    public void No_date_but_the_documents_own_is_in_the_file()
    {
        var text = System.Text.Encoding.Latin1.GetString(Sample);
        var dates = System.Text.RegularExpressions.Regex.Matches(text, @"D:\d{8}|\b20\d\d-\d\d-\d\d").Select(m => m.Value).Distinct();
        Assert.All(dates, d => Assert.Contains(d, new[] { "D:20261201", "2026-12-01" }));
    }

    [Fact]
    public void Head_of_a_long_table_is_repeated_on_its_pages()
    {
        using var pdf = PdfDocument.Open(Write(SampleDocument.Create(2000), PageFormat.A4));
        var pagesWithRows = pdf.GetPages().Where(p => p.Text.Contains("NET_1", StringComparison.Ordinal)).ToList();
        Assert.True(pagesWithRows.Count > 10);
        Assert.All(pagesWithRows, p => Assert.Contains("Remark", p.Text, StringComparison.Ordinal));
        Assert.Contains("NET_1999", TextOf(pdf), StringComparison.Ordinal);
    }

    [Fact]
    public void Every_page_tells_its_number_and_the_count()
    {
        using var pdf = PdfDocument.Open(Sample);
        foreach (var page in pdf.GetPages())
            Assert.Contains($"Page {page.Number} of {pdf.NumberOfPages}", page.Text, StringComparison.Ordinal);
    }

    [Fact]
    public void Nothing_stands_outside_the_margins()
    {
        using var pdf = PdfDocument.Open(Sample);
        foreach (var letter in pdf.GetPages().SelectMany(p => p.Letters))
        {
            Assert.InRange(letter.StartBaseLine.X, PageFormat.A4.Left - 1, PageFormat.A4.Width - PageFormat.A4.Right + 1);
            Assert.InRange(letter.StartBaseLine.Y, 20, PageFormat.A4.Height - 20);
        }
    }

    [Fact]
    public void Outline_follows_the_sections()
    {
        using var pdf = PdfDocument.Open(Sample);
        Assert.True(pdf.TryGetBookmarks(out var bookmarks));
        Assert.Equal(
            ["Contents", "1  Findings", "2  An empty section", "Appendix A  Digests"],
            bookmarks.Roots.Select(r => r.Title));
        var nested = Assert.IsType<DocumentBookmarkNode>(Assert.Single(bookmarks.Roots[1].Children));
        Assert.Equal("1.1  A long table", nested.Title);
        Assert.True(nested.PageNumber >= 2);
    }

    [Fact]
    public void Links_lead_to_the_page_of_their_anchor()
    {
        using var pdf = PdfDocument.Open(Sample);
        var links = pdf.GetPage(1).GetAnnotations().Where(a => a.Type == AnnotationType.Link).ToList();
        Assert.NotEmpty(links);
        var findings = pdf.GetPages().First(p => p.Text.Contains("Signs of the trade", StringComparison.Ordinal)).Number;
        Assert.Contains(links, l => l.Action is GoToAction go && go.Destination.PageNumber == findings);
    }

    [Fact]
    public void Attached_file_comes_back_byte_for_byte()
    {
        using var pdf = PdfDocument.Open(Sample);
        Assert.True(pdf.Advanced.TryGetEmbeddedFiles(out var files));
        var file = Assert.Single(files);
        Assert.Equal("results.json", file.Name);
        Assert.Equal(SampleDocument.Attached, file.Memory.ToArray());
    }

    [Fact]
    public void Letter_paper_is_respected()
    {
        using var pdf = PdfDocument.Open(Write(SampleDocument.Create(), PageFormat.Letter));
        Assert.Equal(612, pdf.GetPage(1).Width, 1);
        Assert.Equal(792, pdf.GetPage(1).Height, 1);
    }

    [Fact]
    public void Title_and_producer_are_in_the_properties()
    {
        using var pdf = PdfDocument.Open(Sample);
        Assert.Equal("Compliance report: sample board", pdf.Information.Title);
        Assert.Equal("StackTiming 0.1.0", pdf.Information.Creator);
    }
}
