using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Stackups.Tests.Reading;

public sealed class InputPathTests
{
    private readonly ProblemList problems = new();

    [Theory]
    [InlineData("boards/rev-c/board.yaml", "buoy.stackup.yaml", "boards/rev-c/buoy.stackup.yaml")]
    [InlineData("boards/rev-c/board.yaml", "../buoy.stackup.yaml", "boards/buoy.stackup.yaml")]
    [InlineData("boards/rev-c/board.yaml", "./a/./b.yaml", "boards/rev-c/a/b.yaml")]
    [InlineData("board.yaml", "../x.yaml", "../x.yaml")]
    [InlineData("../board.yaml", "../x.yaml", "../../x.yaml")]
    [InlineData("board.yaml", "parts\\x.yaml", "parts/x.yaml")]
    [InlineData("/b/c/board.yaml", "../x.yaml", "/b/x.yaml")]
    [InlineData("board.yaml", "/lib/x.yaml", "/lib/x.yaml")]
    public void Paths_are_relative_to_the_file_that_names_them(string baseFile, string written, string expected)
    {
        Assert.Equal(expected, InputPath.Resolve(baseFile, written, problems, default));
        Assert.Empty(problems.Items);
    }

    [Theory]
    [InlineData("")]
    [InlineData("  ")]
    [InlineData("a\0b")]
    public void Paths_that_name_nothing_are_refused(string written)
    {
        Assert.Null(InputPath.Resolve("board.yaml", written, problems, new FilePosition("board.yaml", 2, 9)));
        Assert.Equal("board.yaml:2:9: error: the path is empty; write the path of a file, relative to this one", Assert.Single(problems.Items).ToString());
    }

    [Theory]
    [InlineData("", "x.yaml", true)]
    [InlineData("", "sub/x.yaml", true)]
    [InlineData("", "..x.yaml", true)]
    [InlineData("", "../x.yaml", false)]
    [InlineData("/b/board", "/b/board/sub/x.yaml", true)]
    [InlineData("/b/board/", "/b/board/x.yaml", true)]
    [InlineData("/b/board", "/b/board-2/x.yaml", false)]
    [InlineData("/b/board", "/b/board/../x.yaml", false)]
    [InlineData("/", "/x.yaml", true)]
    public void What_lies_outside_the_folder_is_noted(string folder, string path, bool inside)
    {
        Assert.Equal(inside, InputPath.LiesInside(folder, path));
        InputPath.NoteIfOutside(folder, path, problems, default);
        Assert.Equal(inside ? 0 : 1, problems.Items.Count);
        Assert.False(problems.HasErrors);
    }
}
