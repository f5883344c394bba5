using System.Globalization;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>The block at the foot of the column: title, stage, plate, scale, sheet, hand, script and the check bar.</summary>
internal sealed class TitleBlock(Layout layout, PlateFormat format, PlateScale scale, string? scriptName)
{
    private const double TitleSize = 3.1;
    private const double BarLength = 50;

    public void Draw(Canvas canvas, PlatePlan plan, int count)
    {
        double left = format.ColumnLeft, right = format.ColumnRight, top = format.TitleBlockTop, middle = (left + right) / 2;
        canvas.Line(Role.Frame, new(left, top), new(right, top), Pens.Present);
        double y = top + 5;
        string plate = string.Create(CultureInfo.InvariantCulture, $"Plate {plan.Index + 1} of {count}");
        double plateWidth = Typesetting.Width(plate, Typeface.Strong, TitleSize);
        string title = Typesetting.Fit(layout.Title, Typeface.Strong, TitleSize, right - left - plateWidth - 4);
        canvas.Write(Role.Text, title, new(left, y), Typeface.Strong, TitleSize);
        canvas.Write(Role.Text, plate, new(right, y), Typeface.Strong, TitleSize, Anchor.Right);
        y += 4;
        string stage = layout.Stages.IsDefaultOrEmpty ? "" : $"Stage {layout.Stages[plan.Stage].Number}: {layout.Stages[plan.Stage].Title}";
        canvas.Write(Role.Text, Typesetting.Fit(stage, Typeface.Text, PlateFormat.NoteSize, right - left), new(left, y), Typeface.Text, PlateFormat.NoteSize);
        y += 4;
        Cell("Scale", scale.ToString(), left);
        Cell("Hand", layout.Hand.Name, middle);
        y += 4;
        Cell("Sheet", SheetText(layout.Sheet), left);
        if (scriptName is not null)
        {
            Cell("From", scriptName, middle);
        }

        y = format.Height - PlateFormat.Margin - 3;
        Signs.CheckBar(canvas, new(left, y), BarLength, true);
        canvas.Write(Role.Text, "50 mm if printed at 100 %", new(left + 54, y + 0.8), Typeface.Text, PlateFormat.NoteSize);

        void Cell(string label, string text, double x)
        {
            canvas.Write(Role.Text, label, new(x, y), Typeface.Text, PlateFormat.NoteSize, ink: Ink.Grey);
            string shown = Typesetting.Fit(text, Typeface.Text, PlateFormat.NoteSize, middle - left - 12);
            canvas.Write(Role.Text, shown, new(x + 10, y), Typeface.Text, PlateFormat.NoteSize);
        }
    }

    /// <summary>The sheet's name, where it has one, and its size.</summary>
    public static string SheetText(Sheet sheet)
    {
        string size = string.Create(CultureInfo.InvariantCulture, $"{sheet.Width.ToDouble():0.##} × {sheet.Height.ToDouble():0.##} mm");
        return sheet.Name is null ? size : $"{sheet.Name}, {size}";
    }
}
