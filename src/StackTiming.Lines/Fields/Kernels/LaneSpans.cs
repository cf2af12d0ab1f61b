using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace StackTiming.Lines.Fields.Kernels;

/// <summary>Loops over spans of numbers, eight at once.</summary>
internal static class LaneSpans
{
    /// <summary>Multiplies every value.</summary>
    public static void Scale(Span<double> values, double factor)
    {
        var i = 0;
        ref var value = ref MemoryMarshal.GetReference(values);
        for (; i + Lanes.Count <= values.Length; i += Lanes.Count)
            (Vector512.LoadUnsafe(ref value, (nuint)i) * factor).StoreUnsafe(ref value, (nuint)i);
        for (; i < values.Length; i++)
            values[i] *= factor;
    }

    /// <summary>Multiplies every value by its own factor.</summary>
    public static void Scale(Span<double> values, ReadOnlySpan<double> factors)
    {
        var i = 0;
        ref var value = ref MemoryMarshal.GetReference(values);
        ref var factor = ref MemoryMarshal.GetReference(factors);
        for (; i + Lanes.Count <= values.Length; i += Lanes.Count)
            (Vector512.LoadUnsafe(ref value, (nuint)i) * Vector512.LoadUnsafe(ref factor, (nuint)i)).StoreUnsafe(ref value, (nuint)i);
        for (; i < values.Length; i++)
            values[i] *= factors[i];
    }

    /// <summary>Adds a multiple of the source to the target of the same length.</summary>
    public static void AddScaled(Span<double> target, ReadOnlySpan<double> source, double factor)
    {
        var i = 0;
        ref var from = ref MemoryMarshal.GetReference(source);
        ref var value = ref MemoryMarshal.GetReference(target);
        var factors = Vector512.Create(factor);
        for (; i + Lanes.Count <= source.Length; i += Lanes.Count)
        {
            Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref from, (nuint)i), factors, Vector512.LoadUnsafe(ref value, (nuint)i))
                .StoreUnsafe(ref value, (nuint)i);
        }

        for (; i < source.Length; i++)
            target[i] += factor * source[i];
    }

    /// <summary>The scalar product.</summary>
    public static double Dot(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        var i = 0;
        var sums = Vector512<double>.Zero;
        ref var first = ref MemoryMarshal.GetReference(a);
        ref var second = ref MemoryMarshal.GetReference(b);
        for (; i + Lanes.Count <= a.Length; i += Lanes.Count)
            sums = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref first, (nuint)i), Vector512.LoadUnsafe(ref second, (nuint)i), sums);
        var sum = Vector512.Sum(sums);
        for (; i < a.Length; i++)
            sum += a[i] * b[i];
        return sum;
    }
}
