using System.Text.RegularExpressions;
using Xunit;

namespace StackTiming.Acceptance;

/// <summary>The README's files and commands, taken from its text and run as a new user would.</summary>
public sealed partial class ReadmeTests
{
    [Fact]
    public void Every_command_of_the_README_runs_on_the_files_of_the_README()
    {
        var readme = File.ReadAllText(Path.Combine(Tool.Root, "README.md"));
        using var folder = new TemporaryFolder();
        var files = FileBlock().Matches(readme);
        Assert.Equal(7, files.Count);
        foreach (Match file in files)
            folder.Write(file.Groups[1].Value, file.Groups[2].Value);
        var commands = ShellBlock().Matches(readme).SelectMany(m => m.Groups[1].Value.Split('\n', StringSplitOptions.RemoveEmptyEntries))
            .Where(c => c.StartsWith("stacktiming ", StringComparison.Ordinal)).ToArray();
        Assert.True(commands.Length >= 9);
        foreach (var command in commands)
        {
            var run = Tool.RunIn(folder.Path, null, command.Split(' ')[1..]);
            Assert.True(run.ExitCode == 0, $"{command}: {run.ExitCode}\n{run.Error}{run.Output}");
        }
        Assert.StartsWith("%PDF-", File.ReadAllText(folder.PathOf("board.pdf")));
        Assert.Contains("<svg", File.ReadAllText(folder.PathOf("clk.svg")));
    }

    [GeneratedRegex("<!-- file: (\\S+) -->\\n```\\w+\\n(.*?)```", RegexOptions.Singleline)]
    private static partial Regex FileBlock();

    [GeneratedRegex("```sh\\n(.*?)```", RegexOptions.Singleline)]
    private static partial Regex ShellBlock();
}
