using System.Collections.Immutable;
using System.Diagnostics;
using RuleAndCompass.Plates.Fonts;
using RuleAndCompass.Plates.Scene;
using SkiaSharp;

namespace RuleAndCompass.Plates.Writing;

/// <summary>Paints a page on a canvas whose unit is the millimetre.</summary>
internal static class SkiaPainter
{
    // A quarter turn as one cubic leaves the circle by 2.7e-4 of the radius, and n cubics to the turn by (4/n)^6 of that: so many that it stays
    // under 1e-5 mm, which is 32 on a circle of ten metres.
    private const double QuarterError = 2.73e-4;
    private const double LargestErrorMillimetres = 1e-5;

    public static void Paint(SKCanvas canvas, Page page, CancellationToken cancellation)
    {
        using SKPaint paint = new() { IsAntialias = true };
        Dictionary<(Typeface, double), SKFont> fonts = [];
        SKPathBuilder? path = null;
        Item? first = null;
        int painted = 0;
        foreach (Item item in page.Items)
        {
            if (++painted % 256 == 0)
            {
                cancellation.ThrowIfCancellationRequested();
            }

            // Neighbours drawn alike leave as one path: a smaller file, sooner written.
            if (first is not null && !Alike(first, item))
            {
                Finish();
            }

            switch (item)
            {
                case Stroke stroke:
                    Add(path ??= new SKPathBuilder(), stroke.Outline);
                    first ??= item;
                    break;
                case Fill fill:
                    Add(path ??= new SKPathBuilder(), fill.Outline);
                    first ??= item;
                    break;
                case Words words:
                    Write(words);
                    break;
                default:
                    throw new UnreachableException($"No paint for {item.GetType().Name}.");
            }
        }

        Finish();
        foreach (SKFont font in fonts.Values)
        {
            font.Dispose();
        }

        void Finish()
        {
            if (path is null)
            {
                return;
            }

            using SKPath drawn = path.Detach();
            path.Dispose();
            path = null;
            if (first is Stroke { Pen: var pen })
            {
                using SKPathEffect? dashes = Dashes(pen.Dashes);
                paint.Style = SKPaintStyle.Stroke;
                paint.StrokeWidth = (float)pen.WidthMillimetres;
                paint.StrokeCap = SKStrokeCap.Butt;
                paint.StrokeJoin = SKStrokeJoin.Round;
                paint.Color = Colour(pen.Ink);
                paint.PathEffect = dashes;
                canvas.DrawPath(drawn, paint);
                paint.PathEffect = null;
            }
            else if (first is Fill fill)
            {
                paint.Style = SKPaintStyle.Fill;
                paint.Color = Colour(fill.Ink);
                canvas.DrawPath(drawn, paint);
            }

            first = null;
        }

        void Write(Words words)
        {
            Face face = Face.Of(words.Typeface);
            string shown = face.Shown(words.Text);
            if (!fonts.TryGetValue((words.Typeface, words.SizeMillimetres), out SKFont? font))
            {
                fonts.Add((words.Typeface, words.SizeMillimetres), font = face.CreateFont((float)words.SizeMillimetres));
            }

            double back = words.Anchor switch
            {
                Anchor.Left => 0,
                Anchor.Middle => face.Width(shown, words.SizeMillimetres) / 2,
                _ => face.Width(shown, words.SizeMillimetres),
            };
            paint.Style = SKPaintStyle.Fill;
            paint.Color = Colour(words.Ink);
            if (words.TurnDegrees == 0)
            {
                canvas.DrawText(shown, (float)(words.At.X - back), (float)words.At.Y, SKTextAlign.Left, font, paint);
                return;
            }

            canvas.Save();
            canvas.Translate((float)words.At.X, (float)words.At.Y);
            canvas.RotateDegrees((float)-words.TurnDegrees);
            canvas.DrawText(shown, (float)-back, 0, SKTextAlign.Left, font, paint);
            canvas.Restore();
        }
    }

    internal static SKColor Colour(Ink ink) => ink switch
    {
        Ink.Black => new SKColor(0x1C, 0x1B, 0x1A),
        Ink.Grey => new SKColor(0x86, 0x86, 0x84),
        Ink.Accent => new SKColor(0x98, 0x34, 0x22),
        Ink.Paper => SKColors.White,
        _ => throw new UnreachableException($"No colour for {ink}."),
    };

    private static bool Alike(Item a, Item b) => (a, b) switch
    {
        (Stroke first, Stroke second) => Same(first.Pen, second.Pen),
        (Fill first, Fill second) => first.Ink == second.Ink,
        _ => false,
    };

    private static bool Same(Pen a, Pen b) =>
        ReferenceEquals(a, b) || (a.Ink == b.Ink && a.WidthMillimetres == b.WidthMillimetres && a.Dashes.SequenceEqual(b.Dashes));

    private static SKPathEffect? Dashes(ImmutableArray<double> lengths) =>
        lengths.IsEmpty ? null : SKPathEffect.CreateDash([.. lengths.Select(length => (float)length)], 0);

    private static void Add(SKPathBuilder path, Outline outline)
    {
        Spot at = outline.Start;
        path.MoveTo((float)at.X, (float)at.Y);
        foreach (Leg leg in outline.Legs)
        {
            if (leg is ArcLeg arc)
            {
                AddArc(path, at, arc);
            }
            else
            {
                path.LineTo((float)leg.To.X, (float)leg.To.Y);
            }

            at = leg.To;
        }

        if (outline.Closed)
        {
            path.Close();
        }
    }

    private static void AddArc(SKPathBuilder path, Spot from, ArcLeg arc)
    {
        // The page's y runs down, so clockwise as seen is the way of growing angles.
        double start = Math.Atan2(from.Y - arc.Centre.Y, from.X - arc.Centre.X);
        double end = Math.Atan2(arc.To.Y - arc.Centre.Y, arc.To.X - arc.Centre.X);
        double sweep = end - start;
        if (arc.Clockwise && sweep < 0)
        {
            sweep += 2 * Math.PI;
        }
        else if (!arc.Clockwise && sweep > 0)
        {
            sweep -= 2 * Math.PI;
        }

        double perTurn = Math.Max(4, 4 * Math.Pow(QuarterError * arc.RadiusMillimetres / LargestErrorMillimetres, 1.0 / 6));
        int count = Math.Max(1, (int)Math.Ceiling((Math.Abs(sweep) / (2 * Math.PI) * perTurn) - 1e-9));
        double step = sweep / count;
        double handle = 4.0 / 3 * Math.Tan(step / 4) * arc.RadiusMillimetres;
        for (int i = 0; i < count; i++)
        {
            (double sine0, double cosine0) = Math.SinCos(start + (step * i));
            (double sine1, double cosine1) = Math.SinCos(start + (step * (i + 1)));
            Spot to = i == count - 1 ? arc.To : new Spot(arc.Centre.X + (arc.RadiusMillimetres * cosine1), arc.Centre.Y + (arc.RadiusMillimetres * sine1));
            path.CubicTo(
                (float)(arc.Centre.X + (arc.RadiusMillimetres * cosine0) - (handle * sine0)),
                (float)(arc.Centre.Y + (arc.RadiusMillimetres * sine0) + (handle * cosine0)),
                (float)(arc.Centre.X + (arc.RadiusMillimetres * cosine1) + (handle * sine1)),
                (float)(arc.Centre.Y + (arc.RadiusMillimetres * sine1) - (handle * cosine1)),
                (float)to.X,
                (float)to.Y);
        }
    }
}
