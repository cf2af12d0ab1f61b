namespace StackTiming.Reports.Writing;

/// <summary>Why a file could not be written. Nothing was written then, and what stood there before still stands.</summary>
/// <param name="Path">The file, as the user named it.</param>
/// <param name="Message">What is wrong, in a sentence without a final full stop.</param>
/// <param name="Advice">What to do about it, or null.</param>
public sealed record OutputProblem(string Path, string Message, string? Advice)
{
    /// <inheritdoc/>
    public override string ToString() => Advice is null ? $"{Path}: {Message}" : $"{Path}: {Message}; {Advice}";

    /// <summary>The problem behind a failure of the file system.</summary>
    /// <param name="path">The file, as the user named it.</param>
    /// <param name="failure">The failure.</param>
    public static OutputProblem From(string path, Exception failure) => failure switch
    {
        UnauthorizedAccessException => new(path, "cannot be written: permission denied", "choose another folder, or ask for the right to write there"),
        DirectoryNotFoundException => new(path, $"cannot be written: the folder {FolderOf(path)} does not exist", "create it first, or choose another folder"),
        PathTooLongException => new(path, "cannot be written: the path is too long", "choose a shorter name"),
        IOException io when IsFull(io) => new(path, "cannot be written: the disk is full", "free some space, or choose another disk"),
        _ => new(path, "cannot be written: " + failure.Message.TrimEnd('.'), null),
    };

    private static string FolderOf(string path) => System.IO.Path.GetDirectoryName(System.IO.Path.GetFullPath(path)) ?? path;

    // ENOSPC and EDQUOT of POSIX, ERROR_DISK_FULL and ERROR_HANDLE_DISK_FULL of Windows.
    private static bool IsFull(IOException failure) =>
        OperatingSystem.IsWindows() ? (failure.HResult & 0xFFFF) is 112 or 39 : failure.HResult is 28 or 122 || failure.Message.Contains("No space left", StringComparison.Ordinal);
}
