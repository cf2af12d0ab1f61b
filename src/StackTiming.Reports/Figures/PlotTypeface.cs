using ScottPlot;
using SkiaSharp;
using StackTiming.Reports.Fonts;

namespace StackTiming.Reports.Figures;

/// <summary>Gives the plotting library the report's own faces, which it knows only by name.</summary>
internal sealed class PlotTypeface : IFontResolver
{
    /// <summary>The name under which plots ask for the report's face.</summary>
    public const string Name = "StackTiming report";

    // The library keeps its resolvers in a list of its own; the report's is entered once, before the first plot.
    private static readonly Lazy<string> Registered = new(() =>
    {
        ScottPlot.Fonts.FontResolvers.Insert(0, new PlotTypeface());
        return Name;
    });

    private PlotTypeface()
    {
    }

    /// <summary>Makes the face known and returns its name.</summary>
    public static string Register() => Registered.Value;

    /// <inheritdoc/>
    public SKTypeface? CreateTypeface(string fontName, FontWeight weight, FontSlant slant, FontSpacing spacing) =>
        fontName != Name ? null : (int)weight >= (int)FontWeight.SemiBold ? ReportFonts.Instance.SemiBold.Typeface : ReportFonts.Instance.Regular.Typeface;

    /// <inheritdoc/>
    public SKTypeface? CreateTypeface(string fontName, bool bold, bool italic) =>
        fontName != Name ? null : bold ? ReportFonts.Instance.SemiBold.Typeface : ReportFonts.Instance.Regular.Typeface;
}
