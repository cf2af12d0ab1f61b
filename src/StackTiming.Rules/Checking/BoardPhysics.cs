using System.Collections.Concurrent;
using System.Collections.Immutable;
using StackTiming.Lines.Solutions;
using StackTiming.Nets.Lengths;
using StackTiming.Rules.Boards;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Results;
using StackTiming.Stackups.Layers;
using StackTiming.Waves.BoardNets;
using StackTiming.Waves.Paths;
using StackTiming.Waves.Vias;

namespace StackTiming.Rules.Checking;

/// <summary>Answers what rules ask of a board, from its lines, paths and waveforms, each computed once.</summary>
internal sealed class BoardPhysics : IBoardPhysics
{
    // Volts; less is rounding.
    private const double LeastSwing = 1e-6;

    private readonly Board board;
    private readonly LineTable lines;
    private readonly PathTracer tracer;
    private readonly LineFigures figures;
    private readonly WaveBook waves;
    private readonly ConcurrentDictionary<string, bool> notes = new(StringComparer.Ordinal);
    private readonly ConcurrentDictionary<(string Net, DriveChoice Drive), (ImmutableArray<DrivenNet> Drives, string Objection)> traced = [];

    public BoardPhysics(Board board, ILineCalculator calculator, LineTable lines)
    {
        this.board = board;
        this.lines = lines;
        var vias = new ViaTable(board.StackUp, board.Lengths, board.Assumed.FrequencyHertz);
        tracer = new PathTracer(board.Electrical, new PathDelays(lines, vias), note => notes.TryAdd(note, true));
        waves = new WaveBook(new BoardNetwork(lines, vias), board.Assumed);
        figures = new LineFigures(board.StackUp, calculator, board.Assumed.FrequencyHertz);
    }

    public StackUp StackUp => board.StackUp;

    public SignalAssumptions Assumed => board.Assumed;

    public string CalculatorName => lines.CalculatorName;

    /// <summary>What delays and waveforms assumed so far, in ordinal order.</summary>
    public IEnumerable<string> Notes => notes.Keys.Order(StringComparer.Ordinal);

    public ReadOnlySpan<Segment> SegmentsOf(string net) =>
        board.Lengths.Find(net) is { } found ? board.Lengths.SegmentsOf(found) : [];

    public BoardLine? LineOf(in Segment trace, out string objection) => lines.Find(LineKey.Of(trace), out objection);

    public double? WidthFor(string layer, double gapMetres, double targetOhms, bool differential) =>
        figures.WidthFor(layer, differential ? gapMetres : 0, targetOhms);

    public double? AttenuationDbPerMetre(in PathPiece trace, double hertz, out string objection)
    {
        (var attenuation, objection) = figures.Attenuation(new LineKey(trace.Layer, trace.WidthMetres, trace.GapMetres), hertz);
        return attenuation;
    }

    public ImmutableArray<DrivenNet> Drives(string net, DriveChoice drive, out string objection)
    {
        if (!traced.TryGetValue((net, drive), out var found))
        {
            found.Drives = tracer.Trace(net, drive, out found.Objection);
            found = traced.GetOrAdd((net, drive), found);
        }
        objection = found.Objection;
        return found.Drives;
    }

    public ReceiverResponse? Response(DrivenNet driven, string receiver, Edge edge, out string objection)
    {
        if (KeyOf(driven, edge, out objection) is not { } key)
            return null;
        var wave = waves.Of(key);
        objection = wave.Objection;
        if (objection.Length > 0)
            return null;
        if (!wave.Receivers.TryGetValue(key.Net.FindPin(receiver), out var response))
            objection = $"{receiver} has no receiver model";
        else if (response.SwingVolts < LeastSwing)
            objection = $"the driver does not move the level at {receiver}: a series capacitor or a short keeps direct current from it";
        return objection.Length > 0 ? null : response;
    }

    public ReceiverResponse? ResponseWithAddedSeries(DrivenNet driven, string receiver, Edge edge, double addedOhms)
    {
        if (KeyOf(driven, edge, out _) is not { } key || waves.WithAddedSeries(key, addedOhms) is not { } wave)
            return null;
        return wave.Receivers.GetValueOrDefault(key.Net.FindPin(receiver));
    }

    public double? FlightTime(DrivenNet driven, string receiver, Edge edge, out string objection)
    {
        if (KeyOf(driven, edge, out objection) is not { } key)
            return null;
        var wave = waves.ArrivalOf(key);
        objection = wave.Objection;
        if (objection.Length > 0)
            return null;
        if (!wave.Receivers.TryGetValue(key.Net.FindPin(receiver), out var response))
            objection = $"{receiver} has no receiver model";
        else if (response.FlightSeconds is null)
            objection = $"{driven.Net} has no flight time at {receiver}: there is no threshold, or it is never crossed";
        return objection.Length > 0 ? null : response!.FlightSeconds;
    }

    /// <summary>What must be solved for the needs of all rules: each net and driver once, both edges together, and no more of it than is wanted.</summary>
    /// <param name="needs">The needs.</param>
    public WaveJob[] WavesFor(IEnumerable<NetNeed> needs)
    {
        var wanted = new Dictionary<WaveKey, bool>();
        foreach (var need in needs)
        {
            if (need.Edge is not { } edge)
                continue;
            foreach (var driven in Drives(need.Net, need.Drive, out _))
            {
                if (KeyOf(driven, edge, out _) is { } key)
                    wanted[key] = need.ArrivalOnly && wanted.GetValueOrDefault(key, true);
            }
        }
        var jobs = new List<WaveJob>(wanted.Count);
        foreach (var (key, arrivalOnly) in wanted)
        {
            var other = wanted.TryGetValue(key.Opposite, out var otherArrivalOnly) && otherArrivalOnly == arrivalOnly;
            if (!other || key.Edge == Edge.Rise)
                jobs.Add(new WaveJob(key, arrivalOnly, other));
        }
        return [.. jobs];
    }

    /// <summary>Solves waveforms, so that rules find them.</summary>
    /// <param name="job">What to solve.</param>
    public void Solve(WaveJob job) => waves.Solve(job);

    /// <summary>Number of waveforms solved.</summary>
    public int WaveCount => waves.Count;

    /// <summary>A waveform with what was judged in it, or null where it has none.</summary>
    /// <param name="judged">Which.</param>
    public ReceiverWave? Waveform(JudgedWave judged)
    {
        if (board.Electrical.Find(judged.Net) is not { } net)
            return null;
        var key = new WaveKey(net, net.FindPin(judged.Driver), judged.Edge);
        var node = net.FindPin(judged.Receiver);
        if (!waves.Of(key).Receivers.TryGetValue(node, out var seen) || waves.Waveforms(key, out _) is not var (network, response))
            return null;
        var receiver = response.Receivers[WaveBook.ReceiverOf(network, node)];
        var times = new double[receiver.Volts.Length];
        for (var i = 0; i < times.Length; i++)
            times[i] = i * response.StepSeconds;
        return new ReceiverWave(
            judged.Net, judged.Driver, judged.Receiver, judged.Edge == Edge.Rise ? "rise" : "fall", times, receiver.Volts, response.Pin.Volts,
            seen.VilVolts, seen.VihVolts, net.Nodes[node].Pin?.Model?.Receiver?.TimingThresholdVolts, KeptWaves.Marks(seen, judged.Edge), [], null);
    }

    private WaveKey? KeyOf(DrivenNet driven, Edge edge, out string objection)
    {
        objection = "";
        if (driven.Model is null)
            objection = $"{driven.Driver} has no driver model";
        else if (board.Electrical.Find(driven.Net) is { } net)
            return new WaveKey(net, net.FindPin(driven.Driver), edge);
        return null;
    }
}
