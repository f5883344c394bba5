using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using Sprache;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Parts the tokens into sentences, reads each, and goes on with the next whatever has become of it.</summary>
internal sealed class SentenceReader(string text, List<Token> tokens, ReadingLimits limits, List<Diagnostic> findings, BlockBuilder blocks)
{
    // of a long run of joined lines, as much is looked at for the sake of a hint
    private const int FarthestLook = 100;

    /// <summary>Reads all sentences into the blocks.</summary>
    public void ReadAll(CancellationToken cancellation)
    {
        int joinedEnd = 0;
        int sentences = 0;
        for (int start = 0; start < tokens.Count;)
        {
            cancellation.ThrowIfCancellationRequested();
            if (++sentences > limits.MaximumSentences)
            {
                findings.Add(LanguageFindings.TooManySentences(limits.MaximumSentences, tokens[start].Span));
                break;
            }

            // no one reads more, and a file that is no script would take long
            if (findings.Count > limits.MaximumFindings)
                break;
            if (start >= joinedEnd)
                joinedEnd = FindEnd(start);
            start = ReadSentence(start, joinedEnd);
        }
    }

    // A line that ends in a comma, or whose next begins with a little word, goes on there.
    private int FindEnd(int start)
    {
        int end = start + 1;
        while (end < tokens.Count
            && (!tokens[end].FirstOnLine || tokens[end - 1].IsSign(",") || (tokens[end].Kind == TokenKind.Word && Vocabulary.LittleWords.Contains(tokens[end].Text))))
            end++;
        return end;
    }

    // Returns where the next sentence begins.
    private int ReadSentence(int start, int end)
    {
        Token first = tokens[start];
        if (first.Kind != TokenKind.Word || !SentenceForms.Begins(first.Text))
            return SkipUnknown(first, start, end);

        TokenStream stream = new(text, tokens, start, end - start, limits);
        IResult<Sentence> result = SentenceGrammar.Sentence(stream.Input(0));
        findings.AddRange(stream.Findings);
        if (result.WasSuccessful)
        {
            findings.AddRange(stream.Doubts);
            if (stream.Findings.Count == 0 && stream.Doubts.Count == 0)
                blocks.Add(result.Value, first);
            else
                blocks.AddBad(first.Text, first, UnreadName.Find(tokens, start, end, first.Text));
            return end;
        }

        // a token that is itself a fault has been told, and so has a limit
        if (!stream.LimitMet && stream[stream.Farthest].Kind != TokenKind.Fault)
        {
            Diagnostic finding = SentenceFault.Explain(stream, first.Text, first.Span);
            if (!stream.Findings.Any(other => other.Span == finding.Span))
                findings.Add(finding);
        }

        int next = FindNext(Math.Max(start + 1, start + stream.Farthest), end);
        blocks.AddBad(first.Text, first, UnreadName.Find(tokens, start, next, first.Text));
        return next;
    }

    private int SkipUnknown(Token first, int start, int end)
    {
        if (first.Kind != TokenKind.Fault)
        {
            string written = text.Substring(first.Span.Start, first.Span.Length);
            IEnumerable<string> words = tokens.Skip(start).Take(Math.Min(end - start, FarthestLook)).Select(token => token.Text);
            findings.Add(LanguageFindings.UnknownSentenceWord(written, words, first.Span));
        }

        int next = FindNext(start + 1, end);
        string meant = first.Kind == TokenKind.Word ? Habits.FindFirstWord(first.Text) ?? NearName.Find(first.Text, SentenceForms.Words) ?? "" : "none";
        blocks.AddBad(meant, first, UnreadName.Find(tokens, start, next, meant));
        return next;
    }

    // After a fault, a comma at the end of a line must not take the next sentence with it: one begins where a line begins with a sentence word and reads on.
    private int FindNext(int from, int end)
    {
        for (int at = from; at < end; at++)
        {
            if (!tokens[at].FirstOnLine || tokens[at].Kind != TokenKind.Word || !SentenceForms.Begins(tokens[at].Text))
                continue;
            TokenStream trial = new(text, tokens, at, end - at, limits);
            if (SentenceGrammar.Sentence(trial.Input(0)).WasSuccessful || trial.Farthest > 1)
                return at;
        }

        return end;
    }
}
