using RuleAndCompass.Plates.Fonts;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Tests;

/// <summary>Measures scenes apart from the composers' own means: strokes are walked in small steps.</summary>
internal static class Measuring
{
    public static Box BoxOf(Words words)
    {
        Face face = Face.Of(words.Typeface);
        double width = face.Width(face.Shown(words.Text), words.SizeMillimetres);
        double left = words.Anchor switch
        {
            Anchor.Left => words.At.X,
            Anchor.Right => words.At.X - width,
            _ => words.At.X - (width / 2),
        };
        return new(left, words.At.Y - (words.SizeMillimetres * Face.CapitalHeight), left + width, words.At.Y);
    }

    public static bool Touches(Outline outline, Box box) => SpotsOn(outline).Any(box.Holds);

    private static IEnumerable<Spot> SpotsOn(Outline outline)
    {
        Spot at = outline.Start;
        IEnumerable<Leg> legs = outline.Closed ? outline.Legs.Append(new StraightLeg(outline.Start)) : outline.Legs;
        foreach (Leg leg in legs)
        {
            double length = leg is ArcLeg round ? 2.2 * round.RadiusMillimetres : at.DistanceTo(leg.To);
            int steps = 2 + (int)(length / 0.1);
            for (int i = 0; i <= steps; i++)
            {
                double part = (double)i / steps;
                if (leg is ArcLeg arc)
                {
                    double start = Math.Atan2(at.Y - arc.Centre.Y, at.X - arc.Centre.X), end = Math.Atan2(leg.To.Y - arc.Centre.Y, leg.To.X - arc.Centre.X);
                    double sweep = end - start;
                    sweep = arc.Clockwise ? (sweep < 0 ? sweep + (2 * Math.PI) : sweep) : sweep > 0 ? sweep - (2 * Math.PI) : sweep;
                    yield return new(arc.Centre.X + (arc.RadiusMillimetres * Math.Cos(start + (part * sweep))), arc.Centre.Y + (arc.RadiusMillimetres * Math.Sin(start + (part * sweep))));
                }
                else
                {
                    yield return new(at.X + (part * (leg.To.X - at.X)), at.Y + (part * (leg.To.Y - at.Y)));
                }
            }

            at = leg.To;
        }
    }
}
