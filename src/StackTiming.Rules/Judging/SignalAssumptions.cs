using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Judging;

/// <summary>What is assumed of signals where parts and rules say nothing: the key <c>assume</c> of a board file.</summary>
/// <param name="RiseSeconds">Rise time of drivers without a model, s, or null.</param>
/// <param name="FrequencyHertz">Frequency at which Dk and Df are taken, Hz, or null for the values as stated.</param>
/// <param name="Reference">Load of the driver alone against which flight time counts, or null for 50 ohm to half of its swing.</param>
public sealed record SignalAssumptions(double? RiseSeconds, double? FrequencyHertz, AssumedLoad? Reference)
{
    /// <summary>Nothing stated.</summary>
    public static SignalAssumptions None { get; } = new(null, null, null);

    /// <summary>Reads the key <c>assume</c>.</summary>
    /// <param name="reader">The board file's mapping.</param>
    public static SignalAssumptions Read(MapReader reader)
    {
        if (reader.Map("assume") is not { } map)
            return None;
        var rise = map.Quantity("rise", Dimension.Time, QuantityRange.Positive)?.Value;
        var frequency = map.Quantity("frequency", Dimension.Frequency, QuantityRange.Positive)?.Value;
        var load = map.Map("reference-load") is { } inner ? AssumedLoad.Read(inner) : null;
        map.Finish();
        return new SignalAssumptions(rise, frequency, load);
    }
}

/// <summary>A load on a driver alone.</summary>
/// <param name="ResistanceOhms">Resistance, ohm, or null for none.</param>
/// <param name="ToVolts">Voltage that the resistance goes to, V, or null for half of the driver's swing.</param>
/// <param name="CapacitanceFarad">Capacitance to ground, F.</param>
public sealed record AssumedLoad(double? ResistanceOhms, double? ToVolts, double CapacitanceFarad)
{
    /// <summary>50 ohm to half of the swing: a driver always crosses its middle into it (common practice).</summary>
    public static AssumedLoad Usual { get; } = new(50, null, 0);

    /// <summary>Reads a load.</summary>
    /// <param name="map">The mapping.</param>
    public static AssumedLoad Read(MapReader map)
    {
        var resistance = map.Quantity("resistance", Dimension.Resistance, QuantityRange.Positive)?.Value;
        var to = map.Quantity("to", Dimension.Voltage, QuantityRange.Any)?.Value;
        var capacitance = map.Quantity("capacitance", Dimension.Capacitance, QuantityRange.NotNegative)?.Value ?? 0;
        if (resistance is null && to is not null)
            map.Problems.Error(map.PositionOf("to"), "'to' needs a 'resistance'", "write { resistance: 50 ohm, to: 0.6 V }");
        map.Finish();
        return new AssumedLoad(resistance, to, capacitance);
    }
}
