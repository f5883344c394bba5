using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.Making;

/// <summary>
/// Ends the sentence at hand with a finding: it is caught where sentences are carried out, and never leaves the making.
/// Without a finding, the sentence rests on one that failed, and nothing more is said.
/// </summary>
internal sealed class FaultException(Diagnostic? finding) : Exception(finding?.Message)
{
    public Diagnostic? Finding { get; } = finding;
}
