using System.Collections.Frozen;
using System.Collections.Immutable;

namespace RuleAndCompass.Language.Grammar;

/// <summary>The words of the language, for the grammar, for suggestions and for editors.</summary>
public static class Vocabulary
{
    /// <summary>The reserved words: no name may be one, and a line that begins with one goes on with the sentence before.</summary>
    public static FrozenSet<string> LittleWords { get; } = (
        "about above ahead along and angle anticlockwise as at behind below between by clockwise distance down from left meets nearest not of on or "
        + "right than through timed to touches toward turned up where with within").Split(' ').ToFrozenSet();

    /// <summary>Units of length with their size in millimetres, as a numerator over a denominator.</summary>
    internal static FrozenDictionary<string, (int Numerator, int Denominator)> LengthUnits { get; } = new Dictionary<string, (int, int)>
    {
        ["mm"] = (1, 1),
        ["cm"] = (10, 1),
        ["m"] = (1000, 1),
        ["in"] = (127, 5),
        ["ft"] = (1524, 5),
    }.ToFrozenDictionary();

    /// <summary>Units of angle in degrees.</summary>
    internal static FrozenDictionary<string, int> AngleUnits { get; } = new Dictionary<string, int> { ["deg"] = 1, ["turn"] = 360 }.ToFrozenDictionary();

    /// <summary>All units, in the order a message lists them.</summary>
    public static ImmutableArray<string> Units { get; } = ["mm", "cm", "m", "in", "ft", "deg", "turn"];

    /// <summary>What people write for a unit, and what it is here.</summary>
    internal static FrozenDictionary<string, string> UnitHabits { get; } = new Dictionary<string, string>
    {
        ["millimetre"] = "mm",
        ["millimetres"] = "mm",
        ["millimeter"] = "mm",
        ["millimeters"] = "mm",
        ["MM"] = "mm",
        ["centimetre"] = "cm",
        ["centimetres"] = "cm",
        ["centimeter"] = "cm",
        ["centimeters"] = "cm",
        ["CM"] = "cm",
        ["metre"] = "m",
        ["metres"] = "m",
        ["meter"] = "m",
        ["meters"] = "m",
        ["M"] = "m",
        ["inch"] = "in",
        ["inches"] = "in",
        ["ins"] = "in",
        ["foot"] = "ft",
        ["feet"] = "ft",
        ["degree"] = "deg",
        ["degrees"] = "deg",
        ["degs"] = "deg",
        ["turns"] = "turn",
    }.ToFrozenDictionary();

    /// <summary>The functions, with the least and greatest count of values each takes.</summary>
    internal static FrozenDictionary<string, (int Least, int Most)> FunctionArguments { get; } = new Dictionary<string, (int, int)>
    {
        ["sqrt"] = (1, 1),
        ["sin"] = (1, 1),
        ["cos"] = (1, 1),
        ["tan"] = (1, 1),
        ["asin"] = (1, 1),
        ["acos"] = (1, 1),
        ["atan"] = (1, 2),
        ["abs"] = (1, 1),
        ["min"] = (2, int.MaxValue),
        ["max"] = (2, int.MaxValue),
        ["whole"] = (1, 1),
        ["remainder"] = (2, 2),
        ["declination"] = (2, 3),
        ["sun_correction"] = (2, 3),
    }.ToFrozenDictionary();

    /// <summary>The functions by name.</summary>
    public static ImmutableArray<string> Functions { get; } =
        ["sqrt", "sin", "cos", "tan", "asin", "acos", "atan", "abs", "min", "max", "whole", "remainder", "declination", "sun_correction"];

    /// <summary>The standard sheets.</summary>
    public static ImmutableArray<string> Sheets { get; } = ["A0", "A1", "A2", "A3", "A4", "A5", "A6", "letter", "legal", "tabloid"];

    /// <summary>What a value may be shown as within text, beside a count of decimals.</summary>
    public static ImmutableArray<string> Forms { get; } = ["roman", "chapter", "clock", "month"];

    /// <summary>The kinds a recipe's need may have; the plural is for a whole family.</summary>
    public static ImmutableArray<string> Kinds { get; } =
        ["point", "line", "circle", "number", "length", "angle", "text", "points", "lines", "circles", "numbers", "lengths", "angles", "texts"];

    /// <summary>Words that stand at a set place in a sentence; a maker may use them as names all the same.</summary>
    public static ImmutableArray<string> PlaceWords { get; } =
    [
        "upright", "sideways", "straightedge", "dividers", "beam", "square", "protractor", "scale", "but", "fine", "ordinary", "coarse", "edge", "opening", "prick", "step",
        "dividing", "round", "stepping", "foot", "centre", "midway", "opposite", "across", "parallel", "back", "halving", "touching", "open", "crossed",
        "farthest", "other", "same", "side", "inside", "outside", "heavy", "dashed", "chain", "cut", "engraved", "drilled", "joined", "faired", "closed",
        "height", "feet", "head", "minutes", "one", "point", "line", "circle", "radius", "x", "y", "pi",
    ];

    private static readonly FrozenDictionary<string, string> Interned =
        LittleWords.Concat(SentenceForms.Words).Concat(Units).Concat(Functions).Concat(PlaceWords).Concat(Kinds).Distinct().ToFrozenDictionary(word => word);

    private static readonly FrozenDictionary<string, string>.AlternateLookup<ReadOnlySpan<char>> InternedBySpan = Interned.GetAlternateLookup<ReadOnlySpan<char>>();

    /// <summary>Whether the word has a meaning of its own somewhere in the language.</summary>
    internal static bool Holds(string word) => Interned.ContainsKey(word);

    /// <summary>The word as a string, without making a new one for the words of the language.</summary>
    internal static string Intern(ReadOnlySpan<char> word) => InternedBySpan.TryGetValue(word, out string? known) ? known : word.ToString();
}
