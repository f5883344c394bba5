using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>Where the stock lies on a page, and what of it shows.</summary>
/// <param name="Middle">The page's spot for the middle of the sheet.</param>
/// <param name="Scale">Millimetres on the page for one on the stock.</param>
/// <param name="Window">On the page; what lies outside is cut off.</param>
internal sealed record View(Spot Middle, double Scale, Box Window)
{
    public Spot OnPage(Spot stock) => new(Middle.X + (Scale * stock.X), Middle.Y + (Scale * stock.Y));

    public Box OnPage(Box stock)
    {
        Spot corner = OnPage(new Spot(stock.Left, stock.Top)), opposite = OnPage(new Spot(stock.Right, stock.Bottom));
        return new(corner.X, corner.Y, opposite.X, opposite.Y);
    }

    /// <summary>The strokes of a curve's trace, each running <paramref name="past"/> millimetres of the page over its ends.</summary>
    public IEnumerable<Outline> Strokes(Trace trace, double past)
    {
        switch (trace)
        {
            case LineTrace line:
                Spot from = OnPage(line.From), to = OnPage(line.To);
                double length = from.DistanceTo(to);
                double x = (to.X - from.X) / length * past, y = (to.Y - from.Y) / length * past;
                if (Clipping.Line(from.Moved(-x, -y), to.Moved(x, y), Window) is { } shown)
                {
                    yield return Outline.Line(shown.From, shown.To);
                }

                break;
            case CircleTrace circle:
                foreach (ArcSpan arc in Arcs(circle, past))
                {
                    yield return Outline.Arc(OnPage(circle.Centre), circle.Radius * Scale, arc.Start, arc.Sweep);
                }

                break;
        }
    }

    /// <summary>The arcs of a circle that show, radians as seen.</summary>
    public IEnumerable<ArcSpan> Arcs(CircleTrace circle, double past)
    {
        double radius = circle.Radius * Scale;
        double over = Math.Min(past / radius, Math.PI / 6);
        foreach (ArcSpan arc in circle.Arcs)
        {
            foreach (ArcSpan shown in Clipping.Arc(OnPage(circle.Centre), radius, arc.IsWhole ? arc : arc.Grown(over), Window))
            {
                yield return shown;
            }
        }
    }
}
