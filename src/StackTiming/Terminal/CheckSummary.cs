using System.Globalization;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;

namespace StackTiming.Terminal;

/// <summary>What a check says on the terminal: the verdict, what fails or could not be judged with what would mend it, and the phases.</summary>
internal static class CheckSummary
{
    private const int MostFindings = 40;

    /// <summary>Writes it.</summary>
    /// <param name="result">The results.</param>
    /// <param name="output">Where to.</param>
    public static void Write(CheckResult result, TextWriter output)
    {
        var console = Tables.On(output);
        var open = result.Findings.Where(f => f.Status is FindingStatus.Fail or FindingStatus.Unchecked or FindingStatus.Waived).ToArray();
        if (open.Length > 0)
        {
            var table = Tables.Of("Status", "Rule", "Subject", ">Value", ">Limit", ">Margin", "What it means, and what would mend it");
            foreach (var finding in open.Take(MostFindings))
            {
                table.Add(
                    StatusWord(finding), finding.Rule, finding.Subject, Figure(finding.Value, finding), Limit(finding), Figure(finding.Margin, finding),
                    finding.Status == FindingStatus.Unchecked ? finding.UncheckedReason : finding.Explanation + (finding.Fix is { } fix ? " → " + fix.Text : ""));
            }
            console.Write(table);
            if (open.Length > MostFindings)
                output.WriteLine($"and {open.Length - MostFindings} more; the results file (--json) and the report (--report) hold them all");
        }
        var counts = result.Counts;
        output.WriteLine($"{ProblemPrinter.Printable(result.Board)} {ProblemPrinter.Printable(result.Revision)}: {result.NetCount} nets, {result.SegmentCount} segments, {result.Lines.Length} line sections, {result.Rules.Length} rules");
        output.WriteLine($"{counts.Passed} pass, {counts.Failed} fail, {counts.Waived} waived, {counts.Unchecked} unchecked");
        output.WriteLine(string.Join(", ", result.Phases.Select(p => string.Create(CultureInfo.InvariantCulture, $"{p.Name} {p.Elapsed.TotalSeconds:0.00} s"))));
        output.WriteLine(result.Verdict == Verdict.Pass ? "Verdict: PASS" : "Verdict: FAIL");
    }

    private static string StatusWord(Finding finding) => finding.Status switch
    {
        FindingStatus.Fail => finding.Severity == Severity.Must ? "FAIL" : "fail (should)",
        FindingStatus.Waived => "waived",
        _ => "unchecked",
    };

    private static string Figure(double? value, Finding finding) => value is { } v ? Text(v, finding) : "";

    private static string Limit(Finding finding) => (finding.LowerLimit, finding.UpperLimit) switch
    {
        ({ } low, { } high) => $"{Text(low, finding)} … {Text(high, finding)}",
        ({ } low, null) => $"≥ {Text(low, finding)}",
        (null, { } high) => $"≤ {Text(high, finding)}",
        _ => "",
    };

    private static string Text(double value, Finding finding) => finding.Unit.Show(finding.Unit.ToSi(value));
}
