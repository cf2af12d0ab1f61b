namespace StackTiming.Stackups.Quantities;

/// <summary>
/// A nominal value with its tolerance, in SI units. The value is always finite; readers reject NaN and infinities.
/// </summary>
/// <param name="Value">Nominal value in the SI unit of its dimension.</param>
/// <param name="Tolerance">Its tolerance, absolute, in the same unit.</param>
public readonly record struct Quantity(double Value, Tolerance Tolerance)
{
    /// <summary>A value without tolerance.</summary>
    /// <param name="value">Value in SI units.</param>
    public static Quantity Exact(double value) => new(value, Tolerance.None);

    /// <summary>Lowest value inside the tolerance.</summary>
    public double Lowest => Value - Tolerance.Minus;

    /// <summary>Highest value inside the tolerance.</summary>
    public double Highest => Value + Tolerance.Plus;
}
