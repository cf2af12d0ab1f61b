using System.Collections.Immutable;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Geometry;

/// <summary>
/// The outline of conformal mask round one conductor: the conductor's own outline with every corner moved out by the mask's thickness
/// over copper, sideways and away from the laminate. A trapezoid standing on the laminate.
/// </summary>
/// <param name="CentreMetres">x of its axis.</param>
/// <param name="FootMetres">y of the laminate that it stands on.</param>
/// <param name="FootHalfWidthMetres">Half of its width on the laminate.</param>
/// <param name="HeadMetres">y of its far face.</param>
/// <param name="HeadHalfWidthMetres">Half of the width of its far face.</param>
internal readonly record struct MaskOutline(
    double CentreMetres,
    double FootMetres,
    double FootHalfWidthMetres,
    double HeadMetres,
    double HeadHalfWidthMetres)
{
    /// <summary>Outlines of the conductors that rise above the highest slab; of one sunk into the slab, the part above it counts.</summary>
    public static ImmutableArray<MaskOutline> OnTop(CrossSection section, SectionMask mask)
    {
        if (section.Slabs.IsEmpty)
            return [];
        var foot = section.Slabs[^1].TopMetres;
        return
        [
            .. section.Conductors
                .Where(c => c.TopMetres > foot || (c.ThicknessMetres == 0 && c.BottomMetres >= foot))
                .Select(c => Round(c, mask.OverCopperMetres, foot, 1))
        ];
    }

    /// <summary>Outlines of the conductors that hang below the lowest slab.</summary>
    public static ImmutableArray<MaskOutline> Below(CrossSection section, SectionMask mask)
    {
        if (section.Slabs.IsEmpty)
            return [];
        var foot = section.Slabs[0].BottomMetres;
        return
        [
            .. section.Conductors
                .Where(c => c.BottomMetres < foot || (c.ThicknessMetres == 0 && c.TopMetres <= foot))
                .Select(c => Round(c, mask.OverCopperMetres, foot, -1))
        ];
    }

    /// <summary>True where the outline holds the point.</summary>
    public bool Holds(double x, double y)
    {
        var height = (y - FootMetres) / (HeadMetres - FootMetres);
        return height is >= 0 and < 1
            && Math.Abs(x - CentreMetres) < FootHalfWidthMetres + height * (HeadHalfWidthMetres - FootHalfWidthMetres);
    }

    private static MaskOutline Round(SectionConductor c, double cover, double foot, int side)
    {
        var (near, far) = side > 0 ? (c.BottomMetres, c.TopMetres) : (c.TopMetres, c.BottomMetres);
        var (nearWidth, farWidth) = side > 0 ? (c.LowerWidthMetres, c.UpperWidthMetres) : (c.UpperWidthMetres, c.LowerWidthMetres);
        var sunk = side * (foot - near);
        var footWidth = sunk > 0 && c.ThicknessMetres > 0 ? nearWidth + (farWidth - nearWidth) * sunk / c.ThicknessMetres : nearWidth;
        return new MaskOutline(c.CentreMetres, foot, footWidth / 2 + cover, far + side * cover, farWidth / 2 + cover);
    }
}
