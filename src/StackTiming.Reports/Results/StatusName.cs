using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Results;

/// <summary>The words of the machine-readable results.</summary>
internal static class StatusName
{
    /// <summary>The word for a status.</summary>
    /// <param name="status">The status.</param>
    public static string Of(FindingStatus status) => status switch
    {
        FindingStatus.Pass => "pass",
        FindingStatus.Fail => "fail",
        FindingStatus.Waived => "waived",
        _ => "unchecked",
    };

    /// <summary>The word for a severity.</summary>
    /// <param name="severity">The severity.</param>
    public static string Of(Severity severity) => severity == Severity.Must ? "must" : "should";

    /// <summary>The word for a verdict.</summary>
    /// <param name="verdict">The verdict.</param>
    public static string Of(Verdict verdict) => verdict == Verdict.Pass ? "pass" : "fail";
}
