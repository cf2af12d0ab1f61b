namespace StackTiming.Waves.Characteristics;

/// <summary>
/// Gaussian elimination with partial pivoting for the few unknowns of a net's lumped parts, in place and without allocation: a net has
/// thousands of them solved per second, which the general library's decompositions are too heavy for.
/// </summary>
internal static class LinearSystem
{
    /// <summary>Solves A·X = B; A is destroyed, B becomes X. Both row-major.</summary>
    /// <param name="a">Matrix, n×n.</param>
    /// <param name="b">Right-hand sides, n×m.</param>
    /// <param name="n">Number of unknowns.</param>
    /// <param name="m">Number of right-hand sides.</param>
    /// <exception cref="InvalidOperationException">The matrix is singular.</exception>
    public static void Solve(Span<double> a, Span<double> b, int n, int m)
    {
        for (var column = 0; column < n; column++)
        {
            var pivot = column;
            for (var row = column + 1; row < n; row++)
            {
                if (Math.Abs(a[(row * n) + column]) > Math.Abs(a[(pivot * n) + column]))
                    pivot = row;
            }
            if (!(Math.Abs(a[(pivot * n) + column]) > 0))
                throw new InvalidOperationException("The network has a part whose voltages nothing determines.");
            if (pivot != column)
            {
                SwapRows(a, pivot, column, n);
                SwapRows(b, pivot, column, m);
            }
            var pivotRow = a.Slice(column * n, n);
            var inverse = 1 / pivotRow[column];
            for (var row = column + 1; row < n; row++)
            {
                var other = a.Slice(row * n, n);
                var factor = other[column] * inverse;
                if (factor == 0)
                    continue;
                for (var k = column + 1; k < n; k++)
                    other[k] -= factor * pivotRow[k];
                for (var k = 0; k < m; k++)
                    b[(row * m) + k] -= factor * b[(column * m) + k];
            }
        }
        for (var row = n - 1; row >= 0; row--)
        {
            var inverse = 1 / a[(row * n) + row];
            for (var k = 0; k < m; k++)
            {
                var sum = b[(row * m) + k];
                for (var j = row + 1; j < n; j++)
                    sum -= a[(row * n) + j] * b[(j * m) + k];
                b[(row * m) + k] = sum * inverse;
            }
        }
    }

    private static void SwapRows(Span<double> matrix, int a, int b, int length)
    {
        for (var k = 0; k < length; k++)
            (matrix[(a * length) + k], matrix[(b * length) + k]) = (matrix[(b * length) + k], matrix[(a * length) + k]);
    }
}
