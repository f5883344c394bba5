namespace RuleAndCompass.Numbers;

/// <summary>What bounds the work of decisions.</summary>
/// <param name="Seed">SHA-256 of the script's text: the random primes and points follow from it.</param>
/// <param name="Prove">Do the exact computation however long it takes.</param>
/// <param name="MaximumBits">Largest precision of an enclosure.</param>
/// <param name="MaximumDegree">Largest degree of a tower decided exactly without <paramref name="Prove"/>.</param>
/// <param name="TimeLimit">For one decision.</param>
public sealed record DeciderOptions(
    ReadOnlyMemory<byte> Seed = default,
    bool Prove = false,
    int MaximumBits = 65536,
    int MaximumDegree = 64,
    TimeSpan? TimeLimit = null);
