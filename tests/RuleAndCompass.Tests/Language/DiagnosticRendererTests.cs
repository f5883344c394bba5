using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.Tests.Language;

public sealed class DiagnosticRendererTests
{
    [Fact]
    public void A_finding_shows_its_line_its_place_and_what_to_try()
    {
        const string Text = "a\nb\nc\nprick C where a meets b, above A\n";
        Diagnostic finding = new("RC2004", Severity.Error, "circles `a` and `b` do not meet", SpanOf(Text, "a meets b"), "enlarge one circle; the centres are 3 mm apart and the radii add up to 2 mm");

        Render(Text, finding).ShouldBe(
            """
            porch.setout, line 4: circles `a` and `b` do not meet  (RC2004)

                prick C where a meets b, above A
                              ‾‾‾‾‾‾‾‾‾
                Try: enlarge one circle; the centres are 3 mm apart and the radii add up to 2 mm.

            """);
    }

    [Fact]
    public void A_warning_says_so_and_a_finding_may_lack_a_hint() =>
        Render("keep a", new Diagnostic("RC3001", Severity.Warning, "small", new SourceSpan(5, 1))).ShouldBe("porch.setout, line 1: warning: small  (RC3001)\n\n    keep a\n         ‾\n");

    [Fact]
    public void Another_file_is_named_and_without_its_text_no_line_is_shown()
    {
        Diagnostic finding = new("RC2004", Severity.Error, "no", new SourceSpan(5, 1), "mend it", "corbels.setout");

        new DiagnosticRenderer("porch.setout", null).Render(finding).ShouldBe("corbels.setout: no  (RC2004)\n\n    Try: mend it.\n");
    }

    [Theory]
    [InlineData("\tkeep a", "a", "    keep a\n         ‾\n")]
    [InlineData("    keep\ta", "a", "    keep    a\n            ‾\n")]
    [InlineData("keep 名前 on a", "a", "    keep 名前 on a\n                 ‾\n")]
    [InlineData("keep 名前", "名前", "    keep 名前\n         ‾‾‾‾\n")]
    [InlineData("keep e\u0301a b", "b", "    keep e\u0301a b\n            ‾\n")]
    [InlineData("keep 🜚 b", "🜚", "    keep 🜚 b\n         ‾\n")]
    [InlineData("keep \u0001 b", "b", "    keep � b\n           ‾\n")]
    [InlineData("keep b   ", "b", "    keep b\n         ‾\n")]
    [InlineData("a\r\nkeep b\r\n", "b", "    keep b\n         ‾\n")]
    public void Tabs_wide_signs_and_marks_leave_the_underline_in_its_place(string text, string place, string shown) =>
        Render(text, new Diagnostic("RC1000", Severity.Error, "x", SpanOf(text, place))).ShouldBe($"porch.setout, line {(text.StartsWith("a\r", StringComparison.Ordinal) ? 2 : 1)}: x  (RC1000)\n\n{shown}");

    [Fact]
    public void A_long_line_is_cut_to_the_part_around_the_place()
    {
        string text = $"let a = {string.Concat(Enumerable.Repeat("b + ", 5_000))}zz{string.Concat(Enumerable.Repeat(" + c", 5_000))}";

        string[] lines = Render(text, new Diagnostic("RC1000", Severity.Error, "x", SpanOf(text, "zz"))).Split('\n');

        lines[2].Length.ShouldBeLessThan(120);
        lines[2].ShouldStartWith("    …");
        lines[2].ShouldEndWith("…");
        lines[3].IndexOf('‾', StringComparison.Ordinal).ShouldBe(lines[2].IndexOf("zz", StringComparison.Ordinal));
        lines[3].Trim().ShouldBe("‾‾");
    }

    [Fact]
    public void A_span_over_several_lines_is_underlined_on_its_first()
    {
        const string Text = "for i = 1 to 2\n  keep a\nend";

        Render(Text, new Diagnostic("RC1000", Severity.Error, "x", new SourceSpan(0, Text.Length))).ShouldBe("porch.setout, line 1: x  (RC1000)\n\n    for i = 1 to 2\n    ‾‾‾‾‾‾‾‾‾‾‾‾‾‾\n");
    }

    [Fact]
    public void The_end_of_the_text_can_be_shown() =>
        Render("keep", new Diagnostic("RC1000", Severity.Error, "x", new SourceSpan(4, 0))).ShouldBe("porch.setout, line 1: x  (RC1000)\n\n    keep\n        ‾\n");

    private static string Render(string text, Diagnostic finding) => new DiagnosticRenderer("porch.setout", text).Render(finding);

    private static SourceSpan SpanOf(string text, string place) => new(text.LastIndexOf(place, StringComparison.Ordinal), place.Length);
}
