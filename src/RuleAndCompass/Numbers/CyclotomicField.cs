using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>
/// Decides identities that hold for the very angles at hand, such as 30 × 43.3° = 219° drawn step by step: cosines and sines are images of a root of
/// unity.
/// </summary>
/// <remarks>
/// Let every angle be a multiple of 1/N turn. For a prime p ≡ −1 modulo N and 4 the circle x² + y² = 1 over the field of p elements is a cyclic
/// group of p + 1 points, the elements of norm 1 in the field of p² elements, so it has a point of order N: cosines and sines of all the angles
/// have images in the field of p elements, tied to each other. Square roots that lie in the field of the angles are tied too: they are
/// looked for among rational multiples of √m cos α and checked by images. The others must be shown independent by a radicand that
/// is no square.
/// The chance is reckoned as in <see cref="JointField"/>; that rests on the primes of 61 bits being spread over the classes modulo N as evenly as
/// Dirichlet's theorem says of all primes, with one bit to spare.
/// </remarks>
internal sealed class CyclotomicField
{
    // Eighths of 3°, so that halves of halves of constructible angles are among the multiples.
    private const int LeastOrder = 960;
    private const ulong GreatestOrder = 1UL << 40;
    private const int TestImages = 12;
    private const int EnoughCertainty = 128;
    private const int MostImages = 200;
    private const int MostDraws = 1 << 16;
    private const int MostHalves = 64;
    private const int MostDenominator = 240;

    private readonly StraightLine line;
    private readonly SeededBits random;
    private readonly WorkLimit limit;
    private readonly ulong order;
    private readonly Dictionary<int, ulong> turns = [];
    private readonly Dictionary<int, Tied> tied = [];
    private readonly List<Image> images = [];
    private readonly List<ulong> orderPrimes;
    private readonly House[] houses;
    private readonly double[] doubles;
    private readonly List<(double Cosine, ulong Turns)> candidates = [];
    private int housed;
    private int freshRoots;
    private long draws;
    private double certainty = double.PositiveInfinity;

    private CyclotomicField(StraightLine line, ulong order, SeededBits random, WorkLimit limit)
    {
        this.line = line;
        this.order = order;
        this.random = random;
        this.limit = limit;
        orderPrimes = PrimesOf(order);
        houses = new House[line.Count];
        doubles = new double[line.Count];
        var balls = new Dictionary<int, Ball>();
        foreach ((int at, Real leaf) in line.Leaves)
        {
            var direction = (DirectionReal)leaf;
            balls[at] = direction.Enclose(128);
            Rational part = TurnOf(direction) * new Rational(order, 1);
            turns[at] = Multiple(part.Numerator - (direction.IsSine ? order / 4 : 0));
        }

        Ball[] all = ProgramBalls.Evaluate(line, balls, 128);
        for (int i = 0; i < line.Count; i++)
        {
            (double low, double high) = all[i].ToDoubles();
            doubles[i] = (low + high) / 2;
        }
    }

    // factor × √squareFree × 2 cos(turns/order of a turn)
    private readonly record struct Tied(Rational Factor, ulong SquareFree, ulong Turns);

    private sealed class Image(PrimeField field, Residue root, int count)
    {
        public PrimeField Field { get; } = field;

        public Residue Root { get; } = root;

        public Residue[] Values { get; } = new Residue[count];

        public int Next { get; set; }
    }

    /// <summary>The verdict where <paramref name="x"/> is zero; null where it is not, or where this cannot tell.</summary>
    public static Verdict? TryVanishing(Real x, SeededBits random, WorkLimit limit)
    {
        StraightLine? line = StraightLine.Compile(x, leaf => leaf switch
        {
            GivenReal given => given.Value,
            DirectionReal direction when direction.Source.Degrees.TryGetRational(out _) => direction,
            _ => null,
        });
        if (line is null)
            return null;

        BigInteger order = LeastOrder;
        foreach (Real leaf in line.Leaves.Values)
        {
            BigInteger twice = 2 * TurnOf((DirectionReal)leaf).Denominator;
            order = order / BigInteger.GreatestCommonDivisor(order, twice) * twice;
        }

        if (order > GreatestOrder)
            return null;

        var field = new CyclotomicField(line, (ulong)order, random, limit);
        return field.Decide() ? new Verdict(Certainty.Certain, (int)Math.Min(field.certainty, 1 << 20), []) : null;
    }

    private static Rational TurnOf(DirectionReal direction)
    {
        direction.Source.Degrees.TryGetRational(out Rational degrees);
        return direction.Multiple * degrees / 360;
    }

    private static List<ulong> PrimesOf(ulong value)
    {
        var primes = new List<ulong>();
        for (ulong p = 2; p * p <= value; p++)
        {
            if (value % p != 0)
                continue;
            primes.Add(p);
            while (value % p == 0)
                value /= p;
        }

        if (value > 1)
            primes.Add(value);
        return primes;
    }

    private ulong Multiple(BigInteger turns) => (ulong)((turns % order + order) % order);

    private bool Decide()
    {
        for (int i = 0; i < line.Count; i++)
        {
            limit.Check();
            if (!line[i].IsConstant && line[i].Operation == Operation.Sqrt && !TryResolve(i))
                return false;
        }

        return Vanishes(line.Result);
    }

    // Ties the root to the angles, or shows it independent; false where neither works.
    private bool TryResolve(int at)
    {
        int radicand = line[at].Left;
        for (int i = 0; i < TestImages; i++)
        {
            if (ImageAt(i, at) is not { } image)
                return false;
            Residue value = image.Values[radicand];
            if (value.IsZero || image.Field.TrySqrt(value, out Residue root) && root.IsReal)
                continue;

            images.RemoveAt(i);
            freshRoots++;
            return true;
        }

        foreach (Tied candidate in CandidatesFor(doubles[at]))
        {
            if (!Agrees(candidate, radicand))
                continue;
            tied[at] = candidate;
            EnsureHouses(radicand);
            return true;
        }

        return false;
    }

    // The square of the candidate is the radicand: at as many images as it takes to be certain.
    private bool Agrees(Tied candidate, int radicand)
    {
        EnsureHouses(radicand);
        House square = House.Of(candidate.Factor * candidate.Factor * new Rational(4 * (BigInteger)candidate.SquareFree, 1));
        House difference = House.Apply(Operation.Subtract, houses[radicand], square);
        return VanishesEverywhere(difference, radicand + 1, image =>
        {
            Residue value = ImageOf(candidate, image);
            return image.Field.Multiply(value, value) == image.Values[radicand];
        });
    }

    private bool Vanishes(int at)
    {
        EnsureHouses(at);
        return VanishesEverywhere(houses[at], at + 1, image => image.Values[at].IsZero);
    }

    private bool VanishesEverywhere(House house, int end, Func<Image, bool> vanishes)
    {
        // The degree of the field, at most; and the primes of the class among those between 2^58 and 2^61.
        double logDegree = Math.Log2(order) - 1 + freshRoots;
        double logBad = Math.Log2(Math.Max(house.Upper, 1) / (PrimeField.PrimeBits - 3)) + logDegree;
        double logPrimes = PrimeField.PrimeBits - 2 - Math.Log2(43) - Math.Log2(order);
        for (int count = 1; count <= MostImages; count++)
        {
            if (ImageAt(count - 1, end) is not { } image || !vanishes(image))
                return false;
            double each = logPrimes - Math.Max(logBad, 0) - Math.Log2(draws);
            if (count * each >= EnoughCertainty)
            {
                certainty = double.IsPositiveInfinity(certainty) ? count * each : Math.Min(certainty, count * each) - 1;
                return true;
            }
        }

        return false;
    }

    private void EnsureHouses(int last)
    {
        for (; housed <= last; housed++)
        {
            StraightLine.Instruction step = line[housed];
            houses[housed] = line.Leaves.ContainsKey(housed) ? new House(1, 0, 2)
                : step.IsConstant ? House.Of(step.Value)
                : step.Operation == Operation.Divide && line[step.Right] is { IsConstant: true, Value.IsZero: false } divisor
                    ? House.Apply(Operation.Multiply, houses[step.Left], House.Of(Rational.One / divisor.Value))
                : House.Apply(step.Operation, houses[step.Left], houses[step.Right]);
        }
    }

    private Image? ImageAt(int i, int end)
    {
        while (i < images.Count)
        {
            if (TryAdvance(images[i], end))
                return images[i];
            images.RemoveAt(i);
        }

        for (int tries = 0; tries < MostDraws; tries++)
        {
            limit.Check();
            draws++;
            PrimeField field = PrimeField.DrawBelowMultiple(order, random);
            var image = new Image(field, RootOfUnity(field), line.Count);
            if (TryAdvance(image, end))
            {
                images.Add(image);
                return image;
            }
        }

        return null;
    }

    private bool TryAdvance(Image image, int end)
    {
        PrimeField field = image.Field;
        for (; image.Next < end; image.Next++)
        {
            int i = image.Next;
            StraightLine.Instruction step = line[i];
            Residue inverse;
            if (turns.TryGetValue(i, out ulong multiple))
            {
                image.Values[i] = field.Multiply(Twice(image, multiple), Half(field));
            }
            else if (step.IsConstant)
            {
                if (!field.TryInvert(field.Of(step.Value.Denominator), out inverse))
                    return false;
                image.Values[i] = field.Multiply(field.Of(step.Value.Numerator), inverse);
            }
            else
            {
                Residue left = image.Values[step.Left];
                Residue right = image.Values[step.Right];
                switch (step.Operation)
                {
                    case Operation.Add:
                        image.Values[i] = field.Add(left, right);
                        break;
                    case Operation.Subtract:
                        image.Values[i] = field.Subtract(left, right);
                        break;
                    case Operation.Multiply:
                        image.Values[i] = field.Multiply(left, right);
                        break;
                    case Operation.Divide:
                        if (!field.TryInvert(right, out inverse))
                            return false;
                        image.Values[i] = field.Multiply(left, inverse);
                        break;
                    default:
                        if (tied.TryGetValue(i, out Tied known))
                        {
                            image.Values[i] = ImageOf(known, image);
                            break;
                        }

                        if (left.IsZero || !field.TrySqrt(left, out Residue root) || !root.IsReal)
                            return false;
                        image.Values[i] = (random.NextWord() & 1) == 0 ? root : field.Negate(root);
                        break;
                }
            }
        }

        return true;
    }

    private static Residue Half(PrimeField field)
    {
        field.TryInvert(field.Of(2), out Residue half);
        return half;
    }

    // 2 cos of a multiple of the least angle: the root's power and its inverse, which is its conjugate.
    private static Residue Twice(Image image, ulong multiple)
    {
        Residue power = image.Field.Power(image.Root, multiple);
        return image.Field.Add(power, new Residue(power.A, 0)) with { B = 0 };
    }

    private Residue ImageOf(Tied candidate, Image image)
    {
        PrimeField field = image.Field;
        Residue value = field.Multiply(field.Of(candidate.Factor.Numerator), Twice(image, candidate.Turns));
        field.TryInvert(field.Of(candidate.Factor.Denominator), out Residue inverse);
        value = field.Multiply(value, inverse);
        foreach (ulong prime in orderPrimes)
        {
            if (candidate.SquareFree % prime == 0)
                value = field.Multiply(value, RootOfPrime(image, prime));
        }

        return value;
    }

    // Gauss's sums: √q = Σ (a/q) cos(2πa/q) for q ≡ 1 modulo 4, Σ (a/q) sin(2πa/q) for q ≡ 3; √2 = 2 cos 45°.
    private Residue RootOfPrime(Image image, ulong prime)
    {
        PrimeField field = image.Field;
        if (prime == 2)
            return Twice(image, order / 8);

        Residue sum = default;
        for (ulong a = 1; a < prime; a++)
        {
            bool square = BigInteger.ModPow(a, (prime - 1) / 2, prime).IsOne;
            ulong multiple = Multiple((BigInteger)(order / prime) * a - (prime % 4 == 3 ? order / 4 : 0));
            Residue term = Twice(image, multiple);
            sum = square ? field.Add(sum, term) : field.Subtract(sum, term);
        }

        return field.Multiply(sum, Half(field));
    }

    // A point of the circle with exactly this order.
    private Residue RootOfUnity(PrimeField field)
    {
        while (true)
        {
            Residue t = field.Of(random.NextInteger(60));
            Residue square = field.Multiply(t, t);
            if (!field.TryInvert(field.Add(field.One, square), out Residue inverse))
                continue;
            Residue x = field.Multiply(field.Subtract(field.One, square), inverse);
            Residue y = field.Multiply(field.Add(t, t), inverse);
            Residue root = field.Power(PrimeField.Join(x, y), (field.Prime + 1) / order);
            bool whole = true;
            foreach (ulong prime in orderPrimes)
                whole &= field.Power(root, order / prime) != field.One;
            if (whole)
                return root;
        }
    }

    private IEnumerable<Tied> CandidatesFor(double root)
    {
        if (candidates.Count == 0)
            FillCandidates();

        foreach (ulong squareFree in SquareFree())
        {
            double size = root / Math.Sqrt(squareFree);
            foreach ((double twiceCosine, ulong multiple) in candidates)
            {
                if (Math.Abs(twiceCosine) > 1e-6 && TryRational(size / twiceCosine, out Rational factor))
                    yield return new Tied(factor, squareFree, multiple);
            }
        }
    }

    private IEnumerable<ulong> SquareFree()
    {
        List<ulong> small = [.. orderPrimes.Where(prime => prime < 1000).Take(6)];
        for (int set = 0; set < 1 << small.Count; set++)
        {
            ulong product = 1;
            for (int i = 0; i < small.Count; i++)
                product *= (set >> i & 1) != 0 ? small[i] : 1;
            yield return product;
        }
    }

    private void FillCandidates()
    {
        void Add(ulong multiple) => candidates.Add((2 * Math.Cos(2 * Math.PI * multiple / order), multiple));

        // Constructible angles first, 60° (for 1) before all, then half multiples of the leaves' angles with multiples of 15°.
        Add(order / 6);
        for (ulong k = 0; k < 240; k++)
            Add(k * (order / LeastOrder));
        foreach (ulong leaf in turns.Values.Distinct())
        {
            for (int m = 1; m <= MostHalves; m++)
            {
                for (ulong k = 0; k < 24; k++)
                    Add(Multiple((BigInteger)(leaf / 2) * m + k * (order / 24)));
            }
        }
    }

    private static bool TryRational(double value, out Rational result)
    {
        double rest = Math.Abs(value);
        (double p0, double q0, double p1, double q1) = (0, 1, 1, 0);
        result = default;
        for (int i = 0; i < 12; i++)
        {
            double whole = Math.Floor(rest);
            (p0, q0, p1, q1) = (p1, q1, whole * p1 + p0, whole * q1 + q0);
            if (q1 > MostDenominator || p1 > 1e9)
                return false;
            if (Math.Abs(p1 / q1 - Math.Abs(value)) <= 1e-11 * Math.Abs(value))
            {
                result = new Rational((BigInteger)p1 * Math.Sign(value), (BigInteger)q1);
                return p1 != 0;
            }

            if (rest == whole)
                return false;
            rest = 1 / (rest - whole);
        }

        return false;
    }
}
