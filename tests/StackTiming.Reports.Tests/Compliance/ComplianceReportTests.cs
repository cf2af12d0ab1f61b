using System.Globalization;
using StackTiming.Reports.Compliance;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Pdf;
using StackTiming.Reports.Results;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;
using UglyToad.PdfPig;
using UglyToad.PdfPig.Actions;
using UglyToad.PdfPig.Annotations;
using Xunit;

namespace StackTiming.Reports.Tests.Compliance;

public class ComplianceReportTests
{
    private static readonly ToolIdentity Tool = new("StackTiming", "0.1.0");
    private static readonly byte[] Json = Results(SampleCheck.Create());
    private static readonly byte[] Sample = Pdf(SampleCheck.Create(), PageFormat.A4);

    private static byte[] Results(CheckResult result)
    {
        using var stream = new MemoryStream();
        ResultsJson.Write(result, Tool, stream);
        return stream.ToArray();
    }

    private static ReportDocument Build(CheckResult result) => ComplianceReport.Build(new ReportInput(result, Tool, result.CheckedOn) { ResultsJson = Json });

    private static byte[] Pdf(CheckResult result, PageFormat format)
    {
        using var stream = new MemoryStream();
        PdfReportWriter.Write(Build(result), stream, format);
        return stream.ToArray();
    }

    private static string PageText(byte[] pdf, int page)
    {
        using var document = PdfDocument.Open(pdf);
        return document.GetPage(page).Text;
    }

    private static string AllText(byte[] pdf)
    {
        using var document = PdfDocument.Open(pdf);
        return string.Join('\n', document.GetPages().Select(p => p.Text));
    }

    [Fact]
    public void First_page_stands_alone_on_either_paper()
    {
        foreach (var format in new[] { PageFormat.A4, PageFormat.Letter })
        {
            var text = PageText(Pdf(SampleCheck.Create(), format), 1);
            foreach (var expected in new[]
            {
                "FAIL", "Harbour buoy recorder", "Revision", "2026-12-01", "6 findings of rules that must hold fail.", "LANE0-MATCH", "−13.40 ps", "36.00 to 44.00 Ω",
                "stackups/harbour-buoy/rev-b/board.yaml", "a0f1e2d3c4b5", "predictions", "Prepared", "Reviewed", "Approved", "Signature",
            })
                Assert.Contains(expected, text, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void First_page_leads_to_findings_rules_and_digests()
    {
        using var document = PdfDocument.Open(Sample);
        var pages = document.GetPage(1).GetAnnotations().Where(a => a.Type == AnnotationType.Link)
            .Select(a => Assert.IsType<GoToAction>(a.Action).Destination.PageNumber).ToHashSet();
        int PageWith(string text) => document.GetPages().Skip(2).First(p => p.Text.Contains(text, StringComparison.Ordinal)).Number;
        Assert.Contains(PageWith("5.1LANE0-Z: impedance".Replace("5.1", "5.1  ", StringComparison.Ordinal)), pages);
        Assert.Contains(PageWith("Appendix A  Input files"), pages);
        Assert.Contains(2, pages);
    }

    [Fact]
    public void Findings_carry_explanation_fix_and_reason()
    {
        var text = AllText(Sample);
        foreach (var expected in new[]
        {
            "shorten MEM_D5 by 2.02 mm on L3", "put 33 Ω in series at U1.C4", "MEM_D5 arrives 23.4 ps after MEM_D1", "no part on the net has a driver model",
            "a second crossing clocks twice",
        })
            Assert.Contains(expected, text, StringComparison.Ordinal);
    }

    [Fact]
    public void Waivers_methods_assumptions_and_whole_digests_are_there()
    {
        var text = AllText(Sample);
        foreach (var expected in new[]
        {
            "SI lead", "2027-06-30", "The waiver of LANE0-MATCH ended on 2026-10-31.", "Hammerstad and Jensen 1980", "Accurate models", "an etch factor of 2.5",
            "Creepage, clearance, current-carrying capacity and safety insulation", SampleCheck.Create().Inputs[0].Sha256, "1 first crossing of vih, 1.140 ns",
        })
            Assert.Contains(expected, text, StringComparison.Ordinal);
    }

    [Fact]
    public void Passing_board_says_so_and_has_no_failures()
    {
        var check = SampleCheck.Create();
        var holding = check.Findings.Where(f => f.Status is FindingStatus.Pass or FindingStatus.Waived).ToList();
        var text = PageText(Pdf(check with { Findings = [.. holding], Counts = FindingCounts.Of(holding), Waves = [] }, PageFormat.A4), 1);
        Assert.Contains("PASS", text, StringComparison.Ordinal);
        Assert.DoesNotContain("FAIL", text, StringComparison.Ordinal);
        Assert.Contains("Every rule that must hold holds or is waived with a reason.", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Board_without_rules_gets_no_verdict()
    {
        var text = PageText(Pdf(SampleCheck.Empty(), PageFormat.A4), 1);
        Assert.Contains("NO VERDICT", text, StringComparison.Ordinal);
        Assert.DoesNotContain("PASS", text, StringComparison.Ordinal);
        Assert.Contains("This says nothing about the board.", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Results_travel_inside_the_report()
    {
        using var document = PdfDocument.Open(Sample);
        Assert.True(document.Advanced.TryGetEmbeddedFiles(out var files));
        Assert.Equal(Json, Assert.Single(files).Memory.ToArray());
    }

    [Fact]
    public void Same_results_give_the_same_bytes() => Assert.Equal(Sample, Pdf(SampleCheck.Create(), PageFormat.A4));

    [Fact]
    public void Anchors_are_unique_and_every_link_has_one()
    {
        var document = Build(SampleCheck.Create());
        var anchors = new List<string>();
        var links = new List<string>();
        foreach (var block in document.FirstPage)
            Collect(block);
        foreach (var section in document.Sections)
            CollectSection(section);
        Assert.Equal(anchors.Count, anchors.Distinct().Count());
        Assert.All(links, l => Assert.Contains(l, anchors));

        void CollectSection(Section section)
        {
            anchors.Add(section.Anchor);
            foreach (var block in section.Blocks)
                Collect(block);
            foreach (var inner in section.Sections)
                CollectSection(inner);
        }

        void Collect(Block block)
        {
            switch (block)
            {
                case Table table:
                    foreach (var cell in table.Rows.SelectMany(r => r.Cells).OfType<TextCell>())
                        Links(cell.Text);
                    break;
                case Entry entry:
                    Links(entry.Title);
                    break;
                case Paragraph paragraph:
                    Links(paragraph.Text);
                    break;
                case Figure figure:
                    Links(figure.Caption);
                    break;
                case Note note:
                    foreach (var item in note.Items)
                        Links(item);
                    break;
                case VerdictPanel panel:
                    links.AddRange(panel.Counts.Select(c => c.Link).OfType<string>());
                    break;
                case SideBySide pair:
                    foreach (var inner in pair.Left.Concat(pair.Right))
                        Collect(inner);
                    break;
                default:
                    break;
            }
        }

        void Links(RichText text) => links.AddRange(text.Runs.Select(r => r.Link).OfType<string>());
    }

    [Fact]
    public void Report_of_a_very_large_board_stays_bounded()
    {
        var check = SampleCheck.Create();
        var model = check.Findings.First(f => f.Rule == "LANE0-Z");
        var rules = Enumerable.Range(0, 400).Select(r => check.Rules[0] with { Id = "RULE-" + r.ToString(CultureInfo.InvariantCulture) }).ToList();
        var findings = rules.SelectMany((r, i) => Enumerable.Range(0, 50).Select(n => model with
        {
            Rule = r.Id,
            Subject = $"NET_{i}_{n}",
            Status = n % 10 == 0 ? FindingStatus.Fail : FindingStatus.Pass,
            RelativeMargin = n % 10 == 0 ? -0.1 : 0.2,
        })).Order(WorstFirst.Instance).ToList();
        var large = check with
        {
            Rules = [.. rules],
            Findings = [.. findings],
            Counts = FindingCounts.Of(findings),
            NetCount = 20_000,
            SegmentCount = 120_000,
            Groups = [.. Enumerable.Range(0, 200).Select(i => check.Groups[2] with { Rule = rules[i].Id })],
            Waves = [.. Enumerable.Range(0, 100).Select(i => check.Waves[i % 2])],
            Lines = [.. Enumerable.Range(0, 400).Select(i => check.Lines[i % check.Lines.Length])],
        };
        using var document = PdfDocument.Open(Pdf(large, PageFormat.A4));
        Assert.InRange(document.NumberOfPages, 30, 140);
        Assert.Contains("more findings", document.GetPage(document.NumberOfPages / 2).Text + string.Concat(document.GetPages().Select(p => p.Text)), StringComparison.Ordinal);
    }
}
