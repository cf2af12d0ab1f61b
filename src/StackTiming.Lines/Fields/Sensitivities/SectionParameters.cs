using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Sensitivities;

/// <summary>The parameters of a cross-section and how it changes with each.</summary>
public static class SectionParameters
{
    /// <summary>Every geometric parameter and every permittivity of the section.</summary>
    public static IReadOnlyList<SectionParameter> Of(CrossSection section)
    {
        var parameters = new List<SectionParameter>();
        for (var i = 0; i < section.Slabs.Length; i++)
            parameters.Add(Thickness(section, i));
        foreach (var name in Dielectrics(section))
            parameters.Add(Permittivity(section, name.Name, name.Dk));
        for (var i = 0; i < section.Conductors.Length; i++)
            AddConductor(parameters, section, i);
        if (section.TopMask is { } top)
            AddMask(parameters, "top mask", top, m => section with { TopMask = m });
        if (section.BottomMask is { } bottom)
            AddMask(parameters, "bottom mask", bottom, m => section with { BottomMask = m });
        return parameters;
    }

    private static IEnumerable<SectionDielectric> Dielectrics(CrossSection section)
    {
        var all = section.Slabs.Select(s => s.Dielectric).ToList();
        if (section.TopMask is { } top)
            all.Add(top.Dielectric);
        if (section.BottomMask is { } bottom)
            all.Add(bottom.Dielectric);
        return all.DistinctBy(d => d.Name);
    }

    private static SectionParameter Thickness(CrossSection section, int index)
    {
        var slab = section.Slabs[index];
        return new SectionParameter(
            ParameterKind.SlabThickness, slab.Dielectric.Name, slab.ThicknessMetres, slab.ThicknessMetres, t =>
                Thicken(section, index, t - slab.ThicknessMetres));
    }

    /// <summary>Moves up everything that stands on the slab, lies above it or hangs from its upper face.</summary>
    private static CrossSection Thicken(CrossSection section, int index, double rise)
    {
        var slab = section.Slabs[index];
        var near = 1e-6 * slab.ThicknessMetres;
        bool Moves(SectionConductor c) => c.BottomMetres >= slab.TopMetres - near
            || (c.BottomMetres > slab.BottomMetres + near && Math.Abs(c.TopMetres - slab.TopMetres) <= near);
        return section with
        {
            Slabs = [.. section.Slabs.Select((s, i) => i < index ? s
                : s with { BottomMetres = i == index ? s.BottomMetres : s.BottomMetres + rise, TopMetres = s.TopMetres + rise })],
            TopPlaneMetres = section.TopPlaneMetres + rise,
            Conductors = [.. section.Conductors.Select(c => Moves(c) ? c with { BottomMetres = c.BottomMetres + rise } : c)],
        };
    }

    private static SectionParameter Permittivity(CrossSection section, string name, double value)
    {
        SectionDielectric Set(SectionDielectric d, double dk) => d.Name == name ? d with { Dk = dk } : d;
        SectionMask? SetMask(SectionMask? mask, double dk) => mask is null ? null : mask with { Dielectric = Set(mask.Dielectric, dk) };
        return new SectionParameter(ParameterKind.DielectricConstant, name, value, value, dk => section with
        {
            Slabs = [.. section.Slabs.Select(s => s with { Dielectric = Set(s.Dielectric, dk) })],
            TopMask = SetMask(section.TopMask, dk),
            BottomMask = SetMask(section.BottomMask, dk),
        });
    }

    private static void AddConductor(List<SectionParameter> parameters, CrossSection section, int index)
    {
        var c = section.Conductors[index];
        CrossSection With(SectionConductor changed) => section with { Conductors = section.Conductors.SetItem(index, changed) };
        parameters.Add(new SectionParameter(
            ParameterKind.Width, c.Name, c.WideMetres, c.NarrowMetres, w =>
                With(c with { WideMetres = w, NarrowMetres = w - (c.WideMetres - c.NarrowMetres) })));
        parameters.Add(new SectionParameter(
            ParameterKind.Position, c.Name, c.CentreMetres, c.WideMetres, x => With(c with { CentreMetres = x })));
        if (c.ThicknessMetres <= 0)
            return;
        parameters.Add(new SectionParameter(
            ParameterKind.ConductorThickness, c.Name, c.ThicknessMetres, c.ThicknessMetres,
            t => With(c with { ThicknessMetres = t, BottomMetres = c.WideFaceDown ? c.BottomMetres : c.TopMetres - t })));
        if (c.NarrowMetres < c.WideMetres)
        {
            parameters.Add(new SectionParameter(
                ParameterKind.NarrowWidth, c.Name, c.NarrowMetres, Math.Min(c.WideMetres - c.NarrowMetres, c.NarrowMetres), w =>
                    With(c with { NarrowMetres = w })));
        }
    }

    private static void AddMask(List<SectionParameter> parameters, string subject, SectionMask mask, Func<SectionMask, CrossSection> with)
    {
        if (mask.OverLaminateMetres > 0)
        {
            parameters.Add(new SectionParameter(
                ParameterKind.MaskOverLaminate, subject, mask.OverLaminateMetres, mask.OverLaminateMetres, t =>
                    with(mask with { OverLaminateMetres = t })));
        }

        if (mask.OverCopperMetres > 0)
        {
            parameters.Add(new SectionParameter(
                ParameterKind.MaskOverCopper, subject, mask.OverCopperMetres, mask.OverCopperMetres, t =>
                    with(mask with { OverCopperMetres = t })));
        }
    }
}
