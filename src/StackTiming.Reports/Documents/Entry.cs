using System.Collections.Immutable;
using StackTiming.Rules.Findings;

namespace StackTiming.Reports.Documents;

/// <summary>A finding with its figures, its explanation and what would mend it; kept together on a page.</summary>
/// <param name="Status">Its status.</param>
/// <param name="Title">What was judged.</param>
/// <param name="Figures">Names and figures, such as value, limit and margin.</param>
/// <param name="RelativeMargin">The margin to draw as a bar, or null.</param>
/// <param name="Explanation">The finding in plain words.</param>
/// <param name="Details">Further lines with their names, such as the fix or the method.</param>
/// <param name="Anchor">Where links lead to, or null.</param>
public sealed record Entry(
    FindingStatus Status,
    RichText Title,
    ImmutableArray<(string Name, string Figure)> Figures,
    double? RelativeMargin,
    RichText Explanation,
    ImmutableArray<(string Name, RichText Text)> Details,
    string? Anchor = null) : Block;
