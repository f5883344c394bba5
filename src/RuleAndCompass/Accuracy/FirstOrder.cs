using System.Collections.Immutable;
using RuleAndCompass.Bench.Errors;

namespace RuleAndCompass.Accuracy;

/// <summary>An act's part of a variance.</summary>
internal readonly record struct ActShare(int Act, double Share);

/// <summary>The hand error of one quantity to first order.</summary>
/// <param name="Sigma">Null where a derivative is not finite.</param>
/// <param name="Size95">What 95 in 100 stay within; null with <paramref name="Sigma"/>.</param>
/// <param name="Shares">The acts with the largest parts of the variance, largest first; where a derivative is not finite, its act alone.</param>
internal sealed record FirstOrder(double? Sigma, double? Size95, ImmutableArray<ActShare> Shares);

/// <summary>Works out first order, quantity by quantity: one reverse sweep for each, two for a place.</summary>
/// <param name="shareCount">How many acts a result names.</param>
internal sealed class FirstOrderSweeps(ActProgram program, int shareCount)
{
    /// <summary>Within this many standard deviations 95 % of a normal distribution lie; Abramowitz and Stegun (1964), table 26.1.</summary>
    public const double NormalSize95 = 1.959963984540054;

    private readonly Sweep sweep = new(program);
    private readonly List<int> touched = [];
    private readonly double[] byVariable = new double[program.Variables.Count];
    private readonly double[] byAct = new double[program.Variables.Count == 0 ? 1 : program.Variables[^1].Act + 1];

    /// <summary>The shares of all acts, added up over the quantities that were asked to be.</summary>
    public double[] Whole { get; } = new double[program.Variables.Count == 0 ? 1 : program.Variables[^1].Act + 1];

    /// <param name="addToWhole">Whether the quantity's shares count in <see cref="Whole"/>.</param>
    public FirstOrder Of(Quantity quantity, bool addToWhole)
    {
        double varianceX = 0;
        foreach (Sensitivity found in sweep.Run(start => quantity.Gauge.Pull(start, 1)))
        {
            varianceX += Add(found);
            byVariable[found.Variable] = found.Value;
        }

        int? singular = sweep.SingularAct;
        double varianceY = 0;
        double covariance = 0;
        if (quantity.GaugeY is { } second)
        {
            foreach (Sensitivity found in sweep.Run(start => second.Pull(start, 1)))
            {
                varianceY += Add(found);
                double sigma = program.Variables[found.Variable].Sigma;
                covariance += byVariable[found.Variable] * found.Value * sigma * sigma;
            }

            singular ??= sweep.SingularAct;
        }

        double variance = varianceX + varianceY;
        ImmutableArray<ActShare> shares = Collect(variance, addToWhole && singular is null);
        if (singular is { } act)
        {
            if (addToWhole)
                Whole[act] += 1;
            return new FirstOrder(null, null, [new ActShare(act, 1)]);
        }

        double size = quantity.IsPlace ? PlanarNormal.Within(varianceX, varianceY, covariance, 0.95) : NormalSize95 * Math.Sqrt(variance);
        return new FirstOrder(Math.Sqrt(variance), size, shares);
    }

    private double Add(Sensitivity found)
    {
        ErrorVariable variable = program.Variables[found.Variable];
        double error = found.Value * variable.Sigma;
        byAct[variable.Act] += error * error;
        touched.Add(found.Variable);
        return error * error;
    }

    // The largest shares; leaves the tables zero for the next quantity.
    private ImmutableArray<ActShare> Collect(double variance, bool addToWhole)
    {
        List<ActShare> shares = [];
        foreach (int variable in touched)
        {
            int act = program.Variables[variable].Act;
            byVariable[variable] = 0;
            if (byAct[act] == 0)
                continue;
            double share = byAct[act] / variance;
            byAct[act] = 0;
            shares.Add(new ActShare(act, share));
            if (addToWhole)
                Whole[act] += share;
        }

        touched.Clear();
        return Largest(shares, shareCount);
    }

    /// <summary>The largest of some shares, largest first; of two alike that of the earlier act.</summary>
    public static ImmutableArray<ActShare> Largest(List<ActShare> shares, int count)
    {
        shares.Sort((a, b) => a.Share != b.Share ? b.Share.CompareTo(a.Share) : a.Act.CompareTo(b.Act));
        return [.. shares.Take(count)];
    }
}
