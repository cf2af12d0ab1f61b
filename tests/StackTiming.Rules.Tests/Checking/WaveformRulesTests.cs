using StackTiming.Rules.Checking;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;
using StackTiming.Rules.Tests.Boards;
using Xunit;

namespace StackTiming.Rules.Tests.Checking;

/// <summary>
/// Rules over waveforms on a line of 50 ohm and 240 ps from a driver of 0 to 1.2 V to an open end: the bounce diagram gives every figure. The
/// first wave is 1.2 V · 50/(50 + Rs) and doubles at the open end; what comes back is reflected at the source by (Rs − 50)/(Rs + 50).
/// </summary>
public sealed class WaveformRulesTests : IDisposable
{
    // 0.1 % of the swing, to which waveforms are computed.
    private const double Millivolts = 1.2;

    private readonly BoardFolder folder = new();

    public void Dispose() => folder.Dispose();

    private CheckResult Run(double sourceOhms, string rules, string fall = "150 ps")
    {
        folder.Write("nets.lengths.csv", "net,from,to,layer,length[mm],width[mm]\nA,U1.1,U2.1,L1,40,0.18\n")
            .Write("parts.yaml", FormattableString.Invariant($$"""
                models:
                  out: { driver: { low: 0 V, high: 1.2 V, resistance: {{sourceOhms}} ohm, rise: 150 ps, fall: {{fall}} } }
                  in: { receiver: { capacitance: 0 pF, vil: 0.45 V, vih: 0.75 V, threshold: 0.6 V } }
                parts:
                  U1: { pins: { 1: { model: out } } }
                  U2: { pins: { 1: { model: in } } }
                """))
            .WriteBoard($"rules: [ {rules} ]");
        return BoardCheck.Run(folder.ReadWhole(), new CheckOptions(new RoundLines(), new DateOnly(2026, 12, 1)));
    }

    private Finding Only(double sourceOhms, string rule) => Assert.Single(Run(sourceOhms, rule).Findings);

    [Fact]
    public void A_matched_driver_has_the_flight_time_of_the_line()
    {
        var finding = Only(50, "{ id: T, kind: flight-time, nets: A, max: 300 ps }");
        Assert.Equal(240, finding.Value!.Value, 0.1);
        Assert.StartsWith("flight time", finding.Method, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(25, 400)]
    [InlineData(50, 0)]
    [InlineData(100, 0)]
    public void Overshoot_is_what_the_doubled_first_wave_has_too_much(double sourceOhms, double millivolts) =>
        Assert.Equal(millivolts, Only(sourceOhms, "{ id: O, kind: overshoot, nets: A, max: 100 mV }").Value!.Value, Millivolts);

    [Fact]
    public void Ringback_is_the_first_wave_less_its_reflection_at_the_source()
    {
        // 1.6 V at first, then 1.6 V · (1 − 1/3) = 1.0667 V, which is 316.7 mV above vih.
        Assert.Equal(1600 * 2 / 3.0 - 750, Only(25, "{ id: R, kind: ringback, nets: A, margin: 50 mV }").Value!.Value, Millivolts);
    }

    [Theory]
    [InlineData(100, 50)]
    [InlineData(130, -83.333)]
    public void The_first_wave_is_twice_the_share_of_the_line(double sourceOhms, double millivolts) =>
        Assert.Equal(millivolts, Only(sourceOhms, "{ id: F, kind: first-wave, nets: A }").Value!.Value, Millivolts);

    [Fact]
    public void The_fix_of_a_weak_first_wave_is_the_source_that_just_reaches_the_threshold()
    {
        var fix = Only(130, "{ id: F, kind: first-wave, nets: A }").Fix!;
        // 2 · 1.2 V · 50/(50 + Rs) = 0.75 V at Rs = 110 ohm.
        Assert.Equal(110, fix.Value, 0.5);
        Assert.Equal(FindingStatus.Pass, Only(fix.Value - 0.5, "{ id: F, kind: first-wave, nets: A }").Status);
    }

    [Theory]
    [InlineData("{ id: O, kind: overshoot, nets: A, max: 100 mV }")]
    [InlineData("{ id: R, kind: ringback, nets: A, margin: 400 mV }")]
    [InlineData("{ id: S, kind: settling, nets: A, within: 500 ps }")]
    public void The_series_resistor_that_a_fix_proposes_mends_the_net(string rule)
    {
        var failed = Only(20, rule);
        Assert.Equal((FindingStatus.Fail, FixKind.SeriesResistor), (failed.Status, failed.Fix!.Kind));
        Assert.Equal(FindingStatus.Pass, Only(20 + failed.Fix.Value, rule).Status);
    }

    [Fact]
    public void Settling_ends_when_the_last_reflection_of_more_than_5_percent_has_arrived()
    {
        // Rs = 25 ohm: the end is off by 1/3, −1/9, 1/27, … of the swing, so that the third wave, 5 · 240 ps after the start, brings it within 5 %.
        var finding = Only(25, "{ id: S, kind: settling, nets: A, within: 2 ns }");
        Assert.InRange(finding.Value!.Value, 1200, 1350);
    }

    [Fact]
    public void The_falling_edge_of_a_linear_driver_mirrors_the_rising_one()
    {
        // Ramps that differ by nothing to speak of are solved apart; equal ones together.
        const string rules = "{ id: F, kind: ringback, nets: A, margin: 50 mV, edge: fall }, { id: R, kind: ringback, nets: A, margin: 50 mV, edge: rise }";
        var together = Run(25, rules).Findings.OrderBy(f => f.Rule).Select(f => f.Value!.Value).ToArray();
        var apart = Run(25, rules, fall: "150.000001 ps").Findings.OrderBy(f => f.Rule).Select(f => f.Value!.Value).ToArray();
        Assert.Equal(apart[0], together[0], 1e-3);
        Assert.Equal(apart[1], together[1], 1e-3);
    }

    [Fact]
    public void A_look_at_the_beginning_gives_the_same_flight_time_as_the_whole_waveform()
    {
        const string time = "{ id: T, kind: flight-time, nets: A, max: 300 ps }";
        var alone = Only(30, time).Value;
        var beside = Run(30, time + ", { id: R, kind: ringback, nets: A, margin: 50 mV }").Findings.Single(f => f.Rule == "T").Value;
        Assert.Equal(alone, beside);
    }

    [Fact]
    public void Waveforms_of_failing_nets_are_kept_with_their_marks()
    {
        var result = Run(20, "{ id: O, kind: overshoot, nets: A, max: 100 mV }, { id: R, kind: ringback, nets: A, margin: 400 mV }");
        var wave = Assert.Single(result.Waves);
        Assert.Equal(["O", "R"], wave.Rules.Order());
        Assert.Equal(("A", "U1.1", "U2.1", "rise"), (wave.Net, wave.Driver, wave.Receiver, wave.Edge));
        Assert.Equal(wave.TimeSeconds.Length, wave.Volts.Length);
        Assert.Contains(wave.Marks, m => m.Name == "first crossing of vih" && Math.Abs(m.Volts - 0.75) < 1e-9);
        Assert.Empty(Run(50, "{ id: O, kind: overshoot, nets: A, max: 300 mV }").Waves);
    }

    [Fact]
    public void Behind_a_series_capacitor_levels_are_not_judged()
    {
        folder.Write("nets.lengths.csv", "net,from,to,layer,length[mm],width[mm]\nA,U1.1,C1.1,L1,10,0.18\nB,C1.2,U2.1,L1,30,0.18\n")
            .Write("parts.yaml", """
                models:
                  out: { driver: { low: 0 V, high: 1.2 V, resistance: 50 ohm, rise: 150 ps } }
                  in: { receiver: { capacitance: 0 pF, vil: 0.45 V, vih: 0.75 V, threshold: 0.6 V, termination: { resistance: 50 ohm, to: 0.6 V } } }
                parts:
                  U1: { pins: { 1: { model: out } } }
                  U2: { pins: { 1: { model: in } } }
                  C1: { joins: [ 1, 2 ], capacitance: 100 nF }
                """)
            .WriteBoard("rules: [ { id: R, kind: overshoot, nets: A, max: 100 mV } ]");
        var finding = Assert.Single(BoardCheck.Run(folder.ReadWhole(), new CheckOptions(new RoundLines(), new DateOnly(2026, 12, 1))).Findings);
        Assert.Equal(FindingStatus.Unchecked, finding.Status);
        Assert.Contains("a series capacitor", finding.UncheckedReason, StringComparison.Ordinal);
    }

    [Fact]
    public void A_driver_that_never_reaches_the_threshold_has_no_flight_time()
    {
        folder.Write("nets.lengths.csv", "net,from,to,layer,length[mm],width[mm]\nA,U1.1,U2.1,L1,40,0.18\n")
            .Write("parts.yaml", """
                models:
                  out: { driver: { low: 0 V, high: 0.5 V, resistance: 50 ohm, rise: 150 ps } }
                  in: { receiver: { capacitance: 0 pF, vil: 0.45 V, vih: 0.75 V, threshold: 0.6 V } }
                parts:
                  U1: { pins: { 1: { model: out } } }
                  U2: { pins: { 1: { model: in } } }
                """)
            .WriteBoard("rules: [ { id: T, kind: flight-time, nets: A, max: 1 ns, delay: flight-time }, { id: R, kind: ringback, nets: A, margin: 0 mV } ]");
        var findings = BoardCheck.Run(folder.ReadWhole(), new CheckOptions(new RoundLines(), new DateOnly(2026, 12, 1))).Findings;
        Assert.Equal(FindingStatus.Unchecked, findings.Single(f => f.Rule == "T").Status);
        Assert.Contains("never reaches vih", findings.Single(f => f.Rule == "R").Explanation, StringComparison.Ordinal);
    }
}
