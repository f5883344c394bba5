using System.CommandLine;
using RuleAndCompass.CommandLine.Display;
using RuleAndCompass.CommandLine.Files;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.CommandLine.Commands;

/// <summary><c>setout tidy FILE…</c>: scripts in the one standard layout, written in place; from standard input to standard output.</summary>
internal static class TidyCommand
{
    public static Command Build(Surroundings surroundings)
    {
        Option<bool> check = new("--check") { Description = "Write nothing; tell which scripts are not tidy, and end with status 1 if there are any" };
        Command command = new("tidy", "Put scripts into the one standard layout")
        {
            surroundings.Options.Files, check,
        };
        command.SetAction(parsed => Run(parsed, parsed.GetValue(check), surroundings));
        return command;
    }

    private static int Run(ParseResult parsed, bool checkOnly, Surroundings surroundings)
    {
        int status = ExitCode.Well;
        foreach (string path in parsed.GetRequiredValue(surroundings.Options.Files))
        {
            surroundings.Cancellation.ThrowIfCancellationRequested();
            try
            {
                status = Math.Max(status, Tidy(path, checkOnly, parsed.GetValue(surroundings.Options.Quiet), surroundings));
            }
            catch (StopException stop)
            {
                Findings.Show(surroundings.Terminal, stop.Finding);
                status = Math.Max(status, stop.Status);
            }
        }

        return status;
    }

    private static int Tidy(string path, bool checkOnly, bool quiet, Surroundings surroundings)
    {
        Terminal terminal = surroundings.Terminal;
        ScriptFile script = ScriptFile.Read(path, surroundings);
        Outcome<Script> read = ScriptReader.Read(script.Name, script.Text, cancellation: surroundings.Cancellation);
        if (read.Value is null || read.HasErrors)
        {
            // A sentence that can't be read would be lost.
            Findings.Show(terminal, script.Name, script.Text, read.Diagnostics);
            return ExitCode.ScriptWrong;
        }

        string tidied = TidyPrinter.Print(read.Value);
        bool isTidy = tidied == script.Text;
        if (checkOnly)
        {
            if (!isTidy)
                Findings.Show(terminal, CommandLineFindings.NotTidy(path));
            return isTidy ? ExitCode.Well : ExitCode.ScriptWrong;
        }

        if (path == ScriptFile.StandardInput)
        {
            terminal.Output.Write(tidied);
            return ExitCode.Well;
        }

        if (isTidy)
            return ExitCode.Well;
        OutputFiles files = new(script.Name, force: true);
        files.Add(Target(path), tidied);
        files.Write(surroundings.Cancellation);
        if (!quiet)
            terminal.Output.WriteLine(path);
        return ExitCode.Well;
    }

    // A link stays a link: what it leads to is rewritten.
    private static string Target(string path)
    {
        try
        {
            return File.ResolveLinkTarget(path, returnFinalTarget: true)?.FullName ?? path;
        }
        catch (Exception failure) when (OutputFiles.IsFileTrouble(failure))
        {
            throw new StopException(CommandLineFindings.CannotWrite(path, OutputFiles.Reason(failure)), ExitCode.FileTrouble);
        }
    }
}
