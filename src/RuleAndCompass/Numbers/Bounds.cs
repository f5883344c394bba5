using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>
/// How large and of what degree the norm of a number with unknowns can be. A number is written as u over a product of factors, all integral over
/// the polynomials in the unknowns: the factors are the 1 + t² of an angle, what was divided by, and denominators of constants. Sums share
/// factors; degrees and sizes of u are followed through the program.
/// </summary>
/// <param name="LogDegree">Binary logarithm of the degree, rounded up.</param>
/// <param name="ProofBits">Bits that no leading coefficient has.</param>
/// <remarks>The bookkeeping is that of C. Burnikel, R. Fleischer, K. Mehlhorn and S. Schirra, Algorithmica 27 (2000), carried to polynomials.</remarks>
internal readonly record struct Bounds(int LogDegree, int ProofBits)
{
    public static Bounds Of(StraightLine line, Dictionary<int, (int Unknown, int Degree)> places)
    {
        var factors = new Factors();
        var parts = new Part[line.Count];
        var moving = new bool[line.Count];
        int roots = 0;
        Size greatest = new(1, 1);
        for (int i = 0; i < line.Count; i++)
        {
            StraightLine.Instruction step = line[i];
            if (places.TryGetValue(i, out (int Unknown, int Degree) place))
            {
                moving[i] = true;
                // Cosine and sine: the parts of (1 + it)²ⁿ over (1 + t²)ⁿ; their coefficients add up to 2²ⁿ⁻¹ at most. A number: t over 1.
                parts[i] = place.Degree < 0
                    ? new Part(new Size(1, 0), [])
                    : new Part(new Size(place.Degree, place.Degree), [(factors.OfCircle(place.Unknown), place.Degree / 2)]);
                continue;
            }

            if (step.IsConstant)
            {
                parts[i] = new Part(new Size(0, Log(step.Value.Numerator)), step.Value.IsInteger ? [] : [(factors.OfConstant(step.Value.Denominator), 1)]);
                continue;
            }

            Part a = parts[step.Left];
            Part b = parts[step.Right];
            moving[i] = moving[step.Left] || moving[step.Right];
            parts[i] = step.Operation switch
            {
                Operation.Multiply => new Part(a.Upper + b.Upper, Merged(a.Lower, b.Lower, (x, y) => x + y)),
                Operation.Divide => factors.Divided(a, b, step.Right),
                Operation.Sqrt => factors.Rooted(a),
                _ => factors.Sum(a, b),
            };
            if (step.Operation == Operation.Sqrt && moving[i])
                roots++;
            greatest = greatest.Larger(parts[i].Upper).Larger(factors.SizeOf(parts[i].Lower));
        }

        double logDegree = roots + Math.Log2(greatest.Degree) + 1;
        double proofBits = (greatest.Log + 1) * Math.Pow(2, roots);
        return new Bounds(
            logDegree < 10000 ? (int)Math.Ceiling(logDegree) : int.MaxValue,
            proofBits < 1e9 ? (int)Math.Ceiling(proofBits) + 1 : int.MaxValue);
    }

    private static double Log(BigInteger value) => value.IsZero ? 0 : value.GetBitLength();

    // Factors stand in order of their numbers.
    private static (int Factor, double Power)[] Merged((int Factor, double Power)[] a, (int Factor, double Power)[] b, Func<double, double, double> join)
    {
        if (b.Length == 0 && a.Length == 0)
            return a;

        var merged = new List<(int Factor, double Power)>(a.Length + b.Length);
        for (int i = 0, j = 0; i < a.Length || j < b.Length;)
        {
            int order = i == a.Length ? 1 : j == b.Length ? -1 : a[i].Factor.CompareTo(b[j].Factor);
            (int Factor, double Power) next = order < 0 ? (a[i].Factor, join(a[i].Power, 0))
                : order > 0 ? (b[j].Factor, join(0, b[j].Power))
                : (a[i].Factor, join(a[i].Power, b[j].Power));
            i += order <= 0 ? 1 : 0;
            j += order >= 0 ? 1 : 0;
            if (next.Power > 0)
                merged.Add(next);
        }

        return [.. merged];
    }

    /// <summary>Degree in the unknowns, and the binary logarithm of the greatest size on the unit circle.</summary>
    private readonly record struct Size(double Degree, double Log)
    {
        public static Size operator +(Size a, Size b) => new(a.Degree + b.Degree, a.Log + b.Log);

        public static Size operator *(double power, Size a) => new(power * a.Degree, power * a.Log);

        public Size Larger(Size other) => new(Math.Max(Degree, other.Degree), Math.Max(Log, other.Log));
    }

    private readonly record struct Part(Size Upper, (int Factor, double Power)[] Lower);

    private sealed class Factors
    {
        private readonly List<Size> sizes = [];
        private readonly Dictionary<int, int> circles = [];
        private readonly Dictionary<int, int> divisors = [];
        private readonly Dictionary<BigInteger, int> constants = [];

        public int OfCircle(int unknown) => Find(circles, unknown, new Size(2, 1));

        public int OfConstant(BigInteger denominator) => Find(constants, denominator, new Size(0, Log(denominator)));

        public Size SizeOf((int Factor, double Power)[] product)
        {
            Size size = default;
            foreach ((int factor, double power) in product)
                size += power * sizes[factor];
            return size;
        }

        // What b was divided by comes above, but for what a was divided by as well; b's u becomes a factor below.
        public Part Divided(Part a, Part b, int divisor)
        {
            (int Factor, double Power)[] above = Merged(b.Lower, a.Lower, (x, y) => Math.Max(0, x - y));
            (int Factor, double Power)[] below = Merged(a.Lower, b.Lower, (x, y) => Math.Max(0, x - y));
            if (b.Upper != default)
                below = Merged(below, [(Find(divisors, divisor, b.Upper), 1)], (x, y) => x + y);
            return new Part(a.Upper + SizeOf(above), below);
        }

        // √(u/f^n) = √(u f)/f^((n + 1)/2) for odd n.
        public Part Rooted(Part a)
        {
            Size upper = a.Upper;
            var below = new (int Factor, double Power)[a.Lower.Length];
            for (int i = 0; i < below.Length; i++)
            {
                (int factor, double power) = a.Lower[i];
                double half = Math.Ceiling(power / 2);
                upper += (2 * half - power) * sizes[factor];
                below[i] = (factor, half);
            }

            return new Part(0.5 * upper, below);
        }

        public Part Sum(Part a, Part b)
        {
            (int Factor, double Power)[] common = Merged(a.Lower, b.Lower, Math.Max);
            Size first = a.Upper + SizeOf(Merged(common, a.Lower, (x, y) => x - y));
            Size second = b.Upper + SizeOf(Merged(common, b.Lower, (x, y) => x - y));
            Size larger = first.Larger(second);
            return new Part(larger with { Log = larger.Log + 1 }, common);
        }

        private int Find<T>(Dictionary<T, int> known, T key, Size size)
            where T : notnull
        {
            if (!known.TryGetValue(key, out int factor))
            {
                factor = sizes.Count;
                sizes.Add(size);
                known.Add(key, factor);
            }

            return factor;
        }
    }
}
