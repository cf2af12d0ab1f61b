using System.Collections.Immutable;
using System.Globalization;
using StackTiming.Reports.Documents;

namespace StackTiming.Reports.Compliance;

/// <summary>
/// Builds the report that an engineer signs: the verdict first, what fails and what would mend it, then everything a reviewer needs to
/// follow each number back. Its length is bounded: of very large boards the worst is shown, and the rest is in the attached results.
/// </summary>
public static class ComplianceReport
{
    /// <summary>Builds the report.</summary>
    /// <param name="input">What it is built from.</param>
    public static ReportDocument Build(ReportInput input)
    {
        var result = input.Result;
        var judgements = new Judgements(result);
        var board = result.Board.Length > 0 ? result.Board : "Board without a name";
        var revision = result.Revision.Length > 0 ? "Revision " + result.Revision : "";

        var sections = ImmutableArray.CreateBuilder<Section>();
        sections.Add(new Section(Anchors.Contents, "Contents", [new Contents(2)], []) { Numbering = Numbering.None, BeginsPage = true });
        sections.Add(FindingsSection.Build(result, judgements));
        sections.Add(StackUpSection.Build(result, input.ShowFields));
        if (!result.Groups.IsEmpty)
            sections.Add(MatchingSection.Build(result, judgements));
        if (!result.Waves.IsEmpty)
            sections.Add(WaveformSection.Build(result, judgements));
        sections.Add(RulesSection.Build(result, judgements));
        sections.Add(WaiverSection.Build(result, judgements));
        sections.Add(MethodSection.Build(input));
        sections.Add(CautionSection.Build(result));
        sections.AddRange(Appendices.Build(input));

        return new ReportDocument(
            $"Compliance report: {board}{(revision.Length > 0 ? ", " + revision.ToLowerInvariant() : "")}",
            "Impedance, timing, matching and reflections of the board against its rules",
            (board, (revision.Length > 0 ? revision + ", " : "") + input.Date.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture)),
            input.Date,
            FirstPage.Build(input, judgements),
            sections.ToImmutable(),
            input.ResultsJson is { } json ? [new Attachment("results.json", "application/json", "Results of the check, machine-readable", json)] : [])
        {
            Producer = input.Tool.ToString(),
        };
    }
}
