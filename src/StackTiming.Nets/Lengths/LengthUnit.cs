namespace StackTiming.Nets.Lengths;

/// <summary>Units of length as the headers and cells of length lists write them, foreign ones in any case and with plural.</summary>
public static class LengthUnit
{
    /// <summary>What a message lists as accepted.</summary>
    public const string Accepted = "m, cm, mm, um, nm, in, mil";

    /// <summary>The factor from a unit to metres, or null where it is not a unit of length.</summary>
    /// <param name="unit">Text such as <c>mil</c> or <c>µm</c>.</param>
    public static double? FactorOf(ReadOnlySpan<char> unit)
    {
        Span<char> lower = stackalloc char[8];
        var length = unit.Length <= lower.Length ? unit.ToLowerInvariant(lower) : -1;
        return length < 0 ? null : lower[..length] switch
        {
            "m" => 1,
            "cm" => 1e-2,
            "mm" => 1e-3,
            // micro sign and Greek mu
            "um" or "\u00b5m" or "\u03bcm" => 1e-6,
            "nm" => 1e-9,
            "in" or "inch" or "inches" or "\"" => 0.0254,
            "mil" or "mils" or "thou" => 2.54e-5,
            _ => null,
        };
    }
}
