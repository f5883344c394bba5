using System.Globalization;
using RuleAndCompass.Numbers;
using RuleAndCompass.Tests.Numbers;

namespace RuleAndCompass.Benchmarks.Exact;

/// <summary>What a run of a workload found: zeros, non-zero signs, and decisions left open.</summary>
internal sealed class Tally
{
    public int Zeros { get; set; }

    public int Others { get; set; }

    public int Open { get; set; }

    public int Proved { get; set; }

    public void Count(Decision decision)
    {
        if (!decision.Verdict.IsDecided)
            Open++;
        else if (decision.Sign == 0)
            Zeros++;
        else
            Others++;
        if (decision.Verdict.Certainty == Certainty.Proved)
            Proved++;
    }

    public override string ToString() =>
        string.Create(CultureInfo.InvariantCulture, $"zeros {Zeros} others {Others} open {Open} proved {Proved}");
}

/// <summary>The constructions of <c>peers/workloads.h</c>, step for step, on <see cref="Real"/> and <see cref="Decider"/>.</summary>
internal static class Workloads
{
    public static IReadOnlyList<string> Names { get; } = ["w1h", "w1q", "w2rot", "w2mirror", "w2comp", "w3", "w4M", "w4N", "w5", "w6"];

    public static Tally Run(string name, int size) => name switch
    {
        "w1h" => Dial(0),
        "w1q" => Dial(1),
        "w1deep" => Dial(2),
        "w2rot" => Polygon(17, 0),
        "w2comp" => Polygon(17, 1),
        "w2mirror" => Polygon(17, 2),
        "w3" => Feuerbach(),
        "w4M" => Chain(ChainM, 1, size),
        "w4N" => Chain(ChainN, 3, size),
        "w5" => PolygonByKnownCrossings(257),
        "w5mirror" => Polygon(257, 2),
        "w2known" => PolygonByKnownCrossings(17),
        "w5rot" => Polygon(257, 0),
        "w6" => Order(),
        _ => throw new ArgumentException($"No workload {name}.", nameof(name)),
    };

    private static Decider NewDecider() => new(new DeciderOptions(new byte[32]));

    private static Real Q(int numerator, int denominator = 1) => new Rational(numerator, denominator);

    private readonly record struct Vec(Real X, Real Y)
    {
        public static Vec operator +(Vec a, Vec b) => new(a.X + b.X, a.Y + b.Y);

        public static Vec operator -(Vec a, Vec b) => new(a.X - b.X, a.Y - b.Y);

        public static Vec operator *(Real s, Vec b) => new(s * b.X, s * b.Y);

        public static Real Dot(Vec a, Vec b) => a.X * b.X + a.Y * b.Y;

        public static Real Cross(Vec a, Vec b) => a.X * b.Y - a.Y * b.X;

        public Real Norm() => X * X + Y * Y;
    }

    private static Vec LineLine(Vec p, Vec d, Vec q, Vec e) => p + Vec.Cross(q - p, e) / Vec.Cross(d, e) * d;

    private static Vec Foot(Vec s, Vec o, Vec d) => o + Vec.Dot(s - o, d) / d.Norm() * d;

    private static Vec CircleCircle(Vec a, Real a2, Vec b, Real b2)
    {
        Vec v = b - a;
        Real d2 = v.Norm();
        Real along = (a2 - b2 + d2) / (2 * d2);
        Real across = Real.Sqrt(a2 / d2 - along * along);
        return a + along * v + across * new Vec(-v.Y, v.X);
    }

    private static Vec UnitBisector(Vec u, Vec v)
    {
        Vec s = u + v;
        Real length = Real.Sqrt(s.Norm());
        return new(s.X / length, s.Y / length);
    }

    private static Vec Circumcentre(Vec a, Vec b, Vec c)
    {
        Vec p = b - a;
        Vec q = c - a;
        Real d = 2 * Vec.Cross(p, q);
        Real p2 = p.Norm();
        Real q2 = q.Norm();
        return new(a.X + (q.Y * p2 - p.Y * q2) / d, a.Y + (p.X * q2 - q.X * p2) / d);
    }

    private static Vec[] Directions(int parts)
    {
        Real r2 = Real.Sqrt(2), r3 = Real.Sqrt(3);
        Real half = Q(1, 2), s45 = r2 / 2, c30 = r3 / 2;
        int n = 6 * parts;
        var d = new Vec[n + 1];
        d[0] = new(0, 1);
        d[parts] = new(s45 * c30 - s45 * half, s45 * c30 + s45 * half);
        d[2 * parts] = new(half, c30);
        d[3 * parts] = new(s45, s45);
        d[4 * parts] = new(c30, half);
        d[5 * parts] = new(s45 * c30 + s45 * half, s45 * c30 - s45 * half);
        d[n] = new(1, 0);
        for (int g = parts; g > 1; g /= 2)
        {
            for (int k = 0; k < n; k += g)
                d[k + g / 2] = UnitBisector(d[k], d[k + g]);
        }

        return d;
    }

    private static (Vec S, Vec C, Real SinL) DialBase()
    {
        Real sinL = Q(6858, 10000);
        Real cosL = Real.Sqrt(1 - sinL * sinL);
        Vec o = new(0, 0);
        Vec s = new(0, 90);
        Vec f = Foot(s, o, new(sinL, cosL));
        Real sf = Real.Sqrt((f - s).Norm());
        return (s, new(0, 90 + sf), sinL);
    }

    private static Vec TangentPoint((Vec S, Vec C, Real SinL) dial, Vec direction) =>
        LineLine(dial.C, new(direction.X, -direction.Y), dial.S, new(1, 0));

    private static Tally Dial(int mode)
    {
        var tally = new Tally();
        Decider decider = NewDecider();
        (Vec S, Vec C, Real SinL) dial = DialBase();
        int parts = mode == 0 ? 1 : 4;
        int n = 6 * parts;
        Vec[] d = Directions(parts);
        Real r3 = Real.Sqrt(3);
        Real[] hours = [0, 2 - r3, 1 / r3, 1, r3, 2 + r3];
        var tangents = new Real[n];
        if (mode == 0)
        {
            for (int k = 1; k < 6; k++)
                tangents[k] = hours[k];
        }
        else
        {
            Real t2 = (Real.Sqrt(1 + hours[1] * hours[1]) - 1) / hours[1];
            Real t1 = (Real.Sqrt(1 + t2 * t2) - 1) / t2;
            if (mode == 1)
            {
                Real t3 = (t1 + t2) / (1 - t1 * t2);
                Real[] quarters = [0, t1, t2, t3];
                for (int k = 1; k < n; k++)
                {
                    (int h, int q) = Math.DivRem(k, 4);
                    tangents[k] = q == 0 ? hours[h] : h == 0 ? quarters[q] : (hours[h] + quarters[q]) / (1 - hours[h] * quarters[q]);
                }
            }
            else
            {
                tangents[1] = t1;
                for (int k = 2; k < n; k++)
                    tangents[k] = (tangents[k - 1] + t1) / (1 - tangents[k - 1] * t1);
            }
        }

        for (int k = 1; k < n; k++)
            tally.Count(decider.Decide(TangentPoint(dial, d[k]).X / 90 - dial.SinL * tangents[k]));
        return tally;
    }

    private static Tally Polygon(int sides, int mode)
    {
        var tally = new Tally();
        Decider decider = NewDecider();
        var periods = new GaussPeriods(sides);
        Real c = periods.Get((sides - 1) / 2, 0) / 2;
        Real s = Real.Sqrt(1 - c * c);
        Vec o = new(0, 0), first = new(1, 0), second = new(c, s), previous = first, current = second;
        Real chord = (second - first).Norm();
        for (int k = 1; k < sides; k++)
        {
            Vec next = mode switch
            {
                0 => new(current.X * c - current.Y * s, current.X * s + current.Y * c),
                1 => CircleCircle(o, 1, current, chord),
                _ => 2 * Foot(previous, o, current) - previous,
            };
            previous = current;
            current = next;
        }

        tally.Count(decider.Decide(current.X - first.X));
        tally.Count(decider.Decide(current.Y - first.Y));
        return tally;
    }

    // Circle by circle round the rim: each new circle has its centre on the rim and passes through the last point, so both are known to lie on both
    // curves. The other crossing is the known one mirrored in the line of centres, and every length in that is a radius.
    private static Tally PolygonByKnownCrossings(int sides)
    {
        var tally = new Tally();
        Decider decider = NewDecider();
        var periods = new GaussPeriods(sides);
        Real c = periods.Get((sides - 1) / 2, 0) / 2;
        Real s = Real.Sqrt(1 - c * c);
        Vec first = new(1, 0), previous = first, current = new(c, s);
        Real chord = (current - first).Norm();
        Real along = (1 - chord + 1) / (2 * (Real)1);
        for (int k = 1; k < sides; k++)
            (previous, current) = (current, 2 * along * current - previous);

        tally.Count(decider.Decide(current.X - first.X));
        tally.Count(decider.Decide(current.Y - first.Y));
        return tally;
    }

    private static Tally Feuerbach()
    {
        var tally = new Tally();
        Decider decider = NewDecider();
        Vec[] v = [new(0, 0), new(13, 1), new(4, 11)];
        var u = new Vec[3, 3];
        for (int i = 0; i < 3; i++)
        {
            for (int j = i + 1; j < 3; j++)
            {
                Vec side = v[j] - v[i];
                Real length = Real.Sqrt(side.Norm());
                u[i, j] = new(side.X / length, side.Y / length);
                u[j, i] = new(-u[i, j].X, -u[i, j].Y);
            }
        }

        Vec Middle(int i, int j) => new((v[i].X + v[j].X) / 2, (v[i].Y + v[j].Y) / 2);
        Vec m = Middle(0, 1);
        Vec n = Circumcentre(m, Middle(1, 2), Middle(0, 2));
        Real r9 = Real.Sqrt((n - m).Norm());
        for (int e = 0; e < 4; e++)
        {
            Vec centre;
            if (e == 0)
            {
                centre = LineLine(v[0], u[0, 1] + u[0, 2], v[1], u[1, 0] + u[1, 2]);
            }
            else
            {
                int a = e - 1, b = (a + 1) % 3, c = (a + 2) % 3;
                centre = LineLine(v[a], u[a, b] + u[a, c], v[b], u[b, a] - u[b, c]);
            }

            Vec foot = Foot(centre, v[0], v[1] - v[0]);
            Real radius = Real.Sqrt((foot - centre).Norm());
            Real reach = e == 0 ? r9 - radius : r9 + radius;
            tally.Count(decider.Decide((centre - n).Norm() - reach * reach));
        }

        return tally;
    }

    private static readonly int[,] ChainM = { { 0, 0 }, { 9, 10 }, { 16, 17 }, { 19, 19 }, { 21, 23 }, { 31, 22 }, { 21, 26 }, { 18, 13 }, { 17, 12 }, { 4, 15 }, { 18, 24 }, { 30, 26 }, { 40, 11 } };

    private static readonly int[,] ChainN = { { 0, 0 }, { 5, 5 }, { 6, 8 }, { 11, 5 }, { 2, 3 }, { 18, 3 }, { 13, 37 }, { 27, 15 }, { 39, 48 }, { 28, 50 }, { 41, 51 }, { 26, 53 }, { 40, 36 } };

    private static Tally Chain(int[,] table, int back, int n)
    {
        var tally = new Tally();
        Decider decider = NewDecider();
        List<Vec> p = [new(0, 0), new(1, 0)];
        for (int k = 1; k <= n; k++)
        {
            int c = back == 1 || k < 4 ? k - 1 : k - 3;
            p.Add(CircleCircle(p[c], Q(table[k, 0], 8), p[k], Q(table[k, 1], 8)));
        }

        Vec A = p[n + 1], B = p[n], C = p[1];
        Vec D = B + Q(1, 3) * (C - B), E = C + Q(2, 5) * (A - C), F = A + Q(3, 7) * (B - A);
        Vec o1 = Circumcentre(A, E, F), o2 = Circumcentre(B, F, D), o3 = Circumcentre(C, D, E);
        Vec f = Foot(F, o1, o2 - o1);
        Vec m = 2 * f - F;
        tally.Count(decider.Decide((m - o3).Norm() - (C - o3).Norm()));
        return tally;
    }

    private static Tally Order()
    {
        var tally = new Tally();
        Decider decider = NewDecider();
        (Vec S, Vec C, Real SinL) dial = DialBase();
        Vec[] d = Directions(32);
        var x = new List<Real>();
        for (int k = 0; k < 192; k++)
            x.Add(TangentPoint(dial, d[k]).X);
        for (int k = 8; k <= 64; k += 8)
            x.Add(-x[k]);

        int n = x.Count;
        int[] order = new int[n];
        int[] merged = new int[n];
        for (int i = 0; i < n; i++)
            order[i] = i;
        uint state = 12345;
        for (int i = n - 1; i > 0; i--)
        {
            state = state * 1103515245u + 12345u;
            int j = (int)((state >> 16) % (uint)(i + 1));
            (order[i], order[j]) = (order[j], order[i]);
        }

        for (int width = 1; width < n; width *= 2)
        {
            for (int low = 0; low < n; low += 2 * width)
            {
                int middle = Math.Min(low + width, n), high = Math.Min(low + 2 * width, n), i = low, j = middle, k = low;
                while (i < middle && j < high)
                {
                    tally.Others++;
                    merged[k++] = decider.Compare(x[order[j]], x[order[i]]) < 0 ? order[j++] : order[i++];
                }

                while (i < middle)
                    merged[k++] = order[i++];
                while (j < high)
                    merged[k++] = order[j++];
            }

            (order, merged) = (merged, order);
        }

        bool right = true;
        for (int i = 0; i < n; i++)
            right &= order[i] == (i < 8 ? 199 - i : i - 8);
        tally.Zeros = right ? 1 : 0;
        return tally;
    }
}
