using System.Runtime.Intrinsics;

namespace RuleAndCompass.Bench.Errors;

/// <summary>The dividers set to the span of two points, with one error that every arc at this setting shares.</summary>
internal sealed class SpanStep(int act, int slot, int first, int second, int opening) : Step(act)
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
        slots[slot] = Vector256.Sqrt(wx * wx + wy * wy) + noise[opening];
    }

    public override void Pull(Sweep sweep)
    {
        double span = sweep.Take(slot);
        if (span == 0)
            return;

        double[] value = sweep.Value;
        double wx = value[second] - value[first];
        double wy = value[second + 1] - value[first + 1];
        double length = double.Hypot(wx, wy);
        sweep.AddPair(first, -span * wx / length, -span * wy / length);
        sweep.AddPair(second, span * wx / length, span * wy / length);
        sweep.Feel(opening, span);
    }
}

/// <summary>
/// The dividers set to a length: free, by scale (a reading error beside the opening's own, and the setting rounded to the scale's step), or off
/// the printed plate, where the span is taken across the sheet.
/// </summary>
/// <param name="lengthMillimetres">The exact length wanted.</param>
/// <param name="setMillimetres">The length the dividers are really set to, rounded where the scale is.</param>
/// <param name="opening">The opening's error; the reading's follows it.</param>
/// <param name="byScale">Whether a scale was read.</param>
/// <param name="offPlate">Whether the printed plate was used.</param>
internal sealed class LengthStep(int act, int slot, double lengthMillimetres, double setMillimetres, int opening, bool byScale, bool offPlate) : Step(act)
{
    public override void Need(Slice slice)
    {
    }

    public override void Replay(Span<Vector256<double>> slots, ReadOnlySpan<Vector256<double>> noise)
    {
        Vector256<double> length = Lanes.All(setMillimetres) + noise[opening];
        if (byScale)
            length += noise[opening + 1];
        if (offPlate)
            length += noise[ActProgram.PaperAcross] * setMillimetres;
        slots[slot] = length;
    }

    public override void Pull(Sweep sweep)
    {
        double span = sweep.Take(slot);
        if (span == 0)
            return;

        sweep.Feel(opening, span);
        if (byScale)
            sweep.Feel(opening + 1, span);
        if (offPlate)
            sweep.Feel(ActProgram.PaperAcross, span * lengthMillimetres);
    }
}

/// <summary>The needle seated afresh at a point, and the circle drawn at the opening that stands.</summary>
internal sealed class SwingStep(int act, int slot, int centre, int opening, int prick) : Step(act)
{
    public override void Need(Slice slice)
    {
        slice.Need(centre);
        slice.Need(opening);
    }

    public override void Replay(Span<Vector256<double>> slots, ReadOnlySpan<Vector256<double>> noise)
    {
        slots[slot] = slots[centre] + noise[prick];
        slots[slot + 1] = slots[centre + 1] + noise[prick + 1];
        slots[slot + 2] = slots[opening];
    }

    public override void Pull(Sweep sweep)
    {
        double x = sweep.Take(slot);
        double y = sweep.Take(slot + 1);
        double radius = sweep.Take(slot + 2);
        if (x == 0 && y == 0 && radius == 0)
            return;

        sweep.AddPair(centre, x, y);
        sweep.Add(opening, radius);
        sweep.Feel(prick, x);
        sweep.Feel(prick + 1, y);
    }
}
