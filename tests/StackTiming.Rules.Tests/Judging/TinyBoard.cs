using System.Collections.Immutable;
using StackTiming.Lines.Solutions;
using StackTiming.Nets.Lengths;
using StackTiming.Nets.Parts;
using StackTiming.Rules.Judging;
using StackTiming.Stackups.Copper;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using StackTiming.Waves.Paths;

namespace StackTiming.Rules.Tests.Judging;

/// <summary>
/// A board whose physics can be done in the head: a trace of w mm has 5/w ohm (0.1 mm is 50 ohm), a pair 0.9 times twice that; a trace on L1
/// takes 6 ps/mm, on L3 7 ps/mm; it loses 0.01 dB/mm at 1 GHz and grows with the frequency. Nets are chains from U1 to U2.
/// </summary>
internal sealed class TinyBoard : IBoardPhysics
{
    private readonly Dictionary<string, Segment[]> nets = new(StringComparer.Ordinal);
    private readonly Dictionary<string, ImmutableArray<StubBranch>> stubs = new(StringComparer.Ordinal);
    private readonly Dictionary<(string Net, Edge Edge), ReceiverResponse> responses = [];
    private readonly Dictionary<string, string> receiverPart = new(StringComparer.Ordinal);
    private readonly Dictionary<string, double> viaSeconds = new(StringComparer.Ordinal);

    public DriverModel? Driver { get; set; }

    public double SeriesOhms { get; set; }

    public StackUp StackUp { get; } = new("tiny", "A",
    [
        Copper("L1", CopperUse.Signal), Copper("L2", CopperUse.Plane), Copper("L3", CopperUse.Signal), Copper("L4", CopperUse.Plane), Copper("L5", CopperUse.Signal),
    ]);

    public SignalAssumptions Assumed { get; set; } = SignalAssumptions.None;

    public string CalculatorName => "arithmetic";

    public static Segment Trace(string layer, double lengthMillimetres, double widthMillimetres = 0.1, double gapMillimetres = 0) => new()
    {
        From = "",
        To = "",
        Layer = layer,
        ToLayer = "",
        Line = 1,
        FileIndex = 0,
        Kind = SegmentKind.Trace,
        LengthMetres = lengthMillimetres * 1e-3,
        WidthMetres = widthMillimetres * 1e-3,
        GapMetres = gapMillimetres * 1e-3,
    };

    public static Segment Via() => new() { From = "", To = "", Layer = "L1", ToLayer = "L3", Line = 1, FileIndex = 0, Kind = SegmentKind.Via };

    public TinyBoard Net(string name, params Segment[] segments)
    {
        nets[name] = segments;
        return this;
    }

    public TinyBoard To(string net, string part)
    {
        receiverPart[net] = part;
        return this;
    }

    public TinyBoard Stub(string net, double lengthMillimetres)
    {
        stubs[net] = [new StubBranch("*1", "U3.1", lengthMillimetres * 6e-12, lengthMillimetres * 1e-3, "L1", 6e-9)];
        return this;
    }

    public TinyBoard Response(string net, Edge edge, ReceiverResponse response)
    {
        responses[(net, edge)] = response;
        return this;
    }

    public ReadOnlySpan<Segment> SegmentsOf(string net) => nets.GetValueOrDefault(net) ?? [];

    public BoardLine? LineOf(in Segment trace, out string objection)
    {
        objection = trace.Layer == "L4" ? "no closed form describes L4" : "";
        return trace.Layer == "L4" ? null : Line(LineKey.Of(trace), Ohms(trace.WidthMetres), Slope(trace.Layer));
    }

    public double? WidthFor(string layer, double gapMetres, double targetOhms, bool differential) =>
        targetOhms > 200 ? null : 5e-3 / (differential ? targetOhms / 1.8 : targetOhms);

    public double? AttenuationDbPerMetre(in PathPiece trace, double hertz, out string objection)
    {
        objection = "";
        return 10 * hertz / 1e9;
    }

    public ImmutableArray<DrivenNet> Drives(string net, DriveChoice drive, out string objection)
    {
        objection = "";
        if (!nets.TryGetValue(net, out var segments))
        {
            objection = "it has no driver";
            return [];
        }
        var pieces = ImmutableArray.CreateBuilder<PathPiece>();
        foreach (var s in segments)
        {
            var isTrace = s.Kind == SegmentKind.Trace;
            var z = isTrace ? Ohms(s.WidthMetres) * (s.GapMetres > 0 ? 0.9 : 1) : double.NaN;
            pieces.Add(new PathPiece(
                isTrace ? PieceKind.Trace : PieceKind.Via, net, s.Layer, s.LengthMetres, s.WidthMetres, s.GapMetres,
                isTrace ? s.LengthMetres * Slope(s.Layer) : viaSeconds.GetValueOrDefault(net, 10e-12), z));
        }
        var path = new ReceiverPath(receiverPart.GetValueOrDefault(net, "U2") + ".1", null, pieces.ToImmutable());
        return [new DrivenNet(net, "U1." + net, Driver, [path], stubs.GetValueOrDefault(net, []), SeriesOhms)];
    }

    public double? FlightTime(DrivenNet driven, string receiver, Edge edge, out string objection) =>
        Response(driven, receiver, edge, out objection)?.FlightSeconds;

    /// <summary>The response that a series resistor is said to give; by default it gives a clean one.</summary>
    public Func<double, Edge, ReceiverResponse>? WithSeries { get; set; }

    public ReceiverResponse? ResponseWithAddedSeries(DrivenNet driven, string receiver, Edge edge, double addedOhms) =>
        WithSeries?.Invoke(addedOhms, edge) ?? (edge == Edge.Rise ? Responses.Clean : Responses.CleanFall);

    public ReceiverResponse? Response(DrivenNet driven, string receiver, Edge edge, out string objection)
    {
        objection = "the driver has no model";
        return responses.GetValueOrDefault((driven.Net, edge));
    }

    private static double Ohms(double widthMetres) => 5e-3 / widthMetres;

    private static double Slope(string layer) => layer == "L1" ? 6e-9 : 7e-9;

    private static BoardLine Line(LineKey key, double ohms, double slope)
    {
        var solution = new LineSolution(
            ["a"], "arithmetic", new[,] { { slope / ohms } }, new[,] { { slope * ohms } }, [], 0.01, []);
        const double c = 299_792_458.0;
        var eps = slope * c * slope * c;
        return new BoardLine(key, solution, key.GapMetres > 0 ? new PairModes(1.8 * ohms, 0.6 * ohms, eps, eps, true) : null, null);
    }

    private static CopperLayer Copper(string name, CopperUse use) => new(
        FilePosition.WholeFile("tiny"), name, Quantity.Exact(18e-6), use,
        new CopperProperties(Quantity.Exact(1.7e-8), Quantity.Exact(0), Quantity.Exact(0)), WideFace.Down, Tolerance.None);
}
