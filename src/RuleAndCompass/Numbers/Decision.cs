namespace RuleAndCompass.Numbers;

/// <summary>The sign of a number, and how it is known. An undecided sign is 0 with <see cref="Certainty.Digits"/>.</summary>
/// <param name="Sign">−1, 0 or 1.</param>
/// <param name="Verdict">How it is known.</param>
public readonly record struct Decision(int Sign, Verdict Verdict)
{
    /// <summary>A decided zero.</summary>
    public bool IsZero => Sign == 0 && Verdict.IsDecided;
}
