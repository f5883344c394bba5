using System.Globalization;
using System.Text;

namespace RuleAndCompass.Comparing;

/// <summary>Columns lined up by blanks; one in which nothing stands is left out.</summary>
internal static class PlainTable
{
    private const string Margin = "  ";
    private const string Gap = "   ";

    /// <summary>Sets rows out, each ended by a line feed.</summary>
    /// <param name="rows">All of one length; where <paramref name="hasNames"/>, the first names the columns.</param>
    public static string Render(IReadOnlyList<string[]> rows, bool hasNames = true)
    {
        int first = hasNames ? 1 : 0;
        if (rows.Count <= first)
            return "";
        int[] columns = [.. Enumerable.Range(0, rows[0].Length).Where(column => rows.Skip(first).Any(row => row[column].Length > 0))];
        int[] widths = [.. columns.Select(column => rows.Max(row => Width(row[column])))];
        StringBuilder text = new();
        foreach (string[] row in rows)
        {
            StringBuilder line = new(Margin);
            for (int index = 0; index < columns.Length; index++)
                line.Append(index == 0 ? "" : Gap).Append(row[columns[index]]).Append(' ', widths[index] - Width(row[columns[index]]));
            text.Append(line.ToString().TrimEnd()).Append('\n');
        }

        return text.ToString();
    }

    /// <summary>How many signs wide a text is; one with a mark set over it counts once.</summary>
    public static int Width(string text) => StringInfo.ParseCombiningCharacters(text).Length;
}
