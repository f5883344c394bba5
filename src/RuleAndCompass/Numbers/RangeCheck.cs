namespace RuleAndCompass.Numbers;

/// <summary>
/// Shows that no radicand and no divisor of a program vanishes while its givens move through their ranges, by balls over pieces of the ranges:
/// an identity that holds near one value then holds at all of them, since everything in it is analytic.
/// </summary>
/// <param name="branchHolds">Whether the balls show it for one box of values.</param>
internal sealed class RangeCheck(Func<IReadOnlyList<(Rational From, Rational To)>, bool> branchHolds)
{
    private const int FinestSteps = 1 << 18;
    private const int MostBoxes = 4000;

    private int boxes;

    /// <summary>The part of one range about <paramref name="value"/> for which it is shown.</summary>
    public (Rational From, Rational To) Extend(Rational value, Rational from, Rational to)
    {
        Rational finest = (to - from) / FinestSteps;
        return (value - Reach(value, value - from, -1, finest), value + Reach(value, to - value, 1, finest));
    }

    /// <summary>Whether it is shown for the whole box, within a bounded number of pieces.</summary>
    public bool Holds(IReadOnlyList<(Rational From, Rational To)> box) => Holds(box, 0);

    private bool Holds(IReadOnlyList<(Rational From, Rational To)> box, int depth)
    {
        if (++boxes > MostBoxes)
            return false;
        if (branchHolds(box))
            return true;

        // The sides in turn.
        int side = depth % box.Count;
        Rational middle = (box[side].From + box[side].To) / 2;
        var low = box.ToArray();
        var high = box.ToArray();
        low[side].To = middle;
        high[side].From = middle;
        return Holds(low, depth + 1) && Holds(high, depth + 1);
    }

    private Rational Reach(Rational value, Rational distance, int sign, Rational finest)
    {
        Rational reached = Rational.Zero;
        Rational step = distance;
        while (reached < distance && step >= finest && ++boxes <= MostBoxes)
        {
            Rational next = reached + step > distance ? distance : reached + step;
            Rational near = value + sign * reached;
            Rational far = value + sign * next;
            if (branchHolds([sign > 0 ? (near, far) : (far, near)]))
            {
                reached = next;
                step *= 2;
            }
            else
            {
                step /= 4;
            }
        }

        return reached;
    }
}
