using System.Runtime.Intrinsics;

namespace RuleAndCompass.Accuracy;

/// <summary>Independent normal numbers of mean 0 and deviation 1, keyed by seed, trial and draw.</summary>
/// <remarks>
/// G. Box and M. Muller, A note on the generation of random normal deviates, Annals of Mathematical Statistics 29 (1958). From words of 32 bits the largest
/// is 6.8, which one draw in 10^11 would exceed.
/// </remarks>
internal static class NormalNumbers
{
    /// <summary>Trials drawn at once.</summary>
    public const int Lanes = 8;

    /// <summary>Two numbers for each of eight trials from <paramref name="firstTrial"/> on; the four first trials in the first two vectors.</summary>
    public static (Vector256<double> First, Vector256<double> Second, Vector256<double> LaterFirst, Vector256<double> LaterSecond) Draw(
        ulong seed, uint firstTrial, uint draw)
    {
        Vector256<uint> trials = Vector256.Create(firstTrial) + Vector256<uint>.Indices;
        (Vector256<uint> sizes, Vector256<uint> ways) = Threefry.Bits(seed, trials, draw);
        (Vector256<double> first, Vector256<double> second) = Transform(Vector256.WidenLower(sizes), Vector256.WidenLower(ways));
        (Vector256<double> laterFirst, Vector256<double> laterSecond) = Transform(Vector256.WidenUpper(sizes), Vector256.WidenUpper(ways));
        return (first, second, laterFirst, laterSecond);
    }

    private static (Vector256<double> First, Vector256<double> Second) Transform(Vector256<ulong> size, Vector256<ulong> way)
    {
        Vector256<double> radius = Vector256.Sqrt(Bench.Errors.Lanes.Logarithm(Fraction(size)) * -2.0);
        (Vector256<double> sine, Vector256<double> cosine) = Bench.Errors.Lanes.SineCosine(Fraction(way));
        return (radius * cosine, radius * sine);
    }

    // (word + ½) / 2^32, between 0 and 1 and neither; exact.
    private static Vector256<double> Fraction(Vector256<ulong> word)
    {
        Vector256<double> whole = (word | Vector256.Create(0x4330000000000000UL)).AsDouble() - Vector256.Create(4503599627370496.0);
        return (whole + Vector256.Create(0.5)) * (1.0 / 4294967296.0);
    }
}
