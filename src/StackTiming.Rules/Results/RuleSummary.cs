using StackTiming.Rules.Findings;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Results;

/// <summary>One rule as the check applied it: the heading of its table in the report.</summary>
/// <param name="Id">Id.</param>
/// <param name="Kind">Kind.</param>
/// <param name="Nets">Nets or pair, as the file names them.</param>
/// <param name="Limit">Its limit in words, such as <c>within 10.00 ps</c>.</param>
/// <param name="Severity">What it means for the verdict.</param>
/// <param name="Reason">Why it exists; may be empty.</param>
/// <param name="Source">Where its limit comes from; may be empty.</param>
/// <param name="At">Where it is written.</param>
public sealed record RuleSummary(
    string Id, string Kind, string Nets, string Limit, Severity Severity, string Reason, string Source, FilePosition At);
