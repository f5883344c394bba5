using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making.Wants;

/// <content>Points round circles, and lines divided.</content>
internal sealed partial class Constructions
{
    /// <summary>Where a spoke meets its circle, ahead of the centre.</summary>
    public PointMark OnSpoke(DirectedLine spoke, PointMark centre, CircleMark circle, string? name)
    {
        Vector way = spoke.Direction;
        return CrossWhere(spoke.Mark, circle, point => Decider.Sign(Vector.Dot(way, point.From(centre.Point))) > 0, name);
    }

    /// <summary>The mark as far beyond a centre as another lies before it.</summary>
    public PointMark Opposite(PointMark of, PointMark about, string? name)
    {
        Point wanted = about.Point.Plus(about.Point.From(of.Point));
        if (bench.Marks.Find(wanted) is { } standing)
            return standing;
        if (!HasDividers)
            throw NoTool("the opposite of a point", "`dividers`");
        DirectedLine line = Through(of, about, null);
        CircleMark swung = bench.Swing(about, new SpanOpening(about, of), null);
        Vector beyond = about.Point.From(of.Point);
        return CrossWhere(line.Mark, swung, point => Decider.Sign(Vector.Dot(beyond, point.From(about.Point))) > 0, name);
    }

    /// <summary>The mark on a circle, turned anticlockwise by an angle from another.</summary>
    public PointMark TurnedOn(CircleMark circle, PointMark centre, PointMark from, Angle by, string? name, ByTool? tool)
    {
        Point wanted = centre.Point.Plus(from.Point.From(centre.Point).Turned(by));
        if (bench.Marks.Find(wanted) is { } standing)
            return standing;
        if (by.TryGetDegrees(out Rational degrees) && tool is null or ByTool.Dividers && HasDividers && degrees.Abs() == 60)
            return StepRound(circle, centre, from, new SpanOpening(centre, from), degrees.Sign > 0, name);
        bool chord = tool == ByTool.Scale || (tool is null && !Kit.Protractor && Kit.ScaleStep is not null && HasDividers);
        if (chord && by.HasExactDirection && Math.Abs(Math.IEEERemainder(by.ToDegreesDouble(), 360)) < 179)
        {
            Real span = 2 * circle.Circle.Radius * (new Rational(1, 2) * by).Sine;
            Need(tool, ByTool.Scale, Kit.ScaleStep is not null);
            CircleMark swung = bench.Swing(from, ByScale(Decider.Sign(span) < 0 ? -span : span), null);
            return CrossProved(circle, swung, wanted, name, "the turned point", centre.Point, from.Point, circle.Circle);
        }

        DirectedLine spoke = Through(centre, from, null);
        DirectedLine turned = Turned(spoke, centre, by, null, tool);
        return OnSpoke(turned, centre, circle, name);
    }

    /// <summary>One step of the dividers round a circle.</summary>
    public PointMark StepRound(CircleMark circle, PointMark centre, PointMark from, Opening opening, bool anticlockwise, string? name)
    {
        if (!HasDividers)
            throw NoTool("steps round a circle", "`dividers`");
        CircleMark swung = bench.Swing(from, opening, null, opening is SpanOpening && ReferenceEquals(opening.Squared, circle.Circle.RadiusSquared) ? [centre] : []);
        Vector spoke = from.Point.From(centre.Point);
        int side = anticlockwise ? 1 : -1;
        return CrossWhere(circle, swung, point => Decider.Sign(Vector.Cross(spoke, point.From(centre.Point))) == side, name);
    }

    /// <summary>Equal parts of the way between two marks: the marks at either end and those between.</summary>
    public IReadOnlyList<PointMark> Dividing(PointMark from, PointMark to, int parts, Func<int, string> nameOf)
    {
        Vector whole = to.Point.From(from.Point);
        PointMark?[] marks = new PointMark?[parts + 1];
        (marks[0], marks[parts]) = (from, to);
        Halve(0, parts);
        if (marks.Any(mark => mark is null))
            Aslant();
        return marks!;

        // Halving is the surest, as long as the count is even.
        void Halve(int low, int high)
        {
            if ((high - low) % 2 != 0 || marks[low] is not { } a || marks[high] is not { } b)
                return;
            int middle = (low + high) / 2;
            marks[middle] = Midway(a, b, nameOf(middle));
            Halve(low, middle);
            Halve(middle, high);
        }

        // Equal steps on a line aslant, and parallels to the line that closes the last (Euclid VI.9).
        void Aslant()
        {
            DirectedLine line = Through(from, to, null);
            DirectedLine slant = Slanted(from, whole);
            double step = Math.Max(1, Math.Round(from.Point.DistanceTo(to.Point).ToDouble() / parts));
            FreeOpening opening = Free(step);
            List<PointMark> steps = [from];
            for (int part = 1; part <= parts; part++)
                steps.Add(AlongLine(slant, steps[^1], opening, true, null));
            DirectedLine close = Through(steps[^1], to, null);
            for (int part = 1; part < parts; part++)
                if (marks[part] is null)
                {
                    DirectedLine across = Parallel(close, steps[part], null);
                    Point wanted = from.Point.Plus(new Rational(part, parts) * whole);
                    marks[part] = bench.Marks.Find(wanted) ?? CrossProved(line.Mark, across.Mark, wanted, nameOf(part), "an equal part", from.Point, to.Point);
                }
        }
    }

    /// <summary>The corners of a regular figure about a centre, the first where the mark is.</summary>
    public IReadOnlyList<PointMark> Round(PointMark centre, PointMark from, int corners, bool anticlockwise, Func<int, string> nameOf, ByTool? tool)
    {
        CircleMark ring = bench.Swing(centre, new SpanOpening(centre, from), null);
        List<PointMark> marks = [from];
        Angle step = Angle.FromDegrees(new Rational(anticlockwise ? 360 : -360, corners));
        for (int corner = 1; corner < corners; corner++)
            marks.Add(NextCorner(corner));
        return marks;

        PointMark NextCorner(int corner)
        {
            string name = nameOf(corner);
            if (6 % corners == 0 && tool is null or ByTool.Dividers && HasDividers)
            {
                // The radius steps six times round its circle (Euclid IV.15); a triangle takes every second step.
                PointMark at = marks[^1];
                for (int sixth = 0; sixth < 6 / corners; sixth++)
                    at = StepRound(ring, centre, at, new SpanOpening(centre, from), anticlockwise, sixth == (6 / corners) - 1 ? name : null);
                return at;
            }

            if (corners % 2 == 0 && corner >= corners / 2)
                return Opposite(marks[corner - (corners / 2)], centre, name);
            if (corners == 4)
            {
                DirectedLine spoke = Square(Through(centre, from, null), centre, null, tool == ByTool.Scale ? null : tool);
                return OnSpoke(anticlockwise ? spoke : spoke.Reversed(), centre, ring, name);
            }

            return TurnedOn(ring, centre, from, (Rational)corner * step, name, tool);
        }
    }

    // A line through the mark well aslant of the way to be divided, by a point measured on the stock.
    private DirectedLine Slanted(PointMark from, Vector whole)
    {
        double dx = whole.X.ToDouble(), dy = whole.Y.ToDouble(), length = Math.Sqrt((dx * dx) + (dy * dy));
        double reach = Math.Min(length, Diagonal / 3);
        // Turned by about 40° towards the middle of the stock, in whole millimetres.
        double side = (dx * -from.Point.Y.Near()) - (dy * -from.Point.X.Near()) >= 0 ? 1 : -1;
        double turn = side * 40 * Math.PI / 180;
        double x = Math.Round(reach * ((dx * Math.Cos(turn)) - (dy * Math.Sin(turn))) / length), y = Math.Round(reach * ((dx * Math.Sin(turn)) + (dy * Math.Cos(turn))) / length);
        Point aim = from.Point.Plus(new(Rational.FromDouble(x), Rational.FromDouble(y)));
        return bench.Lay(from, bench.Locate(aim, null, AimedWords(from, aim), from), null);
    }
}
