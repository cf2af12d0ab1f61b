using StackTiming.Waves.Vias;
using Xunit;

namespace StackTiming.Waves.Tests.Vias;

public class JohnsonGraham1993Tests
{
    private const double Mil = 2.54e-5;

    // The example that handbooks and application notes give with these formulas: 50 mil board of Dk 4.4, 10 mil hole, 20 mil pad,
    // 32 mil clearance: 0.517 pF and 1.015 nH (from memory).
    [Fact]
    public void Handbook_example_of_a_50_mil_board()
    {
        Assert.Equal(0.517e-12, JohnsonGraham1993.CapacitanceFarad(50 * Mil, 20 * Mil, 32 * Mil, 4.4), 0.0005e-12);
        Assert.Equal(1.015e-9, JohnsonGraham1993.InductanceHenry(50 * Mil, 10 * Mil), 0.0005e-9);
    }

    // Johnson and Graham 1993, section 7.3: 63 mil board, 16 mil hole: 1.2 nH (from memory).
    [Fact]
    public void Handbook_example_of_a_63_mil_board()
    {
        Assert.Equal(1.2e-9, JohnsonGraham1993.InductanceHenry(63 * Mil, 16 * Mil), 0.05e-9);
    }

    [Fact]
    public void A_barrel_without_length_has_neither()
    {
        Assert.Equal(0, JohnsonGraham1993.InductanceHenry(0, 1e-4));
        Assert.Equal(0, JohnsonGraham1993.CapacitanceFarad(0, 1e-4, 2e-4, 4));
    }
}
