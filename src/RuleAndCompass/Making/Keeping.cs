using System.Collections.Immutable;
using System.Diagnostics;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making;

/// <summary>Works out what the finished face shows: kept pieces with exact ends, and lettering. No act is added.</summary>
internal sealed class Keeping(Evaluator evaluator, Decider decider)
{
    private readonly record struct Style(Layer Layer, Weight Weight, Dash Dash, double? DrillMillimetres);

    public IEnumerable<Kept> Keep(KeepSentence sentence)
    {
        Style style = StyleOf(sentence.Style);
        Value value = evaluator.Resolve(sentence.Figure);
        string name = evaluator.Labelled(sentence.Figure).ToString()!;
        if (sentence.Portion is JoinedPortion joined)
            return [Joined(value, joined, name, style, sentence)];
        return Members(value, name).Select(member => Keep(member.Value, member.Name, sentence, style)).ToArray();
    }

    public Kept Keep(KeepRunSentence sentence)
    {
        Style style = StyleOf(sentence.Style);
        List<Piece> pieces = [];
        PointValue at = evaluator.Point(sentence.From);
        string name = evaluator.Labelled(sentence.From).ToString()!;
        foreach (Leg leg in sentence.Legs)
        {
            PointValue to = evaluator.Point(leg.To);
            switch (evaluator.Resolve(leg.Along))
            {
                case LineValue line:
                    if (leg.Way is not null)
                        throw new FaultException(MakingFindings.BadKeep("a way is said along a circle only", leg.Span, "leave out `clockwise` or `anticlockwise`"));
                    MustLieOn(at, line.Directed.Mark.Line, leg.Along, name, leg);
                    MustLieOn(to, line.Directed.Mark.Line, leg.Along, leg.To.ToString()!, leg);
                    MustGoOn(at, to, leg);
                    pieces.Add(new SegmentPiece(at.Point, to.Point));
                    break;
                case CircleValue circle:
                    if (leg.Way is not { } way)
                        throw new FaultException(MakingFindings.BadKeep("which way round is not said", leg.Span, "add `clockwise` or `anticlockwise`"));
                    MustLieOn(at, circle.Mark.Circle, leg.Along, name, leg);
                    MustLieOn(to, circle.Mark.Circle, leg.Along, leg.To.ToString()!, leg);
                    MustGoOn(at, to, leg);
                    pieces.Add(Arc(circle.Mark.Circle, at.Point, to.Point, way));
                    break;
                case Value other:
                    throw new FaultException(MakingFindings.WrongKind(leg.Along.ToString()!, other.KindWithArticle, "a line or a circle", leg.Along.Span));
            }

            at = to;
            name = evaluator.Labelled(leg.To).ToString()!;
        }

        return new($"the run from {evaluator.Labelled(sentence.From)} to {name}", null, [.. pieces], style.Layer, style.Weight, style.Dash, style.DrillMillimetres, sentence.Span, null);
    }

    public Lettering Letter(LetterSentence sentence)
    {
        string text = evaluator.Text(sentence.Text);
        PointValue at = evaluator.Point(sentence.At);
        Real height = evaluator.Length(sentence.Height).Amount;
        if (decider.Sign(height) <= 0)
            throw new FaultException(MakingFindings.NotPositive("the lettering's height", $"{ValueText.Decimals(height.ToDouble(), 3)} mm", sentence.Height.Span));
        LetteringLie lie = sentence.Lie switch
        {
            null => new StraightLie(0),
            TowardLie toward => new StraightLie(Toward(at, evaluator.Point(toward.Toward), toward)),
            AlongLie along => new StraightLie(Degrees(evaluator.Line(along.Line).Direction)),
            RoundLie round => Bent(at, evaluator.Circle(round.Circle).Mark.Circle, round),
            _ => throw new UnreachableException(),
        };
        return new(text, at.Point, sentence.Anchor, height.ToDouble(), lie, sentence.Span, null);
    }

    // The base line's direction: feet toward Q means that "down" points to Q.
    private static double Toward(PointValue at, PointValue toward, TowardLie lie)
    {
        if (ReferenceEquals(at.Mark, toward.Mark))
            throw new FaultException(MakingFindings.OnePointTwice(lie.Toward.ToString()!, "the lettering's place", lie.Span));
        double degrees = Degrees(toward.Point.From(at.Point));
        return lie.Feet ? degrees + 90 : degrees - 90;
    }

    private BentLie Bent(PointValue at, Circle circle, RoundLie lie)
    {
        if (decider.IsZero(at.Point.SquaredDistanceTo(circle.Centre)))
            throw new FaultException(MakingFindings.OnePointTwice("the lettering's place", $"the centre of {lie.Circle}", lie.Span) with { Message = $"the lettering's place is the centre of `{lie.Circle}`, so it cannot be bent round it", Hint = "letter at a point away from the centre" });
        return new(circle.Centre, at.Point.DistanceTo(circle.Centre).ToDouble(), lie.Way == Way.Clockwise);
    }

    private static double Degrees(Vector direction) => Math.Atan2(direction.Y.ToDouble(), direction.X.ToDouble()) * 180 / Math.PI;

    private static IEnumerable<(string Name, Value Value)> Members(Value value, string name) => value is FamilyValue family
        ? family.Members.SelectMany(member => Members(member.Value, Indexed(name, member.Key)))
        : [(name, value)];

    private static string Indexed(string name, IndexKey key) => name.EndsWith(']') ? $"{name[..^1]}, {key}]" : $"{name}[{key}]";

    private Kept Keep(Value value, string name, KeepSentence sentence, Style style)
    {
        (Mark mark, ImmutableArray<Piece> pieces) = (value, sentence.Portion) switch
        {
            (PointValue point, null) => (point.Mark, [new PointPiece(point.Point)]),
            (PointValue, _) => throw new FaultException(MakingFindings.BadKeep("a point has no part to keep", sentence.Portion.Span, "keep it whole: `keep " + name + "`")),
            (CircleValue circle, null) => (circle.Mark, [new CirclePiece(circle.Mark.Circle.Centre, circle.Mark.Circle.Radius)]),
            (LineValue, null) => throw new FaultException(MakingFindings.BadKeep($"a line is kept in part, and `{name}` is kept whole", sentence.Span, "say which part: `from P to Q`, `between a and b` or `inside c`")),
            (LineValue line, FromToPortion part) => ((Mark)line.Directed.Mark, (ImmutableArray<Piece>)[Segment(line, part, name)]),
            (CircleValue circle, FromToPortion part) => (circle.Mark, [Arc(circle, part, name)]),
            (LineValue line, BetweenPortion part) => (line.Directed.Mark, [Between(line, part, name)]),
            (CircleValue, BetweenPortion) => throw new FaultException(MakingFindings.BadKeep("`between` keeps a part of a line", sentence.Portion.Span, "of a circle, keep `from P to Q clockwise` or `inside c`")),
            (LineValue line, LimitsPortion limits) => (line.Directed.Mark, Limited(line, limits, name)),
            (CircleValue circle, LimitsPortion limits) => (circle.Mark, Limited(circle.Mark.Circle, limits, name)),
            _ => throw new FaultException(MakingFindings.WrongKind(name, value.KindWithArticle, "a figure", sentence.Figure.Span)),
        };
        return new(name, mark, pieces, style.Layer, style.Weight, style.Dash, style.DrillMillimetres, sentence.Span, null);
    }

    private SegmentPiece Segment(LineValue line, FromToPortion part, string name)
    {
        if (part.Way is not null)
            throw new FaultException(MakingFindings.BadKeep("a way is said along a circle only", part.Span, "leave out `clockwise` or `anticlockwise`"));
        PointValue from = evaluator.Point(part.From), to = evaluator.Point(part.To);
        MustLieOn(from, line.Directed.Mark.Line, name, part.From, part);
        MustLieOn(to, line.Directed.Mark.Line, name, part.To, part);
        if (ReferenceEquals(from.Mark, to.Mark))
            throw new FaultException(MakingFindings.BadKeep("the part to be kept begins and ends at one point", part.Span));
        return new(from.Point, to.Point);
    }

    private ArcPiece Arc(CircleValue circle, FromToPortion part, string name)
    {
        if (part.Way is not { } way)
            throw new FaultException(MakingFindings.BadKeep("which way round is not said", part.Span, "add `clockwise` or `anticlockwise`"));
        PointValue from = evaluator.Point(part.From), to = evaluator.Point(part.To);
        MustLieOn(from, circle.Mark.Circle, name, part.From, part);
        MustLieOn(to, circle.Mark.Circle, name, part.To, part);
        if (ReferenceEquals(from.Mark, to.Mark))
            throw new FaultException(MakingFindings.BadKeep("the part to be kept begins and ends at one point", part.Span, $"for all of it, `keep {name}`"));
        return Arc(circle.Mark.Circle, from.Point, to.Point, way);
    }

    private static ArcPiece Arc(Circle circle, Point from, Point to, Way way) => new(circle.Centre, circle.Radius, from, to, way == Way.Clockwise);

    private SegmentPiece Between(LineValue line, BetweenPortion part, string name)
    {
        Point from = Ahead(line, part.First, name, part), to = Ahead(line, part.Second, name, part);
        return new(from, to);
    }

    // The nearest crossing at the line's start or ahead of it.
    private Point Ahead(LineValue line, Reference limit, string name, BetweenPortion part)
    {
        Curve curve = CurveOf(limit);
        Crossing crossing = Crossing.Of(line.Directed.Line, curve, decider);
        foreach (Point point in crossing.Points)
            if (ReferenceEquals(point, line.Start) || decider.Sign(Vector.Dot(line.Direction, point.From(line.Start))) >= 0)
                return point;
        throw new FaultException(MakingFindings.BadKeep($"`{name}` does not reach `{limit}` ahead of its start", part.Span));
    }

    private ImmutableArray<Piece> Limited(LineValue line, LimitsPortion limits, string name)
    {
        Line along = line.Directed.Line;
        List<Point> ends = [];
        foreach (LimitClause limit in limits.Limits)
            ends.AddRange(Crossing.Of(along, evaluator.Circle(limit.Circle).Mark.Circle, decider).Points);
        ends.Sort((a, b) => ReferenceEquals(a, b) ? 0 : decider.Sign(Vector.Dot(along.Direction, a.From(b))));
        ImmutableArray<Piece>.Builder pieces = ImmutableArray.CreateBuilder<Piece>();
        if (limits.Limits.All(limit => !limit.Inside))
            throw new FaultException(MakingFindings.BadKeep($"what is kept of `{name}` has no end", limits.Span, "add an `inside`"));
        for (int next = 0; next + 1 < ends.Count; next++)
        {
            if (ReferenceEquals(ends[next], ends[next + 1]) || decider.IsZero(Vector.Dot(along.Direction, ends[next].From(ends[next + 1]))))
                continue;
            Point middle = new((ends[next].X + ends[next + 1].X) / 2, (ends[next].Y + ends[next + 1].Y) / 2);
            if (Within(middle, limits))
                pieces.Add(new SegmentPiece(ends[next], ends[next + 1]));
        }

        return pieces.Count > 0 ? pieces.ToImmutable() : throw new FaultException(MakingFindings.BadKeep($"nothing of `{name}` lies there", limits.Span));
    }

    private ImmutableArray<Piece> Limited(Circle circle, LimitsPortion limits, string name)
    {
        List<Point> ends = [];
        foreach (LimitClause limit in limits.Limits)
            ends.AddRange(Crossing.Of(circle, evaluator.Circle(limit.Circle).Mark.Circle, decider).Points);
        if (ends.Count < 2)
        {
            // No crossing parts the circle: it is kept whole or not at all.
            Point any = circle.Centre.Plus(new Vector(circle.Radius, Real.Zero));
            return Within(any, limits) ? [new CirclePiece(circle.Centre, circle.Radius)] : throw new FaultException(MakingFindings.BadKeep($"nothing of `{name}` lies there", limits.Span));
        }

        Point origin = ends[0];
        ends.Sort((a, b) => CompareTurn(circle, origin, a, b));
        ImmutableArray<Piece>.Builder pieces = ImmutableArray.CreateBuilder<Piece>();
        for (int next = 0; next < ends.Count; next++)
        {
            Point from = ends[next], to = ends[(next + 1) % ends.Count];
            if (Within(MiddleOfArc(circle, from, to), limits))
                pieces.Add(new ArcPiece(circle.Centre, circle.Radius, from, to, false));
        }

        return pieces.Count > 0 ? pieces.ToImmutable() : throw new FaultException(MakingFindings.BadKeep($"nothing of `{name}` lies there", limits.Span));
    }

    // Which comes first going anticlockwise from the origin, itself first.
    private int CompareTurn(Circle circle, Point origin, Point a, Point b)
    {
        if (ReferenceEquals(a, b))
            return 0;
        Vector from = origin.From(circle.Centre), u = a.From(circle.Centre), v = b.From(circle.Centre);
        int halfU = Half(origin, a, Vector.Cross(from, u)), halfV = Half(origin, b, Vector.Cross(from, v));
        return halfU != halfV ? halfU.CompareTo(halfV) : -decider.Sign(Vector.Cross(u, v));

        int Half(Point start, Point point, Real side) => ReferenceEquals(start, point) ? -1 : decider.Sign(side) >= 0 ? 0 : 1;
    }

    // Halfway round anticlockwise: square to the chord, on its right as one goes from the first end to the second.
    private static Point MiddleOfArc(Circle circle, Point from, Point to)
    {
        Vector out1 = -to.From(from).QuarterTurn;
        return circle.Centre.Plus(circle.Radius / out1.Length * out1);
    }

    private bool Within(Point point, LimitsPortion limits)
    {
        foreach (LimitClause limit in limits.Limits)
        {
            int side = decider.Sign(evaluator.Circle(limit.Circle).Mark.Circle.PowerOf(point));
            if (limit.Inside ? side > 0 : side < 0)
                return false;
        }

        return true;
    }

    private Kept Joined(Value value, JoinedPortion joined, string name, Style style, KeepSentence sentence)
    {
        if (value is not FamilyValue family || family.Flattened().Any(member => member is not PointValue))
            throw new FaultException(MakingFindings.WrongKind(name, value.KindWithArticle, "a family of points", sentence.Figure.Span));
        List<Point> points = [.. family.Flattened().OfType<PointValue>().Select(member => member.Point)];
        if (points.Count > 1 && ReferenceEquals(points[0], points[^1]))
            points.RemoveAt(points.Count - 1);
        if (points.Count < 2)
            throw new FaultException(MakingFindings.BadKeep("joining takes two points or more", sentence.Span));
        bool closed = joined.Closed || ReferenceEquals(family.Flattened().OfType<PointValue>().Last().Point, points[0]);
        ImmutableArray<Piece> pieces = joined.Faired ? Fairing.Arcs(points, closed, decider) : Straight(points, closed);
        return new(name, null, pieces, style.Layer, style.Weight, style.Dash, style.DrillMillimetres, sentence.Span, null);
    }

    private static ImmutableArray<Piece> Straight(List<Point> points, bool closed)
    {
        ImmutableArray<Piece>.Builder pieces = ImmutableArray.CreateBuilder<Piece>();
        for (int next = 0; next + 1 < points.Count; next++)
            pieces.Add(new SegmentPiece(points[next], points[next + 1]));
        if (closed && points.Count > 2)
            pieces.Add(new SegmentPiece(points[^1], points[0]));
        return pieces.ToImmutable();
    }

    private Curve CurveOf(Reference reference) => evaluator.Resolve(reference) switch
    {
        CurveValue curve => curve.CurveMark.Curve,
        Value other => throw new FaultException(MakingFindings.WrongKind(reference.ToString()!, other.KindWithArticle, "a line or a circle", reference.Span)),
    };

    private static void MustGoOn(PointValue from, PointValue to, Leg leg)
    {
        if (ReferenceEquals(from.Mark, to.Mark))
            throw new FaultException(MakingFindings.BadKeep("this piece of the run begins and ends at one point", leg.Span, "leave it out, or name the point it goes to"));
    }

    private void MustLieOn(PointValue point, Curve curve, Reference curveName, string pointName, Node at) => MustLieOn(point, curve, curveName.ToString()!, pointName, at);

    private void MustLieOn(PointValue point, Curve curve, string curveName, Reference pointName, Node at) => MustLieOn(point, curve, curveName, pointName.ToString()!, at);

    private void MustLieOn(PointValue point, Curve curve, string curveName, string pointName, Node at)
    {
        if (!Incidence.Holds(point.Point, curve, decider))
            throw new FaultException(MakingFindings.NotOn(pointName, curveName, Incidence.Distance(point.Point, curve), at.Span));
    }

    private Style StyleOf(KeepStyle style)
    {
        Layer layer = Layer.Engraved;
        Weight weight = Weight.Plain;
        Dash dash = Dash.Whole;
        foreach (Name word in style.Words)
            switch (word.Text)
            {
                case "heavy":
                    weight = Weight.Heavy;
                    break;
                case "fine":
                    weight = Weight.Fine;
                    break;
                case "dashed":
                    dash = Dash.Dashed;
                    break;
                case "chain":
                    dash = Dash.Chain;
                    break;
                case "cut":
                    layer = Layer.Cut;
                    break;
                case "drilled":
                    layer = Layer.Drilled;
                    break;
            }

        double? drill = null;
        if (style.DrilledWidth is { } width)
        {
            Real size = evaluator.Length(width).Amount;
            if (decider.Sign(size) <= 0)
                throw new FaultException(MakingFindings.NotPositive("the hole's width", $"{ValueText.Decimals(size.ToDouble(), 3)} mm", width.Span));
            drill = size.ToDouble();
        }

        return new(layer, weight, dash, drill);
    }
}
