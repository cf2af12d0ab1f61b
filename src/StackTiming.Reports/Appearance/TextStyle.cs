using SkiaSharp;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Fonts;

namespace StackTiming.Reports.Appearance;

/// <summary>How text is set.</summary>
/// <param name="Face">The face.</param>
/// <param name="Size">Size of the letters, points.</param>
/// <param name="Color">Colour.</param>
public readonly record struct TextStyle(FontFace Face, float Size, SKColor Color)
{
    /// <summary>Running text.</summary>
    public static TextStyle Body { get; } = new(ReportFonts.Instance.Regular, 9.2f, Palette.Ink);

    /// <summary>Text of tables.</summary>
    public static TextStyle Cell { get; } = Body with { Size = 8f };

    /// <summary>Headings of columns, and names of facts.</summary>
    public static TextStyle Label { get; } = new(ReportFonts.Instance.SemiBold, 7.4f, Palette.Quiet);

    /// <summary>Captions and remarks.</summary>
    public static TextStyle Small { get; } = new(ReportFonts.Instance.Regular, 7.8f, Palette.Quiet);

    /// <summary>Headings, by level from 1.</summary>
    /// <param name="level">Level, from 1.</param>
    public static TextStyle Heading(int level) =>
        new(ReportFonts.Instance.SemiBold, level switch { 1 => 15f, 2 => 11f, _ => 9.6f }, Palette.Ink);

    /// <summary>Distance of baselines, points.</summary>
    public float LineHeight => MathF.Round(Size * 1.38f * 4) / 4;

    /// <summary>The style of a run inside text of this style.</summary>
    /// <param name="run">The run.</param>
    public TextStyle For(Run run)
    {
        var style = run.Emphasis switch
        {
            Emphasis.Strong => this with { Face = ReportFonts.Instance.SemiBold },
            Emphasis.Quiet => this with { Color = Palette.Quiet },
            Emphasis.Code => this with { Face = ReportFonts.Instance.Mono, Size = Size * 0.92f },
            _ => this,
        };
        return run.Link is null ? style : style with { Color = Palette.Accent };
    }
}
