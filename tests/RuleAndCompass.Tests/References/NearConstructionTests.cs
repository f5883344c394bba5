using RuleAndCompass.Making;
using RuleAndCompass.Tests.Making;

namespace RuleAndCompass.Tests.References;

/// <summary>Constructions that come near: the script's error beside the published one.</summary>
public sealed class NearConstructionTests
{
    private const string Topic = "approximate_constructions";

    private const string Ring = """
        let R = 80 mm
        prick O at (0, 0)
        strike ring about O opening R
        rule  across through O toward right
        rule  upright through O toward up
        prick A where across meets ring, ahead of O
        prick Z where across meets ring, behind O
        """;

    // Error quoted in drawing manuals to 0.1 %, from memory; angles computed.
    [Fact]
    public void Half_the_side_of_the_triangle_steps_seven_times_round()
    {
        Layout layout = Layouts.Make($"""
            {Ring}
            strike sixth about A through O
            prick B, C where ring meets sixth
            prick M midway B to C
            prick P[0 to 7] stepping M to B round ring from A anticlockwise
            compare distance P[0] to P[1] with 2 * R * sin(180° / 7) as "side"
            compare angle P[0] O P[1] with 360° / 7 as "step"
            compare angle P[7] O A with 0° as "gap"
            """);

        Comparison side = layout.Comparison("side");
        Published.Figure(Topic, "heptagon-halfside-pct").Check(side.Difference.ToDouble() / side.Computed.ToDouble() * 100);
        Published.Figure(Topic, "heptagon-halfside-angle").Check(layout.Constructed("step"), layout.Constructed("gap"));
    }

    // R. A. Simon, "Approximate construction of regular polygons: two Renaissance artists", MAA Convergence.
    [Fact]
    public void The_pentagon_of_one_opening_has_the_angles_that_are_published()
    {
        Layout layout = Layouts.Make("""
            prick A at (-20 mm, 0)
            prick B at (20 mm, 0)
            strike a about A through B
            strike b about B through A
            prick C, D where a meets b
            strike d about D through A
            rule  axis through D, C
            prick E where a meets d, other than B
            prick F where b meets d, other than A
            prick G where axis meets d, ahead of D
            rule  rising through E, G
            rule  falling through F, G
            prick H where rising meets b, ahead of G
            prick I where falling meets a, ahead of G
            strike h about H through B
            strike i about I through A
            prick K where h meets i, farthest from G
            compare angle A B H with 108° as "base"
            compare angle B H K with 108° as "shoulder"
            compare angle H K I with 108° as "top"
            claim distance A to B = distance H to K
            """);

        Published.Figure(Topic, "durer-pentagon-base").Check(layout.Constructed("base"));
        Published.Figure(Topic, "durer-pentagon-rest").Check(layout.Constructed("shoulder"), layout.Constructed("top"));
    }

    // After U. Dudley, Mathematical Cranks (1992).
    [Fact]
    public void The_nonagon_of_three_petals_has_the_central_angle_that_is_published()
    {
        Layout layout = Layouts.Make($"""
            {Ring}
            prick B where upright meets ring, ahead of O
            strike sixth about B through O
            prick I, J where ring meets sixth
            strike petal[1] about I through O
            strike petal[2] about J through O
            prick third[0 to 3] dividing O to B
            rule  bar through third[1] square to upright
            prick E where bar meets petal[1], right along upright
            prick F where bar meets petal[2], left along upright
            compare angle E O F with 40° as "angle"
            """);

        Published.Figure(Topic, "durer-nonagon-angle").Check(layout.Constructed("angle"));
    }

    // J. D. Cook, "How Albrecht Dürer drew an 11-sided figure".
    [Fact]
    public void Nine_sixteenths_of_the_radius_nearly_step_eleven_times()
    {
        Layout layout = Layouts.Make($"""
            {Ring}
            prick part[0 to 16] dividing O to A
            prick P[0 to 1] stepping O to part[9] round ring from A anticlockwise
            compare angle A O P[1] with 360° / 11 as "angle"
            """);

        Published.Figure(Topic, "durer-11gon").Check(layout.Constructed("angle"));
    }

    // P. J. Freitas and H. Tavares, "Dividing the circle", College Mathematics Journal 49 (2018), 187-194.
    [Theory]
    [InlineData(5)]
    [InlineData(7)]
    [InlineData(9)]
    [InlineData(11)]
    [InlineData(13)]
    public void The_rule_of_the_second_division_gives_the_central_angles_that_are_published(int sides) =>
        Published.Figure(Topic, $"bion-{sides}").Check(SecondDivision(sides).Constructed("angle"));

    // A web article on the rule, author not given: 3.3 % for nineteen sides.
    [Fact]
    public void The_rule_of_the_second_division_is_out_by_three_parts_in_a_hundred_for_nineteen_sides()
    {
        Comparison angle = SecondDivision(19).Comparison("angle");

        Published.Figure(Topic, "bion-19-pct").Check(angle.Difference.ToDouble() / angle.Computed.ToDouble() * 100);
    }

    // Freitas and Tavares (2018), from memory.
    [Fact]
    public void The_rule_of_the_second_division_is_exact_for_three_four_and_six_sides()
    {
        PublishedFigure exact = Published.Figure(Topic, "bion-exact");

        exact.Check([.. Enumerable.Range(3, 7).Where(sides => SecondDivision(sides).Comparison("angle").Decision.IsZero).Select(sides => (double)sides)]);
        exact.Values.Count.ShouldBe(3);
    }

    // Freitas and Tavares (2018).
    [Theory]
    [InlineData(7)]
    [InlineData(9)]
    [InlineData(12)]
    [InlineData(17)]
    public void The_rule_of_two_parts_from_the_centre_gives_the_central_angles_that_are_published(int sides)
    {
        Layout layout = Layouts.Make($"""
            {Ring}
            {Triangle}
            prick B where upright meets ring, ahead of O
            prick part on across, 2 * (2 * R) / {sides} ahead of O
            rule  ray through top, part
            prick V where ray meets ring, farthest from top
            compare angle B O V with 360° / {sides} as "angle"
            """);

        Published.Figure(Topic, $"tempier-{sides}").Check(layout.Constructed("angle"));
        layout.Comparison("angle").Decision.IsZero.ShouldBe(sides == 12);
    }

    // T. Iwamoto, "Trisecting an angle: approximation": 9'02" too little for 60°.
    [Fact]
    public void A_third_of_the_tangent_is_nearly_a_third_of_the_angle()
    {
        Layout layout = Layouts.Make($"""
            {Ring}
            prick D on across, 2 * R behind O
            rule  edge through A square to across
            prick B on ring turned 60° from A anticlockwise
            rule  far through D, B
            prick T where far meets edge
            prick third[0 to 3] dividing A to T
            rule  near through D, third[1]
            prick P where near meets ring, ahead of O
            compare angle A O P with 20° as "third"
            """);

        Published.Figure(Topic, "cusa-snell-60").Check(layout.Comparison("third").Difference.ToDouble() * 60);
    }

    // E. W. Hobson, Squaring the Circle (1913), from memory.
    [Fact]
    public void Half_the_circumference_is_nearly_laid_straight()
    {
        Layout layout = Layouts.Make("""
            let R = 30 mm
            prick O at (0, 0)
            strike ring about O opening R
            rule  upright through O toward up
            prick B where upright meets ring, ahead of O
            prick A where upright meets ring, behind O
            rule  ground through A square to upright
            rule  ray through O turned 30° from upright anticlockwise
            prick C where ray meets ground
            prick D[0 to 3] stepping O to A along ground from C toward A
            compare distance B to D[3] / R with pi as "half the circumference"
            """);

        Published.Figure(Topic, "kochanski").Check(layout.Constructed("half the circumference"));
        layout.Comparison("half the circumference").Decision.Sign.ShouldBe(-1);
    }

    // S. Ramanujan, "Squaring the circle", Journal of the Indian Mathematical Society 5 (1913), p. 132.
    [Fact]
    public void The_side_of_the_square_is_too_long_by_about_an_inch_for_a_country()
    {
        Layout layout = Layouts.Make($"""
            {Ring}
            prick H midway O to Z
            prick third[0 to 3] dividing O to A
            rule  rise through third[2] square to across
            prick Q where rise meets ring, above O
            strike s about A opening third[2] to Q
            prick S where s meets ring, above O
            rule  chord through Z, S
            rule  last through A, S
            rule  from_O through O parallel to last
            rule  from_T through third[2] parallel to last
            prick M where from_O meets chord
            prick N where from_T meets chord
            strike k about Z through M
            prick K where k meets ring, below O
            rule  edge through Z square to across
            strike l about Z opening M to N
            prick L where edge meets l, below O
            rule  AL through A, L
            rule  AK through A, K
            rule  KL through K, L
            strike c about A through H
            prick C where AK meets c, ahead of A
            rule  close through C parallel to KL
            prick D where close meets AL
            compare 12 * 5280 * sqrt(140000 / pi) * distance A to D / R with 12 * 5280 * sqrt(140000) as "side in inches"
            claim distance A to D = R * sqrt(355/113)
            """);

        Published.Figure(Topic, "ramanujan-355-113").Check(layout.Comparison("side in inches").Difference.ToDouble());
    }

    // E. W. Hobson, Squaring the Circle (1913), from memory.
    [Fact]
    public void Six_fifths_of_the_golden_square_are_nearly_the_circle()
    {
        Layout layout = Layouts.Make("""
            prick A at (-40 mm, 0)
            prick B at (0, 0)
            rule  base through A, B
            rule  rise through B square to base
            prick C on rise, 20 mm ahead of B
            strike half about C through B
            rule  slant through A, C
            prick D where slant meets half, ahead of C
            compare 6/5 * (distance A to D / 40 mm) * (distance A to D / 40 mm) with pi as "the circle"
            """);

        Published.Figure(Topic, "pi-6-5-phi2").Check(layout.Constructed("the circle"));
    }

    // Computed from the construction that drawing manuals describe.
    [Fact]
    public void The_oval_in_a_rhombus_has_the_half_axes_that_follow_from_its_four_centres()
    {
        Layout layout = Layouts.Make("""
            prick O at (0, 0)
            rule  long through O toward right
            rule  short through O square to long
            prick B on short, 40 mm ahead of O
            prick D on short, 40 mm behind O
            strike side[1] about B opening 80 mm
            prick a, c where long meets side[1]
            prick M midway B to c
            rule  toM through D, M
            prick F where toM meets long
            strike lesser about F through M
            strike greater about D through M
            prick X where long meets lesser, ahead of F
            prick Y where short meets greater, ahead of O
            compare distance O to X / distance B to c with 1 as "long"
            compare distance O to Y / distance B to c with 1 as "short"
            """);

        Published.Figure(Topic, "isometric-oval").Check(layout.Constructed("long"), layout.Constructed("short"));
    }

    // The triangle of equal sides on the diameter, below it.
    private const string Triangle = """
        strike base[1] about A through Z
        strike base[2] about Z through A
        prick top where base[1] meets base[2], below O
        """;

    private static Layout SecondDivision(int sides) => Layouts.Make($"""
        {Ring}
        {Triangle}
        prick part[0 to {sides}] dividing A to Z
        rule  ray through top, part[2]
        prick V where ray meets ring, farthest from top
        compare angle A O V with 360° / {sides} as "angle"
        """);
}
