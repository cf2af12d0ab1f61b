using System.Text.Json;

namespace StackTiming.Acceptance;

/// <summary>The check values under tests/references, which this project did not produce (each file names its method and source).</summary>
public static class ReferenceFiles
{
    /// <summary>Names of the files of a folder of tests/references, without ending.</summary>
    public static IEnumerable<string> Names(string folder, Func<string, bool>? wanted = null) =>
        Directory.GetFiles(Path.Combine(Tool.Root, "tests", "references", folder), "*.json")
            .Select(f => Path.GetFileNameWithoutExtension(f)!)
            .Where(n => wanted is null || wanted(n))
            .Order(StringComparer.Ordinal);

    /// <summary>One of them.</summary>
    public static JsonElement Read(string folder, string name) =>
        JsonDocument.Parse(File.ReadAllText(Path.Combine(Tool.Root, "tests", "references", folder, name + ".json"))).RootElement;
}
