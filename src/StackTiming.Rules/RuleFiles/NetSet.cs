using System.Collections.Immutable;

namespace StackTiming.Rules.RuleFiles;

/// <summary>Nets that a rule applies to, found on the board.</summary>
/// <param name="Text">How the file names them.</param>
/// <param name="Names">The nets, each once, in natural order.</param>
/// <param name="Strobe">The strobe or clock of the group, where the selector is one group that has one; otherwise null.</param>
/// <param name="Drive">Who drives the group, where the selector is one group that says so; otherwise null.</param>
public sealed record NetSet(string Text, ImmutableArray<string> Names, ReferenceNets? Strobe, SelectorItem? Drive);

/// <summary>A differential pair found on the board.</summary>
/// <param name="Name">Its name, or its nets with a slash between.</param>
/// <param name="Positive">Its positive net.</param>
/// <param name="Negative">Its negative net.</param>
public sealed record PairRef(string Name, string Positive, string Negative);

/// <summary>What others are compared with: a net, or a pair or group, whose mean then counts.</summary>
/// <param name="Name">How the file names it.</param>
/// <param name="Nets">Its nets in natural order, at least one.</param>
public sealed record ReferenceNets(string Name, ImmutableArray<string> Nets);
