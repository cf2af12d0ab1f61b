using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>Loss of the traces along the way from driver to receiver at a frequency.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The nets.</param>
/// <param name="AtHertz">Frequency, Hz.</param>
/// <param name="MaxDecibels">Largest loss allowed, dB.</param>
/// <param name="Drive">Who drives.</param>
public sealed record LossRule(RuleHeader Header, NetSet Nets, double AtHertz, double MaxDecibels, Drivers Drive) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "loss",
        "Loss of the traces from driver to each receiver at a frequency.",
        "sum of length times attenuation (conductor with roughness, and dielectric); vias and mismatch are not counted",
        [
            RuleKeys.Nets,
            new("at", "2.5 GHz", true, "frequency, such as half the bit rate"),
            new("max", "3 dB", true, "largest loss"),
            RuleKeys.Drive,
        ],
        Read);

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText => $"at most {DisplayUnit.Decibels.Show(MaxDecibels)} at {Gigahertz}";

    private string Gigahertz => (AtHertz * 1e-9).ToString("0.####", System.Globalization.CultureInfo.InvariantCulture) + " GHz";

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
            {
                if (driven.Receivers.IsEmpty)
                    judgement.Unchecked(judged.SubjectOf(driven), [judged.Net], "no receiver is on it");
                foreach (var path in driven.Receivers)
                    Judge(board, judgement, driven, path, judged.SubjectOf(driven, path.Receiver));
            }
        }
    }

    private static LossRule? Read(RuleReader reader, RuleHeader header)
    {
        var nets = reader.NeedNets();
        var at = reader.NeedPositive("at", Dimension.Frequency, "at: 2.5 GHz");
        var max = reader.NeedPositive("max", Dimension.Decibel, "max: 3 dB");
        var drive = reader.Drive(nets);
        return nets is null || at is null || max is null ? null : new LossRule(header, nets, at.Value, max.Value, drive);
    }

    private void Judge(IBoardPhysics board, Judgement judgement, DrivenNet driven, ReceiverPath path, string subject)
    {
        ImmutableArray<string> nets = [driven.Net];
        var loss = 0.0;
        PathPiece longest = default;
        var longestSlope = 0.0;
        foreach (var piece in path.Pieces)
        {
            if (piece.Kind != PieceKind.Trace)
                continue;
            if (board.AttenuationDbPerMetre(piece, AtHertz, out var objection) is not { } slope)
            {
                judgement.Unchecked(subject, nets, objection);
                return;
            }
            loss += slope * piece.LengthMetres;
            if (piece.LengthMetres > longest.LengthMetres)
                (longest, longestSlope) = (piece, slope);
        }
        var unit = DisplayUnit.Decibels;
        var explanation = $"{subject} loses {unit.Show(loss)} at {Gigahertz} over {DisplayUnit.Millimetres.Show(path.LengthMetres)} of "
            + $"trace; allowed is {unit.Show(MaxDecibels)}.";
        Fix? fix = null;
        if (loss > MaxDecibels)
        {
            var metres = (loss - MaxDecibels) / longestSlope;
            fix = metres < longest.LengthMetres
                ? new Fix(
                    FixKind.RemoveLength,
                    $"shorten {longest.Net} by {DisplayUnit.Millimetres.Show(metres)} on {longest.Layer} "
                        + $"({unit.Show(loss - MaxDecibels)} at {unit.Show(longestSlope * 1e-3)}/mm), or route it wider",
                    longest.Net, longest.Layer, metres)
                : new Fix(FixKind.Other, $"route {longest.Net} wider, on smoother copper or in a material of lower Df; shortening it "
                    + $"cannot save {unit.Show(loss - MaxDecibels)}", longest.Net, longest.Layer, double.NaN);
        }
        judgement.Measured(
            subject, nets, loss, Window.AtMost(MaxDecibels), unit, $"sum of trace attenuations; lines by {board.CalculatorName}", explanation, fix);
    }
}
