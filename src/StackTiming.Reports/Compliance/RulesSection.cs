using System.Collections.Immutable;
using System.Globalization;
using StackTiming.Reports.Documents;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Compliance;

/// <summary>Every rule with its findings.</summary>
internal static class RulesSection
{
    private const int RulesListed = 500;
    private const int RulesInContents = 40;

    // About as many rows as fit on twenty pages are shared among the rules, so that the report of a very large board stays readable.
    private const int RowsInAll = 900;
    private const int LeastRowsOfARule = 4;
    private const int MostRowsOfARule = 40;

    // Of what holds, a reviewer needs the tightest; the rest is in the attached results.
    private const int PassesOfARule = 5;

    /// <summary>The section.</summary>
    /// <param name="result">The results of the check.</param>
    /// <param name="judgements">The findings by rule.</param>
    public static Section Build(CheckResult result, Judgements judgements)
    {
        if (result.Rules.IsEmpty)
            return new Section(Anchors.Rules, "Rules", [new Paragraph("The board names no rules.")], []);
        var rowsOfARule = Math.Clamp(RowsInAll / judgements.Tabled.Count, LeastRowsOfARule, MostRowsOfARule);
        var listed = result.Rules.Take(RulesListed).ToList();
        var summary = new Table(
            [
                new Column("Rule") { Wraps = false }, new Column("Kind"), new Column("Nets", Grows: true), new Column("Limit"), new Column("Severity"), new Column("Pass", Alignment.Right),
                new Column("Fail", Alignment.Right), new Column("Waived", Alignment.Right), new Column("Unch.", Alignment.Right), new Column("Worst margin", Alignment.Right),
            ],
            [.. listed.Select(r => SummaryRow(r, judgements))],
            result.Rules.Length > listed.Count ? $"… and {result.Rules.Length - listed.Count} more rules, see the attached results" : "");
        ImmutableArray<Block> blocks = judgements.Tabled.Count < result.Rules.Length
            ? [summary, new Paragraph($"The {judgements.Tabled.Count} rules with the worst findings have a table of their own; the findings of all are in the attached results.")]
            : [summary];
        return new Section(Anchors.Rules, "Rules and their findings", blocks,
            [.. judgements.Tabled.Select(r => RuleSection(r, judgements, rowsOfARule) with { InContents = result.Rules.Length <= RulesInContents })])
        { BeginsPage = true };
    }

    private static Row SummaryRow(RuleSummary rule, Judgements judgements)
    {
        var findings = judgements.Of(rule.Id);
        string Count(FindingStatus status)
        {
            var count = findings.Count(f => f.Status == status);
            return count == 0 ? "–" : count.ToString(CultureInfo.InvariantCulture);
        }
        var worst = findings.Where(f => f.Margin is not null).MinBy(f => f.RelativeMargin);
        return Row.Of(
            RichText.LinkTo(rule.Id, judgements.AnchorOf(rule.Id)), rule.Kind, Short(rule.Nets), Wording.Signs(rule.Limit), rule.Severity == Severity.Must ? "must" : "should",
            Count(FindingStatus.Pass), findings.Exists(f => f.Status == FindingStatus.Fail) ? RichText.In(Count(FindingStatus.Fail), Emphasis.Strong) : "–",
            Count(FindingStatus.Waived), Count(FindingStatus.Unchecked), worst is null ? "–" : Wording.Figure(worst.Margin, worst.Unit));
    }

    // The table of the rule names them all.
    private static string Short(string nets) => nets.Length <= 32 ? nets : nets[..31] + "…";

    private static Section RuleSection(RuleSummary rule, Judgements judgements, int rows)
    {
        var findings = judgements.Of(rule.Id);
        var facts = ImmutableArray.CreateBuilder<(string, RichText)>();
        facts.Add(("Limit", $"{Wording.Signs(rule.Limit)} on {rule.Nets} ({(rule.Severity == Severity.Must ? "must" : "should")})"));
        if (rule.Reason.Length > 0)
            facts.Add(("Reason", rule.Reason));
        facts.Add(("Source", RichText.Of(new Run(rule.Source.Length > 0 ? rule.Source + "  " : ""), new Run("written at " + rule.At, Emphasis.Quiet))));

        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.Add(new KeyValues(facts.ToImmutable()));
        blocks.Add(findings.Count == 0 ? new Paragraph("The rule has no findings.") : FindingTable(findings, rows));
        return new Section(judgements.AnchorOf(rule.Id), $"{rule.Id}: {rule.Kind}", blocks.ToImmutable(), []);
    }

    private static Table FindingTable(List<Finding> findings, int most)
    {
        // Passes stand behind everything else.
        var rows = Math.Min(most, findings.Count(f => f.Status != FindingStatus.Pass) + PassesOfARule);
        return new Table(
        [
            new Column("Status"), new Column("Subject", Grows: true), new Column("Value", Alignment.Right), new Column("Limit", Alignment.Right),
            new Column("Margin", Alignment.Right), new Column("Share of limit"),
        ],
        [.. findings.Take(rows).Select(f => Row.Of(
            new StatusCell(f.Status), f.UncheckedReason.Length > 0 ? RichText.Of(new Run(f.Subject), new Run("  " + f.UncheckedReason, Emphasis.Quiet)) : f.Subject,
            Wording.Figure(f.Value, f.Unit), Wording.Limit(f), Wording.Figure(f.Margin, f.Unit), new MarginCell(f.RelativeMargin)))],
        findings.Count > rows ? $"… and {Wording.Count(findings.Count - rows, "more finding", "more findings")} with larger margins, see the attached results" : "");
    }
}
