using RuleAndCompass.Bench;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;

namespace RuleAndCompass.Tests.Making;

/// <summary>Which of two crossings a choice picks.</summary>
public sealed class ChoiceTests
{
    // The circle of radius 25 about the middle, met by a level line at height 15 running to the right, or by its double running to the left: (-20, 15) and (20, 15).
    private const string LineAndCircle = """
        prick O at (0, 0)
        prick A at (-30 mm, 15 mm)
        prick B at (30 mm, 15 mm)
        prick C at (5 mm, 15 mm)
        prick D at (5 mm, 40 mm)
        prick W at (-20 mm, 15 mm)
        rule l through A, B
        rule back through B, A
        rule upright through O toward up
        rule downright through D toward down
        strike c about O opening 25 mm
        strike d about B opening 15 mm
        strike near about A opening 15 mm

        """;

    [Theory]
    [InlineData("nearest B", 20)]
    [InlineData("nearest C", 20)]
    [InlineData("farthest from C", -20)]
    [InlineData("other than W", 20)]
    [InlineData("left of C", -20)]
    [InlineData("right of C", 20)]
    [InlineData("left along upright", -20)]
    [InlineData("right along upright", 20)]
    [InlineData("left along downright", 20)]
    [InlineData("right along downright", -20)]
    [InlineData("ahead of C", 20)]
    [InlineData("behind C", -20)]
    [InlineData("ahead of O", 20)]
    [InlineData("same side of upright as B", 20)]
    [InlineData("same side of downright as O", -20)]
    [InlineData("across upright from A", 20)]
    [InlineData("across downright from B", -20)]
    [InlineData("inside d", 20)]
    [InlineData("outside d", -20)]
    [InlineData("inside near", -20)]
    public void A_choice_picks_one_crossing_of_a_line_and_a_circle(string choice, double x)
    {
        foreach (string meeting in (string[])["l meets c", "c meets l"])
        {
            Layout layout = Layouts.Make($"{LineAndCircle}prick P where {meeting}, {choice}\nprick Q at (0, 0) from P\nrule m through P, D");

            Point(layout).ShouldStand(x, 15);
        }
    }

    [Theory]
    [InlineData("ahead of C", -20)]
    [InlineData("behind C", 20)]
    public void A_second_name_has_a_way_of_its_own(string choice, double x)
    {
        Layout layout = Layouts.Make($"{LineAndCircle}prick P where back meets c, {choice}\nrule m through P, D");

        Point(layout).ShouldStand(x, 15);
        layout.Acts.OfType<Lay>().Count(act => act.Line.Name is "l" or "back").ShouldBe(1);
    }

    [Theory]
    [InlineData("above O", 15)]
    [InlineData("below O", -15)]
    [InlineData("nearest A", 15)]
    [InlineData("farthest from A", -15)]
    [InlineData("left along level", 15)]
    [InlineData("right along level", -15)]
    [InlineData("same side of level as A", 15)]
    [InlineData("across level from A", -15)]
    [InlineData("inside high", 15)]
    [InlineData("outside high", -15)]
    [InlineData("other than low", 15)]
    public void A_choice_picks_one_crossing_of_two_circles(string choice, double y)
    {
        foreach (string meeting in (string[])["a meets b", "b meets a"])
        {
            Layout layout = Layouts.Make($"""
                prick O at (0, 0)
                prick A at (0, 40 mm)
                prick low at (0, -15 mm)
                prick K at (-20 mm, 0)
                prick L at (20 mm, 0)
                rule level through K, L
                strike high about A opening 40 mm
                strike a about K opening 25 mm
                strike b about L opening 25 mm
                prick P where {meeting}, {choice}
                rule m through P, L
                """);

            Point(layout).ShouldStand(0, y);
        }
    }

    [Fact]
    public void Two_at_once_come_in_order_along_the_line()
    {
        Layout layout = Layouts.Make($"{LineAndCircle}prick E, F where l meets c\nprick G, H where c meets back\nclaim E = H and F = G and E = W");

        layout.Claims.ShouldHaveSingleItem().Holds.ShouldBe(true);
        layout.Place("W").ShouldStand(-20, 15);
        layout.Place("F").ShouldStand(20, 15);
    }

    [Fact]
    public void Two_at_once_of_two_circles_begin_on_the_left()
    {
        Layout layout = Layouts.Make("""
            prick K at (-20 mm, 0)
            prick L at (20 mm, 0)
            strike a about K opening 25 mm
            strike b about L opening 25 mm
            prick E, F where a meets b
            prick G, H where b meets a
            claim E = H and F = G
            """);

        layout.Place("E").ShouldStand(0, 15);
        layout.Claims.ShouldHaveSingleItem().Holds.ShouldBe(true);
    }

    [Theory]
    [InlineData("nearest O", "neither")]
    [InlineData("other than O", "both")]
    [InlineData("above O", "both")]
    [InlineData("below O", "neither")]
    [InlineData("inside c", "neither")]
    [InlineData("same side of l as O", "neither")]
    [InlineData("left along l", "neither")]
    public void A_choice_that_does_not_part_the_two_is_an_error_that_shows_both(string choice, string picks)
    {
        Diagnostic finding = Layouts.Finding($"{LineAndCircle}prick P where l meets c, {choice}");

        finding.Code.ShouldBe("RC2009");
        finding.Message.ShouldContain(picks);
        finding.Hint.ShouldNotBeNull().ShouldContain("(-20, 15) mm and (20, 15) mm");
    }

    [Fact]
    public void A_choice_where_there_is_one_crossing_must_hold()
    {
        const string Touching = "prick O at (0, 0)\nstrike c about O opening 20 mm\nprick A on c toward up\nrule t touching c at A\n";

        Layouts.Findings(Touching + "prick P where t meets c, above O").ShouldBeEmpty();
        Layouts.Finding(Touching + "prick P where t meets c, below O").Code.ShouldBe("RC2010");
        Layouts.Finding(Touching + "prick P where t meets c, nearest Z").Code.ShouldBe("RC2001");
        Layouts.Finding(Touching + "prick P, Q where t meets c").Code.ShouldBe("RC2038");
    }

    [Fact]
    public void A_choice_is_decided_exactly_however_close_the_two_are()
    {
        // The line passes a millionth of a millionth of a millimetre below the top: the two crossings lie 1.3 µm apart.
        Layout layout = Layouts.Make("""
            prick O at (0, 0)
            strike c about O opening 20 mm
            prick A at (-30 mm, 19.999999999999 mm)
            prick B at (30 mm, 19.999999999999 mm)
            rule l through A, B
            prick P where l meets c, left of O
            prick Q where l meets c, right of O
            claim x of P < 0 and x of Q > 0
            """);

        layout.Claims.ShouldHaveSingleItem().Holds.ShouldBe(true);
        Layouts.Finding("prick O at (0, 0)\nstrike c about O opening 20 mm\nprick A at (-30 mm, 20.0000000000000000000001 mm)\nprick B at (30 mm, 20.0000000000000000000001 mm)\nrule l through A, B\nprick P where l meets c, left of O")
            .Code.ShouldBe("RC2005");
    }

    // P may be a second name of a point that stands, so it is found by the line laid from it.
    private static (double X, double Y) Point(Layout layout)
    {
        PointMark first = layout.Acts.OfType<Lay>().Last().First;
        return (first.Point.XMillimetres, first.Point.YMillimetres);
    }
}
