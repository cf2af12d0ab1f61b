using System.Collections.Immutable;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Findings;

/// <summary>
/// The judgement of one rule on one subject. Figures are in <see cref="Unit"/>; <c>Unit.ToSi</c> turns them into SI. A margin is positive
/// where the rule holds, and is the distance to the nearest limit.
/// </summary>
public sealed record Finding
{
    /// <summary>Id of the rule.</summary>
    public required string Rule { get; init; }

    /// <summary>Kind of the rule, such as <c>match</c>; <c>waiver</c> for findings about waivers.</summary>
    public required string Kind { get; init; }

    /// <summary>What was judged, in words: a net, a pair, a receiver on a net, a section.</summary>
    public required string Subject { get; init; }

    /// <summary>The outcome.</summary>
    public required FindingStatus Status { get; init; }

    /// <summary>Why the rule could not be judged; empty unless <see cref="FindingStatus.Unchecked"/> (or waived from it).</summary>
    public string UncheckedReason { get; init; } = "";

    /// <summary>The value found, in <see cref="Unit"/>; null where nothing could be measured.</summary>
    public double? Value { get; init; }

    /// <summary>Lowest value allowed, in <see cref="Unit"/>; null where there is none.</summary>
    public double? LowerLimit { get; init; }

    /// <summary>Highest value allowed, in <see cref="Unit"/>; null where there is none.</summary>
    public double? UpperLimit { get; init; }

    /// <summary>Distance of the value to the nearest limit, in <see cref="Unit"/>: negative where the rule fails.</summary>
    public double? Margin { get; init; }

    /// <summary>
    /// Margin as a share of what the rule allows (half of a two-sided window, otherwise the limit itself), so that findings of different
    /// units can be ranked: 1 is everything left, 0 at the limit, −1 off by as much again. Null where there is no margin.
    /// </summary>
    public double? RelativeMargin { get; init; }

    /// <summary>Unit of the figures.</summary>
    public DisplayUnit Unit { get; init; }

    /// <summary>Scatter of the margin, once tolerances are computed.</summary>
    public MarginSpread? Spread { get; init; }

    /// <summary>How the value was computed: the method of the lines and the way to the figure.</summary>
    public string Method { get; init; } = "";

    /// <summary>The finding in plain words.</summary>
    public required string Explanation { get; init; }

    /// <summary>What would mend it, where something computable would.</summary>
    public Fix? Fix { get; init; }

    /// <summary>What the rule means for the verdict.</summary>
    public required Severity Severity { get; init; }

    /// <summary>Why the rule exists, as its file says; empty where it does not.</summary>
    public string RuleReason { get; init; } = "";

    /// <summary>Where its limit comes from, as its file says; empty where it does not.</summary>
    public string RuleSource { get; init; } = "";

    /// <summary>Where the rule (or waiver) is written.</summary>
    public required FilePosition RuleAt { get; init; }

    /// <summary>The nets concerned, in natural order; the keys into the delay tables and waveforms of the result.</summary>
    public required ImmutableArray<string> Nets { get; init; }

    /// <summary>The waiver that accepts it; null unless <see cref="FindingStatus.Waived"/>.</summary>
    public WaiverNote? Waiver { get; init; }
}
