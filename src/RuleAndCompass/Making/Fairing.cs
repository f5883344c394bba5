using System.Collections.Immutable;
using RuleAndCompass.Geometry;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making;

/// <summary>A curve of arcs that touch, through points in order, as a batten lies.</summary>
/// <remarks>
/// Two arcs between each pair of points, touching each other and the chosen tangents: Bolton, "Biarc curves", Computer-Aided Design 7 (1975), with the
/// tangent at an inner point that of the circle through it and its neighbours. The points are exact; where the arcs join between them is a double made exact,
/// since it is a choice and not a construction.
/// </remarks>
internal static class Fairing
{
    private const double Straight = 1e-9;

    public static ImmutableArray<Piece> Arcs(IReadOnlyList<Point> points, bool closed, Decider decider)
    {
        int count = points.Count;
        (double X, double Y)[] at = [.. points.Select(point => (point.XMillimetres, point.YMillimetres))];
        (double X, double Y)[] tangents = new (double, double)[count];
        for (int i = 0; i < count; i++)
        {
            int before = i - 1, after = i + 1;
            if (closed)
            {
                before = (before + count) % count;
                after %= count;
            }

            tangents[i] = before < 0 || after >= count ? (double.NaN, 0) : MiddleTangent(at[before], at[i], at[after]);
        }

        // An open end takes the tangent that mirrors its neighbour's in the chord.
        if (double.IsNaN(tangents[0].X))
            tangents[0] = count == 2 ? Unit(at[0], at[1]) : Mirrored(tangents[1], Unit(at[0], at[1]));
        if (double.IsNaN(tangents[^1].X))
            tangents[^1] = count == 2 ? Unit(at[0], at[1]) : Mirrored(tangents[^2], Unit(at[^2], at[^1]));
        ImmutableArray<Piece>.Builder pieces = ImmutableArray.CreateBuilder<Piece>();
        for (int i = 0; i + 1 < count || (closed && i < count); i++)
        {
            int next = (i + 1) % count;
            AddPair(pieces, points[i], points[next], tangents[i], tangents[next]);
        }

        return pieces.ToImmutable();
    }

    private static void AddPair(ImmutableArray<Piece>.Builder pieces, Point from, Point to, (double X, double Y) t0, (double X, double Y) t1)
    {
        (double X, double Y) a = (from.XMillimetres, from.YMillimetres), b = (to.XMillimetres, to.YMillimetres);
        (double vx, double vy) = (b.X - a.X, b.Y - a.Y);
        double chord = (vx * vx) + (vy * vy);
        double sumX = t0.X + t1.X, sumY = t0.Y + t1.Y;
        double along = (vx * sumX) + (vy * sumY);
        double spread = 2 * (1 - ((t0.X * t1.X) + (t0.Y * t1.Y)));
        double reach = spread < Straight ? chord / (2 * along) : (-along + Math.Sqrt((along * along) + (spread * chord))) / spread;
        (double X, double Y) join = ((a.X + b.X + (reach * (t0.X - t1.X))) / 2, (a.Y + b.Y + (reach * (t0.Y - t1.Y))) / 2);
        Point middle = new(Rational.FromDouble(join.X), Rational.FromDouble(join.Y));
        pieces.Add(Arc(from, middle, t0));
        pieces.Add(Arc(middle, to, Mirrored(t1, Unit(join, b))));
    }

    // The arc that leaves a point along a tangent and comes to another point.
    private static Piece Arc(Point from, Point to, (double X, double Y) tangent)
    {
        double vx = to.XMillimetres - from.XMillimetres, vy = to.YMillimetres - from.YMillimetres;
        double across = (tangent.X * vy) - (tangent.Y * vx);
        double chord = (vx * vx) + (vy * vy);
        if (Math.Abs(across) <= Straight * chord)
            return new SegmentPiece(from, to);
        double radius = chord / (2 * across);
        Point centre = new(from.X + Rational.FromDouble(-tangent.Y * radius), from.Y + Rational.FromDouble(tangent.X * radius));
        return new ArcPiece(centre, from.DistanceTo(centre), from, to, across < 0);
    }

    private static (double X, double Y) MiddleTangent((double X, double Y) a, (double X, double Y) b, (double X, double Y) c)
    {
        // The tangent at b of the circle through a, b, c: the chords' directions turned by each other.
        (double X, double Y) u = Unit(a, b), v = Unit(b, c), w = Unit(a, c);
        (double X, double Y) turned = ((u.X * v.X) - (u.Y * v.Y), (u.X * v.Y) + (u.Y * v.X));
        return ((turned.X * w.X) + (turned.Y * w.Y), (turned.Y * w.X) - (turned.X * w.Y));
    }

    private static (double X, double Y) Mirrored((double X, double Y) tangent, (double X, double Y) chord)
    {
        double along = 2 * ((tangent.X * chord.X) + (tangent.Y * chord.Y));
        return ((along * chord.X) - tangent.X, (along * chord.Y) - tangent.Y);
    }

    private static (double X, double Y) Unit((double X, double Y) from, (double X, double Y) to)
    {
        double x = to.X - from.X, y = to.Y - from.Y, length = Math.Sqrt((x * x) + (y * y));
        return (x / length, y / length);
    }
}
