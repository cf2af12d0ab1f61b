using ScottPlot;
using SkiaSharp;

namespace StackTiming.Reports.Figures;

/// <summary>Draws a plot on a page once.</summary>
internal static class PlotPage
{
    /// <summary>
    /// Draws the plot. The library draws a plot twice the first time, because the layout settles only then; on a picture the second drawing
    /// covers the first, on a page both would stay. So the first goes to a canvas that keeps nothing.
    /// </summary>
    /// <param name="plot">The plot.</param>
    /// <param name="canvas">What to draw on.</param>
    /// <param name="width">Width, points.</param>
    /// <param name="height">Height, points.</param>
    public static void Render(Plot plot, SKCanvas canvas, int width, int height)
    {
        using (var nowhere = new SKNoDrawCanvas(width, height))
            plot.Render(nowhere, width, height);
        plot.Render(canvas, width, height);
    }
}
