using RuleAndCompass.Benchmarks.Exact;

if (args.Length > 0 && args[0] == "exact")
    return ExactBenchmark.Run(args.AsSpan(1));

Console.Error.WriteLine("usage: exact WORKLOAD [SIZE]");
return 2;
