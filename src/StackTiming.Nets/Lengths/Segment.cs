namespace StackTiming.Nets.Lengths;

/// <summary>
/// One row of a length list. A board has up to millions of them, so this is a plain value; its names are shared strings, one
/// object per distinct text in a list. A length of 0 stands for "not stated" wherever the row may leave it out.
/// </summary>
public readonly record struct Segment
{
    /// <summary>Where it starts: a pin (<c>U1.A3</c>), a branch label (<c>*1</c>), or empty.</summary>
    public required string From { get; init; }

    /// <summary>Where it ends: a pin, a branch label, or empty.</summary>
    public required string To { get; init; }

    /// <summary>The layer of a trace; the first layer of a via.</summary>
    public required string Layer { get; init; }

    /// <summary>The layer at which a via's signal leaves it; empty for a trace.</summary>
    public string ToLayer { get; init; }

    /// <summary>Net that runs beside this trace without being its pair, or empty.</summary>
    public string Neighbour { get; init; }

    /// <summary>Routed length of a trace in metres; 0 for a via, whose height follows from the stack-up.</summary>
    public double LengthMetres { get; init; }

    /// <summary>Width of a trace on the drawing in metres; 0 for a via.</summary>
    public double WidthMetres { get; init; }

    /// <summary>Spacing to the other member of the pair in metres; 0 where the trace runs alone.</summary>
    public double GapMetres { get; init; }

    /// <summary>Space between the legs of a meander in metres; 0 where there is none.</summary>
    public double MeanderGapMetres { get; init; }

    /// <summary>Length of one leg of a meander in metres; 0 where there is none.</summary>
    public double MeanderLegMetres { get; init; }

    /// <summary>Spacing to <see cref="Neighbour"/> in metres; 0 where not stated.</summary>
    public double NeighbourGapMetres { get; init; }

    /// <summary>Length beside <see cref="Neighbour"/> in metres; 0 where not stated.</summary>
    public double NeighbourLengthMetres { get; init; }

    /// <summary>Finished or drilled hole diameter of a via in metres; 0 where not stated.</summary>
    public double DrillMetres { get; init; }

    /// <summary>Pad diameter of a via in metres; 0 where not stated.</summary>
    public double PadMetres { get; init; }

    /// <summary>Diameter of the clearance in the planes around a via in metres; 0 where not stated.</summary>
    public double AntipadMetres { get; init; }

    /// <summary>Line of the row in its file, from 1.</summary>
    public required int Line { get; init; }

    /// <summary>Which of the list's files the row stands in.</summary>
    public required short FileIndex { get; init; }

    /// <summary>Trace or via.</summary>
    public required SegmentKind Kind { get; init; }

    /// <summary>True for a trace that meanders.</summary>
    public bool Meanders => MeanderGapMetres > 0;
}
