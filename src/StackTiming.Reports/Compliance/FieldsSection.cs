using System.Collections.Immutable;
using System.Globalization;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Sections;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Figures;
using StackTiming.Rules.Results;
using StackTiming.Stackups.Reading;

namespace StackTiming.Reports.Compliance;

/// <summary>The fields around the single trace and around the pair of which most is routed: where the signals of the board travel.</summary>
internal static class FieldsSection
{
    // Two and a half points of a page a column: what print shows of a smooth map.
    private const int Columns = 100;

    /// <summary>The section, or nothing where the field solver did not judge the lines.</summary>
    /// <param name="result">The results of the check.</param>
    public static ImmutableArray<Section> Build(CheckResult result)
    {
        var most = result.Lines.Where(l => l.MethodId == FieldSolver.MethodId).GroupBy(l => l.GapMetres is null)
            .OrderByDescending(g => g.Key).Select(g => g.MaxBy(l => l.TotalLengthMetres)!);
        var figures = most.ToArray().AsParallel().AsOrdered().Select(l => Picture(result, l)).OfType<Block>().ToImmutableArray();
        return figures.IsEmpty ? [] : [new Section("fields", "Fields of the most routed lines", figures, [])];
    }

    private static Figure? Picture(CheckResult result, LineUse line)
    {
        var request = new SectionRequest(default, line.Layer, line.WidthMetres) { PairGapMetres = line.GapMetres };
        if (SectionBuilder.Build(result.StackUp, request, new ProblemList()) is not { } section)
            return null;
        var name = string.Create(CultureInfo.InvariantCulture, $"{line.Layer}, {line.WidthMetres * 1e3:0.000} mm wide")
            + (line.GapMetres is { } gap ? string.Create(CultureInfo.InvariantCulture, $", gap {gap * 1e3:0.000} mm") : "");
        try
        {
            var picture = SectionPictures.Of(name, FieldSolver.Default.Solve(section), Columns);
            return new Figure(
                new SectionFigure(picture),
                $"{name}, {Wording.Millimetres(line.TotalLengthMetres)} mm routed: equipotentials, charge, energy and power of the field at Dk as stated, and the return current in the planes.",
                $"Cross-section of a line on {line.Layer} with the field around it.");
        }
        catch (SectionNotSolvableException)
        {
            return null;
        }
    }
}
