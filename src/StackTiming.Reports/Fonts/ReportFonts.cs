using SkiaSharp;

namespace StackTiming.Reports.Fonts;

/// <summary>The faces that travel inside the assembly, so that a report looks the same on a machine without fonts.</summary>
public sealed class ReportFonts
{
    private static readonly Lazy<ReportFonts> Loaded = new(() => new ReportFonts());

    private ReportFonts()
    {
        Regular = Load("IBMPlexSans-Regular.ttf");
        SemiBold = Load("IBMPlexSans-SemiBold.ttf");
        Mono = Load("IBMPlexMono-Regular.ttf");
    }

    /// <summary>The faces, read once.</summary>
    public static ReportFonts Instance => Loaded.Value;

    /// <summary>Running text.</summary>
    public FontFace Regular { get; }

    /// <summary>Headings and whatever stands out.</summary>
    public FontFace SemiBold { get; }

    /// <summary>Digests, paths and identifiers.</summary>
    public FontFace Mono { get; }

    private static FontFace Load(string name)
    {
        using var stream = typeof(ReportFonts).Assembly.GetManifestResourceStream(name)
            ?? throw new InvalidOperationException($"the font {name} is missing from the assembly");
        var typeface = SKTypeface.FromData(SKData.Create(stream))
            ?? throw new InvalidOperationException($"the font {name} in the assembly cannot be read");
        return new FontFace(typeface);
    }
}
