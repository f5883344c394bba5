using System.Collections.Frozen;

namespace RuleAndCompass.Language.Grammar;

/// <summary>What people write from habit, and the word of the language for it, where no likeness of spelling leads there.</summary>
internal static class Habits
{
    private static readonly FrozenDictionary<string, string> FirstWords = Read(
        "when: if | otherwise: else elif elseif | for: while repeat loop foreach each | prick: point dot mark | rule: line segment draw | strike: circle arc swing scribe "
        + "| letter: text label write engrave | let: set var const define def | given: input parameter param | claim: assert prove check test | keep: show output "
        + "| use: import include | recipe: function procedure macro | follow: call apply make | note: print remark | sheet: paper page | refuse: error fail stop "
        + "| stage: step section part | end: done endfor endif fi");

    private static readonly FrozenDictionary<string, string> InnerWords = Read(
        "square: perpendicular normal | midway: halfway midpoint middle | straightedge: ruler rule | dividers: compass compasses | beam: trammel | opening: radius "
        + "| halving: bisecting bisects bisector | touching: tangent | touches: tangents | meets: crosses cuts intersects | where: intersection | heavy: bold thick "
        + "| fine: thin light | dashed: dotted broken | clockwise: cw | anticlockwise: ccw counterclockwise | sideways: landscape | upright: portrait "
        + "| nearest: closest near | farthest: far | turned: rotated | toward: to | opposite: mirrored reflected | height: size | about: at | centre: middle "
        + "| by: using | stepping: step | foot: projection | when: if | closed: close | ahead: beyond | behind: before");

    /// <summary>The sentence word for a first word that is none.</summary>
    public static string? FindFirstWord(string word) => FirstWords.GetValueOrDefault(word.ToLowerInvariant());

    /// <summary>The word of the language for another within a sentence.</summary>
    public static string? FindInnerWord(string word) => InnerWords.GetValueOrDefault(word.ToLowerInvariant());

    private static FrozenDictionary<string, string> Read(string table)
    {
        Dictionary<string, string> words = [];
        foreach (string entry in table.Split(" | "))
        {
            int colon = entry.IndexOf(':', StringComparison.Ordinal);
            foreach (string habit in entry[(colon + 2)..].Trim().Split(' '))
                words.TryAdd(habit, entry[..colon].Trim());
        }

        return words.ToFrozenDictionary();
    }
}
