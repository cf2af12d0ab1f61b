using BenchmarkDotNet.Attributes;
using StackTiming.Nets.Electrical;
using StackTiming.Nets.Lengths;
using StackTiming.Nets.Parts;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Benchmarks;

/// <summary>Reading the length list of a generated board, and joining its rows into trees.</summary>
[MemoryDiagnoser, MinColumn, MedianColumn]
public class LengthListBenchmarks
{
    private InputFile file = null!;
    private LengthList lengths = null!;
    private PartList parts = null!;

    /// <summary>Nets of six rows each.</summary>
    [Params(20_000, 200_000)]
    public int Nets { get; set; }

    /// <summary>Writes the board and reads it once.</summary>
    [GlobalSetup]
    public void Setup()
    {
        var folder = Directory.CreateTempSubdirectory("stacktiming-lengths").FullName;
        GeneratedBoard.Write(folder, Nets);
        var problems = new ProblemList();
        file = InputFileLoader.Load(Path.Combine(folder, "large.lengths.csv"), default, problems, 1L << 30)!;
        var map = YamlDocument.ReadMap(InputFileLoader.Load(Path.Combine(folder, "large.parts.yaml"), default, problems)!, problems)!;
        var reader = new MapReader(map, DefaultUnits.None, problems);
        FormatVersion.Check(reader);
        parts = PartListReader.Read(reader)!;
        lengths = Read();
        Directory.Delete(folder, recursive: true);
        Console.WriteLine($"// {Nets} nets: {file.Text.Length / 1e6:F1} MB, {problems.Items.Count} problems");
    }

    /// <summary>Text to segments.</summary>
    [Benchmark]
    public LengthList Read() => LengthListReader.Read(file, LengthListFormat.Own, null, new ProblemList())!;

    /// <summary>Segments to connected trees, with the drivers and receivers of the parts.</summary>
    [Benchmark]
    public ElectricalNets Join() => ElectricalNets.Build(lengths, parts, new ProblemList())!;
}
