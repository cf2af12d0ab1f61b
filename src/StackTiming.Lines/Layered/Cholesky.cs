namespace StackTiming.Lines.Layered;

/// <summary>
/// Factor and solution of a small symmetric positive definite matrix in a flat array. The matrices here have 2 to 60 rows and are solved
/// a hundred thousand times a second, where the objects of a general library would cost more than the arithmetic.
/// </summary>
internal static class Cholesky
{
    /// <summary>Factors in place; reads and writes the lower triangle, stored by rows.</summary>
    /// <param name="a">The matrix.</param>
    /// <param name="n">Number of rows.</param>
    public static void Factor(Span<double> a, int n)
    {
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j <= i; j++)
            {
                var sum = a[i * n + j];
                for (var k = 0; k < j; k++)
                    sum -= a[i * n + k] * a[j * n + k];
                a[i * n + j] = i == j ? Math.Sqrt(sum) : sum / a[j * n + j];
            }
        }
    }

    /// <summary>Solves with a factored matrix, in place.</summary>
    /// <param name="a">The factor.</param>
    /// <param name="x">Right side, then solution.</param>
    public static void Solve(ReadOnlySpan<double> a, Span<double> x)
    {
        var n = x.Length;
        for (var i = 0; i < n; i++)
        {
            for (var k = 0; k < i; k++)
                x[i] -= a[i * n + k] * x[k];
            x[i] /= a[i * n + i];
        }
        for (var i = n - 1; i >= 0; i--)
        {
            for (var k = i + 1; k < n; k++)
                x[i] -= a[k * n + i] * x[k];
            x[i] /= a[i * n + i];
        }
    }
}
