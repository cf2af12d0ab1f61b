using StackTiming.Lines.Materials;
using StackTiming.Lines.Roughness;
using Xunit;

namespace StackTiming.Lines.Tests.Roughness;

/// <summary>Check values of design/standards.md 6.8, skin depth of copper with 5.8·10⁷ S/m.</summary>
public sealed class RoughnessTests
{
    [Theory]
    [InlineData(0.5, 1e9, 1.0509)]
    [InlineData(1, 1e9, 1.1975)]
    [InlineData(1, 10e9, 1.8075)]
    [InlineData(2, 1e9, 1.5783)]
    [InlineData(2, 10e9, 1.9505)]
    public void Hammerstad_and_Groisse_have_the_tabulated_factors(double rmsMicrometres, double hertz, double factor) =>
        Assert.Equal(factor, HammerstadGroisse1999.Factor(rmsMicrometres * 1e-6, SkinEffect.DepthMetres(1 / 5.8e7, hertz)), 4);

    [Theory]
    [InlineData(1e9, 1.0537)]
    [InlineData(10e9, 1.2337)]
    [InlineData(50e9, 1.4228)]
    public void Spheres_of_Huray_have_the_tabulated_factors(double hertz, double factor) =>
        Assert.Equal(factor, CannonballHuray.Factor(0.5e-6, 14, 9.4e-6 * 9.4e-6, SkinEffect.DepthMetres(1 / 5.8e7, hertz)), 4);

    [Fact]
    public void Smooth_copper_has_factor_one()
    {
        Assert.Equal(1, HammerstadGroisse1999.Factor(0, 1e-6));
        Assert.Equal(1, CannonballHuray.FactorOfFoil(0, 1e-6));
    }

    [Fact]
    public void Foil_of_known_ten_point_roughness_is_a_pyramid_of_fourteen_balls()
    {
        const double rz = 5e-6, radius = 0.06 * rz;

        Assert.Equal(CannonballHuray.Factor(radius, 14, 9.4 * radius * 9.4 * radius, 1e-6), CannonballHuray.FactorOfFoil(rz, 1e-6), 12);
    }
}
