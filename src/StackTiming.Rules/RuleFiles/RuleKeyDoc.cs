namespace StackTiming.Rules.RuleFiles;

/// <summary>A key of a rule kind, for help texts.</summary>
/// <param name="Key">The key.</param>
/// <param name="Value">What it takes, by example, such as <c>40 ohm ±10 %</c>.</param>
/// <param name="Required">Whether it must be there.</param>
/// <param name="Meaning">What it means, in a sentence.</param>
public sealed record RuleKeyDoc(string Key, string Value, bool Required, string Meaning);
