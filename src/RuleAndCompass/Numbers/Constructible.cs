namespace RuleAndCompass.Numbers;

/// <summary>Cosines and sines of multiples of 3° and of their halves, quarters and so on, as radicals.</summary>
/// <remarks>18° and 36° from Euclid's Elements XIII.9 and 10; the rest by sums and halves.</remarks>
internal static class Constructible
{
    // Halving further is right but never asked for by a drawing.
    private const int MostHalvings = 24;

    /// <summary>The constructible part of <paramref name="degrees"/> and the rest, which is 0 or no multiple of 3° halved at most 24 times.</summary>
    public static (Rational Part, Rational Remainder) Split(Rational degrees)
    {
        Rational threes = degrees / 3;
        if (HalvingsOf(threes) >= 0)
            return (degrees, Rational.Zero);

        Rational part = 3 * (Rational)(threes + new Rational(1, 2)).Floor();
        return (part, degrees - part);
    }

    /// <summary>Cosine and sine; <paramref name="degrees"/> is what <see cref="Split"/> calls a part.</summary>
    public static (Real Cosine, Real Sine) Unit(Rational degrees)
    {
        Rational threes = Turned(degrees, 360) / 3;
        if (threes.IsInteger)
            return UnitOfThrees((int)threes.Numerator);

        // The half of an angle in [0°, 720°): its sine is not negative, its cosine is where the half is within 90° of 0.
        Rational half = Turned(degrees, 360);
        (Real cosine, _) = Unit(2 * half);
        Real c = Real.Sqrt((1 + cosine) / 2);
        Real s = Real.Sqrt((1 - cosine) / 2);
        if (half > 90 && half < 270)
            c = -c;
        if (half > 180)
            s = -s;
        return (c, s);
    }

    /// <summary>A vector of this direction with fewer roots than the unit vector: (1 + cos 2a, sin 2a), turned about where a is obtuse.</summary>
    public static (Real X, Real Y) Vector(Rational degrees)
    {
        Rational turned = Turned(degrees, 360);
        if ((turned / 90).IsInteger)
            return Unit(turned);

        bool opposite = turned > 90 && turned < 270;
        (Real cosine, Real sine) = Unit(2 * turned);
        return opposite ? (-1 - cosine, -sine) : (1 + cosine, sine);
    }

    /// <summary>Into [0, <paramref name="turn"/>).</summary>
    public static Rational Turned(Rational degrees, int turn) => degrees - turn * (Rational)(degrees / turn).Floor();

    // How many halvings make this from an integer; −1 where none do.
    private static int HalvingsOf(Rational value)
    {
        if (!value.Denominator.IsPowerOfTwo)
            return -1;

        long halvings = value.Denominator.GetBitLength() - 1;
        return halvings <= MostHalvings ? (int)halvings : -1;
    }

    // 3k = 18a + 15b with a in 0..4.
    private static (Real Cosine, Real Sine) UnitOfThrees(int k)
    {
        int a = k % 5;
        int b = ((k - 6 * a) / 5 % 24 + 24) % 24;
        (Real Cosine, Real Sine) first = UnitOf18(a);
        (Real Cosine, Real Sine) second = UnitOf15(b);
        return a == 0 ? second : b == 0 ? first : Product(first, second);
    }

    public static (Real X, Real Y) Product((Real X, Real Y) a, (Real X, Real Y) b) =>
        (a.X * b.X - a.Y * b.Y, a.X * b.Y + a.Y * b.X);

    private static (Real Cosine, Real Sine) UnitOf18(int a)
    {
        if (a == 0)
            return (Real.One, Real.Zero);

        Real root5 = Real.Sqrt(5);
        return a switch
        {
            1 => (Real.Sqrt(10 + 2 * root5) / 4, (root5 - 1) / 4),
            2 => ((root5 + 1) / 4, Real.Sqrt(10 - 2 * root5) / 4),
            3 => (Real.Sqrt(10 - 2 * root5) / 4, (root5 + 1) / 4),
            _ => ((root5 - 1) / 4, Real.Sqrt(10 + 2 * root5) / 4),
        };
    }

    private static (Real Cosine, Real Sine) UnitOf15(int b)
    {
        Real half = new Rational(1, 2);
        (Real Cosine, Real Sine) first = (b % 6) switch
        {
            0 => (Real.One, Real.Zero),
            1 => Of15(1),
            2 => (Real.Sqrt(3) / 2, half),
            3 => (Real.Sqrt(2) / 2, Real.Sqrt(2) / 2),
            4 => (half, Real.Sqrt(3) / 2),
            _ => Of15(-1),
        };
        return (b / 6) switch
        {
            0 => first,
            1 => (-first.Sine, first.Cosine),
            2 => (-first.Cosine, -first.Sine),
            _ => (first.Sine, -first.Cosine),
        };
    }

    private static (Real Cosine, Real Sine) Of15(int sign)
    {
        Real root2 = Real.Sqrt(2);
        Real root6 = root2 * Real.Sqrt(3);
        Real large = (root6 + root2) / 4;
        Real small = (root6 - root2) / 4;
        return sign > 0 ? (large, small) : (small, large);
    }
}
