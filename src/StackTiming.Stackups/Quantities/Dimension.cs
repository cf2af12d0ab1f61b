namespace StackTiming.Stackups.Quantities;

/// <summary>What a quantity measures; decides which units a file may write. Values are kept in the SI unit named here.</summary>
public enum Dimension
{
    /// <summary>A pure number, such as Dk or Df.</summary>
    None,
    /// <summary>A share; written in percent, kept as a fraction (3 % is 0.03).</summary>
    Ratio,
    /// <summary>Metres. Copper weight in ounces per square foot is a length too (see the reader).</summary>
    Length,
    /// <summary>Seconds.</summary>
    Time,
    /// <summary>Hertz.</summary>
    Frequency,
    /// <summary>Volts.</summary>
    Voltage,
    /// <summary>Amperes.</summary>
    Current,
    /// <summary>Ohms.</summary>
    Resistance,
    /// <summary>Farads.</summary>
    Capacitance,
    /// <summary>Henries.</summary>
    Inductance,
    /// <summary>Ohm metres.</summary>
    Resistivity,
    /// <summary>Decibels.</summary>
    Decibel,
    /// <summary>Kelvin of temperature difference, or degrees Celsius of temperature.</summary>
    Temperature,
    /// <summary>Farads per metre.</summary>
    CapacitancePerLength,
    /// <summary>Henries per metre.</summary>
    InductancePerLength,
    /// <summary>Ohms per metre.</summary>
    ResistancePerLength,
    /// <summary>Ohms per metre and root hertz: the skin-effect coefficient of a line.</summary>
    SkinResistancePerLength,
    /// <summary>Seconds per metre.</summary>
    TimePerLength,
    /// <summary>Decibels per metre.</summary>
    DecibelPerLength,
}
