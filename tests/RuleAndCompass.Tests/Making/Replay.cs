using System.Globalization;
using RuleAndCompass.Bench;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Making;

/// <summary>
/// Does a layout's acts over again in decimals of 28 digits, from what another program would be told: measured places, openings off the scale, angles, and which
/// of two crossings. It shares no arithmetic with the library. (Doubles would do but for circles that reach far off the sheet near a pole.)
/// </summary>
internal sealed class Replay(Decider decider)
{
    private readonly Dictionary<Mark, (decimal X, decimal Y)> points = [];
    private readonly Dictionary<Mark, (decimal X, decimal Y, decimal Dx, decimal Dy)> lines = [];
    private readonly Dictionary<Mark, (decimal X, decimal Y, decimal R)> circles = [];
    private readonly Dictionary<Act, decimal> openings = [];

    /// <summary>How far the worst point lands from where the layout says it is, millimetres, and its name.</summary>
    public static (double Millimetres, string Name) Worst(Layout layout)
    {
        Replay replay = new(layout.Decider);
        (double Millimetres, string Name) worst = (0, "");
        foreach (Act act in layout.Acts)
        {
            replay.Do(act);
            if (act.Makes is PointMark mark)
            {
                (decimal x, decimal y) = replay.points[mark];
                double off = (double)Root(Squared(x - replay.Given(mark.Point.X)) + Squared(y - replay.Given(mark.Point.Y)));
                if (!(off <= worst.Millimetres))
                    worst = (off, mark.Name);
            }
        }

        return worst;
    }

    private void Do(Act act)
    {
        switch (act)
        {
            case Locate locate:
                points[locate.Point] = (Given(locate.Point.Point.X), Given(locate.Point.Point.Y));
                break;
            case Lay lay:
                (decimal fx, decimal fy) = points[lay.First];
                (decimal sx, decimal sy) = points[lay.Second];
                lines[lay.Line] = Unit(fx, fy, sx - fx, sy - fy);
                break;
            case SetOpening set:
                openings[set] = set.Opening switch
                {
                    SpanOpening span => Apart(points[span.First], points[span.Second]),
                    ScaleOpening scale => Given(scale.Wanted),
                    FreeOpening free => Given(free.Chosen),
                    _ => throw new InvalidOperationException(set.Opening.GetType().Name),
                };
                break;
            case Swing swing:
                circles[swing.Circle] = (points[swing.Centre].X, points[swing.Centre].Y, openings[swing.Setting]);
                break;
            case Protract protract:
                lines[protract.Line] = Turned(lines[protract.Base], points[protract.At], protract.By);
                break;
            case Slide slide:
                (_, _, decimal dx, decimal dy) = lines[slide.Base];
                lines[slide.Line] = (points[slide.Through].X, points[slide.Through].Y, -dy, dx);
                break;
            case Cross cross:
                points[cross.Point] = Crossed(cross.First, cross.Second, cross.Which);
                break;
            default:
                throw new InvalidOperationException(act.GetType().Name);
        }
    }

    private (decimal X, decimal Y) Crossed(CurveMark first, CurveMark second, int which) => (first, second) switch
    {
        (LineMark, LineMark) => Crossed(lines[first], lines[second]),
        (LineMark, CircleMark) => Crossed(lines[first], circles[second], which),
        (CircleMark, LineMark) => Crossed(lines[second], circles[first], which),
        _ => Crossed(circles[first], circles[second], which),
    };

    private static (decimal X, decimal Y) Crossed((decimal X, decimal Y, decimal Dx, decimal Dy) a, (decimal X, decimal Y, decimal Dx, decimal Dy) b)
    {
        decimal along = (((b.X - a.X) * b.Dy) - ((b.Y - a.Y) * b.Dx)) / ((a.Dx * b.Dy) - (a.Dy * b.Dx));
        return (a.X + (along * a.Dx), a.Y + (along * a.Dy));
    }

    private static (decimal X, decimal Y) Crossed((decimal X, decimal Y, decimal Dx, decimal Dy) line, (decimal X, decimal Y, decimal R) circle, int which)
    {
        decimal foot = ((circle.X - line.X) * line.Dx) + ((circle.Y - line.Y) * line.Dy);
        decimal offset = ((circle.X - line.X) * line.Dy) - ((circle.Y - line.Y) * line.Dx);
        decimal half = Root(Math.Max(0m, (circle.R - offset) * (circle.R + offset)));
        decimal along = which == 0 ? foot - half : foot + half;
        return (line.X + (along * line.Dx), line.Y + (along * line.Dy));
    }

    private static (decimal X, decimal Y) Crossed((decimal X, decimal Y, decimal R) a, (decimal X, decimal Y, decimal R) b, int which)
    {
        decimal between = Apart((a.X, a.Y), (b.X, b.Y)), ux = (b.X - a.X) / between, uy = (b.Y - a.Y) / between;
        decimal along = (between + ((a.R - b.R) * (a.R + b.R) / between)) / 2;
        decimal up = Root(Math.Max(0m, (a.R - along) * (a.R + along)));
        if (which == 1)
            up = -up;
        return (a.X + (along * ux) - (up * uy), a.Y + (along * uy) + (up * ux));
    }

    private (decimal X, decimal Y, decimal Dx, decimal Dy) Turned((decimal X, decimal Y, decimal Dx, decimal Dy) line, (decimal X, decimal Y) at, Angle by)
    {
        (decimal sine, decimal cosine) = SineAndCosine(by);
        return (at.X, at.Y, (line.Dx * cosine) - (line.Dy * sine), (line.Dx * sine) + (line.Dy * cosine));
    }

    private static (decimal X, decimal Y, decimal Dx, decimal Dy) Unit(decimal x, decimal y, decimal dx, decimal dy)
    {
        decimal length = Root(Squared(dx) + Squared(dy));
        return (x, y, dx / length, dy / length);
    }

    private static decimal Apart((decimal X, decimal Y) a, (decimal X, decimal Y) b) => Root(Squared(a.X - b.X) + Squared(a.Y - b.Y));

    private static decimal Squared(decimal value) => value * value;

    // A number that the script gives, to 28 digits.
    private decimal Given(Real value) => decimal.Parse(decider.ToDecimal(value, 28), NumberStyles.Float, CultureInfo.InvariantCulture);

    // Newton's steps from the double.
    private static decimal Root(decimal value)
    {
        if (value == 0)
            return 0;
        decimal root = (decimal)Math.Sqrt((double)value);
        for (int step = 0; step < 3 && root != 0; step++)
            root = (root + (value / root)) / 2;
        return root;
    }

    // The series of sine and cosine, for an angle brought within half a turn.
    private (decimal Sine, decimal Cosine) SineAndCosine(Angle by)
    {
        const decimal Pi = 3.1415926535897932384626433833m;
        decimal degrees = decimal.Remainder(Given(by.Degrees), 360);
        decimal radians = (degrees > 180 ? degrees - 360 : degrees < -180 ? degrees + 360 : degrees) * Pi / 180;
        decimal sine = 0, cosine = 0, term = 1;
        for (int power = 0; power < 40; power++)
        {
            if (power % 2 == 0)
                cosine += power % 4 == 0 ? term : -term;
            else
                sine += power % 4 == 1 ? term : -term;
            term *= radians / (power + 1);
        }

        return (sine, cosine);
    }
}
