namespace StackTiming.Rules.Findings;

/// <summary>The unit in which a finding shows its figures.</summary>
/// <param name="Symbol">How it is written, such as <c>ps</c>; empty for a pure number.</param>
/// <param name="SiPerUnit">Factor from the unit to SI: 1e-12 for picoseconds.</param>
/// <param name="Decimals">Digits after the point that make sense in print.</param>
public readonly record struct DisplayUnit(string Symbol, double SiPerUnit, int Decimals)
{
    /// <summary>Picoseconds.</summary>
    public static DisplayUnit Picoseconds { get; } = new("ps", 1e-12, 2);

    /// <summary>Ohms.</summary>
    public static DisplayUnit Ohms { get; } = new("ohm", 1, 2);

    /// <summary>Millivolts.</summary>
    public static DisplayUnit Millivolts { get; } = new("mV", 1e-3, 1);

    /// <summary>Percent.</summary>
    public static DisplayUnit Percent { get; } = new("%", 1e-2, 2);

    /// <summary>Decibels.</summary>
    public static DisplayUnit Decibels { get; } = new("dB", 1, 3);

    /// <summary>Millimetres.</summary>
    public static DisplayUnit Millimetres { get; } = new("mm", 1e-3, 3);

    /// <summary>A pure number, such as a reflection coefficient.</summary>
    public static DisplayUnit None { get; } = new("", 1, 3);

    /// <summary>A count of things, such as segments or nets.</summary>
    public static DisplayUnit Count { get; } = new("", 1, 0);

    /// <summary>Turns an SI value into this unit.</summary>
    /// <param name="si">The value in SI units.</param>
    public double FromSi(double si) => si / SiPerUnit;

    /// <summary>Turns a value in this unit into SI.</summary>
    /// <param name="value">The value in this unit.</param>
    public double ToSi(double value) => value * SiPerUnit;

    /// <summary>An SI value as text in this unit, with the unit.</summary>
    /// <param name="si">The value in SI units.</param>
    public string Show(double si)
    {
        var number = FromSi(si).ToString("F" + Decimals.ToString(System.Globalization.CultureInfo.InvariantCulture), System.Globalization.CultureInfo.InvariantCulture);
        if (number.AsSpan().TrimStart('-').TrimStart("0.").IsEmpty)
            number = number.TrimStart('-');
        return Symbol.Length == 0 ? number : number + " " + Symbol;
    }
}
