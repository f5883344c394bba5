using System.Collections.Immutable;
using System.CommandLine;
using RuleAndCompass.Accuracy;
using RuleAndCompass.CommandLine.Display;
using RuleAndCompass.CommandLine.Files;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine;

/// <summary>A script carried out for a command.</summary>
/// <param name="Script">As read.</param>
/// <param name="Layout">Null where the script is wrong.</param>
/// <param name="Findings">Of all stages, in source order.</param>
/// <param name="Status">The exit status so far.</param>
internal sealed record ScriptRun(ScriptFile Script, Layout? Layout, ImmutableArray<Diagnostic> Findings, int Status)
{
    /// <summary>Reads and makes a script.</summary>
    /// <exception cref="StopException">It can't be read, or an option can't.</exception>
    public static ScriptRun Of(string path, ParseResult parsed, Surroundings surroundings)
    {
        ScriptFile script = ScriptFile.Read(path, surroundings);
        MakingOptions options = surroundings.Options.MakingOf(parsed, script);
        using ProgressLine progress = new(surroundings.Terminal, $"making {script.Name}", parsed.GetValue(surroundings.Options.Quiet));
        Outcome<Layout> made = Maker.Make(script.Name, script.Text, options, progress, surroundings.Cancellation);
        ImmutableArray<Diagnostic> findings = made.Diagnostics;
        if (made.Value is { } layout)
            findings = [.. findings.Concat(LayoutFitness.Inspect(layout, surroundings.Cancellation)).OrderBy(finding => finding.Span.Start)];
        return new(script, made.Value, findings, StatusOf(made, script, options));
    }

    /// <summary>Reads and makes the one script a command works on, and shows what was found.</summary>
    public static ScriptRun Single(ParseResult parsed, Surroundings surroundings)
    {
        ScriptRun run = Of(parsed.GetRequiredValue(surroundings.Options.File), parsed, surroundings);
        run.ShowFindings(surroundings.Terminal, parsed.GetValue(surroundings.Options.Quiet));
        return run;
    }

    /// <summary>Shows the findings; where only errors are wanted, without the warnings.</summary>
    public void ShowFindings(Terminal terminal, bool quiet) =>
        CommandLine.Findings.Show(terminal, Script.Name, Script.Text, quiet ? Findings.Where(finding => finding.Severity == Severity.Error) : Findings);

    private static int StatusOf(Outcome<Layout> made, ScriptFile script, MakingOptions options)
    {
        if (!made.HasErrors)
            return ExitCode.Well;
        return made.Diagnostics.Any(finding => finding.Severity == Severity.Error && IsOfCommandLine(finding, script, options)) ? ExitCode.CommandLineWrong : ExitCode.ScriptWrong;
    }

    // What the command line sets and the script refuses is the command line's fault: an unknown given, one of another kind or out of its range, a hand that can't be read.
    private static bool IsOfCommandLine(Diagnostic finding, ScriptFile script, MakingOptions options)
    {
        if (CommandLine.Findings.HasNoPlace(finding))
            return options.Sheet is not null || options.Kit is not null || options.Hand is not null || options.Givens is not null;
        return finding.Code == "RC2033" && options.Givens is { } givens
            && Language.Grammar.ScriptReader.Read(script.Name, script.Text).Value?.Sentences.OfType<GivenSentence>().Any(given => given.Span == finding.Span && givens.ContainsKey(given.Name.Text)) == true;
    }
}
