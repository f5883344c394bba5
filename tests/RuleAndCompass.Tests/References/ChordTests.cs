using RuleAndCompass.Making;
using RuleAndCompass.Tests.Making;

namespace RuleAndCompass.Tests.References;

/// <summary>
/// The ancient table of chords, radius 60, as printed by T. L. Heath, A History of Greek Mathematics, vol. 2 (1921), pp. 283-284, and by G. J. Toomer in his
/// translation (1984), I.11; each entry's own source stands beside it in <c>published.json</c>.
/// </summary>
public sealed class ChordTests
{
    public static TheoryData<string> Chords => [.. Published.Ids("ancient_chords", "chord-").Where(id => id != "chord-accuracy")];

    [Theory]
    [MemberData(nameof(Chords))]
    public void A_chord_spanned_on_the_circle_agrees_with_the_table(string id)
    {
        PublishedFigure figure = Published.Figure("ancient_chords", id);

        Layout layout = Layouts.Make($"""
            prick O at (0, 0)
            strike ring about O opening 60 mm
            prick A on ring toward right
            prick B on ring turned {figure.Input("arc_deg")}° from A anticlockwise
            compare distance A to B with 60 mm as "chord"
            """);

        figure.Check(layout.Constructed("chord"));
    }

    [Theory]
    [MemberData(nameof(Chords))]
    public void The_scale_of_chords_agrees_with_the_table(string id)
    {
        PublishedFigure figure = Published.Figure("ancient_chords", id);
        string arc = figure.Input("arc_deg");
        if (double.Parse(arc, System.Globalization.CultureInfo.InvariantCulture) > 90)
            return; // the scale ends at a quarter of the circle

        Layout layout = Layouts.Make($"""
            prick A at (-40 mm, 0)
            rule base through A toward right
            follow "scale of chords" as scale with start = A, base = base, radius = 60 mm, step = {arc}°, greatest = {arc}°
            """);

        figure.Check(layout.Constructed($"chord of {arc}°"));
        layout.Comparison($"chord of {arc}°").Decision.IsZero.ShouldBeTrue();
    }

    // T. L. Heath (1921), as above: no entry is out by more than one unit of its last place, 1/3600 of a part.
    [Fact]
    public void No_entry_differs_by_more_than_the_table_is_said_to_be_out()
    {
        double unit = Published.Figure("ancient_chords", "chord-accuracy").Value / 3600;

        foreach (PublishedFigure figure in Published.Topic("ancient_chords").Where(figure => figure.Inputs.ContainsKey("arc_deg")))
            figure.Tolerance.ShouldBe(unit, 0.01 * unit);
    }
}
