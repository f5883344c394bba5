using System.Collections.Immutable;
using System.Globalization;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>One plate: a stage, or as many of its acts as the column holds.</summary>
/// <param name="Index">From 0.</param>
/// <param name="Stage">Index into the layout's stages.</param>
/// <param name="First">Index of its first act.</param>
/// <param name="End">Index after its last act.</param>
internal sealed record PlatePlan(int Index, int Stage, int First, int End, ImmutableArray<SentenceBlock> Blocks);

/// <summary>Composes step plates: plans them, gives every name one place for all of them, and then draws each.</summary>
internal sealed class StepPlateComposer
{
    private const double SmallestFactorOnA4 = 0.1;
    private const double OverEdge = 3;
    private const int MostMoved = 5;
    private const double NumberGap = 2.2;
    private const double PastInThumbnail = 0.8;
    private const double RoomRoundUsed = 0.06;

    private readonly Layout layout;
    private readonly StepPlateOptions options;
    private readonly CancellationToken cancellation;
    private readonly Tracing tracing;
    private readonly PlateFormat format;
    private readonly PlateScale scale;
    private readonly View view;
    private readonly ImmutableArray<int> stages;
    private readonly ImmutableArray<string> cautions;
    private readonly Dictionary<Point, int> actOfPoint = new(ReferenceEqualityComparer.Instance);

    public StepPlateComposer(Layout layout, StepPlateOptions options, CancellationToken cancellation)
    {
        this.layout = layout;
        this.options = options;
        this.cancellation = cancellation;
        tracing = Tracing.Of(layout, cancellation);
        cautions = Cautions.For(layout);
        stages = [.. layout.Acts.Select(act => act.Stage).Distinct()];
        foreach (Trace trace in tracing.Traces)
        {
            if (trace is PointTrace point)
            {
                actOfPoint.TryAdd(point.Point.Point, trace.Act);
            }
        }

        Box needed = NeededStock(tracing.Sheet);
        Box whole = needed;
        Box used = UsedStock(needed);
        format = options.Paper == PlatePaper.A3 ? PlateFormat.A3 : PlateFormat.A4;
        if (options.Paper is null && ScaleOn(format, needed).Factor < SmallestFactorOnA4)
        {
            format = PlateFormat.A3;
        }

        // The whole sheet, unless the part with work on it can be shown larger; never larger than life for that.
        scale = ScaleOn(format, needed);
        PlateScale larger = ScaleOn(format, used);
        larger = larger.Factor > 1 ? new PlateScale(1, 1) : larger;
        if (larger.Factor > scale.Factor)
        {
            scale = larger;
            needed = used;
        }

        Box area = format.DrawingArea(stages.Length > 1);

        // The used part in the middle, but as much of the sheet round it as there is room for.
        double centreX = whole.Width * scale.Factor <= area.Width ? whole.Middle.X : needed.Middle.X;
        double centreY = whole.Height * scale.Factor <= area.Height ? whole.Middle.Y : needed.Middle.Y;
        Spot middle = new(area.Middle.X - (centreX * scale.Factor), area.Middle.Y - (centreY * scale.Factor));
        view = new(middle, scale.Factor, area);
        Box shown = view.OnPage(whole).Grown(OverEdge);
        view = view with
        {
            Window = new(Math.Max(area.Left, shown.Left), Math.Max(area.Top, shown.Top), Math.Min(area.Right, shown.Right), Math.Min(area.Bottom, shown.Bottom)),
        };
    }

    public ImmutableArray<Page> Compose(IProgress<double>? progress)
    {
        List<PlatePlan> plans = Plan();
        StepDrawing drawing = new(layout, tracing, view, plans, actOfPoint, cancellation);
        ImmutableArray<Page>.Builder pages = ImmutableArray.CreateBuilder<Page>(plans.Count);
        foreach (PlatePlan plan in plans)
        {
            cancellation.ThrowIfCancellationRequested();
            Canvas canvas = new();
            drawing.Draw(canvas, plan);
            double top = Header(canvas, plan);
            Sentences(canvas, plan, top);
            if (plan.Index == 0)
            {
                SignKey.Draw(canvas, format);
            }

            Thumbnails(canvas, plan);
            TitleBlock(canvas, plan, plans.Count);
            Foot(canvas);
            pages.Add(canvas.Finish(format.Width, format.Height, $"{layout.Title}, plate {plan.Index + 1}"));
            progress?.Report((double)pages.Count / plans.Count);
        }

        return pages.MoveToImmutable();
    }

    private PlateScale ScaleOn(PlateFormat paper, Box needed)
    {
        Box area = paper.DrawingArea(stages.Length > 1);
        return PlateScale.Fitting(needed.Width, needed.Height, area.Width, area.Height);
    }

    // The sheet and every point, but not beyond the board; without a board not far beyond the sheet, so that a stray point does not shrink all the rest.
    private Box NeededStock(Box needed)
    {
        Box near = needed.Grown(Math.Max(needed.Width, needed.Height) / 4);
        Box limit = tracing.Board ?? near;
        foreach (Trace trace in tracing.Traces)
        {
            // A generated point far off is only aimed at.
            if (trace is PointTrace point && (!point.Point.IsAuxiliary || near.Holds(point.At)))
            {
                needed = needed.With(new Spot(Math.Clamp(point.At.X, limit.Left, limit.Right), Math.Clamp(point.At.Y, limit.Top, limit.Bottom)));
            }
        }

        return needed;
    }

    // The part of the needed stock that has work on it, with some room.
    private Box UsedStock(Box needed)
    {
        Box? used = null;
        foreach (Trace trace in tracing.Traces)
        {
            foreach (Spot spot in trace is PointTrace point ? [point.At] : ExtremesOf(trace))
            {
                Spot inside = new(Math.Clamp(spot.X, needed.Left, needed.Right), Math.Clamp(spot.Y, needed.Top, needed.Bottom));
                used = used?.With(inside) ?? new Box(inside.X, inside.Y, inside.X, inside.Y);
            }
        }

        if (used is not { } box)
        {
            return needed;
        }

        box = box.Grown(RoomRoundUsed * Math.Max(box.Width, box.Height));
        return box.Width <= 0 ? needed : new(Math.Max(box.Left, needed.Left), Math.Max(box.Top, needed.Top), Math.Min(box.Right, needed.Right), Math.Min(box.Bottom, needed.Bottom));
    }

    private static IEnumerable<Spot> ExtremesOf(Trace trace)
    {
        switch (trace)
        {
            case LineTrace line:
                yield return line.From;
                yield return line.To;
                break;
            case CircleTrace circle:
                foreach (ArcSpan arc in circle.Arcs)
                {
                    int steps = 1 + (int)(arc.Sweep / 0.2);
                    for (int i = 0; i <= steps; i++)
                    {
                        double angle = arc.Start + (arc.Sweep * i / steps);
                        yield return circle.Centre.Moved(circle.Radius * Math.Cos(angle), -circle.Radius * Math.Sin(angle));
                    }
                }

                break;
        }
    }

    private List<PlatePlan> Plan()
    {
        List<PlatePlan> plans = [];
        List<SentenceBlock> blocks = [];
        double room = 0;
        int first = 0, stage = 0;

        foreach (string note in Preface())
        {
            Take(SentenceBlock.OfNote(note, format), 0);
        }

        for (int i = 0; i < layout.Acts.Length; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            Act act = layout.Acts[i];
            if (act.Stage != stage)
            {
                if (blocks.Count > 0)
                {
                    Finish(i);
                }

                stage = act.Stage;
            }

            Take(SentenceBlock.OfAct(act, options.Cautions.GetValueOrDefault(act.Number, []), format), i);
        }

        if (blocks.Count > 0 || plans.Count == 0)
        {
            Finish(layout.Acts.Length);
        }

        return plans;

        void Take(SentenceBlock block, int at)
        {
            if (blocks.Count == 0)
            {
                room = Room(plans.Count == 0, stage);
            }
            else if (block.Height > room)
            {
                // The acts of one sentence stay together where that moves few of them.
                int moved = 0;
                while (moved < MostMoved && moved < blocks.Count - 1 && at - moved - 1 >= first && layout.Acts[at - moved - 1].Want == layout.Acts[at].Want)
                {
                    moved++;
                }

                if (moved == MostMoved || moved >= at - first)
                {
                    moved = 0;
                }

                List<SentenceBlock> taken = blocks.GetRange(blocks.Count - moved, moved);
                blocks.RemoveRange(blocks.Count - moved, moved);
                Finish(at - moved);
                room = Room(false, stage) - taken.Sum(earlier => earlier.Height);
                blocks.AddRange(taken);
            }

            room -= block.Height;
            blocks.Add(block);
        }

        void Finish(int end)
        {
            plans.Add(new(plans.Count, stage, first, end, [.. blocks]));
            blocks.Clear();
            first = end;
        }
    }

    private IEnumerable<string> Preface()
    {
        if (layout.Acts.IsEmpty)
        {
            yield return "Nothing is to be done: the script asks for no act.";
        }

        if (!layout.Givens.IsEmpty)
        {
            yield return "Given: " + string.Join("; ", layout.Givens.Select(given => $"{given.Name} = {given.Text}")) + ".";
        }

        foreach (string note in layout.Notes)
        {
            yield return note;
        }
    }

    private double Room(bool isFirst, int stage) =>
        format.TitleBlockTop - PlateFormat.Leading - (isFirst ? PlateFormat.KeyHeight : 0) - HeaderBottom(TitleLines(stage).Count);

    private static double HeaderBottom(int titleLines) => PlateFormat.Margin + 4 + (titleLines * PlateFormat.TitleLeading) + 8;

    // The stage's number hangs left of its title, as an act's number does; a long one pushes the title in.
    private double TitleLeft(int stage) => Math.Max(format.SentenceLeft, format.ColumnLeft + Typesetting.Width(StageNumber(stage), Typeface.Strong, PlateFormat.TitleSize) + NumberGap);

    private string StageNumber(int stage) => layout.Stages.IsDefaultOrEmpty ? "" : Typesetting.Fit(layout.Stages[stage].Number, Typeface.Strong, PlateFormat.TitleSize, PlateFormat.NumberWidth * 3);

    private List<string> TitleLines(int stage)
    {
        double measure = format.ColumnRight - TitleLeft(stage);
        List<string> lines = layout.Stages.IsDefaultOrEmpty
            ? Typesetting.Break(layout.Title, Typeface.Strong, PlateFormat.TitleSize, measure)
            : Typesetting.Break(layout.Stages[stage].Title, Typeface.Strong, PlateFormat.TitleSize, measure);
        if (lines.Count > 3)
        {
            lines = [lines[0], lines[1], Typesetting.Fit(string.Join(' ', lines.Skip(2)), Typeface.Strong, PlateFormat.TitleSize, measure)];
        }

        return lines;
    }

    private double Header(Canvas canvas, PlatePlan plan)
    {
        double y = PlateFormat.Margin + 2.4;
        canvas.Write(Role.Text, Typesetting.Fit(layout.Title, Typeface.Text, PlateFormat.NoteSize, format.Measure), new(format.SentenceLeft, y), Typeface.Text, PlateFormat.NoteSize, ink: Ink.Grey);
        List<string> lines = TitleLines(plan.Stage);
        double left = TitleLeft(plan.Stage);
        y = PlateFormat.Margin + 4;
        foreach (string line in lines)
        {
            y += PlateFormat.TitleLeading;
            canvas.Write(Role.Text, line, new(left, y - 1), Typeface.Strong, PlateFormat.TitleSize);
        }

        canvas.Write(
            Role.Text, StageNumber(plan.Stage), new(left - NumberGap, PlateFormat.Margin + 4 + PlateFormat.TitleLeading - 1), Typeface.Strong, PlateFormat.TitleSize, Anchor.Right);

        double rule = y + 2;
        canvas.Line(Role.Frame, new(format.ColumnLeft, rule), new(format.ColumnRight, rule), Pens.Rule);
        return HeaderBottom(lines.Count);
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
                    canvas.Write(
                        Role.Text, number.ToString(CultureInfo.InvariantCulture), new(format.SentenceLeft - NumberGap, baseLine), Typeface.Strong, line.Size, Anchor.Right, Ink.Accent);
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

    private void TitleBlock(Canvas canvas, PlatePlan plan, int count)
    {
        double left = format.ColumnLeft, right = format.ColumnRight, top = format.TitleBlockTop, middle = (left + right) / 2;
        canvas.Line(Role.Frame, new(left, top), new(right, top), Pens.Present);
        double y = top + 5;
        string plate = string.Create(CultureInfo.InvariantCulture, $"Plate {plan.Index + 1} of {count}");
        double plateWidth = Typesetting.Width(plate, Typeface.Strong, 3.1);
        canvas.Write(Role.Text, Typesetting.Fit(layout.Title, Typeface.Strong, 3.1, right - left - plateWidth - 4), new(left, y), Typeface.Strong, 3.1);
        canvas.Write(Role.Text, plate, new(right, y), Typeface.Strong, 3.1, Anchor.Right);
        y += 4;
        string stage = layout.Stages.IsDefaultOrEmpty ? "" : $"Stage {layout.Stages[plan.Stage].Number}: {layout.Stages[plan.Stage].Title}";
        canvas.Write(Role.Text, Typesetting.Fit(stage, Typeface.Text, PlateFormat.NoteSize, right - left), new(left, y), Typeface.Text, PlateFormat.NoteSize);
        y += 4;
        Cell("Scale", scale.ToString(), left);
        Cell("Hand", layout.Hand.Name, middle);
        y += 4;
        Cell("Sheet", SheetText(layout.Sheet), left);
        if (options.ScriptName is not null)
        {
            Cell("From", options.ScriptName, middle);
        }

        y = format.Height - PlateFormat.Margin - 3;
        Signs.CheckBar(canvas, new(left, y), 50, true);
        canvas.Write(Role.Text, "50 mm if printed at 100 %", new(left + 54, y + 0.8), Typeface.Text, PlateFormat.NoteSize);

        void Cell(string label, string text, double x)
        {
            canvas.Write(Role.Text, label, new(x, y), Typeface.Text, PlateFormat.NoteSize, ink: Ink.Grey);
            canvas.Write(Role.Text, Typesetting.Fit(text, Typeface.Text, PlateFormat.NoteSize, middle - left - 12), new(x + 10, y), Typeface.Text, PlateFormat.NoteSize);
        }
    }

    internal static string SheetText(Sheet sheet)
    {
        string size = string.Create(CultureInfo.InvariantCulture, $"{sheet.Width.ToDouble():0.##} × {sheet.Height.ToDouble():0.##} mm");
        return sheet.Name is null ? size : $"{sheet.Name}, {size}";
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

    private void Thumbnails(Canvas canvas, PlatePlan plan)
    {
        if (stages.Length < 2)
        {
            return;
        }

        const double gap = 4, pictureHeight = 16, labelHeight = 4;
        Box row = format.DrawingArea(true);
        double aspect = tracing.Sheet.Width / tracing.Sheet.Height;
        double width = Math.Clamp(pictureHeight * aspect, 8, 32);
        int fit = Math.Min(stages.Length, (int)((row.Width + gap) / (width + gap)));
        int present = stages.IndexOf(plan.Stage);
        int first = Math.Clamp(present - (fit / 2), 0, stages.Length - fit);
        double top = row.Bottom + 3;
        for (int i = 0; i < fit; i++)
        {
            int stage = stages[first + i];
            bool isPresent = stage == plan.Stage;
            Box box = Box.Of(row.Left + (i * (width + gap)), top, width, pictureHeight);
            double factor = Math.Min(box.Width / tracing.Sheet.Width, box.Height / tracing.Sheet.Height) * 0.94;
            View small = new(box.Middle, factor, box);
            bool isBare = !tracing.Traces.Any(trace => trace is not PointTrace && layout.Acts[trace.Act - 1].Stage == stage);
            foreach (Trace trace in tracing.Traces)
            {
                if (layout.Acts[trace.Act - 1].Stage == stage)
                {
                    if (isBare && trace is PointTrace point && box.Holds(small.OnPage(point.At)))
                    {
                        canvas.Fill(Role.Thumbnail, Outline.Circle(small.OnPage(point.At), 0.22), Ink.Black);
                    }

                    foreach (Outline outline in small.Strokes(trace, PastInThumbnail))
                    {
                        canvas.Draw(Role.Thumbnail, outline, Pens.Thin);
                    }
                }
            }

            canvas.Draw(Role.Thumbnail, Outline.Around(box), isPresent ? Pens.Present : Pens.Earlier);
            string label = layout.Stages[stage].Number;
            canvas.Write(
                Role.Text, label, new(box.Middle.X, box.Bottom + labelHeight - 0.9), isPresent ? Typeface.Strong : Typeface.Text, PlateFormat.NoteSize, Anchor.Middle, isPresent ? Ink.Black : Ink.Grey);
            if (isPresent)
            {
                canvas.Fill(Role.Thumbnail, Outline.Around(Box.Of(box.Left, box.Top - 1.4, box.Width, 1)), Ink.Black);
            }
        }
    }
}
