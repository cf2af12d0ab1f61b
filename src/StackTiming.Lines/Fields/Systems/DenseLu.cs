using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using StackTiming.Lines.Fields.Kernels;

namespace StackTiming.Lines.Fields.Systems;

/// <summary>
/// LU factors of a dense matrix with row exchanges, right-looking in blocks (G. H. Golub and C. F. Van Loan, Matrix Computations, 4th ed.
/// 2013, ch. 3.2 and 3.4). The library's managed factorisation is not blocked and takes several times as long at the sizes of a bus;
/// figures are in the benchmarks' README. Matrices are column-major; the number of rows in store is a multiple of eight, the surplus rows
/// zero.
/// </summary>
internal sealed class DenseLu
{
    private const int Block = 32;

    private readonly double[] lu;
    private readonly int[] pivots;
    private readonly int size;
    private readonly int stride;

    /// <summary>Factors the matrix in place.</summary>
    /// <param name="matrix">Column-major matrix with <paramref name="stride"/> numbers in store per column.</param>
    /// <param name="size">Rows and columns.</param>
    /// <param name="stride">At least <paramref name="size"/>, a multiple of eight.</param>
    public DenseLu(double[] matrix, int size, int stride)
    {
        (lu, this.size, this.stride) = (matrix, size, stride);
        pivots = new int[size];
        for (var start = 0; start < size; start += Block)
        {
            var end = Math.Min(start + Block, size);
            FactorPanel(start, end);
            ExchangeOutside(start, end);
            if (end == size)
                break;
            SolveUpper(start, end);
            UpdateTrailing(start, end);
        }
    }

    /// <summary>True where a pivot is zero or not a number, so that there is no solution.</summary>
    public bool IsSingular { get; private set; }

    /// <summary>Solves A x = b in place for each of the right sides; together, so that the factors are read once.</summary>
    public void Solve(double[][] rights)
    {
        foreach (var b in rights)
        {
            for (var i = 0; i < size; i++)
                (b[i], b[pivots[i]]) = (b[pivots[i]], b[i]);
        }

        for (var j = 0; j < size; j++)
        {
            var below = Column(j)[(j + 1)..size];
            foreach (var b in rights)
                LaneSpans.AddScaled(b.AsSpan((j + 1)..size), below, -b[j]);
        }

        for (var j = size - 1; j >= 0; j--)
        {
            var above = Column(j)[..j];
            foreach (var b in rights)
            {
                b[j] /= lu[j * stride + j];
                LaneSpans.AddScaled(b.AsSpan(..j), above, -b[j]);
            }
        }
    }

    /// <summary>Solves Aᵀ x = b in place for each of the right sides.</summary>
    public void SolveTransposed(double[][] rights)
    {
        for (var j = 0; j < size; j++)
        {
            var above = Column(j)[..j];
            foreach (var b in rights)
                b[j] = (b[j] - LaneSpans.Dot(above, b.AsSpan(..j))) / lu[j * stride + j];
        }

        for (var j = size - 1; j >= 0; j--)
        {
            var below = Column(j)[(j + 1)..size];
            foreach (var b in rights)
                b[j] -= LaneSpans.Dot(below, b.AsSpan((j + 1)..size));
        }

        foreach (var b in rights)
        {
            for (var i = size - 1; i >= 0; i--)
                (b[i], b[pivots[i]]) = (b[pivots[i]], b[i]);
        }
    }

    private Span<double> Column(int j) => lu.AsSpan(j * stride, stride);

    private void FactorPanel(int start, int end)
    {
        for (var j = start; j < end; j++)
        {
            var column = Column(j);
            var pivot = j;
            for (var i = j + 1; i < size; i++)
            {
                if (Math.Abs(column[i]) > Math.Abs(column[pivot]))
                    pivot = i;
            }

            pivots[j] = pivot;
            if (pivot != j)
            {
                for (var k = start; k < end; k++)
                    (lu[k * stride + j], lu[k * stride + pivot]) = (lu[k * stride + pivot], lu[k * stride + j]);
            }

            var diagonal = column[j];
            if (!(Math.Abs(diagonal) > 0))
            {
                IsSingular = true;
                continue;
            }

            var below = column[(j + 1)..size];
            LaneSpans.Scale(below, 1 / diagonal);
            for (var k = j + 1; k < end; k++)
                LaneSpans.AddScaled(Column(k)[(j + 1)..size], below, -Column(k)[j]);
        }
    }

    private void ExchangeOutside(int start, int end)
    {
        for (var k = 0; k < size; k++)
        {
            if (k == start)
                k = end;
            if (k >= size)
                return;
            var column = Column(k);
            for (var j = start; j < end; j++)
                (column[j], column[pivots[j]]) = (column[pivots[j]], column[j]);
        }
    }

    private void SolveUpper(int start, int end)
    {
        for (var k = end; k < size; k++)
        {
            var column = Column(k);
            for (var j = start; j < end; j++)
                LaneSpans.AddScaled(column[(j + 1)..end], Column(j)[(j + 1)..end], -column[j]);
        }
    }

    /// <summary>A[end.., end..] -= L[end.., start..end] U[start..end, end..], four columns by sixteen rows in registers.</summary>
    private void UpdateTrailing(int start, int end)
    {
        ref var origin = ref MemoryMarshal.GetArrayDataReference(lu);
        var k = end;
        for (; k + 4 <= size; k += 4)
        {
            var row = end;
            for (; row + 16 <= stride; row += 16)
                UpdateTile(ref origin, start, end, row, k);
            for (; row < stride; row += 8)
            {
                for (var c = 0; c < 4; c++)
                    UpdateLanes(ref origin, start, end, row, k + c);
            }
        }

        for (; k < size; k++)
        {
            for (var row = end; row < stride; row += 8)
                UpdateLanes(ref origin, start, end, row, k);
        }
    }

    private void UpdateTile(ref double origin, int start, int end, int row, int k)
    {
        var step = (nuint)stride;
        ref var c0 = ref Unsafe.Add(ref origin, k * stride);
        ref var c1 = ref Unsafe.Add(ref c0, stride);
        ref var c2 = ref Unsafe.Add(ref c1, stride);
        ref var c3 = ref Unsafe.Add(ref c2, stride);
        var at = (nuint)row;
        var (s00, s01, s10, s11) = (Vector512<double>.Zero, Vector512<double>.Zero, Vector512<double>.Zero, Vector512<double>.Zero);
        var (s20, s21, s30, s31) = (Vector512<double>.Zero, Vector512<double>.Zero, Vector512<double>.Zero, Vector512<double>.Zero);
        var lower = (nuint)start * step + at;
        for (var j = start; j < end; j++, lower += step)
        {
            var (l0, l1) = (Vector512.LoadUnsafe(ref origin, lower), Vector512.LoadUnsafe(ref origin, lower + 8));
            var u = Vector512.Create(Unsafe.Add(ref c0, j));
            (s00, s01) = (Vector512.FusedMultiplyAdd(l0, u, s00), Vector512.FusedMultiplyAdd(l1, u, s01));
            u = Vector512.Create(Unsafe.Add(ref c1, j));
            (s10, s11) = (Vector512.FusedMultiplyAdd(l0, u, s10), Vector512.FusedMultiplyAdd(l1, u, s11));
            u = Vector512.Create(Unsafe.Add(ref c2, j));
            (s20, s21) = (Vector512.FusedMultiplyAdd(l0, u, s20), Vector512.FusedMultiplyAdd(l1, u, s21));
            u = Vector512.Create(Unsafe.Add(ref c3, j));
            (s30, s31) = (Vector512.FusedMultiplyAdd(l0, u, s30), Vector512.FusedMultiplyAdd(l1, u, s31));
        }

        Store(ref c0, at, s00, s01);
        Store(ref c1, at, s10, s11);
        Store(ref c2, at, s20, s21);
        Store(ref c3, at, s30, s31);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static void Store(ref double column, nuint at, Vector512<double> first, Vector512<double> second)
    {
        (Vector512.LoadUnsafe(ref column, at) - first).StoreUnsafe(ref column, at);
        (Vector512.LoadUnsafe(ref column, at + 8) - second).StoreUnsafe(ref column, at + 8);
    }

    private void UpdateLanes(ref double origin, int start, int end, int row, int k)
    {
        ref var column = ref Unsafe.Add(ref origin, k * stride);
        var sum = Vector512.LoadUnsafe(ref column, (nuint)row);
        for (var j = start; j < end; j++)
            sum -= Vector512.LoadUnsafe(ref origin, (nuint)(j * stride + row)) * Unsafe.Add(ref column, j);
        sum.StoreUnsafe(ref column, (nuint)row);
    }
}
