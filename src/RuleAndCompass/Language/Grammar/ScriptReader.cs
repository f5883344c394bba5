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
        int sentences = 0;
        for (int start = 0; start < tokens.Count;)
        {
            cancellation.ThrowIfCancellationRequested();
            if (++sentences > limits.MaximumSentences)
            {
                findings.Add(LanguageFindings.TooManySentences(limits.MaximumSentences, tokens[start].Span));
                break;
            }

            int end = SentenceEnd(tokens, start);
            start = ReadSentence(text, tokens, start, end, limits, findings, blocks);
        }

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

    // A line that ends in a comma, or whose next begins with a little word, goes on there.
    private static int SentenceEnd(List<Token> tokens, int start)
    {
        int end = start + 1;
        while (end < tokens.Count
            && (!tokens[end].FirstOnLine || tokens[end - 1].IsSign(",") || (tokens[end].Kind == TokenKind.Word && Vocabulary.LittleWords.Contains(tokens[end].Text))))
            end++;
        return end;
    }

    /// <summary>Reads the sentence, hands it to the blocks, and returns where the next begins.</summary>
    private static int ReadSentence(string text, List<Token> tokens, int start, int end, ReadingLimits limits, List<Diagnostic> findings, BlockBuilder blocks)
    {
        Token first = tokens[start];
        if (tokens.FindIndex(start, end - start, token => token.Kind == TokenKind.Fault) >= 0)
        {
            // a comma at the end of a faulty line must not take the next sentence with it
            int next = tokens.FindIndex(start + 1, end - start - 1, token => token.FirstOnLine && SentenceForms.Begins(token.Text));
            end = next < 0 ? end : next;
            blocks.AddBad(Meant(first), first, UnreadName.Find(tokens, start, end, Meant(first)));
            return end;
        }

        if (first.Kind != TokenKind.Word || !SentenceForms.Begins(first.Text))
        {
            string written = text.Substring(first.Span.Start, first.Span.Length);
            findings.Add(LanguageFindings.UnknownSentenceWord(written, tokens.GetRange(start, end - start).Select(token => token.Text), first.Span));
            blocks.AddBad(Meant(first), first, UnreadName.Find(tokens, start, end, Meant(first)));
            return end;
        }

        TokenStream stream = new(text, tokens, start, end - start, limits);
        IResult<Sentence> result = SentenceGrammar.Sentence(stream.Input(0));
        if (result.WasSuccessful)
        {
            findings.AddRange(stream.Findings);
            findings.AddRange(stream.Doubts);
            if (stream.Findings.Count == 0 && stream.Doubts.Count == 0)
                blocks.Add(result.Value, first);
            else
                blocks.AddBad(first.Text, first, UnreadName.Find(tokens, start, end, first.Text));
            return end;
        }

        findings.AddRange(stream.Findings);
        if (!stream.LimitMet)
        {
            Diagnostic finding = SentenceFault.Explain(stream, first.Text, first.Span);
            if (!stream.Findings.Any(other => other.Span == finding.Span))
                findings.Add(finding);
            Token found = stream[stream.Farthest];
            if (stream.Farthest > 0 && found.FirstOnLine && SentenceForms.Begins(found.Text))
                end = start + stream.Farthest;
        }

        blocks.AddBad(first.Text, first, UnreadName.Find(tokens, start, end, first.Text));
        return end;
    }

    // The sentence word that was meant, so that a mistyped `for` still takes its `end`.
    private static string Meant(Token first) =>
        first.Kind != TokenKind.Word ? ""
        : SentenceForms.Begins(first.Text) ? first.Text
        : NearName.Find(first.Text, SentenceForms.Words) ?? "";

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
