using System.Collections.Immutable;
using System.Globalization;
using StackTiming.Reports.Documents;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Tests.Pdf;

/// <summary>An invented document that holds every kind of block, long words and long tables.</summary>
internal static class SampleDocument
{
    public static readonly byte[] Attached = "{\"verdict\":\"fail\"}\n"u8.ToArray();

    public static ReportDocument Create(int rows = 120) => new(
        "Compliance report: sample board",
        "A sample",
        ("Sample board", "Revision B"),
        new DateOnly(2026, 12, 1),
        [
            new TitleBlock("Compliance report", "Sample board", [("Revision", "B"), ("Date", "2026-12-01")]),
            new VerdictPanel(Verdict.Fail, "2 findings of rules that must hold fail.", [("Passed", 1312, null), ("Failed", 2, "findings"), ("Unchecked", 1, null)]),
            new Caption("Worst margins"),
            new Table(
                [new Column("Status"), new Column("Rule"), new Column("Subject", Grows: true), new Column("Value", Alignment.Right), new Column("Margin", Alignment.Right), new Column("")],
                [
                    Row.Of(new StatusCell(FindingStatus.Fail), RichText.LinkTo("LANE0-Z", "findings"), "MEM_D[0]", "48.21 Ω", "−4.21 Ω", new MarginCell(-1.6)),
                    Row.Of(new StatusCell(FindingStatus.Unchecked), "CLK-RING", "CLK_A at U7.3", "", "", new MarginCell(null)),
                    Row.Of(new StatusCell(FindingStatus.Waived), "USB-SKEW", "usb", "6.10 ps", "−1.10 ps", new MarginCell(-0.22)),
                    Row.Of(new StatusCell(FindingStatus.Pass), "ADDR-TIME", "MEM_A3", "812.00 ps", "88.00 ps", new MarginCell(0.1)),
                ]),
            new SideBySide(
                [new Caption("Board"), new KeyValues([("Nets", "164"), ("Stack-up", "Harbour buoy recorder, 8 layers")])],
                [new Caption("Inputs"), new KeyValues([("board", RichText.In("0f1e2d3c4b5a6978", Emphasis.Code))])]),
            new Note("Cautions", ["Results are predictions.", "Creepage and clearance are not checked here."]),
            new SignOff(["Prepared", "Reviewed", "Approved"]),
        ],
        [
            new Section("contents", "Contents", [new Contents(2)], []) { Numbering = Numbering.None, BeginsPage = true },
            new Section("findings", "Findings", [
                new Paragraph("Signs of the trade: Ω ± µ ε Γ Δ ≤ ≥ – “quoted” √2 · 3 × 10³ → end."),
                new Paragraph("A word without end: " + new string('x', 100_000)),
                new Bullets(["first", "second, which is " + string.Join(' ', Enumerable.Repeat("rather long", 20))]),
                new Entry(FindingStatus.Fail, "MEM_D0", [("value", "48.21 Ω"), ("limit", "36.00 … 44.00 Ω"), ("margin", "−4.21 Ω")], -1.05,
                    "The trace is too narrow for 40 Ω on L3.", [("Fix", "route at 0.142 mm on L3")], "finding-1"),
            ], [
                new Section("long-table", "A long table", [LongTable(rows)], []),
            ]),
            new Section("empty", "An empty section", [], []),
            new Section("appendix", "Digests", [new Paragraph("none")], []) { Numbering = Numbering.Appendix },
        ],
        [new Attachment("results.json", "application/json", "Results of the check", Attached)])
    {
        Producer = "StackTiming 0.1.0",
    };

    private static Table LongTable(int rows) => new(
        [new Column("Net", Grows: true), new Column("Delay", Alignment.Right), new Column("Remark")],
        [.. Enumerable.Range(0, rows).Select(i => Row.Of(
            i == 5 ? string.Concat(Enumerable.Repeat("VERY_LONG_NET_NAME_", 11)) : "NET_" + i.ToString(CultureInfo.InvariantCulture),
            $"{i}.25 ps",
            i % 7 == 0 ? "a remark that takes somewhat more room than the others do" : ""))],
        "… and 17 more, see the results JSON");
}
