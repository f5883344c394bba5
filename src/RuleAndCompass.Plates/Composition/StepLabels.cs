using System.Globalization;
using RuleAndCompass.Bench;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>Names and numbers on step plates. A name has one place on all of them; numbers and angles find theirs plate by plate.</summary>
internal sealed class StepLabels
{
    private const double LabelGap = 1.7;
    private const double LongestName = 40;
    private const double MostOutside = 12;

    private static readonly double[] nearLine = [0.9, 1.6, 2.7];
    private static readonly double[] farFromLine = [5, 8];
    private static readonly double[] partsOfLine = [0.62, 0.75, 0.5, 0.86, 0.38, 0.25, 0.95, 0.12, 0.56, 0.69, 0.81, 0.44, 0.31, 0.19, 0.05];
    private static readonly double[] partsOfCircle = [0.125, 0.375, 0.625, 0.875, 0.06, 0.19, 0.31, 0.44, 0.56, 0.69, 0.81, 0.94];
    private static readonly double[] partsOfArc = [0.9, 0.1, 0.5, 0.7, 0.3];

    private readonly StepGeometry geometry;
    private readonly CancellationToken cancellation;
    private readonly LabelPlacement placement;
    private readonly Dictionary<Mark, (string Text, PlacedLabel Label)> names = new(ReferenceEqualityComparer.Instance);

    /// <param name="lettering">The words of the finished piece, which the last plate shows.</param>
    public StepLabels(StepGeometry geometry, IEnumerable<Words> lettering, CancellationToken cancellation)
    {
        this.geometry = geometry;
        this.cancellation = cancellation;
        placement = new(geometry.View.Window);
        foreach (Words words in lettering)
        {
            placement.Block(KeptShape.BoxOf(words), PlateSet.Only(geometry.Plans.Count - 1));
        }

        BlockStrokes();
        BlockSigns();
        PlaceNames();
    }

    /// <summary>The name of a mark and its place; null where it has none.</summary>
    public (string Text, PlacedLabel Label)? NameOf(Mark mark) => names.TryGetValue(mark, out (string, PlacedLabel) name) ? name : null;

    /// <summary>Places the numbers of a plate's acts, each beside what the act makes. To be asked once for each plate.</summary>
    public IEnumerable<(Act Act, string Text, PlacedLabel Label)> PlaceNumbers(PlatePlan plan)
    {
        for (int i = plan.First; i < plan.End; i++)
        {
            Act act = geometry.Layout.Acts[i];
            string text = act.Number.ToString(CultureInfo.InvariantCulture);
            if (PlaceNumber(plan, act, text) is { } label)
            {
                yield return (act, text, label);
            }
        }
    }

    /// <summary>Places the angles beside the protractor's arcs. To be asked once for each plate.</summary>
    public IEnumerable<(string Text, PlacedLabel Label)> PlaceAngles(PlatePlan plan)
    {
        for (int i = plan.First; i < plan.End; i++)
        {
            if (geometry.Layout.Acts[i] is Protract protract && geometry.View.Window.Holds(geometry.SpotOf(protract.At)))
            {
                string text = AngleText(Math.Abs(protract.By.ToDegreesDouble()));
                (double width, double height) = Canvas.LabelSize(text, Typeface.Text, PlateFormat.NumberSize);
                yield return (text, placement.Place(AroundAngle(protract, width, height), PlateSet.Only(plan.Index)));
            }
        }
    }

    // Whole minutes as such, anything else as a decimal.
    private static string AngleText(double degrees)
    {
        const double sameMinute = 1e-6;
        double minutes = Math.Round(degrees * 60);
        return Math.Abs((degrees * 60) - minutes) > sameMinute ? string.Create(CultureInfo.InvariantCulture, $"{degrees:0.##}°")
            : minutes % 60 == 0 ? string.Create(CultureInfo.InvariantCulture, $"{minutes / 60}°")
            : string.Create(CultureInfo.InvariantCulture, $"{Math.Floor(minutes / 60)}°{minutes % 60:00}′");
    }

    private PlacedLabel? PlaceNumber(PlatePlan plan, Act act, string text)
    {
        (double width, double height) = Canvas.LabelSize(text, Typeface.Strong, PlateFormat.NumberSize);
        IEnumerable<LabelPlace> places = act switch
        {
            Locate or Cross => LabelPlacement.Around(geometry.SpotOf(act.Makes!), width, height, LabelGap), // Both make a point.
            Swing swing => BesideCurve(geometry.Tracing[swing.Circle], width, height),
            SetOpening set => geometry.SpanOf(plan, set) is { } span ? BesideSpan(span.From, span.To, width, height) : [],
            Protract protract => AroundAngle(protract, width, height),
            _ => BesideCurve(geometry.Tracing[act.Makes!], width, height), // Lines, made by lay and slide.
        };
        if (!places.Any())
        {
            return null;
        }

        PlacedLabel label = placement.Place(places, PlateSet.Only(plan.Index));
        return geometry.View.Window.Grown(MostOutside).Holds(label.Box) ? label : null;
    }

    private static IEnumerable<LabelPlace> BesideSpan(Spot from, Spot to, double width, double height)
    {
        (Spot first, Spot second) = Signs.SpanBridge(from, to, 1);
        double length = first.DistanceTo(second);
        double x = length == 0 ? 1 : (second.X - first.X) / length, y = length == 0 ? 0 : (second.Y - first.Y) / length;
        foreach (double part in new[] { 0.5, 0.35, 0.65, 0.2, 0.8 })
        {
            foreach (LabelPlace place in LabelPlacement.Beside(first.Moved(part * length * x, part * length * y), x, y, width, height, nearLine))
            {
                yield return place;
            }
        }
    }

    private IEnumerable<LabelPlace> AroundAngle(Protract protract, double width, double height)
    {
        (double start, double sweep) = geometry.AngleOf(protract);
        Spot at = geometry.SpotOf(protract.At);
        foreach (double radius in new[] { StepGeometry.ProtractorRadius + 2.6, StepGeometry.ProtractorRadius - 3, StepGeometry.ProtractorRadius + 5.2, StepGeometry.ProtractorRadius + 8 })
        {
            foreach (double part in new[] { 0.5, 0.3, 0.7, 1.2, -0.2 })
            {
                double angle = start + (sweep * part);
                Spot middle = at.Moved(radius * Math.Cos(angle), -radius * Math.Sin(angle));
                yield return new(Box.Of(middle.X - (width / 2), middle.Y - (height / 2), width, height), middle);
            }
        }
    }

    // Along the strokes of a curve, a little towards its far end first: there fewest other lines run together.
    private IEnumerable<LabelPlace> BesideCurve(Trace trace, double width, double height)
    {
        foreach (double[] distances in new[] { nearLine, farFromLine })
        {
            foreach ((Spot at, double x, double y) in SpotsAlong(trace))
            {
                foreach (LabelPlace place in LabelPlacement.Beside(at, x, y, width, height, distances))
                {
                    yield return place;
                }
            }
        }
    }

    private IEnumerable<(Spot At, double X, double Y)> SpotsAlong(Trace trace)
    {
        if (trace is LineTrace line)
        {
            if (Clipping.Line(geometry.View.OnPage(line.From), geometry.View.OnPage(line.To), geometry.View.Window) is not { } shown)
            {
                yield break;
            }

            (double x, double y) = Tracing.DirectionOf(line.Line);
            foreach (double part in partsOfLine)
            {
                yield return (new(shown.From.X + (part * (shown.To.X - shown.From.X)), shown.From.Y + (part * (shown.To.Y - shown.From.Y))), x, y);
            }
        }
        else if (trace is CircleTrace circle)
        {
            Spot centre = geometry.View.OnPage(circle.Centre);
            double radius = circle.Radius * geometry.View.Scale;
            foreach (ArcSpan arc in geometry.View.Arcs(circle, StepGeometry.Past))
            {
                foreach (double part in arc.IsWhole ? partsOfCircle : partsOfArc)
                {
                    double angle = arc.Start + (part * arc.Sweep);
                    yield return (centre.Moved(radius * Math.Cos(angle), -radius * Math.Sin(angle)), -Math.Sin(angle), -Math.Cos(angle));
                }
            }
        }
    }

    private void BlockStrokes()
    {
        foreach (Trace trace in geometry.Tracing.Traces)
        {
            cancellation.ThrowIfCancellationRequested();
            PlateSet plates = PlateSet.AllFrom(geometry.PlateOf(trace));
            if (trace is PointTrace point)
            {
                Spot at = geometry.View.OnPage(point.At);
                placement.Block(new Box(at.X - 0.4, at.Y - 0.4, at.X + 0.4, at.Y + 0.4), plates);
                continue;
            }

            foreach (Outline outline in geometry.StrokesOf(trace))
            {
                placement.Block(outline, plates);
            }
        }
    }

    private void BlockSigns()
    {
        foreach (PlatePlan plan in geometry.Plans)
        {
            cancellation.ThrowIfCancellationRequested();
            PlateSet plates = PlateSet.Only(plan.Index);
            for (int i = plan.First; i < plan.End; i++)
            {
                switch (geometry.Layout.Acts[i])
                {
                    case Swing swing:
                        Spot seat = geometry.SpotOf(swing.Centre);
                        placement.Block(Box.Of(seat.X - Signs.NeedleHalfWidth, seat.Y - Signs.NeedleHeight, 2 * Signs.NeedleHalfWidth, Signs.NeedleHeight), plates);
                        break;
                    case Locate or Cross:
                        Spot prick = geometry.SpotOf(geometry.Layout.Acts[i].Makes!); // Both make a point.
                        placement.Block(new Box(prick.X, prick.Y, prick.X, prick.Y).Grown(Signs.RingRadius), plates);
                        break;
                    case SetOpening set when geometry.SpanOf(plan, set) is { } span:
                        (Spot from, Spot to) = Signs.SpanBridge(span.From, span.To, 1);
                        placement.Block(from, to, plates);
                        break;
                    case Protract protract:
                        (double start, double sweep) = geometry.AngleOf(protract);
                        placement.Block(Outline.Arc(geometry.SpotOf(protract.At), StepGeometry.ProtractorRadius, start, sweep), plates);
                        break;
                }
            }
        }
    }

    private void PlaceNames()
    {
        Dictionary<Mark, List<int>> spokenOf = new(ReferenceEqualityComparer.Instance);
        foreach (PlatePlan plan in geometry.Plans)
        {
            foreach (Mark mark in geometry.MarksOn(plan))
            {
                if (!spokenOf.TryGetValue(mark, out List<int>? plates))
                {
                    spokenOf.Add(mark, plates = []);
                }

                if (plates.Count == 0 || plates[^1] != plan.Index)
                {
                    plates.Add(plan.Index);
                }
            }
        }

        foreach (bool points in new[] { true, false })
        {
            foreach (Trace trace in geometry.Tracing.Traces)
            {
                cancellation.ThrowIfCancellationRequested();
                if (trace is PointTrace == points && spokenOf.TryGetValue(trace.Mark, out List<int>? plates))
                {
                    PlaceName(trace, PlateSet.Of(plates));
                }
            }
        }
    }

    private void PlaceName(Trace trace, PlateSet plates)
    {
        string text = Typesetting.Fit(trace.Mark.Name, Typeface.Text, PlateFormat.NameSize, LongestName);
        (double width, double height) = Canvas.LabelSize(text, Typeface.Text, PlateFormat.NameSize);
        IEnumerable<LabelPlace> places;
        if (trace is PointTrace point)
        {
            Spot at = geometry.View.OnPage(point.At);
            if (!geometry.View.Window.Holds(at))
            {
                return;
            }

            places = LabelPlacement.Around(at, width, height, LabelGap);
        }
        else
        {
            places = BesideCurve(trace, width, height);
        }

        if (!places.Any())
        {
            return;
        }

        // A curve whose name would lie on another is told by its act's number; a point keeps its name.
        bool IsTaken(PlacedLabel placed) => trace is PointTrace || !placed.IsUnreadable;
        PlacedLabel label = placement.Place(places, plates, IsTaken);
        if (IsTaken(label))
        {
            names.Add(trace.Mark, (text, label));
        }
    }
}
