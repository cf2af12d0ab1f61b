using System.Collections.Immutable;
using System.Globalization;
using StackTiming.Reports.Documents;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Compliance;

/// <summary>What was accepted although it fails, by whom, why and for how long.</summary>
internal static class WaiverSection
{
    private const int RowsShown = 100;

    /// <summary>The section.</summary>
    /// <param name="result">The results of the check.</param>
    /// <param name="judgements">The findings by rule.</param>
    public static Section Build(CheckResult result, Judgements judgements)
    {
        var waived = result.Findings.Where(f => f.Waiver is not null).ToList();
        var faults = result.Findings.Where(f => f.Kind == "waiver" && f.Waiver is null).ToList();
        var blocks = ImmutableArray.CreateBuilder<Block>();
        if (waived.Count == 0)
        {
            blocks.Add(new Paragraph("No finding is waived."));
        }
        else
        {
            blocks.Add(new Table(
                [
                    new Column("Rule"), new Column("Subject"), new Column("Margin", Alignment.Right), new Column("Reason", Grows: true),
                    new Column("Approved by"), new Column("Until"), new Column("Written at"),
                ],
                [.. waived.Take(RowsShown).Select(f => Row.Of(
                    RichText.LinkTo(f.Rule, judgements.AnchorOf(f.Rule)), f.Subject, Wording.Figure(f.Margin, f.Unit), f.Waiver!.Reason, f.Waiver.ApprovedBy,
                    f.Waiver.Until?.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture) ?? "not limited", RichText.In(f.Waiver.At.ToString(), Emphasis.Quiet)))],
                waived.Count > RowsShown ? $"… and {waived.Count - RowsShown} more, see the attached results" : ""));
        }
        if (faults.Count > 0)
        {
            blocks.Add(new Caption("Waivers that do not count"));
            blocks.Add(new Bullets([.. faults.Take(RowsShown).Select(f => (RichText)$"{f.Rule}: {f.Explanation}")]));
        }
        return new Section(Anchors.Waivers, "Waivers", blocks.ToImmutable(), []);
    }
}
