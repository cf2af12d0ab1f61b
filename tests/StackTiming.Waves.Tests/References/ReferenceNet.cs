using System.Text.Json;
using StackTiming.Waves.Networks;

namespace StackTiming.Waves.Tests.References;

/// <summary>
/// A response of tests/references/waves: computed by an independent code from the exact nodal solution in the complex-frequency plane, inverted numerically
/// (see the README there).
/// </summary>
public sealed record ReferenceNet(string Name, Network Network, JsonElement Metrics, double[] Times, Dictionary<string, double[]> Volts, double Swing)
{
    public static IEnumerable<string> Names => Directory.GetFiles(Folder, "*.json").Select(f => Path.GetFileNameWithoutExtension(f)!).Order(StringComparer.Ordinal);

    public static ReferenceNet Load(string name)
    {
        var root = JsonDocument.Parse(File.ReadAllText(Path.Combine(Folder, name + ".json"))).RootElement;
        var net = root.GetProperty("net");
        var builder = new NetworkBuilder();
        var d = net.GetProperty("driver");
        DriverPackage? package = d.TryGetProperty("package", out var p) ? new DriverPackage(Number(p, "inductance") ?? 0, Number(p, "capacitance") ?? 0) : null;
        var driver = new Driver(builder.Node(d.GetProperty("at").GetString()!), Need(d, "low"), Need(d, "high"), Need(d, "resistance"), package);
        foreach (var line in List(net, "lines"))
        {
            var (from, to) = (line.GetProperty("from").GetString()!, line.GetProperty("to").GetString()!);
            if (Number(line, "z0") is { } z0)
                builder.Line(from, to, z0, Need(line, "delay"));
            else
                builder.LossyLine(from, to, Need(line, "length"), new LossyLineConstants(
                    Need(line, "l"), Need(line, "c"), Number(line, "r-dc") ?? 0, Number(line, "r-skin") ?? 0, Number(line, "df") ?? 0, Number(line, "at") ?? 1e9));
        }
        foreach (var pair in List(net, "coupled-lines"))
        {
            var from = pair.GetProperty("from").EnumerateArray().Select(e => builder.Node(e.GetString()!)).ToArray();
            var to = pair.GetProperty("to").EnumerateArray().Select(e => builder.Node(e.GetString()!)).ToArray();
            builder.Coupled(CoupledLines.SymmetricPair(
                (from[0], from[1]), (to[0], to[1]), Need(pair, "z-even"), Need(pair, "z-odd"), Need(pair, "delay-even"), Need(pair, "delay-odd")));
        }
        foreach (var s in List(net, "series"))
            builder.SeriesElement(s.GetProperty("from").GetString()!, s.GetProperty("to").GetString()!, Number(s, "resistance") ?? 0, Number(s, "inductance") ?? 0, Number(s, "capacitance"));
        foreach (var s in List(net, "shunts"))
            builder.ShuntElement(s.GetProperty("at").GetString()!, Number(s, "capacitance") ?? 0, Number(s, "resistance"), Number(s, "to") ?? 0);
        foreach (var r in List(net, "receivers"))
        {
            Thresholds? levels = Number(r, "threshold") is { } mid ? new Thresholds(Need(r, "vil"), Need(r, "vih"), mid) : null;
            builder.Receiver(r.GetProperty("at").GetString()!, Number(r, "capacitance") ?? 0, levels, Number(r, "resistance"), Number(r, "to") ?? 0);
        }
        ReferenceLoad? load = net.TryGetProperty("reference-load", out var l) ? new ReferenceLoad(Number(l, "resistance"), Number(l, "to") ?? 0, Number(l, "capacitance") ?? 0) : null;
        var rise = Need(d, "rise");
        var fall = Number(d, "fall") ?? rise;
        var stimulus = net.GetProperty("edge").GetString() switch
        {
            "rise" => new Stimulus(Edge.Rise, rise, fall, [], 0),
            "fall" => new Stimulus(Edge.Fall, rise, fall, [], 0),
            _ => new Stimulus(Edge.Pattern, rise, fall, [.. net.GetProperty("pattern").GetString()!.Select(c => c == '1')], Need(net, "bit")),
        };
        var network = builder.Build(driver, stimulus, Need(root, "duration"), load);
        var waveforms = root.GetProperty("waveforms");
        return new ReferenceNet(
            name, network, root.GetProperty("metrics"), Numbers(waveforms.GetProperty("time_s")),
            waveforms.EnumerateObject().Where(w => w.Name != "time_s").ToDictionary(w => w.Name, w => Numbers(w.Value)), driver.HighVolts - driver.LowVolts);
    }

    private static string Folder
    {
        get
        {
            var folder = AppContext.BaseDirectory;
            while (!File.Exists(Path.Combine(folder, "StackTiming.sln")))
                folder = Path.GetDirectoryName(folder)!;
            return Path.Combine(folder, "tests", "references", "waves", "visible");
        }
    }

    private static double Need(JsonElement element, string key) => element.GetProperty(key).GetDouble();

    private static double? Number(JsonElement element, string key) => element.TryGetProperty(key, out var value) ? value.GetDouble() : null;

    private static JsonElement.ArrayEnumerator List(JsonElement element, string key) => element.TryGetProperty(key, out var list) ? list.EnumerateArray() : default;

    private static double[] Numbers(JsonElement list) => [.. list.EnumerateArray().Select(v => v.GetDouble())];
}
