using StackTiming.Lines.Stripline;
using Xunit;

namespace StackTiming.Lines.Tests.Stripline;

public sealed class Cohn1954Tests
{
    [Fact]
    public void Thin_strips_are_exact()
    {
        foreach (var row in ReferenceSections.AnalyticRows("stripline_thin"))
            Assert.Equal(row["z0_sqrt_er"], Cohn1954.Z0Ohms(row["w_over_b"], 1, 1), row["z0_sqrt_er"] * 1e-8);
    }

    [Theory]
    [InlineData(150)]
    [InlineData(500)]
    public void Very_wide_strips_are_plates_with_a_constant_fringe(double widthOverSpacing)
    {
        var plates = 376.730313668 / (4 * (widthOverSpacing + 2 * Math.Log(2) / Math.PI));

        Assert.Equal(1, Cohn1954.Z0Ohms(widthOverSpacing, 1, 1) / plates, 1e-9);
    }
}
