using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>Time until a receiver's voltage stays within 5 % of its swing around the final level.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The nets.</param>
/// <param name="WithinSeconds">Sample instant after the start of the driver's edge, s.</param>
/// <param name="Query">Which responses.</param>
public sealed record SettlingRule(RuleHeader Header, NetSet Nets, double WithinSeconds, EdgeQuery Query) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "settling",
        "The voltage must have settled before the sample instant.",
        "last instant, from the start of the driver's edge, at which the voltage is more than 5 % of the receiver's swing away from its final level",
        [
            RuleKeys.Nets,
            new("within", "10 ns", true, "sample instant after the start of the driver's edge"),
            RuleKeys.Edge, RuleKeys.Drive, RuleKeys.At,
        ],
        Read);

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText => $"within {DisplayUnit.Picoseconds.Show(WithinSeconds)}";

    /// <inheritdoc/>
    public override IEnumerable<NetNeed> Needs() => NetNeed.ForEdges(Nets.Names, Query.Drive, Query.Edges);

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        var unit = DisplayUnit.Picoseconds;
        var window = Window.AtMost(WithinSeconds);
        foreach (var judged in JudgedResponse.Of(board, judgement, Nets.Names, Query))
        {
            var (edge, response) = judged.Responses.MaxBy(r => r.Response.SettledSeconds);
            var value = response.SettledSeconds;
            var explanation = $"{judged.Subject} settles {unit.Show(value)} after the {(edge == Edge.Rise ? "rising" : "falling")} edge "
                + $"begins; it is sampled after {unit.Show(WithinSeconds)}.";
            var fix = Judgement.Holds(value, window) ? null : FixOf(board, judged, judgement, value);
            var finding = judgement.Measured(
                judged.Subject, [judged.Driven.Net], value, window, unit, ResponseText.Method(board), explanation, fix);
            judgement.Drawn(new JudgedWave(judged.Driven.Net, judged.Driven.Driver, judged.Path.Receiver, edge, Header.Id, finding.RelativeMargin ?? 0));
        }
    }

    private static SettlingRule? Read(RuleReader reader, RuleHeader header)
    {
        var nets = reader.NeedNets();
        var within = reader.NeedPositive("within", Dimension.Time, "within: 2.5 ns");
        var query = reader.Responses(nets);
        return nets is null || within is null ? null : new SettlingRule(header, nets, within.Value, query);
    }

    private Fix FixOf(IBoardPhysics board, JudgedResponse judged, Judgement judgement, double value) =>
        SeriesTermination.Of(board, judged, judgement, (_, response) => response.SettledSeconds <= WithinSeconds) ?? new Fix(
            FixKind.Later, $"sample {DisplayUnit.Picoseconds.Show(value - WithinSeconds)} later", judged.Driven.Net, "", value - WithinSeconds);
}
