using StackTiming.Rules.Checking;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;
using StackTiming.Rules.Tests.Boards;
using Xunit;

namespace StackTiming.Rules.Tests.Checking;

public sealed class BoardCheckTests : IDisposable
{
    private static readonly DateOnly Today = new(2026, 12, 1);
    private readonly BoardFolder folder = new();
    private readonly RoundLines lines = new();

    public void Dispose() => folder.Dispose();

    private CheckResult Run(params string[] board)
    {
        folder.WriteBoard(board);
        return BoardCheck.Run(folder.ReadWhole(), new CheckOptions(lines, Today) { Cancellation = TestContext.Current.CancellationToken });
    }

    private Finding Only(params string[] board) => Assert.Single(Run(board).Findings);

    [Fact]
    public void A_whole_board_gets_a_verdict_with_counts_tables_and_phases()
    {
        // 240, 246 and 243 ps: all within 10 ps.
        var result = Run("rules: board.rules.yaml");
        Assert.Equal(Verdict.Pass, result.Verdict);
        Assert.Equal(3, result.Counts.Passed);
        Assert.Equal([6.0, 6.0, 3.0], result.Findings.Select(f => Math.Round(f.Value!.Value, 6)));
        Assert.Equal(["lines", "delays", "waves", "rules"], result.Phases.Select(p => p.Name));
        Assert.Equal((4, 4), (result.NetCount, result.SegmentCount));
        var line = Assert.Single(result.Lines);
        Assert.Equal(("L1", 4, 161.7), (line.Layer, line.SegmentCount, Math.Round(line.TotalLengthMetres * 1e3, 6)));
        Assert.Equal("round", Assert.Single(result.Methods).Id);
        Assert.Equal("MATCH", Assert.Single(result.Groups).Rule);
    }

    [Fact]
    public void A_failing_must_fails_the_board_and_a_failing_should_does_not()
    {
        Assert.Equal(Verdict.Fail, Run("rules: [ { id: Z, kind: impedance, nets: D0, target: 40 ohm ±10 % } ]").Verdict);
        var should = Run("rules: [ { id: Z, kind: impedance, nets: D0, severity: should, target: 40 ohm ±10 % } ]");
        Assert.Equal((Verdict.Pass, 1), (should.Verdict, should.Counts.FailedShould));
    }

    [Fact]
    public void What_cannot_be_judged_fails_the_board_and_says_why()
    {
        folder.Write("nets.lengths.csv", "net,from,to,layer,length[mm],width[mm],gap[mm]\nP,U1.1,U2.1,L1,40,0.18,0.2\nN,U1.2,U2.2,L1,40,0.18,0.2\n");
        var result = Run("rules: [ { id: Z, kind: impedance, pair: [ P, N ], target: 90 ohm ±10 % } ]");
        Assert.Equal(Verdict.Fail, result.Verdict);
        Assert.Equal("round figures describe single traces only", result.Findings[0].UncheckedReason);
    }

    [Fact]
    public void Each_distinct_section_is_solved_once()
    {
        folder.Write("nets.lengths.csv", "net,from,to,layer,length[mm],width[mm]\n"
            + string.Concat(Enumerable.Range(0, 60).Select(i => $"D{i},A.{i},B.{i},L{(i % 2) * 3 + 1},40,{0.1 + 0.1 * (i % 3)}\n")));
        Run("rules: [ { id: Z, kind: impedance, nets: \"D*\", target: 50 ohm ±10 % }, { id: T, kind: flight-time, nets: \"D*\", max: 1 ns } ]");
        Assert.Equal(6, lines.Calls);
    }

    [Fact]
    public void Results_do_not_depend_on_the_number_of_threads()
    {
        folder.WriteBoard("rules: board.rules.yaml");
        var board = folder.ReadWhole();
        string[] Findings(int threads) =>
            [.. BoardCheck.Run(board, new CheckOptions(lines, Today) { Threads = threads }).Findings.Select(f => f.Explanation)];
        Assert.Equal(Findings(1), Findings(8));
    }

    [Fact]
    public void Progress_is_told_for_each_phase_up_to_its_end()
    {
        folder.WriteBoard("rules: board.rules.yaml");
        var seen = new System.Collections.Concurrent.ConcurrentQueue<CheckProgress>();
        BoardCheck.Run(folder.ReadWhole(), new CheckOptions(lines, Today) { Progress = seen.Enqueue });
        Assert.All(seen.GroupBy(p => p.Phase), phase => Assert.Contains(phase, p => p.Done == p.Total));
        Assert.Equal(4, seen.Select(p => p.Phase).Distinct().Count());
    }

    [Fact]
    public void A_check_stops_when_it_is_cancelled()
    {
        folder.WriteBoard("rules: board.rules.yaml");
        var board = folder.ReadWhole();
        using var stopped = new CancellationTokenSource();
        stopped.Cancel();
        Assert.ThrowsAny<OperationCanceledException>(() => BoardCheck.Run(board, new CheckOptions(lines, Today) { Cancellation = stopped.Token }));
    }

    [Fact]
    public void Waivers_are_held_against_the_day_of_the_check()
    {
        string[] board =
        [
            "rules: [ { id: Z, kind: impedance, nets: [ D0, D1 ], target: 40 ohm ±10 % } ]",
            "waivers: [ { rule: Z, nets: [ D0, D1 ], reason: prototype, approved-by: lead, until: 2026-12-01 } ]",
        ];
        Assert.Equal(Verdict.Pass, Run(board).Verdict);
        var later = BoardCheck.Run(folder.ReadWhole(), new CheckOptions(lines, Today.AddDays(1)));
        Assert.Equal((Verdict.Fail, 3), (later.Verdict, later.Counts.FailedMust));
    }

    [Fact]
    public void Package_delays_and_series_parts_belong_to_the_path()
    {
        // 2 mm, a resistor, 40 mm, and 33 ps in the package: 12 + 240 + 33 = 285 ps.
        folder.Write("nets.lengths.csv", "net,from,to,layer,length[mm],width[mm]\nCK_S,U1.1,R1.1,L1,2,0.18\nCK,R1.2,U2.1,L1,40,0.18\n")
            .Write("parts.yaml", """
                models:
                  out: { driver: { low: 0 V, high: 1.2 V, resistance: 20 ohm, rise: 150 ps } }
                  in: { receiver: { capacitance: 1.5 pF } }
                parts:
                  U1: { pins: { 1: { model: out, package-delay: 33 ps } } }
                  U2: { pins: { 1: { model: in } } }
                  R1: { joins: [ 1, 2 ], resistance: 30 ohm }
                """);
        var finding = Only("rules: [ { id: T, kind: flight-time, nets: \"CK*\", max: 280 ps, delay: time-of-flight } ]");
        Assert.Equal(285, finding.Value!.Value, 6);
        Assert.Equal("CK", finding.Fix!.Net);
        Assert.Equal(5 / 6.0, finding.Fix.Value * 1e3, 9);
    }

    [Fact]
    public void A_net_without_any_model_is_measured_between_its_two_pins()
    {
        folder.Write("board.yaml", "name: x\nstackup: four.stackup.yaml\nlengths: nets.lengths.csv\nrules: [ { id: T, kind: flight-time, nets: D0, max: 1 ns } ]\n");
        var finding = Assert.Single(BoardCheck.Run(folder.ReadWhole(), new CheckOptions(lines, Today)).Findings);
        Assert.Equal((FindingStatus.Pass, 240.0), (finding.Status, Math.Round(finding.Value!.Value, 6)));
        Assert.StartsWith("time of flight", finding.Method, StringComparison.Ordinal);
    }

    [Fact]
    public void With_two_drivers_a_rule_must_say_which_or_both()
    {
        folder.Write("nets.lengths.csv", "net,from,to,layer,length[mm],width[mm]\nD0,U1.1,U2.1,L1,40,0.18\n")
            .Write("parts.yaml", """
                models:
                  io: { driver: { low: 0 V, high: 1.2 V, resistance: 20 ohm, rise: 150 ps }, receiver: { capacitance: 1.5 pF } }
                parts:
                  U1: { pins: { 1: { model: io } } }
                  U2: { pins: { 1: { model: io } } }
                """);
        folder.WriteBoard("rules: [ { id: T, kind: stub, nets: D0, max: 5 ps } ]");
        Assert.Null(folder.Read());
        Assert.Contains(folder.Errors(), e => e.Contains("several pins can drive 'D0' (U1.1, U2.1)", StringComparison.Ordinal));
        Assert.Equal("D0", Only("rules: [ { id: T, kind: stub, nets: D0, drive: U2, max: 5 ps } ]").Subject);
        Assert.Equal(
            ["D0 from U1.1", "D0 from U2.1"], Run("rules: [ { id: T, kind: stub, nets: D0, drive: both, max: 5 ps } ]").Findings.Select(f => f.Subject));
        Assert.Contains("'U7' has no pin that can drive 'D0'", Only("rules: [ { id: T, kind: stub, nets: D0, drive: U7, max: 5 ps } ]").UncheckedReason, StringComparison.Ordinal);
    }

    [Fact]
    public void On_a_chain_the_way_to_the_end_resistor_is_no_stub_and_a_branch_off_it_is()
    {
        // U1 - 20 mm - *1 - 20 mm - U3 - 5 mm - R9 (ends the chain); *1 - 3 mm - U2 is a stub of 18 ps.
        folder.Write("nets.lengths.csv", """
            net,from,to,layer,length[mm],width[mm]
            A0,U1.1,*1,L1,20,0.18
            A0,*1,U2.1,L1,3,0.18
            A0,*1,U3.1,L1,20,0.18
            A0,U3.1,R9.1,L1,5,0.18
            """)
            .Write("parts.yaml", """
                models:
                  out: { driver: { low: 0 V, high: 1.2 V, resistance: 40 ohm, rise: 150 ps } }
                  in: { receiver: { capacitance: 1.5 pF } }
                parts:
                  U1: { pins: { 1: { model: out } } }
                  U2: { pins: { 1: { model: in } } }
                  U3: { pins: { 1: { model: in } } }
                  R9: { pins: { 1: { termination: { resistance: 50 ohm, to: 0.6 V } } } }
                """);
        var finding = Only("rules: [ { id: S, kind: stub, nets: A0, max: 10 % } ]");
        Assert.Equal(12, finding.Value!.Value, 6);
        Assert.Contains("branches off at *1 to U2.1", finding.Explanation, StringComparison.Ordinal);
        Assert.Equal(0.5, finding.Fix!.Value * 1e3, 6);
    }
}
