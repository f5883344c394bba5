using System.Runtime.Intrinsics;
using RuleAndCompass.Accuracy;

namespace RuleAndCompass.Tests.Accuracy;

public sealed class DistributionTests
{
    [Theory]
    [InlineData(1.0, 1.0)]
    [InlineData(0.003, 0.001)]
    [InlineData(250.0, 1000.0)]
    public void Percentiles_are_those_of_the_sorted_list(double sigma, double typical)
    {
        double[] errors = [.. Normals(200_000).Select(normal => 0.3 * sigma + sigma * normal)];
        Distribution distribution = new(typical);
        foreach (double[] block in errors.Chunk(4096))
            distribution.AddSums(distribution.Tally(block));

        double[] sorted = [.. errors.Order()];
        double[] sizes = [.. errors.Select(Math.Abs).Order()];
        foreach (double part in new[] { 0.025, 0.5, 0.975 })
            distribution.Percentile(part).ShouldBe(sorted[(int)(part * sorted.Length)], 2e-3 * sigma);
        foreach (double part in new[] { 0.95, 0.99 })
            distribution.SizePercentile(part).ShouldBe(sizes[(int)(part * sizes.Length)], 2e-3 * sigma);
        distribution.Mean.ShouldBe(errors.Average(), 1e-12 * sigma);
        distribution.RootMeanSquare.ShouldBe(Math.Sqrt(errors.Average(error => error * error)), 1e-12 * sigma);
    }

    [Fact]
    public void Lost_trials_are_counted_apart()
    {
        Distribution distribution = new(1);
        distribution.AddSums(distribution.Tally([1, double.NaN, -1, double.NaN, 1]));

        distribution.Lost.ShouldBe(2);
        distribution.Kept.ShouldBe(3);
        distribution.Mean.ShouldBe(1.0 / 3);
    }

    [Fact]
    public void Errors_that_are_all_zero_have_zero_percentiles()
    {
        Distribution distribution = new(1);
        distribution.AddSums(distribution.Tally([0, 0, 0]));

        distribution.Percentile(0.975).ShouldBe(0);
        distribution.SizePercentile(0.95).ShouldBe(0);
    }

    // Rayleigh: √(−2 ln 0.05). One direction only: the normal's own 1.9600. Half as broad as long: worked out apart, by quadrature in Cartesian
    // coordinates, ∫ φ(x) erf(√(R² − x²) / (½ √2)) dx from −R to R = 0.95.
    [Theory]
    [InlineData(1.0, 2.447747)]
    [InlineData(0.0, 1.959964)]
    [InlineData(0.5, 2.035858)]
    public void The_distance_of_a_planar_error_is_that_of_the_tables(double ratio, double expected)
    {
        PlanarNormal.Within(4, 4 * ratio * ratio, 0, 0.95).ShouldBe(2 * expected, 2 * expected * 1e-3);
    }

    [Fact]
    public void Turning_a_planar_error_leaves_its_distance()
    {
        // Variances 9 and 1 along axes turned by 45°: both coordinates have variance 5, covariance 4.
        PlanarNormal.Within(5, 5, 4, 0.95).ShouldBe(PlanarNormal.Within(9, 1, 0, 0.95), 1e-9);
    }

    internal static IEnumerable<double> Normals(int count)
    {
        for (uint trial = 0; trial < count; trial += 8)
        {
            (Vector256<double> first, _, Vector256<double> later, _) = NormalNumbers.Draw(11, trial, 1);
            for (int lane = 0; lane < 8; lane++)
                yield return lane < 4 ? first[lane] : later[lane - 4];
        }
    }
}
