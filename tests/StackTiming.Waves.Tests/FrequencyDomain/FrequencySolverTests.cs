using StackTiming.Waves.Characteristics;
using StackTiming.Waves.FrequencyDomain;
using StackTiming.Waves.Networks;
using StackTiming.Waves.Tests.References;
using Xunit;

namespace StackTiming.Waves.Tests.FrequencyDomain;

public sealed class FrequencySolverTests
{
    public static TheoryData<string> Lossless() => [.. ReferenceNet.Names.Where(n => ReferenceNet.Load(n).Network.LossyLines.IsEmpty)];

    [Theory]
    [MemberData(nameof(Lossless))]
    public void Time_and_frequency_domain_agree_on_lossless_nets(string name)
    {
        var reference = ReferenceNet.Load(name);
        var inTime = TransientSolver.Solve(reference.Network);
        var inFrequency = FrequencySolver.Solve(reference.Network);
        for (var i = 0; i < reference.Network.Receivers.Length; i++)
        {
            foreach (var t in reference.Times)
                Assert.Equal(inTime.Receivers[i].At(t, inTime.StepSeconds), inFrequency.Receivers[i].At(t, inFrequency.StepSeconds), 0.004 * reference.Swing);
        }
    }

    /// <summary>
    /// R. L. Wigington and N. S. Nahman, "Transient analysis of coaxial cables considering skin effect", Proc. IRE 45, 1957, pp. 166–174: a matched line whose
    /// only loss is the skin effect has H(s) = e^(−sτ)·e^(−a√s) with a = r_skin·l/(2·Z0·√π), and answers a step with erfc(a/(2√(t−τ))).
    /// </summary>
    [Fact]
    public void Skin_effect_answers_a_step_with_the_erfc_of_Wigington_and_Nahman_1957()
    {
        const double l = 250e-9, c = 100e-12, length = 0.5, skin = 2e-4, rise = 2e-12;
        var z0 = Math.Sqrt(l / c);
        var builder = new NetworkBuilder().LossyLine("a", "b", length, new LossyLineConstants(l, c, 0, skin, 0, 1e9)).Receiver("b", resistanceOhms: z0);
        var network = builder.Build(new Driver(builder.Node("a"), 0, 2, z0, null), Stimulus.Rising(rise), 4e-9);
        var response = FrequencySolver.Solve(network);
        var delay = length * Math.Sqrt(l * c);
        var a = skin * length / (2 * z0 * Math.Sqrt(Math.PI));
        foreach (var after in new[] { 20e-12, 50e-12, 0.1e-9, 0.3e-9, 1e-9 })
        {
            // The middle of the ramp is the instant of the step. The characteristic impedance departs from z0 by the loss itself, which is small here.
            var expected = MathNet.Numerics.SpecialFunctions.Erfc(a / (2 * Math.Sqrt(after)));
            Assert.Equal(expected, response.Receivers[0].At(delay + (0.5 * rise) + after, response.StepSeconds), 0.004);
        }
    }

    /// <summary>
    /// A line of resistance and capacitance without inductance diffuses: far from its end a step held at its start gives erfc(x/2·√(rc/t)) (the heat
    /// equation; H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 1959, section 2.5). The far end is matched by more of the same line.
    /// </summary>
    [Fact]
    public void A_resistive_line_diffuses_like_heat()
    {
        const double r = 5e4, c = 100e-12, x = 0.02, rise = 1e-12;
        var constants = new LossyLineConstants(1e-12, c, r, 0, 0, 1e9);
        var builder = new NetworkBuilder().LossyLine("a", "b", x, constants).LossyLine("b", "end", 20 * x, constants)
            .Receiver("b").ShuntElement("end", resistanceOhms: 1e6);
        var network = builder.Build(new Driver(builder.Node("a"), 0, 1, 1e-3, null), Stimulus.Rising(rise), 8e-9);
        var response = FrequencySolver.Solve(network);
        foreach (var t in new[] { 0.5e-9, 1e-9, 2e-9, 5e-9 })
            Assert.Equal(MathNet.Numerics.SpecialFunctions.Erfc(0.5 * x * Math.Sqrt(r * c / t)), response.Receivers[0].At(t, response.StepSeconds), 0.002);
    }

    [Fact]
    public void Nothing_arrives_before_the_fastest_wave()
    {
        var reference = ReferenceNet.Load("W9_lossy_matched");
        var line = reference.Network.LossyLines[0];
        // ε falls to ε∞ at the highest frequencies: the front travels with it. A loss tangent of 0.02 over nine decades lowers ε by about 0.1.
        var earliest = line.LengthMetres * Math.Sqrt(line.Constants.InductanceHenryPerMetre * line.Constants.CapacitanceFaradPerMetre * 0.85);
        var response = FrequencySolver.Solve(reference.Network);
        for (var t = 0.0; t < earliest; t += 5e-12)
            Assert.Equal(0, response.Receivers[0].At(t, response.StepSeconds), 1e-4);
    }
}
