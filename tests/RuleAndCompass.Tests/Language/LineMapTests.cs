using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.Tests.Language;

public sealed class LineMapTests
{
    [Theory]
    [InlineData("", 0, 1, 1)]
    [InlineData("ab", 1, 1, 2)]
    [InlineData("ab", 99, 1, 3)]
    [InlineData("a\nb", 1, 1, 2)]
    [InlineData("a\nb", 2, 2, 1)]
    [InlineData("a\r\nb", 2, 1, 3)]
    [InlineData("a\r\nb", 3, 2, 1)]
    [InlineData("a\rb", 2, 2, 1)]
    [InlineData("a\n", 2, 2, 1)]
    [InlineData("a\n\nb", 2, 2, 1)]
    public void Lines_and_columns_count_from_one(string text, int position, int line, int column) =>
        new LineMap(text).Find(position).ShouldBe(new LineColumn(line, column));

    [Fact]
    public void A_line_is_found_without_its_end()
    {
        LineMap map = new("one\r\ntwo\n\nfour");

        map.Count.ShouldBe(4);
        map.LineSpan(1).ShouldBe(new SourceSpan(0, 3));
        map.LineSpan(2).ShouldBe(new SourceSpan(5, 3));
        map.LineSpan(3).ShouldBe(new SourceSpan(9, 0));
        map.LineSpan(4).ShouldBe(new SourceSpan(10, 4));
        map.Find(new SourceSpan(5, 3)).ShouldBe((new LineColumn(2, 1), new LineColumn(2, 4)));
    }
}
