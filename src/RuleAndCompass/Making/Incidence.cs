using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making;

/// <summary>Whether a point lies on a curve, by the way they were made or by decision.</summary>
internal static class Incidence
{
    public static bool Holds(Point point, Curve curve, Decider decider) => curve.IsKnownToHold(point) || curve switch
    {
        Line line => decider.IsZero(line.SideOf(point)),
        Circle circle => decider.IsZero(circle.PowerOf(point)),
        _ => false,
    };

    /// <summary>How far off it lies, in words.</summary>
    public static string Distance(Point point, Curve curve) => curve switch
    {
        Line line => $"it lies {ValueText.Decimals(Math.Abs((line.SideOf(point) / line.DirectionLength).ToDouble()), 6)} mm off the line",
        Circle circle => $"it lies {ValueText.Decimals(Math.Abs((point.DistanceTo(circle.Centre) - circle.Radius).ToDouble()), 6)} mm off the circle",
        _ => "",
    };
}
