using System.Runtime.Intrinsics;

namespace RuleAndCompass.Bench.Errors;

/// <summary>The straightedge laid to two points: the line misses each by an error of the edge, square to it.</summary>
internal sealed class LayStep(int act, int slot, int first, int second, int edge) : Step(act)
{
    public override void Need(Slice slice)
    {
        slice.Need(first);
        slice.Need(second);
    }

    public override void Replay(Span<Vector256<double>> slots, ReadOnlySpan<Vector256<double>> noise)
    {
        Vector256<double> wx = slots[second] - slots[first];
        Vector256<double> wy = slots[second + 1] - slots[first + 1];
        Vector256<double> length = Lanes.All(1.0) / Vector256.Sqrt(wx * wx + wy * wy);
        Vector256<double> ux = wx * length;
        Vector256<double> uy = wy * length;
        slots[slot] = slots[first] - noise[edge] * uy;
        slots[slot + 1] = slots[first + 1] + noise[edge] * ux;

        Vector256<double> tilt = (noise[edge + 1] - noise[edge]) * length;
        Vector256<double> unit = Lanes.All(1.0) / Vector256.Sqrt(Lanes.All(1.0) + tilt * tilt);
        slots[slot + 2] = (ux - tilt * uy) * unit;
        slots[slot + 3] = (uy + tilt * ux) * unit;
    }

    public override void Pull(Sweep sweep)
    {
        double startX = sweep.Take(slot);
        double startY = sweep.Take(slot + 1);
        double turnX = sweep.Take(slot + 2);
        double turnY = sweep.Take(slot + 3);
        if (startX == 0 && startY == 0 && turnX == 0 && turnY == 0)
            return;

        double[] value = sweep.Value;
        double normalX = -value[slot + 3];
        double normalY = value[slot + 2];
        double length = double.Hypot(value[second] - value[first], value[second + 1] - value[first + 1]);
        double turn = (normalX * turnX + normalY * turnY) / length;
        sweep.AddPair(first, startX - turn * normalX, startY - turn * normalY);
        sweep.AddPair(second, turn * normalX, turn * normalY);
        sweep.Feel(edge, normalX * startX + normalY * startY - turn);
        sweep.Feel(edge + 1, turn);
    }
}

/// <summary>
/// A line at an angle to another through a point, by protractor or square: the angle has the tool's error, in which the laying of the
/// tool to the line is understood, and the line misses the point by one error of the edge, as every drawn line does.
/// </summary>
internal sealed class TurnStep(int act, int slot, int line, int point, double turnDegrees, int angle) : Step(act)
{
    // Not the platform's functions, whose last digit differs from one to another.
    private readonly double cosine = Lanes.SineCosine(Lanes.All(turnDegrees / 360)).Cosine[0];
    private readonly double sine = Lanes.SineCosine(Lanes.All(turnDegrees / 360)).Sine[0];

    private int Edge => angle + 1;

    public override void Need(Slice slice)
    {
        slice.Need(line);
        slice.Need(point);
    }

    public override void Replay(Span<Vector256<double>> slots, ReadOnlySpan<Vector256<double>> noise)
    {
        (Vector256<double> errorSine, Vector256<double> errorCosine) = Lanes.SineCosine(noise[angle] * (1 / Math.Tau));
        Vector256<double> c = errorCosine * cosine - errorSine * sine;
        Vector256<double> s = errorCosine * sine + errorSine * cosine;
        Vector256<double> dx = slots[line + 2] * c - slots[line + 3] * s;
        Vector256<double> dy = slots[line + 2] * s + slots[line + 3] * c;
        slots[slot] = slots[point] - noise[Edge] * dy;
        slots[slot + 1] = slots[point + 1] + noise[Edge] * dx;
        slots[slot + 2] = dx;
        slots[slot + 3] = dy;
    }

    public override void Pull(Sweep sweep)
    {
        double startX = sweep.Take(slot);
        double startY = sweep.Take(slot + 1);
        double turnX = sweep.Take(slot + 2);
        double turnY = sweep.Take(slot + 3);
        if (startX == 0 && startY == 0 && turnX == 0 && turnY == 0)
            return;

        double normalX = -sweep.Value[slot + 3];
        double normalY = sweep.Value[slot + 2];
        sweep.AddPair(point, startX, startY);
        sweep.AddPair(line + 2, cosine * turnX + sine * turnY, cosine * turnY - sine * turnX);
        sweep.Feel(angle, normalX * turnX + normalY * turnY);
        sweep.Feel(Edge, normalX * startX + normalY * startY);
    }
}
