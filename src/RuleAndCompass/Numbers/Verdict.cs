using System.Collections.Immutable;
using System.Diagnostics;
using System.Globalization;

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
/// <param name="Givens">For the <c>…ForEvery</c> ones: the names of the givens; <see cref="Decider.FindRanges"/> tells how far.</param>
public sealed record Verdict(Certainty Certainty, int Size, ImmutableArray<string> Givens)
{
    /// <summary>Proved, for the values at hand.</summary>
    public static Verdict Proved { get; } = new(Certainty.Proved, 0, []);

    /// <summary>Whether a decision was reached.</summary>
    public bool IsDecided => Certainty != Certainty.Digits;

    /// <summary><c>proved</c>, <c>proved for every latitude</c>, <c>certain (2^-128)</c>, <c>certain for every latitude (2^-128)</c>, <c>to 50 digits</c>.</summary>
    public override string ToString() => Certainty switch
    {
        Certainty.Proved => "proved",
        Certainty.ProvedForEvery => $"proved for every {string.Join(" and ", Givens)}",
        Certainty.Certain => string.Create(CultureInfo.InvariantCulture, $"certain (2^-{Size})"),
        Certainty.CertainForEvery => string.Create(CultureInfo.InvariantCulture, $"certain for every {string.Join(" and ", Givens)} (2^-{Size})"),
        Certainty.Digits => string.Create(CultureInfo.InvariantCulture, $"to {Size} digits"),
        _ => throw new UnreachableException($"No words for {Certainty}."),
    };
}
