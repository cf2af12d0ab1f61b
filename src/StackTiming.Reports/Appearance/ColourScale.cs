using SkiaSharp;

namespace StackTiming.Reports.Appearance;

/// <summary>
/// Colours for magnitudes, pale for little and dark for much, whose lightness falls evenly: told apart in grey print and by colour-blind readers. The colours are
/// those of J. R. Nuñez, C. R. Anderton and R. S. Renslow, "Optimizing colormaps with consideration for color vision deficiency", PLoS ONE 13, 2018
/// (ten of them, from memory), turned round for paper.
/// </summary>
public static class ColourScale
{
    private static readonly SKColor[] Steps =
    [
        new(0xFF, 0xEA, 0x46), new(0xE4, 0xCF, 0x5B), new(0xC4, 0xB5, 0x6C), new(0xA6, 0x9D, 0x75), new(0x8A, 0x87, 0x79),
        new(0x70, 0x71, 0x73), new(0x57, 0x5C, 0x6D), new(0x39, 0x48, 0x6B), new(0x00, 0x33, 0x6F), new(0x00, 0x20, 0x4D),
    ];

    /// <summary>The colour of a share of the scale.</summary>
    /// <param name="share">0 for the low end to 1 for the high end; values beyond take the colour of the end.</param>
    public static SKColor At(double share)
    {
        var place = Math.Clamp(share, 0, 1) * (Steps.Length - 1);
        var i = Math.Min((int)place, Steps.Length - 2);
        var (from, to, part) = (Steps[i], Steps[i + 1], place - i);
        byte Mix(byte a, byte b) => (byte)Math.Round(a + (b - a) * part);
        return new SKColor(Mix(from.Red, to.Red), Mix(from.Green, to.Green), Mix(from.Blue, to.Blue));
    }
}
