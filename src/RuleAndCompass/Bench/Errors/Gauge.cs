using System.Diagnostics;
using System.Runtime.Intrinsics;

namespace RuleAndCompass.Bench.Errors;

/// <summary>A quantity read off the slots of an <see cref="ActProgram"/>: lengths in millimetres, angles in degrees.</summary>
internal abstract class Gauge
{
    /// <summary>Compiles a measure.</summary>
    /// <exception cref="ArgumentException">It uses a mark that no act of the program made.</exception>
    public static Gauge Compile(Measure measure, ActProgram program) => measure switch
    {
        ConstantMeasure constant => new ConstantGauge(constant.Value),
        PointDistance distance => new DistanceGauge(Slot(distance.First, program), Slot(distance.Second, program)),
        LineDistance distance => new OffsetGauge(Slot(distance.Line, program), Slot(distance.Point, program)),
        LineTurn turn => new TurnGauge(Slot(turn.From, program), Slot(turn.To, program), turn.FromReversed != turn.ToReversed, turn.Clockwise),
        CornerAngle corner => new CornerGauge(Slot(corner.First, program), Slot(corner.Corner, program), Slot(corner.Second, program)),
        CircleRadius radius => new SlotGauge(Slot(radius.Circle, program) + 2),
        PointCoordinate { From: null } at => new SlotGauge(Slot(at.Point, program) + (at.IsX ? 0 : 1)),
        PointCoordinate { From: { } from } at => new SlotDifferenceGauge(Slot(at.Point, program) + (at.IsX ? 0 : 1), Slot(from, program) + (at.IsX ? 0 : 1)),
        FunctionMeasure function => FunctionGauge.Create(function.Function, [.. function.Arguments.Select(argument => Compile(argument, program))]),
        _ => throw new UnreachableException($"No gauge for {measure.GetType().Name}."),
    };

    public abstract void Need(Slice slice);

    public abstract double Value(double[] slots);

    /// <summary>Adds <paramref name="seed"/> times this quantity's derivatives to the sweep.</summary>
    public abstract void Pull(Sweep sweep, double seed);

    public abstract Vector256<double> Replay(ReadOnlySpan<Vector256<double>> slots);

    private static int Slot(Mark mark, ActProgram program) => program.SlotOf(mark) is >= 0 and int slot
        ? slot
        : throw new ArgumentException($"{mark.Name} is measured, but no act makes it.", nameof(mark));
}

internal sealed class ConstantGauge(double value) : Gauge
{
    public override void Need(Slice slice)
    {
    }

    public override double Value(double[] slots) => value;

    public override void Pull(Sweep sweep, double seed)
    {
    }

    public override Vector256<double> Replay(ReadOnlySpan<Vector256<double>> slots) => Lanes.All(value);
}

/// <summary>One slot as it stands.</summary>
internal sealed class SlotGauge(int slot) : Gauge
{
    public override void Need(Slice slice) => slice.Need(slot);

    public override double Value(double[] slots) => slots[slot];

    public override void Pull(Sweep sweep, double seed) => sweep.Add(slot, seed);

    public override Vector256<double> Replay(ReadOnlySpan<Vector256<double>> slots) => slots[slot];
}

/// <summary>One slot less another.</summary>
internal sealed class SlotDifferenceGauge(int slot, int from) : Gauge
{
    public override void Need(Slice slice)
    {
        slice.Need(slot);
        slice.Need(from);
    }

    public override double Value(double[] slots) => slots[slot] - slots[from];

    public override void Pull(Sweep sweep, double seed)
    {
        sweep.Add(slot, seed);
        sweep.Add(from, -seed);
    }

    public override Vector256<double> Replay(ReadOnlySpan<Vector256<double>> slots) => slots[slot] - slots[from];
}

/// <summary>From point to point.</summary>
internal sealed class DistanceGauge(int first, int second) : Gauge
{
    public override void Need(Slice slice)
    {
        slice.Need(first);
        slice.Need(second);
    }

    public override double Value(double[] slots) => double.Hypot(slots[second] - slots[first], slots[second + 1] - slots[first + 1]);

    public override void Pull(Sweep sweep, double seed)
    {
        double distance = Value(sweep.Value);
        if (distance == 0)
            return;

        double x = seed * (sweep.Value[second] - sweep.Value[first]) / distance;
        double y = seed * (sweep.Value[second + 1] - sweep.Value[first + 1]) / distance;
        sweep.AddPair(first, -x, -y);
        sweep.AddPair(second, x, y);
    }

    public override Vector256<double> Replay(ReadOnlySpan<Vector256<double>> slots)
    {
        Vector256<double> x = slots[second] - slots[first];
        Vector256<double> y = slots[second + 1] - slots[first + 1];
        return Vector256.Sqrt(x * x + y * y);
    }
}

/// <summary>From a point to a line, square to it, without sign.</summary>
internal sealed class OffsetGauge(int line, int point) : Gauge
{
    public override void Need(Slice slice)
    {
        slice.Need(line);
        slice.Need(point);
    }

    public override double Value(double[] slots) => Math.Abs(Signed(slots));

    public override void Pull(Sweep sweep, double seed)
    {
        double[] value = sweep.Value;
        double signed = Signed(value) < 0 ? -seed : seed;
        double normalX = -value[line + 3] * signed;
        double normalY = value[line + 2] * signed;
        double along = (value[point] - value[line]) * value[line + 2] + (value[point + 1] - value[line + 1]) * value[line + 3];
        sweep.AddPair(point, normalX, normalY);
        sweep.AddPair(line, -normalX, -normalY);
        sweep.AddPair(line + 2, -along * normalX, -along * normalY);
    }

    public override Vector256<double> Replay(ReadOnlySpan<Vector256<double>> slots) => Vector256.Abs(
        (slots[point + 1] - slots[line + 1]) * slots[line + 2] - (slots[point] - slots[line]) * slots[line + 3]);

    private double Signed(double[] slots) =>
        (slots[point + 1] - slots[line + 1]) * slots[line + 2] - (slots[point] - slots[line]) * slots[line + 3];
}

/// <summary>How far a drawn line passes from a fixed place, square to it, positive where the line passes on the place's right.</summary>
internal sealed class PlaceOffsetGauge(int line, double x, double y) : Gauge
{
    public override void Need(Slice slice) => slice.Need(line);

    public override double Value(double[] slots) => (y - slots[line + 1]) * slots[line + 2] - (x - slots[line]) * slots[line + 3];

    public override void Pull(Sweep sweep, double seed)
    {
        double[] value = sweep.Value;
        double normalX = -value[line + 3] * seed;
        double normalY = value[line + 2] * seed;
        double along = (x - value[line]) * value[line + 2] + (y - value[line + 1]) * value[line + 3];
        sweep.AddPair(line, -normalX, -normalY);
        sweep.AddPair(line + 2, -along * normalX, -along * normalY);
    }

    public override Vector256<double> Replay(ReadOnlySpan<Vector256<double>> slots) =>
        (Lanes.All(y) - slots[line + 1]) * slots[line + 2] - (Lanes.All(x) - slots[line]) * slots[line + 3];
}

/// <summary>How far a line has turned on the sheet from where it should run, anticlockwise.</summary>
internal sealed class HeadingGauge(int line, double dx, double dy) : Gauge
{
    public override void Need(Slice slice) => slice.Need(line);

    public override double Value(double[] slots) => double.RadiansToDegrees(
        Math.Atan2(dx * slots[line + 3] - dy * slots[line + 2], dx * slots[line + 2] + dy * slots[line + 3]));

    public override void Pull(Sweep sweep, double seed)
    {
        double degrees = double.RadiansToDegrees(seed);
        sweep.AddPair(line + 2, -sweep.Value[line + 3] * degrees, sweep.Value[line + 2] * degrees);
    }

    public override Vector256<double> Replay(ReadOnlySpan<Vector256<double>> slots) =>
        Lanes.Angle(slots[line + 3] * dx - slots[line + 2] * dy, slots[line + 2] * dx + slots[line + 3] * dy) * (180 / Math.PI);
}

/// <summary>From one line's direction to another's, in (−180°, 180°].</summary>
internal sealed class TurnGauge(int from, int to, bool isReversed, bool isClockwise) : Gauge
{
    private readonly double way = isReversed ? -1 : 1;

    public override void Need(Slice slice)
    {
        slice.Need(from);
        slice.Need(to);
    }

    public override double Value(double[] slots)
    {
        double sine = way * (slots[from + 2] * slots[to + 3] - slots[from + 3] * slots[to + 2]);
        double cosine = way * (slots[from + 2] * slots[to + 2] + slots[from + 3] * slots[to + 3]);
        return double.RadiansToDegrees(Math.Atan2(isClockwise ? -sine : sine, cosine));
    }

    public override void Pull(Sweep sweep, double seed)
    {
        double degrees = double.RadiansToDegrees(isClockwise ? -seed : seed);
        sweep.AddPair(to + 2, -sweep.Value[to + 3] * degrees, sweep.Value[to + 2] * degrees);
        sweep.AddPair(from + 2, sweep.Value[from + 3] * degrees, -sweep.Value[from + 2] * degrees);
    }

    public override Vector256<double> Replay(ReadOnlySpan<Vector256<double>> slots)
    {
        Vector256<double> sine = (slots[from + 2] * slots[to + 3] - slots[from + 3] * slots[to + 2]) * way;
        Vector256<double> cosine = (slots[from + 2] * slots[to + 2] + slots[from + 3] * slots[to + 3]) * way;
        return Lanes.Angle(isClockwise ? -sine : sine, cosine) * (180 / Math.PI);
    }
}

/// <summary>The angle at a corner, 0° to 180°.</summary>
internal sealed class CornerGauge(int first, int corner, int second) : Gauge
{
    public override void Need(Slice slice)
    {
        slice.Need(first);
        slice.Need(corner);
        slice.Need(second);
    }

    public override double Value(double[] slots)
    {
        double ax = slots[first] - slots[corner];
        double ay = slots[first + 1] - slots[corner + 1];
        double bx = slots[second] - slots[corner];
        double by = slots[second + 1] - slots[corner + 1];
        return double.RadiansToDegrees(Math.Atan2(Math.Abs(ax * by - ay * bx), ax * bx + ay * by));
    }

    public override void Pull(Sweep sweep, double seed)
    {
        double[] value = sweep.Value;
        double ax = value[first] - value[corner];
        double ay = value[first + 1] - value[corner + 1];
        double bx = value[second] - value[corner];
        double by = value[second + 1] - value[corner + 1];
        double degrees = double.RadiansToDegrees(ax * by - ay * bx < 0 ? -seed : seed);
        double a = degrees / (ax * ax + ay * ay);
        double b = degrees / (bx * bx + by * by);
        sweep.AddPair(second, -by * b, bx * b);
        sweep.AddPair(first, ay * a, -ax * a);
        sweep.AddPair(corner, by * b - ay * a, ax * a - bx * b);
    }

    public override Vector256<double> Replay(ReadOnlySpan<Vector256<double>> slots)
    {
        Vector256<double> ax = slots[first] - slots[corner];
        Vector256<double> ay = slots[first + 1] - slots[corner + 1];
        Vector256<double> bx = slots[second] - slots[corner];
        Vector256<double> by = slots[second + 1] - slots[corner + 1];
        return Lanes.Angle(Vector256.Abs(ax * by - ay * bx), ax * bx + ay * by) * (180 / Math.PI);
    }
}
