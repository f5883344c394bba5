using System.Collections.Immutable;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Geometry;

/// <summary>A directed line: it runs from <see cref="Start"/> along <see cref="Direction"/>, which need not be of unit length.</summary>
public sealed class Line : Curve
{
    private Line(Point start, Vector direction, Real squaredLength, ImmutableArray<Point> holds)
    {
        Start = start;
        Direction = direction;
        DirectionSquared = squaredLength;
        Holds = holds;
    }

    /// <summary>The first point it was ruled through.</summary>
    public Point Start { get; }

    /// <summary>The way it runs; of any length but zero.</summary>
    public Vector Direction { get; }

    /// <summary>The square of the direction's length; a value known more simply than by its parts, where there is one.</summary>
    public Real DirectionSquared { get; }

    /// <inheritdoc/>
    public override ImmutableArray<Point> Holds { get; }

    /// <summary>The direction's length.</summary>
    public Real DirectionLength => Real.Sqrt(DirectionSquared);

    /// <summary>The line from <paramref name="first"/> to <paramref name="second"/>, which the caller has decided to be two points.</summary>
    public static Line Through(Point first, Point second)
    {
        Vector direction = second.From(first);
        return new(first, direction, first.SquaredDistanceTo(second), [first, second]);
    }

    /// <summary>The line through <paramref name="start"/> along <paramref name="direction"/>, whose squared length may be known more simply.</summary>
    public static Line Along(Point start, Vector direction, Real? squaredLength = null) => new(start, direction, squaredLength ?? direction.SquaredLength, [start]);

    /// <summary>Through <paramref name="point"/>, a quarter turn anticlockwise from this line.</summary>
    public Line SquareThrough(Point point) => new(point, Direction.QuarterTurn, DirectionSquared, [point]);

    /// <summary>Through <paramref name="point"/>, as this line runs.</summary>
    public Line ParallelThrough(Point point) => new(point, Direction, DirectionSquared, [point]);

    /// <summary>Through <paramref name="point"/>, as this line runs, turned by <paramref name="angle"/> anticlockwise.</summary>
    public Line TurnedThrough(Point point, Angle angle) => new(point, Direction.Turned(angle), DirectionSquared, [point]);

    /// <summary>The same line the other way.</summary>
    public Line Reversed() => new(Start, -Direction, DirectionSquared, Holds);

    /// <summary>The same line with more points known to lie on it; the direction and start stay.</summary>
    public Line WithPoints(params ReadOnlySpan<Point> points) => new(Start, Direction, DirectionSquared, [.. Holds, .. points]);

    /// <summary>Twice the area of the triangle that the direction makes with <paramref name="point"/>: positive on the left, zero on the line.</summary>
    public Real SideOf(Point point) => Vector.Cross(Direction, point.From(Start));

    /// <summary>How far along the line <paramref name="point"/> lies from <paramref name="origin"/>, times the direction's length.</summary>
    public Real Along(Point point, Point origin) => Vector.Dot(Direction, point.From(origin));

    /// <summary>The foot of the perpendicular from <paramref name="point"/>.</summary>
    public Point FootOf(Point point) => Start.Plus(Along(point, Start) / DirectionSquared * Direction);

    /// <summary>The mirror image of <paramref name="point"/>.</summary>
    public Point MirrorOf(Point point)
    {
        Vector across = SideOf(point) / DirectionSquared * Direction.QuarterTurn;
        return point.Plus(-2 * across);
    }
}
