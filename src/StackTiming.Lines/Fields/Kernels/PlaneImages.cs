using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields.Kernels;

/// <summary>
/// Potential and field of the charge on a panel together with its images in the planes, so that the planes themselves carry no unknowns:
/// none in open space, one image under one plane, and between two planes the three nearest images exactly with <see
/// cref="ParallelPlates"/> for all the others. Units: charge over 2πε0, so that a unit line charge has the potential -ln r.
/// </summary>
/// <param name="hasPlane">True where a plane lies at y = 0.</param>
/// <param name="topPlane">y of the upper plane in metres, or null.</param>
internal sealed class PlaneImages(bool hasPlane, double? topPlane)
{
    private readonly ParallelPlates? plates = topPlane is { } height ? new ParallelPlates(height) : null;

    /// <summary>
    /// Adds the potentials at the points, a column of <paramref name="stride"/> numbers for each polynomial of the panel. With
    /// <paramref name="mirrored"/> the panel's mirror image about x = 0 is meant.
    /// </summary>
    public void AddPotential(Panel panel, ChargePoints points, bool mirrored, Span<double> columns, int stride)
    {
        AddImage(panel, points, mirrored, 1, 0, -1, true, columns, stride);
        if (hasPlane)
            AddImage(panel, points, mirrored, -1, 0, 1, true, columns, stride);
        else if (panel.Map == PanelMap.Infinite)
            AddTailConstants(panel, columns, stride, points.Padded);
        if (topPlane is { } top)
            AddImage(panel, points, mirrored, -1, 2 * top, 1, true, columns, stride);
        plates?.AddPotential(panel, points, mirrored, columns, stride);
    }

    /// <summary>
    /// Adds the fields along the points' normals, laid out as potentials are. On the panel itself the field of its own charge has no
    /// normal part (the mean of both sides): pass the rows of its own points, which must start empty, as <paramref name="ownStart"/> and
    /// <paramref name="ownCount"/>.
    /// </summary>
    public void AddNormalField(Panel panel, ChargePoints points, bool mirrored, int ownStart, int ownCount, Span<double> columns,
        int stride)
    {
        AddImage(panel, points, mirrored, 1, 0, 1, false, columns, stride);
        if (ownCount > 0)
        {
            for (var n = 0; n < panel.Terms; n++)
                columns.Slice(n * stride + ownStart, ownCount).Clear();
        }

        if (hasPlane)
            AddImage(panel, points, mirrored, -1, 0, -1, false, columns, stride);
        if (topPlane is { } top)
            AddImage(panel, points, mirrored, -1, 2 * top, -1, false, columns, stride);
        plates?.AddNormalField(panel, points, mirrored, columns, stride);
    }

    /// <summary>The image of the panel is evaluated at the point that is the image of the wanted one: (±x, offset ± y).</summary>
    private static void AddImage(
        Panel panel, ChargePoints points, bool mirrored, int upright, double offset, double sign, bool potentials, Span<double> columns,
            int stride)
    {
        Span<Vector512<double>> first = stackalloc Vector512<double>[panel.Terms];
        Span<Vector512<double>> second = stackalloc Vector512<double>[panel.Terms];
        Span<Vector512<double>> workspace = stackalloc Vector512<double>[PanelIntegral.Workspace];
        var (cos, sin) = (panel.Direction.Real, panel.Direction.Imaginary);
        var across = mirrored ? -1.0 : 1.0;
        ref var column = ref MemoryMarshal.GetReference(columns);
        for (var t = 0; t < points.Padded; t += Lanes.Count)
        {
            var x = across * Vector512.Create<double>(points.X.AsSpan(t)) - Vector512.Create(panel.Origin.Real);
            var y = upright * Vector512.Create<double>(points.Y.AsSpan(t)) + Vector512.Create(offset - panel.Origin.Imaginary);
            var (localX, localY) = (x * cos + y * sin, y * cos - x * sin);
            if (potentials)
            {
                PanelIntegral.Evaluate(panel, localX, localY, first, default, default, workspace);
                for (var n = 0; n < panel.Terms; n++)
                    Accumulate(ref column, n * stride + t, first[n] * sign);
                continue;
            }

            PanelIntegral.Evaluate(panel, localX, localY, default, first, second, workspace);
            var normalX = across * Vector512.Create<double>(points.NormalX.AsSpan(t)) * sign;
            var normalY = upright * Vector512.Create<double>(points.NormalY.AsSpan(t)) * sign;
            var (localNormalX, localNormalY) = (normalX * cos + normalY * sin, normalY * cos - normalX * sin);
            for (var n = 0; n < panel.Terms; n++)
                Accumulate(ref column, n * stride + t, first[n] * localNormalX - second[n] * localNormalY);
        }
    }

    /// <summary>The part ∫ P_n ln u du of an infinite panel's potential, which images under a plane would cancel.</summary>
    private static void AddTailConstants(Panel panel, Span<double> columns, int stride, int padded)
    {
        for (var n = 0; n < panel.Terms; n++)
        {
            var constant = n == 0 ? -1.0 : (n % 2 == 0 ? -1.0 : 1.0) / (n * (n + 1.0));
            foreach (ref var value in columns.Slice(n * stride, padded))
                value += constant;
        }
    }

    private static void Accumulate(ref double column, int at, Vector512<double> value)
    {
        var sum = Vector512.LoadUnsafe(ref column, (nuint)at) + value;
        sum.StoreUnsafe(ref column, (nuint)at);
    }
}
