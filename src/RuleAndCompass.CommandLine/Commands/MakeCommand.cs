using System.CommandLine;
using System.Diagnostics;
using RuleAndCompass.Accuracy;
using RuleAndCompass.CommandLine.Display;
using RuleAndCompass.CommandLine.Files;
using RuleAndCompass.CommandLine.Json;
using RuleAndCompass.Comparing;
using RuleAndCompass.Plates.Writing;

namespace RuleAndCompass.CommandLine.Commands;

/// <summary><c>setout make FILE [-o DIR]</c>: everything that a script gives, in a folder.</summary>
internal static class MakeCommand
{
    public static Command Build(Surroundings surroundings)
    {
        Option<string?> folder = new("-o", "--output") { Description = "The folder; without it, one named after the script", HelpName = "DIR" };
        Command command = new("make", "Check a script and write everything it gives: step plates, full-size plate, cut file, report")
        {
            surroundings.Options.File, folder, surroundings.Options.Json, surroundings.Options.Force,
        };
        foreach (Option option in surroundings.Options.ForMaking)
            command.Options.Add(option);
        command.SetAction(parsed => Run(parsed, parsed.GetValue(folder), surroundings));
        return command;
    }

    private static int Run(ParseResult parsed, string? folder, Surroundings surroundings)
    {
        (Terminal terminal, CommonOptions options, CancellationToken cancellation) = surroundings;
        long begun = Stopwatch.GetTimestamp();
        ScriptRun run = ScriptRun.Single(parsed, surroundings);
        if (run.Layout is not { } layout)
            return run.Status;
        if (parsed.GetValue(options.Verbose))
            terminal.Error.WriteLine(FormattableString.Invariant($"setout: read, made and proved in {Stopwatch.GetElapsedTime(begun).TotalSeconds:0.00} s"));

        string stem = Path.Combine(folder ?? run.Script.Stem, run.Script.Stem);
        Output[] outputs = [.. OutputsOf(stem)];
        OutputFiles.Check(outputs.Select(output => output.Path), run.Script.Name, parsed.GetValue(options.Force));
        Product product = new(run, HandReport.Of(run, surroundings), parsed.GetValue(options.Digits));
        OutputFiles files = new(run.Script.Name, parsed.GetValue(options.Force));
        using (ProgressLine progress = new(terminal, $"writing {run.Script.Stem}", parsed.GetValue(options.Quiet)))
        {
            for (int index = 0; index < outputs.Length; index++)
            {
                cancellation.ThrowIfCancellationRequested();
                progress.Report((double)index / outputs.Length);
                files.Add(outputs[index].Path, outputs[index].Write(product, cancellation));
            }
        }

        files.Write(cancellation);
        Tell(parsed, terminal, options, run, product, [.. files.Paths]);
        if (parsed.GetValue(options.Verbose))
            terminal.Error.WriteLine(FormattableString.Invariant($"setout: all done in {Stopwatch.GetElapsedTime(begun).TotalSeconds:0.00} s"));
        return run.Status;
    }

    private static IEnumerable<Output> OutputsOf(string stem) =>
    [
        new($"{stem}-steps.pdf", (product, cancellation) => PlateFiles.Write(product.Run.Layout!, "steps", product.Run.Findings, cancellation)), // There is a layout where anything is written.
        new($"{stem}-full.pdf", (product, cancellation) => PlateFiles.Write(product.Run.Layout!, "full", product.Run.Findings, cancellation)),
        new($"{stem}-cut.svg", (product, cancellation) => PlateFiles.Write(product.Run.Layout!, "cut", product.Run.Findings, cancellation)),
        new($"{stem}-report.txt", (product, _) => Utf8(product.ReportText())),
        new($"{stem}-report.json", (product, _) => Utf8(product.ReportJson())),
    ];

    private static void Tell(ParseResult parsed, Terminal terminal, CommonOptions options, ScriptRun run, Product product, string[] paths)
    {
        if (parsed.GetValue(options.Json))
        {
            terminal.Output.Write(ResultJson.Write(json =>
            {
                json.WriteScript(run.Script.Name, run.Script);
                json.WriteStartArray("files");
                foreach (string path in paths)
                    json.WriteStringValue(path);
                json.WriteEndArray();
                json.WriteDiagnostics(run.Findings, run.Script);
                Json.ReportJson.Write(json, run.Layout!, product.Hand, product.Digits); // There is a layout where anything is written.
            }));
            return;
        }

        if (parsed.GetValue(options.Quiet))
            return;
        terminal.Output.WriteLine($"{product.Report.Title}: {Summary.Of(run.Layout!)}");
        foreach (string path in paths)
            terminal.Output.WriteLine($"  {path}");
    }

    private static byte[] Utf8(string text) => System.Text.Encoding.UTF8.GetBytes(text);

    /// <summary>One file that a making gives.</summary>
    private sealed record Output(string Path, Func<Product, CancellationToken, byte[]> Write);

    /// <summary>What the files are written from.</summary>
    private sealed record Product(ScriptRun Run, HandErrorReport? Hand, int? Digits)
    {
        public DeviationReport Report { get; } = ReportCommand.ReportOf(Run, Hand, Digits);

        public string ReportText() => $"{DeviationText.Render(Report)}\n{Origin.Line(Run.Script.Name)}\n";

        public string ReportJson() => ReportCommand.JsonOf(Run, Hand, Digits);
    }
}
