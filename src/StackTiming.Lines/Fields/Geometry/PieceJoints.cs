using System.Collections.Immutable;
using System.Numerics;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Geometry;

/// <summary>Joins pieces that were cut without need and tells how the charge behaves at each end of the rest.</summary>
internal static class PieceJoints
{
    /// <summary>The joined pieces with their ends classified.</summary>
    public static ImmutableArray<SurfacePiece> Finish(
        List<SurfacePiece> pieces, CrossSection section, bool half, double tolerance, Func<Complex, bool> goesOn)
    {
        Join(pieces, half, tolerance);
        return
        [
            .. pieces.Select(p => p with
            {
                StartKind = Kind(p, p.Start, pieces, section, half, tolerance, goesOn),
                EndKind = Kind(p, p.End, pieces, section, half, tolerance, goesOn),
            })
        ];
    }

    private static void Join(List<SurfacePiece> pieces, bool half, double tolerance)
    {
        for (var i = 0; i < pieces.Count; i++)
        {
            while (Continuation(pieces, i, half, tolerance) is { } next)
            {
                pieces[i] = pieces[i] with { End = pieces[next].End };
                pieces.RemoveAt(next);
                if (next < i)
                    i--;
            }
        }
    }

    /// <summary>Index of the piece that goes straight on from the end of this one, if it is the only one there and of its kind.</summary>
    private static int? Continuation(List<SurfacePiece> pieces, int index, bool half, double tolerance)
    {
        var piece = pieces[index];
        if (half && Math.Abs(piece.End.Real) <= tolerance)
            return null;
        int? found = null;
        for (var j = 0; j < pieces.Count; j++)
        {
            if (j == index)
                continue;
            var atStart = SegmentArrangement.Near(pieces[j].Start, piece.End, tolerance);
            if (!atStart && !SegmentArrangement.Near(pieces[j].End, piece.End, tolerance))
                continue;
            if (found is not null)
                return null;
            var other = atStart ? pieces[j] : pieces[j].Reversed();
            if (other.Conductor != piece.Conductor || other.Left != piece.Left || other.Right != piece.Right || !Straight(piece, other))
                return null;
            pieces[j] = other;
            found = j;
        }

        return found;
    }

    private static bool Straight(SurfacePiece a, SurfacePiece b)
    {
        var turn = b.Direction / a.Direction;
        return Math.Abs(turn.Imaginary) < 1e-7 && turn.Real > 0;
    }

    private static PieceEnd Kind(
        SurfacePiece piece,
        Complex end,
        List<SurfacePiece> pieces,
        CrossSection section,
        bool half,
        double tolerance,
        Func<Complex, bool> goesOn)
    {
        if (goesOn(end) && piece.Conductor < 0)
            return PieceEnd.Smooth;
        var (alone, flat, strip) = (true, true, piece.IsStrip);
        foreach (var other in pieces)
        {
            if (ReferenceEquals(other, piece)
                || (!SegmentArrangement.Near(other.Start, end, tolerance) && !SegmentArrangement.Near(other.End, end, tolerance)))
                continue;
            alone = false;
            strip |= other.IsStrip;
            flat &= Math.Abs((other.Direction / piece.Direction).Imaginary) < 1e-7;
            RefuseContact(piece, other, section);
        }

        if (alone && half && Math.Abs(end.Real) <= tolerance)
            return Math.Abs(piece.Direction.Imaginary) < 1e-7 ? PieceEnd.Smooth : PieceEnd.Corner;
        return strip && flat ? PieceEnd.StripEdge : PieceEnd.Corner;
    }

    private static void RefuseContact(SurfacePiece a, SurfacePiece b, CrossSection section)
    {
        if (a.Conductor < 0 || b.Conductor < 0 || a.Conductor == b.Conductor)
            return;
        var (first, second) = (section.Conductors[a.Conductor], section.Conductors[b.Conductor]);
        if (!first.Grounded || !second.Grounded)
            throw new SectionNotSolvableException($"Conductors {first.Name} and {second.Name} touch; leave a gap between them.");
    }
}
