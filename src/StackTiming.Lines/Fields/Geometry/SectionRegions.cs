using System.Collections.Immutable;
using System.Numerics;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Geometry;

/// <summary>
/// Says what fills a point of a cross-section. Points are complex numbers x + iy in metres. Dielectrics have the numbers 0, 1, …
/// of <see cref="Media"/>; a conductor has the complement of its index in the section; beyond a plane is <see cref="Plane"/>.
/// </summary>
internal sealed class SectionRegions
{
    /// <summary>What <see cref="At"/> answers beyond an infinite plane.</summary>
    public const int Plane = int.MinValue;

    private readonly CrossSection section;
    private readonly List<SectionDielectric> media = [];
    private readonly int[] slabMedia;
    private readonly int topMaskMedium;
    private readonly int bottomMaskMedium;

    public SectionRegions(CrossSection section)
    {
        this.section = section;
        slabMedia = [.. section.Slabs.Select(s => Index(s.Dielectric))];
        topMaskMedium = section.TopMask is { } top ? Index(top.Dielectric) : -1;
        bottomMaskMedium = section.BottomMask is { } bottom ? Index(bottom.Dielectric) : -1;
        Air = Index(SectionDielectric.Air);
        TopOutlines = section.TopMask is { } upper ? MaskOutline.OnTop(section, upper) : [];
        BottomOutlines = section.BottomMask is { } lower ? MaskOutline.Below(section, lower) : [];
    }

    /// <summary>The dielectrics that the section consists of, air among them.</summary>
    public IReadOnlyList<SectionDielectric> Media => media;

    /// <summary>Number of the air.</summary>
    public int Air { get; }

    /// <summary>Outline of the top mask round every conductor above the laminate.</summary>
    public ImmutableArray<MaskOutline> TopOutlines { get; }

    /// <summary>Outline of the bottom mask round every conductor below the laminate.</summary>
    public ImmutableArray<MaskOutline> BottomOutlines { get; }

    /// <summary>What fills the point: a dielectric's number, the complement of a conductor's index, or <see cref="Plane"/>.</summary>
    public int At(Complex point)
    {
        var (x, y) = (point.Real, point.Imaginary);
        if (y < section.BottomPlaneMetres || y > section.TopPlaneMetres)
            return Plane;
        for (var i = 0; i < section.Conductors.Length; i++)
        {
            if (Holds(section.Conductors[i], x, y))
                return ~i;
        }

        return Dielectric(x, y);
    }

    /// <summary>True where the region is grounded metal: a plane or a conductor at zero volts.</summary>
    public bool IsGround(int region) => region == Plane || (region < 0 && section.Conductors[~region].Grounded);

    private int Dielectric(double x, double y)
    {
        var slabs = section.Slabs;
        for (var i = 0; i < slabs.Length; i++)
        {
            if (y >= slabs[i].BottomMetres && y < slabs[i].TopMetres)
                return slabMedia[i];
        }

        if (slabs.Length == 0)
            return Air;
        if (section.TopMask is { } top && y >= slabs[^1].TopMetres
            && (y < slabs[^1].TopMetres + top.OverLaminateMetres || Covered(TopOutlines, x, y)))
            return topMaskMedium;
        if (section.BottomMask is { } bottom && y < slabs[0].BottomMetres
            && (y > slabs[0].BottomMetres - bottom.OverLaminateMetres || Covered(BottomOutlines, x, y)))
            return bottomMaskMedium;
        return Air;
    }

    private static bool Covered(ImmutableArray<MaskOutline> outlines, double x, double y)
    {
        foreach (var outline in outlines)
        {
            if (outline.Holds(x, y))
                return true;
        }

        return false;
    }

    private static bool Holds(SectionConductor c, double x, double y)
    {
        if (y < c.BottomMetres || y > c.TopMetres || c.ThicknessMetres <= 0)
            return false;
        var height = (y - c.BottomMetres) / c.ThicknessMetres;
        var width = c.LowerWidthMetres + height * (c.UpperWidthMetres - c.LowerWidthMetres);
        return Math.Abs(x - c.CentreMetres) < width / 2;
    }

    private int Index(SectionDielectric dielectric)
    {
        var index = media.FindIndex(m => m == dielectric);
        if (index >= 0)
            return index;
        media.Add(dielectric);
        return media.Count - 1;
    }
}
