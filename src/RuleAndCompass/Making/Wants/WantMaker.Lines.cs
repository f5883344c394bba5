using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making.Wants;

/// <content>Lines, and the way each runs.</content>
internal sealed partial class WantMaker
{
    private void Make(RuleThrough want)
    {
        PointValue first = evaluator.Point(want.First), second = evaluator.Point(want.Second);
        Apart(first, want.First, second, want.Second);
        Bind(want.Line, constructions.Through(first.Mark, second.Mark, evaluator.NameOf(want.Line)), first.Point);
    }

    private void Make(RuleToward want)
    {
        PointValue through = evaluator.Point(want.Through);
        string name = evaluator.NameOf(want.Line);
        if (want.Toward is TowardDirection toward && evaluator.Evaluate(toward.Value) is PointValue aim)
        {
            Apart(through, want.Through, aim, (Reference)toward.Value); // only a reference gives a point
            Bind(want.Line, constructions.Through(through.Mark, aim.Mark, name), through.Point);
            return;
        }

        Bind(want.Line, constructions.Toward(through.Mark, AngleOf(want.Toward, through, want.Through), name, want.By), through.Point);
    }

    private void Make(RuleSquare want)
    {
        PointValue through = evaluator.Point(want.Through);
        Bind(want.Line, constructions.Square(Directed(evaluator.Line(want.To)), through.Mark, evaluator.NameOf(want.Line), want.By), through.Point);
    }

    private void Make(RuleParallel want)
    {
        PointValue through = evaluator.Point(want.Through);
        Bind(want.Line, constructions.Parallel(Directed(evaluator.Line(want.To)), through.Mark, evaluator.NameOf(want.Line), want.By), through.Point);
    }

    private void Make(RuleBack want)
    {
        PointValue through = evaluator.Point(want.Through);
        Bind(want.Line, constructions.Parallel(Directed(evaluator.Line(want.Along)).Reversed(), through.Mark, evaluator.NameOf(want.Line), want.By), through.Point);
    }

    private void Make(RuleTurned want)
    {
        PointValue through = evaluator.Point(want.Through);
        Angle by = Signed(evaluator.AngleOf(want.Angle), want.Way);
        Bind(want.Line, constructions.Turned(Directed(evaluator.Line(want.From)), through.Mark, by, evaluator.NameOf(want.Line), want.By), through.Point);
    }

    private void Make(RuleHalving want)
    {
        PointValue from = evaluator.Point(want.From), to = evaluator.Point(want.To);
        Apart(from, want.From, to, want.To);
        DirectedLine line = constructions.Halving(from.Mark, to.Mark, evaluator.NameOf(want.Line));
        Bind(want.Line, line, new Point((from.Point.X + to.Point.X) / 2, (from.Point.Y + to.Point.Y) / 2, [line.Mark.Line]));
    }

    private void Make(RuleHalvingAngle want)
    {
        PointValue first = evaluator.Point(want.First), corner = evaluator.Point(want.Corner), second = evaluator.Point(want.Second);
        Apart(first, want.First, corner, want.Corner);
        Apart(corner, want.Corner, second, want.Second);
        Vector a = first.Point.From(corner.Point), b = second.Point.From(corner.Point);
        if (ReferenceEquals(first.Mark, second.Mark) || Decider.IsZero(Vector.Cross(a, b)))
        {
            if (Decider.Sign(Vector.Dot(a, b)) < 0)
                throw new FaultException(MakingFindings.Degenerate("the angle is half a turn, so it has two halves", want.Span, $"rule a line through `{want.Corner}` square to the side"));
            Bind(want.Line, constructions.Through(corner.Mark, first.Mark, evaluator.NameOf(want.Line)), corner.Point);
            return;
        }

        Bind(want.Line, constructions.HalvingAngle(first.Mark, corner.Mark, second.Mark, evaluator.NameOf(want.Line)), corner.Point);
    }

    private void Make(RuleTouchingAt want)
    {
        CircleValue circle = evaluator.Circle(want.Circle);
        PointValue at = evaluator.Point(want.At);
        On(at, want.At, circle.Mark.Circle, want.Circle);
        DirectedLine spoke = constructions.Through(CentreOf(circle), at.Mark, null);
        Bind(want.Line, constructions.Square(spoke, at.Mark, evaluator.NameOf(want.Line), want.By), at.Point);
    }

    private void Make(RuleTouchingFrom want)
    {
        CircleValue circle = evaluator.Circle(want.Circle);
        PointValue from = evaluator.Point(want.From);
        int side = Decider.Sign(circle.Mark.Circle.PowerOf(from.Point));
        if (side < 0)
            throw new FaultException(MakingFindings.Degenerate($"`{want.From}` lies inside `{want.Circle}`, so no line through it touches the circle", MeetingIn(want), "name a point outside the circle"));
        if (side == 0)
            throw new FaultException(MakingFindings.Degenerate($"`{want.From}` lies on `{want.Circle}`, where the line would touch", MeetingIn(want), $"write `rule {want.Line} touching {want.Circle} at {want.From}`"));
        // The half circle on the way to the centre meets the circle where the square angles stand (Euclid III.31).
        PointMark middle = constructions.Midway(CentreOf(circle), from.Mark, null);
        CircleMark half = bench.Swing(middle, new SpanOpening(middle, from.Mark), null, CentreOf(circle));
        Crossing crossing = Crossing.Of(circle.Mark.Circle, half.Circle, Decider);
        PointMark touch = Pick(circle.Mark, half, crossing, want.Choice, want.Circle.ToString()!, want.From.ToString()!, want, null);
        Bind(want.Line, constructions.Through(from.Mark, touch, evaluator.NameOf(want.Line)), from.Point);
    }

    private void Make(RuleTouchingBoth want)
    {
        CircleValue first = evaluator.Circle(want.First), second = evaluator.Circle(want.Second);
        DirectedLine line = TouchingBoth(want, first, second, out PointMark touch);
        Bind(want.Line, line, touch.Point);
    }

    // The centre's mark: every circle is struck about one.
    private PointMark CentreOf(CircleValue circle) => bench.Marks.Find(circle.Mark.Circle.Centre)
        ?? throw new System.Diagnostics.UnreachableException("A circle without a centre on the stock.");
}
