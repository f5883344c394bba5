using System.Collections.Immutable;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>A row of small pictures of the stages, the present one marked; as many round it as there is room for.</summary>
internal sealed class ThumbnailRow(Layout layout, Tracing tracing, PlateFormat format, ImmutableArray<int> stages)
{
    private const double Gap = 4;
    private const double PictureHeight = 16;
    private const double LabelHeight = 4;
    private const double Past = 0.8;

    public void Draw(Canvas canvas, int presentStage)
    {
        if (stages.Length < 2)
        {
            return;
        }

        Box row = format.DrawingArea(true);
        double aspect = tracing.Sheet.Width / tracing.Sheet.Height;
        double width = Math.Clamp(PictureHeight * aspect, 8, 32);
        int fit = Math.Min(stages.Length, (int)((row.Width + Gap) / (width + Gap)));
        int present = stages.IndexOf(presentStage);
        int first = Math.Clamp(present - (fit / 2), 0, stages.Length - fit);
        double top = row.Bottom + 3;
        for (int i = 0; i < fit; i++)
        {
            int stage = stages[first + i];
            bool isPresent = stage == presentStage;
            Box box = Box.Of(row.Left + (i * (width + Gap)), top, width, PictureHeight);
            Picture(canvas, stage, box);
            canvas.Draw(Role.Thumbnail, Outline.Around(box), isPresent ? Pens.Present : Pens.Earlier);
            string label = layout.Stages[stage].Number;
            Spot labelAt = new(box.Middle.X, box.Bottom + LabelHeight - 0.9);
            (Typeface typeface, Ink ink) = isPresent ? (Typeface.Strong, Ink.Black) : (Typeface.Text, Ink.Grey);
            canvas.Write(Role.Text, label, labelAt, typeface, PlateFormat.NoteSize, Anchor.Middle, ink);
            if (isPresent)
            {
                canvas.Fill(Role.Thumbnail, Outline.Around(Box.Of(box.Left, box.Top - 1.4, box.Width, 1)), Ink.Black);
            }
        }
    }

    private void Picture(Canvas canvas, int stage, Box box)
    {
        double factor = Math.Min(box.Width / tracing.Sheet.Width, box.Height / tracing.Sheet.Height) * 0.94;
        View small = new(box.Middle, factor, box);
        List<Trace> traces = [.. tracing.Traces.Where(trace => layout.Acts[trace.Act - 1].Stage == stage)];

        // Points only where there is nothing else to tell the stage by.
        bool showsPoints = traces.All(trace => trace is PointTrace);
        foreach (Trace trace in traces)
        {
            if (showsPoints && trace is PointTrace point && box.Holds(small.OnPage(point.At)))
            {
                canvas.Fill(Role.Thumbnail, Outline.Circle(small.OnPage(point.At), 0.22), Ink.Black);
            }

            foreach (Outline outline in small.Strokes(trace, Past))
            {
                canvas.Draw(Role.Thumbnail, outline, Pens.Thin);
            }
        }
    }
}
