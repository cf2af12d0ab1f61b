using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;

namespace StackTiming.Terminal;

/// <summary>JSON for the standard output.</summary>
internal static class JsonText
{
    /// <summary>The text of what a writer is given.</summary>
    /// <param name="write">Writes one value.</param>
    public static string Of(Action<Utf8JsonWriter> write)
    {
        using var stream = new MemoryStream();
        using (var writer = new Utf8JsonWriter(stream, new JsonWriterOptions { Indented = true, Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping }))
            write(writer);
        return Encoding.UTF8.GetString(stream.ToArray());
    }

    /// <summary>Writes a number; left out where there is none.</summary>
    /// <param name="writer">The writer.</param>
    /// <param name="name">Name of the property.</param>
    /// <param name="value">The number, or null or NaN.</param>
    public static void Number(Utf8JsonWriter writer, string name, double? value)
    {
        if (value is { } number && double.IsFinite(number))
            writer.WriteNumber(name, number);
    }
}
