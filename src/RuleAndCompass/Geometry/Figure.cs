using System.Collections.Immutable;

namespace RuleAndCompass.Geometry;

/// <summary>A point, a line or a circle: exact, immutable. Lengths are millimetres, x to the right, y up, the origin in the middle of the sheet.</summary>
public abstract class Figure;

/// <summary>A line or a circle.</summary>
public abstract class Curve : Figure
{
    /// <summary>Points the curve was made through: they need no test.</summary>
    public abstract ImmutableArray<Point> Holds { get; }

    /// <summary>Points known to lie on the curve when it was made: those it holds, and what follows from equal openings.</summary>
    public virtual IEnumerable<Point> KnownPoints => Holds;

    /// <summary>True where <paramref name="point"/> lies on the curve by the way one of them was made. False says nothing.</summary>
    public virtual bool IsKnownToHold(Point point) => Holds.Contains(point) || point.MadeOn.Contains(this);
}
