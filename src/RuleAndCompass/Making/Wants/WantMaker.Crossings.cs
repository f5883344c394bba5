using System.Diagnostics;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making.Wants;

/// <content>Crossings, and the choice of one.</content>
internal sealed partial class WantMaker
{
    private void Make(PrickWhere want)
    {
        (CurveMark first, LineValue? firstLine) = CurveIn(want.First);
        (CurveMark second, LineValue? secondLine) = CurveIn(want.Second);
        Crossing crossing = Crossing.Of(first.Curve, second.Curve, Decider);
        PointMark mark = Pick(first, second, crossing, want.Choice, want.First.ToString()!, want.Second.ToString()!, want, evaluator.NameOf(want.Point), firstLine ?? secondLine);
        Bind(want.Point, mark);
    }

    private void Make(PrickBoth want)
    {
        (CurveMark first, LineValue? firstLine) = CurveIn(want.First);
        (CurveMark second, LineValue? secondLine) = CurveIn(want.Second);
        Crossing crossing = Crossing.Of(first.Curve, second.Curve, Decider);
        MustMeet(first, second, crossing, want.First.ToString()!, want.Second.ToString()!, MeetingIn(want));
        if (crossing.Points.Length < 2)
            throw new FaultException(MakingFindings.Degenerate($"`{want.First}` and `{want.Second}` meet in one point only", MeetingIn(want), $"prick one point: `prick {want.Point} where {want.First} meets {want.Second}`"));
        bool against = (firstLine ?? secondLine)?.Directed.IsReversed == true;
        for (int place = 0; place < 2; place++)
        {
            int which = against ? 1 - place : place;
            Bound bound = place == 0 ? want.Point : want.Other;
            Bind(bound, bench.Cross(first, second, crossing.Points[which], which, evaluator.NameOf(bound), place == 0 ? ", the first of the two" : ", the other"));
        }
    }

    private (CurveMark Mark, LineValue? Line) CurveIn(Reference reference) => evaluator.Resolve(reference) switch
    {
        CurveValue curve => (curve.CurveMark, curve as LineValue),
        Value other => throw new FaultException(MakingFindings.WrongKind(reference.ToString()!, other.KindWithArticle, "a line or a circle", reference.Span, other is FamilyValue ? $"say which one: `{reference}[…]`" : null)),
    };

    private PointMark Pick(CurveMark first, CurveMark second, Crossing crossing, Choice? choice, string firstName, string secondName, WantSentence want, string? name, LineValue? met = null)
    {
        MustMeet(first, second, crossing, firstName, secondName, MeetingIn(want));
        SourceSpan at = choice?.Span ?? MeetingIn(want);
        if (crossing.Points.Length == 1)
        {
            if (choice is not null && !Chosen(choice, crossing.Points[0], null, met))
                throw new FaultException(MakingFindings.OnlyCrossingFailsChoice(choice.ToString()!, $"it lies at {Place(crossing.Points[0])}", at));
            return bench.Cross(first, second, crossing.Points[0], 0, name);
        }

        string candidates = $"they are at {Place(crossing.Points[0])} and {Place(crossing.Points[1])}";
        if (choice is null)
            throw new FaultException(MakingFindings.NeedsChoice(firstName, secondName, candidates, at));
        (bool one, bool other) = Decider.Recording(() =>
            (Chosen(choice, crossing.Points[0], crossing.Points[1], met), Chosen(choice, crossing.Points[1], crossing.Points[0], met)));
        if (one == other)
            throw new FaultException(one ? MakingFindings.ChoicePicksBoth(choice.ToString()!, candidates, at) : MakingFindings.ChoicePicksNeither(choice.ToString()!, candidates, at));
        int which = one ? 0 : 1;
        return bench.Cross(first, second, crossing.Points[which], which, name, Said(choice, met));
    }

    // The choice as it is said at the bench, with the names that stand on the stock.
    private string Said(Choice choice, LineValue? met)
    {
        // A line may run against the act that made it, which is what the bench sees.
        bool against = choice.Kind switch
        {
            ChoiceKind.LeftAlong or ChoiceKind.RightAlong => evaluator.Line(choice.Of).Directed.IsReversed,
            ChoiceKind.AheadOf or ChoiceKind.Behind => met?.Directed.IsReversed == true,
            _ => false,
        };
        string of = choice.Kind switch
        {
            ChoiceKind.LeftAlong or ChoiceKind.RightAlong or ChoiceKind.SameSide or ChoiceKind.Across => evaluator.Line(choice.Of).Directed.Mark.Name,
            ChoiceKind.Inside or ChoiceKind.Outside => evaluator.Circle(choice.Of).Mark.Name,
            _ => evaluator.Point(choice.Of).Mark.Name,
        };
        string from = choice.From is null ? "" : evaluator.Point(choice.From).Mark.Name;
        return choice.Kind switch
        {
            ChoiceKind.Nearest => $", the one nearest {of}",
            ChoiceKind.FarthestFrom => $", the one farthest from {of}",
            ChoiceKind.OtherThan => $", not at {of} but at the other",
            ChoiceKind.Above => $", above {of}",
            ChoiceKind.Below => $", below {of}",
            ChoiceKind.LeftOf => $", left of {of}",
            ChoiceKind.RightOf => $", right of {of}",
            ChoiceKind.LeftAlong or ChoiceKind.RightAlong => $", on the {((choice.Kind == ChoiceKind.LeftAlong) != against ? "left" : "right")} as {of} runs",
            ChoiceKind.AheadOf or ChoiceKind.Behind => $", {((choice.Kind == ChoiceKind.AheadOf) != against ? "ahead of" : "behind")} {of}",
            ChoiceKind.SameSide => $", on the same side of {of} as {from}",
            ChoiceKind.Across => $", across {of} from {from}",
            ChoiceKind.Inside => $", inside {of}",
            ChoiceKind.Outside => $", outside {of}",
            _ => throw new UnreachableException($"No words for {choice.Kind}."),
        };
    }

    // `a meets b`, or what of the sentence says so.
    private static SourceSpan MeetingIn(WantSentence want) => want switch
    {
        PrickWhere where => where.First.Span.To(where.Second.Span),
        PrickBoth both => both.First.Span.To(both.Second.Span),
        RuleTouchingFrom touching => touching.Circle.Span.To(touching.From.Span),
        RuleTouchingBoth touching => touching.First.Span.To(touching.Second.Span),
        _ => want.Span,
    };

    private void MustMeet(CurveMark first, CurveMark second, Crossing crossing, string firstName, string secondName, SourceSpan span)
    {
        if (crossing.Meeting == Meeting.Same)
            throw new FaultException(MakingFindings.SameCurve(firstName, secondName, span));
        if (crossing.Meeting != Meeting.Apart)
            return;
        throw new FaultException((first, second) switch
        {
            (LineMark a, LineMark b) => MakingFindings.LinesParallel(firstName, secondName, $"they run {Figure(a.Line.SideOf(b.Line.Start) / a.Line.DirectionLength)} mm apart", span),
            (LineMark line, CircleMark circle) => Misses(line, circle, firstName, secondName, span),
            (CircleMark circle, LineMark line) => Misses(line, circle, secondName, firstName, span),
            (CircleMark a, CircleMark b) => MakingFindings.CirclesApart(firstName, secondName, GapOf(a, b), span),
            _ => throw new UnreachableException(),
        });
    }

    private Diagnostic Misses(LineMark line, CircleMark circle, string lineName, string circleName, SourceSpan span)
    {
        double offset = Math.Abs((line.Line.SideOf(circle.Circle.Centre) / line.Line.DirectionLength).ToDouble()), radius = circle.Circle.Radius.ToDouble();
        return MakingFindings.LineMissesCircle(lineName, circleName,
            $"the line passes {Figure(offset)} mm from the centre, and the radius is {Figure(radius)} mm: they are {Figure(offset - radius)} mm apart (acts {ActOf(line)} and {ActOf(circle)})", span);
    }

    private string GapOf(CircleMark a, CircleMark b)
    {
        double between = a.Circle.Centre.DistanceTo(b.Circle.Centre).ToDouble(), r = a.Circle.Radius.ToDouble(), s = b.Circle.Radius.ToDouble();
        return between > r + s
            ? $"enlarge one circle; the centres are {Figure(between)} mm apart and the radii add up to {Figure(r + s)} mm: {Figure(between - r - s)} mm too little (acts {ActOf(a)} and {ActOf(b)})"
            : $"one lies within the other; the centres are {Figure(between)} mm apart and the radii differ by {Figure(Math.Abs(r - s))} mm (acts {ActOf(a)} and {ActOf(b)})";
    }

    private int ActOf(Mark mark) => bench.Acts.First(act => ReferenceEquals(act.Makes, mark)).Number;

    private bool Chosen(Choice choice, Point here, Point? other, LineValue? met)
    {
        switch (choice.Kind)
        {
            case ChoiceKind.Nearest or ChoiceKind.FarthestFrom:
                Point from = evaluator.Point(choice.Of).Point;
                if (other is null)
                    return true;
                // Equal squared distances pick neither.
                int nearer = Decider.Sign(other.SquaredDistanceTo(from) - here.SquaredDistanceTo(from));
                return choice.Kind == ChoiceKind.Nearest ? nearer > 0 : nearer < 0;
            case ChoiceKind.OtherThan:
                return !bench.Marks.IsSame(evaluator.Point(choice.Of).Point, here);
            case ChoiceKind.Above:
                return Decider.Sign(here.Y - evaluator.Point(choice.Of).Point.Y) > 0;
            case ChoiceKind.Below:
                return Decider.Sign(here.Y - evaluator.Point(choice.Of).Point.Y) < 0;
            case ChoiceKind.LeftOf:
                return Decider.Sign(here.X - evaluator.Point(choice.Of).Point.X) < 0;
            case ChoiceKind.RightOf:
                return Decider.Sign(here.X - evaluator.Point(choice.Of).Point.X) > 0;
            case ChoiceKind.LeftAlong:
                return Side(evaluator.Line(choice.Of), here) > 0;
            case ChoiceKind.RightAlong:
                return Side(evaluator.Line(choice.Of), here) < 0;
            case ChoiceKind.AheadOf or ChoiceKind.Behind:
                if (met is null)
                    throw new FaultException(MakingFindings.Degenerate($"`{choice}` looks along a line, and two circles meet here", choice.Span, "use `left along`, `nearest` or another choice"));
                int along = Decider.Sign(Vector.Dot(met.Direction, here.From(evaluator.Point(choice.Of).Point)));
                return choice.Kind == ChoiceKind.AheadOf ? along > 0 : along < 0;
            case ChoiceKind.SameSide or ChoiceKind.Across:
                LineValue line = evaluator.Line(choice.Of);
                int mine = Side(line, here), theirs = Side(line, evaluator.Point(choice.From!).Point); // the grammar gives a point with these two
                return mine != 0 && theirs != 0 && (mine == theirs) == (choice.Kind == ChoiceKind.SameSide);
            case ChoiceKind.Inside:
                return Decider.Sign(evaluator.Circle(choice.Of).Mark.Circle.PowerOf(here)) < 0;
            case ChoiceKind.Outside:
                return Decider.Sign(evaluator.Circle(choice.Of).Mark.Circle.PowerOf(here)) > 0;
            default:
                throw new UnreachableException($"No choice {choice.Kind}.");
        }
    }

    private int Side(LineValue line, Point point)
    {
        int side = line.Directed.Mark.Line.IsKnownToHold(point) ? 0 : Decider.Sign(line.Directed.Mark.Line.SideOf(point));
        return line.Directed.IsReversed ? -side : side;
    }

    private static string Place(Point point) => $"({ValueText.Decimals(point.X.Near(), 3)}, {ValueText.Decimals(point.Y.Near(), 3)}) mm";

    private static string Figure(Real value) => Figure(Math.Abs(value.ToDouble()));

    private static string Figure(double value) => ValueText.Decimals(value, 4);
}
