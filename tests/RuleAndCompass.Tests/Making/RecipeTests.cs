using RuleAndCompass.Bench;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;

namespace RuleAndCompass.Tests.Making;

public sealed class RecipeTests
{
    private const string Cross = """
        recipe "a cross"
          needs centre point, base line, reach length = 20 mm, arms numbers, name text = "cross"
          gives first, ends as "the ends of a cross"
          rule first through centre square to base
          for i = 1 to 2
            prick ends[i] on first, reach * arms[i] ahead of centre
          end
          strike inside about centre opening reach
          note "of {name}"
        end

        """;

    [Fact]
    public void What_a_recipe_binds_stays_inside_apart_from_what_it_gives()
    {
        const string Use = Cross + """
            prick O at (0, 0)
            rule base through O toward right
            let arms[1] = 1
            let arms[2] = 2
            follow "a cross" as mark with centre = O, base = base, arms = arms
            rule l through mark.ends[2], O
            """;

        Layout layout = Layouts.Make(Use);

        layout.Place("mark.ends[2]").ShouldStand(0, 40);
        layout.Notes.ShouldBeEmpty();
        Layouts.Finding(Use + "\nkeep mark.inside").Message.ShouldBe("recipe \"a cross\" gives nothing called `inside`");
        Layouts.Finding(Use + "\nkeep inside").Code.ShouldBe("RC2001");
    }

    [Fact]
    public void A_recipe_sees_nothing_of_its_caller_but_its_needs()
    {
        const string Script = """
            recipe "nosy"
              needs centre point
              strike c about centre opening depth
            end
            let depth = 20 mm
            prick O at (0, 0)
            follow "nosy" as n with centre = O
            """;

        Layouts.Finding(Script).Message.ShouldBe("in the recipe \"nosy\": nothing is called `depth`");
        new DiagnosticRenderer("s", Script).Render(Layouts.Finding(Script)).ShouldContain("follow \"nosy\"");
    }

    [Fact]
    public void A_need_may_be_left_out_where_it_has_a_value_and_that_may_be_made_of_earlier_needs()
    {
        const string Recipe = """
            recipe "ring"
              needs centre point, R length, r length = R / 2, turns number = 1, start angle = 0
              strike outer about centre opening R
              strike inner about centre opening r
              claim start = 0°
            end
            prick O at (0, 0)
            follow "ring" as a with centre = O, R = 30 mm
            follow "ring" as b with centre = O, R = 32 mm, r = 5 mm
            """;

        Layout layout = Layouts.Make(Recipe);

        layout.Acts.OfType<Swing>().Select(act => act.Circle.Circle.Radius.ToDouble()).ShouldBe([30, 15, 32, 5]);
    }

    [Theory]
    [InlineData("point", "O")]
    [InlineData("line", "l")]
    [InlineData("circle", "c")]
    [InlineData("number", "3")]
    [InlineData("length", "3 mm")]
    [InlineData("angle", "3°")]
    [InlineData("text", "\"three\"")]
    [InlineData("points", "P")]
    public void A_need_takes_its_own_kind_only(string kind, string value)
    {
        (string Kind, string Value)[] all = [("point", "O"), ("line", "l"), ("circle", "c"), ("number", "3"), ("length", "3 mm"), ("angle", "3°"), ("text", "\"three\""), ("points", "P")];
        foreach ((string otherKind, string otherValue) in all)
        {
            string script = $"""
                recipe "taker"
                  needs what {kind}
                end
                prick O at (0, 0)
                rule l through O toward up
                strike c about O opening 20 mm
                prick P[1 to 3] stepping 5 mm along l from O toward up
                follow "taker" as t with what = {otherValue}
                """;

            if (otherKind == kind)
                Layouts.Findings(script).ShouldBeEmpty();
            else
                Layouts.Finding(script).Code.ShouldBe("RC2021");
        }

        value.ShouldNotBeEmpty();
    }

    [Fact]
    public void Nothing_is_a_length_an_angle_and_a_number()
    {
        foreach (string kind in (string[])["number", "length", "angle"])
            Layouts.Findings($"recipe \"taker\"\n  needs what {kind}\nend\nfollow \"taker\" as t with what = 0").ShouldBeEmpty();
    }

    [Fact]
    public void A_recipes_own_value_of_the_wrong_kind_is_a_fault_of_the_recipe()
    {
        Layouts.Finding("recipe \"r\"\n  needs R length = 3\nend\nfollow \"r\" as a").Code.ShouldBeOneOf("RC2021", "RC1022");
        Layouts.Finding("recipe \"r\"\n  needs n number = 3, R length = 2 * n\nend\nfollow \"r\" as a").Code.ShouldBe("RC2021");
    }

    [Fact]
    public void A_refusal_ends_the_recipe_and_is_the_only_error()
    {
        const string Script = """
            recipe "careful"
              needs R length
              gives c
              prick O at (0, 0)
              for i = 1 to 3
                when R < 10 mm
                  refuse "a ring of {R} is too small"
                end
              end
              strike c about O opening 1 mm / (R - R)
            end
            follow "careful" as ring with R = 9 mm
            keep ring.c
            """;

        Diagnostic finding = Layouts.Finding(Script);

        finding.Message.ShouldBe("a ring of 9 mm is too small");
        finding.Code.ShouldBe("RC2023");
    }

    [Fact]
    public void A_recipe_may_follow_another_and_none_follows_itself()
    {
        Layouts.Findings("recipe \"a\"\n  follow \"b\" as x\nend\nrecipe \"b\"\n  prick O at (0, 0)\nend\nfollow \"a\" as y\nfollow \"b\" as z").ShouldBeEmpty();
        Layouts.Finding("recipe \"a\"\n  follow \"a\" as x\nend\nfollow \"a\" as y").Code.ShouldBe("RC2022");
    }

    [Fact]
    public void Use_takes_a_scripts_recipes_and_nothing_else()
    {
        Dictionary<string, string> files = new()
        {
            ["rings.setout"] = "let depth = 3 mm\nrecipe \"ring\"\n  needs centre point\n  strike c about centre opening 20 mm\nend\nprick X at (5 mm, 5 mm)\n",
            ["bad.setout"] = "recipe \"broken\"\n  needs centre pont\nend\n",
        };
        MakingOptions options = new(ReadScript: name => files.GetValueOrDefault(name));

        Layouts.Make("use \"rings.setout\"\nprick O at (0, 0)\nfollow \"ring\" as r with centre = O", options).Acts.Length.ShouldBe(3);
        Layouts.Finding("use \"rings.setout\"\nlet a = depth", options).Code.ShouldBe("RC2001");
        Layouts.Finding("use \"none.setout\"\nprick O at (0, 0)\nfollow \"ring\" as r with centre = O\nkeep r.c", options).Code.ShouldBe("RC2034");
        Diagnostic finding = Layouts.Finding("use \"bad.setout\"\nprick O at (0, 0)\nfollow \"broken\" as r with centre = O", options);
        finding.File.ShouldBe("bad.setout");
    }

    [Fact]
    public void A_script_s_own_recipe_comes_before_the_book_s()
    {
        Layout layout = Layouts.Make("""
            recipe "scale of chords"
              needs start point
              strike own about start opening 7 mm
            end
            prick O at (0, 0)
            follow "scale of chords" as s with start = O
            """);

        layout.Mark("s.own").ShouldBeOfType<CircleMark>();
    }

    [Theory]
    [InlineData("0°")]
    [InlineData("90°")]
    [InlineData("-90°")]
    [InlineData("95°")]
    public void Each_dial_refuses_a_latitude_at_which_it_breaks_down(string latitude)
    {
        foreach (string recipe in References.HorizontalDialTests.Recipes)
        {
            Diagnostic finding = Layouts.Finding($"""
                prick O at (0, 0)
                rule noon through O toward up
                follow "{recipe}" as dial with centre = O, noon = noon, latitude = {latitude}, radius = 60 mm
                keep dial.hour
                """);

            finding.Code.ShouldBe("RC2023");
        }
    }

    [Fact]
    public void Each_recipe_of_the_book_reads_well_and_says_where_it_stands()
    {
        foreach (string name in RecipeBook.Names)
        {
            Recipe recipe = RecipeBook.Find(name).ShouldNotBeNull(name);
            RecipeBook.ClosedUp(recipe.Title).ShouldBe(name);
            recipe.Trade.ShouldNotBeNull(name);
            recipe.Says.ShouldNotBeNull(name);
            recipe.Source.ShouldNotBeNull(name);
            recipe.Gives.ShouldNotBeEmpty(name);
        }
    }
}
