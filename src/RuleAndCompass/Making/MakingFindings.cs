using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making;

/// <summary>What the making of a layout can find wrong: codes RC2001 to RC2999.</summary>
internal static class MakingFindings
{
    public static Diagnostic UnknownName(string name, string? near, SourceSpan span) =>
        Error("RC2001", $"nothing is called `{name}`", span, near is null ? $"make it in an earlier sentence: `prick`, `rule`, `strike` or `let {name} = …`" : $"is `{near}` meant?");

    public static Diagnostic OnlyOtherBranch(string why, SourceSpan span) => Error("RC2001", why, span, "use it within that branch, or bind it in every branch");

    public static Diagnostic WrongKind(string what, string found, string needed, SourceSpan span, string? hint = null) =>
        Error("RC2002", $"`{what}` is {found}, and {needed} is needed here", span, hint);

    public static Diagnostic KindsDoNotFit(string left, string word, string right, SourceSpan span, string? hint = null) =>
        Error("RC2002", $"{left} {word} {right} has no meaning", span, hint);

    public static Diagnostic BoundTwice(string name, SourceSpan span) =>
        Error("RC2003", $"`{name}` is bound already", span, "a name is bound once and never changes; give this one another name");

    public static Diagnostic CirclesApart(string first, string second, string gap, SourceSpan span) =>
        Error("RC2004", $"circles `{first}` and `{second}` do not meet", span, gap);

    public static Diagnostic LineMissesCircle(string line, string circle, string gap, SourceSpan span) =>
        Error("RC2005", $"line `{line}` and circle `{circle}` do not meet", span, gap);

    public static Diagnostic LinesParallel(string first, string second, string gap, SourceSpan span) =>
        Error("RC2006", $"lines `{first}` and `{second}` are parallel and do not meet", span, gap);

    public static Diagnostic SameCurve(string first, string second, SourceSpan span) =>
        Error("RC2007", $"`{first}` and `{second}` are the same, so every point is common", span, "name two curves that cross");

    public static Diagnostic NeedsChoice(string first, string second, string candidates, SourceSpan span) =>
        Error("RC2008", $"`{first}` and `{second}` meet in two points, and the sentence does not say which", span, $"{candidates}; add a choice such as `, above P` or `, nearest P`");

    public static Diagnostic ChoicePicksBoth(string choice, string candidates, SourceSpan span) =>
        Error("RC2009", $"`{choice}` picks both crossings", span, $"{candidates}; choose by something that parts them");

    public static Diagnostic ChoicePicksNeither(string choice, string candidates, SourceSpan span) =>
        Error("RC2009", $"`{choice}` picks neither crossing", span, $"{candidates}; choose by something that parts them");

    public static Diagnostic OnlyCrossingFailsChoice(string choice, string candidate, SourceSpan span) =>
        Error("RC2010", $"there is one crossing, and `{choice}` does not hold for it", span, candidate);

    public static Diagnostic OnePointTwice(string first, string second, SourceSpan span) =>
        Error("RC2011", $"`{first}` and `{second}` are one point, so they settle no line", span, "a line needs two points that are apart");

    public static Diagnostic NotPositive(string what, string value, SourceSpan span) =>
        Error("RC2012", $"{what} is {value}, and must be more than nothing", span, "look at the lengths it is worked out from");

    public static Diagnostic DivisionByZero(SourceSpan span) => Error("RC2013", "this divides by exactly zero", span, "exclude the case with `when`, or change the figures");

    public static Diagnostic RootOfNegative(string value, SourceSpan span) => Error("RC2014", $"this is the root of a negative quantity, {value}", span, "look at what is under the root");

    public static Diagnostic OutsideDomain(string message, SourceSpan span, string? hint = null) => Error("RC2015", message, span, hint);

    public static Diagnostic Undecided(string message, Verdict known, SourceSpan span) =>
        Error("RC2016", $"a decision this sentence needs is too hard: {message}", span, $"what is known: {known}; raise `--time-limit`, or give exact figures");

    public static Diagnostic BadIndex(string message, SourceSpan span, string? hint = null) => Error("RC2017", message, span, hint);

    public static Diagnostic NoSuchMember(string name, string index, string known, SourceSpan span) =>
        Error("RC2018", $"`{name}` has no `[{index}]`", span, known);

    public static Diagnostic BadLoop(string message, SourceSpan span, string? hint = null) => Error("RC2019", message, span, hint);

    public static Diagnostic UnknownRecipe(string title, string? near, SourceSpan span) =>
        Error("RC2020", $"no recipe is called \"{title}\"", span, near is null ? "`setout recipes` lists those that are built in" : $"is \"{near}\" meant?");

    public static Diagnostic BadNeed(string message, SourceSpan span, string? hint = null) => Error("RC2021", message, span, hint);

    public static Diagnostic FollowsItself(string title, SourceSpan span) => Error("RC2022", $"recipe \"{title}\" follows itself", span, "a recipe may not, nor through another: it would never end");

    public static Diagnostic Refused(string message, SourceSpan span, string? recipe) =>
        Error("RC2023", message, span, recipe is null ? "the script refuses its own figures; change them" : $"recipe \"{recipe}\" refuses this; change what it is given");

    public static Diagnostic ClaimRefuted(string says, string? by, SourceSpan span) => Error("RC2024", $"the claim `{says}` is refuted", span, by);

    public static Diagnostic ClaimUndecided(string says, Verdict verdict, SourceSpan span) =>
        new("RC2025", Severity.Warning, $"the claim `{says}` is not decided", span, $"what is known: {verdict}");

    public static Diagnostic OutOfTolerance(string label, string difference, string within, SourceSpan span) =>
        Error("RC2026", $"the comparison \"{label}\" is out of tolerance: it differs by {difference}", span, $"{within} was asked");

    public static Diagnostic NotOn(string point, string curve, string distance, SourceSpan span) =>
        Error("RC2027", $"`{point}` does not lie on `{curve}`", span, distance);

    public static Diagnostic BadKit(string message, SourceSpan span, string? hint = null) => Error("RC2030", message, span, hint);

    public static Diagnostic BadHand(string message, SourceSpan span, string? hint = null) => Error("RC2031", message, span, hint);

    public static Diagnostic Limit(string what, string limit, SourceSpan span, string? hint = null) =>
        Error("RC2032", $"{what}; the limit is {limit}", span, hint);

    public static Diagnostic BadGiven(string message, SourceSpan span, string? hint = null) => Error("RC2033", message, span, hint);

    public static Diagnostic CannotUse(string name, SourceSpan span) =>
        Error("RC2034", $"the script \"{name}\" to be used cannot be read", span, "the name is looked for beside this script; mend it, or put the file there");

    public static Diagnostic BadKeep(string message, SourceSpan span, string? hint = null) => Error("RC2035", message, span, hint);

    public static Diagnostic BadComparison(string message, SourceSpan span, string? hint = null) => Error("RC2036", message, span, hint);

    public static Diagnostic BadTextForm(string message, SourceSpan span, string? hint = null) => Error("RC2037", message, span, hint);

    public static Diagnostic Degenerate(string message, SourceSpan span, string? hint = null) => Error("RC2038", message, span, hint);

    public static Diagnostic NoTool(string want, string tools, SourceSpan span) =>
        Error("RC2039", $"no tool in the kit can make {want}", span, $"add {tools} to the `kit`");

    public static Diagnostic NotInKit(string tool, SourceSpan span) =>
        Error("RC2039", $"`by {tool}` is asked, and the kit has none", span, $"add `{tool}` to the `kit`, or leave out `by {tool}`");

    public static Diagnostic NoWayBy(string tool, IEnumerable<string> ways, SourceSpan span) =>
        Error("RC2039", $"`by {tool}` is no way to make this", span, string.Join(" or ", ways.Select(way => $"`by {way}`")) is { Length: > 0 } others ? $"write {others}, or leave it out" : $"leave out `by {tool}`");

    public static Diagnostic ActsDoNotProve(string what, SourceSpan span) =>
        Error("RC2040", $"the acts for this sentence could not be proved to make {what}", span, "please tell the developers; no figure from it can be trusted");

    private static Diagnostic Error(string code, string message, SourceSpan span, string? hint) => new(code, Severity.Error, message, span, hint);
}
