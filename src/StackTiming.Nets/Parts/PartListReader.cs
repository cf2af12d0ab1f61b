using System.Collections.Frozen;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Parts;

/// <summary>Reads parts files (<c>*.parts.yaml</c>).</summary>
public static class PartListReader
{
    /// <summary>Reads the parts and models of one file.</summary>
    /// <param name="map">The file's mapping, its <c>format</c> and <c>units</c> read already or not.</param>
    /// <returns>The parts, or null with problems.</returns>
    public static PartList? Read(MapReader map)
    {
        var before = map.Problems.ErrorCount;
        var models = new Dictionary<string, BufferModel?>(StringComparer.Ordinal);
        foreach (var entry in map.Named("models"))
            models[entry.Key] = map.MapOf(entry.Value, entry.Key) is { } inner ? BufferModelReader.Read(entry.Key, inner) : null;
        var reader = new PartReader(models);
        var parts = new Dictionary<string, Part>(StringComparer.Ordinal);
        foreach (var entry in map.Named("parts"))
        {
            if (map.MapOf(entry.Value, entry.Key) is { } inner)
                parts[entry.Key] = reader.Read(entry.Key, inner);
        }
        if (!map.Has("parts"))
            map.Problems.Error(map.At, "'parts' is missing", "write parts: { U1: { pins: { A3: { model: … } } } }");
        map.Finish();
        if (map.Problems.ErrorCount != before)
            return null;
        return new PartList(models.ToFrozenDictionary(m => m.Key, m => m.Value!, StringComparer.Ordinal), parts.ToFrozenDictionary(StringComparer.Ordinal));
    }
}
