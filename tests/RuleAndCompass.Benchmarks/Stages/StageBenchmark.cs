using System.Collections.Immutable;
using System.Diagnostics;
using System.Globalization;
using RuleAndCompass.Accuracy;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Making;
using RuleAndCompass.Plates;
using RuleAndCompass.Plates.Writing;

namespace RuleAndCompass.Benchmarks.Stages;

/// <summary>
/// Times each stage of a script apart, warm: reading, making with nothing claimed or compared, what the proofs add, and rendering.
/// Wall clock and processor time; the median of the runs.
/// </summary>
internal static class StageBenchmark
{
    private const int Runs = 15;

    public static int Run(ReadOnlySpan<string> arguments)
    {
        if (arguments is not [string path])
        {
            Console.Error.WriteLine("usage: stages SCRIPT");
            return 2;
        }

        string name = Path.GetFileName(path), text = File.ReadAllText(path);
        if (ScriptReader.Read(name, text).Value is not { } script || Maker.Make(script).Value is not { } layout)
        {
            Console.Error.WriteLine($"{path} cannot be made");
            return 1;
        }

        // No speed is told for a wrong result.
        if (layout.Claims.Any(claim => claim.Holds != true) || layout.Comparisons.Any(comparison => !comparison.Decision.Verdict.IsDecided))
        {
            Console.Error.WriteLine($"{path} has something that is not decided");
            return 1;
        }

        Script bare = script with { Sentences = WithoutProofs(script.Sentences) };
        Console.WriteLine($"{name}: {layout.Acts.Length} acts, {layout.Comparisons.Length} comparisons, {layout.Claims.Length} claims; median of {Runs} warm runs, wall / processor ms");
        Time("read", () => ScriptReader.Read(name, text));
        Time("make, script's own proofs left out", () => Maker.Make(bare));
        Time("make and prove", () => Maker.Make(script));
        Time("hand error, first order", () => HandError.Assess(layout, new HandErrorOptions { Trials = 0 }));
        Time("step plates: compose and PDF", () => PdfWriter.Write(StepPlates.Compose(layout), layout.Title));
        Time("full-size plate: compose and PDF", () => PdfWriter.Write(FullSizePlate.Compose(layout), layout.Title));
        Time("cut file", () => CutFile.Write(layout));
        return 0;
    }

    // Recipes of the book keep their comparisons: they are part of what is followed.
    private static ImmutableArray<Sentence> WithoutProofs(ImmutableArray<Sentence> sentences) =>
    [
        .. sentences.Where(sentence => sentence is not (ClaimSentence or CompareSentence)).Select(sentence => sentence switch
        {
            ForBlock loop => loop with { Body = WithoutProofs(loop.Body) },
            WhenBlock block => block with { Branches = [.. block.Branches.Select(branch => branch with { Body = WithoutProofs(branch.Body) })] },
            RecipeBlock recipe => recipe with { Body = WithoutProofs(recipe.Body) },
            _ => sentence,
        }),
    ];

    private static void Time(string stage, Func<object?> run)
    {
        List<double> wall = [], processor = [];
        for (int round = 0; round < Runs + 3; round++)
        {
            TimeSpan before = Environment.CpuUsage.TotalTime;
            long start = Stopwatch.GetTimestamp();
            GC.KeepAlive(run());
            if (round < 3)
                continue;
            wall.Add(Stopwatch.GetElapsedTime(start).TotalMilliseconds);
            processor.Add((Environment.CpuUsage.TotalTime - before).TotalMilliseconds);
        }

        Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"  {stage,-36} {Median(wall),8:0.00} / {Median(processor),8:0.00}"));
    }

    private static double Median(List<double> values)
    {
        values.Sort();
        return values[values.Count / 2];
    }
}
