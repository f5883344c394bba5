using System.Reflection;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Making;

public sealed class MakingFindingsTests
{
    // RC2032 is met at limits, RC2016 and RC2025 at decisions that are too hard (both in LimitTests), RC2040 by no script: it says that a construction of ours is wrong.
    private static readonly string[] Elsewhere = ["RC2016", "RC2025", "RC2032", "RC2040"];

    public static TheoryData<string> Pairs => [.. MakingFiles.Pairs];

    [Theory]
    [MemberData(nameof(Pairs))]
    public void A_fault_is_reported_once_and_as_expected(string file)
    {
        string text = MakingFiles.ReadExpected(file);

        Outcome<Layout> outcome = Maker.Make(file, text);

        string report = new DiagnosticRenderer(file, text).Render(outcome.Diagnostics);
        report.ShouldBe(MakingFiles.ReadExpected(Path.ChangeExtension(file, ".txt")));
        outcome.Diagnostics.ShouldHaveSingleItem().Code.ShouldBe(file[..6]);
    }

    [Fact]
    public void Every_code_has_a_pair_or_is_met_elsewhere() =>
        Codes().Except(Elsewhere).Order(StringComparer.Ordinal).ShouldBe(MakingFiles.Pairs.Select(file => file[..6]).Distinct());

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

    internal static IEnumerable<string> Codes() => Findings().Select(finding => finding.Code).Distinct();

    // Calls each factory once, with something of each kind of argument.
    private static List<Diagnostic> Findings() =>
        [.. typeof(MakingFindings).GetMethods(BindingFlags.Static | BindingFlags.Public | BindingFlags.DeclaredOnly)
            .Where(method => method.ReturnType == typeof(Diagnostic))
            .Select(method => method.Invoke(null, [.. method.GetParameters().Select(Sample)]).ShouldBeOfType<Diagnostic>())];

    private static object? Sample(ParameterInfo parameter) => parameter.ParameterType switch
    {
        var type when type == typeof(string) => "wort",
        var type when type == typeof(Verdict) => new Verdict(Certainty.Digits, 50, []),
        var type when type == typeof(IEnumerable<string>) => (string[])["dividers"],
        _ => new SourceSpan(0, 1),
    };
}
