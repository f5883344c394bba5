using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.Language.Syntax;

/// <summary>A sentence that wants something on the stock; <paramref name="By"/> is the tool named after <c>by</c>, if one is.</summary>
public abstract record WantSentence(ByTool? By, SourceSpan Span) : Sentence(Span);

/// <summary>The tools that may be asked for.</summary>
public enum ByTool
{
    /// <summary><c>by dividers</c></summary>
    Dividers,

    /// <summary><c>by square</c></summary>
    Square,

    /// <summary><c>by protractor</c></summary>
    Protractor,

    /// <summary><c>by scale</c></summary>
    Scale,
}

// Points

/// <summary><c>prick P at (X, Y) from A</c>.</summary>
public sealed record PrickAt(Bound Point, Place Place, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P at foot of A on l</c>.</summary>
public sealed record PrickFoot(Bound Point, Reference From, Reference On, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P at centre of c</c>.</summary>
public sealed record PrickCentre(Bound Point, Reference Circle, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P midway A to B</c>.</summary>
public sealed record PrickMidway(Bound Point, Reference From, Reference To, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P opposite A across l</c>.</summary>
public sealed record PrickAcross(Bound Point, Reference Of, Reference Across, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P opposite A about O</c>.</summary>
public sealed record PrickAbout(Bound Point, Reference Of, Reference About, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P where A meets B, above C</c>.</summary>
public sealed record PrickWhere(Bound Point, Reference First, Reference Second, Choice? Choice, SourceSpan Span) : WantSentence(null, Span);

/// <summary><c>prick P, Q where A meets B</c>.</summary>
public sealed record PrickBoth(Bound Point, Bound Other, Reference First, Reference Second, SourceSpan Span) : WantSentence(null, Span);

/// <summary><c>prick P on l, 30 mm from A toward B</c>.</summary>
public sealed record PrickOnToward(Bound Point, Reference Line, Expression Length, Reference From, Direction Toward, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P on l, 30 mm ahead of A</c>, <c>behind A</c>.</summary>
public sealed record PrickOnAhead(Bound Point, Reference Line, Expression Length, bool Ahead, Reference Of, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P on c toward up</c>.</summary>
public sealed record PrickOnCircle(Bound Point, Reference Circle, Direction Toward, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P on c turned 30° from A clockwise</c>.</summary>
public sealed record PrickTurned(Bound Point, Reference Circle, Expression Angle, Reference From, Way Way, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P[0 to 7] dividing A to B</c>.</summary>
public sealed record PrickDividing(Many Points, Reference From, Reference To, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick V[1 to 6] round O from A anticlockwise</c>.</summary>
public sealed record PrickRound(Many Points, Reference Centre, Reference From, Way Way, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P[0 to 7] stepping A to B along l from C toward D</c>.</summary>
public sealed record PrickSteppingAlong(Many Points, OpeningSpan Opening, Reference Line, Reference From, Direction Toward, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>prick P[0 to 7] stepping A to B round c from C clockwise</c>.</summary>
public sealed record PrickSteppingRound(Many Points, OpeningSpan Opening, Reference Circle, Reference From, Way Way, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

// Lines

/// <summary><c>rule l through A, B</c>.</summary>
public sealed record RuleThrough(Bound Line, Reference First, Reference Second, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>rule l through A toward up</c>.</summary>
public sealed record RuleToward(Bound Line, Reference Through, Direction Toward, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>rule l through A square to m</c>.</summary>
public sealed record RuleSquare(Bound Line, Reference Through, Reference To, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>rule l through A parallel to m</c>.</summary>
public sealed record RuleParallel(Bound Line, Reference Through, Reference To, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>rule l through A back along m</c>.</summary>
public sealed record RuleBack(Bound Line, Reference Through, Reference Along, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>rule l through A turned 15° from m clockwise</c>.</summary>
public sealed record RuleTurned(Bound Line, Reference Through, Expression Angle, Reference From, Way Way, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>rule l halving A to B</c>.</summary>
public sealed record RuleHalving(Bound Line, Reference From, Reference To, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>rule l halving angle A O B</c>.</summary>
public sealed record RuleHalvingAngle(Bound Line, Reference First, Reference Corner, Reference Second, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>rule t touching c at P</c>.</summary>
public sealed record RuleTouchingAt(Bound Line, Reference Circle, Reference At, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>rule t touching c from P, above Q</c>.</summary>
public sealed record RuleTouchingFrom(Bound Line, Reference Circle, Reference From, Choice Choice, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>rule t touching c, d crossed, above Q</c>.</summary>
public sealed record RuleTouchingBoth(Bound Line, Reference First, Reference Second, bool Crossed, Choice Choice, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

// Circles

/// <summary><c>strike c about O through A</c>.</summary>
public sealed record StrikeThrough(Bound Circle, Reference About, Reference Through, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>strike c about O opening 30 mm</c>, <c>opening A to B</c>.</summary>
public sealed record StrikeOpening(Bound Circle, Reference About, OpeningSpan Opening, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>strike c about O touching l</c>.</summary>
public sealed record StrikeTouching(Bound Circle, Reference About, Reference Touching, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

/// <summary><c>strike c through A, B, C</c>.</summary>
public sealed record StrikeThroughThree(Bound Circle, Reference First, Reference Second, Reference Third, ByTool? By, SourceSpan Span) : WantSentence(By, Span);

// Choices

/// <summary>What settles which of two crossings is meant.</summary>
public enum ChoiceKind
{
    /// <summary><c>nearest P</c></summary>
    Nearest,

    /// <summary><c>farthest from P</c></summary>
    FarthestFrom,

    /// <summary><c>other than P</c></summary>
    OtherThan,

    /// <summary><c>above P</c></summary>
    Above,

    /// <summary><c>below P</c></summary>
    Below,

    /// <summary><c>left of P</c></summary>
    LeftOf,

    /// <summary><c>right of P</c></summary>
    RightOf,

    /// <summary><c>left along l</c></summary>
    LeftAlong,

    /// <summary><c>right along l</c></summary>
    RightAlong,

    /// <summary><c>ahead of P</c></summary>
    AheadOf,

    /// <summary><c>behind P</c></summary>
    Behind,

    /// <summary><c>same side of l as P</c></summary>
    SameSide,

    /// <summary><c>across l from P</c></summary>
    Across,

    /// <summary><c>inside c</c></summary>
    Inside,

    /// <summary><c>outside c</c></summary>
    Outside,
}

/// <summary>One choice: <paramref name="Of"/> is the point, line or circle it names first, <paramref name="From"/> the point of the two that name two.</summary>
public sealed record Choice(ChoiceKind Kind, Reference Of, Reference? From, SourceSpan Span) : Node(Span);
