using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;

namespace StackTiming.Reports.Figures;

/// <summary>Writes a drawing on its own, as a picture or as a vector file.</summary>
public static class FigureFile
{
    /// <summary>Writes a PNG picture on white.</summary>
    /// <param name="drawing">The drawing.</param>
    /// <param name="widthPoints">Width, points.</param>
    /// <param name="pixelsPerPoint">Resolution: 2 gives 144 pixels an inch.</param>
    /// <param name="output">Where to.</param>
    public static void WritePng(IDrawing drawing, float widthPoints, float pixelsPerPoint, Stream output)
    {
        var height = drawing.HeightFor(widthPoints);
        const float border = 8;
        var info = new SKImageInfo((int)MathF.Ceiling((widthPoints + 2 * border) * pixelsPerPoint), (int)MathF.Ceiling((height + 2 * border) * pixelsPerPoint));
        using var surface = SKSurface.Create(info);
        surface.Canvas.Clear(Palette.Paper);
        surface.Canvas.Scale(pixelsPerPoint);
        surface.Canvas.Translate(border, border);
        drawing.Draw(surface.Canvas, widthPoints, height);
        using var image = surface.Snapshot();
        using var data = image.Encode(SKEncodedImageFormat.Png, 100);
        data.SaveTo(output);
    }

    /// <summary>Writes an SVG file.</summary>
    /// <param name="drawing">The drawing.</param>
    /// <param name="widthPoints">Width, points.</param>
    /// <param name="output">Where to.</param>
    public static void WriteSvg(IDrawing drawing, float widthPoints, Stream output)
    {
        var height = drawing.HeightFor(widthPoints);
        using var canvas = SKSvgCanvas.Create(SKRect.Create(widthPoints, height), output);
        drawing.Draw(canvas, widthPoints, height);
    }

    /// <summary>Writes a PDF file of one page that the drawing fills.</summary>
    /// <param name="drawing">The drawing.</param>
    /// <param name="title">Title of the document.</param>
    /// <param name="widthPoints">Width, points.</param>
    /// <param name="output">Where to.</param>
    public static void WritePdf(IDrawing drawing, string title, float widthPoints, Stream output)
    {
        const float border = 24;
        var height = drawing.HeightFor(widthPoints);
        using var buffer = new MemoryStream();
        using (var pdf = SKDocument.CreatePdf(buffer, new SKDocumentPdfMetadata { Title = title, EncodingQuality = 100, RasterDpi = 300 }))
        {
            var canvas = pdf.BeginPage(widthPoints + 2 * border, height + 2 * border);
            canvas.Translate(border, border);
            drawing.Draw(canvas, widthPoints, height);
            pdf.EndPage();
            pdf.Close();
        }
        buffer.Position = 0;
        buffer.CopyTo(output);
    }
}
