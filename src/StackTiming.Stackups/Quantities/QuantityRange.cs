namespace StackTiming.Stackups.Quantities;

/// <summary>Which values a key accepts, the bounds of their tolerance included.</summary>
/// <param name="Least">Lowest value in SI units.</param>
/// <param name="LeastAllowed">Whether the lowest value itself is accepted.</param>
/// <param name="Most">Highest value in SI units, itself accepted.</param>
/// <param name="Wording">What is said of a value outside, such as "must be above zero".</param>
public sealed record QuantityRange(double Least, bool LeastAllowed, double Most, string Wording)
{
    /// <summary>Any finite value.</summary>
    public static QuantityRange Any { get; } = new(double.NegativeInfinity, true, double.PositiveInfinity, "must be a number");

    /// <summary>Above zero.</summary>
    public static QuantityRange Positive { get; } = new(0, false, double.PositiveInfinity, "must be above zero");

    /// <summary>Zero or above.</summary>
    public static QuantityRange NotNegative { get; } = new(0, true, double.PositiveInfinity, "must not be negative");

    /// <summary>What is wrong with a quantity, or null where it is inside.</summary>
    /// <param name="quantity">The quantity.</param>
    public string? Objection(Quantity quantity)
    {
        if (!Contains(quantity.Value))
            return Wording;
        // A value inside whose tolerance leaves the range would yield boards that cannot exist once values are drawn from it.
        return Contains(quantity.Lowest) && Contains(quantity.Highest) ? null : Wording + " everywhere inside its tolerance";
    }

    private bool Contains(double value) => value <= Most && (LeastAllowed ? value >= Least : value > Least);
}
