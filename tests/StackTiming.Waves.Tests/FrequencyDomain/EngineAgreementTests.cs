using CsCheck;
using StackTiming.Waves.Characteristics;
using StackTiming.Waves.FrequencyDomain;
using StackTiming.Waves.Networks;
using Xunit;

namespace StackTiming.Waves.Tests.FrequencyDomain;

/// <summary>
/// The two engines share nothing but the description of the net: on arbitrary nets of lines from 1 ps to 1 ns, series and shunt elements, packages and loops they
/// must agree within 0.1 % of the swing everywhere.
/// </summary>
public sealed class EngineAgreementTests
{
    private const double Window = 8e-9;

    private static readonly Gen<(int From, int Kind, double Size, double Z0, double Picofarads)[]> Pieces =
        Gen.Select(Gen.Int[0, 5], Gen.Int[0, 7], Gen.Double[0, 1], Gen.Double[25, 90], Gen.Double[0.1, 4]).Array[1, 6];

    [Fact]
    public void Time_and_frequency_domain_agree_on_arbitrary_nets()
    {
        Gen.Select(Pieces, Gen.Double[10, 80], Gen.Double[60, 600], Gen.Bool, Gen.Bool, Gen.Bool).Sample((pieces, ohms, ramp, package, loop, rise) =>
        {
            var builder = new NetworkBuilder();
            List<string> nodes = ["U1"];
            builder.Node("U1");
            for (var i = 0; i < pieces.Length; i++)
            {
                var (from, kind, size, z0, picofarads) = pieces[i];
                var (a, b) = (nodes[from % nodes.Count], $"n{i}");
                if (kind == 0)
                    builder.SeriesElement(a, b, 1 + (60 * size));
                else if (kind == 1)
                    builder.SeriesElement(a, b, 0, 0.1e-9 * Math.Pow(50, size));
                else
                    builder.Line(a, b, z0, 1e-12 * Math.Pow(1000, size));
                builder.Receiver(b, picofarads * 1e-12, null, kind == 2 ? 60 : null, 0.4);
                nodes.Add(b);
            }
            if (loop && nodes.Count > 3)
                builder.Line(nodes[1], nodes[^1], 60, 0.2137e-9);
            var network = builder.Build(
                new Driver(0, 0, 1, ohms, package ? new DriverPackage(1.3e-9, 0.9e-12) : null),
                rise ? Stimulus.Rising(ramp * 1e-12) : Stimulus.Falling(ramp * 1e-12), Window);
            var inTime = TransientSolver.Solve(network);
            var inFrequency = FrequencySolver.Solve(network);
            for (var i = 0; i < network.Receivers.Length; i++)
            {
                Assert.Equal(inFrequency.Receivers[i].FinalVolts, inTime.Receivers[i].FinalVolts, 1e-6);
                for (var t = 0.0; t < Window; t += 23e-12)
                    Assert.Equal(inFrequency.Receivers[i].At(t, inFrequency.StepSeconds), inTime.Receivers[i].At(t, inTime.StepSeconds), 1e-3);
            }
        }, iter: 25);
    }
}
