using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Making;

namespace RuleAndCompass.Tests.Making;

/// <summary>What the finished face shows.</summary>
public sealed class KeepingTests
{
    private const string Figures = """
        prick O at (0, 0)
        rule l through O toward right
        rule back through O toward left
        prick A on l, 50 mm ahead of O
        strike inner about O opening 20 mm
        strike outer about O opening 40 mm
        prick E where l meets inner, ahead of O
        prick N on inner toward up
        strike aside about A opening 30 mm

        """;

    [Theory]
    [InlineData("keep l from O to A", "(0, 0) - (50, 0)")]
    [InlineData("keep l between inner and outer", "(20, 0) - (40, 0)")]
    [InlineData("keep back between inner and outer", "(-20, 0) - (-40, 0)")]
    [InlineData("keep l inside inner", "(-20, 0) - (20, 0)")]
    [InlineData("keep l inside outer and outside inner", "(-40, 0) - (-20, 0); (20, 0) - (40, 0)")]
    [InlineData("keep inner", "circle 20 at (0, 0)")]
    [InlineData("keep inner from E to N anticlockwise", "arc (20, 0) anticlockwise (0, 20)")]
    [InlineData("keep inner from E to N clockwise", "arc (20, 0) clockwise (0, 20)")]
    [InlineData("keep inner inside outer", "circle 20 at (0, 0)")]
    [InlineData("keep outer outside aside", "arc (32, 24) anticlockwise (32, -24)")]
    [InlineData("keep outer inside aside", "arc (32, -24) anticlockwise (32, 24)")]
    [InlineData("keep A drilled 3 mm", "point (50, 0)")]
    [InlineData("keep from O along l to E, along inner anticlockwise to N cut", "(0, 0) - (20, 0); arc (20, 0) anticlockwise (0, 20)")]
    public void A_portion_has_exact_ends(string sentence, string pieces)
    {
        Layout plain = Layouts.Make(Figures);

        Layout layout = Layouts.Make(Figures + sentence);

        string.Join("; ", layout.Kept.ShouldHaveSingleItem().Pieces.Select(Said)).ShouldBe(pieces);
        layout.Acts.Length.ShouldBe(plain.Acts.Length); // no act is added
    }

    [Fact]
    public void Words_after_it_say_how_it_is_made()
    {
        Layout layout = Layouts.Make(Figures + "keep inner heavy cut\nkeep outer fine dashed engraved\nkeep aside chain\nkeep A drilled 5/2 mm");

        layout.Kept.Select(kept => (kept.Layer, kept.Weight, kept.Dash, kept.DrillMillimetres)).ShouldBe(
        [
            (Layer.Cut, Weight.Heavy, Dash.Whole, null), (Layer.Engraved, Weight.Fine, Dash.Dashed, null),
            (Layer.Engraved, Weight.Plain, Dash.Chain, null), (Layer.Drilled, Weight.Plain, Dash.Whole, 2.5),
        ]);
    }

    [Fact]
    public void A_familys_bare_name_keeps_all_of_it()
    {
        Layout layout = Layouts.Make(Figures + "for i = 3 to 1 + 4 step 2\n  strike ring[i] about O opening i * 1 mm\nend\nstrike ring[4] about O opening 4 mm\nkeep ring");

        layout.Kept.Select(kept => kept.Name).ShouldBe(["ring[3]", "ring[4]", "ring[5]"]);
    }

    [Theory]
    [InlineData("joined", 3)]
    [InlineData("joined closed", 4)]
    [InlineData("faired", 6)]
    [InlineData("faired closed", 8)]
    public void Points_are_joined_straight_or_faired(string portion, int pieces)
    {
        Layout layout = Layouts.Make($"{Figures}prick P[1 to 4] round O from A anticlockwise\nkeep P {portion}");

        Kept kept = layout.Kept.ShouldHaveSingleItem();
        kept.Pieces.Length.ShouldBe(pieces);
        foreach ((Piece before, Piece after) in kept.Pieces.Zip(kept.Pieces.Skip(1)))
            Ends(before).To.ShouldBeSameAs(Ends(after).From);
        if (portion.EndsWith("closed", StringComparison.Ordinal))
            Ends(kept.Pieces[^1]).To.ShouldBeSameAs(Ends(kept.Pieces[0]).From);
    }

    [Fact]
    public void A_faired_curve_passes_its_points_and_turns_nowhere_sharply()
    {
        Layout layout = Layouts.Make("prick P[1] at (0, 0)\nprick P[2] at (30 mm, 10 mm)\nprick P[3] at (50 mm, 40 mm)\nprick P[4] at (90 mm, 30 mm)\nkeep P faired");

        Kept kept = layout.Kept.ShouldHaveSingleItem();
        foreach ((Piece before, Piece after) in kept.Pieces.Zip(kept.Pieces.Skip(1)))
        {
            (double ax, double ay) = Tangent(before, atEnd: true);
            (double bx, double by) = Tangent(after, atEnd: false);
            ((ax * bx) + (ay * by)).ShouldBe(1, 1e-9);
        }
    }

    [Theory]
    [InlineData("letter \"XII\" at A height 5 mm", 0.0)]
    [InlineData("letter \"XII\" at A height 5 mm feet toward O", 270.0)]
    [InlineData("letter \"XII\" at A height 5 mm head toward O", 90.0)]
    [InlineData("letter \"XII\" at N height 5 mm feet toward O", 0.0)]
    [InlineData("letter \"XII\" at N height 5 mm head toward O", 180.0)]
    [InlineData("letter \"XII\" at A height 5 mm along back", 180.0)]
    public void Lettering_lies_as_it_is_said(string sentence, double degrees)
    {
        Lettering lettering = Layouts.Make(Figures + sentence).Letterings.ShouldHaveSingleItem();

        double turned = lettering.Lie.ShouldBeOfType<StraightLie>().Degrees;
        Math.IEEERemainder(turned - degrees, 360).ShouldBe(0, 1e-9);
        lettering.HeightMillimetres.ShouldBe(5);
    }

    [Fact]
    public void Lettering_may_be_bent_round_a_circle_through_its_own_place()
    {
        Lettering lettering = Layouts.Make(Figures + "letter \"Vale\" from A height 5 mm round inner anticlockwise").Letterings.ShouldHaveSingleItem();

        BentLie lie = lettering.Lie.ShouldBeOfType<BentLie>();
        lie.RadiusMillimetres.ShouldBe(50, 1e-12);
        lie.Clockwise.ShouldBeFalse();
        lettering.Anchor.ShouldBe(TextAnchor.Begin);
    }

    [Theory]
    [InlineData("keep l", "RC2035")]
    [InlineData("keep A from O to A", "RC2035")]
    [InlineData("keep inner between outer and aside", "RC2035")]
    [InlineData("keep inner from E to N", "RC2035")]
    [InlineData("keep inner from E to E clockwise", "RC2035")]
    [InlineData("keep l from O to O", "RC2035")]
    [InlineData("keep l from O to A clockwise", "RC2035")]
    [InlineData("keep l from O to N", "RC2027")]
    [InlineData("keep inner from E to A clockwise", "RC2027")]
    [InlineData("keep l outside inner", "RC2035")]
    [InlineData("keep inner outside outer", "RC2035")]
    [InlineData("keep back between aside and outer", "RC2035")]
    [InlineData("keep from O along l to O cut", "RC2035")]
    [InlineData("keep from O along l clockwise to A", "RC2035")]
    [InlineData("keep from E along inner to N", "RC2035")]
    [InlineData("keep A drilled 0 mm", "RC2012")]
    [InlineData("keep A joined", "RC2002")]
    [InlineData("letter \"X\" at A height 5 mm feet toward A", "RC2011")]
    [InlineData("letter \"X\" at O height 5 mm round inner clockwise", "RC2011")]
    [InlineData("letter \"X\" at l height 5 mm", "RC2002")]
    public void What_cannot_be_kept_is_an_error(string sentence, string code) => Layouts.Finding(Figures + sentence).Code.ShouldBe(code);

    private static (Point From, Point To) Ends(Piece piece) => piece switch
    {
        SegmentPiece segment => (segment.From, segment.To),
        ArcPiece arc => (arc.From, arc.To),
        _ => throw new InvalidOperationException(),
    };

    private static (double X, double Y) Tangent(Piece piece, bool atEnd)
    {
        (Point from, Point to) = Ends(piece);
        double x = to.XMillimetres - from.XMillimetres, y = to.YMillimetres - from.YMillimetres;
        if (piece is ArcPiece arc)
        {
            Point at = atEnd ? to : from;
            (x, y) = (arc.Centre.YMillimetres - at.YMillimetres, at.XMillimetres - arc.Centre.XMillimetres);
            if (arc.Clockwise)
                (x, y) = (-x, -y);
        }

        double length = Math.Sqrt((x * x) + (y * y));
        return (x / length, y / length);
    }

    private static string Said(Piece piece) => piece switch
    {
        SegmentPiece segment => $"{Said(segment.From)} - {Said(segment.To)}",
        ArcPiece arc => $"arc {Said(arc.From)} {(arc.Clockwise ? "clockwise" : "anticlockwise")} {Said(arc.To)}",
        CirclePiece circle => $"circle {Figure(circle.Radius.ToDouble())} at {Said(circle.Centre)}",
        PointPiece point => $"point {Said(point.At)}",
        _ => throw new InvalidOperationException(),
    };

    private static string Said(Point point) => $"({Figure(point.XMillimetres)}, {Figure(point.YMillimetres)})";

    private static string Figure(double value) => (Math.Round(value, 9) + 0.0).ToString("0.#########", System.Globalization.CultureInfo.InvariantCulture);
}
