using System.Collections.Immutable;
using System.CommandLine;
using RuleAndCompass.Accuracy;
using RuleAndCompass.CommandLine.Display;
using RuleAndCompass.CommandLine.Json;
using RuleAndCompass.Comparing;

namespace RuleAndCompass.CommandLine.Commands;

/// <summary><c>setout report FILE</c>: what was constructed beside what is computed.</summary>
internal static class ReportCommand
{
    public static Command Build(Surroundings surroundings)
    {
        Command command = new("report", "Show what is constructed beside what is computed, with the hand error")
        {
            surroundings.Options.File, surroundings.Options.Json,
        };
        foreach (Option option in surroundings.Options.ForMaking)
            command.Options.Add(option);
        command.SetAction(parsed => Run(parsed, surroundings));
        return command;
    }

    public static DeviationReport ReportOf(ScriptRun run, HandErrorReport? hand, int? digits) => DeviationReport.Of(
        run.Layout!, // The caller has one.
        new() { Digits = digits, Hand = hand, Warnings = [.. run.Findings.Where(finding => finding.Code.StartsWith("RC3", StringComparison.Ordinal))] });

    public static string JsonOf(ScriptRun run, HandErrorReport? hand, int? digits) => ResultJson.Write(json =>
    {
        json.WriteScript(run.Script.Name, run.Script);
        json.WriteString("title", run.Layout!.Title); // The caller has one.
        ReportJson.Write(json, run.Layout, hand, digits);
    });

    private static int Run(ParseResult parsed, Surroundings surroundings)
    {
        Terminal terminal = surroundings.Terminal;
        ScriptRun run = ScriptRun.Single(parsed, surroundings);
        if (run.Layout is null)
            return run.Status;
        int? digits = parsed.GetValue(surroundings.Options.Digits);
        HandErrorReport? hand = HandReport.Of(run, surroundings);
        if (parsed.GetValue(surroundings.Options.Json))
        {
            terminal.Output.Write(JsonOf(run, hand, digits));
            return run.Status;
        }

        DeviationReport report = ReportOf(run, hand, digits);
        if (terminal.OutputIsTerminal && report.Comparisons.Length > 0)
        {
            terminal.Output.Write(DeviationText.Render(report with { Comparisons = [] }));
            ImmutableArray<(string Name, Func<ComparisonRow, string> Cell)> columns = DeviationText.ComparisonColumns(report.Comparisons);
            Tables.Write(terminal, columns.Select(column => column.Name), report.Comparisons.Select(row => columns.Select(column => column.Cell(row))));
        }
        else
        {
            terminal.Output.Write(DeviationText.Render(report));
        }

        return run.Status;
    }
}
