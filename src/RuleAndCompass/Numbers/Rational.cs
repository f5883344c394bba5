using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>An exact fraction in lowest terms with a positive denominator; <c>default</c> is zero.</summary>
public readonly struct Rational : IEquatable<Rational>, IComparable<Rational>
{
    public Rational(BigInteger numerator, BigInteger denominator) => throw new NotImplementedException();
    public static Rational Zero => default;
    public static Rational One => throw new NotImplementedException();
    public BigInteger Numerator => throw new NotImplementedException();
    public BigInteger Denominator => throw new NotImplementedException();
    public bool IsZero => throw new NotImplementedException();
    public bool IsInteger => throw new NotImplementedException();
    public int Sign => throw new NotImplementedException();
    public static implicit operator Rational(int value) => throw new NotImplementedException();
    public static implicit operator Rational(BigInteger value) => throw new NotImplementedException();
    public static Rational operator +(Rational a, Rational b) => throw new NotImplementedException();
    public static Rational operator -(Rational a, Rational b) => throw new NotImplementedException();
    public static Rational operator *(Rational a, Rational b) => throw new NotImplementedException();
    public static Rational operator /(Rational a, Rational b) => throw new NotImplementedException();
    public static Rational operator -(Rational a) => throw new NotImplementedException();
    public static bool operator ==(Rational a, Rational b) => throw new NotImplementedException();
    public static bool operator !=(Rational a, Rational b) => throw new NotImplementedException();
    public static bool operator <(Rational a, Rational b) => throw new NotImplementedException();
    public static bool operator >(Rational a, Rational b) => throw new NotImplementedException();
    public static bool operator <=(Rational a, Rational b) => throw new NotImplementedException();
    public static bool operator >=(Rational a, Rational b) => throw new NotImplementedException();
    public Rational Abs() => throw new NotImplementedException();
    public BigInteger Floor() => throw new NotImplementedException();
    /// <summary>The exact value of a finite double.</summary>
    public static Rational FromDouble(double value) => throw new NotImplementedException();
    /// <summary>Reads <c>12</c>, <c>0.625</c>; exact.</summary>
    public static Rational ParseDecimal(string text) => throw new NotImplementedException();
    public double ToDouble() => throw new NotImplementedException();
    public int CompareTo(Rational other) => throw new NotImplementedException();
    public bool Equals(Rational other) => throw new NotImplementedException();
    public override bool Equals(object? obj) => throw new NotImplementedException();
    public override int GetHashCode() => throw new NotImplementedException();
    /// <summary><c>3</c>, <c>0.625</c> where the decimal ends within twelve places, else <c>22/7</c>.</summary>
    public override string ToString() => throw new NotImplementedException();
}
