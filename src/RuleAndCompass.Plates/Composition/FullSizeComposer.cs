using System.Globalization;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Fonts;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>Composes the full-size plate.</summary>
internal sealed class FullSizeComposer
{
    private const double BarLength = 100;
    private const double Margin = 12;
    private const double StripHeight = 46;

    // Printers leave up to 5 mm of the edge blank; bars and words keep a little more.
    private const double KeepOffEdge = 8;

    // ISO 3098 heights of capitals.
    private const double TitleHeight = 3.5;
    private const double WordHeight = 2.5;
    private const double NameHeight = 1.8;

    private const double CrossReach = 2.6;
    private const double CrossClear = 0.7;
    private const double SpanRowHeight = 8;
    private const double NameGap = 1.4;

    // A name stands near its mark and on nothing, or not at all: what is pricked through must not be covered.
    private const int NearPlaces = 24;

    private static readonly double titleSize = Face.SizeForCapitals(TitleHeight);
    private static readonly double wordSize = Face.SizeForCapitals(WordHeight);
    private static readonly double nameSize = Face.SizeForCapitals(NameHeight);

    private readonly Layout layout;
    private readonly FullSizeOptions options;
    private readonly CancellationToken cancellation;
    private readonly Tracing tracing;
    private readonly bool showsConstruction;
    private readonly List<(double Length, string Says)> spans;

    public FullSizeComposer(Layout layout, FullSizeOptions options, CancellationToken cancellation)
    {
        this.layout = layout;
        this.options = options;
        this.cancellation = cancellation;
        tracing = Tracing.Of(layout, cancellation);
        showsConstruction = options.ShowConstruction || layout.Kept.IsEmpty;
        spans = [.. SpansToTake()];
    }

    public Page Compose()
    {
        Box sheet = tracing.Sheet;
        if (spans.Count == 0 && ComposeOn(Box.Of(0, 0, sheet.Width, sheet.Height), new Spot(sheet.Width / 2, sheet.Height / 2), isSheet: true) is { } page)
        {
            return page;
        }

        // Room beside the sheet for the bar that stands, below it for the one that lies, the words and the spans.
        double side = Margin + 16;
        double longest = spans.Count == 0 ? 0 : spans.Max(span => span.Length);
        double width = Math.Max(Math.Max(sheet.Width, longest) + Margin + side, BarLength + 110 + (2 * Margin));
        double height = Math.Max(sheet.Height, BarLength) + (2 * Margin) + StripHeight + (spans.Count * SpanRowHeight);
        return ComposeOn(Box.Of(0, 0, width, height), new Spot(Margin + (sheet.Width / 2), Margin + (sheet.Height / 2)), isSheet: false)
            ?? throw new InvalidOperationException("The strip beside the sheet has room for the bars.");
    }

    // Null where bars or words find no room.
    private Page? ComposeOn(Box pageBox, Spot middle, bool isSheet, bool leavesNamesOut = false)
    {
        View view = new(middle, 1, pageBox);
        LabelPlacement placement = new(pageBox);
        Canvas canvas = new();
        PlateSet always = PlateSet.AllFrom(0);
        if (!isSheet)
        {
            canvas.Draw(Role.Frame, Outline.Around(view.OnPage(tracing.Sheet)), Pens.Frame);
            placement.Block(Outline.Around(view.OnPage(tracing.Sheet)), always);
        }

        foreach ((Item item, Outline outline) in Work(view))
        {
            canvas.Add(item);
            placement.Block(outline, always);
        }

        foreach (Lettering lettering in layout.Letterings)
        {
            foreach (Words words in KeptShape.Letters(lettering, view))
            {
                canvas.Add(words);
                placement.Block(KeptShape.BoxOf(words), always);
            }
        }

        List<(Spot At, string Name, bool IsOwn)> pricks = Pricks(view);
        foreach ((Spot at, _, _) in pricks)
        {
            Cross(canvas, at);
            placement.Block(at.Moved(-CrossReach, 0), at.Moved(CrossReach, 0), always);
            placement.Block(at.Moved(0, -CrossReach), at.Moved(0, CrossReach), always);
        }

        // Bars and words first, since a name finds room more easily.
        bool hasRoom = isSheet
            ? InFreeRoom(canvas, placement, pageBox, leavesNamesOut)
            : BesideSheet(canvas, placement, pageBox, view.OnPage(tracing.Sheet), leavesNamesOut);
        if (!hasRoom)
        {
            return null;
        }

        foreach ((Spot at, string name, bool isOwn) in pricks)
        {
            cancellation.ThrowIfCancellationRequested();
            if (name.Length > 0)
            {
                string shown = Typesetting.Fit(name, Typeface.Text, nameSize, 60);
                (double width, double height) = Canvas.LabelSize(shown, Typeface.Text, nameSize);
                PlacedLabel label = placement.Place(LabelPlacement.Around(at, width, height, NameGap).Take(NearPlaces), always, placed => !placed.IsCrowded);
                if (!label.IsCrowded)
                {
                    canvas.Label(Role.Name, shown, label.Box, Typeface.Text, nameSize, Ink.Black);
                }
                else if (isOwn && !leavesNamesOut)
                {
                    // Once more, saying so.
                    return ComposeOn(pageBox, middle, isSheet, leavesNamesOut: true);
                }
            }
        }

        return canvas.Finish(pageBox.Width, pageBox.Height, $"{layout.Title}, full size");
    }

    private IEnumerable<(Item Item, Outline Outline)> Work(View view)
    {
        if (showsConstruction)
        {
            foreach (Trace trace in tracing.Traces)
            {
                cancellation.ThrowIfCancellationRequested();
                foreach (Outline outline in view.Strokes(trace, 3))
                {
                    yield return (new Stroke(Role.Earlier, outline, Pens.Earlier), outline);
                }
            }
        }

        foreach (Kept kept in layout.Kept)
        {
            cancellation.ThrowIfCancellationRequested();
            foreach (Outline outline in KeptShape.Outlines(kept, view))
            {
                yield return (new Stroke(Role.Kept, outline, Pens.Kept(kept.Weight, kept.Dash)), outline);
            }
        }
    }

    // What has to go through onto the stock: the ends and centres of what is kept, points to be drilled, and points that no scale can measure; all named
    // points where nothing is kept or construction is shown.
    private List<(Spot At, string Name, bool IsOwn)> Pricks(View view)
    {
        Dictionary<Point, string> names = new(ReferenceEqualityComparer.Instance);
        Dictionary<(long, long), int> places = [];
        List<(Spot At, string Name, bool IsOwn)> pricks = [];
        foreach (Trace trace in tracing.Traces)
        {
            if (trace is PointTrace point)
            {
                names.TryAdd(point.Point.Point, point.Point.Name);
                if (showsConstruction && !point.Point.IsAuxiliary)
                {
                    Add(point.Point.Point, "");
                }
            }
        }

        foreach (Act act in layout.Acts)
        {
            if (act is Locate { ByScale: false } locate)
            {
                Add(locate.Point.Point, "");
            }
        }

        foreach (Kept kept in layout.Kept)
        {
            string fallback = kept.Pieces.Length == 1 ? kept.Name : "";
            foreach (Piece piece in kept.Pieces)
            {
                switch (piece)
                {
                    case SegmentPiece segment:
                        Add(segment.From, fallback);
                        Add(segment.To, fallback);
                        break;
                    case ArcPiece arc:
                        Add(arc.From, fallback);
                        Add(arc.To, fallback);
                        if (kept.Mark is not null)
                        {
                            Add(arc.Centre, fallback);
                        }

                        break;
                    case CirclePiece circle:
                        Add(circle.Centre, fallback);
                        break;
                    case PointPiece drilled:
                        Add(drilled.At, fallback);
                        break;
                }
            }
        }

        return pricks;

        // Drawn once where several fall together. A point's own name comes before that of the piece which ends there, and that before none.
        void Add(Point point, string fallback)
        {
            Spot at = view.OnPage(Tracing.SpotOf(point));
            bool isOwn = names.TryGetValue(point, out string? own);
            string name = own ?? fallback;
            (long, long) place = ((long)Math.Round(at.X * 1e4), (long)Math.Round(at.Y * 1e4));
            if (places.TryGetValue(place, out int known))
            {
                if (!pricks[known].IsOwn && (isOwn || pricks[known].Name.Length == 0))
                {
                    pricks[known] = (at, name, isOwn);
                }
            }
            else if (view.Window.Holds(at))
            {
                places.Add(place, pricks.Count);
                pricks.Add((at, name, isOwn));
            }
        }
    }

    private IEnumerable<(double Length, string Says)> SpansToTake()
    {
        foreach (Act act in layout.Acts)
        {
            if (act is SetOpening { Opening: ScaleOpening { Setting: null } opening })
            {
                double length = opening.Wanted.ToDouble();
                yield return (length, string.Create(CultureInfo.InvariantCulture, $"act {act.Number}: {length:0.00} mm"));
            }
        }
    }

    private bool InFreeRoom(Canvas canvas, LabelPlacement placement, Box page, bool leavesNamesOut)
    {
        List<string> lines = WordLines(90, isSheet: true, leavesNamesOut);
        List<string> title = TitleLines(90);
        double wordsHeight = (title.Count * 5.5) + 2 + (lines.Count * 4);
        double wordsWidth = Math.Max(
            lines.Max(line => Typesetting.Width(line, Typeface.Text, wordSize)),
            title.Max(line => Typesetting.Width(line, Typeface.Strong, titleSize)));
        if (FreeRoom(placement, page, wordsWidth + 4, wordsHeight + 4) is not { } words)
        {
            return false;
        }

        Block(words);
        if (FreeRoom(placement, page, BarLength + 6, 13) is not { } across)
        {
            return false;
        }

        Block(across);
        if (FreeRoom(placement, page, 13, BarLength + 6) is not { } along)
        {
            return false;
        }

        Block(along);
        Write(canvas, title, lines, new Spot(words.Left + 2, words.Top + 2));
        Bar(canvas, new Spot(across.Left + 3, across.Top + 9), true);
        Bar(canvas, new Spot(along.Left + 9, along.Top + 3), false);
        return true;

        void Block(Box box) => placement.Block(box, PlateSet.AllFrom(0));
    }

    private bool BesideSheet(Canvas canvas, LabelPlacement placement, Box page, Box sheet, bool leavesNamesOut)
    {
        double top = Math.Max(sheet.Bottom, Margin + BarLength) + Margin;
        Bar(canvas, new Spot(page.Right - Margin, Margin), false);
        Bar(canvas, new Spot(Margin, top + 10), true);
        Write(canvas, TitleLines(100), WordLines(100, isSheet: false, leavesNamesOut), new Spot(Margin + BarLength + 10, top));
        placement.Block(new Box(0, sheet.Bottom + 1, page.Right, page.Bottom), PlateSet.AllFrom(0));
        double y = top + StripHeight - 2;
        foreach ((double length, string says) in spans)
        {
            canvas.Line(Role.Prick, new(Margin, y), new(Margin + length, y), Pens.Rule);
            Cross(canvas, new(Margin, y));
            Cross(canvas, new(Margin + length, y));
            canvas.Write(Role.Text, says, new(Margin + 4, y - 1), Typeface.Text, nameSize);
            y += SpanRowHeight;
        }

        return true;
    }

    private List<string> WordLines(double measure, bool isSheet, bool leavesNamesOut)
    {
        string size = TitleBlock.SheetText(layout.Sheet);
        List<string> words =
        [
            $"Full size, 1 : 1. Sheet {size}" + (isSheet ? "; the edge of this page is its edge." : "; its edge is drawn."),
            "Print at 100 %, not fitted to the page. Measure both bars before use: each is 100 mm.",
            .. Cautions.For(layout),
        ];
        if (leavesNamesOut)
        {
            words.Add("Names that found no room are left out; the step plates show them.");
        }

        if (options.ScriptName is not null)
        {
            words.Add($"From {options.ScriptName}.");
        }

        return [.. words.SelectMany(each => Typesetting.Break(each, Typeface.Text, wordSize, measure))];
    }

    private List<string> TitleLines(double measure)
    {
        List<string> lines = Typesetting.Break(layout.Title, Typeface.Strong, titleSize, measure);
        return lines.Count <= 2
            ? [.. lines.DefaultIfEmpty("")]
            : [lines[0], Typesetting.Fit(string.Join(' ', lines.Skip(1)), Typeface.Strong, titleSize, measure)];
    }

    private static void Write(Canvas canvas, List<string> title, List<string> lines, Spot at)
    {
        double y = TitleHeight;
        foreach (string line in title)
        {
            canvas.Write(Role.Text, line, at.Moved(0, y), Typeface.Strong, titleSize);
            y += 5.5;
        }
        foreach (string line in lines)
        {
            canvas.Write(Role.Text, line, at.Moved(0, y), Typeface.Text, wordSize);
            y += 4;
        }
    }

    private static void Bar(Canvas canvas, Spot at, bool across)
    {
        Signs.CheckBar(canvas, at, BarLength, across);
        if (across)
        {
            canvas.Write(Role.Text, "100 mm across", at.Moved(BarLength / 2, -3.2), Typeface.Text, wordSize, Anchor.Middle);
        }
        else
        {
            canvas.Add(new Words(Role.Text, "100 mm along", at.Moved(-3.2, BarLength / 2), Typeface.Text, wordSize, Anchor.Middle, 90, Ink.Black));
        }
    }

    // Fine arms and nothing in the middle, so that the point to prick is seen and not covered.
    private static void Cross(Canvas canvas, Spot at)
    {
        canvas.Line(Role.Prick, at.Moved(-CrossReach, 0), at.Moved(-CrossClear, 0), Pens.Rule);
        canvas.Line(Role.Prick, at.Moved(CrossClear, 0), at.Moved(CrossReach, 0), Pens.Rule);
        canvas.Line(Role.Prick, at.Moved(0, -CrossReach), at.Moved(0, -CrossClear), Pens.Rule);
        canvas.Line(Role.Prick, at.Moved(0, CrossClear), at.Moved(0, CrossReach), Pens.Rule);
    }

    // From the lower left corner upwards and to the right.
    private Box? FreeRoom(LabelPlacement placement, Box page, double width, double height)
    {
        Box room = page.Grown(-KeepOffEdge);
        double step = Math.Max(3, Math.Max(room.Width, room.Height) / 150);
        for (double bottom = room.Bottom; bottom - height >= room.Top; bottom -= step)
        {
            cancellation.ThrowIfCancellationRequested();
            for (double left = room.Left; left + width <= room.Right; left += step)
            {
                Box box = new(left, bottom - height, left + width, bottom);
                if (placement.IsFree(box))
                {
                    return box;
                }
            }
        }

        return null;
    }
}
