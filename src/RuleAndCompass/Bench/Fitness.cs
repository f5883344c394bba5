using System.Collections.Immutable;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Bench;

/// <summary>A rectangle about the origin: the sheet, or the board it lies on. Millimetres.</summary>
internal readonly record struct BenchArea(Rational Width, Rational Height);

/// <summary>An arc of what is kept; the whole circle where it has no ends.</summary>
internal sealed record KeptArc(Point Centre, Real Radius, Point? From, Point? To, bool Clockwise);

/// <summary>Something kept, as far as its room on the sheet goes.</summary>
/// <param name="Name">As the report calls it.</param>
/// <param name="Mark">Of which it is a part, where it is of one.</param>
/// <param name="Ends">Points and ends of straight pieces and arcs.</param>
/// <param name="Arcs">Which may reach beyond their ends.</param>
internal sealed record KeptShape(string Name, Mark? Mark, ImmutableArray<Point> Ends, ImmutableArray<KeptArc> Arcs, SourceSpan Span, string? File);

/// <summary>What a layout asks of the bench.</summary>
internal sealed record BenchWork(ImmutableArray<Act> Acts, Kit Kit, BenchArea Sheet, BenchArea? Board, ImmutableArray<KeptShape> Kept);

/// <summary>
/// Whether a sequence of acts fits the bench: sheet and board, reach of the dividers, length of the straightedge, squareness of crossings,
/// length of bases, distance of pricks. Each is decided exactly: doubles settle what is clear of a limit, the decider what is near it.
/// </summary>
internal sealed class Fitness
{
    // Coordinates and lengths are doubles next to the exact value, and none is above some metres: what lies farther from a limit than this
    // is surely on its side.
    private const double ClearMillimetres = 1e-6;
    private const double ClearDegrees = 1e-6;

    private const int WeakDegrees = 15;
    private const int VeryWeakDegrees = 5;
    private const int ShortBaseShare = 20;
    private static readonly Rational TooNear = new(1, 2);

    private readonly BenchWork work;
    private readonly Decider decider;
    private readonly List<Diagnostic> findings = [];
    private readonly ImmutableDictionary<LineMark, LineUse> uses;
    private readonly HashSet<Mark> used = [];
    private readonly Dictionary<LineMark, PointMark> starts = [];

    private Fitness(BenchWork work, Decider decider)
    {
        this.work = work;
        this.decider = decider;
        uses = LineUse.Of(work.Acts, work.Kept.SelectMany(kept => kept.Mark is null ? [] : kept.Ends.Select(end => new KeptEnd(kept.Mark, end))));
        foreach (Act act in work.Acts)
            Note(act);
        foreach (KeptShape kept in work.Kept)
        {
            if (kept.Mark is not null)
                used.Add(kept.Mark);
        }
    }

    /// <summary>Finds what does not fit, in the order of the acts, then of what is kept. All are warnings.</summary>
    public static ImmutableArray<Diagnostic> Inspect(BenchWork work, Decider decider, CancellationToken cancellation = default)
    {
        Fitness fitness = new(work, decider);
        Dictionary<(long X, long Y), List<(PointMark Mark, Act Act)>> pricked = [];
        foreach (Act act in work.Acts)
        {
            cancellation.ThrowIfCancellationRequested();
            fitness.Inspect(act, pricked);
        }

        foreach (KeptShape kept in work.Kept)
            fitness.InspectRoom(kept);
        return [.. fitness.findings];
    }

    private void Note(Act act)
    {
        switch (act)
        {
            case Locate { From: { } from }:
                used.Add(from);
                break;
            case Lay lay:
                used.Add(lay.First);
                used.Add(lay.Second);
                starts[lay.Line] = lay.First;
                break;
            case SetOpening { Opening: SpanOpening span }:
                used.Add(span.First);
                used.Add(span.Second);
                break;
            case Swing swing:
                used.Add(swing.Centre);
                break;
            case Protract protract:
                used.Add(protract.At);
                starts[protract.Line] = protract.At;
                break;
            case Slide slide:
                used.Add(slide.Through);
                starts[slide.Line] = slide.Through;
                break;
            default:
                break;
        }
    }

    private void Inspect(Act act, Dictionary<(long X, long Y), List<(PointMark Mark, Act Act)>> pricked)
    {
        switch (act)
        {
            case Lay lay:
                InspectLine(lay);
                break;
            case SetOpening set:
                InspectOpening(set);
                break;
            case Cross cross when IsNeeded(cross.Point):
                InspectCrossing(cross);
                break;
            default:
                break;
        }

        if (act.Makes is PointMark point && IsNeeded(point))
        {
            InspectRoom(act, point);
            InspectNeighbours(act, point, pricked);
        }
    }

    // A sentence names it, or an act or a keep uses it.
    private bool IsNeeded(PointMark point) => !point.IsAuxiliary || used.Contains(point);

    private void InspectRoom(Act act, PointMark point)
    {
        if (Off(point.Point.X, point.Point.Y, work.Board ?? work.Sheet) is { } off)
            findings.Add(BenchFindings.PointOff(act, point.Name, work.Board is not null, off.Millimetres, off.Side));
    }

    private void InspectRoom(KeptShape kept)
    {
        (double Millimetres, string Side)? worst = null;
        foreach (Point end in kept.Ends)
            Include(Off(end.X, end.Y, work.Sheet));
        foreach (KeptArc arc in kept.Arcs)
        {
            foreach ((int x, int y) in new[] { (1, 0), (-1, 0), (0, 1), (0, -1) })
            {
                if (Reaches(arc, x, y))
                    Include(Off(arc.Centre.X + x * arc.Radius, arc.Centre.Y + y * arc.Radius, work.Sheet));
            }
        }

        if (worst is { } most)
            findings.Add(BenchFindings.KeptOff(kept.Name, most.Millimetres, most.Side, kept.Span, kept.File));

        void Include((double Millimetres, string Side)? off)
        {
            if (off is { } found && !(worst?.Millimetres >= found.Millimetres))
                worst = found;
        }
    }

    // Whether the arc passes its circle's utmost point in a direction; where that is an end, the ends tell it.
    private static bool Reaches(KeptArc arc, int x, int y)
    {
        if (arc.From is null || arc.To is null)
            return true;

        double from = Turn(arc.From);
        double to = Turn(arc.To);
        double sweep = arc.Clockwise ? from - to : to - from;
        double at = arc.Clockwise ? from : -from;
        return Positive(at) <= Positive(sweep);

        // Anticlockwise from the direction asked about.
        double Turn(Point end)
        {
            double dx = end.XMillimetres - arc.Centre.XMillimetres;
            double dy = end.YMillimetres - arc.Centre.YMillimetres;
            return Math.Atan2(x * dy - y * dx, x * dx + y * dy);
        }

        static double Positive(double turn) => turn < 0 ? turn + Math.Tau : turn;
    }

    private (double Millimetres, string Side)? Off(Real x, Real y, BenchArea area)
    {
        Rational halfWidth = area.Width / 2;
        Rational halfHeight = area.Height / 2;
        (double Millimetres, string Side)? worst = null;
        foreach ((Real place, Rational limit, string side) in new[] { (x, halfWidth, "right"), (-x, halfWidth, "left"), (y, halfHeight, "upper"), (-y, halfHeight, "lower") })
        {
            double by = place.ToDouble() - limit.ToDouble();
            if (!(worst?.Millimetres >= by) && IsOver(by, ClearMillimetres, () => place - limit))
                worst = (by, side);
        }

        return worst;
    }

    private void InspectOpening(SetOpening set)
    {
        Real opening = set.Opening.Length;
        double millimetres = opening.ToDouble();
        // Without any of the two nothing is set: such a want is refused before it comes to acts.
        if ((set.Beam ? work.Kit.Beam : work.Kit.Dividers ?? work.Kit.Beam) is not { } reach)
            return;

        bool isTooWide = IsOver(millimetres - reach.Greatest.ToDouble(), ClearMillimetres, () => opening - reach.Greatest);
        if (isTooWide || IsOver(reach.Least.ToDouble() - millimetres, ClearMillimetres, () => reach.Least - opening))
            findings.Add(BenchFindings.OpeningOutsideReach(set, set.Beam ? "beam compass" : "dividers", millimetres, reach, isTooWide, work.Kit.Beam is not null));
    }

    private void InspectLine(Lay lay)
    {
        LineUse use = uses[lay.Line];
        if (work.Kit.Straightedge is { } edge
            && IsOver(use.Length - edge.ToDouble(), ClearMillimetres, () => use.First.SquaredDistanceTo(use.Last) - edge * edge))
        {
            findings.Add(BenchFindings.LineTooLong(lay, lay.Line.Name, use.Length, edge.ToDouble()));
        }

        double apart = double.Hypot(
            lay.Second.Point.XMillimetres - lay.First.Point.XMillimetres, lay.Second.Point.YMillimetres - lay.First.Point.YMillimetres);
        if (IsOver(
            use.Length - ShortBaseShare * apart,
            ShortBaseShare * ClearMillimetres,
            () => use.First.SquaredDistanceTo(use.Last) - ShortBaseShare * ShortBaseShare * lay.First.Point.SquaredDistanceTo(lay.Second.Point)))
        {
            findings.Add(BenchFindings.ShortBase(lay, lay.Line.Name, lay.First.Name, lay.Second.Name, apart, use.Length));
        }
    }

    private void InspectCrossing(Cross cross)
    {
        Curve first = (Curve)cross.First.Figure;
        Curve second = (Curve)cross.Second.Figure;
        double degrees = CrossingAngle.Degrees(first, second, cross.Point.Point);
        if (!IsUnder(WeakDegrees))
            return;

        findings.Add(BenchFindings.WeakCrossing(
            cross, cross.Point.Name, cross.First.Name, cross.Second.Name, degrees, Mend(cross, first, second, IsUnder(VeryWeakDegrees))));

        bool IsUnder(int limit) => IsOver(limit - degrees, ClearDegrees, () =>
        {
            Vector a = Tangent(first, cross.Point.Point);
            Vector b = Tangent(second, cross.Point.Point);
            Real across = Vector.Cross(a, b);
            Real sine = Angle.FromDegrees(limit).Sine;
            return sine * sine * a.SquaredLength * b.SquaredLength - across * across;
        });
    }

    private static Vector Tangent(Curve curve, Point at) => curve switch
    {
        Line line => line.Direction,
        Circle circle => at.From(circle.Centre).QuarterTurn,
        _ => throw new System.Diagnostics.UnreachableException($"No tangent of {curve.GetType().Name}."),
    };

    private string Mend(Cross cross, Curve first, Curve second, bool isVeryWeak)
    {
        LineMark? along = cross.First as LineMark ?? cross.Second as LineMark;
        string measured = along is not null && starts.TryGetValue(along, out PointMark? start)
            ? $"measure it along `{along.Name}` instead, {BenchFindings.Millimetres(DistanceBetween(start.Point, cross.Point.Point))} from `{start.Name}`"
            : "prick it with a third curve that crosses one of them squarely";
        if (isVeryWeak)
            return measured;
        return (first, second) switch
        {
            (Line, Line) => $"find a line that crosses `{cross.First.Name}` more squarely, or {measured}",
            (Circle a, Circle b) => DistanceBetween(a.Centre, b.Centre) > Math.Max(a.Radius.ToDouble(), b.Radius.ToDouble())
                ? "larger openings cross more squarely"
                : "openings nearer to each other cross more squarely",
            (Line line, Circle circle) => Wider(line, circle),
            (Circle circle, Line line) => Wider(line, circle),
            _ => measured,
        };
    }

    // A line at the distance h from the centre is crossed at 15° by the radius h / cos 15°.
    private static string Wider(Line line, Circle circle)
    {
        double height = Math.Abs(line.SideOf(circle.Centre).ToDouble() / line.DirectionLength.ToDouble());
        return $"an opening over {BenchFindings.Millimetres(Math.Ceiling(height / Math.Cos(double.DegreesToRadians(WeakDegrees))))} crosses it more squarely";
    }

    private void InspectNeighbours(Act act, PointMark point, Dictionary<(long X, long Y), List<(PointMark Mark, Act Act)>> pricked)
    {
        // Cells of a millimetre: whatever is within half of one lies in this cell or the next.
        long x = (long)Math.Floor(point.Point.XMillimetres);
        long y = (long)Math.Floor(point.Point.YMillimetres);
        (PointMark Mark, Act Act, double Apart)? nearest = null;
        for (long cellX = x - 1; cellX <= x + 1; cellX++)
        {
            for (long cellY = y - 1; cellY <= y + 1; cellY++)
            {
                foreach ((PointMark other, Act otherAct) in pricked.GetValueOrDefault((cellX, cellY), []))
                {
                    double apart = DistanceBetween(point.Point, other.Point);
                    if (!(nearest?.Apart <= apart) && !IsOver(
                        apart - TooNear.ToDouble(), ClearMillimetres, () => point.Point.SquaredDistanceTo(other.Point) - TooNear * TooNear))
                    {
                        nearest = (other, otherAct, apart);
                    }
                }
            }
        }

        if (nearest is { } near)
            findings.Add(BenchFindings.PointsTooNear(act, point.Name, near.Mark.Name, near.Act.Number, near.Apart));
        if (!pricked.TryGetValue((x, y), out List<(PointMark, Act)>? here))
            pricked.Add((x, y), here = []);
        here.Add((point, act));
    }

    private static double DistanceBetween(Point first, Point second) =>
        double.Hypot(second.XMillimetres - first.XMillimetres, second.YMillimetres - first.YMillimetres);

    // By doubles where clear of zero, else exactly. What can't be decided is not said to be over.
    private bool IsOver(double by, double clear, Func<Real> exactly)
    {
        if (Math.Abs(by) > clear)
            return by > 0;
        try
        {
            return decider.Decide(exactly()).Sign > 0;
        }
        catch (UndecidedException)
        {
            return false;
        }
    }
}
