using StackTiming.Lines.Coupled;
using Xunit;

namespace StackTiming.Lines.Tests.Coupled;

public sealed class Cohn1960Tests
{
    [Fact]
    public void Very_wide_strips_are_plate_capacitors()
    {
        // Odd: 1/2 V across half the distance inside and across the distance to the plane outside; even: outside only.
        const double width = 60, gap = 0.2, spacing = 1;
        var (odd, even) = Cohn1960.Thin(width, gap, spacing, 1);

        Assert.Equal(1, odd / (376.730313668 / (width * (1 / (0.5 * gap) + 1 / (0.5 * (spacing - gap))))), 0.01);
        Assert.Equal(1, even / (376.730313668 / (width / (0.5 * (spacing - gap)))), 0.02);
    }

    [Fact]
    public void Narrow_strips_are_left_to_a_better_method()
    {
        var section = ReferenceSections.Named("i_broadside_stripline_t0_3").Section;

        Assert.False(new Cohn1960().Suits(section));
        Assert.NotEmpty(new Cohn1960().Calculate(section).Warnings);
    }
}
