using Xunit;

namespace StackTiming.Acceptance;

public sealed class CommandLineTests
{
    [Fact]
    public void Help_of_the_program_shows_commands_examples_and_exit_codes()
    {
        var run = Tool.Run("--help");
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("completion", run.Output);
        Assert.Contains("Examples:", run.Output);
        Assert.Contains("130 interrupted", run.Output);
    }

    [Fact]
    public void An_unknown_command_is_wrong_input()
    {
        var run = Tool.Run("chekc");
        Assert.Equal(2, run.ExitCode);
        Assert.Contains("'chekc'", run.Error);
        Assert.Contains("stacktiming --help", run.Error);
        Assert.Empty(run.Output);
    }

    [Theory]
    [InlineData("bash")]
    [InlineData("zsh")]
    [InlineData("fish")]
    [InlineData("pwsh")]
    public void Completion_scripts_ask_the_program_what_can_follow(string shell)
    {
        var run = Tool.Run("completion", shell);
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("[suggest:", run.Output);
    }

    [Fact]
    public void The_suggest_directive_proposes_commands()
    {
        var run = Tool.Run("[suggest:14]", "stacktiming co");
        Assert.Contains("completion", run.Output);
    }
}
