using RuleAndCompass.Plates.Composition;

namespace RuleAndCompass.Plates.Tests.Composition;

public sealed class PlateScaleTests
{
    [Theory]
    [InlineData(100, 100, "1 : 1")]
    [InlineData(177, 150, "1 : 1")]
    [InlineData(178, 150, "1 : 2")]
    [InlineData(420, 297, "1 : 2.5")]
    [InlineData(1000, 300, "1 : 10")]
    [InlineData(6000, 4000, "1 : 40")]
    [InlineData(20000, 12000, "1 : 200")]
    [InlineData(60, 20, "2 : 1")]
    [InlineData(1, 1, "10 : 1")]
    public void The_largest_standard_scale_that_fits_is_taken(double width, double height, string expected)
    {
        PlateScale.Fitting(width, height, 177, 150).ToString().ShouldBe(expected);
    }
}
