using StackTiming.Waves.Characteristics;
using StackTiming.Waves.Networks;
using StackTiming.Waves.Responses;
using Xunit;

namespace StackTiming.Waves.Tests.Characteristics;

/// <summary>
/// Ramps into capacitances and inductances on matched lines, against the exact response of a first-order circuit: a step answers with
/// 1 − e^(−t/τ), so a ramp of length r with (f(t) − f(t − r))/r, f(t) = t − τ·(1 − e^(−t/τ)) for t &gt; 0.
/// </summary>
public sealed class ReactiveEndTests
{
    private const double Rise = 100e-12;
    private const double Limit = 1e-3;

    [Theory]
    [InlineData(0.8e-9)]
    [InlineData(0.80037e-9)] // not a multiple of any step
    public void Capacitance_at_the_end_of_a_matched_line_charges_with_Z0_C(double delay)
    {
        const double z0 = 50, farads = 3e-12;
        var response = Solve(new NetworkBuilder().Line("a", "b", z0, delay).Receiver("b", farads), z0);
        for (var t = 0.0; t < 3e-9; t += 7e-12)
            Assert.Equal(Ramp(t - delay, z0 * farads), At(response, t), Limit);
    }

    [Fact]
    public void Capacitance_in_mid_line_delays_with_half_of_Z0_C()
    {
        const double z0 = 50, farads = 4e-12, half = 0.45e-9;
        var builder = new NetworkBuilder().Line("a", "m", z0, half).Line("m", "b", z0, half).ShuntElement("m", farads).Receiver("b", resistanceOhms: z0);
        var response = Solve(builder, z0);
        for (var t = 0.0; t < 4e-9; t += 7e-12)
            Assert.Equal(0.5 * Ramp(t - (2 * half), z0 * farads / 2), At(response, t), Limit);
    }

    [Fact]
    public void Inductance_in_mid_line_delays_with_L_over_twice_Z0()
    {
        const double z0 = 50, henries = 8e-9, half = 0.45e-9;
        var builder = new NetworkBuilder().Line("a", "m", z0, half).SeriesElement("m", "n", 0, henries).Line("n", "b", z0, half)
            .Receiver("b", resistanceOhms: z0);
        var response = Solve(builder, z0);
        for (var t = 0.0; t < 4e-9; t += 7e-12)
            Assert.Equal(0.5 * Ramp(t - (2 * half), henries / (2 * z0)), At(response, t), Limit);
    }

    [Fact]
    public void Series_capacitance_passes_the_edge_and_droops()
    {
        const double z0 = 50, farads = 20e-12, delay = 0.5e-9;
        var builder = new NetworkBuilder().Line("a", "m", z0, delay).SeriesElement("m", "b", 0, 0, farads).Receiver("b", resistanceOhms: z0);
        var response = Solve(builder, z0);
        // The wave sees z0 twice in series with the capacitance: what is missing to 1/2 V is half of the capacitor's charge.
        for (var t = 0.0; t < 4e-9; t += 7e-12)
            Assert.Equal(0.5 * (Step(t - delay) - Ramp(t - delay, 2 * z0 * farads)), At(response, t), Limit);
        Assert.Equal(0, response.Receivers[0].FinalVolts, 1e-6);
    }

    [Fact]
    public void Inductance_to_ground_shorts_in_the_end()
    {
        const double z0 = 50, henries = 20e-9, delay = 0.5e-9;
        var builder = new NetworkBuilder().Line("a", "b", z0, delay).ShuntElement("b", inductanceHenries: henries).Receiver("b");
        var response = Solve(builder, z0);
        for (var t = 0.0; t < 4e-9; t += 7e-12)
            Assert.Equal(Step(t - delay) - Ramp(t - delay, henries / z0), At(response, t), Limit);
    }

    private static double Ramp(double t, double tau)
    {
        double Area(double x) => x <= 0 ? 0 : x - (tau * (1 - Math.Exp(-x / tau)));
        return (Area(t) - Area(t - Rise)) / Rise;
    }

    private static double Step(double t) => Math.Clamp(t / Rise, 0, 1);

    private static Response Solve(NetworkBuilder builder, double ohms) =>
        TransientSolver.Solve(builder.Build(new Driver(builder.Node("a"), 0, 1, ohms, null), Stimulus.Rising(Rise), 5e-9));

    private static double At(Response response, double seconds) => response.Receivers[0].At(seconds, response.StepSeconds);
}
