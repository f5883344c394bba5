using RuleAndCompass.Making;

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
        // Each latitude takes one quarter of each hour, its neighbours the others.
        // The circles of the projected sphere take many times as long to decide, so it is asked at every eleventh latitude.
        int step = recipe.Contains("sphere", StringComparison.Ordinal) ? 11 : 1;
        for (int latitude = -89; latitude <= 89; latitude += step)
        {
            if (latitude != 0)
                AllDecided(recipe, latitude, first: $"-5 + {(latitude + 89) % 4} / 4", step: "1", hours: (latitude + 89) % 4 == 0 ? 11 : 10);
        }
    }

    [Theory]
    [MemberData(nameof(Recipes))]
    public void Each_quarter_of_an_hour_is_decided_equal_to_the_formula(string recipe)
    {
        int[] latitudes = recipe.Contains("sphere", StringComparison.Ordinal) ? [-45, 52] : [-89, -45, -1, 1, 30, 52, 89];
        foreach (int latitude in latitudes)
            AllDecided(recipe, latitude, first: "-5", step: "1/4", hours: 41);
    }

    private static void AllDecided(string recipe, int latitude, string first, string step, int hours)
    {
        Layout dial = HorizontalDialTests.Dial(recipe, $"{latitude}°", first: first, step: step);

        dial.Comparisons.Count(comparison => comparison.Label.EndsWith("o'clock", StringComparison.Ordinal)).ShouldBe(hours);
        dial.Comparisons.Where(comparison => !comparison.Decision.IsZero).Select(comparison => comparison.Label).ShouldBeEmpty($"{recipe}, latitude {latitude}°");
    }
}
