using System.Collections.Immutable;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Language.Syntax;

/// <summary>A piece of a script. Its <c>ToString</c> prints it back as the tidy printer does.</summary>
public abstract record Node(SourceSpan Span)
{
    /// <summary>The node as it is written in a sentence.</summary>
    public sealed override string ToString() => TidyPrinter.Print(this);
}

/// <summary>A word that is not a little word: <c>O</c>, <c>noon</c>.</summary>
public sealed record Name(string Text, SourceSpan Span) : Node(Span);

/// <summary><c>hour</c>, <c>hour[3]</c>, <c>V[i, j]</c>: what a sentence binds, or one step of a reference.</summary>
public sealed record Bound(Name Name, ImmutableArray<Expression> Indices, SourceSpan Span) : Node(Span);

/// <summary><c>P[0 to 7]</c>, <c>V[1 to 6 step 1]</c>.</summary>
public sealed record Many(Name Name, Expression From, Expression To, Expression? Step, SourceSpan Span) : Node(Span);

/// <summary>Something with a value. Whether the kinds fit is the making's question.</summary>
public abstract record Expression(SourceSpan Span) : Node(Span);

/// <summary><c>3</c>, <c>0.6858</c>, <c>1/3</c>, <c>2 1/2</c>. <paramref name="Text"/> is as written.</summary>
public sealed record NumberLiteral(Rational Value, string Text, SourceSpan Span) : Expression(Span);

/// <summary><c>90 mm</c>, <c>3 1/2 in</c>.</summary>
public sealed record LengthLiteral(Rational Millimetres, string Text, SourceSpan Span) : Expression(Span);

/// <summary><c>43°18'30"</c>, <c>22 1/2 deg</c>, <c>1/8 turn</c>, <c>2h30m</c>; degrees.</summary>
public sealed record AngleLiteral(Rational Degrees, string Text, SourceSpan Span) : Expression(Span);

/// <summary><c>"hour {h:roman}"</c>.</summary>
public sealed record TextLiteral(ImmutableArray<TextPiece> Pieces, SourceSpan Span) : Expression(Span);

/// <summary>A run of plain text (braces unescaped), or a worked-out value with its form.</summary>
public abstract record TextPiece(SourceSpan Span) : Node(Span);

/// <summary>Plain text.</summary>
public sealed record PlainPiece(string Text, SourceSpan Span) : TextPiece(Span);

/// <summary><c>{h}</c>, <c>{h:2}</c>, <c>{h:chapter}</c>; the form is null, a count of decimals or a form's word.</summary>
public sealed record ValuePiece(Expression Value, string? Form, SourceSpan Span) : TextPiece(Span);

/// <summary><c>dial.hour[3]</c>: one step or more.</summary>
public sealed record Reference(ImmutableArray<Bound> Steps, SourceSpan Span) : Expression(Span);

/// <summary><c>-x</c>.</summary>
public sealed record Negation(Expression Operand, SourceSpan Span) : Expression(Span);

/// <summary>The four operations.</summary>
public enum ArithmeticOperator
{
    /// <summary>+</summary>
    Plus,

    /// <summary>-</summary>
    Minus,

    /// <summary>*</summary>
    Times,

    /// <summary>/</summary>
    Over,
}

/// <summary><c>a + b</c>. Brackets are put back by the printer where precedence needs them.</summary>
public sealed record Arithmetic(Expression Left, ArithmeticOperator Operator, Expression Right, SourceSpan Span) : Expression(Span);

/// <summary><c>atan(y, x)</c>; the function's name is any word standing before a bracket.</summary>
public sealed record Call(Name Function, ImmutableArray<Expression> Arguments, SourceSpan Span) : Expression(Span);

/// <summary><c>distance A to B</c>; B may be a line.</summary>
public sealed record DistanceMeasure(Reference From, Reference To, SourceSpan Span) : Expression(Span);

/// <summary><c>angle from l to m clockwise</c>.</summary>
public sealed record TurnMeasure(Reference From, Reference To, Way Way, SourceSpan Span) : Expression(Span);

/// <summary><c>angle A O B</c>.</summary>
public sealed record AngleMeasure(Reference First, Reference Corner, Reference Second, SourceSpan Span) : Expression(Span);

/// <summary><c>radius of c</c>.</summary>
public sealed record RadiusMeasure(Reference Circle, SourceSpan Span) : Expression(Span);

/// <summary><c>x of P</c>, <c>y of P</c>.</summary>
public sealed record CoordinateMeasure(bool IsX, Reference Point, SourceSpan Span) : Expression(Span);

/// <summary>Sense of turning.</summary>
public enum Way
{
    /// <summary>As the hands of a clock.</summary>
    Clockwise,

    /// <summary>Against them.</summary>
    Anticlockwise,
}

/// <summary><c>(X, Y) [from O]</c>.</summary>
public sealed record Place(Expression X, Expression Y, Reference? From, SourceSpan Span) : Node(Span);

/// <summary><c>up</c>, <c>down</c>, <c>left</c>, <c>right</c>, or an expression that is a point or an angle.</summary>
public abstract record Direction(SourceSpan Span) : Node(Span);

/// <summary>One of the four words, with its angle anticlockwise from right: up is 90.</summary>
public sealed record SheetDirection(string Word, int Degrees, SourceSpan Span) : Direction(Span);

/// <summary>Toward a point, or at an angle anticlockwise from right, by the kind of the value.</summary>
public sealed record TowardDirection(Expression Value, SourceSpan Span) : Direction(Span);

/// <summary><c>A to B</c> or a length.</summary>
public abstract record OpeningSpan(SourceSpan Span) : Node(Span);

/// <summary><c>A to B</c>.</summary>
public sealed record PointsSpan(Reference From, Reference To, SourceSpan Span) : OpeningSpan(Span);

/// <summary>A length worked out.</summary>
public sealed record LengthSpan(Expression Length, SourceSpan Span) : OpeningSpan(Span);
