using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Results;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>Delay of each net against that of a strobe or clock, at the same receiving part.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The nets.</param>
/// <param name="To">The strobe or clock.</param>
/// <param name="Allowed">Allowed difference net − strobe, s.</param>
/// <param name="Query">Which delays.</param>
public sealed record OffsetRule(RuleHeader Header, NetSet Nets, ReferenceNets To, Window Allowed, DelayQuery Query) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "offset",
        "Delay of each net minus that of its strobe or clock, at the same receiving part.",
        "positive where the net arrives after the strobe; of a strobe pair or clock group the mean counts",
        [
            RuleKeys.Nets,
            new("to", "MEM_DQS0", false, "strobe or clock: a net, pair or group; otherwise that of the rule's group"),
            new("min", "-10 ps", false, "earliest allowed against the strobe; at least one of min and max"),
            new("max", "10 ps", false, "latest allowed against the strobe"),
            RuleKeys.Delay, RuleKeys.Drive, RuleKeys.At,
        ],
        Read);

    private DelayQuery WithReferences => Query with { Drive = Query.Drive.ForReferencesOf(Nets.Names[0]) };

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText => $"{Allowed.Show(DisplayUnit.Picoseconds)} against {To.Name}";

    /// <inheritdoc/>
    public override IEnumerable<NetNeed> Needs() => NetNeed.ForDelays([.. Nets.Names, .. To.Nets], WithReferences);

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        ImmutableArray<string> judged = [.. Nets.Names.Except(To.Nets)];
        var table = DelayTable.Collect(board, [.. judged, .. To.Nets], WithReferences);
        foreach (var (net, reason) in table.Missing)
        {
            if (!To.Nets.Contains(net))
                judgement.Unchecked(net, [net], reason);
        }
        var noReference = table.Missing.Where(m => To.Nets.Contains(m.Net)).Select(m => $"{m.Net}: {m.Reason}").FirstOrDefault();
        foreach (var comparison in table.Comparisons)
            Judge(board, judgement, comparison, table, noReference);
    }

    private static OffsetRule? Read(RuleReader reader, RuleHeader header)
    {
        var nets = reader.NeedNets();
        var to = reader.NeedReference("to", nets);
        var window = reader.NeedWindow("min", "max", Dimension.Time, "min: -10 ps, max: 10 ps");
        var query = reader.Delays(nets);
        if (nets is null || to is null || window is null)
            return null;
        if (nets.Names.All(n => to.Nets.Contains(n)))
        {
            reader.Map.Problems.Error(reader.Map.PositionOf("nets"), $"'{nets.Text}' is compared with itself", "name the nets that the strobe samples");
            return null;
        }
        return new OffsetRule(header, nets, to, window.Value, query);
    }

    private void Judge(IBoardPhysics board, Judgement judgement, Comparison comparison, DelayTable table, string? noReference)
    {
        var references = comparison.Delays.Where(d => To.Nets.Contains(d.Driven.Net)).ToArray();
        var others = comparison.Delays.Where(d => !To.Nets.Contains(d.Driven.Net)).ToArray();
        if (references.Length == 0 || noReference is not null)
        {
            var reason = noReference ?? $"{To.Name} does not reach {comparison.To}";
            foreach (var delay in others)
                judgement.Unchecked(comparison.SubjectOf(delay), [delay.Driven.Net], reason);
            return;
        }
        var reference = references.Average(d => d.Seconds);
        var unit = DisplayUnit.Picoseconds;
        var entries = ImmutableArray.CreateBuilder<NetDelay>(others.Length);
        foreach (var delay in others)
        {
            var net = delay.Driven.Net;
            var subject = comparison.SubjectOf(delay);
            var value = delay.Seconds - reference;
            var holds = Judgement.Holds(value, Allowed);
            var side = value < 0 ? "before" : "after";
            var explanation = $"{subject} arrives after {unit.Show(delay.Seconds)}, {unit.Show(Math.Abs(value))} {side} {To.Name} "
                + $"({unit.Show(reference)}); allowed is {Allowed.Show(unit)}.";
            judgement.Measured(
                subject, [net], value, Allowed, unit, table.MethodText(board), explanation,
                holds ? null : PathLength.Change(delay.Path, Aim(value) - value));
            entries.Add(new NetDelay(net, delay.Driven.Driver, delay.Path.Receiver, delay.Seconds, delay.Path.LengthMetres, holds));
        }
        judgement.Compared(new GroupDelays(
            Header.Id, Header.Kind, comparison.To.Length == 0 ? Nets.Text : $"{Nets.Text} at {comparison.To}", To.Name, reference,
            reference + Allowed.Lower, reference + Allowed.Upper, entries.MoveToImmutable()));
    }

    private double Aim(double value) => Allowed is { Lower: { } low, Upper: { } high } ? 0.5 * (low + high) : Allowed.Nearest(value);
}
