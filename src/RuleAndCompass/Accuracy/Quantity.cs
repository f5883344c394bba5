using System.Runtime.Intrinsics;
using RuleAndCompass.Bench.Errors;

namespace RuleAndCompass.Accuracy;

/// <summary>Something whose error is wanted: one gauge, or the two coordinates of a place, whose error is the distance.</summary>
internal sealed class Quantity
{
    // 2^52 + 2^51, as in Lanes: leaves a whole number.
    private const double RoundingConstant = 6755399441055744.0;

    private readonly bool isAngle;

    /// <param name="exact">The slots without errors.</param>
    public Quantity(Gauge gauge, ReadOnlySpan<Vector256<double>> exact, bool isAngle)
    {
        Gauge = gauge;
        Nominal = gauge.Replay(exact)[0];
        this.isAngle = isAngle;
    }

    public Quantity(Gauge x, Gauge y, ReadOnlySpan<Vector256<double>> exact)
    {
        Gauge = x;
        GaugeY = y;
        Nominal = x.Replay(exact)[0];
        NominalY = y.Replay(exact)[0];
    }

    public Gauge Gauge { get; }

    /// <summary>The second coordinate of a place.</summary>
    public Gauge? GaugeY { get; }

    /// <summary>The error is a distance, never negative.</summary>
    public bool IsPlace => GaugeY is not null;

    /// <summary>Without errors.</summary>
    public double Nominal { get; }

    public double NominalY { get; }

    public void Need(Slice slice)
    {
        Gauge.Need(slice);
        GaugeY?.Need(slice);
    }

    /// <summary>What four trials give, less what the exact acts give; angles the short way round.</summary>
    public Vector256<double> Error(ReadOnlySpan<Vector256<double>> slots)
    {
        Vector256<double> error = Gauge.Replay(slots) - Vector256.Create(Nominal);
        if (isAngle)
        {
            Vector256<double> turns = error * (1.0 / 360) + Vector256.Create(RoundingConstant);
            return error - (turns - Vector256.Create(RoundingConstant)) * 360.0;
        }

        if (GaugeY is null)
            return error;

        Vector256<double> errorY = GaugeY.Replay(slots) - Vector256.Create(NominalY);
        return Vector256.Sqrt(error * error + errorY * errorY);
    }
}
