using System.Buffers.Binary;
using SkiaSharp;

namespace StackTiming.Reports.Fonts;

/// <summary>
/// One face of the report's type family, with the advance widths of its characters. Widths come from the font's own tables, unhinted, so
/// that lines break alike on every machine.
/// </summary>
public sealed class FontFace
{
    // Beyond this code point the family has no character that a report uses.
    private const int LastCharacter = 0x26FF;

    private readonly ushort[] glyphs = new ushort[LastCharacter + 1];
    private readonly float[] advances = new float[LastCharacter + 1];

    /// <summary>Reads a face.</summary>
    /// <param name="typeface">The typeface.</param>
    public FontFace(SKTypeface typeface)
    {
        Typeface = typeface;
        using var font = new SKFont(typeface, 1);
        var codes = new int[glyphs.Length];
        for (var i = 0; i < codes.Length; i++)
            codes[i] = i;
        font.GetGlyphs(codes, glyphs);

        var horizontalHeader = typeface.GetTableData(Tag("hhea"));
        var metrics = typeface.GetTableData(Tag("hmtx"));
        int metricCount = BinaryPrimitives.ReadUInt16BigEndian(horizontalHeader.AsSpan(34));
        float unitsPerEm = typeface.UnitsPerEm;
        for (var i = 0; i < advances.Length; i++)
            advances[i] = BinaryPrimitives.ReadUInt16BigEndian(metrics.AsSpan(4 * Math.Min(glyphs[i], metricCount - 1))) / unitsPerEm;
        Ascent = BinaryPrimitives.ReadInt16BigEndian(horizontalHeader.AsSpan(4)) / unitsPerEm;
        Descent = -BinaryPrimitives.ReadInt16BigEndian(horizontalHeader.AsSpan(6)) / unitsPerEm;
    }

    /// <summary>The typeface.</summary>
    public SKTypeface Typeface { get; }

    /// <summary>Height above the baseline, in ems.</summary>
    public float Ascent { get; }

    /// <summary>Depth below the baseline, in ems.</summary>
    public float Descent { get; }

    /// <summary>Whether the face has a shape for the character.</summary>
    /// <param name="character">The character.</param>
    public bool Has(char character) => character <= LastCharacter && glyphs[character] != 0;

    /// <summary>Advance width of a character, in ems.</summary>
    /// <param name="character">The character.</param>
    public float Advance(char character) => character <= LastCharacter ? advances[character] : advances[0];

    /// <summary>Width of a text, points.</summary>
    /// <param name="text">The text.</param>
    /// <param name="sizePoints">Size of the letters, points.</param>
    public float Width(ReadOnlySpan<char> text, float sizePoints)
    {
        var sum = 0f;
        foreach (var character in text)
            sum += Advance(character);
        return sum * sizePoints;
    }

    /// <summary>The face at a size, set up for the page: unhinted and without rounding.</summary>
    /// <param name="sizePoints">Size of the letters, points.</param>
    public SKFont At(float sizePoints) =>
        new(Typeface, sizePoints) { Subpixel = true, LinearMetrics = true, Hinting = SKFontHinting.None, Edging = SKFontEdging.Antialias };

    private static uint Tag(string name) => ((uint)name[0] << 24) | ((uint)name[1] << 16) | ((uint)name[2] << 8) | name[3];
}
