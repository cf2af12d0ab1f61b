using BenchmarkDotNet.Attributes;
using BenchmarkDotNet.Columns;
using BenchmarkDotNet.Configs;
using BenchmarkDotNet.Reports;
using BenchmarkDotNet.Running;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Tests;

namespace StackTiming.Benchmarks;

/// <summary>Error against time of the field solver for each family of geometries: one warm thread, whole solutions with energy shares.</summary>
[Config(typeof(Columns))]
public class FieldSolverBenchmarks
{
    private CrossSection section = null!;
    private FieldSolver solver = FieldSolver.Default;

    /// <summary>Families of the references, and buses of eight traces.</summary>
    public static IEnumerable<string> Families =>
    [
        .. ReferenceSections.FiniteElement.Select(r => r.Name), "bus of 8, mask", "bus of 8, mask, uneven", "bus of 8, stripline",
            "bus of 8, stripline, uneven",
    ];

    /// <summary>What is solved.</summary>
    [ParamsSource(nameof(Families))]
    public string Family { get; set; } = "";

    /// <summary>The relative error that is asked for.</summary>
    [Params(1e-3, 3e-4, 1e-5)]
    public double Tolerance { get; set; }

    /// <summary>Builds the section.</summary>
    [GlobalSetup]
    public void Build() => (section, solver) = (SectionOf(Family), new FieldSolver(new FieldSolverOptions(Tolerance)));

    /// <summary>Solves it.</summary>
    [Benchmark]
    public FieldSolution Solve() => solver.Solve(section);

    private static CrossSection SectionOf(string family) => family switch
    {
        "bus of 8, mask" => Bus(0, true),
        "bus of 8, mask, uneven" => Bus(1e-6, true),
        "bus of 8, stripline" => Bus(0, false),
        "bus of 8, stripline, uneven" => Bus(1e-6, false),
        _ => ReferenceSections.Named(family).Section,
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
        DielectricSlab Slab(string name, double dk, double bottom, double top) => new(new SectionDielectric(name, dk, 0), bottom, top);
        return surface
            ? new CrossSection(
                [Slab("prepreg", 3.8, 0, 100e-6)], 0, null, [.. traces],
                    new SectionMask(new SectionDielectric("mask", 3.5, 0), 25e-6, 15e-6), null, metal)
            : new CrossSection([Slab("core", 4.1, 0, 100e-6), Slab("prepreg", 3.6, 100e-6, 300e-6)], 0, 300e-6, [.. traces], null, null,
                metal);
    }

    private sealed class Columns : ManualConfig
    {
        public Columns() => AddColumn(new ErrorColumn("Error", s => Error(s.Coarse, s.Fine)),
            new ErrorColumn("Estimate", s => s.Coarse.Line.RelativeError));
    }

    /// <summary>Largest relative error over the entries of C and L above a hundredth of the largest, against a solution to 1e-6.</summary>
    private static double Error(FieldSolution coarse, FieldSolution fine) => Math.Max(
        Error(coarse.Line.CapacitanceFaradPerMetre, fine.Line.CapacitanceFaradPerMetre),
        Error(coarse.Line.InductanceHenryPerMetre, fine.Line.InductanceHenryPerMetre));

    private static double Error(double[,] coarse, double[,] fine)
    {
        var largest = fine.Cast<double>().Max(Math.Abs);
        return fine.Cast<double>().Zip(coarse.Cast<double>()).Where(p => Math.Abs(p.First) > 0.01 * largest).Max(p =>
            Math.Abs(p.Second / p.First - 1));
    }

    private sealed class ErrorColumn(string name, Func<(FieldSolution Coarse, FieldSolution Fine), double> figure) : IColumn
    {
        public string Id => name;
        public string ColumnName => name;
        public bool AlwaysShow => true;
        public ColumnCategory Category => ColumnCategory.Custom;
        public int PriorityInCategory => 0;
        public bool IsNumeric => true;
        public UnitType UnitType => UnitType.Dimensionless;
        public string Legend => $"{name}: relative, of C and L";

        public string GetValue(Summary summary, BenchmarkCase benchmarkCase) => GetValue(summary, benchmarkCase, SummaryStyle.Default);

        public string GetValue(Summary summary, BenchmarkCase benchmarkCase, SummaryStyle style)
        {
            var section = SectionOf((string)benchmarkCase.Parameters[nameof(Family)]);
            var coarse = new FieldSolver(new FieldSolverOptions((double)benchmarkCase.Parameters[nameof(Tolerance)])).Solve(section);
            var fine = new FieldSolver(new FieldSolverOptions(1e-6)).Solve(section);
            return figure((coarse, fine)).ToString("0.0E+0", System.Globalization.CultureInfo.InvariantCulture);
        }

        public bool IsAvailable(Summary summary) => true;
        public bool IsDefault(Summary summary, BenchmarkCase benchmarkCase) => false;
    }
}
