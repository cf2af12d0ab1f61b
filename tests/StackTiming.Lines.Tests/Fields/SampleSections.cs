using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Tests.Fields;

/// <summary>Sections for tests that state a property instead of a reference value. Lengths in micrometres.</summary>
public static class SampleSections
{
    private const double Micrometre = 1e-6;

    /// <summary>A trapezoid standing on its wide face, or hanging from it.</summary>
    public static SectionConductor Trace(
        string name, double centre, double wide, double narrow, double thickness, double bottom, bool wideFaceDown = true,
            bool grounded = false) => new(
        name, grounded, centre * Micrometre, wide * Micrometre, narrow * Micrometre, thickness * Micrometre, bottom * Micrometre,
            wideFaceDown);

    /// <summary>A slab.</summary>
    public static DielectricSlab Slab(string name, double dk, double bottom, double top) =>
        new(new SectionDielectric(name, dk, 0), bottom * Micrometre, top * Micrometre);

    /// <summary>A mask.</summary>
    public static SectionMask Mask(double dk, double overLaminate, double overCopper) =>
        new(new SectionDielectric("mask", dk, 0), overLaminate * Micrometre, overCopper * Micrometre);

    /// <summary>A section of copper over a plane at zero height, or between two planes.</summary>
    public static CrossSection Section(
        IEnumerable<DielectricSlab> slabs, IEnumerable<SectionConductor> conductors, double? topPlane = null, SectionMask? mask = null) =>
            new(
        [.. slabs], 0, topPlane * Micrometre, [.. conductors], mask, null, new SectionMetal(1.7241e-8, 0));

    /// <summary>Traces of 120 µm at a pitch of 270 µm on 100 µm of prepreg, with or without mask.</summary>
    public static CrossSection MicrostripBus(int traces, SectionMask? mask = null) => Section(
        [Slab("prepreg", 3.8, 0, 100)],
        Enumerable.Range(0, traces).Select(i => Trace($"d{i}", 270 * i, 120, 100, 45, 100)),
        mask: mask);

    /// <summary>A bare trace on a slab over a plane.</summary>
    public static CrossSection BareTrace(double width, double height, double dk, double thickness = 35) =>
        Section([Slab("laminate", dk, 0, height)], [Trace("a", 0, width, width, thickness, height)]);
}
