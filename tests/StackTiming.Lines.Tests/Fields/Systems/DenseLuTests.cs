using MathNet.Numerics.LinearAlgebra;
using StackTiming.Lines.Fields.Systems;
using Xunit;

namespace StackTiming.Lines.Tests.Fields.Systems;

public sealed class DenseLuTests
{
    [Theory]
    [InlineData(1)]
    [InlineData(7)]
    [InlineData(32)]
    [InlineData(33)]
    [InlineData(100)]
    [InlineData(171)]
    public void Solves_as_the_library_does(int size)
    {
        var random = new Random(size);
        var matrix = Matrix<double>.Build.Dense(size, size, (_, _) => random.NextDouble() - 0.5);
        var right = Vector<double>.Build.Dense(size, _ => random.NextDouble());
        var stride = (size + 7) / 8 * 8;
        var columns = new double[size * stride];
        for (var j = 0; j < size; j++)
        {
            for (var i = 0; i < size; i++)
                columns[j * stride + i] = matrix[i, j];
        }

        var lu = new DenseLu(columns, size, stride);
        var (x, y) = (right.ToArray(), right.ToArray());
        double[] twice = [.. x.Select(v => 2 * v)];
        lu.Solve([x, twice]);
        lu.SolveTransposed([y]);

        var scale = matrix.Inverse().InfinityNorm();
        Assert.False(lu.IsSingular);
        Assert.Equal(x.Select(v => 2 * v), twice);
        Assert.True((Vector<double>.Build.Dense(x) - matrix.Solve(right)).InfinityNorm() < 1e-12 * size * scale);
        Assert.True((Vector<double>.Build.Dense(y) - matrix.Transpose().Solve(right)).InfinityNorm() < 1e-12 * size * scale);
    }

    [Fact]
    public void Notices_a_singular_matrix() => Assert.True(new DenseLu(new double[16], 2, 8).IsSingular);
}
