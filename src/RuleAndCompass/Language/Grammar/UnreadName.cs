namespace RuleAndCompass.Language.Grammar;

/// <summary>Guesses what a sentence that can't be read would have bound, so that its absence is not told again wherever it is used.</summary>
internal static class UnreadName
{
    /// <summary>The names among the tokens from <paramref name="start"/> to <paramref name="end"/>, or the title of a recipe.</summary>
    /// <param name="meant">The word the sentence was meant to begin with; empty where that can't be guessed, and then it may have bound the name after it.</param>
    public static IEnumerable<string> Find(List<Token> tokens, int start, int end, string meant) => meant switch
    {
        "needs" => Names(tokens, start + 1, end, most: int.MaxValue),
        "prick" => Names(tokens, start + 1, PairEnd(tokens, start, end), most: 2),
        "rule" or "strike" or "given" or "let" or "for" or "" => Names(tokens, start + 1, end, most: 1),
        "follow" => Names(tokens, Math.Max(tokens.FindIndex(start, end - start, token => token.IsWord("as")), start) + 1, end, most: 1),
        "recipe" => Texts(tokens, start, end),
        _ => [],
    };

    // The name at the start and those after commas outside brackets.
    private static IEnumerable<string> Names(List<Token> tokens, int at, int end, int most)
    {
        int depth = 0;
        bool takes = true;
        for (int taken = 0; at < end && taken < most; at++)
        {
            Token token = tokens[at];
            if (token.IsSign("[") || token.IsSign("("))
                depth++;
            else if (token.IsSign("]") || token.IsSign(")"))
                depth--;
            if (depth > 0)
                continue;
            if (takes && token.Kind == TokenKind.Word && !Vocabulary.LittleWords.Contains(token.Text))
            {
                taken++;
                yield return token.Text;
            }

            takes = token.IsSign(",");
        }
    }

    // Where the names of `P, Q where …` end: at the first word that follows neither the start, nor a comma, nor the bracket of an index.
    private static int PairEnd(List<Token> tokens, int start, int end)
    {
        for (int at = start + 2; at < end; at++)
        {
            Token before = tokens[at - 1];
            if (tokens[at].Kind == TokenKind.Word && !before.IsSign(",") && !before.IsSign("["))
                return at;
        }

        return end;
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
