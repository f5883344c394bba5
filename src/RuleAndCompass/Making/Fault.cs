using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.Making;

/// <summary>
/// Ends the sentence at hand with a finding: it is caught where sentences are carried out, and never leaves the making.
/// Without a finding, the sentence rests on one that failed, and nothing more is said.
/// </summary>
internal sealed class FaultException(Diagnostic? finding, FaultEnds ends = FaultEnds.Sentence) : Exception(finding?.Message)
{
    public Diagnostic? Finding { get; } = finding;

    /// <summary>How much is given up.</summary>
    public FaultEnds Ends { get; } = ends;
}

/// <summary>What a fault puts an end to.</summary>
internal enum FaultEnds
{
    /// <summary>The sentence; the next is carried out.</summary>
    Sentence,

    /// <summary>The recipe that refuses, or the script where none is followed.</summary>
    Recipe,

    /// <summary>All: a limit is reached.</summary>
    Making,
}
