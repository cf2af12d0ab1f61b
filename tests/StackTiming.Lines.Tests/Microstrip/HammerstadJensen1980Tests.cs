using StackTiming.Lines.Microstrip;
using Xunit;

namespace StackTiming.Lines.Tests.Microstrip;

public sealed class HammerstadJensen1980Tests
{
    /// <summary>Evaluated independently of this project from the published formulas (design/standards.md 6.3).</summary>
    [Theory]
    [InlineData(1, 0.5, 1, 166.700)]
    [InlineData(1, 1, 1, 126.424)]
    [InlineData(1, 2, 1, 89.029)]
    [InlineData(2.2, 1, 1.7723, 94.963)]
    [InlineData(2.2, 3, 1.8782, 50.917)]
    [InlineData(3.66, 1.9, 2.8257, 54.509)]
    [InlineData(4.2, 0.5, 2.9302, 97.384)]
    [InlineData(4.2, 3, 3.3235, 38.277)]
    [InlineData(4.5, 1, 3.2311, 70.332)]
    [InlineData(9.8, 2, 7.0336, 33.569)]
    public void Thin_strips_have_the_tabulated_values(double dk, double widthOverHeight, double epsEff, double z0)
    {
        var line = HammerstadJensen1980.Line(widthOverHeight, 1, 0, dk);

        Assert.Equal(epsEff, line.EpsEff, 4);
        Assert.Equal(z0, line.Z0Ohms, 3);
    }

    [Fact]
    public void Vanishing_thickness_is_the_thin_strip()
    {
        var thin = HammerstadJensen1980.Line(2, 1, 0, 4.3);
        var nearlyThin = HammerstadJensen1980.Line(2, 1, 1e-9, 4.3);

        Assert.Equal(thin.Z0Ohms, nearlyThin.Z0Ohms, 6);
        Assert.Equal(thin.EpsEff, nearlyThin.EpsEff, 6);
    }

    [Fact]
    public void Thickness_lowers_impedance_and_permittivity()
    {
        var thin = HammerstadJensen1980.Line(1, 1, 0, 4.3);
        var thick = HammerstadJensen1980.Line(1, 1, 0.3, 4.3);

        Assert.True(thick.Z0Ohms < thin.Z0Ohms);
        Assert.True(thick.EpsEff < thin.EpsEff);
    }

    [Fact]
    public void Many_lines_at_once_are_the_lines_one_by_one()
    {
        double[] w = [0.1, 0.2, 0.4], h = [0.1, 0.1, 0.2], t = [0.03, 0, 0.035], dk = [3.7, 4.2, 1];
        var z = new double[3];
        var eps = new double[3];

        HammerstadJensen1980.Lines(w, h, t, dk, z, eps);

        for (var i = 0; i < 3; i++)
            Assert.Equal(HammerstadJensen1980.Line(w[i], h[i], t[i], dk[i]), (z[i], eps[i]));
        Assert.Throws<ArgumentException>(() => HammerstadJensen1980.Lines(w, h, t, dk, z, new double[2]));
    }
}
