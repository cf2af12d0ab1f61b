using StackTiming.Lines.Materials;
using Xunit;

namespace StackTiming.Lines.Tests.Materials;

public sealed class SkinEffectTests
{
    /// <summary>Copper of 5.8·10⁷ S/m: 2.09 µm and 8.25 mohm per square at 1 GHz, 0.661 µm at 10 GHz (design/standards.md 6.1).</summary>
    [Fact]
    public void Copper_has_the_tabulated_depth_and_surface_resistance()
    {
        Assert.Equal(2.09e-6, SkinEffect.DepthMetres(1 / 5.8e7, 1e9), 0.005e-6);
        Assert.Equal(0.661e-6, SkinEffect.DepthMetres(1 / 5.8e7, 10e9), 0.0005e-6);
        Assert.Equal(8.25e-3, SkinEffect.SurfaceResistanceOhms(1 / 5.8e7, 1e9), 0.005e-3);
    }
}
