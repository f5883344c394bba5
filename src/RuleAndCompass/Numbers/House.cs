using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>
/// Bounds for a number written as u/(d l), where u and l are algebraic integers and d is an integer: binary logarithms of the size of every
/// conjugate of u and of l. Sums share what they can of d, so that a long chain over one denominator stays small.
/// </summary>
/// <remarks>C. Burnikel, R. Fleischer, K. Mehlhorn and S. Schirra, A strong and easily computable separation bound, Algorithmica 27 (2000).</remarks>
internal readonly record struct House(double Upper, double Lower, BigInteger Denominator)
{
    // Longer denominators are followed by their logarithm alone.
    private const int MostBits = 100_000;

    private double LogDenominator => Log(Denominator);

    public static House Of(Rational value) => Shortened(Log(value.Numerator), 0, value.Denominator);

    public static House Apply(Operation operation, in House a, in House b) => operation switch
    {
        Operation.Multiply => Shortened(a.Upper + b.Upper, a.Lower + b.Lower, a.Denominator * b.Denominator),
        // The divisor's u comes below; its d l comes above.
        Operation.Divide => Shortened(a.Upper + b.Lower + b.LogDenominator, a.Lower + b.Upper, a.Denominator),
        // √(u/(d l)) = √(u d l)/(d l).
        Operation.Sqrt => a with { Upper = (a.Upper + a.Lower + a.LogDenominator) / 2 },
        _ => Sum(a, b),
    };

    public static double Log(BigInteger value) => value.IsZero ? double.NegativeInfinity : value.GetBitLength();

    public House Better(in House other) => other.Size < Size ? other : this;

    private double Size => Upper + Lower + LogDenominator;

    private static House Sum(in House a, in House b)
    {
        BigInteger common = BigInteger.GreatestCommonDivisor(a.Denominator, b.Denominator);
        BigInteger forA = b.Denominator / common;
        BigInteger forB = a.Denominator / common;
        double first = a.Upper + b.Lower + (forA.IsOne ? 0 : Log(forA));
        double second = b.Upper + a.Lower + (forB.IsOne ? 0 : Log(forB));
        return Shortened(Math.Max(first, second) + 1, a.Lower + b.Lower, a.Denominator * forA);
    }

    private static House Shortened(double upper, double lower, BigInteger denominator) => denominator.GetBitLength() <= MostBits
        ? new(upper, lower, denominator)
        : new(upper, lower + Log(denominator), BigInteger.One);
}
