using System.Collections.Concurrent;
using System.Collections.Immutable;
using StackTiming.Nets.Parts;
using StackTiming.Rules.Judging;
using StackTiming.Waves.BoardNets;
using StackTiming.Waves.Characteristics;
using StackTiming.Waves.Metrics;
using StackTiming.Waves.Networks;
using StackTiming.Waves.Responses;
using Edge = StackTiming.Rules.Judging.Edge;

namespace StackTiming.Rules.Checking;

/// <summary>
/// Waveforms of board nets: each net, driver and edge is solved once, and of its waveforms only the metrics are kept. Safe on several threads.
/// </summary>
/// <param name="networks">Turns board nets into networks.</param>
/// <param name="assumed">What is assumed of signals.</param>
internal sealed class WaveBook(BoardNetwork networks, SignalAssumptions assumed)
{
    // Of the window in which a net settles: one and a half times its longest way, where the window is forty.
    private const double BeginningShare = 1.5 / 40;

    // Rise times of the driver alone after which it has crossed every threshold that it will cross.
    private const double ReferenceRamps = 40;

    private readonly ConcurrentDictionary<WaveKey, SolvedWave> whole = [];
    private readonly ConcurrentDictionary<WaveKey, SolvedWave> beginnings = [];
    private readonly ConcurrentDictionary<(DriverModel Model, Edge Edge), Lazy<Response>> references = [];

    /// <summary>Number of waveforms solved so far.</summary>
    public int Count => whole.Count + beginnings.Count;

    /// <summary>Solves waveforms, so that rules find them.</summary>
    /// <param name="job">What to solve.</param>
    public void Solve(WaveJob job)
    {
        if (job.ArrivalOnly)
            ArrivalOf(job.Key);
        else
            Of(job.Key);
        if (!job.BothEdges)
            return;
        if (job.ArrivalOnly)
            ArrivalOf(job.Key.Opposite);
        else
            Of(job.Key.Opposite);
    }

    /// <summary>The responses at the receivers of a net.</summary>
    /// <param name="key">Net, driver and edge.</param>
    public SolvedWave Of(WaveKey key)
    {
        if (!whole.TryGetValue(key, out var wave))
            SolveInto(whole, key, double.PositiveInfinity);
        return wave ?? whole[key];
    }

    /// <summary>The responses as far as flight times are concerned: only the beginning is looked at, unless that is too short.</summary>
    /// <param name="key">Net, driver and edge.</param>
    public SolvedWave ArrivalOf(WaveKey key)
    {
        if (whole.TryGetValue(key, out var wave) || beginnings.TryGetValue(key, out wave))
            return wave;
        SolveInto(beginnings, key, BeginningShare);
        wave = beginnings[key];
        foreach (var response in wave.Receivers.Values)
        {
            if (response.FirstMidSeconds is null)
                return Of(key);
        }
        return wave;
    }

    /// <summary>The responses with another resistance in series with the driver; not kept.</summary>
    /// <param name="key">Net, driver and edge.</param>
    /// <param name="addedOhms">Resistance to add, ohm.</param>
    public SolvedWave? WithAddedSeries(WaveKey key, double addedOhms)
    {
        if (networks.Of(key.Net, key.DriverNode, new BoardEdge(key.Edge == Edge.Rise, null), out _) is not { } network)
            return null;
        var ohms = network.Driver.ResistanceOhms + addedOhms;
        if (ohms <= 0)
            return null;
        var changed = network with { Driver = network.Driver with { ResistanceOhms = ohms } };
        return Judge(key, changed, TransientSolver.Solve(changed), key.Net.Nodes[key.DriverNode].Pin!.Model!.Driver!);
    }

    /// <summary>Solves a net again for its waveforms.</summary>
    /// <param name="key">Net, driver and edge.</param>
    /// <param name="objection">Why there is none.</param>
    public (Network Network, Response Response)? Waveforms(WaveKey key, out string objection) => Waveforms(key, double.PositiveInfinity, out objection);

    private (Network Network, Response Response)? Waveforms(WaveKey key, double longest, out string objection)
    {
        if (networks.Of(key.Net, key.DriverNode, new BoardEdge(key.Edge == Edge.Rise, null), out objection) is not { } network)
            return null;
        var ramps = 3 * network.Stimulus.ShortestRampSeconds;
        return (network, TransientSolver.Solve(network with { DurationSeconds = Math.Min(network.DurationSeconds, ramps + longest * network.DurationSeconds) }));
    }

    /// <summary>Which of a network's receivers is that of a pin, or −1.</summary>
    /// <param name="network">The network of a board net.</param>
    /// <param name="node">Node of the pin in the board net.</param>
    public static int ReceiverOf(Network network, int node)
    {
        var name = BoardNetwork.DieName(node);
        for (var i = 0; i < network.Receivers.Length; i++)
        {
            if (network.NodeNames[network.Receivers[i].Node] == name)
                return i;
        }
        return -1;
    }

    /// <summary>
    /// Solves an edge, and with it the opposite one where both ramps are alike: nets are linear, so that the two responses add up to the sum of
    /// the levels at rest.
    /// </summary>
    private void SolveInto(ConcurrentDictionary<WaveKey, SolvedWave> book, WaveKey key, double longest)
    {
        if (Waveforms(key, longest, out var objection) is not var (network, response))
        {
            book[key] = new SolvedWave(objection, ImmutableDictionary<int, ReceiverResponse>.Empty);
            return;
        }
        var driver = key.Net.Nodes[key.DriverNode].Pin!.Model!.Driver!;
        book[key] = Judge(key, network, response, driver);
        if (driver.Rise.Value == driver.Fall.Value)
            book[key.Opposite] = Judge(key.Opposite, network, Mirrored(response), driver);
    }

    private static Response Mirrored(Response response) => response with { Receivers = [.. response.Receivers.Select(Mirrored)] };

    private static NodeVoltage Mirrored(NodeVoltage voltage)
    {
        var sum = voltage.InitialVolts + voltage.FinalVolts;
        var volts = new double[voltage.Volts.Length];
        for (var i = 0; i < volts.Length; i++)
            volts[i] = sum - voltage.Volts[i];
        return new NodeVoltage(volts, voltage.FinalVolts, voltage.InitialVolts);
    }

    private SolvedWave Judge(WaveKey key, Network network, Response response, DriverModel driver)
    {
        var ramp = network.Stimulus.ShortestRampSeconds;
        var stimulus = key.Edge == Edge.Rise ? Stimulus.Rising(ramp) : Stimulus.Falling(ramp);
        var receivers = ImmutableDictionary.CreateBuilder<int, ReceiverResponse>();
        foreach (var node in key.Net.ReceiverNodes)
        {
            if (node == key.DriverNode || ReceiverOf(network, node) is not (>= 0 and var index))
                continue;
            receivers[node] = Judge(key.Net.Nodes[node].Pin!.Model!.Receiver!, response, response.Receivers[index], stimulus, driver, key.Edge);
        }
        return new SolvedWave("", receivers.ToImmutable());
    }

    private ReceiverResponse Judge(
        ReceiverModel receiver, Response response, NodeVoltage voltage, Stimulus stimulus, DriverModel driver, Edge edge)
    {
        // Settling and the first wave need no thresholds; half of the swing stands in for those that are not stated.
        var mid = receiver.TimingThresholdVolts ?? 0.5 * (voltage.InitialVolts + voltage.FinalVolts);
        var levels = new Thresholds(receiver.Vil?.Value ?? mid, receiver.Vih?.Value ?? mid, mid);
        double? reference = receiver.TimingThresholdVolts is { } threshold ? ReferenceCrossing(driver, edge, threshold) : null;
        var metrics = WaveformMetrics.Of(voltage, response.StepSeconds, response.DurationSeconds, levels, stimulus, reference);
        var rises = edge == Edge.Rise;
        var beyond = rises ? metrics.MaxVolts - metrics.FinalVolts : metrics.FinalVolts - metrics.MinVolts;
        return new ReceiverResponse(
            receiver.Vil?.Value, receiver.Vih?.Value, metrics.FirstMidSeconds, metrics.FirstVihSeconds, metrics.FinalVihSeconds, metrics.RingbackVolts,
            Math.Max(0, beyond), metrics.InitialVolts, metrics.FinalVolts, metrics.SettleSeconds ?? 0,
            reference is null ? null : metrics.FlightTimeSeconds, metrics.FirstWaveVolts, response.DurationSeconds);
    }

    /// <summary>When the driver alone, in the reference load, crosses a threshold; null where it never does.</summary>
    private double? ReferenceCrossing(DriverModel driver, Edge edge, double thresholdVolts)
    {
        var response = references.GetOrAdd((driver, edge), k => new Lazy<Response>(() => SolveReference(k.Model, k.Edge))).Value;
        return WaveformMetrics.FirstCrossing(response.Pin, response.StepSeconds, thresholdVolts, edge == Edge.Rise);
    }

    private Response SolveReference(DriverModel model, Edge edge)
    {
        var load = assumed.Reference ?? AssumedLoad.Usual;
        var builder = new NetworkBuilder();
        var package = new DriverPackage(model.Package?.InductanceHenry ?? 0, (model.Package?.CapacitanceFarad ?? 0) + model.Capacitance.Value);
        var driver = new Driver(
            builder.Node("pin"), model.Low.Value, model.High.Value, model.Resistance.Value,
            package is { InductanceHenries: 0, CapacitanceFarads: 0 } ? null : package);
        var stimulus = edge == Edge.Rise ? Stimulus.Rising(model.Rise.Value) : Stimulus.Falling(model.Fall.Value);
        builder.ShuntElement("pin", load.CapacitanceFarad, load.ResistanceOhms, load.ToVolts ?? 0.5 * (model.Low.Value + model.High.Value));
        var slowest = stimulus.ShortestRampSeconds + model.Resistance.Value * (load.CapacitanceFarad + package.CapacitanceFarads);
        return TransientSolver.Solve(builder.Build(driver, stimulus, ReferenceRamps * slowest));
    }
}
