using System.Runtime.Intrinsics;

namespace RuleAndCompass.Bench.Errors;

/// <summary>
/// A point measured by scale: each coordinate has a reading error, and the prick an error each way. Off the printed plate: the plate's scale
/// errors in place of readings.
/// </summary>
/// <param name="x">From the middle of the sheet, or from the point it is measured from.</param>
/// <param name="y">Likewise.</param>
/// <param name="from">The point it is measured from; −1 for the middle of the sheet.</param>
/// <param name="prick">The first of two errors.</param>
/// <param name="scale">The first of two; null off the plate.</param>
internal sealed class LocateStep(int act, int slot, double x, double y, int from, int prick, int? scale) : Step(act)
{
    public override void Need(Slice slice)
    {
        if (from >= 0)
            slice.Need(from);
    }

    public override void Replay(Span<Vector256<double>> slots, ReadOnlySpan<Vector256<double>> noise)
    {
        Vector256<double> across = Lanes.All(x) + noise[prick];
        Vector256<double> up = Lanes.All(y) + noise[prick + 1];
        if (scale is { } reading)
        {
            across += noise[reading];
            up += noise[reading + 1];
        }
        else
        {
            across += noise[ActProgram.PaperAcross] * x;
            up += noise[ActProgram.PaperUp] * y;
        }

        slots[slot] = from < 0 ? across : slots[from] + across;
        slots[slot + 1] = from < 0 ? up : slots[from + 1] + up;
    }

    public override void Pull(Sweep sweep)
    {
        double px = sweep.Take(slot);
        double py = sweep.Take(slot + 1);
        if (px == 0 && py == 0)
            return;

        if (from >= 0)
            sweep.AddPair(from, px, py);
        sweep.Feel(prick, px);
        sweep.Feel(prick + 1, py);
        if (scale is { } reading)
        {
            sweep.Feel(reading, px);
            sweep.Feel(reading + 1, py);
        }
        else
        {
            sweep.Feel(ActProgram.PaperAcross, px * x);
            sweep.Feel(ActProgram.PaperUp, py * y);
        }
    }
}

/// <summary>A curve of a crossing: a line or a circle, displaced along its own normal by one error of the prick.</summary>
internal readonly record struct CrossedCurve(int Slot, bool IsLine, int Prick)
{
    public void Need(Slice slice) => slice.Need(Slot);

    /// <summary>Its unit normal at (x, y): left of a line, outward from a circle.</summary>
    public (double X, double Y) Normal(double[] value, double x, double y)
    {
        if (IsLine)
            return (-value[Slot + 3], value[Slot + 2]);

        double radius = value[Slot + 2];
        return ((x - value[Slot]) / radius, (y - value[Slot + 1]) / radius);
    }

    /// <summary>Carries back the share of a crossing at (x, y) that lies along this curve's normal.</summary>
    public void Pull(Sweep sweep, double x, double y, (double X, double Y) normal, double share)
    {
        sweep.AddPair(Slot, share * normal.X, share * normal.Y);
        if (IsLine)
        {
            double along = (x - sweep.Value[Slot]) * sweep.Value[Slot + 2] + (y - sweep.Value[Slot + 1]) * sweep.Value[Slot + 3];
            sweep.AddPair(Slot + 2, share * along * normal.X, share * along * normal.Y);
        }
        else
        {
            sweep.Add(Slot + 2, share);
        }

        sweep.Feel(Prick, share);
    }
}

/// <summary>The prick where two curves cross.</summary>
internal abstract class CrossStep(int act, int slot, CrossedCurve first, CrossedCurve second) : Step(act)
{
    protected int Slot { get; } = slot;

    protected CrossedCurve First { get; } = first;

    protected CrossedCurve Second { get; } = second;

    public override void Need(Slice slice)
    {
        First.Need(slice);
        Second.Need(slice);
    }

    public override void Pull(Sweep sweep)
    {
        double px = sweep.Take(Slot);
        double py = sweep.Take(Slot + 1);
        if (px == 0 && py == 0)
            return;

        double x = sweep.Value[Slot];
        double y = sweep.Value[Slot + 1];
        (double X, double Y) normal = First.Normal(sweep.Value, x, y);
        (double X, double Y) otherNormal = Second.Normal(sweep.Value, x, y);
        (double share, double otherShare) = sweep.Share(Act, px, py, normal, otherNormal);
        First.Pull(sweep, x, y, normal, share);
        Second.Pull(sweep, x, y, otherNormal, otherShare);
    }
}

/// <summary>Two lines; lost where errors turn them past parallel.</summary>
internal sealed class CrossLinesStep(int act, int slot, CrossedCurve first, CrossedCurve second, double side) : CrossStep(act, slot, first, second)
{
    public override void Replay(Span<Vector256<double>> slots, ReadOnlySpan<Vector256<double>> noise)
    {
        Vector256<double> dx = slots[First.Slot + 2];
        Vector256<double> dy = slots[First.Slot + 3];
        Vector256<double> ex = slots[Second.Slot + 2];
        Vector256<double> ey = slots[Second.Slot + 3];
        Vector256<double> away = noise[First.Prick];
        Vector256<double> sine = dx * ey - dy * ex;
        sine = Lanes.Lose(Vector256.LessThanOrEqual(sine * side, Vector256<double>.Zero), sine);
        Vector256<double> offset = (slots[Second.Slot + 1] - slots[First.Slot + 1]) * ex - (slots[Second.Slot] - slots[First.Slot]) * ey + noise[Second.Prick];
        Vector256<double> along = (away * (dx * ex + dy * ey) - offset) / sine;
        slots[Slot] = slots[First.Slot] + along * dx - away * dy;
        slots[Slot + 1] = slots[First.Slot + 1] + along * dy + away * dx;
    }
}

/// <summary>A line and a circle; the crossing is the earlier or the later along the line.</summary>
internal sealed class CrossLineCircleStep(int act, int slot, CrossedCurve line, CrossedCurve circle, bool later) : CrossStep(act, slot, line, circle)
{
    public override void Replay(Span<Vector256<double>> slots, ReadOnlySpan<Vector256<double>> noise)
    {
        Vector256<double> dx = slots[First.Slot + 2];
        Vector256<double> dy = slots[First.Slot + 3];
        Vector256<double> wx = slots[Second.Slot] - slots[First.Slot];
        Vector256<double> wy = slots[Second.Slot + 1] - slots[First.Slot + 1];
        Vector256<double> away = noise[First.Prick];
        Vector256<double> height = wy * dx - wx * dy - away;
        Vector256<double> radius = slots[Second.Slot + 2] + noise[Second.Prick];
        radius = Lanes.Lose(Vector256.LessThan(radius, Vector256<double>.Zero), radius);

        // Where they do not meet the root is of a negative number: not a number, the crossing is lost.
        Vector256<double> half = Vector256.Sqrt(radius * radius - height * height);
        Vector256<double> along = wx * dx + wy * dy + (later ? half : -half);
        slots[Slot] = slots[First.Slot] + along * dx - away * dy;
        slots[Slot + 1] = slots[First.Slot + 1] + along * dy + away * dx;
    }
}

/// <summary>Two circles; the crossing is on the left or the right, looking from the first centre to the second.</summary>
internal sealed class CrossCirclesStep(int act, int slot, CrossedCurve first, CrossedCurve second, bool right) : CrossStep(act, slot, first, second)
{
    public override void Replay(Span<Vector256<double>> slots, ReadOnlySpan<Vector256<double>> noise)
    {
        Vector256<double> wx = slots[Second.Slot] - slots[First.Slot];
        Vector256<double> wy = slots[Second.Slot + 1] - slots[First.Slot + 1];
        Vector256<double> radius = slots[First.Slot + 2] + noise[First.Prick];
        Vector256<double> other = slots[Second.Slot + 2] + noise[Second.Prick];
        radius = Lanes.Lose(Vector256.LessThan(Vector256.Min(radius, other), Vector256<double>.Zero), radius);
        Vector256<double> squared = wx * wx + wy * wy;
        Vector256<double> along = (Lanes.All(1.0) + (radius - other) * (radius + other) / squared) * 0.5;
        Vector256<double> height = Vector256.Sqrt(radius * radius / squared - along * along);
        if (right)
            height = -height;
        slots[Slot] = slots[First.Slot] + along * wx - height * wy;
        slots[Slot + 1] = slots[First.Slot + 1] + along * wy + height * wx;
    }
}
