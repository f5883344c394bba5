using System.Collections.Immutable;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Geometry;

/// <summary>A circle about <see cref="Centre"/>.</summary>
public sealed class Circle : Curve
{
    private Real? radius;

    private Circle(Point centre, Real radiusSquared, Real? radius, ImmutableArray<Point> holds)
    {
        Centre = centre;
        RadiusSquared = radiusSquared;
        this.radius = radius;
        Holds = holds;
    }

    /// <summary>Where the needle stands.</summary>
    public Point Centre { get; }

    /// <summary>In square millimetres, greater than zero.</summary>
    public Real RadiusSquared { get; }

    /// <summary>In millimetres; its root is taken when first asked for.</summary>
    public Real Radius => radius ??= Real.Sqrt(RadiusSquared);

    /// <inheritdoc/>
    public override ImmutableArray<Point> Holds { get; }

    /// <summary>
    /// What it holds, and the centres of earlier arcs of the same opening on which its own centre lies: dividers walked at one setting pass back
    /// through where they came from.
    /// </summary>
    public override IEnumerable<Point> KnownPoints
    {
        get
        {
            foreach (Point point in Holds)
                yield return point;
            foreach (Curve curve in Centre.MadeOn)
                if (curve is Circle earlier && ReferenceEquals(earlier.RadiusSquared, RadiusSquared))
                    yield return earlier.Centre;
        }
    }

    /// <inheritdoc/>
    public override bool IsKnownToHold(Point point) => base.IsKnownToHold(point) || KnownPoints.Contains(point);

    /// <summary>About <paramref name="centre"/> through <paramref name="rim"/>, which the caller has decided to be two points.</summary>
    public static Circle Through(Point centre, Point rim) => new(centre, centre.SquaredDistanceTo(rim), null, [rim]);

    /// <summary>About <paramref name="centre"/> with a radius in millimetres that the caller has decided to be positive.</summary>
    public static Circle WithRadius(Point centre, Real radius) => new(centre, radius * radius, radius, []);

    /// <summary>About <paramref name="centre"/> with the opening of another circle, or its square.</summary>
    public static Circle WithSquaredRadius(Point centre, Real radiusSquared, Real? radius = null) => new(centre, radiusSquared, radius, []);

    /// <summary>The same circle with more points known to lie on it.</summary>
    public Circle WithPoints(params ReadOnlySpan<Point> points) => new(Centre, RadiusSquared, radius, [.. Holds, .. points]);

    /// <summary>The power of <paramref name="point"/>: negative inside, zero on the circle, positive outside.</summary>
    /// <remarks>Coxeter and Greitzer, Geometry Revisited (1967), §2.1.</remarks>
    public Real PowerOf(Point point) => point.From(Centre).SquaredLength - RadiusSquared;
}
