using System.Collections.Immutable;
using System.Diagnostics;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Geometry;

/// <summary>How two curves lie to each other.</summary>
public enum Meeting
{
    /// <summary>They share no point.</summary>
    Apart,

    /// <summary>They share one point and touch there.</summary>
    Touching,

    /// <summary>They cross, in one point (two lines) or two.</summary>
    Crossing,

    /// <summary>They are the same curve, or parallel lines that coincide.</summary>
    Same,
}

/// <summary>The points two curves have in common, in Geometry's order.</summary>
/// <param name="Meeting">How they lie.</param>
/// <param name="Points">
/// None, one or two. On a line, in the order of its direction; of two circles, first the one on the left looking from the centre of the first to that of the second.
/// </param>
/// <remarks>
/// Where one common point is known already, the other is rational in it (the two roots of a quadratic have a rational sum) and no root is taken.
/// Radical axis, then line and circle: Coxeter and Greitzer, Geometry Revisited (1967), §2.2.
/// </remarks>
public sealed record Crossing(Meeting Meeting, ImmutableArray<Point> Points)
{
    private static readonly Crossing None = new(Meeting.Apart, []);
    private static readonly Crossing Everywhere = new(Meeting.Same, []);

    /// <summary>Finds the points common to two curves; every decision is exact.</summary>
    public static Crossing Of(Curve first, Curve second, Decider decider) => (first, second) switch
    {
        _ when ReferenceEquals(first, second) => Everywhere,
        (Line a, Line b) => Of(a, b, decider),
        (Line line, Circle circle) => Of(line, circle, decider),
        (Circle circle, Line line) => Of(line, circle, decider),
        (Circle a, Circle b) => Of(a, b, decider),
        _ => throw new UnreachableException($"No crossing of {first.GetType().Name} and {second.GetType().Name}."),
    };

    private static Crossing Of(Line a, Line b, Decider decider)
    {
        Real across = Vector.Cross(a.Direction, b.Direction);
        if (decider.IsZero(across))
            return a.IsKnownToHold(b.Start) || b.IsKnownToHold(a.Start) || decider.IsZero(a.SideOf(b.Start)) ? Everywhere : None;
        if (KnownCommon(a, b) is { } known)
            return new(Meeting.Crossing, [known]);
        Real along = Vector.Cross(b.Start.From(a.Start), b.Direction) / across;
        Point at = a.Start.Plus(along * a.Direction);
        return new(Meeting.Crossing, [new(at.X, at.Y, [a, b])]);
    }

    private static Crossing Of(Line line, Circle circle, Decider decider)
    {
        if (KnownCommon(line, circle) is { } known)
        {
            Real along = line.Along(known, circle.Centre);
            int sign = decider.Sign(along);
            if (sign == 0)
                return new(Meeting.Touching, [known]);
            Point other = SecondKnown(line, circle, known) ?? On(known.Plus(-2 * along / line.DirectionSquared * line.Direction), line, circle);
            return new(Meeting.Crossing, sign < 0 ? [known, other] : [other, known]);
        }

        if (line.IsKnownToHold(circle.Centre))
        {
            Vector reach = Real.Sqrt(circle.RadiusSquared / line.DirectionSquared) * line.Direction;
            return new(Meeting.Crossing, [On(circle.Centre.Plus(-reach), line, circle), On(circle.Centre.Plus(reach), line, circle)]);
        }

        Vector towards = circle.Centre.From(line.Start);
        Real middle = Vector.Dot(line.Direction, towards) / line.DirectionSquared;
        Real offset = Vector.Cross(line.Direction, towards);
        Real spread = ((circle.RadiusSquared * line.DirectionSquared) - (offset * offset)) / (line.DirectionSquared * line.DirectionSquared);
        switch (decider.Sign(spread))
        {
            case < 0:
                return None;
            case 0:
                return new(Meeting.Touching, [On(line.Start.Plus(middle * line.Direction), line, circle)]);
            default:
                Real half = Real.Sqrt(spread);
                return new(Meeting.Crossing, [On(line.Start.Plus((middle - half) * line.Direction), line, circle), On(line.Start.Plus((middle + half) * line.Direction), line, circle)]);
        }
    }

    private static Crossing Of(Circle a, Circle b, Decider decider)
    {
        bool concentric = ReferenceEquals(a.Centre, b.Centre);
        Vector between = b.Centre.From(a.Centre);
        Real squaredBetween = a.Centre.SquaredDistanceTo(b.Centre);
        if (concentric || decider.IsZero(squaredBetween))
            return decider.IsZero(a.RadiusSquared - b.RadiusSquared) ? Everywhere : None;
        if (KnownCommon(a, b) is { } known)
        {
            Real side = Vector.Cross(between, known.From(a.Centre));
            int sign = decider.Sign(side);
            if (sign == 0)
                return new(Meeting.Touching, [known]);
            Point other = SecondKnown(a, b, known) ?? On(known.Plus(-2 * side / squaredBetween * between.QuarterTurn), a, b);
            return new(Meeting.Crossing, sign > 0 ? [known, other] : [other, known]);
        }

        Real along = (a.RadiusSquared - b.RadiusSquared + squaredBetween) / (2 * squaredBetween);
        Real spread = (a.RadiusSquared / squaredBetween) - (along * along);
        Point foot = a.Centre.Plus(along * between);
        switch (decider.Sign(spread))
        {
            case < 0:
                return None;
            case 0:
                return new(Meeting.Touching, [On(foot, a, b)]);
            default:
                Vector half = Real.Sqrt(spread) * between.QuarterTurn;
                return new(Meeting.Crossing, [On(foot.Plus(half), a, b), On(foot.Plus(-half), a, b)]);
        }
    }

    private static Point On(Point at, Curve first, Curve second) => new(at.X, at.Y, [first, second]);

    private static Point? KnownCommon(Curve first, Curve second) => FindKnown(first, second, null);

    private static Point? SecondKnown(Curve first, Curve second, Point known) => FindKnown(first, second, known);

    private static Point? FindKnown(Curve first, Curve second, Point? except)
    {
        foreach (Point point in first.KnownPoints)
            if (!ReferenceEquals(point, except) && second.IsKnownToHold(point))
                return point;
        foreach (Point point in second.KnownPoints)
            if (!ReferenceEquals(point, except) && first.IsKnownToHold(point))
                return point;
        return null;
    }
}
