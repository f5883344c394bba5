using RuleAndCompass.Numbers;

namespace RuleAndCompass.Geometry;

/// <summary>An exact point.</summary>
public sealed class Point(Real x, Real y) : Figure
{
    private readonly List<Curve> curves = [];

    /// <summary>Millimetres right of the sheet's middle.</summary>
    public Real X { get; } = x;

    /// <summary>Millimetres above the sheet's middle.</summary>
    public Real Y { get; } = y;

    /// <summary>The double nearest to <see cref="X"/>, millimetres.</summary>
    public double XMillimetres => X.ToDouble();

    /// <summary>The double nearest to <see cref="Y"/>, millimetres.</summary>
    public double YMillimetres => Y.ToDouble();
}
