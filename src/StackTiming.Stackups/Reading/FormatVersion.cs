namespace StackTiming.Stackups.Reading;

/// <summary>The optional <c>format: 1</c> of every file.</summary>
public static class FormatVersion
{
    /// <summary>Reports a version that this program does not read.</summary>
    /// <param name="file">The file's outermost mapping.</param>
    public static void Check(MapReader file)
    {
        if (file.Text("format") is { } text && text != "1")
            file.Problems.Error(file.PositionOf("format"), $"format '{Suggestion.Shorten(text)}' is not read by this version", "write format: 1");
    }
}
