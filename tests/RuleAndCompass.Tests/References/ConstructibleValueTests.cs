using RuleAndCompass.Making;
using RuleAndCompass.Numbers;
using RuleAndCompass.Tests.Making;

namespace RuleAndCompass.Tests.References;

/// <summary>What straightedge and dividers reach exactly, beside published closed forms.</summary>
public sealed class ConstructibleValueTests
{
    // Exact sines of multiples of 3°; the closed forms are quoted from memory of G. J. Toomer (1984), table of chords.
    [Theory]
    [InlineData("sin3", 3, "(2 * (1 - sqrt(3)) * sqrt(5 + sqrt(5)) + (sqrt(10) - sqrt(2)) * (sqrt(3) + 1)) / 16")]
    [InlineData("sin9", 9, "(sqrt(10) + sqrt(2) - 2 * sqrt(5 - sqrt(5))) / 8")]
    [InlineData("sin12", 12, "(sqrt(10 + 2 * sqrt(5)) - sqrt(15) + sqrt(3)) / 8")]
    [InlineData("sin15", 15, "(sqrt(6) - sqrt(2)) / 4")]
    [InlineData("sin18", 18, "(sqrt(5) - 1) / 4")]
    [InlineData("sin36", 36, "sqrt(10 - 2 * sqrt(5)) / 4")]
    public void A_sine_is_proved_equal_to_its_closed_form(string id, int degrees, string closedForm)
    {
        Layout layout = Layouts.Make($"""
            prick O at (0, 0)
            strike ring about O opening 80 mm
            rule  base through O toward right
            prick A where base meets ring, ahead of O
            prick P on ring turned {degrees}° from A anticlockwise
            prick F at foot of P on base
            compare distance P to F / 80 mm with {closedForm} as "sine"
            """);

        Published.Figure("constructible_values", id).Check(layout.Constructed("sine"));
        layout.Comparison("sine").Decision.ShouldBe(new Decision(0, Verdict.Proved));
    }

    // The same, quoted from memory.
    [Fact]
    public void The_tangent_of_a_sixteenth_of_a_turn_is_the_root_of_two_less_one()
    {
        Layout layout = Layouts.Make("""
            prick O at (0, 0)
            rule  base through O toward right
            prick A on base, 80 mm ahead of O
            rule  rise through A square to base
            rule  ray through O turned 22 1/2° from base anticlockwise
            prick P where ray meets rise
            compare distance A to P / 80 mm with sqrt(2) - 1 as "tangent"
            """);

        Published.Figure("constructible_values", "tan22_5").Check(layout.Constructed("tangent"));
        layout.Comparison("tangent").Decision.ShouldBe(new Decision(0, Verdict.Proved));
    }

    // T. L. Heath, A History of Greek Mathematics, vol. 2 (1921), p. 277: half the radius swung down gives the sides of the decagon and the pentagon.
    [Fact]
    public void Half_the_radius_swung_down_gives_decagon_and_pentagon()
    {
        Layout layout = Layouts.Make("""
            prick O at (0, 0)
            strike ring about O opening 80 mm
            rule  across through O toward right
            rule  upright through O square to across
            prick A where across meets ring, ahead of O
            prick B where upright meets ring, ahead of O
            prick M midway O to A
            strike swung about M through B
            prick N where across meets swung, behind O
            compare distance O to N / 160 mm with (sqrt(5) - 1) / 4 as "cosine of 72°"
            compare distance B to N / 80 mm with sqrt(10 - 2 * sqrt(5)) / 2 as "side of the pentagon"
            """);

        Published.Figure("constructible_values", "cos72").Check(layout.Constructed("cosine of 72°"));
        layout.Comparison("cosine of 72°").Decision.ShouldBe(new Decision(0, Verdict.Proved));
        layout.Comparison("side of the pentagon").Decision.ShouldBe(new Decision(0, Verdict.Proved));
    }

    // C. F. Gauss, Disquisitiones Arithmeticae (1801), art. 365; the construction is H. W. Richmond's (1893), from memory.
    [Fact]
    public void Seventeen_sides_agree_with_the_radicals()
    {
        Layout layout = Layouts.Make("""
            prick O at (0, 0)
            strike ring about O opening 80 mm
            rule  across through O toward right
            rule  upright through O toward up
            prick A where across meets ring, ahead of O
            prick B where upright meets ring, ahead of O
            prick q[0 to 4] dividing O to B
            rule  half[1] halving angle O q[1] A
            prick H where half[1] meets across
            rule  half[2] halving angle O q[1] H
            prick E where half[2] meets across
            rule  eighth through q[1] turned 45° from half[2] clockwise
            prick F where eighth meets across
            prick M midway F to A
            strike round about M through A
            prick K where round meets upright, above O
            strike last about E through K
            prick N where across meets last, ahead of E
            prick N5 where across meets last, behind E
            rule  rise[3] through N square to across
            rule  rise[5] through N5 square to across
            prick P[3] where rise[3] meets ring, above O
            prick P[5] where rise[5] meets ring, above O
            rule  middle halving angle P[3] O P[5]
            rule  spoke through O, P[3]
            prick P[4] where middle meets ring, ahead of O
            prick foot at foot of P[4] on spoke
            compare distance O to foot / 80 mm with (-1 + sqrt(17) + sqrt(34 - 2 * sqrt(17)) + 2 * sqrt(17 + 3 * sqrt(17) - sqrt(34 - 2 * sqrt(17)) - 2 * sqrt(34 + 2 * sqrt(17)))) / 16 as "cosine"
            """);

        Published.Figure("constructible_values", "cos17").Check(layout.Constructed("cosine"));
        layout.Comparison("cosine").Decision.IsZero.ShouldBeTrue();
    }
}
