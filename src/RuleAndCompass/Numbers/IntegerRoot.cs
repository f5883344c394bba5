using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>Square roots of integers.</summary>
/// <remarks>The recursion is P. Zimmermann, Karatsuba Square Root, INRIA RR-3805 (1999), with a Newton step in place of its division.</remarks>
internal static class IntegerRoot
{
    // A square is 0, 1, 4, 9, 16, 17, 25, 33, 36, 41, 49 or 57 modulo 64.
    private const ulong SquaresModulo64 = 0x0202021202030213;

    /// <summary>The greatest integer whose square is not above <paramref name="value"/>, which is not negative.</summary>
    public static BigInteger Floor(BigInteger value)
    {
        long length = value.GetBitLength();
        if (length <= 52)
            return (long)Math.Sqrt((double)value);

        if (length <= 104)
        {
            // The estimate is off by a few units at most: doubles have 53 bits and the root has up to 52.
            BigInteger near = (BigInteger)Math.Sqrt((double)value);
            return Correct(near, value);
        }

        int half = (int)(length / 4);
        BigInteger high = Floor(value >> (2 * half)) << half;
        return Correct((high + value / high) >> 1, value);
    }

    /// <summary>The root where <paramref name="value"/> is a square.</summary>
    public static bool TryExact(BigInteger value, out BigInteger root)
    {
        root = default;
        if (value.Sign < 0)
            return false;

        if ((SquaresModulo64 >> (int)(ulong)(value & 63) & 1) == 0)
            return false;

        root = Floor(value);
        return root * root == value;
    }

    private static BigInteger Correct(BigInteger near, BigInteger value)
    {
        while (near * near > value)
            near -= 1;
        while ((near + 1) * (near + 1) <= value)
            near += 1;
        return near;
    }
}
