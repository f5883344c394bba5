namespace RuleAndCompass.Geometry;

/// <summary>A point, a line or a circle: exact, immutable. Lengths are millimetres, x to the right, y up, the origin in the middle of the sheet.</summary>
public abstract class Figure;

/// <summary>A line or a circle.</summary>
public abstract class Curve : Figure;
