using RuleAndCompass.Bench.Errors;

namespace RuleAndCompass.Accuracy;

/// <summary>The hand error of one quantity to first order: one reverse sweep, or two for a place.</summary>
/// <param name="Sigma">Null where a derivative is not finite.</param>
/// <param name="Size95">What 95 in 100 stay within.</param>
/// <param name="VarianceByAct">What each act adds to the variance.</param>
/// <param name="SingularAct">The act with the derivative that is not finite; 0 for the measure itself.</param>
internal sealed record FirstOrder(double? Sigma, double? Size95, Dictionary<int, double> VarianceByAct, int? SingularAct)
{
    /// <summary>Within this many standard deviations 95 % of a normal distribution lie; Abramowitz and Stegun (1964), table 26.1.</summary>
    public const double NormalSize95 = 1.959963984540054;

    public static FirstOrder Of(Quantity quantity, ActProgram program, Sweep sweep)
    {
        Dictionary<int, double> byAct = [];
        double variance = 0;
        Dictionary<int, double> sensitivities = [];
        foreach (Sensitivity found in sweep.Run(start => quantity.Gauge.Pull(start, 1)))
        {
            variance += Add(found);
            if (quantity.IsPlace)
                sensitivities[found.Variable] = found.Value;
        }

        if (sweep.SingularAct is { } singular)
            return Singular(singular);
        if (quantity.GaugeY is not { } second)
            return new FirstOrder(Math.Sqrt(variance), NormalSize95 * Math.Sqrt(variance), byAct, null);

        double varianceY = 0;
        double covariance = 0;
        foreach (Sensitivity found in sweep.Run(start => second.Pull(start, 1)))
        {
            varianceY += Add(found);
            double sigma = program.Variables[found.Variable].Sigma;
            covariance += sensitivities.GetValueOrDefault(found.Variable) * found.Value * sigma * sigma;
        }

        if (sweep.SingularAct is { } singularY)
            return Singular(singularY);
        return new FirstOrder(Math.Sqrt(variance + varianceY), PlanarNormal.Within(variance, varianceY, covariance, 0.95), byAct, null);

        double Add(Sensitivity found)
        {
            ErrorVariable variable = program.Variables[found.Variable];
            double error = found.Value * variable.Sigma;
            byAct[variable.Act] = byAct.GetValueOrDefault(variable.Act) + error * error;
            return error * error;
        }
    }

    private static FirstOrder Singular(int act) => new(null, null, new Dictionary<int, double> { [act] = 1 }, act);
}
