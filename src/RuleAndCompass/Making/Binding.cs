using System.Collections.Immutable;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Making;

/// <summary>What sentences bind.</summary>
internal static class Binding
{
    /// <summary>The names a sentence, or the sentences in a block, would bind.</summary>
    public static IEnumerable<Bound> Of(Sentence sentence) => sentence switch
    {
        GivenSentence given => [new Bound(given.Name, [], given.Name.Span)],
        LetSentence let => [let.Bound],
        FollowSentence follow => [follow.Alias],
        ForBlock loop => loop.Body.SelectMany(Of),
        WhenBlock block => block.Branches.SelectMany(branch => branch.Body).SelectMany(Of),
        PrickBoth both => [both.Point, both.Other],
        PrickDividing many => [One(many.Points)],
        PrickRound many => [One(many.Points)],
        PrickSteppingAlong many => [One(many.Points)],
        PrickSteppingRound many => [One(many.Points)],
        PrickAt want => [want.Point],
        PrickFoot want => [want.Point],
        PrickCentre want => [want.Point],
        PrickMidway want => [want.Point],
        PrickAcross want => [want.Point],
        PrickAbout want => [want.Point],
        PrickWhere want => [want.Point],
        PrickOnToward want => [want.Point],
        PrickOnAhead want => [want.Point],
        PrickOnCircle want => [want.Point],
        PrickTurned want => [want.Point],
        RuleThrough want => [want.Line],
        RuleToward want => [want.Line],
        RuleSquare want => [want.Line],
        RuleParallel want => [want.Line],
        RuleBack want => [want.Line],
        RuleTurned want => [want.Line],
        RuleHalving want => [want.Line],
        RuleHalvingAngle want => [want.Line],
        RuleTouchingAt want => [want.Line],
        RuleTouchingFrom want => [want.Line],
        RuleTouchingBoth want => [want.Line],
        StrikeThrough want => [want.Circle],
        StrikeOpening want => [want.Circle],
        StrikeTouching want => [want.Circle],
        StrikeThroughThree want => [want.Circle],
        _ => [],
    };

    /// <summary>Every name bound anywhere in the sentences.</summary>
    public static ImmutableHashSet<string> NamesIn(IEnumerable<Sentence> sentences) => sentences.SelectMany(Of).Select(bound => bound.Name.Text).ToImmutableHashSet(StringComparer.Ordinal);

    // Several at once: no single index tells which.
    private static Bound One(Many many) => new(many.Name, [many.From, many.To], many.Span);
}
