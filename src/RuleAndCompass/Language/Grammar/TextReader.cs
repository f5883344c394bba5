using System.Collections.Immutable;
using System.Text;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using Sprache;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Parts a text into what stands as it is and what is worked out.</summary>
internal static class TextReader
{
    /// <summary>Reads a text token; what is amiss goes to the findings of <paramref name="stream"/>.</summary>
    public static TextLiteral Read(Token token, TokenStream stream)
    {
        string text = stream.Text;
        int at = token.Span.Start + 1;
        int end = token.Span.End - 1;
        ImmutableArray<TextPiece>.Builder pieces = ImmutableArray.CreateBuilder<TextPiece>(1);
        while (at < end)
        {
            if (text[at] == '{' && (at + 1 >= end || text[at + 1] != '{'))
            {
                int close = text.IndexOf('}', at, end - at);
                SourceSpan span = new(at, (close < 0 ? end : close + 1) - at);
                if (close < 0)
                    stream.Findings.Add(LanguageFindings.BraceNotClosed(span));
                else if (ReadBraces(stream, at + 1, close) is { } piece)
                    pieces.Add(piece with { Span = span });
                at = span.End;
            }
            else
            {
                pieces.Add(ReadPlain(text, ref at, end));
            }
        }

        return new TextLiteral(pieces.DrainToImmutable(), token.Span);
    }

    private static PlainPiece ReadPlain(string text, ref int at, int end)
    {
        int start = at;
        StringBuilder? plain = null;
        int copied = at;
        while (at < end)
        {
            int brace = text.IndexOf('{', at, end - at);
            if (brace < 0)
            {
                at = end;
            }
            else if (brace + 1 < end && text[brace + 1] == '{')
            {
                (plain ??= new StringBuilder()).Append(text, copied, brace + 1 - copied);
                copied = at = brace + 2;
            }
            else
            {
                at = brace;
                break;
            }
        }

        string read = plain is null ? text[start..at] : plain.Append(text, copied, at - copied).ToString();
        return new PlainPiece(read, new SourceSpan(start, at - start));
    }

    private static ValuePiece? ReadBraces(TokenStream outer, int start, int end)
    {
        (List<Token> tokens, List<Diagnostic> faults) = Lexer.ReadBraces(outer.Text, start, end, outer.Limits);
        outer.Findings.AddRange(faults);
        if (faults.Count > 0)
            return null;
        TokenStream inner = new(outer.Text, tokens, 0, tokens.Count, outer.Limits);
        IResult<ValuePiece> result = ExpressionGrammar.InBraces(inner.Input(0));
        outer.Findings.AddRange(inner.Findings);
        if (result.WasSuccessful)
            return result.Value;
        if (inner.Findings.Count == 0)
            outer.Findings.Add(SentenceFault.Explain(inner, "", new SourceSpan(start - 1, end - start + 2)));
        return null;
    }
}
