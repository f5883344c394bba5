using System.Collections.Immutable;
using System.Globalization;
using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>Decides signs exactly. One for a script; not for use by several threads at once.</summary>
public sealed class Decider
{
    private const int FirstBits = 128;
    private const int SuspectZero = -56;
    private const int FewRoots = 16;

    // Against sizes near 1 a double's interval after a hundred steps is below this.
    private const double NearZero = 1e-9;
    private const int MostBitsUnresolved = 4096;
    private const int MostBitsUndecided = 2048;

    private readonly DeciderOptions options;
    private readonly CancellationToken cancellation;
    private readonly SeededBits random;
    private readonly List<Real> apart = [];
    private readonly List<Real> vanishing = [];
    private bool hasSpecific;
    private bool records;

    /// <summary>Decides within the limits of <paramref name="options"/>.</summary>
    public Decider(DeciderOptions options, CancellationToken cancellation = default)
    {
        this.options = options;
        this.cancellation = cancellation;
        random = new SeededBits(options.Seed);
    }

    private long MaximumDegree => options.Prove ? long.MaxValue / 4 : options.MaximumDegree;

    private WorkLimit NewLimit() => new(options.TimeLimit, cancellation);

    /// <summary>The sign of <paramref name="x"/>, with how it is known; may be undecided for quantities without exact value.</summary>
    /// <exception cref="UndecidedException">The limits were reached.</exception>
    public Decision Decide(Real x) => Record(x, Reach(x));

    /// <summary>Keeps what is decided meanwhile, so that <see cref="FindRanges"/> can tell how far it holds: for the decisions on which a figure depends.</summary>
    public T Recording<T>(Func<T> decide)
    {
        bool before = records;
        records = true;
        try
        {
            return decide();
        }
        finally
        {
            records = before;
        }
    }

    /// <summary>For each given that recorded decisions depend on: over which part of its range they all stay as they are.</summary>
    public ImmutableArray<ValidFor> FindRanges() => ValidRange.Of(apart, vanishing, hasSpecific);

    private Decision Record(Real x, Decision decision)
    {
        if (!records || x is RationalReal || !decision.Verdict.IsDecided)
            return decision;
        if (decision.Sign != 0)
            apart.Add(x);
        else
            vanishing.Add(x);
        // A zero at the very values of the givens, which is no theorem, holds nowhere else.
        hasSpecific |= decision.Sign == 0 && decision.Verdict.Certainty is not (Certainty.ProvedForEvery or Certainty.CertainForEvery) && StraightLine.LeavesOf(x).Exists(ValidRange.IsNamed);
        return decision;
    }

    private Decision Reach(Real x)
    {
        if (SignOfEnclosure(x) is { } quick)
            return new Decision(quick, Verdict.Proved);

        // A number that doubles cannot tell from zero is zero, nearly always: where the field is small, ask it before any ball.
        WorkLimit limit = NewLimit();
        bool? isZero = false;
        StraightLine? line = LooksZero(x) ? StraightLine.Compile(x, Specific) : null;
        bool asked = line is not null && line.Roots <= FewRoots && !line.HasLeaves;
        if (asked)
        {
            try
            {
                isZero = DecideZero(x, line, limit, out Verdict? verdict);
                if (isZero == true)
                    return new Decision(0, verdict!);
            }
            catch (UndecidedException)
            {
                // A ball may still tell the sign; where none does, the field is asked again and its answer stands.
                asked = false;
            }
        }

        int bits = FirstBits;
        for (; bits <= MostBitsUnresolved; bits *= 2)
        {
            Ball ball = Enclosures.Of(x, bits, cancellation);
            if (ball.Sign != 0)
                return new Decision(ball.Sign, Verdict.Proved);
            if (ball.IsBelow(SuspectZero))
                break;
        }

        if (!asked)
        {
            isZero = DecideZero(x, line, limit, out Verdict? verdict);
            if (isZero == true)
                return new Decision(0, verdict!);
        }

        // Not zero, or nobody knows: ever finer balls.
        int most = isZero == false ? options.MaximumBits : Math.Min(options.MaximumBits, MostBitsUndecided);
        for (; bits <= most; bits *= 2)
        {
            Ball ball = Enclosures.Of(x, bits, cancellation);
            if (ball.Sign != 0)
                return new Decision(ball.Sign, Verdict.Proved);
        }

        Verdict known = new(Certainty.Digits, DigitsBelow(Enclosures.Of(x, most, cancellation)), []);
        if (isZero == false)
            throw new UndecidedException($"the number is not 0 but closer to it than {most.ToString(CultureInfo.InvariantCulture)} bits can tell", known);
        return new Decision(0, known);
    }

    /// <summary>The sign of <paramref name="x"/>.</summary>
    /// <exception cref="UndecidedException">It could not be decided.</exception>
    public int Sign(Real x)
    {
        if (SignOfEnclosure(x) is { } quick)
        {
            if (records)
                Record(x, new Decision(quick, Verdict.Proved));
            return quick;
        }

        Decision decision = Decide(x);
        if (!decision.Verdict.IsDecided)
            throw new UndecidedException($"the two sides agree {decision.Verdict} and have no exact value to compare", decision.Verdict);
        return decision.Sign;
    }

    /// <summary>Whether <paramref name="x"/> is 0.</summary>
    /// <exception cref="UndecidedException">It could not be decided.</exception>
    public bool IsZero(Real x) => Sign(x) == 0;

    /// <summary>The sign of a − b.</summary>
    /// <exception cref="UndecidedException">It could not be decided.</exception>
    public int Compare(Real a, Real b)
    {
        if (a.Low > b.High)
            return 1;
        return a.High < b.Low ? -1 : Sign(a - b);
    }

    /// <summary>Compares sizes of angles (turns counted): the sign of a − b.</summary>
    public Decision Compare(Angle a, Angle b)
    {
        Angle difference = a - b;
        if (difference.TryGetDegrees(out Rational degrees))
            return new Decision(degrees.Sign, Verdict.Proved);

        Real size = difference.Degrees;
        for (int bits = FirstBits; bits <= MostBitsUndecided; bits *= 2)
        {
            Ball ball = Enclosures.Of(size, bits, cancellation);
            if (ball.Sign != 0)
                return new Decision(ball.Sign, Verdict.Proved);

            // Within a turn, the angle is 0 exactly when its direction is: a multiple that has a direction will do.
            Angle whole = difference.WithDirection(out BigInteger multiple);
            if (bits == FirstBits && ball.IsBelow(-(int)multiple.GetBitLength()))
            {
                Decision direction = CompareDirections(whole, Angle.Zero);
                if (direction.Sign == 0 && direction.Verdict.IsDecided)
                    return direction;
            }
        }

        return new Decision(0, new Verdict(Certainty.Digits, DigitsBelow(Enclosures.Of(size, MostBitsUndecided, cancellation)), []));
    }

    /// <summary>Whether a and b point the same way (turns not counted): sign 0 when they do, else the sign of the turn from b to a the short way.</summary>
    public Decision CompareDirections(Angle a, Angle b)
    {
        Angle difference = a - b;
        if (difference.TryGetDegrees(out Rational degrees))
        {
            Rational turn = Constructible.Turned(degrees, 360);
            return new Decision(turn.IsZero ? 0 : turn <= 180 ? 1 : -1, Verdict.Proved);
        }

        (Real ax, Real ay) = a.Vector;
        (Real bx, Real by) = b.Vector;
        Decision side = Decide(bx * ay - by * ax);
        if (side.Sign != 0 || !side.Verdict.IsDecided)
            return side;
        return Sign(ax * bx + ay * by) > 0 ? side : new Decision(1, side.Verdict);
    }

    /// <summary>
    /// True when <paramref name="x"/> vanishes for every value of the nodes in <paramref name="free"/> near the ones they have,
    /// treating those nodes as independent unknowns: a local theorem, cheap however deep the nodes are. False says nothing.
    /// </summary>
    public bool HoldsIdentically(Real x, IReadOnlyCollection<Real> free, out Verdict verdict)
    {
        verdict = new Verdict(Certainty.Digits, 0, []);
        if (SignOfEnclosure(x) is { } quick)
        {
            if (quick == 0)
                verdict = Verdict.Proved;
            return quick == 0;
        }

        // A stand-in for each free node is made by rebuilding the graph above them.
        Real rebuilt = FreeNodes.Detach(x, free);
        List<Real> leaves = StraightLine.LeavesOf(rebuilt);
        WorkLimit limit = NewLimit();
        Verdict? found = null;
        try
        {
            if (leaves.Count > 0)
                found = new GenericPoint(leaves, random, limit).TryVanishing(rebuilt, MaximumDegree);
        }
        catch (Exception failure) when (failure is OutOfTimeException or NumberTooLongException)
        {
            return false;
        }

        if (found is null)
            return false;

        verdict = found;
        return true;
    }

    /// <summary>A decimal with <paramref name="significantDigits"/> certain digits (the last one rounded), fewer where the decimal ends. Plain notation.</summary>
    public string ToDecimal(Real x, int significantDigits)
    {
        if (SignOfEnclosure(x) is not { } sign)
        {
            Decision decision = Decide(x);
            sign = decision.Sign;
        }

        if (sign == 0)
            return "0";

        // The place of the first digit, from an enclosure of the size; the rounding itself is certain.
        for (int bits = FirstBits; ; bits *= 2)
        {
            Ball ball = Enclosures.Of(x, bits, cancellation);
            if (ball.Sign == 0)
            {
                if (bits > options.MaximumBits)
                    throw TooFine(bits);
                continue;
            }

            // 10^(magnitude) ≤ |x| up to one too many, which the rounding below puts right.
            int magnitude = (int)Math.Floor((BigInteger.Log10(BigInteger.Abs(ball.Middle)) + ball.Exponent * 0.30102999566398120));
            int places = significantDigits - 1 - magnitude;
            BigInteger rounded = RoundedAt(x, places);
            return DecimalText.Write(rounded, places, trim: Ends(x, rounded, places));
        }
    }

    // A nought at the end is left out only where the decimal ends there; else it is a certain digit like any other.
    private bool Ends(Real x, BigInteger rounded, int places)
    {
        if (!(rounded % 10).IsZero)
            return true;
        Rational value = places >= 0 ? new Rational(rounded, BigInteger.Pow(10, places)) : rounded * BigInteger.Pow(10, -places);
        return x.TryGetRational(out Rational exact) ? exact == value : Decide(x - value).IsZero;
    }

    /// <summary>A decimal rounded to <paramref name="places"/> decimals, certain.</summary>
    public string ToFixed(Real x, int places)
    {
        BigInteger rounded = RoundedAt(x, places);
        return DecimalText.Write(rounded, places, trim: false);
    }

    /// <summary>The exact form where it is short (<c>3/8</c>, <c>√2/2</c>), else null.</summary>
    public string? ToExactForm(Real x)
    {
        if (x.TryGetRational(out Rational rational))
            return ExactForm.Of(FieldElement.Of(rational), null);

        StraightLine? line = StraightLine.Compile(x, Specific);
        if (line is null)
            return null;

        try
        {
            var joint = new JointField(line, ExactForm.MostDegree, random, NewLimit());
            return joint.FindElement() is { } element ? ExactForm.Of(element, joint) : null;
        }
        catch (Exception failure) when (failure is NegativeRadicandException or TowerTooHighException or DivideByZeroException or OutOfTimeException or NumberTooLongException)
        {
            return null;
        }
    }

    /// <summary>Whether <paramref name="x"/> is zero, by the field alone, whatever its enclosures say.</summary>
    internal bool IsExactlyZero(Real x, out Verdict verdict)
    {
        bool? isZero = DecideZero(x, null, NewLimit(), out Verdict? known);
        verdict = known ?? Verdict.Proved;
        return isZero == true;
    }

    // The sign, or 0 for the rational 0, where the enclosure at hand tells it.
    private static int? SignOfEnclosure(Real x)
    {
        if (x.Low > 0)
            return 1;
        if (x.High < 0)
            return -1;
        return x is RationalReal rational ? rational.Value.Sign : null;
    }

    private static int DigitsBelow(Ball ball)
    {
        int magnitude = ball.IsUnknown ? 0 : ball.MagnitudeBound();
        return magnitude >= 0 ? 0 : (int)(-(long)magnitude * 30103 / 100000);
    }

    // Within rounding of zero as far as doubles know, beside the numbers it was made from.
    private static bool LooksZero(Real x)
    {
        double size = Math.Max(-x.Low, x.High);
        double beside = 1;
        if (x is OperationReal { Operation: Operation.Add or Operation.Subtract } sum)
            beside = Math.Max(Math.Abs(sum.Left.High), Math.Abs(sum.Right!.High));
        return size < beside * NearZero;
    }

    private bool? DecideZero(Real x, StraightLine? line, WorkLimit limit, out Verdict? verdict)
    {
        verdict = null;
        try
        {
            return DecideByField(x, line ?? StraightLine.Compile(x, Specific), limit, ref verdict);
        }
        catch (TowerTooHighException tooHigh)
        {
            throw new UndecidedException(
                $"the decision needs numbers of degree {tooHigh.Degree.ToString(CultureInfo.InvariantCulture)}",
                KnownOf(x));
        }
        catch (OutOfTimeException)
        {
            throw new UndecidedException("the decision takes longer than the time allowed", KnownOf(x));
        }
        catch (NumberTooLongException)
        {
            throw new UndecidedException("the decision needs numbers of too many digits", KnownOf(x));
        }
        catch (DivideByZeroException)
        {
            throw new UndecidedException("a divisor is exactly 0", KnownOf(x));
        }
        catch (NegativeRadicandException)
        {
            throw new UndecidedException("a radicand is negative", KnownOf(x));
        }
    }

    private Verdict KnownOf(Real x) => new(Certainty.Digits, DigitsBelow(Enclosures.Of(x, FirstBits, cancellation)), []);

    private bool? DecideByField(Real x, StraightLine? line, WorkLimit limit, ref Verdict? verdict)
    {
        if (line is null || line.HasLeaves)
        {
            List<Real> leaves = StraightLine.LeavesOf(x);
            verdict = new GenericPoint(leaves, random, limit).TryVanishing(x, MaximumDegree);
            if (verdict is not null)
                return true;
        }

        if (line is null)
        {
            verdict = CyclotomicField.TryVanishing(x, random, limit);
            return verdict is null ? null : true;
        }

        bool isZero = new JointField(line, MaximumDegree, random, limit).DecideZero(out int bits);
        verdict = bits == 0 ? Verdict.Proved : new Verdict(Certainty.Certain, bits, []);
        return isZero;
    }

    // A leaf by its own value where that is constructible.
    private static Real? Specific(Real leaf)
    {
        if (leaf is GivenReal given)
            return given.Value;
        if (leaf is not DirectionReal direction || !direction.Source.Degrees.TryGetRational(out Rational degrees))
            return null;

        (Rational part, Rational rest) = Constructible.Split(direction.Multiple * degrees);
        if (!rest.IsZero)
            return null;
        (Real cosine, Real sine) = Constructible.Unit(part);
        return direction.IsSine ? sine : cosine;
    }

    // x × 10^places rounded to the nearest integer, ties away from zero: floor(2·|x|·10^places) tells, and only a tie needs a decision.
    private BigInteger RoundedAt(Real x, int places)
    {
        Rational scale = places >= 0 ? BigInteger.Pow(10, places) : Rational.One / BigInteger.Pow(10, -places);
        Rational half = new(1, 2);
        if (x.TryGetRational(out Rational exact))
        {
            Rational scaled = exact.Abs() * scale;
            return (scaled + half).Floor() * (exact.Sign < 0 ? -1 : 1);
        }

        bool decided = false;
        for (int bits = FirstBits; bits <= options.MaximumBits; bits *= 2)
        {
            Ball ball = Enclosures.Of(x, bits, cancellation);
            if (ball.IsUnknown)
                continue;

            Rational low = ball.End(upper: false) * scale;
            Rational high = ball.End(upper: true) * scale;
            BigInteger first = RoundAway(low);
            BigInteger last = RoundAway(high);
            if (first == last)
                return first;

            if (!decided && last - first <= 1)
            {
                // The one tie, or the sign, that may lie between.
                decided = true;
                Rational tie = (first + last) * half / scale;
                Decision decision = Decide(x - tie);
                if (decision.Verdict.IsDecided)
                {
                    if (decision.Sign != 0)
                        return decision.Sign > 0 ? last : first;
                    return tie.Sign < 0 ? first : last;
                }

                // Equal to the tie as far as anyone can tell: either way of rounding is right within that.
                return tie.Sign < 0 ? first : last;
            }
        }

        throw TooFine(options.MaximumBits);
    }

    private static BigInteger RoundAway(Rational value)
    {
        BigInteger size = (value.Abs() + new Rational(1, 2)).Floor();
        return value.Sign < 0 ? -size : size;
    }

    private static UndecidedException TooFine(int bits) =>
        new($"the digits need more than {bits.ToString(CultureInfo.InvariantCulture)} bits", new Verdict(Certainty.Digits, 0, []));
}
