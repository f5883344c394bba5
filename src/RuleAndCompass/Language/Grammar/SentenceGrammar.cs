using System.Collections.Frozen;
using System.Collections.Immutable;
using System.Diagnostics;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using Sprache;
using static RuleAndCompass.Language.Grammar.ExpressionGrammar;
using static RuleAndCompass.Language.Grammar.Rules;

namespace RuleAndCompass.Language.Grammar;

/// <summary><c>end</c>: closes a block; never in a tree.</summary>
internal sealed record EndSentence(SourceSpan Span) : Sentence(Span);

/// <summary><c>otherwise</c>, <c>otherwise when …</c>: begins a branch; never in a tree.</summary>
internal sealed record OtherwiseSentence(Condition? Condition, SourceSpan Span) : Sentence(Span);

/// <summary>Every sentence, told by its first word. A block's first line is read as a block with nothing in it yet.</summary>
internal static class SentenceGrammar
{
    // The head

    private static readonly Parser<Orientation?> Lying = MaybeValue(
        from word in AnyWord("upright", "sideways")
        select word.Text == "upright" ? Orientation.Upright : Orientation.Sideways);

    // sheet A4 sideways, sheet 420 mm by 297 mm
    private static readonly Parser<Sentence> Sheet = (
        from first in After("sheet", Value)
        from second in Maybe(After("by", Length))
        from lying in Lying
        select second is null && first is Reference { Steps: [{ Indices.IsEmpty: true } step] }
            ? (Sentence)new SheetSentence(step.Name, null, null, lying, default)
            : new SheetSentence(null, first, second, lying, default)).Checked(CheckSheet);

    private static readonly Parser<Sentence> Board =
        from width in After("board", Length)
        from height in After("by", Length)
        select (Sentence)new BoardSentence(width, height, default);

    private static readonly Parser<ToolClause> OneSizeTool =
        from word in AnyWord("straightedge", "scale")
        from size in Length
        select new ToolClause(word.Text == "scale" ? ToolKind.Scale : ToolKind.Straightedge, size, null, default);

    private static readonly Parser<ToolClause> TwoSizeTool =
        from word in AnyWord("dividers", "beam")
        from least in Length
        from most in After("to", Length)
        select new ToolClause(word.Text == "beam" ? ToolKind.Beam : ToolKind.Dividers, least, most, default);

    private static readonly Parser<ToolClause> PlainTool =
        from word in AnyWord("square", "protractor")
        select new ToolClause(word.Text == "square" ? ToolKind.Square : ToolKind.Protractor, null, null, default);

    // kit straightedge 600 mm, dividers 2 mm to 180 mm, square
    private static readonly Parser<Sentence> Kit =
        from tools in After("kit", Listed(OneSizeTool.XOr(TwoSizeTool).XOr(PlainTool).Spanned(), Sign(",")))
        select (Sentence)new KitSentence(tools, default);

    private static readonly Parser<ErrorClause> ErrorOfHand = (
        from source in AnyWord("prick", "edge", "opening", "scale", "protractor", "square")
        from size in source.Text is "protractor" or "square" ? AngleValue : Length
        select new ErrorClause(new Name(source.Text, source.Span), size, default)).Spanned();

    private static readonly Parser<ImmutableArray<ErrorClause>> ErrorsOfHand = Listed(ErrorOfHand, Sign(","));

    private static readonly Parser<ImmutableArray<ErrorClause>?> ButErrors = MaybeValue(Then(Sign(","), After("but", ErrorsOfHand)));

    private static readonly Parser<Sentence> PresetHand =
        from preset in AnyWord("fine", "ordinary", "coarse")
        from errors in ButErrors
        select (Sentence)new HandSentence(new Name(preset.Text, preset.Span), errors ?? [], default);

    // hand fine, hand coarse, but edge 1 mm; hand prick 0.1 mm, edge 0.1 mm
    private static readonly Parser<Sentence> Hand = After("hand", PresetHand.XOr(ErrorsOfHand.Select(errors => (Sentence)new HandSentence(null, errors, default))));

    // Anywhere

    // given latitude = 43°18' from 1° to 89°
    private static readonly Parser<Sentence> Given =
        from name in After("given", NameRule)
        from value in Then(Sign("="), Value)
        from least in Maybe(After("from", Value))
        from most in least is null ? Nothing : After("to", Value).Select(most => (Expression?)most)
        select (Sentence)new GivenSentence(name, value, least, most, default);

    private static readonly Parser<Sentence> Let =
        from bound in After("let", BoundRule)
        from value in Then(Sign("="), Value)
        select (Sentence)new LetSentence(bound, value, default);

    // Flow

    private static readonly Parser<(Expression? To, Expression? Step)> RangeEnd =
        from end in After("to", Value)
        from step in Maybe(After("step", Value))
        select ((Expression?)end, step);

    private static readonly Parser<RangeClause> Range = (
        from start in Value
        from end in MaybeValue(RangeEnd)
        select new RangeClause(start, end?.To, end?.Step, default)).Spanned();

    // for h = 5 to 11, 13 to 19
    private static readonly Parser<Sentence> For =
        from variable in After("for", NameRule)
        from ranges in Then(Sign("="), Listed(Range, Sign(",")))
        select (Sentence)new ForBlock(variable, ranges, [], default);

    private static readonly Parser<Sentence> When =
        from word in Word("when")
        from condition in TruthGrammar.Condition
        select (Sentence)new WhenBlock([new WhenBranch(condition, [], default)], default);

    private static readonly Parser<Sentence> Otherwise =
        from word in Word("otherwise")
        from condition in Maybe(After("when", TruthGrammar.Condition))
        select (Sentence)new OtherwiseSentence(condition, default);

    private static readonly Parser<Sentence> EndOfBlock = Word("end").Select(word => (Sentence)new EndSentence(default(SourceSpan)));

    // Recipes

    private static readonly Parser<NeedClause> Need = (
        from name in NameRule
        from kind in AnyWord(Vocabulary.Kinds)
        from standard in Maybe(Then(Sign("="), Value))
        select new NeedClause(name, new Name(kind.Text, kind.Span), standard, default)).Spanned();

    // needs centre point, first number = 6
    private static readonly Parser<Sentence> Needs =
        After("needs", Listed(Need, Sign(","))).Select(needs => (Sentence)new NeedsSentence(needs, default));

    private static readonly Parser<GiveClause> Give = (
        from name in NameRule
        from says in Maybe(After("as", Text))
        select new GiveClause(name, says, default)).Spanned().Checked((stream, give) => CheckPlain(stream, "gives", give.As));

    private static readonly Parser<Sentence> Gives =
        After("gives", Listed(Give, Sign(","))).Select(gives => (Sentence)new GivesSentence(gives, default));

    private static readonly Parser<ArgumentClause> Argument = (
        from need in NameRule
        from value in Then(Sign("="), Value)
        select new ArgumentClause(need, value, default)).Spanned();

    private static readonly Parser<ImmutableArray<ArgumentClause>?> Arguments = MaybeValue(After("with", Listed(Argument, Sign(","))));

    // follow "hours by the sine circle" as dial with centre = O
    private static readonly Parser<Sentence> Follow = (
        from recipe in After("follow", Text)
        from alias in After("as", BoundRule)
        from arguments in Arguments
        select (Sentence)new FollowSentence(recipe, alias, arguments ?? [], default)).Checked((stream, sentence) => CheckPlain(stream, "follow", (sentence as FollowSentence)?.Recipe));

    private static readonly Parser<Sentence> Whole = input => Told(input);

    /// <summary>One whole sentence, to the end of its tokens.</summary>
    public static readonly Parser<Sentence> Sentence = (
        from sentence in Whole
        from end in End
        select sentence).Spanned();

    /// <summary>One whole expression, to the end of the tokens.</summary>
    public static readonly Parser<Expression> LoneExpression =
        from expression in Value
        from end in End
        select expression;

    private static readonly FrozenDictionary<string, Parser<Sentence>> ByFirstWord = new Dictionary<string, Parser<Sentence>>
    {
        ["title"] = OfText("title", text => new TitleSentence(text, default)),
        ["sheet"] = Sheet,
        ["board"] = Board,
        ["kit"] = Kit,
        ["hand"] = Hand,
        ["note"] = OfText("note", text => new NoteSentence(text, default)),
        ["use"] = OfPlainText("use", text => new UseSentence(text, default)),
        ["given"] = Given,
        ["let"] = Let,
        ["stage"] = OfText("stage", text => new StageSentence(text, default)),
        ["refuse"] = OfText("refuse", text => new RefuseSentence(text, default)),
        ["prick"] = WantGrammar.Prick,
        ["rule"] = WantGrammar.Rule,
        ["strike"] = WantGrammar.Strike,
        ["keep"] = FaceGrammar.Keep,
        ["letter"] = FaceGrammar.Letter,
        ["claim"] = TruthGrammar.Claim,
        ["compare"] = TruthGrammar.Compare,
        ["for"] = For,
        ["when"] = When,
        ["otherwise"] = Otherwise,
        ["end"] = EndOfBlock,
        ["recipe"] = OfPlainText("recipe", text => new RecipeBlock(text, [], default)),
        ["needs"] = Needs,
        ["gives"] = Gives,
        ["trade"] = OfPlainText("trade", text => new TradeSentence(text, default)),
        ["source"] = OfPlainText("source", text => new SourceSentence(text, default)),
        ["follow"] = Follow,
    }.ToFrozenDictionary();

    private static Parser<Expression?> Nothing => input => Reading<Expression?>.Of(null, input);

    private static IResult<Sentence> Told(IInput input) => ByFirstWord.TryGetValue(Current(input).Text, out Parser<Sentence>? rule)
        ? rule(input)
        : throw new UnreachableException("The reader asks for sentences whose first word is known.");

    private static Parser<Sentence> OfText(string word, Func<TextLiteral, Sentence> make) => After(word, Text).Select(make);

    private static Parser<Sentence> OfPlainText(string word, Func<TextLiteral, Sentence> make) =>
        After(word, Text.Checked((stream, text) => CheckPlain(stream, word, text))).Select(make);

    private static void CheckPlain(TokenStream stream, string word, TextLiteral? text)
    {
        if (text?.Pieces.FirstOrDefault(piece => piece is ValuePiece) is { } value)
            stream.Findings.Add(LanguageFindings.ValueInPlainText(word, value.Span));
    }

    private static void CheckSheet(TokenStream stream, Sentence sentence)
    {
        SheetSentence sheet = sentence as SheetSentence ?? throw new UnreachableException();
        if (sheet.Standard is { } name)
        {
            if (!Vocabulary.Sheets.Contains(name.Text))
                stream.Doubts.Add(LanguageFindings.UnknownSheet(name.Text, name.Span));
        }
        else if (sheet.Height is null && sheet.Width is { } alone)
        {
            stream.Doubts.Add(LanguageFindings.UnknownSheet(stream.Text.Substring(alone.Span.Start, alone.Span.Length), alone.Span));
        }
        else if (sheet.Width is NumberLiteral width && !width.Value.IsZero)
        {
            stream.Doubts.Add(LanguageFindings.LengthWithoutUnit(width.Text, width.Span));
        }
    }
}
