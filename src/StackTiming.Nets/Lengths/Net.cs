namespace StackTiming.Nets.Lengths;

/// <summary>A net of a length list: a name and a run of segments.</summary>
/// <param name="Name">The net's name.</param>
/// <param name="Index">Its place in the list.</param>
/// <param name="FirstSegment">Place of its first segment in <see cref="LengthList.Segments"/>.</param>
/// <param name="SegmentCount">How many segments follow from there.</param>
public readonly record struct Net(string Name, int Index, int FirstSegment, int SegmentCount);
