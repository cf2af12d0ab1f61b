using StackTiming.Waves.Vias;
using Xunit;

namespace StackTiming.Waves.Tests.Vias;

public class CoaxialBarrelTests
{
    // Independent values: tests/references/sections/exact/d_coax_1.json to d_coax_3.json (radii in mm, 30-digit evaluation).
    [Theory]
    [InlineData(0.5, 1.675, 2.1, 9.663530836583813e-11, 2.4179206916739503e-07, 50.02108498705878)]
    [InlineData(0.255, 0.84, 2.0, 9.333229306376213e-11, 2.3842766933578664e-07, 50.54315627150218)]
    [InlineData(1.0, 2.302585, 1.0, 6.670304708562848e-11, 1.6680648097223083e-07, 50.00732496822026)]
    public void Constants_per_metre_match_the_exact_coaxial_line(double inner, double outer, double dk, double c, double l, double z0)
    {
        // ε0 and μ0 of the reference and of the project differ by 6e-10.
        Assert.Equal(1, CoaxialBarrel.CapacitancePerMetre(2e-3 * inner, 2e-3 * outer, dk) / c, 1e-8);
        Assert.Equal(1, CoaxialBarrel.InductancePerMetre(2e-3 * inner, 2e-3 * outer) / l, 1e-8);
        Assert.Equal(1, CoaxialBarrel.Z0Ohms(2e-3 * inner, 2e-3 * outer, dk) / z0, 1e-8);
    }
}
