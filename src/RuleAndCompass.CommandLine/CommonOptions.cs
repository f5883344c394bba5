using System.Collections.Immutable;
using System.CommandLine;
using System.Globalization;
using RuleAndCompass.CommandLine.Files;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine;

/// <summary>The options that several commands have, each said once for a tree of commands.</summary>
internal sealed class CommonOptions
{
    private const int MostDigits = 10_000;

    public Option<string[]> Given { get; } = new("--given")
    {
        Description = "Set a given of the script, in the same kind (repeatable)",
        HelpName = "NAME=VALUE",
        Arity = ArgumentArity.OneOrMore,
        AllowMultipleArgumentsPerToken = false,
    };

    public Option<string?> Sheet { get; } = new("--sheet") { Description = "Try another sheet: what follows `sheet` in a script", HelpName = "SIZE" };

    public Option<string?> Kit { get; } = new("--kit") { Description = "Try another kit: what follows `kit` in a script", HelpName = "TOOLS" };

    public Option<string?> Hand { get; } = new("--hand") { Description = "Try another hand: what follows `hand` in a script, or @FILE that holds it", HelpName = "ERRORS|@FILE" };

    public Option<bool> Prove { get; } = new("--prove") { Description = "Decide everything by exact computation, however long it takes" };

    public Option<int?> Digits { get; } = Whole("--digits", "Print so many significant digits, all certain", "N", 1, MostDigits);

    public Option<double?> TimeLimit { get; } = TimeLimitOption();

    public Option<bool> Json { get; } = new("--json") { Description = "Give the result as JSON; `setout explain json` prints its schema" };

    public Option<bool> Force { get; } = new("--force") { Description = "Replace files that were not made from this script" };

    public Option<bool> Quiet { get; } = new("--quiet", "-q") { Description = "Say nothing but results and errors", Recursive = true };

    public Option<bool> Verbose { get; } = new("--verbose", "-v") { Description = "Say more of what is done", Recursive = true };

    /// <summary>What a making takes from the command line; the command adds each.</summary>
    public IEnumerable<Option> ForMaking => [Given, Sheet, Kit, Hand, Prove, Digits, TimeLimit];

    public Argument<string> File { get; } = new("FILE") { Description = "A script; `-` reads standard input" };

    public Argument<string[]> Files { get; } = new("FILE") { Description = "Scripts; `-` reads standard input", Arity = ArgumentArity.OneOrMore };

    /// <summary>Reads the options of a making.</summary>
    /// <exception cref="StopException">One of them can't be read.</exception>
    public MakingOptions MakingOf(ParseResult parsed, ScriptFile script) => new(
        GivensOf(parsed),
        parsed.GetValue(Sheet),
        parsed.GetValue(Kit),
        HandOf(parsed.GetValue(Hand)),
        parsed.GetValue(Prove),
        parsed.GetValue(TimeLimit) is { } seconds ? TimeSpan.FromSeconds(seconds) : null,
        script.ReadBeside);

    /// <summary>An option for a whole number in a range.</summary>
    public static Option<int?> Whole(string name, string description, string helpName, int least, int most)
    {
        Option<int?> option = new(name)
        {
            Description = description,
            HelpName = helpName,
            CustomParser = result =>
            {
                if (result.Tokens is [var token] && int.TryParse(token.Value, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out int value) && value >= least && value <= most)
                    return value;
                result.AddError(FormattableString.Invariant($"`{name}` takes a whole number from {least} to {most}"));
                return null;
            },
        };
        return option;
    }

    private static Option<double?> TimeLimitOption() => new("--time-limit")
    {
        Description = "Give up a script that takes longer",
        HelpName = "SECONDS",
        CustomParser = result =>
        {
            if (result.Tokens is [var token] && double.TryParse(token.Value, NumberStyles.Float, CultureInfo.InvariantCulture, out double value) && value > 0 && value <= 1e6)
                return value;
            result.AddError("`--time-limit` takes a number of seconds above 0");
            return null;
        },
    };

    private ImmutableDictionary<string, string>? GivensOf(ParseResult parsed)
    {
        if (parsed.GetValue(Given) is not { Length: > 0 } texts)
            return null;
        ImmutableDictionary<string, string>.Builder givens = ImmutableDictionary.CreateBuilder<string, string>(StringComparer.Ordinal);
        foreach (string text in texts)
        {
            int equals = text.IndexOf('=', StringComparison.Ordinal);
            string name = equals < 0 ? "" : text[..equals].Trim(), value = equals < 0 ? "" : text[(equals + 1)..].Trim();
            if (name.Length == 0 || value.Length == 0)
                throw new StopException(CommandLineFindings.NotNameAndValue(text), ExitCode.CommandLineWrong);
            Outcome<Expression> read = ScriptReader.ReadExpression(value);
            if (read.Value is null || read.HasErrors)
                throw new StopException(CommandLineFindings.ValueNotRead(name, value, read.Diagnostics.FirstOrDefault()?.Message ?? "it is no value"), ExitCode.CommandLineWrong);
            if (read.Value is Reference { Steps: [{ Name.Text: not "pi" }] })
                throw new StopException(CommandLineFindings.ValueNotRead(name, value, "it is a name, not a value"), ExitCode.CommandLineWrong);
            if (!givens.TryAdd(name, value))
                throw new StopException(CommandLineFindings.GivenTwice(name), ExitCode.CommandLineWrong);
        }

        return givens.ToImmutable();
    }

    // A saved hand is what follows `hand` in a script, with or without the word, over as many lines as it likes, comments and all.
    private static string? HandOf(string? text)
    {
        if (text is not ['@', .. var path])
            return text;
        IEnumerable<string> lines = ScriptFile.ReadText(path).Split('\n').Select(line => line.Split('#')[0].Trim()).Where(line => line.Length > 0);
        string saved = string.Join(' ', lines);
        return saved.StartsWith("hand ", StringComparison.Ordinal) ? saved[5..] : saved;
    }
}
