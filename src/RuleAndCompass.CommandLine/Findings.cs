using RuleAndCompass.CommandLine.Display;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine;

/// <summary>Shows findings on standard error.</summary>
internal static class Findings
{
    private const string Ourselves = "setout";

    /// <summary>Shows findings in a script; those in the command line's own words under the program's name.</summary>
    public static void Show(Terminal terminal, string script, string? text, IEnumerable<Diagnostic> findings)
    {
        DiagnosticRenderer inScript = new(script, text), placeless = new(Ourselves, null), elsewhere = new(script, null);
        bool first = true;
        foreach (Diagnostic finding in findings)
        {
            if (!first)
                terminal.Error.Write('\n');
            first = false;
            DiagnosticRenderer renderer = finding switch
            {
                { File: { } file } when RecipeBook.FindText(Path.GetFileNameWithoutExtension(file)) is { } recipe => new(file, recipe),
                { File: not null } => elsewhere,
                _ when HasNoPlace(finding) => IsOfCommandLine(finding) ? placeless : elsewhere,
                _ => inScript,
            };
            terminal.Error.Write(renderer.Render(finding));
        }
    }

    /// <summary>Shows one finding that is not in a script.</summary>
    public static void Show(Terminal terminal, Diagnostic finding) => terminal.Error.Write(new DiagnosticRenderer(Ourselves, null).Render(finding));

    /// <summary>Whether a finding has no place in the script's text: an empty span at its start.</summary>
    public static bool HasNoPlace(Diagnostic finding) => finding.Span == default;

    // What an option asks for is read as a sentence of the language; what is wrong with it has no place in the script.
    private static bool IsOfCommandLine(Diagnostic finding) => finding.Severity == Severity.Error;
}
