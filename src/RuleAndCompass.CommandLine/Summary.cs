using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine;

/// <summary>A layout in one line: <c>62 acts; 11 comparisons, 11 with difference 0; 1 claim, holds</c>.</summary>
internal static class Summary
{
    public static string Of(Layout layout)
    {
        List<string> parts = [Counted(layout.Acts.Length, "act")];
        if (layout.Comparisons.Length > 0)
        {
            int zero = layout.Comparisons.Count(comparison => comparison.Decision.IsZero), beyond = layout.Comparisons.Count(comparison => !comparison.InTolerance);
            parts.Add(FormattableString.Invariant($"{Counted(layout.Comparisons.Length, "comparison")}, {zero} with difference 0{(beyond > 0 ? $", {beyond} out of tolerance" : "")}"));
        }

        if (layout.Claims.Length > 0)
        {
            int refuted = layout.Claims.Count(claim => claim.Holds == false), open = layout.Claims.Count(claim => claim.Holds is null);
            string told = refuted > 0 ? FormattableString.Invariant($"{refuted} refuted") : open > 0 ? FormattableString.Invariant($"{open} not decided") : layout.Claims.Length == 1 ? "it holds" : "all hold";
            parts.Add($"{Counted(layout.Claims.Length, "claim")}, {told}");
        }

        return string.Join("; ", parts);
    }

    private static string Counted(int count, string thing) => FormattableString.Invariant($"{count} {thing}{(count == 1 ? "" : "s")}");
}
