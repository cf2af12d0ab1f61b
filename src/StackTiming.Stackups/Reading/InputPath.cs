namespace StackTiming.Stackups.Reading;

/// <summary>Paths that one input file gives of another.</summary>
public static class InputPath
{
    /// <summary>The path of a file as messages show it: relative paths are relative to the file that names them.</summary>
    /// <param name="baseFile">The file that names it.</param>
    /// <param name="written">The path as written there.</param>
    /// <param name="problems">Where problems go.</param>
    /// <param name="at">Where it is written.</param>
    /// <returns>The path, or null with a problem.</returns>
    public static string? Resolve(string baseFile, string written, ProblemList problems, FilePosition at)
    {
        if (string.IsNullOrWhiteSpace(written) || written.Contains('\0', StringComparison.Ordinal))
        {
            problems.Error(at, "the path is empty", "write the path of a file, relative to this one");
            return null;
        }
        return Path.IsPathRooted(written) ? written : Normal(Path.Combine(Path.GetDirectoryName(baseFile) ?? "", written));
    }

    /// <summary>Says that a file lies outside a folder, so that whoever archives the folder does not forget it.</summary>
    /// <param name="folder">The folder that should hold everything.</param>
    /// <param name="path">The path of the file, from <see cref="Resolve"/>.</param>
    /// <param name="problems">Where the note goes.</param>
    /// <param name="at">Where the path is written.</param>
    public static void NoteIfOutside(string folder, string path, ProblemList problems, FilePosition at)
    {
        if (!LiesInside(folder, path))
            problems.Note(at, $"'{Suggestion.Shorten(path)}' lies outside the folder of the file that was opened", "keep the two together when you archive them");
    }

    /// <summary>Whether a path leads into a folder or one below it, as the paths are written (links are not followed).</summary>
    /// <param name="folder">The folder; empty is the current one.</param>
    /// <param name="path">The path.</param>
    public static bool LiesInside(string folder, string path)
    {
        var home = Path.TrimEndingDirectorySeparator(Path.GetFullPath(folder.Length == 0 ? "." : folder));
        var relative = Path.GetRelativePath(home, Path.GetFullPath(path));
        return !Path.IsPathRooted(relative) && relative != ".." && !relative.StartsWith("../", StringComparison.Ordinal) && !relative.StartsWith("..\\", StringComparison.Ordinal);
    }

    // Takes x/.. out of a relative path, so that messages stay short; leading .. remain.
    private static string Normal(string path)
    {
        if (Path.IsPathRooted(path))
            return Path.GetFullPath(path);
        var parts = new List<string>();
        foreach (var part in path.Split('/', '\\'))
        {
            if (part == ".." && parts.Count > 0 && parts[^1] != "..")
                parts.RemoveAt(parts.Count - 1);
            else if (part.Length > 0 && part != ".")
                parts.Add(part);
        }
        return string.Join('/', parts);
    }
}
