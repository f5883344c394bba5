using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>An element a + b i of the field of p² elements, in Montgomery form.</summary>
internal readonly record struct Residue(ulong A, ulong B)
{
    public bool IsZero => (A | B) == 0;

    /// <summary>Whether it lies in the field of p elements.</summary>
    public bool IsReal => B == 0;
}

/// <summary>
/// Arithmetic in the field of p² elements, p a prime of 61 bits with p ≡ 3 modulo 4, so that i² = −1 extends the field of p elements. Every
/// element of the smaller field has a root in the larger: rational radicands never stop an image.
/// </summary>
/// <remarks>P. L. Montgomery, Modular multiplication without trial division, Math. Comp. 44 (1985).</remarks>
internal sealed class PrimeField
{
    public const int PrimeBits = 61;

    private static readonly ulong[] smallPrimes = [3, 5, 7, 11, 13, 17, 19, 23, 29, 31, 37, 41, 43, 47, 53];

    // Deterministic for all numbers of 64 bits: J. Sorenson and J. Webster, Math. Comp. 86 (2017).
    private static readonly ulong[] witnesses = [2, 3, 5, 7, 11, 13, 17, 19, 23, 29, 31, 37];

    private readonly ulong prime;
    private readonly ulong inverse;
    private readonly ulong one;
    private readonly ulong radixSquared;

    private PrimeField(ulong modulus)
    {
        prime = modulus;
        ulong x = modulus;
        for (int i = 0; i < 5; i++)
            x *= 2 - modulus * x;
        inverse = 0 - x;
        one = (ulong)((UInt128.One << 64) % modulus);
        radixSquared = (ulong)((UInt128)one * one % modulus);
    }

    public ulong Prime => prime;

    public Residue One => new(one, 0);

    /// <summary>The field of a random prime with exactly 61 bits.</summary>
    public static PrimeField Draw(SeededBits random)
    {
        while (true)
        {
            ulong candidate = random.NextWord() >> 3 | 1UL << (PrimeBits - 1) | 3;
            if (!MayBePrime(candidate))
                continue;
            var field = new PrimeField(candidate);
            if (field.IsPrime())
                return field;
        }
    }

    /// <summary>The field of a random prime of at most 61 bits that is −1 modulo <paramref name="order"/>, a multiple of 4.</summary>
    public static PrimeField DrawBelowMultiple(ulong order, SeededBits random)
    {
        ulong most = (1UL << PrimeBits) / order;
        while (true)
        {
            ulong candidate = (1 + random.NextWord() % most) * order - 1;
            if (candidate >> (PrimeBits - 3) == 0 || !MayBePrime(candidate))
                continue;
            var field = new PrimeField(candidate);
            if (field.IsPrime())
                return field;
        }
    }

    /// <summary>The field of this prime, which is 3 modulo 4 and has at most 61 bits.</summary>
    public static PrimeField Of(ulong prime) => new(prime);

    public Residue Of(BigInteger value)
    {
        BigInteger rest = BigInteger.Remainder(value, prime);
        ulong residue = rest.Sign < 0 ? prime - (ulong)-rest : (ulong)rest;
        return new(Product(residue, radixSquared), 0);
    }

    public BigInteger ToInteger(Residue real) => Product(real.A, 1);

    public Residue Add(Residue x, Residue y) => new(Sum(x.A, y.A), Sum(x.B, y.B));

    public Residue Subtract(Residue x, Residue y) => new(Difference(x.A, y.A), Difference(x.B, y.B));

    public Residue Negate(Residue x) => new(Difference(0, x.A), Difference(0, x.B));

    public Residue Multiply(Residue x, Residue y)
    {
        if ((x.B | y.B) == 0)
            return new(Product(x.A, y.A), 0);
        if (y.B == 0)
            return new(Product(x.A, y.A), Product(x.B, y.A));
        if (x.B == 0)
            return new(Product(x.A, y.A), Product(x.A, y.B));

        return new(
            Difference(Product(x.A, y.A), Product(x.B, y.B)),
            Sum(Product(x.A, y.B), Product(x.B, y.A)));
    }

    /// <summary>a + b i from two elements of the smaller field.</summary>
    public static Residue Join(Residue real, Residue imaginary) => new(real.A, imaginary.A);

    /// <summary>False for 0.</summary>
    public bool TryInvert(Residue x, out Residue result)
    {
        result = default;
        if (x.IsZero)
            return false;
        if (x.B == 0)
        {
            result = new(Power(x.A, prime - 2), 0);
            return true;
        }

        ulong norm = Power(Sum(Product(x.A, x.A), Product(x.B, x.B)), prime - 2);
        result = new(Product(x.A, norm), Product(Difference(0, x.B), norm));
        return true;
    }

    /// <summary>One of the two roots; false where there is none.</summary>
    public bool TrySqrt(Residue x, out Residue root)
    {
        root = default;
        if (x.IsZero)
            return true;

        if (x.B == 0)
        {
            ulong r = Power(x.A, (prime + 1) / 4);
            // One of x and −x has a root in the field of p elements.
            root = Product(r, r) == x.A ? new(r, 0) : new(0, r);
            return true;
        }

        ulong norm = Sum(Product(x.A, x.A), Product(x.B, x.B));
        ulong n = Power(norm, (prime + 1) / 4);
        if (Product(n, n) != norm)
            return false;

        ulong t = Half(Sum(x.A, n));
        ulong real = Power(t, (prime + 1) / 4);
        if (Product(real, real) != t)
        {
            t = Half(Difference(x.A, n));
            real = Power(t, (prime + 1) / 4);
        }

        ulong imaginary = Product(x.B, Power(Sum(real, real), prime - 2));
        root = new(real, imaginary);
        return true;
    }

    private static bool MayBePrime(ulong candidate)
    {
        foreach (ulong small in smallPrimes)
        {
            if (candidate % small == 0)
                return candidate == small;
        }

        return true;
    }

    private ulong Sum(ulong x, ulong y)
    {
        ulong sum = x + y;
        return sum >= prime ? sum - prime : sum;
    }

    private ulong Difference(ulong x, ulong y) => x >= y ? x - y : x + prime - y;

    private ulong Half(ulong x) => (x & 1) == 0 ? x >> 1 : (x + prime) >> 1;

    private ulong Product(ulong x, ulong y)
    {
        ulong high = Math.BigMul(x, y, out ulong low);
        ulong m = low * inverse;
        ulong carry = Math.BigMul(m, prime, out _);
        // The low halves add up to 0 modulo 2^64, with a carry where they are not both 0.
        ulong result = high + carry + (low != 0 ? 1UL : 0UL);
        return result >= prime ? result - prime : result;
    }

    public Residue Power(Residue x, ulong exponent)
    {
        Residue result = One;
        for (int bit = 63 - BitOperations.LeadingZeroCount(exponent); bit >= 0; bit--)
        {
            result = Multiply(result, result);
            if ((exponent >> bit & 1) != 0)
                result = Multiply(result, x);
        }

        return result;
    }

    private ulong Power(ulong x, ulong exponent)
    {
        ulong result = x;
        for (int bit = 62 - BitOperations.LeadingZeroCount(exponent); bit >= 0; bit--)
        {
            result = Product(result, result);
            if ((exponent >> bit & 1) != 0)
                result = Product(result, x);
        }

        return result;
    }

    // Miller and Rabin: p − 1 is twice an odd number.
    private bool IsPrime()
    {
        ulong minusOne = prime - one;
        foreach (ulong witness in witnesses)
        {
            ulong power = Power(Product(witness, radixSquared), (prime - 1) / 2);
            if (power != one && power != minusOne)
                return false;
        }

        return true;
    }
}
