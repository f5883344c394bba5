using RuleAndCompass.Making;
using RuleAndCompass.Tests.Making;

namespace RuleAndCompass.Tests.References;

/// <summary>Hour lines as printed in tables, beside those that each recipe constructs.</summary>
public sealed class HorizontalDialTests
{
    internal static readonly string[] Recipes = ["hours by the sine circle", "hours by two circles", "hours by scales", "hours by the projected sphere"];

    // Encyclopaedia Britannica, 7th edition, vol. 7 (1842), "Dialling", table of art. 24; latitudes 50° to 59°.
    public static TheoryData<string, string> TableOf1842 => Each(Published.Ids("horizontal_dials", "hor-eb1842"));

    // Encyclopaedia Britannica, 9th edition, vol. 7 (1878), "Dialling", p. 156.
    public static TheoryData<string, string> ExamplesOf1878 => Each(Published.Ids("horizontal_dials", "hor-eb1878"));

    // The Boy Mechanic, vol. 1 (1913), "How to Lay Out a Sundial", table 2.
    public static TheoryData<string, string> ChordsOf1913 => Each(Published.Ids("horizontal_dials", "hor-bm1913"));

    // Encyclopaedia Britannica, 7th edition, vol. 7 (1842), "Dialling", art. 15: a south dial is a horizontal dial for the complement of the latitude.
    public static TheoryData<string, string> SouthDials => Each(Published.Ids("vertical_south_dials", "vsouth"));

    [Theory]
    [MemberData(nameof(TableOf1842))]
    public void Hours_agree_with_the_table_of_1842(string id, string recipe)
    {
        PublishedFigure figure = Published.Figure("horizontal_dials", id);

        Layout dial = Dial(recipe, $"{figure.Input("latitude_deg")}°");

        figure.Check([.. Enumerable.Range(1, 5).Select(hour => dial.Constructed($"{hour} o'clock"))]);
        figure.Check([.. Enumerable.Range(1, 5).Select(hour => -dial.Constructed($"{12 - hour} o'clock"))]);
    }

    [Theory]
    [MemberData(nameof(ExamplesOf1878))]
    public void One_o_clock_agrees_with_the_examples_of_1878(string id, string recipe)
    {
        PublishedFigure figure = Published.Figure("horizontal_dials", id);

        Layout dial = Dial(recipe, $"{figure.Input("latitude_deg")}°");

        figure.Check(dial.Constructed("1 o'clock"));
        figure.Check(-dial.Constructed("11 o'clock"));
    }

    [Theory]
    [MemberData(nameof(ChordsOf1913))]
    public void Half_hours_agree_with_the_chords_of_1913(string id, string recipe)
    {
        PublishedFigure figure = Published.Figure("horizontal_dials", id);

        Layout dial = Dial(recipe, $"{figure.Input("latitude_deg")}°", first: "1/2", last: "5 1/2", step: "1/2", then: """
            strike ring about O opening 5 in
            prick M where noon meets ring, ahead of O
            for h = 1/2 to 5 1/2 step 1/2
              prick H[h] where dial.hour[h] meets ring, ahead of O
              compare distance M to H[h] with 1 in as "chord {2 * h}"
            end
            """);

        figure.Check([.. Enumerable.Range(1, 11).Select(half => dial.Constructed($"chord {half}") / 25.4)]);
    }

    [Theory]
    [MemberData(nameof(SouthDials))]
    public void A_south_dial_is_a_horizontal_dial_for_the_complement(string id, string recipe)
    {
        PublishedFigure figure = Published.Figure("vertical_south_dials", id);

        Layout dial = Dial(recipe, $"90° - {figure.Input("latitude_deg")}°", given: "let");

        figure.Check([.. Enumerable.Range(1, 5).Select(hour => dial.Constructed($"{hour} o'clock"))]);
    }

    [Fact]
    public void The_style_rises_as_printed_in_1913()
    {
        PublishedFigure figure = Published.Figure("horizontal_dials", "style-bm1913-40");

        Layout style = Layouts.Make("""
            prick O at (-60 mm, 0)
            rule  base through O toward right
            prick N on base, 5 in ahead of O
            rule  rise through N square to base
            rule  edge through O turned 40° from base anticlockwise
            prick T where edge meets rise
            compare distance N to T with 1 in as "height"
            """);

        figure.Check(style.Constructed("height") / 25.4);
    }

    internal static Layout Dial(string recipe, string latitude, string first = "-5", string last = "5", string step = "1", string given = "given", string then = "") => Layouts.Make($"""
        sheet 400 mm by 400 mm
        {given} latitude = {latitude}
        prick O at (0, 0)
        rule noon through O toward up
        follow "{recipe}" as dial with centre = O, noon = noon, latitude = latitude, radius = 60 mm, first = {first}, last = {last}, step = {step}
        {then}
        """);

    private static TheoryData<string, string> Each(IEnumerable<string> ids)
    {
        TheoryData<string, string> data = [];
        foreach (string id in ids)
            foreach (string recipe in Recipes)
                data.Add(id, recipe);
        return data;
    }
}
