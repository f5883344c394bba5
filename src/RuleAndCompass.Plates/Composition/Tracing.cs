using System.Collections.Immutable;
using System.Diagnostics;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>
/// What each act leaves on the stock, as far as it is used: a line from the first to the last point it serves, an arc round each crossing it makes.
/// The exact figures are turned to doubles here and nowhere else.
/// </summary>
internal sealed class Tracing
{
    private const double Turn = 2 * Math.PI;

    // Uses of one arc further apart than this are struck apart: a generated arc is a flick of the dividers, a named one is meant to be seen.
    private const double LargestGapOfGenerated = Turn / 9;
    private const double LargestGapOfNamed = Turn / 2;

    // Two uses nearer than this are one. It only saves ink: whether points are the same is decided elsewhere.
    private const double SameMillimetres = 1e-6;

    private readonly Dictionary<Mark, Trace> byMark = new(ReferenceEqualityComparer.Instance);

    private Tracing(Layout layout) => Sheet = Centred(layout.Sheet);

    /// <summary>The sheet's edge on the stock.</summary>
    public Box Sheet { get; }

    /// <summary>The board's edge, where there is one.</summary>
    public Box? Board { get; private init; }

    /// <summary>In the order of the acts that made them.</summary>
    public ImmutableArray<Trace> Traces { get; private set; }

    public Trace this[Mark mark] => byMark[mark];

    public static Tracing Of(Layout layout, CancellationToken cancellation)
    {
        Tracing tracing = new(layout) { Board = layout.Board is null ? null : Centred(layout.Board) };
        Dictionary<Mark, List<Spot>> uses = new(ReferenceEqualityComparer.Instance);
        Dictionary<Mark, Act> makers = new(ReferenceEqualityComparer.Instance);
        HashSet<Mark> wholes = new(ReferenceEqualityComparer.Instance);
        foreach (Act act in layout.Acts)
        {
            cancellation.ThrowIfCancellationRequested();
            NoteUses(act, uses);
            if (act.Makes is { } mark)
            {
                makers[mark] = act;
            }
        }

        foreach (Kept kept in layout.Kept)
        {
            if (kept.Mark is CurveMark mark)
            {
                foreach (Piece piece in kept.Pieces)
                {
                    NoteKept(piece, mark, uses, wholes);
                }
            }
        }

        ImmutableArray<Trace>.Builder traces = ImmutableArray.CreateBuilder<Trace>();
        foreach (Act act in layout.Acts)
        {
            cancellation.ThrowIfCancellationRequested();
            if (act.Makes is { } mark && makers[mark] == act)
            {
                List<Spot> used = uses.GetValueOrDefault(mark) ?? [];
                Trace trace = mark switch
                {
                    PointMark point => new PointTrace(point, act.Number, SpotOf(point.Point)),
                    LineMark line => TraceLine(line, act, used, tracing.Sheet),
                    CircleMark circle => TraceCircle(circle, act, used, wholes.Contains(mark)),
                    _ => throw new UnreachableException($"No trace of {mark.GetType().Name}."),
                };
                traces.Add(trace);
                tracing.byMark.Add(mark, trace);
            }
        }

        tracing.Traces = traces.ToImmutable();
        return tracing;
    }

    public static Spot SpotOf(Point point) => new(point.XMillimetres, -point.YMillimetres);

    public static (double X, double Y) DirectionOf(LineMark mark)
    {
        double x = mark.Line.Direction.X.ToDouble(), y = -mark.Line.Direction.Y.ToDouble();
        double length = Math.Sqrt((x * x) + (y * y));
        return (x / length, y / length);
    }

    /// <summary>The point of a line nearest to a spot.</summary>
    public static Spot Foot(Spot of, LineMark on)
    {
        Spot start = SpotOf(on.Line.Start);
        (double x, double y) = DirectionOf(on);
        double along = ((of.X - start.X) * x) + ((of.Y - start.Y) * y);
        return start.Moved(along * x, along * y);
    }

    /// <summary>From right, anticlockwise as seen, radians.</summary>
    public static double AngleOf(Spot from, Spot to) => Math.Atan2(from.Y - to.Y, to.X - from.X);

    private static Box Centred(Sheet sheet)
    {
        double width = sheet.Width.ToDouble(), height = sheet.Height.ToDouble();
        return Box.Of(-width / 2, -height / 2, width, height);
    }

    private static void NoteUses(Act act, Dictionary<Mark, List<Spot>> uses)
    {
        switch (act)
        {
            case Locate or SetOpening or Swing:
                break;
            case Lay lay:
                Note(uses, lay.Line, SpotOf(lay.First.Point));
                Note(uses, lay.Line, SpotOf(lay.Second.Point));
                break;
            case Cross cross:
                Note(uses, cross.First, SpotOf(cross.Point.Point));
                Note(uses, cross.Second, SpotOf(cross.Point.Point));
                break;
            case Protract protract:
                Note(uses, protract.Line, SpotOf(protract.At.Point));
                Note(uses, protract.Base, SpotOf(protract.At.Point));
                break;
            case Slide slide:
                Spot through = SpotOf(slide.Through.Point);
                Spot foot = Foot(through, slide.Base);
                Note(uses, slide.Line, through);
                Note(uses, slide.Line, foot);
                Note(uses, slide.Base, foot);
                break;
            default:
                throw new UnreachableException($"No uses of {act.GetType().Name}.");
        }
    }

    private static void NoteKept(Piece piece, CurveMark mark, Dictionary<Mark, List<Spot>> uses, HashSet<Mark> wholes)
    {
        switch (piece)
        {
            case SegmentPiece segment:
                Note(uses, mark, SpotOf(segment.From));
                Note(uses, mark, SpotOf(segment.To));
                break;
            case ArcPiece arc:
                Note(uses, mark, SpotOf(arc.From));
                Note(uses, mark, SpotOf(arc.To));
                break;
            case CirclePiece:
                wholes.Add(mark);
                break;
        }
    }

    private static void Note(Dictionary<Mark, List<Spot>> uses, Mark mark, Spot spot)
    {
        if (!uses.TryGetValue(mark, out List<Spot>? spots))
        {
            uses.Add(mark, spots = []);
        }

        spots.Add(spot);
    }

    private static LineTrace TraceLine(LineMark mark, Act act, List<Spot> used, Box sheet)
    {
        Spot start = SpotOf(mark.Line.Start);
        (double x, double y) = DirectionOf(mark);
        double least = double.PositiveInfinity, greatest = double.NegativeInfinity;
        foreach (Spot spot in used)
        {
            double along = ((spot.X - start.X) * x) + ((spot.Y - start.Y) * y);
            least = Math.Min(least, along);
            greatest = Math.Max(greatest, along);
        }

        if (used.Count == 0)
        {
            least = greatest = 0;
        }

        // Nothing is known of its other end yet: it is drawn some way ahead, as its direction runs.
        double shortest = Math.Max(sheet.Width, sheet.Height) / 8;
        if (greatest - least < SameMillimetres)
        {
            greatest = least + shortest;
        }

        return new(mark, act.Number, start.Moved(least * x, least * y), start.Moved(greatest * x, greatest * y));
    }

    private static CircleTrace TraceCircle(CircleMark mark, Act act, List<Spot> used, bool whole)
    {
        Spot centre = SpotOf(mark.Circle.Centre);
        double radius = mark.Circle.Radius.ToDouble();
        if (whole || used.Count == 0)
        {
            return new(mark, act.Number, centre, radius, [ArcSpan.Whole]);
        }

        double[] angles = [.. used.Select(spot => AngleOf(centre, spot)).Order()];
        double largestGap = mark.IsAuxiliary ? LargestGapOfGenerated : LargestGapOfNamed;
        double[] gaps = [.. angles.Select((angle, i) => i + 1 < angles.Length ? angles[i + 1] - angle : angles[0] + Turn - angle)];
        int first = Array.FindIndex(gaps, gap => gap > largestGap);
        if (first < 0)
        {
            return new(mark, act.Number, centre, radius, [ArcSpan.Whole]);
        }

        // Begin after a gap, and cut at each gap.
        ImmutableArray<ArcSpan>.Builder arcs = ImmutableArray.CreateBuilder<ArcSpan>();
        double begun = angles[(first + 1) % angles.Length], sweep = 0;
        for (int i = 1; i <= angles.Length; i++)
        {
            double gap = gaps[(first + i) % angles.Length];
            if (gap <= largestGap && i < angles.Length)
            {
                sweep += gap;
                continue;
            }

            arcs.Add(new ArcSpan(begun, sweep));
            begun = begun + sweep + gap;
            sweep = 0;
        }

        return new(mark, act.Number, centre, radius, arcs.ToImmutable());
    }
}
