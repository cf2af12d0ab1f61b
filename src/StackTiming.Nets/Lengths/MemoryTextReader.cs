namespace StackTiming.Nets.Lengths;

/// <summary>Reads a piece of a text in memory without copying it first.</summary>
/// <param name="text">The piece.</param>
internal sealed class MemoryTextReader(ReadOnlyMemory<char> text) : TextReader
{
    private int next;

    /// <inheritdoc/>
    public override int Peek() => next < text.Length ? text.Span[next] : -1;

    /// <inheritdoc/>
    public override int Read() => next < text.Length ? text.Span[next++] : -1;

    /// <inheritdoc/>
    public override int Read(Span<char> buffer)
    {
        var count = Math.Min(buffer.Length, text.Length - next);
        text.Span.Slice(next, count).CopyTo(buffer);
        next += count;
        return count;
    }

    /// <inheritdoc/>
    public override int Read(char[] buffer, int index, int count) => Read(buffer.AsSpan(index, count));
}
