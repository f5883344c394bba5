using RuleAndCompass.Bench;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Making;

/// <summary>Values, names, loops, branches, stages: what the sentences that draw nothing mean.</summary>
public sealed class SemanticsTests
{
    // Values

    [Theory]
    [InlineData("1/2 + 1/3", "5/6")]
    [InlineData("2 1/2 * 2", "5")]
    [InlineData("3 in / 1 mm", "76.2")]
    [InlineData("1 ft / 1 in", "12")]
    [InlineData("sqrt(8) / sqrt(2)", "2")]
    [InlineData("sqrt(9 mm * 4 mm) / 1 mm", "6")]
    [InlineData("90° / 15°", "6")]
    [InlineData("2h30m / 1°", "37.5")]
    [InlineData("1/8 turn / 1°", "45")]
    [InlineData("30' / 1°", "1/2")]
    [InlineData("sin(30°)", "1/2")]
    [InlineData("cos(-60°)", "1/2")]
    [InlineData("tan(45°)", "1")]
    [InlineData("asin(1/2)", "30°")]
    [InlineData("acos(-1/2)", "120°")]
    [InlineData("atan(-1)", "-45°")]
    [InlineData("atan(1, -1)", "135°")]
    [InlineData("atan(-1 mm, -1 mm)", "-135°")]
    [InlineData("atan(0, -1)", "180°")]
    [InlineData("abs(-3)", "3")]
    [InlineData("abs(-3°) / 1°", "3")]
    [InlineData("min(3, 1, 2)", "1")]
    [InlineData("max(3 mm, 1 cm) / 1 mm", "10")]
    [InlineData("max(10°, 20°) / 1°", "20")]
    [InlineData("whole(-1/2)", "-1")]
    [InlineData("whole(sqrt(10))", "3")]
    [InlineData("remainder(17, 5)", "2")]
    [InlineData("remainder(-1, 12)", "11")]
    [InlineData("remainder(25 mm, 10 mm) / 1 mm", "5")]
    [InlineData("remainder(370°, 360°) / 1°", "10")]
    [InlineData("0 + 4 mm - 3 mm - 1 mm", "0")]
    [InlineData("0° + 0 - 0", "0")]
    [InlineData("2 * 3 mm * 4 / 8 mm", "3")]
    [InlineData("-(2 - 5)", "3")]
    public void A_value_is_exact(string expression, string expected)
    {
        Layout layout = Layouts.Make($"let a = {expression}\nclaim a = {expected}");

        layout.Claims.ShouldHaveSingleItem().Holds.ShouldBe(true);
        layout.Claims[0].Verdict.ShouldBe(Verdict.Proved);
    }

    // J. Meeus, Astronomical Algorithms (2nd ed., 1998): the solstice of June 2024 by its ch. 27 is on the 20th; obliquity 23.44°, ch. 22. From memory.
    [Fact]
    public void The_sun_stands_highest_at_the_solstice()
    {
        Layout layout = Layouts.Make("""
            claim declination(6, 20, 2024) > 23°26'
            claim declination(6, 20, 2024) < 23°27'
            claim declination(12, 21) < -23°25'
            claim sun_correction(11, 3) > 4°
            claim sun_correction(2, 11) < -3°30'
            """);

        layout.Claims.ShouldAllBe(claim => claim.Holds == true);
    }

    [Theory]
    [InlineData("{7}", "7")]
    [InlineData("{7 1/2}", "7.5")]
    [InlineData("{22/7}", "3 1/7")]
    [InlineData("{30 mm}", "30 mm")]
    [InlineData("{43°18'}", "43.3°")]
    [InlineData("{sqrt(2):3}", "1.414")]
    [InlineData("{9:roman}", "IX")]
    [InlineData("{16:chapter}", "IIII")]
    [InlineData("{0:chapter}", "XII")]
    [InlineData("{-5:clock}", "7")]
    [InlineData("{4 1/2:clock}", "4:30")]
    [InlineData("{3:month}", "March")]
    [InlineData("{{{1}}", "{1}")]
    [InlineData("{name} of {name}", "Vale of Vale")]
    public void A_text_holds_values(string written, string expected)
    {
        Layout layout = Layouts.Make($"let name = \"Vale\"\nnote \"{written}\"");

        layout.Notes.ShouldBe([expected]);
    }

    // Names and scopes

    [Fact]
    public void A_loop_ends_at_its_end_if_a_step_meets_it_and_takes_several_ranges()
    {
        Layout layout = Layouts.Make("""
            for i = 1 to 2 step 1/2, 5, 7 to 8 step 2
              note "{i}"
            end
            for a = 0° to 90° step 40°
              note "{a}"
            end
            for d = 10 mm to 30 mm step 10 mm
              note "{d}"
            end
            for n = 3 to 1
              note "never"
            end
            """);

        layout.Notes.ShouldBe(["1", "1.5", "2", "5", "7", "0°", "40°", "80°", "10 mm", "20 mm", "30 mm"]);
    }

    [Fact]
    public void A_loops_variable_and_plain_names_last_one_pass_and_families_stay()
    {
        Layout layout = Layouts.Make("""
            prick O at (0, 0)
            for i = 1 to 3
              let reach = 10 mm * i
              prick P[i] at (reach, 0)
            end
            for i = 1 to 3
              let reach = 5 mm * i
              prick Q[i] at (0, reach)
            end
            rule l through P[3], Q[3]
            """);

        layout.Place("P[3]").ShouldStand(30, 0);
        layout.Place("Q[2]").ShouldStand(0, 10);
        Layouts.Finding("for i = 1 to 3\n  let a = i\nend\nlet b = a").Code.ShouldBe("RC2001");
        Layouts.Finding("for i = 1 to 3\n  let a = i\nend\nlet b = i").Code.ShouldBe("RC2001");
        Layouts.Finding("let i = 4\nfor i = 1 to 3\nend").Code.ShouldBe("RC2003");
        Layouts.Finding("let a = 4\nfor i = 1 to 3\n  let a = i\nend").Code.ShouldBe("RC2003");
    }

    [Fact]
    public void A_family_in_two_ways_is_a_family_of_families()
    {
        Layout layout = Layouts.Make("""
            for i = 1 to 2
              for j = 1 to 3
                prick P[i, j] at (10 mm * j, 10 mm * i)
              end
            end
            let row = P[2]
            rule across through row[1], row[3]
            rule upright through P[1, 2], P[2][2]
            keep P
            """.Replace("P[2][2]", "P[2, 2]", StringComparison.Ordinal));

        layout.Kept.Select(kept => kept.Name).ShouldBe(["P[1, 1]", "P[1, 2]", "P[1, 3]", "P[2, 1]", "P[2, 2]", "P[2, 3]"]);
        layout.Acts.OfType<Lay>().First().Says.ShouldContain("P[2, 1] and P[2, 3]");
    }

    [Fact]
    public void An_index_is_a_number_a_length_or_an_angle_of_one_kind_throughout()
    {
        Layout layout = Layouts.Make("""
            for a = 0° to 20° step 10°
              let sine[a] = sin(a)
            end
            for d = 5 mm to 15 mm step 5 mm
              let twice[d] = 2 * d
            end
            let hour[7 1/2] = 3
            claim hour[15/2] = 3
            claim sine[0] = 0
            claim sine[1/18 turn] = sin(20°)
            claim twice[1 cm] = 20 mm
            """);

        layout.Claims.ShouldAllBe(claim => claim.Holds == true);
        Layouts.Finding("let a[1] = 3\nlet b = a[1°]").Message.ShouldBe("`a` has no `[1°]`");
        Layouts.Finding("let a[1] = 3\nlet b = a[1 mm]").Hint.ShouldBe("its indices are like `1`");
    }

    [Fact]
    public void A_second_name_stands_for_the_same_thing()
    {
        Layout layout = Layouts.Make("""
            prick O at (0, 0)
            prick A at (30 mm, 0)
            prick P[0 to 3] dividing O to A
            let thirds = P
            let middle = O
            let start = P[0]
            claim start = middle
            rule l through thirds[1], A
            for i = 4 to 5
              let P2[i] = P[i - 2]
            end
            claim P2[4] = thirds[2]
            """);

        layout.Claims.ShouldAllBe(claim => claim.Holds == true && claim.Verdict == Verdict.Proved);
    }

    [Fact]
    public void What_the_branch_taken_binds_stays_bound()
    {
        Layout layout = Layouts.Make("""
            given n = 2
            prick O at (0, 0)
            when n = 1
              prick P at (10 mm, 0)
            otherwise when n = 2 and 1 < 2
              prick P at (20 mm, 0)
            otherwise
              prick P at (30 mm, 0)
            end
            rule l through O, P
            for h = -1 to 1
              when h = 0
                let turn[h] = 0°
              otherwise
                let turn[h] = 10° * h
              end
            end
            claim turn[0] = 0°
            claim turn[-1] = -10°
            """);

        layout.Place("P").ShouldStand(20, 0);
        layout.Claims.ShouldAllBe(claim => claim.Holds == true);
    }

    [Fact]
    public void A_name_that_only_another_branch_binds_is_unbound_and_the_message_says_where()
    {
        const string Families = """
            for h = 0 to 2
              when h > 0
                let a[h] = h
              end
            end
            let b = a[0]
            """;

        Layouts.Finding(Families).Message.ShouldBe("`a` is bound only in the branch at line 3, which was not taken");
        Layouts.Finding("when 1 > 2\n  let a = 1\nend\nfor i = 1\n  let b = a\nend").Message.ShouldBe("`a` is bound only in the branch at line 2, which was not taken");
        Layouts.Findings("let a = 1\nfor i = 1 to 2\n  when i = 3\n    let c = 2\n  end\n  let b = a\nend").ShouldBeEmpty();
    }

    // One fault, one finding

    [Fact]
    public void Names_that_a_failed_sentence_would_have_bound_raise_no_second_error()
    {
        const string Script = """
            prick O at (0, 0)
            rule l through O toward nowhere
            prick P on l, 20 mm ahead of O
            strike c about P opening 10 mm
            prick A, B where c meets l
            for i = 1 to 9
              rule m[i] through P turned 10° * i from l clockwise
            end
            prick Q[1 to 5] round O from A clockwise
            rule n through Q[3], B
            keep m
            follow "hours by two circles" as dial with centre = O, noon = l, latitude = 50°, radius = 30 mm
            keep dial.hour[2] inside c
            compare distance O to A with 30 mm
            claim A on l
            let width = distance A to B
            letter "{width}" at A height 3 mm
            when width > 3 mm
              let after = 1
            end
            let last = after
            """;

        Layouts.Finding(Script).Message.ShouldBe("nothing is called `nowhere`");
    }

    [Fact]
    public void A_sentence_that_cannot_be_read_raises_no_second_error_for_the_names_in_it()
    {
        Layouts.Finding("prick O at (0, 0)\nprick A at (10 mm; 0)\nrule l through O, A\nkeep l from O to A").Code.ShouldStartWith("RC1");
        Layouts.Finding("prick O at (0, 0)\nrule ray[1] throuh O toward up\nkeep ray[1] from O to O\nkeep ray").Code.ShouldStartWith("RC1");
    }

    [Fact]
    public void One_bad_sentence_does_not_hide_the_next()
    {
        Layouts.Findings("let a = b\nlet c = d\nlet e = a + c\nlet f = g").Select(finding => finding.Message)
            .ShouldBe(["nothing is called `b`", "nothing is called `d`", "nothing is called `g`"]);
    }

    [Fact]
    public void One_of_a_family_that_failed_is_not_told_of_again_and_the_others_stand()
    {
        const string Script = """
            prick O at (0, 0)
            for i = 1 to 4
              prick P[i] at (10 mm / (i - 2), 0)
              rule l[i] through O, P[i]
            end
            rule m through P[1], P[2]
            rule n through P[3], P[9]
            """;

        Layouts.Findings(Script).Select(finding => finding.Code).ShouldBe(["RC2013", "RC2018"]);
    }

    // Givens

    [Fact]
    public void A_given_may_be_set_by_the_caller_in_the_same_kind_and_range()
    {
        const string Script = "given latitude = 43°18' from 1° to 89°\ngiven R = 80 mm\ngiven n = 3\nnote \"{latitude}, {R}, {n}\"";

        Layouts.Make(Script).Notes.ShouldBe(["43.3°, 80 mm, 3"]);
        Layouts.Make(Script, Given("latitude", "52° 30'".Replace(" ", "", StringComparison.Ordinal))).Notes.ShouldBe(["52.5°, 80 mm, 3"]);
        Layouts.Make(Script, Given("R", "0")).Notes.ShouldBe(["43.3°, 0 mm, 3"]);
        Layout layout = Layouts.Make(Script, Given("R", "3 in"));
        layout.Givens.ShouldContain(new GivenValue("R", QuantityKind.Length, "3 in", true));
        layout.Givens.ShouldContain(new GivenValue("n", QuantityKind.Number, "3", false));
    }

    [Theory]
    [InlineData("latitude", "0°", "`latitude` is 0°, outside its range")]
    [InlineData("latitude", "90", "`latitude` is an angle, and `90` is a number")]
    [InlineData("latitude", "50 mm", "`latitude` is an angle, and `50 mm` is a length")]
    [InlineData("n", "3 mm", "`n` is a number, and `3 mm` is a length")]
    [InlineData("R", "(3", "`(3`, set for `R`, cannot be read")]
    [InlineData("latitud", "50°", "the script has no `given latitud`")]
    public void A_given_set_wrongly_is_refused(string name, string value, string message)
    {
        const string Script = "given latitude = 43°18' from 1° to 89°\ngiven R = 80 mm\ngiven n = 3\nlet twice = 2 * R";

        Diagnostic finding = Layouts.Finding(Script, Given(name, value));

        finding.Code.ShouldBe("RC2033");
        finding.Message.ShouldBe(message);
    }

    // Stages

    [Fact]
    public void A_stage_lasts_to_the_next_or_to_the_end_of_its_block_and_then_the_outer_goes_on()
    {
        Layout layout = Layouts.Make("""
            title "A plate"
            prick A at (0, 0)
            stage "One"
            prick B at (10 mm, 0)
            when 1 = 1
              prick C at (20 mm, 0)
              stage "Two"
              prick D at (30 mm, 0)
            end
            prick E at (40 mm, 0)
            stage "Three"
            prick F at (50 mm, 0)
            """);

        layout.Stages.Select(stage => $"{stage.Number} {stage.Title}").ShouldBe(["1 A plate", "2 One", "3 Two", "4 Three"]);
        layout.Acts.Select(act => act.Stage).ShouldBe([0, 1, 1, 2, 1, 3]);
    }

    [Fact]
    public void Passes_of_a_loop_that_open_the_same_text_share_its_plate()
    {
        Layout layout = Layouts.Make("""
            for i = 1 to 3
              stage "Marks"
              prick P[i] at (10 mm * i, 0)
            end
            for i = 1 to 3
              stage "Hour {i}"
              prick Q[i] at (10 mm * i, 10 mm)
            end
            stage "Marks"
            prick R at (0, 50 mm)
            """);

        layout.Stages.Select(stage => $"{stage.Number} {stage.Title}").ShouldBe(["1 Marks", "2 Hour 1", "3 Hour 2", "4 Hour 3", "5 Marks"]);
    }

    [Fact]
    public void A_recipes_stages_number_under_the_callers()
    {
        Layout layout = Layouts.Make("""
            recipe "inner"
              needs centre point
              stage "Deep"
              strike deep about centre opening 33 mm
            end
            recipe "outer"
              needs centre point
              strike before about centre opening 11 mm
              stage "First"
              strike first about centre opening 12 mm
              follow "inner" as nest with centre = centre
              stage "Second"
              strike second about centre opening 13 mm
            end
            stage "Mine"
            prick O at (0, 0)
            follow "outer" as rings with centre = O
            strike last about O opening 44 mm
            """);

        layout.Stages.Select(stage => $"{stage.Number} {stage.Title}").ShouldBe(["1 Mine", "1.1 First", "1.1.1 Deep", "1.2 Second"]);
        layout.Acts.OfType<Swing>().Select(act => $"{layout.Stages[act.Stage].Number} {act.Circle.Name}")
            .ShouldBe(["1 rings.before", "1.1 rings.first", "1.1.1 rings.nest.deep", "1.2 rings.second", "1 last"]);
    }

    internal static MakingOptions Given(string name, string value) => new(Givens: System.Collections.Immutable.ImmutableDictionary<string, string>.Empty.Add(name, value));
}
