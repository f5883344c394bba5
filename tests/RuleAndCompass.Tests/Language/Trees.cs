using System.Collections.Immutable;
using CsCheck;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Tests.Language;

/// <summary>Makes trees of every sort at random, such as reading can give.</summary>
internal static class Trees
{
    private static SourceSpan Nowhere => default;

    /// <summary>One of the values, each as likely.</summary>
    public static Gen<T> Pick<T>(params T[] values) => Gen.Int[0, values.Length - 1].Select(i => values[i]);

    private static readonly Gen<Name> Names = Pick("A", "O", "noon", "T", "square", "scale", "foot", "radius", "x", "cut", "step", "letter", "größe", "p_2", "Left", "mm", "end", "fine")
        .Select(text => new Name(text, Nowhere));

    private static readonly Gen<Expression> Literals = Pick("3", "0.6858", "1/3", "2 1/2", "0", "90 mm", "3 1/2 in", "1/2 mm", "43°18'30\"", "18'", "22 1/2 deg", "1/8 turn", "2h30m", "1/2°")
        .Select(text => ScriptReader.ReadExpression(text).Value!);

    private static readonly Gen<Way> Ways = Pick(Way.Clockwise, Way.Anticlockwise);

    private static readonly Gen<ByTool?> Tools = Pick<ByTool?>(null, null, ByTool.Dividers, ByTool.Square, ByTool.Protractor, ByTool.Scale);

    private static Gen<T?> Maybe<T>(Gen<T> gen)
        where T : class => Gen.Bool.SelectMany(there => there ? gen.Select(value => (T?)value) : Gen.Const((T?)null));

    private static Gen<ImmutableArray<T>> Some<T>(Gen<T> gen, int least, int most) => gen.Array[least, most].Select(items => items.ToImmutableArray());

    private static Gen<Bound> Bounds(int depth) =>
        Gen.Select(Names, depth <= 0 ? Gen.Const(ImmutableArray<Expression>.Empty) : Some(Values(depth - 1), 0, 2)).Select((name, indices) => new Bound(name, indices, Nowhere));

    private static Gen<Reference> References(int depth) => Some(Bounds(depth), 1, 2).Select(steps => new Reference(steps, Nowhere));

    private static Gen<Expression> Values(int depth)
    {
        Gen<Expression> small = Gen.OneOf(Literals, References(0).Select(reference => (Expression)reference));
        if (depth <= 0)
            return small;
        Gen<Expression> inner = Values(depth - 1);
        Gen<Reference> figure = References(depth - 1);
        return Gen.OneOf(
            small,
            inner.Select(operand => (Expression)new Negation(operand, Nowhere)),
            Arithmetics(inner),
            Arithmetics(inner),
            inner.Select(value => (Expression)new Call(new Name("sin", Nowhere), [value], Nowhere)),
            Gen.Select(inner, inner).Select((a, b) => (Expression)new Call(new Name("atan", Nowhere), [a, b], Nowhere)),
            Gen.Select(figure, figure).Select((a, b) => (Expression)new DistanceMeasure(a, b, Nowhere)),
            Gen.Select(figure, figure, Ways).Select((a, b, way) => (Expression)new TurnMeasure(a, b, way, Nowhere)),
            Gen.Select(figure, figure, figure).Select((a, b, c) => (Expression)new AngleMeasure(a, b, c, Nowhere)),
            figure.Select(circle => (Expression)new RadiusMeasure(circle, Nowhere)),
            Gen.Select(Gen.Bool, figure).Select((isX, point) => (Expression)new CoordinateMeasure(isX, point, Nowhere)));
    }

    private static Gen<Expression> Arithmetics(Gen<Expression> inner) =>
        Gen.Select(inner, Pick(ArithmeticOperator.Plus, ArithmeticOperator.Minus, ArithmeticOperator.Times, ArithmeticOperator.Over), inner)
            .Select((left, operation, right) => (Expression)new Arithmetic(left, operation, right, Nowhere));

    private static readonly Gen<Expression> AnyValue = Values(2);

    // A bare number where a length or angle must stand is a finding of its own.
    private static readonly Gen<Expression> Sizes = AnyValue.Where(value => (value is Negation negation ? negation.Operand : value) is not NumberLiteral);

    private static readonly Gen<Reference> Refs = References(1);

    private static readonly Gen<Bound> NewBounds = Bounds(1);

    private static readonly Gen<Many> ManyBounds = Gen.Select(Names, AnyValue, AnyValue, Maybe(AnyValue)).Select((name, start, end, step) => new Many(name, start, end, step, Nowhere));

    private static readonly Gen<TextLiteral> Texts = Gen.Select(
        Pick("", "hour ", "a {brace", "{{", "}", "# no comment", "ä′").Select(text => new PlainPiece(text, Nowhere)),
        Maybe(Gen.Select(Values(1).Where(value => value is not TextLiteral && !value.ToString().Contains('"', StringComparison.Ordinal)), Pick(null, "2", "roman", "clock"))
            .Select((value, form) => new ValuePiece(value, form, Nowhere))))
        .Select((plain, value) => new TextLiteral([.. new TextPiece?[] { plain.Text.Length > 0 ? plain : null, value }.OfType<TextPiece>()], Nowhere));

    private static readonly Gen<TextLiteral> PlainTexts = Pick("", "hours by the sine circle", "{", "a {brace").Select(text => new TextLiteral(text.Length == 0 ? [] : [new PlainPiece(text, Nowhere)], Nowhere));

    private static readonly Gen<Place> Places = Gen.Select(Sizes, Sizes, Maybe(Refs)).Select((x, y, origin) => new Place(x, y, origin, Nowhere));

    private static readonly Gen<Direction> Directions = Gen.OneOf(
        Pick<Direction>(new SheetDirection("up", 90, Nowhere), new SheetDirection("down", 270, Nowhere), new SheetDirection("left", 180, Nowhere), new SheetDirection("right", 0, Nowhere)),
        Sizes.Select(value => (Direction)new TowardDirection(value, Nowhere)));

    private static readonly Gen<OpeningSpan> Openings = Gen.OneOf(
        Gen.Select(Refs, Refs).Select((a, b) => (OpeningSpan)new PointsSpan(a, b, Nowhere)),
        Sizes.Select(length => (OpeningSpan)new LengthSpan(length, Nowhere)));

    private static readonly Gen<Choice> Choices = Gen.Select(Gen.Enum<ChoiceKind>(), Refs, Refs)
        .Select((kind, of, origin) => new Choice(kind, of, kind is ChoiceKind.SameSide or ChoiceKind.Across ? origin : null, Nowhere));

    private static readonly Gen<Test> Tests = Gen.OneOf(
        Gen.Select(Gen.Bool, AnyValue, Gen.Enum<Relation>(), AnyValue).Select((not, left, relation, right) => (Test)new RelationTest(not, left, relation, right, Nowhere)),
        Gen.Select(Gen.Bool, Refs, Gen.Enum<FigureRelation>(), Refs).Select((not, left, relation, right) => (Test)new FigureTest(not, left, relation, right, Nowhere)),
        Gen.Select(Gen.Bool, Some(Refs, 3, 5), Gen.Enum<SharedRelation>()).Select((not, figures, relation) => (Test)new SharedTest(not, figures, relation, Nowhere)));

    private static readonly Gen<Condition> Conditions = Gen.Select(Some(Tests, 1, 3), Gen.Bool).Select((tests, byOr) => new Condition(tests, byOr && tests.Length > 1, Nowhere));

    private static readonly Gen<KeepStyle> Styles = Gen.Select(Pick("", "heavy", "fine"), Pick("", "dashed", "chain"), Pick("", "cut", "engraved", "drilled"), Maybe(Sizes))
        .Select((weight, dash, layer, width) => new KeepStyle(
            [.. new[] { weight, dash, layer }.Where(word => word.Length > 0).Select(word => new Name(word, Nowhere))], layer == "drilled" ? width : null, Nowhere));

    private static readonly Gen<Portion> Portions = Gen.OneOf(
        Gen.Select(Refs, Refs, Pick<Way?>(null, Way.Clockwise, Way.Anticlockwise)).Select((a, b, way) => (Portion)new FromToPortion(a, b, way, Nowhere)),
        Gen.Select(Refs, Refs).Select((a, b) => (Portion)new BetweenPortion(a, b, Nowhere)),
        Some(Gen.Select(Gen.Bool, Refs).Select((inside, circle) => new LimitClause(inside, circle, Nowhere)), 1, 3).Select(limits => (Portion)new LimitsPortion(limits, Nowhere)),
        Gen.Select(Gen.Bool, Gen.Bool).Select((faired, closed) => (Portion)new JoinedPortion(faired, closed, Nowhere)));

    private static readonly Gen<Leg> Legs = Gen.Select(Refs, Pick<Way?>(null, Way.Clockwise, Way.Anticlockwise), Refs).Select((along, way, end) => new Leg(along, way, end, Nowhere));

    private static readonly Gen<Lie> Lies = Gen.OneOf(
        Gen.Select(Gen.Bool, Refs).Select((feet, point) => (Lie)new TowardLie(feet, point, Nowhere)),
        Refs.Select(line => (Lie)new AlongLie(line, Nowhere)),
        Gen.Select(Refs, Ways).Select((circle, way) => (Lie)new RoundLie(circle, way, Nowhere)));

    private static readonly Gen<RangeClause> Ranges = Gen.Select(AnyValue, Maybe(AnyValue), Maybe(AnyValue)).Select((start, end, step) => new RangeClause(start, end, end is null ? null : step, Nowhere));

    private static readonly Gen<Sentence> Points = Gen.OneOf<Sentence>(
        Gen.Select(NewBounds, Places, Tools).Select((p, place, tool) => (Sentence)new PrickAt(p, place, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((p, a, b, tool) => (Sentence)new PrickFoot(p, a, b, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Tools).Select((p, c, tool) => (Sentence)new PrickCentre(p, c, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((p, a, b, tool) => (Sentence)new PrickMidway(p, a, b, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((p, a, b, tool) => (Sentence)new PrickAcross(p, a, b, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((p, a, b, tool) => (Sentence)new PrickAbout(p, a, b, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Maybe(Choices)).Select((p, a, b, choice) => (Sentence)new PrickWhere(p, a, b, choice, Nowhere)),
        Gen.Select(NewBounds, NewBounds, Refs, Refs).Select((p, q, a, b) => (Sentence)new PrickBoth(p, q, a, b, Nowhere)),
        Gen.Select(NewBounds, Refs, Sizes, Refs, Directions, Tools).Select((p, l, size, a, toward, tool) => (Sentence)new PrickOnToward(p, l, size, a, toward, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Sizes, Gen.Bool, Refs, Tools).Select((p, l, size, ahead, a, tool) => (Sentence)new PrickOnAhead(p, l, size, ahead, a, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Directions, Tools).Select((p, c, toward, tool) => (Sentence)new PrickOnCircle(p, c, toward, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Sizes, Refs, Ways, Tools).Select((p, c, angle, a, way, tool) => (Sentence)new PrickTurned(p, c, angle, a, way, tool, Nowhere)),
        Gen.Select(ManyBounds, Refs, Refs, Tools).Select((p, a, b, tool) => (Sentence)new PrickDividing(p, a, b, tool, Nowhere)),
        Gen.Select(ManyBounds, Refs, Refs, Ways, Tools).Select((p, o, a, way, tool) => (Sentence)new PrickRound(p, o, a, way, tool, Nowhere)),
        Gen.Select(ManyBounds, Openings, Refs, Refs, Directions, Tools).Select((p, span, l, a, toward, tool) => (Sentence)new PrickSteppingAlong(p, span, l, a, toward, tool, Nowhere)),
        Gen.Select(ManyBounds, Openings, Refs, Refs, Ways, Tools).Select((p, span, c, a, way, tool) => (Sentence)new PrickSteppingRound(p, span, c, a, way, tool, Nowhere)));

    private static readonly Gen<Sentence> LinesAndCircles = Gen.OneOf<Sentence>(
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((l, a, b, tool) => (Sentence)new RuleThrough(l, a, b, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Directions, Tools).Select((l, a, toward, tool) => (Sentence)new RuleToward(l, a, toward, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((l, a, m, tool) => (Sentence)new RuleSquare(l, a, m, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((l, a, m, tool) => (Sentence)new RuleParallel(l, a, m, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((l, a, m, tool) => (Sentence)new RuleBack(l, a, m, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Sizes, Refs, Ways, Tools).Select((l, a, angle, m, way, tool) => (Sentence)new RuleTurned(l, a, angle, m, way, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((l, a, b, tool) => (Sentence)new RuleHalving(l, a, b, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Refs, Tools).Select((l, a, o, b, tool) => (Sentence)new RuleHalvingAngle(l, a, o, b, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((l, c, p, tool) => (Sentence)new RuleTouchingAt(l, c, p, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Choices, Tools).Select((l, c, p, choice, tool) => (Sentence)new RuleTouchingFrom(l, c, p, choice, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Gen.Bool, Choices, Tools).Select((l, c, d, crossed, choice, tool) => (Sentence)new RuleTouchingBoth(l, c, d, crossed, choice, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((c, o, a, tool) => (Sentence)new StrikeThrough(c, o, a, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Openings, Tools).Select((c, o, span, tool) => (Sentence)new StrikeOpening(c, o, span, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Tools).Select((c, o, l, tool) => (Sentence)new StrikeTouching(c, o, l, tool, Nowhere)),
        Gen.Select(NewBounds, Refs, Refs, Refs, Tools).Select((c, a, b, d, tool) => (Sentence)new StrikeThroughThree(c, a, b, d, tool, Nowhere)));

    private static readonly Gen<Sentence> Others = Gen.OneOf<Sentence>(
        Texts.Select(text => (Sentence)new NoteSentence(text, Nowhere)),
        Texts.Select(text => (Sentence)new StageSentence(text, Nowhere)),
        Texts.Select(text => (Sentence)new RefuseSentence(text, Nowhere)),
        PlainTexts.Select(text => (Sentence)new UseSentence(text, Nowhere)),
        Gen.Select(NewBounds, AnyValue).Select((bound, value) => (Sentence)new LetSentence(bound, value, Nowhere)),
        Conditions.Select(condition => (Sentence)new ClaimSentence(condition, Nowhere)),
        Gen.Select(AnyValue, AnyValue, Maybe(Texts), Maybe(Names), Maybe(AnyValue), Gen.Bool)
            .Select((x, y, label, timed, within, minutes) => (Sentence)new CompareSentence(x, y, null, label, timed, within, within is not null && minutes, Nowhere)),
        Gen.Select(AnyValue, Places, Maybe(Texts), Maybe(Names)).Select((x, place, label, timed) => (Sentence)new CompareSentence(x, null, place, label, timed, null, false, Nowhere)),
        Gen.Select(Refs, Maybe(Portions), Styles).Select((figure, portion, style) => (Sentence)new KeepSentence(figure, portion, style, Nowhere)),
        Gen.Select(Refs, Some(Legs, 1, 3), Styles).Select((start, legs, style) => (Sentence)new KeepRunSentence(start, legs, style, Nowhere)),
        Gen.Select(Texts, Gen.Enum<TextAnchor>(), Refs, Sizes, Maybe(Lies)).Select((text, anchor, at, height, lie) => (Sentence)new LetterSentence(text, anchor, at, height, lie, Nowhere)),
        Gen.Select(PlainTexts, NewBounds, Some(Gen.Select(Names, AnyValue).Select((need, value) => new ArgumentClause(need, value, Nowhere)), 0, 3))
            .Select((recipe, alias, arguments) => (Sentence)new FollowSentence(recipe, alias, arguments, Nowhere)));

    private static Gen<Sentence> InBlocks(int depth)
    {
        Gen<Sentence> plain = Gen.OneOf(Points, LinesAndCircles, Others);
        if (depth == 0)
            return plain;
        Gen<ImmutableArray<Sentence>> body = Some(InBlocks(depth - 1), 0, 3);
        return Gen.OneOf(
            plain,
            Gen.Select(Names, Some(Ranges, 1, 3), body).Select((name, ranges, sentences) => (Sentence)new ForBlock(name, ranges, sentences, Nowhere)),
            Gen.Select(Some(Gen.Select(Conditions, body).Select((condition, sentences) => new WhenBranch(condition, sentences, Nowhere)), 1, 3), Maybe(body.Select(sentences => new WhenBranch(null, sentences, Nowhere))))
                .Select((branches, rest) => (Sentence)new WhenBlock(rest is null ? branches : branches.Add(rest), Nowhere)));
    }

    private static readonly Gen<ToolClause> KitTools = Gen.Select(Gen.Enum<ToolKind>(), Sizes, Sizes).Select((tool, first, second) => tool switch
    {
        ToolKind.Dividers or ToolKind.Beam => new ToolClause(tool, first, second, Nowhere),
        ToolKind.Straightedge or ToolKind.Scale => new ToolClause(tool, first, null, Nowhere),
        _ => new ToolClause(tool, null, null, Nowhere),
    });

    private static readonly Gen<ErrorClause> HandErrors = Gen.Select(Pick("prick", "edge", "opening", "scale", "protractor", "square"), Sizes)
        .Select((source, size) => new ErrorClause(new Name(source, Nowhere), size, Nowhere));

    private static readonly Gen<Orientation?> Lyings = Pick<Orientation?>(null, Orientation.Upright, Orientation.Sideways);

    private static readonly Gen<Sentence> Sheets = Gen.OneOf<Sentence>(
        Gen.Select(Pick("A4", "letter", "tabloid"), Lyings).Select((name, lying) => (Sentence)new SheetSentence(new Name(name, Nowhere), null, null, lying, Nowhere)),
        Gen.Select(Sizes, Sizes, Lyings).Select((width, height, lying) => (Sentence)new SheetSentence(null, width, height, lying, Nowhere)));

    private static readonly Gen<Sentence> Hands = Gen.Select(Pick(null, "fine", "ordinary", "coarse"), Some(HandErrors, 1, 3), Gen.Bool)
        .Select((preset, errors, both) => (Sentence)new HandSentence(preset is null ? null : new Name(preset, Nowhere), preset is null || both ? errors : [], Nowhere));

    private static readonly Gen<Sentence> Recipes = Gen.Select(
        PlainTexts,
        Some(Gen.Select(Names, Pick([.. Vocabulary.Kinds]), Maybe(AnyValue)).Select((name, kind, value) => new NeedClause(name, new Name(kind, Nowhere), value, Nowhere)), 1, 3),
        Some(Gen.Select(Names, Maybe(PlainTexts)).Select((name, says) => new GiveClause(name, says, Nowhere)), 1, 3),
        PlainTexts,
        Some(InBlocks(1), 0, 3))
        .Select((title, needs, gives, text, body) => (Sentence)new RecipeBlock(
            title,
            [new NeedsSentence(needs, Nowhere), new GivesSentence(gives, Nowhere), new TradeSentence(text, Nowhere), new SourceSentence(text, Nowhere), .. body],
            Nowhere));

    /// <summary>Whole scripts: a head, sentences in blocks, a recipe.</summary>
    public static readonly Gen<Script> Scripts = Gen.Select(
        Texts.Select(text => (Sentence)new TitleSentence(text, Nowhere)),
        Sheets,
        Gen.Select(Sizes, Sizes, Some(KitTools, 1, 3)).Select((width, height, tools) => new Sentence[] { new BoardSentence(width, height, Nowhere), new KitSentence(tools, Nowhere) }),
        Hands,
        Gen.Select(Names, AnyValue, AnyValue, AnyValue, Gen.Bool).Select((name, value, least, most, ranged) => (Sentence)new GivenSentence(name, value, ranged ? least : null, ranged ? most : null, Nowhere)),
        Recipes,
        Some(InBlocks(2), 0, 6))
        .Select((title, sheet, bench, hand, given, recipe, body) => new Script("generated", "", [title, sheet, .. bench, hand, given, recipe, .. body]));

    /// <summary>Values of every sort.</summary>
    public static readonly Gen<Expression> Expressions = Values(4);
}
