namespace StackTiming.Stackups.Quantities;

/// <summary>Turns the text of a quantity (<c>75 um ±10 %</c>) into SI units.</summary>
public static class QuantityParser
{
    /// <summary>Reads a quantity of a given dimension.</summary>
    /// <param name="text">Text such as <c>75 um +8/-5 um</c>.</param>
    /// <param name="dimension">What it must measure.</param>
    /// <param name="defaults">Units for bare numbers.</param>
    /// <param name="quantity">The quantity in SI units.</param>
    /// <param name="problem">What is wrong, where the text is refused; empty otherwise.</param>
    /// <param name="advice">What to write instead, where the text is refused; empty otherwise.</param>
    public static bool TryParse(
        ReadOnlySpan<char> text, Dimension dimension, DefaultUnits defaults, out Quantity quantity, out string problem, out string advice)
    {
        // Replaced by the full grammar in the next commit.
        problem = "";
        advice = "";
        var ok = double.TryParse(text, System.Globalization.CultureInfo.InvariantCulture, out var value);
        quantity = Quantity.Exact(value);
        return ok && dimension == Dimension.None && defaults is not null;
    }
}
