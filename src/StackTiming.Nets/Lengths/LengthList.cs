using System.Collections.Immutable;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Lengths;

/// <summary>
/// The routed lengths of a board: its nets in the order of their first rows, and the segments of every net together, in file order.
/// </summary>
public sealed class LengthList
{
    private readonly ReadOnlyMemory<Segment> segments;
    private readonly Dictionary<string, int> indices;

    /// <summary>Makes a list from nets and segments that belong together.</summary>
    /// <param name="files">Paths of the files that the segments come from.</param>
    /// <param name="nets">The nets; names are unique, <see cref="Net.Index"/> counts from 0.</param>
    /// <param name="segments">The segments, those of each net consecutive.</param>
    public LengthList(ImmutableArray<string> files, ImmutableArray<Net> nets, ReadOnlyMemory<Segment> segments)
        : this(files, nets, segments, nets.ToDictionary(n => n.Name, n => n.Index, StringComparer.Ordinal))
    {
    }

    internal LengthList(
        ImmutableArray<string> files, ImmutableArray<Net> nets, ReadOnlyMemory<Segment> segments, Dictionary<string, int> indices)
    {
        Files = files;
        Nets = nets;
        this.segments = segments;
        this.indices = indices;
    }

    /// <summary>A list without nets.</summary>
    public static LengthList Empty { get; } = new([], [], ReadOnlyMemory<Segment>.Empty);

    /// <summary>Paths of the files that the list was read from.</summary>
    public ImmutableArray<string> Files { get; }

    /// <summary>The nets in the order of their first rows.</summary>
    public ImmutableArray<Net> Nets { get; }

    /// <summary>All segments, those of each net consecutive and in file order.</summary>
    public ReadOnlySpan<Segment> Segments => segments.Span;

    /// <summary>The segments of a net in file order.</summary>
    /// <param name="net">A net of this list.</param>
    public ReadOnlySpan<Segment> SegmentsOf(Net net) => segments.Span.Slice(net.FirstSegment, net.SegmentCount);

    /// <summary>The net of that name.</summary>
    /// <param name="name">Its name, in the letters of the file.</param>
    /// <returns>The net, or null where the list has none.</returns>
    public Net? Find(string name) => indices.TryGetValue(name, out var index) ? Nets[index] : null;

    /// <summary>Where a segment's row stands.</summary>
    /// <param name="segment">A segment of this list.</param>
    public FilePosition PositionOf(in Segment segment) => new(Files[segment.FileIndex], segment.Line, 0);
}
