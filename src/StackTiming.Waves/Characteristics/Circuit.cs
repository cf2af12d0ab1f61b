using StackTiming.Waves.Networks;

namespace StackTiming.Waves.Characteristics;

/// <summary>
/// A network as the solver steps it: the driver's die as a node of its own where a package inductance separates it from the pin, and lines that are
/// shorter than a step as inductance between two halves of their capacitance.
/// </summary>
internal sealed class Circuit
{
    /// <summary>Number of nodes; those of the network come first.</summary>
    public required int NodeCount { get; init; }

    /// <summary>Node that the driver's source and resistance act on.</summary>
    public required int SourceNode { get; init; }

    /// <summary>Conductance of the driver, siemens.</summary>
    public required double SourceSiemens { get; init; }

    /// <summary>Lines that are stepped as lines.</summary>
    public required LosslessLine[] Lines { get; init; }

    /// <summary>Lines with loss.</summary>
    public required LossyLine[] LossyLines { get; init; }

    /// <summary>Coupled groups.</summary>
    public required CoupledLines[] Groups { get; init; }

    /// <summary>Branches between nodes.</summary>
    public required SeriesBranch[] Branches { get; init; }

    /// <summary>Elements to ground or to a supply; receivers among them.</summary>
    public required Shunt[] Shunts { get; init; }

    /// <summary>The circuit of a network.</summary>
    /// <param name="network">A network without problems.</param>
    /// <param name="stepSeconds">The step; lines without loss and with a shorter delay are lumped.</param>
    public static Circuit Of(Network network, double stepSeconds)
    {
        var nodes = network.NodeNames.Length;
        var branches = new List<SeriesBranch>(network.Series);
        var shunts = new List<Shunt>(network.Shunts);
        var lines = new List<LosslessLine>(network.Lines.Length);
        foreach (var receiver in network.Receivers)
        {
            if (receiver.CapacitanceFarads > 0 || receiver.ResistanceOhms is not null)
                shunts.Add(new Shunt(receiver.Node, receiver.CapacitanceFarads, receiver.ResistanceOhms, receiver.ToVolts, null));
        }
        foreach (var line in network.Lines)
        {
            if (line.DelaySeconds >= stepSeconds)
            {
                lines.Add(line);
                continue;
            }
            var half = line.DelaySeconds / line.Z0Ohms / 2;
            branches.Add(new SeriesBranch(line.From, line.To, 0, line.DelaySeconds * line.Z0Ohms, null));
            shunts.Add(new Shunt(line.From, half, null, 0, null));
            shunts.Add(new Shunt(line.To, half, null, 0, null));
        }
        var source = network.Driver.Node;
        if (network.Driver.Package is { } package)
        {
            if (package.InductanceHenries > 0)
            {
                source = nodes++;
                branches.Add(new SeriesBranch(source, network.Driver.Node, 0, package.InductanceHenries, null));
            }
            if (package.CapacitanceFarads > 0)
                shunts.Add(new Shunt(source, package.CapacitanceFarads, null, 0, null));
        }
        return new Circuit
        {
            NodeCount = nodes,
            SourceNode = source,
            SourceSiemens = 1 / network.Driver.ResistanceOhms,
            Lines = [.. lines],
            LossyLines = [.. network.LossyLines],
            Groups = [.. network.CoupledLines],
            Branches = [.. branches],
            Shunts = [.. shunts],
        };
    }
}
