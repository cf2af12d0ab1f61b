using System.Collections.Immutable;
using StackTiming.Reports.Documents;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Compliance;

/// <summary>What was assumed, and what this report is not.</summary>
internal static class CautionSection
{
    /// <summary>The cautions in short, for the first page.</summary>
    public static RichText Short { get; } = RichText.Of(
        new Run("These results are predictions. The fabricator's controlled-impedance process and measured coupons decide. Creepage, clearance, current-carrying capacity and safety insulation are "),
        new Run("not", Emphasis.Strong),
        new Run(" checked. A board whose failure can hurt somebody needs review by qualified people under the rules that apply to the product. "),
        new Run("Assumptions and cautions", Emphasis.Plain, Anchors.Cautions));

    private static readonly ImmutableArray<RichText> Cautions =
    [
        "These results are predictions made from the input files listed in the appendix. Whatever those files do not say, or say wrongly, this report does not know.",
        "The fabricator's controlled-impedance process and the measured coupons of the panel decide whether the impedances were met.",
        "A rule that is not written is not checked. A finding that could not be judged is marked UNCHECKED and never counts as passed.",
        "Creepage, clearance, current-carrying capacity and safety insulation are not checked here.",
        "Boards whose failure can hurt somebody need review by qualified people under the rules that apply to the product.",
        "A signature on the first page belongs to the files whose digests the appendix lists, and to no others.",
    ];

    /// <summary>The section.</summary>
    /// <param name="result">The results of the check.</param>
    public static Section Build(CheckResult result) => new(Anchors.Cautions, "Assumptions and cautions", [],
    [
        new Section("assumptions", "Assumptions",
            [result.Assumptions.IsEmpty ? new Paragraph("Nothing was assumed beyond the input files.") : new Bullets([.. result.Assumptions.Take(60).Select(a => (RichText)Wording.Signs(a))])], []),
        new Section("limits", "Cautions", [new Bullets(Cautions)], []),
    ]);
}
