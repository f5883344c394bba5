namespace RuleAndCompass.Language.Grammar;

/// <summary>Guesses what a sentence that can't be read would have bound, so that its absence is not told again wherever it is used.</summary>
internal static class UnreadName
{
    /// <summary>The names among the tokens from <paramref name="start"/> to <paramref name="end"/>, or the title of a recipe.</summary>
    public static IEnumerable<string> Find(List<Token> tokens, int start, int end)
    {
        string word = tokens[start].Text;
        if (word == "recipe")
            return Texts(tokens, start, end);
        if (word is "follow")
            return Names(tokens, Math.Max(tokens.FindIndex(start, end - start, token => token.IsWord("as")), start) + 1, end, lists: false);
        if (word is "needs" or "gives")
            return Names(tokens, start + 1, end, lists: true);
        // a mistyped first word binds what follows it, most likely
        return Names(tokens, start + 1, end, lists: word is not ("given" or "let" or "for"));
    }

    private static IEnumerable<string> Names(List<Token> tokens, int at, int end, bool lists)
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
            else if (token.Kind == TokenKind.Word && takes && depth <= 0)
                yield return token.Text;
            if (depth <= 0)
                takes = lists && token.IsSign(",");
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
