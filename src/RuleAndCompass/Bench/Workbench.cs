using System.Diagnostics;
using System.Globalization;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Bench;

/// <summary>A drawn line as a name sees it: along the mark, or against it.</summary>
internal readonly record struct DirectedLine(LineMark Mark, bool IsReversed)
{
    /// <summary>The line as the name runs.</summary>
    public Line Line => IsReversed ? Mark.Line.Reversed() : Mark.Line;

    /// <summary>The way the name runs.</summary>
    public Vector Direction => IsReversed ? -Mark.Line.Direction : Mark.Line.Direction;

    public DirectedLine Reversed() => this with { IsReversed = !IsReversed };
}

/// <summary>
/// The bench in use: does acts one after another, each evaluated exactly from the marks that stand, and leaves out what stands already.
/// </summary>
/// <param name="kit">The tools.</param>
/// <param name="decider">Takes every decision.</param>
/// <param name="usedNames">Names that generated ones must not be.</param>
/// <param name="maximumActs">A limit.</param>
internal sealed class Workbench(Kit kit, Decider decider, IReadOnlySet<string> usedNames, int maximumActs)
{
    private readonly List<Act> acts = [];
    private readonly MarkIndex index = new(decider);
    private readonly Dictionary<char, int> generated = [];
    private SetOpening? dividersStand;
    private SetOpening? beamStands;
    private int want;
    private int stage;
    private SourceSpan span;
    private string? file;

    public Kit Kit => kit;

    public Decider Decider => decider;

    public IReadOnlyList<Act> Acts => acts;

    public MarkIndex Marks => index;

    /// <summary>The acts that follow serve this sentence.</summary>
    public void Begin(int stageIndex, SourceSpan sentence, string? inFile)
    {
        want++;
        stage = stageIndex;
        span = sentence;
        file = inFile;
    }

    /// <summary>Pricks a measured point.</summary>
    /// <param name="from">The mark it is measured from; null for the middle of the sheet.</param>
    public PointMark Locate(Point at, string? name, string says, PointMark? from = null)
    {
        if (index.Find(at) is { } standing)
            return standing;
        PointMark made = new(name ?? Generate('p'), at, name is null);
        return Done(made, new Locate(Next(), stage, want, made, kit.ScaleStep is not null, says.Replace("{}", made.Name, StringComparison.Ordinal), span, file) { From = from });
    }

    /// <summary>The line from one mark to another, which the caller has decided to be two points.</summary>
    /// <param name="proved">The line in a simpler form, proved to be the same, where there is one.</param>
    public DirectedLine Lay(PointMark first, PointMark second, string? name, Line? proved = null)
    {
        Line line = proved is null ? Line.Through(first.Point, second.Point) : proved.WithPoints(first.Point, second.Point);
        if (Standing(line) is { } standing)
            return standing;
        LineMark made = new(name ?? Generate('l'), line, name is null);
        string says = $"Lay the straightedge to {first.Name} and {second.Name} and draw {made.Name}.";
        return new(Done(made, new Lay(Next(), stage, want, made, first, second, says, span, file)), false);
    }

    /// <summary>A quarter turn anticlockwise from <paramref name="from"/>, by the square.</summary>
    public DirectedLine Slide(DirectedLine from, PointMark through, string? name)
    {
        Line line = from.Mark.Line.SquareThrough(through.Point);
        if (Standing(line) is { } standing)
            return from.IsReversed ? standing.Reversed() : standing;
        LineMark made = new(name ?? Generate('l'), line, name is null);
        string says = $"Lay the square to {from.Mark.Name} and draw {made.Name} through {through.Name}.";
        return new(Done(made, new Slide(Next(), stage, want, made, from.Mark, through, says, span, file)), from.IsReversed);
    }

    /// <summary>Turned anticlockwise by <paramref name="by"/> from <paramref name="from"/> at a point that lies on it, by the protractor.</summary>
    public DirectedLine Protract(DirectedLine from, PointMark at, Angle by, string? name)
    {
        Line line = from.Mark.Line.TurnedThrough(at.Point, by);
        if (Standing(line) is { } standing)
            return from.IsReversed ? standing.Reversed() : standing;
        LineMark made = new(name ?? Generate('l'), line, name is null);
        string way = by.ToDegreesDouble() < 0 ? "clockwise" : "anticlockwise";
        string says = $"Lay the protractor to {from.Mark.Name} at {at.Name}, mark {ValueText.Set(by)} {way}, and draw {made.Name}.";
        return new(Done(made, new Protract(Next(), stage, want, made, from.Mark, at, by, says, span, file)), from.IsReversed);
    }

    /// <summary>Sets the dividers, unless they stand so already.</summary>
    public SetOpening Set(Opening opening)
    {
        bool beam = NeedsBeam(opening.Length.ToDouble());
        SetOpening? stands = beam ? beamStands : dividersStand;
        if (stands is not null && (ReferenceEquals(stands.Opening.Squared, opening.Squared) || IsSame(stands.Opening.Squared, opening.Squared)))
            return stands;
        string tool = beam ? "beam compass" : "dividers";
        string millimetres = opening.Length.ToDouble().ToString("0.0#", CultureInfo.InvariantCulture);
        string says = opening switch
        {
            SpanOpening between => $"Set the {tool} to the span from {between.First.Name} to {between.Second.Name} ({millimetres} mm).",
            ScaleOpening { Setting: { } setting } => $"Set the {tool} to {setting} mm by the scale.",
            ScaleOpening => $"Set the {tool} to {millimetres} mm, taken off the full-size plate.",
            FreeOpening free => $"Set the {tool} to about {ValueText.Plain(free.Chosen)} mm; any opening near it will do.",
            _ => throw new UnreachableException($"No words for {opening.GetType().Name}."),
        };
        SetOpening set = new(Next(), stage, want, opening, beam, says, span, file);
        acts.Add(set);
        return beam ? beamStands = set : dividersStand = set;
    }

    /// <summary>The circle about a mark at an opening; sets the dividers if they do not stand so.</summary>
    /// <param name="known">Marks it is known to pass through.</param>
    public CircleMark Swing(PointMark centre, Opening opening, string? name, params ReadOnlySpan<PointMark> known)
    {
        Circle circle = Circle.WithSquaredRadius(centre.Point, opening.Squared, opening.Length);
        if (opening is SpanOpening between)
            circle = ReferenceEquals(between.First, centre) ? circle.WithPoints(between.Second.Point)
                : ReferenceEquals(between.Second, centre) ? circle.WithPoints(between.First.Point) : circle;
        foreach (PointMark mark in known)
            circle = circle.WithPoints(mark.Point);
        if (index.Find(circle) is { } standing)
            return standing;
        SetOpening setting = Set(opening);
        if (!ReferenceEquals(setting.Opening.Squared, circle.RadiusSquared))
            circle = Circle.WithSquaredRadius(centre.Point, setting.Opening.Squared, setting.Opening.Length).WithPoints([.. circle.Holds]);
        CircleMark made = new(name ?? Generate('c'), circle, name is null);
        string says = name is null ? $"With the needle in {centre.Name} strike the arc {made.Name}." : $"With the needle in {centre.Name} draw the circle {made.Name}.";
        return Done(made, new Swing(Next(), stage, want, made, centre, setting, says, span, file));
    }

    /// <summary>Pricks a crossing.</summary>
    /// <param name="at">The crossing in exact form, as Geometry or a proved theorem gives it; lies on both curves.</param>
    /// <param name="which">Its place in Geometry's order.</param>
    /// <param name="where">Which one, in words, where there are two: <c>, above O</c>; else empty.</param>
    public PointMark Cross(CurveMark first, CurveMark second, Point at, int which, string? name, string where = "")
    {
        if (index.Find(at) is { } standing)
            return standing;
        Point point = new(at.X, at.Y, [first.Curve, second.Curve]);
        PointMark made = new(name ?? Generate('p'), point, name is null);
        string says = $"Prick {made.Name} where {first.Name} crosses {second.Name}{where}.";
        return Done(made, new Cross(Next(), stage, want, made, first, second, which, says, span, file));
    }

    /// <summary>The drawn line that is the same as <paramref name="line"/>, the way that one runs; null where none is drawn.</summary>
    public DirectedLine? Standing(Line line)
    {
        if (index.Find(line) is not { } mark)
            return null;
        return new(mark, Vector.Dot(mark.Line.Direction, line.Direction) is var along && decider.Sign(along) < 0);
    }

    private bool NeedsBeam(double millimetres) =>
        kit.Beam is not null && (kit.Dividers is not { } dividers || millimetres > dividers.Greatest.ToDouble());

    private bool IsSame(Real a, Real b) => Math.Abs(a.ToDouble() - b.ToDouble()) <= 1e-6 * Math.Abs(a.ToDouble()) && decider.Decide(a - b).IsZero;

    private TMark Done<TMark>(TMark made, Act act)
        where TMark : Mark
    {
        acts.Add(act);
        index.Add(made);
        return made;
    }

    private int Next()
    {
        if (acts.Count >= maximumActs)
            throw new TooManyActsException(maximumActs);
        return acts.Count + 1;
    }

    private string Generate(char letter)
    {
        int number = generated.GetValueOrDefault(letter);
        string name;
        do
            name = $"{letter}{++number}";
        while (usedNames.Contains(name));
        generated[letter] = number;
        return name;
    }
}

/// <summary>The limit on acts was reached.</summary>
internal sealed class TooManyActsException(int limit) : Exception
{
    public int Limit { get; } = limit;
}
