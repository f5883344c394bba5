using RuleAndCompass.Geometry;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Bench;

/// <summary>
/// Finds the mark that already stands where a new one is wanted. Doubles sort the marks into cells so that few are looked at;
/// whether two figures are the same is decided exactly.
/// </summary>
internal sealed class MarkIndex(Decider decider)
{
    // Far coarser than the error of the doubles and far finer than marks at a bench: it only bounds the candidates.
    private const double CellMillimetres = 1e-6;
    private const double CellRadians = 1e-7;
    private const double HalfTurnCells = Math.PI / CellRadians;

    private readonly Dictionary<(long X, long Y), List<PointMark>> points = [];
    private readonly Dictionary<(long Turn, long Offset), List<LineMark>> lines = [];
    private readonly Dictionary<long, LineMark> directions = [];
    private readonly Dictionary<(long X, long Y), List<CircleMark>> circles = [];

    public void Add(Mark mark)
    {
        switch (mark)
        {
            case PointMark point:
                AddTo(points, Cell(point.Point), point);
                break;
            case LineMark line:
                AddTo(lines, Cell(line.Line), line);
                directions.TryAdd(Cell(line.Line.Direction), line);
                break;
            case CircleMark circle:
                AddTo(circles, Cell(circle.Circle.Centre), circle);
                break;
        }
    }

    public PointMark? Find(Point wanted)
    {
        foreach ((long X, long Y) cell in Around(Cell(wanted)))
            if (points.TryGetValue(cell, out List<PointMark>? here))
                foreach (PointMark mark in here)
                    if (IsSame(mark.Point, wanted))
                        return mark;
        return null;
    }

    public LineMark? Find(Line wanted)
    {
        foreach ((long turn, long offset) in Around(Cell(wanted)))
        {
            // Past half a turn the same line is seen from its other end.
            bool wraps = turn != Wrapped(turn);
            if (lines.TryGetValue((Wrapped(turn), wraps ? -offset - 1 : offset), out List<LineMark>? here))
                foreach (LineMark mark in here)
                    if (IsSame(mark.Line, wanted))
                        return mark;
        }

        return null;
    }

    public CircleMark? Find(Circle wanted)
    {
        foreach ((long X, long Y) cell in Around(Cell(wanted.Centre)))
            if (circles.TryGetValue(cell, out List<CircleMark>? here))
                foreach (CircleMark mark in here)
                    if (IsNear(mark.Circle.RadiusSquared, wanted.RadiusSquared)
                        && (ReferenceEquals(mark.Circle.RadiusSquared, wanted.RadiusSquared) || IsZero(mark.Circle.RadiusSquared - wanted.RadiusSquared))
                        && IsSame(mark.Circle.Centre, wanted.Centre))
                        return mark;
        return null;
    }

    /// <summary>The first drawn line that runs along <paramref name="way"/> or against it; null where none does.</summary>
    public LineMark? FindParallel(Vector way)
    {
        long cell = Cell(way);
        for (long near = cell - 1; near <= cell + 1; near++)
            if (directions.TryGetValue(Wrapped(near), out LineMark? mark) && IsZero(Vector.Cross(mark.Line.Direction, way)))
                return mark;
        return null;
    }

    /// <summary>True where both are proved to be one point; one that cannot be decided counts as another.</summary>
    public bool IsSame(Point a, Point b) => ReferenceEquals(a, b) || (IsNear(a.X, b.X) && IsNear(a.Y, b.Y) && IsZero(a.X - b.X) && IsZero(a.Y - b.Y));

    private bool IsSame(Line a, Line b)
    {
        double ax = a.Direction.X.Near(), ay = a.Direction.Y.Near();
        double sx = b.Start.X.Near() - a.Start.X.Near(), sy = b.Start.Y.Near() - a.Start.Y.Near();
        if (Math.Abs((ax * sy) - (ay * sx)) > CellMillimetres * 10 * Math.Sqrt((ax * ax) + (ay * ay)) * Math.Max(1, Math.Sqrt((sx * sx) + (sy * sy))))
            return false;
        int shared = b.Holds.Count(a.IsKnownToHold);
        if (shared >= 2)
            return true;
        return IsZero(Vector.Cross(a.Direction, b.Direction)) && (shared == 1 || a.IsKnownToHold(b.Start) || IsZero(a.SideOf(b.Start)));
    }

    private bool IsZero(Real value)
    {
        Decision decision = decider.Decide(value);
        return decision.IsZero;
    }

    private static bool IsNear(Real a, Real b)
    {
        double first = a.Near(), second = b.Near();
        return Math.Abs(first - second) <= CellMillimetres * Math.Max(1, Math.Abs(first));
    }

    private static (long X, long Y) Cell(Point point) => ((long)Math.Floor(point.X.Near() / CellMillimetres), (long)Math.Floor(point.Y.Near() / CellMillimetres));

    private static (long Turn, long Offset) Cell(Line line)
    {
        (double dx, double dy) = Upward(line.Direction);
        double offset = ((dx * line.Start.Y.Near()) - (dy * line.Start.X.Near())) / Math.Sqrt((dx * dx) + (dy * dy));
        return (Cell(line.Direction), (long)Math.Floor(offset / CellMillimetres));
    }

    private static long Cell(Vector way)
    {
        (double dx, double dy) = Upward(way);
        return Wrapped((long)Math.Floor(Math.Atan2(dy, dx) / CellRadians));
    }

    // Of the two ways a line runs, the one in the upper half plane.
    private static (double Dx, double Dy) Upward(Vector way)
    {
        double dx = way.X.Near(), dy = way.Y.Near();
        return dy < 0 || (dy == 0 && dx < 0) ? (-dx, -dy) : (dx, dy);
    }

    private static long Wrapped(long cell)
    {
        long whole = (long)HalfTurnCells;
        return ((cell % whole) + whole) % whole;
    }

    private static IEnumerable<(long X, long Y)> Around((long X, long Y) cell)
    {
        for (long x = cell.X - 1; x <= cell.X + 1; x++)
            for (long y = cell.Y - 1; y <= cell.Y + 1; y++)
                yield return (x, y);
    }

    private static void AddTo<TKey, TMark>(Dictionary<TKey, List<TMark>> cells, TKey cell, TMark mark)
        where TKey : notnull
    {
        if (!cells.TryGetValue(cell, out List<TMark>? here))
            cells.Add(cell, here = []);
        here.Add(mark);
    }
}
