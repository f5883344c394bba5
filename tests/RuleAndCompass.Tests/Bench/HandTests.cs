using RuleAndCompass.Bench;

namespace RuleAndCompass.Tests.Bench;

/// <summary>The presets beside the published figures of drafting by hand, where there are any.</summary>
public sealed class HandTests
{
    // plot-range, plot-mean: NPTEL (IIT), Surveying course 105107122, "Plotting accuracy", module 1: 0.1 to 0.4 mm, usually 0.25 mm.
    [Fact]
    public void An_ordinary_hand_pricks_at_the_better_end_of_plotting_and_a_coarse_one_at_its_usual_figure()
    {
        Hand.Ordinary.PrickMillimetres.ShouldBe(0.1);
        Hand.Coarse.PrickMillimetres.ShouldBe(0.25);
    }

    // marking-metal (workshop manuals, from memory, of low confidence): from a rule 0.1 to 0.25 mm, from a height gauge about 0.05 mm.
    [Fact]
    public void A_scriber_follows_what_is_said_of_marking_metal()
    {
        Hand.Fine.PrickMillimetres.ShouldBe(0.05);
        Hand.Fine.ScaleMillimetres.ShouldBeInRange(0.1, 0.25);
        Hand.Ordinary.ScaleMillimetres.ShouldBeInRange(0.1, 0.25);
    }

    // paper-hygro ("Dimensional stability of paper", a posting of 2011): 0.1 to 0.2 % along the grain, 0.2 to 0.4 % across it. laser-scale (posting): a
    // printer's scale is out by up to 2 %.
    [Fact]
    public void A_printed_plate_is_as_true_as_paper_once_its_bars_are_measured()
    {
        Hand.Fine.PaperFraction.ShouldBeInRange(0.001, 0.002);
        Hand.Ordinary.PaperFraction.ShouldBeInRange(0.002, 0.004);
        Hand.Coarse.PaperFraction.ShouldBe(Hand.Ordinary.PaperFraction);
        Hand.UnmeasuredPaperFraction.ShouldBeInRange(0.005, 0.02);
    }

    // Common practice: what is coarser is coarser throughout.
    [Fact]
    public void Each_preset_is_finer_than_the_next_in_every_error()
    {
        (Hand Finer, Hand Coarser)[] pairs = [(Hand.Fine, Hand.Ordinary), (Hand.Ordinary, Hand.Coarse)];
        foreach ((Hand finer, Hand coarser) in pairs)
        {
            finer.PrickMillimetres.ShouldBeLessThan(coarser.PrickMillimetres);
            finer.EdgeMillimetres.ShouldBeLessThan(coarser.EdgeMillimetres);
            finer.OpeningMillimetres.ShouldBeLessThan(coarser.OpeningMillimetres);
            finer.ScaleMillimetres.ShouldBeLessThan(coarser.ScaleMillimetres);
            finer.ProtractorDegrees.ShouldBeLessThan(coarser.ProtractorDegrees);
            finer.SquareDegrees.ShouldBeLessThan(coarser.SquareDegrees);
        }
    }
}
