using CsCheck;
using StackTiming.Waves.Vias;
using Xunit;

namespace StackTiming.Waves.Tests.Vias;

public class GoldfarbPucel1991Tests
{
    /// <summary>
    /// Partial inductance of a thin tube against its axis, from Neumann's double integral by quadrature: the exact field quantity that the
    /// formula starts from; the plane then takes away half of the end correction.
    /// </summary>
    private static double NeumannInductance(double height, double radius)
    {
        const int n = 2000;
        var sum = 0.0;
        for (var i = 0; i < n; i++)
        {
            var z = (i + 0.5) * height / n;
            // The inner integral along the axis is elementary.
            sum += Math.Asinh((height - z) / radius) + Math.Asinh(z / radius);
        }
        return 1e-7 * sum * height / n;
    }

    [Fact]
    public void Lies_below_the_partial_inductance_by_half_of_its_end_correction()
    {
        Gen.Select(Gen.Double[1e-4, 6e-4], Gen.Double[0.1, 2.6]).Sample((height, ratio) =>
        {
            var radius = ratio * height;
            var slant = Math.Sqrt(height * height + radius * radius);
            Assert.Equal(NeumannInductance(height, radius) - 1e-7 * (slant - radius), GoldfarbPucel1991.InductanceHenry(height, radius), 1e-5 * height * 1e-6);
        });
    }

    [Fact]
    public void Grows_with_height_and_falls_with_radius()
    {
        Gen.Select(Gen.Double[1e-4, 6e-4], Gen.Double[0.1, 2.0]).Sample((height, ratio) =>
        {
            var l = GoldfarbPucel1991.InductanceHenry(height, ratio * height);
            Assert.True(l > 0);
            Assert.True(GoldfarbPucel1991.InductanceHenry(1.1 * height, ratio * height) > l);
            Assert.True(GoldfarbPucel1991.InductanceHenry(height, 1.1 * ratio * height) < l);
        });
    }
}
