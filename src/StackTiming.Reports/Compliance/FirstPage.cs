using System.Collections.Immutable;
using System.Globalization;
using StackTiming.Reports.Documents;
using StackTiming.Rules.Results;
using StackTiming.Stackups.Layers;

namespace StackTiming.Reports.Compliance;

/// <summary>The first page: what a person with a minute must know before signing.</summary>
internal static class FirstPage
{
    private const int WorstShown = 6;
    private const int InputsShown = 6;
    private const int DigestDigits = 12;

    /// <summary>The blocks of the page.</summary>
    /// <param name="input">What the report is built from.</param>
    /// <param name="judgements">The findings by rule.</param>
    public static ImmutableArray<Block> Build(ReportInput input, Judgements judgements)
    {
        var result = input.Result;
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.Add(Title(input));
        blocks.Add(Verdict(result));
        if (judgements.WorstOfEachRule.Count > 0)
            blocks.AddRange(WorstMargins(judgements));
        blocks.Add(new SideBySide([new Caption("Board"), Identity(result)], [new Caption("Inputs"), .. Inputs(result)], 0.42));
        blocks.Add(new Note("Cautions", [CautionSection.Short]));
        blocks.Add(new SignOff(["Prepared", "Reviewed", "Approved"]));
        return blocks.ToImmutable();
    }

    private static TitleBlock Title(ReportInput input)
    {
        var facts = ImmutableArray.CreateBuilder<(string, string)>();
        if (input.Result.Revision.Length > 0)
            facts.Add(("Revision", input.Result.Revision));
        facts.Add(("Date", Day(input.Date)));
        if (input.Date != input.Result.CheckedOn)
            facts.Add(("Checked on", Day(input.Result.CheckedOn)));
        return new TitleBlock("Compliance report", input.Result.Board.Length > 0 ? input.Result.Board : "Board without a name", facts.ToImmutable());
    }

    private static VerdictPanel Verdict(CheckResult result)
    {
        var counts = result.Counts;
        return new VerdictPanel(counts.Total == 0 ? null : result.Verdict, Statement(result),
        [
            ("passed", counts.Passed, Anchors.Rules),
            ("failed, must", counts.FailedMust, counts.FailedMust > 0 ? Anchors.FailedMust : null),
            ("failed, should", counts.FailedShould, counts.FailedShould > 0 ? Anchors.FailedShould : null),
            ("unchecked", counts.Unchecked, counts.UncheckedMust > 0 ? Anchors.UncheckedMust : counts.UncheckedShould > 0 ? Anchors.UncheckedShould : null),
            ("waived", counts.Waived, counts.Waived > 0 ? Anchors.Waivers : null),
        ]);
    }

    private static RichText Statement(CheckResult result)
    {
        var counts = result.Counts;
        if (counts.Total == 0)
            return "No rule was judged, so nothing fails. This says nothing about the board.";
        var parts = new List<string>();
        if (result.Verdict == Rules.Results.Verdict.Fail)
        {
            if (counts.FailedMust > 0)
                parts.Add(Wording.Count(counts.FailedMust, "finding of a rule that must hold fails.", "findings of rules that must hold fail."));
            if (counts.UncheckedMust > 0)
                parts.Add(Wording.Count(counts.UncheckedMust, "finding of a rule that must hold could not be judged, and what nobody has judged cannot be signed for.",
                    "findings of rules that must hold could not be judged, and what nobody has judged cannot be signed for."));
        }
        else
        {
            parts.Add($"Every rule that must hold holds{(counts.Waived > 0 ? " or is waived with a reason" : "")}.");
        }
        if (counts.FailedShould > 0)
            parts.Add(Wording.Count(counts.FailedShould, "recommendation is not met.", "recommendations are not met."));
        parts.Add($"{Wording.Count(result.Rules.Length, "rule was", "rules were")} applied to {Wording.Count(result.NetCount, "net", "nets")}.");
        return string.Join(' ', parts);
    }

    private static IEnumerable<Block> WorstMargins(Judgements judgements)
    {
        var shown = judgements.WorstOfEachRule.Take(WorstShown).ToList();
        yield return new Caption("Worst margin of each rule");
        yield return new Table(
            [
                new Column("Status"), new Column("Rule"), new Column("Subject", Grows: true), new Column("Value", Alignment.Right),
                new Column("Limit", Alignment.Right), new Column("Margin", Alignment.Right), new Column("Share of limit"),
            ],
            [.. shown.Select(f => Row.Of(
                new StatusCell(f.Status), RichText.LinkTo(Cut(f.Rule, 28), judgements.AnchorOf(f.Rule)), Cut(f.Subject, 44), Wording.Figure(f.Value, f.Unit),
                Wording.Limit(f), Wording.Figure(f.Margin, f.Unit), new MarginCell(f.RelativeMargin)))],
            judgements.WorstOfEachRule.Count > shown.Count ? $"… and {Wording.Count(judgements.WorstOfEachRule.Count - shown.Count, "further rule", "further rules")}, all in the section on rules" : "");
    }

    private static KeyValues Identity(CheckResult result) => new(
    [
        ("Board", Cut(result.Board, 60)),
        ("Revision", result.Revision.Length > 0 ? Cut(result.Revision, 40) : "not stated"),
        ("Stack-up", Cut(result.StackUp.Name + (result.StackUp.Revision.Length > 0 ? ", revision " + result.StackUp.Revision : ""), 70)),
        ("Copper layers", result.StackUp.CopperLayers.Count().ToString(CultureInfo.InvariantCulture)),
        ("Laminate", Wording.Millimetres(result.StackUp.Layers.Sum(Thickness)) + " mm without mask"),
        ("Nets, segments", $"{Wording.Count(result.NetCount, "net", "nets")}, {Wording.Count(result.SegmentCount, "segment", "segments")}"),
    ]);

    private static IEnumerable<Block> Inputs(CheckResult result)
    {
        var shown = result.Inputs.Take(InputsShown);
        var more = result.Inputs.Length > InputsShown ? $"… and {result.Inputs.Length - InputsShown} more; " : "";
        yield return new Table(
            [new Column("Role"), new Column("File", Grows: true), new Column("SHA-256 begins") { Wraps = false }],
            [.. shown.Select(i => Row.Of(
                i.Role, Tail(i.Path, 38), RichText.In(i.Sha256.Length > DigestDigits ? i.Sha256[..DigestDigits] : i.Sha256, Emphasis.Code)))],
            RichText.Of(new Run(more), new Run("whole digests in the appendix", Emphasis.Plain, Anchors.Digests)));
    }

    private static double Thickness(Layer layer) => layer switch
    {
        CopperLayer copper => copper.Thickness.Value,
        DielectricLayer dielectric => dielectric.Thickness.Value,
        _ => 0,
    };

    private static string Day(DateOnly date) => date.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);

    private static string Cut(string text, int limit) => text.Length <= limit ? text : text[..(limit - 1)] + "…";

    private static string Tail(string path, int limit) => path.Length <= limit ? path : "…" + path[^(limit - 1)..];
}
