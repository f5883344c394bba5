using System.Collections.Immutable;
using System.Globalization;
using System.Text.RegularExpressions;
using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.CommandLine;

/// <summary>The bench's warnings of single acts, to be told beside the acts on the step plates.</summary>
internal static partial class PlateCautions
{
    /// <summary>The cautions by act number.</summary>
    public static ImmutableDictionary<int, ImmutableArray<string>> Of(IEnumerable<Diagnostic> findings) =>
        (from finding in findings
         where finding.Severity == Severity.Warning && finding.Code.StartsWith("RC3", StringComparison.Ordinal)
         let match = OfAct.Match(finding.Message)
         where match.Success
         group Sentence(match.Groups[2].Value) by int.Parse(match.Groups[1].Value, CultureInfo.InvariantCulture))
        .ToImmutableDictionary(act => act.Key, act => act.ToImmutableArray());

    // On a plate names stand without the backticks of messages.
    private static string Sentence(string message)
    {
        string plain = message.Replace("`", "", StringComparison.Ordinal);
        return $"{plain}.";
    }

    [GeneratedRegex("^act ([0-9]+): (.+)$", RegexOptions.CultureInvariant)]
    private static partial Regex OfAct { get; }
}
