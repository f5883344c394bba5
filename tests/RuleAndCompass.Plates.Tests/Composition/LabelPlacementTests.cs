using RuleAndCompass.Plates.Composition;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Tests.Composition;

public sealed class LabelPlacementTests
{
    private static readonly Box window = new(0, 0, 100, 100);

    [Fact]
    public void A_label_keeps_off_lines_and_off_other_labels()
    {
        LabelPlacement placement = new(window);
        placement.Block(new Spot(0, 50), new Spot(100, 50), PlateSet.AllFrom(0));

        PlacedLabel first = placement.Place(LabelPlacement.Around(new(50, 50), 10, 3, 1.5), PlateSet.Only(0));
        PlacedLabel second = placement.Place(LabelPlacement.Around(new(50, 50), 10, 3, 1.5), PlateSet.Only(0));

        first.IsCrowded.ShouldBeFalse();
        second.IsCrowded.ShouldBeFalse();
        first.Box.Overlaps(second.Box).ShouldBeFalse();
        (first.Box.Bottom < 50 || first.Box.Top > 50).ShouldBeTrue();
        (second.Box.Bottom < 50 || second.Box.Top > 50).ShouldBeTrue();
    }

    [Fact]
    public void What_never_shows_together_may_share_a_place()
    {
        LabelPlacement placement = new(window);

        PlacedLabel first = placement.Place(LabelPlacement.Around(new(50, 50), 10, 3, 1.5), PlateSet.Of([1, 3]));
        PlacedLabel second = placement.Place(LabelPlacement.Around(new(50, 50), 10, 3, 1.5), PlateSet.Of([0, 2]));
        PlacedLabel third = placement.Place(LabelPlacement.Around(new(50, 50), 10, 3, 1.5), PlateSet.Of([3, 4]));

        second.Box.ShouldBe(first.Box);
        third.Box.Overlaps(first.Box).ShouldBeFalse();
    }

    [Fact]
    public void A_label_without_a_free_place_says_so()
    {
        LabelPlacement placement = new(window);
        placement.Block(window, PlateSet.AllFrom(0));

        placement.Place(LabelPlacement.Around(new(50, 50), 10, 3, 1.5), PlateSet.Only(5)).IsCrowded.ShouldBeTrue();
    }

    [Fact]
    public void A_label_stays_inside()
    {
        LabelPlacement placement = new(window);

        window.Holds(placement.Place(LabelPlacement.Around(new(99, 1), 10, 3, 1.5), PlateSet.Only(0)).Box).ShouldBeTrue();
    }
}
