using System.Collections.Frozen;
using CsCheck;
using StackTiming.Lines.Methods;
using StackTiming.Nets.Electrical;
using StackTiming.Nets.Lengths;
using StackTiming.Nets.Parts;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using StackTiming.Waves.Paths;
using StackTiming.Waves.Vias;
using Xunit;

namespace StackTiming.Waves.Tests.Paths;

public class PathDelaysTests
{
    private sealed record Bench(ElectricalNets Nets, LineTable Lines, ViaTable Vias)
    {
        public PathDelays Delays { get; } = new(Lines, Vias);

        public NetPath Path(string net, string from, string to)
        {
            var electrical = Nets.Find(net)!;
            return new NetTree(electrical, electrical.FindPin(from)).PathTo(electrical.FindPin(to));
        }

        public PathDelay Delay(string net, string from, string to)
        {
            var delay = Delays.Of(Path(net, from, to), out var objection);
            Assert.Equal("", objection);
            return delay!;
        }
    }

    private static Bench Make(string rows, PartList? parts = null, double? hertz = null)
    {
        var stackUp = TestBoards.FourLayers();
        var lengths = TestBoards.Lengths(rows);
        var problems = new ProblemList();
        var nets = ElectricalNets.Build(lengths, parts ?? PartList.Empty, problems);
        Assert.False(problems.HasErrors, string.Join('\n', problems.Items));
        var lines = LineTable.Build(stackUp, LineTable.KeysOf(lengths), ClosedForms.Calculator, hertz, TestContext.Current.CancellationToken);
        return new Bench(nets!, lines, new ViaTable(stackUp, lengths, hertz));
    }

    private static PartList PartsOf(params Part[] parts) =>
        new(FrozenDictionary<string, BufferModel>.Empty, parts.ToFrozenDictionary(p => p.Name));

    private static Part WithDelay(string name, string pin, double picoseconds) => new(
        name, default, new Dictionary<string, PartPin> { [pin] = new(pin, default, null, 1e-12 * picoseconds, [], null) }.ToFrozenDictionary(), []);

    [Fact]
    public void A_path_is_the_sum_of_its_pieces_in_their_order()
    {
        var resistor = new Part("R1", default, FrozenDictionary<string, PartPin>.Empty, [new("1", "2", Quantity.Exact(22), Quantity.Exact(0), null)]);
        var bench = Make(
            "S,U1.1,R1.1,L1,5,0.3\nA,R1.2,*1,L1,10,0.3\nA,*1,*2,L1>L4,,,,0.2,0.4,0.65\nA,*2,U2.1,L4,20,0.2\n",
            PartsOf(resistor, WithDelay("U1", "1", 41), WithDelay("U2", "1", 11)));
        var delay = bench.Delay("A", "U1.1", "U2.1");
        Assert.Equal(
            [DelayPieceKind.Package, DelayPieceKind.Trace, DelayPieceKind.SeriesPart, DelayPieceKind.Trace, DelayPieceKind.Via, DelayPieceKind.Trace, DelayPieceKind.Package],
            delay.Pieces.Select(p => p.Kind));
        Assert.Equal(["U1.1", "L1", "R1", "L1", "L1>L4", "L4", "U2.1"], delay.Pieces.Select(p => p.Name));
        var wide = bench.Lines.Find(new LineKey("L1", 0.3e-3, 0), out _)!;
        var narrow = bench.Lines.Find(new LineKey("L4", 0.2e-3, 0), out _)!;
        Assert.Equal(0.015 * wide.DelaySecondsPerMetre + 0.020 * narrow.DelaySecondsPerMetre, delay.SecondsOf(DelayPieceKind.Trace), 1e-18);
        Assert.Equal(52e-12, delay.SecondsOf(DelayPieceKind.Package), 1e-18);
        var via = Assert.Single(bench.Vias.Models).Model;
        Assert.Equal(via.DelaySeconds(Math.Sqrt(wide.WaveOhms * narrow.WaveOhms)), delay.SecondsOf(DelayPieceKind.Via), 1e-18);
        Assert.Equal(delay.Pieces.Sum(p => p.DelaySeconds), delay.Seconds, 1e-18);
        Assert.Equal(wide.WaveOhms, delay.Pieces[1].Z0Ohms);
        Assert.Empty(delay.Notes);
    }

    // Hammerstad and Jensen 1980 give eps_eff of a trace on Dk 4 between 2.5 and 4: no signal on it beats light in the dielectric or loses to light in air.
    [Fact]
    public void Time_of_flight_lies_between_light_in_air_and_light_in_the_dielectric()
    {
        var seconds = Make("A,U1.1,U2.1,L1,100,0.3\n").Delay("A", "U1.1", "U2.1").Seconds;
        Assert.InRange(seconds, Math.Sqrt(2.5) * 0.1 / 299_792_458, Math.Sqrt(4) * 0.1 / 299_792_458);
    }

    [Fact]
    public void Delay_adds_up_however_a_trace_is_cut_and_turned()
    {
        Gen.Select(Gen.Double[0.1, 50].Array[1, 12], Gen.Bool.Array[12]).Sample((lengths, swap) =>
        {
            var rows = new List<string>();
            for (var i = 0; i < lengths.Length; i++)
            {
                var a = i == 0 ? "U1.1" : $"*{i}";
                var b = i == lengths.Length - 1 ? "U2.1" : $"*{i + 1}";
                rows.Add(FormattableString.Invariant($"A,{(swap[i] ? b : a)},{(swap[i] ? a : b)},L1,{lengths[i]:R},0.3"));
            }
            rows.Add(FormattableString.Invariant($"B,U1.2,U2.2,L1,{lengths.Sum():R},0.3"));
            var bench = Make(string.Join('\n', rows) + "\n");
            Assert.Equal(bench.Delay("B", "U1.2", "U2.2").Seconds, bench.Delay("A", "U1.1", "U2.1").Seconds, 1e-18);
            Assert.Equal(bench.Delay("A", "U2.1", "U1.1").Seconds, bench.Delay("A", "U1.1", "U2.1").Seconds, 1e-18);
        }, iter: 50);
    }

    [Fact]
    public void What_was_assumed_is_noted_once()
    {
        var delay = Make("A,U1.1,*1,L1,5,0.3,,,,,,0.4,1\nA,*1,*2,L1>L2,,\nA,*2,*3,L1>L2,,\nA,*3,U2.1,L1,5,0.3,,,,,,0.4,1\n").Delay("A", "U1.1", "U2.1");
        Assert.Equal(5, delay.Notes.Length);
        Assert.StartsWith("meanders are counted with their full length", delay.Notes[0], StringComparison.Ordinal);
        Assert.Equal("via from L1 to L2: the hole is taken to be 0.25 mm wide", delay.Notes[1]);
    }

    [Fact]
    public void A_stub_reaches_to_its_farthest_end()
    {
        var bench = Make("A,U1.1,*1,L1,5,0.3\nA,*1,U2.1,L1,5,0.3\nA,*1,*2,L1,2,0.3\nA,*2,U3.1,L1,9,0.2\nA,*2,U4.1,L1,1,0.3\n");
        var path = bench.Path("A", "U1.1", "U2.1");
        var stub = bench.Delays.Of(path, Assert.Single(path.Stubs()), out var objection)!;
        Assert.Equal("", objection);
        Assert.Equal("U3.1", stub.End.Name);
        Assert.Equal(0.011, stub.TraceMetres, 1e-12);
        Assert.Equal(new LineKey("L1", 0.2e-3, 0), stub.LongestTrace!.Key);
        var wide = bench.Lines.Find(new LineKey("L1", 0.3e-3, 0), out _)!;
        Assert.Equal(0.002 * wide.DelaySecondsPerMetre + 0.009 * stub.LongestTrace.DelaySecondsPerMetre, stub.Seconds, 1e-18);
    }

    [Fact]
    public void A_path_over_a_line_that_cannot_be_computed_says_where_and_why()
    {
        var bench = Make("A,U1.1,*1,L1,5,0.3\nA,*1,U2.1,L2,5,0.3\n");
        Assert.Null(bench.Delays.Of(bench.Path("A", "U1.1", "U2.1"), out var objection));
        Assert.StartsWith("a.csv:3: L2 is a plane", objection, StringComparison.Ordinal);
    }

    [Fact]
    public void A_via_between_vias_takes_the_impedance_of_the_traces_beyond()
    {
        var bench = Make("A,U1.1,*1,L1,5,0.3\nA,*1,*2,L1>L4,,,,0.2,0.4,0.65\nA,*2,*3,L4>L1,,,,0.2,0.4,0.65\nA,*3,U2.1,L1,5,0.3\nB,U1.2,U2.2,L1>L4,,,,0.2,0.4,0.65\n");
        var delay = bench.Delay("A", "U1.1", "U2.1");
        Assert.Equal(delay.Pieces[1].DelaySeconds, delay.Pieces[2].DelaySeconds, 1e-20);
        var alone = bench.Delay("B", "U1.2", "U2.2");
        var via = bench.Vias.Models.First().Model;
        Assert.Equal(Math.Sqrt(via.InductanceHenry * via.CapacitanceFarad), alone.Seconds, 1e-18);
    }
}
