using System.Globalization;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Geometry;

/// <summary>Refuses sections that no field can be computed for, in words that say which part is at fault.</summary>
internal static class SectionChecks
{
    /// <summary>Lengths nearer than this are one: a hundred-thousandth of the smallest dimension, in metres.</summary>
    public static double Tolerance(CrossSection section)
    {
        var smallest = double.PositiveInfinity;
        foreach (var c in section.Conductors)
        {
            smallest = Math.Min(smallest, c.NarrowMetres);
            if (c.ThicknessMetres > 0)
                smallest = Math.Min(smallest, c.ThicknessMetres);
        }

        foreach (var slab in section.Slabs)
            smallest = Math.Min(smallest, slab.ThicknessMetres);
        foreach (var mask in new[] { section.TopMask, section.BottomMask })
        {
            if (mask is { OverLaminateMetres: > 0 })
                smallest = Math.Min(smallest, mask.OverLaminateMetres);
            if (mask is { OverCopperMetres: > 0 })
                smallest = Math.Min(smallest, mask.OverCopperMetres);
        }

        return 1e-5 * smallest;
    }

    /// <summary>Throws where a dimension or a place makes no sense.</summary>
    public static void Check(CrossSection section)
    {
        if (section.Conductors.All(c => c.Grounded))
            throw new SectionNotSolvableException("The cross-section has no signal conductor; give it at least one that is not grounded.");
        foreach (var c in section.Conductors)
            Check(c, section);
        CheckSlabs(section);
        CheckMask(section.TopMask, "top");
        CheckMask(section.BottomMask, "bottom");
        if (section.BottomPlaneMetres is null && section.TopPlaneMetres is null && !section.Conductors.Any(c => c.Grounded))
            throw new SectionNotSolvableException(
                "The cross-section has nothing at zero volts; give it a plane or a grounded conductor for the return current.");
        if (section.BottomPlaneMetres >= section.TopPlaneMetres)
            throw new SectionNotSolvableException(
                $"The top plane at {Micro(section.TopPlaneMetres.Value)} is not above the bottom plane at "
                + $"{Micro(section.BottomPlaneMetres.Value)}.");
    }

    /// <summary>A length in micrometres for a message.</summary>
    public static string Micro(double metres) => (metres * 1e6).ToString("0.###", CultureInfo.InvariantCulture) + " um";

    private static void Check(SectionConductor c, CrossSection section)
    {
        double[] numbers = [c.CentreMetres, c.WideMetres, c.NarrowMetres, c.ThicknessMetres, c.BottomMetres];
        if (!numbers.All(double.IsFinite))
            throw new SectionNotSolvableException($"Conductor {c.Name} has a dimension that is not a finite number.");
        if (c.NarrowMetres <= 0 || c.WideMetres * (1 + 1e-9) < c.NarrowMetres)
            throw new SectionNotSolvableException(
                $"Conductor {c.Name} has faces {Micro(c.NarrowMetres)} and {Micro(c.WideMetres)} wide; "
                    + "the narrow one must be above zero and at most as wide as the wide one.");
        if (c.ThicknessMetres < 0)
            throw new SectionNotSolvableException(
                $"Conductor {c.Name} is {Micro(c.ThicknessMetres)} thick; "
                + "the thickness must not be negative.");
        var slack = 1e-9 * (c.ThicknessMetres + Math.Abs(c.BottomMetres));
        if (c.BottomMetres < section.BottomPlaneMetres - slack || c.TopMetres > section.TopPlaneMetres + slack)
            throw new SectionNotSolvableException($"Conductor {c.Name} reaches through a plane; it must lie between the planes.");
    }

    private static void CheckSlabs(CrossSection section)
    {
        for (var i = 0; i < section.Slabs.Length; i++)
        {
            var slab = section.Slabs[i];
            if (!(slab.ThicknessMetres > 0) || !double.IsFinite(slab.TopMetres) || !double.IsFinite(slab.BottomMetres))
                throw new SectionNotSolvableException(
                    $"Dielectric {slab.Dielectric.Name} is {Micro(slab.ThicknessMetres)} thick; "
                    + "the thickness must be above zero.");
            CheckConstant(slab.Dielectric);
            if (i > 0 && Math.Abs(slab.BottomMetres - section.Slabs[i - 1].TopMetres) > 1e-6 * slab.ThicknessMetres)
                throw new SectionNotSolvableException(
                    $"Dielectric {slab.Dielectric.Name} starts at {Micro(slab.BottomMetres)} but the one below it ends at {Micro(section.Slabs[i - 1].TopMetres)}; "
                        + "slabs must touch.");
        }
    }

    private static void CheckMask(SectionMask? mask, string side)
    {
        if (mask is null)
            return;
        CheckConstant(mask.Dielectric);
        if (!(mask.OverLaminateMetres >= 0 && mask.OverCopperMetres >= 0)
            || !double.IsFinite(mask.OverLaminateMetres + mask.OverCopperMetres))
            throw new SectionNotSolvableException($"The {side} mask has a thickness that is negative or not a number.");
    }

    private static void CheckConstant(SectionDielectric dielectric)
    {
        if (!(dielectric.Dk >= 1) || !double.IsFinite(dielectric.Dk))
            throw new SectionNotSolvableException(
                $"Dielectric {dielectric.Name} has Dk {dielectric.Dk.ToString(CultureInfo.InvariantCulture)}; it must be at least 1.");
    }
}
