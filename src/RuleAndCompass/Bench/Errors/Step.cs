using System.Runtime.Intrinsics;

namespace RuleAndCompass.Bench.Errors;

/// <summary>
/// One act as a differentiable step over flat arrays: it reads slots that earlier steps wrote, and its own errors, and writes its own
/// slots. A point has two slots (x, y), a line four (a point on it, its unit direction), a circle three (centre, radius), an opening one.
/// </summary>
/// <param name="act">The number of the act.</param>
internal abstract class Step(int act)
{
    public int Act { get; } = act;

    /// <summary>Marks the steps this one depends on.</summary>
    public abstract void Need(Slice slice);

    /// <summary>Repeats the act with errors, four trials at once. What can't be done becomes not a number, and so does all that depends on it.</summary>
    public abstract void Replay(Span<Vector256<double>> slots, ReadOnlySpan<Vector256<double>> noise);

    /// <summary>Carries the derivatives of a result from this step's slots back to what it used and to its own errors.</summary>
    public abstract void Pull(Sweep sweep);
}

/// <summary>The steps that given results depend on.</summary>
internal sealed class Slice(int steps, Func<int, int> stepOfSlot)
{
    private readonly bool[] needed = new bool[steps];

    public bool IsNeeded(int step) => needed[step];

    public void Need(int slot)
    {
        int step = stepOfSlot(slot);
        if (step >= 0)
            needed[step] = true;
    }
}
