using System.Collections.Immutable;

namespace RuleAndCompass.Bench;

/// <summary>
/// How a measured quantity follows from the marks: the left side of a comparison, to be worked out again with the hand's errors in it.
/// Lengths are millimetres, angles degrees.
/// </summary>
public abstract record Measure;

/// <summary>A part that does not depend on marks.</summary>
public sealed record ConstantMeasure(double Value) : Measure;

/// <summary>From point to point.</summary>
public sealed record PointDistance(PointMark First, PointMark Second) : Measure;

/// <summary>From point to line, square to it, not negative.</summary>
public sealed record LineDistance(PointMark Point, LineMark Line) : Measure;

/// <summary>The angle from one line's direction to another's in (−180°, 180°], counted in the way said; a name may run against its mark.</summary>
public sealed record LineTurn(LineMark From, bool FromReversed, LineMark To, bool ToReversed, bool Clockwise) : Measure;

/// <summary>The angle at a corner, 0° to 180°.</summary>
public sealed record CornerAngle(PointMark First, PointMark Corner, PointMark Second) : Measure;

/// <summary>A circle's radius.</summary>
public sealed record CircleRadius(CircleMark Circle) : Measure;

/// <summary>A point's place on the sheet, or from another point where one is named.</summary>
public sealed record PointCoordinate(PointMark Point, bool IsX, PointMark? From = null) : Measure;

/// <summary>The functions of the language (<c>+ - * / sqrt sin cos tan asin acos atan abs min max</c>) of measures; angles in degrees.</summary>
public sealed record FunctionMeasure(string Function, ImmutableArray<Measure> Arguments) : Measure;
