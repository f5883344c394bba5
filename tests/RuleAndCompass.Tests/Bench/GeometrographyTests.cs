using RuleAndCompass.Bench;

namespace RuleAndCompass.Tests.Bench;

/// <summary>Counts of elementary problems, after E. Lemoine, Geometrographie (1902), as listed in the project's checks of published figures.</summary>
public sealed class GeometrographyTests
{
    // lem-line (from memory): simplicity 3, exactitude 2.
    [Fact]
    public void A_line_through_two_points()
    {
        ActSequence acts = new();
        acts.Lay(acts.Locate(0, 0), acts.Locate(100, 0));

        ShouldCount(acts, "2R1 + R2", 3, 2);
    }

    // lem-circle-pt (from memory): 2C1 + C3.
    [Fact]
    public void A_circle_about_one_point_through_another()
    {
        ActSequence acts = new();
        PointMark centre = acts.Locate(0, 0);
        acts.Swing(centre, acts.SetSpan(centre, acts.Locate(50, 0)));

        ShouldCount(acts, "2C1 + C3", 3, 2);
    }

    // lem-circle-len (from memory): 3C1 + C3.
    [Fact]
    public void A_circle_about_a_point_with_a_length_taken_elsewhere()
    {
        ActSequence acts = new();
        SetOpening span = acts.SetSpan(acts.Locate(0, 0), acts.Locate(50, 0));
        acts.Swing(acts.Locate(0, 80), span);

        ShouldCount(acts, "3C1 + C3", 4, 3);
    }

    // lem-bisect-seg (from memory): 2R1 + R2 + 2C1 + 2C3.
    [Fact]
    public void A_segment_halved_by_a_free_opening()
    {
        ActSequence acts = new();
        PointMark a = acts.Locate(-50, 0);
        PointMark b = acts.Locate(50, 0);
        SetOpening opening = acts.SetFree(80);
        CircleMark first = acts.Swing(a, opening);
        CircleMark second = acts.Swing(b, opening);
        acts.Lay(acts.Cross(first, second, 1), acts.Cross(first, second, 0));

        ShouldCount(acts, "2R1 + R2 + 2C1 + 2C3", 7, 4);
    }

    // lem-bisect-ang (computed by the published rules): 2R1 + R2 + 3C1 + 3C3.
    [Fact]
    public void An_angle_halved()
    {
        ActSequence acts = new();
        PointMark corner = acts.Locate(0, 0);
        LineMark level = acts.Lay(corner, acts.Locate(100, 0));
        LineMark upright = acts.Lay(corner, acts.Locate(0, 100));
        int before = acts.Acts.Length;
        SetOpening opening = acts.SetFree(50);
        CircleMark around = acts.Swing(corner, opening);
        CircleMark first = acts.Swing(acts.Cross(level, around, 1), opening);
        CircleMark second = acts.Swing(acts.Cross(upright, around, 1), opening);
        acts.Lay(corner, acts.Cross(first, second, 1));

        OperationCount count = Geometrography.Of([.. acts.Acts.Skip(before)]).Total;
        count.ToString().ShouldBe("2R1 + R2 + 3C1 + 3C3");
        (count.Simplicity, count.Exactitude).ShouldBe((9, 5));
    }

    [Fact]
    public void The_needle_stands_at_an_end_of_a_span_for_one_circle_only()
    {
        ActSequence acts = new();
        PointMark a = acts.Locate(0, 0);
        PointMark b = acts.Locate(50, 0);
        SetOpening span = acts.SetSpan(a, b);
        acts.Swing(a, span);
        acts.Swing(b, span);

        ShouldCount(acts, "3C1 + 2C3", 5, 3);
    }

    // Check `identity` (Labelle, read): simplicity less exactitude is the number of lines and circles drawn.
    [Fact]
    public void What_is_not_of_edge_and_compass_is_counted_apart()
    {
        ActSequence acts = new();
        PointMark at = acts.Locate(0, 0);
        LineMark line = acts.Lay(at, acts.Locate(80, 0));
        acts.Slide(line, at);
        acts.Protract(line, at, 20);
        acts.Swing(at, acts.SetScale(30, 30));
        acts.Swing(at, acts.SetScale(31, null));

        OperationCount count = Geometrography.Of(acts.Acts).Total;
        count.ShouldBe(new OperationCount(2, 1, 2, 0, 2, Slides: 1, Protractions: 1, ScaleReadings: 2, Locates: 2));
        (count.Simplicity - count.Exactitude).ShouldBe(3);
    }

    [Fact]
    public void Counts_are_told_by_want_and_by_stage()
    {
        ActSequence acts = new();
        PointMark a = acts.Locate(0, 0);
        PointMark b = acts.Locate(80, 0);
        acts.Want = 2;
        acts.Lay(a, b);
        acts.Want = 3;
        acts.Stage = 1;
        acts.Swing(a, acts.SetSpan(a, b));

        Geometrography counts = Geometrography.Of(acts.Acts);
        counts.Wants[1].Simplicity.ShouldBe(0);
        counts.Wants[2].ToString().ShouldBe("2R1 + R2");
        counts.Wants[3].ToString().ShouldBe("2C1 + C3");
        counts.Stages[0].Locates.ShouldBe(2);
        counts.Stages[1].Simplicity.ShouldBe(3);
        counts.Total.Simplicity.ShouldBe(6);
        new OperationCount().ToString().ShouldBe("0");
    }

    private static void ShouldCount(ActSequence acts, string symbol, int simplicity, int exactitude)
    {
        OperationCount count = Geometrography.Of(acts.Acts).Total;
        count.ToString().ShouldBe(symbol);
        (count.Simplicity, count.Exactitude).ShouldBe((simplicity, exactitude));
    }
}
