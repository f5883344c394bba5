using System.Globalization;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making.Wants;

/// <content>Lengths, places and openings.</content>
internal sealed partial class Constructions
{
    /// <summary>What to set the dividers to for a length: the two marks it is the distance of, else the scale, else the full-size plate.</summary>
    public Opening OpeningFor(QuantityValue length) => length.Trace is PointDistance between ? new SpanOpening(between.First, between.Second) : ByScale(length.Amount);

    /// <summary>The mark on a line at an opening from another mark on it, ahead along the line or behind.</summary>
    public PointMark AlongLine(DirectedLine line, PointMark from, Opening opening, bool ahead, string? name)
    {
        Vector way = ahead ? line.Direction : -line.Direction;
        Point wanted = from.Point.Plus(opening.Length / line.Mark.Line.DirectionLength * way);
        if (bench.Marks.Find(wanted) is { } standing)
            return standing;
        if (!HasDividers)
            throw NoTool("a length along a line", "`dividers`");
        CircleMark swung = bench.Swing(from, opening, null);
        return CrossWhere(line.Mark, swung, point => Decider.Sign(Vector.Dot(way, point.From(from.Point))) > 0, name);
    }

    /// <summary>A point measured from the middle of the sheet, or from a mark.</summary>
    public PointMark At(Point at, PointMark? from, string? name)
    {
        string start = from is null ? "the middle of the sheet" : from.Name;
        Vector step = from is null ? new(at.X, at.Y) : at.From(from.Point);
        string how = Steps(step);
        string says = how.Length == 0 ? $"Prick {{}} at {start}."
            : Kit.ScaleStep is null ? "Prick {} through from the full-size plate."
            : $"Measure {how} from {start} and prick {{}}.";
        return bench.Locate(at, name, says, from);
    }

    private ScaleOpening ByScale(Real length) => new(length, Kit.ScaleStep is { } step ? Rounded(length, step) : null);

    private static Rational Rounded(Real length, Rational step)
    {
        Rational parts = (length.TryGetRational(out Rational exact) ? exact : Rational.FromDouble(length.ToDouble())) / step;
        return (parts + new Rational(1, 2)).Floor() * step;
    }

    private string AimedWords(PointMark through, Point aim) => $"Measure {Steps(aim.From(through.Point))} from {through.Name} and prick {{}} to aim at.";

    private string Steps(Vector step)
    {
        string across = Step(step.X, "to the right", "to the left"), up = Step(step.Y, "up", "down");
        return across.Length == 0 || up.Length == 0 ? across + up : $"{across} and {up}";
    }

    private string Step(Real size, string positive, string negative)
    {
        double approximate = size.ToDouble();
        if (approximate == 0)
            return "";
        Real positiveSize = approximate < 0 ? -size : size;
        string text = Kit.ScaleStep is { } step && !positiveSize.TryGetRational(out _)
            ? ValueText.Plain(Rounded(positiveSize, step))
            : positiveSize.TryGetRational(out Rational exact) ? ValueText.Plain(exact) : Math.Abs(approximate).ToString("0.00", CultureInfo.InvariantCulture);
        return $"{text} mm {(approximate < 0 ? negative : positive)}";
    }
}
