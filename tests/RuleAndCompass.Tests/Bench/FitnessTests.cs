using RuleAndCompass.Accuracy;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Bench;

public sealed class FitnessTests
{
    private static readonly Kit Kit = new(true, 300, new Reach(2, 180), null, true, true, new Rational(1, 2));

    [Fact]
    public void A_layout_that_fits_has_no_warning()
    {
        ActSequence acts = Fitting();
        LineMark line = acts.Lay(acts.Locate(-150, 0), acts.Locate(150, 0));
        acts.Cross(line, acts.Swing(acts.Locate(0, 20), acts.SetFree(80)), 1);

        Inspect(acts).ShouldBeEmpty();
    }

    [Fact]
    public void A_point_off_the_sheet_says_by_how_much_and_where()
    {
        ActSequence acts = Fitting();
        acts.Locate(-215.25, 3, "A");

        Diagnostic finding = Inspect(acts).Single();

        finding.Code.ShouldBe("RC3101");
        finding.Severity.ShouldBe(Severity.Warning);
        finding.Message.ShouldBe("act 1: `A` lies 5.3 mm off the sheet, beyond its left edge");
        finding.Hint.ShouldBe("lay the sheet on a `board`, move or shrink the layout, or use a larger sheet");
    }

    [Fact]
    public void With_a_board_a_point_may_leave_the_sheet_but_what_is_kept_may_not()
    {
        ActSequence acts = Fitting();
        acts.Board = new Sheet(null, 600, 600);
        PointMark outside = acts.Locate(0, 200, "A");
        acts.Locate(0, -301, "B");
        acts.Keep("hole", outside, new PointPiece(outside.Point));

        Inspect(acts).Select(finding => finding.Message).ShouldBe(
        [
            "act 2: `B` lies 1 mm off the board, beyond its lower edge",
            "what is kept of `hole` runs 51.5 mm off the sheet, beyond its upper edge",
        ]);
    }

    [Fact]
    public void A_point_that_nothing_needs_may_lie_anywhere()
    {
        ActSequence acts = Fitting();
        acts.Locate(500, 0, "spare", auxiliary: true);
        PointMark used = acts.Locate(400, 0, "used", auxiliary: true);
        acts.Swing(used, acts.SetFree(50));

        Inspect(acts).Single().Message.ShouldStartWith("act 2: `used` lies 190 mm off");
    }

    // 210 mm is half the sheet, and 30 √49 exactly, though no double holds a root on the way.
    [Theory]
    [InlineData(0, 0)]
    [InlineData(1, 1)]
    public void The_edge_of_the_sheet_is_decided_exactly(int millionths, int findings)
    {
        ActSequence acts = Fitting();
        Real place = Real.Sqrt(2) * Real.Sqrt(22050) + new Rational(millionths, 1_000_000_000_000) * Real.One;
        PointMark point = new("A", new Point(place, 0), false);
        acts.Keep("A", point, new PointPiece(point.Point));

        Inspect(acts).Length.ShouldBe(findings);
    }

    [Fact]
    public void An_arc_is_kept_off_the_sheet_only_where_it_runs()
    {
        ActSequence acts = Fitting();
        PointMark centre = acts.Locate(150, 0);
        CircleMark circle = acts.Swing(centre, acts.SetFree(100), "rim");
        Point top = new(150, 100);
        Point bottom = new(150, -100);
        acts.Keep("inner", circle, new ArcPiece(centre.Point, 100, top, bottom, Clockwise: false));
        acts.Keep("outer", circle, new ArcPiece(centre.Point, 100, top, bottom, Clockwise: true));
        acts.Keep("whole", circle, new CirclePiece(centre.Point, 100));

        Inspect(acts).Select(finding => finding.Message).ShouldBe(
        [
            "what is kept of `outer` runs 40 mm off the sheet, beyond its right edge",
            "what is kept of `whole` runs 40 mm off the sheet, beyond its right edge",
        ]);
    }

    [Theory]
    [InlineData(181, false, "act 1: 181 mm is outside the reach of the dividers, 2 mm to 180 mm", "add a `beam` compass to the kit, or make the layout smaller")]
    [InlineData(1.5, false, "act 1: 1.5 mm is outside the reach of the dividers, 2 mm to 180 mm", "use finer dividers, or a larger layout")]
    [InlineData(180, false, null, null)]
    [InlineData(1001, true, "act 1: 1001 mm is outside the reach of the beam compass, 100 mm to 1000 mm", "use a longer beam compass, or a smaller layout")]
    public void An_opening_outside_the_reach(double opening, bool beam, string? message, string? hint)
    {
        ActSequence acts = Fitting();
        if (beam)
            acts.Kit = Kit with { Beam = new Reach(100, 1000) };
        acts.Set(new FreeOpening(ActSequence.Exact(opening)), beam);

        Diagnostic? finding = Inspect(acts).SingleOrDefault();
        finding?.Code.ShouldBe("RC3103");
        finding?.Message.ShouldBe(message);
        finding?.Hint.ShouldBe(hint);
        (finding is null).ShouldBe(message is null);
    }

    [Fact]
    public void A_line_longer_than_the_straightedge_counts_all_it_is_needed_over()
    {
        ActSequence acts = Fitting();
        PointMark first = acts.Locate(-100, 0);
        LineMark line = acts.Lay(first, acts.Locate(100, 0), "bar");
        acts.Keep("bar", line, new SegmentPiece(new Point(-200, 0), new Point(150, 0)));

        Diagnostic finding = Inspect(acts).Single();
        finding.Code.ShouldBe("RC3104");
        finding.Message.ShouldBe("act 3: `bar` is needed over 350 mm, and the straightedge is 300 mm long");
    }

    [Fact]
    public void A_short_base_is_warned_of_from_a_twentieth_on()
    {
        ActSequence acts = Fitting();
        PointMark first = acts.Locate(0, 0, "A");
        PointMark near = acts.Locate(5, 0, "B");
        LineMark exactly = acts.Lay(first, near, "l");
        acts.Keep("l", exactly, new SegmentPiece(first.Point, new Point(100, 0)));
        LineMark longer = acts.Lay(first, near, "m");
        acts.Keep("m", longer, new SegmentPiece(first.Point, new Point(101, 0)));

        Diagnostic finding = Inspect(acts).Single();
        finding.Code.ShouldBe("RC3106");
        finding.Message.ShouldBe("act 4: `m` is laid to `A` and `B`, 5 mm apart, and used over 101 mm");
        finding.Hint.ShouldBe("lay it to points at least 5.1 mm apart, better half of its length; prick one farther out");
    }

    [Fact]
    public void A_crossing_at_exactly_fifteen_degrees_is_square_enough()
    {
        ActSequence acts = Fitting();
        PointMark at = acts.Locate(-100, 0);
        LineMark bar = acts.Lay(at, acts.Locate(100, 0), "bar");
        PointMark other = acts.Locate(0, 20);
        acts.Cross(bar, acts.Protract(acts.Slide(acts.Slide(bar, other), other), other, 15, "ray"));
        acts.Cross(bar, acts.Protract(acts.Slide(acts.Slide(bar, other), other), other, 14, "steep"), 0, "T");

        Diagnostic finding = Inspect(acts).Single();
        finding.Code.ShouldBe("RC3105");
        finding.Message.ShouldContain("`bar` and `steep` cross at 14°, so `T` is loose along them: 4 times the error of a square crossing");
        finding.Hint!.ShouldStartWith("find a line that crosses `bar` more squarely, or measure it along `bar` instead, ");
    }

    [Fact]
    public void A_crossing_under_five_degrees_has_a_better_way()
    {
        ActSequence acts = Fitting();
        PointMark at = acts.Locate(-100, 0, "S");
        LineMark bar = acts.Lay(at, acts.Locate(100, 0), "bar");
        LineMark ray = acts.Lay(acts.Locate(-100, -10), acts.Locate(100, 0.5), "ray");
        acts.Cross(bar, ray, 0, "T");

        Inspect(acts).Single(finding => finding.Code == "RC3105").Hint.ShouldBe("measure it along `bar` instead, 190 mm from `S`");
    }

    [Fact]
    public void An_arc_that_grazes_a_line_is_told_how_wide_to_open()
    {
        ActSequence acts = Fitting();
        LineMark bar = acts.Lay(acts.Locate(-100, 0), acts.Locate(100, 0), "bar");
        CircleMark arc = acts.Swing(acts.Locate(0, 60), acts.SetFree(61), "arc");
        acts.Cross(bar, arc, 1, "T");

        // 60 / cos 15° = 62.1.
        Inspect(acts).Single().Hint.ShouldBe("an opening over 63 mm crosses it more squarely");
    }

    [Fact]
    public void Two_arcs_that_graze_are_told_which_way_to_change()
    {
        ActSequence acts = Fitting();
        PointMark left = acts.Locate(-60, 0);
        PointMark right = acts.Locate(60, 0);
        SetOpening near = acts.SetFree(60.2);
        acts.Cross(acts.Swing(left, near), acts.Swing(right, near));
        acts.Cross(acts.Swing(left, acts.SetFree(20)), acts.Swing(acts.Locate(-40, 0), acts.SetFree(39.5)));

        Inspect(acts).Where(finding => finding.Code == "RC3105").Select(finding => finding.Hint).ShouldBe(
            ["larger openings cross more squarely", "openings nearer to each other cross more squarely"]);
    }

    [Theory]
    [InlineData(0.4, true)]
    [InlineData(0.5, true)]
    [InlineData(0.51, false)]
    public void Points_within_half_a_millimetre_are_one_at_the_bench(double apart, bool warned)
    {
        ActSequence acts = Fitting();
        acts.Locate(0.75, 0, "A");
        acts.Locate(0.75 + apart, 0, "B");

        Diagnostic? finding = Inspect(acts).SingleOrDefault();
        finding?.Code.ShouldBe("RC3107");
        finding?.Message.ShouldStartWith("act 2: `B` is pricked ");
        (finding is not null).ShouldBe(warned);
    }

    [Fact]
    public void Many_points_are_looked_through_quickly_and_each_warns_of_its_nearest_only()
    {
        ActSequence acts = Fitting();
        for (int point = 0; point < 20; point++)
            acts.Locate(point / 8.0, 0);

        Inspect(acts).Length.ShouldBe(19);
    }

    private static ActSequence Fitting() => new() { Kit = Kit };

    private static Diagnostic[] Inspect(ActSequence acts) => [.. LayoutFitness.Inspect(acts.Layout(Hand.Ordinary))];
}
