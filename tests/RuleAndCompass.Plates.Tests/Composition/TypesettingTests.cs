using RuleAndCompass.Plates.Composition;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Tests.Composition;

public sealed class TypesettingTests
{
    [Fact]
    public void Lines_keep_to_the_measure_and_lose_nothing()
    {
        const string text = "Lay the straightedge to O and hour[7 1/2] and draw averyveryverylongnamethatdoesnotfitonanylineatall.";

        List<string> lines = Typesetting.Break(text, Typeface.Text, 3, 30);

        lines.ShouldAllBe(line => Typesetting.Width(line, Typeface.Text, 3) <= 30);
        string.Concat(lines).Replace(" ", "").ShouldBe(text.Replace(" ", ""));
        lines.ShouldContain(line => line.Contains("hour[7 1/2]"));
    }

    [Fact]
    public void What_does_not_fit_is_cut_short_visibly()
    {
        string fitted = Typesetting.Fit("the ferry slip at Carrow Holm", Typeface.Text, 3, 20);

        fitted.ShouldEndWith("…");
        Typesetting.Width(fitted, Typeface.Text, 3).ShouldBeLessThanOrEqualTo(20);
        Typesetting.Fit("short", Typeface.Text, 3, 20).ShouldBe("short");
    }
}
