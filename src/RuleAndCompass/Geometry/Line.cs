using RuleAndCompass.Numbers;

namespace RuleAndCompass.Geometry;

/// <summary>A directed line: it runs from <see cref="Start"/> along (<see cref="Dx"/>, <see cref="Dy"/>), which need not be of unit length.</summary>
public sealed class Line(Point start, Real dx, Real dy) : Curve
{
    /// <summary>The first point it was ruled through.</summary>
    public Point Start { get; } = start;

    /// <summary>The direction's part to the right.</summary>
    public Real Dx { get; } = dx;

    /// <summary>The direction's part up.</summary>
    public Real Dy { get; } = dy;
}
