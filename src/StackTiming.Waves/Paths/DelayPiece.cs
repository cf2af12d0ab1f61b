namespace StackTiming.Waves.Paths;

/// <summary>What a piece of a path is.</summary>
public enum DelayPieceKind : byte
{
    /// <summary>A trace.</summary>
    Trace,
    /// <summary>A via.</summary>
    Via,
    /// <summary>A package between die and pin.</summary>
    Package,
    /// <summary>A series part, which counts no delay of its own: what its resistance does with capacitances belongs to the waveform.</summary>
    SeriesPart,
}

/// <summary>One contribution to the delay of a path.</summary>
/// <param name="Kind">What it is.</param>
/// <param name="Branch">Index of its branch in the electrical net; −1 for a package.</param>
/// <param name="Net">Index of its net in the length list; −1 for packages and series parts.</param>
/// <param name="Name">Layer of a trace; layers of a via as <c>L1&gt;L3</c>; pin of a package; series part.</param>
/// <param name="LengthMetres">Routed length of a trace, height of a via, metres; 0 otherwise.</param>
/// <param name="WidthMetres">Width of a trace, metres; 0 otherwise.</param>
/// <param name="GapMetres">Spacing inside the pair, metres; 0 where there is none.</param>
/// <param name="DelaySeconds">Its delay, s.</param>
/// <param name="Z0Ohms">Impedance that an edge meets, ohm; NaN for packages and series parts.</param>
public readonly record struct DelayPiece(
    DelayPieceKind Kind, int Branch, int Net, string Name, double LengthMetres, double WidthMetres, double GapMetres, double DelaySeconds, double Z0Ohms);
