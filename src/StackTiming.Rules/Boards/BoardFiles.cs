using System.Collections.Immutable;
using StackTiming.Rules.Results;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Boards;

/// <summary>
/// The files that a board consists of: finds them relative to the file that names them, reads each once, and keeps their digests.
/// </summary>
/// <param name="boardPath">Path of the board file as the user wrote it.</param>
/// <param name="problems">Where problems go.</param>
public sealed class BoardFiles(string boardPath, ProblemList problems)
{
    // Room for some two million routed segments; longer text does not fit into one string.
    private const long LargestLengthList = 900L << 20;

    private readonly string home = Path.GetDirectoryName(Path.GetFullPath(boardPath)) ?? "";
    private readonly Dictionary<string, InputFile?> loaded = new(StringComparer.Ordinal);
    private readonly Dictionary<string, DataMap?> parsed = new(StringComparer.Ordinal);
    private readonly HashSet<string> outsideFull = new(StringComparer.Ordinal);
    private readonly List<string> outside = [];
    private readonly List<InputDigest> digests = [];

    /// <summary>The files read so far, in the order of reading.</summary>
    public ImmutableArray<InputDigest> Digests => [.. digests];

    /// <summary>
    /// The path of a file as messages show it, from the path that another file gives. A file outside the board's folder is noted by <see cref="NoteOutside"/>.
    /// </summary>
    /// <param name="path">The path as written, relative to the file that names it.</param>
    /// <param name="from">Where it is written.</param>
    /// <returns>The path, or null with a problem.</returns>
    public string? Resolve(string path, FilePosition from)
    {
        if (InputPath.Resolve(from.File, path, problems, from) is not { } shown)
            return null;
        if (!InputPath.LiesInside(home, shown) && outsideFull.Add(Path.GetFullPath(shown)))
            outside.Add(Suggestion.Shorten(shown));
        return shown;
    }

    /// <summary>Notes, in one line, which files lie outside the board's folder: whoever archives the board needs them too.</summary>
    /// <param name="board">The board file.</param>
    public void NoteOutside(FilePosition board)
    {
        if (outside.Count > 0)
            problems.Note(board, $"outside the board's folder: {string.Join(", ", outside)}", "keep these with the board when you archive it");
    }

    /// <summary>Reads a file.</summary>
    /// <param name="shown">Its path, from <see cref="Resolve"/>.</param>
    /// <param name="from">Where it is named.</param>
    /// <param name="role">What it is, for the list of inputs.</param>
    /// <returns>The file, or null with a problem.</returns>
    public InputFile? Load(string shown, FilePosition from, string role)
    {
        var full = Path.GetFullPath(shown);
        if (loaded.TryGetValue(full, out var before))
            return before;
        var file = InputFileLoader.Load(shown, from, problems, role == "lengths" ? LargestLengthList : InputFileLoader.LargestFile);
        loaded[full] = file;
        if (file is not null)
            digests.Add(new InputDigest(role, file.Path, file.Sha256));
        return file;
    }

    /// <summary>Reads a structured file whose content is a mapping.</summary>
    /// <param name="shown">Its path, from <see cref="Resolve"/>.</param>
    /// <param name="from">Where it is named.</param>
    /// <param name="role">What it is, for the list of inputs.</param>
    /// <returns>The mapping, or null with a problem.</returns>
    public DataMap? Yaml(string shown, FilePosition from, string role)
    {
        var full = Path.GetFullPath(shown);
        if (parsed.TryGetValue(full, out var before))
            return before;
        var map = Load(shown, from, role) is { } file ? YamlDocument.ReadMap(file, problems) : null;
        parsed[full] = map;
        return map;
    }
}
