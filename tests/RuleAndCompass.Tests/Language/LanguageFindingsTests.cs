using System.Reflection;
using System.Text;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Tests.Language;

public sealed class LanguageFindingsTests
{
    // These are met at limits, which no short script reaches; ScriptReaderTests meets them with smaller limits.
    private static readonly string[] Limits = ["RC1090", "RC1091", "RC1092", "RC1093", "RC1094", "RC1095"];

    public static TheoryData<string> Pairs => [.. LanguageFiles.Names("*.setout", "Expected")];

    public static TheoryData<string, string> Slips => LanguageFiles.Table("Slips.txt");

    [Theory]
    [MemberData(nameof(Slips))]
    public void A_slip_gets_a_hint_that_mends_it(string source, string hint) =>
        ScriptReader.Read("slip", source).Diagnostics.ShouldHaveSingleItem().Hint.ShouldBe(hint);

    [Fact]
    public void A_block_begun_with_a_word_of_habit_still_takes_its_end() =>
        ScriptReader.Read("if", "if x = 3\n  keep a\nelse\n  keep b\nend").Diagnostics.Select(finding => finding.Hint).ShouldBe(
            ["did you mean `when`? For example `when remainder(h, 5) = 0`", "did you mean `otherwise`? For example `otherwise`"]);

    [Theory]
    [MemberData(nameof(Pairs))]
    public void A_fault_is_reported_as_expected(string file)
    {
        string text = LanguageFiles.Read("Expected", file);
        string expected = LanguageFiles.Read("Expected", Path.ChangeExtension(file, ".txt"));

        Outcome<Script> outcome = ScriptReader.Read(file, text);

        outcome.Diagnostics.ShouldHaveSingleItem().Code.ShouldBe(Path.GetFileNameWithoutExtension(file));
        new DiagnosticRenderer(file, text).Render(outcome.Diagnostics).ShouldBe(expected);
    }

    [Fact]
    public void Every_code_has_a_pair_or_is_a_limit() =>
        Codes().Order(StringComparer.Ordinal).ShouldBe(LanguageFiles.Names("*.setout", "Expected").Select(file => Path.GetFileNameWithoutExtension(file)).Concat(Limits).Order(StringComparer.Ordinal));

    [Fact]
    public void Every_code_belongs_to_one_finding() => Codes().ShouldBeUnique();

    [Fact]
    public void Every_code_is_explained_in_the_language_reference()
    {
        string reference = LanguageReference();
        string findings = reference[reference.IndexOf("\n## Findings\n", StringComparison.Ordinal)..];

        foreach (string code in Codes())
        {
            int start = findings.IndexOf($"\n### {code}\n", StringComparison.Ordinal);
            start.ShouldBeGreaterThan(0, $"{code} is not explained");
            int end = findings.IndexOf("\n### ", start + 1, StringComparison.Ordinal);
            string entry = findings[start..(end < 0 ? findings.Length : end)];
            string[] parts = entry.Split("```");
            parts.Length.ShouldBe(3, $"{code} has no example, or several");
            parts.ShouldAllBe(part => !string.IsNullOrWhiteSpace(part), $"{code} lacks its meaning, its example or how to mend it");
        }
    }

    [Fact]
    public void Messages_and_hints_are_written_in_one_manner()
    {
        foreach (Diagnostic finding in Findings())
        {
            finding.Message.ShouldNotEndWith(".");
            char.IsUpper(finding.Message[0]).ShouldBeFalse(finding.Message);
            (finding.Message.Count(c => c == '`') % 2).ShouldBe(0, finding.Message);
            finding.Hint?.ShouldNotEndWith(".");
        }
    }

    internal static string LanguageReference()
    {
        using Stream stream = typeof(ScriptReader).Assembly.GetManifestResourceStream("language.md").ShouldNotBeNull();
        using StreamReader reader = new(stream);
        return reader.ReadToEnd();
    }

    private static List<string> Codes() => [.. Findings().Select(finding => finding.Code)];

    // Calls each factory once, with something of each kind of argument.
    private static List<Diagnostic> Findings() =>
        [.. typeof(LanguageFindings).GetMethods(BindingFlags.Static | BindingFlags.NonPublic | BindingFlags.DeclaredOnly)
            .Where(method => method.IsAssembly && method.ReturnType == typeof(Diagnostic))
            .Select(method => method.Invoke(null, [.. method.GetParameters().Select(Sample)]).ShouldBeOfType<Diagnostic>())];

    private static object? Sample(ParameterInfo parameter) => parameter.ParameterType switch
    {
        var type when type == typeof(string) => parameter.Name is "fraction" ? "2/3" : "wort",
        var type when type == typeof(int) => 3,
        var type when type == typeof(long) => 3L,
        var type when type == typeof(bool) => false,
        var type when type == typeof(SourceSpan) => new SourceSpan(0, 1),
        var type when type == typeof(Rune) => new Rune('?'),
        _ => new List<string>(),
    };
}
