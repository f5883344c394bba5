using RuleAndCompass.Numbers;

namespace RuleAndCompass.Geometry;

/// <summary>An exact step or direction in the plane, millimetres where it is a step.</summary>
public readonly record struct Vector(Real X, Real Y)
{
    /// <summary>The scalar product with itself.</summary>
    public Real SquaredLength => (X * X) + (Y * Y);

    /// <summary>Not negative.</summary>
    public Real Length => Real.Sqrt(SquaredLength);

    /// <summary>A quarter turn anticlockwise from this.</summary>
    public Vector QuarterTurn => new(-Y, X);

    /// <summary>The scalar product.</summary>
    public static Real Dot(Vector a, Vector b) => (a.X * b.X) + (a.Y * b.Y);

    /// <summary>The signed area of the parallelogram: positive where <paramref name="b"/> lies to the left of <paramref name="a"/>.</summary>
    public static Real Cross(Vector a, Vector b) => (a.X * b.Y) - (a.Y * b.X);

    /// <summary>The sum.</summary>
    public static Vector operator +(Vector a, Vector b) => new(a.X + b.X, a.Y + b.Y);

    /// <summary>The difference.</summary>
    public static Vector operator -(Vector a, Vector b) => new(a.X - b.X, a.Y - b.Y);

    /// <summary>The opposite.</summary>
    public static Vector operator -(Vector a) => new(-a.X, -a.Y);

    /// <summary>A multiple.</summary>
    public static Vector operator *(Real factor, Vector a) => new(factor * a.X, factor * a.Y);

    /// <summary>This vector turned by <paramref name="angle"/> anticlockwise; its length stays.</summary>
    public Vector Turned(Angle angle)
    {
        Real cosine = angle.Cosine, sine = angle.Sine;
        return new((X * cosine) - (Y * sine), (X * sine) + (Y * cosine));
    }
}
