using System.Globalization;

namespace StackTiming.Nets.Lengths;

/// <summary>
/// Reads plain decimal numbers quickly: up to 15 digits with or without a point, which a double and one exact division by a power of ten hold
/// without rounding twice (Clinger 1990, the fast path). Everything else goes to the library.
/// </summary>
internal static class NumberText
{
    private static ReadOnlySpan<double> PowersOfTen =>
        [1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15];

    /// <summary>Reads a number.</summary>
    /// <param name="text">Text without spaces around it.</param>
    /// <param name="value">The number; may be infinite or NaN where the text says so.</param>
    /// <returns>False where the text is not a number.</returns>
    public static bool TryParse(ReadOnlySpan<char> text, out double value)
    {
        if (text.Length is > 0 and <= 16)
        {
            long digits = 0;
            var count = 0;
            var decimals = -1;
            foreach (var c in text)
            {
                var digit = (uint)(c - '0');
                if (digit <= 9)
                {
                    digits = digits * 10 + digit;
                    count++;
                }
                else if (c == '.' && decimals < 0)
                    decimals = count;
                else
                    return TryParseSlowly(text, out value);
            }
            if (count is > 0 and <= 15)
            {
                value = decimals < 0 ? digits : digits / PowersOfTen[count - decimals];
                return true;
            }
        }
        return TryParseSlowly(text, out value);
    }

    private static bool TryParseSlowly(ReadOnlySpan<char> text, out double value) =>
        double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out value);
}
