using StackTiming.Rules.Judging;

namespace StackTiming.Rules.RuleFiles;

/// <summary>A rule with its nets found and its limits in SI units, ready to judge.</summary>
/// <param name="Header">What every rule states.</param>
public abstract record Rule(RuleHeader Header)
{
    /// <summary>The nets or pairs as the file names them.</summary>
    public abstract string NetsText { get; }

    /// <summary>The limit in words, such as <c>within 10.00 ps</c>.</summary>
    public abstract string LimitText { get; }

    /// <summary>What it will ask of its nets; nothing where the length list is enough.</summary>
    public virtual IEnumerable<NetNeed> Needs() => [];

    /// <summary>
    /// Judges the rule: adds at least one finding for every net (or pair) of the rule, <c>unchecked</c> with its reason where it cannot be judged.
    /// Safe to call for several rules at once.
    /// </summary>
    /// <param name="board">The board and what its nets do.</param>
    /// <param name="judgement">Where findings and delay tables go.</param>
    public abstract void Judge(IBoardPhysics board, Judgement judgement);
}
