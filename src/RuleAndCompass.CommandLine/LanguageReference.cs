using System.Text;
using System.Text.RegularExpressions;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine;

/// <summary>The language reference that ships with the program, and what it says of a code or a word.</summary>
/// <remarks>
/// A section is a heading with what follows it, to the next heading of its own depth or above. What is sought is found first among the words in backticks of
/// headings, then among those of headings without, then in what a table row or a paragraph begins with or names in backticks.
/// </remarks>
internal static partial class LanguageReference
{
    public static string Text { get; } =
        Resource.Read(typeof(RecipeBook).Assembly, "language.md").TrimEnd() + "\n\n" + Resource.Read(typeof(LanguageReference).Assembly, "command-line.md");

    /// <summary>What the reference says of a code or a word; null where that is nothing.</summary>
    public static string? Find(string what)
    {
        string[] lines = Text.ReplaceLineEndings("\n").Split('\n');
        return FindSections(lines, heading => InBackticks(heading, what))
            ?? FindSections(lines, heading => Regex.IsMatch(heading, $@"(?<![\w-]){Regex.Escape(what)}(?![\w-])", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant))
            ?? FindPassages(lines, what);
    }

    /// <summary>The known word or code nearest to one that is not found; null where none is near.</summary>
    public static string? Near(string what) => NearName.Find(what, Known());

    private static IEnumerable<string> Known() =>
        Ticked.Matches(Text).SelectMany(match => Words.Matches(match.Groups[1].Value)).Select(match => match.Value).Distinct(StringComparer.Ordinal);

    private static string? FindSections(string[] lines, Predicate<string> isSought)
    {
        StringBuilder found = new();
        bool inCode = false;
        int depth = 0;
        foreach (string line in lines)
        {
            inCode ^= line.StartsWith("```", StringComparison.Ordinal);
            int hashes = inCode ? 0 : line.TakeWhile(sign => sign == '#').Count();
            if (hashes > 0 && (depth == 0 || hashes <= depth))
                depth = hashes > 1 && isSought(line) ? hashes : 0;
            if (depth > 0)
                found.Append(line).Append('\n');
        }

        return found.Length == 0 ? null : found.ToString().TrimEnd('\n') + "\n";
    }

    private static string? FindPassages(string[] lines, string what)
    {
        List<string> found = [];
        bool inCode = false;
        StringBuilder passage = new();
        string head = "";
        foreach (string line in lines.Append(""))
        {
            inCode ^= line.StartsWith("```", StringComparison.Ordinal);
            bool isRow = line.StartsWith('|'), isItem = line.StartsWith("- ", StringComparison.Ordinal);
            if (passage.Length > 0 && !inCode && (line.Length == 0 || isRow || isItem || line.StartsWith('#')))
            {
                Keep(passage.ToString(), head, what, found);
                passage.Clear();
            }

            if (line.StartsWith('#') && !inCode)
                head = line.TrimStart('#', ' ');
            else if (line.Length > 0)
                passage.Append(line).Append('\n');
        }

        return found.Count == 0 ? null : string.Join("\n", found);
    }

    private static void Keep(string passage, string head, string what, List<string> found)
    {
        if (!InBackticks(passage, what) && !passage.StartsWith($"| {what} |", StringComparison.Ordinal))
            return;
        found.Add($"({head})\n{passage}");
    }

    private static bool InBackticks(string text, string what) =>
        Ticked.Matches(text).Any(match => Words.Matches(match.Groups[1].Value).Any(word => word.Value.Equals(what, StringComparison.Ordinal)));

    [GeneratedRegex("`([^`\n]+)`", RegexOptions.CultureInvariant)]
    private static partial Regex Ticked { get; }

    [GeneratedRegex(@"[\p{L}_][\p{L}\p{Nd}_]*", RegexOptions.CultureInvariant)]
    private static partial Regex Words { get; }
}
