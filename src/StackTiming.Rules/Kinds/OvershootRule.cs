using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>How far a receiver's voltage goes beyond its final level, above on a rising edge and below on a falling one.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The nets.</param>
/// <param name="OverVolts">Overshoot allowed, V, or null where it is a share of the swing.</param>
/// <param name="OverShare">Overshoot allowed as a share of the swing, or null.</param>
/// <param name="UnderVolts">Undershoot allowed, V, or null.</param>
/// <param name="UnderShare">Undershoot allowed as a share of the swing, or null.</param>
/// <param name="Query">Which responses.</param>
public sealed record OvershootRule(
    RuleHeader Header, NetSet Nets, double? OverVolts, double? OverShare, double? UnderVolts, double? UnderShare, EdgeQuery Query) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "overshoot",
        "Voltage beyond the final level: overshoot above it on the rising edge, undershoot below it on the falling edge.",
        "v_max − v_final on a rising edge, v_final − v_min on a falling edge",
        [
            RuleKeys.Nets,
            new("max", "300 mV or 20 %", true, "largest overshoot: a voltage, or a share of the swing at the receiver"),
            new("undershoot", "250 mV or 15 %", false, "largest undershoot; the same as max where missing"),
            RuleKeys.Edge, RuleKeys.Drive, RuleKeys.At,
        ],
        Read);

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText
    {
        get
        {
            var over = Show(OverVolts, OverShare);
            var under = Show(UnderVolts, UnderShare);
            return over == under ? $"at most {over}" : $"at most {over} above, {under} below";
        }
    }

    /// <inheritdoc/>
    public override IEnumerable<NetNeed> Needs() => NetNeed.ForEdges(Nets.Names, Query.Drive, Query.Edges);

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        foreach (var judged in JudgedResponse.Of(board, judgement, Nets.Names, Query))
            Judge(board, judgement, judged);
    }

    private static OvershootRule? Read(RuleReader reader, RuleHeader header)
    {
        var errors = reader.Map.Problems.ErrorCount;
        var nets = reader.NeedNets();
        reader.Map.Need("max", "max: 300 mV or max: 20 %");
        var (over, overShare) = VoltsOrShare(reader, "max");
        var (under, underShare) = reader.Map.Has("undershoot") ? VoltsOrShare(reader, "undershoot") : (over, overShare);
        var query = reader.Responses(nets);
        return nets is null || reader.Map.Problems.ErrorCount > errors
            ? null
            : new OvershootRule(header, nets, over, overShare, under, underShare, query);
    }

    private static (double? Volts, double? Share) VoltsOrShare(RuleReader reader, string key)
    {
        if (reader.Map.Text(key) is not { } text)
            return (null, null);
        return text.Contains('%', StringComparison.Ordinal)
            ? (null, reader.NotNegative(key, Dimension.Ratio))
            : (reader.NotNegative(key, Dimension.Voltage), null);
    }

    private static string Show(double? volts, double? share) =>
        volts is { } v ? DisplayUnit.Millivolts.Show(v) : $"{DisplayUnit.Percent.Show(share ?? 0)} of the swing";

    private double Limit(Edge edge, ReceiverResponse response)
    {
        var (volts, share) = edge == Edge.Rise ? (OverVolts, OverShare) : (UnderVolts, UnderShare);
        return volts ?? share!.Value * response.SwingVolts;
    }

    private void Judge(IBoardPhysics board, Judgement judgement, JudgedResponse judged)
    {
        var worst = double.PositiveInfinity;
        (Edge Edge, ReceiverResponse Response, double Limit) at = (judged.Responses[0].Edge, judged.Responses[0].Response, 0);
        foreach (var (edge, response) in judged.Responses)
        {
            var limit = Limit(edge, response);
            if (limit - response.OvershootVolts < worst)
                (worst, at) = (limit - response.OvershootVolts, (edge, response, limit));
        }
        var unit = DisplayUnit.Millivolts;
        var value = at.Response.OvershootVolts;
        var words = at.Edge == Edge.Rise ? "above its final level on the rising edge" : "below its final level on the falling edge";
        var explanation = $"{judged.Subject} goes {unit.Show(value)} {words} ({DisplayUnit.Percent.Show(value / at.Response.SwingVolts)} "
            + $"of its swing of {unit.Show(at.Response.SwingVolts)}); allowed is {unit.Show(at.Limit)}.";
        var window = Window.AtMost(at.Limit);
        var fix = Judgement.Holds(value, window) ? null : SeriesTermination.Of(board, judged, judgement, (edge, r) => r.OvershootVolts <= Limit(edge, r));
        var finding = judgement.Measured(
            judged.Subject, [judged.Driven.Net], value, window, unit, ResponseText.Method(board), explanation, fix);
        judgement.Drawn(new JudgedWave(judged.Driven.Net, judged.Driven.Driver, judged.Path.Receiver, at.Edge, Header.Id, finding.RelativeMargin ?? 0));
    }
}
