namespace StackTiming.Rules.Judging;

/// <summary>The values that a rule allows, in SI units; either side may be open.</summary>
/// <param name="Lower">Lowest value allowed, or null.</param>
/// <param name="Upper">Highest value allowed, or null.</param>
public readonly record struct Window(double? Lower, double? Upper)
{
    /// <summary>Everything up to a limit.</summary>
    /// <param name="upper">The limit.</param>
    public static Window AtMost(double upper) => new(null, upper);

    /// <summary>Everything from a limit on.</summary>
    /// <param name="lower">The limit.</param>
    public static Window AtLeast(double lower) => new(lower, null);

    /// <summary>Distance of a value to the nearest limit: positive inside, negative outside; infinite where no side is limited.</summary>
    /// <param name="value">The value.</param>
    public double Margin(double value) =>
        Math.Min(Lower is { } low ? value - low : double.PositiveInfinity, Upper is { } high ? high - value : double.PositiveInfinity);

    /// <summary>
    /// What a margin is measured against when findings are ranked: half of a two-sided window, otherwise the size of the limit; never zero.
    /// </summary>
    /// <param name="smallest">The least that it may be, for limits at zero.</param>
    public double Scale(double smallest)
    {
        var scale = Lower is { } low && Upper is { } high ? 0.5 * (high - low) : Math.Abs(Lower ?? Upper ?? 0);
        return Math.Max(scale, smallest);
    }

    /// <summary>The value inside that is nearest to a given one.</summary>
    /// <param name="value">The value.</param>
    public double Nearest(double value)
    {
        if (value < Lower)
            return Lower.Value;
        return value > Upper ? Upper.Value : value;
    }

    /// <summary>The window in words.</summary>
    /// <param name="unit">Unit of its figures.</param>
    public string Show(Findings.DisplayUnit unit) => (Lower, Upper) switch
    {
        ({ } low, { } high) => $"{unit.Show(low)} to {unit.Show(high)}",
        ({ } low, null) => $"at least {unit.Show(low)}",
        (null, { } high) => $"at most {unit.Show(high)}",
        _ => "anything",
    };
}
