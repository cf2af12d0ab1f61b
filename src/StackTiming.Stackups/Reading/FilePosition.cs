namespace StackTiming.Stackups.Reading;

/// <summary>A place in an input file. Line and column count from 1; 0 means the file as a whole.</summary>
/// <param name="File">The path as the user wrote it, or as the file that names it implies.</param>
/// <param name="Line">Line, from 1; 0 for the whole file.</param>
/// <param name="Column">Column in characters, from 1; 0 for the whole line.</param>
public readonly record struct FilePosition(string File, int Line, int Column)
{
    /// <summary>The file as a whole.</summary>
    /// <param name="file">Its path.</param>
    public static FilePosition WholeFile(string file) => new(file, 0, 0);

    /// <inheritdoc/>
    public override string ToString() => Line <= 0 ? File : Column <= 0 ? $"{File}:{Line}" : $"{File}:{Line}:{Column}";
}
