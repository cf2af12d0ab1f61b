using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Layered;

/// <summary>
/// Conductors as thin strips: lower face, waist and upper face of the trapezoid, shorted together. The faces have their true widths. Side walls are
/// left out; in their place the waist strip stands out on each side, so that the field which leaks between the strips meets the same resistance.
/// </summary>
internal static class StripModel
{
    /// <summary>
    /// How far the waist stands out of the trapezoid on each side, as a fraction of the thickness: chosen so that thick rectangular strips between planes and over
    /// a plane have the capacitance of the exact Schwarz-Christoffel solutions (reference families h and j) within 0.35 %.
    /// </summary>
    private const double WaistOverhang = 0.24;

    /// <summary>A conductor thinner than this part of its width and of its height over the plane counts as a thin strip.</summary>
    private const double ThinFraction = 2e-4;

    /// <summary>A pour farther away than this many heights of the line carries no charge.</summary>
    private const double PourReach = 2;

    /// <summary>Heights of the strips of a conductor, y in metres.</summary>
    /// <param name="c">The conductor.</param>
    /// <param name="height">Its distance to the nearest plane, metres.</param>
    public static double[] Heights(SectionConductor c, double height) => IsThin(c, height)
        ? [c.BottomMetres]
        : [c.BottomMetres, c.BottomMetres + 0.5 * c.ThicknessMetres, c.TopMetres];

    /// <summary>Distance of a conductor to the nearest plane, metres.</summary>
    /// <param name="c">The conductor.</param>
    /// <param name="section">Its section, with a bottom plane.</param>
    public static double HeightOf(SectionConductor c, CrossSection section)
    {
        var below = c.BottomMetres - section.BottomPlaneMetres!.Value;
        return section.TopPlaneMetres is { } top ? Math.Min(below, top - c.TopMetres) : below;
    }

    /// <summary>The strips of all conductors.</summary>
    /// <param name="section">The section.</param>
    /// <param name="nodeAt">Index of the node at a height y in metres.</param>
    /// <param name="even">True where all conductors are centred above each other.</param>
    public static ThinStrip[] Strips(CrossSection section, Func<double, int> nodeAt, bool even)
    {
        var strips = new List<ThinStrip>();
        for (var i = 0; i < section.Conductors.Length; i++)
        {
            var c = section.Conductors[i];
            var height = HeightOf(c, section);
            var (centre, cut) = c.Grounded ? NearPart(c, section, height) : (c.CentreMetres, 0);
            var terms = Terms(c.WideMetres - cut, height, even) + (c.Grounded ? 2 : 0);
            double lower = c.LowerWidthMetres - cut, upper = c.UpperWidthMetres - cut;
            strips.Add(new ThinStrip(i, nodeAt(c.BottomMetres), centre, 0.5 * lower, terms));
            if (IsThin(c, height))
                continue;
            var overhang = Math.Min(WaistOverhang * c.ThicknessMetres, 0.25 * GapBeside(c, section));
            var waist = 0.5 * (lower + upper) + 2 * overhang;
            strips.Add(new ThinStrip(i, nodeAt(c.BottomMetres + 0.5 * c.ThicknessMetres), centre, 0.5 * waist, terms));
            strips.Add(new ThinStrip(i, nodeAt(c.TopMetres), centre, 0.5 * upper, terms));
        }
        return [.. strips];
    }

    private static bool IsThin(SectionConductor c, double height) => c.ThicknessMetres <= ThinFraction * Math.Min(c.NarrowMetres, height);

    /// <summary>A wide strip has a flat charge in its middle and steep ends, which takes more terms.</summary>
    private static int Terms(double width, double height, bool even)
    {
        var more = width > 20 * height ? 2 : width > 3 * height ? 1 : 0;
        return even ? 2 + more : 3 + 2 * more;
    }

    /// <summary>Centre of the part of a pour that carries charge, and the width that is cut away on its far side.</summary>
    private static (double Centre, double Cut) NearPart(SectionConductor c, CrossSection section, double height)
    {
        var reach = PourReach * (height + c.ThicknessMetres);
        var signalsLeft = section.Signals.Any(s => s.CentreMetres < c.CentreMetres);
        var signalsRight = section.Signals.Any(s => s.CentreMetres > c.CentreMetres);
        var cut = c.WideMetres - reach;
        if (cut <= 0 || reach <= c.WideMetres - c.NarrowMetres || signalsLeft == signalsRight)
            return (c.CentreMetres, 0);
        return (c.CentreMetres + (signalsRight ? 0.5 : -0.5) * cut, cut);
    }

    /// <summary>Distance from a conductor to the nearest other one beside it, metres; infinite where there is none.</summary>
    /// <param name="c">The conductor.</param>
    /// <param name="section">Its section.</param>
    public static double GapBeside(SectionConductor c, CrossSection section)
    {
        var least = double.PositiveInfinity;
        foreach (var other in section.Conductors)
        {
            if (!ReferenceEquals(other, c) && other.BottomMetres < c.TopMetres && other.TopMetres > c.BottomMetres)
                least = Math.Min(least, Math.Abs(other.CentreMetres - c.CentreMetres) - 0.5 * (other.WideMetres + c.WideMetres));
        }
        return least;
    }
}
