using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Language.Grammar;

/// <summary>What sort of token it is.</summary>
internal enum TokenKind
{
    /// <summary>Letters, digits and <c>_</c>, a letter first.</summary>
    Word,

    /// <summary>A written number, without its unit.</summary>
    Number,

    /// <summary>An angle with its marks, or hours of turn; its value in degrees.</summary>
    Angle,

    /// <summary>From one <c>"</c> to the next.</summary>
    Text,

    /// <summary>A bracket, comma, operator and the like.</summary>
    Sign,

    /// <summary>Something no sentence may hold; its finding is told already.</summary>
    Fault,

    /// <summary>After the last token of a sentence.</summary>
    End,
}

/// <summary>A token. Its text is in standard form: one blank in a mixed number; for a text, what stands between the marks.</summary>
internal sealed record Token(TokenKind Kind, string Text, SourceSpan Span)
{
    /// <summary>Nothing but blanks stands before it on its line.</summary>
    public bool FirstOnLine { get; init; }

    /// <summary>The value of a number, or of an angle in degrees.</summary>
    public Rational Value { get; init; }

    /// <summary>A closed-up fraction or a mixed number, or an angle that begins with one.</summary>
    public bool IsFraction { get; init; }

    /// <summary>The pieces of a text, once they have been read.</summary>
    public TextLiteral? Literal { get; set; }

    public bool IsWord(string word) => Kind == TokenKind.Word && Text == word;

    public bool IsSign(string sign) => Kind == TokenKind.Sign && Text == sign;
}
