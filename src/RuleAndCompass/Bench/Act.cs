using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Bench;

/// <summary>One thing done with one tool. Whatever it uses was made by an earlier act.</summary>
/// <param name="Number">From 1, in the order of work.</param>
/// <param name="Stage">Index into the layout's stages.</param>
/// <param name="Want">Counts the sentence this act serves; acts of one want carry the same number.</param>
/// <param name="Says">What to do, as a craftsman would say it.</param>
/// <param name="Span">The sentence it serves, in the file named by <paramref name="File"/>.</param>
/// <param name="File">The recipe or used script the sentence stands in; null in the script itself.</param>
public abstract record Act(int Number, int Stage, int Want, string Says, SourceSpan Span, string? File)
{
    /// <summary>What it leaves on the stock; null for a setting of the dividers.</summary>
    public abstract Mark? Makes { get; }
}

/// <summary>Prick a point measured on the stock from the middle of the sheet, or taken off the full-size plate.</summary>
public sealed record Locate(int Number, int Stage, int Want, PointMark Point, bool ByScale, string Says, SourceSpan Span, string? File) : Act(Number, Stage, Want, Says, Span, File)
{
    /// <inheritdoc/>
    public override Mark Makes => Point;

    /// <summary>The mark it is measured from, whose own error it then carries; null for the middle of the sheet.</summary>
    public PointMark? From { get; init; }
}

/// <summary>Lay the straightedge to two points and draw; the line runs from the first to the second.</summary>
public sealed record Lay(int Number, int Stage, int Want, LineMark Line, PointMark First, PointMark Second, string Says, SourceSpan Span, string? File)
    : Act(Number, Stage, Want, Says, Span, File)
{
    /// <inheritdoc/>
    public override Mark Makes => Line;
}

/// <summary>What the dividers are set to.</summary>
public abstract record Opening
{
    /// <summary>The exact span, millimetres.</summary>
    public abstract Real Length { get; }

    /// <summary>Its square: one value for every arc at this opening.</summary>
    public abstract Real Squared { get; }
}

/// <summary>The span of two points that stand on the stock.</summary>
public sealed record SpanOpening(PointMark First, PointMark Second) : Opening
{
    /// <inheritdoc/>
    public override Real Length { get; } = First.Point.DistanceTo(Second.Point);

    /// <inheritdoc/>
    public override Real Squared { get; } = First.Point.SquaredDistanceTo(Second.Point);
}

/// <summary>A length off the scale. <paramref name="Wanted"/> is exact; <paramref name="Setting"/> is rounded to the scale's step, what the sentence tells; null where it is taken off the full-size plate.</summary>
public sealed record ScaleOpening(Real Wanted, Rational? Setting) : Opening
{
    /// <inheritdoc/>
    public override Real Length => Wanted;

    /// <inheritdoc/>
    public override Real Squared { get; } = Wanted * Wanted;
}

/// <summary>Any opening would do; this one was chosen.</summary>
public sealed record FreeOpening(Rational Chosen) : Opening
{
    /// <inheritdoc/>
    public override Real Length { get; } = Chosen;

    /// <inheritdoc/>
    public override Real Squared { get; } = Chosen * Chosen;
}

/// <summary>Set the dividers (or the beam compass).</summary>
public sealed record SetOpening(int Number, int Stage, int Want, Opening Opening, bool Beam, string Says, SourceSpan Span, string? File)
    : Act(Number, Stage, Want, Says, Span, File)
{
    /// <inheritdoc/>
    public override Mark? Makes => null;
}

/// <summary>Seat the needle and draw a circle or an arc at the opening that <paramref name="Setting"/> left standing.</summary>
public sealed record Swing(int Number, int Stage, int Want, CircleMark Circle, PointMark Centre, SetOpening Setting, string Says, SourceSpan Span, string? File)
    : Act(Number, Stage, Want, Says, Span, File)
{
    /// <inheritdoc/>
    public override Mark Makes => Circle;
}

/// <summary>Prick where two drawn curves cross.</summary>
/// <param name="Which">
/// 0 or 1, of the two crossings in Geometry's order: along the first line's (or the only line's) direction; of two circles, 0 is on the left looking from the
/// centre of <paramref name="First"/> to that of <paramref name="Second"/>. 0 for two lines.
/// </param>
public sealed record Cross(int Number, int Stage, int Want, PointMark Point, CurveMark First, CurveMark Second, int Which, string Says, SourceSpan Span, string? File)
    : Act(Number, Stage, Want, Says, Span, File)
{
    /// <inheritdoc/>
    public override Mark Makes => Point;
}

/// <summary>Lay the protractor to a line at a point, mark an angle and draw. Anticlockwise is positive.</summary>
public sealed record Protract(int Number, int Stage, int Want, LineMark Line, LineMark Base, PointMark At, Angle By, string Says, SourceSpan Span, string? File)
    : Act(Number, Stage, Want, Says, Span, File)
{
    /// <inheritdoc/>
    public override Mark Makes => Line;
}

/// <summary>Lay the square to a line and draw through a point; the line runs a quarter turn anticlockwise from <paramref name="Base"/>.</summary>
public sealed record Slide(int Number, int Stage, int Want, LineMark Line, LineMark Base, PointMark Through, string Says, SourceSpan Span, string? File)
    : Act(Number, Stage, Want, Says, Span, File)
{
    /// <inheritdoc/>
    public override Mark Makes => Line;
}
