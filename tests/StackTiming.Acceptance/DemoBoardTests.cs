using System.Text.Json;
using System.Xml.Linq;
using UglyToad.PdfPig;
using UglyToad.PdfPig.DocumentLayoutAnalysis.TextExtractor;
using Xunit;

namespace StackTiming.Acceptance;

/// <summary>The demo board as the README runs it: revision B has the mistakes that its files describe, revision C holds.</summary>
public sealed class DemoBoardTests
{
    private static readonly string[] Cautions =
        ["results are predictions", "controlled-impedance process", "Creepage, clearance", "need review by qualified people"];

    [Fact]
    public void Revision_B_fails_with_its_mistakes_and_their_fixes()
    {
        using var folder = new TemporaryFolder();
        var run = Check("rev-b", folder);
        Assert.True(run.ExitCode == 1, run.Error);
        Assert.Contains("Verdict: FAIL", run.Output);
        var json = JsonDocument.Parse(File.ReadAllText(folder.PathOf("results.json"))).RootElement;
        Assert.Equal("fail", json.GetProperty("verdict").GetString());
        var failed = json.GetProperty("findings").EnumerateArray().Where(f => f.GetProperty("status").GetString() == "fail").ToArray();
        var rules = failed.Select(f => f.GetProperty("rule").GetString()).ToHashSet();
        // An unmatched lane, a stub, a pair on the wrong layer, a ringing clock, an expired waiver.
        Assert.Superset(new HashSet<string?> { "LANE1-MATCH", "ADDR-STUB", "ETH-Z", "CLK-RING", "SLOW-STUB" }, rules);
        Assert.Contains(failed, f => f.GetProperty("kind").GetString() == "waiver");
        Assert.Contains(failed, f => f.TryGetProperty("fix", out var fix) && fix.ToString().Contains("lengthen", StringComparison.Ordinal));
        var text = Text(folder.PathOf("report.pdf"));
        Assert.Contains("FAIL", text);
        Assert.Contains("LANE1-MATCH", text);
        foreach (var caution in Cautions)
            Assert.Contains(caution, text);
    }

    [Fact]
    public void Revision_C_holds_and_its_report_stands_alone()
    {
        using var folder = new TemporaryFolder();
        var run = Check("rev-c", folder);
        Assert.True(run.ExitCode == 0, run.Error + run.Output);
        var json = JsonDocument.Parse(File.ReadAllText(folder.PathOf("results.json"))).RootElement;
        Assert.Equal("pass", json.GetProperty("verdict").GetString());
        Assert.True(json.GetProperty("counts").GetProperty("fail").GetInt32() == 0);
        Assert.All(json.GetProperty("inputs").EnumerateArray(), i => Assert.Equal(64, i.GetProperty("sha256").GetString()!.Length));
        var junit = XDocument.Load(folder.PathOf("results.xml"));
        Assert.Equal("0", junit.Root!.Attribute("failures")!.Value);
        using var pdf = PdfDocument.Open(folder.PathOf("report.pdf"));
        Assert.True(pdf.TryGetBookmarks(out var outline) && outline.GetNodes().Any());
        Assert.True(pdf.Advanced.TryGetEmbeddedFiles(out var attached) && attached.Count == 1);
        Assert.Equal(File.ReadAllBytes(folder.PathOf("results.json")), attached[0].Memory.ToArray());
        var text = Text(folder.PathOf("report.pdf"));
        foreach (var part in new[] { "PASS", "Harbour buoy data recorder", "Prepared", "Reviewed", "Approved", "Ω", "±", "Stack-up and lines", "Matching", "Waivers", "Methods", "Appendix" })
            Assert.Contains(part, text);
    }

    [Fact]
    public void The_same_inputs_give_the_same_bytes()
    {
        using var first = new TemporaryFolder();
        using var second = new TemporaryFolder();
        Check("rev-c", first);
        Check("rev-c", second);
        foreach (var name in new[] { "report.pdf", "results.json", "results.xml", "results.csv" })
            Assert.Equal(File.ReadAllBytes(first.PathOf(name)), File.ReadAllBytes(second.PathOf(name)));
    }

    private static ToolResult Check(string revision, TemporaryFolder folder) => Tool.Run(
        "check", $"stackups/harbour-buoy/{revision}/board.yaml", "--date", "2026-12-01", "--report", folder.PathOf("report.pdf"),
        "--json", folder.PathOf("results.json"), "--junit", folder.PathOf("results.xml"), "--csv", folder.PathOf("results.csv"));

    private static string Text(string path)
    {
        using var pdf = PdfDocument.Open(path);
        return string.Join('\n', pdf.GetPages().Select(p => ContentOrderTextExtractor.GetText(p)));
    }
}
