using System.Collections.Immutable;

namespace StackTiming.Rules.RuleFiles;

/// <summary>A kind of rule: what it is called, what its keys mean, and how a rule of it is read. Each kind is one file.</summary>
/// <param name="Name">Name in rule files, such as <c>match</c>.</param>
/// <param name="Summary">What it judges, in a sentence.</param>
/// <param name="Basis">The equation or definition it judges by, with its source.</param>
/// <param name="Keys">Its keys, apart from those that every rule has.</param>
/// <param name="Read">Reads a rule of this kind; null where a problem was reported.</param>
public sealed record RuleKind(
    string Name, string Summary, string Basis, ImmutableArray<RuleKeyDoc> Keys, Func<RuleReader, RuleHeader, Rule?> Read)
{
    /// <summary>The keys that every rule has.</summary>
    public static ImmutableArray<RuleKeyDoc> CommonKeys { get; } =
    [
        new("id", "LANE0-MATCH", true, "name of the rule, unique on the board; waivers refer to it"),
        new("kind", "match", true, "one of the kinds listed here"),
        new("severity", "must", false, "must (default): a failure or an unchecked net fails the board; should: it is reported only"),
        new("reason", "driver is 40 ohm", false, "why the rule exists; printed in the report"),
        new("source", "JESD79-4, table 120", false, "where the limit comes from; printed in the report"),
    ];
}
