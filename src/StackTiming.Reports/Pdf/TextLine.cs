using StackTiming.Reports.Appearance;

namespace StackTiming.Reports.Pdf;

/// <summary>A stretch of a line in one style.</summary>
/// <param name="Text">The text.</param>
/// <param name="Style">Its style.</param>
/// <param name="X">Distance from the start of the line, points.</param>
/// <param name="Width">Width, points.</param>
/// <param name="Link">The anchor it leads to, or null.</param>
public readonly record struct TextSpan(string Text, TextStyle Style, float X, float Width, string? Link);

/// <summary>A line of text after breaking.</summary>
/// <param name="Spans">Its spans from left to right.</param>
/// <param name="Width">Width without trailing spaces, points.</param>
public sealed record TextLine(TextSpan[] Spans, float Width);
