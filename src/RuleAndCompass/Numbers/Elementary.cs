using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>Sine, cosine, arc tangent and π with certified error, at any precision.</summary>
/// <remarks>
/// Fixed-point Taylor series after shortening the argument: R. P. Brent and P. Zimmermann, Modern Computer Arithmetic (2010), ch. 4;
/// π by J. Machin's formula of 1706, π/4 = 4 arctan 1/5 − arctan 1/239. Each shift rounds down by less than one unit.
/// </remarks>
internal static class Elementary
{
    private const int Guard = 40;

    private sealed record KnownPi(int Bits, BigInteger Scaled);

    // Only replaced by one with more bits; a race costs a computation and nothing else.
    private static KnownPi? knownPi;

    /// <summary>π to about <paramref name="bits"/> bits.</summary>
    public static Ball Pi(int bits)
    {
        KnownPi? known = knownPi;
        if (known is null || known.Bits < bits)
        {
            int work = bits + Guard;
            BigInteger scaled = (4 * ArcTangentOfInverse(5, work) - ArcTangentOfInverse(239, work)) << 2;
            knownPi = known = new KnownPi(bits, scaled);
        }

        int place = known.Bits + Guard;
        // Fewer than place/2 terms of either series, each off by at most two units, 20 times at most.
        return Ball.Around(known.Scaled, -place, (BigInteger)(20 * place), bits + 8);
    }

    /// <summary>Cosine and sine of a rational number of degrees.</summary>
    public static (Ball Cosine, Ball Sine) OfDegrees(Rational degrees, int bits)
    {
        // Into [0, 360), then by symmetry into [0, 45].
        Rational turn = degrees - 360 * (Rational)(degrees / 360).Floor();
        int quadrant = (int)(turn / 90).Floor();
        Rational rest = turn - 90 * quadrant;
        bool mirrored = rest > 45;
        if (mirrored)
            rest = 90 - rest;

        Ball cosine, sine;
        if (rest.IsZero)
        {
            (cosine, sine) = (Ball.Of(1, bits), default);
        }
        else
        {
            // A small angle has a small sine: take as many bits more as it has zeros.
            int more = (int)Math.Max(0, rest.Denominator.GetBitLength() - rest.Numerator.GetBitLength() + 7);
            int work = bits + more;
            Ball radians = Ball.Multiply(Pi(work + 16), Ball.Of(rest / 180, work + 16), work + 16);
            (cosine, sine) = OfRadians(radians, work);
        }

        if (mirrored)
            (cosine, sine) = (sine, cosine);
        return quadrant switch
        {
            0 => (cosine, sine),
            1 => (Ball.Negate(sine), cosine),
            2 => (Ball.Negate(cosine), Ball.Negate(sine)),
            _ => (sine, Ball.Negate(cosine)),
        };
    }

    /// <summary>Cosine and sine of a number of degrees known by a ball.</summary>
    public static (Ball Cosine, Ball Sine) OfDegrees(in Ball degrees, int bits)
    {
        if (degrees.IsUnknown)
            return (Ball.Unknown, Ball.Unknown);

        // The middle exactly, then the slope, which is at most π/180 a degree.
        (Ball cosine, Ball sine) = OfDegrees(degrees.ToRational(), bits);
        if (degrees.IsExact)
            return (cosine, sine);

        // π/180 is less than 9/512.
        Ball slack = Ball.Around(BigInteger.Zero, degrees.Exponent - 9, 9 * (BigInteger)degrees.Radius, bits);
        return (cosine.Widened(slack, bits), sine.Widened(slack, bits));
    }

    /// <summary>The angle of the vector in degrees, in (−180, 180]; unknown where the vector may be zero or may cross the cut.</summary>
    public static Ball DegreesOfVector(in Ball x, in Ball y, int bits)
    {
        int work = bits + 16;
        int signX = x.Sign;
        int signY = y.Sign;
        if (x.IsUnknown || y.IsUnknown || signX == 0 && signY == 0)
            return Ball.Unknown;

        bool onAxis = y.IsExact && y.Middle.IsZero;
        if (onAxis)
            return signX > 0 ? default : Ball.Of(180, bits);

        Ball radians;
        if (signX > 0)
        {
            radians = ArcTangent(Ball.Divide(y, x, work), work);
        }
        else if (signY != 0)
        {
            // ±90° − arctan(x/y), right on both sides of the y axis.
            radians = Ball.Negate(ArcTangent(Ball.Divide(x, y, work), work));
            Ball degreesFromAxis = ToDegrees(radians, work);
            return Ball.Add(Ball.Of(90 * signY, bits), degreesFromAxis, bits);
        }
        else
        {
            return Ball.Unknown;
        }

        return ToDegrees(radians, bits);
    }

    private static Ball ToDegrees(in Ball radians, int bits) =>
        Ball.Divide(Ball.Multiply(radians, Ball.Of(180, bits), bits + 8), Pi(bits + 8), bits);

    private static (Ball Cosine, Ball Sine) OfRadians(in Ball radians, int bits)
    {
        int halvings = 4 + (int)Math.Sqrt(bits) / 4;
        int work = bits + Guard + 2 * halvings;
        BigInteger argument = radians.FloorAt(-work, upper: false);
        BigInteger top = radians.FloorAt(-work, upper: true) + 1;
        BigInteger slack = top - argument;
        // |argument| < 1; after the halvings x < 2^-halvings.
        BigInteger x = argument >> halvings;
        BigInteger square = (x * x) >> work;
        BigInteger one = BigInteger.One << work;

        BigInteger cosine = one;
        BigInteger sine = x;
        BigInteger term = one;
        int count = 0;
        for (int k = 1; ; k += 2)
        {
            // term is x^(k-1)/(k-1)!, so the next even and odd terms follow.
            term = ((term * square) >> work) / (k * (k + 1));
            count++;
            if (term.IsZero)
                break;
            BigInteger odd = ((term * x) >> work) / (k + 2);
            if ((k / 2 & 1) == 0)
            {
                cosine -= term;
                sine -= odd;
            }
            else
            {
                cosine += term;
                sine += odd;
            }
        }

        // Each term is off by at most four units, the rest of the series by less than one more.
        BigInteger error = 4 * count + 8;
        for (int i = 0; i < halvings; i++)
        {
            // (c + is)² moves an error e to at most 2e(|c| + |s|) + 2e² + 2 ≤ 4e + 4 while e is far below one.
            BigInteger doubled = ((cosine * cosine - sine * sine) >> work);
            sine = (cosine * sine) >> (work - 1);
            cosine = doubled;
            error = 4 * error + 4;
        }

        // The halved argument was cut off by under one unit of 2^-work: 2^halvings units of the angle, and the slack of the argument.
        BigInteger radius = error + (BigInteger.One << (halvings + 1)) + slack;
        return (Ball.Around(cosine, -work, radius, bits), Ball.Around(sine, -work, radius, bits));
    }

    /// <summary>The arc tangent, in radians.</summary>
    public static Ball ArcTangent(in Ball tangent, int bits)
    {
        if (tangent.IsUnknown)
            return Ball.Unknown;

        int work = bits + 32;
        Ball x = tangent;
        // arctan x = 2 arctan(x / (1 + √(1 + x²))): the argument more than halves.
        int halvings = 6 + (int)Math.Sqrt(bits) / 8 + Math.Clamp(x.MagnitudeBound(), 0, 2);
        Ball one = Ball.Of(1, work);
        for (int i = 0; i < halvings; i++)
        {
            Ball root = Ball.Sqrt(Ball.Add(one, Ball.Multiply(x, x, work), work), work);
            x = Ball.Divide(x, Ball.Add(one, root, work), work);
        }

        // |x| ≤ tan(90° / 2^halvings) < 1/2: an alternating series, so the rest is below the first term left out.
        Ball square = Ball.Multiply(x, x, work);
        Ball power = x;
        Ball sum = x;
        int size = x.MagnitudeBound();
        for (int k = 3; size != int.MinValue; k += 2)
        {
            power = Ball.Negate(Ball.Multiply(power, square, work));
            Ball term = Ball.Divide(power, Ball.Of(k, work), work);
            if (term.IsBelow(size - work))
            {
                sum = sum.Widened(term, work);
                break;
            }

            sum = Ball.Add(sum, term, work);
        }

        return Ball.Around(sum.Middle, sum.Exponent + halvings, sum.Radius, bits);
    }

    private static BigInteger ArcTangentOfInverse(int inverse, int work)
    {
        BigInteger power = (BigInteger.One << work) / inverse;
        BigInteger sum = power;
        int square = inverse * inverse;
        for (int k = 3; !power.IsZero; k += 2)
        {
            power /= -square;
            sum += power / k;
        }

        return sum;
    }
}
