namespace RuleAndCompass.Accuracy;

/// <summary>What a caller asks of <see cref="HandError"/>.</summary>
public sealed record HandErrorOptions
{
    /// <summary>The most trials that may be asked for.</summary>
    public const int MaximumTrials = 100_000_000;

    /// <summary>How many trials; 0 for first order alone.</summary>
    public int Trials { get; init; } = 100_000;

    /// <summary>The same seed gives the same figures, whatever the machine has of cores and vectors.</summary>
    public ulong Seed { get; init; } = 1;

    /// <summary>Whether the bars of the printed plate were measured, and its scale errors are those of the hand; else 1 % is assumed of a print.</summary>
    public bool BarsMeasured { get; init; }

    /// <summary>How many acts a blame list names at most.</summary>
    public int BlameCount { get; init; } = 10;

    /// <summary>The most threads to use; null for one to a core.</summary>
    public int? Threads { get; init; }
}
