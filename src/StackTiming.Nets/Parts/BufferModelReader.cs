using System.Collections.Immutable;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Parts;

/// <summary>Reads drivers, receivers, terminations and packages. Each method reports the keys that it does not know.</summary>
public static class BufferModelReader
{
    /// <summary>Reads a buffer model.</summary>
    /// <param name="name">Its name.</param>
    /// <param name="map">Its mapping.</param>
    /// <returns>The model, or null with problems.</returns>
    public static BufferModel? Read(string name, MapReader map)
    {
        var before = map.Problems.ErrorCount;
        if (map.Has("file"))
        {
            map.Text("file");
            map.Text("model");
            map.Text("corner");
            map.Finish();
            map.Problems.Error(
                map.PositionOf("file"), "buffer-model files are not read yet",
                "write the model's figures: driver: { low: 0 V, high: 1.2 V, resistance: 34 ohm, rise: 150 ps }, receiver: { capacitance: 1.4 pF, vil: 0.45 V, vih: 0.75 V }");
            return null;
        }
        var driver = map.Map("driver") is { } driverMap ? ReadDriver(driverMap) : null;
        var receiver = map.Map("receiver") is { } receiverMap ? ReadReceiver(receiverMap) : null;
        if (!map.Has("driver") && !map.Has("receiver"))
            map.Problems.Error(map.At, $"the model '{Suggestion.Shorten(name)}' neither drives nor receives", "write driver: { … }, receiver: { … } or both");
        map.Finish();
        return map.Problems.ErrorCount == before ? new BufferModel(name, map.At, driver, receiver) : null;
    }

    /// <summary>Reads a driver.</summary>
    /// <param name="map">Its mapping.</param>
    /// <returns>The driver, or null with problems.</returns>
    public static DriverModel? ReadDriver(MapReader map)
    {
        var before = map.Problems.ErrorCount;
        var low = map.Quantity("low", Dimension.Voltage, QuantityRange.Any) ?? Quantity.Exact(0);
        var high = map.NeedQuantity("high", Dimension.Voltage, QuantityRange.Any, "high: 1.2 V");
        var resistance = map.NeedQuantity("resistance", Dimension.Resistance, QuantityRange.Positive, "resistance: 34 ohm ±15 %");
        var rise = map.NeedQuantity("rise", Dimension.Time, QuantityRange.Positive, "rise: 150 ps, the 0–100 % ramp of the open-circuit source");
        var fall = map.Quantity("fall", Dimension.Time, QuantityRange.Positive);
        var capacitance = map.Quantity("capacitance", Dimension.Capacitance, QuantityRange.NotNegative) ?? Quantity.Exact(0);
        var package = ReadPackage(map);
        if (high is { } top && top.Value <= low.Value)
            map.Problems.Error(map.PositionOf("high"), "'high' must be above 'low'", "swap the two, or check the units");
        map.Finish();
        return map.Problems.ErrorCount == before
            ? new DriverModel(low, high!.Value, resistance!.Value, rise!.Value, fall ?? rise.Value, capacitance, package)
            : null;
    }

    /// <summary>Reads a receiver.</summary>
    /// <param name="map">Its mapping.</param>
    /// <returns>The receiver, or null with problems.</returns>
    public static ReceiverModel? ReadReceiver(MapReader map)
    {
        var before = map.Problems.ErrorCount;
        var capacitance = map.Quantity("capacitance", Dimension.Capacitance, QuantityRange.NotNegative) ?? Quantity.Exact(0);
        var vil = map.Quantity("vil", Dimension.Voltage, QuantityRange.Any);
        var vih = map.Quantity("vih", Dimension.Voltage, QuantityRange.Any);
        var threshold = map.Quantity("threshold", Dimension.Voltage, QuantityRange.Any);
        var terminations = ReadTerminations(map);
        var package = ReadPackage(map);
        if (vil is null != vih is null)
        {
            var absent = vil is null ? "vil" : "vih";
            map.Problems.Error(map.At, $"'{absent}' is missing beside '{(vil is null ? "vih" : "vil")}'", $"write both levels, such as vil: 0.45 V, vih: 0.75 V");
        }
        if (vil is { } lower && vih is { } upper)
        {
            if (lower.Value >= upper.Value)
                map.Problems.Error(map.PositionOf("vil"), "'vil' must be below 'vih'", "swap the two, or check the units");
            else if (threshold is { } middle && (middle.Value < lower.Value || middle.Value > upper.Value))
                map.Problems.Error(map.PositionOf("threshold"), "'threshold' must lie between 'vil' and 'vih'", "check the three levels");
        }
        map.Finish();
        return map.Problems.ErrorCount == before ? new ReceiverModel(capacitance, vil, vih, threshold, terminations, package) : null;
    }

    /// <summary>Reads the <c>termination</c> of a mapping: one resistor, or a list of them.</summary>
    /// <param name="map">The mapping of a receiver or pin.</param>
    public static ImmutableArray<Termination> ReadTerminations(MapReader map)
    {
        var terminations = ImmutableArray.CreateBuilder<Termination>();
        foreach (var node in map.List("termination"))
        {
            if (map.MapOf(node, "termination") is not { } inner)
                continue;
            var before = map.Problems.ErrorCount;
            var resistance = inner.NeedQuantity("resistance", Dimension.Resistance, QuantityRange.Positive, "termination: { resistance: 50 ohm, to: 0.6 V }");
            var to = inner.NeedQuantity("to", Dimension.Voltage, QuantityRange.Any, "the voltage that the resistor goes to, such as to: 0.6 V or to: 0 V");
            var capacitance = inner.Quantity("capacitance", Dimension.Capacitance, QuantityRange.Positive);
            inner.Finish();
            if (map.Problems.ErrorCount == before)
                terminations.Add(new Termination(resistance!.Value, to!.Value.Value, capacitance?.Value));
        }
        return terminations.DrainToImmutable();
    }

    private static PackageModel? ReadPackage(MapReader map)
    {
        if (map.Map("package") is not { } package)
            return null;
        var inductance = package.Quantity("inductance", Dimension.Inductance, QuantityRange.NotNegative);
        var capacitance = package.Quantity("capacitance", Dimension.Capacitance, QuantityRange.NotNegative);
        package.Finish();
        return new PackageModel(inductance?.Value ?? 0, capacitance?.Value ?? 0);
    }
}
