using System.Collections.Immutable;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using Sprache;
using static RuleAndCompass.Language.Grammar.ExpressionGrammar;
using static RuleAndCompass.Language.Grammar.Rules;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Claims, comparisons and the conditions they share with <c>when</c>.</summary>
internal static class TruthGrammar
{
    // Each rule after the first value makes the test from it.
    private delegate Test Tested(TokenStream stream, bool negated, Expression left);

    private static readonly Parser<Token> RelationSign = input =>
    {
        Token token = Current(input);
        if (token.Kind == TokenKind.Sign && token.Text is "=" or "<" or ">" or "<=" or ">=")
            return Reading<Token>.Of(token, input.Advance());
        ((TokenInput)input).Stream.Expect(input.Position, "`=`");
        ((TokenInput)input).Stream.Expect(input.Position, "`<`");
        return Reading<Token>.Failed(input);
    };

    // = y, <= y
    private static readonly Parser<Tested> Compared =
        from sign in RelationSign
        from right in Value
        select new Tested((_, negated, left) => new RelationTest(
            negated,
            left,
            sign.Text switch
            {
                "=" => Relation.Equal,
                "<" => Relation.Less,
                ">" => Relation.Greater,
                "<=" => Relation.AtMost,
                _ => Relation.AtLeast,
            },
            right,
            default));

    private static readonly Parser<Tested> OnFigure = After("on", Ref).Select(right => Figures(FigureRelation.On, right));

    private static readonly Parser<Tested> SquareOrParallel =
        from word in AnyWord("square", "parallel")
        from right in After("to", Ref)
        select Figures(word.Text == "square" ? FigureRelation.SquareTo : FigureRelation.ParallelTo, right);

    private static readonly Parser<Tested> TouchesOrMeets =
        from word in AnyWord("touches", "meets")
        from right in Ref
        select Figures(word.Text == "touches" ? FigureRelation.Touches : FigureRelation.Meets, right);

    private static readonly Parser<SharedRelation> OnOne =
        from word in After("on", Word("one"))
        from shape in AnyWord("line", "circle")
        select shape.Text == "line" ? SharedRelation.OnOneLine : SharedRelation.OnOneCircle;

    private static readonly Parser<SharedRelation> ThroughOne =
        After("through", After("one", Word("point"))).Select(_ => SharedRelation.ThroughOnePoint);

    // , B, C on one line
    private static readonly Parser<Tested> Shared =
        from second in Then(Sign(","), Ref)
        from others in Then(Sign(","), Listed(Ref, Sign(",")))
        from relation in OnOne.XOr(ThroughOne)
        select new Tested((stream, negated, left) => new SharedTest(negated, [AsReference(stream, left, "a list of figures"), second, .. others], relation, default));

    private static readonly Parser<Test> Test = input =>
    {
        IResult<(bool Negated, Expression Left, Tested Make)> result = Shape!(input);
        return result.WasSuccessful
            ? Reading<Test>.Of(result.Value.Make(((TokenInput)input).Stream, result.Value.Negated, result.Value.Left) with { Span = SpanOf(input, result.Remainder) }, result.Remainder)
            : Reading<Test>.Failed(result.Remainder);
    };

    private static readonly Parser<(bool Negated, Expression Left, Tested Make)> Shape =
        from not in Maybe(Word("not"))
        from left in Value
        from make in Shared.XOr(Compared).XOr(OnFigure).XOr(SquareOrParallel).XOr(TouchesOrMeets)
        select (not is not null, left, make);

    private static readonly Parser<(Token Joint, Test Test)> Joined =
        from joint in AnyWord("and", "or")
        from test in Test
        select (joint, test);

    /// <summary>condition = test { "and" test } | test { "or" test }</summary>
    public static readonly Parser<Condition> Condition = input =>
    {
        IResult<(Test First, ImmutableArray<(Token Joint, Test Test)> More)> result = Conditions!(input);
        if (!result.WasSuccessful)
            return Reading<Condition>.Failed(result.Remainder);
        (Test first, ImmutableArray<(Token Joint, Test Test)> rest) = result.Value;
        if (rest.FirstOrDefault(next => next.Joint.Text != rest[0].Joint.Text) is { Joint: { } mixed })
            ((TokenInput)input).Stream.Findings.Add(LanguageFindings.AndWithOr(mixed.Span));
        bool byOr = rest.Length > 0 && rest[0].Joint.Text == "or";
        return Reading<Condition>.Of(new Condition([first, .. rest.Select(next => next.Test)], byOr, SpanOf(input, result.Remainder)), result.Remainder);
    };

    private static readonly Parser<(Test First, ImmutableArray<(Token Joint, Test Test)> More)> Conditions =
        from first in Test
        from rest in Repeated(Joined)
        select (first, rest);

    /// <summary>claim six square to noon</summary>
    public static readonly Parser<Sentence> Claim = After("claim", Condition).Select(condition => (Sentence)new ClaimSentence(condition, default));

    // Comparisons

    private sealed record Clause(Token Word, TextLiteral? Label = null, Name? TimedBy = null, Expression? Within = null, bool Minutes = false);

    private static readonly Parser<Clause> Labelled =
        from word in Word("as")
        from text in Text
        select new Clause(word, Label: text);

    private static readonly Parser<Clause> Timed =
        from word in Word("timed")
        from name in After("by", NameRule)
        select new Clause(word, TimedBy: name);

    private static readonly Parser<Clause> Within =
        from word in Word("within")
        from tolerance in Value
        from minutes in Maybe(Word("minutes"))
        select new Clause(word, Within: tolerance, Minutes: minutes is not null);

    private static readonly Parser<ImmutableArray<Clause>> Clauses = Repeated(Labelled.XOr(Timed).XOr(Within)).Checked(CheckClauses);

    private static readonly Parser<Node> PlaceOrExpression = input =>
        IsPlaceAhead((TokenInput)input) ? PlaceRule.Select(place => (Node)place)(input) : Value.Select(value => (Node)value)(input);

    /// <summary>compare X with Y as "…" timed by h within 1'</summary>
    public static readonly Parser<Sentence> Compare =
        from constructed in After("compare", Value)
        from computed in After("with", PlaceOrExpression)
        from clauses in Clauses
        select (Sentence)new CompareSentence(
            constructed,
            computed as Expression,
            computed as Place,
            clauses.FirstOrDefault(clause => clause.Label is not null)?.Label,
            clauses.FirstOrDefault(clause => clause.TimedBy is not null)?.TimedBy,
            clauses.FirstOrDefault(clause => clause.Within is not null)?.Within,
            clauses.FirstOrDefault(clause => clause.Within is not null)?.Minutes ?? false,
            default);

    private static Tested Figures(FigureRelation relation, Reference right) =>
        (stream, negated, left) => new FigureTest(negated, AsReference(stream, left, "this test"), relation, right, default);

    private static void CheckClauses(TokenStream stream, ImmutableArray<Clause> clauses)
    {
        for (int i = 1; i < clauses.Length; i++)
        {
            if (clauses.Take(i).Any(before => before.Word.Text == clauses[i].Word.Text))
                stream.Findings.Add(LanguageFindings.SaidTwice(clauses[i].Word.Text, clauses[i].Word.Span));
        }
    }

    // A place and a bracket part at the comma.
    private static bool IsPlaceAhead(TokenInput input)
    {
        TokenStream stream = input.Stream;
        if (!input.Token.IsSign("("))
            return false;
        int depth = 0;
        for (int at = input.Position; at < stream.Count; at++)
        {
            Token token = stream[at];
            if (token.Kind != TokenKind.Sign)
                continue;
            if (token.Text is "(" or "[")
                depth++;
            else if (token.Text is ")" or "]" && --depth == 0)
                return false;
            else if (token.Text == "," && depth == 1)
                return true;
        }

        return false;
    }
}
