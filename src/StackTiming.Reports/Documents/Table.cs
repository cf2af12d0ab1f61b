using System.Collections.Immutable;
using StackTiming.Rules.Findings;

namespace StackTiming.Reports.Documents;

/// <summary>Where text stands in its column.</summary>
public enum Alignment
{
    /// <summary>At the left edge: words.</summary>
    Left,
    /// <summary>At the right edge: figures.</summary>
    Right,
}

/// <summary>A column of a table. Its width follows from its cells.</summary>
/// <param name="Heading">Heading, repeated on every page; may be empty.</param>
/// <param name="Alignment">Where its text stands.</param>
/// <param name="Grows">True where the column takes the width that the others leave.</param>
public sealed record Column(string Heading, Alignment Alignment = Alignment.Left, bool Grows = false)
{
    /// <summary>Whether its text may be broken into lines. Figures are not, as long as the page is wide enough.</summary>
    public bool Wraps { get; init; } = Alignment == Alignment.Left;
}

/// <summary>A cell of a table.</summary>
public abstract record Cell
{
    /// <summary>A cell with plain text.</summary>
    /// <param name="text">The text.</param>
    public static implicit operator Cell(string text) => FromString(text);

    /// <summary>A cell with plain text.</summary>
    /// <param name="text">The text.</param>
    public static Cell FromString(string text) => new TextCell(text);

    /// <summary>A cell with text.</summary>
    /// <param name="text">The text.</param>
    public static implicit operator Cell(RichText text) => FromRichText(text);

    /// <summary>A cell with text.</summary>
    /// <param name="text">The text.</param>
    public static Cell FromRichText(RichText text) => new TextCell(text);
}

/// <summary>A cell with text.</summary>
/// <param name="Text">The text.</param>
public sealed record TextCell(RichText Text) : Cell;

/// <summary>A cell that shows a status by its word and by its shape.</summary>
/// <param name="Status">The status.</param>
public sealed record StatusCell(FindingStatus Status) : Cell;

/// <summary>A cell that shows a relative margin as a bar to the left (fails) or to the right (holds) of a line.</summary>
/// <param name="RelativeMargin">The margin as a share of what the rule allows; drawn up to ±1. Null leaves the cell empty.</param>
public sealed record MarginCell(double? RelativeMargin) : Cell;

/// <summary>A row of a table.</summary>
/// <param name="Cells">One cell a column.</param>
/// <param name="Anchor">Where links lead to, or null.</param>
public sealed record Row(ImmutableArray<Cell> Cells, string? Anchor = null)
{
    /// <summary>A row of cells.</summary>
    /// <param name="cells">One cell a column.</param>
    public static Row Of(params ReadOnlySpan<Cell> cells) => new([.. cells]);
}

/// <summary>A table. It may run over pages; its head is then repeated.</summary>
/// <param name="Columns">The columns.</param>
/// <param name="Rows">The rows.</param>
/// <param name="Foot">A remark under it, such as how many rows were left out; null or empty for none.</param>
public sealed record Table(ImmutableArray<Column> Columns, ImmutableArray<Row> Rows, RichText? Foot = null) : Block;
