using CsCheck;
using StackTiming.Waves.Characteristics;
using StackTiming.Waves.Metrics;
using StackTiming.Waves.Networks;
using StackTiming.Waves.Responses;
using StackTiming.Waves.Tests.References;
using Xunit;

namespace StackTiming.Waves.Tests.Characteristics;

/// <summary>What must hold for every passive net.</summary>
public sealed class NetPropertyTests
{
    private const double Ohms = 30;

    /// <summary>A chain with a branch at every node: impedances, delays and loads of each of its pieces.</summary>
    private static readonly Gen<(double Z0, double Picoseconds, double StubPicoseconds, double Picofarads)[]> Chains =
        Gen.Select(Gen.Double[25, 90], Gen.Double[3, 700], Gen.Double[1, 300], Gen.Double[0.2, 4]).Array[1, 5];

    [Fact]
    public void A_passive_net_never_returns_more_energy_than_it_took()
    {
        Chains.Sample(pieces =>
        {
            var response = Solve(pieces, terminationOhms: 60, window: 12e-9);
            double taken = 0, delivered = 0, step = response.StepSeconds;
            var load = response.Receivers[^1].Volts;
            for (var n = 0; n < response.Pin.Volts.Length; n++)
            {
                var source = Math.Clamp(n * step / 200e-12, 0, 1);
                taken += step * response.Pin.Volts[n] * (source - response.Pin.Volts[n]) / Ohms;
                delivered += step * load[n] * load[n] / 60;
                Assert.True(delivered <= taken + 1e-15, $"{delivered} J of {taken} J at {n * step} s");
            }
        }, iter: 12);
    }

    [Fact]
    public void A_net_ends_where_its_resistances_put_it()
    {
        Chains.Sample(pieces =>
        {
            var response = Solve(pieces, terminationOhms: 60, window: 100e-9);
            Assert.Equal(60 / (60 + Ohms), response.Receivers[^1].FinalVolts, 1e-6);
            Assert.Equal(60 / (60 + Ohms), response.Receivers[^1].Volts[^1], 5e-3);
        }, iter: 6);
    }

    [Fact]
    public void Nothing_arrives_before_the_sum_of_the_delays()
    {
        Chains.Sample(pieces =>
        {
            var response = Solve(pieces, terminationOhms: 60, window: 6e-9);
            var front = pieces.Sum(p => p.Picoseconds) * 1e-12;
            // Two steps for each piece: interpolation and lumped pieces look so far ahead.
            for (var t = 0.0; t < front - (2 * pieces.Length * response.StepSeconds); t += 11e-12)
                Assert.Equal(0, response.Receivers[^1].At(t, response.StepSeconds), 1e-4);
        }, iter: 12);
    }

    [Fact]
    public void A_falling_edge_mirrors_a_rising_one()
    {
        Chains.Sample(pieces =>
        {
            var up = Solve(pieces, 60, 8e-9);
            var down = Solve(pieces, 60, 8e-9, rising: false);
            var high = up.Receivers[^1].FinalVolts;
            for (var t = 0.0; t < 8e-9; t += 53e-12)
                Assert.Equal(high - up.Receivers[^1].At(t, up.StepSeconds), down.Receivers[^1].At(t, down.StepSeconds), 1e-6);
        }, iter: 6);
    }

    [Fact]
    public void Cutting_a_line_in_two_changes_nothing()
    {
        var whole = new NetworkBuilder().Line("a", "b", 48, 0.9e-9).Receiver("b", 2e-12);
        var cut = new NetworkBuilder().Line("a", "m", 48, 0.3333e-9).Line("m", "b", 48, 0.5667e-9).Receiver("b", 2e-12);
        var one = TransientSolver.Solve(Build(whole, 15e-9, true));
        var two = TransientSolver.Solve(Build(cut, 15e-9, true));
        for (var t = 0.0; t < 15e-9; t += 29e-12)
            Assert.Equal(one.Receivers[0].At(t, one.StepSeconds), two.Receivers[0].At(t, two.StepSeconds), 1e-3);
    }

    [Theory]
    [InlineData("W5_layer_changes")]
    [InlineData("W7_fly_by")]
    [InlineData("W11_package")]
    [InlineData("W12_crosstalk")]
    public void A_four_times_finer_step_moves_nothing_that_is_judged(string name)
    {
        var network = ReferenceNet.Load(name).Network;
        var coarse = NetResponse.Solve(network).Metrics;
        var fine = NetResponse.Solve(network, new TransientOptions(512)).Metrics;
        for (var i = 0; i < coarse.Length; i++)
        {
            Assert.Equal(fine[i].MaxVolts, coarse[i].MaxVolts, 1e-3);
            Assert.Equal(fine[i].MinVolts, coarse[i].MinVolts, 1e-3);
            if (fine[i].FirstVihSeconds is { } first)
                Assert.Equal(first, coarse[i].FirstVihSeconds!.Value, 0.1e-12);
        }
    }

    /// <summary>
    /// Two weakly coupled matched lines: near end (Ze − Zo)/(Ze + Zo)/2 of the incident wave, which is the coupling coefficient K_b; far end minus half the difference
    /// of the mode delays over the ramp (standards notes 6.9).
    /// </summary>
    [Fact]
    public void Weak_coupling_gives_the_near_and_far_end_crosstalk_of_the_coefficients()
    {
        const double even = 52, odd = 48, evenDelay = 1.01e-9, oddDelay = 0.99e-9, ramp = 0.2e-9;
        var z0 = Math.Sqrt(even * odd);
        var builder = new NetworkBuilder();
        builder.Coupled(CoupledLines.SymmetricPair(
            (builder.Node("a"), builder.Node("near")), (builder.Node("b"), builder.Node("far")), even, odd, evenDelay, oddDelay));
        builder.ShuntElement("b", resistanceOhms: z0).Receiver("near", resistanceOhms: z0).Receiver("far", resistanceOhms: z0);
        var network = builder.Build(new Driver(builder.Node("a"), 0, 2, z0, null), Stimulus.Rising(ramp), 5e-9);
        var metrics = NetResponse.Solve(network).Metrics;
        Assert.Equal(0.5 * (even - odd) / (even + odd), metrics[0].MaxVolts, 0.0005);
        Assert.Equal(-0.5 * (evenDelay - oddDelay) / ramp, metrics[1].MinVolts, 0.0015);
    }

    private static Response Solve(
        (double Z0, double Picoseconds, double StubPicoseconds, double Picofarads)[] pieces, double terminationOhms, double window, bool rising = true)
    {
        var builder = new NetworkBuilder();
        builder.Node("a");
        var last = "a";
        for (var i = 0; i < pieces.Length; i++)
        {
            builder.Line(last, $"n{i}", pieces[i].Z0, pieces[i].Picoseconds * 1e-12);
            builder.Line($"n{i}", $"s{i}", 50, pieces[i].StubPicoseconds * 1e-12).Receiver($"s{i}", pieces[i].Picofarads * 1e-12);
            last = $"n{i}";
        }
        builder.Receiver(last, resistanceOhms: terminationOhms);
        return TransientSolver.Solve(Build(builder, window, rising));
    }

    private static Network Build(NetworkBuilder builder, double window, bool rising) => builder.Build(
        new Driver(builder.Node("a"), 0, 1, Ohms, null), rising ? Stimulus.Rising(200e-12) : Stimulus.Falling(200e-12), window);
}
