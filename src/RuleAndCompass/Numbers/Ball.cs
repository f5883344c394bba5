using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>
/// All reals within <see cref="Radius"/> of <see cref="Middle"/>, both in units of 2^<see cref="Exponent"/>. Every operation encloses
/// the result for all reals of its operands. A negative radius says that nothing is known; <c>default</c> is exactly 0.
/// </summary>
/// <remarks>Midpoint-radius arithmetic: J. van der Hoeven, Ball arithmetic (2009); F. Johansson, IEEE Trans. Comput. 66 (2017).</remarks>
internal readonly struct Ball
{
    private const int RadiusBits = 30;

    // So that sums of exponents and shifts stay within an int.
    private const int MostExponent = 1 << 28;

    public readonly BigInteger Middle;
    public readonly int Exponent;
    public readonly long Radius;

    private Ball(BigInteger middle, int exponent, long radius)
    {
        Middle = middle;
        Exponent = exponent;
        Radius = radius;
    }

    /// <summary>Nothing is known.</summary>
    public static Ball Unknown => new(BigInteger.Zero, 0, -1);

    public bool IsUnknown => Radius < 0;

    public bool IsExact => Radius == 0;

    /// <summary>The sign where it is certain, else 0.</summary>
    public int Sign => IsUnknown || BigInteger.Abs(Middle) <= Radius ? 0 : Middle.Sign;

    public bool ContainsZero => IsUnknown || BigInteger.Abs(Middle) <= Radius;

    /// <summary>The ball about <paramref name="middle"/> × 2^<paramref name="exponent"/>, with the error of its last digits.</summary>
    public static Ball Around(BigInteger middle, int exponent, BigInteger radius, int bits) => Rounded(middle, exponent, radius, bits);

    public static Ball Of(Rational value, int bits)
    {
        if (value.IsInteger)
            return Rounded(value.Numerator, 0, BigInteger.Zero, bits);

        long shift = bits + 2 - (value.Numerator.GetBitLength() - value.Denominator.GetBitLength());
        BigInteger quotient = shift >= 0
            ? BigInteger.DivRem(value.Numerator << (int)shift, value.Denominator, out BigInteger remainder)
            : BigInteger.DivRem(value.Numerator, value.Denominator << (int)-shift, out remainder);
        return Rounded(quotient, (int)-shift, remainder.IsZero ? BigInteger.Zero : BigInteger.One, bits);
    }

    public static Ball Add(in Ball a, in Ball b, int bits) => Sum(a, b, 1, bits);

    public static Ball Subtract(in Ball a, in Ball b, int bits) => Sum(a, b, -1, bits);

    public static Ball Negate(in Ball a) => new(-a.Middle, a.Exponent, a.Radius);

    public static Ball Multiply(in Ball a, in Ball b, int bits)
    {
        if (a.IsUnknown || b.IsUnknown)
            return Unknown;

        BigInteger middle = a.Middle * b.Middle;
        if (a.Radius == 0 && b.Radius == 0)
            return Rounded(middle, a.Exponent + b.Exponent, BigInteger.Zero, bits);

        BigInteger radius = BigInteger.Abs(a.Middle) * b.Radius + BigInteger.Abs(b.Middle) * a.Radius + (BigInteger)a.Radius * b.Radius;
        return Rounded(middle, a.Exponent + b.Exponent, radius, bits);
    }

    /// <summary>Unknown where the divisor may be zero.</summary>
    public static Ball Divide(in Ball a, in Ball b, int bits)
    {
        if (a.IsUnknown || b.ContainsZero)
            return Unknown;

        BigInteger divisor = BigInteger.Abs(b.Middle);
        int shift = (int)Math.Max(0, bits + 2 + divisor.GetBitLength() - a.Middle.GetBitLength());
        BigInteger quotient = BigInteger.DivRem(a.Middle << shift, b.Middle, out BigInteger remainder);
        BigInteger radius = remainder.IsZero ? BigInteger.Zero : BigInteger.One;
        if (a.Radius != 0 || b.Radius != 0)
            radius = (((BigInteger)a.Radius << shift) + (BigInteger.Abs(quotient) + 1) * b.Radius) / (divisor - b.Radius) + 2;
        return Rounded(quotient, a.Exponent - b.Exponent - shift, radius, bits);
    }

    /// <summary>The root of the part that is not negative; the caller knows that the number is not.</summary>
    public static Ball Sqrt(in Ball a, int bits)
    {
        if (a.IsUnknown)
            return Unknown;

        if (a.Middle <= a.Radius)
        {
            // [0, √high], written as a ball.
            BigInteger high = a.Middle + a.Radius;
            if (high.Sign <= 0)
                return default;
            int even = a.Exponent & 1;
            BigInteger top = IntegerRoot.Floor((high << (60 + even))) + 1;
            BigInteger half = (top >> 1) + 1;
            return Rounded(half, (a.Exponent - even - 60) / 2, half, bits);
        }

        int shift = (int)Math.Max(0, 2 * bits + 4 - a.Middle.GetBitLength());
        if (((a.Exponent - shift) & 1) != 0)
            shift++;
        BigInteger scaled = a.Middle << shift;
        BigInteger root = IntegerRoot.Floor(scaled);
        BigInteger radius = a.Radius == 0 && root * root == scaled ? BigInteger.Zero : BigInteger.One;
        if (a.Radius != 0)
        {
            // √m − √(m − r) = r / (√m + √(m − r)).
            BigInteger low = IntegerRoot.Floor((a.Middle - a.Radius) << shift);
            radius = ((BigInteger)a.Radius << shift) / (root + low) + 2;
        }

        return Rounded(root, (a.Exponent - shift) / 2, radius, bits);
    }

    /// <summary>The same middle and a radius larger by the greatest size in <paramref name="by"/>.</summary>
    public Ball Widened(in Ball by, int bits)
    {
        if (IsUnknown || by.IsUnknown)
            return Unknown;

        Ball zero = Rounded(BigInteger.Zero, by.Exponent, BigInteger.Abs(by.Middle) + by.Radius, bits);
        return Sum(this, zero, 1, bits);
    }

    /// <summary>Whether every real in the ball is smaller in size than 2^<paramref name="exponent"/>.</summary>
    public bool IsBelow(int exponent)
    {
        if (IsUnknown)
            return false;
        BigInteger size = BigInteger.Abs(Middle) + Radius;
        return size.IsZero || size.GetBitLength() + Exponent <= exponent;
    }

    /// <summary>Every real in the ball is at most 2 to this in size; int.MinValue for exactly 0.</summary>
    public int MagnitudeBound()
    {
        BigInteger size = BigInteger.Abs(Middle) + Radius;
        return size.IsZero ? int.MinValue : (int)size.GetBitLength() + Exponent;
    }

    /// <summary>Doubles that enclose the ball.</summary>
    public (double Low, double High) ToDoubles()
    {
        if (IsUnknown)
            return (double.NegativeInfinity, double.PositiveInfinity);

        double low = ScaledDown(Middle - Radius);
        double high = -ScaledDown(-(Middle + Radius));
        return (low, high);
    }

    public Rational ToRational() => Exponent >= 0
        ? new Rational(Middle << Exponent, BigInteger.One)
        : new Rational(Middle, BigInteger.One << -Exponent);

    /// <summary>The upper or lower end.</summary>
    public Rational End(bool upper) => new Ball(upper ? Middle + Radius : Middle - Radius, Exponent, 0).ToRational();

    public BigInteger FloorAt(int exponent, bool upper)
    {
        BigInteger end = upper ? Middle + Radius : Middle - Radius;
        return Exponent >= exponent ? end << (Exponent - exponent) : end >> (exponent - Exponent);
    }

    // A double not above value × 2^Exponent.
    private double ScaledDown(BigInteger value)
    {
        if (value.IsZero)
            return 0;

        int drop = (int)Math.Max(0, value.GetBitLength() - 53);
        BigInteger kept = value >> drop;
        // The shift rounds down; a subnormal or huge result may round in ScaleB, and one step outward covers that.
        int exponent = Exponent + drop;
        double result = Math.ScaleB((double)kept, exponent);
        return exponent < -1074 || double.IsInfinity(result) ? Math.BitDecrement(result) : result;
    }

    private static Ball Sum(in Ball a, in Ball b, int sign, int bits)
    {
        if (a.IsUnknown || b.IsUnknown)
            return Unknown;

        if (b.Middle.IsZero && b.Radius == 0)
            return a;

        int exponent = Math.Min(a.Exponent, b.Exponent);
        int top = (int)Math.Max(a.Exponent + a.Middle.GetBitLength(), b.Exponent + b.Middle.GetBitLength());
        exponent = Math.Max(exponent, top - bits - 8);
        if (a.Radius != 0)
            exponent = Math.Max(exponent, a.Exponent + 64 - BitOperations.LeadingZeroCount((ulong)a.Radius) - RadiusBits);
        if (b.Radius != 0)
            exponent = Math.Max(exponent, b.Exponent + 64 - BitOperations.LeadingZeroCount((ulong)b.Radius) - RadiusBits);

        long radius = 0;
        BigInteger middle = Aligned(a, exponent, ref radius);
        BigInteger other = Aligned(b, exponent, ref radius);
        return Rounded(sign > 0 ? middle + other : middle - other, exponent, radius, bits);
    }

    private static BigInteger Aligned(in Ball ball, int exponent, ref long radius)
    {
        int shift = ball.Exponent - exponent;
        if (shift == 0)
        {
            radius += ball.Radius;
            return ball.Middle;
        }

        if (shift > 0)
        {
            radius += ball.Radius == 0 ? 0 : ball.Radius << shift;
            return ball.Middle << shift;
        }

        radius += (-shift >= 63 ? 0 : ball.Radius >> -shift) + 2;
        return ball.Middle >> -shift;
    }

    private static Ball Rounded(BigInteger middle, int exponent, BigInteger radius, int bits)
    {
        int drop = (int)Math.Max(Math.Max(0, middle.GetBitLength() - bits), radius.GetBitLength() - RadiusBits);
        if (Math.Abs((long)exponent + drop) > MostExponent)
            return Unknown;

        return drop == 0
            ? new Ball(middle, exponent, (long)radius)
            : new Ball(middle >> drop, exponent + drop, (long)(radius >> drop) + 2);
    }
}
