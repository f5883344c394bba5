using System.Globalization;
using System.Text;
using RuleAndCompass.Accuracy;
using RuleAndCompass.Making;

namespace RuleAndCompass.Comparing;

/// <summary>The hand error of a layout as plain text: results in columns, then the acts to blame.</summary>
public static class HandText
{
    private const int WorstShown = 5;
    private const double ShareWorthTelling = 0.05;

    /// <summary>Sets it out.</summary>
    public static string Render(HandErrorReport report, Layout layout)
    {
        ArgumentNullException.ThrowIfNull(report);
        ArgumentNullException.ThrowIfNull(layout);
        StringBuilder text = new();
        text.Append(CultureInfo.InvariantCulture, $"{(layout.Title.Length > 0 ? layout.Title : layout.Script.Name)}\nHand {BenchText.Of(report.Hand)}\n");
        text.Append(report.Trials == 0 ? "By first order alone.\n" : string.Create(CultureInfo.InvariantCulture, $"By {report.Trials} trials, seed {report.Seed}.\n"));
        if (!report.Results.IsEmpty)
            text.Append("\nWhat 95 layouts in 100 stay within\n");
        string[][] rows = [["", "size", "at the far end", "in time", "1 in 40 under", "1 in 40 over", "lost"], .. report.Results.Select(Cells)];
        text.Append(PlainTable.Render(rows));
        foreach (string sentence in DeviationReport.HandSentences(report))
            text.Append('\n').Append(sentence);
        text.Append(report.Summaries.IsEmpty ? "" : "\n");
        if (!report.Blame.IsEmpty)
            text.Append("\nWhat spoils it most, over all comparisons\n");
        foreach (Blame blame in report.Blame)
            text.Append("  ").Append(DeviationReport.BlameSentence(blame)).Append('\n');
        foreach (HandResult result in report.Results.Where(result => result.Size95 > 0).OrderByDescending(result => result.MinutesOfTime95 ?? 0).ThenByDescending(result => result.Size95).Take(WorstShown))
        {
            Blame[] worth = [.. result.Blame.Where(blame => blame.Share >= ShareWorthTelling)];
            if (worth.Length == 0)
                continue;
            text.Append(CultureInfo.InvariantCulture, $"\nWhat spoils {result.Label}\n");
            foreach (Blame blame in worth)
                text.Append("  ").Append(DeviationReport.BlameSentence(blame)).Append('\n');
        }

        return text.ToString();
    }

    private static string[] Cells(HandResult result) =>
    [
        result.Label + (result.Subject == HandSubject.Comparison ? "" : $" ({Of(result.Subject)})"),
        result.Size95 is { } size ? DeviationReport.WithUnit(size, result.Kind) : "always lost",
        result.Far95 is { } far ? $"{QuantityText.Estimate(far)} mm" : "",
        result.MinutesOfTime95 is { } minutes ? $"{QuantityText.Estimate(minutes)} min" : "",
        result.Low95 is { } low ? DeviationReport.WithUnit(low, result.Kind) : "",
        result.High95 is { } high ? DeviationReport.WithUnit(high, result.Kind) : "",
        result.Lost > 0 ? result.Lost.ToString(CultureInfo.InvariantCulture) : "",
    ];

    private static string Of(HandSubject subject) => subject switch
    {
        HandSubject.Line => "its way",
        HandSubject.Radius => "its radius",
        HandSubject.Centre => "its centre",
        _ => "its place",
    };
}
