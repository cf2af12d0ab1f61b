using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Results;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>
/// Delays of a group within a window of each other. The window is laid where it holds the most nets; the nets outside it fail, so that one net
/// that is off does not fail all the others.
/// </summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The group.</param>
/// <param name="WithinSeconds">Largest difference allowed between any two, s.</param>
/// <param name="Query">Which delays.</param>
public sealed record MatchRule(RuleHeader Header, NetSet Nets, double WithinSeconds, DelayQuery Query) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "match",
        "Delays of a group within a window of each other, in time; with several receivers, at each part.",
        "max − min of the delays; a net that fails is compared with the largest set of nets that do match",
        [
            RuleKeys.Nets,
            new("within", "10 ps", true, "largest difference between any two nets"),
            RuleKeys.Delay, RuleKeys.Drive, RuleKeys.At,
        ],
        Read);

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText => $"within {DisplayUnit.Picoseconds.Show(WithinSeconds)} of each other";

    /// <inheritdoc/>
    public override IEnumerable<NetNeed> Needs() => NetNeed.ForDelays(Nets.Names, Query);

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        var table = DelayTable.Collect(board, Nets.Names, Query);
        foreach (var (net, reason) in table.Missing)
            judgement.Unchecked(net, [net], reason);
        var compared = table.Comparisons.Where(c => c.NetCount > 1).ToArray();
        foreach (var comparison in compared)
            Judge(board, judgement, comparison, table);
        // A net that alone reaches one part is matched all the same where it reaches another with the rest.
        var matched = compared.SelectMany(c => c.Delays).Select(d => d.Driven.Net).ToHashSet(StringComparer.Ordinal);
        foreach (var alone in table.Comparisons.Where(c => c.NetCount == 1).Select(c => c.Delays[0]))
        {
            if (matched.Add(alone.Driven.Net))
                judgement.Unchecked(alone.Driven.Net, [alone.Driven.Net], $"no other net of '{Nets.Text}' reaches {alone.Path.Part}, so "
                    + "there is nothing to match it with");
        }
    }

    private static MatchRule? Read(RuleReader reader, RuleHeader header)
    {
        var nets = reader.NeedNets();
        var within = reader.NeedPositive("within", Dimension.Time, "within: 10 ps");
        var query = reader.Delays(nets);
        if (nets is { Names.Length: 1 })
        {
            reader.Map.Problems.Error(reader.Map.PositionOf("nets"), $"'{nets.Text}' is a single net, which has nothing to match", "name the whole group");
            return null;
        }
        return nets is null || within is null ? null : new MatchRule(header, nets, within.Value, query);
    }

    private void Judge(IBoardPhysics board, Judgement judgement, Comparison comparison, DelayTable table)
    {
        var (low, high) = FullestWindow(comparison.Delays);
        var middle = 0.5 * (low + high);
        var unit = DisplayUnit.Picoseconds;
        var entries = ImmutableArray.CreateBuilder<NetDelay>(comparison.Delays.Length);
        foreach (var delay in comparison.Delays)
        {
            var net = delay.Driven.Net;
            var subject = comparison.SubjectOf(delay);
            var value = Math.Max(high - delay.Seconds, delay.Seconds - low);
            var holds = Judgement.Holds(value, Window.AtMost(WithinSeconds));
            var side = delay.Seconds < middle ? "early" : "late";
            var explanation = holds
                ? $"{subject} arrives after {unit.Show(delay.Seconds)}; the net of the group farthest from it differs by "
                    + $"{unit.Show(value)}, allowed is {unit.Show(WithinSeconds)}."
                : $"{subject} arrives after {unit.Show(delay.Seconds)}, {unit.Show(Math.Abs(delay.Seconds - middle))} too {side} against "
                    + $"the middle of the nets that match ({unit.Show(low)} to {unit.Show(high)}); the farthest of them differs by "
                    + $"{unit.Show(value)}, allowed is {unit.Show(WithinSeconds)}.";
            judgement.Measured(
                subject, [net], value, Window.AtMost(WithinSeconds), unit, table.MethodText(board), explanation,
                holds ? null : PathLength.Change(delay.Path, middle - delay.Seconds));
            entries.Add(new NetDelay(net, delay.Driven.Driver, delay.Path.Receiver, delay.Seconds, delay.Path.LengthMetres, holds));
        }
        judgement.Compared(new GroupDelays(
            Header.Id, Header.Kind, comparison.To.Length == 0 ? Nets.Text : $"{Nets.Text} at {comparison.To}", "", null,
            middle - 0.5 * WithinSeconds, middle + 0.5 * WithinSeconds, entries.MoveToImmutable()));
    }

    /// <summary>The lowest and highest delay of the largest set that matches; of equal ones, the tightest, then the earliest.</summary>
    private (double Low, double High) FullestWindow(ImmutableArray<ReceiverDelay> delays)
    {
        var sorted = delays.Select(d => d.Seconds).Order().ToArray();
        int bestFirst = 0, bestCount = 0, first = 0;
        for (var last = 0; last < sorted.Length; last++)
        {
            while (!Judgement.Holds(sorted[last] - sorted[first], Window.AtMost(WithinSeconds)))
                first++;
            var count = last - first + 1;
            var tighter = bestCount > 0 && sorted[last] - sorted[first] < sorted[bestFirst + bestCount - 1] - sorted[bestFirst];
            if (count > bestCount || (count == bestCount && tighter))
                (bestFirst, bestCount) = (first, count);
        }
        return (sorted[bestFirst], sorted[bestFirst + bestCount - 1]);
    }
}
