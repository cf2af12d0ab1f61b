namespace StackTiming.Stackups.Reading;

/// <summary>Something in an input file that is wrong, or that its author should know.</summary>
/// <param name="At">Where.</param>
/// <param name="Message">What is wrong, in a sentence without a final full stop.</param>
/// <param name="Advice">What to write instead, or null where nothing can be proposed.</param>
/// <param name="IsError">True where no model can be made; false for a note that does not stop the run.</param>
public sealed record Problem(FilePosition At, string Message, string? Advice, bool IsError)
{
    /// <inheritdoc/>
    public override string ToString()
    {
        var kind = IsError ? "error" : "note";
        return Advice is null ? $"{At}: {kind}: {Message}" : $"{At}: {kind}: {Message}; {Advice}";
    }
}
