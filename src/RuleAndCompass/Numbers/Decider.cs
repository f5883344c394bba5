using System.Collections.Immutable;

namespace RuleAndCompass.Numbers;

/// <summary>How a decision was reached; the words of a report.</summary>
public enum Certainty
{
    /// <summary>A non-zero sign from an enclosure, or an exact zero.</summary>
    Proved,

    /// <summary>Proved with the givens as unknowns.</summary>
    ProvedForEvery,

    /// <summary>By modular images; the chance of error is at most 2^−<see cref="Verdict.Size"/>.</summary>
    Certain,

    /// <summary>By random values of the givens; the chance of error is at most 2^−<see cref="Verdict.Size"/>.</summary>
    CertainForEvery,

    /// <summary>Not decided: equal to <see cref="Verdict.Size"/> decimal digits.</summary>
    Digits,
}

/// <summary>What is known of a decision.</summary>
/// <param name="Certainty">Which of the five words.</param>
/// <param name="Size">Bits for the certain ones, decimal digits for <see cref="Certainty.Digits"/>, else 0.</param>
/// <param name="Givens">For the <c>…ForEvery</c> ones: the names of the givens, each with its range in words where the range is not the whole line (<c>latitude from 1° to 89°</c>).</param>
public sealed record Verdict(Certainty Certainty, int Size, ImmutableArray<string> Givens)
{
    public static Verdict Proved { get; } = new(Certainty.Proved, 0, []);
    public bool IsDecided => Certainty != Certainty.Digits;
    /// <summary><c>proved</c>, <c>proved for every latitude</c>, <c>certain (2^-128)</c>, <c>certain for every latitude (2^-128)</c>, <c>to 50 digits</c>.</summary>
    public override string ToString() => throw new NotImplementedException();
}

/// <summary>The sign of a number, and how it is known. An undecided sign is 0 with <see cref="Certainty.Digits"/>.</summary>
public readonly record struct Decision(int Sign, Verdict Verdict)
{
    public bool IsZero => Sign == 0 && Verdict.IsDecided;
}

/// <summary>A decision was too hard for the limits, or cannot be decided at all; says what is known so far.</summary>
public sealed class UndecidedException(string message, Verdict known) : Exception(message)
{
    public Verdict Known { get; } = known;
}

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

/// <summary>Decides signs exactly. One for a script; not for use by several threads at once.</summary>
public sealed class Decider
{
    public Decider(DeciderOptions options, CancellationToken cancellation = default) => throw new NotImplementedException();
    /// <summary>The sign of <paramref name="x"/>, with how it is known; may be undecided for quantities without exact value.</summary>
    public Decision Decide(Real x) => throw new NotImplementedException();
    /// <summary>The sign of <paramref name="x"/>.</summary>
    /// <exception cref="UndecidedException">It could not be decided.</exception>
    public int Sign(Real x) => throw new NotImplementedException();
    public bool IsZero(Real x) => throw new NotImplementedException();
    public int Compare(Real a, Real b) => throw new NotImplementedException();
    /// <summary>Compares sizes of angles (turns counted): the sign of a − b.</summary>
    public Decision Compare(Angle a, Angle b) => throw new NotImplementedException();
    /// <summary>Whether a and b point the same way (turns not counted): sign 0 when they do, else the sign of the turn from b to a the short way.</summary>
    public Decision CompareDirections(Angle a, Angle b) => throw new NotImplementedException();
    /// <summary>
    /// True when <paramref name="x"/> vanishes for every value of the nodes in <paramref name="free"/> near the ones they have,
    /// treating those nodes as independent unknowns: a local theorem, cheap however deep the nodes are. False says nothing.
    /// </summary>
    public bool HoldsIdentically(Real x, IReadOnlyCollection<Real> free, out Verdict verdict) => throw new NotImplementedException();
    /// <summary>A decimal with <paramref name="significantDigits"/> certain digits (the last one rounded), fewer where the decimal ends. Plain notation.</summary>
    public string ToDecimal(Real x, int significantDigits) => throw new NotImplementedException();
    /// <summary>A decimal rounded to <paramref name="places"/> decimals, certain.</summary>
    public string ToFixed(Real x, int places) => throw new NotImplementedException();
    /// <summary>The exact form where it is short (<c>3/8</c>, <c>√2/2</c>), else null.</summary>
    public string? ToExactForm(Real x) => throw new NotImplementedException();
}
