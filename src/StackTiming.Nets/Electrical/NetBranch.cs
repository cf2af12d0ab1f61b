using StackTiming.Nets.Parts;

namespace StackTiming.Nets.Electrical;

/// <summary>What joins two nodes of an electrical net: a segment of the length list, or a series part.</summary>
/// <param name="From">Index of the node where it starts.</param>
/// <param name="To">Index of the node where it ends.</param>
/// <param name="Segment">Place of the segment in <see cref="Lengths.LengthList.Segments"/>; −1 for a series part.</param>
/// <param name="Part">The series part; null for a segment.</param>
/// <param name="Join">What the series part does between the two pins; null for a segment.</param>
public readonly record struct NetBranch(int From, int To, int Segment, Part? Part, SeriesJoin? Join)
{
    /// <summary>True for a series part.</summary>
    public bool IsSeriesPart => Segment < 0;
}
