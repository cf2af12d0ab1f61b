using StackTiming.Reports.Documents;
using StackTiming.Reports.Figures;

namespace StackTiming.Terminal;

/// <summary>A figure as a file of its own, of the kind that its name says.</summary>
internal static class FigureOutput
{
    private const float WidthPoints = 720;
    private static readonly string[] Known = [".svg", ".png", ".pdf"];

    /// <summary>Whether the name says a kind that can be written.</summary>
    public static bool IsKnown(string path) => Known.Contains(Path.GetExtension(path), StringComparer.OrdinalIgnoreCase);

    /// <summary>Writes the figure.</summary>
    /// <param name="drawing">The figure.</param>
    /// <param name="title">Its title, for kinds that store one.</param>
    /// <param name="path">The file's name.</param>
    /// <param name="stream">Where to.</param>
    public static void Write(IDrawing drawing, string title, string path, Stream stream)
    {
        switch (Path.GetExtension(path).ToUpperInvariant())
        {
            case ".PNG":
                FigureFile.WritePng(drawing, WidthPoints, 2, stream);
                break;
            case ".PDF":
                FigureFile.WritePdf(drawing, title, WidthPoints, stream);
                break;
            default:
                FigureFile.WriteSvg(drawing, WidthPoints, stream);
                break;
        }
    }
}
