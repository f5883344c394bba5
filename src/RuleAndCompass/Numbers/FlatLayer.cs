using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>
/// Which products of given integers are squares: a base of coprime integers, and elimination over the field of two elements. Nothing is
/// factored into primes.
/// </summary>
/// <remarks>D. J. Bernstein, Factoring into coprimes in essentially linear time, J. Algorithms 54 (2005); here by plain refinement.</remarks>
internal static class FlatLayer
{
    /// <summary>
    /// A set of places in <paramref name="radicands"/>, as bits, whose product with <paramref name="value"/> is a square; −1 where there is none.
    /// All are greater than zero; no product of the radicands alone is a square.
    /// </summary>
    public static long FindSquare(IReadOnlyList<BigInteger> radicands, BigInteger value)
    {
        List<BigInteger> coprime = CoprimeBase([.. radicands, value]);
        coprime.RemoveAll(part => IntegerRoot.TryExact(part, out _));

        // Columns reduced so far: parity vector and the set that made it, by its highest place.
        var reduced = new Dictionary<int, (BigInteger Parity, long Set)>();
        for (int i = 0; i < radicands.Count; i++)
        {
            (BigInteger parity, long set) = Reduce(Parity(radicands[i], coprime), 1L << i, reduced);
            if (!parity.IsZero)
                reduced[(int)parity.GetBitLength()] = (parity, set);
        }

        (BigInteger rest, long found) = Reduce(Parity(value, coprime), 0, reduced);
        return rest.IsZero ? found : -1;
    }

    private static (BigInteger Parity, long Set) Reduce(BigInteger parity, long set, Dictionary<int, (BigInteger Parity, long Set)> reduced)
    {
        while (!parity.IsZero && reduced.TryGetValue((int)parity.GetBitLength(), out (BigInteger Parity, long Set) known))
        {
            parity ^= known.Parity;
            set ^= known.Set;
        }

        return (parity, set);
    }

    private static BigInteger Parity(BigInteger value, List<BigInteger> coprime)
    {
        BigInteger parity = BigInteger.Zero;
        for (int i = 0; i < coprime.Count; i++)
        {
            while (true)
            {
                BigInteger quotient = BigInteger.DivRem(value, coprime[i], out BigInteger remainder);
                if (!remainder.IsZero)
                    break;
                value = quotient;
                parity ^= BigInteger.One << i;
            }
        }

        return parity;
    }

    // Pairwise coprime, and every value is a product of powers of them.
    private static List<BigInteger> CoprimeBase(IEnumerable<BigInteger> values)
    {
        var finished = new List<BigInteger>();
        var waiting = new Stack<BigInteger>(values);
        while (waiting.TryPop(out BigInteger value))
        {
            if (value.IsOne)
                continue;

            bool split = false;
            for (int i = 0; i < finished.Count; i++)
            {
                BigInteger common = BigInteger.GreatestCommonDivisor(finished[i], value);
                if (common.IsOne)
                    continue;
                if (common == finished[i])
                {
                    waiting.Push(value / common);
                }
                else
                {
                    BigInteger other = finished[i] / common;
                    finished.RemoveAt(i);
                    waiting.Push(other);
                    waiting.Push(common);
                    waiting.Push(value / common);
                }

                split = true;
                break;
            }

            if (!split)
                finished.Add(value);
        }

        return finished;
    }
}
