using RuleAndCompass.Making;
using RuleAndCompass.Tests.Making;

namespace RuleAndCompass.Tests.References;

/// <summary>
/// Circles of the sphere in plan: the ancient radii after O. Neugebauer, A History of Ancient Mathematical Astronomy (1975), pp. 857-868, the circles of
/// altitude and azimuth by the formulas of J. P. Snyder, Map Projections, USGS Professional Paper 1395 (1987).
/// </summary>
public sealed class StereographicTests
{
    // The meridian laid into the plan: a ray from the far pole through a place of the meridian meets the plan where that place is seen.
    private const string Plan = """
        prick O at (0, 0)
        rule  across through O toward right
        rule  upright through O toward up
        strike equator about O opening R
        prick E where across meets equator, ahead of O
        prick W where across meets equator, behind O
        prick N where upright meets equator, ahead of O
        prick S where upright meets equator, behind O
        """;

    [Fact]
    public void The_tropics_and_the_ecliptic_have_the_ancient_radii()
    {
        Layout layout = Layouts.Make($"""
            let R = 60 mm
            let obliquity = 23°51'20"
            {Plan}
            prick cancer on equator turned obliquity from E anticlockwise
            prick capricorn on equator turned obliquity from W clockwise
            prick south on equator turned obliquity from E clockwise
            rule  ray[1] through S, cancer
            rule  ray[2] through S, south
            rule  ray[3] through S, capricorn
            prick A where ray[1] meets across
            prick B where ray[2] meets across
            prick C where ray[3] meets across
            prick D opposite B about O
            prick M midway A to D
            compare distance O to A with R as "Cancer"
            compare distance O to B with R as "Capricorn"
            compare distance O to M with R as "ecliptic"
            """);

        Published.Figure("stereographic_projection", "ptol-can").Check(layout.Constructed("Cancer"));
        Published.Figure("stereographic_projection", "ptol-cap").Check(layout.Constructed("Capricorn"));
        Published.Figure("stereographic_projection", "ptol-ecc").Check(layout.Constructed("ecliptic"));
    }

    [Fact]
    public void A_place_lies_where_the_numerical_example_of_the_oblique_projection_puts_it()
    {
        // Snyder (1987), appendix A: sphere of radius 1, centre 40° north and 100° west, the place 30° north and 75° west. The horizon has twice the radius.
        Layout layout = Layouts.Make($"""
            let R = 100 mm
            {Plan}
            prick a[1] on equator turned 50° from E anticlockwise
            prick a[2] on equator turned 110° from E anticlockwise
            prick a[3] on equator turned 10° from E clockwise
            prick a[4] opposite a[1] about O
            for i = 1 to 4
              rule ray[i] through W, a[i]
              prick seen[i] where ray[i] meets upright
            end
            prick middle midway seen[2] to seen[3]
            strike parallel about middle through seen[2]
            rule  centres halving seen[1] to seen[4]
            rule  normal through seen[1] turned 115° from upright anticlockwise
            prick K where normal meets centres
            strike meridian about K through seen[1]
            prick place where meridian meets parallel, right along upright
            compare 2 * x of place / R with 0 as "x"
            compare 2 * y of place / R with 0 as "y"
            compare 1 + distance O to place * distance O to place / (R * R) with 1 as "k"
            """);

        Published.Figure("stereographic_projection", "snyder-ster").Check(layout.Constructed("x"), layout.Constructed("y"), layout.Constructed("k"));
    }

    [Theory]
    [InlineData("almucantar-52-0")]
    [InlineData("almucantar-52-30")]
    [InlineData("almucantar-40-0")]
    public void A_circle_of_equal_altitude_has_the_centre_and_radius_of_the_formula(string id)
    {
        PublishedFigure figure = Published.Figure("stereographic_projection", id);

        Layout layout = Layouts.Make($"""
            let R = 50 mm
            let latitude = {figure.Input("latitude_deg")}°
            let altitude = {figure.Input("altitude_deg")}°
            {Plan}
            prick near on equator turned altitude - latitude from E anticlockwise
            prick far on equator turned 180° - latitude - altitude from E anticlockwise
            rule  ray[1] through W, near
            rule  ray[2] through W, far
            prick A where ray[1] meets upright
            prick B where ray[2] meets upright
            prick C midway A to B
            strike almucantar about C through A
            compare distance O to C / R with 1 as "centre"
            compare radius of almucantar / R with 1 as "radius"
            """);

        figure.Check(layout.Constructed("centre"), layout.Constructed("radius"));
    }

    [Theory]
    [InlineData("azimuth-52-0")]
    [InlineData("azimuth-52-60")]
    public void A_circle_of_azimuth_passes_through_zenith_and_nadir(string id)
    {
        PublishedFigure figure = Published.Figure("stereographic_projection", id);

        Layout layout = Layouts.Make($"""
            let R = 50 mm
            {Plan}
            prick high on equator turned 90° - {figure.Input("latitude_deg")}° from E anticlockwise
            prick low opposite high about O
            rule  ray[1] through W, high
            rule  ray[2] through W, low
            prick zenith where ray[1] meets upright
            prick nadir where ray[2] meets upright
            rule  centres halving zenith to nadir
            rule  normal through zenith turned {figure.Input("azimuth_from_prime_vertical_deg")}° from upright anticlockwise
            prick K where normal meets centres
            strike azimuth about K through zenith
            compare distance K to upright / R with 0 as "offset"
            compare distance K to across / R with 1 as "depth"
            compare radius of azimuth / R with 1 as "radius"
            """);

        figure.Check(layout.Constructed("offset"), layout.Constructed("depth"), layout.Constructed("radius"));
    }
}
