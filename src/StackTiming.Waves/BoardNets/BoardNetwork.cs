using StackTiming.Nets.Electrical;
using StackTiming.Nets.Lengths;
using StackTiming.Nets.Parts;
using StackTiming.Waves.Networks;
using StackTiming.Waves.Paths;
using StackTiming.Waves.Vias;

namespace StackTiming.Waves.BoardNets;

/// <summary>What an edge sent into a board net needs beyond the net itself.</summary>
/// <param name="Rising">True for a rising edge.</param>
/// <param name="ReferenceLoad">The load against which flight time counts, or null.</param>
public sealed record BoardEdge(bool Rising, ReferenceLoad? ReferenceLoad);

/// <summary>
/// Turns an electrical net of a board into a network of lines. Traces become lossless lines with the impedance and delay of their cross-section (half the
/// differential impedance inside a pair), vias the inductance of their barrel between two halves of its capacitance, series parts and terminations
/// themselves. A package delay is a line with the impedance of the trace at the pin, which reflects nothing of its own. Receivers are judged at the die.
/// </summary>
/// <param name="lines">The lines of the board.</param>
/// <param name="vias">The vias of the board.</param>
public sealed class BoardNetwork(LineTable lines, ViaTable vias)
{
    /// <summary>Longest way through the net times this is the observed window: twenty round trips settle all but the wildest ringing.</summary>
    private const double WindowInDelays = 40;
    private const double WindowInRamps = 10;
    private const double SupplyOhms = 1e-3;
    private const double AssumedPackageOhms = 50;

    /// <summary>The network of a net.</summary>
    /// <param name="net">The electrical net.</param>
    /// <param name="driverNode">Index of the node that drives; its pin has a driver.</param>
    /// <param name="edge">The edge.</param>
    /// <param name="objection">Why there is none, in a sentence without a full stop; empty where there is one.</param>
    public Network? Of(ElectricalNet net, int driverNode, BoardEdge edge, out string objection)
    {
        if (net.Nodes[driverNode].Pin?.Model?.Driver is not { } model)
        {
            objection = $"'{net.Nodes[driverNode].Name}' has no driver";
            return null;
        }
        var builder = new NetworkBuilder();
        var whole = 0.0;
        for (var i = 0; i < net.Branches.Length; i++)
        {
            var delay = AddBranch(builder, net, i, out objection);
            if (objection.Length > 0)
                return null;
            whole += delay;
        }
        for (var i = 0; i < net.Nodes.Length; i++)
        {
            if (i != driverNode)
                whole += AddPin(builder, net, i);
        }
        whole += AddDriverPackage(builder, net, driverNode, model, out var die);
        AddTerminations(builder, net.Nodes[driverNode].Pin!.Terminations, NodeName(driverNode));
        var package = new DriverPackage(model.Package?.InductanceHenry ?? 0, (model.Package?.CapacitanceFarad ?? 0) + model.Capacitance.Value);
        var driver = new Driver(
            builder.Node(die), model.Low.Value, model.High.Value, model.Resistance.Value,
            package is { InductanceHenries: 0, CapacitanceFarads: 0 } ? null : package);
        var stimulus = edge.Rising ? Stimulus.Rising(model.Rise.Value) : Stimulus.Falling(model.Fall.Value);
        var network = builder.Build(
            driver, stimulus, (WindowInRamps * stimulus.ShortestRampSeconds) + (WindowInDelays * whole), edge.ReferenceLoad);
        objection = NetworkCheck.Problems(network) is { Count: > 0 } problems ? problems[0].Message : "";
        return objection.Length == 0 ? network : null;
    }

    /// <summary>Name, in the network, of the place at which a pin's receiver is judged.</summary>
    /// <param name="node">Index of the pin's node.</param>
    public static string DieName(int node) => $"die {node}";

    private static string NodeName(int node) => $"{node}";

    private double AddBranch(NetworkBuilder builder, ElectricalNet net, int index, out string objection)
    {
        var branch = net.Branches[index];
        var (from, to) = (NodeName(branch.From), NodeName(branch.To));
        objection = "";
        if (branch.Join is { } join)
        {
            builder.SeriesElement(from, to, join.Resistance.Value, join.Inductance.Value, join.Capacitance?.Value);
            return 0;
        }
        var segment = net.SegmentOf(branch);
        if (segment.Kind == SegmentKind.Trace)
        {
            if (lines.Find(LineKey.Of(segment), out objection) is not { } line)
                return 0;
            var delay = segment.LengthMetres * line.DelaySecondsPerMetre;
            builder.Line(from, to, line.WaveOhms, delay);
            return delay;
        }
        if (vias.Find(ViaHole.Of(segment), out objection) is not { } via)
            return 0;
        builder.SeriesElement(from, to, 0, via.InductanceHenry);
        builder.ShuntElement(from, 0.5 * via.CapacitanceFarad);
        builder.ShuntElement(to, 0.5 * via.CapacitanceFarad);
        return via.BarrelDelaySeconds;
    }

    /// <summary>Adds what a pin that does not drive loads the net with; gives the delay of its package.</summary>
    private double AddPin(NetworkBuilder builder, ElectricalNet net, int node)
    {
        if (net.Nodes[node].Pin is not { } pin)
            return 0;
        var name = NodeName(node);
        AddTerminations(builder, pin.Terminations, name);
        if (pin.Model is not { } model)
            return 0;
        var package = model.Receiver?.Package ?? model.Driver?.Package;
        var needsDie = pin.PackageDelaySeconds > 0 || package is { InductanceHenry: > 0 } || model.Receiver is not null;
        var die = needsDie ? DieName(node) : name;
        if (pin.PackageDelaySeconds > 0)
            builder.Line(name, die, PackageOhms(net, node), pin.PackageDelaySeconds);
        else if (package is { InductanceHenry: > 0 })
            builder.SeriesElement(name, die, 0, package.InductanceHenry);
        else if (needsDie)
            builder.SeriesElement(name, die, SupplyOhms);
        if (package is { CapacitanceFarad: > 0 })
            builder.ShuntElement(die, package.CapacitanceFarad);
        if (model.Receiver is not { } receiver)
        {
            // A driver that is switched off still has its capacitance.
            if (model.Driver is { Capacitance.Value: > 0 } off)
                builder.ShuntElement(die, off.Capacitance.Value);
            return pin.PackageDelaySeconds;
        }
        AddTerminations(builder, receiver.Terminations, die);
        Thresholds? levels = receiver is { Vil: { } vil, Vih: { } vih, TimingThresholdVolts: { } mid } ? new Thresholds(vil.Value, vih.Value, mid) : null;
        builder.Receiver(die, receiver.Capacitance.Value, levels);
        return pin.PackageDelaySeconds;
    }

    private double AddDriverPackage(NetworkBuilder builder, ElectricalNet net, int node, DriverModel model, out string die)
    {
        var delay = net.Nodes[node].Pin!.PackageDelaySeconds;
        // A package given as inductance and capacitance is part of the driver; one given as a delay is a line in front of it.
        die = delay > 0 && model.Package is null ? DieName(node) : NodeName(node);
        if (delay > 0 && model.Package is null)
            builder.Line(die, NodeName(node), PackageOhms(net, node), delay);
        return delay;
    }

    private static void AddTerminations(NetworkBuilder builder, IEnumerable<Termination> terminations, string at)
    {
        foreach (var termination in terminations)
        {
            if (termination.CapacitanceFarad is not { } farads)
            {
                builder.ShuntElement(at, 0, termination.Resistance.Value, termination.ToVolts);
                continue;
            }
            var supply = $"supply of {at} {termination.ToVolts}";
            builder.SeriesElement(at, supply, termination.Resistance.Value, 0, farads);
            builder.ShuntElement(supply, 0, SupplyOhms, termination.ToVolts);
        }
    }

    private double PackageOhms(ElectricalNet net, int node)
    {
        foreach (var index in net.BranchesAt(node))
        {
            var branch = net.Branches[index];
            if (!branch.IsSeriesPart && net.SegmentOf(branch) is { Kind: SegmentKind.Trace } trace && lines.Find(LineKey.Of(trace), out _) is { } line)
                return line.WaveOhms;
        }
        return AssumedPackageOhms;
    }
}
