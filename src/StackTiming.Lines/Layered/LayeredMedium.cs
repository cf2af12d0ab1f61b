namespace StackTiming.Lines.Layered;

/// <summary>
/// Layers of dielectric over a grounded plane at y = 0, open above or closed by a second plane, as sheets of charge that vary as cos(kx) see them.
/// The potential follows from wave admittances joined layer by layer (T. Itoh, "Spectral domain immitance approach for dispersion
/// characteristics of generalized printed transmission lines", IEEE Trans. MTT-28, 1980, pp. 733–736, in its static limit).
/// </summary>
/// <param name="thickness">Thickness of each layer from the plane upwards, metres. Node i is the upper face of layer i.</param>
/// <param name="closed">True where a grounded plane lies on the last layer; air fills the space above otherwise.</param>
internal sealed class LayeredMedium(double[] thickness, bool closed)
{
    /// <summary>Potentials of unit sheets, times ε₀: <paramref name="potential"/>[i·n + j] is that at node i from a sheet at node j.</summary>
    /// <param name="k">Wave number, 1/m, above 0.</param>
    /// <param name="dk">Relative permittivity of each layer, then of the open space above the last.</param>
    /// <param name="nodes">The n nodes that carry sheets, rising.</param>
    /// <param name="potential">Receives the n·n potentials in metres.</param>
    public void Potentials(double k, ReadOnlySpan<double> dk, ReadOnlySpan<int> nodes, Span<double> potential)
    {
        var layers = thickness.Length;
        Span<double> up = stackalloc double[layers + 1];
        Span<double> transfer = stackalloc double[layers + 1];
        // Downwards over the layers: the admittance that each node sees above it, and how a potential there carries on to the next node.
        Span<double> square = stackalloc double[layers];
        if (!closed)
            up[layers - 1] = dk[layers] * k;
        for (var i = layers - 1; i >= 1; i--)
        {
            var y = dk[i] * k;
            var e = Math.Exp(-k * thickness[i]);
            var e2 = square[i] = e * e;
            if (closed && i == layers - 1)
            {
                up[i - 1] = y * (1 + e2) / (1 - e2);
                transfer[i] = 0;
            }
            else
            {
                var load = up[i] / y;
                var denominator = 1 + e2 + load * (1 - e2);
                up[i - 1] = y * (load * (1 + e2) + 1 - e2) / denominator;
                transfer[i] = 2 * e / denominator;
            }
        }
        var bottom = Math.Exp(-k * thickness[0]);
        square[0] = bottom * bottom;
        var n = nodes.Length;
        var down = 0.0;
        var next = 0;
        for (var i = 0; i < layers && next < n; i++)
        {
            var y = dk[i] * k;
            var e2 = square[i];
            if (i == 0)
            {
                down = y * (1 + e2) / (1 - e2);
            }
            else
            {
                var load = down / y;
                down = y * (load * (1 + e2) + 1 - e2) / (1 + e2 + load * (1 - e2));
            }
            if (nodes[next] != i)
                continue;
            var value = 1 / (down + up[i]);
            potential[next * n + next] = value;
            for (int other = next + 1, layer = i + 1; other < n; other++)
            {
                for (; layer <= nodes[other]; layer++)
                    value *= transfer[layer];
                potential[other * n + next] = potential[next * n + other] = value;
            }
            next++;
        }
    }
}
