using System.Diagnostics;
using System.Globalization;
using RuleAndCompass.Accuracy;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Benchmarks.Accuracy;

/// <summary>
/// Times the hand error: trials of a script, over counts that double so that growth shows, and first order on a long walk of the dividers whose answer is
/// known. Wall clock and processor time of each, memory at the end.
/// </summary>
internal static class HandErrorBenchmark
{
    public static int Run(ReadOnlySpan<string> arguments)
    {
        switch (arguments)
        {
            case ["trials", string script, .. var rest]:
                return Trials(script, rest.Length > 0 ? int.Parse(rest[0], CultureInfo.InvariantCulture) : 1_000_000);
            case ["first-order", .. var rest]:
                return FirstOrder(rest.Length > 0 ? int.Parse(rest[0], CultureInfo.InvariantCulture) : 10_000);
            default:
                Console.Error.WriteLine("usage: hand trials SCRIPT [COUNT] | hand first-order [ACTS]");
                return 2;
        }
    }

    private static int Trials(string script, int count)
    {
        if (Maker.Make(Path.GetFileName(script), File.ReadAllText(script)).Value is not { } layout)
        {
            Console.Error.WriteLine($"{script} cannot be made");
            return 1;
        }

        // Both computations agree, or the speed is of a wrong result.
        HandErrorReport check = HandError.Assess(layout, new HandErrorOptions { Trials = 20_000 }).Value!;
        int differ = check.Results.Count(result => result.Disagreement is not null);
        Console.WriteLine($"{layout.Acts.Length} acts, {check.Results.Length} results, {differ} of them beyond first order");
        foreach (int trials in new[] { count / 4, count / 2, count })
            Time($"{trials} trials", () => HandError.Assess(layout, new HandErrorOptions { Trials = trials }));
        return 0;
    }

    private static int FirstOrder(int acts)
    {
        Layout layout = Walk(acts, results: 100);
        HandErrorReport report = HandError.Assess(layout, new HandErrorOptions { Trials = 0 }).Value!;

        // n steps at one setting: 2n pricks, and n times the opening's one error.
        int steps = (acts - 4) / 2;
        double expected = Math.Sqrt(2 * steps * 0.01 + (double)steps * steps * 0.01);
        double found = report.Results[^1].FirstOrderSigma!.Value;
        if (Math.Abs(found - expected) > 1e-6 * expected)
        {
            Console.Error.WriteLine($"wrong: {found}, not {expected}");
            return 1;
        }

        for (int run = 0; run < 3; run++)
            Time($"first order, {layout.Acts.Length} acts, {report.Results.Length} results", () => HandError.Assess(layout, new HandErrorOptions { Trials = 0 }));
        return 0;
    }

    // A walk along a line at one setting, every so many steps compared with its start.
    private static Layout Walk(int count, int results)
    {
        Decider decider = new(new DeciderOptions());
        List<Act> acts = [];
        List<Comparison> comparisons = [];
        PointMark start = new("start", new Point(0, 0), false);
        PointMark far = new("far", new Point(100_000, 0), false);
        LineMark line = new("line", Line.Through(start.Point, far.Point), false);
        acts.Add(new Locate(1, 0, 1, start, true, "", default, null));
        acts.Add(new Locate(2, 0, 1, far, true, "", default, null));
        acts.Add(new Lay(3, 0, 1, line, start, far, "", default, null));
        SetOpening setting = new(4, 0, 1, new FreeOpening(10), false, "", default, null);
        acts.Add(setting);
        PointMark at = start;
        int steps = (count - 4) / 2;
        for (int step = 1; step <= steps; step++)
        {
            CircleMark arc = new($"c{step}", Circle.WithSquaredRadius(at.Point, 100, 10), true);
            acts.Add(new Swing(acts.Count + 1, 0, 1, arc, at, setting, "", default, null));
            at = new PointMark($"p{step}", new Point(10 * step, 0), true);
            acts.Add(new Cross(acts.Count + 1, 0, 1, at, line, arc, 1, "", default, null));
            if (step * results / steps > (step - 1) * results / steps)
                comparisons.Add(Compared($"after {step}", new PointDistance(start, at)));
        }

        return new Layout(
            new Script("walk", "", []), "walk", [], new Sheet(null, 420, 297), null, new Kit(true, null, null, null, false, false, null), Hand.Ordinary, [],
            [new Stage("1", "All")], [.. acts], [], [.. comparisons], [], [], false)
        { Decider = decider };
    }

    private static Comparison Compared(string label, Measure measure) => new(
        label, QuantityKind.Length, Real.Zero, Real.Zero, null, null, Real.Zero, new Decision(0, Verdict.Proved), null, false, true, null, null, null, measure, null, null,
        default, null);

    private static void Time(string what, Action work)
    {
        TimeSpan before = Environment.CpuUsage.TotalTime;
        Stopwatch clock = Stopwatch.StartNew();
        work();
        double wall = clock.Elapsed.TotalMilliseconds;
        double processor = (Environment.CpuUsage.TotalTime - before).TotalMilliseconds;
        Console.WriteLine(string.Create(
            CultureInfo.InvariantCulture, $"{what}: {wall:F0} ms, {processor:F0} ms of processor on {Environment.ProcessorCount} cores, {Environment.WorkingSet / 1048576} MB"));
    }
}
