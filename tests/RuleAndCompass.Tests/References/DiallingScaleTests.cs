using RuleAndCompass.Making;
using RuleAndCompass.Tests.Making;

namespace RuleAndCompass.Tests.References;

/// <summary>
/// The scales of hours and of latitudes, in thousandths of the quadrant's radius, as printed in the Encyclopaedia Britannica, 7th edition, vol. 7 (1842),
/// "Dialling", arts. 30-35. A radius of 100 mm makes a part a tenth of a millimetre.
/// </summary>
public sealed class DiallingScaleTests
{
    public static TheoryData<string> Hours => [.. Published.Ids("dialling_scales", "scale-hours-")];

    public static TheoryData<string> Latitudes => [.. Published.Ids("dialling_scales", "scale-lat-")];

    [Theory]
    [MemberData(nameof(Hours))]
    public void The_scale_of_hours_is_cut_by_rays_at_even_turns(string id)
    {
        PublishedFigure figure = Published.Figure("dialling_scales", id);

        Layout layout = Layouts.Make($"""
            prick O at (0, -50 mm)
            rule  middle through O toward up
            rule  edge[1] through O turned 45° from middle anticlockwise
            rule  edge[2] through O turned 45° from middle clockwise
            strike arc about O opening 100 mm
            prick twelve where edge[1] meets arc, ahead of O
            prick six where edge[2] meets arc, ahead of O
            rule  scale through twelve, six
            rule  ray through O turned {figure.Input("minutes_from_noon")} / 60 * 15° from edge[1] clockwise
            prick T where ray meets scale
            compare distance twelve to T with 1 mm as "parts"
            """);

        figure.Check(layout.Constructed("parts") * 10);
    }

    [Theory]
    [MemberData(nameof(Latitudes))]
    public void The_scale_of_latitudes_is_a_chord_at_the_slope_of_the_sine(string id)
    {
        PublishedFigure figure = Published.Figure("dialling_scales", id);

        Layout layout = Layouts.Make($"""
            prick A at (-40 mm, -60 mm)
            rule  base through A toward right
            strike quadrant about A opening 100 mm
            prick B where base meets quadrant, ahead of A
            prick P on quadrant turned {figure.Input("latitude_deg")}° from B anticlockwise
            prick F at foot of P on base
            rule  rise through B square to base
            strike sine about B opening P to F
            prick Q where rise meets sine, ahead of B
            rule  slope through A, Q
            rule  upright through A square to base
            prick M where upright meets quadrant, ahead of A
            rule  diagonal through B, M
            strike square about A opening B to M
            prick D where upright meets square, ahead of A
            prick K midway A to D
            strike circle about K through A
            prick E where slope meets circle, other than A
            compare distance A to E with 1 mm as "parts"
            """);

        figure.Check(layout.Constructed("parts") * 10);
    }

    [Fact]
    public void The_chord_of_sixty_degrees_is_the_radius()
    {
        Layout layout = Layouts.Make("""
            prick A at (-80 mm, 0)
            rule base through A toward right
            follow "scale of chords" as scale with start = A, base = base, radius = 100 mm, step = 15°
            compare distance A to scale.C[60°] / 100 mm with 1 as "chord of 60°, in radii"
            """);

        Published.Figure("dialling_scales", "scale-chords-60").Check(layout.Constructed("chord of 60°, in radii"));
        layout.Comparison("chord of 60°, in radii").Decision.IsZero.ShouldBeTrue();
    }
}
