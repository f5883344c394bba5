using RuleAndCompass.Benchmarks.Accuracy;
using RuleAndCompass.Benchmarks.Exact;
using RuleAndCompass.Benchmarks.Stages;

if (args.Length > 0 && args[0] == "exact")
    return ExactBenchmark.Run(args.AsSpan(1));
if (args.Length > 0 && args[0] == "fuzz-numbers")
    return NumberFuzz.Run(args.AsSpan(1));
if (args.Length > 0 && args[0] == "hand")
    return HandErrorBenchmark.Run(args.AsSpan(1));
if (args.Length > 0 && args[0] == "stages")
    return StageBenchmark.Run(args.AsSpan(1));

Console.Error.WriteLine("usage: stages SCRIPT | exact WORKLOAD [SIZE] | fuzz-numbers [COUNT [SEED]] | hand trials SCRIPT [COUNT] | hand first-order [ACTS]");
return 2;
