using CsCheck;
using StackTiming.Waves.Vias;
using Xunit;

namespace StackTiming.Waves.Tests.Vias;

public class ViaModelTests
{
    private static ViaModel Model(double stub, double pads = 0) => new(new ViaGeometry(1e-3, 0, stub, 0.2e-3, 0.4e-3, 0.65e-3, pads, 4, 4), []);

    [Fact]
    public void A_barrel_of_the_traces_impedance_delays_by_its_time_of_flight()
    {
        var model = Model(0);
        // 1 mm at Dk 4: 2·1e-3/c = 6.671 ps.
        Assert.Equal(6.6713e-12, model.BarrelDelaySeconds, 1e-16);
        Assert.Equal(model.BarrelDelaySeconds, model.DelaySeconds(model.Z0Ohms), 1e-17);
    }

    [Fact]
    public void The_delay_between_traces_is_that_of_a_lumped_section_at_low_frequency()
    {
        // Phase of the insertion loss 2/(A + B/Z0 + C·Z0 + D) of the π section C/2, L, C/2, evaluated at 1 MHz.
        Gen.Select(Gen.Double[20, 120], Gen.Double[0, 2e-3]).Sample((z0, stub) =>
        {
            var model = Model(stub, 80e-6);
            var omega = 2 * Math.PI * 1e6;
            var (l, c) = (model.InductanceHenry, model.CapacitanceFarad);
            var a = 1 - 0.5 * omega * omega * l * c;
            var imaginary = omega * l / z0 + omega * c * (1 - 0.25 * omega * omega * l * c) * z0;
            var delay = Math.Atan2(imaginary, 2 * a) / omega;
            Assert.Equal(1, model.DelaySeconds(z0) / delay, 1e-6);
        });
    }

    [Fact]
    public void Stubs_and_pads_only_add_delay()
    {
        Gen.Select(Gen.Double[20, 120], Gen.Double[1e-5, 2e-3], Gen.Double[1e-6, 1e-4]).Sample((z0, stub, pads) =>
        {
            Assert.True(Model(stub).DelaySeconds(z0) > Model(0).DelaySeconds(z0));
            Assert.True(Model(stub, pads).DelaySeconds(z0) > Model(stub).DelaySeconds(z0));
            Assert.True(Model(0).DelaySeconds(z0) >= Model(0).BarrelDelaySeconds);
        });
    }

    [Fact]
    public void The_handbook_lies_above_the_coaxial_barrel()
    {
        var model = Model(0.5e-3, 80e-6);
        Assert.InRange(model.HandbookCapacitanceFarad / model.CapacitanceFarad, 1, 3);
        Assert.InRange(model.HandbookInductanceHenry / model.InductanceHenry, 1, 5);
    }

    [Fact]
    public void The_longer_stub_sets_the_first_notch()
    {
        // 1.5 mm at Dk 4: quarter wave at c/(4·1.5 mm·2) = 25 GHz; delay 10 ps.
        Assert.Equal(1.0007e-11, Model(1.5e-3).LongerStubDelaySeconds, 1e-15);
    }
}
