using System.Diagnostics;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making.Wants;

/// <summary>Makes each want: what its words mean, the acts for it, and the name it binds.</summary>
internal sealed partial class WantMaker(Evaluator evaluator, Workbench bench, Constructions constructions, Action<Bound, Value> bind, Action<Many, IReadOnlyList<(IndexKey Key, Value Value)>> bindMany)
{
    private Decider Decider => bench.Decider;

    public void Make(WantSentence want)
    {
        constructions.Serving = want.Span;
        if (want.By is { } tool && !WaysOf(want).Contains(tool))
            throw new FaultException(MakingFindings.NoWayBy(tool.ToString().ToLowerInvariant(), WaysOf(want).Select(way => way.ToString().ToLowerInvariant()), want.Span));
        if (want.By is { } by && !Serves(by, want))
            throw new FaultException(MakingFindings.NoTool($"`by {by.ToString().ToLowerInvariant()}` is no way to make it", "nothing: leave `by` out, or name another tool", want.Span) with
            {
                Hint = "leave `by …` out, or name another tool",
            });
        switch (want)
        {
            case PrickAt at:
                Make(at);
                break;
            case PrickFoot foot:
                Make(foot);
                break;
            case PrickCentre centre:
                Make(centre);
                break;
            case PrickMidway midway:
                Make(midway);
                break;
            case PrickAcross across:
                Make(across);
                break;
            case PrickAbout about:
                Make(about);
                break;
            case PrickWhere where:
                Make(where);
                break;
            case PrickBoth both:
                Make(both);
                break;
            case PrickOnToward on:
                Make(on);
                break;
            case PrickOnAhead on:
                Make(on);
                break;
            case PrickOnCircle on:
                Make(on);
                break;
            case PrickTurned turned:
                Make(turned);
                break;
            case PrickDividing dividing:
                Make(dividing);
                break;
            case PrickRound round:
                Make(round);
                break;
            case PrickSteppingAlong stepping:
                Make(stepping);
                break;
            case PrickSteppingRound stepping:
                Make(stepping);
                break;
            case RuleThrough through:
                Make(through);
                break;
            case RuleToward toward:
                Make(toward);
                break;
            case RuleSquare square:
                Make(square);
                break;
            case RuleParallel parallel:
                Make(parallel);
                break;
            case RuleBack back:
                Make(back);
                break;
            case RuleTurned turned:
                Make(turned);
                break;
            case RuleHalving halving:
                Make(halving);
                break;
            case RuleHalvingAngle halving:
                Make(halving);
                break;
            case RuleTouchingAt touching:
                Make(touching);
                break;
            case RuleTouchingFrom touching:
                Make(touching);
                break;
            case RuleTouchingBoth touching:
                Make(touching);
                break;
            case StrikeThrough through:
                Make(through);
                break;
            case StrikeOpening opening:
                Make(opening);
                break;
            case StrikeTouching touching:
                Make(touching);
                break;
            case StrikeThroughThree three:
                Make(three);
                break;
            default:
                throw new UnreachableException($"No want of {want.GetType().Name}.");
        }
    }

    // Which tools can make which wants in more than one way; what is laid or swung anyhow is made by dividers.
    private static bool Serves(ByTool by, WantSentence want) => want switch
    {
        PrickAt => by == ByTool.Scale,
        RuleSquare or PrickFoot or StrikeTouching or RuleTouchingAt => by is ByTool.Square or ByTool.Dividers || (by == ByTool.Protractor && want is RuleSquare),
        RuleParallel or RuleBack or RuleToward => by is ByTool.Square or ByTool.Dividers,
        RuleTurned or PrickTurned or PrickRound => by != ByTool.Square,
        PrickOnAhead or PrickOnToward => by is ByTool.Dividers or ByTool.Scale,
        PrickOnCircle => by is ByTool.Square or ByTool.Dividers,
        RuleThrough => false,
        _ => by == ByTool.Dividers,
    };

    // What a want may be asked to be made by.
    private static ByTool[] WaysOf(WantSentence want) => want switch
    {
        PrickAt => [ByTool.Scale],
        PrickOnToward or PrickOnAhead => [ByTool.Dividers, ByTool.Scale],
        PrickMidway or PrickAcross or PrickAbout or PrickDividing or PrickSteppingAlong or PrickSteppingRound or RuleHalving or RuleHalvingAngle => [ByTool.Dividers],
        PrickFoot or RuleSquare or RuleTouchingAt or StrikeTouching => [ByTool.Square, ByTool.Dividers, ByTool.Protractor],
        RuleParallel or RuleBack => [ByTool.Square, ByTool.Dividers],
        RuleToward or PrickOnCircle => [ByTool.Square, ByTool.Dividers, ByTool.Protractor, ByTool.Scale],
        RuleTurned or PrickTurned or PrickRound => [ByTool.Dividers, ByTool.Protractor, ByTool.Scale],
        _ => [],
    };

    private void Bind(Bound bound, PointMark mark) => bind(bound, new PointValue(mark));

    private void Bind(Bound bound, CircleMark mark) => bind(bound, new CircleValue(mark));

    private void Bind(Bound bound, DirectedLine line, Point start) => bind(bound, new LineValue(line, start));

    private static DirectedLine Directed(LineValue line) => line.Directed;

    private bool IsSame(PointValue a, PointValue b) => bench.Marks.IsSame(a.Point, b.Point);

    private void Apart(PointValue a, Reference nameA, PointValue b, Reference nameB)
    {
        if (IsSame(a, b))
            throw new FaultException(MakingFindings.OnePointTwice(nameA.ToString()!, nameB.ToString()!, nameA.Span.To(nameB.Span)));
    }

    private void On(PointValue point, Reference pointName, Curve curve, Reference curveName)
    {
        if (!Incidence.Holds(point.Point, curve, Decider))
            throw new FaultException(MakingFindings.NotOn(pointName.ToString()!, curveName.ToString()!, Incidence.Distance(point.Point, curve), pointName.Span));
    }

    /// <summary>A direction as an angle from right; a point by the way to it.</summary>
    private Angle AngleOf(Direction direction, PointValue from, Reference fromName)
    {
        switch (direction)
        {
            case SheetDirection sheet:
                return Angle.FromDegrees(sheet.Degrees);
            case TowardDirection toward:
                Value value = evaluator.Evaluate(toward.Value);
                if (value is AngleValue angle)
                    return angle.Angle;
                if (value is QuantityValue { IsNothing: true })
                    return Angle.Zero;
                if (value is PointValue point)
                {
                    if (IsSame(point, from))
                        throw new FaultException(MakingFindings.OnePointTwice(toward.Value.ToString()!, fromName.ToString()!, direction.Span));
                    Vector way = point.Point.From(from.Point);
                    return Angle.OfVector(way.X, way.Y);
                }

                throw new FaultException(MakingFindings.WrongKind(toward.Value.ToString()!, value.KindWithArticle, "a direction", toward.Span, "`up`, `down`, `left`, `right`, a point or an angle"));
            default:
                throw new UnreachableException($"No way of {direction.GetType().Name}.");
        }
    }

    /// <summary>Whether a direction runs ahead along a line that it lies on.</summary>
    private bool IsAhead(LineValue line, Direction direction, PointValue from, Reference fromName)
    {
        (Real x, Real y) = AngleOf(direction, from, fromName).Vector;
        Vector way = new(x, y);
        int sign = Decider.Sign(Vector.Dot(line.Direction, way));
        return sign != 0
            ? sign > 0
            : throw new FaultException(MakingFindings.Degenerate($"`{direction}` is square to the line, so it does not say which way along it", direction.Span, "name a point on the line, or the way it runs"));
    }

    private static Angle Signed(Angle angle, Way way) => way == Way.Clockwise ? -angle : angle;
}
