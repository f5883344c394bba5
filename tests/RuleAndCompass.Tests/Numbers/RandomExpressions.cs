using System.Numerics;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Numbers;

/// <summary>
/// Random numbers made by + − × ÷ and square roots, a tenth of them zero by an identity, another tenth a zero moved by a small power of ten.
/// The judge is a ball of 3,000 bits.
/// </summary>
internal sealed class RandomExpressions(ulong seed)
{
    private const int JudgeBits = 3000;
    private const int MostRoots = 5;

    private readonly List<Real> pool = [];
    private ulong state = seed * 0x9E3779B97F4A7C15 + 1;
    private int roots;

    /// <summary>What the judge says: the sign, and 0 where the number is smaller than 2^−1400 and the ball holds zero; null where even 3,000 bits do not tell.</summary>
    public static int? Judge(Real x)
    {
        Ball ball = Enclosures.Of(x, JudgeBits);
        if (ball.Sign != 0)
            return ball.Sign;
        return ball.IsBelow(-1400) ? 0 : null;
    }

    /// <summary>The next number, and whether it is zero by construction; null where only the judge knows.</summary>
    public (Real Number, bool? IsZero) Next()
    {
        pool.Clear();
        roots = 0;
        for (int i = 0; i < 3; i++)
            pool.Add(new Rational(Below(19) - 9, 1 + Below(6)));
        int steps = 2 + Below(6);
        for (int i = 0; i < steps; i++)
            Grow();

        return Below(10) switch
        {
            0 => (Identity(), true),
            1 => (Identity() + (Real)new Rational(1 - 2 * Below(2), BigInteger.Pow(10, 1 + Below(400))), false),
            _ => (Pick() - Pick(), null),
        };
    }

    private int Below(int bound)
    {
        state ^= state << 13;
        state ^= state >> 7;
        state ^= state << 17;
        return (int)(state >> 33) % bound;
    }

    private Real Pick() => pool[Below(pool.Count)];

    private void Grow()
    {
        Real a = Pick();
        Real b = Pick();
        switch (Below(6))
        {
            case 0:
                pool.Add(a + b);
                break;
            case 1:
                pool.Add(a - b);
                break;
            case 2:
                pool.Add(a * b);
                break;
            case 3 when QuickSign(b) != 0:
                pool.Add(a / b);
                break;
            default:
                if (Positive(a) is { } radicand && roots < MostRoots)
                    pool.Add(Root(radicand));
                break;
        }
    }

    private Real Root(Real radicand)
    {
        roots++;
        return Real.Sqrt(radicand);
    }

    // 0 where 256 bits do not tell.
    private static int QuickSign(Real a) => Enclosures.Of(a, 256).Sign;

    private static Real? Positive(Real a) => QuickSign(a) switch
    {
        1 => a,
        -1 => -a,
        _ => null,
    };

    private Real Identity()
    {
        Real a = Positive(Pick()) ?? new Rational(7, 3);
        Real b = Positive(Pick()) ?? 5;
        Real c = Pick();
        switch (Below(9))
        {
            case 0:
                return (a + c) * (a + c) - a * a - 2 * a * c - c * c;
            case 1:
                return Real.Sqrt(a * a) - a;
            case 2:
                return Real.Sqrt(a) * Real.Sqrt(b) - Real.Sqrt(a * b);
            case 3:
                return Real.Sqrt(a + b + 2 * Real.Sqrt(a * b)) - Real.Sqrt(a) - Real.Sqrt(b);
            case 4:
                return (a - c) * (a + c) - a * a + c * c;
            case 5 when QuickSign(a - b) != 0:
                return (a - b) / (Real.Sqrt(a) - Real.Sqrt(b)) - Real.Sqrt(a) - Real.Sqrt(b);
            case 6:
                return Real.Sqrt(a * a * b) - a * Real.Sqrt(b);
            case 7:
                // x = a + b > a: √(x + √(x² − a²)) = √((x + a)/2) + √((x − a)/2).
                Real x = a + b;
                return Real.Sqrt(x + Real.Sqrt(x * x - a * a)) - Real.Sqrt((x + a) / 2) - Real.Sqrt(b / 2);
            default:
                return c / a + a / b - (c * b + a * a) / (a * b);
        }
    }
}
