using System.Collections.Immutable;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Figures;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Compliance;

/// <summary>The delays of the groups that rules compare, charted.</summary>
internal static class MatchingSection
{
    private const int ChartsShown = 24;

    /// <summary>The section.</summary>
    /// <param name="result">The results of the check.</param>
    /// <param name="judgements">The findings by rule.</param>
    public static Section Build(CheckResult result, Judgements judgements)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.Add(new Paragraph("Matched in time, not in length: each mark is a net's delay from driver to receiver. Shaded is the window that the rule allows; a filled dot lies inside, an open diamond outside."));
        // The groups with failures come first when not all can be shown; what is shown keeps the order of the rules.
        var chosen = result.Groups.Select((g, i) => (Group: g, Index: i))
            .OrderBy(p => p.Group.Delays.All(d => d.Holds)).ThenBy(p => p.Index).Take(ChartsShown).OrderBy(p => p.Index);
        foreach (var (group, _) in chosen)
        {
            var chart = new MatchChart(group);
            var rule = result.Rules.FirstOrDefault(r => r.Id == group.Rule);
            var outside = group.Delays.Count(d => !d.Holds);
            var caption = RichText.Of(
                new Run(group.Rule, Emphasis.Strong, judgements.AnchorOf(group.Rule)),
                new Run($"  {group.Kind}, {group.Group}{(rule is null ? "" : ", " + Wording.Signs(rule.Limit))}. {(outside == 0 ? "All inside." : Wording.Count(outside, "net outside.", "nets outside."))}"
                    + (chart.Omitted > 0 ? $" {Wording.Count(chart.Omitted, "further net is", "further nets are")} not drawn: they lie deeper inside." : "")));
            blocks.Add(new Figure(chart, caption, $"Delays of {group.Delays.Length} nets of {group.Group} in picoseconds, {outside} outside the window"));
        }
        if (result.Groups.Length > ChartsShown)
            blocks.Add(new Paragraph($"… and {result.Groups.Length - ChartsShown} more groups, see the attached results."));
        return new Section(Anchors.Matching, "Matching", blocks.ToImmutable(), []) { BeginsPage = true };
    }
}
