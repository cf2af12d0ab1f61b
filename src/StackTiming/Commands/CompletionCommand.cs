using System.CommandLine;
using StackTiming.Terminal;

namespace StackTiming.Commands;

/// <summary><c>stacktiming completion SHELL</c>: prints the script that makes a shell complete commands, options and files.</summary>
internal static class CompletionCommand
{
    /// <summary>The command.</summary>
    public static Command Create()
    {
        var shell = new Argument<string>("shell") { Description = "bash, zsh, fish or pwsh" };
        shell.AcceptOnlyFromAmong("bash", "zsh", "fish", "pwsh");
        var command = new Command("completion", "Print the script that completes commands and options in a shell.") { shell };
        command.SetAction(result =>
        {
            result.InvocationConfiguration.Output.Write(Script(result.GetRequiredValue(shell)));
            return ExitCode.Holds;
        });
        HelpWithExamples.AddTo(command, () => """
            Examples:
              bash:  stacktiming completion bash >> ~/.bashrc
              zsh:   stacktiming completion zsh >> ~/.zshrc
              fish:  stacktiming completion fish > ~/.config/fish/completions/stacktiming.fish
              pwsh:  stacktiming completion pwsh >> $PROFILE
            """);
        return command;
    }

    // Each script asks the program itself, through the suggest directive, what can stand at the cursor.
    private static string Script(string shell) => shell switch
    {
        "bash" => """
            _stacktiming_complete() {
              local line="${COMP_LINE}" IFS=$'\n'
              COMPREPLY=( $(compgen -W "$(stacktiming "[suggest:${COMP_POINT}]" "${line}" 2>/dev/null)" -- "${COMP_WORDS[COMP_CWORD]}") )
            }
            complete -o default -F _stacktiming_complete stacktiming

            """,
        "zsh" => """
            _stacktiming_complete() {
              local -a found
              found=("${(@f)$(stacktiming "[suggest:${CURSOR}]" "${BUFFER}" 2>/dev/null)}")
              compadd -a found
              _files
            }
            compdef _stacktiming_complete stacktiming

            """,
        "fish" => """
            complete -c stacktiming -a '(stacktiming "[suggest:"(commandline -C)"]" (commandline) 2>/dev/null)'

            """,
        _ => """
            Register-ArgumentCompleter -Native -CommandName stacktiming -ScriptBlock {
              param($word, $ast, $cursor)
              stacktiming "[suggest:$cursor]" "$ast" 2>$null | ForEach-Object {
                [System.Management.Automation.CompletionResult]::new($_, $_, 'ParameterValue', $_)
              }
            }

            """,
    };
}
