using System.Collections.Immutable;

namespace StackTiming.Reports.Documents;

/// <summary>A piece of a section, in the order of reading.</summary>
public abstract record Block;

/// <summary>A paragraph.</summary>
/// <param name="Text">Its text.</param>
public sealed record Paragraph(RichText Text) : Block;

/// <summary>A list whose items begin with a mark.</summary>
/// <param name="Items">The items.</param>
public sealed record Bullets(ImmutableArray<RichText> Items) : Block;

/// <summary>A boxed remark, such as the cautions.</summary>
/// <param name="Heading">Its heading; may be empty.</param>
/// <param name="Items">Its paragraphs.</param>
public sealed record Note(string Heading, ImmutableArray<RichText> Items) : Block;

/// <summary>The following block begins a page.</summary>
public sealed record PageBreak : Block;

/// <summary>The sections with their page numbers.</summary>
/// <param name="Depth">How many levels of headings are listed.</param>
public sealed record Contents(int Depth) : Block;

/// <summary>Two columns beside each other on one page.</summary>
/// <param name="Left">Blocks of the left column.</param>
/// <param name="Right">Blocks of the right column.</param>
/// <param name="LeftShare">Share of the width that the left column takes.</param>
public sealed record SideBySide(ImmutableArray<Block> Left, ImmutableArray<Block> Right, double LeftShare = 0.5) : Block;

/// <summary>A small heading that is neither numbered nor listed.</summary>
/// <param name="Text">Its text.</param>
/// <param name="Anchor">Where links lead to, or null.</param>
public sealed record Caption(string Text, string? Anchor = null) : Block;

/// <summary>Facts, each with its name.</summary>
/// <param name="Items">Name and fact.</param>
public sealed record KeyValues(ImmutableArray<(string Key, RichText Value)> Items) : Block;
