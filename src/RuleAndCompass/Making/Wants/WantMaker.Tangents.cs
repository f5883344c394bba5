using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making.Wants;

/// <content>A line touching two circles.</content>
internal sealed partial class WantMaker
{
    // Through the point from which one circle looks like the other, found by parallel spokes (Euclid's porism; Coxeter and Greitzer 1967, §5.1, homothety).
    private DirectedLine TouchingBoth(RuleTouchingBoth want, CircleValue first, CircleValue second, out PointMark touch)
    {
        Circle a = first.Mark.Circle, b = second.Mark.Circle;
        PointMark from = CentreOf(first), to = CentreOf(second);
        Vector between = to.Point.From(from.Point);
        Real reach = want.Crossed ? a.Radius + b.Radius : a.Radius - b.Radius;
        if (ReferenceEquals(from, to) || Decider.Sign(between.SquaredLength - (reach * reach)) <= 0)
            throw new FaultException(MakingFindings.Degenerate(
                want.Crossed ? $"`{want.First}` and `{want.Second}` overlap, so no crossed line touches both" : $"one of `{want.First}` and `{want.Second}` lies within the other, so no open line touches both", want.Span));
        string name = evaluator.NameOf(want.Line);
        DirectedLine centres = constructions.Through(from, to, null);
        DirectedLine spokeA = constructions.Square(centres, from, null), spokeB = constructions.Square(centres, to, null);
        if (!want.Crossed && Decider.IsZero(reach))
        {
            touch = Pick(spokeA.Mark, first.Mark, Crossing.Of(spokeA.Mark.Line, a, Decider), want.Choice, "the spoke", want.First.ToString()!, want, null);
            bool left = Decider.Sign(centres.Line.SideOf(touch.Point)) > 0;
            PointMark other = constructions.OnSpoke(left ? spokeB : spokeB.Reversed(), to, second.Mark, null);
            return constructions.Through(touch, other, name);
        }

        PointMark u = constructions.OnSpoke(spokeA, from, first.Mark, null);
        PointMark v = constructions.OnSpoke(want.Crossed ? spokeB.Reversed() : spokeB, to, second.Mark, null);
        PointMark apex = constructions.Crossed(constructions.Through(u, v, null), centres);
        PointMark middle = constructions.Midway(from, apex, null);
        CircleMark half = bench.Swing(middle, new SpanOpening(middle, apex), null, from);
        touch = Pick(first.Mark, half, Crossing.Of(a, half.Circle, Decider), want.Choice, want.First.ToString()!, "the half circle", want, null);
        DirectedLine line = constructions.Through(apex, touch, name);
        return Decider.Sign(Vector.Dot(line.Direction, between)) > 0 ? line : line.Reversed();
    }
}
