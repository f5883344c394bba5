using System.CommandLine;
using RuleAndCompass.CommandLine.Display;
using RuleAndCompass.CommandLine.Files;
using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine.Commands;

/// <summary><c>setout begin RECIPE [-o FILE]</c>: a script to start from.</summary>
internal static class BeginCommand
{
    public static Command Build(Surroundings surroundings)
    {
        Argument<string> name = new("RECIPE") { Description = "A recipe of the book, its name in quotes or closed up by hyphens" };
        name.CompletionSources.Add(_ => RecipeBook.Names.Select(known => new System.CommandLine.Completions.CompletionItem(known)));
        Option<string?> output = new("-o", "--output") { Description = "The file; without it, standard output", HelpName = "FILE" };
        Command command = new("begin", "Write a script to start from, which follows a recipe with its needs filled in")
        {
            name, output, surroundings.Options.Force,
        };
        command.SetAction(parsed => Run(parsed, parsed.GetRequiredValue(name), parsed.GetValue(output), surroundings));
        return command;
    }

    private static int Run(ParseResult parsed, string name, string? output, Surroundings surroundings)
    {
        Terminal terminal = surroundings.Terminal;
        string text = StarterScript.For(RecipesCommand.Find(name));
        if (output is null)
        {
            terminal.Output.Write(text);
            return ExitCode.Well;
        }

        // A script is the maker's own work: it is never replaced unasked.
        bool force = parsed.GetValue(surroundings.Options.Force);
        if (!force && File.Exists(output))
            throw new StopException(CommandLineFindings.MadeByAnother(output, null), ExitCode.FileTrouble);
        OutputFiles files = new(Path.GetFileName(output), force);
        files.Add(output, text);
        files.Write(surroundings.Cancellation);
        if (!parsed.GetValue(surroundings.Options.Quiet))
            terminal.Output.WriteLine(output);
        return ExitCode.Well;
    }
}
