using System.Numerics;

namespace StackTiming.Lines.Fields.Geometry;

/// <summary>A straight segment of an arrangement and the strip that it is, or -1.</summary>
internal readonly record struct Segment(Complex Start, Complex End, int Strip)
{
    /// <summary>The point half-way.</summary>
    public Complex Middle => (Start + End) / 2;
}

/// <summary>
/// Cuts segments where they meet, so that afterwards any two share at most an end, and keeps one of those that coincide.
/// </summary>
internal static class SegmentArrangement
{
    /// <summary>The arrangement of the segments; points nearer than the tolerance are one point.</summary>
    public static List<Segment> Cut(List<Segment> segments, double tolerance)
    {
        var pieces = new List<Segment>();
        var cuts = new List<double>();
        for (var i = 0; i < segments.Count; i++)
        {
            var segment = segments[i];
            var length = (segment.End - segment.Start).Magnitude;
            if (length <= tolerance)
                continue;
            cuts.Clear();
            for (var j = 0; j < segments.Count; j++)
            {
                if (j != i)
                    AddCuts(segment, length, segments[j], tolerance, cuts);
            }

            AddPieces(segment, length, cuts, tolerance, pieces);
        }

        return pieces;
    }

    private static void AddCuts(Segment segment, double length, Segment other, double tolerance, List<double> cuts)
    {
        var direction = (segment.End - segment.Start) / length;
        var a = (other.Start - segment.Start) / direction;
        var b = (other.End - segment.Start) / direction;
        if (Math.Max(a.Real, b.Real) < -tolerance || Math.Min(a.Real, b.Real) > length + tolerance
            || Math.Max(a.Imaginary, b.Imaginary) < -tolerance || Math.Min(a.Imaginary, b.Imaginary) > tolerance)
            return;
        var (startOn, endOn) = (Math.Abs(a.Imaginary) <= tolerance, Math.Abs(b.Imaginary) <= tolerance);
        if (startOn)
            cuts.Add(a.Real);
        if (endOn)
            cuts.Add(b.Real);
        if (!startOn && !endOn && a.Imaginary * b.Imaginary < 0)
            cuts.Add(a.Real + (b.Real - a.Real) * a.Imaginary / (a.Imaginary - b.Imaginary));
    }

    private static void AddPieces(Segment segment, double length, List<double> cuts, double tolerance, List<Segment> pieces)
    {
        cuts.Sort();
        var direction = (segment.End - segment.Start) / length;
        var from = segment.Start;
        var at = 0.0;
        foreach (var cut in cuts)
        {
            if (cut <= at + tolerance || cut >= length - tolerance)
                continue;
            var to = segment.Start + cut * direction;
            Add(new Segment(from, to, segment.Strip), tolerance, pieces);
            (from, at) = (to, cut);
        }

        Add(new Segment(from, segment.End, segment.Strip), tolerance, pieces);
    }

    private static void Add(Segment piece, double tolerance, List<Segment> pieces)
    {
        for (var i = 0; i < pieces.Count; i++)
        {
            var other = pieces[i];
            if ((Near(piece.Start, other.Start, tolerance) && Near(piece.End, other.End, tolerance))
                || (Near(piece.Start, other.End, tolerance) && Near(piece.End, other.Start, tolerance)))
            {
                // A strip stays a strip where a boundary runs through it.
                if (other.Strip < 0)
                    pieces[i] = other with { Strip = piece.Strip };
                return;
            }
        }

        pieces.Add(piece);
    }

    /// <summary>True where two points are one within the tolerance (twice of it, because both may have been moved).</summary>
    public static bool Near(Complex a, Complex b, double tolerance) =>
        Math.Abs(a.Real - b.Real) <= 2 * tolerance && Math.Abs(a.Imaginary - b.Imaginary) <= 2 * tolerance;
}
