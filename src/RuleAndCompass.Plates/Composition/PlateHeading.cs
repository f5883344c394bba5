using RuleAndCompass.Making;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>The head of the column: what is made, and the stage.</summary>
internal sealed class PlateHeading(Layout layout, PlateFormat format)
{
    /// <summary>Between a number and the text that it hangs left of.</summary>
    public const double NumberGap = 2.2;

    private const double FirstLine = PlateFormat.Margin + 4;
    private const int MostLines = 3;

    /// <summary>Where the sentences begin under a stage's heading.</summary>
    public double Bottom(int stage) => FirstLine + (TitleLines(stage).Count * PlateFormat.TitleLeading) + 8;

    public void Draw(Canvas canvas, int stage)
    {
        string title = Typesetting.Fit(layout.Title, Typeface.Text, PlateFormat.NoteSize, format.Measure);
        canvas.Write(Role.Text, title, new(format.SentenceLeft, PlateFormat.Margin + 2.4), Typeface.Text, PlateFormat.NoteSize, ink: Ink.Grey);
        double left = TitleLeft(stage), y = FirstLine;
        Spot numberAt = new(left - NumberGap, FirstLine + PlateFormat.TitleLeading - 1);
        foreach (string line in TitleLines(stage))
        {
            y += PlateFormat.TitleLeading;
            canvas.Write(Role.Text, line, new(left, y - 1), Typeface.Strong, PlateFormat.TitleSize);
        }

        canvas.Write(Role.Text, StageNumber(stage), numberAt, Typeface.Strong, PlateFormat.TitleSize, Anchor.Right);
        canvas.Line(Role.Frame, new(format.ColumnLeft, y + 2), new(format.ColumnRight, y + 2), Pens.Rule);
    }

    // The stage's number hangs left of its title, as an act's number does; a long one pushes the title in.
    private double TitleLeft(int stage)
    {
        double number = Typesetting.Width(StageNumber(stage), Typeface.Strong, PlateFormat.TitleSize);
        return Math.Max(format.SentenceLeft, format.ColumnLeft + number + NumberGap);
    }

    private string StageNumber(int stage) => layout.Stages.IsDefaultOrEmpty
        ? ""
        : Typesetting.Fit(layout.Stages[stage].Number, Typeface.Strong, PlateFormat.TitleSize, PlateFormat.NumberWidth * 3);

    private List<string> TitleLines(int stage)
    {
        double measure = format.ColumnRight - TitleLeft(stage);
        string title = layout.Stages.IsDefaultOrEmpty ? layout.Title : layout.Stages[stage].Title;
        List<string> lines = Typesetting.Break(title, Typeface.Strong, PlateFormat.TitleSize, measure);
        if (lines.Count > MostLines)
        {
            string rest = string.Join(' ', lines.Skip(MostLines - 1));
            lines = [.. lines.Take(MostLines - 1), Typesetting.Fit(rest, Typeface.Strong, PlateFormat.TitleSize, measure)];
        }

        return lines;
    }
}
