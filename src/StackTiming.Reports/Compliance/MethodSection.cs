using StackTiming.Reports.Documents;
using StackTiming.Waves.Methods;

namespace StackTiming.Reports.Compliance;

/// <summary>The methods behind the figures, with their sources, ranges and errors.</summary>
internal static class MethodSection
{
    /// <summary>The section.</summary>
    /// <param name="input">What the report is built from.</param>
    public static Section Build(ReportInput input)
    {
        var used = input.Result.Methods;
        if (used.IsEmpty)
            return new Section(Anchors.Methods, "Methods", [new Paragraph("No method was used.")], []);
        var known = input.Methods.GroupBy(m => m.Id).ToDictionary(g => g.Key, g => g.First());
        var table = new Table(
            [new Column("Method"), new Column("Source", Grows: true), new Column("Holds for"), new Column("Measured error"), new Column("Worst in use", Alignment.Right), new Column("Used for")],
            [.. used.Select(m =>
            {
                var description = known.GetValueOrDefault(m.Id);
                return Row.Of(
                    RichText.Of(new Run(description?.Name ?? m.Id, Emphasis.Strong)), description?.Source ?? "", description?.Validity ?? "",
                    description is { MeasuredError.Length: > 0 } ? description.MeasuredError : "–",
                    m.WorstRelativeError > 0 ? Wording.Percent(m.WorstRelativeError, 2) : "exact", m.UsedFor);
            })],
            "Measured error: the largest error against independent reference cases, recomputed by the tests of the program.");
        var further = new Table(
            [new Column("Method"), new Column("Computes"), new Column("Source", Grows: true), new Column("Holds for"), new Column("Held by tests to")],
            [.. SupportingMethod.All.Select(m => Row.Of(RichText.Of(new Run(m.Name, Emphasis.Strong)), m.Purpose, m.Source, m.Validity, m.Proof))],
            "Methods behind waveforms, losses, vias and materials.");
        return new Section(Anchors.Methods, "Methods", [table, further], []);
    }
}
