using System.Globalization;
using System.Text;

namespace StackTiming.Benchmarks;

/// <summary>
/// Writes a large invented board: nets of six rows each on an eight-layer stack-up, forty distinct cross-sections, a driver and a receiver a
/// net, and four hundred rules (at most one per fifty nets). The same count gives the same bytes.
/// </summary>
public static class GeneratedBoard
{
    private const int NetsPerGroup = 50;
    private static readonly string[] SignalLayers = ["L1", "L3", "L6", "L8"];

    /// <summary>Writes the board's files into a folder and gives the path of the board file.</summary>
    /// <param name="folder">Where to; made if missing.</param>
    /// <param name="nets">How many nets.</param>
    public static string Write(string folder, int nets)
    {
        Directory.CreateDirectory(folder);
        File.WriteAllText(Path.Combine(folder, "large.stackup.yaml"), StackUp);
        WriteLengths(Path.Combine(folder, "large.lengths.csv"), nets);
        File.WriteAllText(Path.Combine(folder, "large.parts.yaml"), Parts(nets));
        File.WriteAllText(Path.Combine(folder, "large.rules.yaml"), Rules(nets));
        var board = Path.Combine(folder, "board.yaml");
        File.WriteAllText(board, $"""
            format: 1
            name: Generated board of {nets} nets
            revision: A
            stackup: large.stackup.yaml
            lengths: large.lengths.csv
            parts: large.parts.yaml
            rules: large.rules.yaml

            """);
        return board;
    }

    private static void WriteLengths(string path, int nets)
    {
        using var writer = new StreamWriter(path, append: false, new UTF8Encoding(false), 1 << 20);
        writer.Write("net,from,to,kind,layer,length[mm],width[mm],drill[mm],pad[mm],antipad[mm]\n");
        for (var n = 0; n < nets; n++)
        {
            var layer = SignalLayers[n % 4];
            // Ten widths on each of four layers: forty cross-sections.
            var width = 0.090 + (0.004 * (n / 4 % 10));
            var length = 20 + (0.37 * (n % 61));
            var inner = SignalLayers[(n + 1) % 4];
            var name = string.Create(CultureInfo.InvariantCulture, $"N{n:000000}");
            var w = width.ToString("0.000", CultureInfo.InvariantCulture);
            Trace(writer, name, $"U1.P{n}", "*1", layer, 2.5, w);
            writer.Write($"{name},*1,*2,via,{layer}>{inner},,,0.2,0.45,0.7\n");
            Trace(writer, name, "*2", "*3", inner, length, w);
            Trace(writer, name, "*3", "*4", inner, length / 3, w);
            writer.Write($"{name},*4,*5,via,{inner}>{layer},,,0.2,0.45,0.7\n");
            Trace(writer, name, "*5", $"U2.P{n}", layer, 3.5, w);
        }
    }

    private static void Trace(StreamWriter writer, string net, string from, string to, string layer, double length, string width) =>
        writer.Write(string.Create(CultureInfo.InvariantCulture, $"{net},{from},{to},trace,{layer},{length:0.000},{width},,,\n"));

    private static string Parts(int nets) => $$"""
        format: 1
        models:
          io-out:
            driver: { low: 0 V, high: 1.2 V, resistance: 40 ohm, rise: 200 ps, fall: 200 ps }
          io-in:
            receiver: { capacitance: 1.5 pF, vil: 0.42 V, vih: 0.78 V, threshold: 0.6 V }
        parts:
          U1: { pins: { {{Pins(nets, "io-out")}} } }
          U2: { pins: { {{Pins(nets, "io-in")}} } }

        """;

    // A range stands for 100 000 names at most.
    private static string Pins(int nets, string model) => string.Join(
        ", ",
        Enumerable.Range(0, (nets + 49_999) / 50_000).Select(i => $"\"P{50_000 * i}..P{Math.Min(nets, 50_000 * (i + 1)) - 1}\": {{ model: {model} }}"));

    private static string Rules(int nets)
    {
        var text = new StringBuilder("format: 1\ngroups:\n");
        var groups = nets / NetsPerGroup;
        for (var g = 0; g < groups; g++)
            text.Append(CultureInfo.InvariantCulture, $"  g{g}: {{ nets: \"N[{g * NetsPerGroup:000000}..{(g * NetsPerGroup) + NetsPerGroup - 1:000000}]\" }}\n");
        text.Append("rules:\n");
        for (var g = 0; g < groups; g++)
        {
            text.Append(CultureInfo.InvariantCulture, $"  - {{ id: R{g}, nets: g{g}, severity: must, reason: benchmark, source: invented, ");
            text.Append((g % 4) switch
            {
                0 => "kind: match, within: 400 ps",
                1 => "kind: impedance, target: 50 ohm ±25 %",
                2 => "kind: flight-time, max: 900 ps",
                _ => "kind: ringback, margin: 10 mV",
            });
            text.Append(" }\n");
        }
        return text.ToString();
    }

    private const string StackUp = """
        format: 1
        name: Generated eight layers
        units: { length: um }
        dielectrics:
          core-a: { dk: 3.95 ±3 %, df: 0.016, at: 1 GHz }
          prepreg-a: { dk: 3.70 ±5 %, df: 0.018, at: 1 GHz }
          mask-a: { dk: 3.5, df: 0.025, at: 1 GHz }
        copper: { resistivity: 1.72e-8 ohm m, roughness: 1.2 um, etch-factor: 2.5 }
        layers:
          - { mask: mask-a, over-laminate: 25, over-copper: 15 }
          - { copper: L1, thickness: 45, use: signal }
          - { prepreg: prepreg-a, thickness: 75 }
          - { copper: L2, thickness: 15.2, use: plane }
          - { core: core-a, thickness: 100 }
          - { copper: L3, thickness: 15.2, use: signal }
          - { prepreg: prepreg-a, thickness: 200 }
          - { copper: L4, thickness: 15.2, use: plane }
          - { core: core-a, thickness: 660 }
          - { copper: L5, thickness: 15.2, use: plane }
          - { prepreg: prepreg-a, thickness: 200 }
          - { copper: L6, thickness: 15.2, use: signal }
          - { core: core-a, thickness: 100 }
          - { copper: L7, thickness: 15.2, use: plane }
          - { prepreg: prepreg-a, thickness: 75 }
          - { copper: L8, thickness: 45, use: signal }
          - { mask: mask-a, over-laminate: 25, over-copper: 15 }

        """;
}
