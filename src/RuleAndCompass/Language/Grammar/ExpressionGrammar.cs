using System.Collections.Immutable;
using System.Diagnostics;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;
using Sprache;
using static RuleAndCompass.Language.Grammar.Rules;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Values, measures and names.</summary>
internal static class ExpressionGrammar
{
    private static readonly ImmutableArray<Bound> NoSteps = [];

    // the fields below are made in order, so what is used before its line is reached through a delegate of its own
    private static readonly Parser<Expression> Inner = input => Value!(input);

    // hour[3], V[i, j]
    private static readonly Parser<ImmutableArray<Expression>> Indices = WhereNext(
        "[",
        from open in Sign("[")
        from indices in Listed(Inner, Sign(","))
        from close in Sign("]")
        select indices);

    /// <summary>bound = NAME [ "[" expr { "," expr } "]" ]</summary>
    public static readonly Parser<Bound> BoundRule = (
        from name in NameRule
        from indices in Indices
        select new Bound(name, indices, default)).Spanned();

    /// <summary>ref = bound { "." bound }</summary>
    public static readonly Parser<Reference> Ref = (
        from steps in Listed(BoundRule, Quietly("."))
        select new Reference(steps, default)).Spanned();

    public static readonly Parser<Way> WayRule =
        from word in AnyWord("clockwise", "anticlockwise")
        select word.Text == "clockwise" ? Way.Clockwise : Way.Anticlockwise;

    /// <summary>TEXT, with its values in braces.</summary>
    public static readonly Parser<TextLiteral> Text = input =>
    {
        TokenStream stream = ((TokenInput)input).Stream;
        Token token = Current(input);
        if (token.Kind != TokenKind.Text)
        {
            stream.Expect(input.Position, AText);
            return Reading<TextLiteral>.Failed(input);
        }

        token.Literal ??= TextReader.Read(token, stream);
        return Reading<TextLiteral>.Of(token.Literal, input.Advance());
    };

    // -x
    private static readonly Parser<Expression> Negation = Nested((
        from sign in Sign("-")
        from operand in Lazily(() => Factor!)
        select (Expression)new Negation(operand, default)).Spanned());

    private static readonly Parser<Expression> Bracket =
        from open in Sign("(")
        from inner in Inner
        from close in Sign(")")
        select inner;

    // 90 mm, 1/8 turn, 3
    private static readonly Parser<Expression> Number = input =>
    {
        Token number = Current(input);
        IInput after = input.Advance();
        Token unit = Current(after);
        if (unit.Kind == TokenKind.Word)
        {
            if (Vocabulary.LengthUnits.TryGetValue(unit.Text, out (int Numerator, int Denominator) size))
            {
                Rational millimetres = number.Value * size.Numerator / size.Denominator;
                return Reading<Expression>.Of(new LengthLiteral(millimetres, $"{number.Text} {unit.Text}", number.Span.To(unit.Span)), after.Advance());
            }

            if (Vocabulary.AngleUnits.TryGetValue(unit.Text, out int degrees))
                return Reading<Expression>.Of(new AngleLiteral(number.Value * degrees, $"{number.Text} {unit.Text}", number.Span.To(unit.Span)), after.Advance());
        }

        return Reading<Expression>.Of(new NumberLiteral(number.Value, number.Text, number.Span), after);
    };

    // 43°18'30"
    private static readonly Parser<Expression> Angle = input =>
    {
        Token angle = Current(input);
        return Reading<Expression>.Of(new AngleLiteral(angle.Value, angle.Text, angle.Span), input.Advance());
    };

    // atan(y, x)
    private static readonly Parser<Expression> Call = (
        from function in NameRule
        from open in Sign("(")
        from arguments in Listed(Inner, Sign(","))
        from close in Sign(")")
        select (Expression)new Call(function, arguments, default)).Spanned().Checked(CheckCall);

    // distance A to B
    private static readonly Parser<Expression> Distance = (
        from word in Word("distance")
        from start in Ref
        from end in After("to", Ref)
        select (Expression)new DistanceMeasure(start, end, default)).Spanned();

    // angle from l to m clockwise
    private static readonly Parser<Expression> Turn =
        from start in After("from", Ref)
        from end in After("to", Ref)
        from way in WayRule
        select (Expression)new TurnMeasure(start, end, way, default);

    // angle A O B
    private static readonly Parser<Expression> Corner =
        from first in Ref
        from corner in Ref
        from second in Ref
        select (Expression)new AngleMeasure(first, corner, second, default);

    private static readonly Parser<Expression> AngleOf = Then(Word("angle"), Turn.XOr(Corner)).Spanned();

    // radius of c, x of P
    private static readonly Parser<Expression> PartOf = (
        from part in AnyWord("radius", "x", "y")
        from figure in After("of", Ref)
        select part.Text == "radius" ? (Expression)new RadiusMeasure(figure, default) : new CoordinateMeasure(part.Text == "x", figure, default)).Spanned();

    private static readonly Parser<Expression> Named = Ref.Select(reference => (Expression)reference);

    private static readonly Parser<Expression> Quoted = Text.Select(text => (Expression)text);

    // factor: told by its first token, and by the second for what begins with a name
    private static readonly Parser<Expression> Factor = input =>
    {
        Token token = Current(input);
        switch (token.Kind)
        {
            case TokenKind.Number:
                return Number(input);
            case TokenKind.Angle:
                return Angle(input);
            case TokenKind.Text:
                return Quoted(input);
            case TokenKind.Sign when token.Text == "(":
                return Bracket(input);
            case TokenKind.Sign when token.Text == "-":
                return Negation(input);
            case TokenKind.Word when token.Text == "distance":
                return Distance(input);
            case TokenKind.Word when token.Text == "angle":
                return AngleOf(input);
            case TokenKind.Word when !Vocabulary.LittleWords.Contains(token.Text):
                Token next = Current(input.Advance());
                return next.IsSign("(") ? Call(input) : next.IsWord("of") && token.Text is "radius" or "x" or "y" ? PartOf(input) : Named(input);
            default:
                ((TokenInput)input).Stream.Expect(input.Position, AValue);
                return Reading<Expression>.Failed(input);
        }
    };

    private static readonly Parser<Expression> Term = Chain(Factor, "*", "/");

    /// <summary>expr: sums of terms, terms of factors.</summary>
    public static readonly Parser<Expression> Value = Nested(Chain(Term, "+", "-"));

    /// <summary>A value that can only be a length.</summary>
    public static readonly Parser<Expression> Length = Value.Checked((stream, value) => DoubtBareNumber(stream, value, LanguageFindings.LengthWithoutUnit));

    /// <summary>A value that can only be an angle.</summary>
    public static readonly Parser<Expression> AngleValue = Value.Checked((stream, value) => DoubtBareNumber(stream, value, LanguageFindings.AngleWithoutMark));

    /// <summary>place = "(" expr "," expr ")" [ "from" ref ]</summary>
    public static readonly Parser<Place> PlaceRule = (
        from open in Sign("(")
        from x in Length
        from comma in Sign(",")
        from y in Length
        from close in Sign(")")
        from origin in Maybe(After("from", Ref))
        select new Place(x, y, origin, default)).Spanned();

    private static readonly Parser<Direction> OnSheet = (
        from word in AnyWord("up", "down", "left", "right")
        select (Direction)new SheetDirection(word.Text, word.Text switch { "up" => 90, "down" => 270, "left" => 180, _ => 0 }, default)).Spanned();

    /// <summary>direction = "up" | "down" | "left" | "right" | expr</summary>
    public static readonly Parser<Direction> DirectionRule = OnSheet.XOr(AngleValue.Select(value => (Direction)new TowardDirection(value, value.Span)));

    /// <summary>span = expr [ "to" ref ], a name before "to"</summary>
    public static readonly Parser<OpeningSpan> Opening = (
        from first in Value
        from end in Maybe(After("to", Ref))
        select end is null ? (OpeningSpan)new LengthSpan(first, default) : new PointsSpan(first as Reference ?? Unnamed(first), end, default)).Spanned().Checked(CheckOpening);

    /// <summary>{expr:FORM}, without the braces</summary>
    public static readonly Parser<ValuePiece> InBraces =
        from value in Value
        from form in WhereNext(":", Then(Sign(":"), input => Form!(input)))
        from end in End
        select new ValuePiece(value, form, default);

    private static readonly Parser<string?> Form = input =>
    {
        Token token = Current(input);
        if (token.Kind is not (TokenKind.Number or TokenKind.Word))
        {
            ((TokenInput)input).Stream.Expect(input.Position, "a form");
            return Reading<string?>.Failed(input);
        }

        bool known = token.Kind == TokenKind.Word ? Vocabulary.Forms.Contains(token.Text) : token.Text.Length <= 3 && token.Text.All(char.IsAsciiDigit) && token.Value <= 100;
        if (!known)
            ((TokenInput)input).Stream.Findings.Add(LanguageFindings.UnknownForm(token.Text, token.Span));
        return Reading<string?>.Of(token.Text, input.Advance());
    };

    /// <summary>The reference, or a report that a name was expected and a stand-in, which never leaves the reader.</summary>
    public static Reference AsReference(TokenStream stream, Expression value, string place)
    {
        if (value is Reference reference)
            return reference;
        stream.Findings.Add(LanguageFindings.NameExpected(stream.Text.Substring(value.Span.Start, value.Span.Length), place, value.Span));
        return Unnamed(value);
    }

    private static Reference Unnamed(Expression value) => new(NoSteps, value.Span);

    private static void CheckOpening(TokenStream stream, OpeningSpan span)
    {
        if (span is PointsSpan { From: { Steps.IsEmpty: true, Span: var from } })
            stream.Findings.Add(LanguageFindings.NameExpected(stream.Text.Substring(from.Start, from.Length), "a span before `to`", from));
        else if (span is LengthSpan { Length: var length })
            DoubtBareNumber(stream, length, LanguageFindings.LengthWithoutUnit);
    }

    private static void CheckCall(TokenStream stream, Expression expression)
    {
        Call call = expression as Call ?? throw new UnreachableException();
        if (!Vocabulary.FunctionArguments.TryGetValue(call.Function.Text, out (int Least, int Most) count))
            stream.Findings.Add(LanguageFindings.UnknownFunction(call.Function.Text, call.Function.Span));
        else if (call.Arguments.Length < count.Least || call.Arguments.Length > count.Most)
            stream.Findings.Add(LanguageFindings.WrongCount(call.Function.Text, call.Arguments.Length, count.Least, count.Most, call.Span));
    }

    private static void DoubtBareNumber(TokenStream stream, Expression value, Func<string, SourceSpan, Diagnostic> finding)
    {
        NumberLiteral? bare = (value is Negation negation ? negation.Operand : value) as NumberLiteral;
        if (bare is not null && !bare.Value.IsZero)
            stream.Doubts.Add(finding(bare.Text, bare.Span));
    }

    // Operands joined by two operators of one rank, from the left.
    private static Parser<Expression> Chain(Parser<Expression> operand, string first, string second) => input =>
    {
        IResult<Expression> left = operand(input);
        while (left.WasSuccessful && Current(left.Remainder) is { Kind: TokenKind.Sign } sign && (sign.Text == first || sign.Text == second))
        {
            TokenStream stream = ((TokenInput)input).Stream;
            if (!stream.CountOperator(sign.Span))
                return Reading<Expression>.Failed(left.Remainder);
            if (sign.Text == "/")
                CheckDivisor(stream, left.Remainder.Position + 1);
            IResult<Expression> right = operand(left.Remainder.Advance());
            if (!right.WasSuccessful)
                return right;
            ArithmeticOperator operation = sign.Text switch
            {
                "+" => ArithmeticOperator.Plus,
                "-" => ArithmeticOperator.Minus,
                "*" => ArithmeticOperator.Times,
                _ => ArithmeticOperator.Over,
            };
            left = Reading<Expression>.Of(new Arithmetic(left.Value, operation, right.Value, SpanOf(input, right.Remainder)), right.Remainder);
        }

        return left;
    };

    // R/2/3: is the fraction the divisor, or does the maker divide twice?
    private static void CheckDivisor(TokenStream stream, int position)
    {
        while (stream[position].IsSign("-"))
            position++;
        Token divisor = stream[position];
        if (divisor.IsFraction)
            stream.Findings.Add(LanguageFindings.FractionAfterStroke(divisor.Text, divisor.Span));
    }

    private static Parser<T> Nested<T>(Parser<T> rule) => input =>
    {
        TokenStream stream = ((TokenInput)input).Stream;
        IResult<T> result = stream.Deeper(Current(input).Span) ? rule(input) : Reading<T>.Failed(input);
        stream.Shallower();
        return result;
    };

    private static Parser<T> Lazily<T>(Func<Parser<T>> rule) => input => rule()(input);

    private static Parser<Token> Quietly(string sign) => input =>
        Current(input).IsSign(sign) ? Reading<Token>.Of(Current(input), input.Advance()) : Reading<Token>.Failed(input);

    // The rule where the sign stands next, and else nothing, without a word that the sign could have stood there.
    private static Parser<ImmutableArray<T>> WhereNext<T>(string sign, Parser<ImmutableArray<T>> rule) => input =>
        Current(input).IsSign(sign) ? rule(input) : Reading<ImmutableArray<T>>.Of([], input);

    private static Parser<string?> WhereNext(string sign, Parser<string?> rule) => input =>
        Current(input).IsSign(sign) ? rule(input) : Reading<string?>.Of(null, input);
}
