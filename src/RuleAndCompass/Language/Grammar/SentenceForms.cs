using System.Collections.Frozen;
using System.Collections.Immutable;

namespace RuleAndCompass.Language.Grammar;

/// <summary>The forms of each sentence, shown by example.</summary>
public static class SentenceForms
{
    /// <summary>The words a sentence may begin with, each with every form it has.</summary>
    public static ImmutableArray<(string Word, ImmutableArray<string> Forms)> All { get; } =
    [
        ("title", ["title \"Garden dial\""]),
        ("sheet", ["sheet A3 sideways", "sheet 420 mm by 297 mm"]),
        ("board", ["board 700 mm by 500 mm"]),
        ("kit", ["kit straightedge 600 mm, dividers 2 mm to 180 mm, beam 100 mm to 1 m, square, protractor, scale 1/2 mm"]),
        ("hand", ["hand ordinary, but edge 0.2 mm", "hand prick 0.1 mm, edge 0.1 mm, opening 0.1 mm, protractor 0.2°"]),
        ("note", ["note \"cut before the stone is polished\""]),
        ("use", ["use \"corbels.setout\""]),
        ("given", ["given span = 960 mm", "given span = 960 mm from 500 mm to 2 m"]),
        ("let", ["let rise = span / 2"]),
        ("stage", ["stage \"The springing\""]),
        (
            "prick",
            [
                "prick C where rim meets noon, above O",
                "prick C, D where rim meets noon",
                "prick C where rim meets noon, farthest from O",
                "prick C where rim meets noon, other than O",
                "prick C where rim meets bar, left along noon",
                "prick C where rim meets bar, same side of noon as O",
                "prick C where rim meets bar, across noon from O",
                "prick O at (0, -60 mm)",
                "prick O at (0, 20 mm) from A",
                "prick F at foot of S on slant",
                "prick O at centre of rim",
                "prick M midway A to B",
                "prick B opposite A across noon",
                "prick B opposite A about O",
                "prick P on noon, 30 mm from O toward up",
                "prick P on noon, 30 mm ahead of O",
                "prick P on noon, 30 mm behind O",
                "prick P on rim toward up",
                "prick P on rim turned 30° from A clockwise",
                "prick P[0 to 7] dividing A to B",
                "prick V[1 to 6] round O from A anticlockwise",
                "prick P[0 to 7] stepping 10 mm along noon from O toward up",
                "prick P[0 to 7] stepping A to B round rim from C clockwise",
            ]),
        (
            "rule",
            [
                "rule edge through A, B",
                "rule noon through O toward up",
                "rule six through O square to noon",
                "rule bar through S parallel to six",
                "rule bar through S back along six",
                "rule slant through O turned 43° from noon clockwise",
                "rule middle halving A to B",
                "rule half halving angle A O B",
                "rule edge touching rim at P",
                "rule edge touching rim from P, above O",
                "rule belt touching rim, hub crossed, above O",
                "rule belt touching rim, hub open, left of O",
            ]),
        (
            "strike",
            [
                "strike rim about O through A",
                "strike rim about O opening 80 mm",
                "strike rim about O opening A to B",
                "strike rim about O touching bar",
                "strike rim through A, B, C",
            ]),
        (
            "keep",
            [
                "keep noon",
                "keep noon from O to C heavy",
                "keep rim from A to B clockwise cut",
                "keep noon between rim and hub fine dashed",
                "keep noon inside rim and outside hub",
                "keep P joined closed",
                "keep P faired",
                "keep P drilled 3 mm",
                "keep from A along noon to B, along rim clockwise to C cut",
            ]),
        (
            "letter",
            [
                "letter \"XII\" at C height 5 mm",
                "letter \"XII\" at C height 5 mm feet toward O",
                "letter \"XII\" at C height 5 mm head toward O",
                "letter \"XII\" from C height 5 mm along noon",
                "letter \"XII\" to C height 5 mm round rim clockwise",
            ]),
        (
            "claim",
            [
                "claim six square to noon",
                "claim bar parallel to six",
                "claim A on noon",
                "claim rim touches noon",
                "claim rim meets noon",
                "claim distance A to B = 2 * R",
                "claim A, B, C on one line",
                "claim A, B, C, D on one circle",
                "claim l, m, n through one point",
                "claim not A = B and not B = C",
            ]),
        (
            "compare",
            [
                "compare distance A to B with span / 2 within 0.1 mm",
                "compare angle from noon to ray clockwise with atan(tan(15° * h)) as \"{h} h\" timed by h within 1'",
                "compare angle from noon to ray clockwise with H timed by h within 1/2 minutes",
                "compare P with (20 mm, 30 mm) from O within 0.1 mm",
            ]),
        ("for", ["for h = 1 to 5", "for h = 5 to 11, 13 to 19 step 1/2"]),
        ("when", ["when remainder(h, 5) = 0"]),
        ("otherwise", ["otherwise", "otherwise when h > 12"]),
        ("end", ["end"]),
        ("recipe", ["recipe \"a corbel's curve\""]),
        ("needs", ["needs centre point, radius length = 40 mm"]),
        ("gives", ["gives curve as \"profile of a corbel\""]),
        ("trade", ["trade \"masonry\""]),
        ("source", ["source \"the book it rests on\""]),
        ("follow", ["follow \"a corbel's curve\" as corbel", "follow \"a corbel's curve\" as corbel with centre = A, radius = 40 mm"]),
        ("refuse", ["refuse \"the span must exceed the rise\""]),
    ];

    /// <summary>The words alone.</summary>
    public static ImmutableArray<string> Words { get; } = [.. All.Select(entry => entry.Word)];

    private static readonly FrozenDictionary<string, ImmutableArray<string>> ByWord = All.ToFrozenDictionary(entry => entry.Word, entry => entry.Forms);

    /// <summary>Whether a sentence may begin with the word.</summary>
    public static bool Begins(string word) => ByWord.ContainsKey(word);

    /// <summary>Finds the form nearest to a sentence: the one that shares most words with it, of several the first.</summary>
    /// <param name="sentenceWord">What the sentence begins with.</param>
    /// <param name="words">The other words of the sentence.</param>
    public static string? FindNearest(string sentenceWord, IEnumerable<string> words)
    {
        if (!ByWord.TryGetValue(sentenceWord, out ImmutableArray<string> forms))
            return null;
        HashSet<string> said = [.. words.Where(Vocabulary.Holds)];
        return forms.MaxBy(form => form.Split(' ').Skip(1).Select(word => word.TrimEnd(',')).Distinct().Count(said.Contains));
    }
}
