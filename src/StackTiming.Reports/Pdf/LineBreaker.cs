using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Fonts;

namespace StackTiming.Reports.Pdf;

/// <summary>
/// Breaks text into lines: at spaces, never with a hyphen (a hyphen would read as part of a net name). A word wider than the whole line
/// breaks after a sign that joins names, or else wherever the line is full.
/// </summary>
public static class LineBreaker
{
    private const string Joints = "_-/\\.,:;)]}>=+";

    /// <summary>The lines of a text.</summary>
    /// <param name="text">The text.</param>
    /// <param name="style">Style of plain runs.</param>
    /// <param name="width">Width of the lines, points.</param>
    /// <param name="characterLimit">Most characters of a run.</param>
    /// <param name="lineLimit">Most lines; the last one then ends in an ellipsis.</param>
    public static List<TextLine> Break(RichText text, TextStyle style, float width, int characterLimit = 4000, int lineLimit = int.MaxValue)
    {
        var (characters, owners, runs) = Flatten(text, style, characterLimit);
        var lines = new List<TextLine>();
        var start = 0;
        while (start < characters.Length)
        {
            var end = EndOfLine(characters, owners, runs, start, width, out var next);
            if (lines.Count + 1 == lineLimit && next < characters.Length)
            {
                lines.Add(Ellipsis(characters, owners, runs, start, end, width));
                break;
            }
            lines.Add(Line(characters, owners, runs, start, end));
            start = next;
        }
        return lines;
    }

    /// <summary>Width of the text on one line, points.</summary>
    /// <param name="text">The text.</param>
    /// <param name="style">Style of plain runs.</param>
    /// <param name="characterLimit">Most characters of a run.</param>
    public static float NaturalWidth(RichText text, TextStyle style, int characterLimit)
    {
        var sum = 0f;
        foreach (var run in text.Runs)
        {
            var runStyle = style.For(run);
            sum += runStyle.Face.Width(PrintableText.For(run.Text, runStyle.Face, characterLimit), runStyle.Size);
        }
        return sum;
    }

    /// <summary>Width of the widest word, points.</summary>
    /// <param name="text">The text.</param>
    /// <param name="style">Style of plain runs.</param>
    /// <param name="characterLimit">Most characters of a run.</param>
    public static float WidestWord(RichText text, TextStyle style, int characterLimit)
    {
        var (characters, owners, runs) = Flatten(text, style, characterLimit);
        float widest = 0, current = 0;
        for (var i = 0; i < characters.Length; i++)
        {
            current = characters[i] == ' ' ? 0 : current + Advance(characters, owners, runs, i);
            widest = MathF.Max(widest, current);
        }
        return widest;
    }

    private static (string Characters, ushort[] Owners, (TextStyle Style, string? Link)[] Runs) Flatten(RichText text, TextStyle style, int characterLimit)
    {
        var runs = new (TextStyle, string?)[text.Runs.Length];
        var parts = new string[text.Runs.Length];
        for (var r = 0; r < runs.Length; r++)
        {
            var runStyle = style.For(text.Runs[r]);
            runs[r] = (runStyle, text.Runs[r].Link);
            parts[r] = PrintableText.For(text.Runs[r].Text, runStyle.Face, characterLimit);
        }
        var characters = parts.Length == 1 ? parts[0] : string.Concat(parts);
        var owners = new ushort[characters.Length];
        var at = 0;
        for (var r = 0; r < parts.Length; r++)
        {
            owners.AsSpan(at, parts[r].Length).Fill((ushort)Math.Min(r, ushort.MaxValue));
            at += parts[r].Length;
        }
        return (characters, owners, runs);
    }

    private static float Advance(string characters, ushort[] owners, (TextStyle Style, string? Link)[] runs, int index)
    {
        var style = runs[owners[index]].Style;
        return style.Face.Advance(characters[index]) * style.Size;
    }

    private static int EndOfLine(
        string characters, ushort[] owners, (TextStyle Style, string? Link)[] runs, int start, float width, out int next)
    {
        var used = 0f;
        int space = -1, joint = -1, index = start;
        for (; index < characters.Length; index++)
        {
            var character = characters[index];
            var advance = Advance(characters, owners, runs, index);
            if (character == ' ')
            {
                space = index;
                joint = -1;
            }
            else if (used + advance > width + 0.01f && index > start)
            {
                break;
            }
            used += advance;
            if (character != ' ' && Joints.Contains(character, StringComparison.Ordinal))
                joint = index + 1;
        }

        int end;
        if (index >= characters.Length)
            end = index;
        else if (space > start && WordFits(characters, owners, runs, space + 1, width))
            end = space;
        else if (joint > start)
            end = joint;
        else
            end = index;
        next = end;
        while (next < characters.Length && characters[next] == ' ')
            next++;
        while (end > start + 1 && characters[end - 1] == ' ')
            end--;
        return end;
    }

    private static bool WordFits(string characters, ushort[] owners, (TextStyle Style, string? Link)[] runs, int start, float width)
    {
        var used = 0f;
        for (var i = start; i < characters.Length && characters[i] != ' '; i++)
        {
            used += Advance(characters, owners, runs, i);
            if (used > width)
                return false;
        }
        return true;
    }

    private static TextLine Ellipsis(
        string characters, ushort[] owners, (TextStyle Style, string? Link)[] runs, int start, int end, float width)
    {
        var style = runs[owners[end - 1]].Style;
        var room = width - style.Face.Advance('…') * style.Size;
        var line = Line(characters, owners, runs, start, end);
        while (end > start + 1 && line.Width > room)
            line = Line(characters, owners, runs, start, --end);
        var last = line.Spans[^1];
        line.Spans[^1] = last with { Text = last.Text + "…" };
        return line with { Width = line.Width + style.Face.Advance('…') * style.Size };
    }

    private static TextLine Line(string characters, ushort[] owners, (TextStyle Style, string? Link)[] runs, int start, int end)
    {
        var spans = new List<TextSpan>(1);
        float x = 0;
        var from = start;
        while (from < end)
        {
            var to = from + 1;
            while (to < end && owners[to] == owners[from])
                to++;
            var (style, link) = runs[owners[from]];
            var piece = characters[from..to];
            var width = style.Face.Width(piece, style.Size);
            spans.Add(new TextSpan(piece, style, x, width, link));
            x += width;
            from = to;
        }
        return new TextLine([.. spans], x);
    }
}
