using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;
using Vector = RuleAndCompass.Geometry.Vector;

namespace RuleAndCompass.Making.Wants;

/// <content>Angles and directions.</content>
internal sealed partial class Constructions
{
    // Finer halves of 60° than this are no work for dividers.
    private const int MostHalvings = 5;

    /// <summary>Through a mark, as a line runs, turned anticlockwise by an angle.</summary>
    public DirectedLine Turned(DirectedLine from, PointMark through, Angle by, string? name, ByTool? tool = null)
    {
        Line wanted = from.Line.TurnedThrough(through.Point, by);
        if (bench.Standing(wanted) is { } standing)
            return standing;
        Need(tool, ByTool.Protractor, Kit.Protractor);
        Need(tool, ByTool.Scale, Kit.ScaleStep is not null);
        Need(tool, ByTool.Dividers, HasDividers);
        if (by.TryGetDegrees(out Rational degrees) && tool is null)
        {
            Rational quarters = degrees / 90;
            if (quarters.IsInteger)
                return (int)(((quarters.Numerator % 4) + 4) % 4) switch
                {
                    0 => Parallel(from, through, name),
                    1 => Square(from, through, name),
                    2 => Parallel(from, through, name).Reversed(),
                    _ => Square(from, through, name).Reversed(),
                };
        }

        DirectedLine basis = Holds(from.Mark.Line, through) ? from : Parallel(from, through, null);
        if (tool == ByTool.Protractor || (tool is null && Kit.Protractor))
            return bench.Protract(basis, through, by, name);
        if (HasDividers && Kit.HasStraightedge && tool is null or ByTool.Dividers && PartOfSixty(by) is { } part)
            return TurnedByHalves(basis, through, by, part, name);
        if (HasDividers && Kit.HasStraightedge && tool is null or ByTool.Scale && Kit.ScaleStep is not null)
            return TurnedByChord(basis, through, by, name);
        throw NoTool($"an angle of {by.ToDegreesDouble():0.##}°", "`protractor`, or `dividers` and `scale`");
    }

    /// <summary>Through a mark, in a direction of the sheet: anticlockwise from right.</summary>
    public DirectedLine Toward(PointMark through, Angle direction, string? name, ByTool? tool = null)
    {
        Vector way = direction.HasExactDirection ? Unscaled(direction) : new(direction.Cosine, direction.Sine);
        Line wanted = Line.Along(through.Point, way);
        if (bench.Standing(wanted) is { } standing)
            return standing;
        // What is drawn already serves as the sheet's edge where the new line is square or parallel to it.
        if (bench.Marks.FindParallel(way.QuarterTurn) is { } plumb && CanSquare(new(plumb, false), through))
        {
            DirectedLine line = new(plumb, false);
            return Decider.Sign(Vector.Cross(line.Direction, way)) > 0 ? Square(line, through, name, tool) : Square(line.Reversed(), through, name, tool);
        }

        if (bench.Marks.FindParallel(way) is { } level && CanParallel())
        {
            DirectedLine line = new(level, false);
            return Decider.Sign(Vector.Dot(line.Direction, way)) > 0 ? Parallel(line, through, name, tool) : Parallel(line.Reversed(), through, name, tool);
        }

        if (!Kit.HasStraightedge)
            throw NoTool("a line in a direction", "`straightedge`");
        double degrees = direction.ToDegreesDouble() * Math.PI / 180;
        double reach = Reach(through.Point, Math.Cos(degrees), Math.Sin(degrees));
        Rational distance = Rational.FromDouble(Math.Max(1, Math.Floor(reach)));
        Point aim = through.Point.Plus((distance / Real.Sqrt(wanted.DirectionSquared)) * way);
        PointMark aimed = bench.Locate(aim, null, AimedWords(through, aim), through);
        return bench.Lay(through, aimed, name, wanted);
    }

    private bool CanSquare(DirectedLine line, PointMark through) =>
        Kit.Square || (HasDividers && Kit.HasStraightedge) || (Kit.Protractor && Holds(line.Mark.Line, through));

    private bool CanParallel() => Kit.Square || (HasDividers && Kit.HasStraightedge);

    // How far the room goes on that way, at most a third of it: a long base, still well on the stock.
    private double Reach(Point from, double dx, double dy)
    {
        double across = dx > 0 ? (room.Width.ToDouble() / 2) - from.X.Near() : (room.Width.ToDouble() / 2) + from.X.Near();
        double up = dy > 0 ? (room.Height.ToDouble() / 2) - from.Y.Near() : (room.Height.ToDouble() / 2) + from.Y.Near();
        double reach = Math.Min(Math.Abs(dx) < 1e-9 ? double.MaxValue : across / Math.Abs(dx), Math.Abs(dy) < 1e-9 ? double.MaxValue : up / Math.Abs(dy));
        double longest = Math.Min(Diagonal / 2, (Kit.Straightedge?.ToDouble() ?? double.MaxValue) * 0.9);
        return Math.Clamp(reach * 0.8, 10, Math.Max(10, longest));
    }

    private static Vector Unscaled(Angle direction)
    {
        (Real x, Real y) = direction.Vector;
        return new(x, y);
    }

    // By how many parts of 60°/2^n the angle is, within a turn; null where it is no such part.
    private static Rational? PartOfSixty(Angle by)
    {
        if (!by.TryGetDegrees(out Rational degrees))
            return null;
        Rational part = degrees / 60;
        return (1 << MostHalvings) % part.Denominator == 0 && part.Abs() < 6 ? part : null;
    }

    private DirectedLine TurnedByHalves(DirectedLine basis, PointMark through, Angle by, Rational part, string? name)
    {
        FreeOpening opening = Free(Diagonal / 8);
        CircleMark ring = bench.Swing(through, opening, null);
        Vector ahead = basis.Direction;
        Dictionary<Rational, PointMark> marks = new()
        {
            [Rational.Zero] = CrossWhere(basis.Mark, ring, point => Decider.Sign(Vector.Dot(ahead, point.From(through.Point))) > 0),
        };
        PointMark aim = At(part);
        return LayProved(through, aim, basis.Line.TurnedThrough(through.Point, by), name, "the angle", basis.Mark.Line, through.Point);

        PointMark At(Rational where)
        {
            if (marks.TryGetValue(where, out PointMark? standing))
                return standing;
            if (where.IsInteger)
            {
                // The radius steps round its own circle in sixths.
                PointMark before = At(where - where.Sign);
                CircleMark step = bench.Swing(before, opening, null, through);
                Vector spoke = before.Point.From(through.Point);
                return marks[where] = CrossWhere(ring, step, point => Decider.Sign(Vector.Cross(spoke, point.From(through.Point))) == where.Sign);
            }

            Rational half = new(1, where.Denominator);
            PointMark low = At(where - half), high = At(where + half);
            DirectedLine between = HalvingAngle(low, through, high, null);
            Vector into = between.Direction;
            return marks[where] = CrossWhere(between.Mark, ring, point => Decider.Sign(Vector.Dot(into, point.From(through.Point))) > 0);
        }
    }

    private DirectedLine TurnedByChord(DirectedLine basis, PointMark through, Angle by, string? name)
    {
        // From the side that is nearer, so that the chord crosses its circle squarely.
        double degrees = Math.IEEERemainder(by.ToDegreesDouble(), 360);
        bool behind = Math.Abs(degrees) > 90;
        Angle turn = behind ? by - Angle.FromDegrees(degrees > 0 ? 180 : -180) : by;
        double turns = Math.Round(turn.ToDegreesDouble() / 360);
        turn -= Angle.FromDegrees(360 * Rational.FromDouble(turns));
        FreeOpening opening = Free(Diagonal / 4);
        CircleMark ring = bench.Swing(through, opening, null);
        Vector ahead = behind ? -basis.Direction : basis.Direction;
        PointMark start = CrossWhere(basis.Mark, ring, point => Decider.Sign(Vector.Dot(ahead, point.From(through.Point))) > 0);
        Real chord = 2 * opening.Length * (new Rational(1, 2) * turn).Sine;
        if (Decider.Sign(chord) < 0)
            chord = -chord;
        CircleMark swung = bench.Swing(start, ByScale(chord), null);
        int side = turn.ToDegreesDouble() > 0 ? 1 : -1;
        PointMark aim = CrossWhere(ring, swung, point => Decider.Sign(Vector.Cross(ahead, point.From(through.Point))) == side);
        return LayProved(through, aim, basis.Line.TurnedThrough(through.Point, by), name, "the angle", basis.Mark.Line, through.Point);
    }
}
