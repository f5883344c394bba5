using CsCheck;
using RuleAndCompass.Geometry;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Geometry;

public sealed class CrossingTests
{
    private static readonly Decider Decider = new(new DeciderOptions());

    private static readonly Gen<(int, int, int, int, int, int)> Figures = Gen.Select(Small, Small, Gen.Int[1, 40], Small, Small, Gen.Int[1, 40]);

    private static Gen<int> Small => Gen.Int[-30, 30];

    [Fact]
    public void Two_lines_cross_in_one_point_or_are_parallel_or_the_same()
    {
        Line level = Line.Through(At(0, 0), At(1, 0)), steep = Line.Through(At(0, 1), At(1, 3)), high = Line.Through(At(0, 2), At(-3, 2)), again = Line.Through(At(5, 0), At(-7, 0));

        Crossing.Of(level, steep, Decider).Points.ShouldHaveSingleItem().X.TryGetRational(out Rational x).ShouldBeTrue();
        x.ShouldBe(new Rational(-1, 2));
        Crossing.Of(level, high, Decider).Meeting.ShouldBe(Meeting.Apart);
        Crossing.Of(level, again, Decider).Meeting.ShouldBe(Meeting.Same);
    }

    [Fact]
    public void A_line_meets_a_circle_in_the_order_of_its_direction()
    {
        Circle circle = Circle.WithRadius(At(1, 2), 5);
        Line line = Line.Through(At(-20, 5), At(20, 5));

        Crossing crossing = Crossing.Of(line, circle, Decider);
        Crossing back = Crossing.Of(circle, line.Reversed(), Decider);

        ShouldStand(crossing.Points[0], -3, 5);
        ShouldStand(crossing.Points[1], 5, 5);
        ShouldStand(back.Points[0], 5, 5);
        Crossing.Of(Line.Through(At(0, 7), At(1, 7)), circle, Decider).Meeting.ShouldBe(Meeting.Touching);
        Crossing.Of(Line.Through(At(0, 8), At(1, 8)), circle, Decider).Points.ShouldBeEmpty();
    }

    [Fact]
    public void Two_circles_meet_first_on_the_left()
    {
        Circle a = Circle.WithRadius(At(-4, 0), 5), b = Circle.WithRadius(At(4, 0), 5);

        ShouldStand(Crossing.Of(a, b, Decider).Points[0], 0, 3);
        ShouldStand(Crossing.Of(b, a, Decider).Points[0], 0, -3);
        Crossing.Of(a, Circle.WithRadius(At(4, 0), 3), Decider).Meeting.ShouldBe(Meeting.Touching);
        Crossing.Of(a, Circle.WithRadius(At(-3, 0), 4), Decider).Meeting.ShouldBe(Meeting.Touching);
        Crossing.Of(a, Circle.WithRadius(At(-3, 0), 3), Decider).Meeting.ShouldBe(Meeting.Apart);
        Crossing.Of(a, Circle.WithRadius(At(-4, 0), 5), Decider).Meeting.ShouldBe(Meeting.Same);
        Crossing.Of(a, Circle.WithRadius(At(-4, 0), 6), Decider).Meeting.ShouldBe(Meeting.Apart);
    }

    // In whole numbers, whether circles meet follows from the sum and the difference of the radii (Euclid III.11, III.12): no root is taken here.
    [Fact]
    public void Circles_with_whole_figures_meet_as_the_squares_say() => Figures.Sample(figures =>
    {
        (int ax, int ay, int r, int bx, int by, int s) = figures;
        int between = ((ax - bx) * (ax - bx)) + ((ay - by) * (ay - by)), sum = (r + s) * (r + s), rest = (r - s) * (r - s);

        Crossing crossing = Crossing.Of(Circle.WithRadius(At(ax, ay), r), Circle.WithRadius(At(bx, by), s), Decider);

        Meeting expected = between == 0 ? (r == s ? Meeting.Same : Meeting.Apart)
            : between > sum || between < rest ? Meeting.Apart
            : between == sum || between == rest ? Meeting.Touching : Meeting.Crossing;
        crossing.Meeting.ShouldBe(expected);
        foreach (Point point in crossing.Points)
            Decider.IsZero(point.From(At(ax, ay)).SquaredLength - (r * r)).ShouldBeTrue();
    }, iter: 300, threads: 1);

    // When one crossing is known the other is worked out from it without a root; it must be the point that the root gives.
    [Fact]
    public void The_second_crossing_is_the_same_however_it_is_found() => Figures.Sample(figures =>
    {
        (int ax, int ay, int px, int bx, int by, int py) = figures;
        Point shared = At(px, py), a = At(ax, ay), b = At(bx, by);
        if (IsSame(a, shared) || IsSame(b, shared) || IsSame(a, b))
            return;

        Crossing known = Crossing.Of(Circle.Through(a, shared), Circle.Through(b, shared), Decider);
        Crossing found = Crossing.Of(Circle.WithSquaredRadius(a, a.SquaredDistanceTo(shared)), Circle.WithSquaredRadius(b, b.SquaredDistanceTo(shared)), Decider);

        known.Meeting.ShouldBe(found.Meeting);
        foreach ((Point first, Point second) in known.Points.Zip(found.Points))
            IsSame(first, second).ShouldBeTrue();
    }, iter: 200, threads: 1);

    [Fact]
    public void A_foot_and_a_mirror_image_stand_square_to_the_line()
    {
        Line line = Line.Through(At(0, 0), At(3, 1));
        Point point = At(-2, 6);

        ShouldStand(line.FootOf(point), 0, 0);
        ShouldStand(line.MirrorOf(point), 2, -6);
    }

    private static Point At(int x, int y) => new(x, y);

    private static bool IsSame(Point a, Point b) => Decider.IsZero(a.X - b.X) && Decider.IsZero(a.Y - b.Y);

    private static void ShouldStand(Point point, int x, int y) => IsSame(point, At(x, y)).ShouldBeTrue($"({point.XMillimetres}, {point.YMillimetres})");
}
