namespace RuleAndCompass.Accuracy;

/// <summary>
/// The distribution of one quantity's error over any number of trials in a bounded space of 20 kilobytes: counts in classes whose width is
/// a 128th of the size or less (below a 500th of the typical error, one class to zero), for each sign. Percentiles are interpolated in
/// their class, which puts them within a part in a thousand of those of the sorted list: less than the chance of even a million trials.
/// </summary>
/// <param name="typical">The size of the typical error; any positive number near it will do.</param>
internal sealed class Distribution(double typical)
{
    private const int ClassBits = 7;
    private const int OctavesBelow = 9;
    private const int OctavesAbove = 12;
    private const int Classes = (OctavesBelow + OctavesAbove) << ClassBits;
    private const long FirstClass = (1023L - OctavesBelow) << ClassBits;

    // A power of two, so that dividing by it is exact.
    private readonly double unit = Math.ScaleB(1, Math.ILogB(typical));
    private readonly int[] negative = new int[Classes + 1];
    private readonly int[] positive = new int[Classes + 1];
    private double sum;
    private double sumOfSquares;

    /// <summary>Trials that gave the quantity.</summary>
    public long Kept { get; private set; }

    /// <summary>Trials in which it could not be had.</summary>
    public long Lost { get; private set; }

    public double Mean => sum / Kept;

    /// <summary>Standard deviation about the mean.</summary>
    public double Deviation => Math.Sqrt(Math.Max(0, sumOfSquares - sum * sum / Kept) / Math.Max(1, Kept - 1));

    /// <summary>Root of the mean square about zero.</summary>
    public double RootMeanSquare => Math.Sqrt(sumOfSquares / Kept);

    /// <summary>Counts a block of errors; those that are not numbers are lost. Blocks may come in any order, from one thread at a time.</summary>
    /// <returns>The block's sums, to be handed to <see cref="AddSums"/> in the order of the blocks.</returns>
    public (double Sum, double SumOfSquares) Tally(ReadOnlySpan<double> errors)
    {
        double perUnit = 1 / unit;
        long lost = 0;
        double blockSum = 0;
        double blockSquares = 0;
        foreach (double error in errors)
        {
            if (double.IsNaN(error))
            {
                lost++;
                continue;
            }

            blockSum += error;
            blockSquares += error * error;
            long place = (BitConverter.DoubleToInt64Bits(Math.Abs(error) * perUnit) >> (52 - ClassBits)) - FirstClass + 1;
            (error < 0 ? negative : positive)[Math.Clamp(place, 0, Classes)]++;
        }

        Lost += lost;
        Kept += errors.Length - lost;
        return (blockSum, blockSquares);
    }

    /// <summary>Adds a block's sums. Their order decides the last digit, so it must be that of the blocks.</summary>
    public void AddSums((double Sum, double SumOfSquares) block)
    {
        sum += block.Sum;
        sumOfSquares += block.SumOfSquares;
    }

    /// <summary>The error that the share <paramref name="part"/> of the trials does not exceed; signed.</summary>
    public double Percentile(double part)
    {
        if (sumOfSquares == 0)
            return 0;

        double target = part * Kept;
        double below = 0;
        for (int place = Classes; place >= 0; place--)
        {
            if (Step(negative[place], ref below, target) is { } share)
                return -(Upper(place) + share * (Lower(place) - Upper(place)));
        }

        for (int place = 0; place <= Classes; place++)
        {
            if (Step(positive[place], ref below, target) is { } share)
                return Lower(place) + share * (Upper(place) - Lower(place));
        }

        return 0;
    }

    /// <summary>The size that the share <paramref name="part"/> of the trials does not exceed.</summary>
    public double SizePercentile(double part)
    {
        if (sumOfSquares == 0)
            return 0;

        double target = part * Kept;
        double below = 0;
        for (int place = 0; place <= Classes; place++)
        {
            if (Step(negative[place] + positive[place], ref below, target) is { } share)
                return Lower(place) + share * (Upper(place) - Lower(place));
        }

        return 0;
    }

    // How far into a class the target lies, where it lies there.
    private static double? Step(int count, ref double below, double target)
    {
        if (count > 0 && below + count >= target)
            return Math.Max(0, (target - below) / count);
        below += count;
        return null;
    }

    private double Lower(int place) => place == 0 ? 0 : unit * BitConverter.Int64BitsToDouble((FirstClass + place - 1) << (52 - ClassBits));

    private double Upper(int place) => unit * BitConverter.Int64BitsToDouble((FirstClass + place) << (52 - ClassBits));
}
