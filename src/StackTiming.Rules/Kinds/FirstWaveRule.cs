using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>The first wave alone, before any reflection returns, must carry a receiver across its threshold.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The nets.</param>
/// <param name="MarginVolts">How far beyond the threshold it must carry, V.</param>
/// <param name="Query">Which responses.</param>
public sealed record FirstWaveRule(RuleHeader Header, NetSet Nets, double MarginVolts, EdgeQuery Query) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "first-wave",
        "First-incident switching: the first wave must carry each receiver beyond vih (falling: below vil), without waiting for reflections.",
        "voltage that the first wave brings to the receiver, minus vih; mirrored on a falling edge",
        [
            RuleKeys.Nets,
            new("margin", "20 mV", false, "how far beyond the threshold the first wave must carry; 0 where missing"),
            RuleKeys.Edge, RuleKeys.Drive, RuleKeys.At,
        ],
        Read);

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText => $"at least {DisplayUnit.Millivolts.Show(MarginVolts)} beyond the threshold on the first wave";

    /// <inheritdoc/>
    public override IEnumerable<NetNeed> Needs() => NetNeed.ForEdges(Nets.Names, Query.Drive, Query.Edges);

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        foreach (var judged in JudgedResponse.Of(board, judgement, Nets.Names, Query))
            Judge(board, judgement, judged);
    }

    private static FirstWaveRule? Read(RuleReader reader, RuleHeader header)
    {
        var nets = reader.NeedNets();
        var margin = reader.NotNegative("margin", Dimension.Voltage) ?? 0;
        var query = reader.Responses(nets);
        return nets is null ? null : new FirstWaveRule(header, nets, margin, query);
    }

    private void Judge(IBoardPhysics board, Judgement judgement, JudgedResponse judged)
    {
        var worst = double.PositiveInfinity;
        var at = judged.Responses[0];
        foreach (var (edge, response) in judged.Responses)
        {
            if ((edge == Edge.Rise ? response.VihVolts : response.VilVolts) is not { } threshold || response.FirstWaveVolts is not { } reached)
            {
                judgement.Unchecked(judged.Subject, [judged.Driven.Net], $"the receiver at {judged.Path.Receiver} states no {(edge == Edge.Rise ? "vih" : "vil")}");
                return;
            }
            var beyond = edge == Edge.Rise ? reached - threshold : threshold - reached;
            if (beyond < worst)
                (worst, at) = (beyond, (edge, response));
        }
        var unit = DisplayUnit.Millivolts;
        var name = at.Edge == Edge.Rise ? "vih" : "vil";
        var side = worst < 0 ? "short of" : "beyond";
        var explanation = $"{judged.Subject}: the first wave of the {(at.Edge == Edge.Rise ? "rising" : "falling")} edge brings "
            + $"{unit.Show(at.Response.FirstWaveVolts!.Value)}, {unit.Show(Math.Abs(worst))} {side} {name}; {unit.Show(MarginVolts)} "
            + "beyond it are wanted.";
        var window = Window.AtLeast(MarginVolts);
        var fix = Judgement.Holds(worst, window) ? null : FixOf(judged, at.Edge, at.Response);
        var finding = judgement.Measured(
            judged.Subject, [judged.Driven.Net], worst, window, unit, ResponseText.Method(board), explanation, fix,
            ResponseText.RankShare * at.Response.SwingVolts);
        judgement.Drawn(new JudgedWave(judged.Driven.Net, judged.Driven.Driver, judged.Path.Receiver, at.Edge, Header.Id, finding.RelativeMargin ?? 0));
    }

    /// <summary>
    /// The source resistance at which the first wave is large enough: the wave's share of the swing is Z0/(Z0 + Rs), whatever the line's end makes
    /// of it.
    /// </summary>
    private Fix? FixOf(JudgedResponse judged, Edge edge, ReceiverResponse response)
    {
        if (judged.Driven.Model is not { } model || edge == Edge.Rise != response.FirstWaveVolts > response.InitialVolts)
            return null;
        var z0 = SeriesTermination.LineOhms(judged.Path);
        var threshold = (edge == Edge.Rise ? response.VihVolts : response.VilVolts)!.Value + (edge == Edge.Rise ? MarginVolts : -MarginVolts);
        var source = model.Resistance.Value + judged.Driven.SeriesOhms;
        var factor = (response.FirstWaveVolts!.Value - response.InitialVolts) / (threshold - response.InitialVolts);
        var wanted = factor * (z0 + source) - z0;
        if (!double.IsFinite(wanted))
            return null;
        return wanted > 0
            ? new Fix(
                FixKind.SourceResistance,
                $"drive it with at most {SeriesTermination.Show(wanted)} in all instead of {SeriesTermination.Show(source)} (driver and "
                    + "series resistor), or shorten the branches that the wave divides at",
                judged.Driven.Net, "", wanted)
            : new Fix(FixKind.Other, "no driver is strong enough: reduce the number of branches that the first wave divides at", judged.Driven.Net, "", double.NaN);
    }
}
