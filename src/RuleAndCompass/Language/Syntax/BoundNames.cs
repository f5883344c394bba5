namespace RuleAndCompass.Language.Syntax;

/// <summary>What sentences bind.</summary>
public static class BoundNames
{
    /// <summary>The names that a sentence binds where it stands: of a want, what it makes; of a <c>let</c> or <c>follow</c>, its name. Blocks, which bind within, give none.</summary>
    public static IEnumerable<string> Find(Sentence sentence)
    {
        Name? name = sentence switch
        {
            GivenSentence given => given.Name,
            LetSentence let => let.Bound.Name,
            FollowSentence follow => follow.Alias.Name,
            PrickBoth both => both.Point.Name,
            PrickAt want => want.Point.Name,
            PrickFoot want => want.Point.Name,
            PrickCentre want => want.Point.Name,
            PrickMidway want => want.Point.Name,
            PrickAcross want => want.Point.Name,
            PrickAbout want => want.Point.Name,
            PrickWhere want => want.Point.Name,
            PrickOnToward want => want.Point.Name,
            PrickOnAhead want => want.Point.Name,
            PrickOnCircle want => want.Point.Name,
            PrickTurned want => want.Point.Name,
            PrickDividing want => want.Points.Name,
            PrickRound want => want.Points.Name,
            PrickSteppingAlong want => want.Points.Name,
            PrickSteppingRound want => want.Points.Name,
            RuleThrough want => want.Line.Name,
            RuleToward want => want.Line.Name,
            RuleSquare want => want.Line.Name,
            RuleParallel want => want.Line.Name,
            RuleBack want => want.Line.Name,
            RuleTurned want => want.Line.Name,
            RuleHalving want => want.Line.Name,
            RuleHalvingAngle want => want.Line.Name,
            RuleTouchingAt want => want.Line.Name,
            RuleTouchingFrom want => want.Line.Name,
            RuleTouchingBoth want => want.Line.Name,
            StrikeThrough want => want.Circle.Name,
            StrikeOpening want => want.Circle.Name,
            StrikeTouching want => want.Circle.Name,
            StrikeThroughThree want => want.Circle.Name,
            _ => null,
        };
        if (name is not null)
            yield return name.Text;
        if (sentence is PrickBoth pair)
            yield return pair.Other.Name.Text;
    }
}
