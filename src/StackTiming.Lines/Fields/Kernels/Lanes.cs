using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace StackTiming.Lines.Fields.Kernels;

/// <summary>Elementary functions of eight numbers at once that the runtime does not provide.</summary>
internal static class Lanes
{
    /// <summary>Numbers handled at once.</summary>
    public const int Count = 8;

    /// <summary>The next multiple of <see cref="Count"/>.</summary>
    public static int Padded(int length) => (length + Count - 1) / Count * Count;

    /// <summary>Angle of (x, y) in -π…π; within 4e-16 of π times the exact one.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Vector512<double> Atan2(Vector512<double> y, Vector512<double> x)
    {
        var (ax, ay) = (Vector512.Abs(x), Vector512.Abs(y));
        var (small, large) = (Vector512.Min(ax, ay), Vector512.Max(ax, ay));
        // tan(a - pi/8) moves the range 0...1 of small/large to -0.414...0.414, where the power series is short.
        const double tangent = 0.41421356237309503;
        var ratio = (small - tangent * large) / Vector512.Max(large + tangent * small, Vector512.Create(double.Epsilon));
        var angle = Vector512.Create(Math.PI / 8) + AtanNearZero(ratio);
        angle = Vector512.ConditionalSelect(Vector512.GreaterThan(ay, ax), Vector512.Create(Math.PI / 2) - angle, angle);
        angle = Vector512.ConditionalSelect(Vector512.LessThan(x, Vector512<double>.Zero), Vector512.Create(Math.PI) - angle, angle);
        return Vector512.CopySign(angle, y);
    }

    /// <summary>Cosine and sine of an angle within -1.1…1.1, by their power series.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static (Vector512<double> Cos, Vector512<double> Sin) CosSin(Vector512<double> angle)
    {
        var square = angle * angle;
        var cos = Vector512.Create(1.0);
        var sin = Vector512.Create(1.0);
        for (var k = 9; k >= 1; k--)
        {
            cos = Vector512.Create(1.0) - cos * square * (1.0 / ((2 * k - 1) * (2 * k)));
            sin = Vector512.Create(1.0) - sin * square * (1.0 / ((2 * k) * (2 * k + 1)));
        }

        return (cos, sin * angle);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector512<double> AtanNearZero(Vector512<double> x)
    {
        var square = x * x;
        var sum = Vector512.Create(1.0 / 39);
        for (var k = 18; k >= 0; k--)
            sum = Vector512.FusedMultiplyAdd(-sum, square, Vector512.Create(1.0 / (2 * k + 1)));
        return x * sum;
    }
}
