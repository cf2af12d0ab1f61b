using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>Reflection coefficient where the impedance changes along the way from driver to receiver.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The nets.</param>
/// <param name="Max">Largest reflection coefficient allowed, by amount.</param>
/// <param name="IgnoreShorterMetres">Traces shorter than this are passed over, metres.</param>
/// <param name="Drive">Who drives.</param>
public sealed record StepRule(RuleHeader Header, NetSet Nets, double Max, double IgnoreShorterMetres, Drivers Drive) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "step",
        "Reflection coefficient at every change of impedance between traces along the way from driver to receiver.",
        "Γ = (Z2 − Z1)/(Z2 + Z1), from trace to trace; vias in between are passed over; a pair counts with its odd mode",
        [
            RuleKeys.Nets,
            new("max", "0.1", true, "largest amount of the reflection coefficient, 0 to 1"),
            new("ignore-shorter", "1 mm", false, "traces shorter than this are passed over; 0 where missing"),
            RuleKeys.Drive,
        ],
        Read);

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText => $"|Γ| at most {DisplayUnit.None.Show(Max)}";

    /// <inheritdoc/>
    public override IEnumerable<NetNeed> Needs() => NetNeed.ForPaths(Nets.Names, Drive);

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        foreach (var judged in JudgedNet.Of(board, Nets.Names, Drive))
        {
            if (judged.Drives.IsEmpty)
                judgement.Unchecked(judged.Net, [judged.Net], judged.Objection);
            foreach (var driven in judged.Drives)
                Judge(board, judgement, driven, judged.SubjectOf(driven));
        }
    }

    private static StepRule? Read(RuleReader reader, RuleHeader header)
    {
        var nets = reader.NeedNets();
        var max = reader.NeedPositive("max", Dimension.None, "max: 0.1");
        var ignore = reader.NotNegative("ignore-shorter", Dimension.Length) ?? 0;
        var drive = reader.Drive(nets);
        if (max > 1)
        {
            reader.Map.Problems.Error(reader.Map.PositionOf("max"), "a reflection coefficient is at most 1", "write max: 0.1");
            return null;
        }
        return nets is null || max is null ? null : new StepRule(header, nets, max.Value, ignore, drive);
    }

    private void Judge(IBoardPhysics board, Judgement judgement, DrivenNet driven, string subject)
    {
        var worst = 0.0;
        PathPiece before = default, after = default;
        var traces = 0;
        foreach (var path in driven.Receivers)
        {
            PathPiece? last = null;
            foreach (var piece in path.Pieces)
            {
                // A series part sets the impedance on either side of it on purpose.
                if (piece.Kind == PieceKind.SeriesPart)
                    last = null;
                if (piece.Kind != PieceKind.Trace || piece.LengthMetres < IgnoreShorterMetres || !double.IsFinite(piece.Z0Ohms))
                    continue;
                traces++;
                if (last is { } previous)
                {
                    var gamma = (piece.Z0Ohms - previous.Z0Ohms) / (piece.Z0Ohms + previous.Z0Ohms);
                    if (Math.Abs(gamma) > Math.Abs(worst))
                        (worst, before, after) = (gamma, previous, piece);
                }
                last = piece;
            }
        }
        ImmutableArray<string> nets = [driven.Net];
        if (traces == 0)
        {
            judgement.Unchecked(subject, nets, driven.Receivers.IsEmpty ? "no receiver is on it" : "it has no trace of the length that the rule judges");
            return;
        }
        var unit = DisplayUnit.None;
        var explanation = worst == 0
            ? $"{subject} keeps its impedance all along; allowed is a step of {unit.Show(Max)}."
            : $"{subject} goes from {Show(before)} to {Show(after)}, which reflects {unit.Show(worst)} of an edge; allowed is {unit.Show(Max)}.";
        var fix = Judgement.Holds(Math.Abs(worst), Window.AtMost(Max)) ? null : FixOf(board, driven.Net, before, after);
        judgement.Measured(
            subject, nets, Math.Abs(worst), Window.AtMost(Max), unit, $"impedances of adjoining traces; lines by {board.CalculatorName}", explanation, fix);
    }

    private static Fix FixOf(IBoardPhysics board, string net, PathPiece before, PathPiece after)
    {
        var (shorter, longer) = before.LengthMetres < after.LengthMetres ? (before, after) : (after, before);
        var differential = shorter.GapMetres > 0;
        var target = differential ? 2 * longer.Z0Ohms : longer.Z0Ohms;
        if (board.WidthFor(shorter.Layer, shorter.GapMetres, target, differential) is not { } width)
        {
            return new Fix(
                FixKind.Other, $"no width on {shorter.Layer} gives the {DisplayUnit.Ohms.Show(longer.Z0Ohms)} of the longer trace; move "
                    + "the shorter trace to another layer",
                net, shorter.Layer, double.NaN);
        }
        return new Fix(
            FixKind.SetWidth,
            $"route {DisplayUnit.Millimetres.Show(shorter.LengthMetres)} on {shorter.Layer} {DisplayUnit.Millimetres.Show(width)} wide "
                + $"instead of {DisplayUnit.Millimetres.Show(shorter.WidthMetres)}, for the {DisplayUnit.Ohms.Show(longer.Z0Ohms)} of the "
                + "rest",
            net, shorter.Layer, width);
    }

    private static string Show(in PathPiece piece) =>
        $"{DisplayUnit.Ohms.Show(piece.Z0Ohms)} on {piece.Layer} ({DisplayUnit.Millimetres.Show(piece.WidthMetres)} wide)";
}
