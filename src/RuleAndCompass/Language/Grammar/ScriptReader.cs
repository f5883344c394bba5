using System.Collections.Immutable;
using System.Text;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using Sprache;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Reads the text of a script into its tree.</summary>
public static class ScriptReader
{
    /// <summary>Reads a script; a bad sentence is left out of the tree and told, and reading goes on with the next.</summary>
    /// <param name="name">What diagnostics call the script.</param>
    /// <param name="text">The script.</param>
    /// <param name="limits">What bounds the reading.</param>
    /// <param name="cancellation">Ends the reading early.</param>
    /// <returns>The tree, null only for a script that is too long to be read at all, and the findings in source order.</returns>
    public static Outcome<Script> Read(string name, string text, ReadingLimits? limits = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(name);
        ArgumentNullException.ThrowIfNull(text);
        limits ??= new ReadingLimits();
        if (text.Length > limits.MaximumBytes || Encoding.UTF8.GetByteCount(text) > limits.MaximumBytes)
            return new Outcome<Script>(null, [LanguageFindings.TooManyBytes(Encoding.UTF8.GetByteCount(text), limits.MaximumBytes)]);

        (List<Token> tokens, List<Comment> comments, List<Diagnostic> findings) = Lexer.Read(text, limits, cancellation);
        BlockBuilder blocks = new(text, limits, findings);
        SentenceReader reader = new(text, tokens, limits, findings, blocks);
        reader.ReadAll(cancellation);
        ImmutableArray<Sentence> tree = blocks.Finish();
        Script script = new(name, text, tree) { Comments = [.. comments], UnreadNames = blocks.UnreadNames };
        return new Outcome<Script>(script, InOrder(findings, limits));
    }

    /// <summary>Reads one expression, for values given on the command line (<c>43°18'</c>, <c>80 mm</c>).</summary>
    public static Outcome<Expression> ReadExpression(string text)
    {
        ArgumentNullException.ThrowIfNull(text);
        ReadingLimits limits = new();
        if (text.Length > limits.MaximumBytes)
            return new Outcome<Expression>(null, [LanguageFindings.TooManyBytes(Encoding.UTF8.GetByteCount(text), limits.MaximumBytes)]);
        (List<Token> tokens, _, List<Diagnostic> findings) = Lexer.Read(text, limits, CancellationToken.None);
        if (findings.Count > 0)
            return new Outcome<Expression>(null, InOrder(findings, limits));
        TokenStream stream = new(text, tokens, 0, tokens.Count, limits);
        IResult<Expression> result = SentenceGrammar.LoneExpression(stream.Input(0));
        findings.AddRange(stream.Findings);
        if (!result.WasSuccessful && stream.Findings.Count == 0)
            findings.Add(SentenceFault.Explain(stream, "", new SourceSpan(0, text.Length)));
        return new Outcome<Expression>(findings.Count == 0 ? result.Value : null, InOrder(findings, limits));
    }

    private static ImmutableArray<Diagnostic> InOrder(List<Diagnostic> findings, ReadingLimits limits)
    {
        // a stable sort: what is found at one place stays in the order it was found
        List<Diagnostic> sorted = [.. findings.OrderBy(finding => finding.Span.Start)];
        if (sorted.Count > limits.MaximumFindings)
        {
            SourceSpan next = sorted[limits.MaximumFindings].Span;
            sorted.RemoveRange(limits.MaximumFindings, sorted.Count - limits.MaximumFindings);
            sorted.Add(LanguageFindings.TooManyFindings(limits.MaximumFindings, next));
        }

        return [.. sorted];
    }
}

/// <summary>Bounds on a script, each a diagnostic that names it.</summary>
/// <param name="MaximumBytes">Of the text as UTF-8.</param>
/// <param name="MaximumSentences">In the whole script.</param>
/// <param name="MaximumNesting">Of blocks, and of brackets, where no more than 200 are ever taken.</param>
/// <param name="MaximumDigits">Of one number, its point or stroke counted.</param>
/// <param name="MaximumOperators">In one sentence.</param>
/// <param name="MaximumFindings">That are told.</param>
public sealed record ReadingLimits(
    int MaximumBytes = 4 << 20,
    int MaximumSentences = 200_000,
    int MaximumNesting = 100,
    int MaximumDigits = 10_000,
    int MaximumOperators = 1_000,
    int MaximumFindings = 1_000);
