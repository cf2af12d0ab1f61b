using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>How near a level that has been reached comes to its threshold again.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The nets.</param>
/// <param name="MarginVolts">Distance that must remain, V.</param>
/// <param name="Query">Which responses.</param>
public sealed record RingbackRule(RuleHeader Header, NetSet Nets, double MarginVolts, EdgeQuery Query) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "ringback",
        "After the first crossing of vih (falling: vil) the voltage must stay beyond it by a margin.",
        "lowest turning voltage after the first crossing of vih, minus vih; mirrored on a falling edge; without ringing the final voltage counts",
        [
            RuleKeys.Nets,
            new("margin", "50 mV", true, "distance to the threshold that must remain"),
            RuleKeys.Edge, RuleKeys.Drive, RuleKeys.At,
        ],
        Read);

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText => $"at least {DisplayUnit.Millivolts.Show(MarginVolts)} beyond the threshold";

    /// <inheritdoc/>
    public override IEnumerable<NetNeed> Needs() => NetNeed.ForEdges(Nets.Names, Query.Drive, Query.Edges);

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        foreach (var judged in JudgedResponse.Of(board, judgement, Nets.Names, Query))
            Judge(board, judgement, judged);
    }

    private static RingbackRule? Read(RuleReader reader, RuleHeader header)
    {
        var nets = reader.NeedNets();
        var margin = reader.Map.NeedQuantity("margin", Dimension.Voltage, QuantityRange.NotNegative, "margin: 50 mV")?.Value;
        var query = reader.Responses(nets);
        return nets is null || margin is null ? null : new RingbackRule(header, nets, margin.Value, query);
    }

    private static double? Threshold(Edge edge, ReceiverResponse response) => edge == Edge.Rise ? response.VihVolts : response.VilVolts;

    private static double Beyond(Edge edge, ReceiverResponse response, double threshold)
    {
        var level = response.FirstLevelSeconds is null ? response.FinalVolts : response.RingbackVolts ?? response.FinalVolts;
        return edge == Edge.Rise ? level - threshold : threshold - level;
    }

    private void Judge(IBoardPhysics board, Judgement judgement, JudgedResponse judged)
    {
        var worst = double.PositiveInfinity;
        var at = judged.Responses[0];
        foreach (var (edge, response) in judged.Responses)
        {
            if (Threshold(edge, response) is not { } threshold)
            {
                judgement.Unchecked(judged.Subject, [judged.Driven.Net], $"the receiver at {judged.Path.Receiver} states no {(edge == Edge.Rise ? "vih" : "vil")}");
                return;
            }
            var beyond = Beyond(edge, response, threshold);
            if (beyond < worst)
                (worst, at) = (beyond, (edge, response));
        }
        var unit = DisplayUnit.Millivolts;
        var name = at.Edge == Edge.Rise ? "vih" : "vil";
        var edgeText = at.Edge == Edge.Rise ? "rising" : "falling";
        var explanation = at.Response.FirstLevelSeconds is null
            ? $"{judged.Subject} never reaches {name} on the {edgeText} edge: it ends {unit.Show(-worst)} short of it."
            : $"{judged.Subject} comes back "
                + $"{(worst < 0 ? $"across {name} by {unit.Show(-worst)}" : $"to {unit.Show(worst)} beyond {name}")} on the {edgeText} "
                + $"edge; {unit.Show(MarginVolts)} must remain.";
        var window = Window.AtLeast(MarginVolts);
        var fix = Judgement.Holds(worst, window) ? null : SeriesTermination.Of(board, judged, judgement, (edge, r) => Judgement.Holds(Beyond(edge, r, Threshold(edge, r)!.Value), window));
        var finding = judgement.Measured(
            judged.Subject, [judged.Driven.Net], worst, window, unit, ResponseText.Method(board), explanation, fix,
            ResponseText.RankShare * at.Response.SwingVolts);
        judgement.Drawn(new JudgedWave(judged.Driven.Net, judged.Driven.Driver, judged.Path.Receiver, at.Edge, Header.Id, finding.RelativeMargin ?? 0));
    }
}
