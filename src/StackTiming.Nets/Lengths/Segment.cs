namespace StackTiming.Nets.Lengths;

/// <summary>
/// One row of a length list. A board has up to millions of them, so this is a small plain value; its names are shared strings, one
/// object per distinct text in a list. A length of 0 stands for "not stated" wherever the row may leave it out.
/// </summary>
public readonly record struct Segment
{
    private readonly SegmentDetails? details;

    /// <summary>Where it starts: a pin (<c>U1.A3</c>), a branch label (<c>*1</c>), or empty.</summary>
    public required string From { get; init; }

    /// <summary>Where it ends: a pin, a branch label, or empty.</summary>
    public required string To { get; init; }

    /// <summary>The layer of a trace; the first layer of a via.</summary>
    public required string Layer { get; init; }

    /// <summary>The layer at which a via's signal leaves it; empty for a trace.</summary>
    public required string ToLayer { get; init; }

    /// <summary>Meander, neighbour and hole; <see cref="SegmentDetails.None"/> where the row states none of them.</summary>
    public SegmentDetails Details
    {
        get => details ?? SegmentDetails.None;
        init => details = value;
    }

    /// <summary>Routed length of a trace in metres; 0 for a via, whose height follows from the stack-up.</summary>
    public double LengthMetres { get; init; }

    /// <summary>Width of a trace on the drawing in metres; 0 for a via.</summary>
    public double WidthMetres { get; init; }

    /// <summary>Spacing to the other member of the pair in metres; 0 where the trace runs alone.</summary>
    public double GapMetres { get; init; }

    /// <summary>Line of the row in its file, from 1.</summary>
    public required int Line { get; init; }

    /// <summary>Which of the list's files the row stands in.</summary>
    public required short FileIndex { get; init; }

    /// <summary>Trace or via.</summary>
    public required SegmentKind Kind { get; init; }

    /// <summary>True for a trace that meanders.</summary>
    public bool Meanders => Details.MeanderGapMetres > 0;
}
