using System.Globalization;
using System.Text;

namespace RuleAndCompass.Language.Diagnostics;

/// <summary>Writes findings as people read them: what and where, the line of source with the place underlined, and what to try.</summary>
/// <remarks>
/// The indent of the line is left out; tabs become blanks, signs that can't be shown �, and signs of double width are underlined twice as far. A long line is
/// cut to the part around the place. A span over several lines is underlined to the end of its first.
/// </remarks>
public sealed class DiagnosticRenderer
{
    private const string Margin = "    ";
    private const int WidestLine = 110;
    private const int BeforePlace = 40;
    private const int FarthestLook = 1_000;

    private readonly string _name;
    private readonly string? _text;
    private readonly LineMap? _lines;

    /// <summary>Renders findings in one text.</summary>
    /// <param name="name">What to call it, usually the file's name; a finding that names a file of its own keeps that.</param>
    /// <param name="text">The text that the findings' spans refer to; null where it is not at hand, and then neither line nor place is shown.</param>
    public DiagnosticRenderer(string name, string? text)
    {
        ArgumentNullException.ThrowIfNull(name);
        (_name, _text) = (name, text);
        _lines = text is null ? null : new LineMap(text);
    }

    /// <summary>One finding, over several lines, each ended by a line feed.</summary>
    public string Render(Diagnostic finding)
    {
        ArgumentNullException.ThrowIfNull(finding);
        StringBuilder report = new(finding.File ?? _name);
        if (_lines is not null)
            report.Append(CultureInfo.InvariantCulture, $", line {_lines.Find(finding.Span.Start).Line}");
        report.Append(finding.Severity == Severity.Warning ? ": warning: " : ": ");
        report.Append(finding.Message).Append("  (").Append(finding.Code).Append(")\n");
        bool shows = _text is not null && AppendPlace(report, finding.Span);
        if (finding.Hint is { } hint)
            report.Append(shows ? "" : "\n").Append(Margin).Append("Try: ").Append(hint).Append(hint[^1] is '.' or '?' or '!' ? "\n" : ".\n");
        return report.ToString();
    }

    /// <summary>All findings, an empty line between two.</summary>
    public string Render(IEnumerable<Diagnostic> findings) => string.Join("\n", findings.Select(Render));

    private bool AppendPlace(StringBuilder report, SourceSpan span)
    {
        SourceSpan whole = Around(_lines!.LineSpan(_lines.Find(span.Start).Line), span.Start); // there are lines where there is text
        string line = _text!.Substring(whole.Start, whole.Length);
        if (string.IsNullOrWhiteSpace(line))
            return false;
        int from = Math.Clamp(span.Start - whole.Start, 0, line.Length);
        int to = Math.Clamp(span.End - whole.Start, from, line.Length);
        List<Cell> cells = Cells(line);
        int first = cells.FindIndex(cell => cell.End > from);
        first = first < 0 ? cells.Count : first;
        int last = cells.FindIndex(first, cell => cell.Start >= to);
        last = last < 0 ? cells.Count : last;

        int begin = cells.FindIndex(cell => !string.IsNullOrWhiteSpace(cell.Shown));
        begin = Math.Min(begin, first);
        bool cutBefore = Width(cells, begin, cells.Count) > WidestLine && Width(cells, begin, first) > BeforePlace;
        if (cutBefore)
        {
            for (int before = Width(cells, begin, first); before > BeforePlace; begin++)
                before -= cells[begin].Width;
        }

        int end = begin;
        int width = cutBefore ? 1 : 0;
        while (end < cells.Count && width + cells[end].Width <= WidestLine)
            width += cells[end++].Width;
        bool cutAfter = end < cells.Count;
        last = Math.Min(last, end);

        report.Append('\n').Append(Margin).Append(cutBefore ? "…" : "");
        for (int i = begin; i < end; i++)
            report.Append(cells[i].Shown);
        if (cutAfter)
            report.Append('…');
        else
            TrimEnd(report);
        report.Append('\n').Append(Margin).Append(' ', (cutBefore ? 1 : 0) + Width(cells, begin, first));
        report.Append('‾', Math.Max(1, Width(cells, first, last))).Append('\n');
        return true;
    }

    // Of a line far longer than is shown, the part near a place; never from the middle of a surrogate pair.
    private SourceSpan Around(SourceSpan line, int place)
    {
        if (line.Length <= 2 * FarthestLook)
            return line;
        int start = Math.Max(line.Start, place - FarthestLook);
        int end = Math.Min(line.End, place + FarthestLook);
        if (start > line.Start && char.IsLowSurrogate(_text![start]))
            start++;
        if (end < line.End && char.IsLowSurrogate(_text![end]))
            end++;
        return new SourceSpan(start, end - start);
    }

    private static void TrimEnd(StringBuilder report)
    {
        while (report[^1] == ' ')
            report.Length--;
    }

    private static int Width(List<Cell> cells, int start, int end)
    {
        int width = 0;
        for (int i = start; i < end; i++)
            width += cells[i].Width;
        return width;
    }

    // What the signs of a line look like, each with its place in the line.
    private static List<Cell> Cells(string line)
    {
        List<Cell> cells = [];
        int column = 0;
        for (int at = 0; at < line.Length;)
        {
            Rune.DecodeFromUtf16(line.AsSpan(at), out Rune rune, out int length);
            (string shown, int width) = Shown(rune, column);
            cells.Add(new Cell(at, at + length, shown, width));
            column += width;
            at += length;
        }

        return cells;
    }

    private static (string Shown, int Width) Shown(Rune rune, int column) => Rune.GetUnicodeCategory(rune) switch
    {
        _ when rune.Value == '\t' => (new string(' ', 4 - (column % 4)), 4 - (column % 4)),
        UnicodeCategory.NonSpacingMark or UnicodeCategory.EnclosingMark => (rune.ToString(), 0),
        UnicodeCategory.Control or UnicodeCategory.Format or UnicodeCategory.PrivateUse or UnicodeCategory.OtherNotAssigned
            or UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator => ("�", 1),
        UnicodeCategory.SpaceSeparator => (" ", 1),
        _ => (rune.ToString(), IsWide(rune.Value) ? 2 : 1),
    };

    // The blocks that Unicode Standard Annex 11 gives wide or fullwidth in the main: East Asian scripts and pictures (ranges from memory).
    private static bool IsWide(int value) => value is (>= 0x1100 and <= 0x115F) or (>= 0x2E80 and <= 0x303E) or (>= 0x3041 and <= 0xA4CF) or (>= 0xAC00 and <= 0xD7A3)
        or (>= 0xF900 and <= 0xFAFF) or (>= 0xFE30 and <= 0xFE6F) or (>= 0xFF01 and <= 0xFF60) or (>= 0xFFE0 and <= 0xFFE6) or (>= 0x1F300 and <= 0x1F6FF) or (>= 0x1F900 and <= 0x1FAFF) or (>= 0x20000 and <= 0x3FFFD);

    private readonly record struct Cell(int Start, int End, string Shown, int Width);
}
