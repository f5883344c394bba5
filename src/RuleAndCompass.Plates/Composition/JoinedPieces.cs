using RuleAndCompass.Geometry;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Plates.Composition;

/// <summary>A straight step, or an arc's, to a point.</summary>
internal readonly record struct RunStep(Point To, ArcPiece? Arc, bool Clockwise);

/// <summary>Pieces that a tool goes along without a lift.</summary>
internal sealed record Run(Point Start, List<RunStep> Steps, bool IsClosed)
{
    public Point End => Steps[^1].To;

    public Run Reversed()
    {
        List<RunStep> back = new(Steps.Count);
        for (int i = Steps.Count - 1; i >= 0; i--)
        {
            RunStep step = Steps[i];
            back.Add(new RunStep(i == 0 ? Start : Steps[i - 1].To, step.Arc, !step.Clockwise));
        }

        return new Run(End, back, IsClosed);
    }
}

/// <summary>
/// Joins straight pieces and arcs that share an end. Doubles only find the candidates; whether two ends are one point is decided exactly, and one point
/// then stands for both, so that they agree to the last digit printed.
/// </summary>
internal static class JoinedPieces
{
    // Far coarser than the error of doubles, far finer than two marks at a bench.
    private const double CellMillimetres = 1e-6;

    /// <summary>Groups of runs: the runs of one group hang together. A group is one path.</summary>
    public static List<List<Run>> Of(IEnumerable<Kept> kept, Decider decider, CancellationToken cancellation)
    {
        SharedPoints points = new(decider);
        List<Run> runs = [];
        foreach (Kept each in kept)
        {
            // A kept run's own pieces follow on; they are joined in the order in which they were asked for.
            Run? open = null;
            foreach (Piece piece in each.Pieces)
            {
                cancellation.ThrowIfCancellationRequested();
                if (piece is not (SegmentPiece or ArcPiece))
                {
                    continue;
                }

                (Point from, Point to) = piece is ArcPiece arc ? (points.One(arc.From), points.One(arc.To)) : Ends((SegmentPiece)piece);
                RunStep step = new(to, piece as ArcPiece, piece is ArcPiece { Clockwise: true });
                if (open is not null && ReferenceEquals(open.End, from))
                {
                    open.Steps.Add(step);
                    continue;
                }

                open = new Run(from, [step], false);
                runs.Add(open);
            }
        }

        for (int i = 0; i < runs.Count; i++)
        {
            runs[i] = Closed(runs[i]);
        }

        return Grouped(JoinEnds(runs, cancellation));

        (Point, Point) Ends(SegmentPiece segment) => (points.One(segment.From), points.One(segment.To));
    }

    // Where just two open ends meet they become one run; where more meet, which goes on into which would be a guess.
    private static List<Run> JoinEnds(List<Run> runs, CancellationToken cancellation)
    {
        Dictionary<Point, List<int>> ends = new(ReferenceEqualityComparer.Instance);
        for (int i = 0; i < runs.Count; i++)
        {
            if (!runs[i].IsClosed)
            {
                Note(runs[i].Start, i);
                Note(runs[i].End, i);
            }
        }

        int[] now = [.. Enumerable.Range(0, runs.Count)];
        foreach ((Point at, List<int> meeting) in ends)
        {
            cancellation.ThrowIfCancellationRequested();
            if (meeting.Count != 2)
            {
                continue;
            }

            int first = Find(meeting[0]), second = Find(meeting[1]);
            if (first == second)
            {
                continue;
            }

            (first, second) = (Math.Min(first, second), Math.Max(first, second));
            Run a = runs[first], b = runs[second];
            a = ReferenceEquals(a.End, at) ? a : a.Reversed();
            b = ReferenceEquals(b.Start, at) ? b : b.Reversed();
            runs[first] = Closed(new Run(a.Start, [.. a.Steps, .. b.Steps], false));
            now[second] = first;
        }

        return [.. runs.Where((_, i) => now[i] == i)];

        void Note(Point end, int run)
        {
            if (!ends.TryGetValue(end, out List<int>? here))
            {
                ends.Add(end, here = []);
            }

            here.Add(run);
        }

        int Find(int run)
        {
            while (now[run] != run)
            {
                run = now[run] = now[now[run]];
            }

            return run;
        }
    }

    private static List<List<Run>> Grouped(List<Run> runs)
    {
        Dictionary<Point, int> firstWith = new(ReferenceEqualityComparer.Instance);
        int[] group = [.. Enumerable.Range(0, runs.Count)];
        for (int i = 0; i < runs.Count; i++)
        {
            foreach (Point point in runs[i].Steps.Select(step => step.To).Prepend(runs[i].Start))
            {
                if (firstWith.TryGetValue(point, out int other))
                {
                    int a = Find(i), b = Find(other);
                    group[Math.Max(a, b)] = Math.Min(a, b);
                }
                else
                {
                    firstWith.Add(point, i);
                }
            }
        }

        SortedDictionary<int, List<Run>> groups = [];
        for (int i = 0; i < runs.Count; i++)
        {
            int leader = Find(i);
            if (!groups.TryGetValue(leader, out List<Run>? together))
            {
                groups.Add(leader, together = []);
            }

            together.Add(runs[i]);
        }

        return [.. groups.Values];

        int Find(int run)
        {
            while (group[run] != run)
            {
                run = group[run] = group[group[run]];
            }

            return run;
        }
    }

    private static Run Closed(Run run) => run.Steps.Count > 1 && ReferenceEquals(run.Start, run.End) ? run with { IsClosed = true } : run;

    /// <summary>One point for all that are proved to be the same.</summary>
    private sealed class SharedPoints(Decider decider)
    {
        private readonly Dictionary<Point, Point> known = new(ReferenceEqualityComparer.Instance);
        private readonly Dictionary<(long X, long Y), List<Point>> cells = [];

        public Point One(Point point)
        {
            if (known.TryGetValue(point, out Point? shared))
            {
                return shared;
            }

            (long x, long y) = ((long)Math.Floor(point.XMillimetres / CellMillimetres), (long)Math.Floor(point.YMillimetres / CellMillimetres));
            for (long column = x - 1; column <= x + 1; column++)
            {
                for (long row = y - 1; row <= y + 1; row++)
                {
                    foreach (Point near in cells.GetValueOrDefault((column, row), []))
                    {
                        if (decider.Decide(near.X - point.X).IsZero && decider.Decide(near.Y - point.Y).IsZero)
                        {
                            known.Add(point, near);
                            return near;
                        }
                    }
                }
            }

            if (!cells.TryGetValue((x, y), out List<Point>? here))
            {
                cells.Add((x, y), here = []);
            }

            here.Add(point);
            known.Add(point, point);
            return point;
        }
    }
}
