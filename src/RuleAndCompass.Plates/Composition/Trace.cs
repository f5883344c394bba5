using System.Collections.Immutable;
using RuleAndCompass.Bench;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>
/// A mark as it is drawn, in doubles. Spots lie on the stock: millimetres right of and below the middle of the sheet.
/// </summary>
/// <param name="Act">The number of the act that made it.</param>
internal abstract record Trace(Mark Mark, int Act);

/// <summary>A pricked point.</summary>
internal sealed record PointTrace(PointMark Point, int Act, Spot At) : Trace(Point, Act);

/// <summary>A line over the length it is used; it is drawn a little longer.</summary>
internal sealed record LineTrace(LineMark Line, int Act, Spot From, Spot To) : Trace(Line, Act);

/// <summary>A circle over the parts in which it is used; each is drawn a little longer.</summary>
internal sealed record CircleTrace(CircleMark Circle, int Act, Spot Centre, double Radius, ImmutableArray<ArcSpan> Arcs) : Trace(Circle, Act);

/// <summary>A part of a circle, radians from right; it runs anticlockwise as seen on the stock.</summary>
internal readonly record struct ArcSpan(double Start, double Sweep)
{
    private const double Turn = 2 * Math.PI;

    /// <summary>The whole circle.</summary>
    public static ArcSpan Whole => new(0, Turn);

    public bool IsWhole => Sweep >= Turn;

    public double Middle => Start + (Sweep / 2);

    /// <summary>Longer at both ends; never more than the whole.</summary>
    public ArcSpan Grown(double by) => Sweep + (2 * by) >= Turn ? Whole : new(Start - by, Sweep + (2 * by));
}
