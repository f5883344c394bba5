using System.Collections.Immutable;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Plates.Tests;

/// <summary>
/// A small layout put together act by act, so that it stays the same however scripts are carried out: one act of each kind, one opening of each kind, one
/// kept piece of each kind and lettering of each lie.
/// </summary>
internal static class ByHand
{
    public static Layout OneOfEach()
    {
        Layout bare = Layouts.Of("title \"One of each\"\nsheet 200 mm by 160 mm\n");

        PointMark a = Point("A", -60, -40), b = Point("B", 60, -40);
        LineMark low = new("low", Line.Through(a.Point, b.Point), false);
        SetOpening wide = new(4, 1, 4, new SpanOpening(a, b), false, "Set the dividers from A to B.", default, null);
        CircleMark west = new("west", Circle.Through(a.Point, b.Point), false);
        CircleMark east = new("east", Circle.Through(b.Point, a.Point), false);
        // The top of the equilateral triangle on AB: 60·√3 above it.
        PointMark c = new("C", new Point(0, (Real)60 * Real.Sqrt(3) - 40), false);
        LineMark plumb = new("plumb", low.Line.SquareThrough(c.Point), false);
        PointMark d = Point("D", 0, -40);
        LineMark slant = new("slant", low.Line.TurnedThrough(a.Point, Angle.FromDegrees((Rational)30)), false);
        SetOpening scaled = new(11, 2, 9, new ScaleOpening(20, (Rational)20), false, "Set the dividers to 20 mm by the scale.", default, null);
        CircleMark ring = new("ring", Circle.WithRadius(d.Point, 20), false);
        SetOpening free = new(13, 2, 10, new FreeOpening(25), false, "Set the dividers to about 25 mm.", default, null);
        CircleMark flick = new("c1", Circle.WithRadius(b.Point, 25), true);
        PointMark e = new("E", new Point(35, -40), false);

        ImmutableArray<Act> acts =
        [
            new Locate(1, 0, 1, a, true, "Measure 60 mm left and 40 mm down from the middle and prick A.", default, null),
            new Locate(2, 0, 2, b, true, "Measure 60 mm right and 40 mm down from the middle and prick B.", default, null),
            new Lay(3, 0, 3, low, a, b, "Lay the edge to A and B and draw low.", default, null),
            wide,
            new Swing(5, 1, 4, west, a, wide, "With the needle in A draw west.", default, null),
            new Swing(6, 1, 5, east, b, wide, "With the needle in B draw east.", default, null),
            new Cross(7, 1, 6, c, west, east, 0, "Prick C where west crosses east, the upper one.", default, null),
            new Slide(8, 2, 7, plumb, low, c, "Lay the square to low and draw plumb through C.", default, null),
            new Cross(9, 2, 8, d, plumb, low, 0, "Prick D where plumb crosses low.", default, null),
            new Protract(10, 2, 8, slant, low, a, Angle.FromDegrees((Rational)30), "Lay the protractor to low at A, mark 30° and draw slant.", default, null),
            scaled,
            new Swing(12, 2, 9, ring, d, scaled, "With the needle in D draw ring.", default, null),
            free,
            new Swing(14, 2, 10, flick, b, free, "With the needle in B strike the arc c1.", default, null),
            new Cross(15, 2, 11, e, flick, low, 0, "Prick E where c1 crosses low.", default, null),
        ];
        ImmutableArray<Kept> kept =
        [
            new("low", low, [new SegmentPiece(a.Point, b.Point)], Layer.Cut, Weight.Heavy, Dash.Whole, null, default, null),
            new("the run from A to C", null, [new ArcPiece(b.Point, 120, c.Point, a.Point, false), new SegmentPiece(a.Point, d.Point)], Layer.Engraved, Weight.Plain, Dash.Dashed, null, default, null),
            new("ring", ring, [new CirclePiece(d.Point, 20)], Layer.Engraved, Weight.Fine, Dash.Chain, null, default, null),
            new("E", e, [new PointPiece(e.Point)], Layer.Drilled, Weight.Plain, Dash.Whole, 4, default, null),
        ];
        ImmutableArray<Lettering> letterings =
        [
            new("XII", c.Point, TextAnchor.Middle, 5, new StraightLie(0), default, null),
            new("low", a.Point, TextAnchor.Begin, 3.5, new StraightLie(30), default, null),
            new("ROUND", new Point(0, -20), TextAnchor.Middle, 3.5, new BentLie(d.Point, 20, true), default, null),
            new("UNDER", new Point(0, -60), TextAnchor.End, 3.5, new BentLie(d.Point, 20, false), default, null),
        ];
        return bare with
        {
            Stages = [new("1", "The base"), new("2", "The arcs"), new("3", "The rest")],
            Acts = acts,
            Kept = kept,
            Letterings = letterings,
            Givens = [new GivenValue("R", QuantityKind.Length, "20 mm", false)],
            Notes = ["Mind the grain."],
        };
    }

    private static PointMark Point(string name, int x, int y) => new(name, new Point(x, y), false);
}
