namespace StackTiming.Waves.Characteristics;

/// <summary>Inverse of the small conductance matrices of node clusters, which are symmetric and diagonally dominant.</summary>
internal static class SmallMatrix
{
    /// <summary>Replaces a matrix, by rows, by its inverse (Gauss and Jordan with row pivoting).</summary>
    /// <param name="a">n×n values by rows.</param>
    /// <param name="n">Order.</param>
    public static void Invert(double[] a, int n)
    {
        if (n == 1)
        {
            a[0] = 1 / a[0];
            return;
        }
        var inverse = new double[n * n];
        for (var i = 0; i < n; i++)
            inverse[(i * n) + i] = 1;
        for (var column = 0; column < n; column++)
        {
            var pivot = column;
            for (var row = column + 1; row < n; row++)
            {
                if (Math.Abs(a[(row * n) + column]) > Math.Abs(a[(pivot * n) + column]))
                    pivot = row;
            }
            if (pivot != column)
            {
                a.AsSpan(pivot * n, n).SwapWith(a.AsSpan(column * n, n));
                inverse.AsSpan(pivot * n, n).SwapWith(inverse.AsSpan(column * n, n));
            }
            var scale = 1 / a[(column * n) + column];
            for (var k = 0; k < n; k++)
            {
                a[(column * n) + k] *= scale;
                inverse[(column * n) + k] *= scale;
            }
            for (var row = 0; row < n; row++)
            {
                var factor = a[(row * n) + column];
                if (row == column || factor == 0)
                    continue;
                for (var k = 0; k < n; k++)
                {
                    a[(row * n) + k] -= factor * a[(column * n) + k];
                    inverse[(row * n) + k] -= factor * inverse[(column * n) + k];
                }
            }
        }
        inverse.CopyTo(a, 0);
    }

    private static void SwapWith(this Span<double> a, Span<double> b)
    {
        for (var i = 0; i < a.Length; i++)
            (a[i], b[i]) = (b[i], a[i]);
    }
}
