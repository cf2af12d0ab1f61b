namespace StackTiming.Nets.Lengths;

/// <summary>The columns of a length list. The header writes them in lower case with hyphens: <c>meander-gap[mm]</c>.</summary>
public enum LengthColumn
{
    /// <summary>Name of the net.</summary>
    Net,
    /// <summary>Pin or branch label where the row starts.</summary>
    From,
    /// <summary>Pin or branch label where the row ends.</summary>
    To,
    /// <summary><c>trace</c> or <c>via</c>.</summary>
    Kind,
    /// <summary>Layer of a trace; both layers of a via as <c>L1&gt;L3</c>.</summary>
    Layer,
    /// <summary>Routed length.</summary>
    Length,
    /// <summary>Width on the drawing.</summary>
    Width,
    /// <summary>Spacing inside a pair.</summary>
    Gap,
    /// <summary>Space between the legs of a meander.</summary>
    MeanderGap,
    /// <summary>Length of one leg of a meander.</summary>
    MeanderLeg,
    /// <summary>Hole diameter of a via.</summary>
    Drill,
    /// <summary>Pad diameter of a via.</summary>
    Pad,
    /// <summary>Clearance diameter of a via.</summary>
    Antipad,
    /// <summary>Net that runs beside this one without being its pair.</summary>
    Neighbour,
    /// <summary>Spacing to the neighbour.</summary>
    NeighbourGap,
    /// <summary>Length beside the neighbour.</summary>
    NeighbourLength,
    /// <summary>Layers between which a via's hole is drilled, as <c>L1&gt;L3</c>; the whole board where empty.</summary>
    Barrel,
}
