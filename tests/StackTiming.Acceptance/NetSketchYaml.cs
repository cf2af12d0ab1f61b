using System.Globalization;
using System.Text;
using System.Text.Json;

namespace StackTiming.Acceptance;

/// <summary>Writes a reference net (plain SI numbers) as a net sketch with units.</summary>
public static class NetSketchYaml
{
    private static readonly Dictionary<string, string> Units = new()
    {
        ["low"] = "V",
        ["high"] = "V",
        ["resistance"] = "ohm",
        ["rise"] = "s",
        ["fall"] = "s",
        ["inductance"] = "H",
        ["capacitance"] = "F",
        ["z0"] = "ohm",
        ["delay"] = "s",
        ["length"] = "m",
        ["l"] = "H/m",
        ["c"] = "F/m",
        ["r-dc"] = "ohm/m",
        ["r-skin"] = "ohm/m/sqrtHz",
        ["z-even"] = "ohm",
        ["z-odd"] = "ohm",
        ["delay-even"] = "s",
        ["delay-odd"] = "s",
        ["vil"] = "V",
        ["vih"] = "V",
        ["threshold"] = "V",
        ["bit"] = "s",
        ["duration"] = "s",
    };

    /// <summary>The sketch.</summary>
    public static string From(JsonElement reference)
    {
        var text = new StringBuilder("format: 1\n");
        foreach (var entry in reference.GetProperty("net").EnumerateObject())
            text.Append(entry.Name).Append(": ").Append(Value(entry.Name, entry.Value)).Append('\n');
        text.Append("duration: ").Append(Value("duration", reference.GetProperty("duration"))).Append('\n');
        return text.ToString();
    }

    private static string Value(string key, JsonElement value) => value.ValueKind switch
    {
        JsonValueKind.Object => "{ " + string.Join(", ", value.EnumerateObject().Select(e => $"{e.Name}: {Value(e.Name, e.Value)}")) + " }",
        JsonValueKind.Array => "[ " + string.Join(", ", value.EnumerateArray().Select(e => Value(key, e))) + " ]",
        JsonValueKind.Number => value.GetDouble().ToString("G12", CultureInfo.InvariantCulture) + UnitOf(key),
        _ => $"\"{value.GetString()}\"",
    };

    // `at` is a node or the frequency of Df, `to` a node or a voltage: the numeric ones are frequency and voltage.
    private static string UnitOf(string key) => key switch
    {
        "at" => " Hz",
        "to" => " V",
        _ => Units.TryGetValue(key, out var unit) ? " " + unit : "",
    };
}
