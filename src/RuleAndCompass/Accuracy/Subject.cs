using System.Collections.Immutable;
using System.Runtime.Intrinsics;
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

    /// <summary>Units of the quantity an hour, where timed.</summary>
    public double? RatePerHour { get; init; }

    /// <summary>For a timed place: its error along the path, in minutes of time.</summary>
    public Quantity? Minutes { get; init; }

    /// <summary>Comparisons in their order, then what is kept.</summary>
    public static IEnumerable<Subject> All(Layout layout, ActProgram program)
    {
        Vector256<double>[] exact = program.NominalLanes();
        for (int index = 0; index < layout.Comparisons.Length; index++)
        {
            Comparison comparison = layout.Comparisons[index];
            if (comparison.Measure is not { } measure)
                continue;
            Gauge gauge = Gauge.Compile(measure, program);
            Quantity quantity = comparison.MeasureY is { } measureY
                ? new Quantity(gauge, Gauge.Compile(measureY, program), exact)
                : new Quantity(gauge, exact, comparison.Kind == QuantityKind.Angle);
            yield return new Subject(comparison.Label, HandSubject.Comparison, index, comparison.Kind, quantity, [])
            {
                FarFactor = comparison.FarEnd is { } far && comparison.Kind == QuantityKind.Angle ? double.DegreesToRadians(far) : null,
                RatePerHour = comparison.RatePerHour,
                Minutes = comparison is { PathRate: { } rate, MeasureY: { } y } ? AlongPath(measure, y, rate, program, exact) : null,
            };
        }

        Lazy<Dictionary<Point, PointMark>> marks = new(() => MarksByPoint(layout));
        for (int index = 0; index < layout.Kept.Length; index++)
        {
            foreach (Subject subject in Kept(layout.Kept[index], index, program, exact, marks))
                yield return subject;
        }
    }

    // The part of (x, y) along the path, by its speed: (x vx + y vy) / v², in hours.
    private static Quantity AlongPath(Measure x, Measure y, (double X, double Y) rate, ActProgram program, Vector256<double>[] exact)
    {
        double perMinute = 60 / (rate.X * rate.X + rate.Y * rate.Y);
        FunctionMeasure minutes = new(
            "+",
            [
                new FunctionMeasure("*", [x, new ConstantMeasure(rate.X * perMinute)]),
                new FunctionMeasure("*", [y, new ConstantMeasure(rate.Y * perMinute)]),
            ]);
        return new Quantity(Gauge.Compile(minutes, program), exact, false);
    }

    private static IEnumerable<Subject> Kept(Kept kept, int index, ActProgram program, Vector256<double>[] exact, Lazy<Dictionary<Point, PointMark>> marks)
    {
        switch (kept.Mark)
        {
            case LineMark line:
                yield return Line(kept, index, program, exact, program.SlotOf(line));
                break;
            case CircleMark circle:
                {
                    int slot = program.SlotOf(circle);
                    yield return new Subject(
                        $"{kept.Name} (radius)", HandSubject.Radius, index, QuantityKind.Length, new Quantity(new SlotGauge(slot + 2), exact, false), []);
                    yield return new Subject($"{kept.Name} (centre)", HandSubject.Centre, index, QuantityKind.Point, Place(slot, exact), []);
                    break;
                }

            case PointMark point:
                yield return new Subject(kept.Name, HandSubject.Point, index, QuantityKind.Point, Place(program.SlotOf(point), exact), []);
                break;
            default:
                foreach (PointMark corner in Corners(kept, marks.Value))
                    yield return new Subject($"{kept.Name}, at {corner.Name}", HandSubject.Point, index, QuantityKind.Point, Place(program.SlotOf(corner), exact), []);
                break;
        }
    }

    private static Subject Line(Kept kept, int index, ActProgram program, Vector256<double>[] exact, int slot)
    {
        HeadingGauge heading = new(slot, program.Nominal[slot + 2], program.Nominal[slot + 3]);
        ImmutableArray<Quantity> far =
        [
            .. from piece in kept.Pieces.OfType<SegmentPiece>()
               from end in new[] { piece.From, piece.To }
               select new Quantity(new PlaceOffsetGauge(slot, end.XMillimetres, end.YMillimetres), exact, false),
        ];
        return new Subject(kept.Name, HandSubject.Line, index, QuantityKind.Angle, new Quantity(heading, exact, true), far);
    }

    private static Quantity Place(int slot, Vector256<double>[] exact) => new(new SlotGauge(slot), new SlotGauge(slot + 1), exact);

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
