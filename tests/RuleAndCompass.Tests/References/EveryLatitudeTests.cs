using RuleAndCompass.Making;
using RuleAndCompass.Tests.Making;

namespace RuleAndCompass.Tests.References;

/// <summary>Every degree of latitude, north and south, by quarters of an hour.</summary>
public sealed class EveryLatitudeTests
{
    public static TheoryData<string> Recipes => [.. HorizontalDialTests.Recipes];

    // Formula: tan y = sin L tan x, Encyclopaedia Britannica, 7th edition, vol. 7 (1842), "Dialling", art. 23.
    [Theory]
    [MemberData(nameof(Recipes))]
    public void Each_hour_line_is_decided_equal_to_the_formula(string recipe)
    {
        for (int latitude = 1; latitude <= 89; latitude++)
        {
            foreach (int signed in (int[])[latitude, -latitude])
            {
                Layout dial = HorizontalDialTests.Dial(recipe, $"{signed}°", step: "1/4");

                dial.Comparisons.Count(comparison => comparison.Label.EndsWith("o'clock", StringComparison.Ordinal)).ShouldBe(41);
                dial.Comparisons.Where(comparison => !comparison.Decision.IsZero).Select(comparison => comparison.Label).ShouldBeEmpty($"{recipe}, latitude {signed}°");
            }
        }
    }
}
