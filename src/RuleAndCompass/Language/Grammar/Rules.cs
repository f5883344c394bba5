using System.Collections.Immutable;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using Sprache;

namespace RuleAndCompass.Language.Grammar;

/// <summary>The outcome of a rule. What was expected in vain is noted in the stream, so that it outlives every alternative.</summary>
internal sealed class Reading<T> : IResult<T>
{
    private readonly T _value;

    private Reading(T value, bool wasSuccessful, IInput remainder) => (_value, WasSuccessful, Remainder) = (value, wasSuccessful, remainder);

    public T Value => WasSuccessful ? _value : throw new InvalidOperationException("A failed reading has no value.");

    public bool WasSuccessful { get; }

    public string Message => "";

    public IEnumerable<string> Expectations => [];

    public IInput Remainder { get; }

    public static Reading<T> Of(T value, IInput remainder) => new(value, true, remainder);

    // A failed reading's value is never handed out.
    public static Reading<T> Failed(IInput at) => new(default!, false, at);
}

/// <summary>
/// The small parts that the grammar is put together from, over tokens. The query operators here stand in for Sprache's own: they build nothing while reading.
/// </summary>
internal static class Rules
{
    public const string AName = "a name";
    public const string AValue = "a value";
    public const string AText = "a text";
    public const string TheEnd = "the end of the sentence";

    /// <summary>One word, told by its text wherever it stands.</summary>
    public static Parser<Token> Word(string word)
    {
        string expectation = $"`{word}`";
        return input => Take(input, Current(input).IsWord(word), expectation);
    }

    /// <summary>One of several words.</summary>
    public static Parser<Token> AnyWord(params ImmutableArray<string> words) => input =>
    {
        Token token = Current(input);
        if (token.Kind == TokenKind.Word && words.Contains(token.Text))
            return Reading<Token>.Of(token, input.Advance());
        TokenStream stream = ((TokenInput)input).Stream;
        foreach (string word in words)
            stream.Expect(input.Position, $"`{word}`");
        return Reading<Token>.Failed(input);
    };

    /// <summary>A bracket, comma or operator.</summary>
    public static Parser<Token> Sign(string sign)
    {
        string expectation = $"`{sign}`";
        return input => Take(input, Current(input).IsSign(sign), expectation);
    }

    /// <summary>A word that is not a little word.</summary>
    public static readonly Parser<Name> NameRule = input =>
    {
        Token token = Current(input);
        if (token.Kind == TokenKind.Word && !Vocabulary.LittleWords.Contains(token.Text))
            return Reading<Name>.Of(new Name(token.Text, token.Span), input.Advance());
        ((TokenInput)input).Stream.Expect(input.Position, AName);
        return Reading<Name>.Failed(input);
    };

    /// <summary>After the last token.</summary>
    public static readonly Parser<Token> End = input => Take(input, ((TokenInput)input).AtEnd, TheEnd);

    /// <summary>One rule or, where it takes nothing, null.</summary>
    public static Parser<T?> Maybe<T>(Parser<T> rule)
        where T : class => input =>
    {
        IResult<T> result = rule(input);
        if (result.WasSuccessful)
            return Reading<T?>.Of(result.Value, result.Remainder);
        return ReferenceEquals(result.Remainder, input) ? Reading<T?>.Of(null, input) : Reading<T?>.Failed(result.Remainder);
    };

    /// <summary>One rule or, where it takes nothing, null, for small values.</summary>
    public static Parser<T?> MaybeValue<T>(Parser<T> rule)
        where T : struct => input =>
    {
        IResult<T> result = rule(input);
        if (result.WasSuccessful)
            return Reading<T?>.Of(result.Value, result.Remainder);
        return ReferenceEquals(result.Remainder, input) ? Reading<T?>.Of(null, input) : Reading<T?>.Failed(result.Remainder);
    };

    /// <summary>One or more, parted by a separator.</summary>
    public static Parser<ImmutableArray<T>> Listed<T>(Parser<T> item, Parser<Token> separator) => input =>
    {
        IResult<T> first = item(input);
        if (!first.WasSuccessful)
            return Reading<ImmutableArray<T>>.Failed(first.Remainder);
        ImmutableArray<T>.Builder items = ImmutableArray.CreateBuilder<T>(1);
        items.Add(first.Value);
        IInput at = first.Remainder;
        while (true)
        {
            IResult<Token> parted = separator(at);
            if (!parted.WasSuccessful)
                return Reading<ImmutableArray<T>>.Of(items.DrainToImmutable(), at);
            IResult<T> next = item(parted.Remainder);
            if (!next.WasSuccessful)
                return Reading<ImmutableArray<T>>.Failed(next.Remainder);
            items.Add(next.Value);
            at = next.Remainder;
        }
    };

    /// <summary>None or more, one after the other.</summary>
    public static Parser<ImmutableArray<T>> Repeated<T>(Parser<T> item) => input =>
    {
        ImmutableArray<T>.Builder items = ImmutableArray.CreateBuilder<T>(1);
        for (IInput at = input; ;)
        {
            IResult<T> next = item(at);
            if (!next.WasSuccessful)
                return ReferenceEquals(next.Remainder, at) ? Reading<ImmutableArray<T>>.Of(items.DrainToImmutable(), at) : Reading<ImmutableArray<T>>.Failed(next.Remainder);
            items.Add(next.Value);
            at = next.Remainder;
        }
    };

    /// <summary>The rule after a word.</summary>
    public static Parser<T> After<T>(string word, Parser<T> rule) => Then(Word(word), rule);

    /// <summary>The second rule, after the first.</summary>
    public static Parser<T> Then<TFirst, T>(Parser<TFirst> first, Parser<T> second) => input =>
    {
        IResult<TFirst> result = first(input);
        return result.WasSuccessful ? second(result.Remainder) : Reading<T>.Failed(result.Remainder);
    };

    /// <summary>The node with the span of the tokens it was read from.</summary>
    public static Parser<T> Spanned<T>(this Parser<T> rule)
        where T : Node => input =>
    {
        IResult<T> result = rule(input);
        return result.WasSuccessful ? Reading<T>.Of((T)((Node)result.Value with { Span = SpanOf(input, result.Remainder) }), result.Remainder) : result;
    };

    /// <summary>Looks at what was read, and may report.</summary>
    public static Parser<T> Checked<T>(this Parser<T> rule, Action<TokenStream, T> check) => input =>
    {
        IResult<T> result = rule(input);
        if (result.WasSuccessful)
            check(((TokenInput)input).Stream, result.Value);
        return result;
    };

    public static Parser<TResult> Select<T, TResult>(this Parser<T> rule, Func<T, TResult> make) => input =>
    {
        IResult<T> result = rule(input);
        return result.WasSuccessful ? Reading<TResult>.Of(make(result.Value), result.Remainder) : Reading<TResult>.Failed(result.Remainder);
    };

    public static Parser<TResult> SelectMany<T, TNext, TResult>(this Parser<T> rule, Func<T, Parser<TNext>> next, Func<T, TNext, TResult> make) => input =>
    {
        IResult<T> first = rule(input);
        if (!first.WasSuccessful)
            return Reading<TResult>.Failed(first.Remainder);
        IResult<TNext> second = next(first.Value)(first.Remainder);
        return second.WasSuccessful ? Reading<TResult>.Of(make(first.Value, second.Value), second.Remainder) : Reading<TResult>.Failed(second.Remainder);
    };

    /// <summary>The token that stands next.</summary>
    public static Token Current(IInput input) => ((TokenInput)input).Token;

    /// <summary>From the first token to the last that was taken; empty where none was.</summary>
    public static SourceSpan SpanOf(IInput first, IInput after)
    {
        SourceSpan start = Current(first).Span;
        return after.Position == first.Position ? new SourceSpan(start.Start, 0) : start.To(((TokenInput)after).Stream[after.Position - 1].Span);
    }

    private static Reading<Token> Take(IInput input, bool fits, string expectation)
    {
        if (fits)
        {
            TokenInput here = (TokenInput)input;
            return Reading<Token>.Of(here.Token, here.AtEnd ? here : here.Advance());
        }

        ((TokenInput)input).Stream.Expect(input.Position, expectation);
        return Reading<Token>.Failed(input);
    }
}
