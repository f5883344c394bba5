using System.Diagnostics;
using System.Globalization;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;
using Test = RuleAndCompass.Language.Syntax.Test;

namespace RuleAndCompass.Making;

/// <summary>Decides what is claimed, and what `when` asks.</summary>
internal sealed class Conditions(Evaluator evaluator, Decider decider)
{
    /// <summary>After a test that failed: by how much, in words; null where there is no size to tell.</summary>
    public string? ByHowMuch { get; private set; }

    /// <summary>The condition with its indices worked out.</summary>
    public string Says(Condition condition) => (condition with { Tests = [.. condition.Tests.Select(Labelled)] }).ToString();

    /// <summary>Whether it holds (null: not decided), and the weakest way in which what settles it is known.</summary>
    public (bool? Holds, Verdict Verdict) Test(Condition condition)
    {
        // A single `or` part that holds settles it, as does a single `and` part that fails.
        Verdict weakest = Verdict.Proved;
        bool open = false;
        foreach (Test test in condition.Tests)
        {
            (bool? holds, Verdict verdict) = Test(test);
            if (holds == condition.ByOr)
                return (condition.ByOr, verdict);
            open |= holds is null;
            weakest = Weaker(weakest, verdict);
        }

        return (open ? null : !condition.ByOr, weakest);
    }

    /// <summary>The less certain of two verdicts; what only some givens are unknowns in holds for those.</summary>
    public static Verdict Weaker(Verdict a, Verdict b)
    {
        if (a.Certainty == b.Certainty)
            return a.Size <= b.Size ? a : b;
        return Strength(a.Certainty) <= Strength(b.Certainty) ? a : b;
    }

    private static int Strength(Certainty certainty) => certainty switch
    {
        Certainty.Digits => 0,
        Certainty.Certain => 1,
        Certainty.CertainForEvery => 2,
        Certainty.ProvedForEvery => 3,
        _ => 4,
    };

    private (bool? Holds, Verdict Verdict) Test(Test test)
    {
        (bool? holds, Verdict verdict) = test switch
        {
            RelationTest relation => Relation(relation),
            FigureTest figures => Figures(figures),
            SharedTest shared => Shared(shared),
            _ => throw new UnreachableException($"No test of {test.GetType().Name}."),
        };
        return (holds is null ? null : holds != test.Negated, verdict);
    }

    private (bool? Holds, Verdict Verdict) Relation(RelationTest test)
    {
        Value left = evaluator.Evaluate(test.Left), right = evaluator.Evaluate(test.Right);
        Decision decision;
        switch (left, right)
        {
            case (QuantityValue a, QuantityValue b) when a.Dimension == b.Dimension || a.IsNothing || b.IsNothing:
                Real difference = a.Amount - b.Amount;
                decision = decider.Decide(difference);
                Tell(difference, a.Dimension == 1 || b.Dimension == 1 ? " mm" : "");
                break;
            case (AngleValue a, AngleValue b):
                decision = Compare(a.Angle, b.Angle);
                break;
            case (AngleValue a, QuantityValue { IsNothing: true }):
                decision = Compare(a.Angle, Angle.Zero);
                break;
            case (QuantityValue { IsNothing: true }, AngleValue b):
                decision = Compare(Angle.Zero, b.Angle);
                break;
            case (TextValue a, TextValue b) when test.Relation == Language.Syntax.Relation.Equal:
                return (a.Text == b.Text, Verdict.Proved);
            case (PointValue a, PointValue b) when test.Relation == Language.Syntax.Relation.Equal:
                return SamePoint(a, b);
            case (LineValue a, LineValue b) when test.Relation == Language.Syntax.Relation.Equal:
                return ReferenceEquals(a.Directed.Mark, b.Directed.Mark)
                    ? (true, Verdict.Proved)
                    : Both(decider.Decide(Vector.Cross(a.Direction, b.Direction)), decider.Decide(a.Directed.Mark.Line.SideOf(b.Start)));
            case (CircleValue a, CircleValue b) when test.Relation == Language.Syntax.Relation.Equal:
                if (ReferenceEquals(a.Mark, b.Mark))
                    return (true, Verdict.Proved);
                (bool? sameCentre, Verdict centreVerdict) = Both(
                    decider.Decide(a.Mark.Circle.Centre.X - b.Mark.Circle.Centre.X), decider.Decide(a.Mark.Circle.Centre.Y - b.Mark.Circle.Centre.Y));
                Decision radii = decider.Decide(a.Mark.Circle.RadiusSquared - b.Mark.Circle.RadiusSquared);
                return sameCentre == false ? (false, centreVerdict) : (radii.Verdict.IsDecided && sameCentre is not null ? radii.Sign == 0 : null, Weaker(centreVerdict, radii.Verdict));
            default:
                throw new FaultException(MakingFindings.KindsDoNotFit(left.KindWithArticle, "compared with", right.KindWithArticle, test.Span,
                    left is PointValue or LineValue or CircleValue ? "figures are compared by `=` only" : null));
        }

        if (!decision.Verdict.IsDecided)
            return (null, decision.Verdict);
        return (test.Relation switch
        {
            Language.Syntax.Relation.Equal => decision.Sign == 0,
            Language.Syntax.Relation.Less => decision.Sign < 0,
            Language.Syntax.Relation.Greater => decision.Sign > 0,
            Language.Syntax.Relation.AtMost => decision.Sign <= 0,
            _ => decision.Sign >= 0,
        }, decision.Verdict);
    }

    private Decision Compare(Angle a, Angle b)
    {
        Tell((a - b).Degrees, "°");
        return decider.Compare(a, b);
    }

    private (bool? Holds, Verdict Verdict) SamePoint(PointValue a, PointValue b)
    {
        if (ReferenceEquals(a.Mark, b.Mark))
            return (true, Verdict.Proved);
        (bool? same, Verdict verdict) = Both(decider.Decide(a.Point.X - b.Point.X), decider.Decide(a.Point.Y - b.Point.Y));
        if (same == false)
            ByHowMuch = $"they are {Figure(a.Point.DistanceTo(b.Point))} mm apart";
        return (same, verdict);
    }

    private (bool? Holds, Verdict Verdict) Figures(FigureTest test)
    {
        Value left = evaluator.Resolve(test.Left), right = evaluator.Resolve(test.Right);
        switch (test.Relation, left, right)
        {
            case (FigureRelation.On, PointValue point, LineValue line):
                return OnLine(point, line.Directed.Mark.Line);
            case (FigureRelation.On, PointValue point, CircleValue circle):
                return OnCircle(point, circle.Mark.Circle);
            case (FigureRelation.SquareTo, LineValue a, LineValue b):
                Tell((Angle.OfVector(Vector.Dot(a.Direction, b.Direction), Vector.Cross(a.Direction, b.Direction)) - Angle.FromDegrees(90)).Degrees, "° from square");
                return Zero(Vector.Dot(a.Direction, b.Direction));
            case (FigureRelation.ParallelTo, LineValue a, LineValue b):
                Tell(Angle.OfVector(Vector.Dot(a.Direction, b.Direction), Vector.Cross(a.Direction, b.Direction)).Degrees, "° from parallel");
                return Zero(Vector.Cross(a.Direction, b.Direction));
            case (FigureRelation.Touches, LineValue line, CircleValue circle):
                return Touches(line.Directed.Mark.Line, circle.Mark.Circle);
            case (FigureRelation.Touches, CircleValue circle, LineValue line):
                return Touches(line.Directed.Mark.Line, circle.Mark.Circle);
            case (FigureRelation.Touches, CircleValue a, CircleValue b):
                return Touches(a.Mark.Circle, b.Mark.Circle);
            case (FigureRelation.Meets, LineValue or CircleValue, LineValue or CircleValue):
                Meeting meeting = Crossing.Of(CurveOf(left), CurveOf(right), decider).Meeting;
                return (meeting != Meeting.Apart, Verdict.Proved);
            default:
                throw new FaultException(MakingFindings.KindsDoNotFit(left.KindWithArticle, test.Relation switch
                {
                    FigureRelation.On => "on",
                    FigureRelation.SquareTo => "square to",
                    FigureRelation.ParallelTo => "parallel to",
                    FigureRelation.Touches => "touching",
                    _ => "meeting",
                }, right.KindWithArticle, test.Span));
        }
    }

    private (bool? Holds, Verdict Verdict) OnLine(PointValue point, Line line)
    {
        if (line.IsKnownToHold(point.Point))
            return (true, Verdict.Proved);
        Real side = line.SideOf(point.Point);
        (bool? holds, Verdict verdict) = Zero(side);
        if (holds == false)
            ByHowMuch = $"it lies {Figure(side / line.DirectionLength, size: true)} mm off the line";
        return (holds, verdict);
    }

    private (bool? Holds, Verdict Verdict) OnCircle(PointValue point, Circle circle)
    {
        if (circle.IsKnownToHold(point.Point))
            return (true, Verdict.Proved);
        (bool? holds, Verdict verdict) = Zero(circle.PowerOf(point.Point));
        if (holds == false)
            ByHowMuch = $"it lies {Figure(point.Point.DistanceTo(circle.Centre) - circle.Radius, size: true)} mm off the circle";
        return (holds, verdict);
    }

    private (bool? Holds, Verdict Verdict) Touches(Line line, Circle circle)
    {
        Real offset = line.SideOf(circle.Centre);
        (bool? holds, Verdict verdict) = Zero((offset * offset) - (circle.RadiusSquared * line.DirectionSquared));
        if (holds == false)
            ByHowMuch = $"the centre lies {Figure(offset / line.DirectionLength, size: true)} mm from the line, and the radius is {Figure(circle.Radius)} mm";
        return (holds, verdict);
    }

    private (bool? Holds, Verdict Verdict) Touches(Circle a, Circle b)
    {
        Real between = a.Centre.SquaredDistanceTo(b.Centre);
        Real rest = between - a.RadiusSquared - b.RadiusSquared;
        // (d² − r² − s²)² = 4 r² s² where the circles touch, within or without; one circle alone would satisfy it with d = 0.
        (bool? holds, Verdict verdict) = Zero((rest * rest) - (4 * a.RadiusSquared * b.RadiusSquared));
        if (holds == true && decider.IsZero(between))
            return (false, verdict);
        if (holds == false)
            ByHowMuch = $"the centres are {Figure(a.Centre.DistanceTo(b.Centre))} mm apart, and the radii are {Figure(a.Radius)} mm and {Figure(b.Radius)} mm";
        return (holds, verdict);
    }

    private (bool? Holds, Verdict Verdict) Shared(SharedTest test)
    {
        if (test.Relation == SharedRelation.ThroughOnePoint)
        {
            LineValue[] lines = [.. test.Figures.Select(evaluator.Line)];
            return EachWithFirstTwo(lines, (a, b, c) => Zero(Concurrency(a.Directed.Mark.Line, b.Directed.Mark.Line, c.Directed.Mark.Line)));
        }

        PointValue[] points = [.. test.Figures.Select(evaluator.Point)];
        if (test.Relation == SharedRelation.OnOneLine)
            return EachWithFirstTwo(points, (a, b, c) => Zero(Vector.Cross(b.Point.From(a.Point), c.Point.From(a.Point))));
        Verdict weakest = Verdict.Proved;
        for (int next = 3; next < points.Length; next++)
        {
            (bool? holds, Verdict verdict) = Zero(InCircle(points[0].Point, points[1].Point, points[2].Point, points[next].Point));
            if (holds != true)
                return (holds, verdict);
            weakest = Weaker(weakest, verdict);
        }

        return (true, weakest);
    }

    private static (bool? Holds, Verdict Verdict) EachWithFirstTwo<T>(T[] figures, Func<T, T, T, (bool? Holds, Verdict Verdict)> test)
    {
        Verdict weakest = Verdict.Proved;
        for (int next = 2; next < figures.Length; next++)
        {
            (bool? holds, Verdict verdict) = test(figures[0], figures[1], figures[next]);
            if (holds != true)
                return (holds, verdict);
            weakest = Weaker(weakest, verdict);
        }

        return (true, weakest);
    }

    // The determinant of the three lines' coefficients; zero where they share a point or are all parallel.
    private static Real Concurrency(Line a, Line b, Line c)
    {
        Real ca = Offset(a), cb = Offset(b), cc = Offset(c);
        return (ca * Vector.Cross(b.Direction, c.Direction)) + (cb * Vector.Cross(c.Direction, a.Direction)) + (cc * Vector.Cross(a.Direction, b.Direction));

        static Real Offset(Line line) => (line.Direction.X * line.Start.Y) - (line.Direction.Y * line.Start.X);
    }

    // Zero where the four lie on one circle or one line: de Berg and others, Computational Geometry (3rd ed., 2008), §9.2.
    private static Real InCircle(Point a, Point b, Point c, Point d)
    {
        Vector p = a.From(d), q = b.From(d), r = c.From(d);
        return (p.SquaredLength * Vector.Cross(q, r)) + (q.SquaredLength * Vector.Cross(r, p)) + (r.SquaredLength * Vector.Cross(p, q));
    }

    private (bool? Holds, Verdict Verdict) Zero(Real value)
    {
        Decision decision = decider.Decide(value);
        return (decision.Verdict.IsDecided ? decision.Sign == 0 : null, decision.Verdict);
    }

    private static (bool? Holds, Verdict Verdict) Both(Decision a, Decision b)
    {
        if (a.Sign != 0 || b.Sign != 0)
            return (false, Verdict.Proved);
        return (a.Verdict.IsDecided && b.Verdict.IsDecided ? true : null, Weaker(a.Verdict, b.Verdict));
    }

    private void Tell(Real difference, string unit) => ByHowMuch = $"the difference is {Figure(difference)}{unit}";

    private static string Figure(Real value, bool size = false)
    {
        double approximate = value.ToDouble();
        return (size ? Math.Abs(approximate) : approximate).ToString("0.#########e+0", CultureInfo.InvariantCulture) is var scientific && (approximate == 0 || Math.Abs(approximate) is >= 1e-4 and < 1e7)
            ? ValueText.Decimals(size ? Math.Abs(approximate) : approximate, 6)
            : scientific;
    }

    private static Curve CurveOf(Value value) => value switch
    {
        LineValue line => line.Directed.Mark.Line,
        CircleValue circle => circle.Mark.Circle,
        _ => throw new UnreachableException(),
    };

    private Test Labelled(Test test) => test switch
    {
        RelationTest relation => relation with { Left = evaluator.Labelled(relation.Left), Right = evaluator.Labelled(relation.Right) },
        FigureTest figures => figures with { Left = evaluator.Labelled(figures.Left), Right = evaluator.Labelled(figures.Right) },
        SharedTest shared => shared with { Figures = [.. shared.Figures.Select(evaluator.Labelled)] },
        _ => test,
    };
}
