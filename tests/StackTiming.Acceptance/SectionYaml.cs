using System.Globalization;
using System.Text;
using System.Text.Json;

namespace StackTiming.Acceptance;

/// <summary>Writes a reference cross-section (millimetres, layers from the bottom) as a section file with its stack-up inline.</summary>
public static class SectionYaml
{
    private sealed record Strip(string Name, bool Grounded, double X, double Wide, double Narrow, double Thickness, double Bottom, bool Down);

    /// <summary>The section file.</summary>
    public static string From(JsonElement reference)
    {
        var slabs = reference.GetProperty("layers").EnumerateArray().Select((l, i) => (
            Name: l.GetProperty("name").GetString()!,
            Eps: l.GetProperty("eps").GetDouble(),
            Bottom: l.GetProperty("y_bottom").GetDouble(),
            Top: l.GetProperty("y_top").ValueKind == JsonValueKind.Null ? double.PositiveInfinity : l.GetProperty("y_top").GetDouble())).ToList();
        var strips = reference.GetProperty("conductors").EnumerateArray().Select((c, i) => new Strip(
            c.TryGetProperty("name", out var name) ? name.GetString()! : $"n{i + 1}",
            c.GetProperty("role").GetString() == "ground",
            c.GetProperty("x_center").GetDouble(), c.GetProperty("w_base").GetDouble(), c.GetProperty("w_top").GetDouble(),
            c.GetProperty("t").GetDouble(), c.GetProperty("y0").GetDouble(), c.GetProperty("base_side").GetString() == "down")).ToList();
        var planes = reference.GetProperty("planes");
        var (bottom, top) = planes.ValueKind == JsonValueKind.Array
            ? (planes[0], planes[1]) : (planes.GetProperty("bottom"), planes.GetProperty("top"));

        // Copper layers are the distinct heights of the strips; the slabs are cut there, losing the copper's thickness.
        var coppers = strips.GroupBy(s => s.Bottom).OrderBy(g => g.Key).Select((g, i) => (Name: $"S{i + 1}", Strip: g.First())).ToList();
        var layers = new List<string>(); // from the bottom
        if (bottom.ValueKind != JsonValueKind.Null)
            layers.Add("{ copper: BOT, thickness: 0.0152 mm, use: plane }");
        if (double.IsPositiveInfinity(slabs[^1].Top) && slabs.Count == 1)
            slabs[0] = slabs[0] with { Top = coppers[0].Strip.Bottom }; // an air line stands on a slab of air
        var y = slabs[0].Bottom;
        foreach (var slab in slabs)
        {
            foreach (var (copperName, strip) in coppers)
            {
                if (strip.Bottom < slab.Bottom - 1e-12 || strip.Bottom > slab.Top + 1e-12 || layers.Any(l => l.Contains($"copper: {copperName},")))
                    continue;
                var face = strip.Bottom;
                AddSlab(slab.Name, y, face);
                layers.Add($"{{ copper: {copperName}, thickness: {N(strip.Thickness)} mm, use: signal, base: {(strip.Down ? "down" : "up")}, undercut: {N((strip.Wide - strip.Narrow) / 2)} mm }}");
                y = face + strip.Thickness;
            }
            if (y >= slab.Top - 1e-12)
                continue;
            AddSlab(slab.Name, y, slab.Top);
            y = slab.Top;
        }
        if (top.ValueKind != JsonValueKind.Null)
            layers.Add("{ copper: TOP, thickness: 0.0152 mm, use: plane }");

        void AddSlab(string name, double from, double to)
        {
            if (to > from + 1e-12)
                layers.Add($"{{ core: {name}, thickness: {N(to - from)} mm }}");
        }

        var text = new StringBuilder("format: 1\nstackup:\n  name: reference\n  dielectrics:\n");
        foreach (var slab in slabs.DistinctBy(s => s.Name))
            text.Append(CultureInfo.InvariantCulture, $"    {slab.Name}: {{ dk: {N(slab.Eps)}, df: 0, at: 1 GHz }}\n");
        var mask = reference.GetProperty("mask");
        if (mask.ValueKind != JsonValueKind.Null)
        {
            text.Append(CultureInfo.InvariantCulture, $"    mask: {{ dk: {N(mask.GetProperty("eps").GetDouble())}, df: 0, at: 1 GHz }}\n");
            layers.Add($"{{ mask: mask, over-laminate: {N(mask.GetProperty("m_lam").GetDouble())} mm, over-copper: {N(mask.GetProperty("m_cu").GetDouble())} mm }}");
        }
        layers.Reverse();
        text.Append("  layers:\n");
        foreach (var layer in layers)
            text.Append("    - ").Append(layer).Append('\n');
        text.Append("conductors:\n");
        foreach (var strip in strips)
        {
            var layer = coppers.First(c => c.Strip.Bottom == strip.Bottom).Name;
            text.Append(CultureInfo.InvariantCulture, $"  - {{ name: {strip.Name}, layer: {layer}, ");
            text.Append(strip.Grounded
                ? $"from: {N(strip.X - (strip.Wide / 2))} mm, to: {N(strip.X + (strip.Wide / 2))} mm, grounded: true }}\n"
                : $"x: {N(strip.X)} mm, width: {N(strip.Wide)} mm }}\n");
        }
        return text.ToString();
    }

    // Twelve digits: binary noise of a difference must not reach the file.
    private static string N(double value) => Math.Round(value, 12).ToString("G12", CultureInfo.InvariantCulture);
}
