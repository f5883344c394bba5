using System.Collections.Immutable;
using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>
/// An exact angle: a sum of a rational number of degrees, rational multiples of given angles, and rational multiples of the
/// angles of exact vectors. It counts turns, so 540° is not 180°.
/// </summary>
public sealed class Angle
{
    private readonly Rational degrees;
    private readonly ImmutableArray<(AngleSource Source, Rational Multiple)> sources;
    private readonly ImmutableArray<(VectorSource Source, Rational Multiple)> vectors;
    private (Real X, Real Y)? unit;
    private (Real X, Real Y)? vector;
    private Real? size;

    private Angle(
        Rational degrees,
        ImmutableArray<(AngleSource Source, Rational Multiple)> sources,
        ImmutableArray<(VectorSource Source, Rational Multiple)> vectors)
    {
        this.degrees = degrees;
        this.sources = sources;
        this.vectors = vectors;
    }

    /// <summary>0°.</summary>
    public static Angle Zero { get; } = new(Rational.Zero, [], []);

    /// <summary>True where the angle's cosine and sine are exact; parts other than whole, half, quarter … multiples of a vector's angle are not.</summary>
    public bool HasExactDirection
    {
        get
        {
            foreach ((AngleSource source, _) in sources)
            {
                if (!source.Degrees.TryGetRational(out _))
                    return false;
            }

            foreach ((_, Rational multiple) in vectors)
            {
                if (!multiple.Denominator.IsPowerOfTwo)
                    return false;
            }

            return true;
        }
    }

    /// <summary>The first part of the unit vector of this angle. An enclosure-only quantity where the direction is not exact.</summary>
    public Real Cosine => Unit.X;

    /// <summary>The second part of the unit vector of this angle. An enclosure-only quantity where the direction is not exact.</summary>
    public Real Sine => Unit.Y;

    /// <summary>A vector of this direction, of any length: fewer roots than the unit vector where there is a choice.</summary>
    public (Real X, Real Y) Vector => vector ??= MakeVector();

    /// <summary>The size in degrees as a real number; rational where it is, else a quantity with enclosures only.</summary>
    public Real Degrees => size ??= MakeDegrees();

    private (Real X, Real Y) Unit => unit ??= MakeUnit();

    /// <summary>A written angle.</summary>
    public static Angle FromDegrees(Rational degrees) => new(degrees, [], []);

    /// <summary>An angle given in the script: identities are sought for every value of it (in the range, where there is one; degrees).</summary>
    public static Angle Given(string name, Rational degrees, Rational? from = null, Rational? to = null) =>
        new(Rational.Zero, [(new AngleSource(name, degrees, from, to), Rational.One)], []);

    /// <summary>The angle of the vector (x, y) from right, anticlockwise, in (−180°, 180°]. The caller has decided that it is no zero vector.</summary>
    public static Angle OfVector(Real x, Real y)
    {
        if (x.TryGetRational(out Rational p) && y.TryGetRational(out Rational q))
        {
            // The axes and their bisectors are the rational vectors with a rational number of degrees.
            if (q.IsZero)
                return FromDegrees(p.Sign < 0 ? 180 : 0);
            if (p.IsZero)
                return FromDegrees(90 * q.Sign);
            if (p.Abs() == q.Abs())
                return FromDegrees(p.Sign > 0 ? 45 * q.Sign : 135 * q.Sign);
        }

        return new(Rational.Zero, [], [(new VectorSource(x, y), Rational.One)]);
    }

    /// <summary>An angle known by a real number of degrees that need not be rational (a declination, π times something): enclosures only.</summary>
    public static Angle FromDegrees(Real degrees) => degrees.TryGetRational(out Rational rational)
        ? FromDegrees(rational)
        : new(Rational.Zero, [(new AngleSource(null, degrees), Rational.One)], []);

    /// <summary>The sum.</summary>
    public static Angle operator +(Angle a, Angle b) =>
        new(a.degrees + b.degrees, Sum(a.sources, b.sources, Rational.One), Sum(a.vectors, b.vectors, Rational.One));

    /// <summary>The difference.</summary>
    public static Angle operator -(Angle a, Angle b) =>
        new(a.degrees - b.degrees, Sum(a.sources, b.sources, -1), Sum(a.vectors, b.vectors, -1));

    /// <summary>The same size the other way.</summary>
    public static Angle operator -(Angle a) => -1 * a;

    /// <summary>A multiple or a part.</summary>
    public static Angle operator *(Rational factor, Angle a) => factor.IsZero ? Zero : new(
        factor * a.degrees,
        [.. a.sources.Select(term => (term.Source, factor * term.Multiple))],
        [.. a.vectors.Select(term => (term.Source, factor * term.Multiple))]);

    /// <summary>The whole value as degrees when it is exactly a rational number of them, given angles counted by their value.</summary>
    public bool TryGetDegrees(out Rational degrees)
    {
        degrees = this.degrees;
        foreach ((AngleSource source, Rational multiple) in sources)
        {
            if (!source.Degrees.TryGetRational(out Rational value))
                return false;
            degrees += multiple * value;
        }

        return vectors.IsEmpty;
    }

    /// <summary>The size in degrees, within one unit in the last place.</summary>
    public double ToDegreesDouble() => Degrees.ToDouble();

    /// <summary>This angle times the least whole number that gives it an exact direction, as far as vectors go.</summary>
    internal Angle WithDirection(out BigInteger multiple)
    {
        multiple = BigInteger.One;
        foreach ((_, Rational factor) in vectors)
        {
            BigInteger odd = factor.Denominator;
            while (odd.IsEven)
                odd >>= 1;
            multiple = multiple * odd / BigInteger.GreatestCommonDivisor(multiple, odd);
        }

        return multiple.IsOne ? this : (Rational)multiple * this;
    }

    private static ImmutableArray<(T Source, Rational Multiple)> Sum<T>(
        ImmutableArray<(T Source, Rational Multiple)> first,
        ImmutableArray<(T Source, Rational Multiple)> second,
        Rational factor)
        where T : class
    {
        if (second.IsEmpty)
            return first;

        List<(T Source, Rational Multiple)> sum = [.. first];
        foreach ((T source, Rational multiple) in second)
        {
            int at = sum.FindIndex(term => ReferenceEquals(term.Source, source));
            Rational total = factor * multiple + (at < 0 ? Rational.Zero : sum[at].Multiple);
            if (at < 0)
                sum.Add((source, total));
            else if (total.IsZero)
                sum.RemoveAt(at);
            else
                sum[at] = (source, total);
        }

        return [.. sum];
    }

    private static (Real X, Real Y) Power((Real X, Real Y) unit, BigInteger exponent)
    {
        if (exponent.Sign < 0)
            return Power((unit.X, -unit.Y), -exponent);

        (Real X, Real Y) result = unit;
        for (int bit = (int)exponent.GetBitLength() - 2; bit >= 0; bit--)
        {
            result = Constructible.Product(result, result);
            if (!((exponent >> bit) & 1).IsZero)
                result = Constructible.Product(result, unit);
        }

        return result;
    }

    private static (Real X, Real Y) Times((Real X, Real Y)? a, (Real X, Real Y) b) => a is { } first ? Constructible.Product(first, b) : b;

    private (Real X, Real Y) MakeUnit()
    {
        (Real X, Real Y)? product = null;
        (Rational part, Rational rest) = Constructible.Split(degrees);
        part = Constructible.Turned(part, 360);
        if (!part.IsZero)
            product = Constructible.Unit(part);
        product = TimesSources(product, rest);
        foreach ((VectorSource source, Rational multiple) in vectors)
            product = Times(product, UnitOf(source, multiple));

        return product ?? (Real.One, Real.Zero);
    }

    private (Real X, Real Y) MakeVector()
    {
        (Real X, Real Y)? product = null;
        (Rational part, Rational rest) = Constructible.Split(degrees);
        part = Constructible.Turned(part, 360);
        if (!part.IsZero)
            product = Constructible.Vector(part);
        product = TimesSources(product, rest);
        foreach ((VectorSource source, Rational multiple) in vectors)
        {
            Rational twice = 2 * multiple;
            (Real X, Real Y) factor = multiple.IsInteger ? Power((source.X, source.Y), multiple.Numerator)
                : twice.IsInteger ? Power(source.Half(), twice.Numerator)
                : UnitOf(source, multiple);
            product = Times(product, factor);
        }

        return product ?? (Real.One, Real.Zero);
    }

    private (Real X, Real Y)? TimesSources((Real X, Real Y)? product, Rational rest)
    {
        if (!rest.IsZero)
            product = Times(product, Direction(AngleSource.WrittenDegree, rest));
        foreach ((AngleSource source, Rational multiple) in sources)
            product = Times(product, Direction(source, multiple));
        return product;
    }

    private static (Real X, Real Y) Direction(AngleSource source, Rational multiple) =>
        (new DirectionReal(source, multiple, isSine: false), new DirectionReal(source, multiple, isSine: true));

    private static (Real X, Real Y) UnitOf(VectorSource source, Rational multiple) => multiple.Denominator.IsPowerOfTwo
        ? Power(source.Unit((int)multiple.Denominator.GetBitLength() - 1), multiple.Numerator)
        : Direction(source.Source, multiple);

    private Real MakeDegrees()
    {
        Rational rational = degrees;
        Real sum = Real.Zero;
        foreach ((AngleSource source, Rational multiple) in sources)
        {
            if (source.Degrees.TryGetRational(out Rational value))
                rational += multiple * value;
            else
                sum += (Real)multiple * source.Degrees;
        }

        foreach ((VectorSource source, Rational multiple) in vectors)
            sum += (Real)multiple * source.Degrees;
        return sum + rational;
    }
}
