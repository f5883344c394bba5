using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>
/// A real field Q ⊂ Q(√r₁) ⊂ Q(√r₁, √r₂) …, each radicand from the storeys below and no square there, so that a number is zero
/// exactly when its coefficients are.
/// </summary>
/// <remarks>
/// Roots that lie in the field already are found by the norm: r = x + y√d is a square exactly when x² − y²d is a square n² one storey
/// down and one of (x ± n)/2 is. S. Landau, Simplification of nested radicals, SIAM J. Comput. 21 (1992); A. Borodin, R. Fagin,
/// J. Hopcroft and M. Tompa, Decreasing the nesting depth of expressions involving square roots, J. Symb. Comput. 1 (1985).
/// </remarks>
internal sealed class Tower(WorkLimit limit)
{
    private const int MostGenerators = 60;

    // A hundred thousand digits or so: beyond, bringing a fraction to lowest terms takes seconds.
    private const long MostCoefficientBits = 4_000_000;

    // Of 64 machine integers the recursion keeps a few hundred on the stack.
    private const int MostSmallLevels = 6;

    // Integral radicands of the positive roots; null for one whose exact value was not needed so far.
    private readonly List<FieldElement?> generators = [];
    private readonly List<double> weights = [];
    private Ball[] balls = [];
    private int ballBits;

    public int Count => generators.Count;

    public long Degree => 1L << generators.Count;

    public FieldElement RadicandOf(int generator) =>
        generators[generator] ?? throw new System.Diagnostics.UnreachableException("The radicand of this generator is not known yet.");

    public bool IsFlat(int generator) => generators[generator] is { IsRational: true };

    public static FieldElement Add(FieldElement a, FieldElement b) => Sum(a, b, subtract: false);

    public static FieldElement Subtract(FieldElement a, FieldElement b) => Sum(a, b, subtract: true);

    public FieldElement Multiply(FieldElement a, FieldElement b)
    {
        if (a.IsZero || b.IsZero)
            return FieldElement.Zero;
        if (a.IsRational || b.IsRational)
        {
            if (a.Bits + b.Bits > MostCoefficientBits)
                throw new NumberTooLongException();
        }

        if (a.IsRational)
            return b.Scaled(a.Coefficients[0], a.Denominator);
        if (b.IsRational)
            return a.Scaled(b.Coefficients[0], b.Denominator);

        ulong all = Closed(a.Generators | b.Generators, a.Generators & b.Generators);
        int[] levels = FieldElement.Levels(all);
        if (levels.Length <= MostSmallLevels && SmallMultiply(a, b, all, levels) is { } small)
            return small;

        if (a.Bits + b.Bits > MostCoefficientBits)
            throw new NumberTooLongException();

        var product = new BigInteger[1 << levels.Length];
        MultiplyInto(product, a.Spread(all), b.Spread(all), levels.Length, all, levels);
        return FieldElement.Normal(all, product, a.Denominator * b.Denominator);
    }

    /// <exception cref="DivideByZeroException">It is zero.</exception>
    public FieldElement Invert(FieldElement a)
    {
        limit.Check();
        if (a.IsRational)
            return FieldElement.Of(Rational.One / a.ToRational());

        // Of the numerator alone, in integers: the product with the conjugates, and the norm.
        (FieldElement cofactor, BigInteger norm) = Cofactor(a.Denominator.IsOne ? a : a with { Denominator = BigInteger.One });
        return cofactor.Scaled(a.Denominator, norm);
    }

    // a × cofactor = norm, all integral.
    private (FieldElement Cofactor, BigInteger Norm) Cofactor(FieldElement a)
    {
        if (a.IsRational)
            return (FieldElement.Of(BigInteger.One), a.Coefficients[0]);

        (FieldElement low, FieldElement high, int top) = Split(a);
        FieldElement norm = Subtract(Multiply(low, low), Multiply(Multiply(high, high), RadicandOf(top)));
        (FieldElement rest, BigInteger last) = Cofactor(norm);
        return (Multiply(Join(low, high.Negated(), top), rest), last);
    }

    /// <summary>The root that is not negative of an element that is not negative; the field grows where it has none.</summary>
    public FieldElement Sqrt(FieldElement radicand)
    {
        if (radicand.IsZero)
            return radicand;

        (FieldElement integral, BigInteger outside) = Integral(radicand);
        return IntegralSqrt(integral).Times(outside).Over(radicand.Denominator);
    }

    /// <summary>As <see cref="Sqrt"/>, for a rational that is a square here exactly when it is one among the flat generators' products.</summary>
    public FieldElement FlatSqrt(FieldElement radicand)
    {
        if (radicand.IsZero)
            return radicand;
        if (radicand.Coefficients[0].Sign < 0)
            throw new NegativeRadicandException();

        (FieldElement integral, BigInteger outside) = Integral(radicand);
        FieldElement root = FindFlatRoot(integral.Coefficients[0]) ?? Single(Adjoin(integral));
        return root.Times(outside).Over(radicand.Denominator);
    }

    /// <summary>A new generator that is known to be independent; its radicand is not computed.</summary>
    public int AdjoinFresh() => Adjoin(null);

    /// <summary>Tells the radicand of a fresh generator; gives the root of it. The generator stands for that root times the denominator.</summary>
    public FieldElement MakeExact(int generator, FieldElement radicand)
    {
        (FieldElement integral, BigInteger outside) = Integral(radicand);
        generators[generator] = integral;
        ballBits = 0;
        return Single(generator).Times(outside).Over(radicand.Denominator);
    }

    /// <summary>A bound of the binary logarithm of every conjugate of the element times its denominator.</summary>
    public double LogHouse(FieldElement element)
    {
        double[] logs = [.. element.Levels().Select(level => generators[level] is { } radicand ? LogHouse(radicand) / 2 : double.PositiveInfinity)];
        double house = double.NegativeInfinity;
        for (int i = 0; i < element.Coefficients.Length; i++)
        {
            if (element.Coefficients[i].IsZero)
                continue;
            double term = House.Log(element.Coefficients[i]);
            for (int j = 0; j < logs.Length; j++)
            {
                if ((i >> j & 1) != 0)
                    term += logs[j];
            }

            house = double.IsNegativeInfinity(house) ? term : Math.Max(house, term) + Math.Log2(1 + Math.Pow(2, -Math.Abs(house - term)));
        }

        return house;
    }

    // √(R/d) = outside √integral / d, with square factors of R d outside.
    private static (FieldElement Integral, BigInteger Outside) Integral(FieldElement radicand)
    {
        var numerator = new FieldElement(radicand.Generators, radicand.Coefficients, BigInteger.One);
        BigInteger content = Content(numerator.Coefficients);
        BigInteger outside = SquareFactors(content * radicand.Denominator, out BigInteger rest);
        return (Divided(numerator, content).Times(rest), outside);
    }

    private int Adjoin(FieldElement? radicand)
    {
        if (generators.Count == MostGenerators)
            throw new TowerTooHighException(2 * Degree);
        generators.Add(radicand);
        return generators.Count - 1;
    }

    private FieldElement? FindFlatRoot(BigInteger radicand)
    {
        if (IntegerRoot.TryExact(radicand, out BigInteger plain))
            return FieldElement.Of(plain);

        int[] flat = [.. Enumerable.Range(0, generators.Count).Where(IsFlat)];
        BigInteger[] radicands = [.. flat.Select(generator => RadicandOf(generator).Coefficients[0])];
        long set = FlatLayer.FindSquare(radicands, radicand);
        if (set < 0)
            return null;

        // √r = √(r Πd) / Πd × Π√d.
        BigInteger product = BigInteger.One;
        ulong generatorSet = 0;
        for (int i = 0; i < flat.Length; i++)
        {
            if ((set >> i & 1) == 0)
                continue;
            product *= radicands[i];
            generatorSet |= 1UL << flat[i];
        }

        if (!IntegerRoot.TryExact(radicand * product, out BigInteger root))
            throw new System.Diagnostics.UnreachableException("The product of these radicands is a square.");
        var coefficients = new BigInteger[1 << BitOperations.PopCount(generatorSet)];
        coefficients[^1] = root;
        return FieldElement.Normal(generatorSet, coefficients, product);
    }

    /// <summary>The sign of an element by balls as fine as it takes.</summary>
    public int Sign(FieldElement a)
    {
        if (a.IsRational)
            return a.Coefficients[0].Sign;

        for (int bits = 64; ; bits *= 2)
        {
            limit.Check();
            int sign = BallOf(a, bits).Sign;
            if (sign != 0)
                return sign;
        }
    }

    public Ball BallOf(FieldElement a, int bits)
    {
        EnsureBalls(bits);
        return Evaluate(a, bits);
    }

    private Ball Evaluate(FieldElement a, int bits)
    {
        int[] levels = a.Levels();
        Ball sum = Horner(a.Coefficients, levels.Length, levels, bits);
        return a.Denominator.IsOne ? sum : Ball.Divide(sum, Ball.Of(a.Denominator, bits), bits);
    }

    private Ball Horner(ReadOnlySpan<BigInteger> coefficients, int level, int[] levels, int bits)
    {
        if (level == 0)
            return Ball.Of(coefficients[0], bits);

        int half = coefficients.Length / 2;
        Ball low = Horner(coefficients[..half], level - 1, levels, bits);
        Ball high = Horner(coefficients[half..], level - 1, levels, bits);
        return Ball.Add(low, Ball.Multiply(high, balls[levels[level - 1]], bits), bits);
    }

    private void EnsureBalls(int bits)
    {
        if (ballBits >= bits && balls.Length == generators.Count)
            return;

        int from = ballBits >= bits ? balls.Length : 0;
        bits = Math.Max(bits, ballBits);
        Array.Resize(ref balls, generators.Count);
        ballBits = bits;
        for (int i = from; i < balls.Length; i++)
            balls[i] = generators[i] is { } radicand ? Ball.Sqrt(Evaluate(radicand, bits), bits) : Ball.Unknown;
    }

    private FieldElement IntegralSqrt(FieldElement radicand)
    {
        for (int i = 0; i < generators.Count; i++)
        {
            if (generators[i] is { } known && known.SameAs(radicand))
                return Single(i);
        }

        FieldElement? root = FindRoot(radicand, generators.Count);
        if (root is not null)
            return Sign(root) < 0 ? root.Negated() : root;

        if (Sign(radicand) < 0)
            throw new NegativeRadicandException();
        return Single(Adjoin(radicand));
    }

    // A root among the first `storeys` generators' elements, of either sign; null where there is none.
    private FieldElement? FindRoot(FieldElement radicand, int storeys)
    {
        limit.Check();
        if (radicand.IsZero)
            return radicand;

        if (radicand.IsRational)
        {
            Rational value = radicand.ToRational();
            if (IntegerRoot.TryExact(value.Numerator, out BigInteger n) && IntegerRoot.TryExact(value.Denominator, out BigInteger d))
                return FieldElement.Of(new Rational(n, d));
        }

        if (storeys == 0)
            return null;

        int top = storeys - 1;
        FieldElement below = RadicandOf(top);
        if ((radicand.Generators >> top & 1) == 0)
        {
            // x is a square here exactly when x or x d is one below: √x, or √(x d)/d times the generator.
            if (FindRoot(radicand, top) is { } same)
                return same;
            return FindRoot(Multiply(radicand, below), top) is { } other
                ? Join(FieldElement.Zero, Multiply(other, Invert(below)), top)
                : null;
        }

        (FieldElement x, FieldElement y, _) = Split(radicand);
        FieldElement norm = Subtract(Multiply(x, x), Multiply(Multiply(y, y), below));
        if (FindRoot(norm, top) is not { } n2)
            return null;

        foreach (FieldElement twice in (ReadOnlySpan<FieldElement>)[Add(x, n2), Subtract(x, n2)])
        {
            if (twice.IsZero || FindRoot(twice.Over(2), top) is not { } a)
                continue;
            FieldElement b = Multiply(y, Invert(a.Times(2)));
            FieldElement found = Join(a, b, top);
            if (Multiply(found, found).SameAs(radicand))
                return found;
        }

        return null;
    }

    private static FieldElement Single(int generator) => new(1UL << generator, [BigInteger.Zero, BigInteger.One], BigInteger.One);

    private static FieldElement Sum(FieldElement a, FieldElement b, bool subtract)
    {
        ulong all = a.Generators | b.Generators;
        BigInteger[] first = a.Spread(all);
        BigInteger[] second = b.Spread(all);
        var sum = new BigInteger[first.Length];
        bool same = a.Denominator == b.Denominator;
        for (int i = 0; i < sum.Length; i++)
        {
            BigInteger p = same ? first[i] : first[i] * b.Denominator;
            BigInteger q = same ? second[i] : second[i] * a.Denominator;
            sum[i] = subtract ? p - q : p + q;
        }

        return FieldElement.Normal(all, sum, same ? a.Denominator : a.Denominator * b.Denominator);
    }

    // a = low + high × the highest generator.
    private static (FieldElement Low, FieldElement High, int Top) Split(FieldElement a)
    {
        int top = 63 - BitOperations.LeadingZeroCount(a.Generators);
        int half = a.Coefficients.Length / 2;
        ulong lower = a.Generators & ~(1UL << top);
        return (
            FieldElement.Normal(lower, a.Coefficients[..half], a.Denominator),
            FieldElement.Normal(lower, a.Coefficients[half..], a.Denominator),
            top);
    }

    private static FieldElement Join(FieldElement low, FieldElement high, int top)
    {
        ulong lower = low.Generators | high.Generators;
        BigInteger[] first = low.Spread(lower);
        BigInteger[] second = high.Spread(lower);
        var joined = new BigInteger[2 * first.Length];
        for (int i = 0; i < first.Length; i++)
        {
            joined[i] = first[i] * high.Denominator;
            joined[first.Length + i] = second[i] * low.Denominator;
        }

        return FieldElement.Normal(lower | 1UL << top, joined, low.Denominator * high.Denominator);
    }

    private ulong Closed(ulong all, ulong shared)
    {
        // The square of a shared generator brings in what stands in its radicand, and so on down.
        for (int i = generators.Count - 1; i >= 0; i--)
        {
            if ((shared >> i & 1) == 0)
                continue;
            ulong inner = RadicandOf(i).Generators;
            shared |= inner;
            all |= inner;
        }

        return all;
    }


    // The product by machine integers; null where they might overflow.
    private FieldElement? SmallMultiply(FieldElement a, FieldElement b, ulong all, int[] levels)
    {
        int length = 1 << levels.Length;
        Span<long> first = stackalloc long[length];
        Span<long> second = stackalloc long[length];
        Span<double> weights = stackalloc double[levels.Length];
        for (int i = 0; i < levels.Length; i++)
        {
            weights[i] = WeightOf(levels[i]);
            if (double.IsPositiveInfinity(weights[i]))
                return null;
        }

        if (!SmallProduct.TryRead(a.Spread(all), first) || !SmallProduct.TryRead(b.Spread(all), second))
            return null;
        if (!SmallProduct.Fits(SmallProduct.Weight(first, weights), SmallProduct.Weight(second, weights)))
            return null;

        Span<long> radicands = stackalloc long[length];
        for (int i = 0; i < levels.Length; i++)
        {
            ulong lower = all & ((1UL << levels[i]) - 1);
            SmallProduct.TryRead(RadicandOf(levels[i]).Spread(lower), radicands.Slice((1 << i) - 1, 1 << i));
        }

        Span<long> product = stackalloc long[length];
        SmallProduct.Multiply(product, first, second, radicands);
        return FieldElement.Normal(all, product, a.Denominator.IsOne ? b.Denominator : a.Denominator * b.Denominator);
    }

    // The weight of SmallProduct; infinite where the radicand is long or unknown.
    private double WeightOf(int generator)
    {
        while (weights.Count <= generator)
        {
            FieldElement? radicand = generators[weights.Count];
            if (radicand is null)
                return double.PositiveInfinity;
            weights.Add(NewWeight(radicand));
        }

        return weights[generator];
    }

    private double NewWeight(FieldElement radicand)
    {
        int[] levels = radicand.Levels();
        if (levels.Length > MostSmallLevels)
            return double.PositiveInfinity;

        Span<long> numbers = stackalloc long[radicand.Coefficients.Length];
        Span<double> inner = stackalloc double[levels.Length];
        for (int i = 0; i < levels.Length; i++)
            inner[i] = weights[levels[i]];
        return SmallProduct.TryRead(radicand.Coefficients, numbers)
            ? Math.Max(1, Math.Sqrt(SmallProduct.Weight(numbers, inner)) * 1.0000001)
            : double.PositiveInfinity;
    }

    private void MultiplyInto(Span<BigInteger> product, ReadOnlySpan<BigInteger> a, ReadOnlySpan<BigInteger> b, int level, ulong all, int[] levels)
    {
        if (level == 0)
        {
            product[0] = a[0].IsZero || b[0].IsZero ? BigInteger.Zero : a[0] * b[0];
            return;
        }

        int half = a.Length / 2;
        ReadOnlySpan<BigInteger> a0 = a[..half], a1 = a[half..], b0 = b[..half], b1 = b[half..];
        bool noA1 = IsZero(a1), noB1 = IsZero(b1);
        Span<BigInteger> low = product[..half], high = product[half..];
        if (noA1 && noB1)
        {
            MultiplyInto(low, a0, b0, level - 1, all, levels);
            high.Clear();
            return;
        }

        if (noA1 || noB1)
        {
            MultiplyInto(low, a0, b0, level - 1, all, levels);
            if (noA1)
                MultiplyInto(high, a0, b1, level - 1, all, levels);
            else
                MultiplyInto(high, a1, b0, level - 1, all, levels);
            return;
        }

        // (a0 + a1 g)(b0 + b1 g) with three products, and the square of g from below.
        var top = new BigInteger[half];
        MultiplyInto(top, a1, b1, level - 1, all, levels);
        var sumA = new BigInteger[half];
        var sumB = new BigInteger[half];
        for (int i = 0; i < half; i++)
        {
            sumA[i] = a0[i] + a1[i];
            sumB[i] = b0[i] + b1[i];
        }

        MultiplyInto(high, sumA, sumB, level - 1, all, levels);
        MultiplyInto(low, a0, b0, level - 1, all, levels);
        for (int i = 0; i < half; i++)
            high[i] -= low[i] + top[i];

        FieldElement radicand = RadicandOf(levels[level - 1]);
        if (radicand.IsRational)
        {
            for (int i = 0; i < half; i++)
                low[i] += top[i] * radicand.Coefficients[0];
            return;
        }

        ulong lower = all & ((1UL << levels[level - 1]) - 1);
        MultiplyInto(sumA, top, radicand.Spread(lower), level - 1, all, levels);
        for (int i = 0; i < half; i++)
            low[i] += sumA[i];
    }

    private static bool IsZero(ReadOnlySpan<BigInteger> span)
    {
        foreach (BigInteger value in span)
        {
            if (!value.IsZero)
                return false;
        }

        return true;
    }

    private static BigInteger Content(BigInteger[] coefficients)
    {
        BigInteger content = BigInteger.Zero;
        foreach (BigInteger coefficient in coefficients)
        {
            content = BigInteger.GreatestCommonDivisor(content, coefficient);
            if (content.IsOne)
                break;
        }

        return content;
    }

    private static FieldElement Divided(FieldElement integral, BigInteger content)
    {
        if (content.IsOne)
            return integral;

        var coefficients = new BigInteger[integral.Coefficients.Length];
        for (int i = 0; i < coefficients.Length; i++)
            coefficients[i] = integral.Coefficients[i] / content;
        return integral with { Coefficients = coefficients };
    }

    // value = outside² × rest; squares of small primes and a whole square are found, others may stay in the rest.
    private static BigInteger SquareFactors(BigInteger value, out BigInteger rest)
    {
        if (IntegerRoot.TryExact(value, out BigInteger root))
        {
            rest = BigInteger.One;
            return root;
        }

        BigInteger outside = BigInteger.One;
        foreach (int prime in (ReadOnlySpan<int>)[2, 3, 5, 7, 11, 13])
        {
            int square = prime * prime;
            while (BigInteger.Remainder(value, square).IsZero)
            {
                value /= square;
                outside *= prime;
            }
        }

        rest = value;
        return outside;
    }
}

/// <summary>A number that was to be rooted is negative at the point of evaluation.</summary>
internal sealed class NegativeRadicandException : Exception;

/// <summary>Coefficients became too long to go on.</summary>
internal sealed class NumberTooLongException : Exception;

/// <summary>The degree the tower would have reached.</summary>
internal sealed class TowerTooHighException(long degree) : Exception
{
    public long Degree { get; } = degree;
}
