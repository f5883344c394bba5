using System.Diagnostics;
using System.Runtime.Intrinsics;

namespace RuleAndCompass.Bench.Errors;

/// <summary>
/// A sequence of acts compiled to steps over flat arrays of doubles, with an error variable for each thing a hand does to no more than its own
/// precision. Acts are appended, and may be taken off the end again, so that ways to make a mark can be tried.
/// </summary>
/// <remarks>
/// What errs, each variable once however often its mark is used afterwards:
/// <list type="bullet">
/// <item>locate: a prick each way and a scale reading each way; off the printed plate the plate's two scale errors instead of readings;</item>
/// <item>cross: a prick square to each of the two curves;</item>
/// <item>lay: the edge at each of the two points; protract: the protractor's angle, and the edge at the point; slide: the square's angle, and the edge
/// at the point;</item>
/// <item>set: the opening, shared by all arcs until the next set; by scale a reading too; off the printed plate the plate's scale error across;</item>
/// <item>swing: a prick each way for the needle's seat.</item>
/// </list>
/// </remarks>
internal sealed class ActProgram
{
    /// <summary>The variable of the plate's scale error across.</summary>
    public const int PaperAcross = 0;

    /// <summary>The variable of the plate's scale error up.</summary>
    public const int PaperUp = 1;

    private readonly Hand hand;
    private readonly List<Step> steps = [];
    private readonly List<ErrorVariable> variables = [];
    private readonly List<int> stepOfSlot = [];
    private readonly Dictionary<object, int> slots = new(ReferenceEqualityComparer.Instance);
    private readonly List<(object Made, int Slot, int Variables)> undo = [];
    private double[] nominal = new double[256];

    public ActProgram(Hand hand)
    {
        this.hand = hand;
        AddVariables(0, (ErrorSource.Paper, hand.PaperFraction), (ErrorSource.Paper, hand.PaperFraction));
    }

    public IReadOnlyList<Step> Steps => steps;

    /// <summary>In pairs: an even one and the next belong to one act and one draw of random numbers.</summary>
    public IReadOnlyList<ErrorVariable> Variables => variables;

    /// <summary>Each slot at its exact place, to the nearest double; as long as <see cref="SlotCount"/> or longer.</summary>
    public double[] Nominal => nominal;

    public int SlotCount => stepOfSlot.Count;

    /// <summary>The exact places as four trials without errors.</summary>
    public Vector256<double>[] NominalLanes() => [.. nominal.Take(SlotCount).Select(Lanes.All)];

    public int StepOfSlot(int slot) => stepOfSlot[slot];

    /// <summary>The first slot of a mark, or −1 for one that no act here has made.</summary>
    public int SlotOf(Mark mark) => slots.GetValueOrDefault(mark, -1);

    public void Append(IEnumerable<Act> acts)
    {
        foreach (Act act in acts)
            Append(act);
    }

    /// <exception cref="ArgumentException">The act uses a mark or setting that no act before it made.</exception>
    public void Append(Act act)
    {
        int variablesBefore = variables.Count;
        Step step = Compile(act, out object made, out int slot);
        if (!slots.TryAdd(made, slot))
            throw new ArgumentException($"Act {act.Number} makes again what an earlier act made.", nameof(act));
        steps.Add(step);
        undo.Add((made, slot, variablesBefore));
    }

    /// <summary>Takes acts off the end until <paramref name="count"/> are left.</summary>
    public void Truncate(int count)
    {
        while (steps.Count > count)
        {
            (object made, int slot, int variablesBefore) = undo[^1];
            slots.Remove(made);
            stepOfSlot.RemoveRange(slot, stepOfSlot.Count - slot);
            variables.RemoveRange(variablesBefore, variables.Count - variablesBefore);
            steps.RemoveAt(steps.Count - 1);
            undo.RemoveAt(undo.Count - 1);
        }
    }

    private Step Compile(Act act, out object made, out int slot)
    {
        made = act.Makes ?? (object)act;
        switch (act)
        {
            case Locate locate:
                {
                    double x = locate.Point.Point.XMillimetres;
                    double y = locate.Point.Point.YMillimetres;
                    int from = locate.From is { } measuredFrom ? Slot(act, measuredFrom) : -1;
                    slot = AddSlots(x, y);
                    if (from >= 0)
                    {
                        x -= nominal[from];
                        y -= nominal[from + 1];
                    }

                    int prick = AddVariables(act.Number, (ErrorSource.Prick, hand.PrickMillimetres), (ErrorSource.Prick, hand.PrickMillimetres));
                    int? scale = locate.ByScale
                        ? AddVariables(act.Number, (ErrorSource.Scale, hand.ScaleMillimetres), (ErrorSource.Scale, hand.ScaleMillimetres))
                        : null;
                    return new LocateStep(act.Number, slot, x, y, from, prick, scale);
                }

            case Lay lay:
                {
                    int first = Slot(act, lay.First);
                    int second = Slot(act, lay.Second);
                    slot = AddLine(lay.Line, first);
                    int edge = AddVariables(act.Number, (ErrorSource.Edge, hand.EdgeMillimetres), (ErrorSource.Edge, hand.EdgeMillimetres));
                    return new LayStep(act.Number, slot, first, second, edge);
                }

            case Protract protract:
                return CompileTurn(
                    act, protract.Line, protract.Base, protract.At, protract.By.ToDegreesDouble(), ErrorSource.Protractor, hand.ProtractorDegrees, out slot);

            case Slide slide:
                return CompileTurn(act, slide.Line, slide.Base, slide.Through, 90, ErrorSource.Square, hand.SquareDegrees, out slot);

            case SetOpening set:
                return CompileSetting(set, out slot);

            case Swing swing:
                {
                    int centre = Slot(act, swing.Centre);
                    int opening = Slot(act, swing.Setting);
                    slot = AddSlots(nominal[centre], nominal[centre + 1], nominal[opening]);
                    int prick = AddVariables(act.Number, (ErrorSource.Prick, hand.PrickMillimetres), (ErrorSource.Prick, hand.PrickMillimetres));
                    return new SwingStep(act.Number, slot, centre, opening, prick);
                }

            case Cross cross:
                return CompileCross(cross, out slot);

            default:
                throw new UnreachableException($"No step for {act.GetType().Name}.");
        }
    }

    private TurnStep CompileTurn(
        Act act, LineMark made, LineMark from, PointMark at, double turnDegrees, ErrorSource tool, double sigmaDegrees, out int slot)
    {
        int line = Slot(act, from);
        int point = Slot(act, at);
        slot = AddLine(made, point);
        int angle = AddVariables(act.Number, (tool, double.DegreesToRadians(sigmaDegrees)), (ErrorSource.Edge, hand.EdgeMillimetres));
        return new TurnStep(act.Number, slot, line, point, turnDegrees, angle);
    }

    private Step CompileSetting(SetOpening set, out int slot)
    {
        double length = set.Opening.Length.ToDouble();
        (int First, int Second) ends = set.Opening is SpanOpening of ? (Slot(set, of.First), Slot(set, of.Second)) : default;
        slot = AddSlots(length);
        bool byScale = set.Opening is ScaleOpening { Setting: not null };
        int opening = AddVariables(set.Number, (ErrorSource.Opening, hand.OpeningMillimetres), (ErrorSource.Scale, byScale ? hand.ScaleMillimetres : 0));
        return set.Opening switch
        {
            SpanOpening => new SpanStep(set.Number, slot, ends.First, ends.Second, opening),
            ScaleOpening scale => new LengthStep(
                set.Number, slot, length, scale.Setting is { } setting ? setting.ToDouble() : length, opening, byScale, offPlate: !byScale),
            FreeOpening => new LengthStep(set.Number, slot, length, length, opening, byScale: false, offPlate: false),
            _ => throw new UnreachableException($"No step for {set.Opening.GetType().Name}."),
        };
    }

    private CrossStep CompileCross(Cross cross, out int slot)
    {
        int first = Slot(cross, cross.First);
        int second = Slot(cross, cross.Second);
        slot = AddSlots(cross.Point.Point.XMillimetres, cross.Point.Point.YMillimetres);
        int prick = AddVariables(cross.Number, (ErrorSource.Prick, hand.PrickMillimetres), (ErrorSource.Prick, hand.PrickMillimetres));
        CrossedCurve one = new(first, cross.First is LineMark, prick);
        CrossedCurve other = new(second, cross.Second is LineMark, prick + 1);
        return (one.IsLine, other.IsLine) switch
        {
            (true, true) => new CrossLinesStep(cross.Number, slot, one, other, Side(first, second)),
            (true, false) => new CrossLineCircleStep(cross.Number, slot, one, other, later: cross.Which == 1),
            (false, true) => new CrossLineCircleStep(cross.Number, slot, other, one, later: cross.Which == 1),
            (false, false) => new CrossCirclesStep(cross.Number, slot, one, other, right: cross.Which == 1),
        };
    }

    // 1 where the second line turns anticlockwise from the first, −1 where clockwise.
    private int Side(int first, int second) => Math.Sign(nominal[first + 2] * nominal[second + 3] - nominal[first + 3] * nominal[second + 2]);

    private int Slot(Act act, object used) => slots.TryGetValue(used, out int slot)
        ? slot
        : throw new ArgumentException($"Act {act.Number} uses {(used is Mark mark ? mark.Name : "a setting")}, which no act before it made.", nameof(act));

    private int AddLine(LineMark line, int start)
    {
        double dx = line.Line.Direction.X.ToDouble();
        double dy = line.Line.Direction.Y.ToDouble();
        double length = double.Hypot(dx, dy);
        return AddSlots(nominal[start], nominal[start + 1], dx / length, dy / length);
    }

    private int AddSlots(params ReadOnlySpan<double> values)
    {
        int slot = stepOfSlot.Count;
        if (slot + values.Length > nominal.Length)
            Array.Resize(ref nominal, 2 * nominal.Length);
        values.CopyTo(nominal.AsSpan(slot));
        foreach (double _ in values)
            stepOfSlot.Add(steps.Count);
        return slot;
    }

    private int AddVariables(int act, (ErrorSource Source, double Sigma) first, (ErrorSource Source, double Sigma) second)
    {
        int variable = variables.Count;
        variables.Add(new ErrorVariable(first.Source, act, first.Sigma));
        variables.Add(new ErrorVariable(second.Source, act, second.Sigma));
        return variable;
    }
}
