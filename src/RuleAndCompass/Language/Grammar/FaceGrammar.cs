using System.Collections.Immutable;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using Sprache;
using static RuleAndCompass.Language.Grammar.ExpressionGrammar;
using static RuleAndCompass.Language.Grammar.Rules;

namespace RuleAndCompass.Language.Grammar;

/// <summary>What the finished piece shows: <c>keep</c> and <c>letter</c>.</summary>
internal static class FaceGrammar
{
    private static readonly ImmutableArray<(string First, string Second, string Third)> Groups =
        [("heavy", "fine", ""), ("dashed", "chain", ""), ("cut", "engraved", "drilled")];

    // from P to Q clockwise
    private static readonly Parser<Portion> FromTo =
        from start in After("from", Ref)
        from end in After("to", Ref)
        from way in MaybeValue(WayRule)
        select (Portion)new FromToPortion(start, end, way, default);

    // between a and b
    private static readonly Parser<Portion> Between =
        from first in After("between", Ref)
        from second in After("and", Ref)
        select (Portion)new BetweenPortion(first, second, default);

    private static readonly Parser<LimitClause> Limit = (
        from word in AnyWord("inside", "outside")
        from circle in Ref
        select new LimitClause(word.Text == "inside", circle, default)).Spanned();

    // inside c and outside d
    private static readonly Parser<Portion> Limits = Listed(Limit, Word("and")).Select(limits => (Portion)new LimitsPortion(limits, default));

    // joined, faired closed
    private static readonly Parser<Portion> Joined =
        from word in AnyWord("joined", "faired")
        from closed in Maybe(Word("closed"))
        select (Portion)new JoinedPortion(word.Text == "faired", closed is not null, default);

    private static readonly Parser<Portion> Portion = FromTo.XOr(Between).XOr(Limits).XOr(Joined).Spanned();

    private static readonly Parser<Name> StyleWord =
        AnyWord("heavy", "fine", "dashed", "chain", "cut", "engraved").Select(word => new Name(word.Text, word.Span));

    // the width of a drill is left out where the sentence ends
    private static readonly Parser<Expression?> DrillWidth = input =>
        ((TokenInput)input).AtEnd ? Reading<Expression?>.Of(null, input) : Length.Select(width => (Expression?)width)(input);

    private static readonly Parser<KeepStyle> Drilled =
        from word in Word("drilled")
        from width in DrillWidth
        select new KeepStyle([new Name(word.Text, word.Span)], width, default);

    private static readonly Parser<KeepStyle> Style = (
        from words in Repeated(StyleWord)
        from drilled in Maybe(Drilled)
        select new KeepStyle(drilled is null ? words : words.AddRange(drilled.Words), drilled?.DrilledWidth, default)).Spanned().Checked(CheckStyle);

    // along c clockwise to C
    private static readonly Parser<Leg> Leg = (
        from along in After("along", Ref)
        from way in MaybeValue(WayRule)
        from end in After("to", Ref)
        select new Leg(along, way, end, default)).Spanned();

    // keep from A along l to B, along c clockwise to C cut
    private static readonly Parser<Sentence> Run =
        from start in After("from", Ref)
        from legs in Listed(Leg, Sign(","))
        from style in Style
        select (Sentence)new KeepRunSentence(start, legs, style, default);

    // keep hour[h] from O to T[h] heavy
    private static readonly Parser<Sentence> Figure =
        from figure in Ref
        from portion in Maybe(Portion)
        from style in Style
        select (Sentence)new KeepSentence(figure, portion, style, default);

    /// <summary>"keep" kept</summary>
    public static readonly Parser<Sentence> Keep = After("keep", Run.XOr(Figure));

    private static readonly Parser<Lie> Toward =
        from word in AnyWord("feet", "head")
        from point in After("toward", Ref)
        select (Lie)new TowardLie(word.Text == "feet", point, default);

    private static readonly Parser<Lie> Along = After("along", Ref).Select(line => (Lie)new AlongLie(line, default));

    private static readonly Parser<Lie> Round =
        from circle in After("round", Ref)
        from way in WayRule
        select (Lie)new RoundLie(circle, way, default);

    private static readonly Parser<Lie> Lie = Toward.XOr(Along).XOr(Round).Spanned();

    /// <summary>letter "XII" at P height 5 mm feet toward O</summary>
    public static readonly Parser<Sentence> Letter =
        from text in After("letter", Text)
        from anchor in AnyWord("at", "from", "to")
        from point in Ref
        from height in After("height", Length)
        from lie in Maybe(Lie)
        select (Sentence)new LetterSentence(
            text, anchor.Text switch { "at" => TextAnchor.Middle, "from" => TextAnchor.Begin, _ => TextAnchor.End }, point, height, lie, default);

    private static void CheckStyle(TokenStream stream, KeepStyle style)
    {
        for (int i = 1; i < style.Words.Length; i++)
        {
            Name word = style.Words[i];
            Name? clash = style.Words.Take(i).FirstOrDefault(before => Group(before.Text) == Group(word.Text));
            if (clash is not null)
                stream.Findings.Add(LanguageFindings.StylesClash(clash.Text, word.Text, word.Span));
        }
    }

    private static int Group(string word)
    {
        for (int i = 0; i < Groups.Length; i++)
        {
            if (Groups[i].First == word || Groups[i].Second == word || Groups[i].Third == word)
                return i;
        }

        return -1;
    }
}
