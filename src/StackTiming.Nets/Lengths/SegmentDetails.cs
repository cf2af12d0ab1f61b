namespace StackTiming.Nets.Lengths;

/// <summary>What few rows state: meanders, neighbours, and the hole of a via. Rows with equal details may share one object.</summary>
public sealed record SegmentDetails
{
    /// <summary>Space between the legs of a meander in metres; 0 where there is none.</summary>
    public double MeanderGapMetres { get; init; }

    /// <summary>Length of one leg of a meander in metres; 0 where there is none.</summary>
    public double MeanderLegMetres { get; init; }

    /// <summary>Net that runs beside this trace without being its pair, or empty.</summary>
    public string Neighbour { get; init; } = "";

    /// <summary>Spacing to <see cref="Neighbour"/> in metres; 0 where not stated.</summary>
    public double NeighbourGapMetres { get; init; }

    /// <summary>Length beside <see cref="Neighbour"/> in metres; 0 where not stated.</summary>
    public double NeighbourLengthMetres { get; init; }

    /// <summary>Hole diameter of a via in metres; 0 where not stated.</summary>
    public double DrillMetres { get; init; }

    /// <summary>Pad diameter of a via in metres; 0 where not stated.</summary>
    public double PadMetres { get; init; }

    /// <summary>Diameter of the clearance in the planes around a via in metres; 0 where not stated.</summary>
    public double AntipadMetres { get; init; }

    /// <summary>Layer at one end of a via's drilled barrel, or empty where the hole goes through the whole board.</summary>
    public string BarrelFirst { get; init; } = "";

    /// <summary>Layer at the other end of a via's drilled barrel, or empty where the hole goes through the whole board.</summary>
    public string BarrelSecond { get; init; } = "";

    /// <summary>Nothing stated.</summary>
    public static SegmentDetails None { get; } = new();
}
