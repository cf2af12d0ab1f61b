using StackTiming.Stackups.Reading;

namespace StackTiming.Lines.Sections;

/// <summary>The line whose cross-section is wanted: what a row of a length list or a table of lines says. All lengths in metres.</summary>
/// <param name="At">Where the file asks for it, for the problems.</param>
/// <param name="Layer">Copper layer of the trace, such as <c>L3</c>.</param>
/// <param name="WidthMetres">Width on the drawing: that of the wide face.</param>
public sealed record SectionRequest(FilePosition At, string Layer, double WidthMetres)
{
    /// <summary>Distance between the wide faces of a pair on one layer, or null for a single trace.</summary>
    public double? PairGapMetres { get; init; }

    /// <summary>Distance from the trace or pair to a grounded pour on either side, or null where there is none.</summary>
    public double? PourGapMetres { get; init; }

    /// <summary>The layer of the pair's other trace, straight above or below, or null.</summary>
    public string? BroadsideLayer { get; init; }

    /// <summary>Frequency at which Dk and Df are wanted, or null for the values as stated.</summary>
    public double? FrequencyHertz { get; init; }
}
