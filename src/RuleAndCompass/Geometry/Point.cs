using System.Collections.Immutable;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Geometry;

/// <summary>An exact point.</summary>
/// <param name="x">Millimetres right of the sheet's middle.</param>
/// <param name="y">Millimetres above the sheet's middle.</param>
/// <param name="madeOn">Curves it is known to lie on, because it was made as a point of them.</param>
public sealed class Point(Real x, Real y, ImmutableArray<Curve> madeOn = default) : Figure
{
    /// <summary>Millimetres right of the sheet's middle.</summary>
    public Real X { get; } = x;

    /// <summary>Millimetres above the sheet's middle.</summary>
    public Real Y { get; } = y;

    /// <summary>Curves it is known to lie on, because it was made as a point of them.</summary>
    public ImmutableArray<Curve> MadeOn { get; } = madeOn.IsDefault ? [] : madeOn;

    /// <summary>The double nearest to <see cref="X"/>, millimetres.</summary>
    public double XMillimetres => X.ToDouble();

    /// <summary>The double nearest to <see cref="Y"/>, millimetres.</summary>
    public double YMillimetres => Y.ToDouble();

    /// <summary>From <paramref name="origin"/> to this point.</summary>
    public Vector From(Point origin) => new(X - origin.X, Y - origin.Y);

    /// <summary>The point reached by going <paramref name="step"/> from here.</summary>
    public Point Plus(Vector step) => new(X + step.X, Y + step.Y);

    /// <summary>
    /// The square of the distance to <paramref name="other"/>, square millimetres. Where one is known to lie on a circle about the other, that circle's
    /// own value is given and nothing is computed.
    /// </summary>
    public Real SquaredDistanceTo(Point other) => RadiusTowards(other) is { } known ? known.RadiusSquared : other.From(this).SquaredLength;

    /// <summary>The distance to <paramref name="other"/>, millimetres; the radius of a circle that is known to make it, where there is one.</summary>
    public Real DistanceTo(Point other) => RadiusTowards(other) is { } known ? known.Radius : other.From(this).Length;

    private Circle? RadiusTowards(Point other) => CircleAbout(this, other) ?? CircleAbout(other, this);

    private static Circle? CircleAbout(Point centre, Point rim)
    {
        foreach (Curve curve in rim.MadeOn)
            if (curve is Circle circle && ReferenceEquals(circle.Centre, centre))
                return circle;
        return null;
    }
}
