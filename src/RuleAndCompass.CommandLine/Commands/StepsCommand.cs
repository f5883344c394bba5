using System.CommandLine;
using RuleAndCompass.CommandLine.Display;
using RuleAndCompass.CommandLine.Json;
using RuleAndCompass.Comparing;

namespace RuleAndCompass.CommandLine.Commands;

/// <summary><c>setout steps FILE</c>: the numbered acts.</summary>
internal static class StepsCommand
{
    public static Command Build(Surroundings surroundings)
    {
        Command command = new("steps", "Print the numbered steps to follow at the bench")
        {
            surroundings.Options.File, surroundings.Options.Json,
        };
        foreach (Option option in surroundings.Options.ForMaking)
            command.Options.Add(option);
        command.SetAction(parsed => Run(parsed, surroundings));
        return command;
    }

    private static int Run(ParseResult parsed, Surroundings surroundings)
    {
        Terminal terminal = surroundings.Terminal;
        ScriptRun run = ScriptRun.Single(parsed, surroundings);
        if (run.Layout is not { } layout)
            return run.Status;
        if (parsed.GetValue(surroundings.Options.Json))
        {
            terminal.Output.Write(ResultJson.Write(json =>
            {
                json.WriteScript(run.Script.Name, run.Script);
                ActsJson.Write(json, layout, parsed.GetValue(surroundings.Options.Digits), surroundings.Cancellation);
            }));
        }
        else
        {
            terminal.Output.Write(StepsText.Render(layout));
        }

        return run.Status;
    }
}
