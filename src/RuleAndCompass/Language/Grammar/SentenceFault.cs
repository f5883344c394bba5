using System.Collections.Immutable;
using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Says why a sentence could not be read, from the farthest place that reading came to and what was expected there.</summary>
internal static class SentenceFault
{
    // a sentence may be as long as a script: for the sake of a message, no more is looked at
    private const int FarthestLook = 100;

    /// <summary>The one finding for a sentence whose shape is wrong.</summary>
    /// <param name="stream">After the failed reading.</param>
    /// <param name="sentenceWord">The word it begins with, for the example in the hint; empty for an expression alone.</param>
    /// <param name="emptySpan">What to show where there is no token at all.</param>
    public static Diagnostic Explain(TokenStream stream, string sentenceWord, SourceSpan emptySpan)
    {
        int at = stream.Farthest;
        Token found = stream[at];
        Token before = at > 0 ? stream[at - 1] : found;
        ImmutableArray<string> expected = [.. stream.Expected.Where(what => what != Rules.TheEnd)];
        string? example = SentenceForms.FindNearest(sentenceWord, Words(stream));
        bool mayEnd = stream.Expected.Contains(Rules.TheEnd);

        if (found.Kind == TokenKind.Sign && found.Text is ")" or "]" && OpenBracket(stream, at) is null)
            return LanguageFindings.BracketNotOpened(found.Text, found.Span);
        if (OpenBracket(stream, at) is { } open && !Closes(stream, at, open))
            return LanguageFindings.BracketNotClosed(open.Text, open.Span);
        if (found.Kind == TokenKind.End)
            return LanguageFindings.BreaksOff(at == 0 ? null : Written(stream, before), expected, example, at == 0 ? emptySpan : before.Span);
        if (found.FirstOnLine && before.IsSign(",") && SentenceForms.Begins(found.Text) && !Looks(expected, found))
            return LanguageFindings.CommaBeforeSentence(found.Text, before.Span);

        if (found.Kind == TokenKind.Word)
        {
            if (expected.Contains(Rules.AName) && Vocabulary.LittleWords.Contains(found.Text) && ReadsOnAsName(stream, at, sentenceWord))
                return LanguageFindings.LittleWordAsName(found.Text, found.Span);
            string? near = Near(found.Text, expected);
            if (near is null && before.Kind == TokenKind.Number && IsMeantAsUnit(stream, before, found.Text))
                return LanguageFindings.UnknownUnit(found.Text, found.Span);
            bool valueMayEnd = mayEnd || expected.Contains("`)`") || expected.Contains("`]`");
            if (near is null && valueMayEnd && Vocabulary.Units.Contains(found.Text) && (before.Kind == TokenKind.Word || before.IsSign(")") || before.IsSign("]")))
                return LanguageFindings.UnitAfterValue(found.Text, found.Span);
            string? hint = near is null ? FindHint(stream, at, expected) : $"did you mean `{near}`?";
            return mayEnd
                ? LanguageFindings.TooManyWords(found.Text, hint, expected, found.Span)
                : LanguageFindings.Unexpected(found.Text, expected, hint, example, found.Span);
        }

        string written = Written(stream, found);
        return mayEnd
            ? LanguageFindings.TooManyWords(written, FindHint(stream, at, expected), expected, found.Span)
            : LanguageFindings.Unexpected(written, expected, FindHint(stream, at, expected), example, found.Span);
    }

    // A word after a number: near to a unit, or where a length or an angle was looked for.
    private static bool IsMeantAsUnit(TokenStream stream, Token number, string word) =>
        !Vocabulary.LittleWords.Contains(word)
        && (!Vocabulary.Holds(word) || Vocabulary.UnitHabits.ContainsKey(word))
        && (word == "h" || LanguageFindings.FindUnit(word) is not null || stream.Doubts.Any(doubt => doubt.Span == number.Span));

    // What to say of a few slips that the list of what is expected does not make plain.
    private static string? FindHint(TokenStream stream, int at, ImmutableArray<string> expected)
    {
        Token found = stream[at];
        Token before = stream[Math.Max(at - 1, 0)];
        if (found.IsSign("=") && before.IsSign("="))
            return "one `=` is enough";
        if (found.IsSign(",") && before.Kind == TokenKind.Number && stream[at + 1].Kind == TokenKind.Number && stream[at + 1].Span.Start == found.Span.End)
            return $"decimals are written with a point: `{before.Text}.{stream[at + 1].Text}`";
        if (found.Kind == TokenKind.Word && found.Text is "is" or "are" or "the" or "a" or "then")
            return "leave it out";
        if (expected is [Rules.AText] && found.Kind is TokenKind.Word or TokenKind.Number)
            return $"put it between `\"` marks: `\"{found.Text}\"`";
        if (before.Kind == TokenKind.Word && found.Kind is TokenKind.Word or TokenKind.Number or TokenKind.Angle)
        {
            if (before.Text is "radius" or "x" or "y" && found.Kind == TokenKind.Word)
                return $"write `{before.Text} of {found.Text}`";
            if (Vocabulary.FunctionArguments.ContainsKey(before.Text))
                return $"a function takes its value in brackets: `{before.Text}({found.Text})`";
        }

        return null;
    }

    private static IEnumerable<string> Words(TokenStream stream)
    {
        for (int i = 1; i < Math.Min(stream.Count, FarthestLook); i++)
        {
            if (stream[i].Kind == TokenKind.Word)
                yield return stream[i].Text;
        }
    }

    private static string Written(TokenStream stream, Token token) => stream.Text.Substring(token.Span.Start, token.Span.Length);

    private static bool Looks(ImmutableArray<string> expected, Token found) => expected.Contains($"`{found.Text}`");

    private static string? Near(string word, ImmutableArray<string> expected) =>
        Habits.FindInnerWord(word) is { } meant && expected.Contains($"`{meant}`") ? meant : NearName.Find(word, expected.Where(what => what[0] == '`' && char.IsLetter(what[1])).Select(what => what[1..^1]));

    // The innermost bracket that is open before a place.
    private static Token? OpenBracket(TokenStream stream, int at)
    {
        Stack<Token> open = new();
        for (int i = 0; i < at; i++)
        {
            Token token = stream[i];
            if (token.IsSign("(") || token.IsSign("["))
                open.Push(token);
            else if ((token.IsSign(")") || token.IsSign("]")) && open.Count > 0)
                open.Pop();
        }

        return open.Count > 0 ? open.Peek() : null;
    }

    // Whether the bracket is closed at or after a place, by one of its own kind.
    private static bool Closes(TokenStream stream, int at, Token open)
    {
        string close = open.Text == "(" ? ")" : "]";
        int depth = 0;
        for (int i = at; i < Math.Min(stream.Count, at + FarthestLook); i++)
        {
            Token token = stream[i];
            if (token.IsSign("(") || token.IsSign("["))
                depth++;
            else if ((token.IsSign(")") || token.IsSign("]")) && depth-- == 0)
                return token.Text == close;
        }

        return false;
    }

    // With a plain name in its place the sentence reads on past the word after it: then it is a name in all but spelling, and none is missing.
    private static bool ReadsOnAsName(TokenStream stream, int at, string sentenceWord)
    {
        List<Token> tokens = [];
        for (int i = 0; i < Math.Min(stream.Count, at + FarthestLook); i++)
            tokens.Add(i == at ? stream[i] with { Text = "A" } : stream[i]);
        TokenStream trial = new(stream.Text, tokens, 0, tokens.Count, stream.Limits);
        bool read = sentenceWord.Length > 0
            ? SentenceGrammar.Sentence(trial.Input(0)).WasSuccessful
            : SentenceGrammar.LoneExpression(trial.Input(0)).WasSuccessful;
        return read || trial.Farthest > at + 1;
    }
}
