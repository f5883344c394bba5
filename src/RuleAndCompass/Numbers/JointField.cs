using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>
/// The field of everything one decision needs, and the decision whether the number is zero in it. Roots that are independent apart can be
/// dependent together, so all square roots of the program are adjoined to one tower, each after the test that it is no element already.
/// </summary>
/// <remarks>
/// While the degree stays within the limit all is exact. Beyond it a root counts as independent when its radicand is no square in some
/// field of p² elements, which is a proof; a rational radicand goes through the flat layer; any other is computed exactly. The number is
/// then decided by images modulo random primes. A number that is not zero vanishes at no more primes than its norm has prime factors
/// of that size, and <see cref="House"/> bounds the norm.
///
/// Flat and nested roots stay apart: a nested root that was proved independent by an image in a field of p² elements is so over every flat
/// extension as well, since flat roots all lie in that field. So a rational radicand is a square of the whole field exactly when it is
/// one of the flat part.
/// </remarks>
internal sealed class JointField
{
    private const int TestImages = 12;
    private const int DivisorImages = 3;
    private const int SignChoices = 4;
    private const int EnoughCertainty = 128;
    private const int MostImages = 4000;
    private const int MostDraws = 1 << 20;

    // Fewer than 2^53.5 primes with 61 bits are 3 modulo 4 by a margin; at least 2^53.4 are (Rosser and Schoenfeld's bounds on π(x), halved).
    private const double LogPrimes = 53.4;

    private readonly SeededBits random;
    private readonly WorkLimit limit;
    private readonly long maximumDegree;
    private readonly Tower tower;
    private readonly FieldElement?[] elements;
    private readonly FieldElement?[] roots;
    private int[] fresh = [];
    private House[] houses = [];
    private ulong nestedByImage;
    private readonly List<int> freshInstructions = [];
    private readonly List<ModularImage> images = [];
    private int housed;
    private long draws;
    private double certainty = double.PositiveInfinity;

    public JointField(StraightLine line, long maximumDegree, SeededBits random, WorkLimit limit)
    {
        Line = line;
        this.maximumDegree = maximumDegree;
        this.random = random;
        this.limit = limit;
        tower = new Tower(limit);
        elements = new FieldElement?[line.Count];
        roots = new FieldElement?[line.Count];
    }

    public StraightLine Line { get; }

    public FieldElement? RootAt(int instruction) => roots[instruction];

    public int FreshAt(int instruction) => fresh[instruction];

    public FieldElement RadicandOf(int generator) => tower.RadicandOf(generator);

    /// <summary>Whether the instruction's value was found to be zero on the way; only instructions that were computed exactly are known.</summary>
    public bool IsKnownZero(int instruction) => elements[instruction] is { IsZero: true };

    /// <summary>Whether the program's result is zero; <paramref name="bits"/> is 0 where that is proved, else the certainty.</summary>
    public bool DecideZero(out int bits)
    {
        for (int i = 0; i < Line.Count; i++)
        {
            StraightLine.Instruction step = Line[i];
            if (step.IsConstant)
                continue;
            if (step.Operation == Operation.Sqrt)
                Adjoin(i);
            else if (step.Operation == Operation.Divide && (freshInstructions.Count > 0 || tower.Degree > maximumDegree))
            {
                StartImages();
                SimplifyDivisor(step.Right);
            }
        }

        bits = 0;
        if (tower.Degree <= maximumDegree && freshInstructions.Count == 0)
        {
            bool zero = Exact(Line.Result).IsZero;
            bits = double.IsPositiveInfinity(certainty) ? 0 : Floor(certainty);
            return zero;
        }

        StartImages();
        if (!VanishesInImages(Line.Result, default))
            return false;

        bits = Floor(certainty);
        return true;
    }

    /// <summary>The program's result as an element; null where the field would go above the limit.</summary>
    public FieldElement? FindElement()
    {
        for (int i = 0; i < Line.Count; i++)
        {
            if (Line[i].IsConstant || Line[i].Operation != Operation.Sqrt)
                continue;
            if (tower.Degree * 2 > maximumDegree)
                return null;
            AdjoinExactly(i);
        }

        return Exact(Line.Result);
    }

    private static int Floor(double value) => (int)Math.Min(value, 1 << 20);

    private void Adjoin(int at)
    {
        limit.Check();
        if (tower.Degree * 2 <= maximumDegree && freshInstructions.Count == 0)
        {
            AdjoinExactly(at);
            return;
        }

        StartImages();
        int radicand = Line[at].Left;
        if (elements[radicand] is { } known)
        {
            AdjoinKnown(at, known);
            return;
        }

        bool allReal = true;
        bool allZero = true;
        for (int i = 0; i < TestImages; i++)
        {
            ModularImage image = ImageAt(i, at);
            Residue value = image[radicand];
            allZero &= value.IsZero;
            allReal &= value.IsReal;
            if (value.IsZero || image.Field.TrySqrt(value, out _))
                continue;

            // No square here, so none in the field.
            images.RemoveAt(i);
            fresh[at] = tower.AdjoinFresh();
            nestedByImage |= 1UL << fresh[at];
            freshInstructions.Add(at);
            return;
        }

        if (allZero && VanishesInImages(radicand, default))
            elements[radicand] = FieldElement.Zero;
        else if (allReal && LooksRational(radicand) && FindRational(radicand) is { } rational)
            elements[radicand] = FieldElement.Of(rational);

        if (elements[radicand] is { } found)
        {
            houses[radicand] = HouseOf(found);
            AdjoinKnown(at, found);
            return;
        }

        MakeFreshExact();
        AdjoinExactly(at);
    }

    private void StartImages()
    {
        if (fresh.Length != 0)
            return;
        fresh = new int[Line.Count];
        Array.Fill(fresh, -1);
        houses = new House[Line.Count];
    }

    // A squared distance is often rational whatever its ends are; knowing it keeps the bounds small from there on.
    private void SimplifyDivisor(int divisor)
    {
        if (elements[divisor] is not null || Line[divisor].IsConstant)
            return;

        for (int i = 0; i < DivisorImages; i++)
        {
            if (!ImageAt(i, divisor + 1)[divisor].IsReal)
                return;
        }

        if (LooksRational(divisor) && FindRational(divisor) is { } rational)
        {
            elements[divisor] = FieldElement.Of(rational);
            EnsureHouses(divisor);
            houses[divisor] = House.Of(rational);
        }
    }

    private void AdjoinExactly(int at)
    {
        roots[at] = tower.Sqrt(Exact(Line[at].Left));
    }

    // A rational radicand in a field above the limit: by the flat layer alone where every nested root is independent of all flat ones.
    private void AdjoinKnown(int at, FieldElement radicand)
    {
        if (radicand.IsRational && NestedAreByImage())
            roots[at] = tower.FlatSqrt(radicand);
        else
        {
            MakeFreshExact();
            roots[at] = tower.Sqrt(radicand);
        }

        elements[at] = roots[at];
    }

    private bool NestedAreByImage()
    {
        for (int generator = 0; generator < tower.Count; generator++)
        {
            if (tower.IsFlat(generator) || (nestedByImage >> generator & 1) != 0)
                continue;
            if (!HasWitness(generator))
                return false;
            nestedByImage |= 1UL << generator;
        }

        return true;
    }

    // Looks for a field in which the generators below have images and the radicand of this one is no square.
    private bool HasWitness(int generator)
    {
        for (int i = 0; i < TestImages; i++)
        {
            var image = new ModularImage(this, PrimeField.Draw(random), random);
            for (int tries = 0; !image.TryGenerators(generator); tries++)
            {
                limit.Check();
                if (tries > MostDraws)
                    return false;
                image = new ModularImage(this, PrimeField.Draw(random), random);
            }

            if (image.TryEvaluate(tower.RadicandOf(generator), out Residue radicand) && !image.Field.TrySqrt(radicand, out _))
                return true;
        }

        return false;
    }

    private void MakeFreshExact()
    {
        foreach (int at in freshInstructions)
        {
            FieldElement radicand = Exact(Line[at].Left);
            roots[at] = tower.MakeExact(fresh[at], radicand);
            fresh[at] = -1;
        }

        if (freshInstructions.Count > 0)
            images.Clear();
        freshInstructions.Clear();
    }

    // The exact value of an instruction whose square roots are adjoined.
    private FieldElement Exact(int at)
    {
        if (elements[at] is { } known)
            return known;

        // Operands stand before their instruction, so one sweep over what is missing does.
        var needed = new Stack<int>();
        needed.Push(at);
        while (needed.TryPeek(out int index))
        {
            if (elements[index] is not null)
            {
                needed.Pop();
                continue;
            }

            StraightLine.Instruction step = Line[index];
            if (!step.IsConstant && step.Operation != Operation.Sqrt)
            {
                bool left = elements[step.Left] is not null;
                bool right = elements[step.Right] is not null;
                if (!left)
                    needed.Push(step.Left);
                if (!right)
                    needed.Push(step.Right);
                if (!left || !right)
                    continue;
            }

            limit.Check();
            needed.Pop();
            elements[index] = step.IsConstant ? FieldElement.Of(step.Value) : step.Operation switch
            {
                Operation.Add => Tower.Add(elements[step.Left]!, elements[step.Right]!),
                Operation.Subtract => Tower.Subtract(elements[step.Left]!, elements[step.Right]!),
                Operation.Multiply => tower.Multiply(elements[step.Left]!, elements[step.Right]!),
                Operation.Divide => tower.Multiply(elements[step.Left]!, tower.Invert(elements[step.Right]!)),
                _ => roots[index]!,
            };
        }

        return elements[at]!;
    }

    // The i-th image that reaches the instruction, drawn where there are fewer.
    private ModularImage ImageAt(int i, int end)
    {
        while (i < images.Count)
        {
            if (images[i].TryAdvance(end))
                return images[i];
            images.RemoveAt(i);
        }

        int zeroDivisors = 0;
        for (int tries = 0; tries < MostDraws; tries++)
        {
            limit.Check();
            draws++;
            var image = new ModularImage(this, PrimeField.Draw(random), random);
            if (image.TryAdvance(end))
            {
                images.Add(image);
                return image;
            }

            // By chance this happens once in 2^50 draws.
            if (image.ZeroDivisorAt >= 0 && ++zeroDivisors > 20)
                throw new DivideByZeroException("The divisor is 0.");
        }

        throw new TowerTooHighException(tower.Degree);
    }

    // Whether value − constant vanishes at enough random primes; one image that does not settles it the other way.
    private bool VanishesInImages(int at, Rational constant)
    {
        EnsureHouses(at);
        House house = House.Apply(Operation.Subtract, houses[at], House.Of(constant));
        double logBad = Math.Log2(Math.Max(house.Upper, 1) / (PrimeField.PrimeBits - 1)) + tower.Count;
        for (int count = 1; count <= MostImages; count++)
        {
            ModularImage image = ImageAt(count - 1, at + 1);
            if (!IsImageOf(image, at, constant))
                return false;

            double bits = count * (LogPrimes - Math.Max(logBad, 0) - Math.Log2(draws));
            if (bits >= EnoughCertainty)
            {
                certainty = double.IsPositiveInfinity(certainty) ? bits : Math.Min(certainty, bits) - 1;
                return true;
            }

            if (count >= 2 && LogPrimes - Math.Max(logBad, 0) - Math.Log2(draws) < 1)
                throw new TowerTooHighException(tower.Degree);
        }

        throw new TowerTooHighException(tower.Degree);
    }

    private static bool IsImageOf(ModularImage image, int at, Rational constant)
    {
        if (constant.IsZero)
            return image[at].IsZero;
        return image.Field.Multiply(image[at], image.Field.Of(constant.Denominator)) == image.Field.Of(constant.Numerator);
    }

    // A rational has one image whatever roots the generators go to.
    private bool LooksRational(int at)
    {
        for (int i = 0; i < SignChoices; i++)
        {
            ModularImage image = ImageAt(i, at + 1);
            var other = new ModularImage(this, image.Field, random);
            if (other.TryAdvance(at + 1) && other[at] != image[at])
                return false;
        }

        return true;
    }

    // The rational number that the instruction's images come from, certain; null where there is none.
    private Rational? FindRational(int at)
    {
        BigInteger modulus = BigInteger.One;
        BigInteger residue = BigInteger.Zero;
        Rational? candidate = null;
        const int MostPrimes = 64;
        for (int i = 0; i < MostPrimes; i++)
        {
            ModularImage image = ImageAt(i, at + 1);
            if (!image[at].IsReal)
                return null;
            if (candidate is { } guess && IsImageOf(image, at, guess))
            {
                // The images that made the guess say nothing about it: new ones must.
                images.RemoveRange(0, i);
                return VanishesInImages(at, guess) ? guess : null;
            }

            BigInteger prime = image.Field.Prime;
            BigInteger value = image.Field.ToInteger(image[at]);
            BigInteger step = (value - residue) * Inverse(modulus, prime) % prime;
            residue += modulus * (step.Sign < 0 ? step + prime : step);
            modulus *= prime;
            candidate = Reconstruct(residue, modulus);
        }

        return null;
    }

    private static BigInteger Inverse(BigInteger value, BigInteger prime) => BigInteger.ModPow(value, prime - 2, prime);

    // P. Wang, A p-adic algorithm for univariate partial fractions, SYMSAC (1981): the fraction with both parts below √(modulus/2).
    private static Rational? Reconstruct(BigInteger residue, BigInteger modulus)
    {
        BigInteger bound = IntegerRoot.Floor(modulus >> 1);
        (BigInteger r0, BigInteger r1) = (modulus, residue);
        (BigInteger t0, BigInteger t1) = (BigInteger.Zero, BigInteger.One);
        while (r1 > bound)
        {
            BigInteger quotient = BigInteger.DivRem(r0, r1, out BigInteger rest);
            (r0, r1) = (r1, rest);
            (t0, t1) = (t1, t0 - quotient * t1);
        }

        return t1.IsZero || BigInteger.Abs(t1) > bound ? null : new Rational(r1, t1);
    }

    private void EnsureHouses(int last)
    {
        for (; housed <= last; housed++)
        {
            StraightLine.Instruction step = Line[housed];
            House house = step.IsConstant ? House.Of(step.Value)
                : step.Operation == Operation.Divide && RationalAt(step.Right) is { IsZero: false } divisor
                    ? House.Apply(Operation.Multiply, houses[step.Left], House.Of(Rational.One / divisor))
                    : House.Apply(step.Operation, houses[step.Left], houses[step.Right]);
            if (!step.IsConstant && (elements[housed] ?? roots[housed]) is { } element)
                house = house.Better(HouseOf(element));
            houses[housed] = house;
        }
    }

    private Rational? RationalAt(int at) => Line[at].IsConstant ? Line[at].Value
        : elements[at] is { IsRational: true } element ? element.ToRational() : null;

    private House HouseOf(FieldElement element) => new(tower.LogHouse(element), 0, element.Denominator);
}
