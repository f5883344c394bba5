using RuleAndCompass.Plates.Fonts;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>A page in the making.</summary>
internal sealed class Canvas
{
    private const double LongestUntied = 3.2;

    private readonly List<Item> items = [];

    public void Add(Item item) => items.Add(item);

    public void Line(Role role, Spot from, Spot to, Pen pen) => items.Add(new Stroke(role, Outline.Line(from, to), pen));

    public void Draw(Role role, Outline outline, Pen pen) => items.Add(new Stroke(role, outline, pen));

    public void Fill(Role role, Outline outline, Ink ink) => items.Add(new Fill(role, outline, ink));

    public void Write(Role role, string text, Spot at, Typeface typeface, double size, Anchor anchor = Anchor.Left, Ink ink = Ink.Black)
    {
        if (text.Length > 0)
        {
            items.Add(new Words(role, text, at, typeface, size, anchor, 0, ink));
        }
    }

    /// <summary>A label whose capitals fill the height of a box made by <see cref="LabelSize"/>.</summary>
    public void Label(Role role, string text, Box box, Typeface typeface, double size, Ink ink) =>
        Write(role, text, new Spot(box.Left, box.Bottom - LabelDescent(size)), typeface, size, Anchor.Left, ink);

    /// <summary>A thin line from a label that stands well off to what it belongs to.</summary>
    /// <param name="clear">How far from the spot it ends, millimetres.</param>
    public void Tie(Role role, PlacedLabel label, double clear, Pen pen)
    {
        Spot at = label.Anchor;
        Spot nearest = new(Math.Clamp(at.X, label.Box.Left, label.Box.Right), Math.Clamp(at.Y, label.Box.Top, label.Box.Bottom));
        double distance = at.DistanceTo(nearest);
        if (distance > LongestUntied)
        {
            double part = clear / distance;
            Line(role, new(at.X + (part * (nearest.X - at.X)), at.Y + (part * (nearest.Y - at.Y))), nearest, pen);
        }
    }

    /// <summary>The box a label needs: from its descenders to its capitals.</summary>
    public static (double Width, double Height) LabelSize(string text, Typeface typeface, double size) =>
        (Typesetting.Width(text, typeface, size), (size * Face.CapitalHeight) + LabelDescent(size));

    public Page Finish(double width, double height, string title) => new(width, height, title, [.. items]);

    // Brackets and the tails of letters reach a little under the base line.
    private static double LabelDescent(double size) => size * 0.14;
}
