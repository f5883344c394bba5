using System.Collections.Immutable;
using RuleAndCompass.Bench;
using RuleAndCompass.Bench.Errors;
using RuleAndCompass.Geometry;
using RuleAndCompass.Making;

namespace RuleAndCompass.Accuracy;

/// <summary>Something the report gives a line to: its quantity, and how far that is felt at the far end.</summary>
/// <param name="Far">The ends of a kept line, in millimetres off it.</param>
internal sealed record Subject(
    string Label, HandSubject Of, int Index, QuantityKind Kind, Quantity Quantity, ImmutableArray<Quantity> Far)
{
    /// <summary>Millimetres at the far end for each unit of the quantity; null where the far end has quantities of its own, or there is none.</summary>
    public double? FarFactor { get; init; }

    public double? RatePerHour { get; init; }

    /// <summary>Comparisons in their order, then what is kept.</summary>
    public static IEnumerable<Subject> All(Layout layout, ActProgram program)
    {
        for (int index = 0; index < layout.Comparisons.Length; index++)
        {
            Comparison comparison = layout.Comparisons[index];
            if (comparison.Measure is not { } measure)
                continue;
            Gauge gauge = Gauge.Compile(measure, program);
            Quantity quantity = comparison.MeasureY is { } measureY
                ? new Quantity(gauge, Gauge.Compile(measureY, program), program)
                : new Quantity(gauge, program, comparison.Kind == QuantityKind.Angle);
            yield return new Subject(comparison.Label, HandSubject.Comparison, index, comparison.Kind, quantity, [])
            {
                FarFactor = comparison.FarEnd is { } far && comparison.Kind == QuantityKind.Angle ? double.DegreesToRadians(far) : null,
                RatePerHour = comparison.RatePerHour,
            };
        }

        Lazy<Dictionary<Point, PointMark>> marks = new(() => MarksByPoint(layout));
        for (int index = 0; index < layout.Kept.Length; index++)
        {
            foreach (Subject subject in Kept(layout.Kept[index], index, program, marks))
                yield return subject;
        }
    }

    private static IEnumerable<Subject> Kept(Kept kept, int index, ActProgram program, Lazy<Dictionary<Point, PointMark>> marks)
    {
        switch (kept.Mark)
        {
            case LineMark line:
                yield return Line(kept, index, program, program.SlotOf(line));
                break;
            case CircleMark circle:
            {
                int slot = program.SlotOf(circle);
                yield return new Subject(
                    $"{kept.Name} (radius)", HandSubject.Radius, index, QuantityKind.Length, new Quantity(new SlotGauge(slot + 2), program, false), []);
                yield return new Subject($"{kept.Name} (centre)", HandSubject.Centre, index, QuantityKind.Point, Place(slot, program), []);
                break;
            }

            case PointMark point:
                yield return new Subject(kept.Name, HandSubject.Point, index, QuantityKind.Point, Place(program.SlotOf(point), program), []);
                break;
            default:
                foreach (PointMark corner in Corners(kept, marks.Value))
                    yield return new Subject($"{kept.Name}, at {corner.Name}", HandSubject.Point, index, QuantityKind.Point, Place(program.SlotOf(corner), program), []);
                break;
        }
    }

    private static Subject Line(Kept kept, int index, ActProgram program, int slot)
    {
        HeadingGauge heading = new(slot, program.Nominal[slot + 2], program.Nominal[slot + 3]);
        ImmutableArray<Quantity> far =
        [
            .. from piece in kept.Pieces.OfType<SegmentPiece>()
               from end in new[] { piece.From, piece.To }
               select new Quantity(new PlaceOffsetGauge(slot, end.XMillimetres, end.YMillimetres), program, false),
        ];
        return new Subject(kept.Name, HandSubject.Line, index, QuantityKind.Angle, new Quantity(heading, program, true), far);
    }

    private static Quantity Place(int slot, ActProgram program) => new(new SlotGauge(slot), new SlotGauge(slot + 1), program);

    private static IEnumerable<PointMark> Corners(Kept kept, Dictionary<Point, PointMark> marks)
    {
        IEnumerable<Point> ends = kept.Pieces.SelectMany(piece => piece switch
        {
            SegmentPiece segment => new[] { segment.From, segment.To },
            ArcPiece arc => [arc.From, arc.To],
            PointPiece point => [point.At],
            _ => [],
        });
        return ends.Select(end => marks.GetValueOrDefault(end)).OfType<PointMark>().Distinct();
    }

    private static Dictionary<Point, PointMark> MarksByPoint(Layout layout)
    {
        Dictionary<Point, PointMark> marks = new(ReferenceEqualityComparer.Instance);
        foreach (Act act in layout.Acts)
        {
            if (act.Makes is PointMark mark)
                marks.TryAdd(mark.Point, mark);
        }

        return marks;
    }
}
