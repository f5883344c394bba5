using System.Collections.Immutable;

namespace RuleAndCompass.Language.Diagnostics;

/// <summary>What a stage gives: a value, or null where errors prevent one, and what it found in source order.</summary>
public sealed record Outcome<T>(T? Value, ImmutableArray<Diagnostic> Diagnostics)
    where T : class
{
    /// <summary>True where at least one finding is an error.</summary>
    public bool HasErrors => Diagnostics.Any(finding => finding.Severity == Severity.Error);
}
