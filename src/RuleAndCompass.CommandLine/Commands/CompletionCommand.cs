using System.CommandLine;

namespace RuleAndCompass.CommandLine.Commands;

/// <summary><c>setout completion SHELL</c>: a few lines for a shell's start-up file, which ask the program itself for completions.</summary>
internal static class CompletionCommand
{
    private static readonly (string Shell, string Script)[] Shells =
    [
        ("bash", """
            # In ~/.bashrc: eval "$(setout completion bash)"
            _setout_completion() {
                local IFS=$'\n'
                COMPREPLY=($(setout "[suggest:${COMP_POINT}]" "${COMP_LINE}" 2>/dev/null))
            }
            complete -o default -F _setout_completion setout
            """),
        ("fish", """
            # In ~/.config/fish/config.fish: setout completion fish | source
            complete -c setout -a '(setout "[suggest:"(commandline -C)"]" (commandline -p) 2>/dev/null)'
            """),
        ("powershell", """
            # In $PROFILE: setout completion powershell | Out-String | Invoke-Expression
            Register-ArgumentCompleter -Native -CommandName setout -ScriptBlock {
                param($wordToComplete, $commandAst, $cursorPosition)
                setout "[suggest:$cursorPosition]" "$commandAst" 2>$null | ForEach-Object {
                    [System.Management.Automation.CompletionResult]::new($_, $_, 'ParameterValue', $_)
                }
            }
            """),
        ("zsh", """
            # In ~/.zshrc: eval "$(setout completion zsh)"
            _setout_completion() {
                local -a found
                found=("${(@f)$(setout "[suggest:${#BUFFER}]" "$BUFFER" 2>/dev/null)}")
                compadd -a found
                _files
            }
            compdef _setout_completion setout
            """),
    ];

    public static Command Build(Surroundings surroundings)
    {
        Argument<string> shell = new("SHELL") { Description = string.Join(", ", Shells.Select(known => known.Shell)) };
        shell.AcceptOnlyFromAmong([.. Shells.Select(known => known.Shell)]);
        Command command = new("completion", "Print what makes a shell complete this program's words") { shell };
        command.SetAction(parsed =>
        {
            string name = parsed.GetRequiredValue(shell);
            surroundings.Terminal.Output.Write(Shells.First(known => known.Shell == name).Script.ReplaceLineEndings("\n") + "\n");
            return ExitCode.Well;
        });
        return command;
    }
}
