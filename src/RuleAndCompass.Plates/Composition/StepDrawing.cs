using System.Diagnostics;
using System.Globalization;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>The drawing on each step plate: earlier work light, this stage's dark, signs where the hand is now, names in one place throughout.</summary>
internal sealed class StepDrawing
{
    private const double Past = 3;
    private const double LabelGap = 1.7;
    private static readonly double[] nearLine = [0.9, 1.6, 2.7];
    private static readonly double[] farFromLine = [5, 8];
    private const double ProtractorRadius = 9;
    private const double TickInset = 4;
    private const double LongestName = 40;
    private const double MostOutside = 12;

    private static readonly double[] partsOfLine = [0.62, 0.75, 0.5, 0.86, 0.38, 0.25, 0.95, 0.12, 0.56, 0.69, 0.81, 0.44, 0.31, 0.19, 0.05];
    private static readonly double[] partsOfCircle = [0.125, 0.375, 0.625, 0.875, 0.06, 0.19, 0.31, 0.44, 0.56, 0.69, 0.81, 0.94];
    private static readonly double[] partsOfArc = [0.9, 0.1, 0.5, 0.7, 0.3];

    private readonly Layout layout;
    private readonly Tracing tracing;
    private readonly View view;
    private readonly IReadOnlyList<PlatePlan> plans;
    private readonly Dictionary<Point, int> actOfPoint = new(ReferenceEqualityComparer.Instance);
    private readonly CancellationToken cancellation;
    private readonly LabelPlacement placement;
    private readonly Dictionary<Mark, (string Text, PlacedLabel Label)> names = new(ReferenceEqualityComparer.Instance);

    // Both by the act's number. What is kept stands from an act on.
    private readonly int[] plateOfAct;
    private readonly Outline[][] strokes;
    private readonly List<(int From, Item Item)> keptWork = [];

    public StepDrawing(Layout layout, Tracing tracing, View view, IReadOnlyList<PlatePlan> plans, CancellationToken cancellation)
    {
        this.layout = layout;
        this.tracing = tracing;
        this.view = view;
        this.plans = plans;
        this.cancellation = cancellation;
        placement = new(view.Window);
        plateOfAct = new int[layout.Acts.Length + 1];
        strokes = new Outline[layout.Acts.Length + 1][];
        foreach (PlatePlan plan in plans)
        {
            for (int i = plan.First; i < plan.End; i++)
            {
                plateOfAct[layout.Acts[i].Number] = plan.Index;
            }
        }

        foreach (Trace trace in tracing.Traces)
        {
            if (trace is PointTrace point)
            {
                actOfPoint.TryAdd(point.Point.Point, trace.Act);
            }
        }

        ShapeKept();
        BlockStrokes();
        BlockSigns();
        PlaceNames();
    }

    public void Draw(Canvas canvas, PlatePlan plan)
    {
        Edge(canvas, tracing.Sheet, Pens.Frame);
        if (tracing.Board is { } board)
        {
            Edge(canvas, board, Pens.Board);
        }

        int last = plan.End == 0 ? 0 : layout.Acts[plan.End - 1].Number;
        Middle(canvas, plan);
        Strokes(canvas, plan, last, present: false);
        Strokes(canvas, plan, last, present: true);
        KeptWork(canvas, plan, last);
        List<(Act Act, string Text, PlacedLabel Label)> numbers = [.. PlaceNumbers(plan)];
        List<(string Text, PlacedLabel Label)> angles = [.. PlaceAngles(plan)];
        List<Mark> named = [.. MarksOn(plan).Where(names.ContainsKey)];

        // A label that found no free place gets a little bare paper round it; all of that lies under the signs.
        foreach (PlacedLabel label in numbers.Select(number => number.Label).Concat(angles.Select(angle => angle.Label)).Concat(named.Select(mark => names[mark].Label)))
        {
            if (label.IsCrowded)
            {
                canvas.Fill(Role.Frame, Outline.Around(label.Box.Grown(0.3)), Ink.Paper);
            }
        }

        Points(canvas, plan, last);
        for (int i = plan.First; i < plan.End; i++)
        {
            Sign(canvas, plan, layout.Acts[i]);
        }

        foreach ((Act act, string text, PlacedLabel label) in numbers)
        {
            canvas.Tie(Role.Now, label, act.Makes is PointMark ? Signs.RingRadius + 0.2 : 0, Pens.NowThin);
            canvas.Label(Role.Now, text, label.Box, Typeface.Strong, PlateFormat.NumberSize, Ink.Accent);
        }

        foreach ((string text, PlacedLabel label) in angles)
        {
            canvas.Label(Role.Now, text, label.Box, Typeface.Text, PlateFormat.NumberSize, Ink.Accent);
        }

        foreach (Mark mark in named)
        {
            (string text, PlacedLabel label) = names[mark];
            canvas.Tie(Role.Name, label, mark is PointMark ? Signs.RingRadius + 0.2 : 0, Pens.Thin);
            canvas.Label(Role.Name, text, label.Box, Typeface.Text, PlateFormat.NameSize, Ink.Black);
        }
    }

    private void Edge(Canvas canvas, Box stock, Pen pen)
    {
        Box box = view.OnPage(stock);
        if (view.Window.Holds(box))
        {
            canvas.Draw(Role.Frame, Outline.Around(box), pen);
            return;
        }

        Spot[] corners = [new(box.Left, box.Top), new(box.Right, box.Top), new(box.Right, box.Bottom), new(box.Left, box.Bottom)];
        for (int i = 0; i < corners.Length; i++)
        {
            if (Clipping.Line(corners[i], corners[(i + 1) % corners.Length], view.Window) is { } shown)
            {
                canvas.Line(Role.Frame, shown.From, shown.To, pen);
            }
        }
    }

    // Measures are taken from the middle of the sheet, so it is shown where a point is located.
    private void Middle(Canvas canvas, PlatePlan plan)
    {
        for (int i = plan.First; i < plan.End; i++)
        {
            if (layout.Acts[i] is Locate)
            {
                Signs.Middle(canvas, view.Middle);
                return;
            }
        }
    }

    private void Strokes(Canvas canvas, PlatePlan plan, int last, bool present)
    {
        foreach (Trace trace in tracing.Traces)
        {
            if (trace.Act > last)
            {
                break;
            }

            if (plateOfAct[trace.Act] == plan.Index == present)
            {
                foreach (Outline outline in strokes[trace.Act])
                {
                    canvas.Draw(present ? Role.Present : Role.Earlier, outline, present ? Pens.Present : Pens.Earlier);
                }
            }
        }
    }

    private void KeptWork(Canvas canvas, PlatePlan plan, int last)
    {
        bool isLast = plan.Index == plans.Count - 1;
        foreach ((int from, Item item) in keptWork)
        {
            if (isLast || from <= last)
            {
                canvas.Add(item);
            }
        }
    }

    private void ShapeKept()
    {
        foreach (Kept kept in layout.Kept)
        {
            cancellation.ThrowIfCancellationRequested();
            int from = StandsAt(kept);
            Pen pen = Pens.Standing(kept.Dash);
            keptWork.AddRange(KeptShape.Outlines(kept, view).Select(outline => (from, (Item)new Stroke(Role.Kept, outline, pen))));
        }

        // The piece is lettered when all the rest is done.
        PlateSet lastPlate = PlateSet.Only(plans.Count - 1);
        foreach (Lettering lettering in layout.Letterings)
        {
            foreach (Words words in KeptShape.Letters(lettering, view))
            {
                keptWork.Add((int.MaxValue, words));
                placement.Block(KeptShape.BoxOf(words), lastPlate);
            }
        }
    }

    // The act after which a kept thing can be seen: that of its figure, or the last of its ends.
    private int StandsAt(Kept kept)
    {
        if (kept.Mark is not null)
        {
            return tracing[kept.Mark].Act;
        }

        int stands = 0;
        foreach (Piece piece in kept.Pieces)
        {
            stands = piece switch
            {
                SegmentPiece segment => Math.Max(stands, Math.Max(ActOf(segment.From), ActOf(segment.To))),
                ArcPiece arc => Math.Max(stands, Math.Max(ActOf(arc.From), ActOf(arc.To))),
                PointPiece point => Math.Max(stands, ActOf(point.At)),
                _ => stands,
            };
        }

        return stands;

        int ActOf(Point point) => actOfPoint.GetValueOrDefault(point, int.MaxValue);
    }

    private void Points(Canvas canvas, PlatePlan plan, int last)
    {
        HashSet<Mark> spokenOf = new(MarksOn(plan), ReferenceEqualityComparer.Instance);
        foreach (Trace trace in tracing.Traces)
        {
            if (trace.Act > last)
            {
                break;
            }

            if (trace is PointTrace point && view.Window.Holds(view.OnPage(point.At)))
            {
                Signs.Standing(canvas, view.OnPage(point.At), spokenOf.Contains(trace.Mark));
            }
        }
    }

    private void Sign(Canvas canvas, PlatePlan plan, Act act)
    {
        switch (act)
        {
            case Locate or Cross:
                Signs.Prick(canvas, SpotOf(act.Makes!)); // Both make a point.
                break;
            case Lay lay:
                (double x, double y) = Tracing.DirectionOf(lay.Line);
                Signs.Tick(canvas, TickSpot(plan, lay.First, x, y), x, y);
                Signs.Tick(canvas, TickSpot(plan, lay.Second, -x, -y), x, y);
                break;
            case SetOpening set:
                if (SpanOf(plan, set) is { } span)
                {
                    Signs.Span(canvas, span.From, span.To, 1, view.Window.Grown(MostOutside / 2));
                }

                break;
            case Swing swing:
                Signs.Needle(canvas, SpotOf(swing.Centre));
                break;
            case Protract protract:
                (double start, double sweep) = AngleOf(protract);
                Signs.Protractor(canvas, SpotOf(protract.At), ProtractorRadius, start, sweep);
                break;
            case Slide slide:
                (double baseX, double baseY) = Tracing.DirectionOf(slide.Base);
                (double upX, double upY) = Tracing.DirectionOf(slide.Line);
                Spot through = SpotOf(slide.Through), foot = view.OnPage(Tracing.Foot(Tracing.SpotOf(slide.Through.Point), slide.Base));
                double towards = ((through.X - foot.X) * upX) + ((through.Y - foot.Y) * upY) < -1e-9 ? -1 : 1;
                Signs.Corner(canvas, foot, baseX, baseY, towards * upX, towards * upY);
                Signs.Tick(canvas, through, upX, upY);
                break;
            default:
                throw new UnreachableException($"No sign for {act.GetType().Name}.");
        }
    }

    // Where many lines of one plate are laid to one point, the ticks stand a little way along, so that each can be told from the others.
    private Spot TickSpot(PlatePlan plan, PointMark point, double towardsX, double towardsY)
    {
        int lays = 0;
        for (int i = plan.First; i < plan.End; i++)
        {
            if (layout.Acts[i] is Lay lay && (ReferenceEquals(lay.First, point) || ReferenceEquals(lay.Second, point)))
            {
                lays++;
            }
        }

        Spot at = SpotOf(point);
        return lays > 2 ? at.Moved(towardsX * TickInset, towardsY * TickInset) : at;
    }

    private (Spot From, Spot To)? SpanOf(PlatePlan plan, SetOpening set)
    {
        if (set.Opening is SpanOpening span)
        {
            return (SpotOf(span.First), SpotOf(span.Second));
        }

        for (int i = plan.First; i < plan.End; i++)
        {
            if (layout.Acts[i] is Swing swing && ReferenceEquals(swing.Setting, set) && tracing[swing.Circle] is CircleTrace circle)
            {
                double angle = circle.Arcs[0].IsWhole ? Math.PI / 5 : circle.Arcs[0].Middle;
                Spot centre = view.OnPage(circle.Centre);
                double radius = circle.Radius * view.Scale;
                return (centre, centre.Moved(radius * Math.Cos(angle), -radius * Math.Sin(angle)));
            }
        }

        return null;
    }

    // The angle is shown on the side to which more of the line is drawn.
    private (double Start, double Sweep) AngleOf(Protract protract)
    {
        (double x, double y) = Tracing.DirectionOf(protract.Base);
        (double lineX, double lineY) = Tracing.DirectionOf(protract.Line);
        LineTrace line = (LineTrace)tracing[protract.Line];
        Spot at = Tracing.SpotOf(protract.At.Point);
        double ahead = ((line.To.X - at.X) * lineX) + ((line.To.Y - at.Y) * lineY);
        double behind = ((at.X - line.From.X) * lineX) + ((at.Y - line.From.Y) * lineY);
        if (behind > ahead)
        {
            (x, y) = (-x, -y);
        }

        double sweep = protract.By.ToDegreesDouble() * Math.PI / 180 % (2 * Math.PI);
        return (Math.Atan2(-y, x), sweep);
    }

    private IEnumerable<(Act Act, string Text, PlacedLabel Label)> PlaceNumbers(PlatePlan plan)
    {
        for (int i = plan.First; i < plan.End; i++)
        {
            Act act = layout.Acts[i];
            string text = act.Number.ToString(CultureInfo.InvariantCulture);
            if (PlaceNumber(plan, act, text) is { } label)
            {
                yield return (act, text, label);
            }
        }
    }

    // The angle itself beside the protractor's arc.
    private IEnumerable<(string Text, PlacedLabel Label)> PlaceAngles(PlatePlan plan)
    {
        for (int i = plan.First; i < plan.End; i++)
        {
            if (layout.Acts[i] is Protract protract && view.Window.Holds(SpotOf(protract.At)))
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
            Locate or Cross => LabelPlacement.Around(SpotOf(act.Makes!), width, height, LabelGap), // Both make a point.
            Swing swing => BesideCurve(tracing[swing.Circle], width, height),
            SetOpening set => SpanOf(plan, set) is { } span ? BesideSpan(span.From, span.To, width, height) : [],
            Protract protract => AroundAngle(protract, width, height),
            _ => BesideCurve(tracing[act.Makes!], width, height), // Lines, made by lay and slide.
        };
        if (!places.Any())
        {
            return null;
        }

        PlacedLabel label = placement.Place(places, PlateSet.Only(plan.Index));
        return view.Window.Grown(MostOutside).Holds(label.Box) ? label : null;
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
        (double start, double sweep) = AngleOf(protract);
        Spot at = SpotOf(protract.At);
        foreach (double radius in new[] { ProtractorRadius + 2.6, ProtractorRadius - 3, ProtractorRadius + 5.2, ProtractorRadius + 8 })
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
            if (Clipping.Line(view.OnPage(line.From), view.OnPage(line.To), view.Window) is not { } shown)
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
            Spot centre = view.OnPage(circle.Centre);
            double radius = circle.Radius * view.Scale;
            foreach (ArcSpan arc in view.Arcs(circle, Past))
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
        foreach (Trace trace in tracing.Traces)
        {
            cancellation.ThrowIfCancellationRequested();
            PlateSet plates = PlateSet.AllFrom(plateOfAct[trace.Act]);
            if (trace is PointTrace point)
            {
                Spot at = view.OnPage(point.At);
                strokes[trace.Act] = [];
                placement.Block(new Box(at.X - 0.4, at.Y - 0.4, at.X + 0.4, at.Y + 0.4), plates);
                continue;
            }

            strokes[trace.Act] = [.. view.Strokes(trace, Past)];
            foreach (Outline outline in strokes[trace.Act])
            {
                placement.Block(outline, plates);
            }
        }
    }

    private void BlockSigns()
    {
        foreach (PlatePlan plan in plans)
        {
            cancellation.ThrowIfCancellationRequested();
            PlateSet plates = PlateSet.Only(plan.Index);
            for (int i = plan.First; i < plan.End; i++)
            {
                switch (layout.Acts[i])
                {
                    case Swing swing:
                        Spot seat = SpotOf(swing.Centre);
                        placement.Block(Box.Of(seat.X - Signs.NeedleHalfWidth, seat.Y - Signs.NeedleHeight, 2 * Signs.NeedleHalfWidth, Signs.NeedleHeight), plates);
                        break;
                    case Locate or Cross:
                        Spot prick = SpotOf(layout.Acts[i].Makes!); // Both make a point.
                        placement.Block(new Box(prick.X, prick.Y, prick.X, prick.Y).Grown(Signs.RingRadius), plates);
                        break;
                    case SetOpening set when SpanOf(plan, set) is { } span:
                        (Spot from, Spot to) = Signs.SpanBridge(span.From, span.To, 1);
                        placement.Block(from, to, plates);
                        break;
                    case Protract protract:
                        (double start, double sweep) = AngleOf(protract);
                        placement.Block(Outline.Arc(SpotOf(protract.At), ProtractorRadius, start, sweep), plates);
                        break;
                }
            }
        }
    }

    private void PlaceNames()
    {
        Dictionary<Mark, List<int>> spokenOf = new(ReferenceEqualityComparer.Instance);
        foreach (PlatePlan plan in plans)
        {
            foreach (Mark mark in MarksOn(plan))
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
            foreach (Trace trace in tracing.Traces)
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
            Spot at = view.OnPage(point.At);
            if (!view.Window.Holds(at))
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

    private IEnumerable<Mark> MarksOn(PlatePlan plan)
    {
        HashSet<Mark> given = new(ReferenceEqualityComparer.Instance);
        for (int i = plan.First; i < plan.End; i++)
        {
            foreach (Mark mark in MarksOf(layout.Acts[i]))
            {
                if (given.Add(mark))
                {
                    yield return mark;
                }
            }
        }
    }

    private static Mark[] MarksOf(Act act) => act switch
    {
        Locate locate => [locate.Point],
        Lay lay => [lay.Line, lay.First, lay.Second],
        SetOpening { Opening: SpanOpening span } => [span.First, span.Second],
        SetOpening => [],
        Swing swing => [swing.Circle, swing.Centre],
        Cross cross => [cross.Point, cross.First, cross.Second],
        Protract protract => [protract.Line, protract.Base, protract.At],
        Slide slide => [slide.Line, slide.Base, slide.Through],
        _ => throw new UnreachableException($"No marks of {act.GetType().Name}."),
    };

    private Spot SpotOf(Mark point) => view.OnPage(((PointTrace)tracing[point]).At);
}
