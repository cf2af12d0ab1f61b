using System.Collections.Immutable;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Figures;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Compliance;

/// <summary>The findings that need attention, worst first, each with its explanation and what would mend it.</summary>
internal static class FindingsSection
{
    private const int EntriesOfARule = 8;
    private const int EntriesInAll = 60;
    private const int BarsShown = 24;

    /// <summary>The section.</summary>
    /// <param name="result">The results of the check.</param>
    /// <param name="judgements">The findings by rule.</param>
    public static Section Build(CheckResult result, Judgements judgements)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        var bars = judgements.WorstOfEachRule.Where(f => f.RelativeMargin is { } m && double.IsFinite(m)).OrderBy(f => f.RelativeMargin).Take(BarsShown).ToList();
        if (bars.Count > 0)
        {
            blocks.Add(new Figure(
                new MarginBars([.. bars.Select(f => new MarginEntry(f.Rule, f.RelativeMargin!.Value, Wording.Figure(f.Margin, f.Unit), f.Status))]),
                "Worst margin of each rule as a share of what the rule allows: to the right what is left, to the left by how much it fails (outlined where waived; an arrow goes on beyond 100 %).",
                "Bars of the worst margin of each rule about zero, from " + bars[0].Rule + " to " + bars[^1].Rule));
        }
        var subsections = ImmutableArray.CreateBuilder<Section>();
        var left = EntriesInAll;
        AddGroup(Anchors.FailedMust, "Rules that must hold and fail", f => f.Status == FindingStatus.Fail && f.Severity == Severity.Must);
        AddGroup(Anchors.UncheckedMust, "Rules that must hold and could not be judged", f => f.Status == FindingStatus.Unchecked && f.Severity == Severity.Must);
        AddGroup(Anchors.FailedShould, "Recommendations that are not met", f => f.Status == FindingStatus.Fail && f.Severity == Severity.Should);
        AddGroup(Anchors.UncheckedShould, "Recommendations that could not be judged", f => f.Status == FindingStatus.Unchecked && f.Severity == Severity.Should);
        if (subsections.Count == 0)
            blocks.Add(new Paragraph(result.Counts.Total == 0 ? "No rule was judged." : "No finding fails and none is left unchecked."));
        return new Section(Anchors.Findings, "Findings", blocks.ToImmutable(), subsections.ToImmutable());

        void AddGroup(string anchor, string heading, Func<Finding, bool> belongs)
        {
            var findings = result.Findings.Where(belongs).ToList();
            if (findings.Count > 0)
                subsections.Add(new Section(anchor, heading, Entries(findings, judgements, ref left), []));
        }
    }

    private static ImmutableArray<Block> Entries(List<Finding> findings, Judgements judgements, ref int left)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        foreach (var rule in findings.GroupBy(f => f.Rule))
        {
            if (left <= 0)
                break;
            var shown = rule.Take(Math.Min(EntriesOfARule, left)).ToList();
            left -= shown.Count;
            blocks.AddRange(shown.Select(f => (Block)EntryOf(f, judgements)));
            var more = rule.Count() - shown.Count;
            if (more > 0)
                blocks.Add(new Paragraph(RichText.Of(
                    new Run($"… and {Wording.Count(more, "more finding", "more findings")} of ", Emphasis.Quiet), new Run(rule.Key, Emphasis.Quiet, judgements.AnchorOf(rule.Key)))));
        }
        var shownInAll = blocks.OfType<Entry>().Count();
        if (left <= 0 && shownInAll < findings.Count)
            blocks.Add(new Paragraph($"Of {Wording.Count(findings.Count, "finding", "findings")} {shownInAll} are shown here; the others are in the tables of their rules and in the attached results."));
        return blocks.ToImmutable();
    }

    private static Entry EntryOf(Finding finding, Judgements judgements)
    {
        var title = RichText.Of(new Run(finding.Rule, Emphasis.Strong, judgements.AnchorOf(finding.Rule)), new Run("  " + finding.Kind + "  ", Emphasis.Quiet), new Run(finding.Subject));
        var figures = ImmutableArray.CreateBuilder<(string, string)>();
        if (finding.Value is not null)
            figures.Add(("value", Wording.Figure(finding.Value, finding.Unit)));
        if (finding.LowerLimit is not null || finding.UpperLimit is not null)
            figures.Add(("limit", Wording.Limit(finding)));
        if (finding.Margin is not null)
            figures.Add(("margin", Wording.Figure(finding.Margin, finding.Unit)));
        if (finding.Spread is { } spread)
            figures.Add(("holds with", Wording.Percent(spread.Probability, 1)));

        var details = ImmutableArray.CreateBuilder<(string, RichText)>();
        if (finding.Fix is { } fix)
            details.Add(("Fix", RichText.In(Wording.Signs(fix.Text), Emphasis.Strong)));
        if (finding.RuleReason.Length > 0)
            details.Add(("Why", finding.RuleReason));
        if (finding.Method.Length > 0)
            details.Add(("Method", RichText.In(finding.Method, Emphasis.Quiet)));
        var explanation = finding.UncheckedReason.Length > 0 && !finding.Explanation.Contains(finding.UncheckedReason, StringComparison.Ordinal)
            ? $"{finding.Explanation} Reason: {finding.UncheckedReason}."
            : finding.Explanation;
        return new Entry(finding.Status, title, figures.ToImmutable(), finding.RelativeMargin, Wording.Signs(explanation), details.ToImmutable());
    }
}
