namespace RuleAndCompass.Numbers;

/// <summary>
/// An exact angle: a sum of a rational number of degrees, rational multiples of given angles, and rational multiples of the
/// angles of exact vectors. It counts turns, so 540° is not 180°.
/// </summary>
public sealed class Angle
{
    public static Angle Zero => throw new NotImplementedException();
    public static Angle FromDegrees(Rational degrees) => throw new NotImplementedException();
    /// <summary>An angle given in the script: identities are sought for every value of it (in the range, where there is one; degrees).</summary>
    public static Angle Given(string name, Rational degrees, Rational? from = null, Rational? to = null) => throw new NotImplementedException();
    /// <summary>The angle of the vector (x, y) from right, anticlockwise, in (−180°, 180°]. The caller has decided that it is no zero vector.</summary>
    public static Angle OfVector(Real x, Real y) => throw new NotImplementedException();
    /// <summary>An angle known by a real number of degrees that need not be rational (a declination, π times something): enclosures only.</summary>
    public static Angle FromDegrees(Real degrees) => throw new NotImplementedException();
    public static Angle operator +(Angle a, Angle b) => throw new NotImplementedException();
    public static Angle operator -(Angle a, Angle b) => throw new NotImplementedException();
    public static Angle operator -(Angle a) => throw new NotImplementedException();
    public static Angle operator *(Rational factor, Angle a) => throw new NotImplementedException();
    /// <summary>The whole value as degrees when it is exactly a rational number of them, given angles counted by their value.</summary>
    public bool TryGetDegrees(out Rational degrees) => throw new NotImplementedException();
    /// <summary>True where the angle's cosine and sine are exact; parts other than whole, half, quarter … multiples of a vector's angle are not.</summary>
    public bool HasExactDirection => throw new NotImplementedException();
    /// <summary>The unit vector of this angle. An enclosure-only quantity where the direction is not exact.</summary>
    public Real Cosine => throw new NotImplementedException();
    public Real Sine => throw new NotImplementedException();
    /// <summary>A vector of this direction, of any length: fewer roots than the unit vector where there is a choice.</summary>
    public (Real X, Real Y) Vector => throw new NotImplementedException();
    /// <summary>The size in degrees as a real number; rational where it is, else a quantity with enclosures only.</summary>
    public Real Degrees => throw new NotImplementedException();
    public double ToDegreesDouble() => throw new NotImplementedException();
}
