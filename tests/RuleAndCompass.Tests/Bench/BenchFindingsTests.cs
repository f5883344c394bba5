using RuleAndCompass.Accuracy;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;
using RuleAndCompass.Tests.Language;

namespace RuleAndCompass.Tests.Bench;

/// <summary>Each code of the bench and of the hand error: a script, and its whole report as people read it.</summary>
public sealed class BenchFindingsTests
{
    // RC4001 can't come from a script, whose hand is read with care; RC4003 comes of an option, RC4006 of a limit.
    private static readonly string[] NotFromScripts = ["RC4001", "RC4003", "RC4006"];

    public static TheoryData<string, string> Pairs
    {
        get
        {
            TheoryData<string, string> pairs = [];
            foreach (string room in new[] { "Bench", "Accuracy" })
            {
                foreach (string file in Files(room))
                    pairs.Add(room, file);
            }

            return pairs;
        }
    }

    [Theory]
    [MemberData(nameof(Pairs))]
    public void A_finding_is_reported_as_expected(string room, string file)
    {
        string path = Path.Combine(Folder(room), file);
        string text = File.ReadAllText(path + ".setout");
        Outcome<Layout> made = Maker.Make(file + ".setout", text);
        made.Diagnostics.ShouldBeEmpty();
        Layout layout = made.Value.ShouldNotBeNull();

        Diagnostic[] findings = room == "Bench"
            ? [.. LayoutFitness.Inspect(layout)]
            : [.. HandError.Assess(layout, new HandErrorOptions { Trials = 1000 }).Diagnostics];

        findings.ShouldHaveSingleItem().Code.ShouldBe(file);
        new DiagnosticRenderer(file + ".setout", text).Render(findings).ShouldBe(File.ReadAllText(path + ".txt"));
    }

    [Fact]
    public void Every_code_has_a_pair_and_stands_in_the_language_reference()
    {
        string[] codes = [.. Enumerable.Range(3101, 7).Concat(Enumerable.Range(4001, 6)).Select(code => $"RC{code}")];

        Files("Bench").Concat(Files("Accuracy")).Concat(NotFromScripts).Order(StringComparer.Ordinal).ShouldBe(codes);
        string reference = LanguageFindingsTests.LanguageReference();
        foreach (string code in codes)
            reference.ShouldContain($"\n### {code}\n");
    }

    private static IEnumerable<string> Files(string room) =>
        Directory.EnumerateFiles(Folder(room), "*.setout").Select(file => Path.GetFileNameWithoutExtension(file)).Order(StringComparer.Ordinal);

    private static string Folder(string room)
    {
        DirectoryInfo? at = new(AppContext.BaseDirectory);
        while (at is not null && !File.Exists(Path.Combine(at.FullName, "RuleAndCompass.sln")))
            at = at.Parent;
        return Path.Combine(at.ShouldNotBeNull().FullName, "tests", "RuleAndCompass.Tests", room, "Expected");
    }
}
