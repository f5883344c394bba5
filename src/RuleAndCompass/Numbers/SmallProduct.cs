using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>
/// Products of elements whose coefficients are small: the same recursion as in <see cref="Tower"/>, on machine integers.
/// </summary>
/// <remarks>
/// Give generator g the weight w = max(1, √N(g²)) and let N be the sum of the sizes of the coefficients times the weights of their generators. Then
/// N(ab) ≤ N(a) N(b), and every number that the recursion meets on its way is at most that: where it is below 2^62 nothing overflows.
/// </remarks>
internal static class SmallProduct
{
    private const double Most = 4.6e18 / 1.001;

    /// <summary>Reads coefficients as machine integers and weighs them; false where one does not fit.</summary>
    public static bool TryRead(ReadOnlySpan<BigInteger> coefficients, Span<long> numbers)
    {
        for (int i = 0; i < coefficients.Length; i++)
        {
            if (coefficients[i].GetBitLength() > 62)
                return false;
            numbers[i] = (long)coefficients[i];
        }

        return true;
    }

    /// <summary>N, a shade too large.</summary>
    public static double Weight(ReadOnlySpan<long> numbers, ReadOnlySpan<double> weights)
    {
        if (numbers.Length == 1)
            return Math.Abs((double)numbers[0]);

        int half = numbers.Length / 2;
        return (Weight(numbers[..half], weights[..^1]) + weights[^1] * Weight(numbers[half..], weights[..^1])) * 1.0000001;
    }

    public static bool Fits(double first, double second) => first * second < Most;

    /// <summary>Each level's radicand is spread over the levels below it; they stand one after the other in <paramref name="radicands"/>.</summary>
    public static void Multiply(Span<long> product, ReadOnlySpan<long> a, ReadOnlySpan<long> b, ReadOnlySpan<long> radicands)
    {
        if (a.Length == 1)
        {
            product[0] = a[0] * b[0];
            return;
        }

        if (a.Length == 2)
        {
            product[0] = a[0] * b[0] + radicands[0] * a[1] * b[1];
            product[1] = a[0] * b[1] + a[1] * b[0];
            return;
        }

        int half = a.Length / 2;
        ReadOnlySpan<long> a0 = a[..half], a1 = a[half..], b0 = b[..half], b1 = b[half..];
        Span<long> low = product[..half], high = product[half..];
        // The radicands of the levels below have 1 + 2 + 4 + … = half − 1 coefficients together.
        ReadOnlySpan<long> below = radicands[..(half - 1)];
        ReadOnlySpan<long> radicand = radicands.Slice(half - 1, half);
        bool noA1 = !a1.ContainsAnyExcept(0), noB1 = !b1.ContainsAnyExcept(0);
        if (noA1 || noB1)
        {
            Multiply(low, a0, b0, below);
            if (noA1 && noB1)
                high.Clear();
            else if (noA1)
                Multiply(high, a0, b1, below);
            else
                Multiply(high, a1, b0, below);
            return;
        }

        Span<long> top = stackalloc long[half];
        Span<long> sumA = stackalloc long[half];
        Span<long> sumB = stackalloc long[half];
        Multiply(top, a1, b1, below);
        Multiply(low, a0, b0, below);
        for (int i = 0; i < half; i++)
        {
            sumA[i] = a0[i] + a1[i];
            sumB[i] = b0[i] + b1[i];
        }

        Multiply(high, sumA, sumB, below);
        for (int i = 0; i < half; i++)
            high[i] -= low[i] + top[i];
        if (!radicand[1..].ContainsAnyExcept(0))
        {
            for (int i = 0; i < half; i++)
                low[i] += top[i] * radicand[0];
            return;
        }

        Multiply(sumA, top, radicand, below);
        for (int i = 0; i < half; i++)
            low[i] += sumA[i];
    }
}
