using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>
/// An element of a tower of square roots: a sum of integer multiples of products of generators, over one denominator. It names only
/// the generators that stand in it, so that a small number stays small in a high tower.
/// </summary>
/// <param name="Generators">Bit i is set where generator i may stand in a product.</param>
/// <param name="Coefficients">
/// One for each subset of the generators; bit j of the index says whether the j-th lowest generator is in the product.
/// </param>
/// <param name="Denominator">Greater than zero.</param>
internal sealed record FieldElement(ulong Generators, BigInteger[] Coefficients, BigInteger Denominator)
{
    public static FieldElement Zero { get; } = new(0, [BigInteger.Zero], BigInteger.One);

    public bool IsZero => Generators == 0 && Coefficients[0].IsZero;

    public bool IsRational => Generators == 0;

    /// <summary>The length of the longest coefficient or of the denominator.</summary>
    public long Bits
    {
        get
        {
            long bits = Denominator.GetBitLength();
            foreach (BigInteger coefficient in Coefficients)
                bits = Math.Max(bits, coefficient.GetBitLength());
            return bits;
        }
    }

    public static FieldElement Of(Rational value) => new(0, [value.Numerator], value.Denominator);

    public Rational ToRational() => new(Coefficients[0], Denominator);

    public FieldElement Negated()
    {
        var coefficients = new BigInteger[Coefficients.Length];
        for (int i = 0; i < coefficients.Length; i++)
            coefficients[i] = -Coefficients[i];
        return this with { Coefficients = coefficients };
    }

    public FieldElement Over(BigInteger divisor) =>
        divisor.Sign < 0 ? Negated().Over(-divisor) : Normal(Generators, (BigInteger[])Coefficients.Clone(), Denominator * divisor);

    public FieldElement Times(BigInteger factor) => Scaled(factor, BigInteger.One);

    /// <summary>This element times <paramref name="factor"/> over <paramref name="divisor"/>, which is not zero.</summary>
    public FieldElement Scaled(BigInteger factor, BigInteger divisor)
    {
        if (factor.IsZero)
            return Zero;
        if (factor.IsOne && divisor.IsOne)
            return this;
        if (divisor.Sign < 0)
            (factor, divisor) = (-factor, -divisor);

        var coefficients = new BigInteger[Coefficients.Length];
        for (int i = 0; i < coefficients.Length; i++)
            coefficients[i] = Coefficients[i].IsZero ? BigInteger.Zero : Coefficients[i] * factor;
        return Lowest(Generators, coefficients, divisor.IsOne ? Denominator : Denominator * divisor);
    }

    public bool SameAs(FieldElement other) => Generators == other.Generators
        && Denominator == other.Denominator
        && Coefficients.AsSpan().SequenceEqual(other.Coefficients);

    /// <summary>Leaves out generators that stand in no product, and common factors. Takes <paramref name="coefficients"/> over.</summary>
    public static FieldElement Normal(ulong generators, BigInteger[] coefficients, BigInteger denominator)
    {
        int position = 0;
        for (ulong rest = generators; rest != 0; rest &= rest - 1)
        {
            int bit = 1 << position;
            bool used = false;
            for (int i = 0; i < coefficients.Length && !used; i++)
                used = (i & bit) != 0 && !coefficients[i].IsZero;
            if (used)
            {
                position++;
                continue;
            }

            var fewer = new BigInteger[coefficients.Length / 2];
            for (int i = 0; i < fewer.Length; i++)
                fewer[i] = coefficients[(i & ~(bit - 1)) << 1 | i & (bit - 1)];
            coefficients = fewer;
            generators &= ~(rest & (~rest + 1));
        }

        return Lowest(generators, coefficients, denominator);
    }

    /// <summary>The same for machine integers, which are left changed.</summary>
    public static FieldElement Normal(ulong generators, Span<long> coefficients, BigInteger denominator)
    {
        int position = 0;
        for (ulong rest = generators; rest != 0; rest &= rest - 1)
        {
            int bit = 1 << position;
            long used = 0;
            for (int i = 0; i < coefficients.Length; i++)
            {
                if ((i & bit) != 0)
                    used |= coefficients[i];
            }

            if (used != 0)
            {
                position++;
                continue;
            }

            int fewer = coefficients.Length / 2;
            for (int i = 0; i < fewer; i++)
                coefficients[i] = coefficients[(i & ~(bit - 1)) << 1 | i & (bit - 1)];
            coefficients = coefficients[..fewer];
            generators &= ~(rest & (~rest + 1));
        }

        var result = new BigInteger[coefficients.Length];
        if (denominator.IsOne || denominator.GetBitLength() > 62)
        {
            for (int i = 0; i < result.Length; i++)
                result[i] = coefficients[i];
            return Lowest(generators, result, denominator);
        }

        ulong small = (ulong)denominator;
        ulong common = small;
        if (BitOperations.IsPow2(common))
        {
            long any = 0;
            foreach (long coefficient in coefficients)
                any |= coefficient;
            common = 1UL << Math.Min(BitOperations.TrailingZeroCount(common), BitOperations.TrailingZeroCount(any));
        }
        else
        {
            for (int i = 0; i < coefficients.Length && common != 1; i++)
            {
                ulong other = (ulong)Math.Abs(coefficients[i]);
                while (other != 0)
                    (common, other) = (other, common % other);
            }
        }

        for (int i = 0; i < result.Length; i++)
            result[i] = common == 1 ? coefficients[i] : coefficients[i] / (long)common;
        return new FieldElement(generators, result, common == 1 ? denominator : small / common);
    }

    private static FieldElement Lowest(ulong generators, BigInteger[] coefficients, BigInteger denominator)
    {
        if (!denominator.IsOne)
        {
            BigInteger common = denominator;
            for (int i = 0; i < coefficients.Length && !common.IsOne; i++)
            {
                if (!coefficients[i].IsZero)
                    common = BigInteger.GreatestCommonDivisor(common, coefficients[i]);
            }

            if (generators == 0 && coefficients[0].IsZero)
                common = denominator;
            if (!common.IsOne)
            {
                denominator /= common;
                for (int i = 0; i < coefficients.Length; i++)
                    coefficients[i] /= common;
            }
        }

        return new FieldElement(generators, coefficients, denominator);
    }

    /// <summary>The generators by number, lowest first.</summary>
    public int[] Levels() => Levels(Generators);

    public static int[] Levels(ulong generators)
    {
        var levels = new int[BitOperations.PopCount(generators)];
        for (int i = 0; generators != 0; generators &= generators - 1)
            levels[i++] = BitOperations.TrailingZeroCount(generators);
        return levels;
    }

    /// <summary>The coefficients with zeros for the generators of <paramref name="wider"/> that do not stand here.</summary>
    public BigInteger[] Spread(ulong wider)
    {
        if (wider == Generators)
            return Coefficients;

        var result = new BigInteger[1 << BitOperations.PopCount(wider)];
        for (int i = 0; i < Coefficients.Length; i++)
        {
            if (!Coefficients[i].IsZero)
                result[Position(i, wider)] = Coefficients[i];
        }

        return result;
    }

    // Where product i of this element's generators stands among those of a wider set.
    private int Position(int index, ulong wider)
    {
        int position = 0;
        int mine = 0;
        int theirs = 0;
        for (ulong rest = wider; rest != 0; rest &= rest - 1)
        {
            ulong bit = rest & (~rest + 1);
            if ((Generators & bit) != 0)
            {
                position |= (index >> mine & 1) << theirs;
                mine++;
            }

            theirs++;
        }

        return position;
    }
}
