using System.Collections.Immutable;

namespace StackTiming.Reports.Documents;

/// <summary>A report, free of any file format: title page, sections, attachments. Writers turn it into files.</summary>
/// <param name="Title">Title in the file's properties.</param>
/// <param name="Subject">One sentence for the file's properties.</param>
/// <param name="RunningHead">What stands at the head of every page but the first: left and right.</param>
/// <param name="Date">The day of the report; the only date that appears, so that the same input gives the same bytes.</param>
/// <param name="FirstPage">Blocks of the first page.</param>
/// <param name="Sections">The sections.</param>
/// <param name="Attachments">Files that travel inside the report.</param>
public sealed record ReportDocument(
    string Title,
    string Subject,
    (string Left, string Right) RunningHead,
    DateOnly Date,
    ImmutableArray<Block> FirstPage,
    ImmutableArray<Section> Sections,
    ImmutableArray<Attachment> Attachments)
{
    /// <summary>What made the report, with its version, for the foot of the pages and the file's properties.</summary>
    public string Producer { get; init; } = "";
}

/// <summary>A section with a heading. Numbered unless it says otherwise; appendices carry letters.</summary>
/// <param name="Anchor">Where links lead to; unique in the document.</param>
/// <param name="Heading">Its heading.</param>
/// <param name="Blocks">Its blocks.</param>
/// <param name="Sections">Its subsections.</param>
public sealed record Section(string Anchor, string Heading, ImmutableArray<Block> Blocks, ImmutableArray<Section> Sections)
{
    /// <summary>How it is numbered.</summary>
    public Numbering Numbering { get; init; } = Numbering.Number;

    /// <summary>Whether it begins a page.</summary>
    public bool BeginsPage { get; init; }

    /// <summary>Whether a table of contents lists it.</summary>
    public bool InContents { get; init; } = true;
}

/// <summary>How a section is numbered.</summary>
public enum Numbering
{
    /// <summary>1, 2, 3 …</summary>
    Number,
    /// <summary>Appendix A, B, C …</summary>
    Appendix,
    /// <summary>Not numbered.</summary>
    None,
}

/// <summary>A file that travels inside the report.</summary>
/// <param name="FileName">Its name.</param>
/// <param name="MediaType">Its media type, such as <c>application/json</c>.</param>
/// <param name="Description">What it is.</param>
/// <param name="Content">Its bytes.</param>
public sealed record Attachment(string FileName, string MediaType, string Description, ReadOnlyMemory<byte> Content);
