using BenchmarkDotNet.Attributes;
using StackTiming.Waves.Metrics;
using StackTiming.Waves.Networks;

namespace StackTiming.Benchmarks;

/// <summary>Solving and judging one net: waveforms at every receiver over the window, the driver into its reference load, and all metrics.</summary>
[MemoryDiagnoser]
public class WaveBenchmarks
{
    private static readonly Thresholds Levels = new(0.63, 1.17, 0.9);
    private readonly Network pointToPoint = Trunk(1, terminated: false);
    private readonly Network seriesTerminated = SeriesTerminated();
    private readonly Network branched = Branched();
    private readonly Network flyBy = Trunk(16, terminated: true);
    private readonly Network slowTail = Trunk(1, terminated: false) with { DurationSeconds = 1e-6 };
    private readonly Network lossy = Lossy();
    private readonly Network pair = Pair();

    /// <summary>A strong driver into one open line: it rings over the whole window of 10 ns.</summary>
    [Benchmark]
    public NetResponse PointToPoint() => NetResponse.Solve(pointToPoint);

    /// <summary>A source-terminated line: it settles early.</summary>
    [Benchmark]
    public NetResponse SeriesTerminatedLine() => NetResponse.Solve(seriesTerminated);

    /// <summary>Five lines with two vias, a branch and two receivers, 10 ns.</summary>
    [Benchmark]
    public NetResponse BranchedNet() => NetResponse.Solve(branched);

    /// <summary>Sixteen receivers along a terminated line, 10 ns.</summary>
    [Benchmark]
    public NetResponse FlyByOfSixteen() => NetResponse.Solve(flyBy);

    /// <summary>A microsecond of the ringing line.</summary>
    [Benchmark]
    public NetResponse LongWindow() => NetResponse.Solve(slowTail);

    /// <summary>One line with conductor and dielectric loss, 10 ns.</summary>
    [Benchmark]
    public NetResponse LossyLine() => NetResponse.Solve(lossy);

    /// <summary>A driven line beside a quiet one, 10 ns.</summary>
    [Benchmark]
    public NetResponse CoupledPair() => NetResponse.Solve(pair);

    private static Network Trunk(int loads, bool terminated)
    {
        var builder = new NetworkBuilder();
        var last = "U1";
        for (var i = 0; i < loads; i++)
        {
            builder.Line(last, $"n{i}", 45, i == 0 ? 0.613e-9 : 83.7e-12).Receiver($"n{i}", 1.4e-12, Levels);
            last = $"n{i}";
        }
        if (terminated)
            builder.ShuntElement(last, resistanceOhms: 45, toVolts: 0.9);
        return Build(builder, 25);
    }

    private static Network SeriesTerminated() => Build(
        new NetworkBuilder().Line("U1", "r", 50, 12e-12).SeriesElement("r", "s", 25).Line("s", "U2", 50, 0.731e-9).Receiver("U2", 2e-12, Levels), 25);

    private static Network Branched() => Build(
        new NetworkBuilder().Line("U1", "v", 50, 0.217e-9).Line("v", "w", 32, 9e-12).Line("w", "x", 47, 0.381e-9).Line("x", "U2", 47, 0.12e-9)
            .Line("x", "U3", 47, 0.143e-9).Receiver("U2", 1.5e-12, Levels).Receiver("U3", 1.5e-12, Levels), 30);

    private static Network Lossy() => Build(
        new NetworkBuilder().LossyLine("U1", "U2", 0.18, new LossyLineConstants(3.6e-7, 1.2e-10, 8, 1.6e-3, 0.015, 1e9)).Receiver("U2", 2e-12, Levels), 25);

    private static Network Pair()
    {
        var builder = new NetworkBuilder();
        builder.Coupled(CoupledLines.SymmetricPair(
            (builder.Node("U1"), builder.Node("p")), (builder.Node("q"), builder.Node("r")), 56, 44, 1.02e-9, 0.97e-9));
        builder.ShuntElement("q", resistanceOhms: 50).Receiver("p", resistanceOhms: 50).Receiver("r", resistanceOhms: 50);
        return Build(builder, 50);
    }

    private static Network Build(NetworkBuilder builder, double ohms) => builder.Build(
        new Driver(builder.Node("U1"), 0, 1.8, ohms, null), Stimulus.Rising(200e-12), 10e-9, new ReferenceLoad(50, 0, 0));
}
