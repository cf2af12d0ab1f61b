using System.Collections.Immutable;
using StackTiming.Nets.Lengths;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;
using StackTiming.Waves.Paths;

namespace StackTiming.Rules.Kinds;

/// <summary>Impedance of every distinct section that a net runs through; the worst decides.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">Nets that are judged as single traces, or null.</param>
/// <param name="Pairs">Pairs whose differential impedance is judged, or null.</param>
/// <param name="Target">Wanted impedance with its tolerance, ohm.</param>
/// <param name="IgnoreShorterMetres">Traces shorter than this are not judged, metres.</param>
public sealed record ImpedanceRule(
    RuleHeader Header, NetSet? Nets, ImmutableArray<PairRef>? Pairs, Quantity Target, double IgnoreShorterMetres) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "impedance",
        "Impedance of single traces (nets) or differential impedance of pairs (pair), on every section and layer they use.",
        "Z0 = sqrt(L/C) of each cross-section; Zdiff = 2·Zodd of a symmetric pair",
        [
            new("nets", "lane0", false, "single traces: a group, net, wildcard, range, or a list; either nets or pair"),
            new("pair", "usb", false, "pairs: the differential impedance is judged where the pair runs side by side"),
            new("target", "40 ohm ±10 %", true, "wanted impedance with its tolerance"),
            new("ignore-shorter", "1 mm", false, "traces shorter than this are passed over, such as necks at pins; 0 where missing"),
        ],
        Read);

    private Window Allowed => new(Target.Lowest, Target.Highest);

    /// <inheritdoc/>
    public override string NetsText => Nets?.Text ?? string.Join(", ", Pairs!.Value.Select(p => p.Name));

    /// <inheritdoc/>
    public override string LimitText => Allowed.Show(DisplayUnit.Ohms);

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        foreach (var net in Nets?.Names ?? [])
            JudgeNet(board, judgement, net, [net], differential: false);
        foreach (var pair in Pairs ?? [])
            JudgeNet(board, judgement, pair.Name, [pair.Positive, pair.Negative], differential: true);
    }

    private static ImpedanceRule? Read(RuleReader reader, RuleHeader header)
    {
        var errors = reader.Map.Problems.ErrorCount;
        var isPair = reader.Map.Has("pair");
        if (isPair && reader.Map.Has("nets"))
            reader.Map.Problems.Error(reader.Map.PositionOf("nets"), "an impedance rule has either 'nets' or 'pair'", "write two rules");
        var pairs = isPair ? reader.NeedPairs() : null;
        var nets = isPair ? null : reader.NeedNets();
        var target = reader.Map.NeedQuantity("target", Dimension.Resistance, QuantityRange.Positive, "target: 50 ohm ±10 %");
        var ignore = reader.NotNegative("ignore-shorter", Dimension.Length) ?? 0;
        if (target is { } t && t.Tolerance is { Minus: 0, Plus: 0 })
            reader.Map.Problems.Error(reader.Map.PositionOf("target"), "'target' has no tolerance", "write target: 50 ohm ±10 %");
        if (reader.Map.Problems.ErrorCount > errors || target is null || (nets is null && pairs is null))
            return null;
        return new ImpedanceRule(header, nets, pairs is null ? null : [.. pairs], target.Value, ignore);
    }

    private void JudgeNet(IBoardPhysics board, Judgement judgement, string subject, ImmutableArray<string> nets, bool differential)
    {
        Worst? worst = null;
        var judged = 0;
        string? objection = null;
        foreach (var net in nets)
        {
            foreach (ref readonly var segment in board.SegmentsOf(net))
            {
                if (segment.Kind != SegmentKind.Trace || (differential && segment.GapMetres <= 0) || segment.LengthMetres < IgnoreShorterMetres)
                    continue;
                var line = board.LineOf(segment, out var why);
                if (line is null || (differential && line.Pair is null))
                {
                    objection ??= why;
                    continue;
                }
                judged++;
                var ohms = differential ? line.Pair!.ZDiffOhms : line.Solution.Z0Ohms;
                var margin = Allowed.Margin(ohms);
                if (worst is null || margin < worst.Margin)
                    worst = new Worst(segment, line, ohms, margin);
            }
        }
        if (worst is null || (objection is not null && Judgement.Holds(worst.Ohms, Allowed)))
        {
            judgement.Unchecked(subject, nets, objection ?? NothingToJudge(differential));
            return;
        }
        Report(board, judgement, subject, nets, worst, judged, differential);
    }

    private string NothingToJudge(bool differential) => (differential, IgnoreShorterMetres > 0) switch
    {
        (true, false) => "no row of the length list gives it a gap, so that it nowhere runs as a pair",
        (true, true) => "it runs nowhere as a pair for the length that the rule judges",
        (false, false) => "it has no trace",
        _ => "it has no trace of the length that the rule judges",
    };

    private void Report(
        IBoardPhysics board, Judgement judgement, string subject, ImmutableArray<string> nets, Worst worst, int judged, bool differential)
    {
        var unit = DisplayUnit.Ohms;
        var where = Where(worst.Segment, differential);
        var of = judged == 1 ? "its only trace" : $"the worst of its {judged} traces";
        var explanation = $"{subject} has {(differential ? "a differential impedance" : "an impedance")} of {unit.Show(worst.Ohms)} "
            + $"{where}, {of}; allowed is {LimitText}.";
        var fix = Judgement.Holds(worst.Ohms, Allowed) ? null : FixOf(board, subject, worst, differential);
        judgement.Measured(
            subject, nets, worst.Ohms, Allowed, unit, MethodText(worst.Line), explanation, fix);
    }

    private Fix? FixOf(IBoardPhysics board, string subject, Worst worst, bool differential)
    {
        var segment = worst.Segment;
        if (board.WidthFor(segment.Layer, segment.GapMetres, Target.Value, differential) is not { } width)
        {
            return new Fix(
                FixKind.Other, $"no width on {segment.Layer} gives {DisplayUnit.Ohms.Show(Target.Value)}; use another layer or another dielectric thickness",
                subject, segment.Layer, double.NaN);
        }
        var gap = segment.GapMetres > 0 ? $" at the same gap of {DisplayUnit.Millimetres.Show(segment.GapMetres)}" : "";
        return new Fix(
            FixKind.SetWidth,
            $"route {subject} on {segment.Layer} {DisplayUnit.Millimetres.Show(width)} wide instead of "
                + $"{DisplayUnit.Millimetres.Show(segment.WidthMetres)}{gap} for {DisplayUnit.Ohms.Show(Target.Value)}",
            subject, segment.Layer, width);
    }

    private static string MethodText(BoardLine line) => line.Solution.RelativeError > 0
        ? $"{line.Solution.MethodId} (±{DisplayUnit.Percent.Show(line.Solution.RelativeError)})"
        : line.Solution.MethodId;

    private static string Where(in Segment segment, bool differential)
    {
        var gap = segment.GapMetres > 0 ? $"{(differential ? "" : " beside its pair")} at a gap of {DisplayUnit.Millimetres.Show(segment.GapMetres)}" : "";
        return $"on {segment.Layer}, {DisplayUnit.Millimetres.Show(segment.WidthMetres)} wide{gap} for {DisplayUnit.Millimetres.Show(segment.LengthMetres)}";
    }

    private sealed record Worst(Segment Segment, BoardLine Line, double Ohms, double Margin);
}
