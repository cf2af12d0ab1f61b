using System.Collections.Immutable;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Nets.Lengths;
using StackTiming.Rules.Boards;
using StackTiming.Rules.Results;
using StackTiming.Stackups.Reading;
using StackTiming.Waves.Paths;

namespace StackTiming.Rules.Checking;

/// <summary>The tables of a result that do not depend on its rules: lines and methods used, and what was assumed.</summary>
internal static class CheckTables
{
    /// <summary>The distinct lines of a board with how much of it uses them.</summary>
    public static ImmutableArray<LineUse> Lines(Board board, LineTable lines, ILineCalculator? secondOpinion)
    {
        var uses = new Dictionary<LineKey, (int Count, double Metres)>();
        foreach (ref readonly var segment in board.Lengths.Segments)
        {
            if (segment.Kind != SegmentKind.Trace)
                continue;
            var key = LineKey.Of(segment);
            var use = uses.GetValueOrDefault(key);
            uses[key] = (use.Count + 1, use.Metres + segment.LengthMetres);
        }
        return [.. lines.Lines.Select(l => Row(l, uses.GetValueOrDefault(l.Key)) with { CrossCheck = secondOpinion is null ? null : Compare(board, l, secondOpinion) })];
    }

    private static CrossCheck? Compare(Board board, BoardLine line, ILineCalculator secondOpinion)
    {
        var request = new SectionRequest(default, line.Key.Layer, line.Key.WidthMetres)
        {
            PairGapMetres = line.Key.GapMetres > 0 ? line.Key.GapMetres : null,
            FrequencyHertz = board.Assumed.FrequencyHertz,
        };
        if (SectionBuilder.Build(board.StackUp, request, new ProblemList()) is not { } section || secondOpinion.Calculate(section) is not { } second)
            return null;
        var ohms = line.Pair is null ? second.Z0Ohms : PairModes.Of(second).ZDiffOhms;
        var first = line.Pair?.ZDiffOhms ?? line.Solution.Z0Ohms;
        return new CrossCheck(second.MethodId, ohms, (ohms / first) - 1, second.RelativeError + line.Solution.RelativeError, !second.Warnings.IsEmpty);
    }

    private static LineUse Row(BoardLine line, (int Count, double Metres) use)
    {
        var solution = line.Solution;
        return new LineUse(
            line.Key.Layer, line.Key.WidthMetres, line.Key.GapMetres > 0 ? line.Key.GapMetres : null,
            solution.Z0Ohms, line.Pair?.ZDiffOhms, line.Pair?.EpsEffDiff ?? solution.EpsEff, line.DelaySecondsPerMetre,
            solution.EnergyShares, solution.MethodId, solution.RelativeError, solution.Warnings, use.Count, use.Metres);
    }

    /// <summary>The methods behind the lines.</summary>
    public static ImmutableArray<MethodUse> Methods(ImmutableArray<LineUse> lines) =>
    [
        .. lines.GroupBy(l => l.MethodId).OrderBy(g => g.Key, StringComparer.Ordinal)
            .Select(g => new MethodUse(g.Key, Sections(g.Count()), g.Max(l => l.RelativeError))),
    ];

    /// <summary>What was assumed where the inputs are silent.</summary>
    /// <param name="board">The board.</param>
    /// <param name="notes">What delays and waveforms assumed.</param>
    /// <param name="waves">Number of waveforms computed.</param>
    public static ImmutableArray<string> Assumptions(Board board, IEnumerable<string> notes, int waves)
    {
        var assumptions = ImmutableArray.CreateBuilder<string>();
        assumptions.Add(board.Assumed.FrequencyHertz is { } hertz
            ? $"Dk and Df are taken at {Gigahertz(hertz)} by the wideband Debye model."
            : "Dk and Df are taken as the stack-up states them, at the frequency that it states.");
        if (waves > 0)
        {
            assumptions.Add("Waveforms are computed without loss on the lines.");
            assumptions.Add(board.Assumed.Reference is null
                ? "Flight time counts from the driver into 50 ohm to the middle of its swing, because the board file states no reference load."
                : "Flight time counts from the driver into the reference load of the board file.");
        }
        foreach (var note in notes)
            assumptions.Add($"{char.ToUpperInvariant(note[0])}{note[1..]}.");
        return assumptions.ToImmutable();
    }

    private static string Sections(int count) => count == 1 ? "1 section" : $"{count} sections";

    private static string Gigahertz(double hertz) => (hertz * 1e-9).ToString("0.####", System.Globalization.CultureInfo.InvariantCulture) + " GHz";
}
