using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.Language.Syntax;

/// <summary><c># the bar is left standing</c>: from the sign to the end of its line, blanks at the end left out.</summary>
public readonly record struct Comment(string Text, SourceSpan Span);
