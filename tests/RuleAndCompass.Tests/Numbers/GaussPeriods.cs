using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Numbers;

/// <summary>The periods of the roots of unity of a prime 2^s + 1 with primitive root 3: cos 2π/p by square roots.</summary>
/// <remarks>C. F. Gauss, Disquisitiones Arithmeticae (1801), arts. 343 to 365.</remarks>
internal sealed class GaussPeriods
{
    private readonly int prime;
    private readonly int[] powers;
    private readonly Dictionary<(int M, int J), Real> known = [];

    public GaussPeriods(int prime)
    {
        this.prime = prime;
        powers = new int[prime - 1];
        int value = 1;
        for (int i = 0; i < prime - 1; i++)
        {
            powers[i] = value;
            value = value * 3 % prime;
        }
    }

    public Real Get(int m, int j)
    {
        j %= m;
        if (known.TryGetValue((m, j), out Real? found))
            return found;

        if (m == 1)
            return known[(m, j)] = -1;

        // η(m, a) and η(m, c) are the roots of x² − η(m/2, a) x + their product.
        int h = m / 2, a = j % h, c = a + h;
        int[] count = new int[prime];
        for (int i = a; i < prime - 1; i += m)
        {
            for (int k = c; k < prime - 1; k += m)
                count[(powers[i] + powers[k]) % prime]++;
        }

        Real product = count[0];
        for (int i = 0; i < h; i++)
        {
            if (count[powers[i]] != 0)
                product += count[powers[i]] * Get(h, i);
        }

        Real sum = Get(h, a);
        Real root = Real.Sqrt(sum * sum - 4 * product);
        (int low, int high) = Numeric(m, a) < Numeric(m, c) ? (a, c) : (c, a);
        known[(m, high)] = (sum + root) / 2;
        known[(m, low)] = (sum - root) / 2;
        return known[(m, j)];
    }

    private double Numeric(int m, int j)
    {
        double sum = 0;
        for (int i = j; i < prime - 1; i += m)
            sum += Math.Cos(2 * Math.PI * powers[i] / prime);
        return sum;
    }
}
