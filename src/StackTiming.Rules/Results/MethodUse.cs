namespace StackTiming.Rules.Results;

/// <summary>A method that the check used.</summary>
/// <param name="Id">Id, as <c>stacktiming methods</c> lists it.</param>
/// <param name="UsedFor">What for, in words, such as <c>12 sections</c>.</param>
/// <param name="WorstRelativeError">Largest documented or estimated relative error among its uses; 0 where the method is exact.</param>
public sealed record MethodUse(string Id, string UsedFor, double WorstRelativeError);
