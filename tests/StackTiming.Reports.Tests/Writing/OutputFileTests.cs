using System.Text;
using StackTiming.Reports.Writing;
using Xunit;

namespace StackTiming.Reports.Tests.Writing;

public sealed class OutputFileTests : IDisposable
{
    private readonly string folder = Directory.CreateTempSubdirectory("stacktiming-output-").FullName;

    public void Dispose() => Directory.Delete(folder, recursive: true);

    private string In(string name) => Path.Combine(folder, name);

    private static Action<Stream> Text(string text) => s => s.Write(Encoding.UTF8.GetBytes(text));

    [Fact]
    public void File_appears_with_its_content_and_leaves_nothing_else()
    {
        Assert.Null(OutputFile.Write(In("a.json"), Text("new")));
        Assert.Equal("new", File.ReadAllText(In("a.json")));
        Assert.Equal([In("a.json")], Directory.GetFileSystemEntries(folder));
    }

    [Fact]
    public void Failure_half_way_keeps_the_old_file_and_leaves_no_temporary_file()
    {
        File.WriteAllText(In("a.json"), "old");
        var problem = OutputFile.Write(In("a.json"), s =>
        {
            s.Write(new byte[300_000]);
            throw new IOException("No space left on device");
        });
        Assert.Equal($"{In("a.json")}: cannot be written: the disk is full; free some space, or choose another disk", problem?.ToString());
        Assert.Equal("old", File.ReadAllText(In("a.json")));
        Assert.Equal([In("a.json")], Directory.GetFileSystemEntries(folder));
    }

    [Fact]
    public void Interruption_half_way_passes_on_and_leaves_nothing()
    {
        Assert.Throws<OperationCanceledException>(() => OutputFile.Write(In("a.pdf"), s =>
        {
            s.WriteByte(1);
            throw new OperationCanceledException();
        }));
        Assert.Empty(Directory.GetFileSystemEntries(folder));
    }

    [Fact]
    public void Folder_in_place_of_a_file_is_reported()
    {
        Directory.CreateDirectory(In("sub"));
        Assert.Contains("is a folder", OutputFile.Write(In("sub"), Text("x"))!.Message, StringComparison.Ordinal);
        Assert.Contains("is a folder", OutputFile.Write(In("other/"), Text("x"))!.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Missing_folder_is_reported_with_its_name()
    {
        var problem = OutputFile.Write(In("missing/a.json"), Text("x"));
        Assert.Contains($"the folder {In("missing")} does not exist", problem!.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void File_in_place_of_a_folder_is_reported()
    {
        File.WriteAllText(In("plain"), "");
        Assert.NotNull(OutputFile.Write(In("plain/a.json"), Text("x")));
    }

    [Theory]
    [InlineData("")]
    [InlineData("  ")]
    [InlineData("a\0b")]
    public void Names_that_are_none_are_reported(string path) =>
        Assert.Equal("is not a file name", OutputFile.Write(path, Text("x"))!.Message);

    [Fact]
    public void Write_protected_file_stays_as_it_is()
    {
        File.WriteAllText(In("a.json"), "old");
        File.SetAttributes(In("a.json"), FileAttributes.ReadOnly);
        var problem = OutputFile.Write(In("a.json"), Text("new"));
        File.SetAttributes(In("a.json"), FileAttributes.Normal);
        Assert.Equal("is write-protected", problem!.Message);
        Assert.Equal("old", File.ReadAllText(In("a.json")));
    }

    [Fact]
    public void Link_stays_and_its_target_is_replaced()
    {
        File.WriteAllText(In("target"), "old");
        File.CreateSymbolicLink(In("link"), In("target"));
        Assert.Null(OutputFile.Write(In("link"), Text("new")));
        Assert.Equal("new", File.ReadAllText(In("target")));
        Assert.NotNull(new FileInfo(In("link")).LinkTarget);
    }

    [Fact]
    public void Full_device_is_reported_as_full()
    {
        if (!File.Exists("/dev/full"))
            Assert.Skip("this system has no /dev/full");
        Assert.Contains("the disk is full", OutputFile.Write("/dev/full", Text("x"))!.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Folder_without_permission_is_reported()
    {
        if (!Directory.Exists("/proc/self/task"))
            Assert.Skip("this system has no folder in which nobody may write");
        Assert.NotNull(OutputFile.Write("/proc/self/task/a.json", Text("x")));
    }

    [Fact]
    public void Files_of_a_run_appear_together_or_not_at_all()
    {
        using (var run = new OutputRun())
        {
            Assert.Null(run.Stage(In("a.json"), Text("a")));
            Assert.False(File.Exists(In("a.json")));
            Assert.NotNull(run.Stage(In("missing/b.pdf"), Text("b")));
        }
        Assert.Empty(Directory.GetFileSystemEntries(folder));

        using (var run = new OutputRun())
        {
            Assert.Null(run.Stage(In("a.json"), Text("a")));
            Assert.Null(run.Stage(In("b.pdf"), Text("b")));
            Assert.Null(run.Commit());
        }
        Assert.Equal("a", File.ReadAllText(In("a.json")));
        Assert.Equal("b", File.ReadAllText(In("b.pdf")));
    }

    [Fact]
    public void Same_file_named_twice_is_reported()
    {
        using var run = new OutputRun();
        Assert.Null(run.Stage(In("a.json"), Text("a")));
        Assert.Equal("is named twice as an output", run.Stage(In("sub/../a.json"), Text("b"))!.Message);
    }
}
