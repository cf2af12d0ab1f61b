using CsCheck;
using StackTiming.Waves.Characteristics;
using StackTiming.Waves.Networks;
using StackTiming.Waves.Responses;
using Xunit;

namespace StackTiming.Waves.Tests.Characteristics;

/// <summary>A short ramp into a single line, against the sums of the bounce diagram.</summary>
public sealed class BounceDiagramTests
{
    private const double Delay = 5e-9;

    /// <summary>60 V behind 100 Ω into 50 Ω and 25 Ω: +20, −6.67, −2.22, +0.74, +0.25, −0.08 V at mid-line (textbook problem, standards notes 6.9).</summary>
    [Fact]
    public void Mid_line_voltage_climbs_by_the_increments_of_the_textbook()
    {
        var builder = new NetworkBuilder().Line("a", "mid", 50, Delay / 2).Line("mid", "b", 50, Delay / 2)
            .ShuntElement("b", resistanceOhms: 25).Receiver("mid");
        var response = Solve(builder, volts: 60, ohms: 100, window: 40e-9);
        var expected = new[] { 20.0, 40.0 / 3, 100.0 / 9, 320.0 / 27, 980.0 / 81, 2920.0 / 243 };
        // The waves reach mid-line at T/2, 3T/2, 5T/2 …: read half-way between.
        for (var i = 0; i < expected.Length; i++)
            Assert.Equal(expected[i], At(response, (i + 1) * Delay), 1e-9);
        Assert.Equal(12, response.Receivers[0].FinalVolts, 1e-6);
    }

    /// <summary>Load and source voltages of an open line, exact sums (standards notes 6.9).</summary>
    [Theory]
    [InlineData(2, 75, new[] { 1.6, 1.92, 1.984, 1.9968 }, new[] { 0.8, 1.76, 1.952 })]
    [InlineData(1, 25, new[] { 4.0 / 3, 8.0 / 9, 28.0 / 27, 80.0 / 81 }, new[] { 2.0 / 3, 10.0 / 9, 26.0 / 27 })]
    public void Open_line_follows_the_bounce_diagram(double volts, double ohms, double[] load, double[] source)
    {
        var response = Solve(new NetworkBuilder().Line("a", "b", 50, Delay).Receiver("b"), volts, ohms, 80e-9);
        for (var i = 0; i < load.Length; i++)
            Assert.Equal(load[i], At(response, ((2 * i) + 2) * Delay), 1e-9);
        for (var i = 0; i < source.Length; i++)
            Assert.Equal(source[i], response.Pin.At(((2 * i) + 1) * Delay, response.StepSeconds), 1e-9);
        Assert.Equal(volts, response.Receivers[0].FinalVolts, 1e-6);
    }

    [Fact]
    public void Driver_sees_only_the_impedance_of_the_line_until_the_first_reflection()
    {
        Gen.Select(Gen.Double[5, 200], Gen.Double[20, 120], Gen.Double[0.3, 3]).Sample((ohms, z0, nanoseconds) =>
        {
            var delay = nanoseconds * 1e-9;
            var response = Solve(new NetworkBuilder().Line("a", "b", z0, delay).Receiver("b", 2e-12), 1, ohms, 4 * delay);
            Assert.Equal(z0 / (z0 + ohms), response.Pin.At(1.9 * delay, response.StepSeconds), 1e-9);
        }, iter: 50);
    }

    [Fact]
    public void Two_equal_lines_between_the_same_nodes_act_as_one_of_half_the_impedance()
    {
        var loop = Solve(
            new NetworkBuilder().Line("a", "b", 100, 0.77e-9).Line("a", "b", 100, 0.77e-9).Receiver("b", 3e-12), 1, 20, 20e-9);
        var single = Solve(new NetworkBuilder().Line("a", "b", 50, 0.77e-9).Receiver("b", 3e-12), 1, 20, 20e-9);
        for (var t = 0.0; t < 20e-9; t += 37e-12)
            Assert.Equal(At(single, t), At(loop, t), 1e-6);
    }

    /// <summary>Light crosses one metre of air in 3.336 ns (the defined speed of light), and nothing is there before.</summary>
    [Fact]
    public void Nothing_arrives_before_light_would()
    {
        const double metreOfAir = 1 / 299_792_458.0;
        var response = Solve(new NetworkBuilder().Line("a", "b", 377, metreOfAir).Receiver("b", resistanceOhms: 377), 1, 377, 10e-9);
        Assert.Equal(3.336e-9, metreOfAir, 1e-12);
        for (var t = 0.0; t < metreOfAir - (2 * response.StepSeconds); t += 1e-12)
            Assert.Equal(0, At(response, t), 1e-12);
        Assert.True(At(response, metreOfAir + (2 * response.StepSeconds)) > 1e-3);
    }

    private static Response Solve(NetworkBuilder builder, double volts, double ohms, double window) =>
        TransientSolver.Solve(builder.Build(new Driver(builder.Node("a"), 0, volts, ohms, null), Stimulus.Rising(50e-12), window));

    private static double At(Response response, double seconds) => response.Receivers[0].At(seconds, response.StepSeconds);
}
