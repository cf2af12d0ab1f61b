using StackTiming.Rules.Findings;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.RuleFiles;

/// <summary>What every rule states, whatever its kind.</summary>
/// <param name="Id">Its id, unique on the board.</param>
/// <param name="Kind">Name of its kind.</param>
/// <param name="Severity">What it means for the verdict; <c>must</c> where not stated.</param>
/// <param name="Reason">Why it exists; may be empty.</param>
/// <param name="Source">Where its limit comes from; may be empty.</param>
/// <param name="At">Where it is written.</param>
public sealed record RuleHeader(string Id, string Kind, Severity Severity, string Reason, string Source, FilePosition At);
