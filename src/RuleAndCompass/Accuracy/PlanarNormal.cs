namespace RuleAndCompass.Accuracy;

/// <summary>The distance from its middle of a point that errs normally in the plane.</summary>
internal static class PlanarNormal
{
    /// <summary>The distance within which the point stays with the given chance.</summary>
    /// <param name="varianceX">Variance across.</param>
    /// <param name="varianceY">Variance up.</param>
    /// <param name="covariance">Of the two.</param>
    /// <param name="chance">Between 0 and 1.</param>
    public static double Within(double varianceX, double varianceY, double covariance, double chance)
    {
        double mean = (varianceX + varianceY) / 2;
        double spread = double.Hypot((varianceX - varianceY) / 2, covariance);
        double most = Math.Sqrt(mean + spread);
        double least = Math.Sqrt(Math.Max(0, mean - spread));
        if (most == 0)
            return 0;

        double low = 0;
        double high = 6 * most;
        for (int halving = 0; halving < 60; halving++)
        {
            double middle = (low + high) / 2;
            if (Chance(least / most, middle / most) < chance)
                low = middle;
            else
                high = middle;
        }

        return (low + high) / 2;
    }

    // In polar form the radial part of the integral is elementary; what is left is smooth and of period π, so equal steps converge fast.
    // With the deviations 1 and b, P(distance < r) = (1/π) ∫ b/q(φ) · (1 − exp(−r² q(φ) / 2b²)) dφ over 0 to π, q = b² cos² φ + sin² φ.
    private static double Chance(double b, double radius)
    {
        // Under a twentieth the breadth changes the distance by less than a thousandth; the steps suffice down to there.
        b = Math.Max(b, 0.05);
        const int Steps = 400;
        double sum = 0;
        for (int step = 0; step < Steps; step++)
        {
            (double sine, double cosine) = Math.SinCos(Math.PI * (step + 0.5) / Steps);
            double q = b * b * cosine * cosine + sine * sine;
            sum += b / q * (1 - Math.Exp(-radius * radius * q / (2 * b * b)));
        }

        return sum / Steps;
    }
}
