using System.CommandLine;
using RuleAndCompass.CommandLine.Display;

namespace RuleAndCompass.CommandLine.Commands;

/// <summary><c>setout explain [CODE|WORD|json]</c>: the language reference, or what it says of one thing.</summary>
internal static class ExplainCommand
{
    private const string Schema = "json";

    public static Command Build(Surroundings surroundings)
    {
        Argument<string?> what = new("WORD")
        {
            Description = "A code such as RC2004, a word of the language, or `json` for the schema of JSON results; without it, the whole language",
            Arity = ArgumentArity.ZeroOrOne,
        };
        Command command = new("explain", "Explain a finding's code, a word of the language, or the JSON results") { what };
        command.SetAction(parsed => Run(parsed.GetValue(what), surroundings.Terminal));
        return command;
    }

    private static int Run(string? what, Terminal terminal)
    {
        string text = what switch
        {
            null => LanguageReference.Text,
            Schema => Resource.Read(typeof(ExplainCommand).Assembly, "schema.json"),
            _ => LanguageReference.Find(what) ?? throw new StopException(CommandLineFindings.NothingToExplain(what, LanguageReference.Near(what)), ExitCode.CommandLineWrong),
        };
        terminal.Output.Write(text);
        return ExitCode.Well;
    }
}
