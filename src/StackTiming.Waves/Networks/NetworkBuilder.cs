using System.Collections.Immutable;

namespace StackTiming.Waves.Networks;

/// <summary>Puts a <see cref="Network"/> together from named nodes. A node exists once it is named.</summary>
public sealed class NetworkBuilder
{
    private readonly Dictionary<string, int> nodes = new(StringComparer.Ordinal);
    private readonly ImmutableArray<string>.Builder names = ImmutableArray.CreateBuilder<string>();
    private readonly ImmutableArray<LosslessLine>.Builder lines = ImmutableArray.CreateBuilder<LosslessLine>();
    private readonly ImmutableArray<LossyLine>.Builder lossyLines = ImmutableArray.CreateBuilder<LossyLine>();
    private readonly ImmutableArray<CoupledLines>.Builder coupledLines = ImmutableArray.CreateBuilder<CoupledLines>();
    private readonly ImmutableArray<SeriesBranch>.Builder series = ImmutableArray.CreateBuilder<SeriesBranch>();
    private readonly ImmutableArray<Shunt>.Builder shunts = ImmutableArray.CreateBuilder<Shunt>();
    private readonly ImmutableArray<Receiver>.Builder receivers = ImmutableArray.CreateBuilder<Receiver>();

    /// <summary>The number of the node with a name; a new one where the name is new.</summary>
    /// <param name="name">The name.</param>
    public int Node(string name)
    {
        if (!nodes.TryGetValue(name, out var node))
        {
            node = names.Count;
            nodes.Add(name, node);
            names.Add(name);
        }
        return node;
    }

    /// <summary>Adds a line without loss.</summary>
    /// <param name="from">Node of its near end.</param>
    /// <param name="to">Node of its far end.</param>
    /// <param name="z0Ohms">Impedance in ohms.</param>
    /// <param name="delaySeconds">Delay in seconds.</param>
    public NetworkBuilder Line(string from, string to, double z0Ohms, double delaySeconds)
    {
        lines.Add(new LosslessLine(Node(from), Node(to), z0Ohms, delaySeconds));
        return this;
    }

    /// <summary>Adds a line with loss.</summary>
    /// <param name="from">Node of its near end.</param>
    /// <param name="to">Node of its far end.</param>
    /// <param name="lengthMetres">Length in metres.</param>
    /// <param name="constants">What it is per metre.</param>
    public NetworkBuilder LossyLine(string from, string to, double lengthMetres, LossyLineConstants constants)
    {
        lossyLines.Add(new LossyLine(Node(from), Node(to), lengthMetres, constants));
        return this;
    }

    /// <summary>Adds coupled lines, whose nodes come from <see cref="Node"/>.</summary>
    /// <param name="group">The group.</param>
    public NetworkBuilder Coupled(CoupledLines group)
    {
        coupledLines.Add(group);
        return this;
    }

    /// <summary>Adds an element between two nodes.</summary>
    /// <param name="from">One node.</param>
    /// <param name="to">The other node.</param>
    /// <param name="resistanceOhms">Resistance in ohms.</param>
    /// <param name="inductanceHenries">Inductance in henries.</param>
    /// <param name="capacitanceFarads">Capacitance in farads, or null for none.</param>
    public NetworkBuilder SeriesElement(
        string from, string to, double resistanceOhms, double inductanceHenries = 0, double? capacitanceFarads = null)
    {
        series.Add(new SeriesBranch(Node(from), Node(to), resistanceOhms, inductanceHenries, capacitanceFarads));
        return this;
    }

    /// <summary>Adds an element at a node.</summary>
    /// <param name="at">The node.</param>
    /// <param name="capacitanceFarads">Capacitance to ground in farads.</param>
    /// <param name="resistanceOhms">Resistance in ohms, or null for none.</param>
    /// <param name="toVolts">Voltage behind the resistance.</param>
    /// <param name="inductanceHenries">Inductance to ground in henries, or null for none.</param>
    public NetworkBuilder ShuntElement(
        string at, double capacitanceFarads = 0, double? resistanceOhms = null, double toVolts = 0, double? inductanceHenries = null)
    {
        shunts.Add(new Shunt(Node(at), capacitanceFarads, resistanceOhms, toVolts, inductanceHenries));
        return this;
    }

    /// <summary>Adds a receiver.</summary>
    /// <param name="at">The node of its pin.</param>
    /// <param name="capacitanceFarads">Input capacitance in farads.</param>
    /// <param name="thresholds">Its levels, or null.</param>
    /// <param name="resistanceOhms">Termination inside it, in ohms, or null for none.</param>
    /// <param name="toVolts">Voltage behind the termination.</param>
    public NetworkBuilder Receiver(
        string at, double capacitanceFarads = 0, Thresholds? thresholds = null, double? resistanceOhms = null, double toVolts = 0)
    {
        receivers.Add(new Receiver(Node(at), capacitanceFarads, resistanceOhms, toVolts, thresholds));
        return this;
    }

    /// <summary>The network.</summary>
    /// <param name="driver">The driver; its node comes from <see cref="Node"/>.</param>
    /// <param name="stimulus">What it sends.</param>
    /// <param name="durationSeconds">The window in seconds.</param>
    /// <param name="referenceLoad">The load for flight time, or null.</param>
    public Network Build(Driver driver, Stimulus stimulus, double durationSeconds, ReferenceLoad? referenceLoad = null) => new(
        names.ToImmutable(), lines.ToImmutable(), lossyLines.ToImmutable(), coupledLines.ToImmutable(), series.ToImmutable(),
        shunts.ToImmutable(), driver, receivers.ToImmutable(), stimulus, referenceLoad, durationSeconds);
}
