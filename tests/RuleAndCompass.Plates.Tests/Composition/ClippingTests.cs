using RuleAndCompass.Plates.Composition;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Tests.Composition;

public sealed class ClippingTests
{
    private static readonly Box box = new(0, 0, 10, 10);

    [Fact]
    public void A_line_is_cut_at_the_edges()
    {
        Clipping.Line(new(-5, 5), new(15, 5), box).ShouldBe((new Spot(0, 5), new Spot(10, 5)));
        Clipping.Line(new(2, 3), new(4, 5), box).ShouldBe((new Spot(2, 3), new Spot(4, 5)));
        Clipping.Line(new(-5, 20), new(15, 20), box).ShouldBeNull();
        Clipping.Line(new(-5, 4), new(4, -5), box).ShouldBeNull();
    }

    [Fact]
    public void Touching_agrees_with_cutting()
    {
        Random random = new(7);
        int touching = 0;
        for (int i = 0; i < 2000; i++)
        {
            Spot from = new((random.NextDouble() * 30) - 10, (random.NextDouble() * 30) - 10), to = new((random.NextDouble() * 30) - 10, (random.NextDouble() * 30) - 10);
            bool touches = Clipping.Touches(from, to, box);

            touches.ShouldBe(Clipping.Line(from, to, box) is not null);
            touching += touches ? 1 : 0;
        }

        touching.ShouldBeInRange(500, 1500);
    }

    [Fact]
    public void An_arc_keeps_its_parts_inside()
    {
        // A circle about the corner: a quarter of it lies inside, from straight down to right as seen.
        ArcSpan inside = Clipping.Arc(new(0, 0), 5, ArcSpan.Whole, box).ShouldHaveSingleItem();

        inside.Sweep.ShouldBe(Math.PI / 2, 1e-12);
        Clipping.Arc(new(5, 5), 2, ArcSpan.Whole, box).ShouldHaveSingleItem().IsWhole.ShouldBeTrue();
        Clipping.Arc(new(5, 5), 20, ArcSpan.Whole, box).ShouldBeEmpty();
        Clipping.Arc(new(5, 5), 6, ArcSpan.Whole, box).Count().ShouldBe(4); // one in each corner
    }
}
