namespace StackTiming.Rules.Judging;

/// <summary>Which of a net's drivers a rule looks from.</summary>
/// <param name="Text">A part (<c>U1</c>), a pin (<c>U1.A3</c>), <c>both</c>, or empty for the only driver.</param>
public readonly record struct DriveChoice(string Text)
{
    /// <summary>The only driver of each net.</summary>
    public static DriveChoice OnlyDriver { get; } = new("");

    /// <summary>What a file writes.</summary>
    /// <param name="text">A part, a pin, or <c>both</c>.</param>
    public static DriveChoice Parse(string text) => text == "both" ? Each : new DriveChoice(text);

    /// <summary>Every driver of each net in turn.</summary>
    public static DriveChoice Each { get; } = new("both");
}
