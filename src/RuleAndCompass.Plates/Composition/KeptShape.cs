using System.Diagnostics;
using RuleAndCompass.Geometry;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Fonts;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>Kept pieces and lettering as they are drawn, mapped from the stock to a page.</summary>
internal static class KeptShape
{
    private const double PointRadius = 0.5;

    /// <summary>The outlines of a kept thing; neighbours that follow on are one outline.</summary>
    public static IEnumerable<Outline> Outlines(Kept kept, View view)
    {
        Outline? run = null;
        foreach (Piece piece in kept.Pieces)
        {
            Outline next = OutlineOf(piece, kept, view);
            Spot end = run is null ? default : run.Legs[^1].To;
            if (run is not null && !run.Closed && !next.Closed && end.DistanceTo(next.Start) < 1e-9)
            {
                run = run with { Legs = run.Legs.AddRange(next.Legs) };
                continue;
            }

            if (run is not null)
            {
                yield return Closed(run);
            }

            run = next;
        }

        if (run is not null)
        {
            yield return Closed(run);
        }
    }

    /// <summary>A lettering as words on the page.</summary>
    public static IEnumerable<Words> Letters(Lettering lettering, View view)
    {
        double height = lettering.HeightMillimetres * view.Scale;
        double size = Face.SizeForCapitals(height);
        Spot at = view.OnPage(Tracing.SpotOf(lettering.At));
        Anchor anchor = lettering.Anchor switch
        {
            Language.Syntax.TextAnchor.Begin => Anchor.Left,
            Language.Syntax.TextAnchor.End => Anchor.Right,
            _ => Anchor.Middle,
        };
        switch (lettering.Lie)
        {
            case StraightLie straight:
                // The base line lies half a capital under the place, as the text runs.
                double turn = straight.Degrees * Math.PI / 180;
                Spot baseAt = at.Moved(Math.Sin(turn) * height / 2, Math.Cos(turn) * height / 2);
                yield return new Words(Role.Lettering, lettering.Text, baseAt, Typeface.Lettering, size, anchor, Wrapped(straight.Degrees), Ink.Black);
                break;
            case BentLie bent:
                foreach (Words letter in Bent(lettering, bent, view, at, size, height, anchor))
                {
                    yield return letter;
                }

                break;
            default:
                throw new UnreachableException($"No letters for {lettering.Lie.GetType().Name}.");
        }
    }

    /// <summary>The upright box round words, however they are turned.</summary>
    public static Box BoxOf(Words words)
    {
        double width = Typesetting.Width(words.Text, words.Typeface, words.SizeMillimetres);
        double height = words.SizeMillimetres * Face.CapitalHeight;
        double left = words.Anchor switch
        {
            Anchor.Left => 0,
            Anchor.Right => -width,
            _ => -width / 2,
        };
        (double sine, double cosine) = Math.SinCos(words.TurnDegrees * Math.PI / 180);
        Box box = new(words.At.X, words.At.Y, words.At.X, words.At.Y);
        foreach ((double x, double y) in new[] { (left, 0.0), (left + width, 0.0), (left, height), (left + width, height) })
        {
            box = box.With(words.At.Moved((x * cosine) - (y * sine), -((x * sine) + (y * cosine))));
        }

        return box;
    }

    // Each letter stands square to the circle through the place; the advance is measured along that circle, which is half the letters' height up.
    private static IEnumerable<Words> Bent(Lettering lettering, BentLie bent, View view, Spot at, double size, double height, Anchor anchor)
    {
        Face face = Face.Of(Typeface.Lettering);
        string shown = face.Shown(lettering.Text);
        Spot centre = view.OnPage(Tracing.SpotOf(bent.Centre));
        double radius = Math.Max(centre.DistanceTo(at), 1e-3);
        double baseRadius = bent.Clockwise ? radius - (height / 2) : radius + (height / 2);
        double way = bent.Clockwise ? -1 : 1;
        double width = face.Width(shown, size);
        double along = anchor switch
        {
            Anchor.Left => 0,
            Anchor.Right => -width,
            _ => -width / 2,
        };
        double start = Tracing.AngleOf(centre, at);
        foreach (char letter in shown)
        {
            string text = letter.ToString();
            double advance = face.Width(text, size);
            double angle = start + (way * (along + (advance / 2)) / radius);
            along += advance;
            if (letter != ' ')
            {
                Spot foot = centre.Moved(baseRadius * Math.Cos(angle), -baseRadius * Math.Sin(angle));
                double turn = (angle * 180 / Math.PI) + (way * 90);
                yield return new Words(Role.Lettering, text, foot, Typeface.Lettering, size, Anchor.Middle, Wrapped(turn), Ink.Black);
            }
        }
    }

    private static Outline OutlineOf(Piece piece, Kept kept, View view)
    {
        switch (piece)
        {
            case SegmentPiece segment:
                return Outline.Line(OnPage(segment.From), OnPage(segment.To));
            case ArcPiece arc:
                Spot centre = OnPage(arc.Centre), from = OnPage(arc.From), to = OnPage(arc.To);
                double start = Tracing.AngleOf(centre, from), end = Tracing.AngleOf(centre, to);
                double sweep = arc.Clockwise ? start - end : end - start;
                sweep = sweep <= 0 ? sweep + (2 * Math.PI) : sweep;
                Outline drawn = Outline.Arc(centre, arc.Radius.ToDouble() * view.Scale, start, arc.Clockwise ? -sweep : sweep);

                // The ends are the exact ones, so that neighbours meet.
                ArcLeg last = (ArcLeg)drawn.Legs[^1];
                return drawn with { Start = from, Legs = drawn.Legs.SetItem(drawn.Legs.Length - 1, last with { To = to }) };
            case CirclePiece circle:
                return Outline.Circle(OnPage(circle.Centre), circle.Radius.ToDouble() * view.Scale);
            case PointPiece point:
                double radius = kept.DrillMillimetres is { } width ? width / 2 * view.Scale : PointRadius;
                return Outline.Circle(OnPage(point.At), radius);
            default:
                throw new UnreachableException($"No outline of {piece.GetType().Name}.");
        }

        Spot OnPage(Point point) => view.OnPage(Tracing.SpotOf(point));
    }

    private static Outline Closed(Outline run) => !run.Closed && run.Legs.Length > 1 && run.Legs[^1].To.DistanceTo(run.Start) < 1e-9
        ? run with { Closed = true, Legs = run.Legs.SetItem(run.Legs.Length - 1, run.Legs[^1] with { To = run.Start }) }
        : run;

    private static double Wrapped(double degrees)
    {
        double turned = degrees % 360;
        turned = turned > 180 ? turned - 360 : turned <= -180 ? turned + 360 : turned;
        return Math.Abs(turned) < 1e-9 ? 0 : turned;
    }
}
