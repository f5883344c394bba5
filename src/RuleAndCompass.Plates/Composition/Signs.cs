using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>
/// The signs of the plates, drawn from the tools themselves, each of its own shape. Directions are of unit length, on the page, y down.
/// </summary>
internal static class Signs
{
    public const double RingRadius = 1.15;
    public const double NeedleHeight = 5.2;
    public const double NeedleHalfWidth = 0.75;
    public const double SpanOffset = 2.4;

    private const double TickHalfLength = 1.7;

    /// <summary>A dot in a fine ring.</summary>
    public static void Prick(Canvas canvas, Spot at)
    {
        canvas.Fill(Role.Now, Outline.Circle(at, 0.36), Ink.Accent);
        canvas.Draw(Role.Now, Outline.Circle(at, RingRadius), Pens.Now);
    }

    /// <summary>The middle of the sheet.</summary>
    public static void Middle(Canvas canvas, Spot at)
    {
        canvas.Line(Role.Frame, at.Moved(-2.5, 0), at.Moved(2.5, 0), Pens.Earlier);
        canvas.Line(Role.Frame, at.Moved(0, -2.5), at.Moved(0, 2.5), Pens.Earlier);
    }

    /// <summary>A point that stands already.</summary>
    public static void Standing(Canvas canvas, Spot at, bool now) =>
        canvas.Fill(now ? Role.Present : Role.Earlier, Outline.Circle(at, 0.36), now ? Ink.Black : Ink.Grey);

    /// <summary>A needle standing on its point.</summary>
    public static void Needle(Canvas canvas, Spot at)
    {
        double shoulder = at.Y - 3.4, top = at.Y - NeedleHeight;
        canvas.Fill(
            Role.Now,
            Outline.Through(
                true,
                at,
                new Spot(at.X - NeedleHalfWidth, shoulder),
                new Spot(at.X - NeedleHalfWidth, top),
                new Spot(at.X + NeedleHalfWidth, top),
                new Spot(at.X + NeedleHalfWidth, shoulder)),
            Ink.Accent);
    }

    /// <summary>A tick across the line, where the edge is laid to a point.</summary>
    public static void Tick(Canvas canvas, Spot at, double directionX, double directionY) => canvas.Line(
        Role.Now,
        at.Moved(-directionY * TickHalfLength, directionX * TickHalfLength),
        at.Moved(directionY * TickHalfLength, -directionX * TickHalfLength),
        Pens.NowHeavy);

    /// <summary>The span between two points, beside the line that joins them, with its two feet; what leaves the window is cut off.</summary>
    /// <param name="side">1 for the left as one goes from the first to the second, −1 for the right.</param>
    public static void Span(Canvas canvas, Spot from, Spot to, int side, Box window)
    {
        (Spot first, Spot second) = SpanBridge(from, to, side);
        if (window.Holds(first) && window.Holds(second))
        {
            canvas.Draw(Role.Now, Outline.Through(false, from, first, second, to), Pens.Now);
            return;
        }

        foreach ((Spot a, Spot b) in new[] { (from, first), (first, second), (second, to) })
        {
            if (Clipping.Line(a, b, window) is { } shown)
            {
                canvas.Line(Role.Now, shown.From, shown.To, Pens.Now);
            }
        }
    }

    public static (Spot From, Spot To) SpanBridge(Spot from, Spot to, int side)
    {
        double length = from.DistanceTo(to);
        if (length == 0)
        {
            return (from, to);
        }

        double x = side * (to.Y - from.Y) / length * SpanOffset, y = -side * (to.X - from.X) / length * SpanOffset;
        return (from.Moved(x, y), to.Moved(x, y));
    }

    /// <summary>The square's corner, laid into the angle between two directions.</summary>
    public static void Corner(Canvas canvas, Spot at, double alongX, double alongY, double upX, double upY)
    {
        const double leg = 3.2;
        canvas.Draw(
            Role.Now,
            Outline.Through(false, at.Moved(alongX * leg, alongY * leg), at.Moved((alongX + upX) * leg, (alongY + upY) * leg), at.Moved(upX * leg, upY * leg)),
            Pens.NowHeavy);
    }

    /// <summary>The protractor's arc from one direction to the other, with small feet across its ends.</summary>
    public static void Protractor(Canvas canvas, Spot at, double radius, double startRadians, double sweepRadians)
    {
        canvas.Draw(Role.Now, Outline.Arc(at, radius, startRadians, sweepRadians), Pens.NowHeavy);
        foreach (double angle in new[] { startRadians, startRadians + sweepRadians })
        {
            double x = Math.Cos(angle), y = -Math.Sin(angle);
            canvas.Line(Role.Now, at.Moved(x * (radius - 0.8), y * (radius - 0.8)), at.Moved(x * (radius + 0.8), y * (radius + 0.8)), Pens.Now);
        }
    }

    /// <summary>A bar to be measured, from a spot to the right or down: ends, and a division every 10 mm.</summary>
    public static void CheckBar(Canvas canvas, Spot from, double length, bool across)
    {
        Spot At(double along, double off) => across ? from.Moved(along, off) : from.Moved(off, along);
        canvas.Line(Role.CheckBar, At(0, 0), At(length, 0), Pens.Bar);
        canvas.Line(Role.CheckBar, At(0, -2), At(0, 2), Pens.Rule);
        canvas.Line(Role.CheckBar, At(length, -2), At(length, 2), Pens.Rule);
        for (double along = 10; along < length; along += 10)
        {
            canvas.Line(Role.CheckBar, At(along, 0), At(along, along % 50 == 0 ? -1.5 : -1), Pens.Rule);
        }
    }
}
