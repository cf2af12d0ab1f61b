using System.Numerics;

namespace StackTiming.Lines.Fields.Geometry;

/// <summary>How the charge behaves towards an end of a straight piece of surface.</summary>
internal enum PieceEnd
{
    /// <summary>It goes on smoothly.</summary>
    Smooth,

    /// <summary>Three or more regions meet, or the surface turns.</summary>
    Corner,

    /// <summary>A strip without thickness ends: the charge grows as one over the root of the distance.</summary>
    StripEdge,
}

/// <summary>
/// A straight piece of a surface that carries charge: a face of a conductor, a strip, or a boundary between two dielectrics.
/// The left side is seen when looking from the start to the end; a face has its dielectric on the left.
/// </summary>
/// <param name="Start">Where it starts, x + iy in metres.</param>
/// <param name="End">Where it ends; of an infinite piece, a point on the way.</param>
/// <param name="Left">Dielectric on the left, a number of <see cref="SectionRegions.Media"/>.</param>
/// <param name="Right">Dielectric on the right; -1 where the metal of a face is.</param>
/// <param name="Conductor">Index of the conductor, or -1 for a boundary between dielectrics.</param>
/// <param name="StartKind">Behaviour towards the start.</param>
/// <param name="EndKind">Behaviour towards the end.</param>
/// <param name="Infinite">True where the piece goes on beyond its end without limit.</param>
internal sealed record SurfacePiece(
    Complex Start,
    Complex End,
    int Left,
    int Right,
    int Conductor,
    PieceEnd StartKind,
    PieceEnd EndKind,
    bool Infinite)
{
    /// <summary>Length in metres of a finite piece.</summary>
    public double Length => (End - Start).Magnitude;

    /// <summary>Unit vector from the start to the end.</summary>
    public Complex Direction => (End - Start) / Length;

    /// <summary>True for a strip without thickness, which has a dielectric on both sides.</summary>
    public bool IsStrip => Conductor >= 0 && Right >= 0;

    /// <summary>The same piece from its end to its start.</summary>
    public SurfacePiece Reversed() => new(End, Start, Right, Left, Conductor, EndKind, StartKind, false);
}
