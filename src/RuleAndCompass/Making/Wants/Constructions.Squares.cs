using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making.Wants;

/// <content>Squares, parallels, halves and mirror images.</content>
internal sealed partial class Constructions
{
    /// <summary>A line from one mark to another, which are two points.</summary>
    public DirectedLine Through(PointMark first, PointMark second, string? name)
    {
        if (!Kit.HasStraightedge && bench.Standing(Line.Through(first.Point, second.Point)) is null)
            throw NoTool("a line through two points", "`straightedge`");
        return bench.Lay(first, second, name);
    }

    /// <summary>Through a mark, a quarter turn anticlockwise from a line.</summary>
    public DirectedLine Square(DirectedLine from, PointMark through, string? name, ByTool? by = null)
    {
        if (bench.Standing(from.Line.SquareThrough(through.Point)) is { } standing)
            return standing;
        Need(by, ByTool.Square, Kit.Square);
        Need(by, ByTool.Protractor, Kit.Protractor);
        Need(by, ByTool.Dividers, HasDividers);
        if (Kit.Square && by is null or ByTool.Square)
            return bench.Slide(from, through, name);
        bool on = Holds(from.Mark.Line, through);
        if (by == ByTool.Protractor || (!HasDividers && Kit.Protractor && on))
            return on ? bench.Protract(from, through, Angle.FromDegrees(90), name) : throw NoTool("a square by the protractor from a point off the line", "`square` or `dividers`");
        if (!HasDividers || !Kit.HasStraightedge)
            throw NoTool("a line square to another", "`square`, or `straightedge` and `dividers`");
        return on ? SquareAt(from, through, name) : SquareFrom(from, through, name);
    }

    /// <summary>Through a mark, as a line runs.</summary>
    public DirectedLine Parallel(DirectedLine along, PointMark through, string? name, ByTool? by = null)
    {
        if (bench.Standing(along.Line.ParallelThrough(through.Point)) is { } standing)
            return standing;
        Need(by, ByTool.Square, Kit.Square);
        Need(by, ByTool.Dividers, HasDividers);
        if (Kit.Square && by is null or ByTool.Square)
            return ParallelBySquare(along, through, name);
        if (HasDividers && Kit.HasStraightedge)
            return ParallelByRhombus(along, through, name);
        throw NoTool("a parallel", "`square`, or `straightedge` and `dividers`");
    }

    /// <summary>The line square to the way from one mark to another, through the middle, running to the left.</summary>
    public DirectedLine Halving(PointMark first, PointMark second, string? name)
    {
        Line wanted = Line.Along(Middle(first.Point, second.Point), second.Point.From(first.Point).QuarterTurn, first.Point.SquaredDistanceTo(second.Point));
        if (bench.Standing(wanted) is { } standing)
            return standing;
        if (!HasDividers || !Kit.HasStraightedge)
            throw NoTool("a line that halves", "`straightedge` and `dividers`");
        double apart = first.Point.DistanceTo(second.Point).ToDouble();
        FreeOpening opening = Free(apart * 0.75, (apart / 2) + 1);
        CircleMark a = bench.Swing(first, opening, null), b = bench.Swing(second, opening, null);
        (PointMark left, PointMark right) = CrossBoth(a, b);
        return LayProved(right, left, wanted, name, "the halving line", first.Point, second.Point);
    }

    /// <summary>The point midway between two marks.</summary>
    public PointMark Midway(PointMark first, PointMark second, string? name)
    {
        if (bench.Marks.Find(Middle(first.Point, second.Point)) is { } standing)
            return standing;
        DirectedLine half = Halving(first, second, null), whole = Through(first, second, null);
        return CrossProved(half.Mark, whole.Mark, Middle(first.Point, second.Point), name, "the middle", first.Point, second.Point);
    }

    /// <summary>The line from a corner into the angle of two marks about it.</summary>
    public DirectedLine HalvingAngle(PointMark first, PointMark corner, PointMark second, string? name)
    {
        Vector a = first.Point.From(corner.Point), b = second.Point.From(corner.Point);
        Real alongA = first.Point.DistanceTo(corner.Point), alongB = second.Point.DistanceTo(corner.Point);
        Line wanted = Line.Along(corner.Point, (alongB * a) + (alongA * b));
        if (bench.Standing(wanted) is { } standing)
            return standing;
        if (!HasDividers || !Kit.HasStraightedge)
            throw NoTool("the half of an angle", "`straightedge` and `dividers`");
        // One foot in the corner marks both sides at one distance; equal arcs about the marks cross on the half.
        SpanOpening reach = new(corner, first);
        DirectedLine side = Through(corner, second, null);
        CircleMark arc = bench.Swing(corner, reach, null);
        PointMark marked = CrossWhere(side.Mark, arc, point => Decider.Sign(Vector.Dot(b, point.From(corner.Point))) > 0);
        double between = Math.Sqrt(Apart(first.Point, marked.Point)), radius = reach.Length.ToDouble();
        Opening opening = between < radius * 1.6 ? reach : Free(between, (between / 2) + 1);
        CircleMark p = bench.Swing(first, opening, null), q = bench.Swing(marked, opening, null);
        Vector into = wanted.Direction;
        PointMark half = CrossWhere(p, q, point => Decider.Sign(Vector.Dot(into, point.From(corner.Point))) > 0);
        return LayProved(corner, half, wanted, name, "the half of the angle", corner.Point, first.Point, second.Point);
    }

    /// <summary>The mirror image of a mark in a line.</summary>
    public PointMark Mirror(PointMark of, DirectedLine across, string? name, ByTool? by = null)
    {
        if (Holds(across.Mark.Line, of))
            return of;
        Point wanted = across.Mark.Line.MirrorOf(of.Point);
        if (bench.Marks.Find(wanted) is { } standing)
            return standing;
        if (!HasDividers)
            throw NoTool("a mirror image", "`dividers`");
        if (Kit.Square && by is null)
        {
            DirectedLine plumb = bench.Slide(across, of, null);
            PointMark foot = Crossed(plumb, across);
            CircleMark swung = bench.Swing(foot, new SpanOpening(foot, of), null);
            return CrossProved(plumb.Mark, swung, wanted, name, "the mirror image", across.Mark.Line, of.Point);
        }

        (CircleMark left, CircleMark right) = RhombusArcs(across, of);
        return CrossProved(left, right, wanted, name, "the mirror image", across.Mark.Line, of.Point);
    }

    /// <summary>Where a line drawn square to another meets it.</summary>
    public PointMark Foot(PointMark from, DirectedLine on, string? name, ByTool? by)
    {
        if (Holds(on.Mark.Line, from))
            return from;
        return Crossed(Square(on, from, null, by), on, name);
    }

    /// <summary>The one crossing of two lines that are not parallel.</summary>
    public PointMark Crossed(DirectedLine a, DirectedLine b, string? name = null) => bench.Cross(a.Mark, b.Mark, Crossing.Of(a.Mark.Line, b.Mark.Line, Decider).Points[0], 0, name);

    // From a line that stands square to it already, one slide; else two.
    private DirectedLine ParallelBySquare(DirectedLine along, PointMark through, string? name)
    {
        if (bench.Marks.FindParallel(along.Direction.QuarterTurn) is not { } plumb)
            return bench.Slide(bench.Slide(along, through, null), through, name).Reversed();
        DirectedLine slid = bench.Slide(new(plumb, false), through, name);
        return Decider.Sign(Vector.Dot(slid.Direction, along.Direction)) > 0 ? slid : slid.Reversed();
    }

    private static Point Middle(Point a, Point b) => new((a.X + b.X) / 2, (a.Y + b.Y) / 2);

    // Equal marks to either side of the point, equal arcs about them.
    private DirectedLine SquareAt(DirectedLine from, PointMark at, string? name)
    {
        FreeOpening near = Free(Diagonal / 12);
        CircleMark marks = bench.Swing(at, near, null);
        (PointMark behind, PointMark ahead) = CrossBoth(from.Mark, marks);
        FreeOpening far = Free(near.Chosen.ToDouble() * 1.6, near.Chosen.ToDouble() + 1);
        CircleMark a = bench.Swing(behind, far, null), b = bench.Swing(ahead, far, null);
        Line wanted = from.Mark.Line.SquareThrough(at.Point);
        PointMark above = CrossWhere(a, b, point => Decider.Sign(Vector.Dot(wanted.Direction, point.From(at.Point))) > 0);
        DirectedLine square = LayProved(at, above, wanted, name, "the square", at.Point, from.Mark.Line);
        return from.IsReversed ? square.Reversed() : square;
    }

    private DirectedLine SquareFrom(DirectedLine from, PointMark through, string? name)
    {
        (CircleMark left, CircleMark right) = RhombusArcs(from, through);
        PointMark image = CrossProved(left, right, from.Mark.Line.MirrorOf(through.Point), null, "the mirror image", from.Mark.Line, through.Point);
        Line wanted = from.Mark.Line.SquareThrough(through.Point);
        bool leftOfLine = Decider.Sign(from.Mark.Line.SideOf(through.Point)) > 0;
        DirectedLine square = leftOfLine
            ? LayProved(image, through, wanted, name, "the square", from.Mark.Line, through.Point)
            : LayProved(through, image, wanted, name, "the square", from.Mark.Line, through.Point);
        return from.IsReversed ? square.Reversed() : square;
    }

    // One opening: about the point across the line twice, then about both crossings; the arcs meet again in the mirror image.
    private (CircleMark First, CircleMark Second) RhombusArcs(DirectedLine line, PointMark point)
    {
        double offset = Math.Abs((line.Mark.Line.SideOf(point.Point) / line.Mark.Line.DirectionLength).ToDouble());
        FreeOpening opening = Free(offset * 1.4, offset + 1);
        CircleMark across = bench.Swing(point, opening, null);
        (PointMark first, PointMark second) = CrossBoth(line.Mark, across);
        return (bench.Swing(first, opening, null), bench.Swing(second, opening, null));
    }

    // One opening: about the point across the line, along the line, and back: the four are a rhombus.
    private DirectedLine ParallelByRhombus(DirectedLine along, PointMark through, string? name)
    {
        Line line = along.Mark.Line;
        (FreeOpening opening, int across, int onward) = BestRhombus(line, through.Point);
        CircleMark first = bench.Swing(through, opening, null);
        PointMark here = CrossWhere(along.Mark, first, point => Decider.Sign(line.Along(point, through.Point)) == across);
        CircleMark second = bench.Swing(here, opening, null, through);
        PointMark there = CrossWhere(along.Mark, second, point => Decider.Sign(line.Along(point, here.Point)) == onward);
        CircleMark third = bench.Swing(there, opening, null, here);
        Point wantedCorner = through.Point.Plus(there.Point.From(here.Point));
        PointMark corner = CrossProved(first, third, wantedCorner, null, "the parallel", line, through.Point);
        Line wanted = line.ParallelThrough(through.Point);
        DirectedLine parallel = onward > 0
            ? LayProved(through, corner, wanted, name, "the parallel", line, through.Point)
            : LayProved(corner, through, wanted, name, "the parallel", line, through.Point);
        return along.IsReversed ? parallel.Reversed() : parallel;
    }

    // The opening and the two ways along the line that keep the corners on the stock and cross most squarely.
    private (FreeOpening Opening, int Across, int Onward) BestRhombus(Line line, Point from)
    {
        double length = line.DirectionLength.ToDouble();
        double dx = line.Direction.X.ToDouble() / length, dy = line.Direction.Y.ToDouble() / length;
        double offset = line.SideOf(from).ToDouble() / length;
        double footX = from.X.Near() + (offset * dy), footY = from.Y.Near() - (offset * dx);
        (FreeOpening Opening, int Across, int Onward) best = default;
        double least = double.MaxValue;
        foreach (double factor in (ReadOnlySpan<double>)[1.15, 1.25, 1.4, 1.7, 2.2])
        {
            FreeOpening opening = Free(Math.Max(Math.Abs(offset) * factor, Diagonal / 8), Math.Abs(offset) + 1);
            double radius = opening.Chosen.ToDouble(), reach = Math.Sqrt(Math.Max(0, (radius * radius) - (offset * offset)));
            double slant = Math.Min(reach, Math.Abs(offset)) / radius;
            foreach ((int across, int onward) in (ReadOnlySpan<(int, int)>)[(-1, 1), (1, -1), (1, 1), (-1, -1)])
            {
                double cost = Outside(footX + (across * reach * dx), footY + (across * reach * dy))
                    + Outside(footX + (((across * reach) + (onward * radius)) * dx), footY + (((across * reach) + (onward * radius)) * dy))
                    + Outside(from.X.Near() + (onward * radius * dx), from.Y.Near() + (onward * radius * dy))
                    - slant;
                if (cost < least)
                    (least, best) = (cost, (opening, across, onward));
            }
        }

        return best;
    }

    // How far a place lies off the room, millimetres.
    private double Outside(double x, double y) =>
        Math.Max(0, Math.Abs(x) - (room.Width.ToDouble() / 2)) + Math.Max(0, Math.Abs(y) - (room.Height.ToDouble() / 2));
}
