namespace RuleAndCompass.Numbers;

/// <summary>A decision was too hard for the limits, or cannot be decided at all; says what is known so far.</summary>
public sealed class UndecidedException(string message, Verdict known) : Exception(message)
{
    /// <summary>What is known so far.</summary>
    public Verdict Known { get; } = known;
}
