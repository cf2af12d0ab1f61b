using System.CommandLine;
using System.Diagnostics;
using System.Globalization;
using System.Text;
using StackTiming.Reports.Compliance;
using StackTiming.Reports.Pdf;
using StackTiming.Reports.Results;
using StackTiming.Rules.Boards;
using StackTiming.Rules.Checking;
using StackTiming.Rules.Kinds;
using StackTiming.Rules.Results;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Reading;
using StackTiming.Terminal;

namespace StackTiming.Commands;

/// <summary><c>stacktiming check board.yaml</c>: judges a board against its rules and writes the report.</summary>
internal static class CheckCommand
{
    /// <summary>The command.</summary>
    /// <param name="cancellation">Cancelled when the user wants to stop.</param>
    public static Command Create(CancellationToken cancellation)
    {
        var board = new Argument<string>("board") { Description = "The board file (board.yaml)." };
        var report = new Option<string?>("--report") { Description = "Write the compliance report as PDF.", HelpName = "file.pdf" };
        var json = new Option<string?>("--json") { Description = "Write the results as JSON.", HelpName = "file.json" };
        var csv = new Option<string?>("--csv") { Description = "Write the findings as a table.", HelpName = "file.csv" };
        var junit = new Option<string?>("--junit") { Description = "Write the findings as JUnit XML for a build server.", HelpName = "file.xml" };
        var fields = new Option<bool>("--fields") { Description = "Draw the fields of the most routed lines in the report; takes about a second." };
        var paper = new Option<string>("--paper") { Description = "Paper of the report: a4 or letter.", DefaultValueFactory = _ => "a4", HelpName = "paper" };
        paper.AcceptOnlyFromAmong("a4", "letter");
        var date = new Option<string?>("--date") { Description = "Day of the check, against which waivers are held (default: today).", HelpName = "yyyy-mm-dd" };
        var method = MethodOption.Create(MethodOption.Field, withBoth: false);
        var command = new Command("check", "Check a board against its rules: verdict, findings and compliance report.")
        {
            board, report, json, csv, junit, fields, paper, date, method,
        };
        command.SetAction(result => Run(
            result.GetRequiredValue(board),
            new Wanted(result.GetValue(report), result.GetValue(json), result.GetValue(csv), result.GetValue(junit), result.GetValue(paper) == "letter", result.GetValue(fields)),
            result.GetValue(date), result.GetRequiredValue(method),
            result.InvocationConfiguration.Output, result.InvocationConfiguration.Error, cancellation));
        HelpWithExamples.AddTo(command, Help);
        return command;
    }

    private sealed record Wanted(string? Report, string? Json, string? Csv, string? JUnit, bool Letter, bool Fields);

    private static int Run(
        string path, Wanted wanted, string? dateText, string method, TextWriter output, TextWriter error, CancellationToken cancellation)
    {
        var today = DateOnly.FromDateTime(DateTime.Today);
        if (dateText is not null && !DateOnly.TryParseExact(dateText, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out today))
        {
            error.WriteLine($"error: --date '{ProblemPrinter.Printable(Suggestion.Shorten(dateText))}' is not a day; write it as 2026-12-01");
            return ExitCode.WrongInput;
        }
        var clock = Stopwatch.StartNew();
        var problems = new ProblemList();
        var board = BoardReader.Read(path, problems, cancellation);
        ProblemPrinter.Print(problems, error);
        if (board is null)
            return ExitCode.WrongInput;
        var read = new PhaseTime("read", clock.Elapsed, $"{board.Inputs.Length} files");
        var result = CheckProgressBar.Run(progress => BoardCheck.Run(board, new CheckOptions(MethodOption.Calculator(method), today)
        {
            SecondOpinion = MethodOption.SecondOpinion(method),
            Progress = progress,
            Cancellation = cancellation,
            Before = [read],
        }));
        if (!Write(result, wanted, today, error, cancellation, out var writing))
            return ExitCode.WrongInput;
        CheckSummary.Write(writing is null ? result : result with { Phases = result.Phases.Add(writing) }, output);
        return result.Verdict == Verdict.Pass ? ExitCode.Holds : ExitCode.RuleFails;
    }

    private static bool Write(CheckResult result, Wanted wanted, DateOnly date, TextWriter error, CancellationToken cancellation, out PhaseTime? phase)
    {
        phase = null;
        if (wanted is { Report: null, Json: null, Csv: null, JUnit: null })
            return true;
        var clock = Stopwatch.StartNew();
        var json = new MemoryStream();
        ResultsJson.Write(result, ToolVersion.Identity, json);
        var bytes = json.ToArray();
        var written = Outputs.Write(
            error, cancellation,
            (wanted.Json, s => s.Write(bytes)),
            (wanted.Csv, s => FindingsCsv.Write(result, s)),
            (wanted.JUnit, s => JUnitXml.Write(result, s)),
            (wanted.Report, s => PdfReportWriter.Write(
                ComplianceReport.Build(new ReportInput(result, ToolVersion.Identity, date) { ResultsJson = bytes, ShowFields = wanted.Fields }), s,
                wanted.Letter ? PageFormat.Letter : PageFormat.A4)));
        phase = new PhaseTime("write", clock.Elapsed, "outputs");
        return written;
    }

    private static string Help()
    {
        var text = new StringBuilder("""
            Examples:
              stacktiming check board.yaml
              stacktiming check board.yaml --report board.pdf --json board.json
              stacktiming check board.yaml --junit results.xml --date 2026-12-01

            Exit codes: 0 all rules hold, 1 a rule fails or could not be judged, 2 wrong input, 3 the program failed, 130 interrupted.

            Keys of every rule:

            """);
        foreach (var key in RuleKind.CommonKeys)
            AppendKey(text, key);
        text.Append("\nKinds of rules:\n");
        foreach (var kind in RuleKinds.All)
        {
            text.Append(CultureInfo.InvariantCulture, $"\n  {kind.Name}: {kind.Summary}\n");
            foreach (var key in kind.Keys)
                AppendKey(text, key);
        }
        return text.ToString();
    }

    private static void AppendKey(StringBuilder text, RuleKeyDoc key) => text.Append(
        CultureInfo.InvariantCulture, $"    {key.Key + ": " + key.Value,-36} {(key.Required ? "" : "(optional) ")}{key.Meaning}\n");
}
