using System.CommandLine;
using System.Text.Json;
using RuleAndCompass.CommandLine.Json;
using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.CommandLine.Commands;

/// <summary><c>setout check FILE…</c>: what is wrong, claimed and compared; nothing is written.</summary>
internal static class CheckCommand
{
    public static Command Build(Surroundings surroundings)
    {
        Command command = new("check", "Check scripts: findings, claims, comparisons, fitness for the bench; writes nothing")
        {
            surroundings.Options.Files, surroundings.Options.Json,
        };
        foreach (Option option in surroundings.Options.ForMaking)
            command.Options.Add(option);
        command.SetAction(parsed => Run(parsed, surroundings));
        return command;
    }

    private static int Run(ParseResult parsed, Surroundings surroundings)
    {
        string[] paths = parsed.GetRequiredValue(surroundings.Options.Files);
        bool asJson = parsed.GetValue(surroundings.Options.Json);
        int status = ExitCode.Well;
        List<Checked> all = [];
        foreach (string path in paths)
        {
            surroundings.Cancellation.ThrowIfCancellationRequested();
            Checked one = Check(path, parsed, surroundings);
            status = Math.Max(status, one.Status);
            if (asJson)
                all.Add(one);
            else
                Show(one, parsed, surroundings);
        }

        if (asJson)
            surroundings.Terminal.Output.Write(Json(all, parsed.GetValue(surroundings.Options.Digits)));
        return status;
    }

    private static Checked Check(string path, ParseResult parsed, Surroundings surroundings)
    {
        try
        {
            ScriptRun run = ScriptRun.Of(path, parsed, surroundings);
            return new(run.Script.Name, run, run.Findings, run.Status);
        }
        catch (StopException stop) when (stop.Status == ExitCode.FileTrouble)
        {
            return new(Path.GetFileName(path), null, [stop.Finding], stop.Status);
        }
    }

    private static void Show(Checked one, ParseResult parsed, Surroundings surroundings)
    {
        if (one.Run is null)
        {
            Findings.Show(surroundings.Terminal, one.Findings[0]);
            return;
        }

        one.Run.ShowFindings(surroundings.Terminal, parsed.GetValue(surroundings.Options.Quiet));
        if (one.Run.Layout is { } layout && !parsed.GetValue(surroundings.Options.Quiet))
            surroundings.Terminal.Output.WriteLine($"{one.Name}: {Summary.Of(layout)}");
    }

    private static string Json(List<Checked> all, int? digits) => ResultJson.Write(json =>
    {
        if (all is [var single])
        {
            Write(json, single, digits);
            return;
        }

        json.WriteStartArray("scripts");
        foreach (Checked one in all)
        {
            json.WriteStartObject();
            Write(json, one, digits);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    });

    private static void Write(Utf8JsonWriter json, Checked one, int? digits)
    {
        json.WriteScript(one.Name, one.Run?.Script);
        json.WriteDiagnostics(one.Findings, one.Run?.Script);
        if (one.Run?.Layout is { } layout)
        {
            ReportJson.Write(json, layout, null, digits);
            return;
        }

        foreach (string list in (string[])["comparisons", "claims", "ranges"])
        {
            json.WriteStartArray(list);
            json.WriteEndArray();
        }
    }

    /// <summary>One script checked; without a run where it could not be read.</summary>
    private sealed record Checked(string Name, ScriptRun? Run, IReadOnlyList<Diagnostic> Findings, int Status);
}
