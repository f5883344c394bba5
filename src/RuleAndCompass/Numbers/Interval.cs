namespace RuleAndCompass.Numbers;

/// <summary>
/// Two doubles that enclose a number. <c>+ − × ÷ √</c> of doubles are correctly rounded, so one step outward from each rounded bound is sound.
/// </summary>
/// <remarks>R. E. Moore, Interval Analysis (1966).</remarks>
internal readonly struct Interval(double low, double high)
{
    public readonly double Low = low;
    public readonly double High = high;

    public static Interval Everything => new(double.NegativeInfinity, double.PositiveInfinity);

    public static Interval Of(Rational value)
    {
        double near = value.ToDouble();
        if (value.IsInteger && Math.Abs(near) <= 9007199254740992.0)
            return new(near, near);

        return new(Math.BitDecrement(near), Math.BitIncrement(near));
    }

    public static Interval Of(Ball ball)
    {
        (double low, double high) = ball.ToDoubles();
        return new(low, high);
    }

    public static Interval Add(Interval a, Interval b) => Outward(a.Low + b.Low, a.High + b.High);

    public static Interval Subtract(Interval a, Interval b) => Outward(a.Low - b.High, a.High - b.Low);

    public static Interval Multiply(Interval a, Interval b)
    {
        if (a.Low >= 0 && b.Low >= 0)
            return Outward(a.Low * b.Low, a.High * b.High);

        return Hull(a.Low * b.Low, a.Low * b.High, a.High * b.Low, a.High * b.High);
    }

    public static Interval Divide(Interval a, Interval b)
    {
        if (b.Low <= 0 && b.High >= 0)
            return Everything;

        if (a.Low >= 0 && b.Low > 0)
            return Outward(a.Low / b.High, a.High / b.Low);

        return Hull(a.Low / b.Low, a.Low / b.High, a.High / b.Low, a.High / b.High);
    }

    /// <summary>The radicand is not negative, whatever its enclosure says.</summary>
    public static Interval Sqrt(Interval a)
    {
        Interval root = Outward(Math.Sqrt(Math.Max(a.Low, 0)), Math.Sqrt(Math.Max(a.High, 0)));
        return new(Math.Max(root.Low, 0), root.High);
    }

    public static Interval Apply(Operation operation, Interval a, Interval b) => operation switch
    {
        Operation.Add => Add(a, b),
        Operation.Subtract => Subtract(a, b),
        Operation.Multiply => Multiply(a, b),
        Operation.Divide => Divide(a, b),
        Operation.Sqrt => Sqrt(a),
        _ => new(-180, 180),
    };

    /// <summary>The square, which is not negative however the interval lies.</summary>
    public static Interval Square(Interval a)
    {
        Interval square = Apply(Operation.Multiply, a, a);
        return new(a.Low <= 0 && a.High >= 0 ? 0 : Math.Max(0, square.Low), square.High);
    }

    /// <summary>What lies in both of two intervals that hold one number; one alone where rounding parts them.</summary>
    public static Interval Meet(Interval a, Interval b)
    {
        double low = Math.Max(a.Low, b.Low), high = Math.Min(a.High, b.High);
        return low <= high ? new(low, high) : a;
    }

    // Math.Min and Max pass NaN on, which Outward takes for "nothing known".
    private static Interval Hull(double p, double q, double r, double s) =>
        Outward(Math.Min(Math.Min(p, q), Math.Min(r, s)), Math.Max(Math.Max(p, q), Math.Max(r, s)));

    private static Interval Outward(double low, double high)
    {
        if (double.IsNaN(low) || double.IsNaN(high))
            return Everything;

        return new(Math.BitDecrement(low), Math.BitIncrement(high));
    }
}
