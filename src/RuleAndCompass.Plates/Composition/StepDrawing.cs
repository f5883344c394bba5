using System.Diagnostics;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>The drawing on each step plate: earlier work light, this plate's dark, signs where the hand is now, names in one place throughout.</summary>
internal sealed class StepDrawing
{
    private const double TickInset = 4;
    private const double SpanOutside = 6;

    private readonly Layout layout;
    private readonly Tracing tracing;
    private readonly View view;
    private readonly StepGeometry geometry;
    private readonly StepLabels labels;
    private readonly CancellationToken cancellation;
    private readonly Dictionary<Point, int> actOfPoint = new(ReferenceEqualityComparer.Instance);

    // What is kept stands from an act on.
    private readonly List<(int From, Item Item)> keptWork = [];

    public StepDrawing(Layout layout, Tracing tracing, View view, IReadOnlyList<PlatePlan> plans, CancellationToken cancellation)
    {
        this.layout = layout;
        this.tracing = tracing;
        this.view = view;
        this.cancellation = cancellation;
        foreach (Trace trace in tracing.Traces)
        {
            if (trace is PointTrace point)
            {
                actOfPoint.TryAdd(point.Point.Point, trace.Act);
            }
        }

        geometry = new(layout, tracing, view, plans);
        ShapeKept();
        labels = new(geometry, keptWork.Select(work => work.Item).OfType<Words>(), cancellation);
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
        List<(Act Act, string Text, PlacedLabel Label)> numbers = [.. labels.PlaceNumbers(plan)];
        List<(string Text, PlacedLabel Label)> angles = [.. labels.PlaceAngles(plan)];
        List<(Mark Mark, string Text, PlacedLabel Label)> names = [];
        foreach (Mark mark in geometry.MarksOn(plan))
        {
            if (labels.NameOf(mark) is { } name)
            {
                names.Add((mark, name.Text, name.Label));
            }
        }

        // A label that found no free place gets a little bare paper round it; all of that lies under the signs.
        foreach (PlacedLabel label in numbers.Select(number => number.Label).Concat(angles.Select(angle => angle.Label)).Concat(names.Select(name => name.Label)))
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

        foreach ((Mark mark, string text, PlacedLabel label) in names)
        {
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

            if (geometry.PlateOf(trace) == plan.Index == present)
            {
                foreach (Outline outline in geometry.StrokesOf(trace))
                {
                    canvas.Draw(present ? Role.Present : Role.Earlier, outline, present ? Pens.Present : Pens.Earlier);
                }
            }
        }
    }

    private void KeptWork(Canvas canvas, PlatePlan plan, int last)
    {
        bool isLast = plan.Index == geometry.Plans.Count - 1;
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
        foreach (Lettering lettering in layout.Letterings)
        {
            foreach (Words words in KeptShape.Letters(lettering, view))
            {
                keptWork.Add((int.MaxValue, words));
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
        HashSet<Mark> spokenOf = new(geometry.MarksOn(plan), ReferenceEqualityComparer.Instance);
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
                Signs.Prick(canvas, geometry.SpotOf(act.Makes!)); // Both make a point.
                break;
            case Lay lay:
                (double x, double y) = Tracing.DirectionOf(lay.Line);
                Signs.Tick(canvas, TickSpot(plan, lay.First, x, y), x, y);
                Signs.Tick(canvas, TickSpot(plan, lay.Second, -x, -y), x, y);
                break;
            case SetOpening set:
                if (geometry.SpanOf(plan, set) is { } span)
                {
                    Signs.Span(canvas, span.From, span.To, 1, view.Window.Grown(SpanOutside));
                }

                break;
            case Swing swing:
                Signs.Needle(canvas, geometry.SpotOf(swing.Centre));
                break;
            case Protract protract:
                (double start, double sweep) = geometry.AngleOf(protract);
                Signs.Protractor(canvas, geometry.SpotOf(protract.At), StepGeometry.ProtractorRadius, start, sweep);
                break;
            case Slide slide:
                (double baseX, double baseY) = Tracing.DirectionOf(slide.Base);
                (double upX, double upY) = Tracing.DirectionOf(slide.Line);
                Spot through = geometry.SpotOf(slide.Through), foot = view.OnPage(Tracing.Foot(Tracing.SpotOf(slide.Through.Point), slide.Base));
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

        Spot at = geometry.SpotOf(point);
        return lays > 2 ? at.Moved(towardsX * TickInset, towardsY * TickInset) : at;
    }
}
