using System.Globalization;
using StackTiming.Reports.Documents;

namespace StackTiming.Reports.Compliance;

/// <summary>The appendices: digests of the inputs, notes of the readers, elapsed times.</summary>
internal static class Appendices
{
    private const int InputsShown = 300;
    private const int NotesShown = 60;

    /// <summary>The appendices.</summary>
    /// <param name="input">What the report is built from.</param>
    public static IEnumerable<Section> Build(ReportInput input)
    {
        var result = input.Result;
        yield return new Section(Anchors.Digests, "Input files", [
            new Table(
                [new Column("Role"), new Column("File", Grows: true), new Column("SHA-256") { Wraps = false }],
                [.. result.Inputs.Take(InputsShown).Select(i => Row.Of(i.Role, i.Path, RichText.In(i.Sha256, Emphasis.Code)))],
                result.Inputs.Length > InputsShown ? $"… and {result.Inputs.Length - InputsShown} more, see the attached results" : ""),
            .. input.ResultsJson is null ? Array.Empty<Block>() : [new Paragraph("The complete results travel inside this file as the attachment results.json.")],
        ], [])
        { Numbering = Numbering.Appendix };

        if (!result.Notes.IsEmpty)
        {
            yield return new Section(Anchors.Notes, "Notes of the readers", [
                new Bullets([.. result.Notes.Take(NotesShown).Select(n => RichText.Of(
                    new Run(n.At + ": ", Emphasis.Quiet), new Run(n.Advice is null ? n.Message : $"{n.Message}; {n.Advice}")))]),
                .. result.Notes.Length > NotesShown ? [new Paragraph($"… and {result.Notes.Length - NotesShown} more.")] : Array.Empty<Block>(),
            ], [])
            { Numbering = Numbering.Appendix };
        }

        if (input.ShowTimings && !result.Phases.IsEmpty)
        {
            yield return new Section(Anchors.Timings, "Elapsed time", [
                new Table(
                    [new Column("Phase"), new Column("Work", Grows: true), new Column("Time, ms", Alignment.Right)],
                    [.. result.Phases.Select(p => Row.Of(p.Name, p.Work, p.Elapsed.TotalMilliseconds.ToString("0", CultureInfo.InvariantCulture)))]),
            ], [])
            { Numbering = Numbering.Appendix };
        }
    }
}
