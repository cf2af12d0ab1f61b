namespace StackTiming.Stackups.Quantities;

/// <summary>How the values of a toleranced quantity scatter between its bounds.</summary>
public enum Spread
{
    /// <summary>Normal, the bounds at three standard deviations. The default.</summary>
    ThreeSigma,
    /// <summary>Every value between the bounds equally likely.</summary>
    Uniform,
    /// <summary>Bounds that are never exceeded, with nothing known of what lies between: judged at the bounds.</summary>
    Limits,
}

/// <summary>The tolerance of a quantity, as absolute distances from its nominal value in the same SI unit.</summary>
/// <param name="Minus">How far the value may lie below nominal; not negative.</param>
/// <param name="Plus">How far the value may lie above nominal; not negative.</param>
/// <param name="Spread">How the values scatter between the bounds.</param>
public readonly record struct Tolerance(double Minus, double Plus, Spread Spread)
{
    /// <summary>No tolerance.</summary>
    public static Tolerance None => default;

    /// <summary>Equal bounds on both sides, normal at three sigma.</summary>
    /// <param name="distance">Distance from nominal in the SI unit of the quantity.</param>
    public static Tolerance Symmetric(double distance) => new(distance, distance, Spread.ThreeSigma);
}
