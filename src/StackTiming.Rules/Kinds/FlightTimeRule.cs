using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Results;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>Delay from driver to each receiver between limits.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The nets.</param>
/// <param name="Allowed">Allowed delay, s.</param>
/// <param name="Query">Which delays.</param>
public sealed record FlightTimeRule(RuleHeader Header, NetSet Nets, Window Allowed, DelayQuery Query) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "flight-time",
        "Delay from driver to each receiver, at least min and at most max.",
        "flight time: first crossing of the receiver's threshold minus the crossing at the driver in its reference load, the worse of both edges; without models, time of flight",
        [
            RuleKeys.Nets,
            new("min", "200 ps", false, "shortest allowed; at least one of min and max"),
            new("max", "900 ps", false, "longest allowed"),
            RuleKeys.Delay, RuleKeys.Drive, RuleKeys.At,
        ],
        Read);

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText => Allowed.Show(DisplayUnit.Picoseconds);

    /// <inheritdoc/>
    public override IEnumerable<NetNeed> Needs() => NetNeed.ForDelays(Nets.Names, Query, [Edge.Rise, Edge.Fall]);

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        var entries = ImmutableArray.CreateBuilder<NetDelay>();
        foreach (var (net, _, _) in JudgedNet.Of(board, Nets.Names, Query.Drive))
        {
            // Net by net: a receiver without a threshold on one net must not turn the others to time of flight.
            var table = DelayTable.Collect(board, [net], Query);
            foreach (var (_, reason) in table.Missing)
                judgement.Unchecked(net, [net], reason);
            foreach (var comparison in table.Comparisons)
            {
                foreach (var delay in comparison.Delays)
                    entries.Add(Judge(board, judgement, comparison.SubjectOf(delay), delay, table));
            }
        }
        if (entries.Count > 0)
            judgement.Compared(new GroupDelays(Header.Id, Header.Kind, Nets.Text, "", null, Allowed.Lower, Allowed.Upper, entries.ToImmutable()));
    }

    private static FlightTimeRule? Read(RuleReader reader, RuleHeader header)
    {
        var nets = reader.NeedNets();
        var window = reader.NeedWindow("min", "max", Dimension.Time, "max: 900 ps");
        var query = reader.Delays(nets);
        return nets is null || window is null ? null : new FlightTimeRule(header, nets, window.Value, query);
    }

    private NetDelay Judge(IBoardPhysics board, Judgement judgement, string subject, ReceiverDelay delay, DelayTable table)
    {
        var unit = DisplayUnit.Picoseconds;
        var net = delay.Driven.Net;
        var span = DelaySpan.Of(board, delay, table.Basis);
        var seconds = Allowed.Margin(span.Earliest) < Allowed.Margin(span.Latest) ? span.Earliest : span.Latest;
        var holds = Judgement.Holds(seconds, Allowed);
        var what = table.Basis == DelayBasis.FlightTime ? "flight time" : "time of flight";
        var explanation = $"{net} has a {what} of {unit.Show(seconds)} from {delay.Driven.Driver} to {delay.Path.Receiver} over "
            + $"{DisplayUnit.Millimetres.Show(delay.Path.LengthMetres)} of trace; allowed is {LimitText}.";
        judgement.Measured(
            subject, [net], seconds, Allowed, unit, table.MethodText(board, "the worse of both edges"), explanation,
            holds ? null : PathLength.Change(delay.Path, Allowed.Nearest(seconds) - seconds));
        return new NetDelay(net, delay.Driven.Driver, delay.Path.Receiver, seconds, delay.Path.LengthMetres, holds);
    }
}
