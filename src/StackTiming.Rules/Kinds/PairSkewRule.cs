using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Results;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>Skew between the members of a pair: at the receiver, anywhere along the pair, and the length that runs apart.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Pairs">The pairs.</param>
/// <param name="MaxSeconds">Largest skew at the receiver, s, or null.</param>
/// <param name="AlongSeconds">Largest skew at any point where the pair runs side by side, s, or null.</param>
/// <param name="UncoupledMetres">Longest trace of a member that runs apart from the other, metres, or null.</param>
/// <param name="Query">Which delays.</param>
public sealed record PairSkewRule(
    RuleHeader Header, ImmutableArray<PairRef> Pairs, double? MaxSeconds, double? AlongSeconds, double? UncoupledMetres, DelayQuery Query) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "pair-skew",
        "Skew inside a differential pair: at the receiver (max), anywhere along the pair (along), and the trace length that runs apart (uncoupled).",
        "delay of the positive minus that of the negative member; along: at every point where the two run side by side",
        [
            RuleKeys.Pair,
            new("max", "5 ps", false, "largest skew at the receiver; at least one of max, along and uncoupled"),
            new("along", "8 ps", false, "largest skew at any point where the pair runs side by side"),
            new("uncoupled", "4 mm", false, "longest trace length of either member without a gap to the other"),
            RuleKeys.Drive, RuleKeys.At,
        ],
        Read);

    /// <inheritdoc/>
    public override string NetsText => string.Join(", ", Pairs.Select(p => p.Name));

    /// <inheritdoc/>
    public override string LimitText => string.Join(", ", new[]
    {
        MaxSeconds is { } max ? $"at most {DisplayUnit.Picoseconds.Show(max)}" : null,
        AlongSeconds is { } along ? $"at most {DisplayUnit.Picoseconds.Show(along)} along the pair" : null,
        UncoupledMetres is { } apart ? $"at most {DisplayUnit.Millimetres.Show(apart)} apart" : null,
    }.Where(t => t is not null));

    /// <inheritdoc/>
    public override IEnumerable<NetNeed> Needs() => Pairs.SelectMany(p => NetNeed.ForDelays([p.Positive, p.Negative], Query));

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        foreach (var pair in Pairs)
        {
            ImmutableArray<string> both = [pair.Positive, pair.Negative];
            var table = DelayTable.Collect(board, both, Query);
            if (!table.Missing.IsEmpty)
            {
                judgement.Unchecked(pair.Name, both, $"{table.Missing[0].Net}: {table.Missing[0].Reason}");
                continue;
            }
            foreach (var comparison in table.Comparisons)
                Judge(board, judgement, pair, both, comparison, table);
        }
    }

    private static PairSkewRule? Read(RuleReader reader, RuleHeader header)
    {
        var errors = reader.Map.Problems.ErrorCount;
        var pairs = reader.NeedPairs();
        var max = reader.Positive("max", Dimension.Time);
        var along = reader.Positive("along", Dimension.Time);
        var uncoupled = reader.NotNegative("uncoupled", Dimension.Length);
        var query = new DelayQuery(reader.Drive(null), reader.At(), DelayBasis.TimeOfFlight);
        if (reader.Map.Problems.ErrorCount > errors || pairs is null)
            return null;
        if (max is null && along is null && uncoupled is null)
        {
            reader.Map.Problems.Error(reader.Map.At, "none of 'max', 'along' and 'uncoupled' is given", "write max: 5 ps");
            return null;
        }
        return new PairSkewRule(header, [.. pairs], max, along, uncoupled, query);
    }

    private void Judge(
        IBoardPhysics board, Judgement judgement, PairRef pair, ImmutableArray<string> both, Comparison comparison, DelayTable table)
    {
        var positive = comparison.Delays.Where(d => d.Driven.Net == pair.Positive).ToArray();
        var negative = comparison.Delays.Where(d => d.Driven.Net == pair.Negative).ToArray();
        var name = comparison.To.Length == 0 ? pair.Name : $"{pair.Name} at {comparison.To}";
        if (positive.Length != 1 || negative.Length != 1)
        {
            judgement.Unchecked(name, both, $"it has {positive.Length} receivers on {pair.Positive} and {negative.Length} on "
                + $"{pair.Negative} there, so that it is not clear which belong together");
            return;
        }
        var p = positive[0];
        var n = negative[0];
        if (MaxSeconds is { } max)
            JudgeTotal(board, judgement, pair, name, both, p, n, max, table);
        if (AlongSeconds is null && UncoupledMetres is null)
            return;
        var run = PairRun.Of(p.Path, n.Path);
        if (AlongSeconds is { } along)
            JudgeAlong(board, judgement, name, both, run, along, table);
        if (UncoupledMetres is { } apart)
            JudgeApart(judgement, name, pair, both, run, apart);
    }

    private void JudgeTotal(
        IBoardPhysics board, Judgement judgement, PairRef pair, string name, ImmutableArray<string> both, ReceiverDelay p, ReceiverDelay n, double max, DelayTable table)
    {
        var unit = DisplayUnit.Picoseconds;
        var skew = p.Seconds - n.Seconds;
        var window = Window.AtMost(max);
        var holds = Judgement.Holds(Math.Abs(skew), window);
        var (late, early, net) = skew > 0 ? (p, n, pair.Negative) : (n, p, pair.Positive);
        var explanation = $"{name}: {late.Driven.Net} arrives {unit.Show(Math.Abs(skew))} after {early.Driven.Net} "
            + $"({unit.Show(late.Seconds)} and {unit.Show(early.Seconds)}); allowed is {unit.Show(max)}.";
        judgement.Measured(
            name, both, Math.Abs(skew), window, unit, table.MethodText(board), explanation,
            holds ? null : PathLength.Change(early.Path, Math.Abs(skew)));
        judgement.Compared(new GroupDelays(
            Header.Id, Header.Kind, name, pair.Positive, p.Seconds, p.Seconds - max, p.Seconds + max,
            [Entry(p, holds), Entry(n, holds)]));
    }

    private static NetDelay Entry(ReceiverDelay delay, bool holds) =>
        new(delay.Driven.Net, delay.Driven.Driver, delay.Path.Receiver, delay.Seconds, delay.Path.LengthMetres, holds);

    private static void JudgeAlong(
        IBoardPhysics board, Judgement judgement, string name, ImmutableArray<string> both, PairRun run, double along, DelayTable table)
    {
        var subject = $"{name}, along the pair";
        if (run.CoupledMetres <= 0)
        {
            judgement.Unchecked(subject, both, "no row of the length list gives it a gap, so that it nowhere runs as a pair");
            return;
        }
        var unit = DisplayUnit.Picoseconds;
        var window = Window.AtMost(along);
        var place = DisplayUnit.Millimetres.Show(run.WorstAtMetres);
        var explanation = $"{name}: the members are {unit.Show(run.WorstSkewSeconds)} apart after {place} of their common run of "
            + $"{DisplayUnit.Millimetres.Show(run.CoupledMetres)}; allowed is {unit.Show(along)}.";
        var fix = Judgement.Holds(run.WorstSkewSeconds, window) ? null : new Fix(
            FixKind.Other, $"take up the difference of {unit.Show(run.WorstSkewSeconds)} before the pair has run {place} side by side, near where it arises",
            both[0], "", double.NaN);
        judgement.Measured(subject, both, run.WorstSkewSeconds, window, unit, table.MethodText(board), explanation, fix);
    }

    private static void JudgeApart(Judgement judgement, string name, PairRef pair, ImmutableArray<string> both, PairRun run, double apart)
    {
        var unit = DisplayUnit.Millimetres;
        var window = Window.AtMost(apart);
        var (net, length) = run.ApartPositiveMetres >= run.ApartNegativeMetres
            ? (pair.Positive, run.ApartPositiveMetres)
            : (pair.Negative, run.ApartNegativeMetres);
        var explanation = $"{name}: {net} runs {unit.Show(length)} apart from the other member; allowed is {unit.Show(apart)}.";
        var fix = Judgement.Holds(length, window) ? null : new Fix(
            FixKind.Other, $"bring the members together {unit.Show(length - apart)} sooner", net, "", length - apart);
        judgement.Measured($"{name}, apart", both, length, window, unit, "sum of the traces without a gap", explanation, fix);
    }
}
