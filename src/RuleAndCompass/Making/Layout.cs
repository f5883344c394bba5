using System.Collections.Immutable;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making;

/// <summary>The stock or paper, millimetres.</summary>
/// <param name="Name"><c>A4 upright</c>, or null where two sizes were given.</param>
/// <param name="Width">Across.</param>
/// <param name="Height">Up.</param>
public sealed record Sheet(string? Name, Rational Width, Rational Height);

/// <summary>Acts that belong on one plate.</summary>
/// <param name="Number">As printed: <c>3</c>, <c>3.1</c> under a recipe.</param>
/// <param name="Title">The stage's text; for the acts before any stage, the script's title or <c>To begin</c>.</param>
public sealed record Stage(string Number, string Title);

/// <summary>A <c>given</c> with the value used.</summary>
public sealed record GivenValue(string Name, QuantityKind Kind, string Text, bool FromCommandLine);

/// <summary>What kind of quantity a figure in a report is.</summary>
public enum QuantityKind
{
    /// <summary>A bare number.</summary>
    Number,

    /// <summary>Millimetres.</summary>
    Length,

    /// <summary>Degrees.</summary>
    Angle,

    /// <summary>A place: two lengths.</summary>
    Point,
}

/// <summary>A claim and what became of it.</summary>
/// <param name="Says">As written, indices worked out.</param>
/// <param name="Holds">Null where it is not decided.</param>
/// <param name="Verdict">How it is known.</param>
/// <param name="By">Where refuted, by how much, in words.</param>
public sealed record ClaimResult(string Says, bool? Holds, Verdict Verdict, string? By, SourceSpan Span, string? File);

/// <summary>A quantity of the construction beside the formula's.</summary>
/// <param name="Label">What the report calls it.</param>
/// <param name="Kind">Of both sides.</param>
/// <param name="Constructed">Millimetres, degrees or a bare number; for a point x.</param>
/// <param name="Computed">Likewise.</param>
/// <param name="ConstructedY">For a point, y from the place's origin.</param>
/// <param name="ComputedY">For a point.</param>
/// <param name="Difference">Constructed less computed (angles the short way round; for points the distance apart). Zero only where decided.</param>
/// <param name="Decision">The sign of the difference and how it is known.</param>
/// <param name="Within">The tolerance in the kind's own unit, or in minutes of time where <paramref name="WithinMinutes"/>.</param>
/// <param name="WithinMinutes">The tolerance is minutes of time.</param>
/// <param name="InTolerance">True without a tolerance.</param>
/// <param name="RatePerHour">How fast the computed value changes with the hour (degrees or millimetres an hour), where timed and not standing still.</param>
/// <param name="TimedBy">The name it is timed by.</param>
/// <param name="TimeLeftOut">Why no minutes are told, where timed but the formula stands still.</param>
/// <param name="Measure">How the constructed side follows from the marks.</param>
/// <param name="MeasureY">For a point, its y.</param>
/// <param name="FarEnd">For the angle of a line: the mark or mm radius at which the error is felt, millimetres from the corner; null where nothing is kept of it.</param>
public sealed record Comparison(
    string Label,
    QuantityKind Kind,
    Real Constructed,
    Real Computed,
    Real? ConstructedY,
    Real? ComputedY,
    Real Difference,
    Decision Decision,
    Real? Within,
    bool WithinMinutes,
    bool InTolerance,
    double? RatePerHour,
    string? TimedBy,
    string? TimeLeftOut,
    Measure? Measure,
    Measure? MeasureY,
    double? FarEnd,
    SourceSpan Span,
    string? File)
{
    /// <summary>For a place that is timed: how its formula moves with the hour, across and up, in millimetres an hour.</summary>
    public (double X, double Y)? PathRate { get; init; }

    /// <summary>The difference in minutes of time, where timed.</summary>
    public double? MinutesOfTime => RatePerHour is { } rate ? Difference.ToDouble() / rate * 60 : null;
}

/// <summary>How a kept thing is made on the finished piece; each is a layer of the cut file.</summary>
public enum Layer
{
    /// <summary>The default.</summary>
    Engraved,

    /// <summary>Cut through.</summary>
    Cut,

    /// <summary>A hole.</summary>
    Drilled,
}

/// <summary>How a kept line is drawn.</summary>
public enum Weight
{
    /// <summary>0.35 mm.</summary>
    Plain,

    /// <summary>0.5 mm.</summary>
    Heavy,

    /// <summary>0.18 mm.</summary>
    Fine,
}

/// <summary>Whole or broken.</summary>
public enum Dash
{
    /// <summary>Unbroken.</summary>
    Whole,

    /// <summary><c>dashed</c>.</summary>
    Dashed,

    /// <summary><c>chain</c>.</summary>
    Chain,
}

/// <summary>What the finished piece shows: one or more pieces in order.</summary>
/// <param name="Name">The figure kept, or a description of a run.</param>
/// <param name="Mark">The mark it is a part of, where it is one; for its hand error.</param>
/// <param name="Pieces">In order of the run; each begins where the one before ended in a run.</param>
/// <param name="DrillMillimetres">A drilled hole's width, where given.</param>
public sealed record Kept(
    string Name, Mark? Mark, ImmutableArray<Piece> Pieces, Layer Layer, Weight Weight, Dash Dash, double? DrillMillimetres, SourceSpan Span, string? File);

/// <summary>A piece of a kept figure, with exact ends.</summary>
public abstract record Piece;

/// <summary>A straight piece.</summary>
public sealed record SegmentPiece(Point From, Point To) : Piece;

/// <summary>An arc about a centre.</summary>
public sealed record ArcPiece(Point Centre, Real Radius, Point From, Point To, bool Clockwise) : Piece;

/// <summary>A whole circle.</summary>
public sealed record CirclePiece(Point Centre, Real Radius) : Piece;

/// <summary>A point kept by itself.</summary>
public sealed record PointPiece(Point At) : Piece;

/// <summary>How lettering lies.</summary>
public abstract record LetteringLie;

/// <summary>Along a straight base line, degrees anticlockwise from right; upright is 0.</summary>
public sealed record StraightLie(double Degrees) : LetteringLie;

/// <summary>Bent round a circle: feet to the centre when clockwise, head to the centre when anticlockwise.</summary>
public sealed record BentLie(Point Centre, double RadiusMillimetres, bool Clockwise) : LetteringLie;

/// <summary>A text on the finished piece.</summary>
public sealed record Lettering(string Text, Point At, TextAnchor Anchor, double HeightMillimetres, LetteringLie Lie, SourceSpan Span, string? File);

/// <summary>A script carried out: every act, exactly, with what was claimed, compared and kept. Immutable.</summary>
public sealed record Layout(
    Script Script,
    string Title,
    ImmutableArray<string> Notes,
    Sheet Sheet,
    Sheet? Board,
    Kit Kit,
    Hand Hand,
    ImmutableArray<GivenValue> Givens,
    ImmutableArray<Stage> Stages,
    ImmutableArray<Act> Acts,
    ImmutableArray<ClaimResult> Claims,
    ImmutableArray<Comparison> Comparisons,
    ImmutableArray<Kept> Kept,
    ImmutableArray<Lettering> Letterings,
    bool IsDial)
{
    /// <summary>For each given that choices, claims and comparisons depend on: over which values they all stay as they are. Worked out when first asked for.</summary>
    public ImmutableArray<ValidFor> ValidRanges => validRanges ??= Decider.FindRanges();

    private ImmutableArray<ValidFor>? validRanges;

    /// <summary>Decides and prints exact values for reports of this layout.</summary>
    public required Decider Decider { get; init; }
}

/// <summary>What a caller asks of a making.</summary>
/// <param name="Givens">Values that replace those of <c>given</c> sentences, as text.</param>
/// <param name="Sheet">What follows <c>sheet</c> in a script; null for the script's own.</param>
/// <param name="Kit">What follows <c>kit</c>.</param>
/// <param name="Hand">What follows <c>hand</c>.</param>
/// <param name="Prove">Decide every claim exactly, however long it takes.</param>
/// <param name="TimeLimit">For the whole making.</param>
/// <param name="ReadScript">Reads a used script's text by the name in <c>use</c>; null where none can be read.</param>
public sealed record MakingOptions(
    ImmutableDictionary<string, string>? Givens = null,
    string? Sheet = null,
    string? Kit = null,
    string? Hand = null,
    bool Prove = false,
    TimeSpan? TimeLimit = null,
    Func<string, string?>? ReadScript = null)
{
    /// <summary>The most acts a layout may have.</summary>
    public int MaximumActs { get; init; } = 50_000;

    /// <summary>The most sentences that are carried out, those in loops and recipes counted each time.</summary>
    public int MaximumSentences { get; init; } = 1_000_000;

    /// <summary>How deep blocks, recipes and expressions may nest.</summary>
    public int MaximumNesting { get; init; } = 100;
}
