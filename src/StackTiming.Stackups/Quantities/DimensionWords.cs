namespace StackTiming.Stackups.Quantities;

/// <summary>What messages call a dimension, and the units they propose for it.</summary>
public static class DimensionWords
{
    /// <summary>The dimension in words, such as "a length".</summary>
    /// <param name="dimension">The dimension.</param>
    public static string Name(Dimension dimension) => dimension switch
    {
        Dimension.None => "a plain number",
        Dimension.Ratio => "a share in percent",
        Dimension.Length => "a length",
        Dimension.Time => "a time",
        Dimension.Frequency => "a frequency",
        Dimension.Voltage => "a voltage",
        Dimension.Current => "a current",
        Dimension.Resistance => "a resistance",
        Dimension.Capacitance => "a capacitance",
        Dimension.Inductance => "an inductance",
        Dimension.Resistivity => "a resistivity",
        Dimension.Decibel => "a level in dB",
        Dimension.Temperature => "a temperature",
        Dimension.CapacitancePerLength => "a capacitance per length",
        Dimension.InductancePerLength => "an inductance per length",
        Dimension.ResistancePerLength => "a resistance per length",
        Dimension.SkinResistancePerLength => "a skin-effect coefficient",
        Dimension.TimePerLength => "a delay per length",
        Dimension.DecibelPerLength => "an attenuation per length",
        _ => throw new ArgumentOutOfRangeException(nameof(dimension)),
    };

    /// <summary>Units that a file may write for it, the usual ones first.</summary>
    /// <param name="dimension">The dimension.</param>
    public static IReadOnlyList<string> Units(Dimension dimension) => dimension switch
    {
        Dimension.None => [],
        Dimension.Ratio => ["%"],
        Dimension.Length => ["um", "mm", "mil", "in", "m", "nm", "oz"],
        Dimension.Time => ["ps", "ns", "fs", "s"],
        Dimension.Frequency => ["GHz", "MHz", "kHz", "Hz"],
        Dimension.Voltage => ["V", "mV"],
        Dimension.Current => ["mA", "A"],
        Dimension.Resistance => ["ohm", "mohm", "kohm"],
        Dimension.Capacitance => ["pF", "fF", "nF", "uF", "F"],
        Dimension.Inductance => ["nH", "pH", "uH", "H"],
        Dimension.Resistivity => ["ohm m"],
        Dimension.Decibel => ["dB"],
        Dimension.Temperature => ["degC"],
        Dimension.CapacitancePerLength => ["pF/m", "pF/in", "F/m"],
        Dimension.InductancePerLength => ["nH/m", "nH/in", "H/m"],
        Dimension.ResistancePerLength => ["ohm/m", "mohm/mm"],
        Dimension.SkinResistancePerLength => ["ohm/m/sqrtHz"],
        Dimension.TimePerLength => ["ps/mm", "ps/in", "ns/m"],
        Dimension.DecibelPerLength => ["dB/in", "dB/m"],
        _ => throw new ArgumentOutOfRangeException(nameof(dimension)),
    };
}
