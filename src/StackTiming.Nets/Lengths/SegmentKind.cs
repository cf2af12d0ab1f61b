namespace StackTiming.Nets.Lengths;

/// <summary>What a row of a length list is.</summary>
public enum SegmentKind : byte
{
    /// <summary>A trace on one layer.</summary>
    Trace,
    /// <summary>A plated hole between two layers.</summary>
    Via,
}
