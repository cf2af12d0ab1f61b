namespace StackTiming.Rules.Judging;

/// <summary>Direction of a driver's edge.</summary>
public enum Edge
{
    /// <summary>From low to high.</summary>
    Rise,
    /// <summary>From high to low.</summary>
    Fall,
}
