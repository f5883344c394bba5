using RuleAndCompass.Numbers;

namespace RuleAndCompass.Geometry;

/// <summary>A circle about <see cref="Centre"/>.</summary>
public sealed class Circle(Point centre, Real radiusSquared, Real? radius = null) : Curve
{
    private Real? radius = radius;

    /// <summary>Where the needle stands.</summary>
    public Point Centre { get; } = centre;

    /// <summary>In square millimetres, greater than zero.</summary>
    public Real RadiusSquared { get; } = radiusSquared;

    /// <summary>In millimetres; its root is taken when first asked for.</summary>
    public Real Radius => radius ??= Real.Sqrt(RadiusSquared);
}
