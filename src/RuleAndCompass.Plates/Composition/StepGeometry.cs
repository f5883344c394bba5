using System.Diagnostics;
using RuleAndCompass.Bench;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>Where things are on the pages of step plates, and on which plate each act is done.</summary>
internal sealed class StepGeometry
{
    /// <summary>How far a drawn curve runs past its last use, millimetres.</summary>
    public const double Past = 3;

    public const double ProtractorRadius = 9;

    // By the act's number.
    private readonly int[] plateOfAct;
    private readonly Outline[][] strokes;

    public StepGeometry(Layout layout, Tracing tracing, View view, IReadOnlyList<PlatePlan> plans)
    {
        Layout = layout;
        Tracing = tracing;
        View = view;
        Plans = plans;
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
            strokes[trace.Act] = [.. view.Strokes(trace, Past)];
        }
    }

    public Layout Layout { get; }

    public Tracing Tracing { get; }

    public View View { get; }

    public IReadOnlyList<PlatePlan> Plans { get; }

    public int PlateOf(Trace trace) => plateOfAct[trace.Act];

    public Outline[] StrokesOf(Trace trace) => strokes[trace.Act];

    public Spot SpotOf(Mark point) => View.OnPage(((PointTrace)Tracing[point]).At);

    /// <summary>Where the dividers are set: between the two points, or from the needle of the first arc at that opening; null where neither is on the plate.</summary>
    public (Spot From, Spot To)? SpanOf(PlatePlan plan, SetOpening set)
    {
        if (set.Opening is SpanOpening span)
        {
            return (SpotOf(span.First), SpotOf(span.Second));
        }

        for (int i = plan.First; i < plan.End; i++)
        {
            if (Layout.Acts[i] is Swing swing && ReferenceEquals(swing.Setting, set) && Tracing[swing.Circle] is CircleTrace circle)
            {
                double angle = circle.Arcs[0].IsWhole ? Math.PI / 5 : circle.Arcs[0].Middle;
                Spot centre = View.OnPage(circle.Centre);
                double radius = circle.Radius * View.Scale;
                return (centre, centre.Moved(radius * Math.Cos(angle), -radius * Math.Sin(angle)));
            }
        }

        return null;
    }

    /// <summary>The angle of a protraction as seen, on the side to which more of the line is drawn.</summary>
    public (double Start, double Sweep) AngleOf(Protract protract)
    {
        (double x, double y) = Tracing.DirectionOf(protract.Base);
        (double lineX, double lineY) = Tracing.DirectionOf(protract.Line);
        LineTrace line = (LineTrace)Tracing[protract.Line];
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

    /// <summary>The marks that the sentences of a plate speak of, in order, each once.</summary>
    public IEnumerable<Mark> MarksOn(PlatePlan plan)
    {
        HashSet<Mark> given = new(ReferenceEqualityComparer.Instance);
        for (int i = plan.First; i < plan.End; i++)
        {
            foreach (Mark mark in MarksOf(Layout.Acts[i]))
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
}
