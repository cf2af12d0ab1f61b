using System.Collections.Immutable;

namespace StackTiming.Reports.Documents;

/// <summary>How a run of text stands out.</summary>
public enum Emphasis
{
    /// <summary>Plain text.</summary>
    Plain,
    /// <summary>Stands out.</summary>
    Strong,
    /// <summary>Steps back: secondary information.</summary>
    Quiet,
    /// <summary>Letters of one width: digests, paths, identifiers.</summary>
    Code,
}

/// <summary>A stretch of text in one emphasis.</summary>
/// <param name="Text">The text, as it comes from the files: writers show what they cannot print by its code point.</param>
/// <param name="Emphasis">How it stands out.</param>
/// <param name="Link">The anchor it leads to, or null.</param>
public readonly record struct Run(string Text, Emphasis Emphasis = Emphasis.Plain, string? Link = null);

/// <summary>Text made of runs.</summary>
/// <param name="Runs">The runs, in reading order.</param>
public sealed record RichText(ImmutableArray<Run> Runs)
{
    /// <summary>No text.</summary>
    public static RichText Empty { get; } = new(ImmutableArray<Run>.Empty);

    /// <summary>Text made of runs.</summary>
    /// <param name="runs">The runs, in reading order.</param>
    public static RichText Of(params ReadOnlySpan<Run> runs) => new([.. runs]);

    /// <summary>Plain text.</summary>
    /// <param name="text">The text.</param>
    public static implicit operator RichText(string text) => FromString(text);

    /// <summary>Plain text.</summary>
    /// <param name="text">The text.</param>
    public static RichText FromString(string text) => text.Length == 0 ? Empty : new([new Run(text)]);

    /// <summary>Text that leads to an anchor.</summary>
    /// <param name="text">The text.</param>
    /// <param name="anchor">The anchor.</param>
    /// <param name="emphasis">How it stands out.</param>
    public static RichText LinkTo(string text, string anchor, Emphasis emphasis = Emphasis.Plain) => new([new Run(text, emphasis, anchor)]);

    /// <summary>Text in one emphasis.</summary>
    /// <param name="text">The text.</param>
    /// <param name="emphasis">How it stands out.</param>
    public static RichText In(string text, Emphasis emphasis) => new([new Run(text, emphasis)]);

    /// <summary>The text without emphasis and links.</summary>
    public string PlainText => string.Concat(Runs.Select(r => r.Text));
}
