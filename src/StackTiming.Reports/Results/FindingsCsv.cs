using System.Globalization;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Results;

/// <summary>Writes the findings of a check as a table, one row a finding, worst first.</summary>
public static class FindingsCsv
{
    private static readonly string[] Header =
    [
        "rule", "kind", "subject", "severity", "status", "value", "lower limit", "upper limit", "margin", "unit", "relative margin", "explanation", "fix",
    ];

    /// <summary>Writes the table.</summary>
    /// <param name="result">The results.</param>
    /// <param name="output">Where to.</param>
    public static void Write(CheckResult result, Stream output) => CsvTable.Write(Header, Rows(result), output);

    private static IEnumerable<string[]> Rows(CheckResult result)
    {
        foreach (var finding in result.Findings)
        {
            yield return
            [
                finding.Rule, finding.Kind, finding.Subject, StatusName.Of(finding.Severity), StatusName.Of(finding.Status), Figure(finding.Value),
                Figure(finding.LowerLimit), Figure(finding.UpperLimit), Figure(finding.Margin), finding.Unit.Symbol ?? "", Figure(finding.RelativeMargin),
                finding.UncheckedReason.Length > 0 ? finding.UncheckedReason : finding.Explanation, finding.Fix?.Text ?? "",
            ];
        }
    }

    private static string Figure(double? value) =>
        value is { } number && double.IsFinite(number) ? number.ToString("G9", CultureInfo.InvariantCulture) : "";
}
