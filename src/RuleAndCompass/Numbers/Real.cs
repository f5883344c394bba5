namespace RuleAndCompass.Numbers;

/// <summary>An exact real number: an immutable node of an expression graph.</summary>
/// <remarks>
/// A node knows an enclosure in doubles from its making on; <see cref="Decider"/> tightens it. The value never changes, only what is
/// known of it, and each bound is right by itself, so that reading while another thread writes is harmless.
/// </remarks>
public abstract class Real
{
    private const long MostFoldedBits = 200_000;

    private protected Real(Interval enclosure)
    {
        Low = enclosure.Low;
        High = enclosure.High;
    }

    /// <summary>0.</summary>
    public static Real Zero { get; } = new RationalReal(Rational.Zero);

    /// <summary>1.</summary>
    public static Real One { get; } = new RationalReal(Rational.One);

    /// <summary>π, a quantity without an exact value: enclosures only, generic in identities.</summary>
    public static Real Pi { get; } = new PiReal();

    /// <summary>Not above the value.</summary>
    internal double Low { get; private set; }

    /// <summary>Not below the value.</summary>
    internal double High { get; private set; }

    private Interval Enclosure => new(Low, High);

    /// <summary>For <see cref="StraightLine"/>: a stamp in the high half, a place in the low one, written at once.</summary>
    internal long Mark { get; set; }

    /// <summary>An integer.</summary>
    public static implicit operator Real(int value) => new RationalReal(value);

    /// <summary>A fraction.</summary>
    public static implicit operator Real(Rational value) => new RationalReal(value);

    /// <summary>The sum.</summary>
    public static Real operator +(Real a, Real b)
    {
        if (a is RationalReal p)
        {
            if (b is RationalReal q)
                return Folded(Operation.Add, a, b, p.Value, q.Value);
            if (p.Value.IsZero)
                return b;
        }
        else if (b is RationalReal { Value.IsZero: true })
        {
            return a;
        }

        return new OperationReal(Operation.Add, a, b, Interval.Add(a.Enclosure, b.Enclosure));
    }

    /// <summary>The difference.</summary>
    public static Real operator -(Real a, Real b)
    {
        if (b is RationalReal q)
        {
            if (a is RationalReal p)
                return Folded(Operation.Subtract, a, b, p.Value, q.Value);
            if (q.Value.IsZero)
                return a;
        }

        return ReferenceEquals(a, b) ? Zero : new OperationReal(Operation.Subtract, a, b, Interval.Subtract(a.Enclosure, b.Enclosure));
    }

    /// <summary>The product.</summary>
    public static Real operator *(Real a, Real b)
    {
        if (a is RationalReal p)
        {
            if (b is RationalReal q)
                return Folded(Operation.Multiply, a, b, p.Value, q.Value);
            if (p.Value.IsZero)
                return a;
            if (p.Value == Rational.One)
                return b;
        }
        else if (b is RationalReal q)
        {
            if (q.Value.IsZero)
                return b;
            if (q.Value == Rational.One)
                return a;
        }

        return new OperationReal(Operation.Multiply, a, b, Interval.Multiply(a.Enclosure, b.Enclosure));
    }

    /// <summary>The quotient. The caller has decided that <paramref name="b"/> is not zero.</summary>
    /// <exception cref="DivideByZeroException"><paramref name="b"/> is the rational 0.</exception>
    public static Real operator /(Real a, Real b)
    {
        if (b is RationalReal q)
        {
            if (a is RationalReal p)
                return Folded(Operation.Divide, a, b, p.Value, q.Value);
            if (q.Value.IsZero)
                throw new DivideByZeroException("The divisor is 0.");
            if (q.Value == Rational.One)
                return a;
        }
        else if (a is RationalReal { Value.IsZero: true })
        {
            return a;
        }

        return ReferenceEquals(a, b) ? One : new OperationReal(Operation.Divide, a, b, Interval.Divide(a.Enclosure, b.Enclosure));
    }

    /// <summary>The number with the other sign.</summary>
    public static Real operator -(Real a) => a is RationalReal p
        ? new RationalReal(-p.Value)
        : new OperationReal(Operation.Subtract, Zero, a, Interval.Subtract(Zero.Enclosure, a.Enclosure));

    /// <summary>The root that is not negative. The caller has decided that <paramref name="radicand"/> is not negative.</summary>
    /// <exception cref="ArgumentException"><paramref name="radicand"/> is a negative rational.</exception>
    public static Real Sqrt(Real radicand)
    {
        if (radicand is RationalReal p)
        {
            if (p.Value.Sign < 0)
                throw new ArgumentException("A negative number has no real root.", nameof(radicand));
            if (IntegerRoot.TryExact(p.Value.Numerator, out var numerator) && IntegerRoot.TryExact(p.Value.Denominator, out var denominator))
                return new RationalReal(new Rational(numerator, denominator));
        }

        return new OperationReal(Operation.Sqrt, radicand, null, Interval.Sqrt(radicand.Enclosure));
    }

    /// <summary>A number or length given in the script: its value is known exactly; identities are sought for every value of it.</summary>
    public static Real Given(string name, Rational value, Rational? from = null, Rational? to = null) => new GivenReal(name, value, from, to);

    /// <summary>The value when it is structurally a rational; no decision is made.</summary>
    public bool TryGetRational(out Rational value)
    {
        value = this is RationalReal rational ? rational.Value : default;
        return this is RationalReal;
    }

    /// <summary>A double good to nine places at least, from the enclosure at hand where that will do: for sorting and choosing, never for deciding.</summary>
    internal double Near()
    {
        double middle = Low + ((High - Low) / 2);
        return High - Low <= 1e-9 * Math.Max(1, Math.Abs(middle)) ? middle : ToDouble();
    }

    /// <summary>Within one unit in the last place of the true value.</summary>
    public double ToDouble()
    {
        if (this is RationalReal rational)
            return rational.Value.ToDouble();
        if (this is GivenReal given)
            return given.Value.ToDouble();
        if (Low == High || High <= Math.BitIncrement(Low))
            return Low;

        return Enclosures.ToDouble(this);
    }

    // Rational arithmetic folds at once, unless the result had more than 60,000 digits or so.
    private static Real Folded(Operation operation, Real a, Real b, Rational p, Rational q)
    {
        if (p.Bits + q.Bits <= MostFoldedBits)
        {
            return new RationalReal(operation switch
            {
                Operation.Add => p + q,
                Operation.Subtract => p - q,
                Operation.Multiply => p * q,
                _ => p / q,
            });
        }

        return new OperationReal(operation, a, b, operation switch
        {
            Operation.Add => Interval.Add(a.Enclosure, b.Enclosure),
            Operation.Subtract => Interval.Subtract(a.Enclosure, b.Enclosure),
            Operation.Multiply => Interval.Multiply(a.Enclosure, b.Enclosure),
            _ => q.IsZero ? throw new DivideByZeroException("The divisor is 0.") : Interval.Divide(a.Enclosure, b.Enclosure),
        });
    }

    /// <summary>Keeps the tighter bounds.</summary>
    internal void Tighten((double Low, double High) bounds)
    {
        if (bounds.Low > Low)
            Low = bounds.Low;
        if (bounds.High < High)
            High = bounds.High;
    }
}
