using System.Collections.Immutable;
using System.Numerics;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Geometry;

/// <summary>
/// Every surface of a section that carries charge, cut where surfaces meet. Of a symmetric section only the right half.
/// </summary>
internal sealed class SectionSurfaces
{
    private readonly CrossSection section;
    private readonly double tolerance;
    private readonly bool half;

    private SectionSurfaces(CrossSection section, bool half, double tolerance)
    {
        this.section = section;
        this.half = half;
        this.tolerance = tolerance;
        Regions = new SectionRegions(section);
        Reach = FarEnough();
        var segments = SegmentArrangement.Cut(Halved(Segments()), tolerance);
        var pieces = segments.Select(Classify).OfType<SurfacePiece>().ToList();
        Pieces = PieceJoints.Finish(pieces, section, half, tolerance, IsAtReach);
        if (section.TopPlaneMetres is null)
            Pieces = Pieces.AddRange(Tails());
        CheckEverySignalShows();
    }

    /// <summary>The surfaces.</summary>
    public ImmutableArray<SurfacePiece> Pieces { get; }

    /// <summary>What fills the section.</summary>
    public SectionRegions Regions { get; }

    /// <summary>Distance from the origin at which boundaries are cut off (two planes) or their tails begin, in metres.</summary>
    public double Reach { get; }

    /// <summary>Cuts a section that is in the solver's frame into its surfaces.</summary>
    public static SectionSurfaces Of(CrossSection section, bool symmetric, double tolerance) => new(section, symmetric, tolerance);

    private double FarEnough()
    {
        var extent = section.Conductors.Max(c => Math.Abs(c.CentreMetres) + c.WideMetres / 2);
        foreach (var outline in Regions.TopOutlines.Concat(Regions.BottomOutlines))
            extent = Math.Max(extent, Math.Abs(outline.CentreMetres) + Math.Max(outline.FootHalfWidthMetres, outline.HeadHalfWidthMetres));
        // Between two planes fields die as exp(-pi x/b); five plane distances leave less than 2e-7.
        if (section.TopPlaneMetres is { } top)
            return extent + 5 * top;
        var highest = section.Conductors.Max(c => c.TopMetres);
        var height = section.Slabs.IsEmpty ? highest : Math.Max(highest, section.Slabs[^1].TopMetres);
        return 1.5 * extent + 3 * Math.Min(height, 10 * extent);
    }

    private List<Segment> Segments()
    {
        var segments = new List<Segment>();
        for (var i = 0; i < section.Conductors.Length; i++)
            AddConductor(segments, section.Conductors[i], i);
        foreach (var y in InterfaceHeights())
            segments.Add(new Segment(new Complex(-Reach, y), new Complex(Reach, y), -1));
        foreach (var outline in Regions.TopOutlines.Concat(Regions.BottomOutlines))
        {
            var (x, foot, head) = (outline.CentreMetres, outline.FootHalfWidthMetres, outline.HeadHalfWidthMetres);
            segments.Add(new Segment(new Complex(x - foot, outline.FootMetres), new Complex(x - head, outline.HeadMetres), -1));
            segments.Add(new Segment(new Complex(x - head, outline.HeadMetres), new Complex(x + head, outline.HeadMetres), -1));
            segments.Add(new Segment(new Complex(x + head, outline.HeadMetres), new Complex(x + foot, outline.FootMetres), -1));
        }

        return segments;
    }

    private static void AddConductor(List<Segment> segments, SectionConductor c, int index)
    {
        var (x, lower, upper) = (c.CentreMetres, c.LowerWidthMetres / 2, c.UpperWidthMetres / 2);
        if (c.ThicknessMetres <= 0)
        {
            var (centre, side) = (new Complex(x, c.BottomMetres), new Complex(c.WideMetres / 2, 0));
            segments.Add(new Segment(centre - side, centre + side, index));
            return;
        }

        Complex[] corners =
        [
            new(x - lower, c.BottomMetres), new(x + lower, c.BottomMetres), new(x + upper, c.TopMetres), new(x - upper, c.TopMetres),
        ];
        for (var i = 0; i < corners.Length; i++)
            segments.Add(new Segment(corners[i], corners[(i + 1) % corners.Length], -1));
    }

    private IEnumerable<double> InterfaceHeights()
    {
        var heights = section.Slabs.Select(s => s.BottomMetres).ToList();
        if (!section.Slabs.IsEmpty)
        {
            heights.Add(section.Slabs[^1].TopMetres);
            if (section.TopMask is { OverLaminateMetres: > 0 } top)
                heights.Add(section.Slabs[^1].TopMetres + top.OverLaminateMetres);
            if (section.BottomMask is { OverLaminateMetres: > 0 } bottom)
                heights.Add(section.Slabs[0].BottomMetres - bottom.OverLaminateMetres);
        }

        return heights.Where(y => !(y <= section.BottomPlaneMetres + tolerance) && !(y >= section.TopPlaneMetres - tolerance));
    }

    private List<Segment> Halved(List<Segment> segments)
    {
        if (!half)
            return segments;
        var kept = new List<Segment>();
        foreach (var s in segments)
        {
            var (a, b) = s.Start.Real <= s.End.Real ? (s.Start, s.End) : (s.End, s.Start);
            if (b.Real <= tolerance)
                continue;
            if (a.Real < -tolerance)
                a = new Complex(0, a.Imaginary + (b - a).Imaginary * -a.Real / (b - a).Real);
            kept.Add(new Segment(a, b, s.Strip));
        }

        return kept;
    }

    private SurfacePiece? Classify(Segment segment)
    {
        var along = segment.End - segment.Start;
        var side = new Complex(-along.Imaginary, along.Real) / along.Magnitude * Math.Max(1e-6 * along.Magnitude, 4 * tolerance);
        var (left, right) = (Regions.At(segment.Middle + side), Regions.At(segment.Middle - side));
        var strip = segment.Strip;
        if (strip >= 0)
        {
            Separate(left, ~strip);
            Separate(right, ~strip);
            return left < 0 || right < 0 ? null : new SurfacePiece(segment.Start, segment.End, left, right, strip, default, default, false);
        }

        if (left < 0 && right < 0)
        {
            Separate(left, right);
            return null;
        }

        if (left < 0)
            return new SurfacePiece(segment.End, segment.Start, right, -1, ~left, default, default, false);
        if (right < 0)
            return new SurfacePiece(segment.Start, segment.End, left, -1, ~right, default, default, false);
        return left == right ? null : new SurfacePiece(segment.Start, segment.End, left, right, -1, default, default, false);
    }

    /// <summary>Two pieces of metal that meet must be the same conductor or both grounded.</summary>
    private void Separate(int a, int b)
    {
        if (a >= 0 || b >= 0 || a == b || (Regions.IsGround(a) && Regions.IsGround(b)))
            return;
        throw new SectionNotSolvableException(
            a == SectionRegions.Plane || b == SectionRegions.Plane
                ? $"Signal conductor {section.Conductors[~Math.Max(a, b)].Name} touches a plane; leave dielectric between them."
                : $"Conductors {section.Conductors[~a].Name} and {section.Conductors[~b].Name} touch or overlap; "
                    + "leave a gap between them.");
    }

    private bool IsAtReach(Complex point) => Math.Abs(point.Real) >= Reach - tolerance;

    private IEnumerable<SurfacePiece> Tails()
    {
        foreach (var piece in Pieces.Where(p => p.Conductor < 0))
        {
            if (piece.End.Real >= Reach - tolerance || piece.End.Real <= -Reach + tolerance)
                yield return TailFrom(piece);
            if (piece.Start.Real >= Reach - tolerance || piece.Start.Real <= -Reach + tolerance)
                yield return TailFrom(piece.Reversed());
        }
    }

    /// <summary>From the end of a piece straight on to infinity.</summary>
    private static SurfacePiece TailFrom(SurfacePiece piece) => piece with
    {
        Start = piece.End,
        End = piece.End + piece.End.Real,
        StartKind = PieceEnd.Smooth,
        Infinite = true,
    };

    private void CheckEverySignalShows()
    {
        for (var i = 0; i < section.Conductors.Length; i++)
        {
            var c = section.Conductors[i];
            if (!c.Grounded && (!half || c.CentreMetres > -tolerance) && !Pieces.Any(p => p.Conductor == i))
                throw new SectionNotSolvableException(
                    $"Signal conductor {c.Name} lies inside another conductor; "
                    + "leave a gap between them.");
        }
    }
}
