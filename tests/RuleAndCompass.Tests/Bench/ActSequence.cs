using System.Collections.Immutable;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Bench;

/// <summary>Acts done one after another by hand, from doubles taken as the exact numbers they are.</summary>
internal sealed class ActSequence
{
    private static readonly Kit FullKit = new(true, null, new Reach(1, 2000), null, true, true, new Rational(1, 2));

    private readonly List<Act> acts = [];
    private readonly List<Comparison> comparisons = [];
    private readonly List<Kept> kept = [];
    private readonly Decider decider = new(new DeciderOptions());
    private int names;

    public Kit Kit { get; set; } = FullKit;

    public Sheet Sheet { get; set; } = new(null, 420, 297);

    public Sheet? Board { get; set; }

    public int Want { get; set; } = 1;

    public int Stage { get; set; }

    public ImmutableArray<Act> Acts => [.. acts];

    public static Rational Exact(double value) => Rational.FromDouble(value);

    public PointMark Locate(double x, double y, string? name = null, bool byScale = true, PointMark? from = null, bool auxiliary = false)
    {
        PointMark point = new(name ?? Name("P"), new Point(Exact(x), Exact(y)), auxiliary);
        acts.Add(new Locate(acts.Count + 1, Stage, Want, point, byScale, "", default, null) { From = from });
        return point;
    }

    public LineMark Lay(PointMark first, PointMark second, string? name = null)
    {
        LineMark line = new(name ?? Name("l"), Line.Through(first.Point, second.Point), false);
        acts.Add(new Lay(acts.Count + 1, Stage, Want, line, first, second, "", default, null));
        return line;
    }

    public SetOpening SetSpan(PointMark first, PointMark second) => Set(new SpanOpening(first, second));

    public SetOpening SetScale(double wanted, double? setting) => Set(new ScaleOpening(Exact(wanted), setting is { } rounded ? Exact(rounded) : null));

    public SetOpening SetFree(double chosen) => Set(new FreeOpening(Exact(chosen)));

    public SetOpening Set(Opening opening, bool beam = false)
    {
        SetOpening set = new(acts.Count + 1, Stage, Want, opening, beam, "", default, null);
        acts.Add(set);
        return set;
    }

    public CircleMark Swing(PointMark centre, SetOpening setting, string? name = null)
    {
        CircleMark circle = new(name ?? Name("c"), Circle.WithSquaredRadius(centre.Point, setting.Opening.Squared, setting.Opening.Length), false);
        acts.Add(new Swing(acts.Count + 1, Stage, Want, circle, centre, setting, "", default, null));
        return circle;
    }

    public PointMark Cross(CurveMark first, CurveMark second, int which = 0, string? name = null)
    {
        Crossing crossing = Crossing.Of((Curve)first.Figure, (Curve)second.Figure, decider);
        PointMark point = new(name ?? Name("P"), crossing.Points[which], false);
        acts.Add(new Cross(acts.Count + 1, Stage, Want, point, first, second, which, "", default, null));
        return point;
    }

    public PointMark CrossAt(CurveMark first, CurveMark second, PointMark point)
    {
        acts.Add(new Cross(acts.Count + 1, Stage, Want, point, first, second, 0, "", default, null));
        return point;
    }

    public LineMark Slide(LineMark from, PointMark through, string? name = null)
    {
        LineMark line = new(name ?? Name("l"), from.Line.SquareThrough(through.Point), false);
        acts.Add(new Slide(acts.Count + 1, Stage, Want, line, from, through, "", default, null));
        return line;
    }

    public LineMark Protract(LineMark from, PointMark at, double degrees, string? name = null)
    {
        Angle by = Angle.FromDegrees(Exact(degrees));
        LineMark line = new(name ?? Name("l"), from.Line.TurnedThrough(at.Point, by), false);
        acts.Add(new Protract(acts.Count + 1, Stage, Want, line, from, at, by, "", default, null));
        return line;
    }

    public void Compare(QuantityKind kind, Measure measure, Measure? measureY = null, double? rate = null, double? farEnd = null, string label = "it") =>
        comparisons.Add(new Comparison(
            label, kind, Real.Zero, Real.Zero, null, null, Real.Zero, new Decision(0, Verdict.Proved), null, false, true, rate, null, null, measure, measureY, farEnd, default, null));

    public void ComparePlace(PointMark point, string label = "it") =>
        Compare(QuantityKind.Point, new PointCoordinate(point, true), new PointCoordinate(point, false), label: label);

    public void CompareTurn(LineMark from, LineMark to, double? rate = null, double? farEnd = null) =>
        Compare(QuantityKind.Angle, new LineTurn(from, false, to, false, false), rate: rate, farEnd: farEnd);

    public void Keep(string name, Mark? mark, params ImmutableArray<Piece> pieces) =>
        kept.Add(new Kept(name, mark, pieces, Layer.Engraved, Weight.Plain, Dash.Whole, null, default, null));

    public Layout Layout(Hand hand) => new(
        new Script("by hand", "", []), "by hand", [], Sheet, Board, Kit, hand, [], [new Stage("1", "All")], Acts, [], [.. comparisons], [.. kept], [], false)
    {
        Decider = decider,
    };

    private string Name(string letter) => $"{letter}{++names}";
}
