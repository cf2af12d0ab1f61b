using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Methods;

/// <summary>The shapes of cross-section that closed forms tell apart.</summary>
public enum SectionKind
{
    /// <summary>None of the shapes below.</summary>
    Other,
    /// <summary>One bare trace standing on one dielectric over a plane.</summary>
    SurfaceMicrostrip,
    /// <summary>One trace over a plane with mask, cover or several dielectrics.</summary>
    LayeredMicrostrip,
    /// <summary>One trace between two planes.</summary>
    Stripline,
    /// <summary>Two like traces side by side over one plane.</summary>
    EdgeCoupledMicrostrip,
    /// <summary>Two like traces side by side between two planes.</summary>
    EdgeCoupledStripline,
    /// <summary>Two like traces above each other between two planes.</summary>
    Broadside,
    /// <summary>One trace between two grounded pours on its layer, over one plane.</summary>
    Coplanar,
    /// <summary>Two traces between two grounded pours on their layer, over one plane.</summary>
    CoplanarPair,
    /// <summary>Other traces over a plane or between two.</summary>
    Bus,
}

/// <summary>What kind of line a cross-section is.</summary>
/// <param name="Kind">The shape.</param>
/// <param name="IsHomogeneous">True where all slabs have the same permittivity, there is no mask, and no slab ends in air beside a trace's field.</param>
/// <param name="IsCentred">True for a single trace midway between two planes.</param>
public readonly record struct SectionGeometry(SectionKind Kind, bool IsHomogeneous, bool IsCentred)
{
    private const double Same = 1e-9;

    /// <summary>Recognises the shape of a section.</summary>
    /// <param name="section">The section.</param>
    public static SectionGeometry Of(CrossSection section)
    {
        var hasTop = section.TopPlaneMetres is not null;
        return new SectionGeometry(KindOf(section, hasTop), Homogeneous(section, hasTop), Centred(section));
    }

    private static SectionKind KindOf(CrossSection section, bool hasTop)
    {
        if (section.BottomPlaneMetres is null)
            return SectionKind.Other;
        var conductors = section.Conductors;
        var signals = 0;
        foreach (var conductor in conductors)
            signals += conductor.Grounded ? 0 : 1;
        var pours = conductors.Length - signals;
        if (pours == 2 && signals is 1 or 2 && !hasTop && OnOneLayer(section) && SignalsBetweenPours(section))
            return signals == 1 ? SectionKind.Coplanar : SectionKind.CoplanarPair;
        if (pours > 0)
            return SectionKind.Bus;
        return signals switch
        {
            1 when hasTop => SectionKind.Stripline,
            1 => IsBare(section) ? SectionKind.SurfaceMicrostrip : SectionKind.LayeredMicrostrip,
            2 when OnOneLayer(section) && Alike(conductors[0], conductors[1]) =>
                hasTop ? SectionKind.EdgeCoupledStripline : SectionKind.EdgeCoupledMicrostrip,
            2 when hasTop && Alike(conductors[0], conductors[1]) && Near(conductors[0].CentreMetres, conductors[1].CentreMetres, conductors[0].WideMetres) => SectionKind.Broadside,
            _ => SectionKind.Bus,
        };
    }

    /// <summary>True where traces stand on the top of a single slab in air, or in air alone.</summary>
    /// <param name="section">The section.</param>
    public static bool IsBare(CrossSection section) =>
        section.TopMask is null && section.TopPlaneMetres is null
        && (section.Slabs.IsEmpty
            || (section.Slabs.Length == 1 && section.Conductors.All(c => Near(c.BottomMetres, section.Slabs[0].TopMetres, section.Slabs[0].ThicknessMetres))));

    /// <summary>The dielectric on the lower plane: the only one of a homogeneous section.</summary>
    /// <param name="section">The section.</param>
    public static SectionDielectric LowestDielectric(CrossSection section) => section.Slabs.IsEmpty ? SectionDielectric.Air : section.Slabs[0].Dielectric;

    private static bool Homogeneous(CrossSection section, bool hasTop)
    {
        if (section.TopMask is not null || section.BottomMask is not null)
            return false;
        if (section.Slabs.IsEmpty)
            return true;
        var first = section.Slabs[0].Dielectric.Dk;
        return section.Slabs.All(s => s.Dielectric.Dk == first) && (hasTop || first == 1);
    }

    private static bool Centred(CrossSection section)
    {
        if (section.BottomPlaneMetres is not { } bottom || section.TopPlaneMetres is not { } top || section.Conductors.Length != 1)
            return false;
        var trace = section.Conductors[0];
        return Near(trace.BottomMetres - bottom, top - trace.TopMetres, top - bottom);
    }

    private static bool OnOneLayer(CrossSection section) =>
        section.Conductors.All(c => Near(c.BottomMetres, section.Conductors[0].BottomMetres, section.Conductors[0].WideMetres));

    private static bool SignalsBetweenPours(CrossSection section)
    {
        var fromLeft = section.Conductors.OrderBy(c => c.CentreMetres).ToArray();
        return fromLeft[0].Grounded && fromLeft[^1].Grounded;
    }

    private static bool Alike(SectionConductor a, SectionConductor b) =>
        Near(a.WideMetres, b.WideMetres, a.WideMetres) && Near(a.NarrowMetres, b.NarrowMetres, a.WideMetres)
        && Near(a.ThicknessMetres, b.ThicknessMetres, a.WideMetres);

    private static bool Near(double a, double b, double scale) => Math.Abs(a - b) <= Same * scale;
}
