using System.CommandLine;
using RuleAndCompass.CommandLine.Display;
using RuleAndCompass.CommandLine.Files;

namespace RuleAndCompass.CommandLine.Commands;

/// <summary><c>setout plates FILE --only steps|full|cut -o OUT</c>: one of the plates singly.</summary>
internal static class PlatesCommand
{
    public static Command Build(Surroundings surroundings)
    {
        Option<string?> only = new("--only") { Description = "Which plates", HelpName = string.Join('|', PlateFiles.Kinds), Required = true };
        only.AcceptOnlyFromAmong([.. PlateFiles.Kinds]);
        Option<string?> output = new("-o", "--output") { Description = "The file; its ending says the format", HelpName = "OUT", Required = true };
        Command command = new("plates", "Write one of the plates, in the format that the file's name ends in")
        {
            surroundings.Options.File, only, output, surroundings.Options.Force,
        };
        foreach (Option option in surroundings.Options.ForMaking)
            command.Options.Add(option);
        command.SetAction(parsed => Run(parsed, parsed.GetRequiredValue(only)!, parsed.GetRequiredValue(output)!, surroundings));
        return command;
    }

    private static int Run(ParseResult parsed, string only, string output, Surroundings surroundings)
    {
        (Terminal terminal, CommonOptions options, CancellationToken cancellation) = surroundings;
        string ending = Path.GetExtension(output).TrimStart('.').ToLowerInvariant();
        if (!PlateFiles.EndingsOf(only).Contains(ending))
            throw new StopException(CommandLineFindings.UnknownEnding(output, $"`--only {only}`", string.Join(" or ", PlateFiles.EndingsOf(only).Select(known => $"`.{known}`"))), ExitCode.CommandLineWrong);
        ScriptRun run = ScriptRun.Single(parsed, surroundings);
        if (run.Layout is not { } layout)
            return run.Status;
        OutputFiles.Check([output], run.Script.Name, parsed.GetValue(options.Force));
        OutputFiles files = new(run.Script.Name, parsed.GetValue(options.Force));
        files.Add(output, PlateFiles.Write(layout, only, run.Findings, cancellation));
        files.Write(cancellation);
        if (!parsed.GetValue(options.Quiet))
            terminal.Output.WriteLine(output);
        return run.Status;
    }
}
