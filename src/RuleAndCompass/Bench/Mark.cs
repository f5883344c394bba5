using RuleAndCompass.Geometry;

namespace RuleAndCompass.Bench;

/// <summary>Something that stands on the stock, made by one act: a pricked point, a drawn line, a struck circle.</summary>
/// <param name="name">As the script names it first (<c>hour[3]</c>, <c>dial.T[2]</c>); generated for auxiliary marks.</param>
/// <param name="isAuxiliary">True where no sentence names it.</param>
public abstract class Mark(string name, bool isAuxiliary)
{
    /// <summary>Unique in the layout.</summary>
    public string Name { get; } = name;

    /// <summary>True where no sentence names it: lowering needed it.</summary>
    public bool IsAuxiliary { get; } = isAuxiliary;

    /// <summary>The exact figure.</summary>
    public abstract Figure Figure { get; }
}

/// <summary>A pricked point.</summary>
public sealed class PointMark(string name, Point point, bool isAuxiliary) : Mark(name, isAuxiliary)
{
    /// <inheritdoc/>
    public override Figure Figure => Point;

    /// <summary>Where it is.</summary>
    public Point Point { get; } = point;
}

/// <summary>A line or a circle that stands on the stock.</summary>
public abstract class CurveMark(string name, bool isAuxiliary) : Mark(name, isAuxiliary)
{
    /// <inheritdoc/>
    public sealed override Figure Figure => Curve;

    /// <summary>Where it runs.</summary>
    public abstract Curve Curve { get; }
}

/// <summary>A drawn line, in the direction of the act that made it.</summary>
public sealed class LineMark(string name, Line line, bool isAuxiliary) : CurveMark(name, isAuxiliary)
{
    /// <inheritdoc/>
    public override Curve Curve => Line;

    /// <summary>Where it runs.</summary>
    public Line Line { get; } = line;
}

/// <summary>A struck circle, or an arc of it.</summary>
public sealed class CircleMark(string name, Circle circle, bool isAuxiliary) : CurveMark(name, isAuxiliary)
{
    /// <inheritdoc/>
    public override Curve Curve => Circle;

    /// <summary>Where it runs.</summary>
    public Circle Circle { get; } = circle;
}
