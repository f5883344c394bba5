namespace RuleAndCompass.Language.Diagnostics;

/// <summary>A piece of a script's text, in UTF-16 units from 0; <c>default</c> is the empty span at the start.</summary>
public readonly record struct SourceSpan(int Start, int Length)
{
    /// <summary>The first position after the span.</summary>
    public int End => Start + Length;

    /// <summary>The span from the start of this one to the end of <paramref name="last"/>.</summary>
    public SourceSpan To(SourceSpan last) => new(Start, last.End - Start);
}
