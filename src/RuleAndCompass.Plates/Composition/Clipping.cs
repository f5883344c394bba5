using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>What of a line or an arc lies in a box.</summary>
internal static class Clipping
{
    /// <summary>The part of a straight piece in the box; null where there is none.</summary>
    /// <remarks>Liang and Barsky, ACM Transactions on Graphics 3 (1984), pp. 1–22; from memory.</remarks>
    public static (Spot From, Spot To)? Line(Spot from, Spot to, Box box)
    {
        double dx = to.X - from.X, dy = to.Y - from.Y, enter = 0, leave = 1;
        if (!Cut(-dx, from.X - box.Left) || !Cut(dx, box.Right - from.X) || !Cut(-dy, from.Y - box.Top) || !Cut(dy, box.Bottom - from.Y))
        {
            return null;
        }

        return (enter == 0 ? from : from.Moved(enter * dx, enter * dy), leave == 1 ? to : from.Moved(leave * dx, leave * dy));

        bool Cut(double towards, double room)
        {
            if (towards == 0)
            {
                return room >= 0;
            }

            double at = room / towards;
            if (towards < 0)
            {
                enter = Math.Max(enter, at);
            }
            else
            {
                leave = Math.Min(leave, at);
            }

            return enter <= leave;
        }
    }

    /// <summary>Whether a straight piece and a box share anything.</summary>
    public static bool Touches(Spot from, Spot to, Box box)
    {
        if (Math.Max(from.X, to.X) < box.Left || Math.Min(from.X, to.X) > box.Right || Math.Max(from.Y, to.Y) < box.Top || Math.Min(from.Y, to.Y) > box.Bottom)
        {
            return false;
        }

        // The line parts the corners, or it does not touch.
        double dx = to.X - from.X, dy = to.Y - from.Y;
        double a = Side(box.Left, box.Top), b = Side(box.Right, box.Top), c = Side(box.Left, box.Bottom), d = Side(box.Right, box.Bottom);
        return !((a > 0 && b > 0 && c > 0 && d > 0) || (a < 0 && b < 0 && c < 0 && d < 0));

        double Side(double x, double y) => (dx * (y - from.Y)) - (dy * (x - from.X));
    }

    /// <summary>The parts of an arc in the box, in order.</summary>
    public static IEnumerable<ArcSpan> Arc(Spot centre, double radius, ArcSpan arc, Box box)
    {
        if (box.Holds(new Box(centre.X - radius, centre.Y - radius, centre.X + radius, centre.Y + radius)))
        {
            yield return arc;
            yield break;
        }

        List<double> cuts = [0, arc.Sweep];
        foreach (double angle in Crossings(centre, radius, box))
        {
            double along = (angle - arc.Start) % (2 * Math.PI);
            along = along < 0 ? along + (2 * Math.PI) : along;
            if (along < arc.Sweep)
            {
                cuts.Add(along);
            }
        }

        cuts.Sort();
        for (int i = 1; i < cuts.Count; i++)
        {
            double middle = arc.Start + ((cuts[i - 1] + cuts[i]) / 2);
            if (cuts[i] > cuts[i - 1] && box.Holds(centre.Moved(radius * Math.Cos(middle), -radius * Math.Sin(middle))))
            {
                yield return new ArcSpan(arc.Start + cuts[i - 1], cuts[i] - cuts[i - 1]);
            }
        }
    }

    private static IEnumerable<double> Crossings(Spot centre, double radius, Box box)
    {
        foreach (double x in new[] { box.Left, box.Right })
        {
            double cosine = (x - centre.X) / radius;
            if (Math.Abs(cosine) <= 1)
            {
                yield return Math.Acos(cosine);
                yield return -Math.Acos(cosine);
            }
        }

        foreach (double y in new[] { box.Top, box.Bottom })
        {
            double sine = (centre.Y - y) / radius;
            if (Math.Abs(sine) <= 1)
            {
                yield return Math.Asin(sine);
                yield return Math.PI - Math.Asin(sine);
            }
        }
    }
}
