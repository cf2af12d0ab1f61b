namespace StackTiming.Rules.Findings;

/// <summary>What became of one rule on one subject.</summary>
public enum FindingStatus
{
    /// <summary>The rule holds.</summary>
    Pass,
    /// <summary>The rule does not hold.</summary>
    Fail,
    /// <summary>The rule does not hold or could not be judged, and a waiver that is still valid accepts it.</summary>
    Waived,
    /// <summary>The rule could not be judged; the finding says why. Never counted as a pass.</summary>
    Unchecked,
}
