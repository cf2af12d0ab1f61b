namespace StackTiming.Lines.Sections;

/// <summary>Turns sections upside down. Impedances do not notice.</summary>
internal static class Mirror
{
    /// <summary>The section seen from the other face of the board, so that a plane above comes to lie at y = 0 below.</summary>
    /// <param name="section">The section.</param>
    public static CrossSection UpsideDown(CrossSection section)
    {
        var axis = section.TopPlaneMetres ?? section.Slabs[^1].TopMetres;
        return section with
        {
            Slabs = [.. section.Slabs.Reverse().Select(s => new DielectricSlab(s.Dielectric, axis - s.TopMetres, axis - s.BottomMetres))],
            BottomPlaneMetres = axis - section.TopPlaneMetres,
            TopPlaneMetres = axis - section.BottomPlaneMetres,
            Conductors = [.. section.Conductors.Select(c => c with { BottomMetres = axis - c.TopMetres, WideFaceDown = !c.WideFaceDown })],
            TopMask = section.BottomMask,
            BottomMask = section.TopMask,
        };
    }
}
