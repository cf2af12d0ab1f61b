using System.Collections.Immutable;

namespace StackTiming.Stackups.Reading;

/// <summary>A node of a structured text file, with its place.</summary>
/// <param name="At">Where it begins.</param>
public abstract record DataNode(FilePosition At);

/// <summary>A single value as text.</summary>
/// <param name="At">Where it begins.</param>
/// <param name="Text">The text without quotes.</param>
/// <param name="Quoted">True where the file quotes it.</param>
public sealed record DataScalar(FilePosition At, string Text, bool Quoted) : DataNode(At);

/// <summary>A list.</summary>
/// <param name="At">Where it begins.</param>
/// <param name="Items">Its items.</param>
public sealed record DataList(FilePosition At, ImmutableArray<DataNode> Items) : DataNode(At);

/// <summary>One key of a mapping.</summary>
/// <param name="KeyAt">Where the key stands.</param>
/// <param name="Key">The key.</param>
/// <param name="Value">Its value.</param>
public sealed record DataEntry(FilePosition KeyAt, string Key, DataNode Value);

/// <summary>A mapping, in file order; keys are unique.</summary>
/// <param name="At">Where it begins.</param>
/// <param name="Entries">Its entries.</param>
public sealed record DataMap(FilePosition At, ImmutableArray<DataEntry> Entries) : DataNode(At);
