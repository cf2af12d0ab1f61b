using SkiaSharp;

namespace StackTiming.Reports.Appearance;

/// <summary>
/// The few colours of the report: ink, greys, one accent and one alarm. Every pair that must be told apart also differs in lightness or
/// in form, so that a grey print and a colour-blind reader lose nothing.
/// </summary>
public static class Palette
{
    /// <summary>Text.</summary>
    public static SKColor Ink { get; } = new(0x1C, 0x22, 0x27);

    /// <summary>Secondary text.</summary>
    public static SKColor Quiet { get; } = new(0x5B, 0x65, 0x6D);

    /// <summary>Rules that structure.</summary>
    public static SKColor Rule { get; } = new(0x8F, 0x99, 0xA1);

    /// <summary>Rules between rows.</summary>
    public static SKColor Hairline { get; } = new(0xD8, 0xDD, 0xE1);

    /// <summary>Ground of boxes.</summary>
    public static SKColor Wash { get; } = new(0xF4, 0xF6, 0xF7);

    /// <summary>The accent: headings' marks, links, data.</summary>
    public static SKColor Accent { get; } = new(0x1B, 0x4F, 0x72);

    /// <summary>The accent, light: windows that are allowed, areas.</summary>
    public static SKColor AccentLight { get; } = new(0xDC, 0xE8, 0xF0);

    /// <summary>Failures.</summary>
    public static SKColor Alarm { get; } = new(0xA6, 0x2B, 0x1F);

    /// <summary>Copper in drawings.</summary>
    public static SKColor Copper { get; } = new(0xB8, 0x73, 0x3A);

    /// <summary>Paper.</summary>
    public static SKColor Paper { get; } = SKColors.White;
}
