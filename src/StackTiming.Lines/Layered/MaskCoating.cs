using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Layered;

/// <summary>
/// The conformal mask as flat layers. Up to its thickness on the laminate it is whole; above that it only coats the traces, and counts as a layer diluted
/// with air up to its top over the traces. The share of mask in the diluted layer is this project's own fit, not a published formula: it was chosen so
/// that the effective permittivity of 150 traces and 150 pairs (20 to 65 µm thick, 60 to 300 µm over the plane, 70 to 350 µm wide, coats of 8 to 30 µm, gaps from 70 µm, mask
/// permittivity 3 to 4) agrees with boundary-element solutions of the true outline; the largest difference left was 0.7 % for the traces and the even mode, 1.2 % for the odd mode.
/// </summary>
/// <param name="Tops">Tops of its layers, y in metres; empty without mask.</param>
/// <param name="IsDiluted">Whether each layer only coats the traces.</param>
/// <param name="BottomMetres">y of its lower face.</param>
/// <param name="Material">The mask material, or null.</param>
/// <param name="Share">Share of mask in the diluted layer around a trace without neighbours.</param>
/// <param name="TraceMetres">Height of the traces, metres.</param>
/// <param name="CoatMetres">Thickness of the coat on the traces, metres.</param>
/// <param name="HeightMetres">Height of the laminate over the plane, metres.</param>
internal sealed record MaskCoating(
    double[] Tops, bool[] IsDiluted, double BottomMetres, SectionDielectric? Material, double Share, double TraceMetres, double CoatMetres, double HeightMetres)
{
    private static readonly MaskCoating None = new([], [], 0, null, 0, 0, 0, 0);

    /// <summary>True where a part of the mask only coats the traces.</summary>
    public bool Coats => IsDiluted.Length > 1;

    /// <summary>Flattens the top mask of a section.</summary>
    /// <param name="section">A section with a bottom plane.</param>
    public static MaskCoating Of(CrossSection section)
    {
        if (section.TopMask is not { } mask || section.TopPlaneMetres is not null)
            return None;
        var bottom = section.Slabs[^1].TopMetres;
        var highest = bottom;
        foreach (var conductor in section.Conductors)
            highest = Math.Max(highest, conductor.TopMetres);
        var t = highest - bottom;
        var height = bottom - section.BottomPlaneMetres!.Value;
        double whole = mask.OverLaminateMetres, coated = t + mask.OverCopperMetres;
        if (t <= 0 || whole >= coated)
            return whole > 0 ? new MaskCoating([bottom + whole], [false], bottom, mask.Dielectric, 1, t, mask.OverCopperMetres, height) : None;
        var share = Math.Min(1, 0.505 * Math.Pow(mask.OverCopperMetres / t, 0.606) * Math.Pow(height / t, -0.229));
        return new MaskCoating([bottom + whole, bottom + coated], [false, true], bottom, mask.Dielectric, share, t, mask.OverCopperMetres, height);
    }

    /// <summary>
    /// Share of mask in the diluted layer as the field between two neighbours sees it: more than around a lone trace, and all of it once the coats meet.
    /// </summary>
    /// <param name="gapMetres">Distance between the neighbours, metres.</param>
    public double GapShare(double gapMetres)
    {
        var covered = 2 * CoatMetres / gapMetres;
        if (covered >= 1)
            return 1;
        var share = 0.610 * Math.Pow(CoatMetres / TraceMetres, 0.562) * Math.Pow(HeightMetres / TraceMetres, -0.086) * Math.Pow(gapMetres / TraceMetres, -0.162)
            * Math.Exp(0.422 * covered * covered * covered);
        return Math.Clamp(share, Share, 1);
    }
}
