namespace StackTiming.Reports.Pdf;

/// <summary>A paper size with its margins, points (1/72 inch).</summary>
/// <param name="Width">Width of the sheet.</param>
/// <param name="Height">Height of the sheet.</param>
/// <param name="Left">Left margin.</param>
/// <param name="Right">Right margin.</param>
/// <param name="Top">Top margin.</param>
/// <param name="Bottom">Bottom margin.</param>
public sealed record PageFormat(float Width, float Height, float Left, float Right, float Top, float Bottom)
{
    /// <summary>A4 after ISO 216: 210 mm × 297 mm.</summary>
    public static PageFormat A4 { get; } = new(595.28f, 841.89f, 54, 50, 58, 56);

    /// <summary>Letter after ANSI/ASME Y14.1: 8.5 in × 11 in.</summary>
    public static PageFormat Letter { get; } = new(612, 792, 58, 54, 54, 52);

    /// <summary>Width between the margins.</summary>
    public float ContentWidth => Width - Left - Right;

    /// <summary>Height between the margins.</summary>
    public float ContentHeight => Height - Top - Bottom;
}
