namespace StackTiming.Rules.Findings;

/// <summary>
/// What a rule means for the verdict. The words are those of RFC 2119: a <c>must</c> is a requirement, a <c>should</c> a
/// recommendation that may be departed from for a reason.
/// </summary>
public enum Severity
{
    /// <summary>A failed or unchecked finding fails the board.</summary>
    Must,
    /// <summary>A failed or unchecked finding is reported and counted, and does not fail the board.</summary>
    Should,
}
