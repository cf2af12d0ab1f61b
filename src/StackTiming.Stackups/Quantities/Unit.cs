namespace StackTiming.Stackups.Quantities;

/// <summary>A unit as a file may write it.</summary>
/// <param name="Dimension">What it measures.</param>
/// <param name="Factor">What turns a number in this unit into the SI unit of the dimension.</param>
public readonly record struct Unit(Dimension Dimension, double Factor)
{
    /// <summary>
    /// Thickness of copper of one ounce per square foot, metres. 305.15 g/m² over 8.93 to 8.96 g/cm³ is 34.1 to 34.2 µm; the trade rounds
    /// it to 1.37 mil = 34.8 µm (common practice), which is what fabricators quote.
    /// </summary>
    public const double OunceMetres = 34.8e-6;

    /// <summary>Reads the name of a unit: a prefix and a base unit, or two of them with a solidus.</summary>
    /// <param name="name">Name such as <c>um</c>, <c>kohm</c>, <c>ps/mm</c>, <c>ohm m</c>.</param>
    /// <param name="unit">The unit.</param>
    public static bool TryParse(ReadOnlySpan<char> name, out Unit unit)
    {
        unit = default;
        name = name.Trim();
        if (name.IsEmpty || name.Length > 24)
            return false;
        if (name is "oz/ft2" or "oz/ft²")
            return TrySingle("oz", out unit);
        if (name.EndsWith("/sqrtHz", StringComparison.Ordinal) || name.EndsWith("/sqrt(Hz)", StringComparison.Ordinal) || name.EndsWith("/√Hz", StringComparison.Ordinal))
        {
            var rest = name[..name.LastIndexOf('/')];
            if (!TryParse(rest, out var perLength) || perLength.Dimension != Dimension.ResistancePerLength)
                return false;
            unit = perLength with { Dimension = Dimension.SkinResistancePerLength };
            return true;
        }
        var solidus = name.LastIndexOf('/');
        if (solidus > 0)
            return TryPerLength(name[..solidus], name[(solidus + 1)..], out unit);
        var blank = name.LastIndexOfAny(" ·⋅*-");
        if (blank > 0)
            return TryResistivity(name[..blank], name[(blank + 1)..], out unit);
        return TrySingle(name, out unit);
    }

    private static bool TryPerLength(ReadOnlySpan<char> above, ReadOnlySpan<char> below, out Unit unit)
    {
        unit = default;
        if (!TrySingle(above, out var top) || !TrySingle(below, out var bottom) || bottom.Dimension != Dimension.Length)
            return false;
        Dimension? dimension = top.Dimension switch
        {
            Dimension.Capacitance => Dimension.CapacitancePerLength,
            Dimension.Inductance => Dimension.InductancePerLength,
            Dimension.Resistance => Dimension.ResistancePerLength,
            Dimension.Time => Dimension.TimePerLength,
            Dimension.Decibel => Dimension.DecibelPerLength,
            _ => null,
        };
        if (dimension is not { } found)
            return false;
        unit = new Unit(found, top.Factor / bottom.Factor);
        return true;
    }

    private static bool TryResistivity(ReadOnlySpan<char> left, ReadOnlySpan<char> right, out Unit unit)
    {
        var ok = TrySingle(left, out var a) & TrySingle(right, out var b) && a.Dimension == Dimension.Resistance && b.Dimension == Dimension.Length;
        unit = new Unit(Dimension.Resistivity, a.Factor * b.Factor);
        return ok;
    }

    private static bool TrySingle(ReadOnlySpan<char> name, out Unit unit)
    {
        if (TryWhole(name.Trim(), out unit))
            return true;
        name = name.Trim();
        if (name.Length < 2 || !TryPrefix(name[0], out var power) || !TryBase(name[1..], out var plain))
            return false;
        unit = plain with { Factor = plain.Factor * power };
        return true;
    }

    // Units that take no prefix, and base units by themselves.
    private static bool TryWhole(ReadOnlySpan<char> name, out Unit unit)
    {
        Unit? found = name switch
        {
            "in" or "inch" => new(Dimension.Length, 25.4e-3),
            "mil" or "mils" => new(Dimension.Length, 25.4e-6),
            "oz" => new(Dimension.Length, OunceMetres),
            "%" => new(Dimension.Ratio, 0.01),
            "ppm" => new(Dimension.Ratio, 1e-6),
            "dB" => new(Dimension.Decibel, 1),
            "degC" or "°C" or "K" => new(Dimension.Temperature, 1),
            _ => null,
        };
        unit = found ?? default;
        return found is not null || TryBase(name, out unit);
    }

    private static bool TryBase(ReadOnlySpan<char> name, out Unit unit)
    {
        Unit? found = name switch
        {
            "m" => new(Dimension.Length, 1),
            "s" => new(Dimension.Time, 1),
            "Hz" => new(Dimension.Frequency, 1),
            "V" => new(Dimension.Voltage, 1),
            "A" => new(Dimension.Current, 1),
            "ohm" or "Ohm" or "ohms" or "Ω" or "\u2126" => new(Dimension.Resistance, 1),
            "F" => new(Dimension.Capacitance, 1),
            "H" => new(Dimension.Inductance, 1),
            _ => null,
        };
        unit = found ?? default;
        return found is not null;
    }

    private static bool TryPrefix(char prefix, out double power)
    {
        power = prefix switch
        {
            'f' => 1e-15,
            'p' => 1e-12,
            'n' => 1e-9,
            'u' or 'µ' or 'μ' => 1e-6,
            'm' => 1e-3,
            'c' => 1e-2,
            'k' => 1e3,
            'M' => 1e6,
            'G' => 1e9,
            'T' => 1e12,
            _ => 0,
        };
        return power != 0;
    }
}
