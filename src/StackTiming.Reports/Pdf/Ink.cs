using SkiaSharp;
using StackTiming.Reports.Appearance;

namespace StackTiming.Reports.Pdf;

/// <summary>What draws on the pages: adds broken lines of text, links and page numbers to the pen.</summary>
/// <param name="pageOfAnchor">Page number of each anchor, from 1.</param>
internal sealed class Ink(IReadOnlyDictionary<string, int> pageOfAnchor) : Pen(null!)
{
    /// <summary>Page number of an anchor, from 1; null where the document has no such anchor.</summary>
    /// <param name="anchor">The anchor.</param>
    public int? PageOf(string anchor) => pageOfAnchor.TryGetValue(anchor, out var page) ? page : null;

    /// <summary>Draws a line of broken text with its links.</summary>
    /// <param name="line">The line.</param>
    /// <param name="x">Left edge.</param>
    /// <param name="baseline">Baseline.</param>
    public void Line(TextLine line, float x, float baseline)
    {
        foreach (var span in line.Spans)
        {
            Text(span.Text, span.Style, x + span.X, baseline);
            if (span.Link is not null)
                Link(span.Link, new SKRect(x + span.X, baseline - span.Style.Size, x + span.X + span.Width, baseline + span.Style.Size * 0.3f));
        }
    }

    /// <summary>Draws lines one beneath the other.</summary>
    /// <param name="lines">The lines.</param>
    /// <param name="x">Left edge.</param>
    /// <param name="top">Top edge of the first line.</param>
    /// <param name="style">The style that gives the distance of the lines.</param>
    public void Lines(IReadOnlyList<TextLine> lines, float x, float top, TextStyle style)
    {
        for (var i = 0; i < lines.Count; i++)
            Line(lines[i], x, Baseline(top + i * style.LineHeight, style));
    }

    /// <summary>Makes a rectangle lead to an anchor.</summary>
    /// <param name="anchor">The anchor; nothing happens where the document has none of that name.</param>
    /// <param name="area">The rectangle.</param>
    public void Link(string anchor, SKRect area)
    {
        if (pageOfAnchor.ContainsKey(anchor))
            Canvas.DrawLinkDestinationAnnotation(area, anchor);
    }
}
