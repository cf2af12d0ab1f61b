namespace StackTiming.Rules.Findings;

/// <summary>
/// Orders findings for reading: failed <c>must</c>, unchecked <c>must</c>, failed <c>should</c>, unchecked <c>should</c>, waived, passed; inside each the
/// smallest relative margin first, then rule and subject, so that the order never depends on the order of the work.
/// </summary>
public sealed class WorstFirst : IComparer<Finding>
{
    /// <summary>The only instance.</summary>
    public static WorstFirst Instance { get; } = new();

    private WorstFirst()
    {
    }

    /// <inheritdoc/>
    public int Compare(Finding? x, Finding? y)
    {
        if (x is null || y is null)
            return x is null ? (y is null ? 0 : 1) : -1;
        var byRank = Rank(x).CompareTo(Rank(y));
        if (byRank != 0)
            return byRank;
        var byMargin = (x.RelativeMargin ?? double.NegativeInfinity).CompareTo(y.RelativeMargin ?? double.NegativeInfinity);
        if (byMargin != 0)
            return byMargin;
        var byRule = NaturalOrder.Instance.Compare(x.Rule, y.Rule);
        return byRule != 0 ? byRule : NaturalOrder.Instance.Compare(x.Subject, y.Subject);
    }

    private static int Rank(Finding finding) => finding.Status switch
    {
        FindingStatus.Fail => finding.Severity == Severity.Must ? 0 : 2,
        FindingStatus.Unchecked => finding.Severity == Severity.Must ? 1 : 3,
        FindingStatus.Waived => 4,
        _ => 5,
    };
}
