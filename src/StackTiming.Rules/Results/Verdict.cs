namespace StackTiming.Rules.Results;

/// <summary>The outcome of a check.</summary>
public enum Verdict
{
    /// <summary>Every <c>must</c> rule holds or is waived.</summary>
    Pass,
    /// <summary>A <c>must</c> rule fails, or could not be judged: what nobody has judged cannot be signed for.</summary>
    Fail,
}
