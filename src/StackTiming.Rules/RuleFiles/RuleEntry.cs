using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.RuleFiles;

/// <summary>A rule as it stands in a file, before its nets are found.</summary>
/// <param name="Map">Its mapping.</param>
/// <param name="Scope">The names that it can use.</param>
/// <param name="Prefix">What is put before its id; empty but for sets that are used more than once.</param>
/// <param name="Units">Units of its file.</param>
public sealed record RuleEntry(DataMap Map, RuleScope Scope, string Prefix, DefaultUnits Units);
