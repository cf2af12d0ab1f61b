namespace StackTiming.Rules.Results;

/// <summary>How long a phase of a check took.</summary>
/// <param name="Name">Phase: <c>read</c>, <c>lines</c>, <c>delays</c>, <c>waves</c>, <c>rules</c>.</param>
/// <param name="Elapsed">Wall time.</param>
/// <param name="Work">What it worked on, such as <c>40 sections</c>.</param>
public sealed record PhaseTime(string Name, TimeSpan Elapsed, string Work);
