using System.Diagnostics;
using System.Globalization;
using RuleAndCompass.Numbers;
using RuleAndCompass.Tests.Numbers;

namespace RuleAndCompass.Benchmarks.Exact;

/// <summary>Decides random numbers exactly, every one by the towers or the images too, and counts what a ball of 3,000 bits says against it.</summary>
internal static class NumberFuzz
{
    private static readonly int[] degrees = [64, 64, 4, 1];

    public static int Run(ReadOnlySpan<string> arguments)
    {
        long count = arguments.Length > 0 ? long.Parse(arguments[0], CultureInfo.InvariantCulture) : 1_000_000;
        ulong seed = arguments.Length > 1 ? ulong.Parse(arguments[1], CultureInfo.InvariantCulture) : 1;
        var expressions = new RandomExpressions(seed);
        var clock = Stopwatch.StartNew();
        long zeros = 0, byImages = 0, undecided = 0, judgeSilent = 0, wrong = 0;
        for (long i = 0; i < count; i++)
        {
            (Real number, bool? isZero) = expressions.Next();
            byte[] script = BitConverter.GetBytes(i);
            var decider = new Decider(new DeciderOptions(script, MaximumDegree: degrees[i % degrees.Length], TimeLimit: TimeSpan.FromSeconds(20)));
            int? judged = RandomExpressions.Judge(number);
            if (judged is null)
                judgeSilent++;
            try
            {
                Decision decision = decider.Decide(number);
                bool exact = decider.IsExactlyZero(number, out Verdict verdict);
                if (verdict.Certainty == Certainty.Certain)
                    byImages++;
                if (decision.Sign == 0)
                    zeros++;
                if (judged is { } sign && (decision.Sign != sign || exact != (sign == 0)) || isZero is { } known && exact != known)
                {
                    wrong++;
                    Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"wrong: case {i} of seed {seed}: decided {decision.Sign}, exactly zero {exact}, judge {judged}"));
                }
            }
            catch (UndecidedException e)
            {
                undecided++;
                if (undecided < 10)
                    Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"undecided: case {i} of seed {seed}: {e.Message}"));
            }
        }

        Console.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"{count} numbers, {zeros} zeros, {byImages} of them by modular images; {undecided} undecided, judge silent on {judgeSilent}, {wrong} wrong; {clock.Elapsed.TotalSeconds:F0} s"));
        return wrong == 0 && zeros * 11 >= count ? 0 : 1;
    }
}
