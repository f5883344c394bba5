using RuleAndCompass.Bench;
using RuleAndCompass.Making;

namespace RuleAndCompass.Tests.Making;

/// <summary>
/// Does a layout's acts over again in plain doubles, from what another program would be told: measured places, openings off the scale, angles, and which of two
/// crossings. It shares no arithmetic with the library.
/// </summary>
internal sealed class Replay
{
    private readonly Dictionary<Mark, (double X, double Y)> points = [];
    private readonly Dictionary<Mark, (double X, double Y, double Dx, double Dy)> lines = [];
    private readonly Dictionary<Mark, (double X, double Y, double R)> circles = [];
    private readonly Dictionary<Act, double> openings = [];

    /// <summary>How far the worst point lands from where the layout says it is, millimetres, and its name.</summary>
    public static (double Millimetres, string Name) Worst(Layout layout)
    {
        Replay replay = new();
        (double Millimetres, string Name) worst = (0, "");
        foreach (Act act in layout.Acts)
        {
            replay.Do(act);
            if (act.Makes is PointMark mark)
            {
                (double x, double y) = replay.points[mark];
                double off = Math.Sqrt(Squared(x - mark.Point.XMillimetres) + Squared(y - mark.Point.YMillimetres));
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
                points[locate.Point] = (locate.Point.Point.XMillimetres, locate.Point.Point.YMillimetres);
                break;
            case Lay lay:
                (double fx, double fy) = points[lay.First];
                (double sx, double sy) = points[lay.Second];
                lines[lay.Line] = Unit(fx, fy, sx - fx, sy - fy);
                break;
            case SetOpening set:
                openings[set] = set.Opening switch
                {
                    SpanOpening span => Apart(points[span.First], points[span.Second]),
                    ScaleOpening scale => scale.Wanted.ToDouble(),
                    FreeOpening free => free.Chosen.ToDouble(),
                    _ => throw new InvalidOperationException(set.Opening.GetType().Name),
                };
                break;
            case Swing swing:
                circles[swing.Circle] = (points[swing.Centre].X, points[swing.Centre].Y, openings[swing.Setting]);
                break;
            case Protract protract:
                lines[protract.Line] = Turned(lines[protract.Base], points[protract.At], protract.By.ToDegreesDouble() * Math.PI / 180);
                break;
            case Slide slide:
                (_, _, double dx, double dy) = lines[slide.Base];
                lines[slide.Line] = (points[slide.Through].X, points[slide.Through].Y, -dy, dx);
                break;
            case Cross cross:
                points[cross.Point] = Crossed(cross.First, cross.Second, cross.Which);
                break;
            default:
                throw new InvalidOperationException(act.GetType().Name);
        }
    }

    private (double X, double Y) Crossed(CurveMark first, CurveMark second, int which) => (first, second) switch
    {
        (LineMark, LineMark) => Crossed(lines[first], lines[second]),
        (LineMark, CircleMark) => Crossed(lines[first], circles[second], which),
        (CircleMark, LineMark) => Crossed(lines[second], circles[first], which),
        _ => Crossed(circles[first], circles[second], which),
    };

    private static (double X, double Y) Crossed((double X, double Y, double Dx, double Dy) a, (double X, double Y, double Dx, double Dy) b)
    {
        double along = (((b.X - a.X) * b.Dy) - ((b.Y - a.Y) * b.Dx)) / ((a.Dx * b.Dy) - (a.Dy * b.Dx));
        return (a.X + (along * a.Dx), a.Y + (along * a.Dy));
    }

    private static (double X, double Y) Crossed((double X, double Y, double Dx, double Dy) line, (double X, double Y, double R) circle, int which)
    {
        double foot = ((circle.X - line.X) * line.Dx) + ((circle.Y - line.Y) * line.Dy);
        double offset = ((circle.X - line.X) * line.Dy) - ((circle.Y - line.Y) * line.Dx);
        double half = Math.Sqrt(Math.Max(0, (circle.R - offset) * (circle.R + offset)));
        double along = which == 0 ? foot - half : foot + half;
        return (line.X + (along * line.Dx), line.Y + (along * line.Dy));
    }

    private static (double X, double Y) Crossed((double X, double Y, double R) a, (double X, double Y, double R) b, int which)
    {
        double between = Apart((a.X, a.Y), (b.X, b.Y)), ux = (b.X - a.X) / between, uy = (b.Y - a.Y) / between;
        double along = (between + ((a.R - b.R) * (a.R + b.R) / between)) / 2;
        double up = Math.Sqrt(Math.Max(0, (a.R - along) * (a.R + along)));
        if (which == 1)
            up = -up;
        return (a.X + (along * ux) - (up * uy), a.Y + (along * uy) + (up * ux));
    }

    private static (double X, double Y, double Dx, double Dy) Turned((double X, double Y, double Dx, double Dy) line, (double X, double Y) at, double by) =>
        (at.X, at.Y, (line.Dx * Math.Cos(by)) - (line.Dy * Math.Sin(by)), (line.Dx * Math.Sin(by)) + (line.Dy * Math.Cos(by)));

    private static (double X, double Y, double Dx, double Dy) Unit(double x, double y, double dx, double dy)
    {
        double length = Math.Sqrt(Squared(dx) + Squared(dy));
        return (x, y, dx / length, dy / length);
    }

    private static double Apart((double X, double Y) a, (double X, double Y) b) => Math.Sqrt(Squared(a.X - b.X) + Squared(a.Y - b.Y));

    private static double Squared(double value) => value * value;
}
