using System.Collections.Immutable;
using StackTiming.Nets.Electrical;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Waves.Paths;

namespace StackTiming.Rules.Checking;

/// <summary>Traces electrical nets from their drivers: the way to each receiver and the branches off the longest way.</summary>
/// <param name="nets">The electrical nets.</param>
/// <param name="delays">Delays of paths and stubs.</param>
/// <param name="notes">Is told what the delays assume; safe on several threads.</param>
internal sealed class PathTracer(ElectricalNets nets, PathDelays delays, Action<string> notes)
{
    /// <summary>A net as its drivers see it.</summary>
    /// <param name="name">Name of a net.</param>
    /// <param name="drive">Which drivers.</param>
    /// <param name="objection">Why there is none.</param>
    public ImmutableArray<DrivenNet> Trace(string name, DriveChoice drive, out string objection)
    {
        objection = "";
        if (nets.Find(name) is not { } net)
        {
            objection = "the length list has no such net";
            return [];
        }
        var drivers = DriversOf(net, drive, out objection);
        var result = ImmutableArray.CreateBuilder<DrivenNet>(drivers.Count);
        foreach (var driver in drivers)
        {
            if (Trace(name, net, driver, out objection) is not { } driven)
                return [];
            result.Add(driven);
        }
        return result.ToImmutable();
    }

    private static List<int> DriversOf(ElectricalNet net, DriveChoice drive, out string objection)
    {
        objection = "";
        if (drive == DriveChoice.Each)
        {
            List<int> all = [.. net.DriverNodes.OrderBy(n => net.Nodes[n].Name, NaturalOrder.Instance)];
            if (all.Count > 0)
                return all;
        }
        var stated = drive == DriveChoice.Each || drive.Text.Length == 0 ? null : drive.Text;
        var choice = DriverChoice.Of(net, stated);
        if (choice.IsFound)
            return [choice.Node];
        var without = WithoutModel(net, stated);
        if (without >= 0)
            return [without];
        objection = $"{choice.Objection} ({choice.Advice})";
        return [];
    }

    /// <summary>Where no pin has a driver: the pin that the rule names, or one end of a net that only has two.</summary>
    private static int WithoutModel(ElectricalNet net, string? stated)
    {
        if (net.DriverNodes.Any() && stated is null)
            return -1;
        var ends = EndPins(net);
        if (stated is not null)
        {
            var named = ends.FindAll(n => net.Nodes[n].Name == stated || PinName.PartOf(net.Nodes[n].Name) == stated);
            return named.Count == 1 ? named[0] : -1;
        }
        if (ends.Count != 2)
            return -1;
        return net.Nodes[ends[0]].Pin?.Model?.Receiver is null ? ends[0] : ends[1];
    }

    /// <summary>The pins at which a signal can begin or end: not those of series parts, and not resistors that only terminate.</summary>
    private static List<int> EndPins(ElectricalNet net)
    {
        var ends = new List<int>();
        for (var i = 0; i < net.Nodes.Length; i++)
        {
            var node = net.Nodes[i];
            if (node.IsPin && node.Part is not { Joins.IsEmpty: false } && node.Pin is not { Model: null, Terminations.IsEmpty: false })
                ends.Add(i);
        }
        ends.Sort((a, b) => NaturalOrder.Instance.Compare(net.Nodes[a].Name, net.Nodes[b].Name));
        return ends;
    }

    private DrivenNet? Trace(string name, ElectricalNet net, int driver, out string objection)
    {
        var tree = new NetTree(net, driver);
        var receivers = new List<int>(net.ReceiverNodes);
        receivers.Remove(driver);
        if (receivers.Count == 0)
        {
            receivers = EndPins(net);
            receivers.Remove(driver);
        }
        receivers.Sort((a, b) => NaturalOrder.Instance.Compare(net.Nodes[a].Name, net.Nodes[b].Name));
        var paths = ImmutableArray.CreateBuilder<ReceiverPath>(receivers.Count);
        (NetPath Path, double Seconds)? longest = null;
        foreach (var receiver in receivers)
        {
            var path = tree.PathTo(receiver);
            if (delays.Of(path, out objection) is not { } delay)
                return null;
            foreach (var note in delay.Notes)
                notes(note);
            paths.Add(new ReceiverPath(net.Nodes[receiver].Name, net.Nodes[receiver].Pin?.Model?.Receiver, Pieces(delay)));
            if (longest is null || delay.Seconds > longest.Value.Seconds)
                longest = (path, delay.Seconds);
        }
        var trunk = TerminatedEnd(tree) ?? longest?.Path;
        objection = "";
        var stubs = trunk is null ? [] : StubsOf(trunk, out objection);
        return objection.Length > 0
            ? null
            : new DrivenNet(name, net.Nodes[driver].Name, net.Nodes[driver].Pin?.Model?.Driver, paths.ToImmutable(), stubs, SeriesOhms(trunk));
    }

    /// <summary>The way to the farthest resistor that ends the net: what lies between the last receiver and it is no stub.</summary>
    private static NetPath? TerminatedEnd(NetTree tree)
    {
        NetPath? farthest = null;
        for (var i = 0; i < tree.Net.Nodes.Length; i++)
        {
            if (i == tree.Root || tree.Net.Nodes[i].Pin is not { Model: null, Terminations.IsEmpty: false })
                continue;
            var path = tree.PathTo(i);
            if (farthest is null || path.TraceLengthMetres > farthest.TraceLengthMetres)
                farthest = path;
        }
        return farthest;
    }

    private ImmutableArray<StubBranch> StubsOf(NetPath trunk, out string objection)
    {
        objection = "";
        var stubs = ImmutableArray.CreateBuilder<StubBranch>();
        foreach (var stub in trunk.Stubs())
        {
            // What leaves at the driver itself is a second line in parallel, not a stub of the first.
            if (stub.Place == 0)
                continue;
            if (delays.Of(trunk, stub, out objection) is not { } delay)
                return [];
            if (delay.Seconds > 0)
            {
                stubs.Add(new StubBranch(
                    NameOf(trunk.Net, trunk.Nodes[stub.Place]), delay.End.Name.Length > 0 ? delay.End.Name : "an open end",
                    delay.Seconds, delay.TraceMetres, delay.LongestTrace?.Key.Layer ?? "", delay.LongestTrace?.DelaySecondsPerMetre ?? 0));
            }
        }
        return stubs.ToImmutable();
    }

    private static string NameOf(ElectricalNet net, int node)
    {
        var here = net.Nodes[node];
        return here.Name.Length > 0 ? here.Name : $"a point of {net.Lengths.Nets[here.Net].Name}";
    }

    private static double SeriesOhms(NetPath? trunk)
    {
        var sum = 0.0;
        foreach (var branch in trunk?.Branches ?? [])
            sum += trunk!.Net.Branches[branch].Join?.Resistance.Value ?? 0;
        return sum;
    }

    private static ImmutableArray<PathPiece> Pieces(PathDelay delay)
    {
        var pieces = ImmutableArray.CreateBuilder<PathPiece>(delay.Pieces.Length);
        foreach (var piece in delay.Pieces)
        {
            var kind = piece.Kind switch
            {
                DelayPieceKind.Trace => PieceKind.Trace,
                DelayPieceKind.Via => PieceKind.Via,
                DelayPieceKind.Package => PieceKind.Package,
                _ => PieceKind.SeriesPart,
            };
            var net = piece.Net >= 0 ? delay.Path.Net.Lengths.Nets[piece.Net].Name : "";
            pieces.Add(new PathPiece(
                kind, net, piece.Name, piece.LengthMetres, piece.WidthMetres, piece.GapMetres, piece.DelaySeconds, piece.Z0Ohms));
        }
        return pieces.MoveToImmutable();
    }
}
