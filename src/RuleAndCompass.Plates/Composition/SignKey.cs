using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>What the signs mean, on the first plate.</summary>
internal static class SignKey
{
    private const double RowHeight = 5.3;

    public static void Draw(Canvas canvas, PlateFormat format)
    {
        double left = format.ColumnLeft, middle = (format.ColumnLeft + format.ColumnRight) / 2;
        double top = format.TitleBlockTop - PlateFormat.KeyHeight;
        canvas.Line(Role.Frame, new(left, top), new(format.ColumnRight, top), Pens.Rule);
        double y = top + 5;
        Row(left, "prick here", at => Signs.Prick(canvas, at));
        Row(middle, "set the dividers so", at => Signs.Span(canvas, at.Moved(-4, 1.2), at.Moved(4, 1.2), 1, new Box(left, top, format.ColumnRight, format.TitleBlockTop)));
        y += RowHeight;
        Row(left, "seat the needle here", at => Signs.Needle(canvas, at.Moved(0, 2.4)));
        Row(middle, "lay the square here", at =>
        {
            Line(at.Moved(0, 1.6), Pens.Present);
            Signs.Corner(canvas, at.Moved(-1, 1.6), 1, 0, 0, -1);
        });
        y += RowHeight;
        Row(left, "lay the edge to these", at =>
        {
            Line(at, Pens.Present);
            Signs.Tick(canvas, at.Moved(-2.4, 0), 1, 0);
            Signs.Tick(canvas, at.Moved(2.4, 0), 1, 0);
        });
        Row(middle, "mark this angle", at => Signs.Protractor(canvas, at.Moved(-3, 1.8), 5, 0, 0.7));
        y += RowHeight;
        Row(left, "number of the act", at => canvas.Write(Role.Now, "12", at.Moved(0, 1), Typeface.Strong, PlateFormat.NumberSize, Anchor.Middle, Ink.Accent));
        Row(middle, "work of this plate", at => Line(at, Pens.Present));
        y += RowHeight;
        Row(left, "middle of the sheet", at => Signs.Middle(canvas, at));
        Row(middle, "take care", at => canvas.Write(Role.Text, "△", at.Moved(0, 1), Typeface.Text, PlateFormat.NameSize, Anchor.Middle));
        y += RowHeight;
        Row(left, "earlier work", at => Line(at, Pens.Earlier));
        Row(middle, "kept on the piece", at => Line(at, Pens.Standing(Making.Dash.Whole)));

        void Row(double x, string says, Action<Spot> draw)
        {
            draw(new(x + 5, y));
            canvas.Write(Role.Text, says, new(x + 12, y + 0.9), Typeface.Text, PlateFormat.NoteSize);
        }

        void Line(Spot at, Pen pen) => canvas.Line(Role.Frame, at.Moved(-4, 0), at.Moved(4, 0), pen);
    }
}
