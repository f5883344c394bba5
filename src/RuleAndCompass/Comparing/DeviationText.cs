using System.Collections.Immutable;
using System.Text;

namespace RuleAndCompass.Comparing;

/// <summary>A deviation report as plain text: columns lined up by blanks, lines ended by line feeds.</summary>
public static class DeviationText
{
    private const string Margin = "  ";
    private const int Measure = 100;

    /// <summary>Sets a report out.</summary>
    public static string Render(DeviationReport report)
    {
        ArgumentNullException.ThrowIfNull(report);
        StringBuilder text = new();
        text.Append(report.Title).Append('\n').Append('=', PlainTable.Width(report.Title)).Append("\n\n");
        text.Append(PlainTable.Render([["Script", report.Script], .. report.Head.Select(row => new[] { row.Name, row.Says })], hasNames: false));
        if (report.Notes.Length > 0)
            Paragraphs(text, "Notes", report.Notes);
        Comparisons(text, report.Comparisons);
        Claims(text, report.Claims);
        Paragraphs(text, "How far it reaches", report.Ranges);
        Paragraphs(text, "By hand", report.HandSummary);
        Lines(text, "What spoils it most", report.Blame);
        Paragraphs(text, "At the bench", report.Warnings);
        Paragraphs(text, "The work", report.Counts);
        Paragraphs(text, "Cautions", report.Cautions);
        return text.ToString();
    }

    /// <summary>The comparisons' columns that are used: name and cell. A table on a terminal shows the same.</summary>
    public static ImmutableArray<(string Name, Func<ComparisonRow, string> Cell)> ComparisonColumns(ImmutableArray<ComparisonRow> rows)
    {
        (string Name, Func<ComparisonRow, string> Cell)[] all =
        [
            ("", row => row.Label),
            ("constructed", row => row.Constructed),
            ("computed", row => row.Computed),
            ("difference", row => row.Difference),
            ("known", row => row.Verdict),
            ("in time", row => row.Time),
            ("by hand, 95 %", row => row.Hand95),
            ("allowed", row => row.Within.Length == 0 ? "" : row.IsInTolerance ? row.Within : $"{row.Within}: OUT OF TOLERANCE"),
        ];
        return [.. all.Where(column => rows.Any(row => column.Cell(row).Length > 0))];
    }

    private static void Comparisons(StringBuilder text, ImmutableArray<ComparisonRow> rows)
    {
        if (rows.IsEmpty)
            return;
        Heading(text, "Constructed beside computed");
        ImmutableArray<(string Name, Func<ComparisonRow, string> Cell)> columns = ComparisonColumns(rows);
        text.Append(PlainTable.Render([[.. columns.Select(column => column.Name)], .. rows.Select(row => columns.Select(column => column.Cell(row)).ToArray())]));
    }

    private static void Claims(StringBuilder text, ImmutableArray<ClaimRow> rows)
    {
        if (rows.IsEmpty)
            return;
        Heading(text, "Claims");
        text.Append(PlainTable.Render([.. rows.Select(row => new[] { row.Says, row.Holds == false ? row.Verdict.ToUpperInvariant() : row.Verdict, row.By ?? "" })], hasNames: false));
    }

    private static void Paragraphs(StringBuilder text, string heading, ImmutableArray<string> paragraphs)
    {
        if (paragraphs.IsEmpty)
            return;
        Heading(text, heading);
        foreach (string paragraph in paragraphs)
            Wrapped(text, paragraph);
    }

    private static void Lines(StringBuilder text, string heading, ImmutableArray<string> lines)
    {
        if (lines.IsEmpty)
            return;
        Heading(text, heading);
        foreach (string line in lines)
            text.Append(Margin).Append(line).Append('\n');
    }

    private static void Heading(StringBuilder text, string heading) => text.Append('\n').Append(heading).Append('\n');

    private static void Wrapped(StringBuilder text, string paragraph)
    {
        int column = 0;
        foreach (string word in paragraph.Split(' ', StringSplitOptions.RemoveEmptyEntries))
        {
            if (column > 0 && column + 1 + PlainTable.Width(word) > Measure)
            {
                text.Append('\n');
                column = 0;
            }

            text.Append(column == 0 ? Margin : " ").Append(word);
            column += PlainTable.Width(word) + 1;
        }

        text.Append('\n');
    }
}
