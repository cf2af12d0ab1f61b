namespace StackTiming.Reports.Pdf;

/// <summary>A piece of a page that is never split: a line of a paragraph, a row of a table, a figure.</summary>
/// <param name="Height">Height, points.</param>
/// <param name="Draw">Draws it with its top left corner at the given point.</param>
internal sealed record Chunk(float Height, Action<Ink, float, float> Draw)
{
    /// <summary>White above, dropped at the head of a page, points.</summary>
    public float SpaceBefore { get; init; }

    /// <summary>Whether the next piece must stand on the same page.</summary>
    public bool KeepWithNext { get; init; }

    /// <summary>What is drawn again where this piece begins a page, such as the head of its table.</summary>
    public Chunk? HeadOnNewPage { get; init; }

    /// <summary>Whether it begins a page.</summary>
    public bool BeginsPage { get; init; }

    /// <summary>Where links lead to, or null.</summary>
    public string? Anchor { get; init; }

    /// <summary>The entry in the outline that leads here, or null.</summary>
    public (int Level, string Text)? Outline { get; init; }
}
