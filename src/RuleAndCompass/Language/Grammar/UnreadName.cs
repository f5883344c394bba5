namespace RuleAndCompass.Language.Grammar;

/// <summary>Guesses what a sentence that can't be read would have bound, so that its absence is not told again wherever it is used.</summary>
internal static class UnreadName
{
    /// <summary>The names among the tokens from <paramref name="start"/> to <paramref name="end"/>, or the title of a recipe.</summary>
    /// <param name="meant">The word the sentence was meant to begin with; empty where that can't be guessed, and then it may have bound the name after it.</param>
    public static IEnumerable<string> Find(List<Token> tokens, int start, int end, string meant) => meant switch
    {
        "prick" or "rule" or "strike" or "needs" => Names(tokens, start + 1, end, isList: true),
        "given" or "let" or "for" or "" => Names(tokens, start + 1, end, isList: false),
        "follow" => Names(tokens, Math.Max(tokens.FindIndex(start, end - start, token => token.IsWord("as")), start) + 1, end, isList: false),
        "recipe" => Texts(tokens, start, end),
        _ => [],
    };

    private static IEnumerable<string> Names(List<Token> tokens, int at, int end, bool isList)
    {
        int depth = 0;
        bool takes = true;
        for (; at < end; at++)
        {
            Token token = tokens[at];
            if (token.IsSign("[") || token.IsSign("("))
                depth++;
            else if (token.IsSign("]") || token.IsSign(")"))
                depth--;
            else if (token.Kind == TokenKind.Word && Vocabulary.LittleWords.Contains(token.Text))
                yield break;
            else if (token.Kind == TokenKind.Word && takes && depth <= 0)
                yield return token.Text;
            if (depth <= 0)
                takes = isList && token.IsSign(",");
        }
    }

    private static IEnumerable<string> Texts(List<Token> tokens, int start, int end)
    {
        for (int at = start; at < end; at++)
        {
            if (tokens[at].Kind == TokenKind.Text)
                yield return tokens[at].Text;
        }
    }
}
