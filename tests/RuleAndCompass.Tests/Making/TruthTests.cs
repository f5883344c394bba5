using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Making;

/// <summary>Claims and comparisons.</summary>
public sealed class TruthTests
{
    private const string Figures = """
        prick O at (0, 0)
        prick A at (30 mm, 0)
        prick B at (0, 40 mm)
        prick C at (30 mm, 40 mm)
        prick D at (60 mm, 0)
        prick E at (90 mm, 1 mm)
        rule l through O, A
        rule m through O, B
        rule n through A square to l
        rule top through B parallel to l
        rule slant through A, B
        rule cross through O, C
        strike c about O opening 30 mm
        strike d about D opening 30 mm
        strike e about O opening 10 mm
        strike f about C opening 5 mm
        strike g about O through A
        prick H midway A to B

        """;

    [Theory]
    [InlineData("distance A to B = 50 mm", null)]
    [InlineData("distance A to B = 51 mm", "the difference is -1 mm")]
    [InlineData("distance A to slant = 0", null)]
    [InlineData("distance O to slant = 24 mm", null)]
    [InlineData("distance O to A < distance O to B", null)]
    [InlineData("distance O to B < distance O to A", "the difference is 10 mm")]
    [InlineData("distance O to A <= 30 mm and 3 >= 3", null)]
    [InlineData("3 > 3", "the difference is 0")]
    [InlineData("radius of c = 30 mm", null)]
    [InlineData("x of C = 30 mm and y of C = 40 mm", null)]
    [InlineData("angle A O B = 90°", null)]
    [InlineData("angle B O A = 90°", null)]
    [InlineData("angle D O E > 0°", null)]
    [InlineData("angle from l to m clockwise = -90°", null)]
    [InlineData("angle from l to m anticlockwise = 90°", null)]
    [InlineData("angle from l to m anticlockwise = 91°", "the difference is -1°")]
    [InlineData("A = A", null)]
    [InlineData("A = B", "they are 50 mm apart")]
    [InlineData("not A = B", null)]
    [InlineData("c = g", null)]
    [InlineData("c = e", "their radii differ by 20 mm")]
    [InlineData("c = d", "their centres are 60 mm apart")]
    [InlineData("l = top", "they are parallel, 40 mm apart")]
    [InlineData("l = m", "they run at 90° to each other")]
    [InlineData("A on l", null)]
    [InlineData("B on l", "it lies 40 mm off the line")]
    [InlineData("A on c", null)]
    [InlineData("B on c", "it lies 10 mm off the circle")]
    [InlineData("H on slant", null)]
    [InlineData("l square to m", null)]
    [InlineData("cross square to m", "the difference is -53.130102° from square")]
    [InlineData("l parallel to top", null)]
    [InlineData("l parallel to m", "the difference is 90° from parallel")]
    [InlineData("n touches c", null)]
    [InlineData("c touches n", null)]
    [InlineData("m touches c", "the centre lies 0 mm from the line, and the radius is 30 mm")]
    [InlineData("c touches d", null)]
    [InlineData("c touches e", "the centres are 0 mm apart, and the radii are 30 mm and 10 mm")]
    [InlineData("c touches g", "they are one circle")]
    [InlineData("c meets l", null)]
    [InlineData("c meets d", null)]
    [InlineData("c meets f", "they are 15 mm apart")]
    [InlineData("top meets e", "they are 30 mm apart")]
    [InlineData("l meets top", "they are parallel, 40 mm apart")]
    [InlineData("c meets e", "they are 20 mm apart")]
    [InlineData("O, A, D on one line", null)]
    [InlineData("O, A, D, E on one line", "`E` lies 1 mm off the line from `O` to `A`")]
    [InlineData("O, A, C, B on one circle", null)]
    [InlineData("O, A, C, B, H on one circle", "`H` lies 25 mm off the circle through `O`, `A` and `C`")]
    [InlineData("l, m, cross through one point", null)]
    [InlineData("l, slant, n through one point", null)]
    [InlineData("l, m, slant through one point", "one passes 24 mm from where two others cross")]
    [InlineData("1 = 2 or 2 = 2", null)]
    [InlineData("1 = 1 and 2 = 3", "the difference is -1")]
    [InlineData("\"a\" = \"a\"", null)]
    public void A_claim_is_proved_or_refuted_and_says_by_how_much(string claim, string? by)
    {
        Outcome<Layout> outcome = Maker.Make("claims", Figures + "claim " + claim);

        ClaimResult result = outcome.Value.ShouldNotBeNull().Claims.ShouldHaveSingleItem();
        result.Says.ShouldBe(claim);
        result.Holds.ShouldBe(by is null);
        result.By.ShouldBe(by);
        result.Verdict.ShouldBe(Verdict.Proved);
        outcome.Diagnostics.Select(finding => finding.Code).ShouldBe(by is null ? [] : ["RC2024"]);
    }

    [Theory]
    [InlineData("O, O, A, E on one line", false)]
    [InlineData("O, O, A, D on one line", true)]
    [InlineData("O, A, D, B on one circle", false)]
    [InlineData("O, A, A, C, B on one circle", true)]
    [InlineData("l, top, m through one point", false)]
    [InlineData("l, l, m through one point", true)]
    [InlineData("l, top, l through one point", false)]
    public void Figures_that_coincide_or_are_parallel_do_not_fool_a_claim(string claim, bool holds)
    {
        Outcome<Layout> outcome = Maker.Make("claims", Figures + "claim " + claim);

        outcome.Value.ShouldNotBeNull().Claims.ShouldHaveSingleItem().Holds.ShouldBe(holds);
    }

    [Fact]
    public void A_near_miss_is_refuted_and_a_true_identity_proved()
    {
        Outcome<Layout> outcome = Maker.Make("near", """
            claim sqrt(2) + sqrt(3) = sqrt(5 + 2 * sqrt(6))
            claim sqrt(2) + sqrt(3) = 3.14626436994197234232913506571557044
            claim sin(10°) * sin(50°) * sin(70°) = 1/8
            """);

        outcome.Value.ShouldNotBeNull().Claims.Select(claim => claim.Holds).ShouldBe([true, false, true]);
    }

    [Theory]
    [InlineData("A = 3", "RC2002")]
    [InlineData("A < B", "RC2002")]
    [InlineData("A on B", "RC2002")]
    [InlineData("l square to c", "RC2002")]
    [InlineData("3 mm = 3°", "RC2002")]
    [InlineData("3 mm = 3", "RC2002")]
    [InlineData("l touches m", "RC2002")]
    [InlineData("l, A, B on one line", "RC2002")]
    public void A_claim_of_the_wrong_kinds_is_an_error(string claim, string code) => Layouts.Finding(Figures + "claim " + claim).Code.ShouldBe(code);

    [Fact]
    public void Angles_are_compared_the_short_way_round()
    {
        Layout layout = Layouts.Make("""
            prick O at (0, 0)
            rule l through O toward 179°
            rule m through O toward right
            compare angle from m to l anticlockwise with -179° as "across"
            compare angle from m to l anticlockwise with 179° as "same"
            compare angle from m to l anticlockwise with 539° as "round"
            """);

        layout.Comparison("across").Difference.ToDouble().ShouldBe(-2, 1e-12);
        layout.Comparison("same").Decision.IsZero.ShouldBeTrue();
        layout.Comparison("round").Decision.IsZero.ShouldBeTrue();
        layout.Comparison("round").Difference.TryGetRational(out Rational zero).ShouldBeTrue();
        zero.IsZero.ShouldBeTrue();
    }

    [Fact]
    public void A_place_is_compared_from_the_middle_of_the_sheet_or_from_a_point()
    {
        Layout layout = Layouts.Make("""
            prick O at (10 mm, 10 mm)
            prick A at (40 mm, 50 mm)
            compare A with (40 mm, 50 mm) as "sheet"
            compare A with (30 mm, 40 mm) from O as "from O"
            compare A with (33 mm, 36 mm) from O as "off" within 6 mm
            """);

        layout.Comparison("sheet").Decision.IsZero.ShouldBeTrue();
        layout.Comparison("from O").Decision.IsZero.ShouldBeTrue();
        layout.Comparison("off").Difference.ToDouble().ShouldBe(5, 1e-12);
        layout.Comparison("off").InTolerance.ShouldBeTrue();
        layout.Comparison("off").Kind.ShouldBe(QuantityKind.Point);
    }

    [Fact]
    public void A_comparison_without_a_name_is_called_as_written_with_its_indices_worked_out()
    {
        Layout layout = Layouts.Make("""
            prick O at (0, 0)
            for i = 1 to 2
              prick P[i] at (10 mm * i, 0)
              compare distance O to P[i] with 10 mm * i
            end
            """);

        layout.Comparisons.Select(comparison => comparison.Label).ShouldBe(["distance O to P[1]", "distance O to P[2]"]);
    }

    // Rate of the hour angle of a horizontal dial: dy/dx = sin L sec² x / (1 + sin² L tan² x), by differentiating tan y = sin L tan x by hand.
    [Fact]
    public void Time_is_told_through_the_rate_at_which_the_formula_changes()
    {
        Layout layout = Layouts.Make("""
            prick O at (0, 0)
            rule noon through O toward up
            let L = 30°
            for h = 3
              let x = 15° * h
              let y = atan(sin(L) * tan(x))
              rule hour through O turned 27° from noon clockwise
              compare angle from noon to hour clockwise with y as "three" timed by h within 3 minutes
            end
            """);

        Comparison three = layout.Comparison("three");
        double rate = 15 * 0.5 * 2 / (1 + 0.25);
        three.RatePerHour!.Value.ShouldBe(rate, 1e-9);
        three.MinutesOfTime!.Value.ShouldBe((27 - (Math.Atan(0.5) * 180 / Math.PI)) / rate * 60, 1e-9);
    }

    [Fact]
    public void Where_the_formula_stands_still_the_time_is_left_out_and_the_report_says_why()
    {
        Layout layout = Layouts.Make("""
            prick O at (0, 0)
            rule noon through O toward up
            for h = 6
              rule hour through O turned 10° from noon clockwise
              compare angle from noon to hour clockwise with asin(sin(15° * h)) / 9 as "still" timed by h
              compare angle from noon to hour clockwise with 10° as "constant" timed by h within 1 minutes
            end
            """);

        layout.Comparison("constant").RatePerHour.ShouldBeNull();
        layout.Comparison("constant").MinutesOfTime.ShouldBeNull();
        layout.Comparison("constant").TimeLeftOut.ShouldBe("the formula does not change with `h` here");
        layout.Comparison("still").TimeLeftOut.ShouldBe("the formula does not change with `h` here");
    }

    [Fact]
    public void A_place_is_timed_by_the_part_of_the_difference_along_its_path()
    {
        // The place moves straight up, 10 mm an hour: only the 2 mm upward count, 12 minutes.
        Layout layout = Layouts.Make("""
            for h = 3
              prick P at (5 mm, 32 mm)
              compare P with (0, 10 mm * h) as "P" timed by h
            end
            """);

        layout.Comparison("P").MinutesOfTime!.Value.ShouldBe(12, 1e-9);
    }

    [Theory]
    [InlineData("compare distance O to A with 30°", "RC2002")]
    [InlineData("compare distance O to A with 30 mm within 1°", "RC2036")]
    [InlineData("compare distance O to A with 30 mm within -1 mm", "RC2036")]
    [InlineData("compare distance O to A with 30 mm within 1/2 minutes", "RC2036")]
    [InlineData("compare A with B", "RC2036")]
    [InlineData("compare l with m", "RC2002")]
    [InlineData("compare distance O to A * distance O to A with 3 mm * 4 mm", "RC2036")]
    [InlineData("compare distance O to A with (1 mm, 2 mm)", "RC2002")]
    [InlineData("compare distance O to A with 30 mm timed by width", "RC2002")]
    public void A_comparison_that_makes_no_sense_is_an_error(string sentence, string code) => Layouts.Finding(Figures + "let width = 3 mm\n" + sentence).Code.ShouldBe(code);

    [Fact]
    public void A_comparison_out_of_tolerance_is_an_error_that_leaves_the_layout_standing()
    {
        Outcome<Layout> outcome = Maker.Make("out", Figures + "compare distance A to B with 49 mm as \"rafter\" within 1/2 mm\ncompare distance A to B with 49 mm within 1 mm");

        outcome.Diagnostics.ShouldHaveSingleItem().Code.ShouldBe("RC2026");
        outcome.Value.ShouldNotBeNull().Comparisons.Select(comparison => comparison.InTolerance).ShouldBe([false, true]);
    }

    [Fact]
    public void An_identity_in_a_given_is_decided_for_every_value_of_it()
    {
        Layout layout = Layouts.Make("""
            given latitude = 43°18' from 1° to 89°
            given R = 80 mm
            prick O at (0, 0)
            rule noon through O toward up
            strike rim about O opening R
            prick S where noon meets rim, ahead of O
            rule slant through O turned latitude from noon clockwise
            prick F at foot of S on slant
            compare distance S to F with R * sin(latitude) as "sine"
            claim distance S to F > 0
            """);

        Decision decision = layout.Comparison("sine").Decision;
        decision.IsZero.ShouldBeTrue();
        decision.Verdict.Certainty.ShouldBeOneOf(Certainty.ProvedForEvery, Certainty.CertainForEvery);
        decision.Verdict.ToString().ShouldContain("latitude");
    }
}
