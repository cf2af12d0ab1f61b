using StackTiming.Lines.Sections;
using StackTiming.Lines.Tests;

namespace StackTiming.Benchmarks;

/// <summary>Sections that the field solver is timed on: one of each family of the references, and buses of eight traces.</summary>
public static class FieldSolverCases
{
    /// <summary>Names of the sections.</summary>
    public static IEnumerable<string> Names =>
    [
        .. ReferenceSections.FiniteElement.Select(r => r.Name),
        "bus of 8, mask", "bus of 8, mask, uneven", "bus of 8, stripline", "bus of 8, stripline, uneven",
    ];

    /// <summary>The section of this name.</summary>
    public static CrossSection Named(string name) => name switch
    {
        "bus of 8, mask" => Bus(0, true),
        "bus of 8, mask, uneven" => Bus(1e-6, true),
        "bus of 8, stripline" => Bus(0, false),
        "bus of 8, stripline, uneven" => Bus(1e-6, false),
        _ => ReferenceSections.Named(name).Section,
    };

    /// <summary>Traces of 120 µm at a pitch of 270 µm that grows by twice <paramref name="growth"/> from each to the next.</summary>
    private static CrossSection Bus(double growth, bool surface)
    {
        SectionConductor[] traces =
        [
            .. Enumerable.Range(0, 8).Select(i => new SectionConductor(
                $"d{i}", false, i * 270e-6 + i * i * growth, 120e-6, 100e-6, surface ? 45e-6 : 17e-6, 100e-6, true))
        ];
        var metal = new SectionMetal(1.7241e-8, 0);
        var mask = new SectionMask(new SectionDielectric("mask", 3.5, 0), 25e-6, 15e-6);
        DielectricSlab Slab(string name, double dk, double bottom, double top) => new(new SectionDielectric(name, dk, 0), bottom, top);
        return surface
            ? new CrossSection([Slab("prepreg", 3.8, 0, 100e-6)], 0, null, [.. traces], mask, null, metal)
            : new CrossSection([Slab("core", 4.1, 0, 100e-6), Slab("prepreg", 3.6, 100e-6, 300e-6)], 0, 300e-6, [.. traces], null, null, metal);
    }
}
