using System.Globalization;

namespace StackTiming.Stackups.Quantities;

/// <summary>Writes SI values in the trade's units, with a fixed number of significant digits.</summary>
public static class QuantityFormat
{
    private static readonly (double Factor, string Prefix)[] Prefixes =
        [(1e12, "T"), (1e9, "G"), (1e6, "M"), (1e3, "k"), (1, ""), (1e-3, "m"), (1e-6, "µ"), (1e-9, "n"), (1e-12, "p"), (1e-15, "f")];

    /// <summary>A value with its unit and the prefix that leaves one to three digits before the point, such as <c>41.2 ps</c>.</summary>
    /// <param name="value">Value in the SI unit.</param>
    /// <param name="unit">SI unit, such as <c>s</c>.</param>
    /// <param name="digits">Significant digits.</param>
    public static string Engineering(double value, string unit, int digits = 4)
    {
        var magnitude = Math.Abs(value);
        // The sign of a negative zero says nothing.
        if (magnitude == 0)
            return $"0 {unit}";
        if (!double.IsFinite(value))
            return $"{value.ToString(CultureInfo.InvariantCulture)} {unit}";
        var (factor, prefix) = Prefixes[^1];
        foreach (var candidate in Prefixes)
        {
            // Rounding must not leave 1000 of the smaller prefix.
            if (Significant(magnitude / candidate.Factor, digits) < 1)
                continue;
            (factor, prefix) = candidate;
            break;
        }
        return $"{Number(value / factor, digits)} {prefix}{unit}";
    }

    /// <summary>A number with a fixed count of significant digits, without exponent.</summary>
    /// <param name="value">The number.</param>
    /// <param name="digits">Significant digits.</param>
    public static string Number(double value, int digits)
    {
        if (value == 0)
            return "0";
        if (!double.IsFinite(value))
            return value.ToString(CultureInfo.InvariantCulture);
        var rounded = Significant(value, digits);
        var decimals = digits - 1 - (int)Math.Floor(Math.Log10(Math.Abs(rounded)));
        return rounded.ToString("F" + Math.Clamp(decimals, 0, 15).ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
    }

    private static double Significant(double value, int digits)
    {
        var scale = Math.Pow(10, digits - 1 - Math.Floor(Math.Log10(Math.Abs(value))));
        return double.IsFinite(scale) && scale > 0 ? Math.Round(value * scale) / scale : value;
    }
}
