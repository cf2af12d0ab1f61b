using System.Collections.Immutable;
using System.Numerics;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Geometry;

/// <summary>
/// The solver's own coordinates: x from the axis of symmetry (or the middle of the conductors), y from the bottom plane, and a lone
/// plane always at the bottom.
/// </summary>
/// <param name="OriginX">x of the section's coordinates where the solver's is zero.</param>
/// <param name="OriginY">y of the section's coordinates where the solver's is zero.</param>
/// <param name="Upright">False where up and down are exchanged.</param>
/// <param name="Symmetric">True where the section is its own mirror image about the origin's vertical.</param>
internal readonly record struct SectionFrame(double OriginX, double OriginY, bool Upright, bool Symmetric)
{
    /// <summary>Chooses the frame of a section; lengths nearer than the tolerance are equal.</summary>
    public static SectionFrame Of(CrossSection section, double tolerance)
    {
        var left = section.Conductors.Min(c => c.CentreMetres - c.WideMetres / 2);
        var right = section.Conductors.Max(c => c.CentreMetres + c.WideMetres / 2);
        var middle = (left + right) / 2;
        var upright = section.BottomPlaneMetres is not null || section.TopPlaneMetres is null;
        var originY = section.BottomPlaneMetres ?? section.TopPlaneMetres ?? section.Conductors.Min(c => c.BottomMetres);
        return new SectionFrame(middle, originY, upright, section.Conductors.All(c => HasTwin(section, c, middle, tolerance)));
    }

    /// <summary>The section in the solver's coordinates.</summary>
    public CrossSection Apply(CrossSection section)
    {
        var (dx, dy) = (OriginX, OriginY);
        var moved = section with
        {
            Slabs = [.. section.Slabs.Select(s => s with { BottomMetres = s.BottomMetres - dy, TopMetres = s.TopMetres - dy })],
            BottomPlaneMetres = section.BottomPlaneMetres - dy,
            TopPlaneMetres = section.TopPlaneMetres - dy,
            Conductors = [.. section.Conductors.Select(c =>
                c with { CentreMetres = c.CentreMetres - dx, BottomMetres = c.BottomMetres - dy })],
        };
        return Upright ? moved : UpsideDown(moved);
    }

    /// <summary>A point of the section in the solver's coordinates.</summary>
    public Complex Apply(double xMetres, double yMetres) =>
        new(xMetres - OriginX, Upright ? yMetres - OriginY : OriginY - yMetres);

    /// <summary>A point of the solver in the section's coordinates.</summary>
    public Complex Back(Complex point) =>
        new(point.Real + OriginX, Upright ? point.Imaginary + OriginY : OriginY - point.Imaginary);

    /// <summary>Index of the conductor that is the mirror image of this one.</summary>
    public static int TwinOf(ImmutableArray<SectionConductor> conductors, int index, double tolerance)
    {
        var c = conductors[index];
        for (var i = 0; i < conductors.Length; i++)
        {
            if (IsTwin(c, conductors[i], 0, tolerance))
                return i;
        }

        return -1;
    }

    /// <summary>True where a conductor is its own mirror image, or the image of another that it does not touch.</summary>
    private static bool HasTwin(CrossSection section, SectionConductor c, double axis, double tolerance) =>
        section.Conductors.Any(other => IsTwin(c, other, axis, tolerance))
        && (Math.Abs(c.CentreMetres - axis) <= tolerance / 2 || Math.Abs(c.CentreMetres - axis) > c.WideMetres / 2 + tolerance);

    private static bool IsTwin(SectionConductor a, SectionConductor b, double axis, double tolerance) =>
        a.Grounded == b.Grounded
        && Math.Abs(a.CentreMetres + b.CentreMetres - 2 * axis) <= tolerance
        && Math.Abs(a.BottomMetres - b.BottomMetres) <= tolerance
        && Math.Abs(a.ThicknessMetres - b.ThicknessMetres) <= tolerance
        && Math.Abs(a.LowerWidthMetres - b.LowerWidthMetres) <= tolerance
        && Math.Abs(a.UpperWidthMetres - b.UpperWidthMetres) <= tolerance;

    private static CrossSection UpsideDown(CrossSection section) => section with
    {
        Slabs = [.. section.Slabs.Reverse().Select(s => s with { BottomMetres = -s.TopMetres, TopMetres = -s.BottomMetres })],
        BottomPlaneMetres = -section.TopPlaneMetres,
        TopPlaneMetres = -section.BottomPlaneMetres,
        Conductors = [.. section.Conductors.Select(c => c with { BottomMetres = -c.TopMetres, WideFaceDown = !c.WideFaceDown })],
        TopMask = section.BottomMask,
        BottomMask = section.TopMask,
    };
}
