using System.Numerics;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields.Kernels;

/// <summary>
/// The images between two parallel planes beyond the nearest three. A unit line charge at z' between planes at y = 0 and y = b has the
/// potential -ln|sinh(π(z-z')/2b) / sinh(π(z-z'*)/2b)| (P. M. Morse and H. Feshbach, Methods of Theoretical Physics, 1953, ch. 10). What
/// is left of it without the charge and its first image in each plane is smooth on the scale of b and is summed with a Gauss rule.
/// </summary>
/// <param name="height">b in metres.</param>
internal sealed class ParallelPlates(double height)
{
    private const double Steepest = 60;

    private readonly double rate = Math.PI / (2 * height);

    /// <summary>Adds the potentials of the remaining images.</summary>
    public void AddPotential(Panel panel, ChargePoints points, bool mirrored, Span<double> columns, int stride) =>
        Add(panel, points, mirrored, true, columns, stride);

    /// <summary>Adds the fields of the remaining images along the points' normals.</summary>
    public void AddNormalField(Panel panel, ChargePoints points, bool mirrored, Span<double> columns, int stride) =>
        Add(panel, points, mirrored, false, columns, stride);

    private void Add(Panel panel, ChargePoints points, bool mirrored, bool potentials, Span<double> columns, int stride)
    {
        // At the far end of a mapped panel u runs as many times faster as the map has powers.
        var parts = (int)Math.Ceiling((int)panel.Map * panel.Length / (1.5 * height));
        var rule = LegendreRule.Of(Math.Max(panel.Terms, 4) + (parts > 1 ? 4 : 2));
        Span<Vector512<double>> sums = stackalloc Vector512<double>[panel.Terms];
        var across = mirrored ? -1.0 : 1.0;
        ref var column = ref MemoryMarshal.GetReference(columns);
        // The growth splits into those of point and source while neither meets its bound.
        var isLong = rate * panel.Length > Steepest / 2;
        var centre = panel.At(0.5).Real;
        var sources = Sources(panel, rule, parts, centre);
        for (var t = 0; t < points.Padded; t += Lanes.Count)
        {
            sums.Clear();
            var x = across * Vector512.Create<double>(points.X.AsSpan(t));
            var y = Vector512.Create<double>(points.Y.AsSpan(t));
            var normalX = across * Vector512.Create<double>(points.NormalX.AsSpan(t));
            var normalY = Vector512.Create<double>(points.NormalY.AsSpan(t));
            var (sin, cos) = (Vector512.Sin(y * rate), Vector512.Cos(y * rate));
            var fromCentre = Growth(x - Vector512.Create(centre));
            foreach (var source in sources)
            {
                var growth = isLong ? Growth(x - Vector512.Create(source.Point.Real)) : fromCentre * source.Growth;
                var value = potentials
                    ? -Potential(x, y, sin, cos, growth, source)
                    : Field(x, y, sin, cos, growth, normalX, normalY, source);
                for (var n = 0; n < sums.Length; n++)
                    sums[n] += value * source.Weights[n];
            }

            for (var n = 0; n < sums.Length; n++)
            {
                var at = (nuint)(n * stride + t);
                (Vector512.LoadUnsafe(ref column, at) + sums[n]).StoreUnsafe(ref column, at);
            }
        }
    }

    private Source[] Sources(Panel panel, LegendreRule rule, int parts, double centre)
    {
        var sources = new Source[rule.Nodes.Length * parts];
        for (var i = 0; i < sources.Length; i++)
        {
            var u = (i / rule.Nodes.Length + rule.Nodes[i % rule.Nodes.Length]) / parts;
            var weights = new double[panel.Terms];
            for (var n = 0; n < weights.Length; n++)
                weights[n] = rule.Weights[i % rule.Nodes.Length] / parts * LegendreRule.Polynomial(n, u);
            var point = panel.At(u);
            sources[i] = new Source(point, Math.Exp(Math.Clamp(rate * (centre - point.Real), -Steepest, Steepest)),
                Math.Sin(rate * point.Imaginary), Math.Cos(rate * point.Imaginary), weights);
        }

        return sources;
    }

    private Vector512<double> Potential(Vector512<double> x, Vector512<double> y, Vector512<double> sin, Vector512<double> cos,
        Vector512<double> growth, Source source)
    {
        var dx = x - Vector512.Create(source.Point.Real);
        var down = y - Vector512.Create(source.Point.Imaginary);
        var up = y + Vector512.Create(source.Point.Imaginary);
        var beyond = up - Vector512.Create(2 * height);
        var (sinh, _) = Hyperbolic(growth);
        var square = sinh * sinh;
        var (sinDown, sinUp) = (sin * source.Cos - cos * source.Sin, sin * source.Cos + cos * source.Sin);
        // A point that is the source itself: both the true and the removed charge move away by the same nothing.
        var nothing = 1e-20 * height * height;
        var nearest = dx * dx + down * down + Vector512.Create(nothing);
        var direct = square + sinDown * sinDown + Vector512.Create(nothing * rate * rate);
        var image = square + sinUp * sinUp;
        return 0.5 * Vector512.Log(direct * (dx * dx + up * up) * (dx * dx + beyond * beyond) / (image * nearest));
    }

    private Vector512<double> Field(
        Vector512<double> x, Vector512<double> y, Vector512<double> sin, Vector512<double> cos, Vector512<double> growth,
            Vector512<double> normalX, Vector512<double> normalY, Source source)
    {
        var dx = x - Vector512.Create(source.Point.Real);
        var down = y - Vector512.Create(source.Point.Imaginary);
        var up = y + Vector512.Create(source.Point.Imaginary);
        var beyond = up - Vector512.Create(2 * height);
        var (sinh, cosh) = Hyperbolic(growth);
        var square = sinh * sinh;
        var (sinDown, sinUp) = (sin * source.Cos - cos * source.Sin, sin * source.Cos + cos * source.Sin);
        var (cosDown, cosUp) = (cos * source.Cos + sin * source.Sin, cos * source.Cos - sin * source.Sin);
        var (imageSquare, beyondSquare) = (dx * dx + up * up, dx * dx + beyond * beyond);
        var inverse = Vector512.Create(1.0) / (imageSquare * beyondSquare);
        var (imageInverse, beyondInverse) = (beyondSquare * inverse, imageSquare * inverse);
        var imageScale = Vector512.Create(rate) / (square + sinUp * sinUp);
        var (re, im) = NearestRemainder(dx, down, sinh, cosh, sinDown, cosDown);
        re += dx * (imageInverse + beyondInverse) - sinh * cosh * imageScale;
        im += sinUp * cosUp * imageScale - up * imageInverse - beyond * beyondInverse;
        return re * normalX - im * normalY;
    }

    /// <summary>κ coth(κζ) - 1/ζ, which tends to κ²ζ/3.</summary>
    private (Vector512<double> Re, Vector512<double> Im) NearestRemainder(
        Vector512<double> dx, Vector512<double> down, Vector512<double> sinh, Vector512<double> cosh, Vector512<double> sinDown,
            Vector512<double> cosDown)
    {
        var distance = dx * dx + down * down;
        var near = Vector512.LessThan(distance, Vector512.Create(1e-6 * height * height));
        var safe = Vector512.ConditionalSelect(near, Vector512.Create(height * height), distance);
        var scale = Vector512.Create(rate) / (sinh * sinh + sinDown * sinDown + Vector512.Create(1e-30));
        var third = rate * rate / 3;
        return (
            Vector512.ConditionalSelect(near, dx * third, sinh * cosh * scale - dx / safe),
            Vector512.ConditionalSelect(near, down * third, down / safe - sinDown * cosDown * scale));
    }

    /// <summary>e^(κx), bounded: where it is that large or small, sinh and cosh are equal to the last digit.</summary>
    private Vector512<double> Growth(Vector512<double> x) =>
        Vector512.Exp(Vector512.Min(Vector512.Max(x * rate, Vector512.Create(-Steepest)), Vector512.Create(Steepest)));

    private static (Vector512<double> Sinh, Vector512<double> Cosh) Hyperbolic(Vector512<double> growth)
    {
        var decay = Vector512.Create(1.0) / growth;
        return (0.5 * (growth - decay), 0.5 * (growth + decay));
    }

    private readonly record struct Source(Complex Point, double Growth, double Sin, double Cos, double[] Weights);
}
