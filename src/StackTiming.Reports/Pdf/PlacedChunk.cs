namespace StackTiming.Reports.Pdf;

/// <summary>A piece where it stands on its page.</summary>
/// <param name="Chunk">The piece.</param>
/// <param name="Y">Its top edge, points from the top of the sheet.</param>
internal readonly record struct PlacedChunk(Chunk Chunk, float Y);

/// <summary>An entry of the outline.</summary>
/// <param name="Level">Level, from 1.</param>
/// <param name="Text">Its text.</param>
/// <param name="Page">Page, from 1.</param>
/// <param name="Y">Height on the page, points from the top.</param>
internal readonly record struct OutlineEntry(int Level, string Text, int Page, float Y);
