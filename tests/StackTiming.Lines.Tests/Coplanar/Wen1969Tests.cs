using StackTiming.Lines.Coplanar;
using Xunit;

namespace StackTiming.Lines.Tests.Coplanar;

public sealed class Wen1969Tests
{
    [Fact]
    public void Lines_in_air_are_exact()
    {
        foreach (var row in ReferenceSections.AnalyticRows("coplanar_thin_air"))
        {
            var ratio = row["a_over_b"];
            Assert.Equal(1, Wen1969.Z0Ohms(ratio, 0.5 * (1 - ratio), 1) / row["z0"], 1e-8);
        }
    }

    [Fact]
    public void Dielectric_fills_half_of_the_space()
    {
        Assert.Equal(Wen1969.Z0Ohms(0.2, 0.1, 1) / Math.Sqrt(2.65), Wen1969.Z0Ohms(0.2, 0.1, 4.3), 9);
    }
}
