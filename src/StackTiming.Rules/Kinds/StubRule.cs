using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>Delay of the branches that leave the longest way of a net, by itself or against the rise time.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The nets.</param>
/// <param name="MaxSeconds">Longest branch allowed, s, or null.</param>
/// <param name="MaxOfRise">Longest branch allowed as a share of the rise time, or null.</param>
/// <param name="RiseSeconds">Rise time that the rule states, s, or null.</param>
/// <param name="Drive">Who drives.</param>
public sealed record StubRule(
    RuleHeader Header, NetSet Nets, double? MaxSeconds, double? MaxOfRise, double? RiseSeconds, Drivers Drive) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "stub",
        "One-way delay of every branch that leaves the way to the farthest receiver, as a time or as a share of the rise time.",
        "a branch shorter than a small part of the rise time acts as a capacitance, a longer one rings (common practice: 10 % to 25 %)",
        [
            RuleKeys.Nets,
            new("max", "10 % or 15 ps", true, "longest branch: a share of the rise time, or a time"),
            new("rise", "150 ps", false, "rise time for a share; otherwise the shorter edge of the driver's model, or the board's assume: { rise: … }"),
            RuleKeys.Drive,
        ],
        Read);

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText => MaxSeconds is { } max
        ? $"at most {DisplayUnit.Picoseconds.Show(max)}"
        : $"at most {DisplayUnit.Percent.Show(MaxOfRise!.Value)} of the rise time";

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

    private static StubRule? Read(RuleReader reader, RuleHeader header)
    {
        var errors = reader.Map.Problems.ErrorCount;
        var nets = reader.NeedNets();
        double? seconds = null, share = null;
        if (reader.Map.NeedText("max", "max: 10 % (of the rise time) or max: 15 ps") is { } text)
        {
            if (text.Contains('%', StringComparison.Ordinal))
                share = reader.Positive("max", Dimension.Ratio);
            else
                seconds = reader.Positive("max", Dimension.Time);
        }
        var rise = reader.Positive("rise", Dimension.Time);
        var drive = reader.Drive(nets);
        return nets is null || reader.Map.Problems.ErrorCount > errors ? null : new StubRule(header, nets, seconds, share, rise, drive);
    }

    private void Judge(IBoardPhysics board, Judgement judgement, DrivenNet driven, string subject)
    {
        ImmutableArray<string> nets = [driven.Net];
        var worst = default(StubBranch);
        foreach (var stub in driven.Stubs)
        {
            if (worst.End is null || stub.DelaySeconds > worst.DelaySeconds)
                worst = stub;
        }
        var method = $"one-way delay of the branch; lines by {board.CalculatorName}";
        var ps = DisplayUnit.Picoseconds;
        var what = worst.End is null
            ? $"{subject} has no branch"
            : $"{subject} branches off at {worst.At} to {worst.End}: {DisplayUnit.Millimetres.Show(worst.LengthMetres)}, {ps.Show(worst.DelaySeconds)}";
        if (MaxSeconds is { } max)
        {
            judgement.Measured(
                subject, nets, worst.DelaySeconds, Window.AtMost(max), ps, method, $"{what}; allowed is {ps.Show(max)}.", FixOf(driven, worst, max));
            return;
        }
        if (RiseOf(board, driven) is not { } rise)
        {
            judgement.Unchecked(subject, nets, "its rise time is not known: the driver has no model, and neither the rule nor the board file states one");
            return;
        }
        var share = MaxOfRise!.Value;
        judgement.Measured(
            subject, nets, worst.DelaySeconds / rise, Window.AtMost(share), DisplayUnit.Percent, method,
            $"{what}, {DisplayUnit.Percent.Show(worst.DelaySeconds / rise)} of the rise time of {ps.Show(rise)}; allowed is {DisplayUnit.Percent.Show(share)}.",
            FixOf(driven, worst, share * rise));
    }

    private double? RiseOf(IBoardPhysics board, DrivenNet driven) =>
        RiseSeconds ?? (driven.Model is { } model ? Math.Min(model.Rise.Value, model.Fall.Value) : board.Assumed.RiseSeconds);

    private static Fix? FixOf(DrivenNet driven, StubBranch worst, double maxSeconds)
    {
        var excess = worst.DelaySeconds - maxSeconds;
        if (worst.End is null || excess <= 0)
            return null;
        var metres = worst.DelayPerMetre > 0 ? excess / worst.DelayPerMetre : double.PositiveInfinity;
        return metres <= worst.LengthMetres
            ? new Fix(
                FixKind.RemoveLength,
                $"shorten the branch to {worst.End} by {DisplayUnit.Millimetres.Show(metres)} on {worst.Layer} "
                    + $"({DisplayUnit.Picoseconds.Show(excess)} at {PathLength.Slope(worst.DelayPerMetre)}), or run the net through it",
                driven.Net, worst.Layer, metres)
            : new Fix(
                FixKind.Other, $"run {driven.Net} through {worst.End} instead of branching off: even without its trace the branch is too long",
                driven.Net, worst.Layer, double.NaN);
    }
}
