using RuleAndCompass.Geometry;

namespace RuleAndCompass.Bench;

/// <summary>How squarely two curves cross.</summary>
public static class CrossingAngle
{
    /// <summary>The smaller angle between the curves at <paramref name="at"/>, degrees from 0 (they touch) to 90.</summary>
    public static double Degrees(Curve first, Curve second, Point at)
    {
        (double ax, double ay) = Tangent(first, at);
        (double bx, double by) = Tangent(second, at);
        return Math.Atan2(Math.Abs((ax * by) - (ay * bx)), Math.Abs((ax * bx) + (ay * by))) * 180 / Math.PI;
    }

    private static (double X, double Y) Tangent(Curve curve, Point at) => curve switch
    {
        Line line => (line.Direction.X.ToDouble(), line.Direction.Y.ToDouble()),
        Circle circle => (circle.Centre.YMillimetres - at.YMillimetres, at.XMillimetres - circle.Centre.XMillimetres),
        _ => throw new System.Diagnostics.UnreachableException($"No tangent of {curve.GetType().Name}."),
    };
}
