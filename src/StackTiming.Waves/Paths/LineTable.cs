using System.Collections.Immutable;
using StackTiming.Lines.Loss;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Nets.Lengths;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Waves.Paths;

/// <summary>The lines of a board, each computed once however many traces use it.</summary>
public sealed class LineTable
{
    private readonly Dictionary<LineKey, (BoardLine? Line, string Objection)> lines;

    private LineTable(Dictionary<LineKey, (BoardLine?, string)> lines, string calculatorName, double? frequencyHertz)
    {
        (this.lines, CalculatorName, FrequencyHertz) = (lines, calculatorName, frequencyHertz);
    }

    /// <summary>Name of the calculator that computed the lines.</summary>
    public string CalculatorName { get; }

    /// <summary>Frequency of the lines, Hz; null for lossless lines with Dk as stated.</summary>
    public double? FrequencyHertz { get; }

    /// <summary>The lines that could be computed, by layer, width and gap.</summary>
    public IEnumerable<BoardLine> Lines =>
        lines.Values.Where(l => l.Line is not null).Select(l => l.Line!)
            .OrderBy(l => l.Key.Layer, StringComparer.Ordinal).ThenBy(l => l.Key.WidthMetres).ThenBy(l => l.Key.GapMetres);

    /// <summary>The different lines that the traces of a list use, in the order of their first rows.</summary>
    /// <param name="lengths">The list.</param>
    public static ImmutableArray<LineKey> KeysOf(LengthList lengths)
    {
        var seen = new HashSet<LineKey>();
        var keys = ImmutableArray.CreateBuilder<LineKey>();
        var last = default(LineKey);
        foreach (ref readonly var segment in lengths.Segments)
        {
            if (segment.Kind != SegmentKind.Trace || LineKey.Of(segment) is var key && key == last)
                continue;
            last = LineKey.Of(segment);
            if (seen.Add(last))
                keys.Add(last);
        }
        return keys.DrainToImmutable();
    }

    /// <summary>Computes lines, several at a time.</summary>
    /// <param name="stackUp">The stack-up.</param>
    /// <param name="keys">The lines.</param>
    /// <param name="calculator">Closed forms or the field solver.</param>
    /// <param name="frequencyHertz">Frequency of Dk, Df and losses, Hz; null for lossless lines with Dk as stated.</param>
    /// <param name="cancellation">Stops the work.</param>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    public static LineTable Build(
        StackUp stackUp, ImmutableArray<LineKey> keys, ILineCalculator calculator, double? frequencyHertz, CancellationToken cancellation = default)
    {
        var results = new (BoardLine? Line, string Objection)[keys.Length];
        var options = new ParallelOptions { CancellationToken = cancellation, MaxDegreeOfParallelism = Environment.ProcessorCount };
        Parallel.For(0, keys.Length, options, i => results[i] = Solve(stackUp, keys[i], calculator, frequencyHertz));
        var lines = new Dictionary<LineKey, (BoardLine?, string)>(keys.Length);
        for (var i = 0; i < keys.Length; i++)
            lines[keys[i]] = results[i];
        return new LineTable(lines, calculator.Name, frequencyHertz);
    }

    /// <summary>The line of a trace.</summary>
    /// <param name="key">Layer, width and gap.</param>
    /// <param name="objection">Why there is none, in a sentence without a full stop; empty where there is one.</param>
    public BoardLine? Find(LineKey key, out string objection)
    {
        if (!lines.TryGetValue(key, out var found))
        {
            objection = FormattableString.Invariant($"no line of {1e3 * key.WidthMetres:0.####} mm on {key.Layer} has been computed");
            return null;
        }
        objection = found.Objection;
        return found.Line;
    }

    private static (BoardLine?, string) Solve(StackUp stackUp, LineKey key, ILineCalculator calculator, double? frequencyHertz)
    {
        var problems = new ProblemList();
        var request = new SectionRequest(default, key.Layer, key.WidthMetres)
        {
            PairGapMetres = key.GapMetres > 0 ? key.GapMetres : null,
            FrequencyHertz = frequencyHertz,
        };
        if (SectionBuilder.Build(stackUp, request, problems) is not { } section)
            return (null, problems.Items.First(p => p.IsError).Message);
        if (calculator.Calculate(section) is not { } solution)
            return (null, calculator.Objection(section) ?? "there is no method for this cross-section");
        var pair = key.GapMetres > 0 ? PairModes.Of(solution) : null;
        var atFrequency = frequencyHertz is { } hertz ? IncrementalInductance.At(section, hertz, calculator) : null;
        return (new BoardLine(key, solution, pair, atFrequency), "");
    }
}
