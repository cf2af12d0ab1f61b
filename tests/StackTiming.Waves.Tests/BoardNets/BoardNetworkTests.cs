using StackTiming.Lines.Methods;
using StackTiming.Nets.Electrical;
using StackTiming.Nets.Parts;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using StackTiming.Waves.BoardNets;
using StackTiming.Waves.Metrics;
using StackTiming.Waves.Networks;
using StackTiming.Waves.Paths;
using StackTiming.Waves.Vias;
using Xunit;

namespace StackTiming.Waves.Tests.BoardNets;

/// <summary>A net of a board must behave as the same net drawn by hand.</summary>
public sealed class BoardNetworkTests
{
    private const string Parts = """
        models:
          out: { driver: { low: 0 V, high: 1.8 V, resistance: 20 ohm, rise: 400 ps, fall: 300 ps } }
          in: { receiver: { capacitance: 2 pF, vil: 0.6 V, vih: 1.2 V, threshold: 0.9 V, termination: { resistance: 1 kohm, to: 0.9 V } } }
        parts:
          U1: { pins: { 1: { model: out, package-delay: 40 ps } } }
          U2: { pins: { 1: { model: in, package-delay: 25 ps } } }
          R1: { joins: [1, 2], resistance: 22 ohm }
          R2: { pins: { 1: { termination: { resistance: 60 ohm, to: 0.9 V } } } }
        """;

    private static (NetResponse Board, ElectricalNet Net, LineTable Lines, ViaTable Vias) Solve(string rows, bool rising)
    {
        var problems = new ProblemList();
        var map = YamlDocument.ReadMap(new InputFile("parts.yaml", Parts, ""), problems)!;
        var parts = PartListReader.Read(new MapReader(map, DefaultUnits.None, problems))!;
        var lengths = TestBoards.Lengths(rows);
        var nets = ElectricalNets.Build(lengths, parts, problems);
        Assert.False(problems.HasErrors, string.Join('\n', problems.Items));
        var lines = LineTable.Build(TestBoards.FourLayers(), LineTable.KeysOf(lengths), ClosedForms.Calculator, null, TestContext.Current.CancellationToken);
        var vias = new ViaTable(TestBoards.FourLayers(), lengths, null);
        var net = nets!.Find("S")!;
        var network = new BoardNetwork(lines, vias).Of(net, DriverChoice.Of(net, null).Node, new BoardEdge(rising, new ReferenceLoad(50, 0.9, 0)), out var objection);
        Assert.True(objection.Length == 0, objection);
        return (NetResponse.Solve(network!), net, lines, vias);
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void A_board_net_behaves_like_the_same_net_drawn_by_hand(bool rising)
    {
        var (board, net, lines, vias) = Solve("S,U1.1,R1.1,L1,5,0.3\nA,R1.2,*1,L1,30,0.3\nA,*1,*2,L1>L4,,,,0.2,0.4,0.65\nA,*2,U2.1,L4,20,0.2\nA,*2,R2.1,L4,4,0.2\n", rising);
        BoardLine Line(string layer, double millimetres) => lines.Find(new LineKey(layer, millimetres * 1e-3, 0), out _)!;
        var (top, bottom) = (Line("L1", 0.3), Line("L4", 0.2));
        var via = vias.Models.Single().Model;
        var builder = new NetworkBuilder()
            .Line("die", "pin", top.WaveOhms, 40e-12).Line("pin", "r1", top.WaveOhms, 5e-3 * top.DelaySecondsPerMetre).SeriesElement("r1", "r2", 22)
            .Line("r2", "v1", top.WaveOhms, 30e-3 * top.DelaySecondsPerMetre).SeriesElement("v1", "v2", 0, via.InductanceHenry)
            .ShuntElement("v1", via.CapacitanceFarad / 2).ShuntElement("v2", via.CapacitanceFarad / 2)
            .Line("v2", "u2", bottom.WaveOhms, 20e-3 * bottom.DelaySecondsPerMetre).Line("u2", "in", bottom.WaveOhms, 25e-12)
            .Line("v2", "t", bottom.WaveOhms, 4e-3 * bottom.DelaySecondsPerMetre).ShuntElement("t", resistanceOhms: 60, toVolts: 0.9)
            .Receiver("in", 2e-12, new Thresholds(0.6, 1.2, 0.9), 1000, 0.9);
        var byHand = NetResponse.Solve(builder.Build(
            new Driver(builder.Node("die"), 0, 1.8, 20, null), rising ? Stimulus.Rising(400e-12) : Stimulus.Falling(300e-12), 20e-9, new ReferenceLoad(50, 0.9, 0)));
        Assert.Equal("U2.1", net.Nodes.Single(n => n.Pin?.Model?.Receiver is not null).Name);
        var (actual, expected) = (board.Metrics.Single(), byHand.Metrics.Single());
        Assert.Equal(expected.FirstMidSeconds!.Value, actual.FirstMidSeconds!.Value, 0.05e-12);
        Assert.Equal(expected.FlightTimeSeconds!.Value, actual.FlightTimeSeconds!.Value, 0.05e-12);
        Assert.Equal(expected.MaxVolts, actual.MaxVolts, 1e-3);
        Assert.Equal(expected.MinVolts, actual.MinVolts, 1e-3);
        Assert.Equal(expected.FinalVolts, actual.FinalVolts, 1e-4);
    }

    [Fact]
    public void A_pin_that_cannot_drive_is_refused()
    {
        var (_, net, lines, vias) = Solve("S,U1.1,U2.1,L1,50,0.3\n", rising: true);
        var receiver = net.ReceiverNodes.Single();
        Assert.Null(new BoardNetwork(lines, vias).Of(net, receiver, new BoardEdge(true, null), out var objection));
        Assert.Contains("has no driver", objection);
    }
}
