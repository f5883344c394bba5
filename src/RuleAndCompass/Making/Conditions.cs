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
    private string? byHowMuch;
    private (Real Size, string Unit)? told;

    /// <summary>After a test that failed: by how much, in words; null where there is no size to tell.</summary>
    public string? ByHowMuch
    {
        get => byHowMuch ?? (told is { } difference ? $"the difference is {Figure(difference.Size)}{difference.Unit}" : null);
        private set => (byHowMuch, told) = (value, null);
    }

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
        ByHowMuch = null;
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
                return SameLine(a, b);
            case (CircleValue a, CircleValue b) when test.Relation == Language.Syntax.Relation.Equal:
                return SameCircle(a, b);
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

    private (bool? Holds, Verdict Verdict) SameLine(LineValue a, LineValue b)
    {
        if (ReferenceEquals(a.Directed.Mark, b.Directed.Mark))
            return (true, Verdict.Proved);
        Decision parallel = decider.Decide(Vector.Cross(a.Direction, b.Direction));
        Real off = a.Directed.Mark.Line.SideOf(b.Start);
        (bool? same, Verdict verdict) = Both(parallel, decider.Decide(off));
        if (same == false)
            ByHowMuch = parallel.Sign != 0
                ? $"they run at {Figure(Angle.OfVector(Vector.Dot(a.Direction, b.Direction), Vector.Cross(a.Direction, b.Direction)).Degrees, size: true)}° to each other"
                : $"they are parallel, {Figure(off / a.Directed.Mark.Line.DirectionLength, size: true)} mm apart";
        return (same, verdict);
    }

    private (bool? Holds, Verdict Verdict) SameCircle(CircleValue a, CircleValue b)
    {
        if (ReferenceEquals(a.Mark, b.Mark))
            return (true, Verdict.Proved);
        Circle first = a.Mark.Circle, second = b.Mark.Circle;
        (bool? concentric, Verdict centres) = Both(decider.Decide(first.Centre.X - second.Centre.X), decider.Decide(first.Centre.Y - second.Centre.Y));
        (bool? equal, Verdict radii) = Zero(first.RadiusSquared - second.RadiusSquared);
        if (concentric == false || equal == false)
        {
            ByHowMuch = concentric == false ? $"their centres are {Figure(first.Centre.DistanceTo(second.Centre))} mm apart" : $"their radii differ by {Figure(first.Radius - second.Radius, size: true)} mm";
            return (false, Verdict.Proved);
        }

        return (concentric is null || equal is null ? null : true, Weaker(centres, radii));
    }

    private (bool? Holds, Verdict Verdict) Meets(Curve a, Curve b)
    {
        Crossing crossing = Crossing.Of(a, b, decider);
        if (crossing.Meeting == Meeting.Apart)
            ByHowMuch = (a, b) switch
            {
                (Line first, Line second) => $"they are parallel, {Figure(first.SideOf(second.Start) / first.DirectionLength, size: true)} mm apart",
                (Line line, Circle circle) => Gap(line, circle),
                (Circle circle, Line line) => Gap(line, circle),
                (Circle first, Circle second) => Gap(first, second),
                _ => null,
            };
        // That they touch, or are the same, rests on a zero, which may be known less surely than a sign.
        return crossing.Meeting == Meeting.Touching
            ? (true, (a, b) switch
            {
                (Line line, Circle circle) => Touches(line, circle).Verdict,
                (Circle circle, Line line) => Touches(line, circle).Verdict,
                (Circle first, Circle second) => Touches(first, second).Verdict,
                _ => Verdict.Proved,
            })
            : (crossing.Meeting != Meeting.Apart, Verdict.Proved);
    }

    private static string Gap(Line line, Circle circle) =>
        $"they are {Figure(Math.Abs((line.SideOf(circle.Centre) / line.DirectionLength).ToDouble()) - circle.Radius.ToDouble())} mm apart";

    private static string Gap(Circle a, Circle b)
    {
        double between = a.Centre.DistanceTo(b.Centre).ToDouble(), r = a.Radius.ToDouble(), s = b.Radius.ToDouble();
        return $"they are {Figure(between > r + s ? between - r - s : Math.Abs(r - s) - between)} mm apart";
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
            case (FigureRelation.Meets, CurveValue a, CurveValue b):
                return Meets(a.CurveMark.Curve, b.CurveMark.Curve);
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
        {
            ByHowMuch = "they are one circle";
            return (false, verdict);
        }

        if (holds == false)
            ByHowMuch = $"the centres are {Figure(a.Centre.DistanceTo(b.Centre))} mm apart, and the radii are {Figure(a.Radius)} mm and {Figure(b.Radius)} mm";
        return (holds, verdict);
    }

    private (bool? Holds, Verdict Verdict) Shared(SharedTest test)
    {
        switch (test.Relation)
        {
            case SharedRelation.ThroughOnePoint:
                return ThroughOnePoint([.. test.Figures.Select(evaluator.Line)]);
            case SharedRelation.OnOneLine:
                return OnOneLine([.. test.Figures.Select(evaluator.Point)], [.. test.Figures.Select(figure => figure.ToString()!)]);
            case SharedRelation.OnOneCircle:
                return OnOneCircle([.. test.Figures.Select(evaluator.Point)], [.. test.Figures.Select(figure => figure.ToString()!)]);
            default:
                throw new UnreachableException($"No test of {test.Relation}.");
        }
    }

    private (bool? Holds, Verdict Verdict) OnOneLine(PointValue[] points, string[] names)
    {
        // Two that are apart settle the line.
        int other = Array.FindIndex(points, point => !IsSame(point, points[0]));
        if (other < 0)
            return (true, Verdict.Proved);
        Line line = Line.Through(points[0].Point, points[other].Point);
        return Every(points, other + 1, (point, place) =>
        {
            Real side = line.SideOf(point.Point);
            (bool? holds, Verdict verdict) = ReferenceEquals(point.Mark, points[0].Mark) ? (true, Verdict.Proved) : Zero(side);
            if (holds == false)
                ByHowMuch = $"`{names[place]}` lies {Figure(side / line.DirectionLength, size: true)} mm off the line from `{names[0]}` to `{names[other]}`";
            return (holds, verdict);
        });
    }

    private (bool? Holds, Verdict Verdict) OnOneCircle(PointValue[] points, string[] names)
    {
        // Three that are no two alike settle the circle, if they are not on one line.
        List<int> apart = [];
        for (int place = 0; place < points.Length && apart.Count < 3; place++)
            if (apart.TrueForAll(earlier => !IsSame(points[earlier], points[place])))
                apart.Add(place);
        if (apart.Count < 3)
            return (true, Verdict.Proved);
        Point a = points[apart[0]].Point, b = points[apart[1]].Point, c = points[apart[2]].Point;
        Real bend = Vector.Cross(b.From(a), c.From(a));
        (bool? straight, Verdict straightness) = Zero(bend);
        if (straight != false)
        {
            ByHowMuch = $"`{names[apart[0]]}`, `{names[apart[1]]}` and `{names[apart[2]]}` are on one line";
            return (straight is null ? null : false, straightness);
        }

        return Every(points, apart[2] + 1, (point, place) =>
        {
            (bool? holds, Verdict verdict) = Zero(InCircle(a, b, c, point.Point));
            if (holds == false)
            {
                // The circle's middle, from the halves of two chords.
                Vector u = b.From(a), v = c.From(a);
                Point centre = a.Plus(new((v.Y * u.SquaredLength - (u.Y * v.SquaredLength)) / (2 * bend), (u.X * v.SquaredLength - (v.X * u.SquaredLength)) / (2 * bend)));
                ByHowMuch = $"`{names[place]}` lies {Figure(point.Point.DistanceTo(centre) - centre.DistanceTo(a), size: true)} mm off the circle through `{names[apart[0]]}`, `{names[apart[1]]}` and `{names[apart[2]]}`";
            }

            return (holds, verdict);
        });
    }

    private (bool? Holds, Verdict Verdict) ThroughOnePoint(LineValue[] lines)
    {
        // Two that cross settle the point.
        Line first = lines[0].Directed.Mark.Line;
        int other = Array.FindIndex(lines, line => !decider.IsZero(Vector.Cross(first.Direction, line.Direction)));
        if (other < 0)
        {
            ByHowMuch = "they are parallel";
            return Every(lines, 1, (line, _) => SameLine(lines[0], line));
        }

        Line second = lines[other].Directed.Mark.Line;
        return Every(lines, 1, (line, place) =>
        {
            if (place == other)
                return (true, Verdict.Proved);
            Line third = line.Directed.Mark.Line;
            (bool? holds, Verdict verdict) = Zero(Concurrency(first, second, third));
            if (holds == false)
                ByHowMuch = $"one passes {Figure(third.SideOf(Crossing.Of(first, second, decider).Points[0]) / third.DirectionLength, size: true)} mm from where two others cross";
            return (holds, verdict);
        });
    }

    private static (bool? Holds, Verdict Verdict) Every<T>(T[] figures, int from, Func<T, int, (bool? Holds, Verdict Verdict)> test)
    {
        Verdict weakest = Verdict.Proved;
        for (int place = from; place < figures.Length; place++)
        {
            (bool? holds, Verdict verdict) = test(figures[place], place);
            if (holds != true)
                return (holds, verdict);
            weakest = Weaker(weakest, verdict);
        }

        return (true, weakest);
    }

    private bool IsSame(PointValue a, PointValue b) =>
        ReferenceEquals(a.Mark, b.Mark) || (decider.IsZero(a.Point.X - b.Point.X) && decider.IsZero(a.Point.Y - b.Point.Y));

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

    // Put into words only when someone asks: most conditions hold, and nobody does.
    private void Tell(Real difference, string unit) => (byHowMuch, told) = (null, (difference, unit));

    private static string Figure(Real value, bool size = false) => Figure(value.ToDouble(), size);

    private static string Figure(double approximate, bool size = false)
    {
        return (size ? Math.Abs(approximate) : approximate).ToString("0.#########e+0", CultureInfo.InvariantCulture) is var scientific && (approximate == 0 || Math.Abs(approximate) is >= 1e-4 and < 1e7)
            ? ValueText.Decimals(size ? Math.Abs(approximate) : approximate, 6)
            : scientific;
    }

    private Test Labelled(Test test) => test switch
    {
        RelationTest relation => relation with { Left = evaluator.Labelled(relation.Left), Right = evaluator.Labelled(relation.Right) },
        FigureTest figures => figures with { Left = evaluator.Labelled(figures.Left), Right = evaluator.Labelled(figures.Right) },
        SharedTest shared => shared with { Figures = [.. shared.Figures.Select(evaluator.Labelled)] },
        _ => test,
    };
}
