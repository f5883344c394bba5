using System.Runtime.InteropServices;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>The plates, by their index, on which something shows: each of them, or all from the first on.</summary>
internal readonly record struct PlateSet(int[]? Each, int From)
{
    public static PlateSet AllFrom(int plate) => new(null, plate);

    public static PlateSet Only(int plate) => new([plate], plate);

    /// <param name="ascending">In ascending order, at least one.</param>
    public static PlateSet Of(List<int> ascending) => new([.. ascending], ascending[0]);

    public bool Meets(PlateSet other)
    {
        if (Each is null)
        {
            return other.Each is null || other.Each[^1] >= From;
        }

        if (other.Each is null)
        {
            return Each[^1] >= other.From;
        }

        for (int i = 0, j = 0; i < Each.Length && j < other.Each.Length;)
        {
            if (Each[i] == other.Each[j])
            {
                return true;
            }

            if (Each[i] < other.Each[j])
            {
                i++;
            }
            else
            {
                j++;
            }
        }

        return false;
    }
}

/// <summary>A place for a label, and the spot it belongs to.</summary>
internal readonly record struct LabelPlace(Box Box, Spot Anchor);

/// <summary>Where a label stands.</summary>
/// <param name="IsCrowded">No free place was found: it lies on something.</param>
/// <param name="IsUnreadable">It lies on another label.</param>
internal readonly record struct PlacedLabel(Box Box, Spot Anchor, bool IsCrowded, bool IsUnreadable);

/// <summary>
/// Finds free places for names and numbers: inside the drawing, on no line and on no other label. Only what shows on a plate together is kept apart, so a
/// name can have one place from plate to plate.
/// </summary>
internal sealed class LabelPlacement(Box window)
{
    private const double SmallestCellMillimetres = 4;
    private const double CellsAcross = 500;
    private const double LineCost = 10;
    private const double LabelCost = 200;
    private const double OutsideCost = 2000;

    private readonly double cellMillimetres = CellSize(window);
    private readonly int columns = CellCount(window.Width, window);
    private readonly List<int>?[] cells = new List<int>?[CellCount(window.Width, window) * CellCount(window.Height, window)];
    private readonly List<Obstacle> obstacles = [];
    private int[] seen = [];
    private int asked;

    private readonly record struct Obstacle(Spot From, Spot To, Box Box, bool IsLine, PlateSet Plates);

    /// <summary>Keeps labels off a straight line.</summary>
    public void Block(Spot from, Spot to, PlateSet plates)
    {
        if (Clipping.Line(from, to, window) is not { } inside)
        {
            return;
        }

        int number = Add(new(inside.From, inside.To, default, true, plates));
        int steps = 1 + (int)(inside.From.DistanceTo(inside.To) / (cellMillimetres / 4));
        int last = -1;
        for (int i = 0; i <= steps; i++)
        {
            double part = (double)i / steps;
            Spot at = inside.From.Moved(part * (inside.To.X - inside.From.X), part * (inside.To.Y - inside.From.Y));
            if (Column(at.X) + (Row(at.Y) * columns) is var cell && cell != last)
            {
                Enter(cell, number);
                last = cell;
            }
        }
    }

    /// <summary>Keeps labels off the strokes of an outline.</summary>
    public void Block(Outline outline, PlateSet plates)
    {
        Spot at = outline.Start;
        foreach (Leg leg in outline.Legs)
        {
            if (leg is ArcLeg arc)
            {
                double start = Tracing.AngleOf(arc.Centre, at), end = Tracing.AngleOf(arc.Centre, arc.To);
                double sweep = arc.Clockwise ? start - end : end - start;
                sweep = sweep <= 0 ? sweep + (2 * Math.PI) : sweep;
                int chords = Math.Clamp((int)Math.Ceiling(sweep * arc.RadiusMillimetres / SmallestCellMillimetres), 4, 2000);
                for (int i = 1; i <= chords; i++)
                {
                    double angle = start + ((arc.Clockwise ? -sweep : sweep) * i / chords);
                    Spot to = arc.Centre.Moved(arc.RadiusMillimetres * Math.Cos(angle), -arc.RadiusMillimetres * Math.Sin(angle));
                    Block(at, to, plates);
                    at = to;
                }
            }
            else
            {
                Block(at, leg.To, plates);
            }

            at = leg.To;
        }

        if (outline.Closed)
        {
            Block(at, outline.Start, plates);
        }
    }

    /// <summary>Keeps labels off a box: a sign, or another label.</summary>
    public void Block(Box box, PlateSet plates)
    {
        int number = Add(new(default, default, box, false, plates));
        (int left, int right, int top, int bottom) = (Column(box.Left), Column(box.Right), Row(box.Top), Row(box.Bottom));
        for (int row = top; row <= bottom; row++)
        {
            for (int column = left; column <= right; column++)
            {
                Enter(column + (row * columns), number);
            }
        }
    }

    /// <summary>Whether nothing that is blocked touches the box.</summary>
    public bool IsFree(Box box) => Cost(box, PlateSet.AllFrom(0), double.Epsilon) == 0;

    /// <summary>Takes the first of the places that is free, else the one that covers least, and blocks it.</summary>
    /// <param name="places">Best first.</param>
    /// <param name="isTaken">Whether the caller will use such a place; one that is not used stays free. Null where any will do.</param>
    public PlacedLabel Place(IEnumerable<LabelPlace> places, PlateSet plates, Predicate<PlacedLabel>? isTaken = null)
    {
        LabelPlace best = default;
        double least = double.PositiveInfinity;
        foreach (LabelPlace place in places)
        {
            double cost = Cost(place.Box, plates, least);
            if (cost < least)
            {
                least = cost;
                best = place;
                if (cost == 0)
                {
                    break;
                }
            }
        }

        PlacedLabel label = new(best.Box, best.Anchor, least > 0, least >= LabelCost);
        if (isTaken is null || isTaken(label))
        {
            Block(best.Box, plates);
        }

        return label;
    }

    /// <summary>Places round a spot for a label of a size: beside it, then above and below, then in the corners, then further off.</summary>
    public static IEnumerable<LabelPlace> Around(Spot spot, double width, double height, double gap)
    {
        foreach (double distance in new[] { gap, gap * 1.7, gap * 2.6, gap * 3.8, gap * 5.2, gap * 7, gap * 9 })
        {
            double half = height / 2, slant = distance * 0.7;
            yield return At(spot.X + slant, spot.Y - slant - height);
            yield return At(spot.X + distance, spot.Y - half);
            yield return At(spot.X + slant, spot.Y + slant);
            yield return At(spot.X - slant - width, spot.Y - slant - height);
            yield return At(spot.X - distance - width, spot.Y - half);
            yield return At(spot.X - slant - width, spot.Y + slant);
            yield return At(spot.X - (width / 2), spot.Y - distance - height);
            yield return At(spot.X - (width / 2), spot.Y + distance);
        }

        LabelPlace At(double left, double top) => new(Box.Of(left, top, width, height), spot);
    }

    /// <summary>Places beside a curve at a spot where it runs in a direction (of unit length): on either side, at some distances.</summary>
    public static IEnumerable<LabelPlace> Beside(Spot spot, double directionX, double directionY, double width, double height, params double[] distances)
    {
        foreach (double distance in distances)
        {
            foreach (int side in new[] { 1, -1 })
            {
                double x = side * directionY, y = -side * directionX;

                // So far that the box clears the line whatever its slope.
                double reach = distance + (((Math.Abs(x) * width) + (Math.Abs(y) * height)) / 2);
                yield return new(Box.Of(spot.X + (x * reach) - (width / 2), spot.Y + (y * reach) - (height / 2), width, height), spot);
            }
        }
    }

    private double Cost(Box box, PlateSet plates, double giveUpAt)
    {
        double cost = window.Holds(box) ? 0 : OutsideCost;
        if (seen.Length < obstacles.Count)
        {
            Array.Resize(ref seen, Math.Max(64, obstacles.Count * 2));
        }

        asked++;
        (int left, int right, int top, int bottom) = (Column(box.Left), Column(box.Right), Row(box.Top), Row(box.Bottom));
        for (int row = top; row <= bottom; row++)
        {
            for (int column = left; column <= right && cost < giveUpAt; column++)
            {
                if (cells[column + (row * columns)] is { } here)
                {
                    cost += Cost(here, box, plates, giveUpAt - cost);
                }
            }
        }

        return cost;
    }

    private double Cost(List<int> here, Box box, PlateSet plates, double giveUpAt)
    {
        double cost = 0;
        ReadOnlySpan<Obstacle> all = CollectionsMarshal.AsSpan(obstacles);
        foreach (int number in here)
        {
            if (seen[number] == asked)
            {
                continue;
            }

            seen[number] = asked;
            ref readonly Obstacle obstacle = ref all[number];
            bool touches = obstacle.IsLine ? Clipping.Touches(obstacle.From, obstacle.To, box) : obstacle.Box.Overlaps(box);
            if (touches && obstacle.Plates.Meets(plates))
            {
                cost += obstacle.IsLine ? LineCost : LabelCost;
                if (cost >= giveUpAt)
                {
                    break;
                }
            }
        }

        return cost;
    }

    private int Add(Obstacle obstacle)
    {
        obstacles.Add(obstacle);
        return obstacles.Count - 1;
    }

    private void Enter(int cell, int number) => (cells[cell] ??= []).Add(number);

    // What lies outside the window counts to the nearest cell in it.
    private int Column(double x) => Math.Clamp((int)((x - window.Left) / cellMillimetres), 0, columns - 1);

    private int Row(double y) => Math.Clamp((int)((y - window.Top) / cellMillimetres), 0, (cells.Length / columns) - 1);

    private static double CellSize(Box window) => Math.Max(SmallestCellMillimetres, Math.Max(window.Width, window.Height) / CellsAcross);

    private static int CellCount(double length, Box window) => 1 + (int)(Math.Max(0, length) / CellSize(window));
}
