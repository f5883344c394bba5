using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.Tests.Language;

public sealed class NearNameTests
{
    private static readonly string[] Known = ["prick", "rule", "strike", "for", "mm", "cm", "noon", "straightedge", "noon_line"];

    [Theory]
    [InlineData("prik", "prick")]
    [InlineData("pirck", "prick")]
    [InlineData("Prick", "prick")]
    [InlineData("RULE", "rule")]
    [InlineData("fro", "for")]
    [InlineData("mn", "mm")]
    [InlineData("straitedge", "straightedge")]
    [InlineData("stike", "strike")]
    [InlineData("nonn", "noon")]
    public void A_mistyped_word_finds_its_fellow(string word, string near) => NearName.Find(word, Known).ShouldBe(near);

    [Theory]
    [InlineData("")]
    [InlineData("q")]
    [InlineData("bench")]
    [InlineData("prick")]
    [InlineData("zzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzzz")]
    public void A_word_far_from_all_or_known_itself_finds_none(string word) => NearName.Find(word, Known).ShouldBeNull();

    // counted by hand; `ca` to `abc` is 3 because no letter is touched twice
    [Theory]
    [InlineData("", "", 0)]
    [InlineData("abc", "abc", 0)]
    [InlineData("abc", "axc", 1)]
    [InlineData("ab", "ba", 1)]
    [InlineData("ca", "abc", 3)]
    [InlineData("kitten", "sitting", 3)]
    public void Distances_count_single_changes(string first, string second, int distance)
    {
        NearName.Distance(first, second).ShouldBe(distance);
        NearName.Distance(second, first).ShouldBe(distance);
    }
}
