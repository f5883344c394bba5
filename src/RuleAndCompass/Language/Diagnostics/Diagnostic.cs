namespace RuleAndCompass.Language.Diagnostics;

/// <summary>How much a finding matters.</summary>
public enum Severity
{
    /// <summary>The work goes on; the maker should know.</summary>
    Warning,

    /// <summary>The script is wrong; nothing is written.</summary>
    Error,
}

/// <summary>Something a writer of a script should know, found by any stage.</summary>
/// <param name="Code"><c>RC</c> and four digits; never changes its meaning. RC1… language, RC2… making, RC3… bench, RC4… accuracy and comparing, RC5… plates, RC6… command line.</param>
/// <param name="Severity">Whether the script can still be used.</param>
/// <param name="Message">What is wrong, standing alone: lower case, no full stop, source words in backticks.</param>
/// <param name="Span">The smallest text that shows it, in the script that <paramref name="File"/> names.</param>
/// <param name="Hint">What to change, where that is known.</param>
/// <param name="File">The used script or built-in recipe it lies in; null in the script itself.</param>
public sealed record Diagnostic(string Code, Severity Severity, string Message, SourceSpan Span, string? Hint = null, string? File = null);
