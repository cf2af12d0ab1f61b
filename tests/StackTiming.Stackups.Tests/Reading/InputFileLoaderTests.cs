using System.Diagnostics;
using System.Text;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Stackups.Tests.Reading;

public sealed class InputFileLoaderTests : IDisposable
{
    private const string Text = "name: 50 Ω ±10 %\n";
    private readonly string folder = Directory.CreateTempSubdirectory("stacktiming").FullName;

    public void Dispose() => Directory.Delete(folder, recursive: true);

    private string Write(string name, params byte[] bytes)
    {
        var path = Path.Combine(folder, name);
        File.WriteAllBytes(path, bytes);
        return path;
    }

    private static (InputFile? File, ProblemList Problems) Load(string path, long largest = InputFileLoader.LargestFile)
    {
        var problems = new ProblemList();
        return (InputFileLoader.Load(path, default, problems, largest), problems);
    }

    private static string OnlyProblem(string path, long largest = InputFileLoader.LargestFile)
    {
        var (file, problems) = Load(path, largest);
        Assert.Null(file);
        return Assert.Single(problems.Items).ToString();
    }

    public static TheoryData<string, byte[]> Encodings() => new()
    {
        { "UTF-8", Encoding.UTF8.GetBytes(Text) },
        { "UTF-8 with a mark", [0xEF, 0xBB, 0xBF, .. Encoding.UTF8.GetBytes(Text)] },
        { "UTF-16, low byte first", [0xFF, 0xFE, .. Encoding.Unicode.GetBytes(Text)] },
        { "UTF-16, high byte first", [0xFE, 0xFF, .. Encoding.BigEndianUnicode.GetBytes(Text)] },
    };

    [Theory]
    [MemberData(nameof(Encodings))]
    public void Reads_Unicode_with_and_without_a_mark(string name, byte[] bytes)
    {
        var (file, problems) = Load(Write(name, bytes));
        Assert.Empty(problems.Items);
        Assert.Equal(Text, file!.Text);
    }

    // The digest of "abc" is given in FIPS 180-4's example file (NIST, SHA256.pdf).
    [Fact]
    public void The_digest_is_that_of_the_bytes() =>
        Assert.Equal("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad", Load(Write("abc", "abc"u8.ToArray())).File!.Sha256);

    [Fact]
    public void Bytes_of_another_encoding_are_located()
    {
        var path = Write("latin.yaml", Encoding.Latin1.GetBytes("a: 1\nb: 5 µm\n"));
        Assert.Equal($"{path}:2: error: the text is not valid UTF-8; save the file as UTF-8", OnlyProblem(path));
    }

    [Fact]
    public void Half_a_character_of_UTF16_is_refused() =>
        Assert.EndsWith("error: the text is not valid UTF-16; save the file as UTF-8", OnlyProblem(Write("odd", 0xFF, 0xFE, 65, 0, 66)));

    [Fact]
    public void NUL_characters_are_located()
    {
        var path = Write("nul.yaml", "a: 1\nb: \0\n"u8.ToArray());
        Assert.Equal($"{path}:2: error: the file contains NUL characters; save it as UTF-8 text; UTF-16 needs a byte-order mark", OnlyProblem(path));
    }

    [Theory]
    [InlineData("")]
    [InlineData(" \n\t\n")]
    public void Files_without_content_are_refused(string content) =>
        Assert.Contains("empty", OnlyProblem(Write("blank.yaml", Encoding.UTF8.GetBytes(content))));

    [Fact]
    public void A_missing_file_is_reported_where_it_is_named()
    {
        var problems = new ProblemList();
        var path = Path.Combine(folder, "none.yaml");
        Assert.Null(InputFileLoader.Load(path, new FilePosition("board.yaml", 3, 10), problems));
        Assert.Equal(
            $"board.yaml:3:10: error: '{Suggestion.Shorten(path)}' does not exist; check the path; it is relative to the file that names it",
            Assert.Single(problems.Items).ToString());
    }

    [Fact]
    public void A_folder_is_no_file() => Assert.EndsWith("is a folder; name a file in it", OnlyProblem(folder));

    [Theory]
    [InlineData("")]
    [InlineData("a\0b")]
    public void Impossible_paths_are_refused(string path) => Assert.Contains("the path of a file is empty or has a NUL character", OnlyProblem(path));

    [Fact]
    public void Files_above_the_limit_are_not_read()
    {
        var path = Write("large", new byte[3 << 20]);
        Assert.EndsWith("has 3 MiB; at most 2 MiB are read; split it, or check that it is the right file", OnlyProblem(path, 2 << 20));
    }

    [Fact]
    public void Devices_and_pipes_are_refused_before_a_byte_is_read()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux(), "needs /dev and mkfifo");
        Assert.Contains("not a regular file", OnlyProblem("/dev/zero"));
        var link = Path.Combine(folder, "link");
        File.CreateSymbolicLink(link, "/dev/zero");
        Assert.Contains("not a regular file", OnlyProblem(link));
        var pipe = Path.Combine(folder, "pipe");
        using (var make = Process.Start("mkfifo", pipe))
            make.WaitForExit();
        Assert.Contains("not a regular file", OnlyProblem(pipe));
    }

    [Fact]
    public void Links_are_followed_and_broken_ones_reported()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "links need privileges there");
        Write("real.yaml", Encoding.UTF8.GetBytes(Text));
        var (good, broken, loop) = (Path.Combine(folder, "good"), Path.Combine(folder, "broken"), Path.Combine(folder, "loop"));
        File.CreateSymbolicLink(good, "real.yaml");
        File.CreateSymbolicLink(broken, "nowhere.yaml");
        File.CreateSymbolicLink(loop, loop);
        Assert.Equal(Text, Load(good).File!.Text);
        Assert.EndsWith("leads to a file that does not exist; check where the link points", OnlyProblem(broken));
        Assert.Contains("cannot be read", OnlyProblem(loop));
    }

    [Fact]
    public void A_file_without_permission_is_reported()
    {
        // The superuser may read everything.
        Assert.SkipWhen(OperatingSystem.IsWindows() || Environment.UserName == "root", "needs a user whom permissions bind");
        var path = Write("closed.yaml", Encoding.UTF8.GetBytes(Text));
        if (!OperatingSystem.IsWindows())
            File.SetUnixFileMode(path, UnixFileMode.None);
        Assert.EndsWith("may not be read by this user; change its permissions", OnlyProblem(path));
    }
}
