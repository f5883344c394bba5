using System.Globalization;
using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>An exact fraction in lowest terms with a positive denominator; <c>default</c> is zero.</summary>
public readonly struct Rational : IEquatable<Rational>, IComparable<Rational>
{
    private const int PlacesShown = 12;

    private readonly BigInteger numerator;

    // 0 stands for 1, so that default is a valid zero.
    private readonly BigInteger denominator;

    /// <summary>The fraction in lowest terms.</summary>
    /// <exception cref="DivideByZeroException">The denominator is 0.</exception>
    public Rational(BigInteger numerator, BigInteger denominator)
    {
        if (denominator.IsZero)
            throw new DivideByZeroException("A fraction has no denominator 0.");

        if (denominator.Sign < 0)
        {
            numerator = -numerator;
            denominator = -denominator;
        }

        if (!denominator.IsOne)
        {
            BigInteger common = BigInteger.GreatestCommonDivisor(numerator, denominator);
            if (!common.IsOne)
            {
                numerator /= common;
                denominator /= common;
            }
        }

        this.numerator = numerator;
        this.denominator = denominator.IsOne ? BigInteger.Zero : denominator;
    }

    private Rational(BigInteger integer) => numerator = integer;

    /// <summary>0.</summary>
    public static Rational Zero => default;

    /// <summary>1.</summary>
    public static Rational One => new(BigInteger.One);

    /// <summary>Carries the sign.</summary>
    public BigInteger Numerator => numerator;

    /// <summary>Greater than zero.</summary>
    public BigInteger Denominator => denominator.IsZero ? BigInteger.One : denominator;

    /// <summary>The length of both parts together.</summary>
    internal long Bits => numerator.GetBitLength() + denominator.GetBitLength();

    /// <summary>Whether this is 0.</summary>
    public bool IsZero => numerator.IsZero;

    /// <summary>Whether the denominator is 1.</summary>
    public bool IsInteger => denominator.IsZero;

    /// <summary>−1, 0 or 1.</summary>
    public int Sign => numerator.Sign;

    /// <summary>An integer as a fraction.</summary>
    public static implicit operator Rational(int value) => new((BigInteger)value);

    /// <summary>An integer as a fraction.</summary>
    public static implicit operator Rational(BigInteger value) => new(value);

    /// <summary>The sum.</summary>
    public static Rational operator +(Rational a, Rational b) => a.IsInteger && b.IsInteger
        ? new(a.numerator + b.numerator)
        : new(a.numerator * b.Denominator + b.numerator * a.Denominator, a.Denominator * b.Denominator);

    /// <summary>The difference.</summary>
    public static Rational operator -(Rational a, Rational b) => a.IsInteger && b.IsInteger
        ? new(a.numerator - b.numerator)
        : new(a.numerator * b.Denominator - b.numerator * a.Denominator, a.Denominator * b.Denominator);

    /// <summary>The product.</summary>
    public static Rational operator *(Rational a, Rational b) => a.IsInteger && b.IsInteger
        ? new(a.numerator * b.numerator)
        : new(a.numerator * b.numerator, a.Denominator * b.Denominator);

    /// <summary>The quotient.</summary>
    /// <exception cref="DivideByZeroException"><paramref name="b"/> is 0.</exception>
    public static Rational operator /(Rational a, Rational b) => new(a.numerator * b.Denominator, a.Denominator * b.numerator);

    /// <summary>The number with the other sign.</summary>
    public static Rational operator -(Rational a) => new(-a.numerator, a.denominator, lowest: true);

    /// <summary>Equality of value.</summary>
    public static bool operator ==(Rational a, Rational b) => a.Equals(b);

    /// <summary>Inequality of value.</summary>
    public static bool operator !=(Rational a, Rational b) => !a.Equals(b);

    /// <summary>Order of size.</summary>
    public static bool operator <(Rational a, Rational b) => a.CompareTo(b) < 0;

    /// <summary>Order of size.</summary>
    public static bool operator >(Rational a, Rational b) => a.CompareTo(b) > 0;

    /// <summary>Order of size.</summary>
    public static bool operator <=(Rational a, Rational b) => a.CompareTo(b) <= 0;

    /// <summary>Order of size.</summary>
    public static bool operator >=(Rational a, Rational b) => a.CompareTo(b) >= 0;

    /// <summary>The size without the sign.</summary>
    public Rational Abs() => numerator.Sign < 0 ? -this : this;

    /// <summary>The greatest integer not above this.</summary>
    public BigInteger Floor()
    {
        if (IsInteger)
            return numerator;

        BigInteger quotient = BigInteger.DivRem(numerator, denominator, out BigInteger remainder);
        return remainder.Sign < 0 ? quotient - 1 : quotient;
    }

    /// <summary>The exact value of a finite double.</summary>
    /// <exception cref="ArgumentException">Not finite.</exception>
    public static Rational FromDouble(double value)
    {
        if (!double.IsFinite(value))
            throw new ArgumentException("A fraction is finite.", nameof(value));

        long bits = BitConverter.DoubleToInt64Bits(value);
        int exponent = (int)((bits >> 52) & 0x7FF);
        long mantissa = bits & 0xFFFFFFFFFFFFFL;
        if (exponent == 0)
            exponent = 1;
        else
            mantissa |= 1L << 52;

        BigInteger signed = value < 0 ? -mantissa : mantissa;
        exponent -= 1075;
        return exponent >= 0 ? new(signed << exponent) : new(signed, BigInteger.One << -exponent);
    }

    /// <summary>Reads <c>12</c>, <c>0.625</c>; exact.</summary>
    /// <exception cref="FormatException">Not a plain decimal.</exception>
    public static Rational ParseDecimal(string text)
    {
        int point = text.IndexOf('.', StringComparison.Ordinal);
        if (point < 0)
            return new(BigInteger.Parse(text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture));

        if (point + 1 == text.Length)
            throw new FormatException("A decimal has digits after its point.");

        int places = text.Length - point - 1;
        BigInteger digits = BigInteger.Parse(text.Remove(point, 1), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
        return new(digits, BigInteger.Pow(10, places));
    }

    /// <summary>The nearest double; ties to even.</summary>
    public double ToDouble()
    {
        if (IsInteger && numerator.GetBitLength() <= 53)
            return (double)numerator;

        if (IsZero)
            return 0;

        // Scale so that the quotient has 64 or 65 bits, keep a sticky bit, and let one rounding step do the rest.
        BigInteger size = BigInteger.Abs(numerator);
        int shift = 65 - (int)(size.GetBitLength() - Denominator.GetBitLength());
        // Below the normal range the double keeps fewer bits; scaling less keeps the single rounding right.
        shift = Math.Min(shift, 1074 + 2);
        BigInteger quotient = shift >= 0
            ? BigInteger.DivRem(size << shift, Denominator, out BigInteger remainder)
            : BigInteger.DivRem(size, Denominator << -shift, out remainder);
        long length = quotient.GetBitLength();
        long lowest = Math.Max(length - 53, shift - 1074);
        if (lowest > 0)
        {
            BigInteger kept = quotient >> (int)lowest;
            BigInteger rest = quotient - (kept << (int)lowest);
            int half = rest.CompareTo(BigInteger.One << (int)(lowest - 1));
            if (half > 0 || half == 0 && (!remainder.IsZero || !kept.IsEven))
                kept += 1;
            double value = Math.ScaleB((double)kept, (int)(lowest - shift));
            return numerator.Sign < 0 ? -value : value;
        }

        double small = Math.ScaleB((double)quotient, -shift);
        return numerator.Sign < 0 ? -small : small;
    }

    /// <inheritdoc/>
    public int CompareTo(Rational other)
    {
        if (IsInteger && other.IsInteger)
            return numerator.CompareTo(other.numerator);

        return (numerator * other.Denominator).CompareTo(other.numerator * Denominator);
    }

    /// <inheritdoc/>
    public bool Equals(Rational other) => numerator == other.numerator && denominator == other.denominator;

    /// <inheritdoc/>
    public override bool Equals(object? obj) => obj is Rational other && Equals(other);

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(numerator, denominator);

    /// <summary><c>3</c>, <c>0.625</c> where the decimal ends within twelve places, else <c>22/7</c>.</summary>
    public override string ToString()
    {
        if (IsInteger)
            return numerator.ToString(CultureInfo.InvariantCulture);

        BigInteger scale = BigInteger.Pow(10, PlacesShown);
        if (!(scale % denominator).IsZero)
            return string.Create(CultureInfo.InvariantCulture, $"{numerator}/{denominator}");

        return DecimalText.Write(numerator * (scale / denominator), PlacesShown, trim: true);
    }

    private Rational(BigInteger numerator, BigInteger denominator, bool lowest)
    {
        _ = lowest;
        this.numerator = numerator;
        this.denominator = denominator;
    }
}
