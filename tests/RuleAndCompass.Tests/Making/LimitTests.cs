using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Making;

/// <summary>Limits, and what cannot be decided.</summary>
public sealed class LimitTests
{
    [Fact]
    public void A_loop_that_runs_too_long_ends_at_a_limit()
    {
        MakingOptions options = new() { MaximumSentences = 1000 };

        Layouts.Finding("for i = 1 to 100000000\n  let x = i\nend\nlet y = z", options).ShouldSatisfyAllConditions(
            finding => finding.Code.ShouldBe("RC2032"),
            finding => finding.Message.ShouldBe("too many sentences are carried out; the limit is 1000"));
        Layouts.Finding("for i = 1 to 100000000\nend", options).Code.ShouldBe("RC2032");
        Layouts.Finding("for i = 1 to 100000\n  for j = 1 to 100000\n  end\nend", options).Code.ShouldBe("RC2032");
    }

    [Fact]
    public void A_script_of_too_many_acts_ends_at_a_limit_told_at_its_sentence()
    {
        Diagnostic finding = Layouts.Finding("prick O at (0, 0)\nfor i = 1 to 100\n  prick P[i] at (1 mm * i, 0)\nend\nprick Q at (0, 1 mm)", new() { MaximumActs = 10 });

        finding.Message.ShouldBe("the script asks for too many acts; the limit is 10");
        finding.Span.Start.ShouldBe(37);
    }

    [Fact]
    public void Recipes_nested_too_deep_end_at_a_limit()
    {
        string chain = string.Concat(Enumerable.Range(1, 30).Select(i => $"recipe \"r{i}\"\n  follow \"r{i + 1}\" as next\nend\n"));

        Diagnostic finding = Layouts.Finding(chain + "recipe \"r31\"\nend\nfollow \"r1\" as all", new() { MaximumNesting = 20 });

        finding.Code.ShouldBe("RC2032");
        finding.Message.ShouldContain("nested too deep; the limit is 20");
    }

    [Fact]
    public void Deep_nesting_in_a_script_is_a_finding_and_no_crash()
    {
        string blocks = string.Concat(Enumerable.Repeat("when 1 = 1\n", 5000)) + "let a = 1\n" + string.Concat(Enumerable.Repeat("end\n", 5000));
        string brackets = "let a = " + new string('(', 20_000) + "1" + new string(')', 20_000);
        string signs = "let a = " + new string('-', 20_000) + "1";
        string sum = "let a = 1" + string.Concat(Enumerable.Repeat(" + 1", 20_000));

        foreach (string script in (string[])[blocks, brackets, signs, sum])
            Layouts.Findings(script).Count(finding => finding.Severity == Severity.Error).ShouldBeLessThanOrEqualTo(1000);
    }

    [Fact]
    public void A_family_too_long_does_not_hide_the_next_sentence()
    {
        Layouts.Findings("prick O at (0, 0)\nprick A at (30 mm, 0)\nprick P[1 to 1000000] dividing O to A\nlet a = b").Select(finding => finding.Code).ShouldBe(["RC2032", "RC2001"]);
    }

    [Fact]
    public void The_time_allowed_is_a_limit()
    {
        Diagnostic finding = Layouts.Finding("for i = 1 to 1000000\n  let x = sin(1° * i) * cos(1° * i)\nend", new(TimeLimit: TimeSpan.FromMilliseconds(50)));

        finding.Code.ShouldBe("RC2032");
        finding.Message.ShouldStartWith("the time allowed has run out here");
    }

    [Fact]
    public void Making_ends_when_it_is_cancelled()
    {
        using CancellationTokenSource cancelled = new();
        cancelled.Cancel();

        Should.Throw<OperationCanceledException>(() => Maker.Make("long", "let a = 1", null, null, cancelled.Token));
    }

    [Fact]
    public void Progress_runs_from_the_first_sentence_to_the_last()
    {
        List<double> told = [];

        Maker.Make("steps", "let a = 1\nlet b = 2\nlet c = 3\nlet d = 4", progress: new Told(told));

        told.ShouldBe([0.25, 0.5, 0.75, 1]);
    }

    // Sines of multiples of pi degrees have no exact direction: the identity of the double angle is true and cannot be decided.
    [Fact]
    public void What_is_not_decided_is_a_warning_that_claims_no_more_than_its_digits()
    {
        Outcome<Layout> outcome = Maker.Make("undecided", "claim sin(1° * pi) = 2 * sin(1° * pi / 2) * cos(1° * pi / 2)");

        ClaimResult claim = outcome.Value.ShouldNotBeNull().Claims.ShouldHaveSingleItem();
        if (claim.Holds is null)
        {
            Diagnostic finding = outcome.Diagnostics.ShouldHaveSingleItem();
            finding.Code.ShouldBe("RC2025");
            finding.Severity.ShouldBe(Severity.Warning);
            claim.Verdict.Certainty.ShouldBe(Certainty.Digits);
        }
        else
        {
            claim.Holds.ShouldBe(true);
        }
    }

    [Fact]
    public void A_branch_that_hangs_on_an_undecided_condition_is_an_error()
    {
        Diagnostic finding = Layouts.Finding("let turn = atan(1/2)\nlet part = turn * pi\nwhen sin(part) * sin(part) + cos(part) * cos(part) * sin(part) / sin(part) = 1\n  let a = 1\nend\nlet b = a");

        finding.Code.ShouldBe("RC2016");
    }

    private sealed class Told(List<double> told) : IProgress<double>
    {
        public void Report(double value) => told.Add(value);
    }
}
