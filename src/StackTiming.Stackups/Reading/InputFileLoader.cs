using System.Security.Cryptography;
using System.Text;

namespace StackTiming.Stackups.Reading;

/// <summary>Brings the text of a file into memory, or says why that cannot be done.</summary>
public static class InputFileLoader
{
    /// <summary>Largest structured text file that is read, bytes.</summary>
    public const long LargestFile = 64L << 20;

    /// <summary>Reads a text file in UTF-8 or, with a byte-order mark, UTF-16.</summary>
    /// <param name="path">The path.</param>
    /// <param name="from">What names the file; problems are located there, or at the file itself where it is the default.</param>
    /// <param name="problems">Where problems go.</param>
    /// <param name="largestBytes">Largest size accepted, bytes.</param>
    public static InputFile? Load(string path, FilePosition from, ProblemList problems, long largestBytes = LargestFile)
    {
        var bytes = LoadBytes(path, from, problems, largestBytes);
        return bytes is null ? null : Decode(path, bytes, problems);
    }

    /// <summary>Reads the bytes of a regular file.</summary>
    /// <param name="path">The path.</param>
    /// <param name="from">What names the file.</param>
    /// <param name="problems">Where problems go.</param>
    /// <param name="largestBytes">Largest size accepted, bytes.</param>
    public static byte[]? LoadBytes(string path, FilePosition from, ProblemList problems, long largestBytes = LargestFile)
    {
        var at = string.IsNullOrEmpty(from.File) ? FilePosition.WholeFile(path) : from;
        var shown = Suggestion.Shorten(path);
        if (string.IsNullOrWhiteSpace(path) || path.Contains('\0', StringComparison.Ordinal))
            return Refuse(problems, at, "the path of a file is empty or has a NUL character in it", "write the path of a file");
        try
        {
            if (Directory.Exists(path))
                return Refuse(problems, at, $"'{shown}' is a folder", "name a file in it");
            var info = new FileInfo(path);
            if (!info.Exists)
                return Refuse(problems, at, $"'{shown}' does not exist", "check the path; it is relative to the file that names it");
            var target = info.ResolveLinkTarget(returnFinalTarget: true) as FileInfo ?? info;
            // Devices and pipes, which could never end, state no length: they are refused with empty files before a byte is read.
            if (target.Length == 0)
                return Refuse(problems, at, $"'{shown}' is empty or not a regular file", "name a text file that has content");
            if (target.Length > largestBytes)
                return Refuse(problems, at, $"'{shown}' has {target.Length >> 20} MiB; at most {largestBytes >> 20} MiB are read", "split it, or check that it is the right file");
            return File.ReadAllBytes(path);
        }
        catch (Exception missing) when (missing is FileNotFoundException or DirectoryNotFoundException)
        {
            return Refuse(problems, at, $"'{shown}' leads to a file that does not exist", "check where the link points");
        }
        catch (UnauthorizedAccessException)
        {
            return Refuse(problems, at, $"'{shown}' may not be read by this user", "change its permissions");
        }
        catch (Exception failure) when (failure is IOException or ArgumentException or NotSupportedException or System.Security.SecurityException)
        {
            return Refuse(problems, at, $"'{shown}' cannot be read: {failure.Message}", null);
        }
    }

    /// <summary>Decodes bytes as text.</summary>
    /// <param name="path">The path for messages.</param>
    /// <param name="bytes">The bytes.</param>
    /// <param name="problems">Where problems go.</param>
    public static InputFile? Decode(string path, byte[] bytes, ProblemList problems)
    {
        var name = "UTF-8";
        Encoding encoding = new UTF8Encoding(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);
        var skip = 0;
        if (bytes is [0xEF, 0xBB, 0xBF, ..])
            skip = 3;
        else if (bytes is [0xFF, 0xFE, ..])
            (encoding, skip, name) = (new UnicodeEncoding(bigEndian: false, byteOrderMark: false, throwOnInvalidBytes: true), 2, "UTF-16");
        else if (bytes is [0xFE, 0xFF, ..])
            (encoding, skip, name) = (new UnicodeEncoding(bigEndian: true, byteOrderMark: false, throwOnInvalidBytes: true), 2, "UTF-16");
        string text;
        try
        {
            text = encoding.GetString(bytes, skip, bytes.Length - skip);
        }
        catch (DecoderFallbackException failure)
        {
            var line = 1 + bytes.AsSpan(0, Math.Clamp(failure.Index + skip, 0, bytes.Length)).Count((byte)'\n');
            problems.Error(new FilePosition(path, line, 0), $"the text is not valid {name}", "save the file as UTF-8");
            return null;
        }
        var nul = text.IndexOf('\0');
        if (nul >= 0)
        {
            problems.Error(new FilePosition(path, 1 + text.AsSpan(0, nul).Count('\n'), 0), "the file contains NUL characters", "save it as UTF-8 text; UTF-16 needs a byte-order mark");
            return null;
        }
        if (string.IsNullOrWhiteSpace(text))
        {
            problems.Error(FilePosition.WholeFile(path), "the file is empty");
            return null;
        }
        return new InputFile(path, text, Convert.ToHexStringLower(SHA256.HashData(bytes)));
    }

    private static byte[]? Refuse(ProblemList problems, FilePosition at, string message, string? advice)
    {
        problems.Error(at, message, advice);
        return null;
    }
}
