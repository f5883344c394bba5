using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;
using RuleAndCompass.CommandLine.Commands;
using RuleAndCompass.CommandLine.Display;
using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.CommandLine;

/// <summary>All commands, and how a command line is read and obeyed.</summary>
internal static class CommandTree
{
    // `@FILE` is a saved hand here, not a file of arguments.
    private static readonly ParserConfiguration Reading = new() { ResponseFileTokenReplacer = null };

    public static int Run(string[] args, Terminal terminal, CancellationToken cancellation)
    {
        RootCommand root = Build(new(terminal, new(), cancellation));
        ParseResult parsed = root.Parse(args, Reading);
        try
        {
            if (args.Length == 0)
                throw new StopException(CommandLineFindings.BadArguments("it needs a command", "`setout --help` lists them; `setout make FILE` is the main one"), ExitCode.CommandLineWrong);
            if (MistakenOption(parsed, args) is { } mistaken)
                throw new StopException(UnknownOption(mistaken, parsed, root), ExitCode.CommandLineWrong);
            if (parsed.Errors.Count > 0 && parsed.Action is not System.CommandLine.Help.HelpAction)
                throw new StopException(Explain(parsed, root), ExitCode.CommandLineWrong);
            return parsed.Invoke(new InvocationConfiguration
            {
                Output = terminal.Output,
                Error = terminal.Error,
                EnableDefaultExceptionHandler = false,
                ProcessTerminationTimeout = null,
            });
        }
        catch (StopException stop)
        {
            Findings.Show(terminal, stop.Finding);
            return stop.Status;
        }
    }

    public static RootCommand Build(Surroundings surroundings)
    {
        RootCommand root = new("Rule and Compass: from a script of points, lines and circles to checked steps and plates for the bench")
        {
            MakeCommand.Build(surroundings),
            CheckCommand.Build(surroundings),
            StepsCommand.Build(surroundings),
            PlatesCommand.Build(surroundings),
            ReportCommand.Build(surroundings),
            HandCommand.Build(surroundings),
            RecipesCommand.Build(surroundings),
            BeginCommand.Build(surroundings),
            TidyCommand.Build(surroundings),
            ExplainCommand.Build(surroundings),
            CompletionCommand.Build(surroundings),
        };
        root.Options.Add(surroundings.Options.Quiet);
        root.Options.Add(surroundings.Options.Verbose);
        return root;
    }

    // A mistyped option would otherwise be taken for the name of a file.
    private static string? MistakenOption(ParseResult parsed, string[] args) =>
        args.Contains("--") ? null : parsed.Tokens.Where(token => token is { Type: TokenType.Argument, Value: ['-', _, ..] }).Select(token => token.Value).FirstOrDefault(value => args.Contains(value) && !IsValueOfOption(parsed, value));

    private static bool IsValueOfOption(ParseResult parsed, string value) =>
        parsed.CommandResult.Children.OfType<OptionResult>().Any(option => option.Tokens.Any(token => token.Value == value));

    private static Diagnostic UnknownOption(string unknown, ParseResult parsed, RootCommand root)
    {
        string name = unknown.Split('=')[0];
        IEnumerable<string> known = parsed.CommandResult.Command.Options.Concat(root.Options).SelectMany(option => option.Aliases.Append(option.Name));
        return CommandLineFindings.BadArguments($"`{Name(parsed, root)}` has no option `{name}`", NearName.Find(name, known) is { } near ? $"is `{near}` meant?" : Help(parsed, root));
    }

    private static Diagnostic Explain(ParseResult parsed, RootCommand root)
    {
        if (parsed.UnmatchedTokens is not [var unknown, ..])
            return CommandLineFindings.BadArguments(InOurWords(parsed.Errors[0].Message, parsed), Help(parsed, root));
        if (parsed.CommandResult.Command != root)
            return CommandLineFindings.BadArguments($"`{unknown}` is more than `{Name(parsed, root)}` can take", Help(parsed, root));
        string? near = NearName.Find(unknown, root.Subcommands.Select(command => command.Name));
        return CommandLineFindings.BadArguments($"there is no command `{unknown}`", near is null ? Help(parsed, root) : $"is `{near}` meant?");
    }

    private static string Name(ParseResult parsed, RootCommand root) => parsed.CommandResult.Command == root ? "setout" : $"setout {parsed.CommandResult.Command.Name}";

    private static string Help(ParseResult parsed, RootCommand root) => $"`{Name(parsed, root)} --help` tells how it is written";

    private static string InOurWords(string message, ParseResult parsed)
    {
        foreach (SymbolResult result in parsed.CommandResult.Children)
        {
            if (result is ArgumentResult { Tokens.Count: 0, Argument.Arity.MinimumNumberOfValues: > 0 } missing)
                return $"`setout {parsed.CommandResult.Command.Name}` needs {missing.Argument.Name}";
            if (result is OptionResult { Tokens.Count: 0, Implicit: false, Option.Arity.MinimumNumberOfValues: > 0 } empty)
                return $"`{empty.Option.Name}` needs {empty.Option.HelpName ?? "a value"}";
            if (result is OptionResult { Implicit: false, IdentifierTokenCount: > 1, Option.Arity.MaximumNumberOfValues: 1 } twice)
                return $"`{twice.Option.Name}` is given more than once";
        }

        string plain = message.ReplaceLineEndings(" ").Replace("\t", "", StringComparison.Ordinal).Trim().TrimEnd('.').Replace('\'', '`');
        return plain.Length > 1 ? char.ToLower(plain[0], CultureInfo.InvariantCulture) + plain[1..] : plain;
    }
}
