namespace StackTiming.Reports.Figures;

/// <summary>Round values for the marks of an axis: steps of 1, 2 or 5 times a power of ten.</summary>
public static class NiceTicks
{
    /// <summary>The marks between two values.</summary>
    /// <param name="lowest">Lower end of the axis.</param>
    /// <param name="highest">Upper end of the axis.</param>
    /// <param name="wanted">About how many marks.</param>
    /// <returns>The marks, rising, and how many digits after the point they need.</returns>
    public static (double[] Values, int Decimals) Between(double lowest, double highest, int wanted)
    {
        var span = highest - lowest;
        if (!(span > 0) || !double.IsFinite(span))
            return ([lowest], 0);
        var rough = span / Math.Max(1, wanted);
        var power = Math.Pow(10, Math.Floor(Math.Log10(rough)));
        var step = power * ((rough / power) switch { < 1.5 => 1, < 3.5 => 2, < 7.5 => 5, _ => 10 });
        var first = Math.Ceiling(lowest / step - 1e-9);
        var last = Math.Floor(highest / step + 1e-9);
        var values = new double[(int)(last - first) + 1];
        for (var i = 0; i < values.Length; i++)
            values[i] = (first + i) * step;
        return (values, Math.Clamp(-(int)Math.Floor(Math.Log10(step) + 1e-9), 0, 12));
    }
}
