using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making.Wants;

/// <summary>
/// What the wants are made by: the acts that a kit can do for a square, a parallel, a half, an angle, a length. The acts are evaluated as they are done,
/// and each construction is proved to make what it is for before the simple exact form takes its place.
/// </summary>
/// <param name="bench">Where the acts are done.</param>
/// <param name="room">How far the stock or the board reaches.</param>
/// <param name="sheet">The stock, by whose size openings and bases are chosen.</param>
internal sealed partial class Constructions(Workbench bench, Sheet room, Sheet sheet)
{
    private Kit Kit => bench.Kit;

    private Decider Decider => bench.Decider;

    /// <summary>The sentence at hand, for findings.</summary>
    public SourceSpan Serving { get; set; }

    private double Diagonal => Math.Sqrt(Math.Pow(sheet.Width.ToDouble(), 2) + Math.Pow(sheet.Height.ToDouble(), 2));

    /// <summary>A whole number of millimetres near the one that suits, and within the dividers' reach.</summary>
    private FreeOpening Free(double suitsMillimetres, double leastMillimetres = 1)
    {
        double greatest = Math.Max(Kit.Dividers?.Greatest.ToDouble() ?? 0, Kit.Beam?.Greatest.ToDouble() ?? 0);
        if (greatest == 0)
            greatest = Diagonal;
        double least = Math.Max(leastMillimetres, (Kit.Dividers ?? Kit.Beam)?.Least.ToDouble() ?? 1);
        double chosen = Math.Clamp(suitsMillimetres, least, Math.Max(least, greatest));
        double whole = Math.Ceiling(chosen);
        return new(Rational.FromDouble(whole > greatest && Math.Floor(chosen) > leastMillimetres ? Math.Floor(chosen) : whole));
    }

    /// <summary>Pricks the crossings of two drawn curves, which the construction makes sure are two, in Geometry's order.</summary>
    private (PointMark First, PointMark Second) CrossBoth(CurveMark a, CurveMark b)
    {
        Crossing crossing = Crossing.Of(Plain(a), Plain(b), Decider);
        if (crossing.Points.Length != 2)
            throw new FaultException(MakingFindings.Degenerate("the arcs for this do not cross twice", Serving, "the figures lie too close together, or too far apart for the dividers"));
        return (bench.Cross(a, b, crossing.Points[0], 0, null, Where(crossing, 0, a)), bench.Cross(a, b, crossing.Points[1], 1, null, Where(crossing, 1, a)));
    }

    /// <summary>Pricks the crossing that <paramref name="keep"/> says.</summary>
    private PointMark CrossWhere(CurveMark a, CurveMark b, Func<Point, bool> keep, string? name = null)
    {
        Crossing crossing = Crossing.Of(Plain(a), Plain(b), Decider);
        for (int which = 0; which < crossing.Points.Length; which++)
            if (keep(crossing.Points[which]))
                return bench.Cross(a, b, crossing.Points[which], which, name, Where(crossing, which, a));
        throw new FaultException(MakingFindings.Degenerate("the arcs for this do not cross where they should", Serving, "the figures lie too close together, or too far apart for the dividers"));
    }

    // The words that tell one crossing of two, as seen on the sheet.
    private static string Where(Crossing crossing, int which, CurveMark first)
    {
        if (crossing.Points.Length < 2)
            return "";
        Point here = crossing.Points[which], other = crossing.Points[1 - which];
        double dx = here.X.Near() - other.X.Near(), dy = here.Y.Near() - other.Y.Near();
        return Math.Abs(dy) >= Math.Abs(dx) ? (dy > 0 ? ", the upper one" : ", the lower one") : dx > 0 ? ", the one on the right" : ", the one on the left";
    }

    // A line whose length is worked out from its direction alone, so that a theorem about it needs nothing else.
    private static Curve Plain(CurveMark mark) => mark switch
    {
        LineMark { Line: var line } => Line.Along(line.Start, line.Direction).WithPoints([.. line.Holds.Where(point => !ReferenceEquals(point, line.Start))]),
        _ => mark.Curve,
    };

    /// <summary>Lays the edge to two marks, and proves that the line so drawn is <paramref name="wanted"/> before it takes its form.</summary>
    private DirectedLine LayProved(PointMark first, PointMark second, Line wanted, string? name, string what, params ReadOnlySpan<Figure> inputs)
    {
        Vector drawn = second.Point.From(first.Point);
        bool along = IsTheorem(Vector.Cross(drawn, wanted.Direction), inputs) && Decider.Sign(Vector.Dot(drawn, wanted.Direction)) > 0;
        bool through = wanted.IsKnownToHold(first.Point) || wanted.IsKnownToHold(second.Point) || IsTheorem(wanted.SideOf(first.Point), inputs);
        if (!along || !through)
            throw new FaultException(MakingFindings.ActsDoNotProve(what, Serving));
        return bench.Lay(first, second, name, wanted);
    }

    /// <summary>Pricks a crossing, and proves that it is <paramref name="wanted"/> before it takes its form.</summary>
    private PointMark CrossProved(CurveMark a, CurveMark b, Point wanted, string? name, string what, params ReadOnlySpan<Figure> inputs)
    {
        Crossing crossing = Crossing.Of(Plain(a), Plain(b), Decider);
        int which = crossing.Points.Length == 2 && Apart(crossing.Points[1], wanted) < Apart(crossing.Points[0], wanted) ? 1 : 0;
        if (crossing.Points.IsEmpty || !IsTheorem(crossing.Points[which].X - wanted.X, inputs) || !IsTheorem(crossing.Points[which].Y - wanted.Y, inputs))
            throw new FaultException(MakingFindings.ActsDoNotProve(what, Serving));
        return bench.Cross(a, b, wanted, which, name, Where(crossing, which, a));
    }

    private static double Apart(Point a, Point b)
    {
        double dx = a.X.Near() - b.X.Near(), dy = a.Y.Near() - b.Y.Near();
        return (dx * dx) + (dy * dy);
    }

    // First as a theorem about any such figures, which is cheap however deep they lie; else for these.
    private bool IsTheorem(Real difference, ReadOnlySpan<Figure> inputs)
    {
        List<Real> free = [];
        foreach (Figure figure in inputs)
            switch (figure)
            {
                case Point point:
                    AddFree(free, point.X, point.Y);
                    break;
                case Line line:
                    AddFree(free, line.Start.X, line.Start.Y, line.Direction.X, line.Direction.Y);
                    break;
                case Circle circle:
                    AddFree(free, circle.Centre.X, circle.Centre.Y, circle.RadiusSquared);
                    break;
            }

        return Decider.HoldsIdentically(difference, free, out _) || Decider.IsZero(difference);
    }

    private static void AddFree(List<Real> free, params ReadOnlySpan<Real> values)
    {
        foreach (Real value in values)
            if (!value.TryGetRational(out _))
                free.Add(value);
    }

    private bool Holds(Line line, PointMark mark) => Incidence.Holds(mark.Point, line, Decider);

    private FaultException NoTool(string want, string tools) => new(MakingFindings.NoTool(want, tools, Serving));

    private void Need(ByTool? by, ByTool tool, bool has)
    {
        if (by == tool && !has)
            throw new FaultException(MakingFindings.NotInKit(tool.ToString().ToLowerInvariant(), Serving));
    }

    private bool HasDividers => Kit.Dividers is not null || Kit.Beam is not null;

}
