namespace StackTiming.Lines.Layered;

/// <summary>
/// Bessel functions of the first kind of several orders at once, absolute error below 10⁻⁷: Miller's backward recurrence below x = 12, and the
/// polynomials of M. Abramowitz, I. A. Stegun, Handbook of Mathematical Functions, 1964, 9.4.3 and 9.4.6, with forward recurrence above.
/// </summary>
internal static class BesselJ
{
    private const double Crossover = 12;

    /// <summary>J₀(x) to J_{n−1}(x).</summary>
    /// <param name="x">Argument, not negative.</param>
    /// <param name="values">Receives the values; at most 12 of them.</param>
    public static void Fill(double x, Span<double> values)
    {
        if (x < Crossover)
            Backward(x, values);
        else
            Forward(x, values);
    }

    private static void Backward(double x, Span<double> values)
    {
        values.Clear();
        if (x < 1e-8)
        {
            values[0] = 1;
            return;
        }
        var start = 2 * ((int)(0.75 * x + 9 + 0.5 * values.Length) / 2) + 4;
        double above = 0, here = 1e-30, sum = 0;
        var factor = 2 / x;
        for (var n = start; n > 0; n--)
        {
            if ((n & 1) == 0)
                sum += 2 * here;
            if (n < values.Length)
                values[n] = here;
            (above, here) = (here, n * factor * here - above);
            if (Math.Abs(here) > 1e200)
            {
                here *= 1e-200;
                above *= 1e-200;
                sum *= 1e-200;
                for (var i = 0; i < values.Length; i++)
                    values[i] *= 1e-200;
            }
        }
        values[0] = here;
        var scale = 1 / (sum + here);
        for (var i = 0; i < values.Length; i++)
            values[i] *= scale;
    }

    private static void Forward(double x, Span<double> values)
    {
        var z = 3 / x;
        var f0 = 0.79788456 + z * (-0.00000077 + z * (-0.00552740 + z * (-0.00009512 + z * (0.00137237 + z * (-0.00072805 + z * 0.00014476)))));
        var a0 = x - 0.78539816 + z * (-0.04166397 + z * (-0.00003954 + z * (0.00262573 + z * (-0.00054125 + z * (-0.00029333 + z * 0.00013558)))));
        var f1 = 0.79788456 + z * (0.00000156 + z * (0.01659667 + z * (0.00017105 + z * (-0.00249511 + z * (0.00113653 - z * 0.00020033)))));
        var a1 = x - 2.35619449 + z * (0.12499612 + z * (0.00005650 + z * (-0.00637879 + z * (0.00074348 + z * (0.00079824 - z * 0.00029166)))));
        var root = 1 / Math.Sqrt(x);
        double below = f0 * root * Math.Cos(a0), here = f1 * root * Math.Cos(a1);
        values[0] = below;
        for (var n = 1; n < values.Length; n++)
        {
            values[n] = here;
            (below, here) = (here, 2 * n / x * here - below);
        }
    }
}
