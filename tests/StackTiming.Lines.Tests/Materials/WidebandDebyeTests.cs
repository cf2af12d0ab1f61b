using StackTiming.Lines.Materials;
using Xunit;

namespace StackTiming.Lines.Tests.Materials;

public sealed class WidebandDebyeTests
{
    /// <summary>Computed independently of this project from the published model (design/standards.md 6.8): 4.3 and 0.02 at 1 GHz, corners 10 kHz and 1 THz.</summary>
    [Theory]
    [InlineData(1e6, 4.6784, 0.01828)]
    [InlineData(10e6, 4.5523, 0.01889)]
    [InlineData(100e6, 4.4261, 0.01944)]
    [InlineData(1e9, 4.3000, 0.02000)]
    [InlineData(10e9, 4.1739, 0.02049)]
    [InlineData(20e9, 4.1359, 0.02054)]
    public void Tabulated_values_are_met(double hertz, double dk, double df)
    {
        var model = WidebandDebye.Through(4.3, 0.02, 1e9, 10e3, 1e12);

        Assert.Equal(3.92156, model.EpsInfinity, 5);
        Assert.Equal(1.00917, model.DeltaEps, 5);
        Assert.Equal(dk, model.Dk(hertz), 4);
        Assert.Equal(df, model.Df(hertz), 5);
    }

    [Fact]
    public void Static_value_is_the_sum_of_its_parts()
    {
        var model = WidebandDebye.Through(4.0, 0.015, 1e9);

        Assert.Equal(model.EpsInfinity + model.DeltaEps, model.Dk(0), 9);
        Assert.Equal(0, model.Df(0));
    }
}
