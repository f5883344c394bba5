using System.Globalization;
using System.Text;
using RuleAndCompass.Language.Grammar;

namespace RuleAndCompass.Language.Diagnostics;

/// <summary>What the reading of a script finds. Each code is explained in the language reference.</summary>
internal static class LanguageFindings
{
    // Words and their order

    internal static Diagnostic UnknownSentenceWord(string found, IEnumerable<string> words, SourceSpan span)
    {
        string? near = Habits.FindFirstWord(found) ?? NearName.Find(found, SentenceForms.Words);
        return Error(
            "RC1001",
            $"no sentence begins with {Quote(found)}",
            span,
            Vocabulary.LittleWords.Contains(found) ? "a line that begins with a little word goes on with the sentence before it, and there is none"
            : near is null
                ? "a sentence begins with a word such as `prick`, `rule`, `strike`, `keep`, `let` or `for`"
                : $"did you mean `{near}`? For example `{SentenceForms.FindNearest(near, words)}`");
    }

    internal static Diagnostic Unexpected(string found, IReadOnlyList<string> expected, string? hint, string? example, SourceSpan span) => Error(
        "RC1002",
        expected.Count is 0 or > 5 ? $"{Quote(found)} is not understood here" : $"{Quote(found)} stands where {Join(expected)} is expected",
        span,
        hint is not null ? hint
        : expected is [Rules.AName] && example is not null ? $"put a name before {Quote(found)}, {Example(example)}"
        : expected.Count > 5 ? $"here may stand {Join(expected)}" : Example(example));

    internal static Diagnostic BreaksOff(string? last, IReadOnlyList<string> expected, string? example, SourceSpan span) => Error(
        "RC1003",
        last is null ? $"nothing is written where {Join(expected)} is expected" : expected.Count == 0 ? $"the sentence breaks off after {Quote(last)}" : $"the sentence breaks off after {Quote(last)}; {Join(expected)} is expected",
        span,
        Example(example));

    internal static Diagnostic LittleWordAsName(string word, SourceSpan span)
    {
        string capital = char.ToUpperInvariant(word[0]) + word[1..];
        return Error("RC1004", $"`{word}` is a word of the language and can't be a name", span, $"call it `{capital}` or `{word}_1`, say");
    }

    internal static Diagnostic TooManyWords(string found, string? hint, IReadOnlyList<string> possible, SourceSpan span) => Error(
        "RC1005",
        $"the sentence is complete before {Quote(found)}",
        span,
        hint is not null ? hint
        : possible.Count > 0 ? $"leave it out, or begin a line with the next sentence; only {Join(possible)} could follow"
        : "leave it out, or begin a line with the next sentence");

    internal static Diagnostic CommaBeforeSentence(string word, SourceSpan comma) => Error(
        "RC1006",
        $"a line ends in a comma, and the next begins the sentence `{word}`",
        comma,
        "a comma at the end of a line carries the sentence on: leave it out, or write what follows it");

    // Brackets and texts

    internal static Diagnostic BracketNotClosed(string bracket, SourceSpan span) => Error(
        "RC1007",
        $"the bracket `{bracket}` is not closed",
        span,
        bracket == "(" ? "put `)` where the bracket ends" : "put `]` after the index");

    internal static Diagnostic BracketNotOpened(string bracket, SourceSpan span) => Error(
        "RC1008",
        $"the bracket `{bracket}` closes nothing",
        span,
        $"leave it out, or put `{(bracket == ")" ? "(" : "[")}` where the bracket begins");

    internal static Diagnostic TextNotClosed(SourceSpan span) => Error(
        "RC1009",
        "the text is not closed",
        span,
        "put `\"` at its end; a text ends on the line it begins on");

    internal static Diagnostic BraceNotClosed(SourceSpan span) => Error(
        "RC1010",
        "the brace `{` is not closed within the text",
        span,
        "put `}` after the value, or write `{{` for a brace; no `\"` stands inside braces");

    internal static Diagnostic UnknownForm(string form, SourceSpan span)
    {
        string? near = NearName.Find(form, Vocabulary.Forms);
        return Error(
            "RC1011",
            $"{Quote(form)} is no form to show a value in",
            span,
            near is not null
                ? $"did you mean `{near}`?"
                : "a form is a count of decimals, up to 100, or `roman`, `chapter`, `clock` or `month`: `{h}`, `{R:2}`, `{h:chapter}`");
    }

    internal static Diagnostic ValueInPlainText(string sentenceWord, SourceSpan span) => Error(
        "RC1012",
        $"the text of `{sentenceWord}` is taken as it stands and holds no value in braces",
        span,
        "write it out; `{{` is a brace");

    // Signs, numbers and units

    internal static Diagnostic StraySign(string found, Rune first, SourceSpan span)
    {
        string shown = Rune.GetUnicodeCategory(first) is UnicodeCategory.Control or UnicodeCategory.Format or UnicodeCategory.PrivateUse
            or UnicodeCategory.OtherNotAssigned or UnicodeCategory.Surrogate || first.Value == 0xFFFD
            ? $"a sign that can't be shown (U+{(first.Value == 0xFFFD ? found[0] : first.Value):X4})"
            : Quote(found);
        string? hint = FindMeant(first);
        return Error("RC1013", $"{shown} has no meaning here", span, hint ?? "leave it out; a `#` begins a comment");
    }

    /// <summary>What to write for a sign that people write for another, or null.</summary>
    internal static string? FindMeant(Rune sign) => sign.Value switch
    {
        '“' or '”' or '„' or '«' or '»' => "write a text between plain `\"` marks",
        '‘' or '’' or '´' or '`' => "for minutes of arc write `'`; a text stands between `\"` marks",
        '\'' or '′' => "minutes of arc stand right after a digit: `18'`; a text stands between `\"` marks",
        '″' => "seconds of arc stand right after a digit: `30\"`",
        '°' => "degrees stand right after a digit: `15°`; for a value worked out, multiply: `h * 1°`",
        'º' or '˚' => "for degrees write `°`, or `deg`",
        '−' or '–' or '—' => "write `-`",
        '×' or '·' or '∙' or '⋅' => "write `*`",
        '÷' => "write `/`",
        '≤' => "write `<=`",
        '≥' => "write `>=`",
        '≠' => "write `not x = y`",
        '√' => "write `sqrt(2)`",
        'π' => "write `pi`",
        '^' => "write a power as a product: `x * x`",
        '&' => "write `and`",
        '|' => "write `or`",
        '!' => "write `not`",
        ';' => "one sentence stands on a line; begin a new line",
        '{' or '}' => "braces show a value within text: `\"hour {h}\"`; an index stands in `[` and `]`",
        '_' => "a name begins with a letter",
        > 127 when Rune.IsDigit(sign) => "figures are written with 0 to 9",
        ':' => "leave it out; a name and its value are parted by `=`",
        _ => null,
    };

    internal static Diagnostic NumberBeginsWithPoint(string found, SourceSpan span) => Error(
        "RC1014",
        $"the number `{found}` has no digit before its point",
        span,
        $"write `0{found}`");

    internal static Diagnostic ClosedUp(string number, string word, SourceSpan wordSpan, SourceSpan whole, bool mayBeUnit)
    {
        string? unit = mayBeUnit ? FindUnit(word) : null;
        return unit is not null
            ? UnknownUnit(word, wordSpan)
            : Error("RC1015", $"`{Clip(number)}{word}` is neither a number nor a name", whole, word == "h" || word.StartsWith('h') && word.Skip(1).All(char.IsAsciiDigit)
                ? "hours of turn are whole, as in `2h` or `2h30m`; a product is written with `*`"
                : $"a product is written with `*`: `{Clip(number)} * {word}`; a name begins with a letter");
    }

    internal static Diagnostic PartWithoutMark(string digits, SourceSpan span) => Error(
        "RC1016",
        $"the part `{digits}` of an angle has no mark",
        span,
        "minutes end in `'` and seconds in `\"`: `43°18'30\"`");

    internal static Diagnostic SixtyParts(string found, string parts, SourceSpan span) => Error(
        "RC1017",
        $"`{found}` {parts} after a larger part of an angle are more than a whole one",
        span,
        $"{parts} run from 0 to 59 there; carry sixty of them over");

    internal static Diagnostic ZeroBelow(SourceSpan span) => Error(
        "RC1018",
        "a fraction has 0 below its stroke",
        span,
        "nothing can be divided by 0");

    internal static Diagnostic FractionAfterStroke(string fraction, SourceSpan span)
    {
        int slash = fraction.IndexOf('/', StringComparison.Ordinal);
        string twice = fraction.Contains(' ', StringComparison.Ordinal) ? "" : $", or `/ {fraction[..slash]} / {fraction[(slash + 1)..]}` to divide twice";
        return Error("RC1019", $"the fraction `{fraction}` after `/` can be read in two ways", span, $"write `/ ({fraction})` to divide by the fraction{twice}");
    }

    internal static Diagnostic UnknownUnit(string word, SourceSpan span)
    {
        string? unit = FindUnit(word);
        return Error(
            "RC1020",
            $"{Quote(word)} is no unit",
            span,
            word == "h" ? "hours of turn are written closed up: `2h`, `2h30m`" : unit is null ? "units are `mm`, `cm`, `m`, `in`, `ft`, `deg` and `turn`" : $"did you mean `{unit}`?");
    }

    internal static Diagnostic UnitAfterValue(string unit, SourceSpan span) => Error(
        "RC1021",
        $"the unit `{unit}` does not follow a written number",
        span,
        $"a value worked out is multiplied by its unit: `* 1 {unit}`");

    internal static Diagnostic LengthWithoutUnit(string number, SourceSpan span) => Error(
        "RC1022",
        $"a length is expected, and `{number}` has no unit",
        span,
        $"write `{number} mm`, say; units of length are `mm`, `cm`, `m`, `in` and `ft`");

    internal static Diagnostic AngleWithoutMark(string number, SourceSpan span) => Error(
        "RC1023",
        $"an angle is expected, and `{number}` has no mark",
        span,
        $"write {(number.Contains('/', StringComparison.Ordinal) ? $"`{number} turn`" : $"`{number}°`")}, say; an angle ends in `°`, `'`, `\"`, `deg` or `turn`");

    internal static Diagnostic UnknownFunction(string name, SourceSpan span)
    {
        string? near = NearName.Find(name, Vocabulary.Functions);
        return Error(
            "RC1024",
            $"there is no function {Quote(name)}",
            span,
            near is not null ? $"did you mean `{near}`?" : $"functions are {Join(Vocabulary.Functions.Select(function => $"`{function}`").ToList(), "and")}; a product is written with `*`");
    }

    internal static Diagnostic WrongCount(string function, int given, int least, int most, SourceSpan span) => Error(
        "RC1025",
        $"`{function}` takes {(most == int.MaxValue ? $"{Count(least)} or more values" : least == most ? $"{Count(least)} value{(least == 1 ? "" : "s")}" : $"{Count(least)} or {Count(most)} values")}, not {Count(given)}",
        span,
        function switch
        {
            "atan" => "`atan(t)` takes a tangent, `atan(y, x)` the two sides for the full turn",
            "remainder" => "write `remainder(x, n)`",
            "declination" or "sun_correction" => $"write `{function}(month, day)` or `{function}(month, day, year)`",
            "min" or "max" => $"write `{function}(a, b)`",
            _ => $"write `{function}(x)`",
        });

    internal static Diagnostic NameExpected(string written, string place, SourceSpan span) => Error(
        "RC1026",
        $"`{Clip(written)}` is worked out, and {place} takes the name of a figure",
        span,
        "make it first with `prick`, `rule` or `strike`, and name it here");

    internal static Diagnostic UnknownSheet(string name, SourceSpan span)
    {
        string? near = NearName.Find(name, Vocabulary.Sheets);
        return Error(
            "RC1027",
            $"{Quote(name)} is no standard sheet",
            span,
            near is not null && (name.Length > 2 || near.Equals(name, StringComparison.OrdinalIgnoreCase)) ? $"did you mean `{near}`?" : "sheets are `A0` to `A6`, `letter`, `legal`, `tabloid`, or two sizes: `sheet 420 mm by 297 mm`");
    }

    internal static Diagnostic SaidTwice(string clause, SourceSpan span) => Error(
        "RC1028",
        $"`{clause}` is said twice in the sentence",
        span,
        "leave one of them out");

    internal static Diagnostic StylesClash(string first, string second, SourceSpan span) => Error(
        "RC1029",
        first == second ? $"`{first}` is said twice" : $"`{first}` and `{second}` exclude each other",
        span,
        "a kept figure has one of `heavy` and `fine`, one of `dashed` and `chain`, one of `cut`, `engraved` and `drilled`");

    internal static Diagnostic AndWithOr(SourceSpan span) => Error(
        "RC1030",
        "`and` and `or` are mixed in one condition",
        span,
        "join all by `and` or all by `or`; nest a `when` in a `when`, or write two claims");

    // Blocks and where sentences stand

    internal static Diagnostic EndMissing(string opener, string? suspicion, SourceSpan span) => Error(
        "RC1031",
        $"`{opener}` has no `end`",
        span,
        suspicion ?? "put `end` on a line of its own after the last sentence of the block");

    internal static Diagnostic EndTooMany(SourceSpan span) => Error(
        "RC1032",
        "`end` ends nothing",
        span,
        "leave it out; only `for`, `when` and `recipe` are ended");

    internal static Diagnostic OtherwiseOutOfPlace(string? openBlock, SourceSpan span) => Error(
        "RC1033",
        openBlock is null ? "`otherwise` stands outside any `when`" : $"`otherwise` stands in a `{openBlock}`, not in a `when`",
        span,
        openBlock is null ? "an `end` may stand before it that belongs after it" : $"the `{openBlock}` may lack its `end`");

    internal static Diagnostic OtherwiseAfterLast(SourceSpan span) => Error(
        "RC1034",
        "a branch follows the `otherwise` that takes all the rest",
        span,
        "put the `otherwise` without a condition last, or give it one: `otherwise when …`");

    internal static Diagnostic NotOutermost(string word, string block, SourceSpan span) => Error(
        "RC1035",
        $"`{word}` stands within a `{block}`",
        span,
        word == "recipe" ? $"recipes stand outermost; the `{block}` before it may lack its `end`"
        : block == "recipe" && word == "given" ? "a recipe takes values by `needs`: `needs latitude angle = 52°`"
        : $"`{word}` stands outermost only; move it before the block");

    internal static Diagnostic OutsideRecipe(string word, SourceSpan span) => Error(
        "RC1036",
        $"`{word}` stands outside any recipe",
        span,
        word == "needs" ? "a script takes values by `given`: `given latitude = 52°`" : $"`{word}` belongs between `recipe` and its `end`");

    internal static Diagnostic HeadTooLate(string word, SourceSpan span) => Error(
        "RC1037",
        $"`{word}` stands after the first want",
        span,
        "`title`, `sheet`, `board`, `kit` and `hand` stand before the first thing pricked, ruled or struck");

    internal static Diagnostic HeadTwice(string word, int line, SourceSpan span) => Error(
        "RC1038",
        $"`{word}` is said twice",
        span,
        $"it stands on line {line.ToString(CultureInfo.InvariantCulture)} already; leave one out");

    // Limits

    internal static Diagnostic TooManyBytes(long bytes, int limit) => Error(
        "RC1090",
        $"the script has {Figure(bytes)} bytes, and the limit is {Figure(limit)}",
        default,
        "part it; recipes can stand in a script of their own, taken in by `use`");

    internal static Diagnostic TooManySentences(int limit, SourceSpan span) => Error(
        "RC1091",
        $"the script has more than {Figure(limit)} sentences, which is the limit; the rest is not read",
        span,
        "say what repeats in a `for`");

    internal static Diagnostic TooDeep(int limit, SourceSpan span) => Error(
        "RC1092",
        $"blocks or brackets are nested more than {Figure(limit)} deep, which is the limit",
        span,
        "name an inner part with `let`, or make it a recipe");

    internal static Diagnostic TooManyDigits(int limit, SourceSpan span) => Error(
        "RC1093",
        $"the number is written with more than {Figure(limit)} signs, which is the limit",
        span,
        "a fraction or a root says it exactly and in short");

    internal static Diagnostic TooManyOperators(int limit, SourceSpan span) => Error(
        "RC1094",
        $"the sentence has more than {Figure(limit)} operations, which is the limit",
        span,
        "name parts of it with `let`");

    internal static Diagnostic TooManyFindings(int limit, SourceSpan span) => Error(
        "RC1095",
        $"more than {Figure(limit)} findings, which is the limit; the rest of the script is not read",
        span,
        "mend these first");

    /// <summary>The unit someone meant by a word, or null.</summary>
    internal static string? FindUnit(string word) =>
        Vocabulary.UnitHabits.TryGetValue(word, out string? unit) ? unit : word.Length < 2 ? null : NearName.Find(word, Vocabulary.Units.Where(known => known.Length > 1));

    private static Diagnostic Error(string code, string message, SourceSpan span, string? hint) => new(code, Severity.Error, message, span, hint);

    private static string? Example(string? example) => example is null ? null : $"for example `{example}`";

    private static string Quote(string found) => found.Contains('`', StringComparison.Ordinal) ? $"'{Clip(found)}'" : $"`{Clip(found)}`";

    private static string Clip(string found) => found.Length <= 40 ? found : found[..(char.IsHighSurrogate(found[38]) ? 38 : 39)] + "…";

    private static string Join(IReadOnlyList<string> items, string last = "or") => items.Count switch
    {
        0 => "nothing",
        1 => items[0],
        _ => $"{string.Join(", ", items.Take(items.Count - 1))} {last} {items[^1]}",
    };

    private static string Count(int count) => count switch
    {
        0 => "none",
        1 => "one",
        2 => "two",
        3 => "three",
        _ => count.ToString(CultureInfo.InvariantCulture),
    };

    private static string Figure(long count) => count.ToString("#,0", CultureInfo.InvariantCulture);
}
