using System.Diagnostics;
using System.Globalization;

namespace RuleAndCompass.Benchmarks.Exact;

/// <summary>Times one workload as the peers do: everything built afresh in each run, the median of steady-state CPU time.</summary>
internal static class ExactBenchmark
{
    private const int MostRuns = 2000;
    private static readonly TimeSpan WarmUp = TimeSpan.FromSeconds(1.5);
    private static readonly TimeSpan Measured = TimeSpan.FromSeconds(3);

    public static int Run(ReadOnlySpan<string> arguments)
    {
        string name = arguments[0];
        int size = arguments.Length > 1 ? int.Parse(arguments[1], CultureInfo.InvariantCulture) : 0;
        var clock = Stopwatch.StartNew();
        Tally tally = Workloads.Run(name, size);
        double first = clock.Elapsed.TotalMilliseconds;
        if (Environment.GetEnvironmentVariable("ONCE") is not null)
        {
            Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"ours {name} {size} {tally} first {first:F3} ms"));
            return 0;
        }

        int runs = 0;
        for (clock.Restart(); clock.Elapsed < WarmUp; runs++)
            Workloads.Run(name, size);

        // Several runs a sample, so that the processor clock's step does not matter.
        int batch = Math.Max(1, (int)(runs / WarmUp.TotalSeconds / 50));
        var times = new List<double>();
        using var process = Process.GetCurrentProcess();
        for (clock.Restart(); clock.Elapsed < Measured && times.Count < MostRuns;)
        {
            TimeSpan before = Environment.CpuUsage.TotalTime;
            for (int i = 0; i < batch; i++)
                Workloads.Run(name, size);
            times.Add((Environment.CpuUsage.TotalTime - before).TotalMilliseconds / batch);
        }

        times.Sort();
        process.Refresh();
        Console.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"ours {name} {size} {tally} cpu_med_ms={times[times.Count / 2]:F4} first_ms={first:F2} peak_mb={process.PeakWorkingSet64 / 1048576}"));
        return 0;
    }
}
