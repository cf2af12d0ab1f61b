using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Loss;

/// <summary>A section whose metal walls are moved back into the metal, as the incremental-inductance rule asks.</summary>
internal static class RecededWalls
{
    /// <summary>Smallest length of the metal and of the distance to a plane: the scale of a small step, in metres.</summary>
    /// <param name="section">The section.</param>
    public static double Scale(CrossSection section)
    {
        var least = double.PositiveInfinity;
        foreach (var c in section.Conductors)
        {
            least = Math.Min(least, Math.Min(c.ThicknessMetres, c.NarrowMetres));
            if (section.BottomPlaneMetres is { } bottom)
                least = Math.Min(least, c.BottomMetres - bottom);
            if (section.TopPlaneMetres is { } top)
                least = Math.Min(least, top - c.TopMetres);
        }
        return least;
    }

    /// <summary>The section in air with every wall moved into its metal, planes included.</summary>
    /// <param name="section">The section.</param>
    /// <param name="step">How far, in metres; negative moves the walls out of the metal.</param>
    public static CrossSection InAir(CrossSection section, double step)
    {
        return section with
        {
            Slabs = [],
            BottomPlaneMetres = section.BottomPlaneMetres - step,
            TopPlaneMetres = section.TopPlaneMetres + step,
            TopMask = null,
            BottomMask = null,
            Conductors = [.. section.Conductors.Select(c => Recede(c, step))],
        };
    }

    private static SectionConductor Recede(SectionConductor c, double step)
    {
        // Each face keeps its slope: a flank moved by the step along its normal moves sideways by step/cos of its lean, corrected for the faces' own move.
        var undercut = 0.5 * (c.WideMetres - c.NarrowMetres);
        var lean = undercut / c.ThicknessMetres;
        var sideways = step * Math.Sqrt(1 + lean * lean);
        return c with
        {
            WideMetres = c.WideMetres - 2 * (sideways + lean * step),
            NarrowMetres = c.NarrowMetres - 2 * (sideways - lean * step),
            ThicknessMetres = c.ThicknessMetres - 2 * step,
            BottomMetres = c.BottomMetres + step,
        };
    }
}
