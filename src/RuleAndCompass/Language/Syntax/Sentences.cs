using System.Collections.Immutable;
using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.Language.Syntax;

/// <summary>A whole script, as far as it could be read. Comments are kept apart, for the printer.</summary>
/// <param name="Name">What diagnostics and outputs call it, usually the file's name without folders.</param>
/// <param name="Text">As read.</param>
/// <param name="Sentences">In order; blocks hold their own.</param>
public sealed record Script(string Name, string Text, ImmutableArray<Sentence> Sentences)
{
    /// <summary>The comments in order.</summary>
    public ImmutableArray<Comment> Comments { get; init; } = [];

    /// <summary>Names that sentences left out of the tree would have bound, titles of recipes among them: that they are missing has been told already.</summary>
    public ImmutableHashSet<string> UnreadNames { get; init; } = [];
}

/// <summary>One sentence, or a block with the sentences in it.</summary>
public abstract record Sentence(SourceSpan Span) : Node(Span);

// The head

/// <summary><c>title "Ferry-slip dial"</c>.</summary>
public sealed record TitleSentence(TextLiteral Text, SourceSpan Span) : Sentence(Span);

/// <summary>Which way a sheet lies.</summary>
public enum Orientation
{
    /// <summary>The long side up.</summary>
    Upright,

    /// <summary>The long side across.</summary>
    Sideways,
}

/// <summary><c>sheet A4 sideways</c>, <c>sheet 420 mm by 297 mm</c>: a standard name, or two sizes.</summary>
public sealed record SheetSentence(Name? Standard, Expression? Width, Expression? Height, Orientation? Orientation, SourceSpan Span) : Sentence(Span);

/// <summary><c>board 700 mm by 500 mm</c>.</summary>
public sealed record BoardSentence(Expression Width, Expression Height, SourceSpan Span) : Sentence(Span);

/// <summary><c>kit straightedge 600 mm, dividers 2 mm to 180 mm, square</c>.</summary>
public sealed record KitSentence(ImmutableArray<ToolClause> Tools, SourceSpan Span) : Sentence(Span);

/// <summary>The tools a kit may name.</summary>
public enum ToolKind
{
    /// <summary>With its length.</summary>
    Straightedge,

    /// <summary>With the least and greatest opening.</summary>
    Dividers,

    /// <summary>A beam compass, with the least and greatest opening.</summary>
    Beam,

    /// <summary>A try square.</summary>
    Square,

    /// <summary>A protractor.</summary>
    Protractor,

    /// <summary>A scale, with its step.</summary>
    Scale,
}

/// <summary>One tool: <paramref name="First"/> is the straightedge's length, the least opening or the scale's step; <paramref name="Second"/> the greatest opening.</summary>
public sealed record ToolClause(ToolKind Tool, Expression? First, Expression? Second, SourceSpan Span) : Node(Span);

/// <summary><c>hand fine</c>, <c>hand coarse, but edge 1 mm</c>, <c>hand prick 0.1 mm, edge 0.1 mm</c>; preset is <c>fine</c>, <c>ordinary</c>, <c>coarse</c> or null.</summary>
public sealed record HandSentence(Name? Preset, ImmutableArray<ErrorClause> Errors, SourceSpan Span) : Sentence(Span);

/// <summary><c>prick 0.10 mm</c>: source is <c>prick edge opening scale protractor square</c>.</summary>
public sealed record ErrorClause(Name Source, Expression Size, SourceSpan Span) : Node(Span);

// Anywhere

/// <summary><c>note "…"</c>.</summary>
public sealed record NoteSentence(TextLiteral Text, SourceSpan Span) : Sentence(Span);

/// <summary><c>use "other.setout"</c>.</summary>
public sealed record UseSentence(TextLiteral File, SourceSpan Span) : Sentence(Span);

/// <summary><c>given latitude = 43°18' from 1° to 89°</c>.</summary>
public sealed record GivenSentence(Name Name, Expression Value, Expression? From, Expression? To, SourceSpan Span) : Sentence(Span);

/// <summary><c>let H = 15° * h</c>.</summary>
public sealed record LetSentence(Bound Bound, Expression Value, SourceSpan Span) : Sentence(Span);

/// <summary><c>stage "The tangents"</c>.</summary>
public sealed record StageSentence(TextLiteral Text, SourceSpan Span) : Sentence(Span);

/// <summary><c>refuse "no dial at the pole"</c>.</summary>
public sealed record RefuseSentence(TextLiteral Text, SourceSpan Span) : Sentence(Span);

/// <summary><c>for h = 5 to 11, 13 to 19 … end</c>.</summary>
public sealed record ForBlock(Name Variable, ImmutableArray<RangeClause> Ranges, ImmutableArray<Sentence> Body, SourceSpan Span) : Sentence(Span);

/// <summary><c>A to B [step S]</c>, or a single value.</summary>
public sealed record RangeClause(Expression From, Expression? To, Expression? Step, SourceSpan Span) : Node(Span);

/// <summary><c>when … otherwise when … otherwise … end</c>.</summary>
public sealed record WhenBlock(ImmutableArray<WhenBranch> Branches, SourceSpan Span) : Sentence(Span);

/// <summary>One branch; the last may have no condition.</summary>
public sealed record WhenBranch(Condition? Condition, ImmutableArray<Sentence> Body, SourceSpan Span) : Node(Span);

/// <summary><c>recipe "…" … end</c>; needs, gives, trade and source stand in the body as sentences.</summary>
public sealed record RecipeBlock(TextLiteral Title, ImmutableArray<Sentence> Body, SourceSpan Span) : Sentence(Span);

/// <summary><c>needs centre point, first number = 6</c>.</summary>
public sealed record NeedsSentence(ImmutableArray<NeedClause> Needs, SourceSpan Span) : Sentence(Span);

/// <summary>One need: kind is <c>point line circle number length angle text</c> or its plural.</summary>
public sealed record NeedClause(Name Name, Name Kind, Expression? Default, SourceSpan Span) : Node(Span);

/// <summary><c>gives hour as "hour lines of a horizontal dial"</c>.</summary>
public sealed record GivesSentence(ImmutableArray<GiveClause> Gives, SourceSpan Span) : Sentence(Span);

/// <summary>One thing given.</summary>
public sealed record GiveClause(Name Name, TextLiteral? As, SourceSpan Span) : Node(Span);

/// <summary><c>trade "dials"</c>.</summary>
public sealed record TradeSentence(TextLiteral Text, SourceSpan Span) : Sentence(Span);

/// <summary><c>source "…"</c>.</summary>
public sealed record SourceSentence(TextLiteral Text, SourceSpan Span) : Sentence(Span);

/// <summary><c>follow "hours by the sine circle" as dial with centre = O</c>.</summary>
public sealed record FollowSentence(TextLiteral Recipe, Bound Alias, ImmutableArray<ArgumentClause> Arguments, SourceSpan Span) : Sentence(Span);

/// <summary><c>centre = O</c>.</summary>
public sealed record ArgumentClause(Name Need, Expression Value, SourceSpan Span) : Node(Span);

// Truth

/// <summary><c>claim six square to noon</c>.</summary>
public sealed record ClaimSentence(Condition Condition, SourceSpan Span) : Sentence(Span);

/// <summary>Tests joined by all <c>and</c> or all <c>or</c>; a single test is joined by <c>and</c>.</summary>
public sealed record Condition(ImmutableArray<Test> Tests, bool ByOr, SourceSpan Span) : Node(Span);

/// <summary>One thing that is so or not.</summary>
public abstract record Test(bool Negated, SourceSpan Span) : Node(Span);

/// <summary>How two values are compared.</summary>
public enum Relation
{
    /// <summary>=</summary>
    Equal,

    /// <summary>&lt;</summary>
    Less,

    /// <summary>&gt;</summary>
    Greater,

    /// <summary>&lt;=</summary>
    AtMost,

    /// <summary>&gt;=</summary>
    AtLeast,
}

/// <summary><c>x = y</c>, <c>x &lt;= y</c>.</summary>
public sealed record RelationTest(bool Negated, Expression Left, Relation Relation, Expression Right, SourceSpan Span) : Test(Negated, Span);

/// <summary>Relations of two figures.</summary>
public enum FigureRelation
{
    /// <summary><c>A on l</c></summary>
    On,

    /// <summary><c>l square to m</c></summary>
    SquareTo,

    /// <summary><c>l parallel to m</c></summary>
    ParallelTo,

    /// <summary><c>t touches c</c></summary>
    Touches,

    /// <summary><c>a meets b</c></summary>
    Meets,
}

/// <summary><c>A on l</c>, <c>l square to m</c>, …</summary>
public sealed record FigureTest(bool Negated, Reference Left, FigureRelation Relation, Reference Right, SourceSpan Span) : Test(Negated, Span);

/// <summary>What several figures may have in common.</summary>
public enum SharedRelation
{
    /// <summary><c>A, B, C on one line</c></summary>
    OnOneLine,

    /// <summary><c>A, B, C, D on one circle</c></summary>
    OnOneCircle,

    /// <summary><c>l, m, n through one point</c></summary>
    ThroughOnePoint,
}

/// <summary><c>A, B, C on one line</c>.</summary>
public sealed record SharedTest(bool Negated, ImmutableArray<Reference> Figures, SharedRelation Relation, SourceSpan Span) : Test(Negated, Span);

/// <summary><c>compare X with Y as "…" timed by h within 1'</c>; the formula is a place or an expression.</summary>
public sealed record CompareSentence(
    Expression Constructed, Expression? Computed, Place? ComputedPlace, TextLiteral? Label, Name? TimedBy, Expression? Within, bool WithinMinutes, SourceSpan Span) : Sentence(Span);

// The finished face

/// <summary><c>keep hour[h] from O to T[h] heavy cut</c>; styles are the words after it.</summary>
public sealed record KeepSentence(Reference Figure, Portion? Portion, KeepStyle Style, SourceSpan Span) : Sentence(Span);

/// <summary><c>keep from A along l to B, along c clockwise to C cut</c>.</summary>
public sealed record KeepRunSentence(Reference From, ImmutableArray<Leg> Legs, KeepStyle Style, SourceSpan Span) : Sentence(Span);

/// <summary><c>along c clockwise to C</c>.</summary>
public sealed record Leg(Reference Along, Way? Way, Reference To, SourceSpan Span) : Node(Span);

/// <summary>The words of a kept thing in the order written: weights and dashes <c>heavy fine dashed chain</c>, layers <c>cut engraved drilled</c>.</summary>
public sealed record KeepStyle(ImmutableArray<Name> Words, Expression? DrilledWidth, SourceSpan Span) : Node(Span);

/// <summary>Which part of a figure is kept.</summary>
public abstract record Portion(SourceSpan Span) : Node(Span);

/// <summary><c>from P to Q [clockwise]</c>.</summary>
public sealed record FromToPortion(Reference From, Reference To, Way? Way, SourceSpan Span) : Portion(Span);

/// <summary><c>between a and b</c>.</summary>
public sealed record BetweenPortion(Reference First, Reference Second, SourceSpan Span) : Portion(Span);

/// <summary><c>inside c and outside d</c>.</summary>
public sealed record LimitsPortion(ImmutableArray<LimitClause> Limits, SourceSpan Span) : Portion(Span);

/// <summary><c>inside c</c>, <c>outside c</c>.</summary>
public sealed record LimitClause(bool Inside, Reference Circle, SourceSpan Span) : Node(Span);

/// <summary><c>joined</c>, <c>faired closed</c>.</summary>
public sealed record JoinedPortion(bool Faired, bool Closed, SourceSpan Span) : Portion(Span);

/// <summary>Where a text's named point lies in it.</summary>
public enum TextAnchor
{
    /// <summary><c>at P</c>: the middle.</summary>
    Middle,

    /// <summary><c>from P</c>: it begins there.</summary>
    Begin,

    /// <summary><c>to P</c>: it ends there.</summary>
    End,
}

/// <summary><c>letter "XII" at P height 5 mm feet toward O</c>.</summary>
public sealed record LetterSentence(TextLiteral Text, TextAnchor Anchor, Reference At, Expression Height, Lie? Lie, SourceSpan Span) : Sentence(Span);

/// <summary>How a text lies; upright without one.</summary>
public abstract record Lie(SourceSpan Span) : Node(Span);

/// <summary><c>feet toward Q</c>, <c>head toward Q</c>.</summary>
public sealed record TowardLie(bool Feet, Reference Toward, SourceSpan Span) : Lie(Span);

/// <summary><c>along l</c>.</summary>
public sealed record AlongLie(Reference Line, SourceSpan Span) : Lie(Span);

/// <summary><c>round c clockwise</c>.</summary>
public sealed record RoundLie(Reference Circle, Way Way, SourceSpan Span) : Lie(Span);
