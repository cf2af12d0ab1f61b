using StackTiming.Lines.Microstrip;
using Xunit;

namespace StackTiming.Lines.Tests.Microstrip;

public sealed class Wheeler1977Tests
{
    /// <summary>The stated 2 % against Hammerstad and Jensen's values (design/standards.md 6.3), which are ten times as accurate.</summary>
    [Theory]
    [InlineData(4.2, 0.5, 97.384)]
    [InlineData(4.2, 1, 72.494)]
    [InlineData(4.2, 3, 38.277)]
    [InlineData(9.8, 1, 49.289)]
    [InlineData(1, 2, 89.029)]
    public void Thin_strips_agree_within_the_stated_error(double dk, double widthOverHeight, double z0) =>
        Assert.Equal(1, Wheeler1977.Z0Ohms(widthOverHeight, 1, 0, dk) / z0, 0.02);
}
