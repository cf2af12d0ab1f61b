using System.Collections.Immutable;
using StackTiming.Lines.Solutions;
using StackTiming.Nets.Electrical;
using StackTiming.Rules.Boards;
using StackTiming.Rules.Judging;
using StackTiming.Stackups.Reading;
using StackTiming.Waves.BoardNets;
using StackTiming.Waves.Networks;
using StackTiming.Waves.Paths;
using StackTiming.Waves.Vias;

namespace StackTiming.Commands;

/// <summary>A net whose waveforms are asked for.</summary>
/// <param name="Name">What it is called.</param>
/// <param name="Network">The network.</param>
/// <param name="Receivers">Names of its receivers in the order of the network.</param>
internal sealed record NetSubject(string Name, Network Network, ImmutableArray<string> Receivers);

/// <summary>Finds a net of a board and makes a network of it.</summary>
internal static class BoardNetSubject
{
    /// <summary>The net, or null with problems.</summary>
    public static NetSubject? Find(
        string boardPath, string netName, string? drive, bool rising, ILineCalculator calculator, ProblemList problems, CancellationToken cancellation)
    {
        if (BoardReader.Read(boardPath, problems, cancellation) is not { } board)
            return null;
        var at = FilePosition.WholeFile(boardPath);
        if (board.Electrical.Find(netName) is not { } net)
        {
            problems.Error(at, $"the board has no net '{Suggestion.Shorten(netName)}'", Suggestion.For(netName, board.Lengths.Nets.Select(n => n.Name)));
            return null;
        }
        var choice = DriverChoice.Of(net, drive);
        if (!choice.IsFound)
        {
            problems.Error(at, choice.Objection, choice.Advice);
            return null;
        }
        var keys = net.Branches.Where(b => !b.IsSeriesPart).Select(b => net.SegmentOf(b))
            .Where(s => s.Kind == Nets.Lengths.SegmentKind.Trace).Select(s => LineKey.Of(s)).Distinct().ToImmutableArray();
        var lines = LineTable.Build(board.StackUp, keys, calculator, board.Assumed.FrequencyHertz, cancellation);
        var builder = new BoardNetwork(lines, new ViaTable(board.StackUp, board.Lengths, board.Assumed.FrequencyHertz));
        var model = net.Nodes[choice.Node].Pin!.Model!.Driver!;
        var load = board.Assumed.Reference ?? AssumedLoad.Usual;
        var middle = 0.5 * (model.Low.Value + model.High.Value);
        var network = builder.Of(net, choice.Node, new BoardEdge(rising, new ReferenceLoad(load.ResistanceOhms, load.ToVolts ?? middle, load.CapacitanceFarad)), out var objection);
        if (network is null)
        {
            problems.Error(at, $"'{netName}': {objection}");
            return null;
        }
        if (network.Receivers.IsEmpty)
        {
            problems.Error(at, $"no pin of '{netName}' has a receiver", "give one of its pins a model with a receiver in the parts file");
            return null;
        }
        var names = Enumerable.Range(0, net.Nodes.Length).ToDictionary(BoardNetwork.DieName, i => net.Nodes[i].Name);
        return new NetSubject($"{netName} from {net.Nodes[choice.Node].Name}", network, [.. network.Receivers.Select(r => names[network.NodeNames[r.Node]])]);
    }
}
