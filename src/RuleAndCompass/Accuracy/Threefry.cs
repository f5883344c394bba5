using System.Runtime.Intrinsics;

namespace RuleAndCompass.Accuracy;

/// <summary>
/// Random bits as a pure function of a key and a counter: the key is the seed, the counter a trial and an act. No trial waits for another and
/// none depends on how many run at once.
/// </summary>
/// <remarks>
/// Threefry-2x32 with 20 rounds: J. Salmon, M. Moraes, R. Dror and D. Shaw, Parallel random numbers: as easy as 1, 2, 3 (SC11, 2011),
/// doi:10.1145/2063384.2063405. Only sums, turns and exclusive ors of 32-bit words.
/// </remarks>
internal static class Threefry
{
    private const uint Parity = 0x1BD11BDA;

    /// <summary>Two words for each of eight counters (<paramref name="trials"/>, <paramref name="draw"/>).</summary>
    public static (Vector256<uint> First, Vector256<uint> Second) Bits(ulong seed, Vector256<uint> trials, uint draw)
    {
        uint key0 = (uint)seed;
        uint key1 = (uint)(seed >> 32);
        uint key2 = Parity ^ key0 ^ key1;
        Vector256<uint> x = trials + Vector256.Create(key0);
        Vector256<uint> y = Vector256.Create(draw + key1);

        EvenRounds(ref x, ref y);
        Inject(ref x, ref y, key1, key2 + 1);
        OddRounds(ref x, ref y);
        Inject(ref x, ref y, key2, key0 + 2);
        EvenRounds(ref x, ref y);
        Inject(ref x, ref y, key0, key1 + 3);
        OddRounds(ref x, ref y);
        Inject(ref x, ref y, key1, key2 + 4);
        EvenRounds(ref x, ref y);
        Inject(ref x, ref y, key2, key0 + 5);
        return (x, y);
    }

    private static void EvenRounds(ref Vector256<uint> x, ref Vector256<uint> y)
    {
        Round(ref x, ref y, 13);
        Round(ref x, ref y, 15);
        Round(ref x, ref y, 26);
        Round(ref x, ref y, 6);
    }

    private static void OddRounds(ref Vector256<uint> x, ref Vector256<uint> y)
    {
        Round(ref x, ref y, 17);
        Round(ref x, ref y, 29);
        Round(ref x, ref y, 16);
        Round(ref x, ref y, 24);
    }

    private static void Round(ref Vector256<uint> x, ref Vector256<uint> y, int turn)
    {
        x += y;
        y = ((y << turn) | (y >> (32 - turn))) ^ x;
    }

    private static void Inject(ref Vector256<uint> x, ref Vector256<uint> y, uint toX, uint toY)
    {
        x += Vector256.Create(toX);
        y += Vector256.Create(toY);
    }
}
