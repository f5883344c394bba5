using System.Collections.Immutable;
using System.Globalization;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>Composes step plates: plans them, gives every name one place for all of them, and then draws each.</summary>
internal sealed class StepPlateComposer
{
    private readonly Layout layout;
    private readonly CancellationToken cancellation;
    private readonly Tracing tracing;
    private readonly PlateFormat format;
    private readonly View view;
    private readonly ImmutableArray<string> cautions;
    private readonly PlateHeading heading;
    private readonly PlatePlanner planner;
    private readonly TitleBlock titleBlock;
    private readonly ThumbnailRow thumbnails;

    public StepPlateComposer(Layout layout, StepPlateOptions options, CancellationToken cancellation)
    {
        this.layout = layout;
        this.cancellation = cancellation;
        tracing = Tracing.Of(layout, cancellation);
        cautions = Cautions.For(layout);
        ImmutableArray<int> stages = [.. layout.Acts.Select(act => act.Stage).Distinct()];
        (format, PlateScale scale, view) = StockView.Of(tracing, options.Paper, stages.Length > 1);
        heading = new PlateHeading(layout, format);
        planner = new PlatePlanner(layout, options.Cautions, format, heading, cancellation);
        titleBlock = new TitleBlock(layout, format, scale, options.ScriptName);
        thumbnails = new ThumbnailRow(layout, tracing, format, stages);
    }

    public ImmutableArray<Page> Compose(IProgress<double>? progress)
    {
        List<PlatePlan> plans = planner.Plan();
        StepDrawing drawing = new(layout, tracing, view, plans, cancellation);
        ImmutableArray<Page>.Builder pages = ImmutableArray.CreateBuilder<Page>(plans.Count);
        foreach (PlatePlan plan in plans)
        {
            cancellation.ThrowIfCancellationRequested();
            Canvas canvas = new();
            drawing.Draw(canvas, plan);
            heading.Draw(canvas, plan.Stage);
            Sentences(canvas, plan, heading.Bottom(plan.Stage));
            if (plan.Index == 0)
            {
                SignKey.Draw(canvas, format);
            }

            thumbnails.Draw(canvas, plan.Stage);
            titleBlock.Draw(canvas, plan, plans.Count);
            Foot(canvas);
            pages.Add(canvas.Finish(format.Width, format.Height, $"{layout.Title}, plate {plan.Index + 1}"));
            progress?.Report((double)pages.Count / plans.Count);
        }

        return pages.MoveToImmutable();
    }

    private void Sentences(Canvas canvas, PlatePlan plan, double top)
    {
        double y = top;
        foreach (SentenceBlock block in plan.Blocks)
        {
            bool isFirstLine = true;
            foreach (SentenceLine line in block.Lines)
            {
                double baseLine = y + (line.Size * 0.8);
                if (isFirstLine && block.Number is { } number)
                {
                    Spot numberAt = new(format.SentenceLeft - PlateHeading.NumberGap, baseLine);
                    canvas.Write(Role.Text, number.ToString(CultureInfo.InvariantCulture), numberAt, Typeface.Strong, line.Size, Anchor.Right, Ink.Accent);
                }

                isFirstLine = false;
                canvas.Write(Role.Text, line.Text, new(format.SentenceLeft, baseLine), Typeface.Text, line.Size);
                if (line.Tail is not null)
                {
                    double at = line.Text.Length == 0 ? 0 : Typesetting.Width(line.Text + "  ", Typeface.Text, line.Size);
                    canvas.Write(Role.Text, line.Tail, new(format.SentenceLeft + at, baseLine), Typeface.Text, PlateFormat.NoteSize, ink: Ink.Grey);
                }

                y += line.Leading;
            }

            y += block.Height - block.Lines.Sum(line => line.Leading);
        }
    }

    private void Foot(Canvas canvas)
    {
        double width = format.DrawingArea(false).Width;
        List<string> lines = Typesetting.Break(string.Join("  ", cautions), Typeface.Text, PlateFormat.NoteSize, width);
        double y = format.Height - PlateFormat.Margin - ((lines.Count - 1) * PlateFormat.NoteLeading);
        foreach (string line in lines)
        {
            canvas.Write(Role.Text, line, new(PlateFormat.Margin, y), Typeface.Text, PlateFormat.NoteSize);
            y += PlateFormat.NoteLeading;
        }
    }
}
