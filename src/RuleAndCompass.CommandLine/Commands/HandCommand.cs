using System.CommandLine;
using System.Globalization;
using RuleAndCompass.Accuracy;
using RuleAndCompass.CommandLine.Display;
using RuleAndCompass.CommandLine.Json;
using RuleAndCompass.Comparing;
using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.CommandLine.Commands;

/// <summary><c>setout hand FILE [--trials N] [--seed S]</c>: how far the hand throws a layout out, and which acts are to blame.</summary>
internal static class HandCommand
{
    public static Command Build(Surroundings surroundings)
    {
        HandErrorOptions usual = new();
        Option<int?> trials = CommonOptions.Whole("--trials", "How many trials; 0 for first order alone", "N", 0, HandErrorOptions.MaximumTrials);
        Option<ulong?> seed = new("--seed")
        {
            Description = "The same seed gives the same figures",
            HelpName = "S",
            CustomParser = result =>
            {
                if (result.Tokens is [var token] && ulong.TryParse(token.Value, NumberStyles.None, CultureInfo.InvariantCulture, out ulong value))
                    return value;
                result.AddError("`--seed` takes a whole number from 0");
                return null;
            },
        };
        Command command = new("hand", "Tell the hand error of every result, and which acts spoil it")
        {
            surroundings.Options.File, trials, seed, surroundings.Options.Json,
        };
        foreach (Option option in surroundings.Options.ForMaking)
            command.Options.Add(option);
        command.SetAction(parsed => Run(parsed, usual with { Trials = parsed.GetValue(trials) ?? usual.Trials, Seed = parsed.GetValue(seed) ?? usual.Seed }, surroundings));
        return command;
    }

    private static int Run(ParseResult parsed, HandErrorOptions asked, Surroundings surroundings)
    {
        Terminal terminal = surroundings.Terminal;
        ScriptRun run = ScriptRun.Single(parsed, surroundings);
        if (run.Layout is not { } layout)
            return run.Status;
        Outcome<HandErrorReport> assessed;
        using (ProgressLine progress = new(terminal, "trying", parsed.GetValue(surroundings.Options.Quiet)))
            assessed = HandError.Assess(layout, asked, progress, surroundings.Cancellation);
        Findings.Show(terminal, run.Script.Name, run.Script.Text, assessed.Diagnostics);
        if (assessed.Value is not { } report)
            return Math.Max(run.Status, ExitCode.ScriptWrong);
        terminal.Output.Write(parsed.GetValue(surroundings.Options.Json)
            ? ResultJson.Write(json =>
            {
                json.WriteScript(run.Script.Name, run.Script);
                HandJson.Write(json, report);
            })
            : HandText.Render(report, layout));
        return run.Status;
    }
}
