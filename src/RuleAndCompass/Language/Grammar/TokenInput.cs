using System.Diagnostics.CodeAnalysis;
using RuleAndCompass.Language.Diagnostics;
using Sprache;

namespace RuleAndCompass.Language.Grammar;

/// <summary>
/// The tokens of one sentence while it is being read: how far reading came, what was expected there, and what was found amiss on the way.
/// </summary>
internal sealed class TokenStream
{
    // brackets deeper than this would come near the end of the stack
    private const int DeepestBrackets = 200;

    private readonly List<Token> _tokens;
    private readonly int _start;
    private readonly List<TokenInput> _inputs = [];
    private readonly int _deepest;
    private int _depth;
    private int _operators;

    /// <summary>Takes <paramref name="count"/> tokens from <paramref name="start"/>; the text is the script's, to which spans refer.</summary>
    public TokenStream(string text, List<Token> tokens, int start, int count, ReadingLimits limits)
    {
        (Text, _tokens, _start, Count, Limits) = (text, tokens, start, count, limits);
        _deepest = Math.Min(DeepestBrackets, limits.MaximumNesting);
        int end = count == 0 ? 0 : tokens[start + count - 1].Span.End;
        EndToken = new Token(TokenKind.End, "", new SourceSpan(end, 0));
    }

    public string Text { get; }

    public ReadingLimits Limits { get; }

    /// <summary>How many tokens there are, the end not counted.</summary>
    public int Count { get; }

    /// <summary>What is amiss although the shape is right.</summary>
    public List<Diagnostic> Findings { get; } = [];

    /// <summary>What is amiss unless a better reason is found why the sentence can't be read.</summary>
    public List<Diagnostic> Doubts { get; } = [];

    /// <summary>The farthest token at which reading failed.</summary>
    public int Farthest { get; private set; }

    /// <summary>What was expected there.</summary>
    public List<string> Expected { get; } = [];

    /// <summary>A limit was met, which is told in the findings; the failure that ended the reading says nothing more.</summary>
    public bool LimitMet { get; private set; }

    private Token EndToken { get; }

    /// <summary>The input at a position, one for each, made when it is first reached; they are reached in order.</summary>
    public TokenInput Input(int position)
    {
        while (_inputs.Count <= position)
            _inputs.Add(new TokenInput(this, _inputs.Count));
        return _inputs[position];
    }

    public Token this[int position] => position < Count ? _tokens[_start + position] : EndToken;

    /// <summary>Notes that <paramref name="what"/> was looked for in vain.</summary>
    public void Expect(int position, string what)
    {
        if (position < Farthest)
            return;
        if (position > Farthest)
        {
            Farthest = position;
            Expected.Clear();
        }

        if (!Expected.Contains(what))
            Expected.Add(what);
    }

    public bool Deeper(SourceSpan span)
    {
        if (++_depth <= _deepest)
            return true;
        MeetLimit(LanguageFindings.TooDeep(_deepest, span));
        return false;
    }

    public void Shallower() => _depth--;

    public bool CountOperator(SourceSpan span)
    {
        if (++_operators <= Limits.MaximumOperators)
            return true;
        MeetLimit(LanguageFindings.TooManyOperators(Limits.MaximumOperators, span));
        return false;
    }

    private void MeetLimit(Diagnostic finding)
    {
        if (!LimitMet)
            Findings.Add(finding);
        LimitMet = true;
    }
}

/// <summary>A place in the tokens of a sentence, for Sprache; the position counts tokens.</summary>
internal sealed class TokenInput(TokenStream stream, int position) : IInput
{
    public TokenStream Stream => stream;

    public Token Token => stream[position];

    public int Position => position;

    public bool AtEnd => position >= stream.Count;

    public string Source => stream.Text;

    public char Current => stream.Text[Token.Span.Start];

    public int Line => 1;

    public int Column => Token.Span.Start;

    [field: AllowNull]
    public IDictionary<object, object> Memos => field ??= new Dictionary<object, object>();

    public IInput Advance() => stream.Input(position + 1);

    // One input is made for each place, so that places compare by identity.
    public bool Equals(IInput? other) => ReferenceEquals(this, other);

    public override bool Equals(object? obj) => ReferenceEquals(this, obj);

    public override int GetHashCode() => position;
}
