using System.Collections.Immutable;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Documents;

/// <summary>The head of the first page: what the document is and what it is about.</summary>
/// <param name="Kind">What the document is, such as <c>Compliance report</c>.</param>
/// <param name="Title">What it is about.</param>
/// <param name="Facts">Short facts beneath, such as the revision and the date.</param>
public sealed record TitleBlock(string Kind, string Title, ImmutableArray<(string Name, string Fact)> Facts) : Block;

/// <summary>The verdict, large, with the counts behind it.</summary>
/// <param name="Verdict">The verdict; null where nothing was judged, which is no pass.</param>
/// <param name="Statement">What it means, in a sentence or two.</param>
/// <param name="Counts">Names and numbers.</param>
public sealed record VerdictPanel(Verdict? Verdict, RichText Statement, ImmutableArray<(string Name, int Count, string? Link)> Counts) : Block;

/// <summary>Lines for the people who sign: name, signature and date for each role.</summary>
/// <param name="Roles">The roles.</param>
public sealed record SignOff(ImmutableArray<string> Roles) : Block;
