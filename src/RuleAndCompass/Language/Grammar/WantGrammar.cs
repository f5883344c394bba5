using RuleAndCompass.Language.Syntax;
using Sprache;
using static RuleAndCompass.Language.Grammar.ExpressionGrammar;
using static RuleAndCompass.Language.Grammar.Rules;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Points, lines and circles. What is bound is read first; each rule after it makes the sentence from it.</summary>
internal static class WantGrammar
{
    // by dividers
    private static readonly Parser<ByTool?> Tools = MaybeValue(After(
        "by",
        from tool in AnyWord("dividers", "square", "protractor", "scale")
        select tool.Text switch
        {
            "dividers" => ByTool.Dividers,
            "square" => ByTool.Square,
            "protractor" => ByTool.Protractor,
            _ => ByTool.Scale,
        }));

    // Choices

    // nearest P, above P, inside c
    private static readonly Parser<Choice> ChoiceOfOne =
        from word in AnyWord("nearest", "above", "below", "behind", "inside", "outside")
        from figure in Ref
        select new Choice(
            word.Text switch
            {
                "nearest" => ChoiceKind.Nearest,
                "above" => ChoiceKind.Above,
                "below" => ChoiceKind.Below,
                "behind" => ChoiceKind.Behind,
                "inside" => ChoiceKind.Inside,
                _ => ChoiceKind.Outside,
            },
            figure,
            null,
            default);

    private static readonly Parser<Choice> Farthest =
        from word in Word("farthest")
        from figure in After("from", Ref)
        select new Choice(ChoiceKind.FarthestFrom, figure, null, default);

    private static readonly Parser<Choice> Other =
        from word in Word("other")
        from figure in After("than", Ref)
        select new Choice(ChoiceKind.OtherThan, figure, null, default);

    private static readonly Parser<Choice> Ahead =
        from word in Word("ahead")
        from figure in After("of", Ref)
        select new Choice(ChoiceKind.AheadOf, figure, null, default);

    // left of P, right along l
    private static readonly Parser<Choice> Aside =
        from word in AnyWord("left", "right")
        from relation in AnyWord("of", "along")
        from figure in Ref
        select new Choice(
            (word.Text, relation.Text) switch
            {
                ("left", "of") => ChoiceKind.LeftOf,
                ("right", "of") => ChoiceKind.RightOf,
                ("left", _) => ChoiceKind.LeftAlong,
                _ => ChoiceKind.RightAlong,
            },
            figure,
            null,
            default);

    private static readonly Parser<Choice> SameSide =
        from word in Word("same")
        from line in After("side", After("of", Ref))
        from point in After("as", Ref)
        select new Choice(ChoiceKind.SameSide, line, point, default);

    private static readonly Parser<Choice> Across =
        from word in Word("across")
        from line in Ref
        from point in After("from", Ref)
        select new Choice(ChoiceKind.Across, line, point, default);

    private static readonly Parser<Choice> Choice =
        ChoiceOfOne.XOr(Farthest).XOr(Other).XOr(Ahead).XOr(Aside).XOr(SameSide).XOr(Across).Spanned();

    // Points

    // at (X, Y) from A
    private static readonly Parser<Func<Bound, Sentence>> AtPlace =
        from place in PlaceRule
        from tool in Tools
        select Made(point => new PrickAt(point, place, tool, default));

    // at foot of A on l
    private static readonly Parser<Func<Bound, Sentence>> AtFoot =
        from word in Word("foot")
        from start in After("of", Ref)
        from line in After("on", Ref)
        from tool in Tools
        select Made(point => new PrickFoot(point, start, line, tool, default));

    // at centre of c
    private static readonly Parser<Func<Bound, Sentence>> AtCentre =
        from word in Word("centre")
        from circle in After("of", Ref)
        from tool in Tools
        select Made(point => new PrickCentre(point, circle, tool, default));

    private static readonly Parser<Func<Bound, Sentence>> At = After("at", AtPlace.XOr(AtFoot).XOr(AtCentre));

    // midway A to B
    private static readonly Parser<Func<Bound, Sentence>> Midway =
        from start in After("midway", Ref)
        from end in After("to", Ref)
        from tool in Tools
        select Made(point => new PrickMidway(point, start, end, tool, default));

    // opposite A across l, opposite A about O
    private static readonly Parser<Func<Bound, Sentence>> Opposite =
        from of in After("opposite", Ref)
        from relation in AnyWord("across", "about")
        from mirror in Ref
        from tool in Tools
        select Made(point => relation.Text == "across" ? new PrickAcross(point, of, mirror, tool, default) : new PrickAbout(point, of, mirror, tool, default));

    private static readonly Parser<(Reference First, Reference Second)> Crossing =
        from first in After("where", Ref)
        from second in After("meets", Ref)
        select (first, second);

    // where A meets B, above C
    private static readonly Parser<Func<Bound, Sentence>> Where =
        from crossing in Crossing
        from choice in Maybe(Then(Sign(","), Choice))
        select Made(point => new PrickWhere(point, crossing.First, crossing.Second, choice, default));

    // , Q where A meets B
    private static readonly Parser<Func<Bound, Sentence>> Both =
        from other in Then(Sign(","), BoundRule)
        from crossing in Crossing
        select Made(point => new PrickBoth(point, other, crossing.First, crossing.Second, default));

    private delegate Sentence OnCurve(Bound point, Reference curve);

    // from A toward B, after the length
    private static readonly Parser<Func<Expression, OnCurve>> LaidToward =
        from start in After("from", Ref)
        from toward in After("toward", DirectionRule)
        from tool in Tools
        select new Func<Expression, OnCurve>(length => (point, line) => new PrickOnToward(point, line, length, start, toward, tool, default));

    private static readonly Parser<Func<Expression, OnCurve>> LaidAhead =
        from start in After("ahead", After("of", Ref))
        from tool in Tools
        select new Func<Expression, OnCurve>(length => (point, line) => new PrickOnAhead(point, line, length, true, start, tool, default));

    private static readonly Parser<Func<Expression, OnCurve>> LaidBehind =
        from start in After("behind", Ref)
        from tool in Tools
        select new Func<Expression, OnCurve>(length => (point, line) => new PrickOnAhead(point, line, length, false, start, tool, default));

    // , 30 mm from A toward B; , 30 mm ahead of A
    private static readonly Parser<OnCurve> OnLine =
        from length in Then(Sign(","), Length)
        from laid in LaidToward.XOr(LaidAhead).XOr(LaidBehind)
        select laid(length);

    // toward up
    private static readonly Parser<OnCurve> OnToward =
        from toward in After("toward", DirectionRule)
        from tool in Tools
        select new OnCurve((point, circle) => new PrickOnCircle(point, circle, toward, tool, default));

    // turned 30° from A clockwise
    private static readonly Parser<OnCurve> OnTurned =
        from angle in After("turned", AngleValue)
        from start in After("from", Ref)
        from way in WayRule
        from tool in Tools
        select new OnCurve((point, circle) => new PrickTurned(point, circle, angle, start, way, tool, default));

    private static readonly Parser<Func<Bound, Sentence>> On =
        from curve in After("on", Ref)
        from make in OnLine.XOr(OnToward).XOr(OnTurned)
        select Made(point => make(point, curve));

    private static readonly Parser<Func<Bound, Sentence>> OnePoint = Where.XOr(Both).XOr(At).XOr(Midway).XOr(Opposite).XOr(On);

    // dividing A to B
    private static readonly Parser<Func<Many, Sentence>> Dividing =
        from start in After("dividing", Ref)
        from end in After("to", Ref)
        from tool in Tools
        select MadeMany(points => new PrickDividing(points, start, end, tool, default));

    // round O from A anticlockwise
    private static readonly Parser<Func<Many, Sentence>> Round =
        from centre in After("round", Ref)
        from start in After("from", Ref)
        from way in WayRule
        from tool in Tools
        select MadeMany(points => new PrickRound(points, centre, start, way, tool, default));

    private static readonly Parser<Func<OpeningSpan, Func<Many, Sentence>>> SteppingAlong =
        from line in After("along", Ref)
        from start in After("from", Ref)
        from toward in After("toward", DirectionRule)
        from tool in Tools
        select new Func<OpeningSpan, Func<Many, Sentence>>(span => points => new PrickSteppingAlong(points, span, line, start, toward, tool, default));

    private static readonly Parser<Func<OpeningSpan, Func<Many, Sentence>>> SteppingRound =
        from circle in After("round", Ref)
        from start in After("from", Ref)
        from way in WayRule
        from tool in Tools
        select new Func<OpeningSpan, Func<Many, Sentence>>(span => points => new PrickSteppingRound(points, span, circle, start, way, tool, default));

    // stepping A to B along l from C toward D; stepping 10 mm round c from C clockwise
    private static readonly Parser<Func<Many, Sentence>> Stepping =
        from span in After("stepping", Opening)
        from make in SteppingAlong.XOr(SteppingRound)
        select make(span);

    private static readonly Parser<Func<Many, Sentence>> ManyPoints = Dividing.XOr(Round).XOr(Stepping);

    private static readonly Parser<(Expression To, Expression? Step)> RangeEnd =
        from end in After("to", Value)
        from step in Maybe(After("step", Value))
        select (end, step);

    private static readonly Parser<Node> InIndex =
        from open in Sign("[")
        from first in Value
        from range in MaybeValue(RangeEnd)
        from others in Repeated(range is null ? Then(Sign(","), Value) : Nothing)
        from close in Sign("]")
        select range is { } ends
            ? new Many(NoName, first, ends.To, ends.Step, default)
            : (Node)new Bound(NoName, [first, .. others], default);

    // P, P[3], P[0 to 7]: one point or many are told apart after the first index
    private static readonly Parser<Node> Head = (
        from name in NameRule
        from index in Maybe(InIndex)
        select index switch
        {
            Many many => many with { Name = name },
            Bound bound => bound with { Name = name },
            _ => (Node)new Bound(name, [], default),
        }).Spanned();

    /// <summary>"prick" point</summary>
    public static readonly Parser<Sentence> Prick =
        from word in Word("prick")
        from head in Head
        from sentence in head is Many ? Finished((Many)head, ManyPoints) : Finished((Bound)head, OnePoint)
        select sentence;

    // Lines

    private static readonly Parser<Func<Bound, Reference, Sentence>> ThroughTwo =
        from second in Then(Sign(","), Ref)
        from tool in Tools
        select Through((line, first) => new RuleThrough(line, first, second, tool, default));

    private static readonly Parser<Func<Bound, Reference, Sentence>> ThroughToward =
        from toward in After("toward", DirectionRule)
        from tool in Tools
        select Through((line, first) => new RuleToward(line, first, toward, tool, default));

    private static readonly Parser<Func<Bound, Reference, Sentence>> ThroughSquare =
        from relation in AnyWord("square", "parallel")
        from other in After("to", Ref)
        from tool in Tools
        select Through((line, first) => relation.Text == "square" ? new RuleSquare(line, first, other, tool, default) : new RuleParallel(line, first, other, tool, default));

    private static readonly Parser<Func<Bound, Reference, Sentence>> ThroughBack =
        from word in Word("back")
        from other in After("along", Ref)
        from tool in Tools
        select Through((line, first) => new RuleBack(line, first, other, tool, default));

    private static readonly Parser<Func<Bound, Reference, Sentence>> ThroughTurned =
        from angle in After("turned", AngleValue)
        from other in After("from", Ref)
        from way in WayRule
        from tool in Tools
        select Through((line, first) => new RuleTurned(line, first, angle, other, way, tool, default));

    // through A, B; through A toward up; through A square to m; through A turned 15° from m clockwise
    private static readonly Parser<Func<Bound, Sentence>> LineThrough =
        from first in After("through", Ref)
        from make in ThroughTwo.XOr(ThroughToward).XOr(ThroughSquare).XOr(ThroughBack).XOr(ThroughTurned)
        select Made(line => make(line, first));

    // halving angle A O B
    private static readonly Parser<Func<Bound, Sentence>> HalvingAngle =
        from first in After("angle", Ref)
        from corner in Ref
        from second in Ref
        from tool in Tools
        select Made(line => new RuleHalvingAngle(line, first, corner, second, tool, default));

    // halving A to B
    private static readonly Parser<Func<Bound, Sentence>> HalvingSpan =
        from start in Ref
        from end in After("to", Ref)
        from tool in Tools
        select Made(line => new RuleHalving(line, start, end, tool, default));

    private static readonly Parser<Func<Bound, Sentence>> Halving = After("halving", HalvingAngle.XOr(HalvingSpan));

    private static readonly Parser<Func<Bound, Reference, Sentence>> TouchingAt =
        from point in After("at", Ref)
        from tool in Tools
        select Through((line, circle) => new RuleTouchingAt(line, circle, point, tool, default));

    private static readonly Parser<Func<Bound, Reference, Sentence>> TouchingFrom =
        from start in After("from", Ref)
        from choice in Then(Sign(","), Choice)
        from tool in Tools
        select Through((line, circle) => new RuleTouchingFrom(line, circle, start, choice, tool, default));

    private static readonly Parser<Func<Bound, Reference, Sentence>> TouchingBoth =
        from second in Then(Sign(","), Ref)
        from manner in AnyWord("open", "crossed")
        from choice in Then(Sign(","), Choice)
        from tool in Tools
        select Through((line, circle) => new RuleTouchingBoth(line, circle, second, manner.Text == "crossed", choice, tool, default));

    // touching c at P; touching c from P, above Q; touching c, d crossed, above Q
    private static readonly Parser<Func<Bound, Sentence>> Touching =
        from circle in After("touching", Ref)
        from make in TouchingAt.XOr(TouchingFrom).XOr(TouchingBoth)
        select Made(line => make(line, circle));

    /// <summary>"rule" line</summary>
    public static readonly Parser<Sentence> Rule =
        from line in After("rule", BoundRule)
        from make in LineThrough.XOr(Halving).XOr(Touching)
        select make(line);

    // Circles

    // through A, B, C
    private static readonly Parser<Func<Bound, Sentence>> ThroughThree =
        from first in After("through", Ref)
        from second in Then(Sign(","), Ref)
        from third in Then(Sign(","), Ref)
        from tool in Tools
        select Made(circle => new StrikeThroughThree(circle, first, second, third, tool, default));

    private static readonly Parser<Func<Bound, Reference, Sentence>> AboutThrough =
        from point in After("through", Ref)
        from tool in Tools
        select Through((circle, centre) => new StrikeThrough(circle, centre, point, tool, default));

    private static readonly Parser<Func<Bound, Reference, Sentence>> AboutOpening =
        from span in After("opening", Opening)
        from tool in Tools
        select Through((circle, centre) => new StrikeOpening(circle, centre, span, tool, default));

    private static readonly Parser<Func<Bound, Reference, Sentence>> AboutTouching =
        from line in After("touching", Ref)
        from tool in Tools
        select Through((circle, centre) => new StrikeTouching(circle, centre, line, tool, default));

    // about O through A; about O opening 30 mm; about O touching l
    private static readonly Parser<Func<Bound, Sentence>> About =
        from centre in After("about", Ref)
        from make in AboutThrough.XOr(AboutOpening).XOr(AboutTouching)
        select Made(circle => make(circle, centre));

    /// <summary>"strike" circle</summary>
    public static readonly Parser<Sentence> Strike =
        from circle in After("strike", BoundRule)
        from make in About.XOr(ThroughThree)
        select make(circle);

    private static Name NoName => new("", default);

    private static Parser<Expression> Nothing => input => Reading<Expression>.Failed(input);

    private static Parser<Sentence> Finished<T>(T head, Parser<Func<T, Sentence>> rest) => rest.Select(make => make(head));

    private static Func<Bound, Sentence> Made(Func<Bound, Sentence> make) => make;

    private static Func<Many, Sentence> MadeMany(Func<Many, Sentence> make) => make;

    private static Func<Bound, Reference, Sentence> Through(Func<Bound, Reference, Sentence> make) => make;
}
