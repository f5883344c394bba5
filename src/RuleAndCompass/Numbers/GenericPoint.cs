using System.Collections.Immutable;
using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>
/// Decides identities for every value of the quantities in them: each is replaced by a random rational near its value, an angle by a
/// random rational point of the unit circle, and the ordinary tower decides there.
/// </summary>
/// <remarks>
/// Let x vanish at the random point without vanishing identically. Then the norm of x, a polynomial P in the unknowns with algebraic
/// integers for coefficients, vanishes there too. Its degree is at most the sum over the conjugates of x, so that the chance is at most
/// degree / 2^(random bits): J. T. Schwartz, J. ACM 27 (1980). With one unknown t = a/2^B and a odd, P(t) = 0 makes 2^B divide the
/// leading coefficient; where B exceeds a bound of that coefficient's size, x vanishes identically: then it is proved. The bound is
/// taken on the circle |t| = 1, where Cauchy's inequality bounds every coefficient.
/// The value at the random point tells about the value at hand because no radicand and no divisor vanishes between: balls show it.
/// </remarks>
internal sealed class GenericPoint
{
    private const int RandomBits = 192;
    private const int LeastCertainty = 128;
    private const int MostProofBits = 4096;
    private const int FirstNearness = 40;
    private const int MostNearness = 640;

    private readonly SeededBits random;
    private readonly WorkLimit limit;
    private readonly List<Real> leaves;
    private readonly List<Unknown> unknowns = [];
    private readonly Dictionary<Real, int> unknownOf = new(ReferenceEqualityComparer.Instance);

    public GenericPoint(List<Real> leaves, SeededBits random, WorkLimit limit)
    {
        this.random = random;
        this.limit = limit;
        this.leaves = leaves;
        foreach (Real leaf in leaves)
            Place(leaf);
    }

    // A number has no source.
    private sealed class Unknown(AngleSource? source, Real? number)
    {
        public AngleSource? Source { get; } = source;

        public Real? Number { get; } = number;

        public Rational Unit { get; set; }

        public Rational Near { get; set; }

        public string? Name => Source is { } angle ? angle.Name : (Number as GivenReal)?.Name;
    }

    /// <summary>The verdict where <paramref name="x"/> vanishes identically; null where it does not, or where this cannot tell.</summary>
    public Verdict? TryVanishing(Real x, long maximumDegree)
    {
        for (int nearness = FirstNearness; nearness <= MostNearness; nearness *= 2)
        {
            int bits = RandomBits + nearness;
            var standIns = new Dictionary<Real, Real>(ReferenceEqualityComparer.Instance);
            if (!Draw(nearness, bits) || !Fill(standIns))
                return null;

            StraightLine line = StraightLine.Compile(x, leaf => standIns[leaf])!;
            limit.Check();
            Bounds bounds = Bounds.Of(line, IndexOf(line, standIns));
            if (bounds.LogDegree > RandomBits - LeastCertainty)
                return null;

            int proofBits = unknowns.Count == 1 ? bounds.ProofBits : int.MaxValue;
            bool proves = proofBits <= MostProofBits;
            if (proves && proofBits > bits)
            {
                Lengthen(proofBits + 8);
                standIns.Clear();
                Fill(standIns);
                line = StraightLine.Compile(x, leaf => standIns[leaf])!;
            }

            var joint = new JointField(line, maximumDegree, random, limit);
            bool isZero;
            int certainty;
            try
            {
                isZero = joint.DecideZero(out certainty);
            }
            catch (Exception failure) when (failure is NegativeRadicandException or TowerTooHighException or DivideByZeroException)
            {
                if (failure is TowerTooHighException)
                    return null;
                continue;
            }

            if (!isZero)
                return null;
            if (!BranchHolds(line, joint, NearHulls(line, standIns, nearness), nearness))
                continue;

            ImmutableArray<string> names = [.. unknowns.Select(unknown => unknown.Name).OfType<string>()];
            int size = RandomBits - bounds.LogDegree;
            if (certainty > 0)
            {
                proves = false;
                size = Math.Min(size, certainty) - 1;
            }

            return (proves, names.IsEmpty) switch
            {
                (true, true) => Verdict.Proved,
                (true, false) => new Verdict(Certainty.ProvedForEvery, 0, names),
                (false, true) => new Verdict(Certainty.Certain, size, []),
                _ => new Verdict(Certainty.CertainForEvery, size, names),
            };
        }

        return null;
    }

    private void Place(Real leaf)
    {
        if (leaf is not DirectionReal direction)
        {
            unknownOf[leaf] = unknowns.Count;
            unknowns.Add(new Unknown(null, leaf));
            return;
        }

        int at = unknowns.FindIndex(unknown => ReferenceEquals(unknown.Source, direction.Source));
        if (at < 0)
        {
            at = unknowns.Count;
            unknowns.Add(new Unknown(direction.Source, null) { Unit = direction.Multiple.Abs() });
        }
        else
        {
            unknowns[at].Unit = CommonMeasure(unknowns[at].Unit, direction.Multiple.Abs());
        }

        unknownOf[leaf] = at;
    }

    private static Rational CommonMeasure(Rational a, Rational b)
    {
        BigInteger denominator = a.Denominator * b.Denominator / BigInteger.GreatestCommonDivisor(a.Denominator, b.Denominator);
        return new Rational(
            BigInteger.GreatestCommonDivisor(a.Numerator * (denominator / a.Denominator), b.Numerator * (denominator / b.Denominator)),
            denominator);
    }

    // Values that agree with the true ones to `nearness` bits and go on with random ones, the last bit odd.
    private bool Draw(int nearness, int bits)
    {
        foreach (Unknown unknown in unknowns)
        {
            Ball near = ParameterOf(unknown, nearness + 32);
            if (near.IsUnknown)
                return false;
            BigInteger lead = near.FloorAt(-nearness, upper: false);
            unknown.Near = new Rational(lead << (bits - nearness) | random.NextInteger(bits - nearness) | 1, BigInteger.One << bits);
        }

        return true;
    }

    private void Lengthen(int bits)
    {
        foreach (Unknown unknown in unknowns)
        {
            int more = bits - (int)(unknown.Near.Denominator.GetBitLength() - 1);
            unknown.Near = new Rational(unknown.Near.Numerator << more | 1, unknown.Near.Denominator << more);
        }
    }

    // The number itself, or the tangent of half the unit angle.
    private static Ball ParameterOf(Unknown unknown, int bits)
    {
        if (unknown.Number is { } number)
            return Enclosures.Of(number, bits);

        (Ball cosine, Ball sine) = Elementary.OfDegrees(
            Ball.Multiply(Enclosures.Of(unknown.Source!.Degrees, bits + 16), Ball.Of(unknown.Unit, bits + 16), bits + 16), bits + 16);
        return Ball.Divide(sine, Ball.Add(Ball.Of(1, bits), cosine, bits), bits);
    }

    private bool Fill(Dictionary<Real, Real> standIns)
    {
        foreach (Real leaf in leaves)
        {
            Unknown unknown = unknowns[unknownOf[leaf]];
            if (leaf is not DirectionReal direction)
            {
                standIns[leaf] = unknown.Near;
                continue;
            }

            BigInteger times = (direction.Multiple / unknown.Unit).Numerator;
            if (BigInteger.Abs(times) > 1000)
                return false;
            BigInteger a = unknown.Near.Numerator;
            BigInteger b = unknown.Near.Denominator;
            (BigInteger X, BigInteger Y) power = Power((b * b - a * a, 2 * a * b), (int)BigInteger.Abs(times));
            BigInteger length = BigInteger.Pow(a * a + b * b, (int)BigInteger.Abs(times));
            Rational part = new(direction.IsSine ? power.Y * times.Sign : power.X, length);
            standIns[leaf] = part;
        }

        return true;
    }

    private static (BigInteger X, BigInteger Y) Power((BigInteger X, BigInteger Y) unit, int exponent)
    {
        (BigInteger X, BigInteger Y) result = (BigInteger.One, BigInteger.Zero);
        for (int i = 0; i < exponent; i++)
            result = (result.X * unit.X - result.Y * unit.Y, result.X * unit.Y + result.Y * unit.X);
        return result;
    }

    private Dictionary<int, (int Unknown, int Degree)> IndexOf(StraightLine line, Dictionary<Real, Real> standIns)
    {
        var places = new Dictionary<int, (int, int)>();
        foreach ((int at, Real leaf) in PlacesOf(line, standIns))
        {
            Rational unit = unknowns[unknownOf[leaf]].Unit;
            int degree = leaf is DirectionReal direction ? 2 * (int)BigInteger.Abs((direction.Multiple / unit).Numerator) : -1;
            places[at] = (unknownOf[leaf], degree);
        }

        return places;
    }

    // Where the leaves may be: between their values and the random ones.
    private Dictionary<int, Ball> NearHulls(StraightLine line, Dictionary<Real, Real> standIns, int nearness)
    {
        var hulls = new Dictionary<int, Ball>();
        foreach ((int at, Real leaf) in PlacesOf(line, standIns))
            hulls[at] = NearHull(leaf, unknowns[unknownOf[leaf]], line[at].Value, nearness, nearness + 128);
        return hulls;
    }

    private IEnumerable<(int At, Real Leaf)> PlacesOf(StraightLine line, Dictionary<Real, Real> standIns)
    {
        foreach (Real leaf in leaves)
        {
            Rational value = ((RationalReal)standIns[leaf]).Value;
            for (int i = 0; i < line.Count; i++)
            {
                if (line[i].IsConstant && line[i].Value == value)
                    yield return (i, leaf);
            }
        }
    }

    // |t − t*| ≤ 2^(2−nearness), and the point turns by at most twice that for each multiple.
    private static Ball NearHull(Real leaf, Unknown unknown, Rational value, int nearness, int bits)
    {
        BigInteger factor = leaf is DirectionReal direction ? 2 * BigInteger.Abs((direction.Multiple / unknown.Unit).Numerator) : 1;
        return Ball.Of(value, bits).Widened(Ball.Around(factor, 2 - nearness, BigInteger.Zero, bits), bits);
    }

    // No radicand and no divisor vanishes while the leaves move in their hulls.
    private static bool BranchHolds(StraightLine line, JointField joint, Dictionary<int, Ball> hulls, int bits)
    {
        bits += 128;
        Ball[] balls = ProgramBalls.Evaluate(line, hulls, bits);
        for (int i = 0; i < line.Count; i++)
        {
            StraightLine.Instruction step = line[i];
            if (step.IsConstant)
                continue;
            if (step.Operation == Operation.Divide && balls[step.Right].ContainsZero)
                return false;
            if (step.Operation == Operation.Sqrt && balls[step.Left].Sign <= 0 && !joint.IsKnownZero(step.Left))
                return false;
        }

        return true;
    }
}
