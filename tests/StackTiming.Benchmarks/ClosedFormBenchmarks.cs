using BenchmarkDotNet.Attributes;
using StackTiming.Lines.Layered;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Microstrip;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Lines.Stripline;

namespace StackTiming.Benchmarks;

/// <summary>Closed forms on one core: the fast paths that tolerance sampling uses, and whole solutions with energy shares and warnings.</summary>
[MemoryDiagnoser]
public class ClosedFormBenchmarks
{
    private const int Lines = 1000;
    private readonly double[] widths = new double[Lines];
    private readonly double[] heights = new double[Lines];
    private readonly double[] thicknesses = new double[Lines];
    private readonly double[] dks = new double[Lines];
    private readonly double[] z0 = new double[Lines];
    private readonly double[] epsEff = new double[Lines];
    private CrossSection masked = null!;
    private CrossSection stripline = null!;
    private CrossSection pair = null!;
    private CrossSection pairWithPours = null!;

    /// <summary>Geometries as boards have them.</summary>
    [GlobalSetup]
    public void Setup()
    {
        for (var i = 0; i < Lines; i++)
            (widths[i], heights[i], thicknesses[i], dks[i]) = (100e-6 + i * 1e-7, 75e-6 + i * 2e-8, 45e-6, 3.7 + i * 1e-4);
        var metal = new SectionMetal(1.72e-8, 1e-6);
        var prepreg = new SectionDielectric("prepreg", 3.7, 0.018);
        var core = new SectionDielectric("core", 4.0, 0.016);
        var mask = new SectionMask(new SectionDielectric("mask", 3.5, 0.025), 25e-6, 15e-6);
        var outer = new SectionConductor("a", false, 0, 130e-6, 100e-6, 45e-6, 75e-6, true);
        var inner = new SectionConductor("a", false, 0, 100e-6, 88e-6, 15e-6, 100e-6, true);
        masked = new CrossSection([new DielectricSlab(prepreg, 0, 75e-6)], 0, null, [outer], mask, null, metal);
        stripline = new CrossSection([new DielectricSlab(core, 0, 100e-6), new DielectricSlab(prepreg, 100e-6, 300e-6)], 0, 300e-6, [inner], null, null, metal);
        pair = masked with { Conductors = [outer with { CentreMetres = -140e-6 }, outer with { Name = "b", CentreMetres = 140e-6 }] };
        var pour = new SectionConductor("left", true, -1.9e-3, 3e-3, 2.97e-3, 45e-6, 75e-6, true);
        pairWithPours = pair with { TopMask = null, Conductors = [.. pair.Conductors, pour, pour with { Name = "right", CentreMetres = 1.9e-3 }] };
    }

    /// <summary>Surface microstrip with thickness, 1000 lines at once.</summary>
    [Benchmark(OperationsPerInvoke = Lines)]
    public void HammerstadJensenBatch() => HammerstadJensen1980.Lines(widths, heights, thicknesses, dks, z0, epsEff);

    /// <summary>Thick centred stripline, 1000 lines.</summary>
    [Benchmark(OperationsPerInvoke = Lines)]
    public double WheelerStripline()
    {
        var sum = 0.0;
        for (var i = 0; i < Lines; i++)
            sum += Wheeler1978.Z0Ohms(widths[i], 4 * heights[i], 15e-6, dks[i]);
        return sum;
    }

    /// <summary>C and L of a masked trapezoid, without energy shares.</summary>
    [Benchmark]
    public double MaskedMicrostripMatrices() => Yamashita1968.Matrices(masked).Capacitance[0, 0];

    /// <summary>Whole solution of a masked trapezoid.</summary>
    [Benchmark]
    public LineSolution? MaskedMicrostrip() => ClosedForms.Calculate(masked);

    /// <summary>Whole solution of an offset stripline in two dielectrics.</summary>
    [Benchmark]
    public LineSolution? OffsetStripline() => ClosedForms.Calculate(stripline);

    /// <summary>Whole solution of a masked pair.</summary>
    [Benchmark]
    public LineSolution? MaskedPair() => ClosedForms.Calculate(pair);

    /// <summary>Whole solution of a pair between pours.</summary>
    [Benchmark]
    public LineSolution? PairWithPours() => ClosedForms.Calculate(pairWithPours);
}
