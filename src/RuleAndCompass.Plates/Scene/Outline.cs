using System.Collections.Immutable;

namespace RuleAndCompass.Plates.Scene;

/// <summary>A piece of an outline, from where the piece before it ended.</summary>
public abstract record Leg(Spot To);

/// <summary>A straight piece.</summary>
public sealed record StraightLeg(Spot To) : Leg(To);

/// <summary>An arc of at most a third of a turn, so that its radius and ends tell its centre well.</summary>
/// <param name="Clockwise">As seen on the page.</param>
public sealed record ArcLeg(Spot Centre, double RadiusMillimetres, Spot To, bool Clockwise) : Leg(To);

/// <summary>Where a pen goes without leaving the page.</summary>
public sealed record Outline(Spot Start, ImmutableArray<Leg> Legs, bool Closed)
{
    private const double LargestLegRadians = 2 * Math.PI / 3;

    /// <summary>A straight line.</summary>
    public static Outline Line(Spot from, Spot to) => new(from, [new StraightLeg(to)], false);

    /// <summary>Straight pieces through spots, two or more.</summary>
    public static Outline Through(bool closed, params ReadOnlySpan<Spot> spots)
    {
        ImmutableArray<Leg>.Builder legs = ImmutableArray.CreateBuilder<Leg>(spots.Length - 1);
        for (int i = 1; i < spots.Length; i++)
        {
            legs.Add(new StraightLeg(spots[i]));
        }

        return new Outline(spots[0], legs.MoveToImmutable(), closed);
    }

    /// <summary>The edge of a box.</summary>
    public static Outline Around(Box box) => Through(
        true, new Spot(box.Left, box.Top), new Spot(box.Right, box.Top), new Spot(box.Right, box.Bottom), new Spot(box.Left, box.Bottom));

    /// <summary>A whole circle.</summary>
    public static Outline Circle(Spot centre, double radiusMillimetres) => Arc(centre, radiusMillimetres, 0, 2 * Math.PI);

    /// <summary>An arc, or a closed circle where the sweep is a whole turn.</summary>
    /// <param name="startRadians">From right, anticlockwise as seen on the page.</param>
    /// <param name="sweepRadians">Likewise; negative runs clockwise. No more than a turn.</param>
    public static Outline Arc(Spot centre, double radiusMillimetres, double startRadians, double sweepRadians)
    {
        bool whole = Math.Abs(sweepRadians) >= 2 * Math.PI;
        int count = Math.Max(1, (int)Math.Ceiling((Math.Abs(sweepRadians) / LargestLegRadians) - 1e-9));
        Spot At(int i)
        {
            double angle = startRadians + (sweepRadians * i / count);
            return new Spot(centre.X + (radiusMillimetres * Math.Cos(angle)), centre.Y - (radiusMillimetres * Math.Sin(angle)));
        }

        Spot start = At(0);
        ImmutableArray<Leg>.Builder legs = ImmutableArray.CreateBuilder<Leg>(count);
        for (int i = 1; i <= count; i++)
        {
            legs.Add(new ArcLeg(centre, radiusMillimetres, whole && i == count ? start : At(i), sweepRadians < 0));
        }

        return new Outline(start, legs.MoveToImmutable(), whole);
    }
}
