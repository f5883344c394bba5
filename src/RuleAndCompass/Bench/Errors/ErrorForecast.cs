namespace RuleAndCompass.Bench.Errors;

/// <summary>
/// Predicts to first order how far a hand leaves single marks out, while a sequence of acts grows: lowering appends the acts of one way to make a
/// mark, asks, takes them off again and tries another.
/// </summary>
internal sealed class ErrorForecast
{
    private readonly ActProgram program;
    private readonly Sweep sweep;

    public ErrorForecast(Hand hand)
    {
        program = new ActProgram(hand);
        sweep = new Sweep(program);
    }

    /// <summary>How many acts it holds.</summary>
    public int Count => program.Steps.Count;

    /// <exception cref="ArgumentException">The act uses a mark or setting that no act before it made.</exception>
    public void Append(Act act) => program.Append(act);

    /// <summary>Takes acts off the end until <paramref name="count"/> are left.</summary>
    public void Truncate(int count) => program.Truncate(count);

    /// <summary>
    /// One standard deviation of a mark in millimetres: of a point, the root of its mean square distance from where it should be; of a circle, of the
    /// mean square of centre and radius together; of a line, of the mean square of its offsets at its start and at <paramref name="reachMillimetres"/> along it.
    /// </summary>
    /// <returns>Infinite where the mark rests on curves that only touch.</returns>
    public double Sigma(Mark mark, double reachMillimetres = 100)
    {
        int slot = program.SlotOf(mark);
        if (slot < 0)
            throw new ArgumentException($"No act here makes {mark.Name}.", nameof(mark));
        double[] value = program.Nominal;
        return mark switch
        {
            PointMark => Math.Sqrt(Variance(new SlotGauge(slot)) + Variance(new SlotGauge(slot + 1))),
            CircleMark => Math.Sqrt(Variance(new SlotGauge(slot)) + Variance(new SlotGauge(slot + 1)) + Variance(new SlotGauge(slot + 2))),
            LineMark => Math.Sqrt((Offset(0) + Offset(reachMillimetres)) / 2),
            _ => throw new System.Diagnostics.UnreachableException($"No forecast for {mark.GetType().Name}."),
        };

        double Offset(double along) =>
            Variance(new PlaceOffsetGauge(slot, value[slot] + along * value[slot + 2], value[slot + 1] + along * value[slot + 3]));
    }

    private double Variance(Gauge gauge)
    {
        double variance = 0;
        foreach (Sensitivity found in sweep.Run(start => gauge.Pull(start, 1)))
        {
            double error = found.Value * program.Variables[found.Variable].Sigma;
            variance += error * error;
        }

        return sweep.SingularAct is null ? variance : double.PositiveInfinity;
    }
}
