using System.Security.Cryptography;

namespace StackTiming.Reports.Writing;

/// <summary>
/// The files of one run, which appear together or not at all. Each is written beside its destination under a temporary name and
/// flushed to the disk; <see cref="Commit"/> then renames them. Whatever was not committed is deleted.
/// </summary>
public sealed class OutputRun : IDisposable
{
    private readonly List<(string Shown, string Temporary, string Destination)> staged = [];
    private readonly List<(string Shown, string Device, MemoryStream Content)> devices = [];

    /// <summary>Writes a file under a temporary name.</summary>
    /// <param name="path">Its destination, as the user named it.</param>
    /// <param name="write">Writes its content.</param>
    /// <returns>What prevents it, or null.</returns>
    public OutputProblem? Stage(string path, Action<Stream> write)
    {
        var problem = Check(path, out var destination);
        if (problem is not null)
            return problem;
        if (staged.Exists(s => s.Destination == destination))
            return new OutputProblem(path, "is named twice as an output", "give each output a file of its own");
        if (IsDevice(destination))
        {
            var content = new MemoryStream();
            write(content);
            devices.Add((path, destination, content));
            return null;
        }

        var temporary = Path.Combine(
            Path.GetDirectoryName(destination)!, $".{Shorten(Path.GetFileName(destination))}.{Convert.ToHexStringLower(RandomNumberGenerator.GetBytes(6))}.part");
        var created = false;
        try
        {
            using (var stream = new FileStream(temporary, FileMode.CreateNew, FileAccess.Write, FileShare.None, 1 << 16))
            {
                created = true;
                staged.Add((path, temporary, destination));
                write(stream);
                stream.Flush(flushToDisk: true);
            }
            return null;
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException or NotSupportedException)
        {
            if (created)
                Forget(temporary);
            return OutputProblem.From(path, failure);
        }
        catch
        {
            if (created)
                Forget(temporary);
            throw;
        }
    }

    /// <summary>Gives the staged files their names.</summary>
    /// <returns>What prevents it, or null. Files renamed before the obstacle keep their new content; the others are as they were.</returns>
    public OutputProblem? Commit()
    {
        while (staged.Count > 0)
        {
            var (shown, temporary, destination) = staged[0];
            try
            {
                File.Move(temporary, destination, overwrite: true);
            }
            catch (Exception failure) when (failure is IOException or UnauthorizedAccessException)
            {
                return OutputProblem.From(shown, failure);
            }
            staged.RemoveAt(0);
        }
        foreach (var (shown, device, content) in devices)
        {
            try
            {
                using var stream = new FileStream(device, FileMode.Open, FileAccess.Write, FileShare.ReadWrite, 0);
                content.WriteTo(stream);
            }
            catch (Exception failure) when (failure is IOException or UnauthorizedAccessException)
            {
                return OutputProblem.From(shown, failure);
            }
        }
        devices.Clear();
        return null;
    }

    /// <summary>Deletes what was not committed.</summary>
    public void Dispose()
    {
        while (staged.Count > 0)
            Forget(staged[^1].Temporary);
    }

    private static OutputProblem? Check(string path, out string destination)
    {
        destination = "";
        if (string.IsNullOrWhiteSpace(path) || path.Contains('\0', StringComparison.Ordinal))
            return new OutputProblem(path, "is not a file name", "name a file");
        try
        {
            destination = Path.GetFullPath(path);
            // A link is followed, so that the file it points to is replaced and the link stays.
            if (new FileInfo(destination).LinkTarget is not null && File.ResolveLinkTarget(destination, returnFinalTarget: true) is { } target)
                destination = target.FullName;
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException)
        {
            return OutputProblem.From(path, failure);
        }
        if (Directory.Exists(destination) || Path.EndsInDirectorySeparator(path))
            return new OutputProblem(path, "is a folder", "name a file in it");
        if (File.Exists(destination) && File.GetAttributes(destination).HasFlag(FileAttributes.ReadOnly))
            return new OutputProblem(path, "is write-protected", "choose another name, or make it writable");
        return null;
    }

    // A device is never replaced by a file; what is written to it cannot be taken back, so it comes last.
    private static bool IsDevice(string path) =>
        !OperatingSystem.IsWindows() && (path.StartsWith("/dev/", StringComparison.Ordinal) || path.StartsWith("/proc/", StringComparison.Ordinal)) && File.Exists(path);

    private static string Shorten(string name) => name.Length <= 60 ? name : name[..60];

    private void Forget(string temporary)
    {
        staged.RemoveAll(s => s.Temporary == temporary);
        try
        {
            File.Delete(temporary);
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException)
        {
            // The folder may have vanished meanwhile; there is nothing left to undo then.
        }
    }
}
